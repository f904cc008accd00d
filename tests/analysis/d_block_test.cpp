#include "analysis/d_block.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <numbers>
#include <random>
#include <string>
#include <utility>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Geometry>

#include "analysis/donors.hpp"
#include "job/variants.hpp"
#include "molecule/polyhedra.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "support/paths.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

DBlock d_block_of(const Molecule& molecule) {
  const Run r = run(molecule);
  const Populations populations = mulliken_populations(r.symmetry, r.basis, r.levels);
  const std::vector<int> metals = metal_atoms(r.symmetry.molecule, r.basis);
  REQUIRE_FALSE(metals.empty());
  return find_d_block(r.symmetry, r.basis, r.levels, populations, metals.front());
}

// "e1g of which parent": the irreps of the molecule beside those of the parent, sorted.
std::vector<std::string> correlation(const Molecule& molecule, std::string& parent) {
  const Run r = run(molecule);
  const Populations populations = mulliken_populations(r.symmetry, r.basis, r.levels);
  const DBlock block = find_d_block(r.symmetry, r.basis, r.levels, populations,
                                    metal_atoms(r.symmetry.molecule, r.basis).front());
  parent = block.parent_group;
  std::vector<std::string> pairs;
  for (const DLevel& entry : block.levels) {
    const Level& level = r.levels.levels[static_cast<std::size_t>(entry.level)];
    pairs.push_back(
        level_label(r.symmetry.group.irreps()[static_cast<std::size_t>(level.irrep)].label) + " (" +
        entry.parent_label + ")");
  }
  std::sort(pairs.begin(), pairs.end());
  return pairs;
}

using Labels = std::vector<std::string>;

}  // namespace

TEST_CASE("d levels bear the labels of the textbook correlation") {
  // Source: correlation table of Oh, Cotton, Chemical Applications of Group Theory, appendix II B
  // (from memory). In C2v the labels b1 and b2 follow from the conventions' plane yz; cis has its
  // two like ligands in it.
  struct Row {
    const char* molecule;
    const char* parent;
    Labels labels;
  };
  const Row rows[] = {
      {"hexacarbonylchromium", "Oh", {"eg (eg)", "t2g (t2g)"}},
      {"trans-tetracarbonyldichloromolybdate(0)",
       "Oh",
       {"a1g (eg)", "b1g (eg)", "b2g (t2g)", "eg (t2g)"}},
      {"pentacarbonylchloromanganese", "Oh", {"a1 (eg)", "b1 (eg)", "b2 (t2g)", "e (t2g)"}},
      {"mer-tricyanotrifluorocobaltate(III)",
       "Oh",
       {"a1 (eg)", "a1 (eg)", "a2 (t2g)", "b1 (t2g)", "b2 (t2g)"}},
      {"fac-tricyanotrifluorocobaltate(III)", "Oh", {"a1 (t2g)", "e (eg)", "e (t2g)"}},
      {"titanium tetrachloride", "Td", {"e (e)", "t2 (t2)"}},
      {"tetrachloroplatinate(II)", "D4h", {"a1g (a1g)", "b1g (b1g)", "b2g (b2g)", "eg (eg)"}},
      {"pentacarbonyliron", "D3h", {"a1' (a1')", "e\" (e\")", "e' (e')"}},
      {"benzenetricarbonylchromium", "Oh", {"a1 (t2g)", "e (eg)", "e (t2g)"}}};
  for (const Row& row : rows) {
    CAPTURE(std::string(row.molecule));
    std::string parent;
    const Labels found = correlation(test_molecule(row.molecule).molecule, parent);
    CHECK(parent == row.parent);
    CHECK(found == row.labels);
  }
  // In cis one of t2g and one of eg are b1 or b2, and not the same.
  std::string parent;
  const Labels cis =
      correlation(test_molecule("cis-tetracarbonyldichloromolybdate(0)").molecule, parent);
  CHECK(parent == "Oh");
  const bool one = cis == Labels{"a1 (eg)", "a1 (t2g)", "a2 (t2g)", "b1 (eg)", "b2 (t2g)"};
  const bool other = cis == Labels{"a1 (eg)", "a1 (t2g)", "a2 (t2g)", "b1 (t2g)", "b2 (eg)"};
  CHECK((one || other));
}

