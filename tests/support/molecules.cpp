#include "support/molecules.hpp"

#include <stdexcept>
#include <utility>

#include "support/molecules_parts.hpp"
#include "support/shapes.hpp"

namespace {

// cos of the tetrahedral angle is -1/3; the angle to the fourth bond's other side is its
// supplement.
constexpr double tetrahedral_supplement_degrees = 70.528779365509308;

void append(std::vector<TestMolecule>& all, std::vector<TestMolecule> part) {
  for (TestMolecule& entry : part) all.push_back(std::move(entry));
}

}  // namespace

TestMolecule by_orbits(const std::string& name, const std::string& point_group, int charge,
                       const std::vector<shapes::Seed>& seeds) {
  return {name, shapes::from_orbits(shapes::generators(point_group), seeds, charge, name),
          point_group};
}

TestMolecule by_atoms(const std::string& name, const std::string& point_group, int charge,
                      const std::vector<shapes::Seed>& atoms) {
  return {name, shapes::from_orbits({}, atoms, charge, name), point_group};
}

const std::vector<TestMolecule>& test_molecules() {
  static const std::vector<TestMolecule> molecules = [] {
    std::vector<TestMolecule> all;
    append(all, main_group_molecules());
    append(all, organic_molecules());
    append(all, cages());
    append(all, complexes());
    append(all, sandwiches());
    append(all, synthetic_clusters());
    return all;
  }();
  return molecules;
}

const TestMolecule& test_molecule(const std::string& name) {
  for (const TestMolecule& entry : test_molecules()) {
    if (entry.name == name) return entry;
  }
  throw std::out_of_range("no test molecule is called " + name);
}

irrepwise::Molecule methane(double ch_angstrom) {
  return shapes::from_orbits(
      shapes::generators("Td"),
      {{"C", {0, 0, 0}}, {"H", ch_angstrom * Eigen::Vector3d::Ones().normalized()}}, 0, "methane");
}

irrepwise::Molecule ethane(double cc_angstrom, double ch_angstrom, EthaneForm form) {
  const bool staggered = form == EthaneForm::Staggered;
  const Eigen::Vector3d carbon(0, 0, cc_angstrom / 2);
  const Eigen::Vector3d hydrogen =
      shapes::bond_end(carbon, Eigen::Vector3d::UnitZ(), ch_angstrom,
                       tetrahedral_supplement_degrees, Eigen::Vector3d::UnitX());
  return shapes::from_orbits(shapes::generators(staggered ? "D3d" : "D3h"),
                             {{"C", carbon}, {"H", hydrogen}}, 0,
                             staggered ? "ethane, staggered" : "ethane, eclipsed");
}
