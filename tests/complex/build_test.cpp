#include "complex/build.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "molecule/element.hpp"
#include "support/complexes.hpp"

using namespace irrepwise;

namespace {

constexpr int molybdenum = 42;

// The ligand on an octahedron, all other vertices held by ammines. Rings of four and more donors
// hold three vertices, allyl two, as common practice has it.
ComplexSpec with_ammines(const Ligand& ligand) {
  const Binding& binding = ligand.bindings.front();
  ComplexSpec spec = spec_of("Mo", "OC-6", 4, {});
  std::vector<int> vertices = {1};
  if (binding.denticity() == 2 || binding.hapticity() == 3) vertices = {1, 2};
  if (binding.hapticity() > 3) vertices = {1, 2, 3};
  std::vector<LigandRequest>& requests = spec.centres[0].ligands;
  requests.push_back(binding.hapticity() > 2 ? over(ligand.name, vertices)
                                             : on(ligand.name, vertices));
  for (std::size_t i = vertices.size(); i < 6; ++i) requests.push_back(on("NH3", {}));
  return spec;
}

// Nearest distance between atoms of different ligands, over the limit that the documentation
// states, computed here from the coordinates alone.
double nearest_relative(const BuiltComplex& built) {
  double nearest = 1e9;
  const std::vector<Atom>& atoms = built.molecule.atoms();
  for (const BuiltLigand& a : built.ligands) {
    for (const BuiltLigand& b : built.ligands) {
      if (&a == &b) continue;
      for (const int i : a.atoms) {
        for (const int j : b.atoms) {
          const Atom& p = atoms[static_cast<std::size_t>(i)];
          const Atom& q = atoms[static_cast<std::size_t>(j)];
          const int n_hydrogens = (p.atomic_number == 1) + (q.atomic_number == 1);
          const double limit = n_hydrogens == 2 ? 1.6
                               : n_hydrogens == 1
                                   ? 1.9
                                   : *covalent_radius_angstrom(p.atomic_number) +
                                         *covalent_radius_angstrom(q.atomic_number) + 0.6;
          nearest = std::min(nearest, (p.position - q.position).norm() / limit);
        }
      }
    }
  }
  return nearest;
}

}  // namespace

TEST_CASE("every ligand of the library builds beside ammines, without clash, with its electrons") {
  for (const Ligand& ligand : built_in_ligands().ligands()) {
    const std::string& name = ligand.name;
    CAPTURE(name);
    const BuiltComplex built = build_complex(with_ammines(ligand));
    CHECK(nearest_relative(built) >= 0.999);
    const BuiltLigand& placed = built.ligands.front();
    const Binding& binding = ligand.bindings.front();
    const int n_ammines = static_cast<int>(built.ligands.size()) - 1;
    // Mo(IV) is d2; each ammine gives a lone pair, the ligand what its entry says.
    CHECK(built.centres[0].electrons.metal == 2);
    CHECK(built.centres[0].electrons.total == 2 + 2 * n_ammines + binding.electrons);
    CHECK(built.molecule.charge() == 4 + ligand.charge);
    // Donors at the sum of the radii less the shortening; the inside of the ligand as in the
    // library.
    for (const std::vector<int>& tooth : binding.teeth) {
      for (const int donor : tooth) {
        const Atom& atom =
            built.molecule.atoms()[static_cast<std::size_t>(placed.atoms[std::size_t(donor)])];
        const double expected = *covalent_radius_angstrom(molybdenum) +
                                *covalent_radius_angstrom(atom.atomic_number) -
                                ligand.shortening_angstrom;
        // Donors side by side lie on a circle to the rounding of the library; in butadiene, whose
        // inner and outer carbons are not alike, to 0.01 Å.
        CHECK(std::abs(atom.position.norm() - expected) < (binding.hapticity() > 1 ? 0.01 : 1e-3));
      }
    }
    for (std::size_t i = 0; i < ligand.atoms.size(); ++i) {
      for (std::size_t j = 0; j < i; ++j) {
        const auto at = [&](std::size_t k) {
          return built.molecule.atoms()[static_cast<std::size_t>(placed.atoms[k])].position;
        };
        const double inside = (ligand.atoms[i].position - ligand.atoms[j].position).norm();
        CHECK(std::abs((at(i) - at(j)).norm() - inside) < 1e-3);
      }
    }
  }
}

