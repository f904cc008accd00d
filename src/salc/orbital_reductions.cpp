#include "salc/orbital_reductions.hpp"

#include <algorithm>
#include <stdexcept>
#include <utility>

#include "harmonics/real_harmonics.hpp"
#include "molecule/metals.hpp"
#include "salc/outer_frames.hpp"

namespace irrepwise {
namespace {

std::vector<int> times_of(const PointGroup& group, const EquivalentAtoms& set,
                          const SiteFunctions& functions) {
  std::vector<int> times;
  const bool spherical = group.symbol().family == Family::Kh;
  for (std::size_t i = 0; i < group.irreps().size(); ++i) {
    times.push_back(spherical ? (static_cast<int>(i) == functions.l ? 1 : 0)
                              : multiplicity(group.irreps()[i], set, functions));
  }
  return times;
}

// The parts of all shells up to one, each once.
std::vector<Part> parts_up_to(const LocalFrames& frames, int largest_l) {
  std::vector<Part> parts;
  for (int l = 0; l <= largest_l; ++l) {
    for (const Part part : parts_of_shell(frames, l)) {
      if (std::find(parts.begin(), parts.end(), part) == parts.end()) parts.push_back(part);
    }
  }
  return parts;
}

OrbitalReduction reduction(const MolecularSymmetry& symmetry,
                           const std::vector<EquivalentAtoms>& sets, int set, Part part,
                           const SiteFunctions& functions) {
  OrbitalReduction result{set, part, {}, 0, times_of(symmetry.group, sets[set], functions)};
  result.orbitals = static_cast<int>(functions.span.cols()) * sets[set].size();
  int spanned = 0;
  for (std::size_t i = 0; i < result.times.size(); ++i) {
    spanned += result.times[i] * symmetry.group.irreps()[i].dimension;
  }
  if (spanned != result.orbitals) {
    throw std::logic_error("a reduction does not add up to the number of orbitals");
  }
  return result;
}

}  // namespace

std::vector<int> part_components(Part part, int l) {
  switch (part) {
    case Part::Shell:
      break;
    case Part::Sigma:
      if (l == 1) return {2};
      return {0};
    case Part::Pi:
      if (l == 0) return {};
      if (l == 1) return {0, 1};
      return l == 2 ? std::vector<int>{3, 4} : std::vector<int>{1, 2};
    case Part::PiInPlane:
    case Part::PiOutOfPlane: {
      const std::vector<int> both = part_components(Part::Pi, l);
      if (both.empty()) return {};
      return {part == Part::PiInPlane ? both[0] : both[1]};
    }
    case Part::Delta:
      if (l < 2) return {};
      return l == 2 ? std::vector<int>{1, 2} : std::vector<int>{3, 4};
    case Part::Phi:
      if (l < 3) return {};
      return {5, 6};
    case Part::FacePi:
      return l == 1 ? std::vector<int>{2} : std::vector<int>{};
    case Part::FacePlane:
      return l == 1 ? std::vector<int>{0, 1} : std::vector<int>{};
    case Part::FaceS:
      if (l != 0) return {};
      break;
    case Part::FaceD:
      if (l != 2) return {};
      break;
    case Part::FaceF:
      if (l != 3) return {};
      break;
  }
  std::vector<int> all;
  for (int i = 0; i <= 2 * l; ++i) all.push_back(i);
  return all;
}

const char* part_name(Part part) {
  switch (part) {
    case Part::Shell:
      return "";
    case Part::Sigma:
      return "σ";
    case Part::Pi:
      return "π";
    case Part::PiInPlane:
      return "π in plane";
    case Part::PiOutOfPlane:
      return "π out of plane";
    case Part::Delta:
      return "δ";
    case Part::Phi:
      return "φ";
    case Part::FacePi:
      return "π";
    case Part::FacePlane:
      return "in plane";
    case Part::FaceS:
      return "s";
    case Part::FaceD:
      return "d";
    case Part::FaceF:
      return "f";
  }
  return "";
}

std::string part_key(Part part, int l) {
  switch (part) {
    case Part::Shell:
      return std::string(1, shell_letter(l));
    case Part::Sigma:
      return "sigma";
    case Part::Pi:
      return "pi";
    case Part::PiInPlane:
      return "pi_in_plane";
    case Part::PiOutOfPlane:
      return "pi_out_of_plane";
    case Part::Delta:
      return "delta";
    case Part::Phi:
      return "phi";
    case Part::FacePi:
      return "pi_of_ligand";
    case Part::FacePlane:
      return "in_plane_of_ligand";
    case Part::FaceS:
      return "s_of_ligand";
    case Part::FaceD:
      return "d_of_ligand";
    case Part::FaceF:
      return "f_of_ligand";
  }
  return {};
}

std::vector<Part> parts_of_shell(const LocalFrames& frames, int l) {
  if (frames.side_on) {
    if (l == 0) return {Part::FaceS};
    if (l == 1) return {Part::FacePi, Part::FacePlane};
    return {l == 2 ? Part::FaceD : Part::FaceF};
  }
  std::vector<Part> parts = {Part::Sigma};
  if (l >= 1 && !frames.in_plane) parts.push_back(Part::Pi);
  if (l >= 1 && frames.in_plane) {
    parts.push_back(Part::PiInPlane);
    parts.push_back(Part::PiOutOfPlane);
  }
  if (l >= 2) parts.push_back(Part::Delta);
  if (l >= 3) parts.push_back(Part::Phi);
  return parts;
}

SiteFunctions part_functions(const PointGroup& group, const EquivalentAtoms& set,
                             const LocalFrames& frames, Part part, int l) {
  SiteFunctions functions = whole_shell(group, set, l);
  const HarmonicMatrix turned = harmonic_rotation(l, frames.frames.front());
  const std::vector<int> components = part_components(part, l);
  functions.span.resize(2 * l + 1, static_cast<Eigen::Index>(components.size()));
  for (std::size_t i = 0; i < components.size(); ++i) {
    functions.span.col(static_cast<Eigen::Index>(i)) = turned.col(components[i]);
  }
  return functions;
}

std::vector<std::optional<LocalFrames>> frames_of_sets(const MolecularSymmetry& symmetry,
                                                       const std::vector<EquivalentAtoms>& sets) {
  const std::optional<Centre> centre = find_centre(symmetry);
  std::vector<std::optional<LocalFrames>> frames;
  for (const EquivalentAtoms& set : sets) {
    frames.push_back(centre ? local_frames(symmetry, set, *centre) : std::nullopt);
  }
  std::vector<int> starts;
  if (centre && centre->atom) {
    starts = {*centre->atom};
  } else {
    starts = metals_of_complex(symmetry.molecule);
    if (starts.size() < 2) return frames;
  }
  return with_outer_frames(symmetry, sets, starts, centre, std::move(frames));
}

std::vector<OrbitalReduction> orbital_reductions(
    const MolecularSymmetry& symmetry, const Basis& basis, const std::vector<EquivalentAtoms>& sets,
    const std::vector<std::optional<LocalFrames>>& frames) {
  std::vector<OrbitalReduction> list;
  for (int s = 0; s < static_cast<int>(sets.size()); ++s) {
    const int first = basis.first_shell[sets[s].representative()];
    const int end = basis.first_shell[sets[s].representative() + 1];
    for (int shell = first; shell < end; ++shell) {
      const SiteFunctions functions = whole_shell(symmetry.group, sets[s], basis.shells[shell].l);
      list.push_back(reduction(symmetry, sets, s, Part::Shell, functions));
      list.back().shells = {shell};
    }
    if (!frames[s]) continue;
    int largest_l = 0;
    for (int shell = first; shell < end; ++shell) {
      largest_l = std::max(largest_l, basis.shells[shell].l);
    }
    for (const Part part : parts_up_to(*frames[s], largest_l)) {
      std::vector<int> holders;
      for (int shell = first; shell < end; ++shell) {
        if (!part_components(part, basis.shells[shell].l).empty()) holders.push_back(shell);
      }
      list.push_back(reduction(symmetry, sets, s, part,
                               part_functions(symmetry.group, sets[s], *frames[s], part,
                                              basis.shells[holders.front()].l)));
      list.back().shells = holders;
    }
  }
  return list;
}

}  // namespace irrepwise
