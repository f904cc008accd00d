#include "molecule/element.hpp"

#include <array>
#include <cassert>
#include <cstddef>

namespace irrepwise {
namespace {

constexpr std::array<std::string_view, max_atomic_number> symbols = {
    "H",  "He", "Li", "Be", "B",  "C",  "N",  "O",  "F",  "Ne", "Na", "Mg", "Al", "Si", "P",
    "S",  "Cl", "Ar", "K",  "Ca", "Sc", "Ti", "V",  "Cr", "Mn", "Fe", "Co", "Ni", "Cu", "Zn",
    "Ga", "Ge", "As", "Se", "Br", "Kr", "Rb", "Sr", "Y",  "Zr", "Nb", "Mo", "Tc", "Ru", "Rh",
    "Pd", "Ag", "Cd", "In", "Sn", "Sb", "Te", "I",  "Xe", "Cs", "Ba", "La", "Ce", "Pr", "Nd",
    "Pm", "Sm", "Eu", "Gd", "Tb", "Dy", "Ho", "Er", "Tm", "Yb", "Lu", "Hf", "Ta", "W",  "Re",
    "Os", "Ir", "Pt", "Au", "Hg", "Tl", "Pb", "Bi", "Po", "At", "Rn", "Fr", "Ra", "Ac", "Th",
    "Pa", "U",  "Np", "Pu", "Am", "Cm", "Bk", "Cf", "Es", "Fm", "Md", "No", "Lr", "Rf", "Db",
    "Sg", "Bh", "Hs", "Mt", "Ds", "Rg", "Cn", "Nh", "Fl", "Mc", "Lv", "Ts", "Og"};

// Å, Z = 1 to 96, ten to a line. Cordero et al., Dalton Trans. 2008, 2832, from memory.
constexpr std::array<double, 96> covalent_radii = {
    0.31, 0.28, 1.28, 0.96, 0.84, 0.76, 0.71, 0.66, 0.57, 0.58,  // H to Ne
    1.66, 1.41, 1.21, 1.11, 1.07, 1.05, 1.02, 1.06, 2.03, 1.76,  // Na to Ca
    1.70, 1.60, 1.53, 1.39, 1.39, 1.32, 1.26, 1.24, 1.32, 1.22,  // Sc to Zn
    1.22, 1.20, 1.19, 1.20, 1.20, 1.16, 2.20, 1.95, 1.90, 1.75,  // Ga to Zr
    1.64, 1.54, 1.47, 1.46, 1.42, 1.39, 1.45, 1.44, 1.42, 1.39,  // Nb to Sn
    1.39, 1.38, 1.39, 1.40, 2.44, 2.15, 2.07, 2.04, 2.03, 2.01,  // Sb to Nd
    1.99, 1.98, 1.98, 1.96, 1.94, 1.92, 1.92, 1.89, 1.90, 1.87,  // Pm to Yb
    1.87, 1.75, 1.70, 1.62, 1.51, 1.44, 1.41, 1.36, 1.36, 1.32,  // Lu to Hg
    1.45, 1.46, 1.48, 1.40, 1.50, 1.50, 2.60, 2.21, 2.15, 2.06,  // Tl to Th
    2.00, 1.96, 1.90, 1.87, 1.80, 1.69};                         // Pa to Cm

char lower(char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c; }

bool same_but_case(std::string_view a, std::string_view b) {
  if (a.size() != b.size()) return false;
  for (std::size_t i = 0; i < a.size(); ++i) {
    if (lower(a[i]) != lower(b[i])) return false;
  }
  return true;
}

}  // namespace

std::optional<int> atomic_number(std::string_view symbol) {
  for (std::size_t i = 0; i < symbols.size(); ++i) {
    if (same_but_case(symbols[i], symbol)) return static_cast<int>(i) + 1;
  }
  return std::nullopt;
}

std::string_view element_symbol(int atomic_number) {
  assert(atomic_number >= 1 && atomic_number <= max_atomic_number);
  return symbols[static_cast<std::size_t>(atomic_number - 1)];
}

std::optional<double> covalent_radius_angstrom(int atomic_number) {
  assert(atomic_number >= 1 && atomic_number <= max_atomic_number);
  const auto index = static_cast<std::size_t>(atomic_number - 1);
  if (index >= covalent_radii.size()) return std::nullopt;
  return covalent_radii[index];
}

}  // namespace irrepwise
