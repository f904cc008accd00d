#include "complex/body.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/complexes.hpp"

using namespace irrepwise;

TEST_CASE("only the donors of a binding are at the distance of donors") {
  // A flat ring bound by some of its atoms must lean, or all of them would be bound alike: the
  // library may claim no hapticity that its geometry does not have.
  constexpr int iron = 26;
  for (const Ligand& ligand : built_in_ligands().ligands()) {
    for (const Binding& binding : ligand.bindings) {
      const std::string& name = ligand.name;
      const int hapticity = binding.hapticity();
      CAPTURE(name);
      CAPTURE(hapticity);
      SeatedLigand seated{&ligand, &binding, on(ligand.name, {1})};
      const LigandBody body = make_body(seated, iron);
      std::vector<bool> is_donor(ligand.atoms.size(), false);
      double farthest_donor = 0.0;
      for (const std::vector<int>& tooth : binding.teeth) {
        for (const int donor : tooth) {
          const auto i = static_cast<std::size_t>(donor);
          is_donor[i] = true;
          farthest_donor = std::max(farthest_donor, body.atoms[i].position.norm());
        }
      }
      for (std::size_t i = 0; i < body.atoms.size(); ++i) {
        if (!is_donor[i]) CHECK(body.atoms[i].position.norm() > farthest_donor + 0.15);
      }
    }
  }
}

TEST_CASE("donors of one tooth lie at one distance from the metal, their middle on the axis") {
  constexpr int iron = 26;
  for (const char* name : {"Cp", "C6H6", "C3H5", "C4H6", "C2H4", "H2"}) {
    CAPTURE(name);
    const Ligand& ligand = built_in_ligands().find(name);
    SeatedLigand seated{&ligand, &ligand.bindings.front(), on(name, {1})};
    const LigandBody body = make_body(seated, iron);
    Eigen::Vector3d middle = Eigen::Vector3d::Zero();
    for (const int donor : ligand.bindings.front().teeth[0]) {
      const Eigen::Vector3d& r = body.atoms[static_cast<std::size_t>(donor)].position;
      CHECK(std::abs(r.norm() - body.distances_angstrom[0]) < 0.01);
      middle += r;
    }
    CHECK(std::hypot(middle.x(), middle.y()) < 1e-9);
    CHECK(middle.z() > 0.0);
  }
}

TEST_CASE("a ring that is wider than the distance allows is refused") {
  const Ligand& ligand = built_in_ligands().find("C8H8");
  SeatedLigand seated{&ligand, &ligand.bindings.front(), on("C8H8", {1})};
  seated.request.distance_angstrom = 1.8;
  CHECK_THROWS_WITH_AS(
      static_cast<void>(make_body(seated, 26)),
      "C8H8 cannot have all its donors at 1.800 Å from the metal; they are farther "
      "apart than that allows, give more than 1.942 Å",
      Error);
}

TEST_CASE("options that a ligand has no use for are refused") {
  const auto refusal = [](const std::string& name, LigandRequest request) {
    const Ligand& ligand = built_in_ligands().find(name);
    const SeatedLigand seated{&ligand, &ligand.bindings.front(), std::move(request)};
    try {
      (void)make_body(seated, 27);
    } catch (const Error& error) {
      return std::string(error.what());
    }
    return std::string("accepted");
  };
  LigandRequest twisted = on("en", {1, 2});
  twisted.twist_degrees = 30.0;
  CHECK(
      refusal("en", twisted) ==
      "en holds on with two teeth and cannot be twisted; `mirrored: true` gives its mirror image");
  LigandRequest bent = on("NH3", {1});
  bent.angle_degrees = 100.0;
  CHECK(refusal("NH3", bent) ==
        "`angle` is for a ligand with one atom behind the donor; NH3 has 3");
  LigandRequest biting = on("Cl", {1});
  biting.bite_degrees = 80.0;
  CHECK(refusal("Cl", biting) == "Cl has one tooth here and no bite");
}
