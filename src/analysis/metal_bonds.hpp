// The bonds from a metal to its donors, sorted into types that a chemist would tell apart.
#pragma once

#include <string>
#include <vector>

#include "analysis/populations.hpp"

namespace irrepwise {

/// What stands across the metal: nothing, a donor of the same kind, or one of another kind.
enum class Opposite { None, Like, Other };

/// Of donors that are otherwise of one type, the nearer and the farther ones.
enum class BondLength { Alike, Short, Long };

/// "none", "like", "other"
[[nodiscard]] const char* opposite_word(Opposite opposite);

/// "alike", "short", "long"
[[nodiscard]] const char* length_word(BondLength length);

struct MetalBond {
  int donor = 0;  // index of the atom
  double overlap_population = 0.0;
  double distance_angstrom = 0.0;
};

struct BondType {
  std::string element;    // of the donor
  std::string ligand;     // formula of the ligand without the metal: "H3N"
  bool bridging = false;  // the donor binds another metal too
  Opposite opposite = Opposite::None;
  std::string opposite_element;  // "C"; "C, N" where they differ; empty where there is none
  BondLength length = BondLength::Alike;
  std::vector<MetalBond> bonds;  // by donor, ascending; at least one

  [[nodiscard]] double overlap_population() const;  // mean
  [[nodiscard]] double distance_angstrom() const;   // mean
};

/// Two places of donors lie across the metal from each other from this angle on. Below the axes of
/// a square pyramid, above the widest angles of polyhedra without opposite vertices (a ring of five
/// has 144 degrees). A choice of ours.
inline constexpr double opposite_degrees = 150.0;

/// A gap in the distances of one type that parts long from short bonds. A choice of ours.
inline constexpr double length_gap_angstrom = 0.05;

/// Donors of one type have the element and the ligand's formula in common, and whether a like
/// donor, another or none stands opposite; all or none of them bridge, and no gap parts their
/// distances. Donors that are equivalent about the metal therefore are of one type.
///
/// @param metal  of the d or f block, with or without a d shell
/// @returns  in the order of their first donors
[[nodiscard]] std::vector<BondType> bond_types(const MolecularSymmetry& symmetry,
                                               const Populations& populations, int metal);

/// @returns  formula of what hangs together with the donor when all metals are taken away
[[nodiscard]] std::string ligand_formula(const Molecule& molecule, int donor);

}  // namespace irrepwise
