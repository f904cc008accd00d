// The report of `symmetry` for people.
#pragma once

#include "output/report.hpp"
#include "output/symmetry_result.hpp"

namespace irrepwise {

/// Group, ladder and axes; character table and functions; sets, reductions and what can bond; then
/// the sections and answers asked for.
/// @param width  columns, at which a wide character table breaks
[[nodiscard]] Report symmetry_report(const SymmetryResult& result, const SymmetrySections& sections,
                                     int width);

/// A group without a molecule.
[[nodiscard]] Report group_report(const PointGroup& group, const GroupAnswers& answers, int width);

}  // namespace irrepwise
