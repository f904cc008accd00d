#include "output/group_answers.hpp"

#include <fmt/format.h>

#include "output/symmetry_words.hpp"

namespace irrepwise {
namespace {

Words factors_words(const std::vector<Factor>& factors) {
  std::string words;
  for (const Factor& factor : factors) {
    words += (words.empty() ? "{" : " × {") + factor.label + "}" +
             (factor.exponent > 1 ? superscript(factor.exponent) : "");
  }
  return {words};
}

Table product_table(const std::vector<ProductAnswer>& products) {
  Table table;
  table.caption = "Direct products";
  table.columns = {{"product", "product", "", Align::Left, 0, false},
                   {"part", "part", "", Align::Left, 0, false},
                   {"irreps", "irreps", "", Align::Left, 0, true}};
  for (const ProductAnswer& answer : products) {
    table.lines.emplace_back(
        Row{{factors_words(answer.factors), "whole", state_words(answer.product)}});
    if (!answer.has_parts) continue;
    table.lines.emplace_back(Row{{"", "symmetric", state_words(answer.symmetric)}});
    table.lines.emplace_back(Row{{"", "antisymmetric", state_words(answer.antisymmetric)}});
  }
  return table;
}

Words configuration_words(const std::vector<OpenLevel>& levels) {
  std::string words;
  for (const OpenLevel& level : levels) {
    words += (words.empty() ? "{" : " {") + level_label(level.label) + "}" +
             (level.electrons > 1 ? superscript(level.electrons) : "");
  }
  return {words};
}

Table term_table(const PointGroup& group, const std::vector<TermsAnswer>& answers) {
  Table table;
  table.caption = "Terms";
  table.columns = {{"configuration", "configuration", "", Align::Left, 0, false},
                   {"terms", "terms", "", Align::Left, 0, true}};
  for (const TermsAnswer& answer : answers) {
    table.lines.emplace_back(
        Row{{configuration_words(parse_configuration(group, answer.configuration)),
             term_words(answer.terms)}});
  }
  return table;
}

// Several ways that lead to the same group stand beside each other.
std::vector<Table> descent_tables(const PointGroup& group,
                                  const std::vector<DescentAnswer>& descents) {
  std::vector<Table> tables;
  for (std::size_t next = 0; next < descents.size();) {
    const Schoenflies symbol = descents[next].embedding.subgroup.symbol();
    Table table;
    table.caption = fmt::format("Descent from {} to {}", group.symbol().name(), symbol.name());
    table.columns = {{"irrep", group.symbol().name(), "", Align::Left, 0, false}};
    const std::size_t first = next;
    for (; next < descents.size() && descents[next].embedding.subgroup.symbol() == symbol; ++next) {
      const std::string name = readable_class(descents[next].embedding.name);
      table.columns.push_back({descents[next].embedding.name, name, "", Align::Left, 0, true});
    }
    for (std::size_t i = 0; i < group.irreps().size(); ++i) {
      Row row{{SymmetryLabel{group.irreps()[i].label}}};
      for (std::size_t d = first; d < next; ++d) {
        row.cells.emplace_back(
            state_words(reduction_of(descents[d].embedding.subgroup, descents[d].times[i])));
      }
      table.lines.emplace_back(std::move(row));
    }
    if (next - first > 1) {
      table.notes.push_back("In brackets: what the subgroup keeps, by the classes of the group.");
    }
    tables.push_back(std::move(table));
  }
  return tables;
}

Table transition_table(const PointGroup& group, const FrontierSymmetry& frontier) {
  Table table;
  table.caption = "One-electron transitions between frontier levels";
  table.columns = {{"from", "from", "", Align::Left, 0, false},
                   {"to", "to", "", Align::Left, 0, false},
                   {"dipole", "dipole along", "", Align::Left, 0, false},
                   {"two_photon", "Raman, two-photon", "", Align::Left, 0, false}};
  for (const Transition& transition : frontier.transitions) {
    std::string axes;
    for (const std::string& axis : transition.rule.dipole_axes) {
      axes += (axes.empty() ? "" : ", ") + axis;
    }
    const auto& levels = frontier.levels.levels;
    table.lines.emplace_back(
        Row{{SymmetryLabel{level_name(group, levels[transition.from])},
             SymmetryLabel{level_name(group, levels[transition.to])},
             axes.empty() ? "forbidden" : axes, transition.rule.two_photon ? "active" : "–"}});
  }
  table.notes.push_back(
      "Spin is not considered; a transition may borrow intensity from vibrations.");
  return table;
}

Words distortion_words(const TermDistortion& distortion) {
  const std::string along = " along " + mode_words(distortion.modes).marked;
  switch (distortion.kind) {
    case DistortionKind::None:
      return {"none: not degenerate"};
    case DistortionKind::Atom:
      return {"none: an atom has no vibration"};
    case DistortionKind::JahnTeller:
      return {"Jahn–Teller" +
              (distortion.modes.empty() ? ", but this molecule has no such mode" : along)};
    case DistortionKind::RennerTeller:
      return {"Renner–Teller" +
              (distortion.modes.empty() ? ", but this molecule cannot bend" : along)};
  }
  return {};
}

Table ground_table(const FrontierSymmetry& frontier) {
  Table table;
  table.caption = "Terms of " + cell_text(configuration_words(frontier.open));
  table.columns = {{"term", "lowest by Hund's rules", "", Align::Left, 0, false},
                   {"distortion", "distortion", "", Align::Left, 0, true}};
  for (const GroundTerm& ground : frontier.ground) {
    table.lines.emplace_back(Row{{term_words({ground.term}), distortion_words(ground.distortion)}});
  }
  table.notes.push_back("All terms: " + cell_text(term_words(frontier.terms)) + ".");
  return table;
}

}  // namespace

std::vector<Table> answer_tables(const PointGroup& group, const GroupAnswers& answers) {
  std::vector<Table> tables;
  if (!answers.products.empty()) tables.push_back(product_table(answers.products));
  if (!answers.terms.empty()) tables.push_back(term_table(group, answers.terms));
  for (Table& table : descent_tables(group, answers.descents)) tables.push_back(std::move(table));
  return tables;
}

std::vector<Table> frontier_tables(const PointGroup& group, const FrontierSymmetry& frontier) {
  std::vector<Table> tables;
  if (!frontier.transitions.empty()) tables.push_back(transition_table(group, frontier));
  if (!frontier.terms.empty()) tables.push_back(ground_table(frontier));
  return tables;
}

}  // namespace irrepwise
