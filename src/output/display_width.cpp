#include "output/display_width.hpp"

#include <algorithm>
#include <cstdint>

#include "core/text.hpp"

namespace irrepwise {
namespace {

constexpr std::string_view no_break_space = "\u00A0";

struct CodePoint {
  std::uint32_t value;
  std::size_t bytes;
};

CodePoint next_code_point(std::string_view text) {
  const auto byte = [&](std::size_t i) { return static_cast<unsigned char>(text[i]); };
  const unsigned char first = byte(0);
  std::size_t bytes = 1;
  std::uint32_t value = first;
  if (first >= 0xC2 && first < 0xE0) {
    bytes = 2;
    value = first & 0x1Fu;
  } else if (first >= 0xE0 && first < 0xF0) {
    bytes = 3;
    value = first & 0x0Fu;
  } else if (first >= 0xF0 && first < 0xF5) {
    bytes = 4;
    value = first & 0x07u;
  }
  if (bytes > text.size()) return {first, 1};
  for (std::size_t i = 1; i < bytes; ++i) {
    if ((byte(i) & 0xC0u) != 0x80u) return {first, 1};
    value = value << 6 | (byte(i) & 0x3Fu);
  }
  return {value, bytes};
}

// The blocks that can meet a title or an atom list; not the whole of Unicode Standard Annex 11.
int width_of(std::uint32_t c) {
  if ((c >= 0x300 && c <= 0x36F) || (c >= 0x200B && c <= 0x200F)) return 0;
  const bool wide = (c >= 0x1100 && c <= 0x115F) || (c >= 0x2E80 && c <= 0xA4CF) ||
                    (c >= 0xAC00 && c <= 0xD7A3) || (c >= 0xF900 && c <= 0xFAFF) ||
                    (c >= 0xFE30 && c <= 0xFE6F) || (c >= 0xFF00 && c <= 0xFF60) ||
                    (c >= 0x1F300 && c <= 0x1FAFF) || (c >= 0x20000 && c <= 0x3FFFD);
  return wide ? 2 : 1;
}

std::string spaces_up_to(int width, std::string_view text) {
  return std::string(static_cast<std::size_t>(std::max(0, width - display_width(text))), ' ');
}

}  // namespace

int display_width(std::string_view text) {
  int width = 0;
  while (!text.empty()) {
    const CodePoint point = next_code_point(text);
    width += width_of(point.value);
    text.remove_prefix(point.bytes);
  }
  return width;
}

std::string padded_right(std::string_view text, int width) {
  return std::string(text) + spaces_up_to(width, text);
}

std::string padded_left(std::string_view text, int width) {
  return spaces_up_to(width, text) + std::string(text);
}

std::vector<std::string> wrapped(std::string_view text, int width) {
  std::vector<std::string> lines(1);
  for (const std::string_view word : split_words(text)) {
    std::string& line = lines.back();
    if (line.empty()) {
      line = word;
    } else if (display_width(line) + 1 + display_width(word) <= width) {
      line.append(" ").append(word);
    } else {
      lines.emplace_back(word);
    }
  }
  for (std::string& line : lines) {
    for (std::size_t at = line.find(no_break_space); at != std::string::npos;
         at = line.find(no_break_space, at)) {
      line.replace(at, no_break_space.size(), " ");
    }
  }
  return lines;
}

}  // namespace irrepwise
