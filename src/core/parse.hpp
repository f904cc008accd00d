// Numbers and names as the user wrote them, and how messages quote them.
#pragma once

#include <optional>
#include <string>
#include <string_view>

namespace irrepwise {

/// The whole word as a finite number: "1", "-0.25", "+1e-3", and "1.0D-3" as Fortran writes it.
/// @returns  nothing for anything else: "1,5", "nan", "inf", "1e999", "0x10", an empty word
[[nodiscard]] std::optional<double> parse_number(std::string_view word);

/// The whole word as a whole number that fits an int: "12", "-2", "+2".
[[nodiscard]] std::optional<int> parse_whole_number(std::string_view word);

/// What stands in the input, fit for one line of a message: in quotes, long text cut short, control
/// characters and broken UTF-8 shown as "\x07".
[[nodiscard]] std::string quoted(std::string_view text);

/// "found 'abc', expected a number", or why a word that looks like one is refused: NaN and
/// infinity, a decimal comma, out of range.
[[nodiscard]] std::string why_not_a_number(std::string_view word);

/// @returns  the text, each byte that is not part of UTF-8 replaced by U+FFFD
[[nodiscard]] std::string valid_utf8(std::string_view text);

}  // namespace irrepwise
