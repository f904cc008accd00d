// Which surfaces a page carries: those nearest the frontier first, as long as the page stays small.
#pragma once

#include <vector>

#include "page/page_data.hpp"

namespace irrepwise {

/// @returns  0 for HOMO and LUMO, 1 for the levels next to them …
[[nodiscard]] int levels_from_frontier(const Levels& levels, int level);

/// @param molecules      whose levels have no surfaces yet
/// @param levels_around  how many levels below the HOMO and above the LUMO are of interest
/// @param threads        changes no result
/// Fills the surfaces of levels, every molecule's frontier first, until the page holds about
/// 1.4 million characters of them; the levels left out have none.
void add_surfaces(std::vector<PageMolecule>& molecules, int levels_around, int threads);

}  // namespace irrepwise
