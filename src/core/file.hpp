// Reading a whole file of text, with errors that say what was found in its place.
#pragma once

#include <string>

namespace irrepwise {

/// @param path    a regular file of at most 256 MiB; a byte-order mark at its start is dropped
/// @returns       its text, bytes as they are
/// @throws Error  with the path as its place: missing, a directory, unreadable, empty, too large
[[nodiscard]] std::string read_text_file(const std::string& path);

/// @returns  `name` as seen from the folder of `beside`, unless it is absolute
[[nodiscard]] std::string path_beside(const std::string& beside, const std::string& name);

}  // namespace irrepwise
