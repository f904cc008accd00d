#include "output/latex_columns.hpp"

#include <doctest/doctest.h>

using namespace irrepwise;

namespace {

Table table_of(int columns, const std::string& words, bool wraps = false) {
  Table table;
  table.lines.emplace_back(Row{});
  for (int i = 0; i < columns; ++i) {
    table.columns.push_back({std::to_string(i), "x", "", Align::Left, 0, wraps && i == 1});
    std::get<Row>(table.lines[0]).cells.emplace_back(words);
  }
  return table;
}

}  // namespace

TEST_CASE("a narrow table stays as it is") {
  const auto parts = latex_parts(table_of(4, "words"));
  REQUIRE(parts.size() == 1);
  CHECK(parts[0].size.empty());
  CHECK(parts[0].columns.size() == 4);
  CHECK(parts[0].columns[0].kind == "l");
}

TEST_CASE("a long text becomes a paragraph of the width that is left") {
  Table table = table_of(2, "words", true);
  std::get<Row>(table.lines[0]).cells[1] = std::string(300, 'a');
  const auto parts = latex_parts(table);
  REQUIRE(parts.size() == 1);
  CHECK(parts[0].size.empty());
  // 88 digits of width less 2 * 2.4 between the columns and 5 of the first: 78.2 / 88.
  CHECK(parts[0].columns[1].kind == ">{\\raggedright\\arraybackslash}p{0.89\\linewidth}");
}

TEST_CASE("what does not fit gets smaller letters, then parts that repeat the first column") {
  // Seven columns of 11 digits and gaps: 7 * 13.4 = 93.8, at 9 pt 84.4 of 88.
  CHECK(latex_parts(table_of(7, std::string(11, 'a'))).front().size == "\\small");
  const auto parts = latex_parts(table_of(20, std::string(11, 'a')));
  REQUIRE(parts.size() == 3);  // at 8 pt eight to a part, of which seven are new: 19 = 7 + 7 + 5
  std::size_t next = 1;
  for (const LatexPart& part : parts) {
    CHECK(part.size == "\\footnotesize");
    CHECK(part.columns[0].index == 0);
    for (std::size_t i = 1; i < part.columns.size(); ++i) CHECK(part.columns[i].index == next++);
  }
  CHECK(next == 20);
}

TEST_CASE("a column wider than a page has a part of its own and none is lost") {
  const auto parts = latex_parts(table_of(3, std::string(200, 'a')));
  REQUIRE(parts.size() == 2);
  CHECK(parts[0].columns[1].index == 1);
  CHECK(parts[1].columns[1].index == 2);
}
