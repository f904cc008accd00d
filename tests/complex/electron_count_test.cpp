#include "complex/electron_count.hpp"

#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "molecule/element.hpp"
#include "support/complexes.hpp"

using namespace irrepwise;

TEST_CASE("valence electrons of neutral atoms follow the periodic table") {
  // The columns of the periodic table; lanthanides and actinides from the noble-gas core.
  const std::vector<std::pair<const char*, int>> expected = {
      {"H", 1},   {"Li", 1},  {"Be", 2},  {"Al", 3},  {"S", 6},   {"Sc", 3}, {"Ti", 4},
      {"Cr", 6},  {"Fe", 8},  {"Ni", 10}, {"Cu", 11}, {"Zn", 12}, {"Ga", 3}, {"Zr", 4},
      {"Pd", 10}, {"Cd", 12}, {"Sn", 4},  {"La", 3},  {"Ce", 4},  {"Lu", 3}, {"Hf", 4},
      {"Pt", 10}, {"Hg", 12}, {"Tl", 3},  {"Bi", 5},  {"Th", 4},  {"U", 6},  {"Rf", 4}};
  for (const auto& [symbol, electrons] : expected) {
    CAPTURE(symbol);
    CHECK(valence_electrons(atomic_number(symbol).value()) == electrons);
  }
}

TEST_CASE("known complexes have the counts of the textbooks") {
  // Common practice: the 18-electron rule and its well-known exceptions.
  struct Row {
    const char* metal;
    const char* polyhedron;
    int oxidation;
    std::vector<std::string> ligands;
    int metal_electrons;
    int total;
    int charge;
  };
  const std::vector<Row> rows = {
      {"Cr", "OC-6", 0, {"CO", "CO", "CO", "CO", "CO", "CO"}, 6, 18, 0},
      {"Fe", "TBPY-5", 0, {"CO", "CO", "CO", "CO", "CO"}, 8, 18, 0},
      {"Ni", "T-4", 0, {"CO", "CO", "CO", "CO"}, 10, 18, 0},
      {"Fe", "L-2", 2, {"Cp", "Cp"}, 6, 18, 0},
      {"Co", "L-2", 2, {"Cp", "Cp"}, 7, 19, 0},
      {"Cr", "L-2", 0, {"C6H6", "C6H6"}, 6, 18, 0},
      {"V", "L-2", 0, {"Cp", "C7H7"}, 5, 17, 0},
      {"U", "L-2", 4, {"C8H8", "C8H8"}, 2, 22, 0},
      {"Co", "OC-6", 3, {"NH3", "NH3", "NH3", "NH3", "NH3", "NH3"}, 6, 18, 3},
      {"Pt", "SP-4", 2, {"Cl", "Cl", "Cl", "Cl"}, 8, 16, -2},
      {"Rh", "SP-4", 1, {"CO", "Cl", "PH3", "PH3"}, 8, 16, 0},
      {"Pt", "SP-4", 2, {"C2H4", "Cl", "Cl", "Cl"}, 8, 16, -1},
      {"Fe", "T-4", -2, {"NO", "NO", "CO", "CO"}, 10, 18, 0},
      {"Os", "T-4", 8, {"O", "O", "O", "O"}, 0, 16, 0},
      {"Cr", "OC-6", 3, {"ox", "ox", "ox"}, 3, 15, -3},
      {"W", "TPR-6", 6, {"CH3", "CH3", "CH3", "CH3", "CH3", "CH3"}, 0, 12, 0}};
  for (const Row& row : rows) {
    const BuiltComplex built =
        build_complex(spec_of(row.metal, row.polyhedron, row.oxidation, row.ligands));
    CAPTURE(built.how);
    CHECK(built.centres[0].electrons.metal == row.metal_electrons);
    CHECK(built.centres[0].electrons.total == row.total);
    CHECK(built.molecule.charge() == row.charge);
  }
}

TEST_CASE("impossible oxidation states are refused") {
  CHECK_THROWS_WITH_AS(static_cast<void>(count_electrons(22, 5, 12)),
                       "the oxidation state +5 takes more electrons from Ti than its 4 valence "
                       "electrons; check oxidation state, charge and ligands",
                       Error);
  CHECK_THROWS_WITH_AS(
      static_cast<void>(count_electrons(28, -3, 8)),
      "the oxidation state -3 leaves 13 electrons on Ni, more than the 12 that its "
      "valence shells hold; check oxidation state, charge and ligands",
      Error);
}
