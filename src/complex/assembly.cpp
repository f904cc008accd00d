#include "complex/assembly.hpp"

#include <cmath>
#include <cstddef>
#include <map>
#include <numbers>
#include <utility>

#include <Eigen/Geometry>

#include <fmt/format.h>

#include "complex/second_centre.hpp"
#include "core/at_place.hpp"
#include "core/error.hpp"

namespace irrepwise {
namespace {

constexpr double degree = std::numbers::pi / 180.0;

std::string vertex_words(const std::vector<int>& vertices) {
  std::string words = vertices.size() == 1 ? "vertex" : "vertices";
  for (std::size_t i = 0; i < vertices.size(); ++i) {
    words += fmt::format("{}{}", i == 0 ? " " : ", ", vertices[i]);
  }
  return words;
}

double bridge_distance(const BridgeRequest& request, const Ligand& ligand, std::size_t centre,
                       int metal) {
  if (request.distances_angstrom[centre]) return *request.distances_angstrom[centre];
  // What shortens a terminal bond does not hold between two metals.
  return usual_distance_angstrom(ligand, ligand.bindings.front().teeth[0][0], metal) +
         ligand.shortening_angstrom - ligand.bridging_shortening_angstrom;
}

void check_bridges(const ComplexSpec& complex) {
  const bool two = complex.centres.size() == 2;
  if (complex.centres.empty() || complex.centres.size() > 2) {
    throw Error(fmt::format("found {} centres, expected one or two", complex.centres.size()));
  }
  if (complex.metal_metal_bond != 0) {
    at_place(complex.metal_metal_bond_place, [&] {
      constexpr int highest = 5;
      const int order = complex.metal_metal_bond;
      if (!two) throw Error("`metal_metal_bond` needs two centres; leave it out");
      if (order < 0 || order > highest) {
        throw Error(fmt::format("found a bond of order {}, expected 0 to {}", order, highest));
      }
    });
  }
  if (two == complex.bridges.empty()) {
    throw Error(two ? "two centres need at least one bridge" : "bridges need two centres");
  }
  for (const BridgeRequest& bridge : complex.bridges) {
    at_place(bridge.place, [&] {
      for (std::size_t centre = 0; centre < 2; ++centre) {
        const Polyhedron& polyhedron = complex.centres[centre].polyhedron;
        const int vertex = bridge.vertices[centre];
        if (vertex >= 1 && vertex <= polyhedron.size()) continue;
        throw Error(fmt::format("{} has no vertex {}, expected 1 to {}", polyhedron.kind().symbol,
                                vertex, polyhedron.size()));
      }
    });
  }
}

// Distances and donors of the bridges, then the second metal beyond them.
SecondCentre place_bridges(const ComplexSpec& complex, std::vector<PlacedBridge>& bridges,
                           std::vector<Eigen::Vector3d>& donors) {
  std::vector<Eigen::Vector3d> vertices;
  std::vector<double> distances;
  for (const BridgeRequest& request : complex.bridges) {
    at_place(request.place, [&] {
      const Ligand& ligand = complex.library.find(request.ligand);
      const double first = bridge_distance(request, ligand, 0, complex.centres[0].atomic_number);
      const double second = bridge_distance(request, ligand, 1, complex.centres[1].atomic_number);
      donors.push_back(first * complex.centres[0].polyhedron.vertex(request.vertices[0]));
      vertices.push_back(complex.centres[1].polyhedron.vertex(request.vertices[1]));
      distances.push_back(second);
      bridges.push_back({&ligand,
                         request,
                         {first, second},
                         {},
                         0,
                         fmt::format("{} on vertex {} of the first and {} of the second centre",
                                     ligand.name, request.vertices[0], request.vertices[1])});
    });
  }
  return at_place(complex.bridges[0].place, [&] {
    if (donors.size() > 1) {
      if (complex.bridge_angle_degrees || complex.torsion_degrees) {
        throw Error("`bridge_angle` and `torsion` are for a single bridge; leave them out");
      }
      return beyond_bridges(donors, vertices, distances);
    }
    const double angle = complex.bridge_angle_degrees.value_or(180.0);
    if (!(angle >= 60.0 && angle <= 180.0)) {
      throw Error(fmt::format("found a bridge angle of {}°, expected 60 to 180", angle));
    }
    return beyond_one_bridge(donors[0], vertices[0], distances[0], angle * degree,
                             complex.torsion_degrees.value_or(0.0) * degree);
  });
}

// Atoms of a bridging ligand, away from both metals.
std::vector<Eigen::Vector3d> bridge_positions(const PlacedBridge& bridge,
                                              const Eigen::Vector3d& donor,
                                              const Eigen::Vector3d& second_metal) {
  const std::vector<Atom> atoms = make_bridge_body(*bridge.ligand);
  const Eigen::Vector3d towards = -donor.normalized() + (second_metal - donor).normalized();
  if (atoms.size() > 1 && towards.norm() < 0.05) {
    throw Error(fmt::format("{} cannot lie straight between two metals; give `bridge_angle`",
                            bridge.ligand->name));
  }
  const Eigen::Vector3d outwards =
      towards.norm() < 0.05 ? reference_direction(donor.normalized()) : -towards.normalized();
  // x stands on the plane of the donor and the metals. Seen along the line of the metals it turns
  // the same way at every bridge, so that two bent ligands point to opposite sides.
  const Eigen::Vector3d normal = (-donor).cross(second_metal - donor);
  if (normal.norm() < 0.05) return posed(atoms, {axes_along(outwards, 0.0), false}, donor);
  const Eigen::Vector3d x = (bridge.request.mirrored ? -1.0 : 1.0) * normal.normalized();
  Eigen::Matrix3d axes;
  axes << x, outwards.cross(x), outwards;
  return posed(atoms, {axes, false}, donor);
}

Eigen::Vector3d direction(const SeatedLigand& seated, const Polyhedron& polyhedron,
                          const Eigen::Matrix3d& turn) {
  Eigen::Vector3d sum = Eigen::Vector3d::Zero();
  for (const int vertex : seated.request.vertices) sum += turn * polyhedron.vertex(vertex);
  if (sum.norm() < 0.1) {
    throw Error(
        fmt::format("{} cannot lie over vertices on opposite sides of the metal; give it "
                    "neighbouring ones",
                    seated.ligand->name));
  }
  return sum.normalized();
}

void add_poses(Site& site, const Polyhedron& polyhedron, const Eigen::Matrix3d& turn) {
  const LigandRequest& request = site.seated.request;
  std::vector<bool> hands = {request.mirrored.value_or(false)};
  if (site.body.has_hand && !request.mirrored) hands.push_back(true);
  for (const bool mirrored : hands) {
    if (site.seated.binding->denticity() == 2) {
      const Eigen::Vector3d across =
          turn * (polyhedron.vertex(request.vertices[0]) - polyhedron.vertex(request.vertices[1]));
      Eigen::Matrix3d axes;
      axes << across.normalized(), site.along.cross(across.normalized()), site.along;
      site.candidates.push_back({axes, mirrored});
    } else {
      const double twist = request.twist_degrees.value_or(0.0) * degree;
      site.candidates.push_back({axes_along(site.along, twist), mirrored});
    }
  }
  site.any_twist = site.body.turns && !request.twist_degrees;
}

// What two ligands must have in common to be images of each other.
std::string kind_key(const Site& site) {
  std::string key = site.seated.ligand->name;
  for (const Eigen::Vector3d& tooth : site.body.teeth) key += fmt::format("|{:.6f}", tooth.norm());
  for (const double distance : site.body.distances_angstrom)
    key += fmt::format("|{:.6f}", distance);
  return key + fmt::format("|{}|{}", site.seated.binding->hapticity(),
                           site.seated.request.angle_degrees.value_or(0.0));
}

}  // namespace

Assembly assemble(const ComplexSpec& complex) {
  check_bridges(complex);
  Assembly assembly;
  assembly.metals.push_back(Eigen::Vector3d::Zero());
  std::vector<Eigen::Matrix3d> turns = {Eigen::Matrix3d::Identity()};
  std::vector<Eigen::Vector3d> donors;
  if (complex.centres.size() == 2) {
    const SecondCentre second = place_bridges(complex, assembly.bridges, donors);
    assembly.metals.push_back(second.position);
    turns.push_back(second.turn);
  }
  std::map<std::string, int> kinds;
  const auto kind_of = [&](const std::string& key) {
    return kinds.emplace(key, static_cast<int>(kinds.size())).first->second;
  };
  for (std::size_t i = 0; i < assembly.bridges.size(); ++i) {
    PlacedBridge& bridge = assembly.bridges[i];
    bridge.positions = at_place(bridge.request.place, [&] {
      return bridge_positions(bridge, donors[i], assembly.metals[1]);
    });
    bridge.kind = kind_of(fmt::format("bridge {}", bridge.ligand->name));
  }
  for (std::size_t c = 0; c < complex.centres.size(); ++c) {
    const CentreSpec& centre = complex.centres[c];
    std::vector<int> taken;
    for (const BridgeRequest& bridge : complex.bridges) taken.push_back(bridge.vertices[c]);
    for (SeatedLigand& seated : seat_ligands(centre, taken, complex.library)) {
      at_place(seated.request.place, [&] {
        Site site;
        site.body = make_body(seated, centre.atomic_number);
        site.centre = static_cast<int>(c);
        site.along = direction(seated, centre.polyhedron, turns[c]);
        site.words =
            fmt::format("{} on {}", seated.ligand->name, vertex_words(seated.request.vertices));
        if (complex.centres.size() == 2)
          site.words += c == 0 ? " of the first centre" : " of the second centre";
        site.seated = std::move(seated);
        add_poses(site, centre.polyhedron, turns[c]);
        site.kind = kind_of(kind_key(site));
        assembly.sites.push_back(std::move(site));
      });
    }
  }
  assembly.n_kinds = static_cast<int>(kinds.size());
  return assembly;
}

}  // namespace irrepwise
