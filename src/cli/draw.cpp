// irrepwise draw: level diagrams, contour drawings and surfaces of orbitals, meshes and grids.
#include <cstdio>
#include <memory>

#include <unistd.h>

#include <fmt/format.h>

#include "cli/axis.hpp"
#include "cli/commands.hpp"
#include "cli/compared.hpp"
#include "cli/computed.hpp"
#include "cli/draw_kind.hpp"
#include "cli/draw_variants.hpp"
#include "cli/orbital_choice.hpp"
#include "cli/output_options.hpp"
#include "cli/variant_option.hpp"
#include "core/at_place.hpp"
#include "core/error.hpp"
#include "core/output_file.hpp"
#include "figure/gltf.hpp"
#include "figure/level_diagram.hpp"
#include "figure/orbital_sheets.hpp"
#include "figure/paint.hpp"
#include "figure/rich_text.hpp"
#include "figure/svg.hpp"
#include "figure/vti.hpp"
#include "output/orbital_pictures.hpp"

namespace irrepwise::cli {
namespace {

struct Drawn {
  std::string bytes;
  std::vector<std::string> remarks;  // a line each on standard output
};

std::string picture_bytes(const Figure& figure, DrawFormat format) {
  return format == DrawFormat::Svg ? svg_document(figure) : png_bytes(painted(figure));
}

Camera camera_for(const LevelsResult& result, const std::vector<OrbitalScene>& scenes,
                  const std::string& view) {
  if (view.empty()) {
    std::vector<Scene> plain;
    for (const OrbitalScene& scene : scenes) plain.push_back(scene.scene);
    return best_camera(plain);
  }
  const bool minus = view.starts_with("-") && view.size() == 2;
  const std::string axis = minus ? view.substr(1) : view;
  for (int i = 0; i < 3; ++i) {
    if (axis == std::string(1, "xyz"[i])) {
      return camera_from((minus ? -1.0 : 1.0) * Eigen::Vector3d::Unit(i));
    }
  }
  const Molecule& molecule = result.symmetry.molecule;
  const AxisDirection direction = parse_axis(view, molecule);
  Eigen::Vector3d towards = Eigen::Vector3d::Zero();
  if (const auto* vector = std::get_if<Eigen::Vector3d>(&direction)) {
    towards = *vector;
  } else {
    const auto& atoms = std::get<std::vector<int>>(direction);
    const auto at = [&](std::size_t i) -> const Eigen::Vector3d& {
      return molecule.atoms()[static_cast<std::size_t>(atoms[i])].position;
    };
    if (atoms.size() == 3)
      return camera_from(atoms_plane(molecule, {atoms[0], atoms[1], atoms[2]}).normal());
    towards = atoms.size() == 1 ? at(0) : Eigen::Vector3d(at(1) - at(0));
  }
  if (!(towards.norm() > 1e-6)) {
    throw Error(
        fmt::format("'{}' gives no direction; use x, y, z, a vector such as 1,1,0.5 or "
                    "atoms away from the centre",
                    view));
  }
  return camera_from(towards);
}

SurfaceChoice surface_choice(const DrawOptions& options) {
  SurfaceChoice choice;
  if (options.share) {
    at_place("--share", [&] { check_share(*options.share); });
    choice.share = *options.share;
  }
  choice.spacing_angstrom = options.spacing_angstrom;
  return choice;
}

Drawn draw_levels(const LevelsResult& result, const DrawOptions& options) {
  LevelDiagram diagram;
  const SheetWords words = sheet_heading(result);
  diagram.title = words.title;
  diagram.method = words.method;
  diagram.columns = {diagram_column(result.symmetry.group, result.levels)};
  const EnergyWindow window = frontier_window(diagram.columns);
  diagram.from_ev = options.from_ev.value_or(window.from_ev);
  diagram.to_ev = options.to_ev.value_or(window.to_ev);
  Drawn out;
  if (options.pictures) {
    const ChosenOrbitals chosen = chosen_orbitals(result, frontier_orbitals(result.levels));
    const OrbitalSurfaces surfaces = orbital_surfaces(result, chosen, surface_choice(options));
    const Camera camera =
        at_place("--view", [&] { return camera_for(result, surfaces.scenes, options.view); });
    constexpr int picture_px = 260;
    for (std::size_t i = 0; i < surfaces.scenes.size(); ++i) {
      const auto level = static_cast<std::size_t>(chosen.choices[i].level);
      diagram.columns[0].levels[level].pictures.push_back(
          std::make_shared<const Raster>(surface_picture(surfaces.scenes[i], camera, picture_px)));
    }
    out.remarks = surfaces.remarks;
    diagram.notes.push_back(plain_text(fmt::format(
        "Pictures: surfaces that enclose {:g}\u00A0% of the density, blue where the orbital is "
        "positive, amber where it is negative; degenerate partners side by side.",
        100.0 * surfaces.scenes.front().share)));
  }
  out.bytes = picture_bytes(level_diagram_figure(diagram), draw_format(options.output));
  return out;
}

Plane plane_for(const LevelsResult& result, const OrbitalField& field, int orbital,
                const DrawOptions& options) {
  const Molecule& molecule = result.symmetry.molecule;
  if (options.plane.empty() && !options.offset_angstrom) {
    return telling_plane(molecule, field, orbital);
  }
  if (options.plane.find(',') == std::string::npos) {
    return axes_plane(options.plane.empty() ? "xy" : options.plane,
                      options.offset_angstrom.value_or(0.0));
  }
  if (options.offset_angstrom) throw Error("--offset goes with xy, xz or yz, not with atoms");
  const AxisDirection direction = parse_axis(options.plane, molecule);
  const auto* atoms = std::get_if<std::vector<int>>(&direction);
  if (atoms == nullptr || atoms->size() != 3) {
    throw Error(fmt::format("'{}' is no plane; expected xy, xz, yz or three atoms", options.plane));
  }
  return atoms_plane(molecule, {(*atoms)[0], (*atoms)[1], (*atoms)[2]});
}

Drawn draw_contours(const LevelsResult& result, const ChosenOrbitals& chosen,
                    const DrawOptions& options) {
  const Molecule& molecule = result.symmetry.molecule;
  std::vector<Plane> planes;
  std::vector<ContourMap> maps;
  for (std::size_t i = 0; i < chosen.choices.size(); ++i) {
    const OrbitalField field(molecule, result.basis,
                             chosen.coefficients.col(static_cast<Eigen::Index>(i)));
    planes.push_back(at_place("--plane", [&] { return plane_for(result, field, 0, options); }));
    maps.push_back(contour_map(field, 0, planes.back(), contour_levels()));
  }
  const Figure figure =
      contour_sheet(sheet_heading(result), molecule, chosen.captions, maps, planes);
  Drawn out;
  out.bytes = picture_bytes(figure, draw_format(options.output));
  for (std::size_t i = 0; i < planes.size(); ++i) {
    out.remarks.push_back(chosen.names[i] + ": " + planes[i].words);
  }
  return out;
}

Drawn draw_surfaces(const LevelsResult& result, const ChosenOrbitals& chosen,
                    const DrawOptions& options) {
  const OrbitalSurfaces surfaces = orbital_surfaces(result, chosen, surface_choice(options));
  const Camera camera =
      at_place("--view", [&] { return camera_for(result, surfaces.scenes, options.view); });
  const Figure figure = surface_sheet(sheet_heading(result), result.symmetry.molecule,
                                      chosen.captions, surfaces.scenes, camera);
  return {picture_bytes(figure, draw_format(options.output)), surfaces.remarks};
}

Drawn draw_mesh(const LevelsResult& result, const ChosenOrbitals& chosen,
                const DrawOptions& options) {
  if (chosen.choices.size() != 1) {
    throw Error(fmt::format("{}: a mesh holds one orbital and {} are meant; choose one, such as {}",
                            options.output, chosen.choices.size(), chosen.names.front()));
  }
  const OrbitalSurfaces surfaces = orbital_surfaces(result, chosen, surface_choice(options));
  const OrbitalScene& scene = surfaces.scenes.front();
  const std::vector<std::pair<std::string, std::string>> facts = {
      {"orbital", chosen.names.front()},
      {"energy_ev", fmt::format("{}", chosen.captions.front().energy_ev)},
      {"isovalue_bohr", fmt::format("{}", scene.isovalue)},
      {"share_enclosed", fmt::format("{}", scene.share)},
      {"density_integral", fmt::format("{}", scene.integral)},
      {"unit_of_length", "angstrom"},
      {"molecule", charged_formula(result.molecule)},
      {"point_group", result.symmetry.group.symbol().name()},
      {"method", method_words(result)}};
  return {glb_bytes(scene.scene, facts), surfaces.remarks};
}

Drawn draw_grid(const LevelsResult& result, const ChosenOrbitals& chosen,
                const DrawOptions& options) {
  const Molecule& molecule = result.symmetry.molecule;
  const OrbitalField field(molecule, result.basis, chosen.coefficients);
  const OrbitalGrid grid = sample(field, options.spacing_angstrom);
  Drawn out{vti_document(grid, chosen.names, molecule), {}};
  for (std::size_t i = 0; i < chosen.names.size(); ++i) {
    const std::array<int, 3>& n = grid.shape.size;
    out.remarks.push_back(fmt::format(
        "{}: integral of the density on the grid {:.4f} ({} x {} x {} "
        "points, spacing {:.3g} Å)",
        chosen.names[i], grid.integrals[i], n[0], n[1], n[2], grid.shape.spacing_angstrom));
  }
  return out;
}

Drawn drawn(const LevelsResult& result, const DrawOptions& options, DrawKind kind) {
  if (kind == DrawKind::Levels) return draw_levels(result, options);
  const ChosenOrbitals chosen = chosen_orbitals(result, choose_orbitals(options.orbitals, result));
  switch (kind) {
    case DrawKind::Levels:
    case DrawKind::Variants:
      break;
    case DrawKind::Contours:
      return draw_contours(result, chosen, options);
    case DrawKind::Surfaces:
      return draw_surfaces(result, chosen, options);
    case DrawKind::Mesh:
      return draw_mesh(result, chosen, options);
    case DrawKind::Grid:
      return draw_grid(result, chosen, options);
  }
  return {};
}

void draw_variants(const DrawOptions& options) {
  std::vector<std::string> files = {options.job.file};
  files.insert(files.end(), options.others.begin(), options.others.end());
  const Compared result = compared(files, options.reference);
  OutputOptions output;
  output.output = options.output;
  refuse_to_overwrite(output, result.files_read);
  const Figure figure = variants_figure(result.comparison, options);
  print_warnings(output, warnings_of(result.comparison));
  write_file(options.output, picture_bytes(figure, draw_format(options.output)));
}

void run(DrawOptions options) {
  sort_words(options);
  const DrawKind kind = draw_kind(options);
  if (kind == DrawKind::Variants) {
    draw_variants(options);
    return;
  }
  const Job job = read_job_with(options.job);
  OutputOptions output;
  output.output = options.output;
  refuse_to_overwrite(output, job.source_files);
  const LevelsResult result = computed(job, job_place(options.job));
  const Drawn picture = drawn(result, options, kind);
  print_warnings(output, result.warnings);
  write_file(options.output, picture.bytes);
  const std::string variants = words_on_variants(options.job.file, options.job.variant);
  std::string remarks = variants.empty() ? "" : "variant: " + variants + "\n";
  for (const std::string& remark : picture.remarks) remarks += remark + "\n";
  write_descriptor(STDOUT_FILENO, remarks, "standard output");
}

}  // namespace

Command add_draw(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "draw", "Level diagrams and pictures of orbitals; meshes and grids for other viewers");
  const auto options = std::make_shared<DrawOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  add_job_options(*app, options->job);
  app->add_option("orbitals", options->words,
                  std::string("Which: ") + orbital_words_help +
                      ". Without any a level diagram is drawn. Further files: their levels side by "
                      "side, as those of a job with `variants:`")
      ->option_text("ORBITAL ... | FILE ...");
  app->add_option("-o,--output", options->output,
                  "File to write. Level diagrams: .svg, .png. Orbitals: .svg contour lines, .png "
                  "shaded surfaces, .glb mesh (glTF 2.0), .vti grid (VTK ImageData)")
      ->required()
      ->option_text("FILE")
      ->group("Output");
  const auto add = [&](const char* name, auto& value, const char* text, const char* help,
                       const char* group) {
    app->add_option(name, value, help)->option_text(text)->group(group);
  };
  add("--from", options->from_ev, "eV", "Lowest energy shown", "Level diagrams");
  add("--to", options->to_ev, "eV", "Highest energy shown", "Level diagrams");
  app->add_flag("--pictures", options->pictures, "Show HOMO and LUMO beside their levels")
      ->group("Level diagrams");
  add("-r,--reference", options->reference, "NAME",
      "Variant whose HOMO and LUMO are followed; the first by default", "Variants side by side");
  app->add_option("--variants", options->variants, "Which to draw, in this order, with commas")
      ->delimiter(',')
      ->option_text("NAMES")
      ->group("Variants side by side");
  app->add_flag("--contours", options->contours, "Contour lines also in a .png file")
      ->group("Contour lines");
  add("--plane", options->plane, "PLANE",
      "xy, xz, yz or three atoms (Pt1,Cl2,Cl3); by default the plane with most to show",
      "Contour lines");
  add("--offset", options->offset_angstrom, "Å", "Shifts the plane along its third axis",
      "Contour lines");
  add("--share", options->share, "S", "Part of the density inside the surface; 0.5 by default",
      "Surfaces and grids");
  add("--view", options->view, "FROM",
      "Where the eye is: x, -z, a vector (1,1,0.5; standard frame) or atoms; by default where "
      "the lobes show best",
      "Surfaces and grids");
  add("--spacing", options->spacing_angstrom, "Å",
      "Between points of the grid; by default 0.15 or finer, by the size of the molecule",
      "Surfaces and grids");
  app->footer(
      "Axes and partners are those of the standard frame, as `irrepwise levels` states them.\n"
      "Exit code: 0 done, 1 something is wrong with input or computation, 2 with the options.\n\n"
      "Examples:\n"
      "  irrepwise draw complex.xyz --charge -2 --output levels.svg\n"
      "  irrepwise draw family.yaml --reference chloride --output variants.svg\n"
      "  irrepwise draw family.yaml homo --variant chloride --output homo.png\n"
      "  irrepwise draw complex.xyz homo-1..lumo --output orbitals.png\n"
      "  irrepwise draw complex.xyz 2eg --plane xy --output contours.svg\n"
      "  irrepwise draw complex.xyz 2eg:1 --share 0.8 --output orbital.glb");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
