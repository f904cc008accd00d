#include "figure/contour_lines.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <unordered_map>

namespace irrepwise {
namespace {

constexpr std::array<double, 6> usual_levels = {0.0125, 0.025, 0.05, 0.1, 0.2, 0.4};

struct Samples {
  double left = 0.0;  // Å
  double bottom = 0.0;
  double step = 0.0;
  int columns = 0;
  int rows = 0;
  std::vector<double> values;

  [[nodiscard]] double at(int i, int j) const {
    return values[static_cast<std::size_t>(j) * static_cast<std::size_t>(columns) +
                  static_cast<std::size_t>(i)];
  }
  [[nodiscard]] Point2 place(int i, int j) const { return {left + i * step, bottom + j * step}; }
};

// As far as any density of note reaches; the rim is set to zero so that every line is closed.
Samples sampled(const OrbitalField& field, int orbital, const Plane& plane) {
  double low[2] = {1e9, 1e9};
  double high[2] = {-1e9, -1e9};
  for (const OrbitalField::Centre& centre : field.centres()) {
    const Eigen::Vector3d r = centre.position_angstrom - plane.origin;
    const double reach = centre.density_angstrom;
    const double places[2] = {plane.right.dot(r), plane.up.dot(r)};
    for (int i = 0; i < 2; ++i) {
      low[i] = std::min(low[i], places[i] - reach);
      high[i] = std::max(high[i], places[i] + reach);
    }
  }
  Samples samples;
  const double size = std::max(high[0] - low[0], high[1] - low[1]);
  samples.step = std::max(0.06, size / 240.0);
  // Points at multiples of the step: a symmetric orbital gives a symmetric drawing.
  const auto first = [&](int i) { return std::floor(low[i] / samples.step + 1e-6) - 1.0; };
  const auto last = [&](int i) { return std::ceil(high[i] / samples.step - 1e-6) + 1.0; };
  samples.left = first(0) * samples.step;
  samples.bottom = first(1) * samples.step;
  samples.columns = static_cast<int>(last(0) - first(0)) + 1;
  samples.rows = static_cast<int>(last(1) - first(1)) + 1;
  for (int j = 0; j < samples.rows; ++j) {
    for (int i = 0; i < samples.columns; ++i) {
      const bool rim = i == 0 || j == 0 || i + 1 == samples.columns || j + 1 == samples.rows;
      const Point2 p = samples.place(i, j);
      samples.values.push_back(rim ? 0.0 : field.value(plane.point(p.x, p.y), orbital));
    }
  }
  return samples;
}

class Tracer {
 public:
  Tracer(const OrbitalField& field, int orbital, const Plane& plane, const Samples& samples,
         double level)
      : field_(field), orbital_(orbital), plane_(plane), samples_(samples), level_(level) {}

  std::vector<std::vector<Point2>> lines() {
    for (int j = 0; j + 1 < samples_.rows; ++j) {
      for (int i = 0; i + 1 < samples_.columns; ++i) cell(i, j);
    }
    return chained();
  }

 private:
  // Positive inside.
  [[nodiscard]] double inside(int i, int j) const {
    return (level_ < 0.0 ? -1.0 : 1.0) * (samples_.at(i, j) - level_);
  }

  // Each edge is known by its lower left end and direction; walking around the cell with the
  // inside to the left, a line leaves at one edge and enters at another.
  void cell(int i, int j) {
    const bool in[4] = {inside(i, j) > 0.0, inside(i + 1, j) > 0.0, inside(i + 1, j + 1) > 0.0,
                        inside(i, j + 1) > 0.0};
    const int count = in[0] + in[1] + in[2] + in[3];
    if (count == 0 || count == 4) return;
    const int edges[4] = {edge(i, j, 0), edge(i + 1, j, 1), edge(i, j + 1, 0), edge(i, j, 1)};
    std::vector<int> to_out;  // edges at which the walk around passes from in to out
    std::vector<int> to_in;
    for (int e = 0; e < 4; ++e) {
      if (in[e] && !in[(e + 1) % 4]) to_out.push_back(e);
      if (!in[e] && in[(e + 1) % 4]) to_in.push_back(e);
    }
    if (to_out.size() == 1) {
      next_[edges[to_out[0]]] = edges[to_in[0]];
      return;
    }
    // A saddle: the mean decides whether the two inner corners are joined.
    const double mean = inside(i, j) + inside(i + 1, j) + inside(i + 1, j + 1) + inside(i, j + 1);
    for (const int e : to_out) {
      const int partner = mean > 0.0 ? (e + 1) % 4 : (e + 3) % 4;
      next_[edges[e]] = edges[partner];
    }
  }

