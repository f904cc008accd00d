#include "molecule/polyhedra.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <numbers>
#include <string>
#include <vector>

#include <Eigen/Geometry>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "molecule/molecule.hpp"
#include "symmetry/molecular_symmetry.hpp"

using namespace irrepwise;

namespace {

double angle(const Polyhedron& p, int a, int b) {
  return std::acos(std::clamp(p.vertex(a).dot(p.vertex(b)), -1.0, 1.0)) * 180.0 / std::numbers::pi;
}

double edge(const Polyhedron& p, int a, int b) { return (p.vertex(a) - p.vertex(b)).norm(); }

// All angles between vertices, rounded to 0.1°, with how often they occur.
std::map<double, int> angles(const std::string& symbol) {
  const Polyhedron p(symbol);
  std::map<double, int> counts;
  for (int a = 1; a <= p.size(); ++a) {
    for (int b = 1; b < a; ++b) ++counts[std::round(angle(p, a, b) * 10.0) / 10.0];
  }
  return counts;
}

double repulsion(const std::vector<Eigen::Vector3d>& points) {
  double sum = 0.0;
  for (std::size_t a = 0; a < points.size(); ++a) {
    for (std::size_t b = 0; b < a; ++b) sum += std::pow((points[a] - points[b]).norm(), -6.0);
  }
  return sum;
}

std::vector<Eigen::Vector3d> vertices(const Polyhedron& p) {
  std::vector<Eigen::Vector3d> points;
  for (int v = 1; v <= p.size(); ++v) points.push_back(p.vertex(v));
  return points;
}

// Largest force along the sphere on any vertex: the derivative of the repulsion by a shift.
double largest_force(const Polyhedron& p) {
  const std::vector<Eigen::Vector3d> points = vertices(p);
  constexpr double step = 1e-5;
  double largest = 0.0;
  for (std::size_t i = 0; i < points.size(); ++i) {
    const Eigen::Vector3d other =
        std::abs(points[i].z()) < 0.9 ? Eigen::Vector3d::UnitZ() : Eigen::Vector3d::UnitX();
    const Eigen::Vector3d u = points[i].cross(other).normalized();
    for (const Eigen::Vector3d& direction : {u, Eigen::Vector3d(points[i].cross(u))}) {
      const auto moved = [&](double by) {
        std::vector<Eigen::Vector3d> shifted = points;
        shifted[i] = (points[i] + by * direction).normalized();
        return repulsion(shifted);
      };
      largest = std::max(largest, std::abs(moved(step) - moved(-step)) / (2.0 * step));
    }
  }
  return largest;
}

}  // namespace

TEST_CASE("every polyhedron has as many unit vertices as its symbol says, well apart") {
  CHECK(polyhedron_kinds().size() == 21);
  for (const PolyhedronKind& kind : polyhedron_kinds()) {
    const std::string symbol(kind.symbol);
    CAPTURE(symbol);
    const Polyhedron p(symbol);
    CHECK(p.size() == symbol.back() - '0');
    for (int a = 1; a <= p.size(); ++a) {
      CHECK(std::abs(p.vertex(a).norm() - 1.0) < 1e-15);
      for (int b = 1; b < a; ++b) CHECK(angle(p, a, b) > 50.0);
    }
  }
}

