// What the valence orbitals of each set of equivalent atoms span.
#pragma once

#include <string>
#include <vector>

#include "basis/basis.hpp"
#include "salc/local_frames.hpp"
#include "salc/projection.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {

/// Part of a set's orbitals: a whole shell, or functions that look alike from the centre. Of atoms
/// that bind side-on: p along the normal of the ligand's plane, p in that plane, and whole shells
/// of other kinds.
enum class Part {
  Shell,
  Sigma,
  Pi,
  PiInPlane,
  PiOutOfPlane,
  Delta,
  Phi,
  FacePi,
  FacePlane,
  FaceS,
  FaceD,
  FaceF
};

struct OrbitalReduction {
  int set = 0;  // index in the sets
  Part part = Part::Shell;
  std::vector<int> shells;  // of the representative, in the basis: the shell, or all that hold the
                            // part (they span the same)
  int orbitals = 0;         // of one shell, on the whole set: sum of times * dimension
  std::vector<int> times;   // by irrep of the group; a complex pair counts once
};

/// Each shell of each set; then, for sets with local frames, the parts they have. π is split where
/// the frames tell in-plane from out-of-plane.
///
/// @param frames  by set, see `local_frames`
/// @returns       in the order of the sets; the number of orbitals is checked for each
[[nodiscard]] std::vector<OrbitalReduction> orbital_reductions(
    const MolecularSymmetry& symmetry, const Basis& basis, const std::vector<EquivalentAtoms>& sets,
    const std::vector<std::optional<LocalFrames>>& frames);

/// Frames of every set: about the centre of the molecule, and further out along the bonds. Where
/// several metals are and none of them is the centre, along the bonds from the metals.
/// @returns  by set; all empty where the molecule has neither a centre nor several metals
[[nodiscard]] std::vector<std::optional<LocalFrames>> frames_of_sets(
    const MolecularSymmetry& symmetry, const std::vector<EquivalentAtoms>& sets);

/// The local functions of a part within a shell.
/// @returns  components in the order of the conventions, empty where the shell has none
[[nodiscard]] std::vector<int> part_components(Part part, int l);

/// The functions of a part on the representative, written in the standard frame.
[[nodiscard]] SiteFunctions part_functions(const PointGroup& group, const EquivalentAtoms& set,
                                           const LocalFrames& frames, Part part, int l);

/// @returns  for programs: "s" … "f" for a shell, "sigma", "pi", "pi_in_plane" …
[[nodiscard]] std::string part_key(Part part, int l);

/// @returns  for people: "σ", "π in plane" …; empty for a shell
[[nodiscard]] const char* part_name(Part part);

/// The parts of a shell, whole π where the frames do not split it.
[[nodiscard]] std::vector<Part> parts_of_shell(const LocalFrames& frames, int l);

}  // namespace irrepwise
