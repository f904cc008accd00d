#include "output/table_csv.hpp"

#include <cmath>
#include <cstdlib>
#include <limits>

#include <doctest/doctest.h>

using namespace irrepwise;

namespace {

// A reader after the grammar of RFC 4180, section 2, written for this test only.
std::vector<std::vector<std::string>> read_csv(const std::string& text) {
  std::vector<std::vector<std::string>> records(1, std::vector<std::string>(1));
  bool in_quotes = false;
  for (std::size_t i = 0; i < text.size(); ++i) {
    std::string& field = records.back().back();
    if (in_quotes) {
      if (text[i] != '"') {
        field += text[i];
      } else if (i + 1 < text.size() && text[i + 1] == '"') {
        field += text[++i];
      } else {
        in_quotes = false;
      }
    } else if (text[i] == '"') {
      in_quotes = true;
    } else if (text[i] == ',') {
      records.back().emplace_back();
    } else if (text.compare(i, 2, "\r\n") == 0) {
      ++i;
      if (i + 1 < text.size()) records.emplace_back(1);
    } else {
      field += text[i];
    }
  }
  return records;
}

}  // namespace

TEST_CASE("text and numbers read back exactly") {
  const double numbers[] = {0.1,
                            -1.0 / 3.0,
                            6.02214076e23,
                            std::nextafter(1.0, 2.0),
                            std::numeric_limits<double>::denorm_min(),
                            4.0};
  const std::string words[] = {"plain", "with, comma", "a \"quoted\" word", "two\nlines",
                               "",      "e1\""};
  Table table;
  table.caption = "never in the file";
  table.columns = {{"words, here", "w", "", Align::Left, 0, false},
                   {"value", "v", "eV", Align::Decimal, 0, false}};
  for (int i = 0; i < 6; ++i) {
    table.lines.emplace_back(Row{{words[i], Number{numbers[i], 1}}});
    table.lines.emplace_back(Separator{"never either"});
  }
  const auto records = read_csv(table_csv(table));
  REQUIRE(records.size() == 7);
  CHECK(records[0] == std::vector<std::string>{"words, here", "value"});
  for (std::size_t i = 0; i < 6; ++i) {
    CHECK(records[i + 1][0] == words[i]);
    CHECK(std::strtod(records[i + 1][1].c_str(), nullptr) == numbers[i]);
  }
}

TEST_CASE("labels are ASCII as in JSON, empty cells empty, negative zero plain") {
  Table table;
  table.columns = {{"a", "", "", Align::Left, 0, false},
                   {"b", "", "", Align::Left, 0, false},
                   {"c", "", "", Align::Left, 0, false}};
  table.lines.emplace_back(Row{{SymmetryLabel{"1sigmag+"}, Cell(), Number{-0.0}}});
  CHECK(table_csv(table) == "a,b,c\r\n1sigmag+,,0\r\n");
}
