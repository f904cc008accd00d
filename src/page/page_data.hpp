// What the script of a page reads: molecules, their levels and the surfaces of orbitals, as JSON.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

#include "output/levels_result.hpp"
#include "page/page_orbitals.hpp"

namespace irrepwise {

struct PageLevel {
  int level = 0;                      // index in the levels
  std::vector<PageOrbital> orbitals;  // per partner, or none where the page shows no surface
};

struct PageMolecule {
  std::string name;
  const LevelsResult* result = nullptr;
  std::vector<PageLevel> levels;  // those that can be chosen, in order of energy
};

/// @param molecules  in the order of the columns of the diagram
/// @param eye        from where the molecules are seen at first, standard frame
/// @returns          JSON that may stand inside a <script> element: "</" does not occur in it
[[nodiscard]] std::string page_data(const std::vector<PageMolecule>& molecules,
                                    const Eigen::Vector3d& eye);

}  // namespace irrepwise
