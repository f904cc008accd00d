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
