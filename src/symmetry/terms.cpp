#include "symmetry/terms.hpp"

#include <algorithm>
#include <map>

#include <fmt/format.h>

#include "core/error.hpp"
#include "symmetry/character_table.hpp"
#include "symmetry/products.hpp"

namespace irrepwise {
namespace {

using Characters = std::vector<double>;
using BySpin = std::map<int, Characters>;  // 2 M_S -> characters of the determinants that have it

constexpr double most_determinants = 1e8;  // counts stay exact whole numbers in doubles

// Largest |M_L| of any determinants of a level: both spins fill the orbitals of highest m first.
int reach(const PointGroup& group, const std::string& label) {
  const int m = angular_number(group, label);
  return group.symbol().family == Family::Kh ? m * (m + 1) : 2 * m;
}

BySpin level_characters(const CharacterTable& table, const TableIrrep& irrep, int electrons) {
  const std::vector<Characters> powers =
      antisymmetric_powers(table, irrep.characters, irrep.dimension);
  BySpin result;
  for (int up = std::max(0, electrons - irrep.dimension);
       up <= std::min(irrep.dimension, electrons); ++up) {
    const int down = electrons - up;
    Characters& characters = result[up - down];
    for (int node = 0; node < table.size(); ++node) {
      characters.push_back(powers[up][node] * powers[down][node]);
    }
  }
  return result;
}

BySpin multiplied(const BySpin& a, const BySpin& b) {
  BySpin result;
  for (const auto& [spin_a, of_a] : a) {
    for (const auto& [spin_b, of_b] : b) {
      Characters& sum = result[spin_a + spin_b];
      sum.resize(of_a.size(), 0.0);
      for (std::size_t node = 0; node < of_a.size(); ++node) sum[node] += of_a[node] * of_b[node];
    }
  }
  return result;
}

double binomial(int n, int k) {
  double value = 1.0;
  for (int i = 1; i <= k; ++i) value = value * (n - k + i) / i;
  return value;
}

}  // namespace

std::vector<OpenLevel> parse_configuration(const PointGroup& group, std::string_view text) {
  std::vector<OpenLevel> levels;
  for (const Factor& factor : parse_factors(group, text)) {
    for (const OpenLevel& level : levels) {
      if (level.label == factor.label) {
        throw Error(fmt::format("'{}' names {} twice; write its electrons as one exponent", text,
                                level_label(factor.label)));
      }
    }
    levels.push_back({factor.label, factor.exponent});
  }
  return levels;
}

std::vector<Term> find_terms(const PointGroup& group, const std::vector<OpenLevel>& levels) {
  std::vector<OpenLevel> named;
  int largest_m = 0;
  for (const OpenLevel& level : levels) {
    named.push_back({table_label(group, level.label), level.electrons});
    largest_m += reach(group, named.back().label);
  }
  const CharacterTable table(group, largest_m);
  BySpin by_spin = {{0, Characters(static_cast<std::size_t>(table.size()), 1.0)}};
  double determinants = 1.0;
  for (const OpenLevel& level : named) {
    const TableIrrep& irrep = table.irrep(level.label);
    if (level.electrons < 0 || level.electrons > 2 * irrep.dimension) {
      throw Error(fmt::format("{} electrons in {}; it holds 0 to {}", level.electrons,
                              level_label(level.label), 2 * irrep.dimension));
    }
    determinants *= binomial(2 * irrep.dimension, level.electrons);
    if (determinants > most_determinants) {
      throw Error(
          fmt::format("the configuration has {:.2g} determinants, at most {:.0g} are sorted "
                      "into terms; leave a level out",
                      determinants, most_determinants));
    }
    by_spin = multiplied(by_spin, level_characters(table, irrep, level.electrons));
  }

  std::vector<Term> terms;
  for (auto at = by_spin.rbegin(); at != by_spin.rend() && at->first >= 0; ++at) {
    Characters characters = at->second;
    const auto above = by_spin.find(at->first + 2);
    if (above != by_spin.end()) {
      for (std::size_t node = 0; node < characters.size(); ++node) {
        characters[node] -= above->second[node];
      }
    }
    const std::size_t first = terms.size();
    for (const IrrepCount& irrep : table.reduce(characters)) {
      terms.push_back({at->first + 1, irrep.label, irrep.dimension, irrep.count});
    }
    const auto rank = [&](const Term& term) {
      return std::pair(angular_number(group, term.irrep), term.dimension);
    };
    std::stable_sort(terms.begin() + static_cast<std::ptrdiff_t>(first), terms.end(),
                     [&](const Term& a, const Term& b) { return rank(a) > rank(b); });
  }
  return terms;
}

std::vector<Term> lowest_terms(const PointGroup& group, const std::vector<Term>& terms) {
  std::vector<Term> lowest;
  int multiplicity = 0, angular = 0;
  for (const Term& term : terms) multiplicity = std::max(multiplicity, term.multiplicity);
  for (const Term& term : terms) {
    if (term.multiplicity == multiplicity) {
      angular = std::max(angular, angular_number(group, term.irrep));
    }
  }
  for (const Term& term : terms) {
    if (term.multiplicity == multiplicity && angular_number(group, term.irrep) == angular) {
      lowest.push_back(term);
    }
  }
  return lowest;
}

std::string term_text(const Term& term) {
  const std::string symbol = fmt::format("{}{}", term.multiplicity, term.irrep);
  return term.count == 1 ? symbol : fmt::format("{} {}", term.count, symbol);
}

}  // namespace irrepwise
