#include "complex/build.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numbers>
#include <utility>

#include <Eigen/Geometry>

#include <fmt/format.h>

#include "complex/assembly.hpp"
#include "complex/charges.hpp"
#include "complex/conformation.hpp"
#include "core/at_place.hpp"
#include "molecule/element.hpp"
#include "symmetry/molecular_symmetry.hpp"

namespace irrepwise {
namespace {

// Rounding of the library's coordinates is made good; distances as requested are not touched.
constexpr double largest_rounding_angstrom = 1e-3;

double twist_of(const Site& site, const Pose& pose) {
  const Eigen::Vector3d reference = reference_direction(site.along);
  const Eigen::Vector3d x = pose.axes.col(0);
  const double angle = std::atan2(x.dot(site.along.cross(reference)), x.dot(reference));
  const double degrees = angle * 180.0 / std::numbers::pi;
  if (std::abs(degrees) < 1e-6) return 0.0;
  return degrees < -180.0 + 1e-6 ? degrees + 360.0 : degrees;
}

// Adds the atoms and tells their indices.
std::vector<int> add_atoms(const std::vector<Atom>& body,
                           const std::vector<Eigen::Vector3d>& positions, std::vector<Atom>& all) {
  std::vector<int> indices;
  for (std::size_t i = 0; i < body.size(); ++i) {
    indices.push_back(static_cast<int>(all.size()));
    all.push_back({body[i].atomic_number, positions[i]});
  }
  return indices;
}

BuiltLigand built(const Site& site, const Pose& pose, std::vector<int> atoms) {
  BuiltLigand ligand;
  ligand.name = site.seated.ligand->name;
  ligand.charge = site.seated.ligand->charge;
  ligand.centres = {site.centre};
  ligand.vertices = site.seated.request.vertices;
  ligand.atoms = std::move(atoms);
  ligand.distances_angstrom = site.body.distances_angstrom;
  ligand.denticity = site.seated.binding->denticity();
  ligand.hapticity = site.seated.binding->hapticity();
  ligand.electrons = site.seated.binding->electrons;
  ligand.turns = site.body.turns;
  ligand.twist_degrees = site.body.turns ? twist_of(site, pose) : 0.0;
  ligand.bite_degrees = site.body.bite_degrees;
  ligand.mirrored = site.body.has_hand && pose.mirrored;
  return ligand;
}

BuiltLigand built(const PlacedBridge& bridge, std::vector<int> atoms) {
  BuiltLigand ligand;
  ligand.name = bridge.ligand->name;
  ligand.charge = bridge.ligand->charge;
  ligand.centres = {0, 1};
  ligand.vertices = {bridge.request.vertices[0], bridge.request.vertices[1]};
  ligand.atoms = std::move(atoms);
  ligand.distances_angstrom = bridge.distances_angstrom;
  ligand.electrons = bridge.ligand->bridging_electrons.value_or(0);
  return ligand;
}

std::vector<BuiltCentre> count_centres(const ComplexSpec& complex, const Charges& charges,
                                       const std::vector<BuiltLigand>& ligands) {
  std::vector<BuiltCentre> centres;
  for (std::size_t c = 0; c < complex.centres.size(); ++c) {
    const CentreSpec& spec = complex.centres[c];
    int donated = 0;
    for (const BuiltLigand& ligand : ligands) {
      const auto& holders = ligand.centres;
      const bool here =
          std::find(holders.begin(), holders.end(), static_cast<int>(c)) != holders.end();
      if (here) donated += ligand.electrons;
    }
    const std::string& place = spec.oxidation ? spec.oxidation_place : complex.charge_place;
    const ElectronCount electrons = at_place(place, [&] {
      return count_electrons(spec.atomic_number, charges.oxidation[c], donated,
                             complex.metal_metal_bond);
    });
    centres.push_back({static_cast<int>(c), std::string(spec.polyhedron.kind().symbol), electrons});
  }
  return centres;
}

std::string ligand_words(const BuiltLigand& ligand) {
  std::string words;
  for (const int vertex : ligand.vertices)
    words += fmt::format("{}{}", words.empty() ? "" : "+", vertex);
  if (ligand.centres.size() == 2)
    words = fmt::format("{}-{}", ligand.vertices[0], ligand.vertices[1]);
  words += " " + ligand.name;
  if (ligand.hapticity > 1) words += fmt::format(" η{}", ligand.hapticity);
  double least = ligand.distances_angstrom[0];
  double most = least;
  for (const double d : ligand.distances_angstrom) {
    least = std::min(least, d);
    most = std::max(most, d);
  }
  words += most - least < 5e-4
               ? fmt::format(" at {:.3f} Å", least)
               : fmt::format(" at {:.3f} and {:.3f} Å", ligand.distances_angstrom[0],
                             ligand.distances_angstrom[1]);
  if (ligand.turns) words += fmt::format(" twist {:.0f}°", ligand.twist_degrees + 0.0);
  if (ligand.mirrored) words += " mirrored";
  return words;
}

std::string how_made(const ComplexSpec& complex, const std::vector<BuiltCentre>& centres,
                     const std::vector<BuiltLigand>& ligands) {
  std::string words = "built:";
  for (std::size_t c = 0; c < centres.size(); ++c) {
    words += fmt::format("{} {}({}) {}", c == 0 ? "" : " and",
                         element_symbol(complex.centres[c].atomic_number),
                         signed_number(centres[c].electrons.oxidation), centres[c].polyhedron);
    const Polyhedron& polyhedron = complex.centres[c].polyhedron;
    if (polyhedron.angle_degrees() != polyhedron.kind().angle_degrees) {
      words +=
          fmt::format(" with {} {:.1f}°", polyhedron.kind().free_angle, polyhedron.angle_degrees());
    }
  }
  for (const BuiltLigand& ligand : ligands) words += "; " + ligand_words(ligand);
  if (complex.metal_metal_bond > 0) {
    words += fmt::format("; bond of order {} between the metals counted", complex.metal_metal_bond);
  }
  return words;
}

// The molecule with its rounding errors averaged over the group, in the frame it was built in.
Molecule made_exact(const Molecule& molecule, const MolecularSymmetry& symmetry) {
  Eigen::Matrix3Xd positions = symmetry.rotation.transpose() * symmetry.molecule.positions();
  positions.colwise() += symmetry.origin;
  positions.colwise() -= positions.col(0).eval();  // the first metal stays at the origin
  return molecule.with_positions(positions);
}

}  // namespace

BuiltComplex build_complex(const ComplexSpec& complex) {
  const Assembly assembly = assemble(complex);
  const Charges charges = settle_charges(complex, assembly);
  std::vector<int> metals;
  for (const CentreSpec& centre : complex.centres) metals.push_back(centre.atomic_number);
  const std::vector<Pose> poses = at_place(complex.centres.front().place,
                                           [&] { return most_symmetric_poses(assembly, metals); });
  std::vector<Atom> atoms;
  for (std::size_t m = 0; m < metals.size(); ++m) atoms.push_back({metals[m], assembly.metals[m]});
  std::vector<BuiltLigand> ligands;
  for (std::size_t i = 0; i < assembly.sites.size(); ++i) {
    const Site& site = assembly.sites[i];
    const Eigen::Vector3d& metal = assembly.metals[static_cast<std::size_t>(site.centre)];
    ligands.push_back(
        built(site, poses[i],
              add_atoms(site.body.atoms, posed(site.body.atoms, poses[i], metal), atoms)));
  }
  for (const PlacedBridge& bridge : assembly.bridges) {
    ligands.push_back(built(bridge, add_atoms(bridge.ligand->atoms, bridge.positions, atoms)));
  }
  std::vector<BuiltCentre> centres = count_centres(complex, charges, ligands);
  std::string how = how_made(complex, centres, ligands);
  const Molecule rough(std::move(atoms), charges.total);
  const MolecularSymmetry symmetry = find_symmetry(rough);
  const bool only_rounding = symmetry.largest_shift_angstrom < largest_rounding_angstrom;
  return {only_rounding ? made_exact(rough, symmetry) : rough,
          std::move(centres),
          std::move(ligands),
          symmetry.group.symbol().name(),
          only_rounding ? symmetry.largest_shift_angstrom : 0.0,
          std::move(how)};
}

}  // namespace irrepwise
