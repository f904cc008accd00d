#include "output/orbital_table_data.hpp"

#include <cmath>
#include <utility>

#include "molecule/element.hpp"
#include "output/json_text.hpp"
#include "output/table_csv.hpp"
#include "output/table_document.hpp"
#include "symmetry/irrep.hpp"

namespace irrepwise {
namespace {

bool over_salcs(const OrbitalTable& table) {
  return table.options.functions == TableFunctions::Salcs;
}

bool as_shares(const OrbitalTable& table) { return table.options.entries == TableEntries::Shares; }

const Level& level_of(const LevelsResult& result, const TableOrbital& orbital) {
  return result.levels.levels[static_cast<std::size_t>(orbital.choice.level)];
}

// Nothing below the threshold, and for SALCs of another irrep than the level's.
std::optional<double> entry(const LevelsResult& result, const OrbitalTable& table, std::size_t row,
                            std::size_t column, double threshold) {
  if (over_salcs(table) &&
      table.functions[row].irrep != level_of(result, table.orbitals[column]).irrep) {
    return std::nullopt;
  }
  const auto i = static_cast<Eigen::Index>(row);
  const auto j = static_cast<Eigen::Index>(column);
  const double value = as_shares(table) ? 100.0 * table.shares(i, j) : table.coefficients(i, j);
  if (std::abs(value) < threshold) return std::nullopt;
  return value;
}

bool has_entry(const LevelsResult& result, const OrbitalTable& table, std::size_t row,
               double threshold) {
  for (std::size_t column = 0; column < table.orbitals.size(); ++column) {
    if (entry(result, table, row, column, threshold)) return true;
  }
  return false;
}

std::string irrep_of(const LevelsResult& result, int irrep) {
  return level_label(result.symmetry.group.irreps()[static_cast<std::size_t>(irrep)].label);
}

Json function_json(const LevelsResult& result, const OrbitalTable& table,
                   const TableFunction& function) {
  Json entry = {{"set", table.sets[static_cast<std::size_t>(function.set)].name}};
  if (function.atom) {
    const Atom& atom = result.molecule.atoms()[static_cast<std::size_t>(*function.atom)];
    entry["atom"] = *function.atom + 1;
    entry["element"] = element_symbol(atom.atomic_number);
    entry["orbital"] = function.name;
  } else {
    entry["irrep"] = irrep_of(result, function.irrep);
    entry["orbital"] = function.name;
    entry["number"] = function.number;
    if (function.partner > 0) entry["partner"] = function.partner;
  }
  entry["frame"] = function.frame == OrbitalFrame::Standard ? "standard" : "local";
  return entry;
}

Json orbital_json(const LevelsResult& result, const TableOrbital& orbital) {
  const Level& level = level_of(result, orbital);
  const Frontier& frontier = result.levels.frontier;
  return {{"name", orbital.name},
          {"label", level_name(result.symmetry.group, level)},
          {"partner", orbital.choice.partner + 1},
          {"degeneracy", level.degeneracy},
          {"energy_ev", finite_number(level.energy_ev)},
          {"occupation", finite_number(level.occupation)},
          {"frontier", frontier.homo == orbital.choice.level   ? Json("homo")
                       : frontier.lumo == orbital.choice.level ? Json("lumo")
                                                               : Json(nullptr)}};
}

}  // namespace

std::string orbital_table_csv(const LevelsResult& result, const OrbitalTable& table,
                              const OrbitalTableData& data) {
  const bool salcs = over_salcs(table);
  Table sheet;
  const auto add_column = [&](const std::string& key) {
    sheet.columns.push_back({key, key, "", Align::Left, 0, false});
  };
  for (const char* key : {"quantity", "set"}) add_column(key);
  if (salcs) {
    for (const char* key : {"irrep", "orbital", "number", "partner"}) add_column(key);
  } else {
    for (const char* key : {"atom", "orbital"}) add_column(key);
  }
  const std::size_t fixed = sheet.columns.size();
  for (const TableOrbital& orbital : table.orbitals) add_column(orbital.name);

  const auto add_head = [&](const char* quantity, auto&& value) {
    Row row{{std::string(quantity)}};
    row.cells.resize(fixed);
    for (const TableOrbital& orbital : table.orbitals) {
      row.cells.emplace_back(Number{value(level_of(result, orbital))});
    }
    sheet.lines.emplace_back(std::move(row));
  };
  add_head("energy_ev", [](const Level& level) { return level.energy_ev; });
  add_head("occupation", [](const Level& level) { return level.occupation; });
  add_head("degeneracy", [](const Level& level) { return double(level.degeneracy); });

  for (std::size_t i = 0; i < table.functions.size(); ++i) {
    if (data.threshold > 0.0 && !has_entry(result, table, i, data.threshold)) continue;
    const TableFunction& function = table.functions[i];
    Row row{{std::string(as_shares(table) ? "share_percent" : "coefficient"),
             table.sets[static_cast<std::size_t>(function.set)].name}};
    if (salcs) {
      row.cells.emplace_back(SymmetryLabel{irrep_of(result, function.irrep)});
      row.cells.emplace_back(function.name);
      row.cells.emplace_back(Number{double(function.number)});
      row.cells.emplace_back(function.partner > 0 ? Cell(Number{double(function.partner)})
                                                  : Cell());
    } else {
      row.cells.emplace_back(atom_name(result.symmetry.molecule, *function.atom));
      row.cells.emplace_back(function.name);
    }
    for (std::size_t j = 0; j < table.orbitals.size(); ++j) {
      const std::optional<double> value = entry(result, table, i, j, data.threshold);
      row.cells.emplace_back(value ? Cell(Number{*value}) : Cell());
    }
    sheet.lines.emplace_back(std::move(row));
  }
  return table_csv(sheet);
}

std::string orbital_table_json(const LevelsResult& result, const OrbitalTable& table,
                               const OrbitalTableData& data) {
  Json orbitals = Json::array();
  for (const TableOrbital& orbital : table.orbitals)
    orbitals.push_back(orbital_json(result, orbital));
  Json rows = Json::array();
  for (std::size_t i = 0; i < table.functions.size(); ++i) {
    if (data.threshold > 0.0 && !has_entry(result, table, i, data.threshold)) continue;
    Json row = function_json(result, table, table.functions[i]);
    Json values = Json::object();
    for (std::size_t j = 0; j < table.orbitals.size(); ++j) {
      const std::optional<double> value = entry(result, table, i, j, data.threshold);
      values[table.orbitals[j].name] = value ? Json(finite_number(*value)) : Json(nullptr);
    }
    row["values"] = std::move(values);
    rows.push_back(std::move(row));
  }
  Json document = table_document(result, data.source);
  document["of"] = as_shares(table) ? "shares" : "coefficients";
  document["unit"] = as_shares(table) ? "%" : "";
  document["over"] = over_salcs(table) ? "salcs" : "orbitals";
  document["frame"] = table.options.frame == OrbitalFrame::Local ? "local" : "standard";
  document["threshold"] = data.threshold;
  document["orbitals"] = std::move(orbitals);
  document["rows"] = std::move(rows);
  document["warnings"] = result.warnings;
  return json_text(document);
}

}  // namespace irrepwise
