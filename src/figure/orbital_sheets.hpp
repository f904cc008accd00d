// Sheets of orbitals: shaded surfaces, or contour lines in a plane.
#pragma once

#include <span>
#include <string>
#include <vector>

#include "figure/contour_lines.hpp"
#include "figure/figure.hpp"
#include "figure/orbital_scene.hpp"
#include "figure/render.hpp"

namespace irrepwise {

/// What the caption of one orbital says.
struct OrbitalCaption {
  std::string label;  // ASCII, "2e1g"
  int partner = 1;
  int degeneracy = 1;
  double energy_ev = 0.0;
  double occupation = 0.0;  // electrons in the whole level
  std::string mark;         // "HOMO", "LUMO" or empty
};

struct SheetWords {
  std::string title;
  RichText method;
};

/// @param scenes        one per caption; all are drawn to one scale, from one side
/// @param raster_scale  pixels of a surface for one of the figure
[[nodiscard]] Figure surface_sheet(const SheetWords& words, const Molecule& molecule,
                                   std::span<const OrbitalCaption> captions,
                                   std::span<const OrbitalScene> scenes, const Camera& camera,
                                   double raster_scale = 2.0);

/// @param maps, planes  one per caption
[[nodiscard]] Figure contour_sheet(const SheetWords& words, const Molecule& molecule,
                                   std::span<const OrbitalCaption> captions,
                                   std::span<const ContourMap> maps, std::span<const Plane> planes);

/// One square picture of a surface, for the margin of a level diagram.
[[nodiscard]] Raster surface_picture(const OrbitalScene& scene, const Camera& camera, int size_px);

/// First line "2e1g, partner 1 of 2", second line energy, electrons and mark.
[[nodiscard]] std::vector<RichText> caption_lines(const OrbitalCaption& caption);

}  // namespace irrepwise
