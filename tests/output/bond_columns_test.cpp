#include "output/bond_columns.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "job/variants.hpp"
#include "output/varied_bonds.hpp"
#include "support/moved.hpp"
#include "support/paths.hpp"

using namespace irrepwise;

namespace {

void match_all(Comparison& comparison) {
  const LevelsResult& a =
      comparison.variants[static_cast<std::size_t>(comparison.reference)].levels;
  const MatchReference reference = make_match_reference(a.symmetry, a.basis, a.levels);
  comparison.matchings.clear();
  for (const VariantResult& variant : comparison.variants) {
    const LevelsResult& b = variant.levels;
    comparison.matchings.push_back(match_levels(reference, b.symmetry, b.basis, b.levels));
  }
  find_varied_bonds(comparison);
}

// Each variant turned and renumbered in its own way; seed 0 leaves them as they are.
Comparison comparison_of(const std::string& file, int reference = 0, unsigned seed = 0) {
  Comparison comparison;
  comparison.reference = reference;
  for (const VariantJob& variant : variant_jobs(source_path("inputs/" + file))) {
    Job job = variant.read();
    if (seed != 0) job.molecule = moved(job.molecule, seed++).molecule;
    comparison.variants.push_back(analysed(variant.name, levels_result(job)));
  }
  match_all(comparison);
  return comparison;
}

const BondColumn* column(const std::vector<BondColumn>& columns, const std::string& key) {
  const auto found = std::find_if(columns.begin(), columns.end(),
                                  [&](const BondColumn& c) { return c.key == key; });
  return found == columns.end() ? nullptr : &*found;
}

std::vector<std::string> shown_titles(const std::vector<BondColumn>& columns) {
  std::vector<std::string> titles;
  for (const BondColumn& c : columns) {
    if (c.shown) titles.push_back(c.title);
  }
  return titles;
}

using Titles = std::vector<std::string>;

}  // namespace

TEST_CASE("the ligand that is varied has a column of its own, apart from the others") {
  const Comparison comparison = comparison_of("trans_to_hydride.yaml");
  const std::vector<BondColumn> columns = bond_columns(comparison);
  CHECK(shown_titles(columns) == Titles{"M–varied", "M–P trans P", "M–H"});
  // One place of four varies; whatever stands there, the two phosphanes and the hydride stay.
  for (const VariantResult& variant : comparison.variants) {
    CAPTURE(variant.name);
    REQUIRE(variant.varied_bonds.size() == 1);
    CHECK(column(columns, "bond_H")->mean(variant).has_value());
  }
  // The phosphane trans to the hydride is the varied one, the other two are not mixed with it: they
  // differ, and the mean over the element lies between.
  const VariantResult& phosphane = comparison.variants[4];
  REQUIRE(phosphane.name == "phosphane");
  const double trans_to_hydride = *column(columns, "bond_P_other")->mean(phosphane);
  const double cis = *column(columns, "bond_P_like")->mean(phosphane);
  CHECK(*column(columns, "bond_varied")->mean(phosphane) == trans_to_hydride);
  CHECK(std::abs(trans_to_hydride - cis) > 0.01);
  CHECK(std::abs((trans_to_hydride + 2 * cis) / 3 - *column(columns, "bond_P")->mean(phosphane)) <
        1e-12);
}

TEST_CASE("where every place is varied in some variant, bonds are told by what stands opposite") {
  const Comparison comparison = comparison_of("stepwise_octahedron.yaml");
  const std::vector<BondColumn> columns = bond_columns(comparison);
  CHECK(shown_titles(columns) ==
        Titles{"M–N trans N", "M–N trans C", "M–C trans C", "M–C trans N"});
  for (const VariantResult& variant : comparison.variants) {
    CAPTURE(variant.name);
    CHECK(variant.varied_bonds.empty());
  }
  // fac: each nitrogen is opposite to a carbon; mer: one of three (common practice).
  const auto has = [&](const std::string& name, const std::string& key) {
    const auto variant = std::find_if(comparison.variants.begin(), comparison.variants.end(),
                                      [&](const VariantResult& v) { return v.name == name; });
    return column(columns, key)->mean(*variant).has_value();
  };
  CHECK_FALSE(has("fac three", "bond_N_like"));
  CHECK(has("fac three", "bond_N_other"));
  CHECK(has("mer three", "bond_N_like"));
  CHECK(has("mer three", "bond_N_other"));
}

TEST_CASE("bonds that vary to several elements at once are not averaged") {
  // From four chlorides to chloride, two phosphanes and a hydride: three donors are new.
  Comparison comparison;
  for (const char* file : {"square_ptcl4.xyz", "hydride_platform.yaml"}) {
    Comparison one = comparison_of(file);
    comparison.variants.push_back(std::move(one.variants.front()));
  }
  match_all(comparison);
  CHECK(comparison.variants[1].varied_bonds.size() == 3);
  CHECK(shown_titles(bond_columns(comparison)) == Titles{"M–Cl", "M–H", "M–P"});
}

TEST_CASE("six equal ligands need one column for each element") {
  const Comparison comparison = comparison_of("ligand_series.yaml");
  CHECK(shown_titles(bond_columns(comparison)) ==
        Titles{"M–Br", "M–Cl", "M–F", "M–O", "M–N", "M–C"});
}

TEST_CASE("neither turning, renumbering nor another reference changes a column") {
  const Comparison as_given = comparison_of("trans_to_hydride.yaml");
  const std::vector<BondColumn> expected = bond_columns(as_given);
  for (const Comparison& other :
       {comparison_of("trans_to_hydride.yaml", 0, 7), comparison_of("trans_to_hydride.yaml", 4)}) {
    const std::vector<BondColumn> columns = bond_columns(other);
    for (const BondColumn& known : expected) {
      CAPTURE(known.key);
      const BondColumn* const found = column(columns, known.key);
      REQUIRE(found != nullptr);
      CHECK(found->title == known.title);
      CHECK(found->shown == known.shown);
      for (std::size_t i = 0; i < as_given.variants.size(); ++i) {
        const std::optional<double> before = known.mean(as_given.variants[i]);
        const std::optional<double> after = found->mean(other.variants[i]);
        REQUIRE(before.has_value() == after.has_value());
        if (before) CHECK(std::abs(*before - *after) < 1e-6);
      }
    }
  }
}
