#include "symmetry/products.hpp"

#include <algorithm>
#include <charconv>
#include <cmath>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/text.hpp"
#include "symmetry/angular_label.hpp"
#include "symmetry/character_table.hpp"

namespace irrepwise {
namespace {

constexpr int largest_exponent = 20;
constexpr double largest_dimension = 1e6;

// Joining signs become blanks. No irrep has an x in its label.
std::string with_blanks(std::string text) {
  for (const std::string_view sign : {"×", "⊗"}) {
    for (std::size_t at = text.find(sign); at != std::string::npos; at = text.find(sign)) {
      text.replace(at, sign.size(), " ");
    }
  }
  std::replace_if(
      text.begin(), text.end(),
      [](char c) { return c == 'x' || c == 'X' || c == ',' || c == '*' || c == ';'; }, ' ');
  return text;
}

int exponent_of(std::string_view word, std::string_view digits) {
  int exponent = 0;
  const auto [end, status] =
      std::from_chars(digits.data(), digits.data() + digits.size(), exponent);
  if (status != std::errc() || end != digits.data() + digits.size() || exponent < 1 ||
      exponent > largest_exponent) {
    throw Error(fmt::format("'{}': the exponent must be a whole number from 1 to {}", word,
                            largest_exponent));
  }
  return exponent;
}

int largest_m(const PointGroup& group, const std::vector<Factor>& factors) {
  int sum = 0;
  for (const Factor& factor : factors) sum += angular_number(group, factor.label) * factor.exponent;
  return sum;
}

void require_moderate(double dimension) {
  if (dimension > largest_dimension) {
    throw Error(
        fmt::format("the product has {:.3g} dimensions, at most {:.0g} are reduced; take "
                    "fewer factors",
                    dimension, largest_dimension));
  }
}

Reduction part_of_power(const PointGroup& group, const std::string& label, int n, bool symmetric) {
  const std::string name = table_label(group, label);
  const CharacterTable table(group, largest_m(group, {{name, n}}));
  const TableIrrep& irrep = table.irrep(name);
  require_moderate(std::pow(irrep.dimension, n));
  const auto powers = symmetric ? symmetric_powers(table, irrep.characters, n)
                                : antisymmetric_powers(table, irrep.characters, n);
  return table.reduce(powers.back());
}

}  // namespace

std::vector<Factor> parse_factors(const PointGroup& group, std::string_view text) {
  std::vector<Factor> factors;
  const std::string spaced = with_blanks(ascii_label(text));
  for (const std::string_view word : split_words(spaced)) {
    const std::size_t caret = word.find('^');
    Factor factor{table_label(group, word.substr(0, caret)), 1};
    if (caret != std::string_view::npos)
      factor.exponent = exponent_of(word, word.substr(caret + 1));
    factors.push_back(std::move(factor));
  }
  if (factors.empty()) {
    throw Error(fmt::format("'{}' names no irrep; write them like {}", text,
                            group.symbol().is_finite()
                                ? level_label(group.irreps().back().label) + "^2"
                                : std::string("pi x delta, with g or u where there is a centre")));
  }
  return factors;
}

std::string factors_text(const std::vector<Factor>& factors) {
  std::string text;
  for (const Factor& factor : factors) {
    if (!text.empty()) text += " x ";
    text += factor.label;
    if (factor.exponent > 1) text += fmt::format("^{}", factor.exponent);
  }
  return text;
}

Reduction direct_product(const PointGroup& group, const std::vector<Factor>& factors) {
  std::vector<Factor> named;
  for (const Factor& factor : factors) {
    named.push_back({table_label(group, factor.label), factor.exponent});
  }
  const CharacterTable table(group, largest_m(group, named));
  std::vector<double> characters(static_cast<std::size_t>(table.size()), 1.0);
  double dimension = 1.0;
  for (const Factor& factor : named) {
    const TableIrrep& irrep = table.irrep(factor.label);
    dimension *= std::pow(irrep.dimension, factor.exponent);
    for (int node = 0; node < table.size(); ++node) {
      characters[node] *= std::pow(irrep.characters[node], factor.exponent);
    }
  }
  require_moderate(dimension);
  return table.reduce(characters);
}

Reduction direct_product(const PointGroup& group, const std::string& a, const std::string& b) {
  return direct_product(group, {{a, 1}, {b, 1}});
}

Reduction symmetric_power(const PointGroup& group, const std::string& label, int n) {
  return part_of_power(group, label, n, true);
}

Reduction antisymmetric_power(const PointGroup& group, const std::string& label, int n) {
  return part_of_power(group, label, n, false);
}

ProductAnswer answer_product(const PointGroup& group, std::string_view question) {
  ProductAnswer answer;
  answer.factors = parse_factors(group, question);
  answer.product = direct_product(group, answer.factors);
  const std::vector<Factor>& factors = answer.factors;
  const bool twice = factors.size() == 2 && factors[0] == factors[1] && factors[0].exponent == 1;
  if (twice || (factors.size() == 1 && factors[0].exponent > 1)) {
    const int n = twice ? 2 : factors[0].exponent;
    answer.has_parts = true;
    answer.symmetric = symmetric_power(group, factors[0].label, n);
    answer.antisymmetric = antisymmetric_power(group, factors[0].label, n);
  }
  return answer;
}

}  // namespace irrepwise
