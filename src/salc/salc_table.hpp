// SALCs as tables of coefficients: over orbitals of the standard frame or of each atom's own frame.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <Eigen/Core>

#include "basis/basis.hpp"
#include "salc/orbital_reductions.hpp"

namespace irrepwise {

/// Whose axes orbitals are written in: the molecule's, or each atom's own; the latter is named by
/// σ and π or, where the atom binds side-on, by the plane of the ligand.
enum class OrbitalFrame { Standard, Local, SideOn };

[[nodiscard]] OrbitalFrame orbital_frame(const std::optional<LocalFrames>& frames);

/// One partner of one SALC.
struct SalcFunction {
  int set = 0;    // index in the sets
  int shell = 0;  // of the representative, in the basis
  Part part = Part::Shell;
  OrbitalFrame frame = OrbitalFrame::Standard;
  int irrep = 0;
  int number = 1;                // of the SALCs of this part and irrep
  int partner = 1;               // from 1
  std::vector<int> components;   // which orbitals of the shell the columns stand for
  Eigen::MatrixXd coefficients;  // `n_atoms of the set x n_components`; sum of squares 1
};

/// Orthonormal over orbitals taken as orthonormal; partners follow the group's fixed matrices, so
/// that partner r meets partner r of the central atom's functions. The largest coefficient of the
/// first partner is positive (of equal ones the first), and fixes the signs of the others.
///
/// @param frames  by set; a set without local frames is given in the standard one. Empty: all are
[[nodiscard]] std::vector<SalcFunction> salc_table(
    const MolecularSymmetry& symmetry, const Basis& basis, const std::vector<EquivalentAtoms>& sets,
    const std::vector<std::optional<LocalFrames>>& frames = {});

/// @returns  of an atom that binds side-on: "pπ" along the normal, "pr", "pt", "drn"
[[nodiscard]] std::string side_on_name(int l, int component);

/// @returns  "3pz" in the standard frame, "3s", "3pσ", "3pπx", "3dδxy" in the local one;
///           side-on "2pπ" along the normal, "2pr" and "2pt" in the plane, "3drn" of higher shells
[[nodiscard]] std::string salc_orbital_name(const Shell& shell, int component, OrbitalFrame frame);

}  // namespace irrepwise
