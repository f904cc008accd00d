#include "cli/draw_kind.hpp"

#include <cmath>

#include <CLI/CLI.hpp>

#include <fmt/format.h>

#include "core/error.hpp"
#include "job/variants.hpp"

namespace irrepwise::cli {
namespace {

void refuse(bool given, const char* option, const char* meant_for) {
  if (given) throw CLI::ValidationError(fmt::format("{} is for {} only", option, meant_for));
}

// "../a.xyz" and "a.xyz", but not "homo-1..lumo".
bool is_file_name(const std::string& word) {
  return word.find('/') != std::string::npos ||
         (word.find('.') != std::string::npos && word.find("..") == std::string::npos);
}

void check_options(const DrawOptions& options, DrawKind kind) {
  const bool variants = kind == DrawKind::Variants;
  const bool levels = kind == DrawKind::Levels;
  const bool plane = kind == DrawKind::Contours;
  const bool surface = kind == DrawKind::Surfaces || kind == DrawKind::Mesh;
  const bool grid = surface || kind == DrawKind::Grid || (levels && options.pictures);
  refuse(!variants && !options.reference.empty(), "--reference", "variants side by side");
  refuse(!variants && !options.variants.empty(), "--variants", "variants side by side");
  if (variants && !options.job.variant.empty()) {
    throw CLI::ValidationError(
        "--variant takes one molecule of one job; leave the other files out, or name variants to "
        "lay side by side with --variants");
  }
  if (variants && options.job.is_used()) {
    throw CLI::ValidationError(
        "options that change charge, method or symmetry are for one molecule; for variants, write "
        "it in their job files");
  }
  refuse(!levels && !variants && (options.from_ev || options.to_ev), "--from or --to",
         "level diagrams");
  refuse(!levels && options.pictures, "--pictures", "the level diagram of one molecule");
  refuse(!plane && !options.plane.empty(), "--plane", "contour drawings");
  refuse(!plane && options.offset_angstrom, "--offset", "contour drawings");
  refuse(!surface && !(levels && options.pictures) && options.share, "--share",
         "surfaces and meshes");
  refuse(kind != DrawKind::Surfaces && !(levels && options.pictures) && !options.view.empty(),
         "--view", "pictures of surfaces");
  refuse(!grid && options.spacing_angstrom, "--spacing", "surfaces, meshes and grids");
  for (const std::optional<double>& number :
       {options.from_ev, options.to_ev, options.offset_angstrom}) {
    if (number && !std::isfinite(*number)) {
      throw CLI::ValidationError("--from, --to and --offset need finite numbers");
    }
  }
}

}  // namespace

DrawFormat draw_format(const std::string& output) {
  const std::size_t point = output.rfind('.');
  const std::string ending = point == std::string::npos ? "" : output.substr(point);
  if (ending == ".svg") return DrawFormat::Svg;
  if (ending == ".png") return DrawFormat::Png;
  if (ending == ".glb") return DrawFormat::Glb;
  if (ending == ".vti") return DrawFormat::Vti;
  throw Error(fmt::format(
      "{}: cannot draw into a file of this kind; end its name in .svg or .png for pictures, .glb "
      "for a mesh or .vti for values on a grid",
      output));
}

void sort_words(DrawOptions& options) {
  for (const std::string& word : options.words) {
    (is_file_name(word) ? options.others : options.orbitals).push_back(word);
  }
}

DrawKind draw_kind(const DrawOptions& options) {
  const DrawFormat format = draw_format(options.output);
  const bool solid = format == DrawFormat::Glb || format == DrawFormat::Vti;
  if (options.orbitals.empty() && solid) {
    throw Error(
        fmt::format("{}: a level diagram is written as .svg or .png; name an orbital, such "
                    "as homo, for this file",
                    options.output));
  }
  const bool plane_asked = options.contours || !options.plane.empty();
  if (solid && plane_asked) {
    throw Error(fmt::format("{}: a contour drawing is written as .svg or .png", options.output));
  }
  if (options.orbitals.empty() && plane_asked) {
    throw CLI::ValidationError("--contours and --plane need an orbital, such as homo");
  }
  if (!options.orbitals.empty() && !options.others.empty()) {
    throw CLI::ValidationError(
        "orbitals are drawn of one molecule; give one file with them, or several without");
  }
  DrawKind kind = DrawKind::Levels;
  const bool whole_job = options.orbitals.empty() && options.job.variant.empty();
  if (!options.others.empty() || (whole_job && has_variants(options.job.file))) {
    kind = DrawKind::Variants;
  }
  if (!options.orbitals.empty()) {
    switch (format) {
      case DrawFormat::Svg:
        kind = DrawKind::Contours;
        break;
      case DrawFormat::Png:
        kind = plane_asked ? DrawKind::Contours : DrawKind::Surfaces;
        break;
      case DrawFormat::Glb:
        kind = DrawKind::Mesh;
        break;
      case DrawFormat::Vti:
        kind = DrawKind::Grid;
        break;
    }
  }
  check_options(options, kind);
  return kind;
}

}  // namespace irrepwise::cli
