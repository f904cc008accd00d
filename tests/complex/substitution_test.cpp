#include <cmath>
#include <string>

#include <doctest/doctest.h>

#include "complex/build.hpp"
#include "complex/spec.hpp"
#include "core/error.hpp"
#include "support/complexes.hpp"

using namespace irrepwise;

TEST_CASE("replacing a ligand keeps the others where they are") {
  const ComplexSpec base = spec_of("Pt", "SP-4", 2, {"H", "PH3", "Cl", "PH3"});
  Substitution change;
  change.ligands = {on("CO", {3})};
  const BuiltComplex before = build_complex(base);
  const BuiltComplex after = build_complex(substituted(base, change));
  CHECK(after.molecule.charge() == before.molecule.charge() + 1);
  CHECK(after.centres[0].electrons.total == 16);
  CHECK(after.ligands.back().name == "CO");
  CHECK(after.ligands.back().vertices == std::vector<int>{3});
  CHECK((after.molecule.atoms()[1].position - before.molecule.atoms()[1].position).norm() < 1e-3);
}

TEST_CASE("a charge given for the base becomes an oxidation state, so that variants differ") {
  ComplexSpec base = spec_of("Pt", "SP-4", {}, {"Cl", "Cl", "Cl", "Cl"});
  base.charge = -2;
  Substitution change;
  change.ligands = {on("NH3", {1, 2})};
  CHECK(build_complex(substituted(base, change)).molecule.charge() == 0);
  change.metal = 46;
  const BuiltComplex palladium = build_complex(substituted(base, change));
  CHECK(palladium.molecule.atoms()[0].atomic_number == 46);
  CHECK(palladium.centres[0].electrons.metal == 8);
}

TEST_CASE("distances can change by vertex, and a chelate leaves with both teeth") {
  const ComplexSpec base = spec_of("Co", "OC-6", 3, {"en", "NH3", "NH3", "NH3", "NH3"});
  Substitution change;
  change.distances_angstrom = {{6, 2.1}};
  const BuiltComplex longer = build_complex(substituted(base, change));
  CHECK(std::abs(longer.ligands.back().distances_angstrom[0] - 2.1) < 1e-12);
  change = {};
  change.ligands = {on("Cl", {1})};
  CHECK_THROWS_WITH_AS(static_cast<void>(build_complex(substituted(base, change))),
                       "nothing is on vertex 2 of OC-6; give it a ligand, or choose a smaller "
                       "polyhedron",
                       Error);
  change.ligands = {on("Cl", {1, 2})};
  CHECK(build_complex(substituted(base, change)).molecule.charge() == 1);
}
