#include "analysis/d_block.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numbers>
#include <utility>

#include <Eigen/Geometry>

#include "analysis/donors.hpp"
#include "core/constants.hpp"
#include "harmonics/real_harmonics.hpp"
#include "molecule/polyhedra.hpp"
#include "overlap/two_centre.hpp"

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

// One irrep of the parent that d functions span.
struct DIrrep {
  std::string label;
  Eigen::MatrixXd projector;  // on what the d functions have of it, 5 x 5
  int n_orbitals = 0;
  bool sigma = false;  // whether σ donors at the places act on it more than in passing
};

// The angular overlap model: the squared amplitude of the irrep's d orbitals in the directions of
// the donors, for each orbital; 3 for eg and 0 for t2g of an octahedron, 4/3 for t2 of a
// tetrahedron (Schäffer and Jørgensen, Mol. Phys. 9, 401 (1965), from memory).
bool takes_sigma(const Eigen::MatrixXd& projector, int n_orbitals, const Parent& parent,
                 const std::vector<Eigen::Vector3d>& directions) {
  constexpr double least = 0.5;  // e of a square pyramid, apex at 100 degrees, has 0.2
  double sum = 0.0;
  for (const Eigen::Vector3d& direction : directions) {
    sum += (projector * real_harmonics(d, parent.turn * direction).normalized()).squaredNorm();
  }
  return sum > least * n_orbitals;
}

