#include "output/population_tables.hpp"

#include <algorithm>
#include <map>
#include <string>
#include <utility>

#include "molecule/contacts.hpp"

namespace irrepwise {
namespace {

// Electrons of one atom in its shells of one l.
double gross_of_type(const LevelsResult& result, int atom, int l) {
  double sum = 0.0;
  for (const Shell& shell : result.basis.shells) {
    if (shell.atom == atom && shell.l == l) {
      sum += result.populations.gross_by_orbital.segment(shell.first_orbital, shell.size()).sum();
    }
  }
  return sum;
}

bool has_type(const Basis& basis, int atom, int l) {
  for (const Shell& shell : basis.shells) {
    if (shell.atom == atom && shell.l == l) return true;
  }
  return false;
}

}  // namespace

Table charge_table(const LevelsResult& result, const std::vector<AtomSet>& sets,
                   Grouping grouping) {
  int highest_l = 0;
  for (const Shell& shell : result.basis.shells) highest_l = std::max(highest_l, shell.l);

  Table table;
  table.caption = "Charges and gross populations";
  table.columns = {{"atoms", "atoms", "", Align::Left, 0, true},
                   {"charge", "charge", "e", Align::Decimal, 0, false},
                   {"gross_population", "electrons", "", Align::Decimal, 1, false}};
  for (int l = 0; l <= highest_l; ++l) {
    const std::string letter(1, shell_letter(l));
    table.columns.push_back({"gross_" + letter, letter, "", Align::Decimal, 2, false});
  }

  const auto add_row = [&](int atom, const std::string& name) {
    Row row;
    row.cells = {name, Number{result.populations.charge[atom], 3, true},
                 Number{result.populations.gross_by_atom[atom], 3}};
    for (int l = 0; l <= highest_l; ++l) {
      if (has_type(result.basis, atom, l)) {
        row.cells.emplace_back(Number{gross_of_type(result, atom, l), 3});
      } else {
        row.cells.emplace_back();
      }
    }
    table.lines.emplace_back(std::move(row));
  };
  const Molecule& molecule = result.symmetry.molecule;
  for (const AtomSet& set : sets) {
    if (grouping == Grouping::Equivalent) {
      add_row(set.atoms.front(), atom_list(molecule, set.atoms));
      continue;
    }
    for (const int atom : set.atoms) add_row(atom, atom_name(molecule, atom));
  }
  return table;
}

Table overlap_population_table(const LevelsResult& result, Grouping grouping) {
  Table table;
  table.caption = grouping == Grouping::Single ? "Overlap populations of all pairs"
                                               : "Overlap populations of bonds";
  table.columns = {{"atoms", "atoms", "", Align::Left, 0, false},
                   {"distance_angstrom", "distance", "Å", Align::Decimal, 1, false},
                   {"value", "overlap population", "", Align::Decimal, 0, false}};
  if (grouping == Grouping::Equivalent) {
    table.columns.push_back({"count", "number", "", Align::Right, 2, false});
  }

  std::map<std::pair<int, int>, int> count;
  for (const OverlapPopulation& pair : result.populations.overlap_populations) {
    if (pair.bonded) ++count[first_equivalent_pair(result.symmetry, pair.atom_a, pair.atom_b)];
  }
  const Molecule& molecule = result.symmetry.molecule;
  for (const OverlapPopulation& pair : result.populations.overlap_populations) {
    const auto equivalent = count.find({pair.atom_a, pair.atom_b});
    if (grouping == Grouping::Equivalent && equivalent == count.end()) continue;
    Row row{{atom_name(molecule, pair.atom_a) + "–" + atom_name(molecule, pair.atom_b),
             Number{pair.distance_angstrom, 3}, Number{pair.value, 3}}};
    if (grouping == Grouping::Equivalent)
      row.cells.emplace_back(Number{double(equivalent->second), 0});
    table.lines.emplace_back(std::move(row));
  }
  const std::string criterion = bond_criterion(molecule);
  if (grouping == Grouping::Equivalent && !criterion.empty()) table.notes.push_back(criterion);
  return table;
}

}  // namespace irrepwise
