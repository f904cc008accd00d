#include "molecule/molecule.hpp"

#include <cassert>
#include <cstddef>
#include <map>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "molecule/element.hpp"
#include "molecule/pairs.hpp"

namespace irrepwise {
namespace {

std::string numbered(const std::vector<Atom>& atoms, int index) {
  return fmt::format("{} ({})", index + 1,
                     element_symbol(atoms[static_cast<std::size_t>(index)].atomic_number));
}

// So that counting electrons cannot overflow; what charge makes sense depends on the parameters.
int checked_charge(int charge) {
  constexpr int largest = 100000;
  if (charge >= -largest && charge <= largest) return charge;
  throw Error(fmt::format("found a charge of {}, expected {} to {}", charge, -largest, largest));
}

}  // namespace

Molecule::Molecule(std::vector<Atom> atoms, int charge, std::string title)
    : atoms_(std::move(atoms)), charge_(checked_charge(charge)), title_(std::move(title)) {
  if (atoms_.empty()) throw Error("a molecule needs at least one atom");
  for (std::size_t i = 0; i < atoms_.size(); ++i) {
    const int z = atoms_[i].atomic_number;
    if (z < 1 || z > max_atomic_number) {
      throw Error(
          fmt::format("atom {}: atomic number {}, expected 1 to {}", i + 1, z, max_atomic_number));
    }
    // Beyond this a squared distance could overflow, and no molecule is a metre long.
    constexpr double farthest = 1e10;  // Å
    if (!(atoms_[i].position.cwiseAbs().maxCoeff() < farthest) || !atoms_[i].position.allFinite()) {
      throw Error(fmt::format("atom {}: coordinates must be finite and below {} Å", i + 1, 1e10));
    }
  }
  for (const NearPair& pair : near_pairs(atoms_, min_distance_angstrom)) {
    if (pair.distance_angstrom >= min_distance_angstrom) continue;
    throw Error(
        fmt::format("atoms {} and {} are {:.3f} Å apart, expected at least {} Å; remove a double "
                    "atom, or check the unit of the coordinates",
                    numbered(atoms_, pair.a), numbered(atoms_, pair.b), pair.distance_angstrom,
                    min_distance_angstrom));
  }
}

Molecule Molecule::with_positions(const Eigen::Ref<const Eigen::Matrix3Xd>& positions) const {
  assert(positions.cols() == size());
  std::vector<Atom> moved = atoms_;
  for (std::size_t i = 0; i < moved.size(); ++i) {
    moved[i].position = positions.col(static_cast<Eigen::Index>(i));
  }
  return Molecule(std::move(moved), charge_, title_);
}

Molecule Molecule::with_charge(int charge) const {
  Molecule changed = *this;
  changed.charge_ = checked_charge(charge);
  return changed;
}

Eigen::Matrix3Xd Molecule::positions() const {
  Eigen::Matrix3Xd positions(3, size());
  for (std::size_t i = 0; i < atoms_.size(); ++i) {
    positions.col(static_cast<Eigen::Index>(i)) = atoms_[i].position;
  }
  return positions;
}

std::string hill_formula(const Molecule& molecule) {
  std::map<std::string_view, int> counts;  // by symbol, which is Hill's order without carbon
  for (const Atom& atom : molecule.atoms()) ++counts[element_symbol(atom.atomic_number)];
  std::string formula;
  const auto take = [&](std::string_view symbol) {
    const auto found = counts.find(symbol);
    if (found == counts.end()) return;
    formula += symbol;
    if (found->second > 1) formula += std::to_string(found->second);
    counts.erase(found);
  };
  if (counts.contains("C")) {
    take("C");
    take("H");
  }
  while (!counts.empty()) take(counts.begin()->first);
  return formula;
}

std::string atom_name(const Molecule& molecule, int atom) {
  assert(atom >= 0 && atom < molecule.size());
  return fmt::format("{}{}",
                     element_symbol(molecule.atoms()[static_cast<std::size_t>(atom)].atomic_number),
                     atom + 1);
}

}  // namespace irrepwise
