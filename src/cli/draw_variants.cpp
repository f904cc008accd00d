#include "cli/draw_variants.hpp"

#include <cstddef>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "cli/variant_option.hpp"
#include "core/error.hpp"
#include "output/variant_diagram.hpp"

namespace irrepwise::cli {

std::vector<int> chosen_variants(const Comparison& comparison,
                                 const std::vector<std::string>& chosen) {
  std::vector<std::string> names;
  for (const VariantResult& variant : comparison.variants) names.push_back(variant.name);
  std::vector<int> out = find_variants("--variants", names, chosen);
  if (out.size() > static_cast<std::size_t>(most_columns)) {
    throw Error(fmt::format(
        "--variants: {} are too many for one diagram, which holds up to {}; leave some out",
        out.size(), most_columns));
  }
  return out;
}

Figure variants_figure(const Comparison& comparison, const DrawOptions& options) {
  VariantDiagramChoice choice;
  choice.variants = chosen_variants(comparison, options.variants);
  choice.from_ev = options.from_ev;
  choice.to_ev = options.to_ev;
  const std::size_t count = comparison.variants.size();
  if (choice.variants.empty() && count > static_cast<std::size_t>(most_columns)) {
    throw Error(fmt::format(
        "{} variants are too many for one diagram, which holds up to {}; name those to draw, with "
        "commas: --variants \"{},{}\"",
        count, most_columns, comparison.variants[0].name, comparison.variants[1].name));
  }
  return level_diagram_figure(variant_diagram(comparison, choice));
}

}  // namespace irrepwise::cli
