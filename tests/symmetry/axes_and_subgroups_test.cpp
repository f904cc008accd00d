// Wishes about axes and subgroups: what they change, what they must not, and what is refused.
#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/Geometry>

#include "core/error.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

SymmetryOptions subgroup(const std::string& name) {
  SymmetryOptions options;
  options.subgroup = name;
  return options;
}

std::vector<double> energies(const Levels& levels) {
  std::vector<double> all;
  for (const Level& level : levels.levels) {
    all.insert(all.end(), static_cast<std::size_t>(level.degeneracy), level.energy_ev);
  }
  std::sort(all.begin(), all.end());
  return all;
}

void check_same_energies(const Molecule& molecule, const std::string& name) {
  CAPTURE(name);
  const Run whole = run(molecule), part = run(molecule, {}, subgroup(name));
  CHECK(part.symmetry.group.symbol() == parse_schoenflies(name));
  CHECK(part.symmetry.full_group == whole.symmetry.group.symbol().name());
  CHECK(part.symmetry.largest_shift_angstrom < 1e-9);
  const std::vector<double> expected = energies(whole.levels), found = energies(part.levels);
  REQUIRE(found.size() == expected.size());
  double worst = 0.0;
  for (std::size_t k = 0; k < found.size(); ++k) {
    worst = std::max(worst, std::abs(found[k] - expected[k]));
  }
  CHECK(worst < 1e-9);
}

const Molecule& square() { return test_molecule("tetrachloroplatinate(II)").molecule; }

}  // namespace

TEST_CASE("levels in a subgroup have the energies of the whole group") {
  struct Case {
    const char* molecule;
    std::vector<const char*> subgroups;
  };
  const Case cases[] = {
      {"tetrachloroplatinate(II)",
       {"D4h", "C4v", "C4h", "D4", "D2d", "D2h", "C2v", "C2h", "D2", "S4", "C4", "C2", "Cs", "Ci",
        "C1"}},
      {"hexacarbonylchromium",
       {"Oh", "O", "Td", "Th", "T", "D4h", "D3d", "C4v", "C3v", "D2h", "S6"}},
      {"permanganate", {"T", "D2d", "C3v", "S4", "C2v"}},
      {"buckminsterfullerene", {"I", "Th", "D5d", "D3d", "C2v", "S10"}},
      {"ferrocene, eclipsed", {"D5", "C5v", "C5h", "C2v"}},
      {"carbon dioxide", {"Dinfh", "D2h", "D6h", "C2v", "D4h", "C4v", "D3d", "Ci", "C1"}},
      {"carbon monoxide", {"C2v", "C6v", "C4", "Cs"}},
      {"iron(II) ion", {"Oh", "Ih", "D4h", "Td", "C3v", "C1"}}};
  for (const Case& c : cases) {
    CAPTURE(c.molecule);
    const Molecule turned = moved(test_molecule(c.molecule).molecule, 31).molecule;
    for (const char* name : c.subgroups) check_same_energies(turned, name);
  }
}

TEST_CASE("a d shell in a subgroup splits as the correlation tables say") {
  // Common practice: Oh -> D4h: eg -> a1g + b1g, t2g -> b2g + eg; Oh -> D3d: t2g -> a1g + eg.
  const auto d_levels = [](const char* name) {
    const Run r = run(test_molecule("iron(II) ion").molecule, {}, subgroup(name));
    std::vector<std::string> labels;
    for (std::size_t i = 0; i < r.levels.salcs.by_irrep.size(); ++i) {
      for (const Salc& salc : r.levels.salcs.by_irrep[i]) {
        if (r.basis.shells[salc.shell].l == 2) {
          labels.push_back(level_label(r.symmetry.group.irreps()[i].label));
        }
      }
    }
    return labels;
  };
  CHECK(d_levels("Oh") == std::vector<std::string>{"eg", "t2g"});
  CHECK(d_levels("D4h") == std::vector<std::string>{"a1g", "b1g", "b2g", "eg"});
  CHECK(d_levels("D3d") == std::vector<std::string>{"a1g", "eg", "eg"});
  CHECK(d_levels("Td") == std::vector<std::string>{"e", "t2"});
  CHECK(d_levels("Ih") == std::vector<std::string>{"hg"});
}

