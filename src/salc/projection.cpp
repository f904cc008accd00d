#include "salc/projection.hpp"

#include <cmath>
#include <stdexcept>

namespace irrepwise {
namespace {

constexpr double near_whole = 1e-6;

// Theory demands a whole number; anything else is a mistake of ours, not of the input.
int whole(double value) {
  const double rounded = std::round(value);
  if (std::abs(value - rounded) > near_whole) {
    throw std::logic_error("an irrep occurs a fractional number of times");
  }
  return static_cast<int>(rounded);
}

// The multiplication by i in the real form of a pair of complex conjugate irreps.
Eigen::MatrixXd times_i(const Eigen::MatrixXd& rows) {
  Eigen::MatrixXd result(2, rows.cols());
  result.row(0) = -rows.row(1);
  result.row(1) = rows.row(0);
  return result;
}

}  // namespace

SiteFunctions whole_shell(const PointGroup& group, const EquivalentAtoms& set, int l) {
  SiteFunctions functions{l, {}, HarmonicMatrix::Identity(2 * l + 1, 2 * l + 1)};
  for (const int g : set.site_group) {
    functions.rotations.push_back(harmonic_rotation(l, group.operations()[g]));
  }
  return functions;
}

int multiplicity(const Irrep& irrep, const EquivalentAtoms& set, const SiteFunctions& functions) {
  double sum = 0.0;
  for (std::size_t h = 0; h < set.site_group.size(); ++h) {
    const HarmonicMatrix image = functions.rotations[h] * functions.span;
    sum += irrep.characters[set.site_group[h]] * image.cwiseProduct(functions.span).sum();
  }
  const double order = static_cast<double>(set.site_group.size());
  return whole(sum / order / (irrep.complex_pair ? 2.0 : 1.0));
}

std::vector<Eigen::MatrixXd> site_invariants(const Irrep& irrep, const EquivalentAtoms& set,
                                             const SiteFunctions& functions, int wanted) {
  const Eigen::Index d = irrep.dimension, m = 2 * functions.l + 1;
  const auto project = [&](const Eigen::MatrixXd& x) {
    Eigen::MatrixXd sum = Eigen::MatrixXd::Zero(d, m);
    for (std::size_t h = 0; h < set.site_group.size(); ++h) {
      sum += irrep.matrices[set.site_group[h]] * x * functions.rotations[h].transpose();
    }
    return Eigen::MatrixXd(sum / static_cast<double>(set.site_group.size()));
  };
  std::vector<Eigen::MatrixXd> projected;
  for (Eigen::Index r = 0; r < d; ++r) {
    for (Eigen::Index p = 0; p < functions.span.cols(); ++p) {
      Eigen::MatrixXd unit = Eigen::MatrixXd::Zero(d, m);
      unit.row(r) = functions.span.col(p).transpose();
      projected.push_back(project(unit));
    }
  }
  constexpr double tie = 1e-9;      // lengths that differ by rounding only
  constexpr double nothing = 1e-6;  // a projection of this length is none
  // The projections of single functions, the longest first, each freed of those taken before.
  std::vector<Eigen::MatrixXd> chosen;
  while (static_cast<int>(chosen.size()) < wanted) {
    const Eigen::MatrixXd* longest = &projected.front();
    for (const Eigen::MatrixXd& candidate : projected) {
      if (candidate.norm() > longest->norm() + tie) longest = &candidate;
    }
    if (longest->norm() < nothing) throw std::logic_error("too few invariants of a site group");
    const Eigen::MatrixXd unit = longest->normalized();
    chosen.push_back(unit);
    std::vector<Eigen::MatrixXd> taken = {unit};
    if (irrep.complex_pair) taken.push_back(times_i(unit));
    for (Eigen::MatrixXd& candidate : projected) {
      for (const Eigen::MatrixXd& done : taken) {
        candidate -= done.cwiseProduct(candidate).sum() * done;
      }
    }
  }
  return chosen;
}

}  // namespace irrepwise