TEST_CASE("a complex of equal ligands has the group of the handbooks") {
  // Common practice, as in any text on coordination chemistry; the angular, pyramidal, T-shaped and
  // see-saw ones as AX2E, AX3E, AX3E2 and AX4E.
  const std::map<std::string, std::string> expected = {
      {"L-2", "Dinfh"},  {"A-2", "C2v"},  {"TP-3", "D3h"},   {"TPY-3", "C3v"},  {"TS-3", "C2v"},
      {"T-4", "Td"},     {"SP-4", "D4h"}, {"SPY-4", "C4v"},  {"SS-4", "C2v"},   {"TBPY-5", "D3h"},
      {"SPY-5", "C4v"},  {"OC-6", "Oh"},  {"TPR-6", "D3h"},  {"PBPY-7", "D5h"}, {"OCF-7", "C3v"},
      {"TPRS-7", "C2v"}, {"CU-8", "Oh"},  {"SAPR-8", "D4d"}, {"DD-8", "D2d"},   {"HBPY-8", "D6h"},
      {"TPRS-9", "D3h"}};
  for (const PolyhedronKind& kind : polyhedron_kinds()) {
    const std::string symbol(kind.symbol);
    CAPTURE(symbol);
    std::vector<Atom> atoms = {{78, Eigen::Vector3d::Zero()}};
    for (const Eigen::Vector3d& vertex : vertices(Polyhedron(symbol))) {
      atoms.push_back({9, 2.0 * vertex});
    }
    const MolecularSymmetry symmetry = find_symmetry(Molecule(atoms, 0));
    CHECK(symmetry.group.symbol().name() == expected.at(symbol));
    CHECK(expected.at(symbol) == kind.group);
    CHECK(symmetry.largest_shift_angstrom < 1e-8);
  }
}

TEST_CASE(
    "an opened tetrahedron closes on the other side, from the square plane's to the see-saw's") {
  // Coulson's rule for hybrids: s = cos / (cos - 1) each, and all four make one s. At 90° there is
  // none left for 1 and 2, and 3 and 4 are sp; at 180° it is the other way round.
  CHECK(std::abs(angle(Polyhedron("T-4", 180.0), 1, 2) - 180.0) < 1e-6);
  CHECK(std::abs(angle(Polyhedron("T-4", 180.0), 3, 4) - 90.0) < 1e-6);
  CHECK(std::abs(angle(Polyhedron("T-4", 90.0), 3, 4) - 180.0) < 1e-6);
  const Polyhedron ideal("T-4"), same("T-4", ideal.angle_degrees() + 1e-9);
  for (int v = 1; v <= 4; ++v) CHECK((ideal.vertex(v) - same.vertex(v)).norm() < 1e-9);
  // Titanocene dichloride: rings 131° apart, chlorides 94.5° (Clearfield et al., Can. J. Chem. 53,
  // 1622 (1975), from memory).
  const Polyhedron bent("T-4", 131.0);
  CHECK(std::abs(angle(bent, 1, 2) - 131.0) < 1e-9);
  CHECK(std::abs(angle(bent, 3, 4) - 94.5) < 3.0);
}

TEST_CASE("vertex angles are those of the ideal shapes") {
  // Geometry: cos = -1/3 in the tetrahedron, 1/3 between neighbours in the cube, and so on.
  CHECK(angles("L-2") == std::map<double, int>{{180.0, 1}});
  CHECK(angles("TP-3") == std::map<double, int>{{120.0, 3}});
  CHECK(angles("TS-3") == std::map<double, int>{{90.0, 2}, {180.0, 1}});
  CHECK(angles("T-4") == std::map<double, int>{{109.5, 6}});
  CHECK(angles("SP-4") == std::map<double, int>{{90.0, 4}, {180.0, 2}});
  CHECK(angles("TBPY-5") == std::map<double, int>{{90.0, 6}, {120.0, 3}, {180.0, 1}});
  CHECK(angles("SS-4") == std::map<double, int>{{90.0, 4}, {120.0, 1}, {180.0, 1}});
  CHECK(angles("OC-6") == std::map<double, int>{{90.0, 12}, {180.0, 3}});
  CHECK(angles("PBPY-7") == std::map<double, int>{{72.0, 5}, {90.0, 10}, {144.0, 5}, {180.0, 1}});
  CHECK(angles("HBPY-8") == std::map<double, int>{{60.0, 6}, {90.0, 12}, {120.0, 6}, {180.0, 4}});
  CHECK(angles("CU-8") == std::map<double, int>{{70.5, 12}, {109.5, 12}, {180.0, 4}});
  // The trigonal prism of equal edges: 81.8° in triangles and along z (common practice).
  CHECK(std::abs(angle(Polyhedron("TPR-6"), 1, 2) - 81.79) < 0.01);
  CHECK(std::abs(angle(Polyhedron("TPR-6"), 1, 4) - 81.79) < 0.01);
}

