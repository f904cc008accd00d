#include "basis/basis.hpp"

#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;

namespace {

Molecule square_anion() {
  return Molecule({{78, {0, 0, 0}},
                   {17, {2.3, 0, 0}},
                   {17, {0, 2.3, 0}},
                   {17, {-2.3, 0, 0}},
                   {17, {0, -2.3, 0}}},
                  -2);
}

std::string refusal(const ParameterOverride& change) {
  try {
    (void)make_basis(square_anion(), published_parameters(), {change});
  } catch (const Error& error) {
    return error.what();
  }
  return "accepted";
}

ParameterOverride for_element(int z) {
  ParameterOverride change;
  change.atomic_number = z;
  return change;
}

ParameterOverride for_atom(int atom) {
  ParameterOverride change;
  change.atom = atom;
  return change;
}

}  // namespace

TEST_CASE("shells follow the atoms, and orbitals the shells") {
  const Basis basis = make_basis(square_anion(), published_parameters());
  CHECK(basis.n_orbitals == 9 + 4 * 4);  // 6s 6p 5d, and 3s 3p four times
  CHECK(basis.shells.size() == 3 + 4 * 2);
  CHECK(basis.first_shell == std::vector<int>{0, 3, 5, 7, 9, 11});
  CHECK(basis.valence_electrons == std::vector<int>{10, 7, 7, 7, 7});
  CHECK(basis.electrons(-2) == 40);
  int next = 0;
  for (const Shell& shell : basis.shells) {
    CHECK(shell.first_orbital == next);
    next += shell.size();
  }
  CHECK(next == basis.n_orbitals);
}

TEST_CASE("orbitals are titled by atom, principal quantum number and component") {
  const Molecule molecule = square_anion();
  const Basis basis = make_basis(molecule, published_parameters());
  CHECK(orbital_title(molecule, basis, 0) == "Pt1 6s");
  CHECK(orbital_title(molecule, basis, 5) == "Pt1 5dx2-y2");
  CHECK(orbital_title(molecule, basis, 9) == "Cl2 3s");
  CHECK(orbital_title(molecule, basis, 24) == "Cl5 3pz");
}

TEST_CASE("an override of an element holds for all its atoms, one of an atom stands above it") {
  ParameterOverride chlorine = for_element(17);
  chlorine.l = 1;
  chlorine.h_ii_ev = -15.0;
  ParameterOverride third = for_atom(2);
  third.l = 1;
  third.h_ii_ev = -16.0;
  third.radial = ContractedRadial({{SlaterRadial(3, 2.0), 1.0}});
  ParameterOverride platinum = for_element(78);
  platinum.valence_electrons = 9;
  const Basis basis =
      make_basis(square_anion(), published_parameters(), {third, chlorine, platinum});
  CHECK(basis.shells[4].h_ii_ev == -15.0);
  CHECK(basis.shells[6].h_ii_ev == -16.0);
  CHECK(basis.shells[6].radial.terms()[0].function.zeta() == 2.0);
  CHECK(basis.shells[8].h_ii_ev == -15.0);
  CHECK(basis.shells[8].radial.terms()[0].function.zeta() == 1.733);
  CHECK(basis.shells[5].h_ii_ev == -26.3);  // the 3s of the third atom is left alone
  CHECK(basis.valence_electrons[0] == 9);
}

TEST_CASE("an override of what is not there is refused") {
  CHECK(refusal(for_atom(5)) == "override: there is no atom 6, expected 1 to 5");
  CHECK(refusal(for_atom(-1)) == "override: there is no atom 0, expected 1 to 5");
  CHECK(refusal(for_element(26)) == "override: there is no Fe in Cl4Pt");
  ParameterOverride f = for_atom(0);
  f.l = 3;
  f.h_ii_ev = -5.0;
  CHECK(refusal(f) == "override: Pt1 has no f shell in the parameter set");
  ParameterOverride wrong_n = for_element(17);
  wrong_n.l = 1;
  wrong_n.radial = ContractedRadial({{SlaterRadial(4, 2.0), 1.0}});
  CHECK(refusal(wrong_n) ==
        "override: the p shell of Cl is 3p in the parameter set, expected exponents for it, not "
        "for 4p");
}

TEST_CASE("an element without parameters is refused by name") {
  const Molecule molecule({{18, {0, 0, 0}}}, 0);
  CHECK_THROWS_AS((void)make_basis(molecule, published_parameters()), Error);
}

TEST_CASE("a molecule with hopelessly many orbitals is refused before they are made") {
  std::vector<Atom> chain;
  for (int i = 0; i < 5001; ++i) chain.push_back({6, {1.4 * i, 0, 0}});
  CHECK_THROWS_WITH_AS((void)make_basis(Molecule(chain, 0), published_parameters()),
                       "the first 5001 atoms have 20004 orbitals, expected at most 20000 in all",
                       Error);
}
