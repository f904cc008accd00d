// Electrons into levels: from below, by multiplicity, or as the user says irrep by irrep.
#pragma once

#include <vector>

#include "hueckel/levels.hpp"

namespace irrepwise {

/// Sets the occupation of every level.
///
/// Without a wish: from below, what is left for a degenerate level is spread evenly over its
/// partners. With a multiplicity 2S + 1: the lowest orbitals doubly, the next 2S singly. With
/// electrons by irrep: from below within each irrep.
///
/// @param levels  ascending energy
/// @throws Error  for no electrons, more than the orbitals hold, an impossible multiplicity, or
///                electrons by irrep that do not add up or do not fit
void occupy(std::vector<Level>& levels, const PointGroup& group, int electrons,
            const HueckelOptions& options);

/// @returns  whether a level holds some electrons and could hold more
[[nodiscard]] bool is_partly_filled(double electrons, int degeneracy);

/// @param levels  occupied
[[nodiscard]] Frontier find_frontier(const std::vector<Level>& levels);

}  // namespace irrepwise
