#include "output/compare_columns.hpp"

#include <algorithm>
#include <cstddef>
#include <string>
#include <utility>
#include <vector>

#include <doctest/doctest.h>

#include "output/compare_json.hpp"
#include "output/compare_tables.hpp"
#include "output/example.hpp"

using namespace irrepwise;

namespace {

Molecule octahedron(int metal, int charge) {
  std::vector<Atom> atoms = {{metal, {0, 0, 0}}};
  for (int axis = 0; axis < 3; ++axis) {
    for (const double sign : {-2.0, 2.0}) {
      Atom atom{9, {0, 0, 0}};
      atom.position[axis] = sign;
      atoms.push_back(atom);
    }
  }
  return {atoms, charge, ""};
}

Comparison alone(std::vector<VariantResult> variants) {
  Comparison comparison;
  comparison.variants = std::move(variants);
  comparison.matchings.resize(comparison.variants.size());
  return comparison;
}

bool shows(const Comparison& comparison, const std::string& key) {
  const Table table = summary_table(comparison, {}, SummaryPart::Frontier);
  return std::any_of(table.columns.begin(), table.columns.end(),
                     [&](const Column& column) { return column.key == key; });
}

// Of one variant, as programs get it.
std::string value(const Comparison& comparison, std::size_t variant, const std::string& key) {
  const Table table = summary_table(comparison, {}, SummaryPart::Whole);
  const auto column = std::find_if(table.columns.begin(), table.columns.end(),
                                   [&](const Column& c) { return c.key == key; });
  REQUIRE(column != table.columns.end());
  const auto at = static_cast<std::size_t>(column - table.columns.begin());
  return cell_exact(std::get<Row>(table.lines[variant]).cells[at]);
}

}  // namespace

TEST_CASE(
    "formula, charge and valence electrons are columns; the charge is shown where it varies") {
  const Molecule square = skew_square();
  const Comparison same =
      alone({analysed("a", result_of(square)), analysed("b", result_of(square))});
  // 10 of platinum, 7 of each chlorine, 2 of the charge: groups of the periodic table.
  CHECK(value(same, 0, "formula") == "Cl4Pt");
  CHECK(value(same, 0, "charge") == "-2");
  CHECK(value(same, 0, "electrons") == "40");
  for (const char* key : {"formula", "charge", "electrons"}) CHECK_FALSE(shows(same, key));
  const Comparison ions = alone({analysed("a", result_of(square)),
                                 analysed("b", result_of(Molecule(square.atoms(), 0, "")))});
  CHECK(value(ions, 1, "charge") == "0");
  CHECK(value(ions, 1, "electrons") == "38");
  CHECK(shows(ions, "charge"));
}

TEST_CASE("fragile and open shell are columns of their own, each with one word or none") {
  // Cu(II) is d9: one hole in eg. Co(III) in fluorides, filled from below, has a full t2g.
  const Comparison comparison = alone({analysed("open", result_of(octahedron(29, -4))),
                                       analysed("closed", result_of(octahedron(27, -3)))});
  CHECK(value(comparison, 0, "open_shell") == "open");
  CHECK(value(comparison, 1, "open_shell").empty());
  for (std::size_t i = 0; i < 2; ++i) {
    CHECK(value(comparison, i, "fragile") ==
          (comparison.variants[i].robustness.fragile() ? "fragile" : ""));
  }
  CHECK(shows(comparison, "open_shell"));
  CHECK_FALSE(shows(alone({comparison.variants[1]}), "open_shell"));
}

TEST_CASE(
    "a metal without a d shell has charge and bonds; only what is of the d shell stays blank") {
  const Comparison comparison = alone({analysed("copper", result_of(octahedron(29, -4))),
                                       analysed("zinc", result_of(octahedron(30, -4)))});
  REQUIRE(comparison.variants[1].metal() != nullptr);
  const Populations& populations = comparison.variants[1].levels.populations;
  CHECK(value(comparison, 1, "metal") == "Zn1");
  // All charges make that of the ion, and the six fluorides are equivalent.
  CHECK(std::stod(value(comparison, 1, "metal_charge")) ==
        doctest::Approx(-4.0 - 6.0 * populations.charge[1]).epsilon(1e-9).scale(0));
  CHECK(std::stod(value(comparison, 1, "bond_F")) > 0.0);
  CHECK(value(comparison, 1, "d_population").empty());
  CHECK_FALSE(value(comparison, 0, "d_population").empty());
  const Table summary = summary_table(comparison, {}, SummaryPart::Metal);
  REQUIRE(summary.notes.size() == 1);
  CHECK(summary.notes[0].find("Zn: no d shell among the parameters") != std::string::npos);
  for (const auto& line : d_block_table(comparison).lines) {
    if (const Row* row = std::get_if<Row>(&line)) CHECK(cell_exact(row->cells[0]) == "copper");
  }
  CHECK(compare_json(comparison).find("\"d_population\":null") != std::string::npos);
}
