#include "basis/parameter_template.hpp"

#include <array>
#include <cassert>
#include <string_view>
#include <vector>

#include <fmt/format.h>

#include "molecule/element.hpp"

namespace irrepwise {
namespace {

struct Valence {
  int electrons = 0;
  std::vector<std::string> shells;
};

Valence valence_of(int atomic_number) {
  constexpr std::array<int, 8> noble_gases = {0, 2, 10, 18, 36, 54, 86, 118};
  int period = 1;
  while (atomic_number > noble_gases[static_cast<std::size_t>(period)]) ++period;
  const int place = atomic_number - noble_gases[static_cast<std::size_t>(period - 1)];
  const auto shell = [](int n, char letter) { return fmt::format("{}{}", n, letter); };

  Valence valence{place, {shell(period, 's')}};
  if (period == 1) return valence;
  valence.shells.push_back(shell(period, 'p'));
  const int n_f = period >= 6 ? 14 : 0;
  const int n_d = period >= 4 ? 10 : 0;
  if (place <= 2) return valence;
  if (place > n_d + n_f + 2) {  // p block: d and f are core
    valence.electrons = place - n_d - n_f;
  } else if (place > n_f + 2) {  // d block: f is core
    valence.electrons = place - n_f;
    valence.shells.push_back(shell(period - 1, 'd'));
  } else {
    valence.shells.push_back(shell(period - 1, 'd'));
    valence.shells.push_back(shell(period - 2, 'f'));
  }
  return valence;
}

}  // namespace

std::string parameter_template(int atomic_number) {
  assert(atomic_number >= 1 && atomic_number <= max_atomic_number);
  const Valence valence = valence_of(atomic_number);
  std::string yaml =
      fmt::format("  {}:\n    valence_electrons: {}\n    shells:", element_symbol(atomic_number),
                  valence.electrons);
  for (const std::string& shell : valence.shells) {
    const bool two_exponents = shell.back() == 'd' || shell.back() == 'f';
    yaml += fmt::format(
        "\n      - {{shell: {}, h_ii: ..., {}, source: ...}}", shell,
        two_exponents ? "exponents: [..., ...], coefficients: [..., ...]" : "exponent: ...");
  }
  return yaml;
}

}  // namespace irrepwise
