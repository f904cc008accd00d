#include "output/table_text.hpp"

#include <limits>
#include <sstream>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "output/display_width.hpp"

using namespace irrepwise;

namespace {

Table example() {
  Table table;
  table.columns = {{"label", "level", "", Align::Right, 0, false},
                   {"energy_ev", "energy", "eV", Align::Decimal, 0, false},
                   {"degeneracy", "degeneracy", "", Align::Right, 3, false},
                   {"composition", "made of", "", Align::Left, 2, true}};
  table.lines.emplace_back(Row{{SymmetryLabel{"10e'"}, Number{-9.8765, 3}, Number{2, 0},
                                "58 % Pt 5dx2-y2, 42 % Cl 3p and a little of many others"}});
  table.lines.emplace_back(Separator{"gap 90.12 eV"});
  table.lines.emplace_back(
      Row{{SymmetryLabel{"1a1'"}, Number{-100.0, 1}, Number{1, 0}, "100 % Cl 3s"}});
  return table;
}

std::vector<std::string> lines_of(const std::string& text) {
  std::istringstream stream(text);
  std::vector<std::string> lines;
  for (std::string line; std::getline(stream, line);) lines.push_back(line);
  return lines;
}

}  // namespace

TEST_CASE("numbers of a column have their points below each other, whatever their digits") {
  const std::vector<std::string> lines = lines_of(table_text(example(), 120));
  REQUIRE(lines.size() == 5);
  CHECK(lines[2].find("-9.877") + 2 == lines[4].find("-100.0") + 4);
  CHECK(lines[0].find("energy / eV") != std::string::npos);
}

TEST_CASE("a separator runs across the table and carries its words") {
  const std::vector<std::string> lines = lines_of(table_text(example(), 120));
  CHECK(lines[3].find("── gap 90.12 eV ─") == 2);
  CHECK(display_width(lines[3]) == display_width(lines[1]));
}

TEST_CASE("every line stays within the width from 40 to 200 columns") {
  for (int width = 40; width <= 200; ++width) {
    for (const std::string& line : lines_of(table_text(example(), width))) {
      CAPTURE(width);
      CAPTURE(line);
      CHECK(display_width(line) <= width);
      CHECK((line.empty() || line.back() != ' '));
    }
  }
}

TEST_CASE("a narrow terminal wraps first, then drops by priority and says so") {
  const std::string wide = table_text(example(), 120);
  CHECK(wide.find("Left out") == std::string::npos);
  const std::string wraps = table_text(example(), 64);
  CHECK(wraps.find("degeneracy\n") == std::string::npos);
  CHECK(wraps.find("Left out") == std::string::npos);
  CHECK(lines_of(wraps).size() > lines_of(wide).size());
  const std::string narrow = table_text(example(), 50);
  // And how wide it would have to be: at that width nothing is left out, below it something is.
  CHECK(narrow.find("Left out for want of width: degeneracy; a") != std::string::npos);
  const std::size_t number = narrow.find_first_of("0123456789", narrow.find("Left out"));
  REQUIRE(number != std::string::npos);
  const int enough = std::stoi(narrow.substr(number));
  CHECK(table_text(example(), enough).find("Left out") == std::string::npos);
  CHECK(table_text(example(), enough - 1).find("Left out") != std::string::npos);
  CHECK(narrow.find("made of") != std::string::npos);
}

TEST_CASE("rounding never shows a negative zero, and charges show their sign") {
  CHECK(cell_text(Number{-0.0004, 3}) == "0.000");
  CHECK(cell_text(Number{-0.0, 1}) == "0.0");
  CHECK(cell_text(Number{0.0004, 3, true}) == "0.000");
  CHECK(cell_text(Number{0.62, 2, true}) == "+0.62");
  CHECK(cell_text(Number{-0.62, 2, true}) == "-0.62");
}

TEST_CASE("a number that is none is an error, never printed") {
  for (const double bad :
       {std::numeric_limits<double>::quiet_NaN(), -std::numeric_limits<double>::infinity()}) {
    CHECK_THROWS_WITH_AS(static_cast<void>(cell_text(Number{bad})),
                         "a result is not a finite number; check the geometry and the parameters",
                         Error);
    CHECK_THROWS_AS(static_cast<void>(cell_exact(Number{bad})), Error);
  }
}
