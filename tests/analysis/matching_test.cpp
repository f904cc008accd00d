#include "analysis/matching.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Geometry>

#include "analysis/common_symmetry.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

Molecule turned(const Molecule& molecule) {
  const Eigen::Matrix3d turn =
      Eigen::AngleAxisd(1.1, Eigen::Vector3d(0.7, 0.1, -0.4).normalized()).toRotationMatrix();
  return molecule.with_positions(turn * molecule.positions());
}

const std::string& label_of(const Run& r, int level) {
  static std::string label;
  label = level_name(r.symmetry.group, r.levels.levels[static_cast<std::size_t>(level)]);
  return label;
}

}  // namespace

TEST_CASE("every level of a molecule is matched with itself, however the second one lies") {
  // An identity: the same orbitals overlap with 1.
  for (const char* name : {"tetrachloroplatinate(II)", "pentacarbonylchloromanganese", "ammonia"}) {
    CAPTURE(std::string(name));
    const Run a = run(test_molecule(name).molecule);
    const Run b = run(turned(test_molecule(name).molecule));
    const MatchReference reference = make_match_reference(a.symmetry, a.basis, a.levels);
    const Matching matching = match_levels(reference, b.symmetry, b.basis, b.levels);
    CHECK(matching.shared_atoms == a.symmetry.molecule.size());
    CHECK(matching.common_group == a.symmetry.group.symbol().name());
    REQUIRE(matching.matches.size() == a.levels.levels.size());
    for (const LevelMatch& match : matching.matches) {
      CHECK(match.reference == match.variant);
      CHECK(std::abs(match.overlap - 1.0) < 1e-6);
    }
  }
}

TEST_CASE("replacing one of six ligands splits t2g into b2 and e, and both are found") {
  // Source of the descent: Cotton, correlation table of Oh to C4v (from memory).
  const Run a = run(test_molecule("hexacarbonylchromium").molecule);
  const Run b = run(test_molecule("pentacarbonylchloromanganese").molecule);
  const MatchReference reference = make_match_reference(a.symmetry, a.basis, a.levels);
  const Matching matching = match_levels(reference, b.symmetry, b.basis, b.levels);
  CHECK(matching.common_group == "C4v");
  CHECK(matching.shared_atoms >= 11);  // the metal and five carbonyls
  std::vector<std::string> found;
  for (const LevelMatch& match : matching.matches) {
    if (match.reference == *a.levels.frontier.homo) found.push_back(match.irrep);
  }
  REQUIRE(label_of(a, *a.levels.frontier.homo).ends_with("t2g"));
  std::sort(found.begin(), found.end());
  CHECK(found == std::vector<std::string>{"b2", "e"});
}

namespace {

Molecule octahedron(int metal, int ligand, double distance_angstrom, int charge) {
  std::vector<Atom> atoms = {{metal, Eigen::Vector3d::Zero()}};
  for (int axis = 0; axis < 3; ++axis) {
    for (const double sign : {1.0, -1.0}) {
      atoms.push_back({ligand, sign * distance_angstrom * Eigen::Vector3d::Unit(axis)});
    }
  }
  return Molecule(std::move(atoms), charge);
}

}  // namespace

TEST_CASE(
    "with all six halides replaced each level is found as the level of its place in its irrep") {
  // Between two octahedra of halides the levels of an irrep keep their order (no reason to cross:
  // common practice), so bonding eg is bonding eg and antibonding eg* antibonding. The metal alone
  // does not tell them apart, the phase of the donors does.
  const Run bromide = run(octahedron(27, 35, 2.46, -3));
  const Run chloride = run(octahedron(27, 17, 2.28, -3));
  const MatchReference reference =
      make_match_reference(bromide.symmetry, bromide.basis, bromide.levels);
  const Matching matching =
      match_levels(reference, chloride.symmetry, chloride.basis, chloride.levels);
  CHECK(matching.common_group == "Oh");
  CHECK(matching.replaced_donors + matching.shared_atoms == 7);
  REQUIRE(matching.matches.size() == bromide.levels.levels.size());
  for (const LevelMatch& match : matching.matches) {
    const Level& a = bromide.levels.levels[static_cast<std::size_t>(match.reference)];
    const Level& b = chloride.levels.levels[static_cast<std::size_t>(match.variant)];
    CAPTURE(a.irrep);
    CAPTURE(a.number);
    CHECK(a.irrep == b.irrep);
    CHECK(a.number == b.number);
  }
}

