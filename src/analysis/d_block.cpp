#include "analysis/d_block.hpp"

#include <algorithm>
#include <map>
#include <utility>

#include <Eigen/Geometry>

#include "analysis/donors.hpp"
#include "harmonics/real_harmonics.hpp"
#include "molecule/polyhedra.hpp"

namespace irrepwise {
namespace {

constexpr int d = 2;

// The ideal group laid over the donors: `turn` takes the molecule's frame to the group's.
struct Parent {
  PointGroup group;
  Eigen::Matrix3d turn;
};

Parent axial_parent(const Eigen::Vector3d& axis) {
  Eigen::Matrix3d turn;
  turn.row(2) = axis.transpose();
  turn.row(0) = axis.unitOrthogonal().transpose();
  turn.row(1) = axis.cross(axis.unitOrthogonal()).transpose();
  return {PointGroup({Family::Cinfv, 1}), turn};
}

// The group and its standard frame are those of a bare complex with equal ligands.
Parent polyhedral_parent(const PolyhedronFit& shape) {
  constexpr int any_metal = 26, any_donor = 9;
  constexpr double any_distance_angstrom = 2.0;
  const Polyhedron polyhedron(shape.symbol);
  std::vector<Atom> atoms = {{any_metal, Eigen::Vector3d::Zero()}};
  for (int vertex = 1; vertex <= polyhedron.size(); ++vertex) {
    atoms.push_back({any_donor, any_distance_angstrom * polyhedron.vertex(vertex)});
  }
  MolecularSymmetry ideal = find_symmetry(Molecule(std::move(atoms), 0));
  const Eigen::Matrix3d turn = ideal.rotation * shape.turn.transpose();
  return {std::move(ideal.group), turn};
}

// Per irrep, the projector on what the d functions have of it.
std::vector<Eigen::MatrixXd> d_projectors(const PointGroup& group) {
  std::vector<Eigen::MatrixXd> turns;
  for (const Eigen::Matrix3d& operation : group.operations()) {
    turns.emplace_back(harmonic_rotation(d, operation));
  }
  std::vector<Eigen::MatrixXd> projectors;
  for (const Irrep& irrep : group.irreps()) {
    Eigen::MatrixXd projector = Eigen::MatrixXd::Zero(5, 5);
    for (std::size_t g = 0; g < turns.size(); ++g) projector += irrep.characters[g] * turns[g];
    // Characters of a complex pair count both of its irreps, each of dimension 1.
    const double dimension = irrep.complex_pair ? 1.0 : irrep.dimension;
    projectors.emplace_back(projector * dimension / group.order());
  }
  return projectors;
}

const Shell* d_shell(const Basis& basis, int atom) {
  const auto at = static_cast<std::size_t>(atom);
  for (int s = basis.first_shell[at]; s < basis.first_shell[at + 1]; ++s) {
    if (basis.shells[static_cast<std::size_t>(s)].l == d) {
      return &basis.shells[static_cast<std::size_t>(s)];
    }
  }
  return nullptr;
}

const EquivalentAtoms& set_of(const Levels& levels, int atom) {
  for (const EquivalentAtoms& set : levels.salcs.sets) {
    if (std::find(set.atoms.begin(), set.atoms.end(), atom) != set.atoms.end()) return set;
  }
  return levels.salcs.sets.front();
}

// How many levels of an irrep the d orbitals of the set account for.
int d_combinations(const Basis& basis, const Levels& levels, const EquivalentAtoms& set,
                   int irrep) {
  int count = 0;
  for (const Salc& salc : levels.salcs.by_irrep[static_cast<std::size_t>(irrep)]) {
    const Shell& shell = basis.shells[static_cast<std::size_t>(salc.shell)];
    if (shell.l == d && shell.atom == set.representative()) ++count;
  }
  return count;
}

std::vector<DLevel> most_metal(const PointGroup& group, const Basis& basis, const Levels& levels,
                               const Populations& populations, int metal) {
  const EquivalentAtoms& set = set_of(levels, metal);
  std::vector<DLevel> chosen;
  for (int irrep = 0; irrep < static_cast<int>(group.irreps().size()); ++irrep) {
    std::vector<DLevel> candidates;
    for (int k = 0; k < static_cast<int>(levels.levels.size()); ++k) {
      if (levels.levels[static_cast<std::size_t>(k)].irrep != irrep) continue;
      double share = 0.0;
      for (const int atom : set.atoms) {
        const Shell* shell = d_shell(basis, atom);
        share += populations.shares.col(k).segment(shell->first_orbital, shell->size()).sum();
      }
      candidates.push_back({k, share, {}, 0.0});
    }
    std::stable_sort(candidates.begin(), candidates.end(),
                     [](const DLevel& a, const DLevel& b) { return a.d_share > b.d_share; });
    const auto wanted = static_cast<std::size_t>(d_combinations(basis, levels, set, irrep));
    candidates.resize(std::min(candidates.size(), wanted));
    chosen.insert(chosen.end(), candidates.begin(), candidates.end());
  }
  std::sort(chosen.begin(), chosen.end(),
            [](const DLevel& a, const DLevel& b) { return a.level < b.level; });
  return chosen;
}

std::vector<ParentMean> parent_means(const Levels& levels, const std::vector<DLevel>& d_levels) {
  std::map<std::string, std::pair<double, double>> sums;  // weight, weight times energy
  for (const DLevel& entry : d_levels) {
    const Level& level = levels.levels[static_cast<std::size_t>(entry.level)];
    const double weight = entry.d_share * level.degeneracy;
    if (entry.parent_label.empty() || !(weight > 0.0)) continue;
    sums[entry.parent_label].first += weight;
    sums[entry.parent_label].second += weight * level.energy_ev;
  }
  std::vector<ParentMean> means;
  for (const auto& [label, sum] : sums) means.push_back({label, sum.second / sum.first});
  std::stable_sort(means.begin(), means.end(), [](const ParentMean& a, const ParentMean& b) {
    return a.energy_ev < b.energy_ev;
  });
  return means;
}

}  // namespace

DBlock find_d_block(const MolecularSymmetry& symmetry, const Basis& basis, const Levels& levels,
                    const Populations& populations, int metal) {
  DBlock block;
  block.metal = metal;
  block.levels = most_metal(symmetry.group, basis, levels, populations, metal);
  std::vector<Eigen::Vector3d> directions;
  for (const DonorSite& site : donor_sites(symmetry.molecule, basis, metal)) {
    directions.push_back(site.direction);
  }
  block.shape = nearest_polyhedron(directions);
  if (!block.shape && directions.size() != 1) return block;
  const Parent parent =
      block.shape ? polyhedral_parent(*block.shape) : axial_parent(directions.front());
  block.parent_group = parent.group.symbol().name();

  const std::vector<Eigen::MatrixXd> projectors = d_projectors(parent.group);
  const Eigen::MatrixXd turn = harmonic_rotation(d, parent.turn);
  const Shell& shell = *d_shell(basis, metal);
  for (DLevel& entry : block.levels) {
    const Eigen::MatrixXd part = turn * level_orbitals(symmetry, basis, levels, entry.level)
                                            .middleRows(shell.first_orbital, shell.size());
    const double whole = part.squaredNorm();
    if (!(whole > 0.0)) continue;
    for (std::size_t irrep = 0; irrep < projectors.size(); ++irrep) {
      const double weight = (projectors[irrep] * part).squaredNorm() / whole;
      if (weight > entry.parent_weight + 1e-9) {
        entry.parent_weight = weight;
        entry.parent_label = level_label(parent.group.irreps()[irrep].label);
      }
    }
  }
  block.means = parent_means(levels, block.levels);
  return block;
}

}  // namespace irrepwise
