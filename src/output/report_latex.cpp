#include "output/latex_text.hpp"
#include "output/report.hpp"
#include "output/table_latex.hpp"

namespace irrepwise {

std::string report_latex(const Report& report) {
  std::string out = "% needs \\usepackage{array,booktabs,longtable}\n";
  if (!report.title.empty()) out += "\\paragraph{" + latex_text(report.title) + "}\n";
  if (!report.facts.empty()) {
    out += "\\begin{description}\n";
    for (const Fact& fact : report.facts) {
      out += "\\item[" + latex_text(fact.name) + "]";
      for (std::size_t i = 0; i < fact.lines.size(); ++i) {
        out += (i > 0 ? "; " : " ") + latex_words(fact.lines[i]);
      }
      out += '\n';
    }
    out += "\\end{description}\n";
  }
  for (const Table& table : report.tables) out += '\n' + table_latex(table);
  for (const std::string& warning : report.warnings) {
    out += "\n\\textbf{Warning:} " + latex_words(warning) + "\n";
  }
  for (const std::string& remark : report.remarks) out += '\n' + latex_words(remark) + '\n';
  return out;
}

}  // namespace irrepwise
