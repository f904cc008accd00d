// The one font of the figures, carried by the library: how wide text is, and its outlines.
#pragma once

#include <memory>
#include <string>
#include <string_view>
#include <vector>

#include "figure/figure.hpp"

namespace irrepwise {

/// Liberation Sans. Its widths are those of Arial and Helvetica, so that a figure in SVG keeps its
/// layout where another program sets the text.
class Font {
 public:
  Font();
  ~Font();
  Font(Font&&) noexcept;
  Font& operator=(Font&&) noexcept;

  /// @param size  px, of the letters in line; sub- and superscripts are smaller by `script_scale`
  /// @returns     px
  [[nodiscard]] double width(const RichText& runs, double size) const;

  /// What the text may cover: from the top of the tallest letters to the bottom of the deepest.
  [[nodiscard]] Box box(const Text& text) const;

  /// @returns  closed polygons to be filled by the non-zero rule, where the text stands
  [[nodiscard]] std::vector<std::vector<Point2>> outlines(const Text& text) const;

 private:
  struct Face;
  std::unique_ptr<Face> face_;
};

// How scripts are set, in parts of the size of the letters in line; the SVG writer does the same.
inline constexpr double script_scale = 0.72;
inline constexpr double sub_drop = 0.22;
inline constexpr double super_rise = 0.36;

/// CSS list of families, the carried one first, then others of the same widths.
inline constexpr std::string_view font_families =
    "'Liberation Sans', Arimo, Arial, Helvetica, sans-serif";

}  // namespace irrepwise
