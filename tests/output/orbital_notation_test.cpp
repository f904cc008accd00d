#include "output/orbital_notation.hpp"

#include <string>

#include <doctest/doctest.h>

#include "basis/shell.hpp"
#include "output/caption_words.hpp"
#include "output/html_text.hpp"
#include "output/latex_text.hpp"

using namespace irrepwise;

namespace {

std::string put_together(const std::string& words) {
  std::string text;
  for (const NotationRun& run : notation_runs(words)) text += run.text + run.below + run.primes;
  return text;
}

}  // namespace

TEST_CASE("orbitals are typeset as the trade writes them") {
  // Common practice: what the function is stands below, its powers above.
  CHECK(html_words("58 % Pt 5dx2-y2, 39 % Cl 3p") == "58 % Pt 5d<sub>x²−y²</sub>, 39 % Cl 3p");
  CHECK(html_words("4fx(x2-3y2)") == "4f<sub>x(x²−3y²)</sub>");
  CHECK(html_words("5d(xz,yz)") == "5d<sub>(xz,yz)</sub>");
  CHECK(html_words("3pπx") == "3p<sub>πx</sub>");
  CHECK(html_words("5fz3") == "5f<sub>z³</sub>");
  CHECK(latex_words("5dx2-y2") == "$5\\mathrm{d}_{x^2-y^2}$");
  CHECK(latex_words("3pz") == "$3\\mathrm{p}_{z}$");
  CHECK(latex_words("3pσ, 3pπx") == "$3\\mathrm{p}_{\\sigma}$, $3\\mathrm{p}_{\\pi x}$");
  CHECK(latex_words("5dδx2-y2") == "$5\\mathrm{d}_{\\delta x^2-y^2}$");
  CHECK(latex_words("4fx(x2-3y2)") == "$4\\mathrm{f}_{x(x^2-3y^2)}$");
}

TEST_CASE("every orbital that tables name is found, and nothing is lost on the way") {
  for (int l = 1; l <= max_l; ++l) {
    for (int component = 0; component <= 2 * l; ++component) {
      const std::string function(orbital_name(l, component));
      const std::string name = "4" + function;
      CAPTURE(name);
      const auto runs = notation_runs("of " + name + ".");
      REQUIRE(runs.size() == 3);
      CHECK(runs[1].text + runs[1].below == name);
      CHECK(runs[1].below == function.substr(1));
    }
  }
}

TEST_CASE("words that only look like orbitals stay words") {
  for (const std::string words :
       {"3p", "15dxy", "Pt5dxy", "5dxyz", "3px1", "2s", "8pz", "5d(xz,", "5d()", "5dx2", "2pz2",
        "Cl4Pt", "3d_xy", "a 4d picture", "5d(xz,yz)b", ""}) {
    CAPTURE(words);
    for (const NotationRun& run : notation_runs(words)) CHECK(run.below.empty());
    CHECK(put_together(words) == words);
  }
  CHECK(html_words("<b> & 3pz") == "&lt;b&gt; &amp; 3p<sub>z</sub>");
}

TEST_CASE("formulas carry numbers below and the charge above") {
  const auto formula = [](int charge) {
    std::vector<Atom> atoms;
    for (int i = 0; i < 12; ++i) atoms.push_back({6, {3.0 * i, 0, 0}});
    atoms.push_back({1, {0, 3, 0}});
    return readable_formula(Molecule(atoms, charge));
  };
  CHECK(formula(0) == "C₁₂H");
  CHECK(formula(1) == "C₁₂H⁺");
  CHECK(formula(-1) == "C₁₂H⁻");
  CHECK(formula(-2) == "C₁₂H²⁻");
  CHECK(formula(10) == "C₁₂H¹⁰⁺");
}

TEST_CASE("groups and axes are typeset, atoms of the same spelling are not") {
  // Schoenflies symbols as the trade writes them: the letter with the rest below.
  CHECK(html_words("C4h at tolerance 0.01 Å") == "C<sub>4h</sub> at tolerance 0.01 Å");
  CHECK(html_words("z = C4 through Pt1") == "z = C<sub>4</sub> through Pt1");
  CHECK(html_words("x = C2' through C2 and C4") == "x = C<sub>2</sub>′ through C2 and C4");
  CHECK(html_words("z = C4 (S8) through C1") == "z = C<sub>4</sub> (S<sub>8</sub>) through C1");
  CHECK(html_words("C4, a subgroup of S4") == "C<sub>4</sub>, a subgroup of S<sub>4</sub>");
  CHECK(html_words("Character table of Cs, order 2") ==
        "Character table of C<sub>s</sub>, order 2");
  CHECK(html_words("Th at tolerance 0.01 Å") == "T<sub>h</sub> at tolerance 0.01 Å");
  CHECK(html_words("Descent from D4h to C4") == "Descent from D<sub>4h</sub> to C<sub>4</sub>");
  CHECK(html_words("D∞h") == "D<sub>∞h</sub>");
  CHECK(html_words("xz = σv through O1") == "xz = σ<sub>v</sub> through O1");
  CHECK(html_words("Td → D3") == "T<sub>d</sub> → D<sub>3</sub>");
  CHECK(latex_words("D4h") == "$D_{4h}$");
  CHECK(latex_words("C∞v") == "$C_{\\infty v}$");
  CHECK(latex_words("x = C2' through Cl2") == "x = $C_{2}'$ through Cl2");
  CHECK(latex_words("σh") == "$\\sigma_{h}$");
  for (const std::string words :
       {"C4–O2", "equivalent: C×4 = C1, C2, C3 and C4", "S4", "C12H10", "Dy4", "C2v1", "(C4)",
        "5C4h", "C4h_a", "Ohm", "Cs", "Th1", "from Pt1 to C4"}) {
    CAPTURE(words);
    for (const NotationRun& run : notation_runs(words)) CHECK(run.below.empty());
    CHECK(put_together(words) == words);
  }
}

TEST_CASE("the name of an option is not broken in a page") {
  CHECK(html_words("with the option --variants and -o") ==
        "with the option <span style=\"white-space:nowrap\">--variants</span> and -o");
  CHECK(html_words("a -- b") == "a -- b");
}
