#include "overlap/diatomic_frame.hpp"

#include <algorithm>
#include <cassert>

#include <Eigen/Geometry>

namespace irrepwise {
namespace {

// Which function of l has this |m|: the one with cos(m phi), or the one with sin(m phi).
constexpr int cosine_component(int l, int m) {
  constexpr std::array<std::array<int, 4>, 4> components = {{{0}, {2, 0}, {0, 3, 1}, {0, 1, 3, 5}}};
  return components[static_cast<std::size_t>(l)][static_cast<std::size_t>(m)];
}
constexpr int sine_component(int l, int m) { return cosine_component(l, m) + 1; }

// The columns are the axes of the frame. Any turn about z would do; this one is exact along the
// axes of the molecule.
Eigen::Matrix3d axes(const Eigen::Vector3d& direction) {
  const Eigen::Vector3d z = direction.stableNormalized();
  Eigen::Index least = 0;
  z.cwiseAbs().minCoeff(&least);
  const Eigen::Vector3d x = (Eigen::Vector3d::Unit(least) - z(least) * z).normalized();
  Eigen::Matrix3d g;
  g << x, z.cross(x), z;
  return g;
}

}  // namespace

DiatomicFrame::DiatomicFrame(const Eigen::Vector3d& direction, int largest_l) {
  assert(direction.allFinite() && !direction.isZero(0.0));
  assert(largest_l >= 0 && largest_l <= 3);
  const Eigen::Matrix3d g = axes(direction);
  for (int l = 0; l <= largest_l; ++l) {
    rotations_[static_cast<std::size_t>(l)] = harmonic_rotation(l, g);
  }
}

OverlapBlock DiatomicFrame::block(const DiatomicOverlaps& overlaps, int l_a, int l_b) const {
  const HarmonicMatrix& d_a = rotations_[static_cast<std::size_t>(l_a)];
  const HarmonicMatrix& d_b = rotations_[static_cast<std::size_t>(l_b)];
  const int n_a = 2 * l_a + 1, n_b = 2 * l_b + 1;
  assert(d_a.rows() == n_a && d_b.rows() == n_b);
  OverlapBlock block = OverlapBlock::Zero(n_a, n_b);
  const auto add = [&](double overlap, int component_a, int component_b) {
    const double* a = d_a.data() + component_a * n_a;
    const double* b = d_b.data() + component_b * n_b;
    double* target = block.data();
    for (int j = 0; j < n_b; ++j) {
      const double factor = overlap * b[j];
      for (int i = 0; i < n_a; ++i) *target++ += a[i] * factor;
    }
  };
  for (int m = 0; m <= std::min(l_a, l_b); ++m) {
    const double overlap = overlaps[static_cast<std::size_t>(m)];
    add(overlap, cosine_component(l_a, m), cosine_component(l_b, m));
    if (m > 0) add(overlap, sine_component(l_a, m), sine_component(l_b, m));
  }
  return block;
}

}  // namespace irrepwise
