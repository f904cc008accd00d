#include "molecule/xyz_comment.hpp"

#include <algorithm>
#include <array>
#include <cstddef>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"

namespace irrepwise {
namespace {

constexpr std::string_view white_space = " \t\r\n\v\f";

bool is_space(char c) { return white_space.find(c) != std::string_view::npos; }

// The closing mark of a value that starts with `open`, or 0 for a bare value.
char closing(char open) {
  switch (open) {
    case '"':
      return '"';
    case '\'':
      return '\'';
    case '[':
      return ']';
    case '{':
      return '}';
    default:
      return 0;
  }
}

// Reads the value that starts at `at` and moves `at` behind it. A mark that is never closed takes
// the rest of the line: a comment is no place to be strict.
std::string take_value(std::string_view text, std::size_t& at) {
  std::string value;
  const char close = at < text.size() ? closing(text[at]) : char{0};
  if (close == 0) {
    while (at < text.size() && !is_space(text[at])) value += text[at++];
    return value;
  }
  for (++at; at < text.size() && text[at] != close; ++at) {
    if (text[at] == '\\' && at + 1 < text.size()) ++at;
    value += text[at];
  }
  if (at < text.size()) ++at;
  return value;
}

}  // namespace

std::vector<CommentPiece> comment_pieces(std::string_view comment) {
  std::vector<CommentPiece> pieces;
  std::size_t at = 0;
  while (true) {
    while (at < comment.size() && is_space(comment[at])) ++at;
    if (at == comment.size()) return pieces;
    CommentPiece piece;
    piece.column = static_cast<int>(at) + 1;
    while (at < comment.size() && !is_space(comment[at]) && comment[at] != '=') {
      piece.key += comment[at++];
    }
    // A lone "=" and "=value" are words of a sentence, not pairs.
    const bool pair = !piece.key.empty() && at < comment.size() && comment[at] == '=';
    if (pair) {
      piece.value_column = static_cast<int>(++at) + 1;
      piece.value = take_value(comment, at);
    } else {
      while (at < comment.size() && !is_space(comment[at])) piece.key += comment[at++];
    }
    pieces.push_back(piece);
  }
}

std::string comment_key(std::string_view key) {
  std::string lower(key);
  std::transform(lower.begin(), lower.end(), lower.begin(), [](char c) {
    return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
  });
  return lower;
}

std::string misspelt_key(std::string_view key) {
  // Short words are near many others: one slip, in the long word two.
  struct Known {
    std::string_view key;
    std::size_t most_slips;
  };
  constexpr std::array<Known, 3> known = {{{"charge", 1}, {"multiplicity", 2}, {"Properties", 1}}};
  constexpr std::size_t shortest_start = 4;
  const std::string word = comment_key(key);
  if (word == "change") return {};  // as of an energy
  for (const Known& one : known) {
    const std::string right = comment_key(one.key);
    if (word == right) return key == one.key || right != "properties" ? "" : std::string(one.key);
    const bool begins =
        right != "properties" && word.size() >= shortest_start && right.starts_with(word);
    if (begins || edit_distance(word, right) <= one.most_slips) return std::string(one.key);
  }
  return {};
}

AtomColumns atom_columns(std::string_view properties) {
  std::vector<std::string_view> fields;
  std::size_t start = 0;
  for (std::size_t at = 0; at <= properties.size(); ++at) {
    if (at < properties.size() && properties[at] != ':') continue;
    fields.push_back(properties.substr(start, at - start));
    start = at + 1;
  }
  const auto malformed = [&] {
    return Error(
        fmt::format("Properties={}: expected name:type:count for each group of columns, "
                    "e.g. Properties=species:S:1:pos:R:3",
                    quoted(properties)));
  };
  if (fields.size() % 3 != 0) throw malformed();

  constexpr int most_columns = 10000;
  std::optional<int> species;
  std::optional<int> number;
  std::optional<int> position;
  int column = 0;
  for (std::size_t i = 0; i < fields.size(); i += 3) {
    const std::optional<int> count = parse_whole_number(fields[i + 2]);
    if (!count || *count < 1 || *count > most_columns || column > most_columns) throw malformed();
    if (fields[i] == "species" && *count == 1) species = column;
    if (fields[i] == "Z" && *count == 1) number = column;
    if (fields[i] == "pos" && *count == 3) position = column;
    column += *count;
  }
  if (!species) species = number;
  if (!species || !position) {
    throw Error(fmt::format("Properties={}: expected species:S:1 and pos:R:3 among the columns",
                            quoted(properties)));
  }
  return {*species, *position};
}

}  // namespace irrepwise
