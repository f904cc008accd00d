#include "output/symmetry_tables.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <type_traits>
#include <utility>

#include <fmt/format.h>

#include "core/text.hpp"
#include "output/equivalence.hpp"
#include "output/symmetry_words.hpp"
#include "output/table_text.hpp"
#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

std::string direction_words(const Eigen::Vector3d& axis) {
  constexpr double along = 1e-9;  // of a unit vector: axes of the standard frame are exact
  constexpr double shown = 5e-4;  // smaller parts are 0.000 to three decimals
  static constexpr const char* names[] = {"x", "y", "z"};
  for (int i = 0; i < 3; ++i) {
    if (std::abs(std::abs(axis[i]) - 1.0) < along)
      return (axis[i] < 0 ? "-" : "") + std::string(names[i]);
  }
  std::string words;
  for (int i = 0; i < 3; ++i) {
    const double value = std::abs(axis[i]) < shown ? 0.0 : axis[i];
    words += fmt::format("{}{:.3f}", i == 0 ? "(" : ", ", value);
  }
  return words + ")";
}

const char* kind_words(const SymmetryOperation& operation) {
  switch (operation.kind) {
    case OperationKind::Identity:
      return "identity";
    case OperationKind::Rotation:
      return "rotation about";
    case OperationKind::Inversion:
      return "inversion";
    case OperationKind::Reflection:
      return "reflection across";
    case OperationKind::Rotoreflection:
      return "rotoreflection about";
  }
  return "";
}

// Cycles of atoms that change places: "(Cl2 Cl4) (Cl3 Cl5)".
std::string cycle_words(const Molecule& molecule, const std::vector<int>& images) {
  std::vector<bool> seen(images.size(), false);
  std::string words;
  for (std::size_t start = 0; start < images.size(); ++start) {
    if (seen[start] || images[start] == static_cast<int>(start)) continue;
    std::string cycle;
    int length = 0;
    for (std::size_t atom = start; !seen[atom]; atom = static_cast<std::size_t>(images[atom])) {
      seen[atom] = true;
      // Short cycles stay on one line; long ones may break.
      const char* space = length % 6 == 0 ? " " : "\u00a0";
      ++length;
      cycle += (cycle.empty() ? "" : space) + atom_name(molecule, static_cast<int>(atom));
    }
    words += (words.empty() ? "(" : " (") + cycle + ")";
  }
  return words.empty() ? "all stay" : words;
}

std::string class_of(const PointGroup& group, int operation) {
  for (const ConjugacyClass& conjugacy : group.classes()) {
    for (const int member : conjugacy.operations) {
      if (member == operation) return readable_class(conjugacy.symbol);
    }
  }
  return {};
}

std::string list_or_dash(const std::vector<std::string>& names) {
  std::string text;
  for (const std::string& name : names) text += (text.empty() ? "" : ", ") + name;
  return text.empty() ? "–" : text;
}

// Whether the irrep can bond, or who holds it alone.
std::string verdict(const SymmetryResult& result, const std::vector<AtomSet>& names,
                    const BondingIrrep& row) {
  if (row.can_bond) return result.central_atom ? "can bond" : "can mix";
  std::vector<std::string> holders;
  for (std::size_t s = 0; s < row.parts.size(); ++s) {
    if (!row.parts[s].empty()) holders.push_back(names[s].name);
  }
  return "non-bonding: " + joined(holders) + " only";
}

}  // namespace

Table operation_table(const SymmetryResult& result) {
  const PointGroup& group = result.symmetry.group;
  Table table;
  table.caption = "Operations";
  table.columns = {{"class", "class", "", Align::Left, 0, false},
                   {"operation", "operation", "", Align::Left, 0, false},
                   {"kind", "kind", "", Align::Left, 1, false},
                   {"axis", "axis or normal", "", Align::Left, 0, false},
                   {"atoms", "atoms that change places", "", Align::Left, 0, true}};
  for (const ConjugacyClass& conjugacy : group.classes()) {
    for (const int g : conjugacy.operations) {
      const SymmetryOperation operation = classify_operation(group.operations()[g]);
      const bool has_axis = operation.axis.norm() > 0.5;
      table.lines.emplace_back(
          Row{{class_of(group, g), readable_class(operation_symbol(operation)),
               kind_words(operation), has_axis ? direction_words(operation.axis) : "",
               cycle_words(result.symmetry.molecule, result.symmetry.images[g])}});
    }
  }
  table.notes.push_back(
      "Axes in the standard frame; in brackets atoms go round: each to the next.");
  if (!group.symbol().is_finite()) {
    table.notes.push_back("The group is infinite: turns by multiples of 45° stand for all.");
  }
  return table;
}

