#include "output/table_markdown.hpp"

#include <algorithm>

#include "output/display_width.hpp"
#include "output/figure_spaces.hpp"

namespace irrepwise {
namespace {

std::vector<std::string> column_cells(const Table& table, std::size_t index) {
  int after = 0;
  for (const auto& line : table.lines) {
    if (const Row* row = std::get_if<Row>(&line)) {
      after = std::max(after, display_width(decimal_parts(row->cells[index]).after));
    }
  }
  std::vector<std::string> cells;
  for (const auto& line : table.lines) {
    if (const auto* separator = std::get_if<Separator>(&line)) {
      // A pipe table has no lines across: the words stand in the first column.
      cells.push_back(index == 0 && !separator->words.empty()
                          ? "*" + markdown_text(separator->words) + "*"
                          : "");
      continue;
    }
    const Cell& cell = std::get<Row>(line).cells[index];
    const DecimalParts parts = decimal_parts(cell);
    const bool fill = table.columns[index].align == Align::Decimal && !parts.before.empty();
    cells.push_back(markdown_text(parts.before) +
                    (fill ? filled_with_figure_spaces(parts.after, after) : parts.after));
  }
  return cells;
}

void add_row(std::string& out, const std::vector<std::string>& cells,
             const std::vector<int>& widths, const std::vector<Column>& columns) {
  for (std::size_t i = 0; i < cells.size(); ++i) {
    out += "| ";
    out += columns[i].align == Align::Left ? padded_right(cells[i], widths[i])
                                           : padded_left(cells[i], widths[i]);
    out += ' ';
  }
  out += "|\n";
}

}  // namespace

std::string markdown_text(std::string_view text) {
  std::string out;
  for (const char c : text) {
    if (std::string_view("\\`*_{}[]<>|#").find(c) != std::string_view::npos) out += '\\';
    out += c;
  }
  return out;
}

std::string table_markdown(const Table& table) {
  std::vector<std::vector<std::string>> columns;
  std::vector<std::string> titles;
  std::vector<int> widths;
  for (std::size_t i = 0; i < table.columns.size(); ++i) {
    columns.push_back(column_cells(table, i));
    titles.push_back(markdown_text(column_title(table.columns[i])));
    widths.push_back(std::max(3, display_width(titles.back())));
    for (const std::string& cell : columns.back()) {
      widths.back() = std::max(widths.back(), display_width(cell));
    }
  }

  std::string out;
  if (!table.caption.empty()) out += "**" + markdown_text(table.caption) + "**\n\n";
  if (!table.legend.empty()) out += markdown_text(table.legend) + "\n\n";
  add_row(out, titles, widths, table.columns);
  for (std::size_t i = 0; i < widths.size(); ++i) {
    const std::string dashes(static_cast<std::size_t>(widths[i] + 1), '-');
    out += table.columns[i].align == Align::Left ? "|" + dashes + "-" : "|" + dashes + ":";
  }
  out += "|\n";
  for (std::size_t line = 0; line < table.lines.size(); ++line) {
    std::vector<std::string> cells;
    for (const auto& column : columns) cells.push_back(column[line]);
    add_row(out, cells, widths, table.columns);
  }
  for (const std::string& note : table.notes) out += "\n" + markdown_text(note) + "\n";
  return out;
}

}  // namespace irrepwise
