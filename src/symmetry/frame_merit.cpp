#include "symmetry/frame_merit.hpp"

#include <algorithm>
#include <cmath>

#include <Eigen/Geometry>

namespace irrepwise {
namespace {

constexpr double on_element = 1e-4;  // Å; coordinates are exact here, this is for rounding

// Atoms on an element of symmetry (a line or a plane), then how near the others come. `distance`
// gives the distance of a point from it.
template <typename Distance>
std::vector<double> nearness(const Molecule& molecule, Distance distance) {
  double atoms_on = 0.0, numbers_on = 0.0;
  std::vector<double> others;
  for (const Atom& atom : molecule.atoms()) {
    const double d = distance(atom.position);
    if (d < on_element) {
      atoms_on += 1.0;
      numbers_on += atom.atomic_number;
    } else {
      others.push_back(-d);
    }
  }
  std::sort(others.begin(), others.end(), std::greater<>());
  std::vector<double> merit = {atoms_on, numbers_on};
  merit.insert(merit.end(), others.begin(), others.end());
  return merit;
}

std::vector<double> line_merit(const Molecule& molecule, const Eigen::Vector3d& axis) {
  return nearness(molecule, [&](const Eigen::Vector3d& r) { return axis.cross(r).norm(); });
}

std::vector<double> plane_merit(const Molecule& molecule, const Eigen::Vector3d& normal) {
  return nearness(molecule, [&](const Eigen::Vector3d& r) { return std::abs(normal.dot(r)); });
}

double bonds_across(const Molecule& molecule, const Eigen::Vector3d& axis) {
  double bonds = 0.0;
  for (int a = 0; a < molecule.size(); ++a) {
    for (int b = a + 1; b < molecule.size(); ++b) {
      const Eigen::Vector3d& from = molecule.atoms()[a].position;
      const Eigen::Vector3d& to = molecule.atoms()[b].position;
      const bool crosses =
          axis.cross(0.5 * (from + to)).norm() < on_element && axis.cross(from).norm() > on_element;
      if (crosses && are_bonded(molecule, a, b)) bonds += 1.0;
    }
  }
  return bonds;
}

double moment_of_inertia(const Molecule& molecule, const Eigen::Vector3d& axis) {
  double moment = 0.0;
  for (const Atom& atom : molecule.atoms()) {
    moment += atom.atomic_number * axis.cross(atom.position).squaredNorm();
  }
  return moment;
}

void append_axis_merit(std::vector<double>& merit, const Molecule& molecule,
                       const Eigen::Vector3d& axis) {
  const std::vector<double> near = line_merit(molecule, axis);
  merit.push_back(near.front());
  merit.push_back(bonds_across(molecule, axis));
  merit.push_back(-moment_of_inertia(molecule, axis));
}

bool lies_across(const Molecule& molecule, const Eigen::Vector3d& normal) {
  return std::all_of(molecule.atoms().begin(), molecule.atoms().end(), [&](const Atom& atom) {
    return std::abs(normal.dot(atom.position)) < on_element;
  });
}

}  // namespace

std::vector<double> frame_merit(const Schoenflies& symbol, const Molecule& molecule,
                                const Eigen::Matrix3d& frame) {
  const Eigen::Vector3d x = frame.row(0), y = frame.row(1), z = frame.row(2);
  const bool even = symbol.n % 2 == 0;
  switch (symbol.family) {
    case Family::Dn:
    case Family::Dnh:
      if (symbol.n == 2) {
        std::vector<double> merit = {
            symbol.family == Family::Dnh && lies_across(molecule, x) ? 1.0 : 0.0};
        append_axis_merit(merit, molecule, z);
        append_axis_merit(merit, molecule, y);
        const std::vector<double> last = line_merit(molecule, z);
        merit.insert(merit.end(), last.begin(), last.end());
        return merit;
      }
      return even ? line_merit(molecule, x) : std::vector<double>{};
    case Family::Cnv:
      if (symbol.n == 2) return plane_merit(molecule, x);
      return even ? plane_merit(molecule, y) : std::vector<double>{};
    default:
      return {};
  }
}

}  // namespace irrepwise
