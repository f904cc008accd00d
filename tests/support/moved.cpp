#include "support/moved.hpp"

#include <cmath>
#include <numbers>
#include <numeric>
#include <random>
#include <utility>

#include <Eigen/Geometry>

namespace {

using Eigen::Vector3d;

// The engine is fixed by the standard, std's distributions are not: hence our own mapping.
double uniform(std::mt19937& engine) {
  return (static_cast<double>(engine()) + 0.5) / 4294967296.0;  // in (0, 1)
}

int uniform_below(std::mt19937& engine, int limit) {
  return static_cast<int>(uniform(engine) * limit);
}

Vector3d random_direction(std::mt19937& engine) {
  const double z = 2.0 * uniform(engine) - 1.0;
  const double azimuth = 2.0 * std::numbers::pi * uniform(engine);
  const double radius = std::sqrt(1.0 - z * z);
  return {radius * std::cos(azimuth), radius * std::sin(azimuth), z};
}

}  // namespace

MovedMolecule moved(const irrepwise::Molecule& molecule, unsigned seed) {
  std::mt19937 engine(seed);
  const Vector3d axis = random_direction(engine);
  const double angle = 2.0 * std::numbers::pi * uniform(engine);
  const Eigen::Matrix3d rotation = Eigen::AngleAxisd(angle, axis).toRotationMatrix();
  Vector3d shift;
  for (double& component : shift) component = 10.0 * uniform(engine) - 5.0;

  std::vector<int> permutation(static_cast<std::size_t>(molecule.size()));
  std::iota(permutation.begin(), permutation.end(), 0);
  for (int i = molecule.size() - 1; i > 0; --i) {
    std::swap(permutation[i], permutation[uniform_below(engine, i + 1)]);
  }
  std::vector<irrepwise::Atom> atoms;
  atoms.reserve(permutation.size());
  for (const int original : permutation) {
    irrepwise::Atom atom = molecule.atoms()[original];
    atom.position = rotation * atom.position + shift;
    atoms.push_back(atom);
  }
  return {irrepwise::Molecule(std::move(atoms), molecule.charge(), molecule.title()),
          std::move(permutation), rotation, shift};
}

irrepwise::Molecule with_noise(const irrepwise::Molecule& molecule, double amplitude_angstrom,
                               unsigned seed) {
  std::mt19937 engine(seed);
  std::vector<irrepwise::Atom> atoms = molecule.atoms();
  for (irrepwise::Atom& atom : atoms) {
    atom.position += amplitude_angstrom * random_direction(engine);
  }
  return {std::move(atoms), molecule.charge(), molecule.title()};
}
