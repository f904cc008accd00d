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

  [[nodiscard]] Eigen::Vector3d y_of(const EquivalentAtoms& set, const Eigen::Vector3d& z) const {
    const int atom = set.representative();
    const std::optional<int> previous = before(atom);
    const auto flat = bond_plane_normal(symmetry_.molecule, atom);
    Eigen::Vector3d y = Eigen::Vector3d::Zero();
    if (flat) {
      y = *flat;
    } else if (previous) {
      const Eigen::Matrix3d& frame = by_atom_[*previous];
      y = is_straight(z, frame.col(2)) ? Eigen::Vector3d(frame.col(1)) : z.cross(frame.col(2));
    }
    y -= y.dot(z) * z;
    return y.norm() < least_across ? first_y(symmetry_, set, z) : y.normalized();
  }

  [[nodiscard]] LocalFrames of_set(const EquivalentAtoms& set) const {
    std::vector<Eigen::Vector3d> wishes;
    for (const int atom : set.atoms) {
      const std::optional<int> previous = before(atom);
      wishes.push_back(previous ? Eigen::Vector3d(by_atom_[*previous].col(1))
                                : Eigen::Vector3d::Zero());
    }
    const Eigen::Vector3d z = z_of(set.representative());
    LocalFrames local = carried_frames(symmetry_, set, y_of(set, z), z, wishes);
    local.beyond_donors = true;
    return local;
  }

  static constexpr double least_across = 0.1;  // a shorter y would be along z

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
