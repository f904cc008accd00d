#include "overlap/diatomic_frame.hpp"

#include <cmath>
#include <random>

#include <Eigen/Geometry>

#include <doctest/doctest.h>

#include "overlap/two_centre.hpp"

using irrepwise::ContractedRadial, irrepwise::DiatomicFrame, irrepwise::harmonic_rotation,
    irrepwise::overlap_block, irrepwise::Shell;

namespace {

Shell shell(int n, int l, double zeta) {
  return {0, l, -10.0, ContractedRadial({{{n, zeta}, 1.0}}), 0};
}

double largest(const Eigen::MatrixXd& m) { return m.cwiseAbs().maxCoeff(); }

const Eigen::Vector3d displacement(1.1, -2.3, 0.9);

}  // namespace

TEST_CASE("along z the block holds the diatomic overlaps and exact zeros elsewhere") {
  const irrepwise::DiatomicOverlaps overlaps = {0.1, 0.2, 0.3, 0.4};
  const DiatomicFrame frame(Eigen::Vector3d(0, 0, 2.5), 3);
  Eigen::MatrixXd pp = Eigen::MatrixXd::Zero(3, 3);
  pp.diagonal() << 0.2, 0.2, 0.1;  // px py pz
  CHECK(Eigen::MatrixXd(frame.block(overlaps, 1, 1)) == pp);
  Eigen::MatrixXd dd = Eigen::MatrixXd::Zero(5, 5);
  dd.diagonal() << 0.1, 0.3, 0.3, 0.2, 0.2;  // dz2 dx2-y2 dxy dxz dyz
  CHECK(Eigen::MatrixXd(frame.block(overlaps, 2, 2)) == dd);
  Eigen::MatrixXd ff = Eigen::MatrixXd::Zero(7, 7);
  ff.diagonal() << 0.1, 0.2, 0.2, 0.3, 0.3, 0.4, 0.4;
  CHECK(Eigen::MatrixXd(frame.block(overlaps, 3, 3)) == ff);
  Eigen::MatrixXd pd = Eigen::MatrixXd::Zero(3, 5);
  pd(2, 0) = 0.1;  // pz dz2
  pd(0, 3) = 0.2;  // px dxz
  pd(1, 4) = 0.2;  // py dyz
  CHECK(Eigen::MatrixXd(frame.block(overlaps, 1, 2)) == pd);
}

TEST_CASE("a p block is pi across the line and sigma along it") {
  // S = pi 1 + (sigma - pi) d d^T: the vector decomposition of two p functions, our derivation.
  const Eigen::Vector3d d = displacement.normalized();
  const DiatomicFrame frame(displacement, 1);
  const Eigen::Matrix3d expected =
      0.2 * Eigen::Matrix3d::Identity() + (-0.3 - 0.2) * d * d.transpose();
  CHECK(largest(Eigen::MatrixXd(frame.block({-0.3, 0.2, 0, 0}, 1, 1)) - expected) <= 1e-15);
}

TEST_CASE("signs are those of the pictures: px towards a neighbour on +x overlaps its s by plus") {
  const Eigen::Vector3d x(2.5, 0, 0);
  const Shell s = shell(1, 0, 1.3), p = shell(2, 1, 1.6), d = shell(3, 2, 1.8);
  CHECK(overlap_block(p, s, x)(0, 0) > 0.1);
  CHECK(overlap_block(s, p, x)(0, 0) < -0.1);
  CHECK(overlap_block(p, p, x)(0, 0) < 0.0);  // lobes of opposite sign meet
  CHECK(overlap_block(p, p, x)(1, 1) > 0.0);  // pi
  CHECK(overlap_block(d, s, x)(1, 0) > 0.1);  // dx2-y2
  CHECK(overlap_block(d, s, x)(0, 0) < 0.0);  // the ring of dz2
}

TEST_CASE("turning the molecule turns the block: S(g r) = D_a S(r) D_b^T") {
  std::mt19937 random(8);
  std::normal_distribution<double> gauss;
  for (int i = 0; i < 40; ++i) {
    const Eigen::Matrix3d turn =
        Eigen::Quaterniond(gauss(random), gauss(random), gauss(random), gauss(random))
            .normalized()
            .toRotationMatrix();
    const Eigen::Matrix3d g = i % 2 == 0 ? turn : Eigen::Matrix3d(-turn);
    for (int l_a = 0; l_a <= 3; ++l_a) {
      for (int l_b = 0; l_b <= 3; ++l_b) {
        const Shell a = shell(l_a + 2, l_a, 1.7), b = shell(l_b + 1, l_b, 1.4);
        const Eigen::MatrixXd still = overlap_block(a, b, displacement);
        const Eigen::MatrixXd turned = overlap_block(a, b, g * displacement);
        const Eigen::MatrixXd expected =
            harmonic_rotation(l_a, g) * still * harmonic_rotation(l_b, g).transpose();
        CHECK(largest(turned - expected) <= 1e-14);
        CHECK(largest(turned) > 1e-3);
      }
    }
  }
}

TEST_CASE("the block seen from the other atom is the transpose") {
  for (int l_a = 0; l_a <= 3; ++l_a) {
    for (int l_b = 0; l_b <= 3; ++l_b) {
      const Shell a = shell(l_a + 2, l_a, 1.7), b = shell(l_b + 1, l_b, 1.4);
      const Eigen::MatrixXd there = overlap_block(a, b, displacement);
      const Eigen::MatrixXd back = overlap_block(b, a, -displacement);
      CHECK(largest(there - back.transpose()) <= 1e-14);
    }
  }
}

TEST_CASE("the direction counts, its length does not, and no direction is special") {
  for (const Eigen::Vector3d& d :
       {Eigen::Vector3d(0, 0, -1), Eigen::Vector3d(1e-9, 0, 1), Eigen::Vector3d(-1, 0, 1e-300),
        Eigen::Vector3d(1, 1, 1), Eigen::Vector3d(0, -1, 0)}) {
    const irrepwise::DiatomicOverlaps overlaps = {0.1, 0.2, 0.3, 0.4};
    for (int l = 1; l <= 3; ++l) {
      const Eigen::MatrixXd block = DiatomicFrame(d, 3).block(overlaps, l, l);
      // Each |m| > 0 occurs twice, so the trace is fixed whatever the direction.
      double trace = overlaps[0];
      for (int m = 1; m <= l; ++m) trace += 2 * overlaps[static_cast<std::size_t>(m)];
      CHECK(std::abs(block.trace() - trace) <= 4e-15);
      CHECK(largest(block - Eigen::MatrixXd(DiatomicFrame(1e-3 * d, 3).block(overlaps, l, l))) <=
            4e-15);
      CHECK(largest(block - block.transpose()) <= 4e-15);
    }
  }
}
