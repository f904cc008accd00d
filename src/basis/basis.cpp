#include "basis/basis.hpp"

#include <algorithm>
#include <cassert>
#include <cstddef>
#include <iterator>

#include <fmt/format.h>

#include "core/error.hpp"
#include "molecule/element.hpp"

namespace irrepwise {
namespace {

// S alone takes 3 GB for as many: beyond it a molecule is a slip in the input, or hopeless.
constexpr int most_orbitals = 20000;

// Whom an override is for, in words.
std::string target(const Molecule& molecule, const ParameterOverride& change) {
  if (change.atom) return atom_name(molecule, *change.atom);
  return std::string(element_symbol(*change.atomic_number));
}

bool concerns(const Molecule& molecule, const ParameterOverride& change, int atom) {
  if (change.atom) return *change.atom == atom;
  return molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number == *change.atomic_number;
}

void check_target(const Molecule& molecule, const ParameterOverride& change) {
  if (change.atom) {
    if (*change.atom >= 0 && *change.atom < molecule.size()) return;
    throw Error(fmt::format("override: there is no atom {}, expected 1 to {}", *change.atom + 1,
                            molecule.size()));
  }
  assert(change.atomic_number.has_value());
  for (int atom = 0; atom < molecule.size(); ++atom) {
    if (concerns(molecule, change, atom)) return;
  }
  throw Error(fmt::format("override: there is no {} in {}", element_symbol(*change.atomic_number),
                          hill_formula(molecule)));
}

void apply(const Molecule& molecule, const ParameterOverride& change, ElementParameters& to) {
  if (change.valence_electrons) to.valence_electrons = *change.valence_electrons;
  if (!change.l) {
    assert(!change.h_ii_ev && !change.radial);
    return;
  }
  const auto shell = std::find_if(to.shells.begin(), to.shells.end(),
                                  [&](const ShellParameters& s) { return s.l == *change.l; });
  if (shell == to.shells.end()) {
    throw Error(fmt::format("override: {} has no {} shell in the parameter set",
                            target(molecule, change), shell_letter(*change.l)));
  }
  if (change.h_ii_ev) shell->h_ii_ev = *change.h_ii_ev;
  if (change.radial) {
    if (change.radial->n() != shell->n) {
      throw Error(fmt::format(
          "override: the {0} shell of {1} is {2}{0} in the parameter set, "
          "expected exponents for it, not for {3}{0}",
          shell_letter(shell->l), target(molecule, change), shell->n, change.radial->n()));
    }
    shell->radial = *change.radial;
  }
}

}  // namespace

int Basis::electrons(int charge) const {
  int sum = -charge;
  for (const int electrons : valence_electrons) sum += electrons;
  return sum;
}

Basis make_basis(const Molecule& molecule, const ParameterSet& parameters,
                 const std::vector<ParameterOverride>& overrides) {
  for (const ParameterOverride& change : overrides) check_target(molecule, change);
  Basis basis;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    ElementParameters own =
        parameters.at(molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number);
    // What is said of one atom stands above what is said of its element, in whatever order.
    for (const bool of_atom : {false, true}) {
      for (const ParameterOverride& change : overrides) {
        if (change.atom.has_value() == of_atom && concerns(molecule, change, atom)) {
          apply(molecule, change, own);
        }
      }
    }
    basis.first_shell.push_back(static_cast<int>(basis.shells.size()));
    basis.valence_electrons.push_back(own.valence_electrons);
    for (const ShellParameters& shell : own.shells) {
      basis.shells.push_back({atom, shell.l, shell.h_ii_ev, shell.radial, basis.n_orbitals});
      basis.n_orbitals += basis.shells.back().size();
    }
    if (basis.n_orbitals > most_orbitals) {
      throw Error(fmt::format("the first {} atoms have {} orbitals, expected at most {} in all",
                              atom + 1, basis.n_orbitals, most_orbitals));
    }
  }
  basis.first_shell.push_back(static_cast<int>(basis.shells.size()));
  return basis;
}

std::string orbital_title(const Molecule& molecule, const Basis& basis, int orbital) {
  assert(orbital >= 0 && orbital < basis.n_orbitals);
  const auto next =
      std::upper_bound(basis.shells.begin(), basis.shells.end(), orbital,
                       [](int index, const Shell& shell) { return index < shell.first_orbital; });
  const Shell& shell = *std::prev(next);
  return fmt::format("{} {}{}", atom_name(molecule, shell.atom), shell.n(),
                     orbital_name(shell.l, orbital - shell.first_orbital));
}

}  // namespace irrepwise
