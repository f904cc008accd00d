// Frames of the atoms that reach the central atom through others: O of a carbonyl, H of a methyl.
#pragma once

#include <optional>
#include <vector>

#include "salc/equivalent_atoms.hpp"
#include "salc/local_frames.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

/// Adds frames to sets that are not bonded to the central atom but reach it over bonds. z points to
/// the atom one bond nearer to it, or between several. y stands across the plane of the atom's own
/// bonds; where they lie in none, and z goes straight on from that atom's, x and y are those of
/// that atom; otherwise y stands across the plane of the two z. Where a ligand has none of these (a
/// CH2 between two arms) the rule of `local_frames` does. Of the two signs of y the one nearer to
/// that atom's y is taken, so that π of a straight ligand follows one pair of axes from end to end.
///
/// @param frames  by set: of the sets bonded to the centre
/// @returns       by set; nothing for the centre, and for atoms with no path of bonds to it
[[nodiscard]] std::vector<std::optional<LocalFrames>> with_outer_frames(
    const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets, int central_atom,
    std::vector<std::optional<LocalFrames>> frames);

}  // namespace irrepwise
