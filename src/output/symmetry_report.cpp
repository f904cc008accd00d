#include "output/symmetry_report.hpp"

#include <iterator>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "core/text.hpp"
#include "output/caption_words.hpp"
#include "output/character_tables.hpp"
#include "output/group_answers.hpp"
#include "output/salc_tables.hpp"
#include "output/symmetry_tables.hpp"
#include "output/symmetry_words.hpp"

namespace irrepwise {
namespace {

std::string group_words(const MolecularSymmetry& symmetry) {
  std::string words = symmetry.group.symbol().name();
  if (!symmetry.full_group.empty() && symmetry.full_group != words) {
    words += ", a subgroup of " + symmetry.full_group;
  }
  return words + fmt::format(" at tolerance {:.4g} Å", symmetry.tolerance_angstrom);
}

// Lines break between the rungs only, after an arrow.
std::string unbroken_rungs(std::string words) {
  for (const auto& [breaks, keeps] :
       {std::pair<std::string_view, std::string_view>{" at ", "\u00a0at\u00a0"},
        {" Å", "\u00a0Å"},
        {" →", "\u00a0→"}}) {
    for (std::size_t at = words.find(breaks); at != std::string::npos; at = words.find(breaks)) {
      words.replace(at, breaks.size(), keeps);
    }
  }
  return words;
}

// "B1g and B2g change places", or "B1g → B3g" for longer cycles.
std::vector<std::string> effect_words(const AxisEffect& effect) {
  std::vector<std::string> lines;
  const auto describe = [&](const std::vector<Relabelled>& changes, auto&& readable) {
    std::string words;
    for (std::size_t i = 0; i < changes.size(); ++i) {
      bool swapped = false, counted = false;
      for (std::size_t j = 0; j < changes.size(); ++j) {
        const bool back =
            changes[j].before == changes[i].after && changes[j].after == changes[i].before;
        swapped = swapped || back;
        counted = counted || (back && j < i);
      }
      if (counted) continue;
      const bool turn_over = swapped && changes[i].after < changes[i].before;
      words +=
          (words.empty() ? "" : ", ") + readable(turn_over ? changes[i].after : changes[i].before) +
          (swapped ? " ↔ " : " → ") + readable(turn_over ? changes[i].before : changes[i].after);
    }
    return words;
  };
  if (!effect.irreps.empty()) {
    lines.push_back("irreps " + describe(effect.irreps, readable_label));
  }
  if (!effect.classes.empty()) {
    lines.push_back("classes " + describe(effect.classes, readable_class));
  }
  return lines;
}

std::vector<Fact> header(const SymmetryResult& result) {
  const MolecularSymmetry& symmetry = result.symmetry;
  std::vector<Fact> facts;
  facts.push_back({"formula", {readable_formula(result.molecule)}});
  facts.push_back({"group", {group_words(symmetry)}});
  facts.push_back({"shift to be exact",
                   {fmt::format("largest {:.4f} Å, root mean square {:.4f} Å",
                                symmetry.largest_shift_angstrom, symmetry.rms_shift_angstrom)}});
  facts.push_back({"ladder",
                   {unbroken_rungs(ladder_words(result.ladder)),
                    fmt::format("searched to {} Å", result.limit_angstrom)}});
  facts.push_back({"axes", symmetry.axes});
  if (result.user_axes) {
    std::vector<std::string> words = effect_words(result.axis_effect);
    if (words.empty()) words.push_back("no label changes");
    facts.push_back({"against the default axes", std::move(words)});
  }
  if (result.central_atom) {
    facts.push_back({"central atom", {atom_name(symmetry.molecule, *result.central_atom)}});
  }
  return facts;
}

std::string irrep_count_words(const PointGroup& group) {
  int pairs = 0;
  for (const Irrep& irrep : group.irreps()) pairs += irrep.complex_pair ? 1 : 0;
  const int all = static_cast<int>(group.irreps().size()) + pairs;
  if (pairs == 0) return std::to_string(all);
  return fmt::format("{}, of which {} are pairs of complex conjugates", all, 2 * pairs);
}

void append(std::vector<Table>& tables, std::vector<Table> more) {
  tables.insert(tables.end(), std::make_move_iterator(more.begin()),
                std::make_move_iterator(more.end()));
}

}  // namespace

Report symmetry_report(const SymmetryResult& result, const SymmetryHeadings& headings,
                       const SymmetrySections& sections, int width) {
  Report report;
  report.title = headings.title.empty() ? readable_formula(result.molecule) : headings.title;
  report.facts = header(result);
  const PointGroup& group = result.symmetry.group;
  append(report.tables, character_tables(group, width));
  report.tables.push_back(function_table(group));
  if (sections.operations) report.tables.push_back(operation_table(result));
  report.tables.push_back(equivalent_atoms_table(result));
  if (result.orbitals) {
    report.tables.push_back(reduction_table(result));
    if (result.sets.size() > 1) append(report.tables, bonding_tables(result, width));
    if (sections.salcs) append(report.tables, salc_tables(result));
  }
  if (sections.vibrations && !result.displacements.vibrations.empty()) {
    report.tables.push_back(vibration_table(result));
  }
  if (result.frontier) append(report.tables, frontier_tables(group, *result.frontier));
  append(report.tables, answer_tables(group, result.answers));
  report.warnings = headings.warnings;
  return report;
}

Report group_report(const PointGroup& group, const GroupAnswers& answers, int width) {
  Report report;
  report.title = "Point group " + group.symbol().name();
  report.facts = {
      {"order", {group.symbol().is_finite() ? std::to_string(group.order()) : "infinite"}},
      {"irreps", {group.symbol().is_finite() ? irrep_count_words(group) : "infinitely many"}}};
  append(report.tables, character_tables(group, width));
  report.tables.push_back(function_table(group));
  append(report.tables, answer_tables(group, answers));
  return report;
}

}  // namespace irrepwise
