#include "symmetry/approached_groups.hpp"

#include <algorithm>

#include "symmetry/identify.hpp"

namespace irrepwise {

ApproachedGroups approached_groups(const Molecule& molecule, const std::vector<int>& kinds,
                                   double limit_angstrom) {
  ApproachedGroups approached;
  approached.operations = find_held_operations(molecule, kinds, limit_angstrom);
  approached.table = {static_cast<int>(approached.operations.size()),
                      partial_products(molecule, approached.operations)};
  for (Subset& subset : closed_subsets(approached.table)) {
    double displacement = 0.0;
    for (const int g : subset) {
      displacement = std::max(displacement, approached.operations[g].displacement);
    }
    approached.groups.push_back({std::move(subset), displacement});
  }
  std::stable_sort(approached.groups.begin(), approached.groups.end(),
                   [](const ApproachedGroup& a, const ApproachedGroup& b) {
                     return a.tolerance_angstrom != b.tolerance_angstrom
                                ? a.tolerance_angstrom < b.tolerance_angstrom
                                : a.operations.size() > b.operations.size();
                   });
  return approached;
}

Schoenflies symbol_of(const ApproachedGroups& approached, const ApproachedGroup& group) {
  std::vector<Eigen::Matrix3d> matrices;
  matrices.reserve(approached.operations.size());
  for (const HeldOperation& operation : approached.operations) {
    matrices.push_back(operation.matrix);
  }
  return identify_group(approached.table, matrices, group.operations);
}

}  // namespace irrepwise
