#include "figure/sheet.hpp"

#include <algorithm>
#include <cmath>

#include "figure/font.hpp"
#include "figure/palette.hpp"
#include "figure/rich_text.hpp"
#include "figure/text_layout.hpp"

namespace irrepwise {
namespace {

constexpr double margin = 24.0;
constexpr double gap = 22.0;
constexpr double title_size = 17.0;
constexpr double caption_size = 15.0;
constexpr double small_size = 11.5;
constexpr double line_height = 16.0;
constexpr double least_width = 420.0;  // room for titles above a single cell
constexpr double corner_size = 60.0;

struct Moved {
  Point2 by;

  [[nodiscard]] Point2 moved(const Point2& p) const { return {p.x + by.x, p.y + by.y}; }
  void operator()(Path& path) const {
    for (std::vector<Point2>& line : path.lines) {
      for (Point2& p : line) p = moved(p);
    }
  }
  void operator()(Disc& disc) const { disc.centre = moved(disc.centre); }
  void operator()(Text& text) const { text.at = moved(text.at); }
  void operator()(Picture& picture) const { picture.corner = moved(picture.corner); }
};

void add_moved(Group& group, std::vector<Element> elements, Point2 by) {
  for (Element& element : elements) {
    std::visit(Moved{by}, element);
    group.elements.push_back(std::move(element));
  }
}

std::size_t columns_for(std::size_t cells) {
  if (cells <= 4) return std::max<std::size_t>(1, cells);
  return cells <= 6 || cells == 9 ? 3 : 4;
}

// A swatch and words for each item, one after the other, broken into lines.
double add_legend(Group& group, const Font& font, const std::vector<LegendItem>& legend, double top,
                  double width) {
  double x = margin;
  double y = top;
  for (const LegendItem& item : legend) {
    const double swatch = item.line ? 26.0 : 12.0;
    const double length = swatch + 6.0 + font.width(plain_text(item.words), small_size);
    if (x > margin && x + length > margin + width) {
      x = margin;
      y += line_height + 2.0;
    }
    if (item.line) {
      Path path;
      path.lines = {{{x, y - 4.0}, {x + swatch, y - 4.0}}};
      path.stroke =
          Stroke{item.fill, 1.6, item.dashed ? std::vector<double>{5, 3} : std::vector<double>{}};
      group.elements.emplace_back(std::move(path));
    } else {
      group.elements.emplace_back(
          Disc{{x + 6.0, y - 4.0}, 5.0, item.fill, Stroke{palette::muted, 0.7, {}}});
    }
    group.elements.emplace_back(
        text_at({x + swatch + 6.0, y}, plain_text(item.words), small_size, palette::muted));
    x += length + 18.0;
  }
  return y;
}

}  // namespace

Figure sheet_figure(const Sheet& sheet) {
  const Font font;
  const std::size_t columns = columns_for(sheet.cells.size());
  const double cells_width = static_cast<double>(columns) * (sheet.cell_size + gap) - gap;
  double width = std::max(cells_width, least_width);
  for (const SheetCell& cell : sheet.cells) {  // a caption may be wider than its cell
    for (const RichText& line : cell.caption) {
      if (columns == 1) width = std::max(width, font.width(line, caption_size));
    }
  }
  Figure figure;
  figure.title = sheet.title;
  figure.description = sheet.description;
  Group heading;
  heading.kind = "heading";
  double y = margin;
  for (const RichText& line : wrapped(font, heading_text(sheet.title), title_size, width)) {
    y += title_size + 3.0;
    heading.elements.emplace_back(text_at({margin, y - 4.0}, line, title_size, palette::ink));
  }
  for (const RichText& line : wrapped(font, sheet.method, small_size, width)) {
    y += line_height;
    heading.elements.emplace_back(text_at({margin, y}, line, small_size, palette::muted));
  }
  figure.groups.push_back(std::move(heading));
  y += 20.0;
  std::size_t most_lines = 0;
  for (const SheetCell& cell : sheet.cells) most_lines = std::max(most_lines, cell.caption.size());
  const double row_height =
      sheet.cell_size + 8.0 + caption_size + static_cast<double>(most_lines) * line_height + 14.0;
  for (std::size_t i = 0; i < sheet.cells.size(); ++i) {
    const SheetCell& cell = sheet.cells[i];
    const Point2 corner = {margin + static_cast<double>(i % columns) * (sheet.cell_size + gap),
                           y + static_cast<double>(i / columns) * row_height};
    Group group;
    group.kind = "orbital";
    group.name = cell.name;
    group.title = cell.title;
    add_moved(group, cell.elements, corner);
    double line_y = corner.y + sheet.cell_size + 8.0 + caption_size;
    for (std::size_t k = 0; k < cell.caption.size(); ++k) {
      group.elements.emplace_back(text_at({corner.x, line_y}, cell.caption[k],
                                          k == 0 ? caption_size : small_size,
                                          k == 0 ? palette::ink : palette::muted));
      line_y += line_height + (k == 0 ? 2.0 : 0.0);
    }
    figure.groups.push_back(std::move(group));
  }
  const std::size_t rows = (sheet.cells.size() + columns - 1) / columns;
  y += static_cast<double>(rows) * row_height + 8.0;
  Group foot;
  foot.kind = "legend";
  const double foot_width = sheet.corner.empty() ? width : width - corner_size - 20.0;
  const double foot_top = y;
  if (!sheet.legend.empty()) y = add_legend(foot, font, sheet.legend, y + 8.0, foot_width);
  for (const RichText& note : sheet.notes) {
    for (const RichText& line : wrapped(font, note, small_size, foot_width)) {
      y += line_height;
      foot.elements.emplace_back(text_at({margin, y}, line, small_size, palette::muted));
    }
  }
  if (!sheet.corner.empty()) {
    add_moved(foot, sheet.corner, {margin + width - corner_size, foot_top - 6.0});
    y = std::max(y, foot_top - 6.0 + corner_size);
  }
  figure.groups.push_back(std::move(foot));
  figure.width = std::ceil(width + 2.0 * margin);
  figure.height = std::ceil(y + margin);
  return figure;
}

}  // namespace irrepwise
