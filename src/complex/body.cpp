#include "complex/body.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <cstddef>
#include <numbers>
#include <optional>

#include <Eigen/Dense>

#include <fmt/format.h>

#include "core/error.hpp"
#include "molecule/bonded_atoms.hpp"
#include "molecule/element.hpp"
#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

constexpr double degree = std::numbers::pi / 180.0;
constexpr double same_place_angstrom = 1e-4;  // the library has five decimals

// Where the metal is in the ligand's frame, and which way its z axis runs.
struct MetalPlace {
  Eigen::Vector3d metal;
  Eigen::Vector3d z;
  Eigen::Vector3d x;
};

// The part of a vector perpendicular to a unit vector, normalised; nothing where there is none.
std::optional<Eigen::Vector3d> perpendicular(const Eigen::Vector3d& v,
                                             const Eigen::Vector3d& unit) {
  const Eigen::Vector3d rest = v - unit * unit.dot(v);
  if (rest.norm() < 1e-3 * std::max(1.0, v.norm())) return {};
  return Eigen::Vector3d(rest.normalized());
}

Eigen::Vector3d own_x(const Eigen::Vector3d& z) {
  if (const auto x = perpendicular(Eigen::Vector3d::UnitX(), z)) return *x;
  return *perpendicular(Eigen::Vector3d::UnitZ(), z);
}

Eigen::Vector3d position(const Ligand& ligand, int atom) {
  return ligand.atoms[static_cast<std::size_t>(atom)].position;
}

Eigen::Vector3d centroid(const Ligand& ligand, const std::vector<int>& atoms) {
  Eigen::Vector3d sum = Eigen::Vector3d::Zero();
  for (const int atom : atoms) sum += position(ligand, atom);
  return sum / static_cast<double>(atoms.size());
}

MetalPlace below_one_donor(const SeatedLigand& seated, double distance) {
  const Eigen::Vector3d donor = position(*seated.ligand, seated.binding->teeth[0][0]);
  const Eigen::Vector3d z = (donor - seated.binding->metal).normalized();
  return {donor - distance * z, z, own_x(z)};
}

Error too_near(const SeatedLigand& seated, double distance, double least) {
  return Error(
      fmt::format("{} cannot have all its donors at {:.3f} Å from the metal; they are "
                  "farther apart than that allows, give more than {:.3f} Å",
                  seated.ligand->name, distance, least));
}

// The point at one distance from all donors, on the side of the metal: below the centre of the
// circle through them, in the sense of least squares.
MetalPlace below_donors(const SeatedLigand& seated, double distance) {
  const Ligand& ligand = *seated.ligand;
  const std::vector<int>& donors = seated.binding->teeth[0];
  const Eigen::Vector3d middle = centroid(ligand, donors);
  const auto n = static_cast<Eigen::Index>(donors.size());
  Eigen::MatrixX3d from_middle(n, 3);
  for (Eigen::Index i = 0; i < n; ++i) {
    from_middle.row(i) = position(ligand, donors[static_cast<std::size_t>(i)]) - middle;
  }
  const Eigen::Vector3d towards_metal = seated.binding->metal - middle;
  Eigen::Vector3d down;
  std::optional<Eigen::Vector3d> x;
  Eigen::Vector3d in_plane = Eigen::Vector3d::Zero();  // from the middle to the circle's centre
  const Eigen::JacobiSVD<Eigen::MatrixX3d> svd(from_middle, Eigen::ComputeFullV);
  if (n == 2) {
    const Eigen::Vector3d along =
        (position(ligand, donors[0]) - position(ligand, donors[1])).normalized();
    x = along;
    const auto below = perpendicular(towards_metal, along);
    if (!below)
      throw Error(fmt::format("{}: its `metal` lies in line with the donors", ligand.name));
    down = *below;
  } else {
    down = svd.matrixV().col(2);
    if (down.dot(towards_metal) < 0.0) down = -down;
    // |p_i - c|^2 = R^2 for all i is linear in c: 2 p_i·c = |p_i|^2 - mean, as the p_i sum to zero.
    const Eigen::VectorXd squares = from_middle.rowwise().squaredNorm();
    const Eigen::VectorXd right = 0.5 * (squares.array() - squares.mean()).matrix();
    const Eigen::MatrixX2d plane = from_middle * svd.matrixV().leftCols<2>();
    const Eigen::Vector2d centre = plane.colPivHouseholderQr().solve(right);
    in_plane = svd.matrixV().leftCols<2>() * centre;
  }
  const double radius =
      std::sqrt((from_middle.rowwise() - in_plane.transpose()).rowwise().squaredNorm().mean());
  if (!(distance > radius + 0.1)) throw too_near(seated, distance, radius + 0.1);
  const double height = std::sqrt(distance * distance - radius * radius);
  const Eigen::Vector3d metal = middle + in_plane + height * down;
  const Eigen::Vector3d z = (middle - metal).normalized();
  return {metal, z, x ? *x : own_x(z)};
}

