#include "page/page_orbitals.hpp"

#include "figure/isosurface.hpp"
#include "figure/orbital_grid.hpp"
#include "hueckel/levels.hpp"

namespace irrepwise {
namespace {

constexpr double share = 0.5;
constexpr std::size_t many_vertices = 700;  // of one phase; above it the next coarser grid is used
constexpr double finest_spacing_angstrom = 0.08;
constexpr double coarsest_spacing_angstrom = 0.4;

std::optional<PackedSurface> packed_phase(const OrbitalField& field, const OrbitalGrid& grid,
                                          int orbital, double isovalue) {
  const double spacing = grid.shape.spacing_angstrom;
  int step = 1;
  while (step * spacing < finest_spacing_angstrom) ++step;
  Mesh mesh = isosurface(field, thinned(grid, step), orbital, isovalue);
  while (mesh.vertices.size() > many_vertices && (step + 1) * spacing < coarsest_spacing_angstrom) {
    ++step;
    mesh = isosurface(field, thinned(grid, step), orbital, isovalue);
  }
  if (mesh.vertices.empty()) return {};
  return packed(mesh);
}

}  // namespace

std::vector<PageOrbital> page_orbitals(const LevelsResult& result, int level) {
  const OrbitalField field(result.symmetry.molecule, result.basis,
                           level_orbitals(result.symmetry, result.basis, result.levels, level));
  const OrbitalGrid grid = sample(field, {}, light_quality);
  std::vector<PageOrbital> orbitals;
  for (int i = 0; i < field.count(); ++i) {
    PageOrbital orbital;
    orbital.isovalue = enclosing_isovalue(field, grid, i, share, light_quality);
    orbital.positive = packed_phase(field, grid, i, orbital.isovalue);
    orbital.negative = packed_phase(field, grid, i, -orbital.isovalue);
    orbitals.push_back(std::move(orbital));
  }
  return orbitals;
}

}  // namespace irrepwise
