// The corpus is used to judge the library, so it is judged here first, without the library.
#include <algorithm>
#include <cmath>
#include <map>
#include <numbers>
#include <set>
#include <string>
#include <vector>

#include <Eigen/Core>
#include <Eigen/Geometry>

#include <doctest/doctest.h>

#include "basis/parameter_set.hpp"
#include "support/molecules.hpp"
#include "support/shapes.hpp"

namespace {

using Eigen::Matrix3d, Eigen::Vector3d;
using irrepwise::Atom, irrepwise::Molecule;

std::vector<Atom> about_centroid(const Molecule& molecule) {
  std::vector<Atom> atoms = molecule.atoms();
  Vector3d centroid = Vector3d::Zero();
  for (const Atom& atom : atoms) centroid += atom.position / molecule.size();
  for (Atom& atom : atoms) atom.position -= centroid;
  return atoms;
}

bool maps_onto_itself(const std::vector<Atom>& atoms, const Matrix3d& g, double tolerance) {
  return std::all_of(atoms.begin(), atoms.end(), [&](const Atom& atom) {
    const Vector3d image = g * atom.position;
    return std::any_of(atoms.begin(), atoms.end(), [&](const Atom& other) {
      return other.atomic_number == atom.atomic_number &&
             (other.position - image).norm() < tolerance;
    });
  });
}

Matrix3d frame(const Vector3d& a, const Vector3d& b) {
  Matrix3d axes;
  axes.col(0) = a.normalized();
  axes.col(2) = a.cross(b).normalized();
  axes.col(1) = axes.col(2).cross(axes.col(0));
  return axes;
}

bool is_linear(const std::vector<Atom>& atoms) {
  const Atom& outermost = *std::max_element(
      atoms.begin(), atoms.end(),
      [](const Atom& a, const Atom& b) { return a.position.norm() < b.position.norm(); });
  return std::all_of(atoms.begin(), atoms.end(), [&](const Atom& atom) {
    return atom.position.cross(outermost.position).norm() < 1e-6;
  });
}

// All symmetry operations by trial: two atoms out of line with the centroid go to any two atoms.
int count_operations(const std::vector<Atom>& atoms, double tolerance) {
  // The pair that spans most, so that the turns are well defined.
  const Atom* first = nullptr;
  const Atom* second = nullptr;
  double largest = 0.0;
  for (const Atom& a : atoms) {
    for (const Atom& b : atoms) {
      const double area = a.position.cross(b.position).norm();
      if (area <= largest) continue;
      largest = area;
      first = &a;
      second = &b;
    }
  }
  REQUIRE(first != nullptr);
  const Matrix3d from = frame(first->position, second->position);
  const auto is_like = [&](const Atom& image, const Atom& atom) {
    return image.atomic_number == atom.atomic_number &&
           std::abs(image.position.norm() - atom.position.norm()) < tolerance;
  };
  const double cosine = first->position.normalized().dot(second->position.normalized());
  int count = 0;
  for (const Atom& a : atoms) {
    if (!is_like(a, *first)) continue;
    for (const Atom& b : atoms) {
      if (!is_like(b, *second)) continue;
      // A pair out of shape cannot be an image; the turn below then fails on `second` itself.
      if (std::abs(a.position.normalized().dot(b.position.normalized()) - cosine) > 0.1) continue;
      for (const double hand : {1.0, -1.0}) {
        Matrix3d to = frame(a.position, b.position);
        to.col(2) *= hand;
        if (maps_onto_itself(atoms, to * from.transpose(), tolerance)) ++count;
      }
    }
  }
  return count;
}

int order_of(const std::string& symbol) {
  const Vector3d general(0.3, 0.7, 1.1);
  return static_cast<int>(shapes::orbit(shapes::generators(symbol), general).size());
}

}  // namespace

TEST_CASE("the groups that build the corpus have the orders of the textbook") {
  // Orders: common knowledge; n, 2n or 4n for the axial groups.
  const std::map<std::string, int> orders = {
      {"C1", 1},   {"Cs", 2},   {"Ci", 2},   {"C7", 7}, {"C5v", 10}, {"C6h", 12},  {"D4", 8},
      {"D6h", 24}, {"D5d", 20}, {"D6d", 24}, {"S8", 8}, {"S6", 6},   {"T", 12},    {"Td", 24},
      {"Th", 24},  {"O", 24},   {"Oh", 48},  {"I", 60}, {"Ih", 120}, {"D12h", 48}, {"S24", 24}};
  for (const auto& [symbol, order] : orders) {
    CAPTURE(symbol);
    CHECK(order_of(symbol) == order);
  }
}

TEST_CASE("each molecule has the operations of its group and no more, up to 0.05 Å") {
  // The group's generators map the molecule onto itself, and the operations that do so at all are
  // no more than the order of the group: so the group is the molecule's whole group.
  for (const TestMolecule& entry : test_molecules()) {
    CAPTURE(entry.name);
    const std::vector<Atom> atoms = about_centroid(entry.molecule);
    if (entry.point_group == "Kh") {
      CHECK(atoms.size() == 1);
      continue;
    }
    if (entry.point_group.ends_with("infv") || entry.point_group.ends_with("infh")) {
      CHECK(is_linear(atoms));
      CHECK(maps_onto_itself(atoms, -Matrix3d::Identity(), 0.05) == (entry.point_group == "Dinfh"));
      continue;
    }
    CHECK_FALSE(is_linear(atoms));
    for (const Matrix3d& generator : shapes::generators(entry.point_group)) {
      CHECK(maps_onto_itself(atoms, generator, 1e-10));
    }
    CHECK(count_operations(atoms, 1e-6) == order_of(entry.point_group));
    CHECK(count_operations(atoms, 0.05) == order_of(entry.point_group));
  }
}

