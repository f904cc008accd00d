#include "analysis/d_block.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
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

double part_of(const DContent& content, std::size_t irrep) {
  return content.share * content.weights[irrep];
}

bool mostly(const DContent& content, std::size_t irrep) {
  return std::max_element(content.weights.begin(), content.weights.end()) -
             content.weights.begin() ==
         static_cast<std::ptrdiff_t>(irrep);
}

// Where σ donors span the irrep too, its d orbitals are shared between bonding levels, below their
// own energy, and antibonding ones above it. The d block is the upper part, unless there is hardly
// anything of them there, as where the donors lie higher than the metal.
bool lies_above(const Levels& levels, const std::vector<DContent>& contents, std::size_t irrep,
                double d_energy_ev) {
  constexpr double least_above = 0.25;  // of what is below
  double above = 0.0, below = 0.0;
  for (std::size_t k = 0; k < contents.size(); ++k) {
    if (!mostly(contents[k], irrep)) continue;
    const Level& level = levels.levels[k];
    (level.energy_ev > d_energy_ev ? above : below) +=
        part_of(contents[k], irrep) * level.degeneracy;
  }
  return above >= least_above * below;
}

// Levels of one irrep of the parent, those to take first in front.
std::vector<int> candidates(const Levels& levels, const std::vector<DContent>& contents,
                            std::size_t irrep, bool above, double d_energy_ev) {
  constexpr double tie = 1e-9;  // shares apart by rounding only keep the order of energy
  std::vector<int> order;
  for (int k = static_cast<int>(contents.size()) - 1; k >= 0; --k) order.push_back(k);
  const auto key = [&](int k) {
    const auto at = static_cast<std::size_t>(k);
    const bool wanted = !above || levels.levels[at].energy_ev > d_energy_ev;
    return std::pair(wanted, std::llround(part_of(contents[at], irrep) / tie));
  };
  std::stable_sort(order.begin(), order.end(), [&](int a, int b) { return key(a) > key(b); });
  return order;
}

// Over the levels chosen, and where they are antibonding also over what else above the d orbitals
// has much of them, since ligand levels near in energy take their share.
std::optional<double> mean_energy(const Levels& levels, const std::vector<DContent>& contents,
                                  std::size_t irrep, const std::vector<int>& chosen, bool above,
                                  double d_energy_ev) {
  constexpr double much = 0.25;  // of the largest part among the chosen
  double largest = 0.0;
  for (const int k : chosen) {
    largest = std::max(largest, part_of(contents[static_cast<std::size_t>(k)], irrep));
  }
  double weights = 0.0, sum = 0.0;
  for (std::size_t k = 0; k < contents.size(); ++k) {
    const Level& level = levels.levels[k];
    const double part = part_of(contents[k], irrep);
    const bool is_chosen =
        std::find(chosen.begin(), chosen.end(), static_cast<int>(k)) != chosen.end();
    const bool joins = above && level.energy_ev > d_energy_ev && mostly(contents[k], irrep) &&
                       part >= much * largest;
    if (!is_chosen && !joins) continue;
    weights += part * level.degeneracy;
    sum += part * level.degeneracy * level.energy_ev;
  }
  if (!(weights > 0.0)) return {};  // Mulliken's shares may be negative
  return sum / weights;
}

void add_levels(const MolecularSymmetry& symmetry, const Basis& basis, const Levels& levels,
                const std::vector<DIrrep>& irreps, const std::vector<DContent>& contents,
                DBlock& block) {
  const EquivalentAtoms& set = set_of(levels, block.metal);
  const double d_energy_ev = d_shell(basis, block.metal)->h_ii_ev;
  const int n_irreps = static_cast<int>(symmetry.group.irreps().size());
  std::vector<int> left;  // by irrep of the molecule: combinations not yet given to a level
  left.reserve(static_cast<std::size_t>(n_irreps));
  for (int irrep = 0; irrep < n_irreps; ++irrep) {
    left.push_back(d_combinations(basis, levels, set, irrep));
  }
  for (std::size_t i = 0; i < irreps.size(); ++i) {
    const bool above = irreps[i].sigma && lies_above(levels, contents, i, d_energy_ev);
    std::vector<int> chosen;
    int wanted = irreps[i].n_orbitals * set.size();
    for (const int k : candidates(levels, contents, i, above, d_energy_ev)) {
      const auto at = static_cast<std::size_t>(k);
      const Level& level = levels.levels[at];
      int& of_irrep = left[static_cast<std::size_t>(level.irrep)];
      if (wanted <= 0) break;
      if (of_irrep == 0 || !mostly(contents[at], i)) continue;
      --of_irrep;
      wanted -= level.degeneracy;
      chosen.push_back(k);
      block.levels.push_back({k, contents[at].share, irreps[i].label, contents[at].weights[i]});
    }
    if (irreps[i].label.empty()) continue;
    const std::optional<double> mean = mean_energy(levels, contents, i, chosen, above, d_energy_ev);
    if (mean) block.means.push_back({irreps[i].label, *mean});
  }
  std::sort(block.levels.begin(), block.levels.end(),
            [](const DLevel& a, const DLevel& b) { return a.level < b.level; });
  std::stable_sort(
      block.means.begin(), block.means.end(),
      [](const ParentMean& a, const ParentMean& b) { return a.energy_ev < b.energy_ev; });
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
  add_levels(symmetry, basis, levels, irreps, contents, block);
  return block;
}

}  // namespace irrepwise
