// Radial part of a Slater-type orbital (STO), and its overlap on one centre.
#pragma once

namespace irrepwise {

/// R(r) = N r^(n-1) exp(-zeta r), with N > 0 such that R^2 r^2 integrates to 1 over r >= 0.
///
/// Always valid: 1 <= n <= max_n and min_zeta <= zeta <= max_zeta, checked once, here.
class SlaterRadial {
 public:
  static constexpr int max_n = 7;           // last row of the periodic table
  static constexpr double min_zeta = 1e-3;  // bohr^-1; outside these two, zeta is a slip of
  static constexpr double max_zeta = 1e3;   // unit or decimal point; inside, S cannot underflow

  /// @param n     principal quantum number
  /// @param zeta  exponent, bohr^-1
  /// @throws Error  if n or zeta is out of range or NaN; the message has value and range
  SlaterRadial(int n, double zeta);

  [[nodiscard]] int n() const noexcept { return n_; }
  [[nodiscard]] double zeta() const noexcept { return zeta_; }  // bohr^-1

 private:
  int n_;
  double zeta_;
};

/// Integral of R_a R_b r^2 over r >= 0 (the angular factor, 0 or 1, is the caller's):
///   S = (n_a + n_b)! / sqrt((2n_a)! (2n_b)!) * t_a^(n_a + 1/2) * t_b^(n_b + 1/2),
///   t_i = 2 zeta_i / (zeta_a + zeta_b).
///
/// @returns   no unit, positive, 1 if a equals b; S(a, b) and S(b, a) are the same bits
/// @accuracy  16 eps (worst found 11.5, whole domain); pow() magnifies the rounding of t_i
/// @source    form of R: doi:10.1103/PhysRev.36.57; integral: DLMF 5.9.1; S follows from both
[[nodiscard]] double one_centre_overlap(const SlaterRadial& a, const SlaterRadial& b);

}  // namespace irrepwise