// The point in the plane of both teeth and the metal's side that has the given distances to them.
MetalPlace between_teeth(const SeatedLigand& seated, double d1, double d2) {
  const Ligand& ligand = *seated.ligand;
  const Eigen::Vector3d first = position(ligand, seated.binding->teeth[0][0]);
  const Eigen::Vector3d second = position(ligand, seated.binding->teeth[1][0]);
  const Eigen::Vector3d middle = 0.5 * (first + second);
  const double apart = (first - second).norm();
  const Eigen::Vector3d along = (first - second) / apart;
  const auto down = perpendicular(seated.binding->metal - middle, along);
  if (!down) throw Error(fmt::format("{}: its `metal` lies in line with the teeth", ligand.name));
  const double shift = (d2 * d2 - d1 * d1) / (2.0 * apart);
  const double square = d1 * d1 - (shift - 0.5 * apart) * (shift - 0.5 * apart);
  if (!(square > 0.01)) {
    throw Error(
        fmt::format("the teeth of {} are {:.3f} Å apart and cannot be {:.3f} and {:.3f} Å "
                    "from the metal; give a distance of more than {:.3f} Å",
                    ligand.name, apart, d1, d2, 0.5 * apart + 0.1));
  }
  const Eigen::Vector3d metal = middle + shift * along + std::sqrt(square) * *down;
  const Eigen::Vector3d u1 = (first - metal).normalized();
  const Eigen::Vector3d u2 = (second - metal).normalized();
  return {metal, (u1 + u2).normalized(), (u1 - u2).normalized()};
}

// The factor on both distances that gives the teeth the bite: law of cosines.
double scale_for_bite(const SeatedLigand& seated, double d1, double d2, double bite) {
  if (!(bite > 20.0 && bite < 170.0)) {
    throw Error(fmt::format("found a bite of {}°, expected 20 to 170", bite));
  }
  const double apart = (position(*seated.ligand, seated.binding->teeth[0][0]) -
                        position(*seated.ligand, seated.binding->teeth[1][0]))
                           .norm();
  return apart / std::sqrt(d1 * d1 + d2 * d2 - 2.0 * d1 * d2 * std::cos(bite * degree));
}

// Turns the ligand about its donor so that metal, donor and the next atom make the angle.
std::vector<Atom> with_angle(const Ligand& ligand, const Binding& binding, double angle_degrees) {
  const Molecule free(ligand.atoms, 0);
  const int donor = binding.teeth[0][0];
  const std::vector<int> next = bonded_atoms(free, donor);
  if (next.size() != 1) {
    throw Error(fmt::format("`angle` is for a ligand with one atom behind the donor; {} has {}",
                            ligand.name, next.size()));
  }
  if (!(angle_degrees >= 80.0 && angle_degrees <= 180.0)) {
    throw Error(fmt::format("found an angle of {}°, expected 80 to 180", angle_degrees));
  }
  const Eigen::Vector3d origin = position(ligand, donor);
  const Eigen::Vector3d to_metal = (binding.metal - origin).normalized();
  const Eigen::Vector3d to_next = (position(ligand, next[0]) - origin).normalized();
  const double now = std::acos(std::clamp(to_metal.dot(to_next), -1.0, 1.0));
  // A straight ligand bends towards its x, a bent one in its own plane.
  const Eigen::Vector3d side = perpendicular(to_next, to_metal).value_or(own_x(to_metal));
  const Eigen::Matrix3d turn =
      rotation_about(to_metal.cross(side).normalized(), angle_degrees * degree - now);
  std::vector<Atom> atoms = ligand.atoms;
  for (Atom& atom : atoms) atom.position = origin + turn * (atom.position - origin);
  return atoms;
}

