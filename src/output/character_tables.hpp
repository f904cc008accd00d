// The character table of a group, for people.
#pragma once

#include <complex>
#include <string>
#include <vector>

#include "output/table.hpp"
#include "symmetry/point_group.hpp"

namespace irrepwise {

/// Characters by class. A pair of complex conjugate irreps stands in two rows joined by a bracket.
/// A table wider than `width` goes on in further tables.
[[nodiscard]] std::vector<Table> character_tables(const PointGroup& group, int width);

/// Linear functions and rotations, quadratic and cubic functions by irrep.
[[nodiscard]] Table function_table(const PointGroup& group);

/// The character of one of a pair of complex conjugate irreps (the other has its conjugate).
[[nodiscard]] std::complex<double> complex_character(const Irrep& irrep, int operation);

}  // namespace irrepwise
