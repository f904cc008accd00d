// The tables of a comparison beside its summary.
#pragma once

#include "output/compare_result.hpp"
#include "output/table.hpp"

namespace irrepwise {

/// A row for each level with most metal d character, the variants below each other; above each the
/// polyhedron, below it the splittings.
[[nodiscard]] Table d_block_table(const Comparison& comparison);

/// What became of the reference's HOMO and LUMO; changes of identity as notes, in words.
[[nodiscard]] Table frontier_match_table(const Comparison& comparison);

/// The smallest change of one parameter that turns the order of two frontier levels.
[[nodiscard]] Table robustness_table(const Comparison& comparison);

/// Derivatives of HOMO, LUMO and gap.
[[nodiscard]] Table slopes_table(const VariantResult& variant);

/// "t2g–eg 3.214 eV": from the lowest mean to the highest, each to the next.
[[nodiscard]] std::string splitting_words(const DBlock& block);

/// "OC-6 octahedron (Oh), 2.1° off".
[[nodiscard]] std::string parent_words(const DBlock& block);

}  // namespace irrepwise
