#include "cli/draw_variants.hpp"

#include <algorithm>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "cli/variant_option.hpp"
#include "core/error.hpp"
#include "output/variant_diagram.hpp"

namespace irrepwise::cli {
namespace {

std::vector<int> chosen_variants(const Comparison& comparison,
                                 const std::vector<std::string>& chosen) {
  std::vector<std::string> names;
  for (const VariantResult& variant : comparison.variants) names.push_back(variant.name);
  std::vector<int> out;
  for (const std::string& name : chosen) {
    const int index = find_variant("--variants", names, name);
    if (std::find(out.begin(), out.end(), index) != out.end()) {
      throw Error(fmt::format("--variants: '{}' is named twice; name each once", name));
    }
    out.push_back(index);
  }
  return out;
}

}  // namespace

Figure variants_figure(const Comparison& comparison, const DrawOptions& options) {
  VariantDiagramChoice choice;
  choice.variants = chosen_variants(comparison, options.variants);
  choice.from_ev = options.from_ev;
  choice.to_ev = options.to_ev;
  const std::size_t count =
      choice.variants.empty() ? comparison.variants.size() : choice.variants.size();
  if (count > static_cast<std::size_t>(most_columns)) {
    throw Error(fmt::format(
        "{} variants are too many for one diagram, which holds up to {}; name those to draw, with "
        "commas: --variants \"{},{}\"",
        count, most_columns, comparison.variants[0].name, comparison.variants[1].name));
  }
  return level_diagram_figure(variant_diagram(comparison, choice));
}

}  // namespace irrepwise::cli
