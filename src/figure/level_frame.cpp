#include "figure/level_frame.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include <fmt/format.h>

#include "figure/level_diagram_words.hpp"
#include "figure/palette.hpp"
#include "figure/rich_text.hpp"
#include "figure/text_layout.hpp"

namespace irrepwise::level_frame {
namespace {

double tick_step(double per_ev) {
  for (const double step : {0.1, 0.2, 0.5, 1.0, 2.0, 5.0, 10.0, 20.0, 50.0}) {
    if (step * per_ev >= 44.0) return step;
  }
  return 100.0;
}

struct Tick {
  double energy_ev = 0.0;
  double y = 0.0;
};

std::vector<Tick> ticks(const LevelDiagram& diagram, double top, double per_ev) {
  const double step = tick_step(per_ev);
  const auto first = static_cast<int>(std::ceil(diagram.from_ev / step - 1e-9));
  const auto last = static_cast<int>(std::floor(diagram.to_ev / step + 1e-9));
  std::vector<Tick> out;
  for (int k = first; k <= last; ++k) {
    out.push_back({k * step, top + (diagram.to_ev - k * step) * per_ev});
  }
  return out;
}

Path arrow(double x, double y, double height, bool up, Colour colour) {
  const double half = 0.5 * height;
  const double head = std::min(4.6, 0.34 * height);
  const double tip = up ? y - half : y + half;
  const double tail = up ? y + half : y - half;
  const double back = up ? tip + head : tip - head;
  Path path;
  path.lines = {{{x, tail}, {x, tip}}, {{x - 2.7, back}, {x, tip}, {x + 2.7, back}}};
  path.stroke = Stroke{colour, 1.3, {}};
  return path;
}

}  // namespace

Colour level_colour(const DiagramLevel& level) {
  switch (level.frontier) {
    case FrontierMark::Homo:
      return palette::homo;
    case FrontierMark::Lumo:
      return palette::lumo;
    case FrontierMark::None:
      break;
  }
  return level.occupation > 0.0 ? palette::ink : palette::empty;
}

std::string level_title(const DiagramLevel& level) {
  return fmt::format("{}{}: {}, {:g} of {} electrons", level.label,
                     level.parent.empty() ? "" : " (" + level.parent + ")",
                     energy_words(level.energy_ev), level.occupation, 2 * level.degeneracy);
}

Path line(double x0, double y0, double x1, double y1, Colour colour, double width,
          std::vector<double> dashes) {
  Path path;
  path.lines = {{{x0, y0}, {x1, y1}}};
  path.stroke = Stroke{colour, width, std::move(dashes)};
  return path;
}

void add_bars(Group& group, const DiagramLevel& level, const Bars& bars, double thickness) {
  for (int partner = 0; partner < level.degeneracy; ++partner) {
    const double x = bars.left + partner * (bars.length + bars.gap);
    group.elements.emplace_back(
        line(x, bars.y, x + bars.length, bars.y, level_colour(level), thickness));
  }
}

void add_electrons(Group& group, const DiagramLevel& level, const Bars& bars, double height) {
  const Colour colour = level_colour(level);
  const double whole = std::round(level.occupation);
  if (std::abs(level.occupation - whole) > 1e-9) return;  // the note says how many
  const int electrons = static_cast<int>(whole);
  const double apart = std::min(4.5, 0.22 * bars.length);
  for (int partner = 0; partner < level.degeneracy; ++partner) {
    const double x = bars.left + partner * (bars.length + bars.gap) + 0.5 * bars.length;
    const bool one = electrons > partner;
    const bool two = electrons > level.degeneracy + partner;
    if (two) {
      group.elements.emplace_back(arrow(x - apart, bars.y, height, true, colour));
      group.elements.emplace_back(arrow(x + apart, bars.y, height, false, colour));
    } else if (one) {
      group.elements.emplace_back(arrow(x, bars.y, height, true, colour));
    }
  }
}

Group axis(const LevelDiagram& diagram, double x, double top, double per_ev) {
  Group group;
  group.kind = "axis";
  const double bottom = top + (diagram.to_ev - diagram.from_ev) * per_ev;
  group.elements.emplace_back(line(x, top, x, bottom, palette::muted, 1.0));
  const int digits = tick_step(per_ev) < 1.0 ? 1 : 0;
  for (const Tick& tick : ticks(diagram, top, per_ev)) {
    group.elements.emplace_back(line(x - 5.0, tick.y, x, tick.y, palette::muted, 1.0));
    Text text;
    text.at = {x - 9.0, tick.y + 0.35 * small_size};
    text.runs = plain_text((tick.energy_ev < 0.0 ? "−" : "") +
                           fmt::format("{:.{}f}", std::abs(tick.energy_ev), digits));
    text.size = small_size;
    text.colour = palette::muted;
    text.anchor = Anchor::End;
    group.elements.emplace_back(std::move(text));
  }
  Text title;
  title.at = {x - 48.0, 0.5 * (top + bottom)};
  title.runs = plain_text("orbital energy / eV");
  title.size = small_size;
  title.colour = palette::muted;
  title.anchor = Anchor::Middle;
  title.upwards = true;
  group.elements.emplace_back(std::move(title));
  return group;
}

Group grid(const LevelDiagram& diagram, double left, double right, double top, double per_ev) {
  Group group;
  group.kind = "grid";
  for (const Tick& tick : ticks(diagram, top, per_ev)) {
    group.elements.emplace_back(line(left, tick.y, right, tick.y, palette::grid, 1.0));
  }
  return group;
}

double add_heading(Figure& figure, const LevelDiagram& diagram, const Font& font, double width) {
  Group group;
  group.kind = "heading";
  double y = margin - 4.0;
  for (const RichText& row : wrapped(font, heading_text(diagram.title), title_size, width)) {
    y += title_size + 3.0;
    group.elements.emplace_back(text_at({margin, y}, row, title_size, palette::ink));
  }
  y += 4.0;
  for (const RichText& row : wrapped(font, diagram.method, small_size, width)) {
    y += line_height;
    group.elements.emplace_back(text_at({margin, y}, row, small_size, palette::muted));
  }
  figure.groups.push_back(std::move(group));
  return y;
}

double add_notes(Figure& figure, const LevelDiagram& diagram, const Font& font, double width,
                 double y) {
  Group group;
  group.kind = "notes";
  std::vector<RichText> notes = diagram.notes;
  for (const std::string& words : {words_on_left_out(diagram), words_on_fractions(diagram)}) {
    if (!words.empty()) notes.push_back(plain_text(words));
  }
  for (const RichText& note : notes) {
    for (const RichText& row : wrapped(font, note, small_size, width)) {
      y += line_height;
      group.elements.emplace_back(text_at({margin, y}, row, small_size, palette::muted));
    }
  }
  if (!group.elements.empty()) figure.groups.push_back(std::move(group));
  return y;
}

}  // namespace irrepwise::level_frame
