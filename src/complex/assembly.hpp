// A complex with everything fixed but the twists and hands of its ligands.
#pragma once

#include <string>
#include <vector>

#include <Eigen/Core>

#include "complex/body.hpp"
#include "complex/spec.hpp"

namespace irrepwise {

/// A ligand of one metal: its body, where it points, and what of its pose is still free.
struct Site {
  SeatedLigand seated;
  LigandBody body;
  int centre = 0;
  int kind = 0;                  // the same for ligands that may be images of each other
  Eigen::Vector3d along;         // unit vector from the metal
  std::vector<Pose> candidates;  // at least one; the only ones allowed
  bool any_twist = false;        // then any other twist is allowed too
  std::string words;             // "NH3 on vertex 2"
};

/// A ligand between both metals, in its final place.
struct PlacedBridge {
  const Ligand* ligand = nullptr;
  BridgeRequest request;
  std::vector<double> distances_angstrom;
  std::vector<Eigen::Vector3d> positions;  // atoms in the order of the library
  int kind = 0;
  std::string words;
};

struct Assembly {
  std::vector<Eigen::Vector3d> metals;  // the first at the origin
  std::vector<Site> sites;
  std::vector<PlacedBridge> bridges;
  int n_kinds = 0;
};

/// The second centre, where there is one, is placed so that both hold the bridges at their
/// distances: its polyhedron is then the mirror image of the one that the numbers describe, so that
/// equal numbers on both sides make mirror images.
///
/// @param complex  must live as long as the result, which points into its library
/// @throws Error   as `seat_ligands` and `make_body`; bridges that do not fit
[[nodiscard]] Assembly assemble(const ComplexSpec& complex);

}  // namespace irrepwise
