// The one exception type: what is wrong with the user's input, where, and what to do.
#pragma once

#include <stdexcept>
#include <string>
#include <string_view>

namespace irrepwise {

/// Thrown by library code for anything wrong with the user's input. The message says what is wrong
/// (found, expected) and what to do, without a place; whoever knows the place adds it on the way
/// up with `error_at`.
class Error : public std::runtime_error {
 public:
  explicit Error(const std::string& message) : std::runtime_error(message) {}
};

/// @param place  "job.yaml:12:5", "atom 3" …
/// @returns      the same error with "place: " before its message
[[nodiscard]] Error error_at(std::string_view place, const Error& error);

/// @returns  "file:line:column"; a line or column of 0 is unknown and left out
[[nodiscard]] std::string file_place(std::string_view file, int line = 0, int column = 0);

}  // namespace irrepwise
