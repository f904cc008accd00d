// Complexes of flat carbon rings: sandwiches in all their twists, half-sandwiches, a bent one.
#include <numbers>

#include <fmt/format.h>

#include "support/molecules_parts.hpp"
#include "support/shapes.hpp"

namespace {

using Eigen::Vector3d;
using shapes::bond_end, shapes::polygon_radius, shapes::ring;

const Vector3d origin = Vector3d::Zero();
const Vector3d x = Vector3d::UnitX();
const Vector3d z = Vector3d::UnitZ();

constexpr double ch = 1.08;  // Å

struct Sandwich {
  std::string name;
  std::string_view metal;
  int n;  // ring size
  int charge;
  double height;  // Å, of a ring above the metal
  double cc;      // Å
};

// Eclipsed in Dnh, staggered in Dnd, in between in Dn.
TestMolecule twisted(const Sandwich& s, const std::string& tail) {
  const bool in_between = tail.empty();
  const double azimuth = in_between ? 0.15 * 180.0 / s.n : 0.0;
  const double radius = polygon_radius(s.n, s.cc);
  const std::string form = in_between ? "twisted" : tail == "h" ? "eclipsed" : "staggered";
  return by_orbits(s.name + ", " + form, fmt::format("D{}{}", s.n, tail), s.charge,
                   {{s.metal, origin},
                    {"C", ring(radius, azimuth, s.height)},
                    {"H", ring(radius + ch, azimuth, s.height)}});
}

std::vector<TestMolecule> half_sandwiches() {
  const auto face = [](const std::string& name, std::string_view metal, int n, int charge,
                       double height, double cc) {
    const double radius = polygon_radius(n, cc);
    return by_orbits(
        name, fmt::format("C{}v", n), charge,
        {{metal, origin}, {"C", ring(radius, 0, height)}, {"H", ring(radius + ch, 0, height)}});
  };
  const double radius_5 = polygon_radius(5, 1.43);
  const double radius_6 = polygon_radius(6, 1.41);
  // Under C3v the six carbons are two sets of three when they stand over the carbonyls or between
  // them, and one set of six, as here, when the mirrors bisect their bonds.
  return {
      face("cyclopentadienylthallium", "Tl", 5, 0, 2.41, 1.43),
      by_orbits("cyclopentadienylnitrosylnickel", "C5v", 0,
                {{"Ni", origin},
                 {"N", -1.626 * z},
                 {"O", -2.791 * z},
                 {"C", ring(radius_5, 0, 1.76)},
                 {"H", ring(radius_5 + ch, 0, 1.76)}}),
      face("benzene with lithium ion", "Li", 6, 1, 1.95, 1.40),
      face("cyclo-octatetraenethorium(2+)", "Th", 8, 2, 2.00, 1.40),
      by_orbits("benzenetricarbonylchromium", "C3v", 0,
                {{"Cr", origin},
                 {"C", ring(radius_6, 30, 1.72)},
                 {"H", ring(radius_6 + ch, 30, 1.72)},
                 {"C", bond_end(origin, -z, 1.84, 54.7, x)},
                 {"O", bond_end(origin, -z, 2.99, 54.7, x)}}),
  };
}

TestMolecule titanocene_dichloride() {
  // Each ring stands across a normal tilted in the xz plane; the yz plane is the mirror of the
  // chlorines. The first carbon lies in the xz plane, on the open side.
  const Vector3d normal = bond_end(origin, z, 1.0, 65.5, x);
  const auto on_ring = [&](double radius, double azimuth) {
    return bond_end(2.06 * normal, normal, radius, 90.0, z, azimuth);
  };
  const double radius = polygon_radius(5, 1.40);
  return by_orbits("dichlorotitanocene", "C2v", 0,
                   {{"Ti", origin},
                    {"Cl", bond_end(origin, -z, 2.364, 47.3, Vector3d::UnitY())},
                    {"C", on_ring(radius, 0)},
                    {"C", on_ring(radius, 72)},
                    {"C", on_ring(radius, 144)},
                    {"H", on_ring(radius + ch, 0)},
                    {"H", on_ring(radius + ch, 72)},
                    {"H", on_ring(radius + ch, 144)}});
}

TestMolecule cymantrene() {
  // Five against three: one mirror, the xy plane, is common; the ring's axis is x.
  const double radius = polygon_radius(5, 1.42);
  const auto on_ring = [&](double r, double azimuth) {
    return bond_end(1.77 * x, x, r, 90.0, Vector3d::UnitY(), azimuth);
  };
  const auto below = [&](double length, double azimuth) {
    return bond_end(origin, -x, length, 55.5, Vector3d::UnitY(), azimuth);
  };
  return by_orbits("tricarbonylcyclopentadienylmanganese", "Cs", 0,
                   {{"Mn", origin},
                    {"C", on_ring(radius, 0)},
                    {"C", on_ring(radius, 72)},
                    {"C", on_ring(radius, 144)},
                    {"H", on_ring(radius + ch, 0)},
                    {"H", on_ring(radius + ch, 72)},
                    {"H", on_ring(radius + ch, 144)},
                    {"C", below(1.79, 0)},
                    {"O", below(2.94, 0)},
                    {"C", below(1.79, 120)},
                    {"O", below(2.94, 120)}});
}

}  // namespace

std::vector<TestMolecule> sandwiches() {
  const Sandwich ferrocene{"ferrocene", "Fe", 5, 0, 1.66, 1.43};
  const Sandwich dibenzenechromium{"dibenzenechromium", "Cr", 6, 0, 1.61, 1.42};
  // One f electron.
  const Sandwich tropylium_uranium{"bis(cycloheptatrienyl)uranium anion", "U", 7, -1, 1.98, 1.42};
  const Sandwich uranocene{"uranocene", "U", 8, 0, 1.924, 1.40};
  std::vector<TestMolecule> all;
  for (const Sandwich& s : {ferrocene, dibenzenechromium, tropylium_uranium, uranocene}) {
    for (const char* tail : {"h", "d", ""}) all.push_back(twisted(s, tail));
  }
  for (TestMolecule& entry : half_sandwiches()) all.push_back(entry);
  all.push_back(titanocene_dichloride());
  all.push_back(cymantrene());
  return all;
}
