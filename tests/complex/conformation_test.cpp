#include "complex/conformation.hpp"

#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "complex/build.hpp"
#include "complex/skeleton.hpp"
#include "core/error.hpp"
#include "support/complexes.hpp"

using namespace irrepwise;

namespace {

std::string group_of(const ComplexSpec& spec) { return build_complex(spec).point_group; }

}  // namespace

TEST_CASE("two trimethylphosphanes side by side are turned together where one alone cannot pass") {
  // cis-Bis(trimethylphosphane) complexes with a small chelate are common (common practice).
  ComplexSpec spec = spec_of("Pd", "SP-4", 2, {});
  spec.centres[0].ligands = {on("OAc", {1, 2}), on("PMe3", {3, 4})};
  spec.centres[0].ligands[0].denticity = 2;
  const BuiltComplex built = build_complex(spec);
  CHECK(built.centres[0].electrons.total == 16);
}

TEST_CASE("complexes come out in their textbook groups") {
  // Common practice; the conformation is the most symmetric one that the ligands allow.
  struct Row {
    const char* metal;
    const char* polyhedron;
    int oxidation;
    std::vector<std::string> ligands;
    const char* group;
  };
  const std::vector<Row> rows = {
      {"Fe", "L-2", 2, {"Cp", "Cp"}, "D5h"},  // eclipsed as in the gas
      {"Cr", "L-2", 0, {"C6H6", "C6H6"}, "D6h"},
      {"U", "L-2", 4, {"C8H8", "C8H8"}, "D8h"},
      {"V", "L-2", 0, {"Cp", "C7H7"}, "Cs"},
      {"Fe", "OC-6", 2, {"OH2", "OH2", "OH2", "OH2", "OH2", "OH2"}, "Th"},
      {"Co", "OC-6", 3, {"NH3", "NH3", "NH3", "NH3", "NH3", "NH3"}, "D3d"},
      {"Co", "OC-6", 3, {"en", "en", "en"}, "D3"},
      {"Ru", "OC-6", 2, {"bpy", "bpy", "bpy"}, "D3"},
      {"Cr", "OC-6", 3, {"acac", "acac", "acac"}, "D3"},
      {"Ni", "SP-4", 2, {"dithiolene", "dithiolene"}, "D2h"},
      {"Pt", "SP-4", 2, {"NH3", "NH3", "Cl", "Cl"}, "C2v"},
      {"Pt", "SP-4", 2, {"NH3", "Cl", "NH3", "Cl"}, "C2h"},
      {"Pt", "SP-4", 2, {"C2H4", "Cl", "Cl", "Cl"}, "C2v"},
      {"Ni", "T-4", 0, {"PF3", "PF3", "PF3", "PF3"}, "Td"},
      {"Ni", "T-4", 0, {"PMe3", "PMe3", "PMe3", "PMe3"}, "Td"},
      {"Ti", "T-4", 4, {"CH3", "CH3", "CH3", "CH3"}, "Td"},
      {"Cr", "OC-6", 0, {"CO", "CO", "CO", "CO", "CO", "PH3"}, "Cs"},
      {"Au", "L-2", 1, {"PH3", "CH3"}, "C3v"},
      {"Hg", "L-2", 2, {"CH3", "CH3"}, "D3h"}};
  for (const Row& row : rows) {
    const ComplexSpec spec = spec_of(row.metal, row.polyhedron, row.oxidation, row.ligands);
    const BuiltComplex built = build_complex(spec);
    CAPTURE(built.how);
    CHECK(built.point_group == row.group);
    // What was made exact was rounding only.
    CHECK(built.largest_shift_angstrom < 1e-3);
  }
}

TEST_CASE("a twist that was asked for is kept, and lowers the group") {
  ComplexSpec spec = spec_of("Fe", "L-2", 2, {"Cp", "Cp"});
  spec.centres[0].ligands[0].twist_degrees = 0.0;   // left free, this ring would follow the other
  spec.centres[0].ligands[1].twist_degrees = 36.0;  // staggered
  BuiltComplex built = build_complex(spec);
  CHECK(built.point_group == "D5d");
  CHECK(std::abs(built.ligands[1].twist_degrees - 36.0) < 1e-9);
  spec.centres[0].ligands[0].twist_degrees = 0.0;
  spec.centres[0].ligands[1].twist_degrees = 10.0;  // neither: no plane is left
  CHECK(group_of(spec) == "D5");
}

TEST_CASE("either hand of a chelate can be asked for, and mirror images agree") {
  ComplexSpec spec = spec_of("Co", "OC-6", 3, {"en", "en", "en"});
  std::vector<std::string> groups;
  for (const bool mirrored : {false, true}) {
    for (LigandRequest& request : spec.centres[0].ligands) request.mirrored = mirrored;
    groups.push_back(group_of(spec));
  }
  CHECK(groups == std::vector<std::string>{"D3", "D3"});  // lel3 and ob3
  spec.centres[0].ligands[0].mirrored = false;
  CHECK(group_of(spec) == "C2");  // lel2ob or lelob2
}

TEST_CASE("hands of ligands go with improper operations") {
  // Six donors with three different substituents, one hand on a face and the other hand opposite:
  // no mirror plane or twofold axis can hold, the inversion and the threefold axis can: S6.
  ComplexSpec spec = spec_of("Zr", "OC-6", 4, {});
  spec.library = built_in_ligands().extended_by(parse_ligands(
      "ligands:\n  NHFCl:\n    charge: 0\n    binding: [{donors: [[1]], electrons: 2}]\n"
      "    atoms:\n      - [N, 0, 0, 0]\n      - [H, 0.96, 0, 0.34]\n"
      "      - [F, -0.65, 1.13, 0.46]\n      - [Cl, -0.83, -1.44, 0.59]\n",
      "chiral.yaml"));
  LigandRequest twisted = on("NHFCl", {1});
  twisted.twist_degrees = 40.0;  // which the others must follow
  LigandRequest same_hand = on("NHFCl", {2, 3});
  LigandRequest other_hand = on("NHFCl", {4, 5, 6});
  twisted.mirrored = same_hand.mirrored = false;
  other_hand.mirrored = true;
  spec.centres[0].ligands = {twisted, same_hand, other_hand};
  CHECK(group_of(spec) == "S6");
}

TEST_CASE("subgroups of the octahedral skeleton are as many as in the literature") {
  // Oh has 98 subgroups, in 33 classes: common knowledge of group theory.
  const ComplexSpec spec = spec_of("Co", "OC-6", 3, {"NH3", "NH3", "NH3", "NH3", "NH3", "NH3"});
  const SkeletonGroup group = skeleton_group(assemble(spec), {27});
  CHECK(group.order() == 48);
  const std::vector<std::vector<int>> all = subgroups_largest_first(group);
  CHECK(all.size() == 98);
  CHECK(all.front().size() == 48);
  CHECK(all.back().size() == 1);
}

TEST_CASE("ligands that cannot avoid each other are refused by name") {
  ComplexSpec spec = spec_of("Ni", "OC-6", 2, {"C6H6", "C6H6", "NH3", "NH3", "NH3", "NH3"});
  try {
    (void)build_complex(spec);
    FAIL("accepted");
  } catch (const Error& error) {
    const std::string message = error.what();
    CAPTURE(message);
    CHECK(message.find("C6H6 on vertex 1") != std::string::npos);
    CHECK(message.find(" clash: atoms come as near as ") != std::string::npos);
  }
}