std::vector<Eigen::Vector3d> positions(const std::vector<Atom>& atoms, const Eigen::Matrix3d& map) {
  std::vector<Eigen::Vector3d> points;
  points.reserve(atoms.size());
  for (const Atom& atom : atoms) points.emplace_back(map * atom.position);
  return points;
}

bool is_axial(const std::vector<Atom>& atoms) {
  return std::all_of(atoms.begin(), atoms.end(), [](const Atom& atom) {
    return std::hypot(atom.position.x(), atom.position.y()) < same_place_angstrom;
  });
}

bool maps_on_itself(const LigandBody& body, const Eigen::Matrix3d& operation) {
  return same_atoms(body.atoms, positions(body.atoms, Eigen::Matrix3d::Identity()),
                    positions(body.atoms, operation));
}

// Whether no mirror plane contains z. Ligands of the library have theirs at multiples of 15°.
bool lacks_mirror(const LigandBody& body) {
  for (int step = 0; step < 12; ++step) {
    const double angle = 15.0 * step * degree;
    const Eigen::Vector3d normal(-std::sin(angle), std::cos(angle), 0.0);
    const Eigen::Matrix3d mirror = Eigen::Matrix3d::Identity() - 2.0 * normal * normal.transpose();
    if (maps_on_itself(body, mirror)) return false;
  }
  return true;
}

double checked_distance(double distance) {
  if (!(distance >= 0.5 && distance <= 6.0)) {
    throw Error(fmt::format("found a distance of {} Å, expected 0.5 to 6", distance));
  }
  return distance;
}

void refuse_superfluous(const SeatedLigand& seated) {
  const LigandRequest& request = seated.request;
  const std::string& name = seated.ligand->name;
  if (seated.binding->denticity() > 1 && request.twist_degrees) {
    throw Error(
        fmt::format("{} holds on with two teeth and cannot be twisted; `mirrored: true` "
                    "gives its mirror image",
                    name));
  }
  if (seated.binding->denticity() == 1 && request.bite_degrees) {
    throw Error(fmt::format("{} has one tooth here and no bite", name));
  }
  const bool one_donor = seated.binding->denticity() == 1 && seated.binding->hapticity() == 1;
  if (!one_donor && request.angle_degrees) {
    throw Error(fmt::format("`angle` is for a ligand with one donor atom; {} has more", name));
  }
  if (request.bite_degrees && request.distance_angstrom) {
    throw Error(
        fmt::format("`bite` and `distance` exclude each other for {}, which is rigid; keep "
                    "one",
                    name));
  }
}

}  // namespace

double usual_distance_angstrom(const Ligand& ligand, int donor_atom, int metal) {
  const int donor = ligand.atoms[static_cast<std::size_t>(donor_atom)].atomic_number;
  for (const int element : {metal, donor}) {
    if (covalent_radius_angstrom(element)) continue;
    throw Error(fmt::format("there is no covalent radius for {}; give `distance` for {}",
                            element_symbol(element), ligand.name));
  }
  return *covalent_radius_angstrom(metal) + *covalent_radius_angstrom(donor) -
         ligand.shortening_angstrom;
}

