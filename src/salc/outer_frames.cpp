#include "salc/outer_frames.hpp"

#include <algorithm>
#include <cstddef>
#include <utility>

#include <Eigen/Geometry>

#include "molecule/bonded_atoms.hpp"
#include "molecule/metals.hpp"
#include "salc/bond_plane.hpp"
#include "salc/side_on.hpp"

namespace irrepwise {
namespace {

constexpr int unreached = -1;

// The number of bonds from the nearest start to each atom along the shortest way.
std::vector<int> bonds_away(const Molecule& molecule, std::vector<int> reached) {
  std::vector<int> distance(static_cast<std::size_t>(molecule.size()), unreached);
  for (const int start : reached) distance[start] = 0;
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
  Outward(const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets,
          const std::vector<int>& starts, const std::optional<Centre>& centre)
      : symmetry_(symmetry),
        sets_(sets),
        several_starts_(starts.size() > 1),
        centre_(centre),
        metals_(metals_of_complex(symmetry.molecule)),
        distance_(bonds_away(symmetry.molecule, starts)),
        by_atom_(static_cast<std::size_t>(symmetry.molecule.size())) {}

  std::vector<std::optional<LocalFrames>> frames(std::vector<std::optional<LocalFrames>> found) {
    for (std::size_t s = 0; s < sets_.size(); ++s) {
      if (distance_[sets_[s].representative()] == 0 && found[s]) remember(sets_[s], *found[s]);
    }
    const int furthest = *std::max_element(distance_.begin(), distance_.end());
    for (int distance = 1; distance <= furthest; ++distance) {
      for (std::size_t s = 0; s < sets_.size(); ++s) {
        if (distance_[sets_[s].representative()] != distance) continue;
        if (auto face = of_face(sets_[s])) {
          found[s] = std::move(face);
        } else if (distance > 1 || several_starts_) {
          found[s] = of_set(sets_[s]);
        }
        if (found[s]) remember(sets_[s], *found[s]);
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

  // The frame of the only atom that is one bond nearer.
  [[nodiscard]] std::optional<Eigen::Matrix3d> frame_before(int atom) const {
    const std::vector<int> nearer = nearer_atoms(atom);
    return nearer.size() == 1 ? by_atom_[nearer.front()] : std::nullopt;
  }

  [[nodiscard]] std::optional<Eigen::Vector3d> z_of(int atom) const {
    constexpr double between_angstrom = 0.1;  // an atom in the middle has no side to point to
    Eigen::Vector3d goal = Eigen::Vector3d::Zero();
    const std::vector<int> nearer = nearer_atoms(atom);
    for (const int other : nearer) goal += position(other) / static_cast<double>(nearer.size());
    if ((goal - position(atom)).norm() < between_angstrom) {
      if (!centre_ || (centre_->position - position(atom)).norm() < between_angstrom) {
        return std::nullopt;
      }
      goal = centre_->position;
    }
    return (goal - position(atom)).normalized();
  }

  // The normal of the plane that the ligand makes at the atom, if it makes one.
  [[nodiscard]] std::optional<Eigen::Vector3d> normal_at(int atom, const Eigen::Vector3d& z) const {
    const std::optional<Eigen::Matrix3d> previous = frame_before(atom);
    Eigen::Vector3d normal = Eigen::Vector3d::Zero();
    if (const auto flat = bond_plane_normal(symmetry_.molecule, atom)) {
      normal = *flat;
    } else if (previous && !is_straight(z, previous->col(2))) {
      normal = z.cross(previous->col(2));
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
      if (!by_atom_[other]) continue;
      const Eigen::Vector3d parts = by_atom_[other]->transpose() * direction;
      x_less_y += parts.x() * parts.x() - parts.y() * parts.y();
    }
    return x_less_y > tie;
  }

  [[nodiscard]] Eigen::Vector3d y_of(const EquivalentAtoms& set, const Eigen::Vector3d& z) const {
    const int atom = set.representative();
    if (const auto normal = normal_at(atom, z)) {
      return is_x_before(atom, *normal) ? Eigen::Vector3d(z.cross(*normal)) : *normal;
    }
    const std::optional<Eigen::Matrix3d> previous = frame_before(atom);
    if (!previous) return first_y(symmetry_, set, z);
    const Eigen::Vector3d y = previous->col(1);
    return (y - y.dot(z) * z).normalized();
  }

  [[nodiscard]] std::optional<LocalFrames> of_set(const EquivalentAtoms& set) const {
    const std::optional<Eigen::Vector3d> z = z_of(set.representative());
    if (!z) return std::nullopt;
    const bool donors = distance_[set.representative()] == 1;
    std::vector<Eigen::Matrix3d> wishes(set.atoms.size(), Eigen::Matrix3d::Zero());
    for (std::size_t i = 0; i < wishes.size() && !donors; ++i) {
      if (const auto previous = frame_before(set.atoms[i])) wishes[i] = *previous;
    }
    const Eigen::Vector3d y = donors ? first_y(symmetry_, set, *z) : y_of(set, *z);
    LocalFrames local = carried_frames(symmetry_, set, y, *z, wishes);
    local.beyond_donors = !donors;
    local.to_own_metal = donors;
    return local;
  }

  [[nodiscard]] std::optional<LocalFrames> of_face(const EquivalentAtoms& set) const {
    const auto bound = side_on(symmetry_.molecule, metals_, set.representative());
    if (!bound || distance_[bound->metal] != distance_[set.representative()] - 1) {
      return std::nullopt;
    }
    const Eigen::Vector3d& z = bound->z;
    const bool has_x = !bound->x.isZero();
    const Eigen::Vector3d y =
        has_x ? Eigen::Vector3d(z.cross(bound->x)) : first_y(symmetry_, set, z);
    std::vector<Eigen::Matrix3d> wishes(set.atoms.size(), Eigen::Matrix3d::Zero());
    if (has_x) wishes.front() << bound->x, y, z;  // keeps the sign
    LocalFrames local = carried_frames(symmetry_, set, y, z, wishes);
    local.side_on = true;
    return local;
  }

  static constexpr double least_across = 0.1;  // a shorter normal would be along z

  const MolecularSymmetry& symmetry_;
  const std::vector<EquivalentAtoms>& sets_;
  bool several_starts_;
  const std::optional<Centre>& centre_;
  std::vector<int> metals_;
  std::vector<int> distance_;                            // by atom
  std::vector<std::optional<Eigen::Matrix3d>> by_atom_;  // of atoms that have one so far
};

}  // namespace

std::vector<std::optional<LocalFrames>> with_outer_frames(
    const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets,
    const std::vector<int>& starts, const std::optional<Centre>& centre,
    std::vector<std::optional<LocalFrames>> frames) {
  return Outward(symmetry, sets, starts, centre).frames(std::move(frames));
}

}  // namespace irrepwise
