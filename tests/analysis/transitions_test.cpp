#include "analysis/transitions.hpp"

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/molecules.hpp"
#include "support/run.hpp"

using namespace irrepwise;

TEST_CASE("benzene's frontier transition e1g to e2u is dipole-allowed in the plane") {
  // e1g x e2u = b1u + b2u + e1u, and e1u holds x and y: Cotton (from memory).
  const Run benzene = run(test_molecule("benzene").molecule);
  const auto transitions = frontier_transitions(benzene.symmetry.group, benzene.levels);
  REQUIRE(!transitions.empty());
  const Transition& first = transitions.front();
  CHECK(first.from == benzene.levels.frontier.homo.value());
  CHECK(first.to == benzene.levels.frontier.lumo.value());
  CHECK(
      level_label(benzene.symmetry.group.irreps()[benzene.levels.levels[first.from].irrep].label) ==
      "e1g");
  CHECK(first.rule.dipole_axes == std::vector<std::string>{"x", "y"});
  CHECK_FALSE(first.rule.two_photon);
  CHECK(open_levels(benzene.symmetry.group, benzene.levels).empty());
}

TEST_CASE("a d9 octahedron has a 2Eg term and distorts along its eg modes") {
  // Jahn and Teller's theorem; the octahedral hexahalides have one eg vibration (common practice).
  const Molecule hexafluoride = test_molecule("sulfur hexafluoride").molecule;
  const MolecularSymmetry symmetry = find_symmetry(hexafluoride);
  const auto ground = ground_terms(symmetry, find_terms(symmetry.group, {{"Eg", 3}}));
  REQUIRE(ground.size() == 1);
  CHECK(ground[0].term == Term{2, "Eg", 2, 1});
  CHECK(ground[0].distortion.kind == DistortionKind::JahnTeller);
  CHECK(ground[0].distortion.modes == Reduction{{"Eg", 2, 1}});
}

TEST_CASE("dioxygen's open shell is pig^2 with a triplet Sigma ground term") {
  // Herzberg; common practice.
  HueckelOptions triplet;
  triplet.multiplicity = 3;
  const Run dioxygen = run(test_molecule("dioxygen").molecule, triplet);
  const auto open = open_levels(dioxygen.symmetry.group, dioxygen.levels);
  REQUIRE(open.size() == 1);
  CHECK(open[0].label == "Pig");
  CHECK(open[0].electrons == 2);
  const auto ground = ground_terms(dioxygen.symmetry, find_terms(dioxygen.symmetry.group, open));
  REQUIRE(ground.size() == 1);
  CHECK(term_text(ground[0].term) == "3Sigmag-");
  CHECK(ground[0].distortion.kind == DistortionKind::None);
}
