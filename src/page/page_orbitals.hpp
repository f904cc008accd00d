// The orbitals of a level as surfaces light enough for a page.
#pragma once

#include <optional>
#include <vector>

#include "output/levels_result.hpp"
#include "page/packed_surface.hpp"

namespace irrepwise {

struct PageOrbital {
  double isovalue = 0.0;  // bohr^(-3/2), encloses half of the density
  std::optional<PackedSurface> positive;
  std::optional<PackedSurface> negative;

  [[nodiscard]] std::size_t bytes() const {
    return (positive ? positive->bytes() : 0) + (negative ? negative->bytes() : 0);
  }
};

/// The isovalue is that of `enclosing_isovalue`; the surface has fewer vertices than that of a
/// drawing, each of them on the isovalue.
/// @param vertices  about how many an orbital may have, both phases together
/// @returns        one per partner
/// @throws Error   as `sample`
[[nodiscard]] std::vector<PageOrbital> page_orbitals(const LevelsResult& result, int level,
                                                     double vertices);

}  // namespace irrepwise
