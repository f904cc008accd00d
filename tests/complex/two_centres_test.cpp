// Complexes of two metals that share bridging ligands.
#include <cmath>
#include <string>
#include <vector>

#include <Eigen/Geometry>

#include <doctest/doctest.h>

#include "complex/build.hpp"
#include "core/error.hpp"
#include "molecule/element.hpp"
#include "support/complexes.hpp"

using namespace irrepwise;

namespace {

BridgeRequest bridge(const std::string& ligand, int vertex) {
  BridgeRequest request;
  request.ligand = ligand;
  request.vertices = {vertex, vertex};
  return request;
}

// Two equal centres; the bridges hold the vertices named.
ComplexSpec pair_of(const std::string& metal, const std::string& polyhedron, int oxidation,
                    const std::vector<std::string>& ligands, const std::string& bridging,
                    const std::vector<int>& vertices) {
  ComplexSpec spec = spec_of(metal, polyhedron, oxidation, ligands);
  spec.centres.push_back(spec.centres[0]);
  for (const int vertex : vertices) spec.bridges.push_back(bridge(bridging, vertex));
  return spec;
}

double metal_distance(const BuiltComplex& built) {
  return (built.molecule.atoms()[0].position - built.molecule.atoms()[1].position).norm();
}

}  // namespace

TEST_CASE("sulfide between two metals is nearer than a single bond, as in clusters") {
  // Fe-S 2.20 in Fe2S2 clusters and Mo-S 2.33 in [Mo2O2S2]2+ units, from memory.
  const auto bridge = [](const char* metal, int oxidation) {
    ComplexSpec spec = pair_of(metal, "T-4", oxidation, {"Cl", "Cl"}, "S", {1, 2});
    return build_complex(spec).ligands.back().distances_angstrom.front();
  };
  CHECK(std::abs(bridge("Fe", 3) - 2.20) < 0.1);
  CHECK(std::abs(bridge("Mo", 5) - 2.33) < 0.1);
}

TEST_CASE("squares that share an edge lie in one plane") {
  const BuiltComplex built = build_complex(pair_of("Pd", "SP-4", 2, {"Cl", "Cl"}, "Cl", {1, 2}));
  CHECK(built.point_group == "D2h");  // as [Pd2Cl6]2- in crystals: common practice
  CHECK(built.molecule.charge() == -2);
  CHECK(built.molecule.size() == 8);
  CHECK(built.centres[0].electrons.total == 16);
  const double pd_cl = *covalent_radius_angstrom(46) + *covalent_radius_angstrom(17);
  // A square of two metals and two bridges: its diagonal.
  CHECK(std::abs(metal_distance(built) - std::sqrt(2.0) * pd_cl) < 1e-6);
  const std::vector<double> bonds = distances(built.molecule, 46, 17, pd_cl + 0.2);
  CHECK(bonds.size() == 8);
  for (const double bond : bonds) CHECK(std::abs(bond - pd_cl) < 1e-9);
}

TEST_CASE("octahedra that share a face or a corner have the groups of the textbooks") {
  const BuiltComplex face =
      build_complex(pair_of("W", "OC-6", 3, {"Cl", "Cl", "Cl"}, "Cl", {1, 2, 3}));
  CHECK(face.point_group == "D3h");  // [W2Cl9]3-: common practice
  CHECK(face.molecule.charge() == -3);
  // Faces of octahedra: the metals are 2 d / √3 apart.
  const double w_cl = *covalent_radius_angstrom(74) + *covalent_radius_angstrom(17);
  CHECK(std::abs(metal_distance(face) - 2.0 * w_cl / std::sqrt(3.0)) < 1e-6);

  const BuiltComplex corner =
      build_complex(pair_of("Ru", "OC-6", 4, {"Cl", "Cl", "Cl", "Cl", "Cl"}, "O", {1}));
  CHECK(corner.point_group == "D4h");  // [Ru2OCl10]4-: common practice
  CHECK(corner.molecule.charge() == -4);
  CHECK(corner.centres[1].electrons.total == 4 + 5 * 2 + 2);
}

