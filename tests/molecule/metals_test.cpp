#include "molecule/metals.hpp"

#include <vector>

#include <doctest/doctest.h>

#include "molecule/element.hpp"

using namespace irrepwise;

TEST_CASE("metals lie left of the line from boron to astatine in the periodic table") {
  // Common practice; the elements along the line, from B to Te, are no metals here.
  for (const char* symbol :
       {"Li", "Mg", "Al", "Sc", "Zn", "Ga", "Sn", "La", "Lu", "Hg", "Tl", "Bi", "U", "Cs"}) {
    CAPTURE(symbol);
    CHECK(is_metal(*atomic_number(symbol)));
  }
  for (const char* symbol :
       {"H", "He", "B", "C", "N", "Si", "P", "S", "Ge", "As", "Sb", "Te", "I", "Xe"}) {
    CAPTURE(symbol);
    CHECK_FALSE(is_metal(*atomic_number(symbol)));
  }
  int d_or_f = 0;
  for (int z = 1; z <= max_atomic_number; ++z) {
    d_or_f += is_d_or_f_block(z) ? 1 : 0;
    if (is_d_or_f_block(z)) CHECK(is_metal(z));
  }
  CHECK(d_or_f == 4 * 10 + 2 * 14);  // ten groups in four periods, and two rows of f elements
}

TEST_CASE("a complex is built around its transition metals, a salt around what metals it has") {
  const Molecule stannyl({{26, {0, 0, 0}}, {50, {2.5, 0, 0}}, {6, {0, 1.8, 0}}}, 0);
  CHECK(metals_of_complex(stannyl) == std::vector<int>{0});
  CHECK(metals_of_complex(Molecule({{17, {0, 0, 0}}, {50, {2.4, 0, 0}}}, 1)) ==
        std::vector<int>{1});
  CHECK(metals_of_complex(Molecule({{6, {0, 0, 0}}, {8, {1.1, 0, 0}}}, 0)).empty());
}
