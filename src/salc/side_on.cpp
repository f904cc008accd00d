#include "salc/side_on.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>

#include "molecule/bonded_atoms.hpp"
#include "salc/bond_plane.hpp"

namespace irrepwise {
namespace {

constexpr double least_rise = 0.5;    // cos 60°, between the normal and the bond to the metal
constexpr double least_across = 0.1;  // a shorter direction is no direction

bool contains(const std::vector<int>& atoms, int atom) {
  return std::find(atoms.begin(), atoms.end(), atom) != atoms.end();
}

// The one metal to which an atom other than hydrogen is bonded.
std::optional<int> only_metal(const Molecule& molecule, const std::vector<int>& metals, int atom) {
  if (molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number == 1) return std::nullopt;
  if (contains(metals, atom)) return std::nullopt;
  std::optional<int> found;
  for (const int metal : metals) {
    if (!are_bonded(molecule, metal, atom)) continue;
    if (found) return std::nullopt;
    found = metal;
  }
  return found;
}

class Face {
 public:
  Face(const Molecule& molecule, const std::vector<int>& metals, int metal)
      : molecule_(molecule), metals_(metals), metal_(metal) {}

  // Atoms bonded to this one that are bonded to the metal as well, and to no other.
  [[nodiscard]] std::vector<int> beside(int atom) const {
    std::vector<int> neighbours;
    for (const int other : bonded_atoms(molecule_, atom)) {
      if (only_metal(molecule_, metals_, other) == metal_) neighbours.push_back(other);
    }
    return neighbours;
  }

  [[nodiscard]] std::vector<int> connected(int atom) const {
    std::vector<int> atoms = {atom};
    for (std::size_t i = 0; i < atoms.size(); ++i) {
      for (const int next : beside(atoms[i])) {
        if (!contains(atoms, next)) atoms.push_back(next);
      }
    }
    return atoms;
  }

  // The frame's z and x; nothing where the metal is not above the plane.
  [[nodiscard]] std::optional<SideOn> at(int atom) const {
    const std::vector<Eigen::Vector3d> bonds = directions(atom, beside(atom));
    if (bonds.empty()) return std::nullopt;
    Eigen::Vector3d inward = Eigen::Vector3d::Zero();
    for (const Eigen::Vector3d& bond : bonds) inward += bond;
    const Eigen::Vector3d to_metal = direction(atom, metal_);

    Eigen::Vector3d z;
    if (const auto normal = common_normal(bonds)) {
      z = *normal;
    } else {
      const auto flat = common_normal(directions(atom, ligand_neighbours(atom)));
      const Eigen::Vector3d wish = flat ? *flat : to_metal;
      z = across(wish, bonds.front());
    }
    if (z.norm() < least_across) return std::nullopt;
    z.normalize();
    if (z.dot(to_metal) < 0.0) z = -z;
    if (z.dot(to_metal) < least_rise) return std::nullopt;
    Eigen::Vector3d x = across(inward, z);
    x = x.norm() < least_across ? Eigen::Vector3d(Eigen::Vector3d::Zero()) : x.normalized();
    return SideOn{metal_, z, x};
  }

 private:
  static Eigen::Vector3d across(const Eigen::Vector3d& wish, const Eigen::Vector3d& unit) {
    return wish - wish.dot(unit) * unit;
  }

  [[nodiscard]] Eigen::Vector3d direction(int from, int to) const {
    return (molecule_.atoms()[static_cast<std::size_t>(to)].position -
            molecule_.atoms()[static_cast<std::size_t>(from)].position)
        .normalized();
  }

  [[nodiscard]] std::vector<Eigen::Vector3d> directions(int from,
                                                        const std::vector<int>& others) const {
    std::vector<Eigen::Vector3d> list;
    for (const int other : others) list.push_back(direction(from, other));
    return list;
  }

  [[nodiscard]] std::vector<int> ligand_neighbours(int atom) const {
    std::vector<int> list;
    for (const int other : bonded_atoms(molecule_, atom)) {
      if (!contains(metals_, other)) list.push_back(other);
    }
    return list;
  }

  const Molecule& molecule_;
  const std::vector<int>& metals_;
  int metal_;
};

}  // namespace

std::optional<SideOn> side_on(const Molecule& molecule, const std::vector<int>& metals, int atom) {
  const std::optional<int> metal = only_metal(molecule, metals, atom);
  if (!metal) return std::nullopt;
  const Face face(molecule, metals, *metal);
  for (const int member : face.connected(atom)) {
    if (!face.at(member)) return std::nullopt;
  }
  return face.at(atom);
}

}  // namespace irrepwise
