#include "cli/draw_variants.hpp"

#include <algorithm>
#include <cstddef>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "cli/variant_option.hpp"
#include "core/error.hpp"
#include "output/variant_diagram.hpp"

namespace irrepwise::cli {

namespace {

// A name may hold commas, at which the option was split: pieces that make a name together are one.
std::vector<std::string> whole_names(const std::vector<std::string>& pieces,
                                     const std::vector<std::string>& names) {
  std::vector<std::string> out;
  for (std::size_t i = 0; i < pieces.size();) {
    std::string word = pieces[i];
    std::size_t end = i + 1;
    std::string longer = word;
    for (std::size_t j = i + 1; j < pieces.size(); ++j) {
      longer += "," + pieces[j];
      if (std::find(names.begin(), names.end(), longer) == names.end()) continue;
      word = longer;
      end = j + 1;
    }
    out.push_back(std::move(word));
    i = end;
  }
  return out;
}

}  // namespace

std::vector<int> chosen_variants(const Comparison& comparison,
                                 const std::vector<std::string>& chosen) {
  std::vector<std::string> names;
  for (const VariantResult& variant : comparison.variants) names.push_back(variant.name);
  std::vector<int> out;
  for (const std::string& name : whole_names(chosen, names)) {
    const int index = find_variant("--variants", names, name);
    if (std::find(out.begin(), out.end(), index) != out.end()) {
      throw Error(fmt::format("--variants: '{}' is named twice; name each once", name));
    }
    out.push_back(index);
  }
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
