#include "figure/level_lanes.hpp"

#include <cmath>

#include <doctest/doctest.h>

using namespace irrepwise;

TEST_CASE("levels of one lane are never closer than asked, and a level keeps the first free lane") {
  const std::vector<double> heights = {0, 5, 9, 21, 22, 60};
  const std::vector<int> lanes = level_lanes(heights, 20.0);
  CHECK(lanes == std::vector<int>{0, 1, 2, 0, 3, 0});  // by hand
  CHECK(level_lanes(heights, 20.0, {4}) == std::vector<int>{0, 1, 2, 3, 0, 0});
}

TEST_CASE("places spread apart keep their order and mean, and stay where there is room") {
  CHECK(spread_apart({0, 100}, 10) == std::vector<double>{0, 100});
  // Two at one place move by half the distance each: the least squares.
  CHECK(spread_apart({50, 50}, 10) == std::vector<double>{45, 55});
  const std::vector<double> places = {0, 1, 2, 40, 41, 90};
  const std::vector<double> moved = spread_apart(places, 15);
  double sum = 0.0;
  for (std::size_t i = 0; i < places.size(); ++i) {
    sum += moved[i] - places[i];
    if (i > 0) CHECK(moved[i] - moved[i - 1] >= 15 - 1e-9);
  }
  CHECK(std::abs(sum) < 1e-9);
  CHECK(moved.back() == 90);
}
