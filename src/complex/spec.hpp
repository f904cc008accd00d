// What the user says about a complex to build: metals, polyhedra, ligands on vertices, bridges.
#pragma once

#include <array>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include "complex/ligand.hpp"
#include "molecule/polyhedra.hpp"

namespace irrepwise {

/// Ligands of one name. Whatever is absent follows from the library, the radii and the symmetry.
struct LigandRequest {
  std::string ligand;
  // Numbers from 1. None: the lowest that are free. As many as the ligand has teeth, or a multiple,
  // which stands for several ligands; with `covers`, one π ligand lies over all of them.
  std::vector<int> vertices;
  bool covers = false;
  std::optional<int> denticity;
  std::optional<int> hapticity;
  std::optional<double> distance_angstrom;  // metal to donor atom
  std::optional<double> twist_degrees;      // about metal-ligand, see `reference_direction`
  std::optional<double> angle_degrees;      // metal-donor-next atom
  std::optional<double> bite_degrees;       // donor-metal-donor
  std::optional<bool> mirrored;             // the mirror image of the library's ligand
  std::string place;                        // for messages: "job.yaml:4:7"
};

struct CentreSpec {
  int atomic_number = 0;
  Polyhedron polyhedron = Polyhedron("OC-6");
  std::optional<int> oxidation;
  std::vector<LigandRequest> ligands;
  std::string place;
  std::string oxidation_place;
};

/// A ligand on a vertex of each of two centres.
struct BridgeRequest {
  std::string ligand;
  std::array<int, 2> vertices = {0, 0};
  std::array<std::optional<double>, 2> distances_angstrom;  // to each metal
  bool mirrored = false;  // atoms behind the donor on the other side of the plane with the metals
  std::string place;
};

struct ComplexSpec {
  std::vector<CentreSpec> centres;     // one, or two that share at least one bridge
  std::vector<BridgeRequest> bridges;  // one to three
  std::optional<double>
      bridge_angle_degrees;               // metal-donor-metal of a single bridge; 180 if absent
  std::optional<double> torsion_degrees;  // turn of the second centre about a single bridge
  int metal_metal_bond = 0;               // order of the bond between the two metals, as stated
  std::string metal_metal_bond_place;
  std::optional<int> charge;  // of the complex
  std::string charge_place;
  LigandLibrary library = built_in_ligands();
};

/// A change of a complex, for variants of it.
struct Substitution {
  std::optional<int> metal;  // atomic number
  std::optional<int> oxidation;
  std::optional<Polyhedron> polyhedron;
  std::vector<LigandRequest> ligands;  // each with the vertices that it takes over
  std::vector<std::pair<int, double>> distances_angstrom;  // vertex, metal-donor distance
  int centre = 0;                                          // which one, from 0
  std::string place;                                       // for messages
};

/// @returns  the complex with the ligands on the vertices named replaced; a ligand that loses one
/// of
///           its teeth leaves, and must be replaced on all its vertices. A new metal keeps the
///           oxidation state; a charge that was given for the whole follows where it can.
/// @throws Error  as `seat_ligands`; a vertex that nothing is on; no such centre
[[nodiscard]] ComplexSpec substituted(const ComplexSpec& complex, const Substitution& change);

/// One ligand with everything settled but its pose.
struct SeatedLigand {
  const Ligand* ligand = nullptr;  // in the library of the spec
  const Binding* binding = nullptr;
  LigandRequest request;  // with the vertices of this one ligand
};

/// Gives every vertex of a centre to exactly one ligand.
/// @param taken   vertices that bridges hold
/// @throws Error  unknown ligand, vertex out of range, used twice or left over, a denticity or
///                hapticity that the ligand lacks, a chelate across distant vertices; with the
///                place of the request
[[nodiscard]] std::vector<SeatedLigand> seat_ligands(const CentreSpec& centre,
                                                     const std::vector<int>& taken,
                                                     const LigandLibrary& library);

/// Largest angle between the two vertices of a chelate: what no small ring spans.
inline constexpr double widest_chelate_degrees = 125.0;

}  // namespace irrepwise
