// Reading and writing coordinates in the XYZ format.
#pragma once

#include <iosfwd>
#include <optional>
#include <string>
#include <string_view>

#include "molecule/molecule.hpp"

namespace irrepwise {

/// What an XYZ file says. The comment becomes the title unless it consists of key=value pairs
/// (extended XYZ), of which `charge=` and `multiplicity=` are honoured and others are read over,
/// unless they look like one of these misspelt.
struct XyzFile {
  Molecule molecule;
  std::optional<int> charge = {};  // as stated by charge=, already in the molecule (0 where absent)
  std::optional<int> multiplicity = {};  // as stated by multiplicity=, 2S + 1
  std::string multiplicity_place = {};   // for messages: "a.xyz:2:10"
};

/// @param path    first frame of the file is read; text after it is an error
/// @throws Error  with file, line and column: unreadable, empty, count and lines disagree, not a
///                number, unknown element, a key that looks like a misspelt one …
[[nodiscard]] XyzFile read_xyz(const std::string& path);

/// @param name  how messages call the text
[[nodiscard]] XyzFile parse_xyz(std::string_view text, const std::string& name);

/// @param title  what the molecule is called; may be empty
/// @param made   how it was made, which no reader takes for its title; may be empty
/// @returns      the text of an extended XYZ file, positions to 10 decimals
[[nodiscard]] std::string xyz_text(const Molecule& molecule, const std::string& title,
                                   const std::string& made = {});

}  // namespace irrepwise