Table equivalent_atoms_table(const SymmetryResult& result) {
  Table table;
  const std::vector<AtomSet> names = atom_sets(result.symmetry);
  table.caption = "Sets of equivalent atoms";
  table.columns = {{"set", "set", "", Align::Left, 0, false},
                   {"size", "atoms", "", Align::Right, 0, false},
                   {"site_group", "site group", "", Align::Left, 0, false},
                   {"representative", "representative", "", Align::Left, 1, false},
                   {"atoms", "which", "", Align::Left, 0, true}};
  for (std::size_t s = 0; s < result.sets.size(); ++s) {
    table.lines.emplace_back(
        Row{{names[s].name, Number{double(result.sets[s].size()), 0},
             site_symbol(result.symmetry.group, result.sets[s]).name(),
             atom_name(result.symmetry.molecule, result.sets[s].representative()),
             atom_list(result.symmetry.molecule, result.sets[s].atoms)}});
  }
  return table;
}

std::string part_words(const SymmetryResult& result, const OrbitalReduction& reduction) {
  if (reduction.part != Part::Shell) return part_name(reduction.part);
  const Shell& shell = result.orbitals->basis.shells[reduction.shells.front()];
  return fmt::format("{}{}", shell.n(), shell_letter(shell.l));
}

std::string side_on_sets(const SymmetryResult& result, const std::vector<AtomSet>& names) {
  std::vector<std::string> sets;
  for (std::size_t s = 0; s < names.size(); ++s) {
    if (result.frames[s] && result.frames[s]->side_on) sets.push_back(names[s].name);
  }
  return sets.empty() ? "" : joined(sets);
}

Table reduction_table(const SymmetryResult& result) {
  Table table;
  const std::vector<AtomSet> names = atom_sets(result.symmetry);
  table.caption = "What the valence orbitals span";
  table.columns = {{"set", "set", "", Align::Left, 0, false},
                   {"part", "orbitals", "", Align::Left, 0, false},
                   {"from", "of shells", "", Align::Left, 1, false},
                   {"number", "number", "", Align::Right, 0, false},
                   {"irreps", "irreps", "", Align::Left, 0, true}};
  const Basis& basis = result.orbitals->basis;
  int total = 0;
  int last_set = -1;
  for (const OrbitalReduction& reduction : result.orbitals->reductions) {
    std::string shells;
    if (reduction.part == Part::Shell) {
      total += reduction.orbitals;
    } else {
      for (const int shell : reduction.shells) {
        shells += fmt::format("{}{}{}", shells.empty() ? "" : ", ", basis.shells[shell].n(),
                              shell_letter(basis.shells[shell].l));
      }
    }
    const bool first = reduction.set != last_set;
    last_set = reduction.set;
    table.lines.emplace_back(
        Row{{first ? names[reduction.set].name : "", part_words(result, reduction), shells,
             Number{double(reduction.orbitals), 0},
             reduction_words(reduction_of(result.symmetry.group, reduction.times))}});
  }
  table.notes.push_back(
      fmt::format("The shells add up to {} orbitals, as many as the valence orbitals.", total));
  const auto any = [&](auto&& holds) {
    return std::any_of(result.frames.begin(), result.frames.end(),
                       [&](const auto& frames) { return frames && holds(*frames); });
  };
  if (any([](const LocalFrames& local) { return !local.side_on; })) {
    const bool own_metal = any([](const LocalFrames& local) { return local.to_own_metal; });
    const std::string goal =
        result.central_atom
            ? "along the line to " + atom_name(result.symmetry.molecule, *result.central_atom)
        : own_metal ? std::string(
                          "along the bond to the metal (of several, to their midpoint; of "
                          "a metal itself, to the centre)")
                    : std::string("along the line to the centre");
    const bool beyond_donors = any([](const LocalFrames& local) { return local.beyond_donors; });
    table.notes.push_back(
        fmt::format("σ: {}{}; π: across it.", goal,
                    beyond_donors ? ", beyond the donors along the bond towards it" : ""));
  }
  if (const std::string sets = side_on_sets(result, names); !sets.empty()) {
    table.notes.push_back(fmt::format(
        "{}, a ring or π bond over the metal: π is along the normal of its plane; s and in plane "
        "make σ bonds within the ligand above all.",
        sets));
  }
  return table;
}

