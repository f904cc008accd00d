#include "page/page_orbitals.hpp"

#include <algorithm>
#include <cmath>
#include <cstdlib>

#include <doctest/doctest.h>

#include "figure/orbital_grid.hpp"
#include "page/page_surfaces.hpp"
#include "support/result.hpp"

using namespace irrepwise;

TEST_CASE("isovalues of the page are those of drawings within 2 %") {
  for (const char* name : {"square_ptcl4.xyz", "hexacarbonyl_cr.xyz", "benzene.xyz"}) {
    const LevelsResult result = input_result(name);
    for (const int level : {*result.levels.frontier.homo, *result.levels.frontier.lumo}) {
      const OrbitalField field(result.symmetry.molecule, result.basis,
                               level_orbitals(result.symmetry, result.basis, result.levels, level));
      const OrbitalGrid grid = sample(field);
      const std::vector<PageOrbital> orbitals = page_orbitals(result, level, 1'000.0);
      REQUIRE(orbitals.size() == std::size_t(field.count()));
      for (int i = 0; i < field.count(); ++i) {
        CAPTURE(name);
        CAPTURE(level);
        const PageOrbital& orbital = orbitals[static_cast<std::size_t>(i)];
        const double usual = enclosing_isovalue(field, grid, i, 0.5);
        CHECK(std::abs(orbital.isovalue / usual - 1.0) < 0.02);
        // Every frontier orbital here changes sign under some operation, so it has both phases.
        CHECK(orbital.positive.has_value());
        CHECK(orbital.negative.has_value());
      }
    }
  }
}

TEST_CASE("a page carries the frontier first, and no more surfaces than it may") {
  const LevelsResult result = input_result("sandwich_fe_staggered.xyz");
  PageMolecule molecule{"sandwich", &result, {}};
  for (std::size_t i = 0; i < result.levels.levels.size(); ++i) {
    molecule.levels.push_back({static_cast<int>(i), {}});
  }
  std::vector<PageMolecule> one = {molecule};
  std::vector<PageMolecule> two = {molecule};
  add_surfaces(one, 3, 1);
  add_surfaces(two, 3, 2);
  const int homo = *result.levels.frontier.homo;
  const int lumo = *result.levels.frontier.lumo;
  for (std::size_t i = 0; i < molecule.levels.size(); ++i) {
    const int level = static_cast<int>(i);
    const bool near = std::min(std::abs(level - homo), std::abs(level - lumo)) <= 3;
    CAPTURE(level);
    CHECK(one[0].levels[i].orbitals.empty() != near);
    REQUIRE(one[0].levels[i].orbitals.size() == two[0].levels[i].orbitals.size());
    for (std::size_t k = 0; k < one[0].levels[i].orbitals.size(); ++k) {
      const PageOrbital& a = one[0].levels[i].orbitals[k];
      const PageOrbital& b = two[0].levels[i].orbitals[k];
      CHECK(a.positive->places == b.positive->places);
      CHECK(a.positive->triangles == b.positive->triangles);
    }
  }

  // Room for the frontier and little more: the farthest levels are the ones to go.
  std::size_t frontier = 0;
  for (const int level : {homo, lumo}) {
    for (const PageOrbital& orbital : page_orbitals(result, level, 1'000.0)) {
      frontier += orbital.bytes();
    }
  }
  std::vector<PageMolecule> few = {molecule};
  add_surfaces(few, 3, 2, frontier + 10);
  std::size_t carried = 0;
  for (const PageLevel& level : few[0].levels) {
    const bool is_frontier = level.level == homo || level.level == lumo;
    CHECK(level.orbitals.empty() != is_frontier);
    for (const PageOrbital& orbital : level.orbitals) carried += orbital.bytes();
  }
  CHECK(carried == frontier);
}
