#include "figure/orbital_grid.hpp"

#include <cmath>

#include <doctest/doctest.h>

#include "core/constants.hpp"
#include "core/error.hpp"
#include "figure/single_orbital.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

TEST_CASE("half of a 1s density lies within the radius of the closed form") {
  // Outside R lies exp(-2 zeta R) (1 + 2 zeta R + 2 zeta^2 R^2): by integrating r^2 exp(-2 zeta r).
  // For 0.5, 2 zeta R = 2.674060 solves it.
  const double zeta = 1.3;
  const double t = 2.674060;
  CHECK(std::abs(std::exp(-t) * (1 + t + t * t / 2) - 0.5) < 1e-6);
  const OrbitalField field = single_orbital(1, 0, zeta, 0);
  for (const double spacing : {0.07, 0.15}) {
    const OrbitalGrid grid = sample(field, spacing);
    const double expected = field.value({0, 0, 0.5 * t / zeta * bohr_in_angstrom}, 0);
    CHECK(std::abs(enclosing_isovalue(field, grid, 0, 0.5) / expected - 1.0) < 0.005);
  }
}

TEST_CASE("a compact d orbital gives the same isovalue on grids of any spacing") {
  // As of a late 5d shell: its lobes hold few points of the coarser grid.
  const OrbitalField field = single_orbital(5, 2, 4.0, 2);
  const double fine = enclosing_isovalue(field, sample(field, 0.06), 0, 0.5);
  for (const double spacing : {0.09, 0.13}) {
    const double coarse = enclosing_isovalue(field, sample(field, spacing), 0, 0.5);
    CHECK(std::abs(coarse / fine - 1.0) < 0.005);
  }
}

TEST_CASE("more of the density needs a smaller isovalue") {
  const OrbitalField field = single_orbital(2, 1, 1.6, 0);
  const OrbitalGrid grid = sample(field);
  double last = 1e9;
  for (const double share : {0.1, 0.3, 0.5, 0.7, 0.9, 0.99}) {
    const double isovalue = enclosing_isovalue(field, grid, 0, share);
    CHECK(isovalue < last);
    last = isovalue;
  }
}

TEST_CASE("orbitals are normalised and orthogonal on the grid as their overlaps say") {
  // Normalised over S, which is computed in another way: by closed two-centre integrals.
  for (const char* name : {"tetrachloroplatinate(II)", "permanganate", "bromochlorofluoromethane",
                           "hydrogen cyanide", "diborane"}) {
    const Run r = run(test_molecule(name).molecule);
    const int homo = *r.levels.frontier.homo;
    for (const int level : {0, homo, homo + 1}) {
      const Eigen::MatrixXd c = level_orbitals(r.symmetry, r.basis, r.levels, level);
      const OrbitalGrid grid = sample(OrbitalField(r.symmetry.molecule, r.basis, c));
      CAPTURE(name);
      CAPTURE(level);
      const double volume = std::pow(grid.shape.spacing_angstrom / bohr_in_angstrom, 3);
      for (std::size_t a = 0; a < grid.values.size(); ++a) {
        CHECK(std::abs(grid.integrals[a] - 1.0) < 0.01);
        for (std::size_t b = 0; b < a; ++b) {
          double sum = 0.0;
          for (std::size_t p = 0; p < grid.shape.points(); ++p) {
            sum += grid.values[a][p] * grid.values[b][p];
          }
          CHECK(std::abs(sum * volume) < 0.005);
        }
      }
    }
  }
}

TEST_CASE("the density summed over partners has the symmetry of the square on the grid") {
  const Run r = run(test_molecule("tetrachloroplatinate(II)").molecule);
  for (std::size_t level = 0; level < r.levels.levels.size(); ++level) {
    if (r.levels.levels[level].degeneracy != 2) continue;
    const OrbitalGrid grid =
        sample(OrbitalField(r.symmetry.molecule, r.basis,
                            level_orbitals(r.symmetry, r.basis, r.levels, static_cast<int>(level))),
               0.3);
    const GridShape& shape = grid.shape;
    REQUIRE(shape.size[0] == shape.size[1]);
    REQUIRE(shape.first[0] == shape.first[1]);
    const auto density = [&](int i, int j, int k) {
      const std::size_t p = shape.index(i, j, k);
      return grid.values[0][p] * grid.values[0][p] + grid.values[1][p] * grid.values[1][p];
    };
    double worst = 0.0;
    for (int k = 0; k < shape.size[2]; ++k) {
      for (int j = 0; j < shape.size[1]; ++j) {
        for (int i = 0; i < shape.size[0]; ++i) {
          worst = std::max({worst, std::abs(density(i, j, k) - density(j, i, k)),
                            std::abs(density(i, j, k) - density(shape.size[0] - 1 - i, j, k)),
                            std::abs(density(i, j, k) - density(i, j, shape.size[2] - 1 - k))});
        }
      }
    }
    CHECK(worst < 1e-9);
    return;  // one level is enough for the time it takes
  }
  FAIL("no degenerate level");
}

TEST_CASE("a share outside 0 to 1, or a spacing that cannot serve, is refused") {
  const OrbitalField field = single_orbital(1, 0, 1.3, 0);
  const OrbitalGrid grid = sample(field, 0.2);
  CHECK_THROWS_WITH_AS(static_cast<void>(enclosing_isovalue(field, grid, 0, 1.5)),
                       "share of the density: found 1.5, expected more than 0 and less than 1",
                       Error);
  CHECK_THROWS_WITH_AS(static_cast<void>(enclosing_isovalue(field, grid, 0, 0.0)),
                       "share of the density: found 0, expected more than 0 and less than 1",
                       Error);
  CHECK_THROWS_WITH_AS(static_cast<void>(enclosing_isovalue(field, grid, 0, std::nan(""))),
                       "share of the density: found nan, expected more than 0 and less than 1",
                       Error);
  CHECK_THROWS_WITH_AS(static_cast<void>(sample(field, 5.0)),
                       "spacing of the grid: found 5, expected 0.02 to 1 Å", Error);
}
