#include <algorithm>
#include <cassert>
#include <cmath>

#include <fmt/format.h>

#include "figure/orbital_sheets.hpp"
#include "figure/palette.hpp"
#include "figure/rich_text.hpp"
#include "figure/sheet.hpp"
#include "molecule/element.hpp"

namespace irrepwise {
namespace {

constexpr double in_plane_angstrom = 0.15;  // atoms nearer than this count as lying in the plane

// From the plane to the cell: equal scale along both, y turned down.
struct Scale {
  double px_per_angstrom = 1.0;
  Point2 middle;                       // of the plane's region, Å
  double half = 0.0;                   // px
  static constexpr double lift = 9.0;  // px, above the scale bar

  [[nodiscard]] Point2 operator()(const Point2& p) const {
    return {half + (p.x - middle.x) * px_per_angstrom,
            half - lift - (p.y - middle.y) * px_per_angstrom};
  }
};

Colour mixed(Colour a, Colour b, double part) {
  const auto mix = [&](std::uint8_t x, std::uint8_t y) {
    return static_cast<std::uint8_t>(std::lround((1.0 - part) * x + part * y));
  };
  return {mix(a.red, b.red), mix(a.green, b.green), mix(a.blue, b.blue)};
}

Point2 in_plane(const Plane& plane, const Eigen::Vector3d& r) {
  return {plane.right.dot(r - plane.origin), plane.up.dot(r - plane.origin)};
}

Scale scale_for(const ContourMap& map, const Molecule& molecule, const Plane& plane,
                double cell_size) {
  Box box = map.extent;
  for (const Atom& atom : molecule.atoms()) {
    const Point2 p = in_plane(plane, atom.position);
    box.left = std::min(box.left, p.x - 0.4);
    box.right = std::max(box.right, p.x + 0.4);
    box.bottom = std::min(box.bottom, p.y - 0.4);
    box.top = std::max(box.top, p.y + 0.4);
  }
  Scale scale;
  const double size = std::max(box.right - box.left, box.top - box.bottom);
  constexpr double rim = 34.0;  // px in all; the lower part holds the scale bar
  scale.px_per_angstrom = (cell_size - rim) / size;
  scale.middle = {0.5 * (box.left + box.right), 0.5 * (box.top + box.bottom)};
  scale.half = 0.5 * cell_size;
  return scale;
}

std::vector<std::vector<Point2>> scaled(const std::vector<std::vector<Point2>>& lines,
                                        const Scale& scale) {
  std::vector<std::vector<Point2>> out = lines;
  for (std::vector<Point2>& line : out) {
    for (Point2& p : line) p = scale(p);
  }
  return out;
}

// Fills from the outermost level in, darker each time, then the lines over them.
void add_contours(std::vector<Element>& elements, const ContourMap& map, const Scale& scale) {
  for (const double sign : {1.0, -1.0}) {
    double step = 0.0;
    for (const Contour& contour : map.contours) {
      if (contour.level * sign < 0.0) continue;
      Path path;
      path.lines = scaled(contour.lines, scale);
      path.closed = true;
      path.fill = sign > 0.0 ? mixed(palette::positive_pale, palette::positive, step)
                             : mixed(palette::negative_pale, palette::negative, step);
      step = std::min(0.75, step + 0.15);
      elements.emplace_back(std::move(path));
    }
  }
  for (const Contour& contour : map.contours) {
    Path path;
    path.lines = scaled(contour.lines, scale);
    path.closed = true;
    const bool positive = contour.level > 0.0;
    path.stroke = Stroke{positive ? palette::homo : palette::negative_line, 0.9,
                         positive ? std::vector<double>{} : std::vector<double>{3.2, 2.2}};
    elements.emplace_back(std::move(path));
  }
}

void add_atoms(std::vector<Element>& elements, const Molecule& molecule, const Plane& plane,
               const Scale& scale) {
  const auto place = [&](int atom) {
    return scale(in_plane(plane, molecule.atoms()[static_cast<std::size_t>(atom)].position));
  };
  const auto lies_in = [&](int atom) {
    const Eigen::Vector3d r =
        molecule.atoms()[static_cast<std::size_t>(atom)].position - plane.origin;
    return std::abs(plane.normal().dot(r)) < in_plane_angstrom;
  };
  for (int a = 0; a < molecule.size(); ++a) {
    if (!lies_in(a)) {
      elements.emplace_back(Disc{place(a), 2.2, {}, Stroke{palette::muted, 0.9, {}}});
    }
  }
  for (int a = 0; a < molecule.size(); ++a) {
    for (int b = a + 1; b < molecule.size(); ++b) {
      if (!lies_in(a) || !lies_in(b) || !are_bonded(molecule, a, b)) continue;
      Path path;
      path.lines = {{place(a), place(b)}};
      path.stroke = Stroke{palette::ink, 1.0, {}};
      elements.emplace_back(std::move(path));
    }
  }
  const bool with_symbols = scale.px_per_angstrom > 17.0;
  for (int a = 0; a < molecule.size(); ++a) {
    if (!lies_in(a)) continue;
    const Point2 at = place(a);
    if (!with_symbols) {
      elements.emplace_back(Disc{at, 2.6, palette::ink, {}});
      continue;
    }
    const std::string symbol(
        element_symbol(molecule.atoms()[static_cast<std::size_t>(a)].atomic_number));
    elements.emplace_back(Disc{at, symbol.size() > 1 ? 8.2 : 6.8, Colour{255, 255, 255},
                               Stroke{palette::ink, 0.8, {}}});
    Text text;
    text.at = {at.x, at.y + 3.6};
    text.runs = plain_text(symbol);
    text.size = 10.0;
    text.colour = palette::ink;
    text.anchor = Anchor::Middle;
    elements.emplace_back(std::move(text));
  }
}

// A length to read distances by, at the lower left of the cell.
void add_scale_bar(std::vector<Element>& elements, const Scale& scale) {
  const double y = 2.0 * scale.half - 2.0;
  Path path;
  path.lines = {{{2.0, y - 3.0},
                 {2.0, y},
                 {2.0 + scale.px_per_angstrom, y},
                 {2.0 + scale.px_per_angstrom, y - 3.0}}};
  path.stroke = Stroke{palette::muted, 1.0, {}};
  elements.emplace_back(std::move(path));
  Text text;
  text.at = {8.0 + scale.px_per_angstrom, y};
  text.runs = plain_text("1 Å");
  text.size = 10.0;
  text.colour = palette::muted;
  elements.emplace_back(std::move(text));
}

std::string level_words(std::span<const ContourMap> maps) {
  double highest = 0.0;
  for (const ContourMap& map : maps) {
    for (const Contour& contour : map.contours) {
      highest = std::max(highest, std::abs(contour.level));
    }
  }
  std::string words;
  for (const double level : contour_levels()) {
    if (level > highest + 1e-12) break;
    words += fmt::format("{}±{:g}", words.empty() ? "" : ", ", level);
  }
  return words;
}

// "x", "(0.71, 0.00, 0.71)"
std::string direction_words(const Eigen::Vector3d& direction) {
  for (int i = 0; i < 3; ++i) {
    if (direction(i) > 1.0 - 1e-9) return std::string(1, "xyz"[i]);
  }
  const auto number = [](double value) {
    const std::string digits = fmt::format("{:.2f}", std::abs(value));
    return (value < 0.0 && digits != "0.00" ? "−" : "") + digits;
  };
  return fmt::format("({}, {}, {})", number(direction.x()), number(direction.y()),
                     number(direction.z()));
}

}  // namespace

Figure contour_sheet(const SheetWords& words, const Molecule& molecule,
                     std::span<const OrbitalCaption> captions, std::span<const ContourMap> maps,
                     std::span<const Plane> planes) {
  assert(captions.size() == maps.size() && maps.size() == planes.size() && !maps.empty());
  Sheet sheet;
  sheet.title = words.title;
  sheet.method = words.method;
  sheet.cell_size = maps.size() == 1 ? 420.0 : 270.0;
  sheet.description = fmt::format("Contour lines of orbitals of {}. ", hill_formula(molecule));
  for (std::size_t i = 0; i < maps.size(); ++i) {
    const Scale scale = scale_for(maps[i], molecule, planes[i], sheet.cell_size);
    SheetCell cell;
    const OrbitalCaption& caption = captions[i];
    cell.name = caption.degeneracy == 1 ? caption.label
                                        : fmt::format("{}:{}", caption.label, caption.partner);
    cell.title =
        fmt::format("{}, {}, {}", cell.name, energy_words(caption.energy_ev), planes[i].words);
    add_contours(cell.elements, maps[i], scale);
    add_atoms(cell.elements, molecule, planes[i], scale);
    add_scale_bar(cell.elements, scale);
    cell.caption = caption_lines(caption);
    cell.caption.push_back(plain_text(planes[i].words));
    cell.caption.push_back(
        plain_text(fmt::format("{} to the right, {} upwards", direction_words(planes[i].right),
                               direction_words(planes[i].up))));
    if (maps[i].contours.empty()) cell.caption.push_back(plain_text("zero here, or nearly so"));
    sheet.description += cell.title + ". ";
    sheet.cells.push_back(std::move(cell));
  }
  sheet.legend = {{"positive phase", palette::homo, false, true},
                  {"negative phase", palette::negative_line, true, true}};
  const std::string levels = level_words(maps);
  if (!levels.empty()) {
    sheet.notes.push_back(plain_text("Lines at " + levels + "\u00A0bohr") +
                          RichText{{"−3/2", Script::Super}} + plain_text("."));
  }
  sheet.notes.push_back(
      plain_text("Discs with symbols are atoms in the plane; small rings are atoms in front of it "
                 "or behind."));
  return sheet_figure(sheet);
}

}  // namespace irrepwise