TEST_CASE("a bent single bridge has the angle and torsion asked for") {
  ComplexSpec spec = pair_of("Ru", "OC-6", 4, {"Cl", "Cl", "Cl", "Cl", "Cl"}, "O", {1});
  spec.bridge_angle_degrees = 150.0;
  spec.torsion_degrees = 45.0;
  for (BridgeRequest& request : spec.bridges) request.distances_angstrom = {2.2, 2.2};
  const BuiltComplex built = build_complex(spec);
  const int oxygen = built.ligands.back().atoms[0];
  CHECK(std::abs(angle(built.molecule, 0, oxygen, 1) - 150.0) < 1e-6);
}

TEST_CASE("a bond between the metals counts one electron of each order to both, if it is stated") {
  // [Fe2(SMe)2(CO)6]: 18 electrons at each iron with one bond, 17 without; [W2Cl9]3-: 12 + 3 with
  // its triple bond. Common practice.
  ComplexSpec iron = pair_of("Fe", "SPY-5", 1, {"CO", "CO", "CO"}, "SMe", {2, 3});
  CHECK(build_complex(iron).centres[0].electrons.total == 17);
  iron.metal_metal_bond = 1;
  const BuiltComplex bonded = build_complex(iron);
  CHECK(bonded.molecule.charge() == 0);
  for (const BuiltCentre& centre : bonded.centres) {
    CHECK(centre.electrons.total == 18);
    CHECK(centre.electrons.other_metal == 1);
  }
  CHECK(bonded.how.ends_with("; bond of order 1 between the metals counted"));
  ComplexSpec tungsten = pair_of("W", "OC-6", 3, {"Cl", "Cl", "Cl"}, "Cl", {1, 2, 3});
  tungsten.metal_metal_bond = 3;
  CHECK(build_complex(tungsten).centres[1].electrons.total == 3 + 6 * 2 + 3);

  tungsten.metal_metal_bond = 6;
  CHECK_THROWS_WITH_AS(static_cast<void>(build_complex(tungsten)),
                       "found a bond of order 6, expected 0 to 5", Error);
  ComplexSpec alone = spec_of("Pd", "SP-4", 2, {"Cl", "Cl", "Cl", "Cl"});
  alone.metal_metal_bond = 1;
  CHECK_THROWS_WITH_AS(static_cast<void>(build_complex(alone)),
                       "`metal_metal_bond` needs two centres; leave it out", Error);
}

TEST_CASE("carbonyls bridge two metals with one electron to each") {
  ComplexSpec spec = pair_of("Co", "OC-6", 0, {"CO", "CO", "CO", "CO"}, "CO", {1, 2});
  const BuiltComplex built = build_complex(spec);
  CHECK(built.molecule.charge() == 0);
  CHECK(built.centres[0].electrons.total == 9 + 4 * 2 + 2 * 1);
  CHECK(built.point_group == "D2h");
  // Oxygen lies on the line from the middle of the metals through the bridging carbon.
  const std::vector<int>& atoms = built.ligands.back().atoms;
  const auto at = [&](int i) {
    return built.molecule.atoms()[static_cast<std::size_t>(i)].position;
  };
  const Eigen::Vector3d middle = 0.5 * (at(0) + at(1));
  CHECK((at(atoms[0]) - middle).normalized().cross((at(atoms[1]) - middle).normalized()).norm() <
        1e-6);
}

TEST_CASE("hydroxide between two metals is planar, its hydrogen away from both") {
  const BuiltComplex built = build_complex(pair_of("Cu", "SP-4", 2, {"Cl", "Cl"}, "OH", {1, 2}));
  CHECK(built.point_group == "D2h");
  CHECK(built.molecule.charge() == -2);
  CHECK(built.centres[0].electrons.total == 9 + 2 * 2 + 2 * 2);
  // Cu-O 1.93 in crystals of Cu2(OH)2 units, from memory.
  const BuiltLigand& hydroxide = built.ligands.back();
  CHECK(std::abs(hydroxide.distances_angstrom[0] - 1.93) < 0.1);
  const int oxygen = hydroxide.atoms[0], hydrogen = hydroxide.atoms[1];
  const double at_oxygen = angle(built.molecule, 0, oxygen, 1);
  CHECK(std::abs(angle(built.molecule, 0, oxygen, hydrogen) - (180.0 - at_oxygen / 2)) < 1e-6);
  CHECK(std::abs(distances(built.molecule, 8, 1, 1.2).front() - 0.96) < 0.01);
}

