// Complexes as built beside published crystal structures. Distances and angles are from memory of
// the papers named, rounded to the second decimal; 0.1 Å is what radii can promise.
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "complex/build.hpp"
#include "molecule/element.hpp"
#include "support/complexes.hpp"

using namespace irrepwise;

namespace {

struct Published {
  const char* metal;
  const char* polyhedron;
  int oxidation;
  std::vector<std::string> ligands;
  const char* donor;
  double distance_angstrom;
  const char* source;
};

}  // namespace

TEST_CASE("distances from metal to donors are within 0.1 Å of crystal structures") {
  const std::vector<Published> rows = {
      {"Co",
       "OC-6",
       3,
       {"NH3", "NH3", "NH3", "NH3", "NH3", "NH3"},
       "N",
       1.96,
       "hexaamminecobalt(III) iodide, Kime and Ibers, Acta Cryst. B 25, 168 (1969)"},
      {"Co",
       "OC-6",
       3,
       {"en", "en", "en"},
       "N",
       1.96,
       "tris(ethylenediamine)cobalt(III) bromide, Nakatsu, Bull. Chem. Soc. Jpn. 35, 832 (1962)"},
      {"Fe",
       "L-2",
       2,
       {"Cp", "Cp"},
       "C",
       2.05,
       "ferrocene, Seiler and Dunitz, Acta Cryst. B 35, 1068 (1979)"},
      {"Cr",
       "L-2",
       0,
       {"C6H6", "C6H6"},
       "C",
       2.14,
       "bis(benzene)chromium, Keulen and Jellinek, J. Organomet. Chem. 5, 490 (1966)"},
      {"Cr",
       "OC-6",
       0,
       {"CO", "CO", "CO", "CO", "CO", "CO"},
       "C",
       1.91,
       "hexacarbonylchromium, Whitaker and Jeffery, Acta Cryst. 23, 977 (1967)"},
      {"Ni",
       "T-4",
       0,
       {"CO", "CO", "CO", "CO"},
       "C",
       1.84,
       "tetracarbonylnickel, Ladell, Post and Fankuchen, Acta Cryst. 5, 795 (1952)"},
      {"Fe",
       "TBPY-5",
       0,
       {"CO", "CO", "CO", "CO", "CO"},
       "C",
       1.81,
       "pentacarbonyliron, Braga et al., Organometallics 12, 1481 (1993)"},
      {"Pt",
       "SP-4",
       2,
       {"Cl", "Cl", "Cl", "Cl"},
       "Cl",
       2.31,
       "K2PtCl4, Mais, Owston and Wood, Acta Cryst. B 28, 393 (1972)"},
      {"Fe",
       "OC-6",
       2,
       {"CN", "CN", "CN", "CN", "CN", "CN"},
       "C",
       1.92,
       "hexacyanidoferrates(II), Swanson and Ryan, Inorg. Chem. 12, 283 (1973)"},
      {"Ni",
       "SP-4",
       2,
       {"CN", "CN", "CN", "CN"},
       "C",
       1.87,
       "tetracyanidonickelates(II), Larsen et al., Acta Chem. Scand. 23, 61 (1969)"},
      {"Ru",
       "OC-6",
       2,
       {"bpy", "bpy", "bpy"},
       "N",
       2.06,
       "tris(bipyridine)ruthenium(II), Rillema et al., J. Chem. Soc. Chem. Commun. 1979, 849"},
      {"Cr",
       "OC-6",
       3,
       {"acac", "acac", "acac"},
       "O",
       1.95,
       "tris(acetylacetonato)chromium(III), Morosin, Acta Cryst. 19, 131 (1965)"},
      {"Re",
       "TPRS-9",
       7,
       {"H", "H", "H", "H", "H", "H", "H", "H", "H"},
       "H",
       1.68,
       "K2ReH9, Abrahams, Ginsberg and Knox, Inorg. Chem. 3, 558 (1964)"},
      {"U",
       "L-2",
       4,
       {"C8H8", "C8H8"},
       "C",
       2.65,
       "uranocene, Avdeef et al., Inorg. Chem. 11, 1083 (1972)"},
      {"Mn",
       "T-4",
       7,
       {"O", "O", "O", "O"},
       "O",
       1.61,
       "KMnO4, Palenik, Inorg. Chem. 6, 503 (1967)"},
      {"Pt",
       "SP-4",
       2,
       {"C2H4", "Cl", "Cl", "Cl"},
       "C",
       2.13,
       "Zeise's salt, Love et al., Inorg. Chem. 14, 2653 (1975)"},
      {"Pt",
       "SP-4",
       2,
       {"C2H4", "Cl", "Cl", "Cl"},
       "Cl",
       2.32,
       "Zeise's salt, Love et al., Inorg. Chem. 14, 2653 (1975)"}};
  for (const Published& row : rows) {
    CAPTURE(row.source);
    const BuiltComplex built =
        build_complex(spec_of(row.metal, row.polyhedron, row.oxidation, row.ligands));
    const std::vector<double> found =
        distances(built.molecule, atomic_number(row.metal).value(),
                  atomic_number(row.donor).value(), row.distance_angstrom + 0.2);
    REQUIRE_FALSE(found.empty());
    for (const double distance : found) {
      CHECK(std::abs(distance - row.distance_angstrom) < 0.1);
    }
  }
}

TEST_CASE("bites of chelates are those of crystal structures") {
  const auto bite = [](const char* metal, int oxidation, const char* ligand) {
    const BuiltComplex built =
        build_complex(spec_of(metal, "OC-6", oxidation, {ligand, ligand, ligand}));
    const std::vector<int>& atoms = built.ligands[0].atoms;
    const double found = angle(built.molecule, atoms[0], 0, atoms[1]);
    CHECK(std::abs(found - built.ligands[0].bite_degrees) < 0.05);
    return found;
  };
  CHECK(std::abs(bite("Co", 3, "en") - 85.4) < 3.0);    // as above; from memory
  CHECK(std::abs(bite("Ru", 2, "bpy") - 78.7) < 3.0);   // as above; from memory
  CHECK(std::abs(bite("Cr", 3, "acac") - 91.1) < 4.0);  // as above; from memory
  // Low-spin iron stands nearer to nitrogen than covalent radii say, a rigid ligand bites wider.
  CHECK(std::abs(bite("Fe", 2, "phen") - 82.6) < 5.0);  // Zalkin et al., Inorg. Chem. 12, 1641 (1973)
  CHECK(std::abs(bite("Cr", 3, "ox") - 82.5) < 3.0);  // van Niekerk and Schoening, 1952
}

TEST_CASE("ferrocene and benzene rings lie where crystal structures have them") {
  // Distance of the ring's plane from the metal: 1.65 Å in ferrocene, 1.61 Å in
  // bis(benzene)chromium (sources above).
  const BuiltComplex ferrocene = build_complex(spec_of("Fe", "L-2", 2, {"Cp", "Cp"}));
  CHECK(std::abs(ferrocene.molecule.atoms()[1].position.z() - 1.65) < 0.05);
  const BuiltComplex chromium = build_complex(spec_of("Cr", "L-2", 0, {"C6H6", "C6H6"}));
  CHECK(std::abs(chromium.molecule.atoms()[1].position.z() - 1.61) < 0.05);
}