std::vector<DIrrep> d_irreps(const Parent& parent, const std::vector<Eigen::Vector3d>& directions) {
  const PointGroup& group = parent.group;
  std::vector<Eigen::MatrixXd> turns;
  for (const Eigen::Matrix3d& operation : group.operations()) {
    turns.emplace_back(harmonic_rotation(d, operation));
  }
  std::vector<DIrrep> found;
  for (const Irrep& irrep : group.irreps()) {
    Eigen::MatrixXd projector = Eigen::MatrixXd::Zero(5, 5);
    for (std::size_t g = 0; g < turns.size(); ++g) projector += irrep.characters[g] * turns[g];
    // Characters of a complex pair count both of its irreps, each of dimension 1.
    const double dimension = irrep.complex_pair ? 1.0 : irrep.dimension;
    projector *= dimension / group.order();
    const int n_orbitals = static_cast<int>(std::lround(projector.trace()));
    if (n_orbitals == 0) continue;
    found.push_back({level_label(irrep.label), projector, n_orbitals,
                     takes_sigma(projector, n_orbitals, parent, directions)});
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

// What σ bonds between metal d and donors are in a level.
enum class Sigma { Bonding, None, Antibonding };

// What one level has of the metal's d orbitals: in all, and by irrep of the parent.
struct DContent {
  double share = 0.0;
  std::vector<double> weights;  // parts of the metal d part, by DIrrep
  Sigma sigma = Sigma::None;
};

// The d function and the s and p functions that point along the line from the metal to a donor, and
// their overlaps: what is between them is σ.
struct SigmaPair {
  HarmonicVector d_along;   // over the metal's d functions, norm 1
  int first_orbital = 0;    // of a shell of the donor
  HarmonicVector overlaps;  // with the functions of that shell
};

std::vector<SigmaPair> sigma_pairs(const Molecule& molecule, const Basis& basis, int metal) {
  std::vector<SigmaPair> pairs;
  const Shell& shell = *d_shell(basis, metal);
  for (const DonorSite& site : donor_sites(molecule, metal)) {
    for (const int donor : site.atoms) {
      const auto at = static_cast<std::size_t>(donor);
      const Eigen::Vector3d line = molecule.atoms()[at].position -
                                   molecule.atoms()[static_cast<std::size_t>(metal)].position;
      const HarmonicVector along = real_harmonics(d, line.normalized()).normalized();
      for (int s = basis.first_shell[at]; s < basis.first_shell[at + 1]; ++s) {
        const Shell& other = basis.shells[static_cast<std::size_t>(s)];
        if (other.l > 1) continue;
        const OverlapBlock overlap = overlap_block(shell, other, line / bohr_in_angstrom);
        pairs.push_back({along, other.first_orbital, overlap.transpose() * along});
      }
    }
  }
  return pairs;
}

// Overlap population of one electron in the level, mean over its orbitals.
double sigma_overlap(const std::vector<SigmaPair>& pairs, const Shell& d_shell,
                     const Eigen::MatrixXd& orbitals) {
  double sum = 0.0;
  for (const SigmaPair& pair : pairs) {
    const auto on_metal = orbitals.middleRows(d_shell.first_orbital, d_shell.size());
    const auto on_donor = orbitals.middleRows(pair.first_orbital, pair.overlaps.size());
    for (Eigen::Index k = 0; k < orbitals.cols(); ++k) {
      sum += 2.0 * pair.d_along.dot(on_metal.col(k)) * pair.overlaps.dot(on_donor.col(k));
    }
  }
  return sum / static_cast<double>(orbitals.cols());
}

// By the σ overlap population for each unit of d share. Of the corpus, levels that are d orbitals
// and no σ bonds stay within 0.07, bonding ones begin at 0.2.
Sigma sigma_of(double overlap, double share) {
  constexpr double marked = 0.1;
  if (share <= 0.0) return Sigma::None;  // Mulliken's may be negative
  if (overlap > marked * share) return Sigma::Bonding;
  return overlap < -marked * share ? Sigma::Antibonding : Sigma::None;
}

std::vector<DContent> d_contents(const MolecularSymmetry& symmetry, const Basis& basis,
                                 const Levels& levels, const Populations& populations, int metal,
                                 const std::vector<DIrrep>& irreps, const Eigen::MatrixXd& turn) {
  const EquivalentAtoms& set = set_of(levels, metal);
  const Shell& shell = *d_shell(basis, metal);
  const std::vector<SigmaPair> pairs = sigma_pairs(symmetry.molecule, basis, metal);
  std::vector<DContent> contents;
  for (int k = 0; k < static_cast<int>(levels.levels.size()); ++k) {
    DContent content;
    for (const int atom : set.atoms) {
      const Shell& own = *d_shell(basis, atom);
      content.share += populations.shares.col(k).segment(own.first_orbital, own.size()).sum();
    }
    const Eigen::MatrixXd orbitals = level_orbitals(symmetry, basis, levels, k);
    const double of_set = static_cast<double>(set.size());
    content.sigma = sigma_of(of_set * sigma_overlap(pairs, shell, orbitals), content.share);
    const Eigen::MatrixXd part = turn * orbitals.middleRows(shell.first_orbital, shell.size());
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

// The d block is what σ bonds leave of the d orbitals: bonding levels are the ligands', unless
// there is hardly anything of the d orbitals elsewhere, as where the donors lie higher than the
// metal.
bool leaves_out_bonding(const Levels& levels, const std::vector<DContent>& contents,
                        std::size_t irrep) {
  constexpr double least = 0.25;  // of what is in bonding levels
  double bonding = 0.0, others = 0.0;
  for (std::size_t k = 0; k < contents.size(); ++k) {
    if (!mostly(contents[k], irrep)) continue;
    (contents[k].sigma == Sigma::Bonding ? bonding : others) +=
        part_of(contents[k], irrep) * levels.levels[k].degeneracy;
  }
  return others >= least * bonding;
}

// A level that may stand for d orbitals of one irrep of the parent.
struct Candidate {
  bool bonding = false;  // taken where nothing else is left
  double merit = 0.0;
  int level = 0;
  std::size_t irrep = 0;
};

// Those to take first in front: by their d part. π acceptors and donors share a d orbital with
// levels above and below; if nearly alike, the one that has stayed near the energy of the d orbital
// is it. Antibonding levels of σ bonds are expected far from it.
std::vector<Candidate> candidates(const Levels& levels, const std::vector<DContent>& contents,
                                  const std::vector<DIrrep>& irreps, double d_energy_ev) {
  constexpr double near_ev = 3.0;
  constexpr double tie = 1e-9;  // parts apart by rounding only keep the order of energy
  std::vector<Candidate> order;
  for (std::size_t irrep = 0; irrep < irreps.size(); ++irrep) {
    const bool no_bonding = leaves_out_bonding(levels, contents, irrep);
    for (int k = static_cast<int>(contents.size()) - 1; k >= 0; --k) {
      const DContent& content = contents[static_cast<std::size_t>(k)];
      double part = part_of(content, irrep);
      if (!irreps[irrep].sigma || content.sigma != Sigma::Antibonding) {
        const double off =
            (levels.levels[static_cast<std::size_t>(k)].energy_ev - d_energy_ev) / near_ev;
        part /= 1.0 + off * off;
      }
      order.push_back({no_bonding && content.sigma == Sigma::Bonding, part, k, irrep});
    }
  }
  const auto key = [](const Candidate& one) {
    return std::pair(one.bonding, -std::llround(one.merit / tie));
  };
  std::stable_sort(order.begin(), order.end(),
                   [&](const Candidate& a, const Candidate& b) { return key(a) < key(b); });
  return order;
}

// Over the levels chosen, and where they are antibonding also over what other antibonding levels
// have much of the d orbitals, since ligand levels near in energy take their share.
std::optional<double> mean_energy(const Levels& levels, const std::vector<DContent>& contents,
                                  std::size_t irrep, const std::vector<int>& chosen) {
  constexpr double much = 0.25;  // of the largest part among the chosen
  double largest = 0.0;
  bool antibonding = false;
  for (const int k : chosen) {
    const auto at = static_cast<std::size_t>(k);
    largest = std::max(largest, part_of(contents[at], irrep));
    antibonding = antibonding || contents[at].sigma == Sigma::Antibonding;
  }
  double weights = 0.0, sum = 0.0;
  for (std::size_t k = 0; k < contents.size(); ++k) {
    const Level& level = levels.levels[k];
    const double part = std::max(part_of(contents[k], irrep), 0.0);
    const bool is_chosen =
        std::find(chosen.begin(), chosen.end(), static_cast<int>(k)) != chosen.end();
    const bool joins = antibonding && contents[k].sigma == Sigma::Antibonding &&
                       mostly(contents[k], irrep) && part >= much * largest;
    if (!is_chosen && !joins) continue;
    weights += part * level.degeneracy;
    sum += part * level.degeneracy * level.energy_ev;
  }
  if (!(weights > 0.0)) return {};
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
  std::vector<int> wanted;  // by irrep of the parent, orbitals
  for (const DIrrep& irrep : irreps) wanted.push_back(irrep.n_orbitals * set.size());
  std::vector<std::vector<int>> chosen(irreps.size());
  std::vector<bool> taken(contents.size(), false);
  for (const Candidate& one : candidates(levels, contents, irreps, d_energy_ev)) {
    const auto at = static_cast<std::size_t>(one.level);
    const Level& level = levels.levels[at];
    int& of_irrep = left[static_cast<std::size_t>(level.irrep)];
    if (taken[at] || wanted[one.irrep] <= 0 || of_irrep == 0) continue;
    taken[at] = true;
    --of_irrep;
    wanted[one.irrep] -= level.degeneracy;
    chosen[one.irrep].push_back(one.level);
    block.levels.push_back(
        {one.level, contents[at].share, irreps[one.irrep].label, contents[at].weights[one.irrep]});
  }
  for (std::size_t i = 0; i < irreps.size(); ++i) {
    if (irreps[i].label.empty()) continue;
    const std::optional<double> mean = mean_energy(levels, contents, i, chosen[i]);
    if (mean) block.means.push_back({irreps[i].label, *mean});
  }
  std::sort(block.levels.begin(), block.levels.end(),
            [](const DLevel& a, const DLevel& b) { return a.level < b.level; });
  std::stable_sort(
      block.means.begin(), block.means.end(),
      [](const ParentMean& a, const ParentMean& b) { return a.energy_ev < b.energy_ev; });
}

// Directions to the places of the donors. A ring with three other donors takes three places, which
// makes piano stools octahedra, as the trade counts them: opposite to the others.
std::vector<Eigen::Vector3d> donor_directions(const std::vector<DonorSite>& sites) {
  constexpr std::size_t least_ring = 5, stool_sites = 4;
  constexpr double least_aside = 0.3;  // sine of the angle between a leg and the axis of the ring
  const auto is_ring = [](const DonorSite& site) { return site.atoms.size() >= least_ring; };
  const auto ring = std::find_if(sites.begin(), sites.end(), is_ring);
  std::vector<Eigen::Vector3d> directions;
  std::vector<Eigen::Vector3d> aside;  // from the axis, opposite to each leg
  for (const DonorSite& site : sites) {
    directions.push_back(site.direction);
    if (ring == sites.end() || is_ring(site)) continue;
    aside.push_back(ring->direction.dot(site.direction) * ring->direction - site.direction);
  }
  const bool stool = sites.size() == stool_sites && aside.size() + 1 == stool_sites &&
                     std::all_of(aside.begin(), aside.end(), [](const Eigen::Vector3d& leg) {
                       return leg.norm() > least_aside;
                     });
  if (!stool) return directions;
  directions.erase(directions.begin() + (ring - sites.begin()));
  for (const Eigen::Vector3d& leg : aside) {
    directions.emplace_back(
        (ring->direction + std::numbers::sqrt2 * leg.normalized()).normalized());
  }
  return directions;
}

}  // namespace

DBlock find_d_block(const MolecularSymmetry& symmetry, const Basis& basis, const Levels& levels,
                    const Populations& populations, int metal) {
  DBlock block;
  block.metal = metal;
  const std::vector<Eigen::Vector3d> directions =
      donor_directions(donor_sites(symmetry.molecule, metal));
  block.shape = nearest_polyhedron(directions);
  // Without a parent all d orbitals are alike, and no label is given.
  std::vector<DIrrep> irreps = {{"", Eigen::MatrixXd::Identity(5, 5), 5, false}};
  Eigen::MatrixXd turn = Eigen::MatrixXd::Identity(5, 5);
  if (block.shape || directions.size() == 1) {
    const Parent parent =
        block.shape ? polyhedral_parent(*block.shape) : axial_parent(directions.front());
    block.parent_group = parent.group.symbol().name();
    irreps = d_irreps(parent, directions);
    turn = harmonic_rotation(d, parent.turn);
  }
  const std::vector<DContent> contents =
      d_contents(symmetry, basis, levels, populations, metal, irreps, turn);
  add_levels(symmetry, basis, levels, irreps, contents, block);
  return block;
}

}  // namespace irrepwise
