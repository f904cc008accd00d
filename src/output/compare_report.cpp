#include "output/compare_report.hpp"

#include <algorithm>
#include <string>
#include <utility>

#include <fmt/format.h>

#include "output/compare_tables.hpp"

namespace irrepwise {
namespace {

std::string method_of(const VariantResult& variant) {
  const Levels& levels = variant.levels.levels;
  std::string words = variant.levels.parameter_set + "; " + rule_name(levels.rule);
  if (levels.k) words += fmt::format(", K = {}", *levels.k);
  return words;
}

// One line where all agree, otherwise one for each variant.
std::vector<std::string> methods(const Comparison& comparison) {
  const std::string first = method_of(comparison.variants.front());
  const bool agree = std::all_of(comparison.variants.begin(), comparison.variants.end(),
                                 [&](const VariantResult& v) { return method_of(v) == first; });
  if (agree) return {first};
  std::vector<std::string> lines;
  for (const VariantResult& variant : comparison.variants) {
    lines.push_back(variant.name + ": " + method_of(variant));
  }
  return lines;
}

}  // namespace

Report compare_report(const Comparison& comparison, const CompareParts& parts) {
  Report report;
  const std::size_t n = comparison.variants.size();
  const std::string& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)].name;
  report.title = n == 1 ? reference : fmt::format("{} variants compared", n);
  report.facts.push_back({"reference", {reference}});
  report.facts.push_back({"method", methods(comparison)});
  for (const SummaryPart part : summary_parts(comparison, parts.summary)) {
    report.tables.push_back(summary_table(comparison, parts.summary, part));
    if (!parts.differences) continue;
    report.tables.push_back(difference_table(comparison, parts.summary, part));
  }
  for (Table table : {d_block_table(comparison), splittings_table(comparison),
                      frontier_match_table(comparison), robustness_table(comparison)}) {
    if (!table.lines.empty()) report.tables.push_back(std::move(table));
  }
  if (parts.slopes) {
    for (const VariantResult& variant : comparison.variants) {
      report.tables.push_back(slopes_table(variant));
    }
  }
  for (const VariantResult& variant : comparison.variants) {
    for (const std::string& warning : variant.levels.warnings) {
      report.warnings.push_back(variant.name + ": " + warning);
    }
  }
  report.remarks = {
      "Extended Hückel ranks levels by symmetry, overlap and electronegativity. Splittings are one-"
      "electron energies, not excitation energies; sums of occupied energies are no total "
      "energies. "
      "Charges of ions and of very polar molecules come out too large.",
      "Orbital energies say nothing about toxicity, stability or how to handle a compound: there, "
      "safety data, local codes and licensed practice decide."};
  return report;
}

}  // namespace irrepwise
