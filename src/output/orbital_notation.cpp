#include "output/orbital_notation.hpp"

#include <algorithm>
#include <array>
#include <cctype>
#include <cstddef>
#include <utility>

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

bool is_digit(std::string_view text, std::size_t at) {
  return at < text.size() && std::isdigit(static_cast<unsigned char>(text[at])) != 0;
}

template <std::size_t n>
bool any_of_ends(std::string_view text, const std::array<std::string_view, n>& ends) {
  return std::any_of(ends.begin(), ends.end(),
                     [&](std::string_view end) { return text.ends_with(end); });
}

template <std::size_t n>
bool any_of_starts(std::string_view text, const std::array<std::string_view, n>& starts) {
  return std::any_of(starts.begin(), starts.end(),
                     [&](std::string_view start) { return text.starts_with(start); });
}

// Whether "C4" between these words is an axis or a group, not the fourth atom; "Cs" and "Th" a
// group, not an element.
bool is_symmetry_between(std::string_view before, std::string_view after) {
  constexpr std::array<std::string_view, 10> leads = {
      "x = ",         "y = ",         "z = ", "subgroup of ", "Character table of ",
      "Point group ", "point group ", "→ ",   "→\u00a0",      "Descent from "};
  constexpr std::array<std::string_view, 7> follows = {
      " at tolerance", "\u00a0at\u00a0",  ", a subgroup of", " →", "\u00a0→",
      " (S",           " in the yz plane"};
  const bool descent = before.starts_with("Descent from ") && before.ends_with(" to ");
  // "C4 (S8)"
  const bool second = before.ends_with(" (") && after.starts_with(')') && before.size() > 2 &&
                      is_digit(before, before.size() - 3);
  return any_of_ends(before, leads) || any_of_starts(after, follows) || descent || second;
}

// The name of a group or an axis that starts here; without text where none does.
NotationRun symmetry_at(std::string_view words, std::size_t at) {
  constexpr std::array<std::string_view, 5> by_letters = {"Td", "Oh", "Ih", "σv", "σh"};
  const std::string_view rest = words.substr(at);
  for (const std::string_view name : by_letters) {
    if (!rest.starts_with(name) || goes_on_a_word(rest, name.size())) continue;
    return {std::string(name.substr(0, name.size() - 1)), std::string(name.substr(name.size() - 1)),
            Notation::Symmetry};
  }
  constexpr std::array<std::string_view, 3> by_words = {"Cs", "Ci", "Th"};
  for (const std::string_view name : by_words) {
    if (!rest.starts_with(name) || goes_on_a_word(rest, name.size())) continue;
    if (!is_symmetry_between(words.substr(0, at), rest.substr(name.size()))) return {};
    return {std::string(name.substr(0, 1)), std::string(name.substr(1)), Notation::Symmetry};
  }
  const char letter = rest.empty() ? ' ' : rest[0];
  if (letter != 'C' && letter != 'D' && letter != 'S') return {};
  constexpr std::string_view infinite = "∞";
  std::size_t size = 1;
  while (is_digit(rest, size)) ++size;
  const bool has_order = size > 1;
  const bool is_infinite = !has_order && rest.substr(1).starts_with(infinite);
  if (is_infinite) size += infinite.size();
  if (!has_order && !is_infinite) return {};
  const bool has_letter =
      letter != 'S' && size < rest.size() && std::string_view("hvd").find(rest[size]) < 3;
  if (has_letter) ++size;
  NotationRun run{std::string(1, letter), std::string(rest.substr(1, size - 1)),
                  Notation::Symmetry};
  while (size < rest.size() && !has_letter && (rest[size] == '\'' || rest[size] == '"')) {
    run.primes += rest[size++];
  }
  if (goes_on_a_word(rest, size)) return {};
  const bool certain = has_letter || letter == 'D' || (letter == 'C' && !run.primes.empty()) ||
                       is_symmetry_between(words.substr(0, at), rest.substr(size));
  return certain ? run : NotationRun{};
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
    if (!inside_word && below == 0) {
      NotationRun symmetry = symmetry_at(words, at);
      if (!symmetry.below.empty()) {
        end_plain();
        at += symmetry.text.size() + symmetry.below.size() + symmetry.primes.size();
        runs.push_back(std::move(symmetry));
        continue;
      }
    }
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
