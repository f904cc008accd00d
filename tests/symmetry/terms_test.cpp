#include "symmetry/terms.hpp"

#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "symmetry/character_table.hpp"
#include "symmetry/operation.hpp"

using namespace irrepwise;

namespace {

PointGroup group_of(const char* name) { return PointGroup(parse_schoenflies(name)); }

std::string terms(const char* group_name, const char* configuration) {
  const PointGroup group = group_of(group_name);
  std::string text;
  for (const Term& term : find_terms(group, parse_configuration(group, configuration))) {
    text += (text.empty() ? "" : ", ") + term_text(term);
  }
  return text;
}

double binomial(int n, int k) {
  double value = 1.0;
  for (int i = 1; i <= k; ++i) value = value * (n - k + i) / i;
  return value;
}

// (2S+1) times the characters of all terms: what determinants of one group are in another.
int determinants(const std::vector<Term>& found) {
  int sum = 0;
  for (const Term& term : found) sum += term.multiplicity * term.dimension * term.count;
  return sum;
}

}  // namespace

TEST_CASE("strong-field terms of d2 to d8 in Oh are those of the tables") {
  // Tanabe and Sugano, J. Phys. Soc. Jpn. 9, 753 (1954); Griffith, The Theory of Transition-Metal
  // Ions, table A24 (both from memory).
  CHECK(terms("Oh", "t2g^2") == "3T1g, 1T2g, 1Eg, 1A1g");
  CHECK(terms("Oh", "t2g eg") == "3T1g, 3T2g, 1T1g, 1T2g");
  CHECK(terms("Oh", "eg^2") == "3A2g, 1Eg, 1A1g");
  CHECK(terms("Oh", "t2g^3") == "4A2g, 2T1g, 2T2g, 2Eg");
  CHECK(terms("Oh", "t2g^2 eg") == "4T1g, 4T2g, 2 2T1g, 2 2T2g, 2 2Eg, 2A1g, 2A2g");
  CHECK(terms("Oh", "t2g eg^2") == "4T1g, 2 2T1g, 2 2T2g");
  CHECK(terms("Oh", "eg^3") == "2Eg");
  CHECK(terms("Oh", "t2g^4") == "3T1g, 1T2g, 1Eg, 1A1g");
  CHECK(terms("Oh", "t2g^3 eg") ==
        "5Eg, 2 3T1g, 2 3T2g, 2 3Eg, 3A1g, 3A2g, 2 1T1g, 2 1T2g, 1Eg, 1A1g, 1A2g");
  CHECK(terms("Oh", "t2g^2 eg^2") ==
        "5T2g, 3 3T1g, 2 3T2g, 3Eg, 3A2g, 1T1g, 3 1T2g, 3 1Eg, 2 1A1g, 1A2g");
  CHECK(terms("Oh", "t2g eg^3") == "3T1g, 3T2g, 1T1g, 1T2g");
  CHECK(terms("Oh", "t2g^5") == "2T2g");
  CHECK(terms("Oh", "t2g^3 eg^2") ==
        "6A1g, 4T1g, 4T2g, 2 4Eg, 4A1g, 4A2g, 4 2T1g, 4 2T2g, 3 2Eg, 2 2A1g, 2A2g");
  CHECK(terms("Oh", "t2g^6") == "1A1g");
  CHECK(terms("Oh", "t2g^5 eg") == "3T1g, 3T2g, 1T1g, 1T2g");
  CHECK(terms("Oh", "t2g^4 eg^2") == terms("Oh", "t2g^2 eg^2"));  // holes
  CHECK(terms("Oh", "t2g^6 eg") == "2Eg");
  CHECK(terms("Oh", "t2g^5 eg^2") == "4T1g, 2 2T1g, 2 2T2g");
  CHECK(terms("Oh", "t2g^6 eg^2") == "3A2g, 1Eg, 1A1g");
}

TEST_CASE("terms of linear molecules and atoms are those of the textbooks") {
  // Herzberg, Spectra of Diatomic Molecules; Condon and Shortley (from memory).
  CHECK(terms("Dinfh", "piu") == "2Piu");
  CHECK(terms("Dinfh", "piu^2") == "3Sigmag-, 1Deltag, 1Sigmag+");
  CHECK(terms("Dinfh", "pig^3") == "2Pig");
  CHECK(terms("Dinfh", "pig^4") == "1Sigmag+");
  CHECK(terms("Cinfv", "delta^2") == "3Sigma-, 1Gamma, 1Sigma+");
  CHECK(terms("Cinfv", "pi delta") == "3Phi, 3Pi, 1Phi, 1Pi");
  CHECK(terms("Dinfh", "piu^3 pig") == "3Deltau, 3Sigmau+, 3Sigmau-, 1Deltau, 1Sigmau+, 1Sigmau-");
  CHECK(terms("Cinfv", "phi^2") == "3Sigma-, 1Iota, 1Sigma+");
  CHECK(terms("Kh", "p^2") == "3Pg, 1Dg, 1Sg");
  CHECK(terms("Kh", "p^3") == "4Su, 2Du, 2Pu");
  CHECK(terms("Kh", "d^2") == "3Fg, 3Pg, 1Gg, 1Dg, 1Sg");
  CHECK(terms("Kh", "d^3") == "4Fg, 4Pg, 2Hg, 2Gg, 2Fg, 2 2Dg, 2Pg");
  CHECK(terms("Kh", "d^5") == "6Sg, 4Gg, 4Fg, 4Dg, 4Pg, 2Ig, 2Hg, 2 2Gg, 2 2Fg, 3 2Dg, 2Pg, 2Sg");
  CHECK(terms("Kh", "f^2") == "3Hg, 3Fg, 3Pg, 1Ig, 1Gg, 1Dg, 1Sg");
  CHECK(terms("Kh", "p d") == "3Fu, 3Du, 3Pu, 1Fu, 1Du, 1Pu");
  // f^7 has 327 levels J, hence 119 terms, with 8S lowest.
  const PointGroup atom = group_of("Kh");
  const std::vector<Term> f7 = find_terms(atom, {{"f", 7}});
  CHECK(term_text(f7.front()) == "8Su");
  int number = 0;
  for (const Term& term : f7) number += term.count;
  CHECK(number == 119);
}