TEST_CASE("two thiolates between metals point to opposite sides, or to one where one is mirrored") {
  for (const char* const ligand : {"SMe", "SH"}) {
    CAPTURE(std::string(ligand));
    ComplexSpec spec = pair_of("Pd", "SP-4", 2, {"Cl", "Cl"}, ligand, {1, 2});
    const BuiltComplex anti = build_complex(spec);
    CHECK(anti.point_group == "C2h");
    CHECK(anti.molecule.charge() == -2);
    CHECK(anti.centres[1].electrons.total == 16);
    spec.bridges[1].mirrored = true;
    const BuiltComplex syn = build_complex(spec);
    CHECK(syn.point_group == "C2v");
    // Pd-S 2.33 in dimers with thiolate bridges, from memory.
    CHECK(std::abs(anti.ligands.back().distances_angstrom[0] - 2.33) < 0.1);
    for (const BuiltComplex& built : {anti, syn}) {
      const std::vector<int>& atoms = built.ligands.back().atoms;
      // Pyramidal sulfur: 100 to 115 degrees from either metal, common practice.
      for (const int metal : {0, 1}) {
        const double at_sulfur = angle(built.molecule, metal, atoms[0], atoms[1]);
        CHECK(at_sulfur > 98.0);
        CHECK(at_sulfur < 115.0);
      }
    }
  }
}

TEST_CASE("three thiolates on one face turn the same way") {
  const BuiltComplex built =
      build_complex(pair_of("Co", "OC-6", 3, {"NH3", "NH3", "NH3"}, "SMe", {1, 2, 3}));
  CHECK(built.centres[0].electrons.total == 18);
  CHECK(built.point_group == "C3h");
}

TEST_CASE("different metals keep both distances") {
  ComplexSpec spec = pair_of("Pd", "SP-4", 2, {"Cl", "Cl"}, "Cl", {1, 2});
  spec.centres[1].atomic_number = 78;
  for (BridgeRequest& request : spec.bridges) request.distances_angstrom = {2.3, 2.45};
  const BuiltComplex built = build_complex(spec);
  for (std::size_t i = 4; i < 6; ++i) {
    const Eigen::Vector3d donor =
        built.molecule.atoms()[static_cast<std::size_t>(built.ligands[i].atoms[0])].position;
    CHECK(std::abs((donor - built.molecule.atoms()[0].position).norm() - 2.3) < 1e-6);
    CHECK(std::abs((donor - built.molecule.atoms()[1].position).norm() - 2.45) < 1e-6);
  }
  CHECK(built.point_group == "C2v");
}

TEST_CASE("bridges that cannot be are refused") {
  CHECK_THROWS_WITH_AS(
      static_cast<void>(build_complex(pair_of("Pd", "SP-4", 2, {"Cl", "Cl"}, "NH3", {1, 2}))),
      "NH3 does not bridge metals in the library; its entry needs `bridging`, the electrons that "
      "each metal counts from it",
      Error);
  CHECK_THROWS_WITH_AS(
      static_cast<void>(build_complex(pair_of("Co", "T-4", 0, {"CO", "CO", "CO"}, "CO", {1}))),
      "CO cannot lie straight between two metals; give `bridge_angle`", Error);
  CHECK_THROWS_WITH_AS(
      static_cast<void>(build_complex(pair_of("Pd", "SP-4", 2, {"Cl", "Cl"}, "Cl", {1, 3}))),
      "the first metal lies between its bridges; give them neighbouring vertices", Error);
  ComplexSpec alone = spec_of("Pd", "SP-4", 2, {"Cl", "Cl", "Cl", "Cl"});
  alone.centres.push_back(alone.centres[0]);
  CHECK_THROWS_WITH_AS(static_cast<void>(build_complex(alone)),
                       "two centres need at least one bridge", Error);
}
