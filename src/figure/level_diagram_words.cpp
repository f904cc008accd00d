#include "figure/level_diagram_words.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include <fmt/format.h>

#include "core/error.hpp"
#include "figure/level_placing.hpp"
#include "figure/rich_text.hpp"

namespace irrepwise {
namespace {

std::string count_words(int n, const char* where) {
  return fmt::format("{} {} {}", n, n == 1 ? "level" : "levels", where);
}

}  // namespace

std::string words_on_left_out(const LevelDiagram& diagram) {
  struct Range {
    int least = std::numeric_limits<int>::max();
    int most = 0;
  };
  Range below;
  Range above;
  for (const DiagramColumn& column : diagram.columns) {
    int n_below = 0;
    int n_above = 0;
    for (const DiagramLevel& level : column.levels) {
      n_below += level.energy_ev < diagram.from_ev ? 1 : 0;
      n_above += level.energy_ev > diagram.to_ev ? 1 : 0;
    }
    below = {std::min(below.least, n_below), std::max(below.most, n_below)};
    above = {std::min(above.least, n_above), std::max(above.most, n_above)};
  }
  const auto words_on = [](const Range& range, const char* where) {
    if (range.least == range.most) return count_words(range.most, where);
    return fmt::format("{} to {} levels {}", range.least, range.most, where);
  };
  std::string words;
  if (below.most > 0) words = words_on(below, "below");
  if (above.most > 0) words += (words.empty() ? "" : ", ") + words_on(above, "above");
  if (words.empty()) return words;
  return words + " the range shown" + (diagram.columns.size() > 1 ? ", in each column" : "");
}

std::string words_on_fractions(const LevelDiagram& diagram) {
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      if (is_shown(diagram, level) &&
          std::abs(level.occupation - std::round(level.occupation)) > 1e-9) {
        const std::string of = diagram.columns.size() > 1 ? " of " + column.title : "";
        return fmt::format("{}{} holds {:g} electrons, spread evenly", level.label, of,
                           level.occupation);
      }
    }
  }
  return {};
}

std::string spoken_levels(const LevelDiagram& diagram) {
  std::string text = fmt::format("Orbital energies from {} to {}. ",
                                 energy_words(diagram.from_ev, 1), energy_words(diagram.to_ev, 1));
  for (const DiagramColumn& column : diagram.columns) {
    if (!column.title.empty()) text += column.title + ": ";
    for (auto level = column.levels.rbegin(); level != column.levels.rend(); ++level) {
      if (!is_shown(diagram, *level)) continue;
      text += fmt::format("{} at {}, {:g} electrons{}; ", level->label,
                          energy_words(level->energy_ev, 2), level->occupation,
                          level->frontier == FrontierMark::Homo   ? " (HOMO)"
                          : level->frontier == FrontierMark::Lumo ? " (LUMO)"
                                                                  : "");
    }
  }
  if (text.ends_with("; ")) text.replace(text.size() - 2, 2, ".");
  return text;
}

void check_diagram(const LevelDiagram& diagram) {
  if (diagram.columns.size() > static_cast<std::size_t>(most_columns)) {
    throw Error(
        fmt::format("{} columns of levels are too many for one diagram; choose up to {} of them",
                    diagram.columns.size(), most_columns));
  }
  constexpr double farthest_ev = 1e4;  // beyond it a decimal point has slipped
  if (!(std::abs(diagram.from_ev) <= farthest_ev && std::abs(diagram.to_ev) <= farthest_ev)) {
    throw Error(
        fmt::format("the range of energies runs from {} to {} eV; expected energies between -{} "
                    "and {} eV",
                    diagram.from_ev, diagram.to_ev, farthest_ev, farthest_ev));
  }
  if (!(diagram.to_ev > diagram.from_ev)) {
    throw Error(
        fmt::format("the range of energies runs from {} to {} eV; its end must lie above "
                    "its start",
                    diagram.from_ev, diagram.to_ev));
  }
  double lowest = std::numeric_limits<double>::infinity();
  double highest = -lowest;
  for (const DiagramColumn& column : diagram.columns) {
    for (const DiagramLevel& level : column.levels) {
      if (is_shown(diagram, level)) return;
      lowest = std::min(lowest, level.energy_ev);
      highest = std::max(highest, level.energy_ev);
    }
  }
  throw Error(fmt::format("no level lies between {} and {} eV; they run from {:.3f} to {:.3f} eV",
                          diagram.from_ev, diagram.to_ev, lowest, highest));
}

}  // namespace irrepwise
