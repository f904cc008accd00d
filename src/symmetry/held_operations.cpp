#include "symmetry/held_operations.hpp"

#include <algorithm>
#include <cmath>
#include <optional>
#include <set>
#include <unordered_map>

#include <Eigen/Eigenvalues>
#include <Eigen/Geometry>
#include <Eigen/LU>
#include <Eigen/SVD>

#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

Eigen::Matrix3Xd centred(const Molecule& molecule) {
  Eigen::Matrix3Xd positions = molecule.positions();
  positions.colwise() -= positions.rowwise().mean().eval();
  return positions;
}

// Atoms that may be images of each other: same element, same distance from the centroid. Distances
// are chained, so that no true image is lost where many lie close together.
std::vector<std::vector<int>> candidate_sets(const Molecule& molecule,
                                             const std::vector<int>& kinds,
                                             const Eigen::Matrix3Xd& positions, double tolerance) {
  std::vector<int> order(molecule.size());
  for (int i = 0; i < molecule.size(); ++i) order[i] = i;
  const auto sort_of = [&](int i) {
    return std::pair(molecule.atoms()[i].atomic_number, kinds.empty() ? 0 : kinds[i]);
  };
  const Eigen::VectorXd radius = positions.colwise().norm();
  std::sort(order.begin(), order.end(), [&](int a, int b) {
    if (sort_of(a) != sort_of(b)) return sort_of(a) < sort_of(b);
    return radius[a] != radius[b] ? radius[a] < radius[b] : a < b;
  });
  std::vector<std::vector<int>> sets;
  for (int atom : order) {
    const bool joins = !sets.empty() && are_alike(molecule, kinds, sets.back().back(), atom) &&
                       radius[atom] - radius[sets.back().back()] <= tolerance;
    if (joins) {
      sets.back().push_back(atom);
    } else {
      sets.push_back({atom});
    }
  }
  return sets;
}

// How sharply two atoms set a frame about the centroid, Å: the smaller of their distances from it
// times the sine of the angle between them.
double sharpness(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  const double longer = std::max(a.norm(), b.norm());
  return longer < 1e-6 ? 0.0 : a.cross(b).norm() / longer;
}

struct ReferencePair {
  int a = 0;
  int b = 0;
  std::size_t set_a = 0;
  std::size_t set_b = 0;
};

// The pair whose sets give fewest candidates among those that set a frame sharply, as errors of
// the two atoms grow with the distance of the others over the sharpness.
std::optional<ReferencePair> reference_pair(const std::vector<std::vector<int>>& sets,
                                            const Eigen::Matrix3Xd& positions) {
  std::vector<std::pair<double, ReferencePair>> pairs;
  double sharpest = 0.0;
  for (std::size_t i = 0; i < sets.size(); ++i) {
    for (std::size_t j = 0; j < sets.size(); ++j) {
      for (int b : sets[j]) {
        const int a = sets[i].front();
        // The first atom sets a direction, which errors turn the more the nearer it is.
        if (positions.col(a).norm() < 0.5 * positions.col(b).norm()) continue;
        const double sharp = sharpness(positions.col(a), positions.col(b));
        sharpest = std::max(sharpest, sharp);
        pairs.push_back({sharp, {a, b, i, j}});
      }
    }
  }
  const auto cost = [&](const ReferencePair& pair) {
    return sets[pair.set_a].size() * sets[pair.set_b].size();
  };
  std::optional<ReferencePair> best;
  double best_sharp = 0.0;
  for (const auto& [sharp, pair] : pairs) {
    if (sharp < 1e-3 || sharp < 0.4 * sharpest) continue;
    const bool better = !best || cost(pair) < cost(*best) ||
                        (cost(pair) == cost(*best) && sharp > best_sharp + 1e-6);
    if (better) {
      best = pair;
      best_sharp = sharp;
    }
  }
  return best;
}

// Right-handed frame with x along a and b in the xy plane.
Eigen::Matrix3d pair_frame(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  Eigen::Matrix3d frame;
  frame.col(0) = a.normalized();
  frame.col(2) = a.cross(b).normalized();
  frame.col(1) = frame.col(2).cross(frame.col(0));
  return frame;
}

