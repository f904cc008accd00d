#include "output/table_json.hpp"

#include "output/table_json_value.hpp"

namespace irrepwise {
namespace {

Json cell_json(const Cell& cell) {
  if (std::holds_alternative<std::monostate>(cell)) return nullptr;
  if (const auto* number = std::get_if<Number>(&cell)) return finite_number(number->value);
  return cell_exact(cell);
}

}  // namespace

Json table_json_value(const Table& table) {
  Json columns = Json::array();
  for (const Column& column : table.columns) {
    Column unitless = column;
    unitless.unit.clear();
    columns.push_back(
        {{"key", column.key}, {"header", column_title(unitless)}, {"unit", column.unit}});
  }
  Json rows = Json::array();
  for (const auto& line : table.lines) {
    const Row* row = std::get_if<Row>(&line);
    if (row == nullptr) continue;
    Json entry = Json::object();
    for (std::size_t i = 0; i < row->cells.size(); ++i) {
      entry[table.columns[i].key] = cell_json(row->cells[i]);
    }
    rows.push_back(std::move(entry));
  }
  return {{"caption", table.legend.empty() ? table.caption : table.caption + ". " + table.legend},
          {"columns", std::move(columns)},
          {"rows", std::move(rows)},
          {"notes", table.notes}};
}

std::string table_json(const Table& table) { return json_text(table_json_value(table)); }

}  // namespace irrepwise
