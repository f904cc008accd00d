#include "output/display_width.hpp"

#include <doctest/doctest.h>

using namespace irrepwise;

TEST_CASE("width counts letters as a terminal shows them, not bytes") {
  CHECK(display_width("") == 0);
  CHECK(display_width("Cl4Pt") == 5);
  CHECK(display_width("σg+ Å ×") == 7);       // two bytes each in UTF-8
  CHECK(display_width("e\u0301t") == 2);      // a combining accent stands on its letter
  CHECK(display_width("\u914D\u4F4D") == 4);  // wide in Unicode Standard Annex 11
}

TEST_CASE("bytes that are no UTF-8 count one each and nothing is read past the end") {
  CHECK(display_width("a\xFF"
                      "b") == 3);
  CHECK(display_width("a\xC3") == 2);
  CHECK(display_width("\xE2\x82") == 2);
}

TEST_CASE("padding fills up to the width and never cuts") {
  CHECK(padded_right("π", 3) == "π  ");
  CHECK(padded_left("π", 3) == "  π");
  CHECK(padded_left("long", 2) == "long");
}

TEST_CASE("wrapping breaks at spaces only and loses no word") {
  CHECK(wrapped("62 % Pt 5d, 38 % Cl 3p", 12) ==
        std::vector<std::string>{"62 % Pt 5d,", "38 % Cl 3p"});
  CHECK(wrapped("62\u00A0%\u00A0Pt 38\u00A0%\u00A0Cl", 9) ==
        std::vector<std::string>{"62 % Pt", "38 % Cl"});
  CHECK(wrapped("unbreakable x", 4) == std::vector<std::string>{"unbreakable", "x"});
  CHECK(wrapped("", 10) == std::vector<std::string>{""});
}
