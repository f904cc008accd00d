#include "analysis/d_block.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
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
  std::vector<Eigen::Vector3d> vertices;  // in the group's frame
};

Parent axial_parent(const Eigen::Vector3d& axis) {
  Eigen::Matrix3d turn;
  turn.row(2) = axis.transpose();
  turn.row(0) = axis.unitOrthogonal().transpose();
  turn.row(1) = axis.cross(axis.unitOrthogonal()).transpose();
  return {PointGroup({Family::Cinfv, 1}), turn, {Eigen::Vector3d::UnitZ()}};
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
  std::vector<Eigen::Vector3d> vertices;
  for (int vertex = 1; vertex <= polyhedron.size(); ++vertex) {
    vertices.emplace_back(ideal.rotation * polyhedron.vertex(vertex));
  }
  return {std::move(ideal.group), turn, std::move(vertices)};
}

// One irrep of the parent that d functions span.
struct DIrrep {
  std::string label;
  Eigen::MatrixXd projector;  // on what the d functions have of it, 5 x 5
  int n_orbitals = 0;
  bool sigma = false;  // whether σ functions of the donors span it too
};

int fixed_vertices(const Parent& parent, const Eigen::Matrix3d& operation) {
  constexpr double same_vertex = 1e-3;
  int count = 0;
  for (const Eigen::Vector3d& vertex : parent.vertices) {
    if ((operation * vertex - vertex).norm() < same_vertex) ++count;
  }
  return count;
}

