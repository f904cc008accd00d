#include "figure/orbital_grid.hpp"

#include <algorithm>
#include <cmath>
#include <functional>
#include <utility>

#include <fmt/format.h>

#include "core/constants.hpp"
#include "core/error.hpp"

namespace irrepwise {
namespace {

constexpr std::size_t most_points = 24'000'000;
constexpr double finest_spacing_angstrom = 0.07;
constexpr double refused_error = 0.01;
constexpr int finer_tries = 4;
constexpr double finer = 0.8;

struct Region {
  Eigen::Vector3d low = Eigen::Vector3d::Constant(1e9);  // Å
  Eigen::Vector3d high = Eigen::Vector3d::Constant(-1e9);
};

Region region_of(const OrbitalField& field) {
  Region region;
  for (const OrbitalField::Centre& centre : field.centres()) {
    const Eigen::Vector3d reach = Eigen::Vector3d::Constant(centre.density_angstrom);
    region.low = region.low.cwiseMin(centre.position_angstrom - reach);
    region.high = region.high.cwiseMax(centre.position_angstrom + reach);
  }
  return region;
}

// In hundredths of Å.
double usual_spacing(const OrbitalField& field, const GridQuality& quality) {
  const Region region = region_of(field);
  const double spacing = std::cbrt((region.high - region.low).prod() / quality.points);
  return std::clamp(std::round(100.0 * spacing) / 100.0, finest_spacing_angstrom,
                    quality.coarsest_angstrom);
}

GridShape shape_around(const OrbitalField& field, double spacing) {
  const auto [low, high] = region_of(field);
  GridShape shape;
  shape.spacing_angstrom = spacing;
  double points = 1.0;
  for (int axis = 0; axis < 3; ++axis) {
    const auto a = static_cast<std::size_t>(axis);
    // Noise of rounding must not make one side of a symmetric grid longer.
    const double first = std::floor(low(axis) / spacing + 1e-6);
    const double last = std::ceil(high(axis) / spacing - 1e-6);
    points *= last - first + 1.0;
    if (points > static_cast<double>(most_points)) {
      const double volume = (high - low).prod();
      throw Error(fmt::format(
          "a grid of spacing {} Å over {:.0f} Å^3 has too many points; use at least {:.2f} Å",
          spacing, volume, std::ceil(100.0 * std::cbrt(volume / most_points) * 1.02) / 100.0));
    }
    shape.first[a] = static_cast<int>(first);
    shape.size[a] = static_cast<int>(last - first) + 1;
  }
  return shape;
}

// First and one past the last index along an axis whose points lie within reach of a centre.
std::pair<int, int> indices_within(const GridShape& shape, std::size_t axis, double centre,
                                   double reach) {
  const double h = shape.spacing_angstrom;
  const int first = static_cast<int>(std::ceil((centre - reach) / h)) - shape.first[axis];
  const int last = static_cast<int>(std::floor((centre + reach) / h)) - shape.first[axis];
  return {std::max(0, first), std::min(shape.size[axis], last + 1)};
}

double worst_error(const OrbitalGrid& grid) {
  double worst = 0.0;
  for (const double integral : grid.integrals) worst = std::max(worst, std::abs(integral - 1.0));
  return worst;
}

}  // namespace

OrbitalGrid sample_on(const OrbitalField& field, const GridShape& shape) {
  const auto n = static_cast<std::size_t>(field.count());
  std::vector<double> all(shape.points() * n, 0.0);  // orbitals run fastest
  for (std::size_t c = 0; c < field.centres().size(); ++c) {
    const OrbitalField::Centre& centre = field.centres()[c];
    const Eigen::Vector3d& p = centre.position_angstrom;
    const double reach = centre.reach_angstrom;
    const auto [k0, k1] = indices_within(shape, 2, p.z(), reach);
    for (int k = k0; k < k1; ++k) {
      const double dz = shape.point(0, 0, k).z() - p.z();
      const double disc = std::sqrt(std::max(0.0, reach * reach - dz * dz));
      const auto [j0, j1] = indices_within(shape, 1, p.y(), disc);
      for (int j = j0; j < j1; ++j) {
        const double dy = shape.point(0, j, k).y() - p.y();
        const double half = std::sqrt(std::max(0.0, disc * disc - dy * dy));
        const auto [i0, i1] = indices_within(shape, 0, p.x(), half);
        for (int i = i0; i < i1; ++i) {
          field.add(static_cast<int>(c), shape.point(i, j, k), &all[shape.index(i, j, k) * n]);
        }
      }
    }
  }
  OrbitalGrid grid;
  grid.shape = shape;
  const double volume = std::pow(shape.spacing_angstrom / bohr_in_angstrom, 3);
  for (std::size_t orbital = 0; orbital < n; ++orbital) {
    std::vector<double> values(shape.points());
    double sum = 0.0;
    for (std::size_t p = 0; p < values.size(); ++p) {
      values[p] = all[p * n + orbital];
      sum += values[p] * values[p];
    }
    grid.values.push_back(std::move(values));
    grid.integrals.push_back(sum * volume);
  }
  return grid;
}

std::size_t GridShape::points() const {
  return static_cast<std::size_t>(size[0]) * static_cast<std::size_t>(size[1]) *
         static_cast<std::size_t>(size[2]);
}

Eigen::Vector3d GridShape::point(int i, int j, int k) const {
  return spacing_angstrom * Eigen::Vector3d(first[0] + i, first[1] + j, first[2] + k);
}

std::size_t GridShape::index(int i, int j, int k) const {
  return (static_cast<std::size_t>(k) * static_cast<std::size_t>(size[1]) +
          static_cast<std::size_t>(j)) *
             static_cast<std::size_t>(size[0]) +
         static_cast<std::size_t>(i);
}

OrbitalGrid sample(const OrbitalField& field, std::optional<double> spacing_angstrom,
                   const GridQuality& quality) {
  if (spacing_angstrom && !(*spacing_angstrom >= 0.02 && *spacing_angstrom <= 1.0)) {
    throw Error(
        fmt::format("spacing of the grid: found {}, expected 0.02 to 1 Å", *spacing_angstrom));
  }
  double spacing = spacing_angstrom.value_or(usual_spacing(field, quality));
  OrbitalGrid grid = sample_on(field, shape_around(field, spacing));
  if (!spacing_angstrom) {
    for (int i = 0; i < finer_tries && worst_error(grid) > quality.wanted_error; ++i) {
      spacing *= finer;
      grid = sample_on(field, shape_around(field, spacing));
    }
  }
  if (worst_error(grid) > std::max(refused_error, quality.wanted_error)) {
    throw Error(fmt::format(
        "the density on a grid of spacing {:.3g} Å is off by {:.1f} %; use a finer grid", spacing,
        100.0 * worst_error(grid)));
  }
  return grid;
}

GridShape with_spacing(const GridShape& shape, double spacing_angstrom) {
  GridShape out;
  out.spacing_angstrom = spacing_angstrom;
  const double ratio = shape.spacing_angstrom / spacing_angstrom;
  for (std::size_t axis = 0; axis < 3; ++axis) {
    const int last = shape.first[axis] + shape.size[axis] - 1;
    out.first[axis] = static_cast<int>(std::floor(shape.first[axis] * ratio));
    out.size[axis] = static_cast<int>(std::ceil(last * ratio)) - out.first[axis] + 1;
  }
  return out;
}

namespace {

// The value at which the densities, each of one small volume, add up to the wanted part.
double value_at_share(std::vector<double>& densities, double volume, double wanted) {
  std::sort(densities.begin(), densities.end(), std::greater<>());
  double sum = 0.0;
  for (const double density : densities) {
    sum += density * volume;
    if (sum >= wanted) return std::sqrt(density);
  }
  return std::sqrt(densities.back());
}

// Lower corners of the cells of the grid in which |psi| may exceed a value.
std::vector<std::array<int, 3>> cells_above(const OrbitalGrid& grid, std::size_t orbital,
                                            double value) {
  const GridShape& shape = grid.shape;
  const std::vector<double>& values = grid.values[orbital];
  std::vector<std::array<int, 3>> cells;
  for (int k = 0; k + 1 < shape.size[2]; ++k) {
    for (int j = 0; j + 1 < shape.size[1]; ++j) {
      for (int i = 0; i + 1 < shape.size[0]; ++i) {
        double largest = 0.0;
        for (int corner = 0; corner < 8; ++corner) {
          const std::size_t p =
              shape.index(i + (corner & 1), j + (corner >> 1 & 1), k + (corner >> 2));
          largest = std::max(largest, std::abs(values[p]));
        }
        if (largest > value) cells.push_back({i, j, k});
      }
    }
  }
  return cells;
}

// At the middles of `parts`^3 equal parts of each cell.
std::vector<double> densities_within(const OrbitalField& field, const GridShape& shape,
                                     const std::vector<std::array<int, 3>>& cells, int orbital,
                                     int parts) {
  std::vector<double> densities;
  const double step = shape.spacing_angstrom / parts;
  for (const auto& [i, j, k] : cells) {
    const Eigen::Vector3d corner = shape.point(i, j, k);
    for (int part = 0; part < parts * parts * parts; ++part) {
      const Eigen::Vector3d inside(part % parts + 0.5, part / parts % parts + 0.5,
                                   part / (parts * parts) + 0.5);
      const double value = field.value(corner + step * inside, orbital);
      densities.push_back(value * value);
    }
  }
  return densities;
}

}  // namespace

void check_share(double share) {
  if (!(share > 0.0 && share < 1.0)) {
    throw Error(
        fmt::format("share of the density: found {}, expected more than 0 and less than 1", share));
  }
}

double enclosing_isovalue(const OrbitalField& field, const OrbitalGrid& grid, int orbital,
                          double share, const GridQuality& quality) {
  check_share(share);
  constexpr int most_parts = 8;
  constexpr double near = 0.6;  // cells with less than this part of the value lie outside
  const auto o = static_cast<std::size_t>(orbital);
  const double volume = std::pow(grid.shape.spacing_angstrom / bohr_in_angstrom, 3);
  std::vector<double> densities;
  densities.reserve(grid.values[o].size());
  for (const double value : grid.values[o]) {
    if (value * value * volume > 1e-12) densities.push_back(value * value);
  }
  const double rough = value_at_share(densities, volume, share * grid.integrals[o]);
  const std::vector<std::array<int, 3>> cells = cells_above(grid, o, near * rough);
  const double wanted_parts = std::cbrt(quality.points_inside / static_cast<double>(cells.size()));
  const int parts = std::clamp(static_cast<int>(std::ceil(wanted_parts)), 1, most_parts);
  if (parts == 1) return rough;
  densities = densities_within(field, grid.shape, cells, orbital, parts);
  return value_at_share(densities, volume / (parts * parts * parts), share);
}

}  // namespace irrepwise
