#include "page/molecule_page.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

#include "core/text.hpp"
#include "figure/level_diagram.hpp"
#include "figure/svg.hpp"
#include "output/caption_words.hpp"
#include "output/html_parts.hpp"
#include "output/levels_report.hpp"
#include "output/orbital_pictures.hpp"
#include "output/orbital_table_layout.hpp"
#include "output/symmetry_report.hpp"
#include "page/page_parts.hpp"
#include "page/page_surfaces.hpp"

namespace irrepwise {
namespace {

constexpr int all_columns = 10'000;  // a page scrolls where a terminal breaks
constexpr int screen_columns = 115;
constexpr int every_level = 1'000'000;

LevelDiagram diagram_of(const LevelsResult& result, const PageOptions& options) {
  LevelDiagram diagram;
  diagram.columns = {diagram_column(result.symmetry.group, result.levels)};
  const EnergyWindow window = frontier_window(diagram.columns);
  diagram.from_ev = options.from_ev.value_or(window.from_ev);
  diagram.to_ev = options.to_ev.value_or(window.to_ev);
  const SheetWords words = sheet_heading(result);
  diagram.title = words.title;
  diagram.method = words.method;
  return diagram;
}

// Of the levels that the diagram shows; of a large molecule, of those nearest to the frontier.
std::vector<Table> coefficient_tables(const LevelsResult& result, const PageMolecule& shown,
                                      const Provenance& provenance) {
  constexpr int most_entries = 8'000;  // of which a reader can still make something
  std::vector<int> levels;
  for (const PageLevel& level : shown.levels) levels.push_back(level.level);
  std::stable_sort(levels.begin(), levels.end(), [&](int a, int b) {
    return levels_from_frontier(result.levels, a) < levels_from_frontier(result.levels, b);
  });
  std::size_t kept = 0;
  for (int columns = 0; kept < levels.size(); ++kept) {
    columns += result.levels.levels[static_cast<std::size_t>(levels[kept])].degeneracy;
    if (kept > 1 && columns * result.basis.n_orbitals > most_entries) break;
  }
  levels.resize(kept);
  std::sort(levels.begin(), levels.end());
  std::vector<OrbitalChoice> choices;
  for (const int level : levels) {
    const std::vector<OrbitalChoice> partners = partners_of(result.levels, level);
    choices.insert(choices.end(), partners.begin(), partners.end());
  }
  OrbitalTableLayout layout;
  layout.width = screen_columns;
  if (!provenance.files.empty()) layout.source = file_name(provenance.files.front().name);
  return orbital_tables(result, orbital_table(result, choices, {}), layout);
}

// The pictures of HOMO and LUMO stand in the page also where no script runs, and on paper.
struct FrontierFigure {
  std::string html;
  Eigen::Vector3d eye;  // from where it is seen
};

FrontierFigure frontier_figure(const LevelsResult& result) {
  const ChosenOrbitals chosen = chosen_orbitals(result, frontier_orbitals(result.levels));
  const OrbitalSurfaces surfaces = orbital_surfaces(result, chosen, {});
  std::vector<Scene> scenes;
  for (const OrbitalScene& scene : surfaces.scenes) scenes.push_back(scene.scene);
  const Camera camera = best_camera(scenes);
  const double raster_scale = scenes.size() > 6 ? 1.0 : 1.5;  // many pictures make a heavy page
  const Figure figure = surface_sheet(sheet_heading(result), result.symmetry.molecule,
                                      chosen.captions, surfaces.scenes, camera, raster_scale);
  return {"<figure class=\"scroll\">\n" + svg_element(figure, "frontier") + "</figure>\n",
          camera.towards};
}

}  // namespace

std::string molecule_page(const LevelsResult& result, const SymmetryResult& symmetry,
                          const Provenance& provenance, const PageOptions& options) {
  const Report levels = levels_report(result, {.all = true});
  const Report summary = levels_report(result);
  const Report about_symmetry = symmetry_report(symmetry, {}, {}, all_columns);
  const LevelDiagram diagram = diagram_of(result, options);

  std::vector<PageMolecule> molecules = {
      page_molecule(readable_formula(result.molecule), result, {diagram.from_ev, diagram.to_ev})};
  add_surfaces(molecules, every_level, options.threads);

  const FrontierFigure frontier = frontier_figure(result);
  HtmlPage page;
  page.title = levels.title;
  page.generator = generator_words(provenance);
  page.head_html = facts_html(levels.facts) + warnings_html(levels.warnings);
  page.sections.push_back(levels_section(level_diagram_figure(diagram), DiagramRoom::Beside));
  page.sections.push_back({"frontier", "Frontier orbitals", frontier.html});
  page.sections.push_back(
      {"energies", "Energies and compositions", tables_html({levels.tables.front()})});
  page.sections.push_back({"coefficients", "Coefficients",
                           tables_html(coefficient_tables(result, molecules.front(), provenance))});
  page.sections.push_back({"populations", "Charges and bonds",
                           tables_html({summary.tables.begin() + 1, summary.tables.end()})});
  page.sections.push_back({"symmetry", "Symmetry",
                           facts_html(about_symmetry.facts) + tables_html(about_symmetry.tables)});
  page.sections.push_back({"geometry", "Geometry", tables_html({geometry_table(result)})});
  page.sections.push_back(method_section(molecules, levels.remarks));
  page.sections.push_back(repeat_section(provenance));
  page.data = page_data(molecules, frontier.eye);
  return html_document(page);
}

}  // namespace irrepwise
