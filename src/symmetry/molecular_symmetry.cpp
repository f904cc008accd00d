#include "symmetry/molecular_symmetry.hpp"

#include <algorithm>
#include <cmath>
#include <optional>
#include <utility>

#include <Eigen/Geometry>
#include <fmt/format.h>

#include "core/error.hpp"
#include "core/text.hpp"
#include "symmetry/approached_groups.hpp"
#include "symmetry/axis_words.hpp"
#include "symmetry/frames.hpp"
#include "symmetry/held_operations.hpp"
#include "symmetry/identify.hpp"
#include "symmetry/ladder.hpp"
#include "symmetry/product_table.hpp"
#include "symmetry/subgroups.hpp"
#include "symmetry/symmetrise.hpp"

namespace irrepwise {
namespace {

// A group in its standard frame and the exactly symmetric molecule there.
struct Found {
  PointGroup group;
  Eigen::Matrix3d rotation;    // from the input frame, about the centroid
  Eigen::Matrix3Xd positions;  // Å, standard frame, centroid at the origin
  std::vector<std::vector<int>> images;
};

// Rotations that are exact up to rounding become exact, so that a molecule given in standard axes
// is not turned at all.
Eigen::Matrix3d without_rounding(const Eigen::Matrix3d& rotation) {
  const Eigen::Matrix3d rounded = rotation.array().round().matrix();
  return (rotation - rounded).cwiseAbs().maxCoeff() < 1e-10 ? rounded : rotation;
}

std::vector<int> nearest_images(const Molecule& molecule, const std::vector<int>& kinds,
                                const Eigen::Matrix3Xd& positions,
                                const Eigen::Matrix3d& operation) {
  std::vector<int> images;
  for (int i = 0; i < molecule.size(); ++i) {
    const Eigen::Vector3d target = operation * positions.col(i);
    int nearest = -1;
    for (int j = 0; j < molecule.size(); ++j) {
      if (!are_alike(molecule, kinds, i, j)) continue;
      if (nearest < 0 || (positions.col(j) - target).squaredNorm() <
                             (positions.col(nearest) - target).squaredNorm()) {
        nearest = j;
      }
    }
    images.push_back(nearest);
  }
  return images;
}

// Images under the group's operations after its frame has been turned by `turn`: the operation g
// of the new frame is turn^T g turn in the old one.
std::vector<std::vector<int>> turned_images(const PointGroup& group,
                                            const std::vector<std::vector<int>>& images,
                                            const Eigen::Matrix3d& turn) {
  const OperationIndex index(group.operations());
  std::vector<std::vector<int>> turned;
  for (const Eigen::Matrix3d& operation : group.operations()) {
    turned.push_back(images[index.find(turn.transpose() * operation * turn)]);
  }
  return turned;
}

void turn_to_conventions(Found& found, const Molecule& molecule, const WantedAxes& wanted) {
  const FrameChoice choice =
      choose_frame(found.group.symbol(), molecule.with_positions(found.positions), found.rotation,
                   wanted);
  const Eigen::Matrix3d turn = choice.rotation * found.rotation.transpose();
  // A linear molecule may turn about its axis by any angle, and its images do not depend on it.
  if (found.group.symbol().is_finite()) {
    found.images = turned_images(found.group, found.images, turn);
  }
  found.positions = turn * found.positions;
  found.rotation = choice.rotation;
}

Found linear(const Molecule& molecule, const std::vector<int>& kinds,
             const Eigen::Matrix3Xd& positions, double tolerance, bool may_have_centre = true) {
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
  Found found{PointGroup({centred ? Family::Dinfh : Family::Cinfv, 1}), rotation, on_axis, {}};
  std::vector<int> same(static_cast<std::size_t>(molecule.size()));
  for (int i = 0; i < molecule.size(); ++i) same[i] = i;
  for (const Eigen::Matrix3d& g : found.group.operations()) {
    found.images.push_back(g(2, 2) > 0 ? same : reversed);
  }
  return found;
}

Found single_atom() {
  return {PointGroup({Family::Kh, 1}), Eigen::Matrix3d::Identity(), Eigen::Matrix3Xd::Zero(3, 1),
          {{0}, {0}}};
}

// Operations of one group by matrix and by what they do to the atoms, about the centroid.
struct OperationList {
  PartialTable table;
  std::vector<Eigen::Matrix3d> matrices;
  std::vector<std::vector<int>> images;
};

Found made_exact(const OperationList& list, const Subset& subset,
                 const Eigen::Matrix3Xd& positions) {
  const Schoenflies symbol = identify_group(list.table, list.matrices, subset);
  const Eigen::Matrix3d frame = some_standard_frame(symbol, list.table, list.matrices, subset);
  std::vector<Eigen::Matrix3d> held;
  std::vector<std::vector<int>> held_images;
  for (int g : subset) {
    held.push_back(list.matrices[g]);
    held_images.push_back(list.images[g]);
  }
  PointGroup group(symbol);
  SymmetrisedPositions exact = symmetrise(group, positions, frame, held, held_images);
  return {std::move(group), exact.rotation, std::move(exact.positions), std::move(exact.images)};
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

Found general(const Molecule& molecule, const std::vector<int>& kinds,
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

// A finite subgroup of the group of a single atom or a linear molecule, laid with its z along the
// molecular axis or else across it.
std::optional<Found> finite_part(const Found& whole, const Molecule& molecule,
                                 const std::vector<int>& kinds, const Schoenflies& wanted) {
  PointGroup group(wanted);
  Eigen::Matrix3d cyclic;
  cyclic << 0, 0, 1, 1, 0, 0, 0, 1, 0;  // z -> x -> y -> z
  Eigen::Matrix3d turn = Eigen::Matrix3d::Identity();
  for (int lay = 0; lay < 3; ++lay, turn = cyclic * turn) {
    const Eigen::Matrix3Xd positions = turn * whole.positions;
    std::vector<std::vector<int>> images;
    bool holds = true;
    for (const Eigen::Matrix3d& g : group.operations()) {
      images.push_back(nearest_images(molecule, kinds, positions, g));
      for (int i = 0; i < molecule.size() && holds; ++i) {
        holds = (g * positions.col(i) - positions.col(images.back()[i])).norm() < 1e-6;
      }
    }
    if (holds) return Found{std::move(group), turn * whole.rotation, positions, std::move(images)};
  }
  return std::nullopt;
}

std::string subgroup_names(const PartialTable& table, const std::vector<Eigen::Matrix3d>& matrices,
                           const std::vector<Subset>& subsets) {
  std::vector<std::string> names;
  for (const Subset& subset : subsets) {
    const std::string name = identify_group(table, matrices, subset).name();
    if (std::find(names.begin(), names.end(), name) == names.end()) names.push_back(name);
  }
  return joined(names);
}

// Of the subsets that are groups with the symbol, the one whose z lies nearest to a given line; then
// by the conventions' rules for axes; then the one turned least. Nothing where no subset has the
// symbol.
std::optional<Found> best_placed(const OperationList& list, const std::vector<Subset>& subsets,
                                 const Schoenflies& symbol, const Eigen::Vector3d& line,
                                 const Molecule& molecule, const Eigen::Matrix3Xd& positions,
                                 const WantedAxes& wanted) {
  std::optional<Found> best;
  std::vector<double> best_merit;
  std::optional<Error> last_error;
  for (const Subset& subset : subsets) {
    if (!(identify_group(list.table, list.matrices, subset) == symbol)) continue;
    Found found = made_exact(list, subset, positions);
    FrameChoice choice;
    try {
      choice = choose_frame(symbol, molecule.with_positions(found.positions), found.rotation, wanted);
    } catch (const Error& error) {  // the wished axes may suit another subset of this symbol
      last_error = error;
      continue;
    }
    std::vector<double> merit = {std::round(std::abs(choice.rotation.row(2).dot(line)) * 1e6)};
    merit.insert(merit.end(), choice.merit.begin(), choice.merit.end());
    const bool better =
        !best || better_merit(merit, best_merit) ||
        (!better_merit(best_merit, merit) &&
         choice.rotation.trace() > best->rotation.trace() + 1e-9);
    if (!better) continue;
    const Eigen::Matrix3d turn = choice.rotation * found.rotation.transpose();
    found.images = turned_images(found.group, found.images, turn);
    found.positions = turn * found.positions;
    found.rotation = choice.rotation;
    best = std::move(found);
    best_merit = std::move(merit);
  }
  if (!best && last_error) throw *last_error;
  return best;
}

// Of all subgroups with the wanted symbol, the one whose z stays the whole group's z where it can;
// then by the conventions' rules for axes; then the one turned least.
Found inside_subgroup(const Found& whole, const Molecule& molecule,
                      const std::vector<int>& kinds, const std::string& text,
                      const WantedAxes& wanted) {
  const Schoenflies symbol = parse_schoenflies(text);
  const auto refuse = [&](const std::string& hint) {
    return Error(fmt::format("{} is no subgroup of {}, the group of this molecule; {}",
                             symbol.name(), whole.group.symbol().name(), hint));
  };
  if (!whole.group.symbol().is_finite()) {
    if (!symbol.is_finite()) {
      if (symbol == whole.group.symbol()) return whole;
      throw refuse("choose a finite group");
    }
    auto found = finite_part(whole, molecule, kinds, symbol);
    if (!found) throw refuse("a linear molecule allows Cn and Cnv, with a centre also Cnh, Dn, Dnh, "
                             "Dnd and S2n");
    turn_to_conventions(*found, molecule, wanted);
    return *found;
  }

  OperationList list{{whole.group.order(), {}}, {}, whole.images};
  for (const Eigen::Matrix3d& g : whole.group.operations()) {
    list.matrices.push_back(whole.rotation.transpose() * g * whole.rotation);
  }
  for (int g = 0; g < whole.group.order(); ++g) {
    for (int h = 0; h < whole.group.order(); ++h) {
      list.table.products.push_back(whole.group.product(g, h));
    }
  }
  const Eigen::Matrix3Xd in_input_frame = whole.rotation.transpose() * whole.positions;
  const std::vector<Subset> subsets = closed_subsets(list.table);
  auto best = best_placed(list, subsets, symbol, whole.rotation.row(2), molecule, in_input_frame,
                          wanted);
  if (!best) {
    throw refuse("its subgroups are " + subgroup_names(list.table, list.matrices, subsets));
  }
  return *best;
}

Error nowhere_near(const Schoenflies& symbol, const Molecule& molecule,
                   const SymmetryOptions& options) {
  return Error(fmt::format(
      "the structure is nowhere near {}: no set of operations of that group comes within {} Å; it "
      "approaches {}",
      symbol.name(), options.limit_angstrom, ladder_words(symmetry_ladder(molecule, options))));
}

// A linear group that the structure approaches; raises the tolerance to where it holds.
Found near_linear(const Molecule& molecule, const SymmetryOptions& options,
                  const Eigen::Matrix3Xd& positions, const Schoenflies& symbol, double& tolerance) {
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
  Found found;
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
  Found whole = made_exact(list, largest->operations, positions);
  turn_to_conventions(whole, molecule, {});
  auto found = best_placed(list, candidates, symbol, whole.rotation.row(2), molecule, positions,
                           wanted);
  return {std::move(*found), whole.group.symbol().name()};
}

// From the centroid to the centroid of the atoms that every operation keeps in place, if any.
Eigen::Vector3d fixed_centre(const Found& found) {
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
    throw Error(fmt::format("symmetry tolerance = {} Å, expected more than 0 and at most 1", tolerance));
  }
  const Eigen::Matrix3Xd input = molecule.positions();
  const Eigen::Vector3d centroid = input.rowwise().mean();
  const Eigen::Matrix3Xd centred = input.colwise() - centroid;
  const WantedAxes wanted = wanted_axes(options, molecule, centroid);

  const Shape shape = molecular_shape(molecule, tolerance);
  std::string full_group;
  Found found = [&] {
    if (options.group) {
      const Schoenflies symbol = parse_schoenflies(*options.group);
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
      case Shape::SingleAtom: return single_atom();
      case Shape::Linear: return linear(molecule, options.kinds, centred, tolerance);
      case Shape::General: break;
    }
    return general(molecule, options.kinds, centred, tolerance);
  }();
  // A finite group of a linear molecule or an atom is a subgroup of what it has.
  const bool is_group_of_linear = options.group && !(found.group.symbol() == parse_schoenflies(*options.group));
  const std::optional<std::string> subgroup =
      options.subgroup ? options.subgroup : is_group_of_linear ? options.group : std::nullopt;
  if (subgroup) {
    full_group = found.group.symbol().name();
    turn_to_conventions(found, molecule, {});
    found = inside_subgroup(found, molecule, options.kinds, *subgroup, wanted);
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