TEST_CASE("a ligand over a face points at its middle, one on a vertex at the vertex") {
  ComplexSpec spec = spec_of("Mn", "OC-6", 1, {});
  spec.centres[0].ligands = {over("Cp", {1, 2, 3}), on("CO", {4, 5, 6})};
  const BuiltComplex built = build_complex(spec);
  CHECK(built.point_group == "Cs");  // of a ring of five on a pedestal of three: common practice
  CHECK(built.centres[0].electrons.total == 18);
  Eigen::Vector3d middle = Eigen::Vector3d::Zero();
  for (int i = 0; i < 5; ++i) {
    middle +=
        built.molecule.atoms()[static_cast<std::size_t>(built.ligands[0].atoms[std::size_t(i)])]
            .position /
        5.0;
  }
  CHECK((middle.normalized() - Eigen::Vector3d::Ones().normalized()).norm() < 1e-3);
  const int carbon = built.ligands[1].atoms[0];
  const Eigen::Vector3d along =
      built.molecule.atoms()[static_cast<std::size_t>(carbon)].position.normalized();
  CHECK((along - Polyhedron("OC-6").vertex(4)).norm() < 1e-3);
}

TEST_CASE("distance, angle, bite, hapticity and denticity can be set") {
  ComplexSpec spec = spec_of("Co", "SPY-5", 3, {"NO-bent", "NH3", "NH3", "NH3", "NH3"});
  spec.centres[0].ligands[0].angle_degrees = 140.0;
  spec.centres[0].ligands[0].distance_angstrom = 1.9;
  BuiltComplex built = build_complex(spec);
  const std::vector<int> nitrosyl = built.ligands[0].atoms;
  CHECK(std::abs(angle(built.molecule, 0, nitrosyl[0], nitrosyl[1]) - 140.0) < 0.05);
  CHECK(std::abs(built.molecule.atoms()[1].position.norm() - 1.9) < 1e-3);

  spec = spec_of("Zr", "OC-6", 4, {"Cl", "Cl", "Cl", "Cl", "NO3"});
  spec.centres[0].ligands[4].denticity = 2;
  spec.centres[0].ligands[4].bite_degrees = 58.0;
  built = build_complex(spec);
  const std::vector<int> nitrate = built.ligands[4].atoms;
  CHECK(std::abs(angle(built.molecule, nitrate[0], 0, nitrate[1]) - 58.0) < 0.05);
  CHECK(built.centres[0].electrons.total == 0 + 4 * 2 + 4);

  // The ring leans away from the metal, so that it has room beside other ligands.
  spec = spec_of("Os", "OC-6", 2, {"C6H6", "NH3", "NH3", "NH3", "NH3", "NH3"});
  spec.centres[0].ligands[0].hapticity = 2;
  built = build_complex(spec);
  CHECK(built.ligands[0].hapticity == 2);
  CHECK(built.centres[0].electrons.total == 18);
  const std::vector<double> carbons = distances(built.molecule, 76, 6, 4.0);
  REQUIRE(carbons.size() == 6);
  CHECK(carbons[2] > carbons[1] + 0.5);  // two carbons are bound, four are not
}

TEST_CASE("the charge follows from the oxidation state, or the other way round") {
  ComplexSpec spec = spec_of("Pt", "SP-4", {}, {"Cl", "Cl", "Cl", "Cl"});
  spec.charge = -2;
  const BuiltComplex built = build_complex(spec);
  CHECK(built.centres[0].electrons.oxidation == 2);
  spec.centres[0].oxidation = 4;
  CHECK_THROWS_WITH_AS(static_cast<void>(build_complex(spec)),
                       "the charge -2 contradicts oxidation state +4 and ligands -4, which make 0; "
                       "correct one, or leave one out",
                       Error);
  spec.centres[0].oxidation.reset();
  spec.charge.reset();
  CHECK_THROWS_WITH_AS(static_cast<void>(build_complex(spec)),
                       "neither the oxidation state of the metal nor the charge is known; give "
                       "`oxidation` or `charge` (--oxidation or --charge on the command line)",
                       Error);
}

TEST_CASE("the metal stays at the origin and equal vertices stay on the polyhedron") {
  const BuiltComplex built =
      build_complex(spec_of("Cr", "OC-6", 0, {"CO", "CO", "CO", "CO", "CO", "CO"}));
  CHECK(built.point_group == "Oh");
  CHECK(built.molecule.atoms()[0].position.norm() == 0.0);
  for (int v = 1; v <= 6; ++v) {
    const Eigen::Vector3d carbon =
        built.molecule.atoms()[static_cast<std::size_t>(built.ligands[std::size_t(v - 1)].atoms[0])]
            .position;
    CHECK((carbon.normalized() - Polyhedron("OC-6").vertex(v)).norm() < 1e-12);
  }
}
