#include "core/parse.hpp"

#include <algorithm>
#include <charconv>
#include <cmath>
#include <cstddef>
#include <system_error>

#include <fmt/format.h>

namespace irrepwise {
namespace {

// from_chars takes no leading plus; a second sign must not slip through behind it.
std::string_view without_plus(std::string_view word) {
  if (word.size() > 1 && word[0] == '+' && word[1] != '-' && word[1] != '+') word.remove_prefix(1);
  return word;
}

// A 'd' exponent can only follow a digit or a point, so that "nand" or "d" is not mended.
std::string with_e_exponent(std::string_view word) {
  std::string text(word);
  for (std::size_t i = 1; i < text.size(); ++i) {
    const bool exponent = text[i] == 'd' || text[i] == 'D';
    if (exponent && (text[i - 1] == '.' || (text[i - 1] >= '0' && text[i - 1] <= '9'))) {
      text[i] = 'e';
    }
  }
  return text;
}

// Length of the UTF-8 sequence that starts at `at`, or 0 where there is none. Overlong forms are
// let through: they only reach a terminal.
std::size_t utf8_length(std::string_view text, std::size_t at) {
  const auto byte = [&](std::size_t i) { return static_cast<unsigned char>(text[i]); };
  const unsigned char first = byte(at);
  const std::size_t length = first < 0x80   ? 1
                             : first < 0xC2 ? 0
                             : first < 0xE0 ? 2
                             : first < 0xF0 ? 3
                             : first < 0xF5 ? 4
                                            : 0;
  if (length == 0 || at + length > text.size()) return 0;
  for (std::size_t i = at + 1; i < at + length; ++i) {
    if ((byte(i) & 0xC0) != 0x80) return 0;
  }
  return length;
}

}  // namespace

std::optional<double> parse_number(std::string_view word) {
  const std::string text = with_e_exponent(without_plus(word));
  double value = 0.0;
  const char* const end = text.data() + text.size();
  const auto [stop, code] = std::from_chars(text.data(), end, value);
  if (code != std::errc{} || stop != end || !std::isfinite(value)) return std::nullopt;
  return value;
}

std::optional<int> parse_whole_number(std::string_view word) {
  const std::string_view text = without_plus(word);
  int value = 0;
  const char* const end = text.data() + text.size();
  const auto [stop, code] = std::from_chars(text.data(), end, value);
  if (code != std::errc{} || stop != end) return std::nullopt;
  return value;
}

std::string quoted(std::string_view text) {
  constexpr std::size_t longest = 40;
  std::string out = "'";
  for (std::size_t at = 0; at < text.size();) {
    if (at >= longest) {
      out += "…";
      break;
    }
    const std::size_t length = utf8_length(text, at);
    const auto byte = static_cast<unsigned char>(text[at]);
    if (length == 0 || byte < 0x20 || byte == 0x7F) {
      out += fmt::format("\\x{:02x}", byte);
      ++at;
    } else {
      out += text.substr(at, length);
      at += length;
    }
  }
  return out + "'";
}

std::string why_not_a_number(std::string_view word) {
  std::string lower(without_plus(word));
  std::transform(lower.begin(), lower.end(), lower.begin(), [](char c) {
    return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
  });
  std::string_view body = lower;
  if (body.starts_with('-') || body.starts_with('.')) body.remove_prefix(1);  // YAML writes .nan
  if (body.starts_with('.')) body.remove_prefix(1);
  if (body.starts_with("nan") || body == "inf" || body == "infinity") {
    return fmt::format("found {}, expected a finite number", quoted(word));
  }
  std::string with_point(word);
  std::replace(with_point.begin(), with_point.end(), ',', '.');
  if (with_point != word && parse_number(with_point)) {
    return fmt::format("found {}, expected a number; write the decimal point as '.'", quoted(word));
  }
  double value = 0.0;
  const std::string text = with_e_exponent(without_plus(word));
  const auto [stop, code] = std::from_chars(text.data(), text.data() + text.size(), value);
  if (code == std::errc::result_out_of_range) {
    return fmt::format("found {}, too large or too small for a number here", quoted(word));
  }
  return fmt::format("found {}, expected a number", quoted(word));
}

std::string valid_utf8(std::string_view text) {
  std::string out;
  for (std::size_t at = 0; at < text.size();) {
    const std::size_t length = utf8_length(text, at);
    out += length == 0 ? "\uFFFD" : std::string(text.substr(at, length));
    at += std::max<std::size_t>(1, length);
  }
  return out;
}

}  // namespace irrepwise
