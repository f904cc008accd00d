#include "output/report.hpp"
#include "output/table_markdown.hpp"

namespace irrepwise {

std::string report_markdown(const Report& report) {
  std::string out;
  if (!report.title.empty()) out = "# " + markdown_text(report.title) + "\n\n";
  for (const Fact& fact : report.facts) {
    out += "- " + markdown_text(fact.name) + ": ";
    for (std::size_t i = 0; i < fact.lines.size(); ++i) {
      out += (i > 0 ? "; " : "") + markdown_text(fact.lines[i]);
    }
    out += '\n';
  }
  for (const Table& table : report.tables) {
    if (!out.empty()) out += '\n';
    out += table_markdown(table);
  }
  if (!report.warnings.empty()) {
    out += "\n**Warnings**\n\n";
    for (const std::string& warning : report.warnings) out += "- " + markdown_text(warning) + '\n';
  }
  for (const std::string& remark : report.remarks) out += '\n' + markdown_text(remark) + '\n';
  return out;
}

}  // namespace irrepwise
