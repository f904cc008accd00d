#include "salc/local_frames.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <cstddef>
#include <tuple>

#include <Eigen/Geometry>

#include "molecule/bonded_atoms.hpp"
#include "molecule/metals.hpp"
#include "salc/bond_plane.hpp"
#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

constexpr int least_neighbours = 2;  // fewer make no centre
constexpr double same = 1e-6;        // of unit vectors; coordinates are exact here
constexpr double in_plane_angstrom = 1e-4;
constexpr double least_across = 1e-3;  // a shorter direction would be along z

bool fixes_one_point(Family family) {
  switch (family) {
    case Family::C1:
    case Family::Cs:
    case Family::Cn:
    case Family::Cnv:
    case Family::Cinfv:
      return false;
    case Family::Ci:
    case Family::Cnh:
    case Family::Dn:
    case Family::Dnh:
    case Family::Dnd:
    case Family::S2n:
    case Family::T:
    case Family::Td:
    case Family::Th:
    case Family::O:
    case Family::Oh:
    case Family::I:
    case Family::Ih:
    case Family::Dinfh:
    case Family::Kh:
      return true;
  }
  return false;
}

bool is_kept(const MolecularSymmetry& symmetry, int atom) {
  return std::all_of(symmetry.images.begin(), symmetry.images.end(),
                     [&](const std::vector<int>& images) { return images[atom] == atom; });
}

using Bonds = std::vector<std::vector<int>>;  // by atom: the atoms bonded to it

Bonds all_bonds(const Molecule& molecule) {
  Bonds bonds;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    bonds.push_back(bonded_atoms(molecule, atom));
  }
  return bonds;
}

// How many pieces its neighbours are in when an atom is taken away.
int pieces_around(const Bonds& bonds, std::size_t atom) {
  std::vector<bool> seen(bonds.size(), false);
  seen[atom] = true;
  int pieces = 0;
  for (const int first : bonds[atom]) {
    if (seen[static_cast<std::size_t>(first)]) continue;
    ++pieces;
    std::vector<int> piece = {first};
    seen[static_cast<std::size_t>(first)] = true;
    for (std::size_t i = 0; i < piece.size(); ++i) {
      for (const int next : bonds[static_cast<std::size_t>(piece[i])]) {
        if (seen[static_cast<std::size_t>(next)]) continue;
        seen[static_cast<std::size_t>(next)] = true;
        piece.push_back(next);
      }
    }
  }
  return pieces;
}

// Whether an atom that is no metal joins what is around it, and is not a member of a ring: of every
// neighbour a piece of its own stays when it is taken away. At the one point that the group keeps
// it may belong to several rings, one on each side (a spiro atom).
bool holds_together(const Bonds& bonds, std::size_t atom, bool at_one_point) {
  const int pieces = pieces_around(bonds, atom);
  return pieces == static_cast<int>(bonds[atom].size()) || (at_one_point && pieces > 1);
}

int atoms_in_plane(const Molecule& molecule, const Eigen::Vector3d& point,
                   const Eigen::Vector3d& normal) {
  return static_cast<int>(
      std::count_if(molecule.atoms().begin(), molecule.atoms().end(), [&](const Atom& atom) {
        return std::abs(normal.dot(atom.position - point)) < in_plane_angstrom;
      }));
}

// The sign for which the first component from z over y to x that is not zero is positive.
Eigen::Vector3d upwards(const Eigen::Vector3d& direction) {
  for (const int i : {2, 1, 0}) {
    if (std::abs(direction[i]) > same) return direction[i] < 0.0 ? -direction : direction;
  }
  return direction;
}

// More is better, compared from the first entry on.
using Merit = std::array<double, 4>;
bool better(const Merit& a, const Merit& b) {
  for (std::size_t i = 0; i < a.size(); ++i) {
    if (std::abs(a[i] - b[i]) > same) return a[i] > b[i];
  }
  return false;
}

Eigen::Matrix3d frame_of(const Eigen::Vector3d& y, const Eigen::Vector3d& z) {
  Eigen::Matrix3d frame;
  frame << y.cross(z), y, z;
  return frame;
}

// 2 where x and y are those wished for, -2 where both are opposite, 0 for no wish.
double nearness_to(const Eigen::Matrix3d& wish, const Eigen::Matrix3d& frame) {
  return wish.col(0).dot(frame.col(0)) + wish.col(1).dot(frame.col(1));
}

// The mirror plane that makes "in plane" mean something: σh, or the plane of a planar molecule.
std::optional<Eigen::Vector3d> normal_of_plane(const MolecularSymmetry& symmetry) {
  const Family family = symmetry.group.symbol().family;
  const bool has_sigma_h = family == Family::Cs || family == Family::Cnh || family == Family::Dnh;
  const Eigen::Vector3d point = symmetry.molecule.atoms().front().position;
  for (const Eigen::Matrix3d& g : symmetry.group.operations()) {
    const SymmetryOperation operation = classify_operation(g);
    if (operation.kind != OperationKind::Reflection || !symmetry.group.symbol().is_finite())
      continue;
    if (atoms_in_plane(symmetry.molecule, point, operation.axis) == symmetry.molecule.size()) {
      return operation.axis;
    }
  }
  if (has_sigma_h) return Eigen::Vector3d(Eigen::Vector3d::UnitZ());
  return std::nullopt;
}

}  // namespace