std::vector<DIrrep> d_irreps(const Parent& parent) {
  const PointGroup& group = parent.group;
  std::vector<Eigen::MatrixXd> turns;
  std::vector<int> fixed;
  for (const Eigen::Matrix3d& operation : group.operations()) {
    turns.emplace_back(harmonic_rotation(d, operation));
    fixed.push_back(fixed_vertices(parent, operation));
  }
  std::vector<DIrrep> found;
  for (const Irrep& irrep : group.irreps()) {
    Eigen::MatrixXd projector = Eigen::MatrixXd::Zero(5, 5);
    double sigma = 0.0;
    for (std::size_t g = 0; g < turns.size(); ++g) {
      projector += irrep.characters[g] * turns[g];
      sigma += irrep.characters[g] * fixed[g];
    }
    // Characters of a complex pair count both of its irreps, each of dimension 1.
    const double dimension = irrep.complex_pair ? 1.0 : irrep.dimension;
    projector *= dimension / group.order();
    const int n_orbitals = static_cast<int>(std::lround(projector.trace()));
    if (n_orbitals == 0) continue;
    found.push_back(
        {level_label(irrep.label), projector, n_orbitals, std::lround(sigma / group.order()) > 0});
  }
  return found;
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

// What one level has of the metal's d orbitals: in all, and by irrep of the parent.
struct DContent {
  double share = 0.0;
  std::vector<double> weights;  // parts of the metal d part, by DIrrep
};

std::vector<DContent> d_contents(const MolecularSymmetry& symmetry, const Basis& basis,
                                 const Levels& levels, const Populations& populations, int metal,
                                 const std::vector<DIrrep>& irreps, const Eigen::MatrixXd& turn) {
  const EquivalentAtoms& set = set_of(levels, metal);
  const Shell& shell = *d_shell(basis, metal);
  std::vector<DContent> contents;
  for (int k = 0; k < static_cast<int>(levels.levels.size()); ++k) {
    DContent content;
    for (const int atom : set.atoms) {
      const Shell& own = *d_shell(basis, atom);
      content.share += populations.shares.col(k).segment(own.first_orbital, own.size()).sum();
    }
    const Eigen::MatrixXd part =
        turn *
        level_orbitals(symmetry, basis, levels, k).middleRows(shell.first_orbital, shell.size());
    const double whole = part.squaredNorm();
    for (const DIrrep& irrep : irreps) {
      content.weights.push_back(whole > 0.0 ? (irrep.projector * part).squaredNorm() / whole : 0.0);
    }
    contents.push_back(std::move(content));
  }
  return contents;
}

// Levels of one irrep of the parent, those to take first in front.
std::vector<int> candidates(const std::vector<DContent>& contents, std::size_t irrep, bool sigma) {
  constexpr double of_the_largest = 0.5;
  constexpr double tie = 1e-9;  // shares apart by rounding only keep the order of energy
  const auto part = [&](int k) {
    const DContent& content = contents[static_cast<std::size_t>(k)];
    return content.share * content.weights[irrep];
  };
  std::vector<int> order;
  double largest = 0.0;
  for (int k = static_cast<int>(contents.size()) - 1; k >= 0; --k) {
    order.push_back(k);
    largest = std::max(largest, part(k));
  }
  const auto key = [&](int k) { return std::llround(part(k) / tie); };
  std::stable_sort(order.begin(), order.end(), [&](int a, int b) {
    if (sigma) {
      const bool much_a = part(a) >= of_the_largest * largest;
      const bool much_b = part(b) >= of_the_largest * largest;
      if (much_a || much_b) return much_a && (!much_b || a > b);
    }
    return key(a) > key(b);
  });
  return order;
}

std::vector<DLevel> d_levels(const MolecularSymmetry& symmetry, const Basis& basis,
                             const Levels& levels, int metal, const std::vector<DIrrep>& irreps,
                             const std::vector<DContent>& contents) {
  const EquivalentAtoms& set = set_of(levels, metal);
  std::vector<int> left;  // by irrep of the molecule: combinations not yet given to a level
  for (int irrep = 0; irrep < static_cast<int>(symmetry.group.irreps().size()); ++irrep) {
    left.push_back(d_combinations(basis, levels, set, irrep));
  }
  std::vector<bool> taken(contents.size(), false);
  std::vector<DLevel> chosen;
  for (std::size_t i = 0; i < irreps.size(); ++i) {
    int wanted = irreps[i].n_orbitals * set.size();
    for (const int k : candidates(contents, i, irreps[i].sigma)) {
      const auto at = static_cast<std::size_t>(k);
      const Level& level = levels.levels[at];
      int& of_irrep = left[static_cast<std::size_t>(level.irrep)];
      if (wanted <= 0) break;
      const std::vector<double>& weights = contents[at].weights;
      const bool of_this = std::max_element(weights.begin(), weights.end()) - weights.begin() ==
                           static_cast<std::ptrdiff_t>(i);
      if (taken[at] || of_irrep == 0 || !of_this) continue;
      taken[at] = true;
      --of_irrep;
      wanted -= level.degeneracy;
      chosen.push_back({k, contents[at].share, irreps[i].label, weights[i]});
    }
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
  std::vector<Eigen::Vector3d> directions;
  for (const DonorSite& site : donor_sites(symmetry.molecule, basis, metal)) {
    directions.push_back(site.direction);
  }
  block.shape = nearest_polyhedron(directions);
  // Without a parent all d orbitals are alike, and no label is given.
  std::vector<DIrrep> irreps = {{"", Eigen::MatrixXd::Identity(5, 5), 5, false}};
  Eigen::MatrixXd turn = Eigen::MatrixXd::Identity(5, 5);
  if (block.shape || directions.size() == 1) {
    const Parent parent =
        block.shape ? polyhedral_parent(*block.shape) : axial_parent(directions.front());
    block.parent_group = parent.group.symbol().name();
    irreps = d_irreps(parent);
    turn = harmonic_rotation(d, parent.turn);
  }
  const std::vector<DContent> contents =
      d_contents(symmetry, basis, levels, populations, metal, irreps, turn);
  block.levels = d_levels(symmetry, basis, levels, metal, irreps, contents);
  block.means = parent_means(levels, block.levels);
  return block;
}

}  // namespace irrepwise
