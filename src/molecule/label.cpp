#include "molecule/label.hpp"

#include <cstddef>
#include <optional>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "molecule/element.hpp"

namespace irrepwise {
namespace {

bool is_upper(char c) { return c >= 'A' && c <= 'Z'; }
bool is_letter(char c) { return is_upper(c) || (c >= 'a' && c <= 'z'); }
bool is_digit(char c) { return c >= '0' && c <= '9'; }

std::size_t count_letters(std::string_view text) {
  std::size_t n = 0;
  while (n < text.size() && is_letter(text[n])) ++n;
  return n;
}

[[noreturn]] void fail_unknown(std::string_view label) {
  throw Error(fmt::format("{} is not an element{}", quoted(label), symbol_hint(label)));
}

}  // namespace

int atomic_number_of_label(std::string_view label) {
  if (const std::optional<int> z = parse_whole_number(label)) {
    if (*z >= 1 && *z <= max_atomic_number) return *z;
    throw Error(fmt::format("{} is not an atomic number; expected 1 to {}, or a symbol",
                            quoted(label), max_atomic_number));
  }
  const std::size_t n_letters = count_letters(label);
  const std::string_view letters = label.substr(0, n_letters);
  const std::optional<int> z = atomic_number(letters);
  if (n_letters == label.size()) {
    if (z) return *z;
    fail_unknown(label);
  }
  if (!is_digit(label[n_letters])) fail_unknown(label);
  const bool two_capitals = n_letters == 2 && is_upper(letters[0]) && is_upper(letters[1]);
  if (z && two_capitals) {
    if (const std::optional<int> other = atomic_number(letters.substr(0, 1))) {
      throw Error(fmt::format("label {} could mean {} or {}; write the symbol, e.g. {}",
                              quoted(label), element_symbol(*other), element_symbol(*z),
                              element_symbol(*z)));
    }
  }
  if (!z) fail_unknown(label);
  return *z;
}

std::string symbol_hint(std::string_view word) {
  const std::string_view letters = word.substr(0, count_letters(word));
  if (letters.empty()) return {};
  std::vector<std::string> candidates;
  for (int z = 1; z <= max_atomic_number; ++z) {
    const std::string_view symbol = element_symbol(z);
    if ((letters[0] | 0x20) == (symbol[0] | 0x20)) candidates.emplace_back(symbol);
  }
  const std::string nearest = nearest_word(letters, candidates);
  return nearest.empty() ? "" : fmt::format("; did you mean '{}'?", nearest);
}

}  // namespace irrepwise
