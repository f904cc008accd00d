#include "output/figure_spaces.hpp"

#include <string_view>

#include "output/display_width.hpp"

namespace irrepwise {
namespace {

constexpr std::string_view figure_space = "\u2007";       // as wide as a digit
constexpr std::string_view punctuation_space = "\u2008";  // as wide as a point

}  // namespace

std::string filled_with_figure_spaces(const std::string& after, int width) {
  std::string text = after;
  int missing = width - display_width(after);
  if (missing > 0 && after.empty()) {
    text += punctuation_space;
    --missing;
  }
  for (; missing > 0; --missing) text += figure_space;
  return text;
}

}  // namespace irrepwise
