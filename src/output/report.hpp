// A report: a title, facts, tables and remarks, in any format that people read.
#pragma once

#include <string>
#include <vector>

#include "output/table.hpp"

namespace irrepwise {

/// A line of the header: "rule" and "weighted, K = 1.75". Several lines stand below each other.
struct Fact {
  std::string name;
  std::vector<std::string> lines;
};

struct Report {
  std::string title;
  std::vector<Fact> facts;
  std::vector<Table> tables;
  std::vector<std::string> warnings;
  std::vector<std::string> remarks;
};

/// @param width  columns of the terminal, see `table_text`
[[nodiscard]] std::string report_text(const Report& report, int width);
[[nodiscard]] std::string report_markdown(const Report& report);

/// To be included in a document that loads array, booktabs and longtable.
[[nodiscard]] std::string report_latex(const Report& report);

/// A whole page that needs nothing beside it: no script, style inside, for light, dark and print.
[[nodiscard]] std::string report_html(const Report& report);

}  // namespace irrepwise
