// Frames that go out from the metals along the bonds: donors, O of a carbonyl, H of a methyl.
#pragma once

#include <optional>
#include <vector>

#include "salc/equivalent_atoms.hpp"
#include "salc/local_frames.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

/// Adds frames to sets that reach a start over bonds. z points to the atom one bond nearer to it,
/// or between several. Where z goes straight on from that atom's, and the atom's own bonds lie in
/// no plane, x and y are those of that atom. Otherwise x or y, whichever is nearer to it in that
/// atom's frame, stands across the plane of the bonds or, where they lie in none, of the two z: so
/// π across a flat ligand is one of πx and πy from end to end, and of a straight one both are.
/// Where a ligand has none of these (a CH2 between two arms) the rule of `local_frames` does, as it
/// does for the atoms bonded to a start. Signs are those nearer to that atom's x and y. Atoms that
/// bind a metal side-on have the frame of `side_on`.
///
/// @param starts  the central atom or, in a complex without one, its metals
/// @param centre  where atoms look that lie midway between those nearer, if there is one
/// @param frames  by set: of the starts; those of sets bonded to a central atom are kept but for
///                atoms that bind side-on; those of sets bonded to one of several starts are not
/// @returns       by set; as given where no path of bonds leads to a start
[[nodiscard]] std::vector<std::optional<LocalFrames>> with_outer_frames(
    const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets,
    const std::vector<int>& starts, const std::optional<Centre>& centre,
    std::vector<std::optional<LocalFrames>> frames);

}  // namespace irrepwise
