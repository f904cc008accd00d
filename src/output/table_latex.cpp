#include "output/table_latex.hpp"

#include <algorithm>
#include <array>
#include <utility>

#include "output/label_parts.hpp"

namespace irrepwise {
namespace {

using Replacement = std::pair<std::string_view, std::string_view>;

constexpr std::array<Replacement, 27> replacements = {{
    {"\\", "\\textbackslash{}"},
    {"{", "\\{"},
    {"}", "\\}"},
    {"$", "\\$"},
    {"&", "\\&"},
    {"%", "\\%"},
    {"#", "\\#"},
    {"_", "\\_"},
    {"^", "\\textasciicircum{}"},
    {"~", "\\textasciitilde{}"},
    {"\u00A0", "~"},
    {"Å", "\\AA{}"},
    {"×", "$\\times$"},
    {"−", "$-$"},
    {"–", "--"},
    {"ζ", "$\\zeta$"},
    {"χ", "$\\chi$"},
    {"∞", "$\\infty$"},
    {"′", "$'$"},
    {"″", "$''$"},
    {"σ", "$\\sigma$"},
    {"π", "$\\pi$"},
    {"δ", "$\\delta$"},
    {"φ", "$\\phi$"},
    {"Σ", "$\\Sigma$"},
    {"<", "\\textless{}"},
    {">", "\\textgreater{}"},
}};

// Greek letters of labels, in mathematics.
constexpr std::array<Replacement, 16> letters = {{{"σ", "\\sigma"},
                                                  {"π", "\\pi"},
                                                  {"δ", "\\delta"},
                                                  {"φ", "\\phi"},
                                                  {"γ", "\\gamma"},
                                                  {"η", "\\eta"},
                                                  {"ι", "\\iota"},
                                                  {"κ", "\\kappa"},
                                                  {"λ", "\\lambda"},
                                                  {"Σ", "\\Sigma"},
                                                  {"Π", "\\Pi"},
                                                  {"Δ", "\\Delta"},
                                                  {"Φ", "\\Phi"},
                                                  {"Γ", "\\Gamma"},
                                                  {"Λ", "\\Lambda"},
                                                  {"Η", "\\mathrm{H}"}}};

constexpr std::size_t most_rows_on_a_page = 40;  // of a float, caption and notes beside them

std::string latex_title(const Column& column) {
  if (column.label.empty()) return latex_text(column_title(column));
  Column without = column;
  without.label.clear();
  return latex_label(column.label) + latex_text(column_title(without));
}

std::string latex_cell(const Cell& cell, int digits_after) {
  if (const auto* label = std::get_if<SymmetryLabel>(&cell)) return latex_label(label->ascii);
  if (!std::holds_alternative<Number>(cell)) return latex_text(cell_text(cell));
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

std::string column_kind(const Column& column) {
  if (column.wraps) return "p{0.45\\linewidth}";
  return column.align == Align::Left ? "l" : "r";
}

}  // namespace

std::string latex_text(std::string_view text) {
  std::string out;
  while (!text.empty()) {
    const auto* found =
        std::find_if(replacements.begin(), replacements.end(),
                     [&](const Replacement& r) { return text.starts_with(r.first); });
    if (found == replacements.end()) {
      out += text.front();
      text.remove_prefix(1);
    } else {
      out += found->second;
      text.remove_prefix(found->first.size());
    }
  }
  return out;
}

std::string latex_label(const std::string& ascii) {
  const LabelParts parts = label_parts(ascii);
  const auto* letter = std::find_if(
      letters.begin(), letters.end(),
      [&](const Replacement& replacement) { return replacement.first == parts.letter; });
  std::string out = "$" + parts.number;
  out += letter == letters.end() ? parts.letter : std::string(letter->second);
  if (!parts.below.empty()) out += "_{" + parts.below + "}";
  if (!parts.above.empty()) out += "^{" + parts.above + "}";
  return out + std::string(static_cast<std::size_t>(parts.primes), '\'') + "$";
}

std::string table_latex(const Table& table) {
  std::vector<int> digits_after(table.columns.size(), 0);
  std::size_t rows = 0;
  for (const auto& line : table.lines) {
    const Row* row = std::get_if<Row>(&line);
    if (row == nullptr) continue;
    ++rows;
    for (std::size_t i = 0; i < row->cells.size(); ++i) {
      if (table.columns[i].align != Align::Decimal) continue;
      const auto after = static_cast<int>(decimal_parts(row->cells[i]).after.size());
      digits_after[i] = std::max(digits_after[i], after);
    }
  }

  std::string kinds;
  std::string titles;
  for (const Column& column : table.columns) {
    titles += (kinds.empty() ? "" : " & ") + latex_title(column);
    kinds += column_kind(column);
  }
  std::string caption = latex_text(table.caption);
  if (!table.legend.empty()) caption += ". " + latex_text(table.legend);

  std::string body;
  for (const auto& line : table.lines) {
    if (const auto* separator = std::get_if<Separator>(&line)) {
      if (!body.empty()) body += "\\midrule\n";
      if (!separator->words.empty()) {
        body += "\\multicolumn{" + std::to_string(table.columns.size()) + "}{c}{\\textit{" +
                latex_text(separator->words) + "}} \\\\\n\\midrule\n";
      }
      continue;
    }
    const Row& row = std::get<Row>(line);
    for (std::size_t i = 0; i < row.cells.size(); ++i) {
      body += (i > 0 ? " & " : "") + latex_cell(row.cells[i], digits_after[i]);
    }
    body += " \\\\\n";
  }
  std::string notes;
  for (const std::string& note : table.notes) {
    notes += "\\par\\smallskip{\\footnotesize " + latex_text(note) + "\\par}\n";
  }

  const std::string head = "\\toprule\n" + titles + " \\\\\n\\midrule\n";
  if (rows > most_rows_on_a_page) {
    return "\\begin{longtable}{" + kinds + "}\n" +
           (caption.empty() ? "" : "\\caption{" + caption + "} \\\\\n") + head +
           "\\endfirsthead\n" + head + "\\endhead\n\\bottomrule\n\\endlastfoot\n" + body +
           "\\end{longtable}\n" + notes;
  }
  return "\\begin{table}\n\\centering\n" + (caption.empty() ? "" : "\\caption{" + caption + "}\n") +
         "\\begin{tabular}{" + kinds + "}\n" + head + body + "\\bottomrule\n\\end{tabular}\n" +
         notes + "\\end{table}\n";
}

}  // namespace irrepwise
