#include "output/table_latex.hpp"

#include <string>

#include <doctest/doctest.h>

using namespace irrepwise;

TEST_CASE("labels among words are typeset") {
  Table table;
  table.columns = {{"irreps", "irreps", "", Align::Left, 0, false}};
  table.lines.emplace_back(Row{{Words{"{a1g} + 2{eg} & more"}}});
  CHECK(table_latex(table).find("$a_{1g}$ + 2$e_{g}$ \\& more") != std::string::npos);
  CHECK(cell_text(Words{"{piu}, ³{T1g}"}) == "πu, ³T1g");
  CHECK(cell_exact(Words{"{piu}, ³{T1g}"}) == "piu, ³T1g");
}

TEST_CASE("numbers align at the point by invisible digits") {
  Table table;
  table.columns = {{"label", "level", "", Align::Right, 0, false},
                   {"energy_ev", "energy", "eV", Align::Decimal, 0, false}};
  table.lines.emplace_back(Row{{SymmetryLabel{"1b1g"}, Number{-9.877, 3}}});
  table.lines.emplace_back(Separator{"gap"});
  table.lines.emplace_back(Row{{SymmetryLabel{"2eu"}, Number{-12, 0}}});
  CHECK(table_latex(table) ==
        "\\begin{table}\n\\centering\n\\begin{tabular}{rr}\n\\toprule\n"
        "level & energy / eV \\\\\n\\midrule\n"
        "$1b_{1g}$ & $-9.877$ \\\\\n"
        "\\midrule\n\\multicolumn{2}{c}{\\textit{gap}} \\\\\n\\midrule\n"
        "$2e_{u}$ & $-12$\\phantom{$.000$} \\\\\n"
        "\\bottomrule\n\\end{tabular}\n\\end{table}\n");
}

TEST_CASE("a row that begins with a bracket or a star is no argument of the command before it") {
  // LaTeX looks for [length] and * after \\ and after the rules of booktabs, over spaces and lines.
  Table table;
  table.columns = {{"name", "[name]", "", Align::Left, 0, false}};
  table.lines = {Row{{std::string("[PtCl4]2-")}}, Row{{std::string("*")}}};
  const std::string text = table_latex(table);
  CHECK(text.find("\n[") == std::string::npos);
  CHECK(text.find("\n*") == std::string::npos);
  CHECK(text.find("{}[PtCl4]2-") != std::string::npos);
}

TEST_CASE("a table of one column too wide for the page is still there") {
  Table table;
  table.columns = {{"words", "words", "", Align::Left, 0, false}};
  table.lines = {Row{{std::string(400, 'm')}}};
  CHECK(table_latex(table).find(std::string(400, 'm')) != std::string::npos);
}
