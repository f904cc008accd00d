#include "molecule/element.hpp"

#include <cmath>
#include <fstream>
#include <sstream>
#include <string>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "molecule/label.hpp"
#include "support/paths.hpp"

using namespace irrepwise;

TEST_CASE("covalent radii agree with another copy of the published table") {
  std::ifstream file(reference_path("covalent_radii.csv"));
  REQUIRE(file);
  std::string line;
  int n_rows = 0;
  while (std::getline(file, line)) {
    if (line.empty() || line[0] == '#' || line.starts_with("atomic_number")) continue;
    CAPTURE(line);
    std::istringstream row(line);
    std::string number, symbol, radius;
    std::getline(row, number, ',');
    std::getline(row, symbol, ',');
    std::getline(row, radius, ',');
    const int z = std::stoi(number);
    CHECK(element_symbol(z) == symbol);
    REQUIRE(covalent_radius_angstrom(z).has_value());
    CHECK(*covalent_radius_angstrom(z) == std::stod(radius));
    ++n_rows;
  }
  CHECK(n_rows == 96);
  CHECK_FALSE(covalent_radius_angstrom(97).has_value());
}

TEST_CASE("every symbol in any case gives its own atomic number") {
  for (int z = 1; z <= max_atomic_number; ++z) {
    std::string upper(element_symbol(z));
    std::string lower = upper;
    for (char& c : upper) c = static_cast<char>(std::toupper(c));
    for (char& c : lower) c = static_cast<char>(std::tolower(c));
    CAPTURE(upper);
    CHECK(atomic_number(upper) == z);
    CHECK(atomic_number(lower) == z);
  }
  // Rows of the periodic table end with the noble gases; Og closes the seventh.
  CHECK(element_symbol(54) == "Xe");
  CHECK(element_symbol(86) == "Rn");
  CHECK(element_symbol(118) == "Og");
  CHECK_FALSE(atomic_number("").has_value());
  CHECK_FALSE(atomic_number("Xx").has_value());
}

TEST_CASE("labels of atoms are read by the letters before the first digit") {
  CHECK(atomic_number_of_label("Fe1") == 26);
  CHECK(atomic_number_of_label("C12A") == 6);
  CHECK(atomic_number_of_label("H1'") == 1);
  CHECK(atomic_number_of_label("Ca1") == 20);
  CHECK(atomic_number_of_label("CO") == 27);   // without a number it is a symbol in capitals
  CHECK(atomic_number_of_label("ZN1") == 30);  // there is no element Z
  CHECK(atomic_number_of_label("78") == 78);
}

TEST_CASE("labels that are no element, or could be two, are refused") {
  CHECK_THROWS_WITH_AS((void)atomic_number_of_label("CO2"),
                       "label 'CO2' could mean C or Co; write the symbol, e.g. Co", Error);
  CHECK_THROWS_WITH_AS((void)atomic_number_of_label("Ptt"),
                       "'Ptt' is not an element; did you mean 'Pt'?", Error);
  CHECK_THROWS_WITH_AS((void)atomic_number_of_label("Q"), "'Q' is not an element", Error);
  CHECK_THROWS_WITH_AS((void)atomic_number_of_label("C-1"),
                       "'C-1' is not an element; did you mean 'C'?", Error);
  CHECK_THROWS_WITH_AS((void)atomic_number_of_label("119"),
                       "'119' is not an atomic number; expected 1 to 118, or a symbol", Error);
  CHECK_THROWS_WITH_AS((void)atomic_number_of_label("0"),
                       "'0' is not an atomic number; expected 1 to 118, or a symbol", Error);
}
