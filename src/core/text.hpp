// Small helpers for words: the nearest known name, joined lists.
#pragma once

#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace irrepwise {

/// The known word nearest to `word` by edit distance (case ignored), for "did you mean".
/// @returns  empty where none is within a third of the longer word's length (at least 2 edits)
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
