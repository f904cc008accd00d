#include "molecule/molecule.hpp"

#include <cmath>
#include <limits>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/constants.hpp"
#include "core/error.hpp"
#include "molecule/contacts.hpp"
#include "molecule/pairs.hpp"

using namespace irrepwise;

namespace {

// O–H 0.96 Å, near the 0.9572 Å and 104.5 degrees of the vapour (common knowledge).
Molecule water() {
  return Molecule({{8, {0, 0, 0}}, {1, {0.7586, 0, 0.5883}}, {1, {-0.7586, 0, 0.5883}}}, 0);
}

Molecule scaled(const Molecule& molecule, double factor) {
  return molecule.with_positions(factor * molecule.positions());
}

}  // namespace

TEST_CASE("a molecule without atoms, or with atoms that cannot be, is refused") {
  CHECK_THROWS_WITH_AS(Molecule({}, 0), "a molecule needs at least one atom", Error);
  CHECK_THROWS_WITH_AS(Molecule({{119, {0, 0, 0}}}, 0),
                       "atom 1: atomic number 119, expected 1 to 118", Error);
  const double nan = std::numeric_limits<double>::quiet_NaN();
  const double infinity = std::numeric_limits<double>::infinity();
  for (const double bad : {nan, infinity, -infinity, 1e300}) {
    CHECK_THROWS_WITH_AS(Molecule({{1, {0, 0, 0}}, {1, {0, bad, 1}}}, 0),
                         "atom 2: coordinates must be finite and below 10000000000 Å", Error);
  }
}

TEST_CASE("a charge that could overflow a count of electrons is refused") {
  constexpr int lowest = std::numeric_limits<int>::min();
  CHECK_THROWS_WITH_AS(Molecule({{1, {0, 0, 0}}}, lowest),
                       "found a charge of -2147483648, expected -100000 to 100000", Error);
  CHECK_THROWS_WITH_AS((void)water().with_charge(100001),
                       "found a charge of 100001, expected -100000 to 100000", Error);
  CHECK(water().with_charge(2).charge() == 2);
}

TEST_CASE("two atoms nearer than 0.3 Å are refused by number and symbol") {
  CHECK_THROWS_WITH_AS(
      Molecule({{78, {0, 0, 0}}, {17, {0, 0, 2.3}}, {17, {0.1, 0, 2.3}}}, 0),
      "atoms 2 (Cl) and 3 (Cl) are 0.100 Å apart, expected at least 0.3 Å; remove a double atom, "
      "or check the unit of the coordinates",
      Error);
  CHECK_NOTHROW(Molecule({{1, {0, 0, 0}}, {1, {0, 0, 0.3}}}, 0));
}

TEST_CASE("formulas are in Hill order") {
  const auto formula = [](const std::vector<int>& numbers) {
    std::vector<Atom> atoms;
    for (const int z : numbers)
      atoms.push_back({z, {2.0 * static_cast<double>(atoms.size()), 0, 0}});
    return hill_formula(Molecule(atoms, 0));
  };
  // Hill, J. Am. Chem. Soc. 22, 478 (1900): with carbon C, H, then by symbol; without, by symbol.
  CHECK(formula({1, 6, 8, 6}) == "C2HO");
  CHECK(formula({78, 17, 17, 17, 17}) == "Cl4Pt");
  CHECK(formula({1, 17, 1, 5}) == "BClH2");
  CHECK(formula({26}) == "Fe");
}

TEST_CASE("atoms are named by symbol and number from 1") {
  CHECK(atom_name(water(), 0) == "O1");
  CHECK(atom_name(water(), 2) == "H3");
}

TEST_CASE("bonds are judged by radii, and by 3 Å where there is no radius") {
  CHECK(are_bonded(water(), 0, 1));
  CHECK_FALSE(are_bonded(water(), 1, 2));
  const Molecule heavy({{97, {0, 0, 0}}, {17, {0, 0, 2.9}}, {17, {0, 0, -3.1}}}, 0);
  CHECK(are_bonded(heavy, 0, 1));
  CHECK_FALSE(are_bonded(heavy, 2, 0));
}

