#include "symmetry/character_table.hpp"

namespace irrepwise {
namespace {

// Newton's identities: n h_n = sum p_i h_(n-i) for the symmetric powers, and with alternating signs
// for the antisymmetric ones, where p_i is the character of g^i.
std::vector<std::vector<double>> powers(const CharacterTable& table,
                                        std::span<const double> characters, int last,
                                        double sign_step) {
  const auto nodes = static_cast<std::size_t>(table.size());
  std::vector<std::vector<double>> result(static_cast<std::size_t>(last) + 1,
                                          std::vector<double>(nodes, 1.0));
  for (int n = 1; n <= last; ++n) {
    for (int node = 0; node < table.size(); ++node) {
      double sum = 0.0, sign = 1.0;
      for (int i = 1; i <= n; ++i, sign *= sign_step) {
        sum += sign * characters[table.power(node, i)] * result[n - i][node];
      }
      result[n][node] = sum / n;
    }
  }
  return result;
}

}  // namespace

std::vector<std::vector<double>> symmetric_powers(const CharacterTable& table,
                                                  std::span<const double> characters, int last) {
  return powers(table, characters, last, 1.0);
}

std::vector<std::vector<double>> antisymmetric_powers(const CharacterTable& table,
                                                      std::span<const double> characters,
                                                      int last) {
  return powers(table, characters, last, -1.0);
}

}  // namespace irrepwise
