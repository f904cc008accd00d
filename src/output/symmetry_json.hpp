// The result of `symmetry` as JSON and CSV, for programs.
#pragma once

#include <string>

#include "analysis/symmetry_result.hpp"
#include "output/symmetry_report.hpp"

namespace irrepwise {

/// Keys in fixed order, labels of irreps as those of levels ("a1g"); README.md lists the keys.
[[nodiscard]] std::string symmetry_json(const SymmetryResult& result,
                                        const SymmetryHeadings& headings);
[[nodiscard]] std::string group_json(const PointGroup& group, const GroupAnswers& answers);

/// One value in a row: `section`, what it is of (`set`, `part`, `irrep`, `partner`, `atom`,
/// `name`), `value`.
[[nodiscard]] std::string symmetry_csv(const SymmetryResult& result);
[[nodiscard]] std::string group_csv(const PointGroup& group, const GroupAnswers& answers);

}  // namespace irrepwise
