#include "page/comparison_page.hpp"

#include <algorithm>
#include <numeric>
#include <utility>

#include <fmt/format.h>
#include <Eigen/Core>

#include "core/text.hpp"
#include "output/character_tables.hpp"
#include "output/compare_report.hpp"
#include "output/html_parts.hpp"
#include "output/html_text.hpp"
#include "output/population_tables.hpp"
#include "output/table_html.hpp"
#include "output/variant_diagram.hpp"
#include "page/page_parts.hpp"
#include "page/page_surfaces.hpp"

namespace irrepwise {
namespace {

constexpr int all_columns = 10'000;  // a page scrolls where a terminal breaks
constexpr int levels_around_frontier = 2;
const Eigen::Vector3d usual_eye(0.45, -0.8, 0.4);  // no axis hides behind another

// Those chosen, or the first ones, as many as a diagram holds, the reference among them.
std::vector<int> shown_variants(const Comparison& comparison, const std::vector<int>& chosen) {
  if (!chosen.empty()) return chosen;
  std::vector<int> shown(comparison.variants.size());
  std::iota(shown.begin(), shown.end(), 0);
  if (shown.size() <= most_columns) return shown;
  shown.resize(most_columns);
  if (comparison.reference >= most_columns) shown.back() = comparison.reference;
  return shown;
}

std::string words_on_shown(const Comparison& comparison, const std::vector<int>& shown) {
  std::vector<std::string> names;
  for (const int i : shown) {
    names.push_back(comparison.variants[static_cast<std::size_t>(i)].name);
  }
  const std::string words = fmt::format(
      "The diagram and the view show {} of the {} variants: {}. The tables have all. To see "
      "others, "
      "make the page again with the option --variants and their names, with commas.",
      shown.size(), comparison.variants.size(), joined(names));
  return "<p>" + html_words(words) + "</p>\n";
}

std::string character_tables_html(const Comparison& comparison) {
  std::string html;
  std::vector<std::string> done;
  for (const VariantResult& variant : comparison.variants) {
    const PointGroup& group = variant.levels.symmetry.group;
    const std::string name = group.symbol().name();
    if (std::find(done.begin(), done.end(), name) != done.end()) continue;
    done.push_back(name);
    html += tables_html(character_tables(group, all_columns));
  }
  return html;
}

std::string variants_html(const Comparison& comparison) {
  std::string html;
  for (const VariantResult& variant : comparison.variants) {
    const std::vector<AtomSet> sets = atom_sets(variant.levels.symmetry);
    std::vector<Table> tables = {geometry_table(variant.levels),
                                 charge_table(variant.levels, sets, Grouping::Equivalent),
                                 overlap_population_table(variant.levels, Grouping::Equivalent)};
    for (Table& table : tables) table.caption = variant.name + ": " + table.caption;
    std::erase_if(tables, [](const Table& table) { return table.lines.empty(); });
    html += tables_html(tables);
  }
  return html;
}

}  // namespace

std::string comparison_page(const Comparison& comparison, const Provenance& provenance,
                            const PageOptions& options) {
  CompareParts parts;
  parts.differences = comparison.variants.size() > 1;
  const Report report = compare_report(comparison, parts);
  const std::vector<int> shown = shown_variants(comparison, options.variants);
  const LevelDiagram diagram = variant_diagram(
      comparison, {.variants = shown, .from_ev = options.from_ev, .to_ev = options.to_ev});

  std::vector<PageMolecule> molecules;
  for (const int index : shown) {
    const VariantResult& variant = comparison.variants[static_cast<std::size_t>(index)];
    molecules.push_back(
        page_molecule(variant.name, variant.levels, {diagram.from_ev, diagram.to_ev}));
  }
  add_surfaces(molecules, levels_around_frontier, options.threads);

  HtmlPage page;
  page.title = diagram.title.empty() ? report.title : diagram.title;
  page.generator = generator_words(provenance);
  page.head_html = facts_html(report.facts) + warnings_html(report.warnings);
  page.sections.push_back(
      {"summary", "Summary", tables_html({report.tables.begin(), report.tables.begin() + 1})});
  PageSection levels = levels_section(level_diagram_figure(diagram), DiagramRoom::Above);
  if (shown.size() < comparison.variants.size()) {
    levels.html = words_on_shown(comparison, shown) + levels.html;
  }
  page.sections.push_back(std::move(levels));
  page.sections.push_back({"comparison", "d block, frontier, robustness",
                           tables_html({report.tables.begin() + 1, report.tables.end()})});
  page.sections.push_back({"symmetry", "Symmetry", character_tables_html(comparison)});
  page.sections.push_back(
      {"variants", "Geometry, charges and bonds of each variant", variants_html(comparison)});
  page.sections.push_back(method_section(molecules, report.remarks));
  page.sections.push_back(repeat_section(provenance));
  page.data = page_data(molecules, usual_eye);
  return html_document(page);
}

}  // namespace irrepwise