TEST_CASE("two metals are bonded within a tighter limit than other atoms") {
  struct Pair {
    int z;
    double distance_angstrom;
    bool bonded;
  };
  // Distances between the metals from memory of the trade: Re2Cl8(2-), Mn2(CO)10, Fe2(CO)9,
  // Rh2(OAc)4 have bonds; of two square planes joined by two chlorides, and of neighbours in
  // Na and Cu salts, there is none.
  for (const Pair& pair : {Pair{75, 2.24, true},
                           {25, 2.90, true},
                           {26, 2.52, true},
                           {45, 2.39, true},
                           {45, 3.45, false},
                           {46, 3.41, false},
                           {29, 3.2, false},
                           {11, 3.96, false}}) {
    CAPTURE(pair.z);
    const Molecule molecule({{pair.z, {0, 0, 0}}, {pair.z, {0, 0, pair.distance_angstrom}}}, 0);
    CHECK(are_bonded(molecule, 0, 1) == pair.bonded);
  }
  // Rhodium and a non-metal keep the wider limit: 1.2 times the sum of the radii.
  const Molecule mixed({{45, {0, 0, 0}}, {17, {0, 0, 1.2 * (1.42 + 1.02)}}}, 0);
  CHECK(are_bonded(mixed, 0, 1));
  CHECK(bond_criterion(mixed).empty());
  CHECK(bond_criterion(Molecule({{45, {0, 0, 0}}, {45, {0, 0, 3}}}, 0)) ==
        "A bond is a distance of at most 1.25 times the sum of the covalent radii, between two "
        "metals of at most 1.15 times.");
}

TEST_CASE("an ordinary geometry and a single atom give no warning") {
  CHECK(geometry_warnings(water()).empty());
  CHECK(geometry_warnings(Molecule({{26, {0, 0, 0}}}, 2)).empty());
}

TEST_CASE("two atoms far nearer than their radii are named with their distance") {
  const Molecule odd({{6, {0, 0, 0}}, {8, {0, 0, 1.13}}, {8, {0.5, 0, 1.4}}, {8, {0, 0, -1.2}}}, 0);
  // By Pythagoras: sqrt(0.5^2 + 0.27^2) = 0.568 Å, 43 % of 2 x 0.66 Å.
  CHECK(geometry_warnings(odd) ==
        std::vector<std::string>{
            "O2 and O3 are 0.568 Å apart, only 43 % of the sum of their covalent radii"});
}

TEST_CASE("coordinates in a wrong unit are recognised both ways") {
  CHECK(geometry_warnings(scaled(water(), bohr_in_angstrom)) ==
        std::vector<std::string>{
            "every contact is far shorter than a bond: the coordinates look as if they were "
            "converted from bohr twice; they are read in Å"});
  CHECK(geometry_warnings(scaled(water(), 1.0 / bohr_in_angstrom)) ==
        std::vector<std::string>{
            "no two atoms are near enough for a bond, but all would be if the coordinates were in "
            "bohr; they are read in Å"});
  CHECK(geometry_warnings(scaled(water(), 10.0)) ==
        std::vector<std::string>{"no two atoms are near enough for a bond; check the coordinates "
                                 "and their unit (Å)"});
}

TEST_CASE("near pairs are those that looking at every pair finds") {
  std::vector<Atom> atoms;
  unsigned state = 12345;  // a fixed sequence of a linear congruential generator
  const auto next = [&] {
    state = state * 1664525u + 1013904223u;
    return static_cast<double>(state >> 8) / (1 << 24) * 8.0;
  };
  for (int i = 0; i < 60; ++i) atoms.push_back({6, {next(), next(), 0.2 * next()}});
  const std::vector<NearPair> found = near_pairs(atoms, 1.9);
  std::size_t at = 0;
  for (int a = 0; a < 60; ++a) {
    for (int b = a + 1; b < 60; ++b) {
      const double distance = (atoms[static_cast<std::size_t>(a)].position -
                               atoms[static_cast<std::size_t>(b)].position)
                                  .norm();
      if (distance > 1.9) continue;
      REQUIRE(at < found.size());
      CHECK(found[at].a == a);
      CHECK(found[at].b == b);
      CHECK(found[at].distance_angstrom == distance);
      ++at;
    }
  }
  CHECK(at == found.size());
  CHECK(at > 20);
}
