#include "output/json_text.hpp"

#include <limits>

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;

TEST_CASE("keys keep their order, lists of things get a line each, matrices a line for each row") {
  const Json document = {{"z", 1},
                         {"a", {{"x", 0.1}, {"matrix", {{1, 2}, {3, 4}}}}},
                         {"list", {{{"b", 1}, {"a", {1, 2}}}, {{"b", 2}}}},
                         {"empty", Json::array()}};
  CHECK(json_text(document) ==
        "{\n \"z\": 1,\n \"a\": {\n  \"x\": 0.1,\n  \"matrix\": [\n   [1,2],\n   [3,4]\n  ]\n },\n"
        " \"list\": [\n  {\"b\":1,\"a\":[1,2]},\n  {\"b\":2}\n ],\n \"empty\": []\n}\n");
}

TEST_CASE("what is written reads back as the same document") {
  const Json document = {{"value", 1.0 / 3.0},
                         {"deep", {{"deeper", {{"deepest", {{"x", {1, 2, {3, 4}}}}}}}}},
                         {"text", "e1\" and \\ and Å"}};
  CHECK(Json::parse(json_text(document)) == document);
}

TEST_CASE("NaN and infinity are refused, and text that is no UTF-8 is mended") {
  CHECK_THROWS_AS(static_cast<void>(finite_number(std::numeric_limits<double>::quiet_NaN())),
                  Error);
  CHECK_THROWS_AS(static_cast<void>(finite_number(std::numeric_limits<double>::infinity())), Error);
  CHECK(Json::parse(json_text(Json{{"title", "a\xFF"}}))["title"] == "a\uFFFD");
}
