// Character tables computed by GAP, tests/reference/gap_character_tables.csv.
#pragma once

#include <map>
#include <string>
#include <vector>

#include <Eigen/Core>

/// Classes and irreps in GAP's order, which is not ours: compare up to permutations of both.
struct GapTable {
  std::vector<int> class_sizes;
  std::vector<int> element_orders;  // by class
  Eigen::MatrixXcd characters;      // n_irreps x n_classes, correct to the last bit of a double
};

/// @returns  by Schoenflies symbol: Cs, Ci, Cn, Cnv, Cnh, Dn, Dnh, Dnd, S2n up to n = 12; the cubic
///           and icosahedral groups
/// @throws irrepwise::Error  with file and line where the file is not as its header says
[[nodiscard]] std::map<std::string, GapTable> read_gap_tables();
