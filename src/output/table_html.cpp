#include "output/table_html.hpp"

#include <algorithm>
#include <vector>

#include "output/display_width.hpp"
#include "output/figure_spaces.hpp"
#include "output/html_text.hpp"

namespace irrepwise {
namespace {

// A hyphen is narrower than a digit; the true minus is as wide as the plus.
std::string with_true_minus(std::string text) {
  return text.starts_with('-') ? "−" + text.substr(1) : text;
}

std::string class_of(const Column& column) {
  if (column.align != Align::Left) return " class=\"number\"";
  return column.wraps ? "" : " class=\"word\"";
}

std::string head_cell(const Column& column) {
  std::string title = html_text(column.header);
  if (!column.label.empty()) {
    title.insert(0, html_label(column.label));
  }
  if (!column.unit.empty())
    title += " <span class=\"unit\">/ " + html_text(column.unit) + "</span>";
  const std::string key = " data-key=\"" + html_text(column.key) + "\"";
  // An empty head is no head: a reader of screens would announce it.
  if (title.empty()) return "<td" + class_of(column) + key + "></td>";
  return "<th scope=\"col\"" + class_of(column) + key + ">" + title + "</th>";
}

std::string body_cell(const Column& column, const Cell& cell, int digits_after) {
  std::string shown;
  if (const auto* label = std::get_if<SymmetryLabel>(&cell)) {
    shown = html_label(label->ascii);
  } else if (const auto* words = std::get_if<Words>(&cell)) {
    for (const WordsPart& part : parts_of(*words)) {
      shown += part.is_label ? html_label(part.text) : html_words(part.text);
    }
  } else if (std::holds_alternative<Number>(cell)) {
    const DecimalParts parts = decimal_parts(cell);
    shown = with_true_minus(parts.before);
    shown += column.align == Align::Decimal ? filled_with_figure_spaces(parts.after, digits_after)
                                            : parts.after;
  } else {
    const std::string text = cell_text(cell);  // "-1/2" stands in a right column as a text
    shown = html_words(column.align == Align::Left ? text : with_true_minus(text));
  }
  return "<td" + class_of(column) + " data-value=\"" + html_text(cell_exact(cell)) + "\">" + shown +
         "</td>";
}

std::vector<int> digits_after_point(const Table& table) {
  std::vector<int> after(table.columns.size(), 0);
  for (const auto& line : table.lines) {
    const Row* row = std::get_if<Row>(&line);
    if (row == nullptr) continue;
    for (std::size_t i = 0; i < row->cells.size(); ++i) {
      after[i] = std::max(after[i], display_width(decimal_parts(row->cells[i]).after));
    }
  }
  return after;
}

}  // namespace

std::string table_html(const Table& table) {
  const std::vector<int> after = digits_after_point(table);
  // A table too wide for a phone scrolls by itself, by keyboard too.
  std::string out = "<div class=\"table\">\n<div class=\"scroll\" role=\"region\" tabindex=\"0\"";
  out += " aria-label=\"" + (table.caption.empty() ? "table" : html_text(table.caption)) + "\">\n";
  out += "<table>\n";
  if (!table.caption.empty()) {
    // The inner block keeps its place while a wide table scrolls beneath it.
    out += "<caption><div class=\"caption\">" + html_words(table.caption);
    if (!table.legend.empty()) {
      out += " <span class=\"legend\">" + html_words(table.legend) + "</span>";
    }
    out += "</div>";
    out += "</caption>\n";
  }
  out += "<thead>\n<tr>";
  for (const Column& column : table.columns) out += head_cell(column);
  out += "</tr>\n</thead>\n";

  bool open = false;
  const auto begin_part = [&] {
    if (open) out += "</tbody>\n";
    out += "<tbody>\n";
    open = true;
  };
  for (const auto& line : table.lines) {
    if (const auto* separator = std::get_if<Separator>(&line)) {
      begin_part();
      if (separator->words.empty()) continue;
      out += "<tr class=\"separator\"><th scope=\"rowgroup\" colspan=\"" +
             std::to_string(table.columns.size()) + "\">" + html_words(separator->words) +
             "</th></tr>\n";
      continue;
    }
    if (!open) begin_part();
    const Row& row = std::get<Row>(line);
    out += "<tr>";
    for (std::size_t i = 0; i < row.cells.size(); ++i) {
      out += body_cell(table.columns[i], row.cells[i], after[i]);
    }
    out += "</tr>\n";
  }
  if (open) out += "</tbody>\n";
  out += "</table>\n</div>\n";
  for (const std::string& note : table.notes) {
    out += "<p class=\"note\">" + html_words(note) + "</p>\n";
  }
  return out + "</div>\n";
}

std::string_view table_style() {
  return R"css(.table { margin: 2rem 0; }
.scroll { overflow-x: auto; }
.table table { border-collapse: collapse; line-height: 1.35; }
.table caption { text-align: left; font-weight: 600; padding: 0 0 .5rem; color: var(--ink); }
.table .caption { position: sticky; left: 0; max-width: min(46rem, calc(100vw - 2.5rem)); }
.table .legend { display: block; font-weight: 400; font-size: .86rem; color: var(--muted); padding-top: .25rem; }
.table th, .table td { padding: .16rem .7rem; text-align: left; vertical-align: baseline; }
.table th:first-child, .table td:first-child { padding-left: .2rem; }
.table thead th, .table thead td { border-top: 1.5px solid var(--ink); border-bottom: 1px solid var(--ink);
  font-weight: 500; color: var(--muted); vertical-align: bottom; }
.table tbody + tbody { border-top: 1px solid var(--faint); }
.table tbody:last-child { border-bottom: 1.5px solid var(--ink); }
.table .word { white-space: nowrap; }
.table .number { text-align: right; white-space: nowrap; font-variant-numeric: tabular-nums lining-nums; }
.table .separator th { font-weight: 400; font-style: italic; color: var(--muted); padding-top: .4rem; }
.table .unit { white-space: nowrap; }
.table .note { font-size: .86rem; color: var(--muted); margin: .4rem 0 0; max-width: 46rem; }
.table sub, .table sup { font-size: .72em; line-height: 0; }
@media print {
  .table table { break-inside: auto; }
  .table tr { break-inside: avoid; }
  .table thead { display: table-header-group; }
  .scroll { overflow: visible; }
}
)css";
}

}  // namespace irrepwise
