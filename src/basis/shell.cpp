#include "basis/shell.hpp"

#include <array>
#include <cassert>
#include <cmath>
#include <limits>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"

namespace irrepwise {
namespace {

double norm(std::span<const ContractedRadial::Term> terms) {
  double sum = 0.0;
  for (const ContractedRadial::Term& a : terms) {
    for (const ContractedRadial::Term& b : terms) {
      sum += a.coefficient * b.coefficient * one_centre_overlap(a.function, b.function);
    }
  }
  return sum;
}

}  // namespace

ContractedRadial::ContractedRadial(std::vector<Term> terms) : terms_(std::move(terms)) {
  if (terms_.empty() || terms_.size() > 2) {
    throw Error(
        fmt::format("contraction: {} Slater functions, expected one or two", terms_.size()));
  }
  for (const Term& term : terms_) {
    if (!std::isfinite(term.coefficient)) {
      throw Error(fmt::format("contraction: coefficient {}, expected a number", term.coefficient));
    }
  }
  if (terms_.front().function.n() != terms_.back().function.n()) {
    throw Error(fmt::format("contraction: n = {} and n = {}, expected the same n in both functions",
                            terms_.front().function.n(), terms_.back().function.n()));
  }
  const double found = norm(terms_);
  if (!(std::abs(found - 1.0) <= max_norm_error)) {
    throw Error(fmt::format(
        "contraction: norm {:.4f}, expected 1 within {}; check coefficients and exponents for a "
        "misprint",
        found, max_norm_error));
  }
  // What is normalised to rounding stays, so that a contraction written in full reads back the
  // same.
  if (std::abs(found - 1.0) <= 8.0 * std::numeric_limits<double>::epsilon()) return;
  const double scale = 1.0 / std::sqrt(found);
  for (Term& term : terms_) term.coefficient *= scale;
}

char shell_letter(int l) {
  assert(l >= 0 && l <= max_l);
  return "spdf"[l];
}

std::string_view orbital_name(int l, int component) {
  assert(l >= 0 && l <= max_l && component >= 0 && component <= 2 * l);
  // Components of l start at l^2, as there are 1 + 3 + … + (2l - 1) = l^2 before them.
  constexpr std::array<std::string_view, 16> names = {
      "s",   "px",  "py",   "pz",   "dz2",       "dx2-y2", "dxy",        "dxz",
      "dyz", "fz3", "fxz2", "fyz2", "fz(x2-y2)", "fxyz",   "fx(x2-3y2)", "fy(3x2-y2)"};
  return names[static_cast<std::size_t>(l * l + component)];
}

}  // namespace irrepwise
