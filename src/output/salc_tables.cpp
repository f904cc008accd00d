#include "output/salc_tables.hpp"

#include <algorithm>
#include <cstddef>

#include <fmt/format.h>

#include "core/exact_number.hpp"
#include "core/text.hpp"
#include "output/caption_words.hpp"
#include "output/display_width.hpp"
#include "output/equivalence.hpp"

namespace irrepwise {
namespace {

constexpr int most_atoms_in_columns = 8;
constexpr int most_partners_in_columns = 5;
constexpr int widest = 98;  // columns of text

using Functions = std::vector<const SalcFunction*>;  // of one part of one set

std::string irrep_label(const SymmetryResult& result, const SalcFunction& salc) {
  return level_label(result.symmetry.group.irreps()[salc.irrep].label);
}

std::string caption(const SymmetryResult& result, const SalcFunction& salc) {
  const Shell& shell = result.orbitals->basis.shells[salc.shell];
  std::vector<std::string> names;
  for (const int component : salc.components) {
    names.push_back(salc_orbital_name(shell, component, salc.frame));
  }
  return fmt::format("SALCs of {} on {}{}", joined(names),
                     atom_sets(result.symmetry)[salc.set].name,
                     salc.part == Part::PiInPlane      ? " (in plane)"
                     : salc.part == Part::PiOutOfPlane ? " (out of plane)"
                                                       : "");
}

enum class OfIrrep { One, Several };  // SALCs of one part and irrep

// Which of several SALCs of one irrep, and which partner: "1", "2·1" where there are several.
std::string partner_words(const SymmetryResult& result, const SalcFunction& salc, OfIrrep salcs) {
  const bool degenerate = result.symmetry.group.irreps()[salc.irrep].dimension > 1;
  const std::string partner = degenerate ? std::to_string(salc.partner) : "";
  if (salcs == OfIrrep::One) return partner;
  return std::to_string(salc.number) + (degenerate ? "." + partner : "");
}

OfIrrep salcs_of(const Functions& functions, int irrep) {
  const bool several = std::any_of(
      functions.begin(), functions.end(),
      [&](const SalcFunction* salc) { return salc->irrep == irrep && salc->number > 1; });
  return several ? OfIrrep::Several : OfIrrep::One;
}

Table atoms_in_columns(const SymmetryResult& result, const Functions& functions) {
  const SalcFunction& first = *functions.front();
  const Shell& shell = result.orbitals->basis.shells[first.shell];
  const bool one_orbital = first.components.size() == 1;
  Table table;
  table.caption = caption(result, first);
  table.columns = {{"irrep", "irrep", "", Align::Left, 0, false},
                   {"partner", "partner", "", Align::Left, 0, false}};
  if (!one_orbital) table.columns.push_back({"orbital", "orbital", "", Align::Left, 0, false});
  for (const int atom : result.sets[first.set].atoms) {
    const std::string name = atom_name(result.symmetry.molecule, atom);
    table.columns.push_back({name, name, "", Align::Right, 0, false});
  }
  for (const SalcFunction* salc : functions) {
    std::string label = irrep_label(result, *salc);
    std::string partner = partner_words(result, *salc, salcs_of(functions, salc->irrep));
    if (salc->partner > 1) label.clear();
    for (std::size_t i = 0; i < salc->components.size(); ++i) {
      const Eigen::VectorXd column = salc->coefficients.col(static_cast<Eigen::Index>(i));
      if (column.isZero(0.0)) continue;
      Row row{{SymmetryLabel{label}, partner}};
      if (!one_orbital)
        row.cells.emplace_back(salc_orbital_name(shell, salc->components[i], salc->frame));
      for (const double value : column) row.cells.emplace_back(coefficient_text(value));
      table.lines.emplace_back(std::move(row));
      label.clear();
      partner.clear();
    }
  }
  return table;
}

Table partners_in_columns(const SymmetryResult& result, const Functions& chosen, OfIrrep salcs) {
  const SalcFunction& first = *chosen.front();
  const Shell& shell = result.orbitals->basis.shells[first.shell];
  const std::string label = irrep_label(result, first);
  Table table;
  table.caption = caption(result, first) + ": " + readable_label(label);
  table.columns = {{"atom", "atom", "", Align::Left, 0, false},
                   {"orbital", "orbital", "", Align::Left, 0, false}};
  for (const SalcFunction* salc : chosen) {
    const std::string words = partner_words(result, *salc, salcs);
    const std::string header = readable_label(label) + (words.empty() ? "" : " " + words);
    table.columns.push_back({header, header, "", Align::Right, 0, false});
  }
  const std::vector<int>& atoms = result.sets[first.set].atoms;
  for (std::size_t atom = 0; atom < atoms.size(); ++atom) {
    std::string name = atom_name(result.symmetry.molecule, atoms[atom]);
    for (std::size_t i = 0; i < first.components.size(); ++i) {
      Row row{{name, salc_orbital_name(shell, first.components[i], first.frame)}};
      bool any = false;
      for (const SalcFunction* salc : chosen) {
        const double value =
            salc->coefficients(static_cast<Eigen::Index>(atom), static_cast<Eigen::Index>(i));
        any = any || value != 0.0;
        row.cells.emplace_back(coefficient_text(value));
      }
      if (!any) continue;
      table.lines.emplace_back(std::move(row));
      name.clear();
    }
  }
  return table;
}

// The partners of one SALC stand together; non-degenerate ones fill a table five at a time.
std::vector<Table> tables_by_irrep(const SymmetryResult& result, const Functions& functions) {
  std::vector<Table> tables;
  Functions chosen;
  for (std::size_t i = 0; i < functions.size(); ++i) {
    chosen.push_back(functions[i]);
    const int irrep = functions[i]->irrep;
    const bool last = i + 1 == functions.size();
    const int with_next =
        static_cast<int>(chosen.size()) + result.symmetry.group.irreps()[irrep].dimension;
    const bool next_is_partner = !last && functions[i + 1]->partner > 1;
    const bool next_fits =
        !last && functions[i + 1]->irrep == irrep && with_next <= most_partners_in_columns;
    if (next_is_partner || next_fits) continue;
    tables.push_back(partners_in_columns(result, chosen, salcs_of(functions, irrep)));
    chosen.clear();
  }
  return tables;
}

// Columns that a table fills at most, as text.
int width_of(const Table& table) {
  int width = 2;
  for (std::size_t i = 0; i < table.columns.size(); ++i) {
    int column = display_width(table.columns[i].header);
    for (const auto& line : table.lines) {
      if (const Row* row = std::get_if<Row>(&line)) {
        column = std::max(column, display_width(cell_text(row->cells[i])));
      }
    }
    width += column + 2;
  }
  return width;
}

}  // namespace

std::string coefficient_text(double value) {
  if (const auto exact = exact_form(value)) return *exact == "0" ? "·" : *exact;
  return fmt::format("{:.4f}", value);
}

std::vector<Table> salc_tables(const SymmetryResult& result) {
  std::vector<Table> tables;
  if (!result.orbitals) return tables;
  const std::vector<SalcFunction>& salcs = result.orbitals->salcs;
  for (std::size_t next = 0; next < salcs.size();) {
    const SalcFunction& first = salcs[next];
    Functions functions;
    for (; next < salcs.size() && salcs[next].set == first.set &&
           salcs[next].shell == first.shell && salcs[next].part == first.part;
         ++next) {
      functions.push_back(&salcs[next]);
    }
    const int size = result.sets[first.set].size();
    if (size == 1) continue;
    if (size <= most_atoms_in_columns) {
      Table table = atoms_in_columns(result, functions);
      if (width_of(table) <= widest) {
        tables.push_back(std::move(table));
        continue;
      }
    }
    for (Table& table : tables_by_irrep(result, functions)) tables.push_back(std::move(table));
  }
  const bool local = std::any_of(salcs.begin(), salcs.end(), [](const SalcFunction& salc) {
    return salc.frame != OrbitalFrame::Standard;
  });
  const bool several = std::any_of(salcs.begin(), salcs.end(), [&](const SalcFunction& salc) {
    return salc.number > 1 && result.sets[salc.set].size() > 1;
  });
  if (!tables.empty()) {
    if (several) {
      tables.back().notes.push_back(
          "2.1: the first partner of the second SALC of that irrep; without a point the number "
          "alone.");
    }
    if (local) {
      tables.back().notes.push_back(fmt::format(
          "Orbitals of each atom's own frame: z of an atom points to {}, x and y across it; y "
          "stands "
          "across the mirror plane that holds the line, or the plane of the atom's bonds, and "
          "symmetry carries it from atom to "
          "atom.{}",
          frame_goal_words(result.symmetry.molecule, result.frames, result.central_atom),
          further_frame_sentences(result.frames)));
    } else {
      tables.back().notes.push_back("Orbitals of the standard frame.");
    }
  }
  return tables;
}

}  // namespace irrepwise
