#include "output/latex_text.hpp"

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

TEST_CASE("a prime behind a symbol is a prime, an apostrophe stays one") {
  CHECK(latex_text("C2' through Mulliken's atom") == "C2$'$ through Mulliken's atom");
  CHECK(latex_text("2S10\u00B3, \u00BD --local `x`") ==
        "2S10$^{3}$, \u00BD -{}-local \\textasciigrave{}x\\textasciigrave{}");
}
