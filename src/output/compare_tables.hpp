// The tables of a comparison beside its summary.
#pragma once

#include "output/compare_result.hpp"
#include "output/table.hpp"

namespace irrepwise {

/// A row for each level with most metal d character, variants and metals below each other, above
/// each the polyhedron.
[[nodiscard]] Table d_block_table(const Comparison& comparison);

/// How far the means of the parent labels lie apart.
[[nodiscard]] Table splittings_table(const Comparison& comparison);

/// What became of the reference's HOMO and LUMO; changes of identity as notes, in words.
[[nodiscard]] Table frontier_match_table(const Comparison& comparison);

/// The smallest change of one parameter that turns the order of two frontier levels.
[[nodiscard]] Table robustness_table(const Comparison& comparison);

/// Derivatives of HOMO, LUMO and gap.
[[nodiscard]] Table slopes_table(const VariantResult& variant);

}  // namespace irrepwise
