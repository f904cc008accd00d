#include "output/table_latex.hpp"

#include <algorithm>
#include <cstddef>
#include <vector>

#include "output/latex_columns.hpp"
#include "output/latex_text.hpp"

namespace irrepwise {
namespace {

constexpr std::ptrdiff_t most_rows_on_a_page = 40;  // of a float, caption and notes beside them

std::string latex_title(const Column& column) {
  if (column.label.empty()) return latex_words(column_title(column));
  Column without = column;
  without.label.clear();
  return latex_label(column.label) + latex_words(column_title(without));
}

std::string latex_cell(const Cell& cell, int digits_after) {
  if (const auto* label = std::get_if<SymmetryLabel>(&cell)) return latex_label(label->ascii);
  if (const auto* words = std::get_if<Words>(&cell)) {
    std::string text;
    for (const WordsPart& part : parts_of(*words)) {
      text += part.is_label ? latex_label(part.text) : latex_words(part.text);
    }
    return text;
  }
  if (!std::holds_alternative<Number>(cell)) return latex_words(cell_text(cell));
  const DecimalParts parts = decimal_parts(cell);
  std::string text = "$" + parts.before + parts.after + "$";
  const int missing = digits_after - static_cast<int>(parts.after.size());
  if (missing > 0) {  // an invisible stretch of the same width keeps the points below each other
    std::string stretch = parts.after.empty() ? "." : "";
    stretch.resize(static_cast<std::size_t>(missing), '0');
    text += "\\phantom{$" + stretch + "$}";
  }
  return text;
}

std::vector<int> digits_after_point(const Table& table) {
  std::vector<int> after(table.columns.size(), 0);
  for (const auto& line : table.lines) {
    const Row* row = std::get_if<Row>(&line);
    if (row == nullptr) continue;
    for (std::size_t i = 0; i < row->cells.size(); ++i) {
      if (table.columns[i].align != Align::Decimal) continue;
      after[i] = std::max(after[i], static_cast<int>(decimal_parts(row->cells[i]).after.size()));
    }
  }
  return after;
}

// A bracket or a star at the start of a row would belong to the command before it.
std::string guarded(const std::string& cells) {
  return cells.starts_with('[') || cells.starts_with('*') ? "{}" + cells : cells;
}

std::string latex_body(const Table& table, const LatexPart& part) {
  const std::vector<int> after = digits_after_point(table);
  std::string body;
  for (const auto& line : table.lines) {
    if (const auto* separator = std::get_if<Separator>(&line)) {
      if (!body.empty()) body += "\\midrule\n";
      if (!separator->words.empty()) {
        body += "\\multicolumn{" + std::to_string(part.columns.size()) + "}{c}{\\textit{" +
                latex_words(separator->words) + "}} \\\\\n\\midrule\n";
      }
      continue;
    }
    const Row& row = std::get<Row>(line);
    std::string cells;
    for (const LatexColumn& column : part.columns) {
      if (&column != part.columns.data()) cells += " & ";
      cells += latex_cell(row.cells[column.index], after[column.index]);
    }
    body += guarded(cells) + " \\\\\n";
  }
  return body;
}

// One part of the table with its caption, as a float or over as many pages as it needs.
std::string latex_part(const Table& table, const LatexPart& part, const std::string& caption,
                       const std::string& notes) {
  std::string kinds;
  std::string titles;
  for (const LatexColumn& column : part.columns) {
    titles += (kinds.empty() ? "" : " & ") + latex_title(table.columns[column.index]);
    kinds += column.kind;
  }
  const std::string head = "\\toprule\n" + guarded(titles) + " \\\\\n\\midrule\n";
  const std::string body = latex_body(table, part);
  const auto rows = std::count_if(table.lines.begin(), table.lines.end(), [](const auto& line) {
    return std::holds_alternative<Row>(line);
  });
  const std::string size = part.size.empty() ? "" : part.size + "\n";
  if (rows > most_rows_on_a_page) {
    return "{" + (size.empty() ? "\n" : size) +
           "\\setlength{\\LTcapwidth}{\\linewidth}\n\\begin{longtable}{" + kinds + "}\n" +
           (caption.empty() ? "" : "\\caption{" + caption + "} \\\\\n") + head +
           "\\endfirsthead\n" + head + "\\endhead\n\\bottomrule\n\\endlastfoot\n" + body +
           "\\end{longtable}\n" + notes + "}\n";
  }
  return "\\begin{table}\n\\centering\n" + (caption.empty() ? "" : "\\caption{" + caption + "}\n") +
         size + "\\begin{tabular}{" + kinds + "}\n" + head + body +
         "\\bottomrule\n\\end{tabular}\n" + notes + "\\end{table}\n";
}

}  // namespace

std::string table_latex(const Table& table) {
  std::string notes;
  for (const std::string& note : table.notes) {
    notes += "\\par\\smallskip{\\footnotesize " + latex_words(note) + "\\par}\n";
  }
  const std::vector<LatexPart> parts = latex_parts(table);
  std::string out;
  for (const LatexPart& part : parts) {
    const bool first = &part == &parts.front();
    std::string caption = latex_words(table.caption);
    if (!first) caption += " (continued)";
    if (first && !table.legend.empty()) caption += ". " + latex_words(table.legend);
    if (!first) out += '\n';
    out += latex_part(table, part, caption, &part == &parts.back() ? notes : "");
  }
  return out;
}

}  // namespace irrepwise