// The orthogonal matrix of given handedness that takes the positions nearest to their images
// (Kabsch's solution by singular values).
Eigen::Matrix3d best_fit(const Eigen::Matrix3Xd& positions, const std::vector<int>& images,
                         int handedness) {
  Eigen::Matrix3d covariance = Eigen::Matrix3d::Zero();
  for (Eigen::Index i = 0; i < positions.cols(); ++i) {
    covariance += positions.col(images[static_cast<std::size_t>(i)]) * positions.col(i).transpose();
  }
  const Eigen::JacobiSVD<Eigen::Matrix3d> svd(covariance, Eigen::ComputeFullU | Eigen::ComputeFullV);
  Eigen::Vector3d signs(1, 1, 1);
  const double natural = (svd.matrixU() * svd.matrixV().transpose()).determinant();
  if (natural * handedness < 0) signs[2] = -1;
  return svd.matrixU() * signs.asDiagonal() * svd.matrixV().transpose();
}

class Matcher {
 public:
  Matcher(const Eigen::Matrix3Xd& positions, const std::vector<std::vector<int>>& sets,
          double tolerance)
      : positions_(positions), tolerance_(tolerance) {
    // Along a generic direction, so that symmetric atoms lie apart on it.
    direction_ = Eigen::Vector3d(0.642, 0.531, 0.553).normalized();
    height_ = direction_.transpose() * positions;
    for (const std::vector<int>& set : sets) {
      std::vector<int> sorted = set;
      std::sort(sorted.begin(), sorted.end(),
                [&](int a, int b) { return height_[a] < height_[b]; });
      sets_.push_back(std::move(sorted));
    }
  }

  // The operation fitted to the atoms, or nothing where it does not hold.
  [[nodiscard]] std::optional<HeldOperation> held(const Eigen::Matrix3d& rough) const {
    const int handedness = determinant_sign(rough);
    // The rough matrix rests on two atoms and carries their errors to all others; the reach
    // allows for that, the tolerance itself is applied to the fitted operation.
    std::optional<std::vector<int>> images = match(rough, 6.0 * tolerance_ + 1e-6);
    HeldOperation operation{rough, {}, 0.0};
    for (int pass = 0; pass < 3 && images; ++pass) {
      const bool settled = operation.images == *images;
      if (settled) break;
      operation.images = *images;
      operation.matrix = best_fit(positions_, operation.images, handedness);
      images = match(operation.matrix, 2.0 * tolerance_ + 1e-6);
    }
    if (!images) return std::nullopt;
    for (Eigen::Index i = 0; i < positions_.cols(); ++i) {
      const double distance = (operation.matrix * positions_.col(i) -
                               positions_.col(operation.images[static_cast<std::size_t>(i)]))
                                  .norm();
      operation.displacement = std::max(operation.displacement, distance);
    }
    if (operation.displacement > tolerance_) return std::nullopt;
    return operation;
  }

 private:
  // One-to-one, each to the nearest atom of its candidate set within reach.
  [[nodiscard]] std::optional<std::vector<int>> match(const Eigen::Matrix3d& matrix,
                                                      double reach) const {
    std::vector<int> images(static_cast<std::size_t>(positions_.cols()), -1);
    std::vector<bool> taken(images.size(), false);
    for (const std::vector<int>& set : sets_) {
      for (int atom : set) {
        const Eigen::Vector3d target = matrix * positions_.col(atom);
        const double height = direction_.dot(target);
        int nearest = -1;
        double nearest_squared = reach * reach;
        auto at = std::lower_bound(set.begin(), set.end(), height - reach,
                                   [&](int other, double value) { return height_[other] < value; });
        for (; at != set.end() && height_[*at] <= height + reach; ++at) {
          const int other = *at;
          const double squared = (positions_.col(other) - target).squaredNorm();
          if (squared <= nearest_squared) {
            nearest = other;
            nearest_squared = squared;
          }
        }
        if (nearest < 0 || taken[nearest]) return std::nullopt;
        taken[nearest] = true;
        images[atom] = nearest;
      }
    }
    return images;
  }

  const Eigen::Matrix3Xd& positions_;
  double tolerance_;
  Eigen::Vector3d direction_;
  Eigen::RowVectorXd height_;           // of each atom along the direction
  std::vector<std::vector<int>> sets_;  // candidate sets, each from low to high
};

}  // namespace

Eigen::Vector3d best_line(const Molecule& molecule) {
  const Eigen::Matrix3Xd positions = centred(molecule);
  const Eigen::SelfAdjointEigenSolver<Eigen::Matrix3d> solver(positions * positions.transpose());
  return solver.eigenvectors().col(2);
}

