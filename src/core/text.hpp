// Small helpers for words: the nearest known name, joined lists.
#pragma once

#include <cstddef>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace irrepwise {

/// @returns  how many letters must be put in, taken out, replaced or exchanged with their neighbour
///           to make one word the other (bytes, case of ASCII ignored)
[[nodiscard]] std::size_t edit_distance(std::string_view a, std::string_view b);

/// The known word that `word` may mean, for "did you mean": one that begins with it (from three
/// letters on), the shortest of these, or else the nearest by edit distance (case ignored).
/// @returns  empty where none begins with it or is within a third of the longer word's length (at
///           least 2 edits)
[[nodiscard]] std::string nearest_word(std::string_view word, std::span<const std::string> known);

/// @returns  "a, b and c" with the given last joiner
[[nodiscard]] std::string joined(std::span<const std::string> words, std::string_view last = "and");

/// @returns  the text without white space at either end
[[nodiscard]] std::string_view trimmed(std::string_view text);

/// @returns  the words between runs of white space
[[nodiscard]] std::vector<std::string_view> split_words(std::string_view text);

/// @returns  "square.xyz" of "inputs/square.xyz": the name without its folders
[[nodiscard]] std::string file_name(const std::string& path);

}  // namespace irrepwise
