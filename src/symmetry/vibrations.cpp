#include "symmetry/vibrations.hpp"

#include <cmath>
#include <vector>

#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

using Characters = std::vector<double>;

// Reduces characters given by operation. All of them have |m| <= 1 for linear molecules, so the
// group's own nodes are a sufficient quadrature there.
Reduction reduce_by_operation(const PointGroup& group, const Characters& characters) {
  Reduction reduction;
  for (const Irrep& irrep : group.irreps()) {
    double sum = 0.0;
    for (int g = 0; g < group.order(); ++g) sum += irrep.characters[g] * characters[g];
    const double norm = group.order() * (irrep.complex_pair ? 2.0 : 1.0);
    const int count = static_cast<int>(std::lround(sum / norm));
    if (count > 0) reduction.push_back({irrep.label, irrep.dimension, count});
  }
  return reduction;
}

Reduction without(Reduction reduction, const Reduction& part) {
  for (IrrepCount& irrep : reduction) irrep.count -= count_of(part, irrep.label);
  std::erase_if(reduction, [](const IrrepCount& irrep) { return irrep.count == 0; });
  return reduction;
}

}  // namespace

DisplacementIrreps displacement_irreps(const MolecularSymmetry& symmetry) {
  const PointGroup& group = symmetry.group;
  if (group.symbol().family == Family::Kh) {
    const Reduction p = {{"Pu", 3, 1}};
    return {p, p, {}, {}};
  }
  const bool linear = !group.symbol().is_finite();
  Characters displacements, translations, rotations;
  for (int g = 0; g < group.order(); ++g) {
    const Eigen::Matrix3d& matrix = group.operations()[g];
    int fixed = 0;
    for (int atom = 0; atom < symmetry.molecule.size(); ++atom) {
      if (symmetry.images[g][atom] == atom) ++fixed;
    }
    const int sign = determinant_sign(matrix);
    translations.push_back(matrix.trace());
    displacements.push_back(fixed * matrix.trace());
    // The rotation about the axis of a linear molecule moves nothing.
    rotations.push_back(sign * (matrix.trace() - (linear ? matrix(2, 2) : 0.0)));
  }
  DisplacementIrreps irreps;
  irreps.displacements = reduce_by_operation(group, displacements);
  irreps.translations = reduce_by_operation(group, translations);
  irreps.rotations = reduce_by_operation(group, rotations);
  irreps.vibrations = without(without(irreps.displacements, irreps.translations), irreps.rotations);
  return irreps;
}

}  // namespace irrepwise
