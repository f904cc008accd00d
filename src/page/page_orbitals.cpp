#include "page/page_orbitals.hpp"

#include <algorithm>
#include <cmath>
#include <utility>

#include "figure/isosurface.hpp"
#include "figure/orbital_grid.hpp"
#include "hueckel/levels.hpp"

namespace irrepwise {
namespace {

constexpr double share = 0.5;
constexpr double finest_spacing_angstrom = 0.16;  // of the grid around the whole molecule
constexpr double coarsest_spacing_angstrom = 0.45;
constexpr double few_vertices = 300;  // with fewer, lobes get finer points
constexpr SmallLobes usual_lobes{40, 2};
constexpr SmallLobes finer_lobes{1'000, 2};

struct Phases {
  Mesh positive;
  Mesh negative;

  [[nodiscard]] double vertices() const {
    return static_cast<double>(positive.vertices.size() + negative.vertices.size());
  }
};

Phases phases_on(const OrbitalField& field, const OrbitalGrid& grid, int orbital, double isovalue,
                 const SmallLobes& lobes) {
  return {isosurface(field, grid, orbital, isovalue, lobes),
          isosurface(field, grid, orbital, -isovalue, lobes)};
}

// As the number of vertices goes with the square of the spacing, one more try is enough.
Phases light_phases(const OrbitalField& field, const OrbitalGrid& grid, int orbital,
                    double isovalue, double vertices) {
  Phases phases = phases_on(field, grid, orbital, isovalue, usual_lobes);
  if (phases.vertices() < few_vertices) {
    return phases_on(field, grid, orbital, isovalue, finer_lobes);
  }
  const double spacing = grid.shape.spacing_angstrom;
  const double wanted = std::clamp(spacing * std::sqrt(phases.vertices() / vertices),
                                   finest_spacing_angstrom, coarsest_spacing_angstrom);
  constexpr double as_good = 0.1;  // a change of spacing that nobody would see
  if (std::abs(wanted / spacing - 1.0) < as_good) return phases;
  return phases_on(field, sample_on(field, with_spacing(grid.shape, wanted)), orbital, isovalue,
                   usual_lobes);
}

std::optional<PackedSurface> packed_phase(const Mesh& mesh) {
  if (mesh.vertices.empty()) return {};
  return packed(mesh);
}

}  // namespace

std::vector<PageOrbital> page_orbitals(const LevelsResult& result, int level, double vertices) {
  const OrbitalField field(result.symmetry.molecule, result.basis,
                           level_orbitals(result.symmetry, result.basis, result.levels, level));
  const OrbitalGrid grid = sample(field, {}, light_quality);
  std::vector<PageOrbital> orbitals;
  for (int i = 0; i < field.count(); ++i) {
    PageOrbital orbital;
    orbital.isovalue = enclosing_isovalue(field, grid, i, share, light_quality);
    const Phases phases = light_phases(field, grid, i, orbital.isovalue, vertices);
    orbital.positive = packed_phase(phases.positive);
    orbital.negative = packed_phase(phases.negative);
    orbitals.push_back(std::move(orbital));
  }
  return orbitals;
}

}  // namespace irrepwise