TEST_CASE("one open level of other groups") {
  // By hand: the symmetric square carries the singlets, the antisymmetric one the triplets.
  CHECK(terms("D5h", "e1'^2") == "3A2', 1E2', 1A1'");
  CHECK(terms("D4h", "eg^2") == "3A2g, 1A1g, 1B1g, 1B2g");
  CHECK(terms("C3", "e^2") == "3A, 1E, 1A");
  CHECK(terms("Ih", "hu^2") == "3Gg, 3T1g, 3T2g, 2 1Hg, 1Gg, 1Ag");
  // t1 behaves as p, whose S, P, D are A, T1, H.
  CHECK(terms("Ih", "t1u^3") == "4Au, 2Hu, 2T1u");
  CHECK(terms("D3h", "e'^3") == "2E'");
}

TEST_CASE("every configuration has as many terms' components as determinants") {
  struct Row {
    const char* group;
    const char* label;
    int dimension;
  };
  for (const Row& row : {Row{"Ih", "hu", 5},
                         {"Ih", "gg", 4},
                         {"Td", "t2", 3},
                         {"C5", "e2", 2},
                         {"Kh", "f", 7},
                         {"Dinfh", "deltau", 2},
                         {"D6h", "e1g", 2}}) {
    const PointGroup group = group_of(row.group);
    for (int n = 0; n <= 2 * row.dimension; ++n) {
      const std::string name = row.label;
      CAPTURE(name);
      CAPTURE(n);
      const std::vector<Term> found = find_terms(group, {{row.label, n}});
      CHECK(determinants(found) == std::lround(binomial(2 * row.dimension, n)));
      if (row.dimension % 2 == 0 || n % 2 == 0) {  // holes; an odd filled shell keeps the parity g
        CHECK(found == find_terms(group, {{row.label, 2 * row.dimension - n}}));
      }
    }
  }
}

TEST_CASE("all strong-field configurations of d^n together are the free ion's terms in the field") {
  // Weak and strong field span the same determinants. The free ion's terms come from Kh, and L
  // splits by its characters sin((L + 1/2) a) / sin(a/2).
  const PointGroup atom = group_of("Kh"), octahedron = group_of("Oh");
  const CharacterTable table(octahedron);
  for (int n = 1; n <= 9; ++n) {
    CAPTURE(n);
    for (int multiplicity = 1; multiplicity <= 6; ++multiplicity) {
      std::vector<double> weak(static_cast<std::size_t>(table.size()), 0.0), strong = weak;
      for (const Term& term : find_terms(atom, {{"d", n}})) {
        if (term.multiplicity != multiplicity) continue;
        const int l = (term.dimension - 1) / 2;
        for (int node = 0; node < table.size(); ++node) {
          const Eigen::Matrix3d& g =
              octahedron.operations()[octahedron.classes()[node].operations.front()];
          const double cosine = 0.5 * (determinant_sign(g) * g.trace() - 1.0);
          const double angle = std::acos(std::min(1.0, std::max(-1.0, cosine)));
          double character = 1.0;
          for (int m = 1; m <= l; ++m) character += 2.0 * std::cos(m * angle);
          weak[node] += term.count * character;
        }
      }
      for (int e = std::max(0, n - 6); e <= std::min(4, n); ++e) {
        for (const Term& term : find_terms(octahedron, {{"t2g", n - e}, {"eg", e}})) {
          if (term.multiplicity != multiplicity) continue;
          for (int node = 0; node < table.size(); ++node) {
            strong[node] += term.count * table.irrep(term.irrep).characters[node];
          }
        }
      }
      CHECK(table.reduce(weak) == table.reduce(strong));
    }
  }
}

TEST_CASE("the lowest terms follow Hund's rules as far as symmetry goes") {
  const auto lowest = [](const char* group_name, const char* configuration) {
    const PointGroup group = group_of(group_name);
    std::string text;
    for (const Term& term :
         lowest_terms(group, find_terms(group, parse_configuration(group, configuration)))) {
      text += (text.empty() ? "" : ", ") + term_text(term);
    }
    return text;
  };
  CHECK(lowest("Oh", "t2g^2") == "3T1g");
  CHECK(lowest("Oh", "t2g^2 eg") == "4T1g, 4T2g");  // repulsion alone decides
  CHECK(lowest("Oh", "t2g^3 eg^2") == "6A1g");
  CHECK(lowest("Kh", "d^3") == "4Fg");
  CHECK(lowest("Kh", "f^2") == "3Hg");
  CHECK(lowest("Dinfh", "pig^2") == "3Sigmag-");
  CHECK(lowest("Cinfv", "pi delta") == "3Phi");
}

TEST_CASE("configurations that cannot be are refused") {
  const PointGroup oh = group_of("Oh");
  CHECK_THROWS_WITH_AS((void)find_terms(oh, {{"eg", 5}}), "5 electrons in eg; it holds 0 to 4",
                       Error);
  CHECK_THROWS_WITH_AS((void)parse_configuration(oh, "eg^2 eg"),
                       "'eg^2 eg' names eg twice; write its electrons as one exponent", Error);
  CHECK_THROWS_AS((void)find_terms(group_of("Kh"), {{"l17", 17}}), Error);
}
