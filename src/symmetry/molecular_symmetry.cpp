#include "symmetry/molecular_symmetry.hpp"

#include <algorithm>
#include <cmath>
#include <optional>
#include <utility>

#include <fmt/format.h>
#include <Eigen/Geometry>

#include "core/error_about.hpp"
#include "symmetry/approached_groups.hpp"
#include "symmetry/axis_words.hpp"
#include "symmetry/frames.hpp"
#include "symmetry/held_operations.hpp"
#include "symmetry/ladder.hpp"
#include "symmetry/placed_group.hpp"
#include "symmetry/subgroups.hpp"

namespace irrepwise {
namespace {

// Rotations that are exact up to rounding become exact, so that a molecule given in standard axes
// is not turned at all.
Eigen::Matrix3d without_rounding(const Eigen::Matrix3d& rotation) {
  const Eigen::Matrix3d rounded = rotation.array().round().matrix();
  return (rotation - rounded).cwiseAbs().maxCoeff() < 1e-10 ? rounded : rotation;
}

PlacedGroup linear(const Molecule& molecule, const std::vector<int>& kinds,
                   const Eigen::Matrix3Xd& positions, double tolerance,
                   bool may_have_centre = true) {
  const Eigen::Matrix3d rotation =
      Eigen::Quaterniond::FromTwoVectors(best_line(molecule), Eigen::Vector3d::UnitZ())
          .toRotationMatrix();
  Eigen::Matrix3Xd on_axis = rotation * positions;
  on_axis.topRows<2>().setZero();
  const std::vector<int> reversed =
      nearest_images(molecule, kinds, on_axis, -Eigen::Matrix3d::Identity());
  bool centred = may_have_centre;
  for (int i = 0; i < molecule.size(); ++i) {
    centred = centred && reversed[reversed[i]] == i &&
              std::abs(on_axis(2, i) + on_axis(2, reversed[i])) <= tolerance;
  }
  if (centred) {
    const Eigen::Matrix3Xd before = on_axis;
    for (int i = 0; i < molecule.size(); ++i) {
      on_axis(2, i) = 0.5 * (before(2, i) - before(2, reversed[i]));
    }
  }
  PlacedGroup found{
      PointGroup({centred ? Family::Dinfh : Family::Cinfv, 1}), rotation, on_axis, {}};
  std::vector<int> same(static_cast<std::size_t>(molecule.size()));
  for (int i = 0; i < molecule.size(); ++i) same[i] = i;
  for (const Eigen::Matrix3d& g : found.group.operations()) {
    found.images.push_back(g(2, 2) > 0 ? same : reversed);
  }
  return found;
}

PlacedGroup single_atom() {
  return {PointGroup({Family::Kh, 1}),
          Eigen::Matrix3d::Identity(),
          Eigen::Matrix3Xd::Zero(3, 1),
          {{0}, {0}}};
}

// The largest closed subset; among equals the one whose operations hold best.
Subset largest_group(const PartialTable& table, const std::vector<HeldOperation>& operations) {
  Subset all;
  for (int g = 0; g < table.size; ++g) all.push_back(g);
  if (table.is_closed()) return all;
  Subset best = {0};
  double best_displacement = 0.0;
  for (const Subset& subset : closed_subsets(table)) {
    double displacement = 0.0;
    for (int g : subset) displacement = std::max(displacement, operations[g].displacement);
    if (subset.size() > best.size() ||
        (subset.size() == best.size() && displacement < best_displacement)) {
      best = subset;
      best_displacement = displacement;
    }
  }
  return best;
}

PlacedGroup general(const Molecule& molecule, const std::vector<int>& kinds,
                    const Eigen::Matrix3Xd& positions, double tolerance) {
  const std::vector<HeldOperation> held = find_held_operations(molecule, kinds, tolerance);
  OperationList list;
  list.table = {static_cast<int>(held.size()), partial_products(molecule, held)};
  for (const HeldOperation& operation : held) {
    list.matrices.push_back(operation.matrix);
    list.images.push_back(operation.images);
  }
  return made_exact(list, largest_group(list.table, held), positions);
}

ErrorAbout nowhere_near(const Schoenflies& symbol, const Molecule& molecule,
                        const SymmetryOptions& options) {
  return ErrorAbout("group", fmt::format("the structure is nowhere near {}: no set of operations "
                                         "of that group comes within {} Å; it "
                                         "approaches {}",
                                         symbol.name(), options.limit_angstrom,
                                         ladder_words(symmetry_ladder(molecule, options))));
}

// A linear group that the structure approaches; raises the tolerance to where it holds.
PlacedGroup near_linear(const Molecule& molecule, const SymmetryOptions& options,
                        const Eigen::Matrix3Xd& positions, const Schoenflies& symbol,
                        double& tolerance) {
  const LinearTolerances needed = linear_tolerances(molecule, options.kinds);
  const double reach = symbol.family == Family::Dinfh
                           ? std::max(needed.line_angstrom, needed.centre_angstrom)
                           : needed.line_angstrom;
  if (symbol.family == Family::Kh || reach > options.limit_angstrom) {
    throw nowhere_near(symbol, molecule, options);
  }
  tolerance = std::max(tolerance, reach * (1.0 + 1e-9));
  return linear(molecule, options.kinds, positions, tolerance, symbol.family == Family::Dinfh);
}

struct InGroup {
  PlacedGroup found;
  std::string largest;  // the largest group at the tolerance used
};

// The structure made exact in a group that it approaches, with a raised tolerance where need be.
// Of several sets of operations that form the group, those that hold at the tolerance asked for
// count alike; where none does, the one that holds first.
InGroup near_group(const Molecule& molecule, const SymmetryOptions& options,
                   const Eigen::Matrix3Xd& positions, const Schoenflies& symbol,
                   const WantedAxes& wanted, double& tolerance) {
  const ApproachedGroups approached =
      approached_groups(molecule, options.kinds, std::max(tolerance, options.limit_angstrom));
  OperationList list{approached.table, {}, {}};
  for (const HeldOperation& operation : approached.operations) {
    list.matrices.push_back(operation.matrix);
    list.images.push_back(operation.images);
  }
  const std::size_t order = PointGroup(symbol).operations().size();
  std::vector<Subset> candidates;
  for (const ApproachedGroup& group : approached.groups) {
    const bool holds = group.tolerance_angstrom <= tolerance;
    if (!candidates.empty() && !holds) break;
    if (group.operations.size() != order || !(symbol_of(approached, group) == symbol)) continue;
    candidates.push_back(group.operations);
    tolerance = std::max(tolerance, group.tolerance_angstrom * (1.0 + 1e-6) + 1e-9);
  }
  if (candidates.empty()) throw nowhere_near(symbol, molecule, options);

  const ApproachedGroup* largest = &approached.groups.front();
  for (const ApproachedGroup& group : approached.groups) {
    const bool holds = group.tolerance_angstrom <= tolerance;
    if (holds && group.operations.size() > largest->operations.size()) largest = &group;
  }
  PlacedGroup whole = made_exact(list, largest->operations, positions);
  turn_to_conventions(whole, molecule, {});
  auto found =
      best_placed(list, candidates, symbol, whole.rotation.row(2), molecule, positions, wanted);
  return {std::move(*found), whole.group.symbol().name()};
}

// From the centroid to the centroid of the atoms that every operation keeps in place, if any.
Eigen::Vector3d fixed_centre(const PlacedGroup& found) {
  Eigen::Vector3d sum = Eigen::Vector3d::Zero();
  int fixed = 0;
  for (Eigen::Index i = 0; i < found.positions.cols(); ++i) {
    const auto atom = static_cast<std::size_t>(i);
    const bool stays = std::all_of(found.images.begin(), found.images.end(),
                                   [&](const auto& image) { return image[atom] == i; });
    if (!stays) continue;
    sum += found.positions.col(i);
    ++fixed;
  }
  return fixed == 0 ? sum : Eigen::Vector3d(sum / fixed);
}

}  // namespace

MolecularSymmetry find_symmetry(const Molecule& molecule, const SymmetryOptions& options) {
  double tolerance = options.tolerance_angstrom;
  if (!(tolerance > 0.0 && tolerance <= 1.0)) {
    throw Error(
        fmt::format("symmetry tolerance = {} Å, expected more than 0 and at most 1", tolerance));
  }
  const Eigen::Matrix3Xd input = molecule.positions();
  const Eigen::Vector3d centroid = input.rowwise().mean();
  const Eigen::Matrix3Xd centred = input.colwise() - centroid;
  const WantedAxes wanted = wanted_axes(options, molecule, centroid);

  const Shape shape = molecular_shape(molecule, tolerance);
  std::string full_group;
  PlacedGroup found = [&] {
    if (options.group) {
      const Schoenflies symbol = about("group", [&] { return parse_schoenflies(*options.group); });
      if (!symbol.is_finite() && shape != Shape::SingleAtom) {
        return near_linear(molecule, options, centred, symbol, tolerance);
      }
      if (shape == Shape::General) {
        InGroup in = near_group(molecule, options, centred, symbol,
                                options.subgroup ? WantedAxes{} : wanted, tolerance);
        if (in.largest != symbol.name()) full_group = in.largest;
        return std::move(in.found);
      }
    }
    switch (shape) {
      case Shape::SingleAtom:
        return single_atom();
      case Shape::Linear:
        return linear(molecule, options.kinds, centred, tolerance);
      case Shape::General:
        break;
    }
    return general(molecule, options.kinds, centred, tolerance);
  }();
  // A finite group of a linear molecule or an atom is a subgroup of what it has.
  const bool is_group_of_linear =
      options.group && !(found.group.symbol() == parse_schoenflies(*options.group));
  const std::optional<std::string> subgroup = options.subgroup     ? options.subgroup
                                              : is_group_of_linear ? options.group
                                                                   : std::nullopt;
  if (subgroup) {
    full_group = found.group.symbol().name();
    turn_to_conventions(found, molecule, {});
    found = about(options.subgroup ? "subgroup" : "group", [&] {
      return inside_subgroup(found, molecule, options.kinds, *subgroup, wanted);
    });
  } else {
    turn_to_conventions(found, molecule, wanted);
  }

  found.rotation = without_rounding(found.rotation);
  const Eigen::Vector3d shift = fixed_centre(found);
  const Eigen::Matrix3Xd moves = found.rotation * centred - found.positions;
  found.positions.colwise() -= shift;

  Molecule exact = molecule.with_positions(found.positions);
  std::vector<std::string> axes = axis_words(found.group, exact);
  return {std::move(found.group),
          std::move(exact),
          found.rotation,
          centroid + found.rotation.transpose() * shift,
          tolerance,
          moves.colwise().norm().maxCoeff(),
          std::sqrt(moves.colwise().squaredNorm().mean()),
          std::move(found.images),
          std::move(axes),
          std::move(full_group)};
}

}  // namespace irrepwise
