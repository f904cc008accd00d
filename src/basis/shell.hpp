// Shells of Slater-type orbitals: what a parameter set says of one, and where it sits in a basis.
#pragma once

#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "basis/slater_radial.hpp"

namespace irrepwise {

inline constexpr int max_l = 3;  // s, p, d, f

/// One or two Slater functions of the same n with coefficients. Always normalised: the constructor
/// scales the coefficients, and refuses a contraction whose norm, the integral of R^2 r^2, is
/// further than 0.01 from 1.
class ContractedRadial {
 public:
  struct Term {
    SlaterRadial function;
    double coefficient;
  };

  static constexpr double max_norm_error = 0.01;  // published pairs are rounded to four figures

  /// @param terms   one or two, of the same n
  /// @throws Error  for another number of terms, unequal n, a coefficient that is not finite, or a
  ///                norm that is not 1; with what was found and what is expected
  explicit ContractedRadial(std::vector<Term> terms);

  [[nodiscard]] std::span<const Term> terms() const noexcept { return terms_; }
  [[nodiscard]] int n() const noexcept { return terms_.front().function.n(); }

 private:
  std::vector<Term> terms_;
};

/// What a parameter set says of one valence shell.
struct ShellParameters {
  int n = 0;
  int l = 0;
  double h_ii_ev = 0.0;
  ContractedRadial radial;
  std::string source;  // attribution, in words
};

/// One shell on one atom of a molecule: 2l + 1 orbitals in the order of the conventions.
struct Shell {
  int atom = 0;  // index from 0
  int l = 0;
  double h_ii_ev = 0.0;
  ContractedRadial radial;
  int first_orbital = 0;  // index of its first orbital in the basis

  [[nodiscard]] int n() const noexcept { return radial.n(); }
  [[nodiscard]] int size() const noexcept { return 2 * l + 1; }
};

/// @returns  's', 'p', 'd' or 'f'
[[nodiscard]] char shell_letter(int l);

/// @param component  0 to 2l in the order of the conventions
/// @returns          "dx2-y2", "s", "fz3" …: without n
[[nodiscard]] std::string_view orbital_name(int l, int component);

}  // namespace irrepwise
