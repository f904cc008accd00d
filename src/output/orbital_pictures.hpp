// Orbitals of a result chosen for drawing, their captions and their surfaces: what `draw` and the
// page make pictures from.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "figure/orbital_scene.hpp"
#include "figure/orbital_sheets.hpp"
#include "output/levels_result.hpp"
#include "output/orbital_choice.hpp"

namespace irrepwise {

struct ChosenOrbitals {
  std::vector<OrbitalChoice> choices;
  std::vector<OrbitalCaption> captions;
  std::vector<std::string> names;  // "2e1g" or "2e1g:1"
  Eigen::MatrixXd coefficients;    // `n_orbitals x n_choices`, standard frame
};

[[nodiscard]] ChosenOrbitals chosen_orbitals(const LevelsResult& result,
                                             std::vector<OrbitalChoice> choices);

struct SurfaceChoice {
  double share = 0.5;  // of the density inside the surface
  std::optional<double> spacing_angstrom = {};
};

struct OrbitalSurfaces {
  std::vector<OrbitalScene> scenes;  // one per chosen orbital
  std::vector<std::string> remarks;  // isovalue, share and grid in words, one per chosen orbital
};

/// Partners of a level share a grid; each level has one of its own size.
///
/// @throws Error  as `sample` with the orbital as its place, and as `enclosing_isovalue`
[[nodiscard]] OrbitalSurfaces orbital_surfaces(const LevelsResult& result,
                                               const ChosenOrbitals& chosen,
                                               const SurfaceChoice& choice);

/// "extended Hückel, weighted rule, K = 1.75 · parameters: …"
[[nodiscard]] std::string method_words(const LevelsResult& result);

/// Title and method line of a drawing; the formula stands for a missing title.
[[nodiscard]] SheetWords sheet_heading(const LevelsResult& result);

}  // namespace irrepwise
