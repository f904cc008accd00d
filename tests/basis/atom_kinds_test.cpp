#include "basis/atom_kinds.hpp"

#include <doctest/doctest.h>

using namespace irrepwise;

namespace {

Molecule water() {
  return {{{8, {0.0, 0.0, 0.119}}, {1, {0.0, 0.763, -0.477}}, {1, {0.0, -0.763, -0.477}}}, 0};
}

ParameterOverride of_atom(int atom, double h_ii_ev) {
  ParameterOverride change;
  change.atom = atom;
  change.l = 0;
  change.h_ii_ev = h_ii_ev;
  return change;
}

std::vector<int> kinds_with(const std::vector<ParameterOverride>& overrides) {
  return atom_kinds(make_basis(water(), published_parameters(), overrides));
}

}  // namespace

TEST_CASE("without overrides atoms of one element are alike") {
  CHECK(kinds_with({}) == std::vector<int>{0, 1, 1});
}

TEST_CASE("an override of one atom makes it unlike the others, the same one of all does not") {
  CHECK(kinds_with({of_atom(2, -13.0)}) == std::vector<int>{0, 1, 2});
  CHECK(kinds_with({of_atom(1, -13.0), of_atom(2, -13.0)}) == std::vector<int>{0, 1, 1});
  ParameterOverride electrons;
  electrons.atom = 1;
  electrons.valence_electrons = 2;
  CHECK(kinds_with({electrons}) == std::vector<int>{0, 1, 2});
}
