#include "hueckel/occupation.hpp"

#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;

namespace {

// a1g below t2g below eg, as the metal levels of an octahedral complex lie: 12 electrons fit.
struct Octahedron {
  PointGroup group{parse_schoenflies("Oh")};
  std::vector<Level> levels;

  Octahedron() {
    const struct {
      const char* label;
      int degeneracy;
      double energy_ev;
    } rows[] = {{"a1g", 1, -15.0}, {"t2g", 3, -12.0}, {"eg", 2, -9.0}};
    for (const auto& row : rows) {
      Level level;
      level.irrep = group.irrep_index(row.label);
      level.degeneracy = row.degeneracy;
      level.energy_ev = row.energy_ev;
      levels.push_back(level);
    }
  }

  std::vector<double> occupied(int electrons, const HueckelOptions& options = {}) {
    occupy(levels, group, electrons, options);
    std::vector<double> occupations;
    for (const Level& level : levels) occupations.push_back(level.occupation);
    return occupations;
  }
};

HueckelOptions multiplicity(int value) {
  HueckelOptions options;
  options.multiplicity = value;
  return options;
}

HueckelOptions by_irrep(std::map<std::string, int> electrons) {
  HueckelOptions options;
  options.electrons_by_irrep = std::move(electrons);
  return options;
}

using Occupations = std::vector<double>;

}  // namespace

TEST_CASE("without a wish the levels fill from below") {
  Octahedron oh;
  CHECK(oh.occupied(1) == Occupations{1, 0, 0});
  CHECK(oh.occupied(7) == Occupations{2, 5, 0});
  CHECK(oh.occupied(12) == Occupations{2, 6, 4});
}

TEST_CASE("a multiplicity gives the high-spin and low-spin configurations of the trade") {
  // Common practice: high-spin d5 is t2g3 eg2 (sextet), d7 t2g5 eg2 (quartet); low-spin d5 t2g5.
  // Two more electrons fill a1g below.
  Octahedron oh;
  CHECK(oh.occupied(2 + 5, multiplicity(6)) == Occupations{2, 3, 2});
  CHECK(oh.occupied(2 + 5, multiplicity(2)) == Occupations{2, 5, 0});
  CHECK(oh.occupied(2 + 7, multiplicity(4)) == Occupations{2, 5, 2});
  CHECK(oh.occupied(2 + 6, multiplicity(1)) == Occupations{2, 6, 0});
  CHECK(oh.occupied(2 + 6, multiplicity(5)) == Occupations{2, 4, 2});
}

TEST_CASE("electrons by irrep go where they are told") {
  Octahedron oh;
  CHECK(oh.occupied(8, by_irrep({{"t2g", 4}, {"eg", 2}, {"a1g", 2}})) == Occupations{2, 4, 2});
  CHECK(oh.occupied(4, by_irrep({{"EG", 4}})) == Occupations{0, 0, 4});
}

TEST_CASE("the frontier is the highest level with electrons and the lowest without") {
  Octahedron oh;
  (void)oh.occupied(8);
  Frontier frontier = find_frontier(oh.levels);
  CHECK(frontier.homo == 1);
  CHECK(frontier.lumo == 2);
  CHECK_FALSE(frontier.open_shell);
  (void)oh.occupied(7);
  CHECK(find_frontier(oh.levels).open_shell);
  (void)oh.occupied(12);
  frontier = find_frontier(oh.levels);
  CHECK(frontier.homo == 2);
  CHECK_FALSE(frontier.lumo.has_value());
  (void)oh.occupied(4, by_irrep({{"eg", 4}}));
  frontier = find_frontier(oh.levels);
  CHECK(frontier.homo == 2);
  CHECK(frontier.lumo == 0);
}

TEST_CASE("impossible occupations are refused, with what would be possible") {
  Octahedron oh;
  const auto refused = [&](int electrons, const HueckelOptions& options, const char* message) {
    CHECK_THROWS_WITH_AS((void)oh.occupied(electrons, options), message, Error);
  };
  refused(0, {}, "the charge leaves 0 valence electrons, expected at least 1; check the charge");
  refused(-3, {}, "the charge leaves -3 valence electrons, expected at least 1; check the charge");
  refused(13, {}, "13 valence electrons, but the orbitals hold 12 at most; check the charge");
  refused(6, multiplicity(0), "multiplicity = 0, expected 2S + 1, that is 1 or more");
  refused(6, multiplicity(2),
          "multiplicity 2 is impossible with 6 electrons: it must be odd (1, 3, 5 … with an even "
          "number of electrons, 2, 4, 6 … with an odd one)");
  refused(5, multiplicity(3),
          "multiplicity 3 is impossible with 5 electrons: it must be even (1, 3, 5 … with an even "
          "number of electrons, 2, 4, 6 … with an odd one)");
  refused(2, multiplicity(5),
          "multiplicity 5 is impossible: 2 electrons in 6 orbitals allow at most 3");
  refused(10, multiplicity(5),
          "multiplicity 5 is impossible: 10 electrons in 6 orbitals allow at most 3");
  HueckelOptions both = by_irrep({{"a1g", 2}});
  both.multiplicity = 1;
  refused(2, both, "both a multiplicity and occupations by irrep are given; keep one of them");
  refused(8, by_irrep({{"a1g", 2}, {"t2g", 5}}),
          "occupations: the irreps hold 7 electrons together, the molecule has 8; name every irrep "
          "that holds valence electrons");
  refused(8, by_irrep({{"a1g", -2}, {"t2g", 6}, {"eg", 4}}),
          "occupations: -2 electrons in a1g, expected 0 or more");
  refused(8, by_irrep({{"a1g", 4}, {"t2g", 4}}),
          "occupations: a1g has room for 2 electrons less than asked");
  CHECK_THROWS_AS((void)oh.occupied(8, by_irrep({{"t3g", 8}})), Error);
}
