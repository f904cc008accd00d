// The report of `symmetry` for people.
#pragma once

#include <string>
#include <vector>

#include "analysis/symmetry_result.hpp"
#include "output/report.hpp"

namespace irrepwise {

/// Which of the longer sections to print.
struct SymmetrySections {
  bool operations = false;
  bool salcs = false;
  bool vibrations = false;
};

/// What a report of a molecule starts and ends with.
struct SymmetryHeadings {
  std::string title;
  std::vector<std::string> warnings;
};

/// Group, ladder and axes; character table and functions; sets, reductions and what can bond; then
/// the sections and answers asked for.
/// @param width  columns, at which a wide character table breaks
[[nodiscard]] Report symmetry_report(const SymmetryResult& result, const SymmetryHeadings& headings,
                                     const SymmetrySections& sections, int width);

/// A group without a molecule.
[[nodiscard]] Report group_report(const PointGroup& group, const GroupAnswers& answers, int width);

}  // namespace irrepwise
