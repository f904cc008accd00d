// A group laid on a molecule: its frame, the exact positions and the images of the atoms.
//
// The steps by which `find_symmetry` finds and places a group.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "molecule/molecule.hpp"
#include "symmetry/frames.hpp"
#include "symmetry/point_group.hpp"
#include "symmetry/subgroups.hpp"

namespace irrepwise {

/// A group in its standard frame and the exactly symmetric molecule there.
struct PlacedGroup {
  PointGroup group;
  Eigen::Matrix3d rotation;    // from the input frame, about the centroid
  Eigen::Matrix3Xd positions;  // Å, standard frame, centroid at the origin
  std::vector<std::vector<int>> images;
};

/// Operations of one group by matrix and by what they do to the atoms, about the centroid.
struct OperationList {
  PartialTable table;
  std::vector<Eigen::Matrix3d> matrices;
  std::vector<std::vector<int>> images;
};

/// @returns  the atom of the same sort nearest to the image of each
[[nodiscard]] std::vector<int> nearest_images(const Molecule& molecule,
                                              const std::vector<int>& kinds,
                                              const Eigen::Matrix3Xd& positions,
                                              const Eigen::Matrix3d& operation);

/// The group that a closed subset forms, with positions averaged over it, in some standard frame.
[[nodiscard]] PlacedGroup made_exact(const OperationList& list, const Subset& subset,
                                     const Eigen::Matrix3Xd& positions);

/// Turns the placed group to the frame of the conventions or of the wish.
/// @throws Error  where the wish is no axis that the group can have there
void turn_to_conventions(PlacedGroup& placed, const Molecule& molecule, const WantedAxes& wanted);

/// Of the subsets that are groups with the symbol, the one whose z lies nearest to a given line;
/// then by the conventions' rules for axes; then the one turned least.
/// @returns       nothing where no subset has the symbol
/// @throws Error  where the wished axes suit none
[[nodiscard]] std::optional<PlacedGroup> best_placed(
    const OperationList& list, const std::vector<Subset>& subsets, const Schoenflies& symbol,
    const Eigen::Vector3d& line, const Molecule& molecule, const Eigen::Matrix3Xd& positions,
    const WantedAxes& wanted);

/// Of all subgroups with the wanted symbol, the one whose z stays the whole group's z where it can;
/// then as `best_placed`.
/// @param text    a symbol, or the name of one way to a subgroup as in `Embedding`: "C2v(C2')"
/// @throws Error  where it is no subgroup (names those there are), or the wished axes suit none
[[nodiscard]] PlacedGroup inside_subgroup(const PlacedGroup& whole, const Molecule& molecule,
                                          const std::vector<int>& kinds, const std::string& text,
                                          const WantedAxes& wanted);

}  // namespace irrepwise
