#include "symmetry/relabelled.hpp"

#include <map>
#include <string>

#include <doctest/doctest.h>

#include "support/molecules.hpp"

using namespace irrepwise;

namespace {

std::map<std::string, std::string> as_map(const std::vector<Relabelled>& changes) {
  std::map<std::string, std::string> map;
  for (const Relabelled& change : changes) map[change.before] = change.after;
  return map;
}

}  // namespace

TEST_CASE("x between the ligands of a square: B1 and B2 change places, and the classes with them") {
  const Molecule square = test_molecule("tetrachloroplatinate(II)").molecule;
  SymmetryOptions options;
  options.x = Eigen::Vector3d(1, 1, 0);
  const AxisEffect effect = axis_effect(find_symmetry(square), find_symmetry(square, options));
  // Common practice: dx2-y2 points at the ligands in one choice, dxy in the other.
  CHECK(as_map(effect.irreps) ==
        std::map<std::string, std::string>{
            {"B1g", "B2g"}, {"B2g", "B1g"}, {"B1u", "B2u"}, {"B2u", "B1u"}});
  CHECK(as_map(effect.classes) ==
        std::map<std::string, std::string>{
            {"C2'", "C2''"}, {"C2''", "C2'"}, {"sigmav", "sigmad"}, {"sigmad", "sigmav"}});
}

TEST_CASE("another z of ethylene takes B1, B2 and B3 round") {
  const Molecule ethylene = test_molecule("ethylene").molecule;
  const MolecularSymmetry usual = find_symmetry(ethylene);
  SymmetryOptions options;
  // z to x, x to y, y to z: what was called after C2(x) is called after C2(z).
  options.z = Eigen::Vector3d(usual.rotation.row(0));
  options.x = Eigen::Vector3d(usual.rotation.row(1));
  const AxisEffect effect = axis_effect(usual, find_symmetry(ethylene, options));
  CHECK(as_map(effect.irreps) == std::map<std::string, std::string>{{"B3g", "B1g"},
                                                                    {"B2g", "B3g"},
                                                                    {"B1g", "B2g"},
                                                                    {"B3u", "B1u"},
                                                                    {"B2u", "B3u"},
                                                                    {"B1u", "B2u"}});
}

TEST_CASE("axes that the conventions would choose change nothing") {
  const Molecule square = test_molecule("tetrachloroplatinate(II)").molecule;
  SymmetryOptions options;
  options.x = Eigen::Vector3d(0, 1, 0);
  const AxisEffect effect = axis_effect(find_symmetry(square), find_symmetry(square, options));
  CHECK(effect.irreps.empty());
  CHECK(effect.classes.empty());
}
