#include "figure/text_layout.hpp"

#include <utility>

#include "core/text.hpp"
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

std::vector<std::string> wrapped(const Font& font, const std::string& text, double size,
                                 double width) {
  std::vector<std::string> lines;
  for (const std::string_view word : split_words(text)) {
    const std::string longer =
        lines.empty() ? std::string(word) : lines.back() + " " + std::string(word);
    if (lines.empty() || font.width(plain_text(longer), size) > width) {
      lines.emplace_back(word);
    } else {
      lines.back() = longer;
    }
  }
  return lines;
}

}  // namespace irrepwise