LigandBody make_body(const SeatedLigand& seated, int metal) {
  refuse_superfluous(seated);
  const Ligand& ligand = *seated.ligand;
  const LigandRequest& request = seated.request;
  LigandBody body;
  for (const std::vector<int>& tooth : seated.binding->teeth) {
    body.distances_angstrom.push_back(checked_distance(
        request.distance_angstrom ? *request.distance_angstrom
                                  : usual_distance_angstrom(ligand, tooth[0], metal)));
  }
  std::vector<double>& d = body.distances_angstrom;
  if (request.bite_degrees) {
    const double scale = scale_for_bite(seated, d[0], d[1], *request.bite_degrees);
    for (double& distance : d) distance *= scale;
  }
  const MetalPlace place = d.size() == 2                     ? between_teeth(seated, d[0], d[1])
                           : seated.binding->hapticity() > 1 ? below_donors(seated, d[0])
                                                             : below_one_donor(seated, d[0]);
  Eigen::Matrix3d axes;
  axes << place.x, place.z.cross(place.x), place.z;
  body.atoms = request.angle_degrees ? with_angle(ligand, *seated.binding, *request.angle_degrees)
                                     : ligand.atoms;
  for (Atom& atom : body.atoms) atom.position = axes.transpose() * (atom.position - place.metal);
  for (const std::vector<int>& tooth : seated.binding->teeth) {
    body.teeth.push_back(axes.transpose() * (centroid(ligand, tooth) - place.metal));
  }
  if (d.size() == 2) {
    const double cosine = body.teeth[0].normalized().dot(body.teeth[1].normalized());
    body.bite_degrees = std::acos(std::clamp(cosine, -1.0, 1.0)) / degree;
  }
  body.turns = d.size() == 1 && !is_axial(body.atoms);
  body.has_hand = !is_axial(body.atoms) && lacks_mirror(body);
  return body;
}

std::vector<Atom> make_bridge_body(const Ligand& ligand) {
  if (!ligand.bridging_electrons) {
    throw Error(
        fmt::format("{} does not bridge metals in the library; its entry needs `bridging`, "
                    "the electrons that each metal counts from it",
                    ligand.name));
  }
  const Binding& binding = ligand.bindings.front();
  std::vector<Atom> atoms = ligand.bridging_angle_degrees
                                ? with_angle(ligand, binding, *ligand.bridging_angle_degrees)
                                : ligand.atoms;
  const Eigen::Vector3d donor = position(ligand, binding.teeth[0][0]);
  for (Atom& atom : atoms) atom.position -= donor;
  return atoms;
}

std::vector<Eigen::Vector3d> posed(const std::vector<Atom>& atoms, const Pose& pose,
                                   const Eigen::Vector3d& centre) {
  Eigen::Matrix3d map = pose.axes;
  if (pose.mirrored) map.col(1) = -map.col(1);
  std::vector<Eigen::Vector3d> points = positions(atoms, map);
  for (Eigen::Vector3d& point : points) point += centre;
  return points;
}

Eigen::Vector3d reference_direction(const Eigen::Vector3d& along) {
  if (const auto part = perpendicular(Eigen::Vector3d::UnitZ(), along)) return *part;
  return *perpendicular(Eigen::Vector3d::UnitX(), along);
}

Eigen::Matrix3d axes_along(const Eigen::Vector3d& along, double twist) {
  const Eigen::Vector3d reference = reference_direction(along);
  const Eigen::Vector3d x = std::cos(twist) * reference + std::sin(twist) * along.cross(reference);
  Eigen::Matrix3d axes;
  axes << x, along.cross(x), along;
  return axes;
}

int axial_order(const LigandBody& body) {
  if (is_axial(body.atoms)) return 0;
  constexpr int highest = 8;
  for (int n = highest; n > 1; --n) {
    if (maps_on_itself(body, rotation_about(Eigen::Vector3d::UnitZ(), 360.0 / n * degree)))
      return n;
  }
  return 1;
}

bool same_atoms(const std::vector<Atom>& atoms, const std::vector<Eigen::Vector3d>& a,
                const std::vector<Eigen::Vector3d>& b) {
  assert(atoms.size() == a.size() && a.size() == b.size());
  for (std::size_t i = 0; i < a.size(); ++i) {
    bool found = false;
    for (std::size_t j = 0; j < b.size() && !found; ++j) {
      found = atoms[i].atomic_number == atoms[j].atomic_number &&
              (a[i] - b[j]).norm() < same_place_angstrom;
    }
    if (!found) return false;
  }
  return true;
}

}  // namespace irrepwise