TEST_CASE("the d block holds the d electrons of the closed-shell count") {
  // Common practice: ligands leave as closed shells, NO as NO+; each metal of a metal–metal bond
  // keeps its electron. Levels of π acceptors, of rings and of metal–metal bonds lie near in energy
  // and must not take the place of d levels.
  struct Row {
    const char* molecule;
    double electrons;
  };
  const Row rows[] = {{"hexacarbonylchromium", 6},
                      {"pentacarbonyliron", 8},
                      {"tetracarbonylnickel", 10},
                      {"tetracarbonylhydridocobalt", 8},
                      {"pentacarbonylchloromanganese", 6},
                      {"decacarbonyldimanganese", 14},
                      {"dodecacarbonyltriruthenium", 24},
                      {"hexacyanoferrate(III)", 5},
                      {"octacyanomolybdate(IV), square antiprism", 2},
                      {"cis-tetracarbonyldichloromolybdate(0)", 6},
                      {"octachlorodirhenate(III)", 8},
                      {"benzenetricarbonylchromium", 6},
                      {"tricarbonylcyclopentadienylmanganese", 6},
                      {"cyclopentadienylnitrosylnickel", 10},
                      {"ferrocene, staggered", 6},
                      {"dichlorotitanocene", 0},
                      {"trichloro(ethylene)platinate(II)", 8},
                      {"tetrachlorooxovanadate(IV)", 1},
                      {"tetrachlorocuprate(II), flattened", 9},
                      {"permanganate", 0},
                      {"tris(ethylenediamine)cobalt(III)", 6}};
  for (const Row& row : rows) {
    CAPTURE(std::string(row.molecule));
    const Run r = run(test_molecule(row.molecule).molecule);
    const Populations populations = mulliken_populations(r.symmetry, r.basis, r.levels);
    const DBlock block = find_d_block(r.symmetry, r.basis, r.levels, populations,
                                      metal_atoms(r.symmetry.molecule, r.basis).front());
    double electrons = 0.0;
    for (const DLevel& entry : block.levels) {
      electrons += r.levels.levels[static_cast<std::size_t>(entry.level)].occupation;
    }
    CHECK(electrons == row.electrons);
  }
}

TEST_CASE("a ring and three more ligands make a pseudo-octahedron with t2g below eg") {
  // Source: Albright, Burdett and Whangbo, Orbital Interactions in Chemistry, chapter on CpM(CO)3:
  // isolobal with ML6 (from memory). The three places of the ring lie opposite to the carbonyls.
  for (const char* name : {"benzenetricarbonylchromium", "tricarbonylcyclopentadienylmanganese"}) {
    CAPTURE(std::string(name));
    const DBlock block = d_block_of(test_molecule(name).molecule);
    REQUIRE(block.shape);
    CHECK(block.shape->symbol == "OC-6");
    CHECK(block.shape->deviation_degrees < 5.0);
    REQUIRE(block.means.size() == 2);
    CHECK(block.means[0].label == "t2g");
  }
}

TEST_CASE("a leg on the axis of the ring makes no pseudo-octahedron, however the molecule lies") {
  // Such a leg has no side for a place of the ring to stand opposite to.
  std::vector<Atom> atoms = {
      {25, {0, 0, 0}}, {8, {0, 0, -1.7}}, {8, {1.6, 0, -0.5}}, {8, {-1.6, 0, -0.5}}};
  for (int i = 0; i < 5; ++i) {
    const double phi = 2.0 * std::numbers::pi * i / 5.0;
    atoms.push_back({6, {1.2 * std::cos(phi), 1.2 * std::sin(phi), 1.8}});
    atoms.push_back({1, {2.28 * std::cos(phi), 2.28 * std::sin(phi), 1.8}});
  }
  const Molecule molecule(std::move(atoms), 0);
  const DBlock before = d_block_of(molecule);
  REQUIRE(before.shape);
  CHECK(before.shape->symbol.ends_with("-4"));
  for (const unsigned seed : {1u, 2u, 3u}) {
    const DBlock after = d_block_of(moved(molecule, seed).molecule);
    REQUIRE(after.shape);
    CHECK(after.shape->symbol == before.shape->symbol);
    CHECK(std::abs(after.shape->deviation_degrees - before.shape->deviation_degrees) < 1e-6);
  }
}

TEST_CASE("in the ideal polyhedron itself the parent label is the level's own, and pure") {
  const DBlock block = d_block_of(test_molecule("hexacarbonylchromium").molecule);
  REQUIRE(block.shape);
  CHECK(block.shape->symbol == "OC-6");
  CHECK(block.shape->deviation_degrees < 1e-5);
  REQUIRE(block.levels.size() == 2);
  for (const DLevel& entry : block.levels)
    CHECK(entry.parent_weight == doctest::Approx(1.0).epsilon(1e-9).scale(0));
  REQUIRE(block.means.size() == 2);
  // Ligand-field theory: t2g lies below eg in an octahedron (common practice).
  CHECK(block.means[0].label == "t2g");
  CHECK(block.means[1].label == "eg");
}