std::optional<Centre> find_centre(const MolecularSymmetry& symmetry) {
  const Molecule& molecule = symmetry.molecule;
  const bool one_point = fixes_one_point(symmetry.group.symbol().family);
  const std::vector<int> metals = metals_of_complex(molecule);
  const Bonds bonds = all_bonds(molecule);
  std::optional<int> best;
  std::tuple<bool, int, int> best_merit = {false, -1, 0};
  for (int atom = 0; atom < molecule.size(); ++atom) {
    if (!is_kept(symmetry, atom)) continue;
    const auto at = static_cast<std::size_t>(atom);
    const int neighbours = static_cast<int>(bonds[at].size());
    if (!one_point && neighbours < least_neighbours) continue;
    const bool metal = std::find(metals.begin(), metals.end(), atom) != metals.end();
    if (!metal && !holds_together(bonds, at, one_point)) continue;
    const std::tuple merit = {metal, neighbours, molecule.atoms()[atom].atomic_number};
    if (merit == best_merit) best.reset();  // two alike: neither is the centre
    if (merit <= best_merit) continue;
    best = atom;
    best_merit = merit;
  }
  if (best) return Centre{molecule.atoms()[*best].position, best};
  if (one_point) return Centre{};
  return std::nullopt;
}

Eigen::Vector3d first_y(const MolecularSymmetry& symmetry, const EquivalentAtoms& set,
                        const Eigen::Vector3d& z) {
  const Eigen::Vector3d at = symmetry.molecule.atoms()[set.representative()].position;
  std::optional<Eigen::Vector3d> best;
  Merit best_merit{};
  for (const int g : set.site_group) {
    const SymmetryOperation operation = classify_operation(symmetry.group.operations()[g]);
    if (operation.kind != OperationKind::Reflection) continue;
    const Eigen::Vector3d normal = operation.axis;
    if (std::abs(normal.dot(z)) > same) continue;
    const double across_principal = std::abs(normal[2]) > 1.0 - same ? 1.0 : 0.0;
    const int in_plane = atoms_in_plane(symmetry.molecule, at, normal);
    const double molecular_plane = in_plane == symmetry.molecule.size() ? 1.0 : 0.0;
    const Merit merit = {std::max(across_principal, molecular_plane), double(in_plane),
                         std::abs(normal[1]), std::abs(normal[0])};
    if (!best || better(merit, best_merit)) {
      best = upwards(normal);
      best_merit = merit;
    }
  }
  if (best) return *best;
  if (const auto flat = bond_plane_normal(symmetry.molecule, set.representative())) {
    const Eigen::Vector3d across = *flat - flat->dot(z) * z;
    if (across.norm() > least_across) return upwards(across.normalized());
  }
  for (const int i : {2, 1}) {
    const Eigen::Vector3d wish = Eigen::Vector3d::Unit(i);
    const Eigen::Vector3d across = wish - wish.dot(z) * z;
    if (across.norm() > least_across) return across.normalized();
  }
  return Eigen::Vector3d::UnitX();
}

std::optional<LocalFrames> local_frames(const MolecularSymmetry& symmetry,
                                        const EquivalentAtoms& set, const Centre& centre) {
  const Molecule& molecule = symmetry.molecule;
  if (centre.atom == set.representative()) return std::nullopt;
  if (centre.atom && !are_bonded(molecule, *centre.atom, set.representative())) return std::nullopt;
  const Eigen::Vector3d at = molecule.atoms()[set.representative()].position;
  constexpr double at_centre_angstrom = 1e-4;  // an atom there has no line to the centre
  if ((centre.position - at).norm() < at_centre_angstrom) return std::nullopt;
  const Eigen::Vector3d z = (centre.position - at).normalized();
  const std::vector<Eigen::Matrix3d> no_wishes(set.atoms.size(), Eigen::Matrix3d::Zero());
  return carried_frames(symmetry, set, first_y(symmetry, set, z), z, no_wishes);
}

LocalFrames carried_frames(const MolecularSymmetry& symmetry, const EquivalentAtoms& set,
                           const Eigen::Vector3d& y, const Eigen::Vector3d& z,
                           const std::vector<Eigen::Matrix3d>& wishes) {
  const double nearness = nearness_to(wishes.front(), frame_of(y, z));
  const bool decides = std::abs(nearness) > same;
  const Eigen::Vector3d first = !decides ? upwards(y) : nearness < 0.0 ? Eigen::Vector3d(-y) : y;
  const Eigen::Vector3d x = frame_of(first, z).col(0);

  LocalFrames local;
  for (std::size_t i = 0; i < set.atoms.size(); ++i) {
    std::optional<Eigen::Matrix3d> best;
    Merit best_merit{};
    for (int g = 0; g < symmetry.group.order(); ++g) {
      if (symmetry.images[g][set.representative()] != set.atoms[i]) continue;
      const Eigen::Matrix3d& operation = symmetry.group.operations()[g];
      const Eigen::Vector3d atom_z = operation * z;
      const Eigen::Vector3d atom_y = atom_z.cross(operation * x);
      const Eigen::Matrix3d frame = frame_of(atom_y, atom_z);
      const Merit merit = {nearness_to(wishes[i], frame), atom_y[2], atom_y[1], atom_y[0]};
      if (!best || better(merit, best_merit)) {
        best = frame;
        best_merit = merit;
      }
    }
    local.frames.push_back(*best);
  }

  const auto normal = normal_of_plane(symmetry);
  local.in_plane = normal && std::all_of(local.frames.begin(), local.frames.end(),
                                         [&](const Eigen::Matrix3d& frame) {
                                           return normal->cross(frame.col(1)).norm() < same;
                                         });
  return local;
}

}  // namespace irrepwise
