// Coordination compounds.
#include <cmath>
#include <numbers>

#include "support/molecules_parts.hpp"
#include "support/shapes.hpp"

namespace {

using Eigen::Vector3d;
using shapes::bond_end, shapes::ring, shapes::Seed;

const Vector3d origin = Vector3d::Zero();
const Vector3d x = Vector3d::UnitX();
const Vector3d y = Vector3d::UnitY();
const Vector3d z = Vector3d::UnitZ();
const Vector3d diagonal = Vector3d::Ones().normalized();

// Seeds of a linear diatomic ligand along a direction from the metal at the origin.
void add_ligand(std::vector<Seed>& seeds, std::string_view donor, std::string_view end,
                const Vector3d& direction, double metal_donor, double donor_end) {
  const Vector3d unit = direction.normalized();
  seeds.push_back({donor, metal_donor * unit});
  seeds.push_back({end, (metal_donor + donor_end) * unit});
}

void add_carbonyl(std::vector<Seed>& seeds, const Vector3d& direction, double metal_carbon) {
  add_ligand(seeds, "C", "O", direction, metal_carbon, 1.14);
}

void add_cyanide(std::vector<Seed>& seeds, const Vector3d& direction, double metal_carbon) {
  add_ligand(seeds, "C", "N", direction, metal_carbon, 1.15);
}

TestMolecule carbonyl(const std::string& name, const std::string& group, std::string_view metal,
                      const std::vector<std::pair<Vector3d, double>>& directions) {
  std::vector<Seed> seeds = {{metal, origin}};
  for (const auto& [direction, distance] : directions) add_carbonyl(seeds, direction, distance);
  return by_orbits(name, group, 0, seeds);
}

TestMolecule cyanide(const std::string& name, const std::string& group, std::string_view metal,
                     int charge, const Vector3d& direction, double distance) {
  std::vector<Seed> seeds = {{metal, origin}};
  add_cyanide(seeds, direction, distance);
  return by_orbits(name, group, charge, seeds);
}

std::vector<TestMolecule> carbonyls_and_cyanides() {
  std::vector<Seed> chloride = {{"Mn", origin}, {"Cl", 2.37 * z}};
  add_carbonyl(chloride, -z, 1.80);
  add_carbonyl(chloride, bond_end(origin, z, 1.0, 88.0, x), 1.89);

  std::vector<Seed> hydride = {{"Co", origin}, {"H", 1.56 * z}};
  add_carbonyl(hydride, -z, 1.76);
  add_carbonyl(hydride, bond_end(origin, z, 1.0, 80.3, x), 1.82);

  // The second metal is the image of the first: ligands are counted from there.
  const Vector3d manganese = 1.45 * z;
  std::vector<Seed> dimer = {{"Mn", manganese}, {"C", 3.26 * z}, {"O", 4.40 * z}};
  dimer.push_back({"C", bond_end(manganese, z, 1.86, 94.0, x)});
  dimer.push_back({"O", bond_end(manganese, z, 3.00, 94.0, x)});

  const Vector3d ruthenium = shapes::polygon_radius(3, 2.854) * x;
  const double out = 49.0;  // half the angle between the two equatorial carbonyls
  const std::vector<Seed> cluster = {{"Ru", ruthenium},
                                     {"C", ruthenium + 1.94 * z},
                                     {"O", ruthenium + 3.08 * z},
                                     {"C", bond_end(ruthenium, x, 1.92, out, y)},
                                     {"O", bond_end(ruthenium, x, 3.06, out, y)}};
  return {
      carbonyl("tetracarbonylnickel", "Td", "Ni", {{diagonal, 1.838}}),
      carbonyl("pentacarbonyliron", "D3h", "Fe", {{x, 1.827}, {z, 1.807}}),
      carbonyl("hexacarbonylchromium", "Oh", "Cr", {{z, 1.914}}),
      by_orbits("pentacarbonylchloromanganese", "C4v", 0, chloride),
      by_orbits("tetracarbonylhydridocobalt", "C3v", 0, hydride),
      by_orbits("decacarbonyldimanganese", "D4d", 0, dimer),
      by_orbits("dodecacarbonyltriruthenium", "D3h", 0, cluster),
      cyanide("tetracyanonickelate(II)", "D4h", "Ni", -2, x, 1.86),
      cyanide("hexacyanoferrate(II)", "Oh", "Fe", -4, z, 1.92),
      cyanide("hexacyanoferrate(III)", "Oh", "Fe", -3, z, 1.94),  // one hole in t2g
      cyanide("octacyanomolybdate(IV), square antiprism", "D4d", "Mo", -4,
              bond_end(origin, z, 1.0, 59.3, x), 2.16),
      by_orbits("octafluorozirconate(IV), dodecahedron", "D2d", -4,
                {{"Zr", origin},
                 {"F", bond_end(origin, z, 2.18, 36.9, x)},
                 {"F", bond_end(origin, z, 2.05, 110.5, x)}}),
  };
}

// Octahedra MA4B2 and MA3B3 with A carbonyl or cyanide, B halide.
std::vector<TestMolecule> isomers() {
  std::vector<Seed> cis = {{"Mo", origin}, {"Cl", 2.52 * Vector3d(0, 1, 1).normalized()}};
  add_carbonyl(cis, Vector3d(0, 1, -1), 1.95);
  add_carbonyl(cis, x, 2.02);
  std::vector<Seed> trans = {{"Mo", origin}, {"Cl", 2.52 * z}};
  add_carbonyl(trans, x, 2.00);
  std::vector<Seed> mer = {{"Co", origin}, {"F", 1.90 * z}, {"F", 1.88 * y}};
  add_cyanide(mer, -z, 1.87);
  add_cyanide(mer, x, 1.90);
  // A facial set of three lies on a cone of arccos(1/sqrt 3) about the threefold axis.
  const double cone = std::acos(1.0 / std::numbers::sqrt3) * 180.0 / std::numbers::pi;
  std::vector<Seed> fac = {{"Co", origin}, {"F", bond_end(origin, z, 1.88, cone, x)}};
  add_cyanide(fac, bond_end(origin, -z, 1.0, cone, -x), 1.88);
  const Vector3d ammine = 2.03 * Vector3d(0, 1, 1).normalized();
  return {
      by_orbits("cis-tetracarbonyldichloromolybdate(0)", "C2v", -2, cis),
      by_orbits("trans-tetracarbonyldichloromolybdate(0)", "D4h", -2, trans),
      by_orbits("mer-tricyanotrifluorocobaltate(III)", "C2v", -3, mer),
      by_orbits("fac-tricyanotrifluorocobaltate(III)", "C3v", -3, fac),
      by_orbits("cis-diamminedichloroplatinum(II)", "C2v", 0,
                {{"Pt", origin},
                 {"Cl", 2.33 * Vector3d(0, 1, -1).normalized()},
                 {"N", ammine},
                 {"H", bond_end(ammine, ammine, 1.02, 70.0, z)},
                 {"H", bond_end(ammine, ammine, 1.02, 70.0, z, 120.0)}}),
      by_orbits("trans-dibromodichloroplatinate(II)", "D2h", -2,
                {{"Pt", origin}, {"Cl", 2.31 * x}, {"Br", 2.44 * y}}),
      by_orbits(
          "bromochloroiodohydridoplatinate(II)", "Cs", -2,
          {{"Pt", origin}, {"H", 1.60 * x}, {"Cl", 2.33 * y}, {"Br", -2.50 * x}, {"I", -2.60 * y}}),
      by_atoms("six different ligands on platinum(IV)", "C1", -2,
               {{"Pt", origin},
                {"F", 1.93 * x},
                {"Cl", 2.31 * y},
                {"Br", 2.45 * z},
                {"I", -2.63 * x},
                {"H", -1.58 * y},
                {"Li", -2.55 * z}}),
      // Three unlike pairs, each bent away from the axes: the inversion alone is left.
      by_orbits("trans pairs on platinum(IV), bent", "Ci", -2,
                {{"Pt", origin},
                 {"F", {1.90, 0.20, 0.13}},
                 {"Cl", {0.25, 2.30, -0.17}},
                 {"Br", {-0.21, 0.33, 2.42}}}),
  };
}

TestMolecule zeise_anion() {
  const Vector3d carbon(0, 0.6875, 2.02);
  const Vector3d back = Vector3d(0, 1.0, 0.25).normalized();  // hydrogens bent away from the metal
  return by_orbits("trichloro(ethylene)platinate(II)", "C2v", -1,
                   {{"Pt", origin},
                    {"Cl", -2.34 * z},
                    {"Cl", 2.30 * x},
                    {"C", carbon},
                    {"H", bond_end(carbon, back, 1.08, 58.0, x)}});
}

TestMolecule tris_ethylenediamine_cobalt() {
  // One chelate ring about the x axis (C2): donors on octahedral sites, carbons turned against
  // them.
  const Vector3d nitrogen(1.440, -0.7147, 1.137);
  const auto about_x = [](double distance, double radius, double degrees) {
    const Vector3d across = ring(radius, degrees, 0);
    return Vector3d(distance, across.x(), across.y());
  };
  const Vector3d carbon = about_x(2.72, 0.76, 150.2);
  const Vector3d other_carbon = about_x(2.72, 0.76, 150.2 + 180.0);
  const auto [ch1, ch2] = shapes::two_bond_ends(carbon, nitrogen, other_carbon, 1.09, 108.5);
  const auto [nh1, nh2] = shapes::two_bond_ends(nitrogen, origin, carbon, 1.02, 107.0);
  return by_orbits("tris(ethylenediamine)cobalt(III)", "D3", 3,
                   {{"Co", origin},
                    {"N", nitrogen},
                    {"C", carbon},
                    {"H", ch1},
                    {"H", ch2},
                    {"H", nh1},
                    {"H", nh2}});
}

std::vector<TestMolecule> others() {
  const Vector3d water_oxygen = 2.10 * z;
  const Vector3d sulfur = ring(1.755, 0, 1.53);
  const Vector3d dithiolene_carbon = ring(2.97, 0, 0.70);
  return {
      by_orbits("tetrachloroplatinate(II)", "D4h", -2, {{"Pt", origin}, {"Cl", 2.31 * x}}),
      by_orbits("titanium tetrachloride", "Td", 0, {{"Ti", origin}, {"Cl", 2.17 * diagonal}}),
      by_orbits("permanganate", "Td", -1, {{"Mn", origin}, {"O", 1.63 * diagonal}}),
      by_orbits("tetrachlorocuprate(II), flattened", "D2d", -2,  // one hole
                {{"Cu", origin}, {"Cl", bond_end(origin, z, 2.25, 65.0, x)}}),
      by_orbits("tetrachlorooxovanadate(IV)", "C4v", -2,  // one d electron
                {{"V", origin}, {"O", 1.60 * z}, {"Cl", bond_end(origin, z, 2.35, 103.0, x)}}),
      by_orbits(
          "hexa-aquairon(II)", "Th", 2,
          {{"Fe", origin}, {"O", water_oxygen}, {"H", bond_end(water_oxygen, z, 0.97, 53.5, y)}}),
      by_orbits("nonahydridorhenate(VII)", "D3h", -2,
                {{"Re", origin}, {"H", -1.68 * x}, {"H", ring(1.20, 0, 1.18)}}),
      by_orbits("octachlorodirhenate(III)", "D4h", -2,
                {{"Re", 1.12 * z}, {"Cl", bond_end(1.12 * z, z, 2.33, 76.3, x)}}),
      // The chelate spans both triangles, so sulfur and carbon lie above one another.
      by_orbits("tris(ethene-1,2-dithiolato)rhenium", "D3h", -1,
                {{"Re", origin},
                 {"S", sulfur},
                 {"C", dithiolene_carbon},
                 {"H", bond_end(dithiolene_carbon, z, 1.09, 61.0, x)}}),
      by_atoms("uranyl", "Dinfh", 2, {{"U", origin}, {"O", 1.76 * z}, {"O", -1.76 * z}}),
      by_orbits("tetrachlorodioxouranate(VI)", "D4h", -2,
                {{"U", origin}, {"O", 1.77 * z}, {"Cl", 2.67 * x}}),
      by_orbits("uranium hexafluoride", "Oh", 0, {{"U", origin}, {"F", 1.996 * z}}),
      zeise_anion(),
      tris_ethylenediamine_cobalt(),
  };
}

}  // namespace

std::vector<TestMolecule> complexes() {
  std::vector<TestMolecule> all = carbonyls_and_cyanides();
  for (TestMolecule& entry : isomers()) all.push_back(entry);
  for (TestMolecule& entry : others()) all.push_back(entry);
  return all;
}
