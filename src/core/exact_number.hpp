// Recognising numbers that have a short exact form.
#pragma once

#include <optional>
#include <string>

namespace irrepwise {

/// The short exact form of a number with |value| <= 12: "0", "-1", "1/2", "√3/2", "-1/√6",
/// "√(2/3)", and with the square root of five, "(1+√5)/4", "√((3+√5)/8)".
///
/// @returns  nothing where no short form lies within 1e-12 of the value (with denominators up to
///           240, so chance agreement is rarer than one in a million)
/// @source   derived by us
[[nodiscard]] std::optional<std::string> exact_form(double value);

}  // namespace irrepwise
