#include "figure/text_layout.hpp"

#include <cstddef>
#include <string>
#include <utility>

#include "figure/rich_text.hpp"

namespace irrepwise {

Text text_at(Point2 at, RichText runs, double size, Colour colour) {
  Text text;
  text.at = at;
  text.runs = std::move(runs);
  text.size = size;
  text.colour = colour;
  return text;
}

namespace {

// Words with their scripts; a word may hold several runs, as "D" with "4h" below.
std::vector<RichText> words_of(const RichText& text) {
  std::vector<RichText> words(1);
  for (const TextRun& run : text) {
    std::size_t start = 0;
    while (true) {
      const std::size_t space = run.text.find(' ', start);
      const std::string part = run.text.substr(start, space - start);
      if (!part.empty()) words.back().push_back({part, run.script});
      if (space == std::string::npos) break;
      if (!words.back().empty()) words.emplace_back();
      start = space + 1;
    }
  }
  if (words.back().empty()) words.pop_back();
  return words;
}

}  // namespace

std::vector<RichText> wrapped(const Font& font, const RichText& text, double size, double width) {
  std::vector<RichText> lines;
  for (const RichText& word : words_of(text)) {
    const RichText longer = lines.empty() ? word : lines.back() + plain_text(" ") + word;
    if (lines.empty() || font.width(longer, size) > width) {
      lines.push_back(word);
    } else {
      lines.back() = longer;
    }
  }
  return lines;
}

}  // namespace irrepwise
