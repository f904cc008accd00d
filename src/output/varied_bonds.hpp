// Which bonds of the metal the variants of a comparison differ in.
#pragma once

#include "output/compare_result.hpp"

namespace irrepwise {

/// Fills `varied_bonds` of every variant: the bonds of its first metal to donors that are not in
/// all variants, by place (as matched with the reference), element and formula of the ligand.
/// Nothing where there is no metal, where no donor varies, or where none is in all of them: then no
/// place stands out.
void find_varied_bonds(Comparison& comparison);

}  // namespace irrepwise
