#include "output/table_csv.hpp"

namespace irrepwise {
namespace {

std::string quoted_field(const std::string& field) {
  if (field.find_first_of(",\"\r\n") == std::string::npos) return field;
  std::string text = "\"";
  for (const char c : field) {
    if (c == '"') text += '"';
    text += c;
  }
  return text + '"';
}

}  // namespace

std::string table_csv(const Table& table) {
  std::string out;
  for (std::size_t i = 0; i < table.columns.size(); ++i) {
    out += (i > 0 ? "," : "") + quoted_field(table.columns[i].key);
  }
  out += "\r\n";
  for (const auto& line : table.lines) {
    const Row* row = std::get_if<Row>(&line);
    if (row == nullptr) continue;
    for (std::size_t i = 0; i < row->cells.size(); ++i) {
      out += (i > 0 ? "," : "") + quoted_field(cell_exact(row->cells[i]));
    }
    out += "\r\n";
  }
  return out;
}

}  // namespace irrepwise
