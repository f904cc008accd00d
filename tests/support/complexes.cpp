#include "support/complexes.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include "molecule/element.hpp"

using namespace irrepwise;

ComplexSpec spec_of(const std::string& metal, const std::string& polyhedron,
                    std::optional<int> oxidation, const std::vector<std::string>& ligands) {
  CentreSpec centre;
  centre.atomic_number = atomic_number(metal).value();
  centre.polyhedron = Polyhedron(polyhedron);
  centre.oxidation = oxidation;
  for (const std::string& name : ligands) centre.ligands.push_back(on(name, {}));
  ComplexSpec complex;
  complex.centres.push_back(centre);
  return complex;
}

LigandRequest on(const std::string& ligand, const std::vector<int>& vertices) {
  LigandRequest request;
  request.ligand = ligand;
  request.vertices = vertices;
  return request;
}

LigandRequest over(const std::string& ligand, const std::vector<int>& vertices) {
  LigandRequest request = on(ligand, vertices);
  request.covers = true;
  return request;
}

std::vector<double> distances(const Molecule& molecule, int element_a, int element_b,
                              double longest) {
  std::vector<double> found;
  const std::vector<Atom>& atoms = molecule.atoms();
  for (std::size_t i = 0; i < atoms.size(); ++i) {
    for (std::size_t j = 0; j < atoms.size(); ++j) {
      if (atoms[i].atomic_number != element_a || atoms[j].atomic_number != element_b) continue;
      const double distance = (atoms[i].position - atoms[j].position).norm();
      if (i != j && distance < longest) found.push_back(distance);
    }
  }
  std::sort(found.begin(), found.end());
  return found;
}

double angle(const Molecule& molecule, int a, int b, int c) {
  const auto at = [&](int i) { return molecule.atoms()[static_cast<std::size_t>(i)].position; };
  const Eigen::Vector3d u = (at(a) - at(b)).normalized();
  const Eigen::Vector3d v = (at(c) - at(b)).normalized();
  return std::acos(std::clamp(u.dot(v), -1.0, 1.0)) * 180.0 / std::numbers::pi;
}
