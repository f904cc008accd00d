#include "figure/polygon_fill.hpp"

#include <cmath>
#include <numbers>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "figure/paint.hpp"

using namespace irrepwise;

namespace {

// Darkness of a white raster painted black, in pixels.
double covered(const Raster& raster) {
  double sum = 0.0;
  for (std::size_t i = 0; i < raster.rgba.size(); i += 4) sum += 1.0 - raster.rgba[i] / 255.0;
  return sum;
}

std::vector<Point2> circle(double radius, bool clockwise) {
  std::vector<Point2> points;
  for (int i = 0; i < 360; ++i) {
    const double angle = (clockwise ? -i : i) * std::numbers::pi / 180.0;
    points.push_back({50 + radius * std::cos(angle), 50 + radius * std::sin(angle)});
  }
  return points;
}

double filled(const std::vector<std::vector<Point2>>& polygons, FillRule rule) {
  Raster raster(100, 100, {255, 255, 255, 255});
  fill_polygons(raster, polygons, rule, {0, 0, 0});
  return covered(raster);
}

}  // namespace

TEST_CASE("what is painted has the area of the shape") {
  const double pi = std::numbers::pi;
  CHECK(std::abs(filled({circle(30, false)}, FillRule::NonZero) - pi * 900) < 3.0);
  CHECK(std::abs(filled({circle(30, true)}, FillRule::EvenOdd) - pi * 900) < 3.0);
  CHECK(std::abs(filled({{{10.25, 10}, {20.75, 10}, {20.75, 20}, {10.25, 20}}}, FillRule::NonZero) -
                 105.0) < 0.2);
  CHECK(filled({{{-40, -40}, {200, -40}, {200, 200}, {-40, 200}}}, FillRule::NonZero) == 10000.0);
}

TEST_CASE("an inner polygon is a hole by the even-odd rule, and not by the non-zero one") {
  const double pi = std::numbers::pi;
  const std::vector<std::vector<Point2>> ring = {circle(30, false), circle(10, false)};
  CHECK(std::abs(filled(ring, FillRule::EvenOdd) - pi * 800) < 3.0);
  CHECK(std::abs(filled(ring, FillRule::NonZero) - pi * 900) < 3.0);
}

TEST_CASE("a line covers its length times its width, with round ends; dashes cover their part") {
  const std::vector<Point2> line = {{20, 50}, {50, 50}, {80, 50}};
  const double solid = filled(stroke_polygons(line, false, 6.0, {}), FillRule::NonZero);
  CHECK(std::abs(solid - (60 * 6 + std::numbers::pi * 9)) < 3.0);
  const double dashed = filled(stroke_polygons(line, false, 6.0, {5, 5}), FillRule::NonZero);
  CHECK(std::abs(dashed - 30 * 6) < 3.0);
}

TEST_CASE("a PNG reads back as the same pixels, and two writings are the same bytes") {
  Raster raster(7, 5, {1, 2, 3, 4});
  for (std::size_t i = 0; i < raster.rgba.size(); ++i) raster.rgba[i] = std::uint8_t(37 * i);
  const std::string bytes = png_bytes(raster);
  CHECK(bytes.substr(1, 3) == "PNG");  // ISO/IEC 15948, signature
  CHECK(bytes == png_bytes(raster));
  const Raster again = read_png(bytes);
  CHECK(again.width == 7);
  CHECK(again.height == 5);
  CHECK(again.rgba == raster.rgba);
  CHECK_THROWS_AS(static_cast<void>(read_png("no picture")), Error);
}

TEST_CASE("a picture inside a figure keeps its colours when it is made smaller") {
  Figure figure;
  figure.width = 20;
  figure.height = 20;
  Raster half(40, 40, {0, 0, 0, 255});
  for (int y = 0; y < 40; ++y) {
    for (int x = 0; x < 40; ++x) half.pixel(x, y)[3] = x % 2 == 0 ? 255 : 0;
  }
  figure.groups.push_back(
      {"", "", "", {Picture{{0, 0}, 20, 20, std::make_shared<const Raster>(half), ""}}});
  const Raster raster = painted(figure, 1.0);
  for (int i = 0; i < 20; ++i) CHECK(std::abs(raster.pixel(i, i)[0] - 127) <= 1);
}
