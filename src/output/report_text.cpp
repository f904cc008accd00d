#include <algorithm>

#include "output/display_width.hpp"
#include "output/report.hpp"
#include "output/table_text.hpp"

namespace irrepwise {
namespace {

void add_paragraph(std::string& out, const std::string& first, const std::string& text, int width) {
  const int hang = display_width(first);
  bool is_first = true;
  for (const std::string& line : wrapped(text, width - hang)) {
    std::string whole =
        (is_first ? first : std::string(static_cast<std::size_t>(hang), ' ')) + line;
    whole.erase(whole.find_last_not_of(' ') + 1);
    out += whole + '\n';
    is_first = false;
  }
}

}  // namespace

std::string report_text(const Report& report, int width) {
  std::string out;
  if (!report.title.empty()) {
    add_paragraph(out, "", report.title, width);
    out += '\n';
  }
  int name_width = 0;
  for (const Fact& fact : report.facts) name_width = std::max(name_width, display_width(fact.name));
  for (const Fact& fact : report.facts) {
    std::string name = fact.name;
    for (const std::string& line : fact.lines) {
      add_paragraph(out, "  " + padded_right(name, name_width) + "  ", line, width);
      name.clear();
    }
  }
  for (const Table& table : report.tables) {
    if (!out.empty()) out += '\n';
    out += table_text(table, width);
  }
  if (!report.warnings.empty()) {
    out += "\nWarnings\n";
    for (const std::string& warning : report.warnings) add_paragraph(out, "  ! ", warning, width);
  }
  if (!report.remarks.empty()) out += '\n';
  for (const std::string& remark : report.remarks) add_paragraph(out, "", remark, width);
  return out;
}

}  // namespace irrepwise
