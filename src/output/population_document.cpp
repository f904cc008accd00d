#include "output/population_document.hpp"

#include <map>
#include <string>
#include <utility>

#include "molecule/element.hpp"
#include "output/caption_words.hpp"
#include "output/table_csv.hpp"
#include "output/table_document.hpp"

namespace irrepwise {
namespace {

// Electrons of one atom by orbital type, in the order s, p, d, f.
std::map<int, double> gross_by_l(const LevelsResult& result, int atom) {
  std::map<int, double> gross;
  const auto at = static_cast<std::size_t>(atom);
  for (int s = result.basis.first_shell[at]; s < result.basis.first_shell[at + 1]; ++s) {
    const Shell& shell = result.basis.shells[static_cast<std::size_t>(s)];
    gross[shell.l] +=
        result.populations.gross_by_orbital.segment(shell.first_orbital, shell.size()).sum();
  }
  return gross;
}

}  // namespace

std::vector<Table> population_tables(const LevelsResult& result, Grouping grouping,
                                     const std::string& source) {
  std::vector<Table> tables = {charge_table(result, atom_sets(result.symmetry), grouping)};
  Table pairs = overlap_population_table(result, grouping);
  if (!pairs.lines.empty()) tables.push_back(std::move(pairs));
  const std::string title = result.title.empty() ? readable_formula(result.molecule) : result.title;
  for (Table& table : tables) table.caption += ": " + title;
  tables.front().legend = geometry_sentence(result, source) + " " + method_sentence(result) +
                          " Mulliken's populations in electrons; charge in e: valence electrons "
                          "less gross population; " +
                          (grouping == Grouping::Equivalent
                               ? "each row for one of the atoms, or pairs, that are equivalent."
                               : "every atom and every pair by itself.");
  return tables;
}

std::string populations_csv(const LevelsResult& result) {
  Table table;
  for (const char* key : {"quantity", "atom", "other_atom", "orbital_type", "value"}) {
    table.columns.push_back({key, key, "", Align::Left, 0, false});
  }
  const Molecule& molecule = result.symmetry.molecule;
  const auto add = [&](const char* quantity, const std::string& atom, const std::string& other,
                       const std::string& type, double value) {
    table.lines.emplace_back(Row{{std::string(quantity), atom, other, type, Number{value}}});
  };
  for (int atom = 0; atom < molecule.size(); ++atom) {
    const std::string name = atom_name(molecule, atom);
    add("charge", name, "", "", result.populations.charge[atom]);
    add("gross_population", name, "", "", result.populations.gross_by_atom[atom]);
    for (const auto& [l, electrons] : gross_by_l(result, atom)) {
      add("gross_population", name, "", std::string(1, shell_letter(l)), electrons);
    }
  }
  for (const OverlapPopulation& pair : result.populations.overlap_populations) {
    const std::string a = atom_name(molecule, pair.atom_a);
    const std::string b = atom_name(molecule, pair.atom_b);
    add("overlap_population", a, b, "", pair.value);
    add("distance_angstrom", a, b, "", pair.distance_angstrom);
    add("bonded", a, b, "", pair.bonded ? 1.0 : 0.0);
  }
  return table_csv(table);
}

std::string populations_json(const LevelsResult& result, const std::string& source) {
  Json atoms = Json::array();
  const Molecule& molecule = result.symmetry.molecule;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    Json by_type = Json::object();
    for (const auto& [l, electrons] : gross_by_l(result, atom)) {
      by_type[std::string(1, shell_letter(l))] = finite_number(electrons);
    }
    const int element = molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number;
    atoms.push_back({{"atom", atom + 1},
                     {"element", element_symbol(element)},
                     {"charge", finite_number(result.populations.charge[atom])},
                     {"gross_population", finite_number(result.populations.gross_by_atom[atom])},
                     {"by_type", std::move(by_type)}});
  }
  Json pairs = Json::array();
  for (const OverlapPopulation& pair : result.populations.overlap_populations) {
    pairs.push_back({{"atoms", {pair.atom_a + 1, pair.atom_b + 1}},
                     {"distance_angstrom", finite_number(pair.distance_angstrom)},
                     {"overlap_population", finite_number(pair.value)},
                     {"bonded", pair.bonded}});
  }
  Json document = table_document(result, source);
  document["of"] = "populations";
  document["atoms"] = std::move(atoms);
  document["pairs"] = std::move(pairs);
  document["warnings"] = result.warnings;
  return json_text(document);
}

}  // namespace irrepwise
