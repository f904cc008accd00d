// Level diagrams: levels by energy in one column or several, with links between columns. One model
// for the levels of a molecule, variants side by side, fragments and scans.
#pragma once

#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "figure/figure.hpp"
#include "hueckel/levels.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

enum class FrontierMark { None, Homo, Lumo };

struct DiagramLevel {
  std::string label;  // ASCII, "2e1g"
  double energy_ev = 0.0;
  int degeneracy = 1;
  double occupation = 0.0;  // electrons in the whole level
  FrontierMark frontier = FrontierMark::None;
  std::vector<std::shared_ptr<const Raster>> pictures;  // per partner, or none
  std::string parent = {};  // ASCII, "t2g": what it is called in an ideal polyhedron; may be empty
  bool labelled = true;     // in a diagram of several columns; a pointer over it tells in any case
};

struct DiagramColumn {
  std::string title;                 // below the column; may be empty where there is one
  std::vector<DiagramLevel> levels;  // ascending energy
  std::vector<RichText> notes = {};  // short lines below the title
};

/// Which orbital a link follows through the columns, or how much it matters.
enum class LinkWeight { Plain, Strong, Homo, Lumo };

/// Two levels of neighbouring columns that belong together: the column on the left, and the indices
/// of the levels in it and in the next.
struct DiagramLink {
  int column = 0;
  int left_level = 0;
  int right_level = 0;
  double overlap = 1.0;  // what they have in common, 0 to 1; dashed below `dashed_below`
  LinkWeight weight = LinkWeight::Plain;
};

inline constexpr double dashed_below = 0.6;

/// More columns than this would be too small to read.
inline constexpr int most_columns = 12;

struct LevelDiagram {
  std::string title;
  RichText method;  // a line below the title
  std::vector<DiagramColumn> columns;
  std::vector<DiagramLink> links;
  double from_ev = 0.0;  // levels outside are counted in a note, not drawn
  double to_ev = 0.0;
  std::vector<RichText> notes = {};  // what links and labels mean, a paragraph each
};

/// Energies that show the valence levels around the frontier.
struct EnergyWindow {
  double from_ev = 0.0;
  double to_ev = 0.0;
};

/// From 7 eV below the HOMO to 6 eV above the LUMO, up to twice as wide where fewer than three
/// occupied or two empty levels lie there, narrower where more than fourteen or ten do.
[[nodiscard]] EnergyWindow frontier_window(const std::vector<DiagramColumn>& columns);

/// Every level of a molecule.
[[nodiscard]] DiagramColumn diagram_column(const PointGroup& group, const Levels& levels);

/// One group of kind "level" per level, with its label as name and the title of its column as fact
/// "column"; degenerate partners side by side, levels too close to each other moved aside. A single
/// column shows electrons as arrows; of several, only levels partly filled do, and each link is a
/// group of kind "link" with the facts "from-column", "from-level", "to-column", "to-level".
/// @throws Error  for a window without levels, or whose end is not above its start, or for more
///                than `most_columns` columns
[[nodiscard]] Figure level_diagram_figure(const LevelDiagram& diagram);

}  // namespace irrepwise