TEST_CASE("prisms, antiprism and dodecahedron have equal edges") {
  const Polyhedron prism("TPR-6");
  CHECK(std::abs(edge(prism, 1, 2) - edge(prism, 1, 4)) < 1e-14);
  const Polyhedron antiprism("SAPR-8");
  CHECK(std::abs(edge(antiprism, 1, 2) - edge(antiprism, 1, 5)) < 1e-14);
  const Polyhedron tricapped("TPRS-9");
  CHECK(std::abs(edge(tricapped, 1, 2) - edge(tricapped, 1, 4)) < 1e-14);
  const Polyhedron dodecahedron("DD-8");
  for (const auto& [a, b] : {std::pair{1, 3}, {1, 5}, {5, 7}, {3, 2}, {7, 8}}) {
    CHECK(std::abs(edge(dodecahedron, a, b) - edge(dodecahedron, 1, 2)) < 1e-9);
  }
  // Hoard and Silverton, Inorg. Chem. 2, 235 (1963): 36.9° and 69.5° (from memory).
  CHECK(std::abs(angle(dodecahedron, 1, 2) / 2.0 - 36.9) < 0.1);
  CHECK(std::abs(angle(dodecahedron, 3, 4) / 2.0 - 69.5) < 0.1);
}

TEST_CASE("capped shapes and the square pyramid are those of least repulsion") {
  // In the capped octahedron and prism no vertex is fixed by symmetry but the cap, and the whole is
  // a stationary point of the sum of r^-6, computed here by finite differences. The square pyramid
  // is stationary as well: the forces along the sphere vanish by symmetry but for the polar ones.
  for (const char* symbol : {"OCF-7", "TPRS-7", "SPY-5"}) {
    CAPTURE(symbol);
    CHECK(largest_force(Polyhedron(symbol)) < 1e-6);
    CHECK(largest_force(Polyhedron("SPY-5", 95.0)) > 1e-2);  // what the test would see elsewhere
  }
}

TEST_CASE("free angles are angles between the vertices") {
  CHECK(std::abs(angle(Polyhedron("A-2", 104.5), 1, 2) - 104.5) < 1e-10);
  CHECK(std::abs(angle(Polyhedron("TPY-3", 97.0), 1, 3) - 97.0) < 1e-10);
  CHECK(std::abs(angle(Polyhedron("SS-4", 101.0), 2, 3) - 101.0) < 1e-10);
  CHECK(std::abs(angle(Polyhedron("SPY-5", 105.0), 1, 4) - 105.0) < 1e-10);
  CHECK(std::abs(angle(Polyhedron("T-4"), 1, 2) - Polyhedron("TPY-3").angle_degrees()) < 1e-10);
}

TEST_CASE("symbols are read in any case, and others are refused with the nearest") {
  CHECK(Polyhedron("oc6").kind().symbol == "OC-6");
  CHECK(Polyhedron("tpr-6").kind().symbol == "TPR-6");
  CHECK_THROWS_WITH_AS(
      Polyhedron("OC-7"),
      "'OC-7' is no polyhedral symbol; did you mean OC-6? Otherwise the known ones are L-2, A-2, "
      "TP-3, TPY-3, TS-3, T-4, SP-4, SPY-4, SS-4, TBPY-5, SPY-5, OC-6, TPR-6, PBPY-7, OCF-7, "
      "TPRS-7, CU-8, SAPR-8, DD-8, HBPY-8 and TPRS-9",
      Error);
  CHECK_THROWS_WITH_AS(Polyhedron("OC-6", 80.0),
                       "OC-6 has no angle that could be set; leave it out", Error);
  CHECK_THROWS_WITH_AS(Polyhedron("A-2", 200.0),
                       "found 200° for the angle 1-M-2 of A-2, expected 40 to 180°", Error);
}
