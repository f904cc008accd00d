// What `draw` is asked to make, as far as the options alone tell.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "cli/job_options.hpp"

namespace irrepwise::cli {

enum class DrawKind { Levels, Variants, Contours, Surfaces, Mesh, Grid };
enum class DrawFormat { Svg, Png, Glb, Vti };

struct DrawOptions {
  JobOptions job;
  std::vector<std::string> words;     // what follows the file on the command line
  std::vector<std::string> orbitals;  // of these, those that name orbitals
  std::vector<std::string> others;    // of these, further files
  std::string output;
  // of level diagrams
  std::optional<double> from_ev;
  std::optional<double> to_ev;
  bool pictures = false;
  // of variants side by side
  std::string reference;
  std::vector<std::string> variants;
  // of contour drawings
  bool contours = false;
  std::string plane;
  std::optional<double> offset_angstrom;
  // of surfaces, meshes and grids
  std::optional<double> share;
  std::string view;
  std::optional<double> spacing_angstrom;
};

/// By the ending of the output file: .svg, .png, .glb or .vti.
/// @throws Error  for another
[[nodiscard]] DrawFormat draw_format(const std::string& output);

/// Puts each word where it belongs: a name of a file has a folder or an ending, an orbital has not.
void sort_words(DrawOptions& options);

/// Without orbitals a level diagram, of variants side by side where there are several files or the
/// job has variants; otherwise contours (.svg), surfaces (.png), a mesh (.glb) or a
/// grid (.vti).
/// @throws Error                 where the file cannot hold what is asked for
/// @throws CLI::ValidationError  for options that have no meaning for the kind
[[nodiscard]] DrawKind draw_kind(const DrawOptions& options);

}  // namespace irrepwise::cli