TEST_CASE("the lone pairs of a halide are not looked for in ligands of several atoms") {
  // 1t1g holds nothing but halide lone pairs across the bonds: no metal orbital is t1g in Oh
  // (character table). Carbonyls have t1g too, of their own.
  const Run halide = run(octahedron(27, 35, 2.46, -3));
  const Run carbonyl = run(test_molecule("hexacarbonylchromium").molecule);
  const MatchReference reference =
      make_match_reference(halide.symmetry, halide.basis, halide.levels);
  const Matching matching =
      match_levels(reference, carbonyl.symmetry, carbonyl.basis, carbonyl.levels);
  CHECK(matching.replaced_donors == 6);
  for (const LevelMatch& match : matching.matches) {
    const std::string label = label_of(halide, match.reference);
    CHECK_FALSE(label.ends_with("t1g"));
  }
}

TEST_CASE("no orbital is matched twice") {
  const Run a = run(test_molecule("trans-tetracarbonyldichloromolybdate(0)").molecule);
  const Run b = run(test_molecule("cis-tetracarbonyldichloromolybdate(0)").molecule);
  const MatchReference reference = make_match_reference(a.symmetry, a.basis, a.levels);
  const Matching matching = match_levels(reference, b.symmetry, b.basis, b.levels);
  std::vector<int> used(b.levels.levels.size(), 0);
  for (const LevelMatch& match : matching.matches) {
    const Level& ours = a.levels.levels[static_cast<std::size_t>(match.reference)];
    const Level& theirs = b.levels.levels[static_cast<std::size_t>(match.variant)];
    CHECK(match.overlap <= 1.0);
    ++used[static_cast<std::size_t>(match.variant)];
    CHECK(used[static_cast<std::size_t>(match.variant)] <= theirs.degeneracy);
    CHECK(ours.degeneracy >= 1);
  }
}

TEST_CASE("the common group of two groups keeps only what both have") {
  // In one frame D4h and D3h share D2h's mirrors through z and C2 along x: C2v; of a group with
  // itself everything is left.
  const PointGroup d4h(parse_schoenflies("D4h")), d3h(parse_schoenflies("D3h"));
  const CommonSymmetry common = common_symmetry(d4h, d3h, Eigen::Matrix3d::Identity());
  CHECK(common.group.symbol().name() == "C2v");
  const CommonSymmetry own = common_symmetry(d4h, d4h, Eigen::Matrix3d::Identity());
  CHECK(own.group.symbol().name() == "D4h");
  for (std::size_t i = 0; i < own.first.size(); ++i) {
    for (std::size_t j = 0; j < own.first[i].size(); ++j)
      CHECK(own.first[i][j] == (i == j ? 1 : 0));
  }
  // Dimensions are kept by every descent.
  for (std::size_t i = 0; i < common.first.size(); ++i) {
    int dimension = 0;
    for (std::size_t j = 0; j < common.first[i].size(); ++j) {
      dimension += common.first[i][j] * common.group.irreps()[j].dimension;
    }
    CHECK(dimension == d4h.irreps()[i].dimension);
  }
  const PointGroup linear(parse_schoenflies("Dinfh")), square(parse_schoenflies("D4h"));
  CHECK(common_symmetry(linear, square, Eigen::Matrix3d::Identity()).group.symbol().name() ==
        "D4h");
}

TEST_CASE("a common group that lies askew in both is described the same way from either side") {
  // A turn by 120 degrees about (1,1,1) puts the C4 of C4v along x or y of D4h, where D4h has C2':
  // the two share C2v. Descent keeps dimensions, and the totally symmetric irrep.
  const PointGroup first(parse_schoenflies("D4h")), second(parse_schoenflies("C4v"));
  const Eigen::Matrix3d third =
      Eigen::AngleAxisd(2.0943951023931953, Eigen::Vector3d::Ones().normalized())
          .toRotationMatrix();
  for (const Eigen::Matrix3d& turn : {third, Eigen::Matrix3d(third.transpose())}) {
    const CommonSymmetry common = common_symmetry(first, second, turn);
    CHECK(common.group.symbol().name() == "C2v");
    const auto check = [&](const PointGroup& whole, const std::vector<std::vector<int>>& counts) {
      CHECK(counts.front().front() == 1);
      for (std::size_t i = 0; i < counts.size(); ++i) {
        int dimension = 0;
        for (std::size_t j = 0; j < counts[i].size(); ++j) {
          dimension += counts[i][j] * common.group.irreps()[j].dimension;
        }
        CHECK(dimension == whole.irreps()[i].dimension);
      }
    };
    check(first, common.first);
    check(second, common.second);
  }
}
