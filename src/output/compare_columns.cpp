#include "output/compare_columns.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <functional>
#include <numeric>
#include <optional>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "molecule/element.hpp"
#include "molecule/molecule.hpp"
#include "output/bond_columns.hpp"

namespace irrepwise {
namespace {

constexpr double same_value = 1e-9;  // apart by rounding only: keeps the order

using Reader = std::function<Cell(const VariantResult&)>;

struct SummaryColumn {
  Column column;
  Reader read;
  SummaryPart part = SummaryPart::Frontier;
  bool shown = true;  // to people who picked no columns
};

Cell level_cell(const VariantResult& variant, const std::optional<int>& level) {
  return level ? Cell(SymmetryLabel{name_of_level(variant, *level)}) : Cell();
}

Cell energy_cell(const VariantResult& variant, const std::optional<int>& level) {
  if (!level) return {};
  return Number{variant.levels.levels.levels[static_cast<std::size_t>(*level)].energy_ev, 3};
}

Cell gap_cell(const VariantResult& variant) {
  const Frontier& frontier = variant.levels.levels.frontier;
  if (!frontier.homo || !frontier.lumo) return {};
  const auto& levels = variant.levels.levels.levels;
  return Number{levels[static_cast<std::size_t>(*frontier.lumo)].energy_ev -
                    levels[static_cast<std::size_t>(*frontier.homo)].energy_ev,
                3};
}

bool is_open(const VariantResult& variant) { return variant.levels.levels.frontier.open_shell; }

bool is_fragile(const VariantResult& variant) { return variant.robustness.fragile(); }

bool any_of(const Comparison& comparison, const std::function<bool(const VariantResult&)>& holds) {
  return std::any_of(comparison.variants.begin(), comparison.variants.end(), holds);
}

bool charges_differ(const Comparison& comparison) {
  const int first = comparison.variants.front().levels.molecule.charge();
  return any_of(comparison,
                [&](const VariantResult& v) { return v.levels.molecule.charge() != first; });
}

std::vector<SummaryColumn> all_columns(const Comparison& comparison) {
  using V = VariantResult;
  std::vector<SummaryColumn> columns = {
      {{"name", "variant", "", Align::Left, 0, true}, [](const V& v) { return Cell(v.name); }},
      {{"formula", "formula", "", Align::Left, 0, false},
       [](const V& v) { return Cell(hill_formula(v.levels.molecule)); },
       SummaryPart::Frontier,
       false},
      {{"charge", "charge", "e", Align::Right, 0, false},
       [](const V& v) {
         return Cell(Number{static_cast<double>(v.levels.molecule.charge()), 0, true});
       },
       SummaryPart::Frontier,
       charges_differ(comparison)},
      {{"electrons", "electrons", "", Align::Right, 0, false},
       [](const V& v) {
         return Cell(Number{static_cast<double>(v.levels.levels.electrons), 0});
       },
       SummaryPart::Frontier,
       false},
      {{"point_group", "group", "", Align::Left, 0, false},
       [](const V& v) { return Cell(v.levels.symmetry.group.symbol().name()); }},
      {{"homo", "HOMO", "", Align::Right, 0, false},
       [](const V& v) { return level_cell(v, v.levels.levels.frontier.homo); }},
      {{"homo_ev", "HOMO", "eV", Align::Decimal, 0, false},
       [](const V& v) { return energy_cell(v, v.levels.levels.frontier.homo); }},
      {{"lumo", "LUMO", "", Align::Right, 0, false},
       [](const V& v) { return level_cell(v, v.levels.levels.frontier.lumo); }},
      {{"lumo_ev", "LUMO", "eV", Align::Decimal, 0, false},
       [](const V& v) { return energy_cell(v, v.levels.levels.frontier.lumo); }},
      {{"gap_ev", "gap", "eV", Align::Decimal, 0, false}, gap_cell},
      {{"open_shell", "shell", "", Align::Left, 0, false},
       [](const V& v) { return Cell(is_open(v) ? "open" : ""); },
       SummaryPart::Frontier,
       any_of(comparison, is_open)},
      {{"fragile", "order", "", Align::Left, 0, false},
       [](const V& v) { return Cell(is_fragile(v) ? "fragile" : ""); },
       SummaryPart::Frontier,
       any_of(comparison, is_fragile)},
      {{"metal", "metal", "", Align::Left, 5, false},
       [](const V& v) {
         return v.metal() ? Cell(atom_name(v.levels.molecule, v.metal()->atom)) : Cell();
       },
       SummaryPart::Metal},
      {{"metal_charge", "metal charge", "e", Align::Decimal, 0, false},
       [](const V& v) {
         return v.metal() ? Cell(Number{v.metal()->charge, 3, true}) : Cell();
       },
       SummaryPart::Metal},
      {{"d_population", "d electrons", "", Align::Decimal, 1, false},
       [](const V& v) {
         return v.metal() && v.metal()->has_d_shell ? Cell(Number{v.metal()->d_population, 3})
                                                    : Cell();
       },
       SummaryPart::Metal}};
  for (const BondColumn& bonds : bond_columns(comparison)) {
    columns.push_back({{bonds.key, bonds.title, "", Align::Decimal, 2, false},
                       [mean = bonds.mean](const V& v) {
                         const std::optional<double> value = mean(v);
                         return value ? Cell(Number{*value, 3}) : Cell();
                       },
                       SummaryPart::Metal,
                       bonds.shown});
  }
  columns.push_back({{"sum_of_occupied_ev", "occupied", "eV", Align::Decimal, 3, false},
                     [](const V& v) {
                       return Cell(Number{v.levels.levels.sum_of_occupied_ev, 2});
                     },
                     SummaryPart::Metal});
  return columns;
}

const SummaryColumn& find_column(const std::vector<SummaryColumn>& columns,
                                 const std::string& key) {
  std::vector<std::string> known;
  for (const SummaryColumn& column : columns) {
    if (column.column.key == key) return column;
    known.push_back(column.column.key);
  }
  const std::string nearest = nearest_word(key, known);
  throw Error(fmt::format("there is no column {}{}; columns are {}", irrepwise::quoted(key),
                          nearest.empty() ? "" : " (did you mean '" + nearest + "'?)",
                          joined(known)));
}

bool has_metal(const Comparison& comparison) {
  return any_of(comparison, [](const VariantResult& v) { return v.metal() != nullptr; });
}

// The name goes with every part. Without metals there is one part, and in it no column of theirs.
std::vector<SummaryColumn> chosen_columns(const Comparison& comparison, const SummaryChoice& choice,
                                          SummaryPart part) {
  std::vector<SummaryColumn> all = all_columns(comparison);
  std::vector<SummaryColumn> chosen;
  for (const std::string& key : choice.columns) chosen.push_back(find_column(all, key));
  if (!chosen.empty() || part == SummaryPart::Whole) return chosen.empty() ? all : chosen;
  const bool split = has_metal(comparison);
  for (SummaryColumn& column : all) {
    const bool of_metal = column.part == SummaryPart::Metal;
    const bool sum = column.column.key == "sum_of_occupied_ev";
    const bool wanted = column.column.key == "name" ||
                        (column.shown && (split ? column.part == part : !of_metal || sum));
    if (wanted) chosen.push_back(std::move(column));
  }
  return chosen;
}

std::optional<double> number_in(const Cell& cell) {
  const Number* number = std::get_if<Number>(&cell);
  return number ? std::optional<double>(number->value) : std::nullopt;
}

// Whether the first comes before the second: numbers by size, all else by its text, nothing last.
bool comes_before(const Cell& a, const Cell& b, bool descending) {
  if (a.index() != b.index() || std::holds_alternative<std::monostate>(a)) {
    return b.index() == 0 && a.index() != 0;
  }
  if (const std::optional<double> x = number_in(a), y = number_in(b); x && y) {
    if (std::abs(*x - *y) < same_value) return false;
    return (*x < *y) != descending;
  }
  const std::string x = cell_exact(a), y = cell_exact(b);
  return descending ? y < x : x < y;
}

std::vector<std::size_t> row_order(const Comparison& comparison, const SummaryChoice& choice) {
  std::vector<std::size_t> order(comparison.variants.size());
  std::iota(order.begin(), order.end(), std::size_t{0});
  if (choice.sort_by.empty()) return order;
  const std::vector<SummaryColumn> all = all_columns(comparison);
  const SummaryColumn& column = find_column(all, choice.sort_by);
  std::stable_sort(order.begin(), order.end(), [&](std::size_t a, std::size_t b) {
    return comes_before(column.read(comparison.variants[a]), column.read(comparison.variants[b]),
                        choice.descending);
  });
  return order;
}

Cell difference(const Cell& cell, const Cell& reference) {
  const std::optional<double> value = number_in(cell), from = number_in(reference);
  if (!value || !from) return {};
  return Number{*value - *from, std::get<Number>(cell).digits, true};
}

bool holds_numbers(const SummaryColumn& column, const Comparison& comparison) {
  return any_of(comparison,
                [&](const VariantResult& v) { return number_in(column.read(v)).has_value(); });
}

bool has_several_metals(const VariantResult& variant) {
  return variant.metals.size() > 1 || (variant.metal() && variant.metal()->n_equivalent > 1);
}

// Elements of metals shown that have no d shell in the parameters: "Zn, Cd".
std::string without_d_shell(const Comparison& comparison) {
  std::vector<std::string> elements;
  for (const VariantResult& variant : comparison.variants) {
    if (!variant.metal() || variant.metal()->has_d_shell) continue;
    const auto& atoms = variant.levels.molecule.atoms();
    std::string element(
        element_symbol(atoms[static_cast<std::size_t>(variant.metal()->atom)].atomic_number));
    if (std::find(elements.begin(), elements.end(), element) == elements.end()) {
      elements.push_back(std::move(element));
    }
  }
  return joined(elements);
}

// What the columns present mean, as far as their titles do not say it.
std::vector<std::string> notes_on(const std::vector<SummaryColumn>& columns,
                                  const Comparison& comparison) {
  std::vector<std::string> bonds;
  for (const SummaryColumn& column : columns) {
    if (column.column.key.starts_with("bond_")) bonds.push_back(column.column.header);
  }
  const auto has = [&](const char* key) {
    return std::any_of(columns.begin(), columns.end(),
                       [&](const SummaryColumn& column) { return column.column.key == key; });
  };
  std::string text;
  const auto say = [&](const std::string& words) { text += (text.empty() ? "" : " ") + words; };
  if (has("electrons")) say("electrons: valence electrons, all that the levels hold.");
  if (has("fragile") && any_of(comparison, is_fragile)) {
    say("fragile: a small change of one parameter turns the order of two frontier levels, see "
        "below.");
  }
  if (has("open_shell") && any_of(comparison, is_open)) {
    say("open: the HOMO is not full; the gap is that to the lowest empty level.");
  }
  const bool metal = has("metal_charge") || has("d_population");
  if (metal) say("metal charge, d electrons: by Mulliken's populations.");
  if (const std::string bare = without_d_shell(comparison); has("d_population") && !bare.empty()) {
    say(bare + ": no d shell among the parameters, thus no d electrons and no d block.");
  }
  if (!bonds.empty()) say(bond_words(bonds));
  if ((metal || !bonds.empty()) && any_of(comparison, has_several_metals)) {
    say("Of several metals the first is shown here; the d block has each.");
  }
  if (has("sum_of_occupied_ev")) {
    say("occupied: sum of the energies of all electrons, which is not a total energy: no reaction "
        "energy follows from differences of it.");
  }
  return text.empty() ? std::vector<std::string>{} : std::vector<std::string>{text};
}

}  // namespace

void check_columns(const Comparison& comparison, const std::vector<std::string>& keys) {
  const std::vector<SummaryColumn> all = all_columns(comparison);
  for (const std::string& key : keys) static_cast<void>(find_column(all, key));
}

std::vector<SummaryPart> summary_parts(const Comparison& comparison, const SummaryChoice& choice) {
  if (!choice.columns.empty() || !has_metal(comparison)) return {SummaryPart::Frontier};
  return {SummaryPart::Frontier, SummaryPart::Metal};
}

Table summary_table(const Comparison& comparison, const SummaryChoice& choice, SummaryPart part) {
  const std::vector<SummaryColumn> columns = chosen_columns(comparison, choice, part);
  const VariantResult& reference =
      comparison.variants[static_cast<std::size_t>(comparison.reference)];
  std::vector<const SummaryColumn*> differing;
  Table table;
  table.caption = part == SummaryPart::Metal ? "The metal and its bonds" : "Summary";
  for (const SummaryColumn& column : columns) {
    table.columns.push_back(column.column);
    if (choice.differences && holds_numbers(column, comparison)) differing.push_back(&column);
  }
  for (const SummaryColumn* column : differing) {
    Column own = column->column;
    own.key = "delta_" + own.key;
    own.header = "Δ " + own.header;
    table.columns.push_back(std::move(own));
  }
  for (const std::size_t i : row_order(comparison, choice)) {
    const VariantResult& variant = comparison.variants[i];
    Row row;
    for (const SummaryColumn& column : columns) row.cells.push_back(column.read(variant));
    for (const SummaryColumn* column : differing) {
      row.cells.push_back(difference(column->read(variant), column->read(reference)));
    }
    table.lines.emplace_back(std::move(row));
  }
  table.notes = notes_on(columns, comparison);
  return table;
}

Table difference_table(const Comparison& comparison, const SummaryChoice& choice,
                       SummaryPart part) {
  const std::vector<SummaryColumn> columns = chosen_columns(comparison, choice, part);
  const auto at = static_cast<std::size_t>(comparison.reference);
  const VariantResult& reference = comparison.variants[at];
  Table table;
  table.caption = "Differences from " + reference.name +
                  (part == SummaryPart::Metal ? ": the metal and its bonds" : "");
  table.columns.push_back({"name", "variant", "", Align::Left, 0, true});
  std::vector<const SummaryColumn*> numbers;
  for (const SummaryColumn& column : columns) {
    if (!holds_numbers(column, comparison)) continue;
    numbers.push_back(&column);
    table.columns.push_back(column.column);
  }
  for (const std::size_t i : row_order(comparison, choice)) {
    if (i == at) continue;
    Row row{{comparison.variants[i].name}};
    for (const SummaryColumn* column : numbers) {
      row.cells.push_back(
          difference(column->read(comparison.variants[i]), column->read(reference)));
    }
    table.lines.emplace_back(std::move(row));
  }
  return table;
}

}  // namespace irrepwise
