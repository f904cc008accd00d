#include "salc/outer_frames.hpp"

#include <algorithm>
#include <cstddef>
#include <utility>

#include <Eigen/Geometry>

#include "salc/bond_plane.hpp"

namespace irrepwise {
namespace {

constexpr int unreached = -1;

// The number of bonds from an atom to each other one along the shortest way.
std::vector<int> bonds_away(const Molecule& molecule, int from) {
  std::vector<int> distance(static_cast<std::size_t>(molecule.size()), unreached);
  distance[from] = 0;
  std::vector<int> reached = {from};
  for (std::size_t i = 0; i < reached.size(); ++i) {
    for (const int next : bonded_atoms(molecule, reached[i])) {
      if (distance[next] != unreached) continue;
      distance[next] = distance[reached[i]] + 1;
      reached.push_back(next);
    }
  }
  return distance;
}

class Outward {
 public:
  Outward(const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets, int centre)
      : symmetry_(symmetry),
        sets_(sets),
        centre_(centre),
        distance_(bonds_away(symmetry.molecule, centre)),
        by_atom_(static_cast<std::size_t>(symmetry.molecule.size())) {}

  std::vector<std::optional<LocalFrames>> frames(std::vector<std::optional<LocalFrames>> found) {
    for (std::size_t s = 0; s < sets_.size(); ++s) {
      if (found[s]) remember(sets_[s], *found[s]);
    }
    const int furthest = *std::max_element(distance_.begin(), distance_.end());
    for (int distance = 2; distance <= furthest; ++distance) {
      for (std::size_t s = 0; s < sets_.size(); ++s) {
        if (distance_[sets_[s].representative()] != distance) continue;
        found[s] = of_set(sets_[s]);
        remember(sets_[s], *found[s]);
      }
    }
    return found;
  }

 private:
  void remember(const EquivalentAtoms& set, const LocalFrames& frames) {
    for (std::size_t i = 0; i < set.atoms.size(); ++i) by_atom_[set.atoms[i]] = frames.frames[i];
  }

  [[nodiscard]] const Eigen::Vector3d& position(int atom) const {
    return symmetry_.molecule.atoms()[atom].position;
  }

  [[nodiscard]] std::vector<int> nearer_atoms(int atom) const {
    std::vector<int> nearer;
    for (const int other : bonded_atoms(symmetry_.molecule, atom)) {
      if (distance_[other] == distance_[atom] - 1) nearer.push_back(other);
    }
    return nearer;
  }

  // The only atom that is one bond nearer.
  [[nodiscard]] std::optional<int> before(int atom) const {
    const std::vector<int> nearer = nearer_atoms(atom);
    return nearer.size() == 1 ? std::optional(nearer.front()) : std::nullopt;
  }

  [[nodiscard]] Eigen::Vector3d z_of(int atom) const {
    constexpr double between_angstrom = 0.1;  // an atom in the middle has no side to point to
    Eigen::Vector3d goal = Eigen::Vector3d::Zero();
    const std::vector<int> nearer = nearer_atoms(atom);
    for (const int other : nearer) goal += position(other) / static_cast<double>(nearer.size());
    if ((goal - position(atom)).norm() < between_angstrom) goal = position(centre_);
    return (goal - position(atom)).normalized();
  }

  // The normal of the plane that the ligand makes at the atom, if it makes one.
  [[nodiscard]] std::optional<Eigen::Vector3d> normal_at(int atom, const Eigen::Vector3d& z) const {
    const std::optional<int> previous = before(atom);
    Eigen::Vector3d normal = Eigen::Vector3d::Zero();
    if (const auto flat = bond_plane_normal(symmetry_.molecule, atom)) {
      normal = *flat;
    } else if (previous && !is_straight(z, by_atom_[*previous].col(2))) {
      normal = z.cross(by_atom_[*previous].col(2));
    }
    normal -= normal.dot(z) * z;
    if (normal.norm() < least_across) return std::nullopt;
    return normal.normalized();
  }

  // Whether x is nearer to the direction than y is, in the frames of the atoms before.
  [[nodiscard]] bool is_x_before(int atom, const Eigen::Vector3d& direction) const {
    constexpr double tie = 1e-6;
    double x_less_y = 0.0;
    for (const int other : nearer_atoms(atom)) {
      const Eigen::Vector3d parts = by_atom_[other].transpose() * direction;
      x_less_y += parts.x() * parts.x() - parts.y() * parts.y();
    }
    return x_less_y > tie;
  }

  [[nodiscard]] Eigen::Vector3d y_of(const EquivalentAtoms& set, const Eigen::Vector3d& z) const {
    const int atom = set.representative();
    if (const auto normal = normal_at(atom, z)) {
      return is_x_before(atom, *normal) ? Eigen::Vector3d(z.cross(*normal)) : *normal;
    }
    const std::optional<int> previous = before(atom);
    if (!previous) return first_y(symmetry_, set, z);
    const Eigen::Vector3d y = by_atom_[*previous].col(1);
    return (y - y.dot(z) * z).normalized();
  }

  [[nodiscard]] LocalFrames of_set(const EquivalentAtoms& set) const {
    std::vector<Eigen::Matrix3d> wishes;
    for (const int atom : set.atoms) {
      const std::optional<int> previous = before(atom);
      wishes.push_back(previous ? by_atom_[*previous] : Eigen::Matrix3d::Zero());
    }
    const Eigen::Vector3d z = z_of(set.representative());
    LocalFrames local = carried_frames(symmetry_, set, y_of(set, z), z, wishes);
    local.beyond_donors = true;
    return local;
  }

  static constexpr double least_across = 0.1;  // a shorter normal would be along z

  const MolecularSymmetry& symmetry_;
  const std::vector<EquivalentAtoms>& sets_;
  int centre_;
  std::vector<int> distance_;             // by atom
  std::vector<Eigen::Matrix3d> by_atom_;  // of atoms that have one so far
};

}  // namespace

std::vector<std::optional<LocalFrames>> with_outer_frames(
    const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets, int central_atom,
    std::vector<std::optional<LocalFrames>> frames) {
  return Outward(symmetry, sets, central_atom).frames(std::move(frames));
}

}  // namespace irrepwise
