#include <string>
#include <utility>
#include <vector>

#include "output/symmetry_json.hpp"
#include "output/table_csv.hpp"
#include "symmetry/functions.hpp"

namespace irrepwise {
namespace {

// What a value is of; every field may be empty.
struct Subject {
  std::string section, set = {}, part = {}, irrep = {}, partner = {}, atom = {}, name = {};
};

class Rows {
 public:
  Rows() {
    for (const char* key :
         {"section", "set", "part", "irrep", "partner", "atom", "name", "value"}) {
      table_.columns.push_back({key, key, "", Align::Left, 0, false});
    }
  }
  void add(const Subject& of, Cell value) {
    table_.lines.emplace_back(Row{
        {of.section, of.set, of.part, of.irrep, of.partner, of.atom, of.name, std::move(value)}});
  }
  void add(const Subject& of, const Reduction& reduction) {
    for (const IrrepCount& part : reduction) {
      Subject row = of;
      row.irrep = level_label(part.label);
      add(row, Number{double(part.count), 0});
    }
  }
  [[nodiscard]] std::string text() const { return table_csv(table_); }

 private:
  Table table_;
};

std::string atoms_text(const std::vector<int>& atoms) {
  std::string text;
  for (const int atom : atoms) text += (text.empty() ? "" : " ") + std::to_string(atom + 1);
  return text;
}

void add_group(Rows& rows, const PointGroup& group) {
  rows.add({.section = "group", .name = "point_group"}, group.symbol().name());
  const auto functions = assign_functions(group);
  for (std::size_t i = 0; i < group.irreps().size(); ++i) {
    const Irrep& irrep = group.irreps()[i];
    const std::string label = level_label(irrep.label);
    for (const ConjugacyClass& conjugacy : group.classes()) {
      rows.add({.section = "character", .irrep = label, .name = conjugacy.symbol},
               Number{irrep.characters[conjugacy.operations.front()]});
    }
    for (const FunctionSet& set : functions[i]) {
      rows.add({.section = "function", .irrep = label}, function_text(set));
    }
  }
}

void add_answers(Rows& rows, const PointGroup& group, const GroupAnswers& answers) {
  for (const ProductAnswer& answer : answers.products) {
    const std::string name = factors_text(answer.factors);
    rows.add({.section = "product", .part = "whole", .name = name}, answer.product);
    if (!answer.has_parts) continue;
    rows.add({.section = "product", .part = "symmetric", .name = name}, answer.symmetric);
    rows.add({.section = "product", .part = "antisymmetric", .name = name}, answer.antisymmetric);
  }
  for (const TermsAnswer& answer : answers.terms) {
    for (const Term& term : answer.terms) {
      rows.add({.section = "term",
                .part = answer.configuration,
                .name = term_text({term.multiplicity, term.irrep, term.dimension, 1})},
               Number{double(term.count), 0});
    }
  }
  for (const DescentAnswer& descent : answers.descents) {
    for (std::size_t i = 0; i < descent.times.size(); ++i) {
      rows.add({.section = "descent",
                .part = level_label(group.irreps()[i].label),
                .name = descent.embedding.name},
               reduction_of(descent.embedding.subgroup, descent.times[i]));
    }
  }
}

void add_orbitals(Rows& rows, const SymmetryResult& result) {
  for (const OrbitalReduction& reduction : result.orbitals->reductions) {
    const int l = result.orbitals->basis.shells[reduction.shells.front()].l;
    rows.add({.section = "reduction",
              .set = atoms_text(result.sets[reduction.set].atoms),
              .part = part_key(reduction.part, l)},
             reduction_of(result.symmetry.group, reduction.times));
  }
  for (const SalcFunction& salc : result.orbitals->salcs) {
    const Shell& shell = result.orbitals->basis.shells[salc.shell];
    const std::vector<int>& atoms = result.sets[salc.set].atoms;
    for (std::size_t atom = 0; atom < atoms.size(); ++atom) {
      for (std::size_t i = 0; i < salc.components.size(); ++i) {
        const double value =
            salc.coefficients(static_cast<Eigen::Index>(atom), static_cast<Eigen::Index>(i));
        if (value == 0.0) continue;
        rows.add({"salc", atoms_text(atoms), part_key(salc.part, shell.l),
                  level_label(result.symmetry.group.irreps()[salc.irrep].label),
                  std::to_string(salc.number) + "." + std::to_string(salc.partner),
                  std::to_string(atoms[atom] + 1),
                  salc_orbital_name(shell, salc.components[i], salc.frame)},
                 Number{value});
      }
    }
  }
}

void add_frontier(Rows& rows, const PointGroup& group, const FrontierSymmetry& frontier) {
  for (const Transition& transition : frontier.transitions) {
    const auto& levels = frontier.levels.levels;
    const std::string name =
        level_name(group, levels[transition.from]) + " " + level_name(group, levels[transition.to]);
    std::string axes;
    for (const std::string& axis : transition.rule.dipole_axes) {
      axes += (axes.empty() ? "" : " ") + axis;
    }
    rows.add({.section = "transition", .part = "dipole", .name = name}, axes);
    rows.add({.section = "transition", .part = "two_photon", .name = name},
             Number{transition.rule.two_photon ? 1.0 : 0.0, 0});
  }
  for (const Term& term : frontier.terms) {
    rows.add(
        {.section = "term", .name = term_text({term.multiplicity, term.irrep, term.dimension, 1})},
        Number{double(term.count), 0});
  }
}

}  // namespace

std::string symmetry_csv(const SymmetryResult& result) {
  const PointGroup& group = result.symmetry.group;
  Rows rows;
  add_group(rows, group);
  for (const Rung& rung : result.ladder) {
    rows.add({.section = "ladder", .name = rung.group.name()}, Number{rung.tolerance_angstrom});
  }
  for (const std::string& axis : result.symmetry.axes) rows.add({.section = "axis"}, axis);
  for (const EquivalentAtoms& set : result.sets) {
    rows.add({.section = "equivalent_atoms", .set = atoms_text(set.atoms), .name = "site_group"},
             site_symbol(group, set).name());
  }
  if (result.orbitals) add_orbitals(rows, result);
  rows.add({.section = "vibration"}, result.displacements.vibrations);
  if (result.frontier) add_frontier(rows, group, *result.frontier);
  add_answers(rows, group, result.answers);
  return rows.text();
}

std::string group_csv(const PointGroup& group, const GroupAnswers& answers) {
  Rows rows;
  add_group(rows, group);
  add_answers(rows, group, answers);
  return rows.text();
}

}  // namespace irrepwise
