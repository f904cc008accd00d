#include "output/table_markdown.hpp"

#include <doctest/doctest.h>

#include "output/display_width.hpp"

using namespace irrepwise;

TEST_CASE("a Markdown table has a row for each line, all of one width in source") {
  Table table;
  table.caption = "Levels";
  table.columns = {{"label", "level", "", Align::Left, 0, false},
                   {"energy_ev", "energy", "eV", Align::Decimal, 0, false}};
  table.lines.emplace_back(Row{{SymmetryLabel{"2e1g"}, Number{-10.5, 1}}});
  table.lines.emplace_back(Separator{"gap 1 eV"});
  table.lines.emplace_back(Row{{"a|b", Number{-9.25, 2}}});
  CHECK(table_markdown(table) ==
        "**Levels**\n\n"
        "| level      | energy / eV |\n"
        "|------------|------------:|\n"
        "| 2e1g       |      -10.5\u2007 |\n"
        "| *gap 1 eV* |             |\n"
        "| a\\|b       |       -9.25 |\n");
}

TEST_CASE("a whole number in a decimal column is filled up with the width of point and digits") {
  Table table;
  table.columns = {{"n", "n", "", Align::Decimal, 0, false}};
  table.lines.emplace_back(Row{{Number{4, 0}}});
  table.lines.emplace_back(Row{{Number{1.33, 2}}});
  const std::string text = table_markdown(table);
  CHECK(text.find("4\u2008\u2007\u2007 |") != std::string::npos);
}

TEST_CASE("characters that mean something in Markdown are escaped") {
  CHECK(markdown_text("a_b*c|d") == "a\\_b\\*c\\|d");
  CHECK(markdown_text("1a1'") == "1a1'");
}
