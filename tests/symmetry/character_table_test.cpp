#include "symmetry/character_table.hpp"

#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/groups.hpp"
#include "symmetry/angular_label.hpp"

using namespace irrepwise;

TEST_CASE("irreps are orthonormal over the nodes, in infinite groups for any angular momentum") {
  for (const Schoenflies& symbol : all_groups(9)) {
    const std::string name = symbol.name();
    CAPTURE(name);
    const CharacterTable table(PointGroup(symbol), 11);
    double worst = 0.0;
    for (const TableIrrep& a : table.irreps()) {
      for (const TableIrrep& b : table.irreps()) {
        double sum = 0.0;
        for (int node = 0; node < table.size(); ++node) {
          sum += table.weights()[node] * a.characters[node] * b.characters[node];
        }
        const double expected = a.label != b.label ? 0.0 : a.complex_pair ? 2.0 : 1.0;
        worst = std::max(worst, std::abs(sum - expected));
      }
    }
    CHECK(worst < 1e-12);
  }
}

TEST_CASE("powers of nodes are those of the operations") {
  for (const char* name : {"D6h", "Td", "S8", "Ih", "C5"}) {
    const PointGroup group(parse_schoenflies(name));
    const CharacterTable table(group);
    for (std::size_t c = 0; c < group.classes().size(); ++c) {
      int power = 0;
      for (int exponent = 0; exponent <= 12; ++exponent) {
        for (std::size_t i = 0; i < group.irreps().size(); ++i) {
          const int node = table.power(static_cast<int>(c), exponent);
          CHECK(table.irreps()[i].characters[node] ==
                doctest::Approx(group.irreps()[i].characters[power]).epsilon(1e-12).scale(1.0));
        }
        power = group.product(group.classes()[c].operations.front(), power);
      }
    }
  }
}

TEST_CASE("the table of an infinite group begins with the irreps of the group, by label") {
  for (const char* name : {"Cinfv", "Dinfh", "Kh"}) {
    const PointGroup group(parse_schoenflies(name));
    const CharacterTable table(group);
    for (const Irrep& irrep : group.irreps()) {
      CHECK(table.irrep(irrep.label).dimension == irrep.dimension);
      CHECK(table_label(group, level_label(irrep.label)) == irrep.label);
    }
  }
}

TEST_CASE("characters of no representation are refused") {
  const CharacterTable table(PointGroup(parse_schoenflies("C2v")));
  const std::vector<double> half = {1.0, 0.0, 0.0, 0.0};
  CHECK_THROWS_WITH_AS(
      (void)table.reduce(half),
      "the characters are those of no representation of C2v: A1 would occur 0.25 times", Error);
}

TEST_CASE("labels are read in any case, with Greek letters, primes and subscripts") {
  const auto read = [](const char* group, const char* text) {
    return table_label(PointGroup(parse_schoenflies(group)), text);
  };
  CHECK(read("Oh", "t₂g") == "T2g");
  CHECK(read("D3h", "e″") == "E\"");
  CHECK(read("D3h", "a2''") == "A2\"");
  CHECK(read("Dinfh", "πu") == "Piu");
  CHECK(read("Dinfh", "sigmag") == "Sigmag+");
  CHECK(read("Dinfh", "Σu⁻") == "Sigmau-");
  CHECK(read("Dinfh", "gammag") == "Gammag");
  CHECK(read("Cinfv", "H") == "Eta");
  CHECK(read("Cinfv", "m12") == "m12");
  CHECK(read("Kh", "p") == "Pu");
  CHECK(read("Kh", "pg") == "Pg");
  CHECK(read("Kh", "f") == "Fu");
  CHECK_THROWS_WITH_AS(
      (void)read("Dinfh", "pi"),
      "Dinfh has no irrep 'pi'; expected sigmag+, sigmau-, pig, piu, deltag, phiu and "
      "so on, up to lambda, then m9g",
      Error);
  CHECK_THROWS_AS((void)read("Cinfv", "pig"), Error);
  CHECK_THROWS_AS((void)read("Cinfv", "pi+"), Error);
  CHECK_THROWS_AS((void)read("Kh", "j"), Error);
  CHECK_THROWS_AS((void)read("Oh", "t3g"), Error);
}
