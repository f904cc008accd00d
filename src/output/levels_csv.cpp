#include "output/composition.hpp"
#include "output/levels_json.hpp"
#include "output/table_csv.hpp"

namespace irrepwise {

std::string levels_csv(const LevelsResult& result) {
  const std::vector<AtomSet> sets = atom_sets(result.symmetry);
  const std::vector<ShellGroup> groups = shell_groups(result, sets);
  const PointGroup& group = result.symmetry.group;
  Table table;
  for (const char* key :
       {"label", "irrep", "number", "degeneracy", "energy_ev", "occupation", "frontier"}) {
    table.columns.push_back({key, key, "", Align::Left, 0, false});
  }
  for (const ShellGroup& part : groups) {
    table.columns.push_back({part.name, part.name, "", Align::Decimal, 0, false});
  }
  const Frontier& frontier = result.levels.frontier;
  for (int i = 0; i < static_cast<int>(result.levels.levels.size()); ++i) {
    const Level& level = result.levels.levels[static_cast<std::size_t>(i)];
    const Irrep& irrep = group.irreps()[static_cast<std::size_t>(level.irrep)];
    Row row{{SymmetryLabel{level_name(group, level)}, SymmetryLabel{level_label(irrep.label)},
             Number{double(level.number)}, Number{double(level.degeneracy)},
             Number{level.energy_ev}, Number{level.occupation},
             frontier.homo == i   ? "homo"
             : frontier.lumo == i ? "lumo"
                                  : ""}};
    for (const ShellGroup& part : groups)
      row.cells.emplace_back(Number{group_share(result, part, i)});
    table.lines.emplace_back(std::move(row));
  }
  return table_csv(table);
}

}  // namespace irrepwise
