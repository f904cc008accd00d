// Which surfaces a page carries: those nearest the frontier first, as long as the page stays small.
#pragma once

#include <cstddef>
#include <vector>

#include "page/page_data.hpp"

namespace irrepwise {

/// @returns  0 for HOMO and LUMO, 1 for the levels next to them …
[[nodiscard]] int levels_from_frontier(const Levels& levels, int level);

/// About what a page can carry besides all the rest and stay below 3 MB.
inline constexpr std::size_t most_surface_characters = 1'400'000;

/// Fills the surfaces of levels, every molecule's frontier first, until the next would not fit; the
/// levels left out have none.
///
/// @param molecules      whose levels have no surfaces yet
/// @param levels_around  how many levels below the HOMO and above the LUMO are of interest
/// @param threads        changes no result
/// @param most           characters of surfaces in the page
/// @throws Error         as `sample`
void add_surfaces(std::vector<PageMolecule>& molecules, int levels_around, int threads,
                  std::size_t most = most_surface_characters);

}  // namespace irrepwise
