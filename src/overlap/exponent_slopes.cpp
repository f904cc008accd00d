#include "overlap/exponent_slopes.hpp"

#include <cmath>
#include <cstddef>

#include "overlap/two_centre.hpp"

namespace irrepwise {
namespace {

// dN/dζ_p of N = sum_ij c_i c_j s_ij with s_ij = (2√(ζ_i ζ_j) / (ζ_i + ζ_j))^(2n+1).
double norm_slope(const ContractedRadial& radial, const ContractedRadial::Term& p) {
  double sum = 0.0;
  for (const ContractedRadial::Term& j : radial.terms()) {
    const double zeta_p = p.function.zeta(), zeta_j = j.function.zeta();
    const double logarithmic = (2 * radial.n() + 1) * (0.5 / zeta_p - 1.0 / (zeta_p + zeta_j));
    sum += 2.0 * p.coefficient * j.coefficient * one_centre_overlap(p.function, j.function) *
           logarithmic;
  }
  return sum;
}

}  // namespace

std::vector<DiatomicOverlaps> exponent_slopes(const ContractedRadial& radial_a, int l_a,
                                              const ContractedRadial& radial_b, int l_b,
                                              double distance_bohr) {
  const int n = radial_a.n();
  const double same = 2 * n + 1;
  const double raised = std::sqrt((2.0 * n + 1.0) * (2.0 * n + 2.0));
  const DiatomicOverlaps whole = diatomic_overlaps(radial_a, l_a, radial_b, l_b, distance_bohr);
  std::vector<DiatomicOverlaps> slopes;
  for (const ContractedRadial::Term& a : radial_a.terms()) {
    const double zeta = a.function.zeta();
    DiatomicOverlaps slope{};
    for (const ContractedRadial::Term& b : radial_b.terms()) {
      const SlaterFunction other{b.function.n(), b.function.zeta()};
      const DiatomicOverlaps here = slater_overlaps({n, zeta}, l_a, other, l_b, distance_bohr);
      const DiatomicOverlaps above = slater_overlaps({n + 1, zeta}, l_a, other, l_b, distance_bohr);
      const double factor = a.coefficient * b.coefficient / (2.0 * zeta);
      for (std::size_t m = 0; m < slope.size(); ++m) {
        slope[m] += factor * (same * here[m] - raised * above[m]);
      }
    }
    const double half_norm_slope = 0.5 * norm_slope(radial_a, a);
    for (std::size_t m = 0; m < slope.size(); ++m) slope[m] -= half_norm_slope * whole[m];
    slopes.push_back(slope);
  }
  return slopes;
}

}  // namespace irrepwise
