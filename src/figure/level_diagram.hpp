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
};

struct DiagramColumn {
  std::string title;  // below the column; may be empty where there is one
  std::vector<DiagramLevel> levels;
};

/// Two levels that belong together: indices of columns and of levels in them.
struct DiagramLink {
  int column_a = 0;
  int level_a = 0;
  int column_b = 0;
  int level_b = 0;
};

struct LevelDiagram {
  std::string title;
  RichText method;  // a line below the title
  std::vector<DiagramColumn> columns;
  std::vector<DiagramLink> links;
  double from_ev = 0.0;  // levels outside are counted in a note, not drawn
  double to_ev = 0.0;
};

/// Energies that show the valence levels around the frontier.
struct EnergyWindow {
  double from_ev = 0.0;
  double to_ev = 0.0;
};

/// From 7 eV below the HOMO to 6 eV above the LUMO, wider where fewer than three occupied or two
/// empty levels lie there, narrower where more than fourteen or ten do.
[[nodiscard]] EnergyWindow frontier_window(const std::vector<DiagramColumn>& columns);

/// Every level of a molecule.
[[nodiscard]] DiagramColumn diagram_column(const PointGroup& group, const Levels& levels);

/// One group of kind "level" per level, with its label as name; degenerate partners side by side,
/// electrons as arrows; levels too close to each other's arrows or labels are moved aside.
/// @throws Error  for a window without levels, or whose end is not above its start
[[nodiscard]] Figure level_diagram_figure(const LevelDiagram& diagram);

}  // namespace irrepwise