namespace {

Table whole_bonding_table(const SymmetryResult& result) {
  Table table;
  const std::vector<AtomSet> names = atom_sets(result.symmetry);
  table.caption = result.central_atom
                      ? fmt::format("What can bond with {} by symmetry",
                                    atom_name(result.symmetry.molecule, *result.central_atom))
                      : "What can mix by symmetry";
  table.columns.push_back({"irrep", "irrep", "", Align::Left, 0, false});
  for (std::size_t s = 0; s < result.sets.size(); ++s) {
    table.columns.push_back({names[s].name, names[s].name, "", Align::Left, 0, true});
  }
  table.columns.push_back({"verdict", "by symmetry", "", Align::Left, 0, true});
  for (const BondingIrrep& row : bonding_by_irrep(result)) {
    Row line{{SymmetryLabel{level_label(result.symmetry.group.irreps()[row.irrep].label)}}};
    for (const auto& parts : row.parts) line.cells.emplace_back(list_or_dash(parts));
    line.cells.emplace_back(verdict(result, names, row));
    table.lines.emplace_back(std::move(line));
  }
  return table;
}

// The first column and some of the others.
Table part_of(const Table& table, std::size_t first, std::size_t end) {
  Table part;
  part.caption = table.caption + (first > 1 ? " (continued)" : "");
  const auto taken = [&](const auto& all) {
    std::decay_t<decltype(all)> some = {all.front()};
    some.insert(some.end(), all.begin() + static_cast<std::ptrdiff_t>(first),
                all.begin() + static_cast<std::ptrdiff_t>(end));
    return some;
  };
  part.columns = taken(table.columns);
  for (const auto& line : table.lines) {
    part.lines.emplace_back(Row{taken(std::get<Row>(line).cells)});
  }
  return part;
}

}  // namespace

std::vector<Table> bonding_tables(const SymmetryResult& result, int width) {
  constexpr int narrowest = 24;  // to which a column may be folded, with the space before it
  const Table whole = whole_bonding_table(result);
  const std::vector<int> widths = text_widths(whole);
  std::vector<Table> tables;
  for (std::size_t first = 1; first < widths.size();) {
    int used = widths.front() + std::min(widths[first], narrowest);
    std::size_t end = first + 1;
    for (; end < widths.size(); ++end) {
      used += std::min(widths[end], narrowest);
      if (used > width) break;
    }
    tables.push_back(part_of(whole, first, end));
    first = end;
  }
  return tables;
}

Table vibration_table(const SymmetryResult& result) {
  Table table;
  table.caption = "Vibrations";
  table.columns = {{"irrep", "irrep", "", Align::Left, 0, false},
                   {"times", "times", "", Align::Right, 0, false},
                   {"infrared", "infrared", "", Align::Left, 0, false},
                   {"raman", "Raman", "", Align::Left, 0, false}};
  const PointGroup& group = result.symmetry.group;
  const std::string symmetric = group.irreps().front().label;
  for (const IrrepCount& mode : result.displacements.vibrations) {
    const TransitionRule rule = transition_rule(group, symmetric, mode.label);
    table.lines.emplace_back(
        Row{{SymmetryLabel{level_label(mode.label)}, Number{double(mode.count), 0},
             list_or_dash(rule.dipole_axes), rule.two_photon ? "yes" : "–"}});
  }
  table.notes.push_back("Fundamentals: allowed in the infrared along the axes named, or in Raman.");
  return table;
}

}  // namespace irrepwise
