// The comment line of an XYZ file, which extended XYZ fills with key=value pairs.
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace irrepwise {

/// One piece of the comment: `key=value`, with the quotes of the value taken off, or a bare word.
struct CommentPiece {
  std::string key;  // the bare word where there is no value
  std::optional<std::string> value;
  int column = 1;  // in bytes, from 1
  int value_column = 1;
};

/// Splits at white space outside "…", '…', […] and {…} behind an equals sign.
[[nodiscard]] std::vector<CommentPiece> comment_pieces(std::string_view comment);

/// The key as its meaning is looked up: in lower case, as charge, Charge and CHARGE are one.
[[nodiscard]] std::string comment_key(std::string_view key);

/// @returns  which of the keys that are honoured this one looks like without being it: "charge" for
///           "chrage", "multiplicity" for "mult"; empty for keys of their own such as Lattice, pbc
///           and energy
[[nodiscard]] std::string misspelt_key(std::string_view key);

/// Where the columns of an atom line are, by `Properties=species:S:1:pos:R:3`.
struct AtomColumns {
  int species = 0;   // index of the word from 0
  int position = 1;  // of x; y and z follow
};

/// @throws Error  not name:type:count triples, no species (or Z), or no pos of three columns
[[nodiscard]] AtomColumns atom_columns(std::string_view properties);

}  // namespace irrepwise