Shape molecular_shape(const Molecule& molecule, double tolerance_angstrom) {
  if (molecule.size() == 1) return Shape::SingleAtom;
  const Eigen::Matrix3Xd positions = centred(molecule);
  const Eigen::Vector3d line = best_line(molecule);
  for (Eigen::Index i = 0; i < positions.cols(); ++i) {
    const Eigen::Vector3d position = positions.col(i);
    if ((position - line.dot(position) * line).norm() > tolerance_angstrom) return Shape::General;
  }
  return Shape::Linear;
}

bool are_alike(const Molecule& molecule, const std::vector<int>& kinds, int atom_a, int atom_b) {
  return molecule.atoms()[atom_a].atomic_number == molecule.atoms()[atom_b].atomic_number &&
         (kinds.empty() || kinds[atom_a] == kinds[atom_b]);
}

std::vector<HeldOperation> find_held_operations(const Molecule& molecule,
                                                const std::vector<int>& kinds,
                                                double tolerance_angstrom) {
  const Eigen::Matrix3Xd positions = centred(molecule);
  const auto sets = candidate_sets(molecule, kinds, positions, tolerance_angstrom);
  const Matcher matcher(positions, sets, tolerance_angstrom);

  HeldOperation identity{Eigen::Matrix3d::Identity(), {}, 0.0};
  for (int i = 0; i < molecule.size(); ++i) identity.images.push_back(i);
  std::vector<HeldOperation> operations = {identity};

  const auto pair = reference_pair(sets, positions);
  if (!pair) return operations;
  const Eigen::Vector3d a = positions.col(pair->a), b = positions.col(pair->b);
  // The longer of the two sets the x axis, as the error of a direction is that of the atom over its
  // distance.
  const bool swapped = b.norm() > a.norm();
  const auto frame_of = [&](const Eigen::Vector3d& first, const Eigen::Vector3d& second) {
    return swapped ? pair_frame(second, first) : pair_frame(first, second);
  };
  const Eigen::Matrix3d from = frame_of(a, b);
  const double length = (a - b).norm();
  const double slack = 2.0 * tolerance_angstrom + 1e-9;

  std::set<std::pair<std::vector<int>, int>> known = {{identity.images, 1}};
  for (int image_a : sets[pair->set_a]) {
    for (int image_b : sets[pair->set_b]) {
      const Eigen::Vector3d to_a = positions.col(image_a), to_b = positions.col(image_b);
      if (std::abs((to_a - to_b).norm() - length) > slack) continue;
      if (sharpness(to_a, to_b) < 0.2 * sharpness(a, b)) continue;
      const Eigen::Matrix3d to = frame_of(to_a, to_b);
      for (int handedness : {1, -1}) {
        const Eigen::Matrix3d rough =
            to * Eigen::Vector3d(1, 1, handedness).asDiagonal() * from.transpose();
        auto operation = matcher.held(rough);
        if (operation && known.insert({operation->images, handedness}).second) {
          operations.push_back(std::move(*operation));
        }
      }
    }
  }
  return operations;
}

std::vector<int> partial_products(const Molecule& molecule,
                                  const std::vector<HeldOperation>& operations) {
  // Two atoms not on one line with the centroid tell operations apart; which two does not matter.
  const Eigen::Matrix3Xd positions = centred(molecule);
  Eigen::Index atom_a = 0, atom_b = 0;
  positions.colwise().norm().maxCoeff(&atom_a);
  double largest_area = -1.0;
  for (Eigen::Index i = 0; i < positions.cols(); ++i) {
    const double area = positions.col(atom_a).cross(positions.col(i)).norm();
    if (area > largest_area) {
      largest_area = area;
      atom_b = i;
    }
  }
  const auto key = [&](int image_a, int image_b, int handedness) {
    return (static_cast<long>(image_a) * molecule.size() + image_b) * 2 + (handedness > 0 ? 1 : 0);
  };
  std::unordered_map<long, int> index;
  std::vector<int> handedness;
  for (std::size_t g = 0; g < operations.size(); ++g) {
    handedness.push_back(determinant_sign(operations[g].matrix));
    index[key(operations[g].images[atom_a], operations[g].images[atom_b], handedness.back())] =
        static_cast<int>(g);
  }
  const std::size_t size = operations.size();
  std::vector<int> products(size * size, -1);
  for (std::size_t g = 0; g < size; ++g) {
    for (std::size_t h = 0; h < size; ++h) {
      const auto found = index.find(key(operations[g].images[operations[h].images[atom_a]],
                                        operations[g].images[operations[h].images[atom_b]],
                                        handedness[g] * handedness[h]));
      if (found != index.end()) products[g * size + h] = found->second;
    }
  }
  return products;
}

}  // namespace irrepwise
