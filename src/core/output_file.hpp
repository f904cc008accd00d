// Writing a file so that it appears whole or not at all.
#pragma once

#include <string>
#include <string_view>

namespace irrepwise {

/// Writes beside the path, then renames: a reader sees the old file or the whole new one, and a
/// full disk leaves the old one. A symbolic link stays a link; a device or pipe is written to
/// directly.
///
/// @throws Error  with the path: folder missing or not writable, a directory in the way, disk full
void write_file(const std::string& path, std::string_view text);

/// Writes all of the text to an open file descriptor.
/// @param name    how messages call it: "standard output"
/// @throws Error  where any byte cannot be written
void write_descriptor(int descriptor, std::string_view text, const std::string& name);

/// @returns  whether both paths lead to the same existing file, by any name or link
[[nodiscard]] bool same_file(const std::string& path_a, const std::string& path_b);

}  // namespace irrepwise