TEST_CASE(
    "the axes asked for are the axes got, by vector, atom, two atoms, or the normal of three") {
  // Atoms of the square: Pt1, Cl2 to Cl5.
  const MolecularSymmetry plain = find_symmetry(square());
  CHECK(plain.rotation.isIdentity(1e-12));
  const Eigen::Vector3d cl2 = square().atoms()[1].position.normalized();
  const Eigen::Vector3d between(std::sqrt(0.5), std::sqrt(0.5), 0);

  SymmetryOptions options;
  options.z = Eigen::Vector3d(0, 0, -3);
  CHECK(find_symmetry(square(), options)
            .rotation.row(2)
            .transpose()
            .isApprox(-Eigen::Vector3d::UnitZ(), 1e-9));
  options.z = std::vector<int>{0, 1, 2};  // normal of the plane
  CHECK(std::abs(find_symmetry(square(), options).rotation(2, 2)) == doctest::Approx(1.0));
  options = {};
  options.x = std::vector<int>{1};
  CHECK(find_symmetry(square(), options).rotation.row(0).transpose().isApprox(cl2, 1e-9));
  options.x = std::vector<int>{1, 0};  // from Cl2 to Pt1
  CHECK(find_symmetry(square(), options).rotation.row(0).transpose().isApprox(-cl2, 1e-9));
  options.x = Eigen::Vector3d(between + Eigen::Vector3d(0.01, 0, 0));  // nearly between the bonds
  const MolecularSymmetry turned = find_symmetry(square(), options);
  CHECK(turned.rotation.row(0).transpose().isApprox(between, 1e-9));
  CHECK(turned.group.symbol().name() == "D4h");
}

TEST_CASE("x between the bonds of a square complex exchanges b1g and b2g, and nothing else") {
  SymmetryOptions options;
  options.x = Eigen::Vector3d(1, 1, 0);
  const Run plain = run(square()), turned = run(square(), {}, options);
  REQUIRE(plain.levels.levels.size() == turned.levels.levels.size());
  int exchanged = 0;
  for (std::size_t k = 0; k < plain.levels.levels.size(); ++k) {
    std::string expected = level_name(plain.symmetry.group, plain.levels.levels[k]);
    const auto b = expected.find('b');
    if (b != std::string::npos) {
      expected[b + 1] = expected[b + 1] == '1' ? '2' : '1';
      ++exchanged;
    }
    CHECK(level_name(turned.symmetry.group, turned.levels.levels[k]) == expected);
    CHECK(std::abs(plain.levels.levels[k].energy_ev - turned.levels.levels[k].energy_ev) < 1e-10);
  }
  CHECK(exchanged > 0);
}

TEST_CASE("wishes that cannot be granted are refused, and the message tells which and why") {
  const auto refused = [](const Molecule& molecule, const SymmetryOptions& options,
                          const std::string& message) {
    CHECK_THROWS_WITH_AS((void)find_symmetry(molecule, options), message.c_str(), Error);
  };
  const std::string no_direction =
      "axis has no direction: a null vector, an atom at the origin, or atoms on one line; name "
      "others";
  SymmetryOptions options;
  options.z = Eigen::Vector3d(0, 0, 0);
  refused(square(), options, "the z " + no_direction);
  options.z = Eigen::Vector3d(std::nan(""), 0, 1);
  refused(square(), options, "the z " + no_direction);
  options.z = std::vector<int>{0};  // Pt1 stands at the origin
  refused(square(), options, "the z " + no_direction);
  options.z = std::vector<int>{1, 9};
  refused(square(), options, "the z axis names atom 10; the molecule has atoms 1 to 5");
  options.z = Eigen::Vector3d(0, 0, 1);
  options.x = Eigen::Vector3d(0, 0, -2);
  refused(square(), options,
          "the x axis is parallel to the z axis; choose another x, or leave it out");
  options = {};
  options.z = Eigen::Vector3d(1, 0, 0);
  refused(square(), options,
          "the wanted z axis is no axis that D4h can have there (to within 5°); leave it out, or "
          "choose a symmetry axis that the conventions allow as z");
  options = {};
  options.x = Eigen::Vector3d(2, 1, 0);
  refused(square(), options,
          "the wanted x axis is no axis that D4h can have there (to within 5°); leave it out, or "
          "choose a symmetry axis that the conventions allow as x");
  refused(
      square(), subgroup("C3v"),
      "C3v is no subgroup of D4h, the group of this molecule; its subgroups are C1, C2, Cs, Ci, "
      "C4, D2, C2h, S4, C2v, D4, C4h, C4v, D2h, D2d and D4h");
  refused(
      test_molecule("carbon monoxide").molecule, subgroup("D2h"),
      "D2h is no subgroup of Cinfv, the group of this molecule; a linear molecule allows Cn and "
      "Cnv, with a centre also Cnh, Dn, Dnh, Dnd and S2n");
  CHECK_THROWS_AS((void)find_symmetry(square(), subgroup("Q7")), Error);
  options = {};
  options.tolerance_angstrom = std::nan("");
  refused(square(), options, "symmetry tolerance = nan Å, expected more than 0 and at most 1");
}
