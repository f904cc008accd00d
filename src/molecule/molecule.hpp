// The molecule: which atoms, where, with what charge.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

namespace irrepwise {

struct Atom {
  int atomic_number = 0;
  Eigen::Vector3d position = Eigen::Vector3d::Zero();  // Å
};

/// Atoms in the order of the input, with a charge. Always valid: at least one atom, known elements,
/// finite positions, no two atoms closer than `min_distance_angstrom`, a charge of at most 100 000.
class Molecule {
 public:
  static constexpr double min_distance_angstrom = 0.3;  // nearer atoms are a slip in the input

  /// @param atoms   positions in Å
  /// @param charge  in units of e
  /// @throws Error  if an invariant fails; the message names the atoms by number from 1
  Molecule(std::vector<Atom> atoms, int charge, std::string title = {});

  [[nodiscard]] const std::vector<Atom>& atoms() const noexcept { return atoms_; }
  [[nodiscard]] int size() const noexcept { return static_cast<int>(atoms_.size()); }
  [[nodiscard]] int charge() const noexcept { return charge_; }
  [[nodiscard]] const std::string& title() const noexcept { return title_; }

  /// @returns  the same molecule with other positions, Å, `3 x n_atoms`
  /// @throws Error  as the constructor
  [[nodiscard]] Molecule with_positions(const Eigen::Ref<const Eigen::Matrix3Xd>& positions) const;
  [[nodiscard]] Molecule with_charge(int charge) const;

  /// @returns  positions in Å, `3 x n_atoms`
  [[nodiscard]] Eigen::Matrix3Xd positions() const;

 private:
  std::vector<Atom> atoms_;
  int charge_;
  std::string title_;
};

/// @returns  the formula in Hill order, without the charge: carbon first and hydrogen second where
///           there is carbon, otherwise by symbol: "C6H6", "Cl4Pt"
[[nodiscard]] std::string hill_formula(const Molecule& molecule);

/// @returns  "Pt1": symbol and number from 1
[[nodiscard]] std::string atom_name(const Molecule& molecule, int atom);

/// What looks odd but may be meant, a sentence each: two atoms far nearer than their covalent
/// radii say, or all contacts so short that the coordinates look like bohr.
[[nodiscard]] std::vector<std::string> geometry_warnings(const Molecule& molecule);

/// @returns  whether the distance is at most 1.25 times the sum of the covalent radii, 1.15 times
/// for
///           two metals; where an element has no radius, whether it is below 3 Å
[[nodiscard]] bool are_bonded(const Molecule& molecule, int atom_a, int atom_b);

}  // namespace irrepwise
