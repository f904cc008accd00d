// What symmetry allows: electronic transitions and Jahn-Teller distortions.
#pragma once

#include <string>
#include <vector>

#include "symmetry/point_group.hpp"
#include "symmetry/reduction.hpp"

namespace irrepwise {

struct TransitionRule {
  std::vector<std::string> dipole_axes;  // of "x", "y", "z": the light's polarisations; empty where
                                         // forbidden
  bool two_photon = false;  // Raman- or two-photon-active: a quadratic function connects
                            // the two
};

/// One-electron transition between two levels; spin is not considered.
/// @throws Error  for an unknown irrep
[[nodiscard]] TransitionRule transition_rule(const PointGroup& group, const std::string& from,
                                             const std::string& to);

enum class DistortionKind {
  None,         // the term is not degenerate
  Atom,         // it is, but a single atom has no vibration
  JahnTeller,   // a non-linear molecule distorts along one of the modes
  RennerTeller  // linear molecules are exempt from the theorem; bending splits the term in 2nd
                // order
};

struct TermDistortion {
  DistortionKind kind = DistortionKind::None;
  Reduction modes;  // counts as they occur in this molecule's vibrations
};

/// Which vibrations lower the energy of a degenerate term: of the irreps in its symmetric square,
/// but the totally symmetric one, those that the molecule's vibrations have. Linear molecules: the
/// bending modes. Spin-orbit coupling is not considered.
///
/// @param term        irrep of the term
/// @param vibrations  as from `displacement_irreps`
/// @throws Error      for an unknown irrep
/// @source            Jahn and Teller, Proc. R. Soc. A 161, 220 (1937); Renner, Z. Phys. 92, 172
/// (1934)
[[nodiscard]] TermDistortion term_distortion(const PointGroup& group, const std::string& term,
                                             const Reduction& vibrations);

}  // namespace irrepwise