  [[nodiscard]] int edge(int i, int j, int direction) const {
    return 2 * (j * samples_.columns + i) + direction;
  }

  [[nodiscard]] double exact(const Point2& p) const {
    return field_.value(plane_.point(p.x, p.y), orbital_) - level_;
  }

  // Where the orbital has the level on the edge: Illinois's false position, bracketed.
  [[nodiscard]] Point2 crossing(int edge) const {
    const int at = edge / 2;
    const int i = at % samples_.columns;
    const int j = at / samples_.columns;
    const int di = edge % 2 == 0 ? 1 : 0;
    const Point2 a = samples_.place(i, j);
    const Point2 b = samples_.place(i + di, j + 1 - di);
    double f_a = samples_.at(i, j) - level_;
    double f_b = samples_.at(i + di, j + 1 - di) - level_;
    double low = 0.0;
    double high = 1.0;
    double t = 0.0;
    int last = 0;
    for (int step = 0; step < 30; ++step) {
      t = low + (high - low) * f_a / (f_a - f_b);
      const double f = exact({a.x + t * (b.x - a.x), a.y + t * (b.y - a.y)});
      if (std::abs(f) < 1e-7 * std::abs(level_)) break;
      if ((f > 0.0) == (f_a > 0.0)) {
        low = t;
        f_a = f;
        if (last == 1) f_b *= 0.5;
        last = 1;
      } else {
        high = t;
        f_b = f;
        if (last == -1) f_a *= 0.5;
        last = -1;
      }
    }
    return {a.x + t * (b.x - a.x), a.y + t * (b.y - a.y)};
  }

  std::vector<std::vector<Point2>> chained() {
    std::vector<std::vector<Point2>> lines;
    std::vector<int> starts;
    for (const auto& [from, to] : next_) starts.push_back(from);
    std::sort(starts.begin(), starts.end());
    for (const int start : starts) {
      std::vector<Point2> line;
      int at = start;
      for (auto found = next_.find(at); found != next_.end(); found = next_.find(at)) {
        line.push_back(crossing(at));
        at = found->second;
        next_.erase(found);
      }
      if (line.size() > 2) lines.push_back(std::move(line));
    }
    return lines;
  }

  const OrbitalField& field_;
  int orbital_;
  const Plane& plane_;
  const Samples& samples_;
  double level_;
  std::unordered_map<int, int> next_;
};

}  // namespace

std::span<const double> contour_levels() { return usual_levels; }

ContourMap contour_map(const OrbitalField& field, int orbital, const Plane& plane,
                       std::span<const double> levels) {
  const Samples samples = sampled(field, orbital, plane);
  ContourMap map;
  map.extent = {1e9, -1e9, -1e9, 1e9};
  for (const double sign : {1.0, -1.0}) {
    for (const double level : levels) {
      Contour contour;
      contour.level = sign * level;
      contour.lines = Tracer(field, orbital, plane, samples, contour.level).lines();
      for (const std::vector<Point2>& line : contour.lines) {
        for (const Point2& p : line) {
          map.extent.left = std::min(map.extent.left, p.x);
          map.extent.right = std::max(map.extent.right, p.x);
          map.extent.bottom = std::min(map.extent.bottom, p.y);
          map.extent.top = std::max(map.extent.top, p.y);
        }
      }
      if (!contour.lines.empty()) map.contours.push_back(std::move(contour));
    }
  }
  return map;
}

}  // namespace irrepwise
