#include "figure/paint.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include "figure/font.hpp"
#include "figure/polygon_fill.hpp"

namespace irrepwise {
namespace {

class Painter {
 public:
  Painter(Raster& raster, double scale) : raster_(raster), scale_(scale) {}

  void operator()(const Path& path) {
    std::vector<std::vector<Point2>> lines = path.lines;
    for (std::vector<Point2>& line : lines) {
      for (Point2& point : line) point = scaled(point);
    }
    if (path.fill) fill_polygons(raster_, lines, FillRule::EvenOdd, *path.fill);
    if (path.stroke) stroke(lines, path.closed, *path.stroke);
  }

  void operator()(const Disc& disc) {
    const double radius = disc.radius * scale_;
    const Point2 centre = scaled(disc.centre);
    const int corners = std::max(16, static_cast<int>(6.0 * radius));
    std::vector<Point2> circle;
    for (int i = 0; i < corners; ++i) {
      const double angle = 2.0 * std::numbers::pi * i / corners;
      circle.push_back({centre.x + radius * std::cos(angle), centre.y + radius * std::sin(angle)});
    }
    if (disc.fill) fill_polygons(raster_, {circle}, FillRule::NonZero, *disc.fill);
    if (disc.stroke) stroke({circle}, true, *disc.stroke);
  }

  void operator()(const Text& text) {
    std::vector<std::vector<Point2>> polygons = font_.outlines(text);
    for (std::vector<Point2>& polygon : polygons) {
      for (Point2& point : polygon) point = scaled(point);
    }
    fill_polygons(raster_, polygons, FillRule::NonZero, text.colour);
  }

  // Each pixel takes the mean of the picture's pixels that it covers.
  void operator()(const Picture& picture) {
    const Raster& source = *picture.raster;
    const double step_x = source.width / (picture.width * scale_);
    const double step_y = source.height / (picture.height * scale_);
    const Point2 corner = scaled(picture.corner);
    const int left = static_cast<int>(std::lround(corner.x));
    const int top = static_cast<int>(std::lround(corner.y));
    const int columns = static_cast<int>(std::lround(picture.width * scale_));
    const int rows = static_cast<int>(std::lround(picture.height * scale_));
    for (int y = std::max(0, -top); y < rows && top + y < raster_.height; ++y) {
      for (int x = std::max(0, -left); x < columns && left + x < raster_.width; ++x) {
        blend(raster_.pixel(left + x, top + y), source, x * step_x, (x + 1) * step_x, y * step_y,
              (y + 1) * step_y);
      }
    }
  }

 private:
  [[nodiscard]] Point2 scaled(const Point2& p) const { return {p.x * scale_, p.y * scale_}; }

  void stroke(const std::vector<std::vector<Point2>>& lines, bool closed, const Stroke& pen) {
    std::vector<double> dashes = pen.dashes;
    for (double& dash : dashes) dash *= scale_;
    std::vector<std::vector<Point2>> polygons;
    for (const std::vector<Point2>& line : lines) {
      std::vector<std::vector<Point2>> more =
          stroke_polygons(line, closed, pen.width * scale_, dashes);
      std::move(more.begin(), more.end(), std::back_inserter(polygons));
    }
    fill_polygons(raster_, polygons, FillRule::NonZero, pen.colour);
  }

  static void blend(std::uint8_t* pixel, const Raster& source, double left, double right,
                    double top, double bottom) {
    const int x0 = std::clamp(static_cast<int>(left), 0, source.width - 1);
    const int y0 = std::clamp(static_cast<int>(top), 0, source.height - 1);
    const int x1 = std::clamp(static_cast<int>(std::ceil(right - 1e-9)), x0 + 1, source.width);
    const int y1 = std::clamp(static_cast<int>(std::ceil(bottom - 1e-9)), y0 + 1, source.height);
    double sum[3] = {0.0, 0.0, 0.0};
    double opacity = 0.0;
    for (int y = y0; y < y1; ++y) {
      for (int x = x0; x < x1; ++x) {
        const std::uint8_t* from = source.pixel(x, y);
        for (int c = 0; c < 3; ++c) sum[c] += from[c] * (from[3] / 255.0);
        opacity += from[3] / 255.0;
      }
    }
    const double n = static_cast<double>((x1 - x0) * (y1 - y0));
    for (int c = 0; c < 3; ++c) {
      const double value = (1.0 - opacity / n) * pixel[c] + sum[c] / n;
      pixel[c] = static_cast<std::uint8_t>(std::lround(std::clamp(value, 0.0, 255.0)));
    }
  }

  Raster& raster_;
  double scale_;
  Font font_;
};

}  // namespace

Raster painted(const Figure& figure, double scale) {
  Raster raster(std::max(1, static_cast<int>(std::lround(figure.width * scale))),
                std::max(1, static_cast<int>(std::lround(figure.height * scale))),
                {255, 255, 255, 255});
  Painter painter(raster, scale);
  for (const Group& group : figure.groups) {
    for (const Element& element : group.elements) std::visit(painter, element);
  }
  return raster;
}

}  // namespace irrepwise
