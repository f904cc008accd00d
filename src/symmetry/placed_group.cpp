#include "symmetry/placed_group.hpp"

#include <algorithm>
#include <cmath>
#include <optional>
#include <utility>

#include <fmt/format.h>

#include "core/error_about.hpp"
#include "core/text.hpp"
#include "symmetry/descent.hpp"
#include "symmetry/held_operations.hpp"
#include "symmetry/identify.hpp"
#include "symmetry/product_table.hpp"
#include "symmetry/symmetrise.hpp"

namespace irrepwise {
namespace {

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

// z along the molecular axis, then across it.
std::vector<Eigen::Matrix3d> lays() {
  Eigen::Matrix3d cyclic;
  cyclic << 0, 0, 1, 1, 0, 0, 0, 1, 0;  // z -> x -> y -> z
  return {Eigen::Matrix3d::Identity(), cyclic, cyclic * cyclic};
}

// A finite subgroup of the group of a single atom or a linear molecule, laid in the first of the
// turned frames in which it holds.
std::optional<PlacedGroup> finite_part(const PlacedGroup& whole, const Molecule& molecule,
                                       const std::vector<int>& kinds, const Schoenflies& wanted,
                                       const std::vector<Eigen::Matrix3d>& turns) {
  PointGroup group(wanted);
  for (const Eigen::Matrix3d& turn : turns) {
    const Eigen::Matrix3Xd positions = turn * whole.positions;
    std::vector<std::vector<int>> images;
    bool holds = true;
    for (const Eigen::Matrix3d& g : group.operations()) {
      images.push_back(nearest_images(molecule, kinds, positions, g));
      for (int i = 0; i < molecule.size() && holds; ++i) {
        holds = (g * positions.col(i) - positions.col(images.back()[i])).norm() < 1e-6;
      }
    }
    if (holds) {
      return PlacedGroup{std::move(group), turn * whole.rotation, positions, std::move(images)};
    }
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

}  // namespace

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

PlacedGroup made_exact(const OperationList& list, const Subset& subset,
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

void turn_to_conventions(PlacedGroup& found, const Molecule& molecule, const WantedAxes& wanted) {
  const FrameChoice choice = choose_frame(
      found.group.symbol(), molecule.with_positions(found.positions), found.rotation, wanted);
  const Eigen::Matrix3d turn = choice.rotation * found.rotation.transpose();
  // A linear molecule may turn about its axis by any angle, and its images do not depend on it.
  if (found.group.symbol().is_finite()) {
    found.images = turned_images(found.group, found.images, turn);
  }
  found.positions = turn * found.positions;
  found.rotation = choice.rotation;
}

std::optional<PlacedGroup> best_placed(const OperationList& list,
                                       const std::vector<Subset>& subsets,
                                       const Schoenflies& symbol, const Eigen::Vector3d& line,
                                       const Molecule& molecule, const Eigen::Matrix3Xd& positions,
                                       const WantedAxes& wanted) {
  std::optional<PlacedGroup> best;
  std::vector<double> best_merit;
  std::optional<ErrorAbout> last_error;
  for (const Subset& subset : subsets) {
    if (!(identify_group(list.table, list.matrices, subset) == symbol)) continue;
    PlacedGroup found = made_exact(list, subset, positions);
    FrameChoice choice;
    try {
      choice =
          choose_frame(symbol, molecule.with_positions(found.positions), found.rotation, wanted);
    } catch (const ErrorAbout& error) {  // the wished axes may suit another subset of this symbol
      last_error = error;
      continue;
    }
    std::vector<double> merit = {std::round(std::abs(choice.rotation.row(2).dot(line)) * 1e6)};
    merit.insert(merit.end(), choice.merit.begin(), choice.merit.end());
    const bool better = !best || better_merit(merit, best_merit) ||
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

PlacedGroup inside_subgroup(const PlacedGroup& whole, const Molecule& molecule,
                            const std::vector<int>& kinds, const std::string& text,
                            const WantedAxes& wanted) {
  const bool says_which = text.find('(') != std::string::npos;  // "C2v(C2')", one of several ways
  std::optional<Embedding> way;
  if (says_which) way = find_embedding(whole.group, text);
  const Schoenflies symbol = way ? way->subgroup.symbol() : parse_schoenflies(text);
  const auto refuse = [&](const std::string& hint) {
    return Error(fmt::format("{} is no subgroup of {}, the group of this molecule; {}",
                             symbol.name(), whole.group.symbol().name(), hint));
  };
  if (!whole.group.symbol().is_finite()) {
    if (!symbol.is_finite()) {
      if (symbol == whole.group.symbol()) return whole;
      throw refuse("choose a finite group");
    }
    auto found =
        finite_part(whole, molecule, kinds, symbol, way ? std::vector{way->rotation} : lays());
    if (!found)
      throw refuse(
          "a linear molecule allows Cn and Cnv, with a centre also Cnh, Dn, Dnh, "
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
  const std::vector<Subset> subsets =
      way ? conjugates(whole.group, *way) : closed_subsets(list.table);
  auto best =
      best_placed(list, subsets, symbol, whole.rotation.row(2), molecule, in_input_frame, wanted);
  if (!best) {
    throw refuse("its subgroups are " + subgroup_names(list.table, list.matrices, subsets));
  }
  return *best;
}

}  // namespace irrepwise
