#include "core/text.hpp"

#include <string>
#include <vector>

#include <doctest/doctest.h>

using namespace irrepwise;

TEST_CASE("slips are counted letter by letter, an exchange of neighbours as one") {
  CHECK(edit_distance("charge", "charge") == 0);
  CHECK(edit_distance("charge", "CHARGE") == 0);
  CHECK(edit_distance("chrage", "charge") == 1);  // exchanged
  CHECK(edit_distance("chage", "charge") == 1);   // left out
  CHECK(edit_distance("charrge", "charge") == 1);
  CHECK(edit_distance("chorge", "charge") == 1);
  CHECK(edit_distance("", "eg") == 2);
  CHECK(edit_distance("eg", "") == 2);
  // Levenshtein, Sov. Phys. Dokl. 10, 707 (1966); the pair is common practice.
  CHECK(edit_distance("kitten", "sitting") == 3);
}

TEST_CASE("a word that begins a known one means it, the shortest of several") {
  const std::vector<std::string> names = {"CN", "cis-ammine", "cis-aqua", "trans-aqua"};
  CHECK(nearest_word("cis", names) == "cis-aqua");
  CHECK(nearest_word("CIS-AM", names) == "cis-ammine");
  CHECK(nearest_word("tarns-aqua", names) == "trans-aqua");
  CHECK(nearest_word("ci", names) == "CN");  // two letters begin too much
  CHECK(nearest_word("fluoride", names).empty());
}
