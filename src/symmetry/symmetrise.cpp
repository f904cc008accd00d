#include "symmetry/symmetrise.hpp"

#include <limits>

#include <Eigen/LU>
#include <Eigen/SVD>

namespace irrepwise {
namespace {

// For each standard operation the images of the held operation nearest to it.
std::vector<std::vector<int>> images_by_operation(
    const PointGroup& group, const Eigen::Matrix3d& rotation,
    const std::vector<Eigen::Matrix3d>& held, const std::vector<std::vector<int>>& held_images) {
  std::vector<std::vector<int>> images;
  for (const Eigen::Matrix3d& operation : group.operations()) {
    const Eigen::Matrix3d in_input_frame = rotation.transpose() * operation * rotation;
    std::size_t nearest = 0;
    double nearest_distance = std::numeric_limits<double>::max();
    for (std::size_t g = 0; g < held.size(); ++g) {
      const double distance = (held[g] - in_input_frame).squaredNorm();
      if (distance < nearest_distance) {
        nearest = g;
        nearest_distance = distance;
      }
    }
    images.push_back(held_images[nearest]);
  }
  return images;
}

Eigen::Matrix3Xd averaged(const PointGroup& group, const Eigen::Matrix3Xd& positions,
                          const std::vector<std::vector<int>>& images) {
  Eigen::Matrix3Xd average = Eigen::Matrix3Xd::Zero(3, positions.cols());
  for (int g = 0; g < group.order(); ++g) {
    const Eigen::Matrix3d back = group.operations()[g].transpose();
    for (Eigen::Index i = 0; i < positions.cols(); ++i) {
      average.col(i) += back * positions.col(images[g][static_cast<std::size_t>(i)]);
    }
  }
  return average / group.order();
}

// The proper turn that takes the points nearest to their targets.
Eigen::Matrix3d turn_onto(const Eigen::Matrix3Xd& points, const Eigen::Matrix3Xd& targets) {
  const Eigen::JacobiSVD<Eigen::Matrix3d> svd(targets * points.transpose(),
                                              Eigen::ComputeFullU | Eigen::ComputeFullV);
  Eigen::Vector3d signs(1, 1, 1);
  if ((svd.matrixU() * svd.matrixV().transpose()).determinant() < 0) signs[2] = -1;
  return svd.matrixU() * signs.asDiagonal() * svd.matrixV().transpose();
}

}  // namespace

SymmetrisedPositions symmetrise(const PointGroup& group,
                                const Eigen::Ref<const Eigen::Matrix3Xd>& positions,
                                const Eigen::Matrix3d& rotation,
                                const std::vector<Eigen::Matrix3d>& held,
                                const std::vector<std::vector<int>>& held_images) {
  SymmetrisedPositions result{rotation, rotation * positions,
                              images_by_operation(group, rotation, held, held_images)};
  if (group.order() == 1) return result;
  constexpr int max_passes = 50;
  for (int pass = 0; pass < max_passes; ++pass) {
    const Eigen::Matrix3Xd turned = result.rotation * positions;
    result.positions = averaged(group, turned, result.images);
    const Eigen::Matrix3d turn = turn_onto(turned, result.positions);
    if ((turn - Eigen::Matrix3d::Identity()).cwiseAbs().maxCoeff() < 1e-15) break;
    result.rotation = turn * result.rotation;
  }
  // The average once more, so that positions and operations agree to the last bit that averaging
  // gives, whatever the last turn was.
  result.positions = averaged(group, result.rotation * positions, result.images);
  return result;
}

}  // namespace irrepwise
