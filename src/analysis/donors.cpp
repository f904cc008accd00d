#include "analysis/donors.hpp"

#include <algorithm>
#include <utility>

#include "molecule/metals.hpp"

namespace irrepwise {
namespace {

bool has_d_shell(const Basis& basis, int atom) {
  const auto at = static_cast<std::size_t>(atom);
  for (int s = basis.first_shell[at]; s < basis.first_shell[at + 1]; ++s) {
    if (basis.shells[static_cast<std::size_t>(s)].l == 2) return true;
  }
  return false;
}

}  // namespace

std::vector<int> metal_atoms(const Molecule& molecule, const Basis& basis) {
  std::vector<int> metals = centre_atoms(molecule);
  std::erase_if(metals, [&](int atom) { return !has_d_shell(basis, atom); });
  return metals;
}

std::vector<DonorSite> donor_sites(const Molecule& molecule, int metal) {
  const std::vector<int> metals = centre_atoms(molecule);
  std::vector<DonorSite> sites;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    if (std::find(metals.begin(), metals.end(), atom) != metals.end()) continue;
    if (!are_bonded(molecule, metal, atom)) continue;
    // Joins every site that holds a neighbour.
    DonorSite site{{atom}};
    std::vector<DonorSite> rest;
    for (DonorSite& other : sites) {
      const bool touches = std::any_of(other.atoms.begin(), other.atoms.end(), [&](int donor) {
        return are_bonded(molecule, donor, atom);
      });
      if (touches) {
        site.atoms.insert(site.atoms.end(), other.atoms.begin(), other.atoms.end());
      } else {
        rest.push_back(std::move(other));
      }
    }
    std::sort(site.atoms.begin(), site.atoms.end());
    rest.push_back(std::move(site));
    sites = std::move(rest);
  }
  std::sort(sites.begin(), sites.end(), [](const DonorSite& a, const DonorSite& b) {
    return a.atoms.front() < b.atoms.front();
  });
  const Eigen::Vector3d centre = molecule.atoms()[static_cast<std::size_t>(metal)].position;
  for (DonorSite& site : sites) {
    Eigen::Vector3d sum = Eigen::Vector3d::Zero();
    for (const int atom : site.atoms) {
      sum += molecule.atoms()[static_cast<std::size_t>(atom)].position - centre;
    }
    // A ring around the metal in its own plane has its centroid there: then its first atom counts.
    if (sum.norm() < 1e-3) {
      sum = molecule.atoms()[static_cast<std::size_t>(site.atoms.front())].position - centre;
    }
    site.direction = sum.normalized();
  }
  return sites;
}

}  // namespace irrepwise
