// What becomes of the irreps when symmetry is lowered to a subgroup.
#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

#include <Eigen/Core>

#include "symmetry/point_group.hpp"
#include "symmetry/subgroups.hpp"

namespace irrepwise {

/// One way to find a subgroup inside a group, up to conjugation.
///
/// Names say which elements of the group, by its own class symbols, the subgroup keeps, where there
/// is more than one way: its principal axis if the ways differ in it, then the perpendicular C2
/// axes, then the mirrors, only as many as tell the ways apart: "C2v(C2')", "D2h(C2'')",
/// "C2v(C2,sigmad)", "Cs(sigmah)". In D2 and D2h the letters of the axis or plane do: "C2v(z)",
/// "Cs(xy)". Linear molecules: "Cinf" is the molecular axis, "C2" one across it.
struct Embedding {
  std::string name;  // ASCII
  PointGroup subgroup;
  std::vector<int> operations;  // [operation of the subgroup]: index in the group; empty for
                                // infinite groups
  Eigen::Matrix3d rotation;     // r_subgroup = rotation r_group, both frames standard
};

/// All non-equivalent ways. Of the conjugate subgroups and their standard frames the one is taken
/// whose z, and then whose x and y, lie nearest to the group's (largest trace); a molecule may
/// choose another by its atoms.
///
/// @returns  empty where it is no subgroup
[[nodiscard]] std::vector<Embedding> embeddings(const PointGroup& group,
                                                const Schoenflies& subgroup);

/// @param text    a symbol, where there is only one way, or the name of an embedding; any case,
///                " for ''
/// @throws Error  for an unknown symbol, no subgroup, or several ways (named)
[[nodiscard]] Embedding find_embedding(const PointGroup& group, std::string_view text);

/// @returns  [irrep of the group][irrep of the subgroup]: how often
[[nodiscard]] std::vector<std::vector<int>> correlate(const PointGroup& group,
                                                      const Embedding& embedding);

/// Character of an irrep of an infinite group under any operation that the group has.
[[nodiscard]] double continuous_character(const PointGroup& group, std::size_t irrep,
                                          const Eigen::Matrix3d& operation);

/// The subgroups conjugate to the embedding, as sets of operations of a finite group.
[[nodiscard]] std::vector<Subset> conjugates(const PointGroup& group, const Embedding& embedding);

/// @returns  symbols of all subgroups of a finite group, by falling order, the group itself left
/// out
[[nodiscard]] std::vector<Schoenflies> subgroup_symbols(const PointGroup& group);

}  // namespace irrepwise
