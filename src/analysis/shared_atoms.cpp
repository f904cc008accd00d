#include "analysis/shared_atoms.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <optional>

#include <Eigen/Geometry>

#include "analysis/donors.hpp"
#include "analysis/nearest_polyhedron.hpp"
#include "molecule/bonded_atoms.hpp"
#include "molecule/metals.hpp"

namespace irrepwise {
namespace {

// What turns are found from: donor sites about a metal, or atoms about the centroid.
struct Landmark {
  int atom = 0;  // the first, if there are several
  int element = 0;
  int n_atoms = 1;
  Eigen::Vector3d position;  // from the anchor, Å
};

struct Laid {
  std::optional<int> metal;
  Eigen::Vector3d anchor;
  std::vector<Landmark> landmarks;
  const Molecule* molecule;
};

constexpr std::size_t most_landmarks = 12;

Laid laid_out(const Molecule& molecule, bool on_metal) {
  Laid laid;
  laid.molecule = &molecule;
  const std::vector<int> metals = on_metal ? centre_atoms(molecule) : std::vector<int>{};
  if (!metals.empty()) {
    laid.metal = metals.front();
    laid.anchor = molecule.atoms()[static_cast<std::size_t>(metals.front())].position;
    for (const DonorSite& site : donor_sites(molecule, metals.front())) {
      Eigen::Vector3d centroid = Eigen::Vector3d::Zero();
      for (const int atom : site.atoms) {
        centroid += molecule.atoms()[static_cast<std::size_t>(atom)].position - laid.anchor;
      }
      const Atom& donor = molecule.atoms()[static_cast<std::size_t>(site.atoms.front())];
      laid.landmarks.push_back({site.atoms.front(), donor.atomic_number,
                                static_cast<int>(site.atoms.size()),
                                centroid / static_cast<double>(site.atoms.size())});
    }
    return laid;
  }
  laid.anchor = molecule.positions().rowwise().mean();
  for (int i = 0; i < molecule.size(); ++i) {
    const Atom& atom = molecule.atoms()[static_cast<std::size_t>(i)];
    laid.landmarks.push_back({i, atom.atomic_number, 1, atom.position - laid.anchor});
  }
  std::stable_sort(laid.landmarks.begin(), laid.landmarks.end(),
                   [](const Landmark& a, const Landmark& b) { return a.element > b.element; });
  if (laid.landmarks.size() > most_landmarks) laid.landmarks.resize(most_landmarks);
  return laid;
}

bool meet(const Landmark& a, const Landmark& b, const Eigen::Matrix3d& turn) {
  return a.element == b.element && a.n_atoms == b.n_atoms &&
         (a.position - turn * b.position).norm() < same_atom_angstrom;
}

int landmarks_met(const Laid& first, const Laid& second, const Eigen::Matrix3d& turn) {
  int count = 0;
  for (const Landmark& a : first.landmarks) {
    count += std::any_of(second.landmarks.begin(), second.landmarks.end(),
                         [&](const Landmark& b) { return meet(a, b, turn); });
  }
  return count;
}

// The nearest pairs first.
std::vector<std::pair<int, int>> atoms_met(const Laid& first, const Laid& second,
                                           const Eigen::Matrix3d& turn) {
  struct Near {
    double distance;
    int a, b;
  };
  std::vector<std::pair<int, int>> pairs;
  std::vector<Near> near;
  for (int a = 0; a < first.molecule->size(); ++a) {
    const Atom& atom = first.molecule->atoms()[static_cast<std::size_t>(a)];
    for (int b = 0; b < second.molecule->size(); ++b) {
      if (first.metal && second.metal && (a == *first.metal || b == *second.metal)) continue;
      const Atom& other = second.molecule->atoms()[static_cast<std::size_t>(b)];
      if (atom.atomic_number != other.atomic_number) continue;
      const double distance =
          (atom.position - first.anchor - turn * (other.position - second.anchor)).norm();
      if (distance < same_atom_angstrom) near.push_back({distance, a, b});
    }
  }
  std::stable_sort(near.begin(), near.end(),
                   [](const Near& x, const Near& y) { return x.distance < y.distance; });
  if (first.metal && second.metal) pairs.emplace_back(*first.metal, *second.metal);
  for (const Near& pair : near) {
    const bool taken = std::any_of(pairs.begin(), pairs.end(), [&](const auto& known) {
      return known.first == pair.a || known.second == pair.b;
    });
    if (!taken) pairs.emplace_back(pair.a, pair.b);
  }
  std::sort(pairs.begin(), pairs.end());
  return pairs;
}

bool spans_a_plane(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  return a.cross(b).norm() > 0.1 * a.norm() * b.norm() && a.norm() > 0.1 && b.norm() > 0.1;
}

// Takes the direction of b1 to that of a1 and the plane of b1 and b2 to that of a1 and a2; nothing
// where the angles in them differ much, or there is no plane.
std::optional<Eigen::Matrix3d> turn_between(const Eigen::Vector3d& a1, const Eigen::Vector3d& a2,
                                            const Eigen::Vector3d& b1, const Eigen::Vector3d& b2) {
  constexpr double same_cosine = 0.35;  // 20 degrees off a right angle
  if (!spans_a_plane(a1, a2) || !spans_a_plane(b1, b2)) return {};
  const double cosine_a = a1.normalized().dot(a2.normalized());
  const double cosine_b = b1.normalized().dot(b2.normalized());
  if (std::abs(cosine_a - cosine_b) > same_cosine) return {};
  const auto frame = [](const Eigen::Vector3d& x, const Eigen::Vector3d& y) {
    Eigen::Matrix3d axes;
    axes.col(0) = x.normalized();
    axes.col(2) = x.cross(y).normalized();
    axes.col(1) = axes.col(2).cross(axes.col(0));
    return axes;
  };
  return frame(a1, a2) * frame(b1, b2).transpose();
}

double cosine_between(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  const double lengths = a.norm() * b.norm();
  return lengths > 0.0 ? a.dot(b) / lengths : 0.0;
}

constexpr double one_direction = 0.94;  // cosine of 20 degrees

// How many landmarks point where one of the other molecule does, of whatever element.
int directions_met(const Laid& first, const Laid& second, const Eigen::Matrix3d& turn) {
  int count = 0;
  for (const Landmark& a : first.landmarks) {
    count += std::any_of(second.landmarks.begin(), second.landmarks.end(), [&](const Landmark& b) {
      return cosine_between(a.position, turn * b.position) >= one_direction;
    });
  }
  return count;
}

struct Best {
  Eigen::Matrix3d turn;
  int landmarks = -1;
  int directions = -1;
  std::vector<std::pair<int, int>> atoms;
};

bool is_terminal(const Laid& laid, int atom) {
  const std::vector<int> neighbours = bonded_atoms(*laid.molecule, atom);
  return std::all_of(neighbours.begin(), neighbours.end(),
                     [&](int other) { return other == *laid.metal; });
}

std::vector<ReplacedDonor> donors_replaced(const Laid& first, const Laid& second,
                                           const Best& best) {
  std::vector<ReplacedDonor> pairs;
  if (!first.metal || !second.metal) return pairs;
  std::vector<bool> ours(first.molecule->atoms().size(), false);
  std::vector<bool> theirs(second.molecule->atoms().size(), false);
  for (const auto& [a, b] : best.atoms) {
    ours[static_cast<std::size_t>(a)] = true;
    theirs[static_cast<std::size_t>(b)] = true;
  }
  for (const Landmark& a : first.landmarks) {
    if (a.n_atoms != 1 || ours[static_cast<std::size_t>(a.atom)]) continue;
    const Landmark* nearest = nullptr;
    double cosine = one_direction;
    for (const Landmark& b : second.landmarks) {
      if (b.n_atoms != 1 || theirs[static_cast<std::size_t>(b.atom)]) continue;
      const double own = cosine_between(a.position, best.turn * b.position);
      if (own >= cosine) {
        cosine = own;
        nearest = &b;
      }
    }
    if (!nearest) continue;
    theirs[static_cast<std::size_t>(nearest->atom)] = true;
    pairs.push_back({a.atom, nearest->atom, a.position.normalized(),
                     !is_terminal(first, a.atom) || !is_terminal(second, nearest->atom)});
  }
  return pairs;
}

void consider(const Laid& first, const Laid& second, const Eigen::Matrix3d& turn, Best& best) {
  const int landmarks = landmarks_met(first, second, turn);
  if (landmarks < best.landmarks) return;
  const int directions = directions_met(first, second, turn);
  if (landmarks == best.landmarks && directions < best.directions) return;
  std::vector<std::pair<int, int>> atoms = atoms_met(first, second, turn);
  if (landmarks == best.landmarks && directions == best.directions &&
      atoms.size() <= best.atoms.size()) {
    return;
  }
  best = {turn, landmarks, directions, std::move(atoms)};
}

// The turn once more, from all atoms that meet, where they span space.
Eigen::Matrix3d refined(const Laid& first, const Laid& second, const Best& best) {
  const auto n = static_cast<Eigen::Index>(best.atoms.size());
  Eigen::Matrix3Xd a(3, n), b(3, n);
  for (Eigen::Index i = 0; i < n; ++i) {
    const auto& [of_first, of_second] = best.atoms[static_cast<std::size_t>(i)];
    a.col(i) = first.molecule->atoms()[static_cast<std::size_t>(of_first)].position - first.anchor;
    b.col(i) = best.turn * (second.molecule->atoms()[static_cast<std::size_t>(of_second)].position -
                            second.anchor);
  }
  const bool spans = [&] {
    for (Eigen::Index i = 0; i < n; ++i) {
      for (Eigen::Index j = i + 1; j < n; ++j) {
        if (spans_a_plane(a.col(i), a.col(j)) && spans_a_plane(b.col(i), b.col(j))) return true;
      }
    }
    return false;
  }();
  return spans ? Eigen::Matrix3d(best_turn(a, b) * best.turn) : best.turn;
}

}  // namespace

SharedAtoms find_shared_atoms(const MolecularSymmetry& first, const MolecularSymmetry& second) {
  // Where one has nothing to lay on a metal, all atoms count.
  const bool on_metals =
      !centre_atoms(first.molecule).empty() && !centre_atoms(second.molecule).empty();
  const Laid a = laid_out(first.molecule, on_metals);
  const Laid b = laid_out(second.molecule, on_metals);
  Best best;
  consider(a, b, first.rotation * second.rotation.transpose(), best);
  const std::size_t most = std::min(first.molecule.atoms().size(), second.molecule.atoms().size());
  for (std::size_t i = 0; i < a.landmarks.size(); ++i) {
    for (std::size_t j = i + 1; j < a.landmarks.size(); ++j) {
      for (std::size_t p = 0; p < b.landmarks.size(); ++p) {
        for (std::size_t q = 0; q < b.landmarks.size(); ++q) {
          if (best.atoms.size() == most) break;
          if (p == q) continue;
          const std::optional<Eigen::Matrix3d> turn =
              turn_between(a.landmarks[i].position, a.landmarks[j].position,
                           b.landmarks[p].position, b.landmarks[q].position);
          if (turn) consider(a, b, *turn, best);
        }
      }
    }
  }
  const Eigen::Matrix3d turn = refined(a, b, best);
  std::vector<ReplacedDonor> replaced = donors_replaced(a, b, best);
  return {std::move(best.atoms), std::move(replaced), turn};
}

}  // namespace irrepwise
