#include "complex/electron_count.hpp"

#include <array>
#include <cassert>
#include <cstddef>
#include <string_view>

#include <fmt/format.h>

#include "core/error.hpp"
#include "molecule/element.hpp"

namespace irrepwise {
namespace {

struct Valence {
  int electrons;
  char shell;
};

Valence valence(int z) {
  constexpr std::array<int, 8> noble = {0, 2, 10, 18, 36, 54, 86, 118};
  int period = 1;
  while (z > noble[static_cast<std::size_t>(period)]) ++period;
  int beyond = z - noble[static_cast<std::size_t>(period - 1)];  // electrons outside the core
  if (beyond <= 2) return {z == 2 ? 2 : beyond, 'p'};
  if (period <= 3) return {beyond, 'p'};
  if (period >= 6) {
    // Fourteen f electrons are filled before group 3, where lutetium and lawrencium stand.
    if (beyond <= 16) return {beyond, 'f'};
    beyond -= 14;
  }
  return beyond <= 12 ? Valence{beyond, 'd'} : Valence{beyond - 10, 'p'};
}

// d10 s2, f14 s2 and s2 p6: beyond them there is no valence orbital left.
int most_electrons(char shell) { return shell == 'd' ? 12 : shell == 'f' ? 16 : 8; }

}  // namespace

int valence_electrons(int atomic_number) {
  assert(atomic_number >= 1 && atomic_number <= max_atomic_number);
  return valence(atomic_number).electrons;
}

std::string signed_number(int number) { return number == 0 ? "0" : fmt::format("{:+}", number); }

ElectronCount count_electrons(int atomic_number, int oxidation, int donated, int other_metal) {
  const Valence neutral = valence(atomic_number);
  const int left = neutral.electrons - oxidation;
  const std::string_view symbol = element_symbol(atomic_number);
  if (left < 0) {
    throw Error(
        fmt::format("the oxidation state {} takes more electrons from {} than its {} "
                    "valence electrons; check oxidation state, charge and ligands",
                    signed_number(oxidation), symbol, neutral.electrons));
  }
  if (left > most_electrons(neutral.shell)) {
    throw Error(
        fmt::format("the oxidation state {} leaves {} electrons on {}, more than the {} "
                    "that its valence shells hold; check oxidation state, charge and ligands",
                    signed_number(oxidation), left, symbol, most_electrons(neutral.shell)));
  }
  return {oxidation, left, neutral.shell, donated, left + donated + other_metal, other_metal};
}

}  // namespace irrepwise