TEST_CASE(
    "isomers have about the same splitting, though ligand levels take part of the d orbitals") {
  // Source: rule of average environment, Figgis and Hitchman, Ligand Field Theory and its
  // Applications (from memory): the mean of the d levels depends on the set of ligands alone. In
  // fac the π* of three cyanides take most of eg: with one level alone the isomers would be 0.4 to
  // 0.9 eV apart, depending on which.
  std::map<std::string, double> splitting;
  for (const VariantJob& variant : variant_jobs(source_path("inputs/stepwise_octahedron.yaml"))) {
    const DBlock block = d_block_of(variant.read().molecule);
    REQUIRE(block.means.size() == 2);
    CHECK(block.means[0].label == "t2g");
    splitting[variant.name] = block.means[1].energy_ev - block.means[0].energy_ev;
  }
  const auto apart = [&](const char* one, const char* other) {
    return std::abs(splitting.at(one) - splitting.at(other));
  };
  CHECK(apart("cis two", "trans two") < 0.1);
  CHECK(apart("fac three", "mer three") < 0.1);
  CHECK(apart("cis four", "trans four") < 0.1);
}

TEST_CASE("labels, shares and splittings do not depend on how the molecule lies") {
  const Molecule molecule = test_molecule("mer-tricyanotrifluorocobaltate(III)").molecule;
  const DBlock before = d_block_of(molecule);
  for (unsigned seed = 1; seed <= 3; ++seed) {
    std::mt19937 random(seed);
    std::normal_distribution<double> normal;
    const Eigen::Quaterniond turn =
        Eigen::Quaterniond(normal(random), normal(random), normal(random), normal(random))
            .normalized();
    const Eigen::Matrix3Xd turned = turn.toRotationMatrix() * molecule.positions();
    const DBlock after = d_block_of(molecule.with_positions(turned));
    REQUIRE(after.levels.size() == before.levels.size());
    for (std::size_t i = 0; i < before.levels.size(); ++i) {
      CHECK(after.levels[i].parent_label == before.levels[i].parent_label);
      CHECK(std::abs(after.levels[i].d_share - before.levels[i].d_share) < 1e-9);
      CHECK(std::abs(after.levels[i].parent_weight - before.levels[i].parent_weight) < 1e-7);
    }
  }
}

TEST_CASE("every ideal polyhedron is found as itself in any orientation") {
  for (const PolyhedronKind& kind : polyhedron_kinds()) {
    const Polyhedron polyhedron(kind.symbol);
    const Eigen::Matrix3d turn =
        Eigen::AngleAxisd(0.9, Eigen::Vector3d(0.3, -0.5, 0.8).normalized()).toRotationMatrix();
    std::vector<Eigen::Vector3d> directions;
    for (int vertex = polyhedron.size(); vertex >= 1; --vertex) {
      directions.emplace_back(turn * polyhedron.vertex(vertex));
    }
    const std::optional<PolyhedronFit> fit = nearest_polyhedron(directions);
    REQUIRE(fit);
    CAPTURE(std::string(kind.symbol));
    CHECK(fit->symbol == kind.symbol);
    CHECK(fit->group == kind.group);
    CHECK(fit->deviation_degrees < 1e-5);
    for (std::size_t i = 0; i < directions.size(); ++i) {
      CHECK((fit->turn * polyhedron.vertex(fit->vertices[i]) - directions[i]).norm() < 1e-7);
    }
  }
}

TEST_CASE("the deviation of a bent pair is half of what each bond is off") {
  // By construction: two bonds at 160 degrees are each 10 degrees off the nearest straight line,
  // and 20 degrees off the angular shape of 120 degrees.
  const double half = 80.0 * std::numbers::pi / 180.0;
  const std::vector<Eigen::Vector3d> bent = {{std::sin(half), 0.0, std::cos(half)},
                                             {-std::sin(half), 0.0, std::cos(half)}};
  const std::optional<PolyhedronFit> fit = nearest_polyhedron(bent);
  REQUIRE(fit);
  CHECK(fit->symbol == "L-2");
  CHECK(fit->deviation_degrees == doctest::Approx(10.0).epsilon(1e-6).scale(0));
}

TEST_CASE("a ring that binds side by side is one donor") {
  const Run r = run(test_molecule("benzenetricarbonylchromium").molecule);
  const std::vector<DonorSite> sites =
      donor_sites(r.symmetry.molecule, metal_atoms(r.symmetry.molecule, r.basis).front());
  REQUIRE(sites.size() == 4);
  std::vector<std::size_t> sizes;
  for (const DonorSite& site : sites) sizes.push_back(site.atoms.size());
  std::sort(sizes.begin(), sizes.end());
  CHECK(sizes == std::vector<std::size_t>{1, 1, 1, 6});
}
