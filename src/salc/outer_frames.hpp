// Frames of the atoms that reach the central atom through others: O of a carbonyl, H of a methyl.
#pragma once

#include <optional>
#include <vector>

#include "salc/equivalent_atoms.hpp"
#include "salc/local_frames.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

/// Adds frames to sets that are not bonded to the central atom but reach it over bonds. z points to
/// the atom one bond nearer to it, or between several. Where z goes straight on from that atom's,
/// and the atom's own bonds lie in no plane, x and y are those of that atom. Otherwise x or y,
/// whichever is nearer to it in that atom's frame, stands across the plane of the bonds or, where
/// they lie in none, of the two z: so π across a flat ligand is one of πx and πy from end to end,
/// and of a straight one both are. Where a ligand has none of these (a CH2 between two arms) the
/// rule of `local_frames` does. Signs are those nearer to that atom's x and y.
///
/// @param frames  by set: of the sets bonded to the centre
/// @returns       by set; nothing for the centre, and for atoms with no path of bonds to it
[[nodiscard]] std::vector<std::optional<LocalFrames>> with_outer_frames(
    const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets, int central_atom,
    std::vector<std::optional<LocalFrames>> frames);

}  // namespace irrepwise
