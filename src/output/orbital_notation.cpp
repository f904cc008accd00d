#include "output/orbital_notation.hpp"

#include <algorithm>
#include <array>
#include <cctype>
#include <cstddef>

#include "basis/shell.hpp"
#include "salc/salc_table.hpp"

namespace irrepwise {
namespace {

constexpr std::array<std::string_view, 8> local_functions = {"σ",   "πx", "πy", "δx2-y2",
                                                             "δxy", "φx", "φy", "π"};

bool goes_on_a_word(std::string_view text, std::size_t at) {
  if (at >= text.size()) return false;
  const auto byte = static_cast<unsigned char>(text[at]);
  return std::isalnum(byte) != 0 || text[at] == '_';
}

// Length of the longest function of the shell that starts here, 0 for none.
std::size_t function_at(std::string_view text, int l) {
  std::size_t longest = 0;
  const auto consider = [&](std::string_view name) {
    if (text.starts_with(name)) longest = std::max(longest, name.size());
  };
  for (int component = 0; l > 0 && component <= 2 * l; ++component) {
    consider(orbital_name(l, component).substr(1));
    consider(side_on_name(l, component).substr(1));
  }
  for (const std::string_view name : local_functions) consider(name);
  return longest;
}

// "(xz,yz)"
std::size_t functions_in_brackets_at(std::string_view text, int l) {
  std::size_t at = 0;
  if (!text.starts_with('(')) return 0;
  do {
    ++at;
    const std::size_t size = function_at(text.substr(at), l);
    if (size == 0) return 0;
    at += size;
  } while (at < text.size() && text[at] == ',');
  return at < text.size() && text[at] == ')' ? at + 1 : 0;
}

// Length of what stands below in the name that starts here, 0 where none does.
std::size_t below_at(std::string_view text) {
  if (text.size() < 3 || text[0] < '1' || text[0] > '7') return 0;
  for (int l = 0; l <= max_l; ++l) {
    if (text[1] != shell_letter(l)) continue;
    const std::string_view rest = text.substr(2);
    const std::size_t size = std::max(function_at(rest, l), functions_in_brackets_at(rest, l));
    return goes_on_a_word(rest, size) ? 0 : size;
  }
  return 0;
}

}  // namespace

std::vector<NotationRun> notation_runs(std::string_view words) {
  std::vector<NotationRun> runs;
  std::string plain;
  const auto end_plain = [&] {
    if (!plain.empty()) runs.push_back({plain});
    plain.clear();
  };
  for (std::size_t at = 0; at < words.size();) {
    const bool inside_word = at > 0 && goes_on_a_word(words, at - 1);
    const std::size_t below = inside_word ? 0 : below_at(words.substr(at));
    if (below == 0) {
      plain += words[at++];
      continue;
    }
    end_plain();
    runs.push_back({std::string(words.substr(at, 2)), std::string(words.substr(at + 2, below))});
    at += 2 + below;
  }
  end_plain();
  return runs;
}

bool is_exponent(std::string_view below, std::size_t at) {
  const auto is = [&](std::size_t i, int (*kind)(int)) {
    return kind(static_cast<unsigned char>(below[i])) != 0;
  };
  return is(at, std::isdigit) && at > 0 && is(at - 1, std::isalpha);
}

}  // namespace irrepwise