TEST_CASE("the corpus has every family of groups, axes of many orders, and no name twice") {
  std::set<std::string> groups;
  std::set<std::string> names;
  for (const TestMolecule& entry : test_molecules()) {
    groups.insert(entry.point_group);
    CAPTURE(entry.name);
    CHECK(names.insert(entry.name).second);
  }
  CHECK(names.size() >= 150);
  for (const char* symbol :
       {"C1",  "Ci",  "Cs",  "C2",  "C3",  "C4",  "C5",    "C6",    "C8",  "C12",  "C2v", "C3v",
        "C4v", "C5v", "C6v", "C8v", "C2h", "C3h", "C4h",   "C5h",   "C6h", "C12h", "D2",  "D3",
        "D4",  "D5",  "D6",  "D12", "D2h", "D3h", "D4h",   "D5h",   "D6h", "D7h",  "D8h", "D12h",
        "D2d", "D3d", "D4d", "D5d", "D6d", "D8d", "D12d",  "S4",    "S6",  "S8",   "S12", "T",
        "Td",  "Th",  "O",   "Oh",  "I",   "Ih",  "Cinfv", "Dinfh", "Kh"}) {
    CAPTURE(symbol);
    CHECK(groups.contains(symbol));
  }
}

TEST_CASE("no two atoms are nearer than 0.7 Å, and none is alone") {
  for (const TestMolecule& entry : test_molecules()) {
    CAPTURE(entry.name);
    const std::vector<Atom>& atoms = entry.molecule.atoms();
    for (std::size_t i = 0; i < atoms.size() && atoms.size() > 1; ++i) {
      double nearest = 1e9;
      for (std::size_t j = 0; j < atoms.size(); ++j) {
        if (i != j) nearest = std::min(nearest, (atoms[i].position - atoms[j].position).norm());
      }
      CAPTURE(i);
      CHECK(nearest > 0.7);
      CHECK(nearest < 3.0);
    }
  }
}

TEST_CASE("all molecules but the radicals named have an even number of electrons") {
  const std::set<std::string> radicals = {"nitric oxide",
                                          "nitrogen dioxide",
                                          "methyl radical",
                                          "hexacyanoferrate(III)",
                                          "tetrachlorocuprate(II), flattened",
                                          "tetrachlorooxovanadate(IV)",
                                          "bis(cycloheptatrienyl)uranium anion, eclipsed",
                                          "bis(cycloheptatrienyl)uranium anion, staggered",
                                          "bis(cycloheptatrienyl)uranium anion, twisted"};
  for (const TestMolecule& entry : test_molecules()) {
    int electrons = -entry.molecule.charge();
    for (const Atom& atom : entry.molecule.atoms()) electrons += atom.atomic_number;
    CAPTURE(entry.name);
    CHECK(electrons > 0);
    CHECK((electrons % 2 != 0) == radicals.contains(entry.name));
  }
}

TEST_CASE("the published parameters cover the corpus, and the electrons fit the orbitals") {
  const irrepwise::ParameterSet& parameters = irrepwise::published_parameters();
  for (const TestMolecule& entry : test_molecules()) {
    CAPTURE(entry.name);
    int electrons = -entry.molecule.charge();
    int orbitals = 0;
    for (const Atom& atom : entry.molecule.atoms()) {
      const irrepwise::ElementParameters& element = parameters.at(atom.atomic_number);
      electrons += element.valence_electrons;
      for (const irrepwise::ShellParameters& shell : element.shells) orbitals += 2 * shell.l + 1;
    }
    CHECK(electrons > 0);
    CHECK(electrons <= 2 * orbitals);
  }
}

TEST_CASE("methane and ethane have the lengths asked for and tetrahedral angles") {
  const std::vector<Atom> m = methane(1.1).atoms();
  REQUIRE(m.size() == 5);
  for (int k = 1; k < 5; ++k) {
    CHECK(std::abs(m[k].position.norm() - 1.1) < 1e-14);
    for (int l = 1; l < k; ++l) {  // cos of the tetrahedral angle is -1/3
      CHECK(std::abs(m[k].position.dot(m[l].position) / 1.21 + 1.0 / 3.0) < 1e-14);
    }
  }
  // Across the bond, the hydrogens are C-C + 2/3 C-H apart along it; eclipsed ones not at all
  // across it, staggered ones by the side of a hexagon of radius sqrt(8)/3 C-H.
  const double along = 1.54 + 2.0 / 3.0 * 1.10;
  const double across = std::sqrt(8.0) / 3.0 * 1.10;
  for (const EthaneForm form : {EthaneForm::Eclipsed, EthaneForm::Staggered}) {
    const std::vector<Atom> e = ethane(1.54, 1.10, form).atoms();
    REQUIRE(e.size() == 8);
    double nearest = 1e9;
    for (int k = 2; k < 8; ++k) {
      const Vector3d& h = e[k].position;
      CHECK(std::abs((h - Vector3d(0, 0, std::copysign(0.77, h.z()))).norm() - 1.10) < 1e-14);
      for (int l = 2; l < k; ++l) {
        if (h.z() * e[l].position.z() < 0) nearest = std::min(nearest, (h - e[l].position).norm());
      }
    }
    const double expected = form == EthaneForm::Eclipsed ? along : std::hypot(along, across);
    CHECK(std::abs(nearest - expected) < 1e-14);
  }
}
