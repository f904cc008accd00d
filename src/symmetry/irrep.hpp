// One irreducible representation of a point group over the real numbers.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

namespace irrepwise {

/// A pair of complex conjugate irreps is one real irrep of dimension 2 with `complex_pair` set: its
/// matrices are then turns by the phase a of the character, [cos a, -sin a; sin a, cos a].
struct Irrep {
  std::string label;  // "A1g", "E1\"", "T2", "Sigmag+": ASCII, capital
  int dimension = 1;
  bool complex_pair = false;
  std::vector<Eigen::MatrixXd> matrices;  // by operation, real orthogonal, `dimension x dimension`
  std::vector<double> characters;         // by operation: traces of the matrices
};

/// "A1g" -> "a1g": the label of a level of that irrep, ASCII as in JSON ("e1\"", "sigmag+").
[[nodiscard]] std::string level_label(const std::string& irrep_label);

/// ASCII label for people: "Sigmag+" -> "Σg+", "piu" -> "πu". One-electron levels are never σ-, so
/// the + of a lower-case sigma is left out, as in the trade: "sigmag+" -> "σg".
[[nodiscard]] std::string readable_label(const std::string& ascii_label);

}  // namespace irrepwise
