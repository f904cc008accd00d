#include "output/table_latex.hpp"

#include <doctest/doctest.h>

using namespace irrepwise;

TEST_CASE("labels are typeset as the trade writes them") {
  // Mulliken, J. Chem. Phys. 23, 1997 (1955): number, letter, subscripts, primes above.
  CHECK(latex_label("2e1g") == "$2e_{1g}$");
  CHECK(latex_label("3t2g") == "$3t_{2g}$");
  CHECK(latex_label("10a1'") == "$10a_{1}'$");
  CHECK(latex_label("1e2\"") == "$1e_{2}''$");
  CHECK(latex_label("E") == "$E$");
  CHECK(latex_label("1sigmag+") == "$1\\sigma_{g}$");
  CHECK(latex_label("Sigmag+") == "$\\Sigma_{g}^{+}$");
  CHECK(latex_label("2piu") == "$2\\pi_{u}$");
  CHECK(latex_label("Sigma-") == "$\\Sigma^{-}$");
  CHECK(latex_label("1pg") == "$1p_{g}$");  // of an atom: p, not pi
  CHECK(latex_label("1pu") == "$1p_{u}$");
}

TEST_CASE("special characters are escaped and our own letters become commands") {
  CHECK(latex_text("62 % Pt_1 & #2 {x} \\ ^ ~ $") ==
        "62 \\% Pt\\_1 \\& \\#2 \\{x\\} \\textbackslash{} \\textasciicircum{} "
        "\\textasciitilde{} \\$");
  CHECK(latex_text("1.5 Å, H×6, Pt1–Cl2") == "1.5 \\AA{}, H$\\times$6, Pt1--Cl2");
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
