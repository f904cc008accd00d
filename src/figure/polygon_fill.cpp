#include "figure/polygon_fill.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numbers>

namespace irrepwise {
namespace {

constexpr int lines_per_pixel = 16;

struct Edge {
  double x_top, y_top, x_bottom, y_bottom;  // y_top < y_bottom
  int direction;
};

struct Crossing {
  double x;
  int direction;
};

std::vector<Edge> edges_of(const std::vector<std::vector<Point2>>& polygons) {
  std::vector<Edge> edges;
  for (const std::vector<Point2>& polygon : polygons) {
    for (std::size_t i = 0; i < polygon.size(); ++i) {
      const Point2& a = polygon[i];
      const Point2& b = polygon[(i + 1) % polygon.size()];
      if (a.y < b.y) edges.push_back({a.x, a.y, b.x, b.y, 1});
      if (a.y > b.y) edges.push_back({b.x, b.y, a.x, a.y, -1});
    }
  }
  std::sort(edges.begin(), edges.end(),
            [](const Edge& a, const Edge& b) { return a.y_top < b.y_top; });
  return edges;
}

// Adds the part of each pixel between two abscissae to the row's coverage.
void cover(std::vector<double>& row, double from, double to) {
  const double end = static_cast<double>(row.size());
  from = std::clamp(from, 0.0, end);
  to = std::clamp(to, 0.0, end);
  if (from >= to) return;
  const auto first = static_cast<std::size_t>(from);
  const auto last = std::min(static_cast<std::size_t>(to), row.size() - 1);
  if (first == last) {
    row[first] += to - from;
    return;
  }
  row[first] += static_cast<double>(first + 1) - from;
  for (std::size_t x = first + 1; x < last; ++x) row[x] += 1.0;
  row[last] += to - static_cast<double>(last);
}

void cover_line(std::vector<double>& row, std::vector<Crossing>& crossings, FillRule rule) {
  std::sort(crossings.begin(), crossings.end(),
            [](const Crossing& a, const Crossing& b) { return a.x < b.x; });
  int winding = 0;
  for (std::size_t i = 0; i + 1 < crossings.size(); ++i) {
    winding += crossings[i].direction;
    const bool inside = rule == FillRule::NonZero ? winding != 0 : i % 2 == 0;
    if (inside) cover(row, crossings[i].x, crossings[i + 1].x);
  }
}

void blend(std::uint8_t* pixel, Colour colour, double part) {
  const double w = std::clamp(part, 0.0, 1.0);
  const std::uint8_t channels[] = {colour.red, colour.green, colour.blue};
  for (int c = 0; c < 3; ++c) {
    pixel[c] = static_cast<std::uint8_t>(std::lround((1.0 - w) * pixel[c] + w * channels[c]));
  }
}

Point2 along(const Point2& a, const Point2& b, double t) {
  return {a.x + t * (b.x - a.x), a.y + t * (b.y - a.y)};
}

// A rectangle around the segment and a disc at its start, wound the same way.
void add_segment(std::vector<std::vector<Point2>>& out, const Point2& a, const Point2& b,
                 double half, bool round) {
  const double length = std::hypot(b.x - a.x, b.y - a.y);
  if (length > 0.0) {
    const double nx = -half * (b.y - a.y) / length;
    const double ny = half * (b.x - a.x) / length;
    out.push_back(
        {{a.x + nx, a.y + ny}, {a.x - nx, a.y - ny}, {b.x - nx, b.y - ny}, {b.x + nx, b.y + ny}});
  }
  if (!round) return;
  const int corners = std::max(8, static_cast<int>(4.0 * half));
  std::vector<Point2> disc;
  for (int i = 0; i < corners; ++i) {
    const double angle = 2.0 * std::numbers::pi * i / corners;
    disc.push_back({a.x + half * std::cos(angle), a.y + half * std::sin(angle)});
  }
  out.push_back(std::move(disc));
}

std::vector<std::vector<Point2>> dashed(const std::vector<Point2>& line,
                                        const std::vector<double>& dashes) {
  std::vector<std::vector<Point2>> pieces;
  std::size_t dash = 0;
  double left = dashes.front();
  bool on = true;
  pieces.push_back({line.front()});
  for (std::size_t i = 0; i + 1 < line.size(); ++i) {
    const double length = std::hypot(line[i + 1].x - line[i].x, line[i + 1].y - line[i].y);
    double done = 0.0;
    while (length - done > left) {
      done += left;
      const Point2 here = along(line[i], line[i + 1], done / length);
      if (on) pieces.back().push_back(here);
      on = !on;
      if (on) pieces.push_back({here});
      dash = (dash + 1) % dashes.size();
      left = dashes[dash];
    }
    left -= length - done;
    if (on) pieces.back().push_back(line[i + 1]);
  }
  return pieces;
}

}  // namespace

void fill_polygons(Raster& raster, const std::vector<std::vector<Point2>>& polygons, FillRule rule,
                   Colour colour) {
  const std::vector<Edge> edges = edges_of(polygons);
  if (edges.empty()) return;
  std::vector<double> row(static_cast<std::size_t>(raster.width));
  std::vector<std::size_t> active;
  std::vector<Crossing> crossings;
  std::size_t next = 0;
  double bottom = 0.0;
  for (const Edge& edge : edges) bottom = std::max(bottom, edge.y_bottom);
  const int first_row = std::max(0, static_cast<int>(std::floor(edges.front().y_top)));
  const int end_row = std::min(raster.height, static_cast<int>(std::ceil(bottom)));
  for (int y = first_row; y < end_row; ++y) {
    std::fill(row.begin(), row.end(), 0.0);
    while (next < edges.size() && edges[next].y_top < y + 1) active.push_back(next++);
    std::erase_if(active, [&](std::size_t e) { return edges[e].y_bottom <= y; });
    if (active.empty()) continue;
    for (int line = 0; line < lines_per_pixel; ++line) {
      const double at = y + (line + 0.5) / lines_per_pixel;
      crossings.clear();
      for (const std::size_t e : active) {
        const Edge& edge = edges[e];
        if (at < edge.y_top || at >= edge.y_bottom) continue;
        const double t = (at - edge.y_top) / (edge.y_bottom - edge.y_top);
        crossings.push_back({edge.x_top + t * (edge.x_bottom - edge.x_top), edge.direction});
      }
      cover_line(row, crossings, rule);
    }
    for (int x = 0; x < raster.width; ++x) {
      const double part = row[static_cast<std::size_t>(x)] / lines_per_pixel;
      if (part > 0.0) blend(raster.pixel(x, y), colour, part);
    }
  }
}

std::vector<std::vector<Point2>> stroke_polygons(const std::vector<Point2>& line, bool closed,
                                                 double width, const std::vector<double>& dashes) {
  std::vector<std::vector<Point2>> out;
  if (line.size() < 2) return out;
  std::vector<Point2> whole = line;
  if (closed) whole.push_back(line.front());
  const bool round = dashes.empty();
  const std::vector<std::vector<Point2>> pieces =
      round ? std::vector<std::vector<Point2>>{whole} : dashed(whole, dashes);
  for (const std::vector<Point2>& piece : pieces) {
    for (std::size_t i = 0; i + 1 < piece.size(); ++i) {
      add_segment(out, piece[i], piece[i + 1], 0.5 * width, round || i > 0);
    }
    if (round) add_segment(out, piece.back(), piece.back(), 0.5 * width, true);
  }
  return out;
}

}  // namespace irrepwise
