#include "output/table_json.hpp"

#include <limits>

#include <doctest/doctest.h>
#include <nlohmann/json.hpp>

#include "core/error.hpp"

using namespace irrepwise;

TEST_CASE("a table reads back from JSON with every digit, by key") {
  const double third = -1.0 / 3.0;
  Table table;
  table.caption = "A \"caption\"";
  table.columns = {{"label", "level", "", Align::Left, 0, false},
                   {"energy_ev", "energy", "eV", Align::Decimal, 0, false},
                   {"2e1g:1", ":1", "", Align::Decimal, 0, false, "2e1g"}};
  table.lines.emplace_back(Row{{SymmetryLabel{"1sigmag+"}, Number{third, 3}, Cell{}}});
  table.lines.emplace_back(Separator{"gap"});
  table.lines.emplace_back(Row{{std::string("words"), Number{-0.0, 3}, Number{1e-7, 3}}});
  table.notes = {"a note"};

  const nlohmann::json document = nlohmann::json::parse(table_json(table));
  CHECK(document["caption"] == "A \"caption\"");
  CHECK(document["columns"][1]["header"] == "energy");
  CHECK(document["columns"][1]["unit"] == "eV");
  CHECK(document["columns"][2]["key"] == "2e1g:1");
  CHECK(document["columns"][2]["header"] == "2e1g:1");
  REQUIRE(document["rows"].size() == 2);  // separators are no rows
  CHECK(document["rows"][0]["label"] == "1sigmag+");
  CHECK(document["rows"][0]["energy_ev"].get<double>() == third);
  CHECK(document["rows"][0]["2e1g:1"].is_null());
  CHECK(document["rows"][1]["2e1g:1"].get<double>() == 1e-7);
  CHECK(document["notes"] == nlohmann::json::array({"a note"}));
}

TEST_CASE("what is no number is refused") {
  Table table;
  table.columns = {{"x", "x", "", Align::Decimal, 0, false}};
  table.lines.emplace_back(Row{{Number{std::numeric_limits<double>::quiet_NaN(), 3}}});
  CHECK_THROWS_WITH_AS(static_cast<void>(table_json(table)),
                       "a result is not a finite number; check the geometry and the parameters",
                       Error);
}
