#include "core/parse.hpp"

#include <string>

#include <doctest/doctest.h>

using namespace irrepwise;

TEST_CASE("numbers are read whole or not at all") {
  CHECK(parse_number("1") == 1.0);
  CHECK(parse_number("+.5") == 0.5);
  CHECK(parse_number("-1.25e-2") == -0.0125);
  CHECK(parse_number("1.25D-2") == 0.0125);
  for (const char* bad : {"", "+", "-", "1 ", " 1", "1,5", "1.0.0", "0x10", "nan", "inf", "1e999",
                          "1e", "d5", "+-1", "++1", "1_0"}) {
    CAPTURE(bad);
    CHECK_FALSE(parse_number(bad).has_value());
  }
}

TEST_CASE("whole numbers are read whole, within the range of int") {
  CHECK(parse_whole_number("+2") == 2);
  CHECK(parse_whole_number("-2147483648") == -2147483648);
  for (const char* bad : {"", "+", "2.0", "2147483648", "1e2", "--1", "+-1", "2 "}) {
    CAPTURE(bad);
    CHECK_FALSE(parse_whole_number(bad).has_value());
  }
}

TEST_CASE("quoted text is one short printable line of UTF-8") {
  CHECK(quoted("Pt") == "'Pt'");
  CHECK(quoted("Å") == "'Å'");
  CHECK(quoted("a\tb\n\x7f") == "'a\\x09b\\x0a\\x7f'");
  CHECK(quoted("\xC3") == "'\\xc3'");
  CHECK(quoted("\xFF\xC3\x28") == "'\\xff\\xc3('");
  CHECK(quoted(std::string(60, 'x')) == "'" + std::string(40, 'x') + "…'");
}
