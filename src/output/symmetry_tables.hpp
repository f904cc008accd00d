// Tables of what the group does to the molecule: operations, sets, reductions, bonding.
#pragma once

#include <vector>

#include "analysis/symmetry_result.hpp"
#include "output/table.hpp"

namespace irrepwise {

/// Kind, axis and what happens to the atoms, a row for each operation.
[[nodiscard]] Table operation_table(const SymmetryResult& result);

/// Sets of equivalent atoms with site group and representative.
[[nodiscard]] Table equivalent_atoms_table(const SymmetryResult& result);

/// What each shell and part spans; total and number of orbitals in the note.
[[nodiscard]] Table reduction_table(const SymmetryResult& result);

/// Which irreps occur on both sides, and which stay non-bonding by symmetry. No set may be missing:
/// what is too wide goes on in further tables, the verdict in the last.
/// @param width  columns of the text
[[nodiscard]] std::vector<Table> bonding_tables(const SymmetryResult& result, int width);

/// Which irreps the vibrations have, and what light excites them.
[[nodiscard]] Table vibration_table(const SymmetryResult& result);

/// @returns  "σ", "π in plane", "3p": for people
[[nodiscard]] std::string part_words(const SymmetryResult& result,
                                     const OrbitalReduction& reduction);

}  // namespace irrepwise
