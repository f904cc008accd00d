#include "output/caption_words.hpp"

#include <algorithm>

#include <array>
#include <cstddef>
#include <cstdlib>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "output/symmetry_words.hpp"

namespace irrepwise {
namespace {

bool any_frames(const std::vector<std::optional<LocalFrames>>& frames, bool LocalFrames::*kind) {
  return std::any_of(frames.begin(), frames.end(),
                     [&](const auto& local) { return local && (*local).*kind; });
}

}  // namespace

std::string readable_group(std::string name) {
  const std::size_t at = name.find("inf");
  return at == std::string::npos ? name : name.replace(at, 3, "∞");
}

std::string readable_formula(const Molecule& molecule) {
  constexpr std::array<const char*, 10> below = {"₀", "₁", "₂", "₃", "₄", "₅", "₆", "₇", "₈", "₉"};
  const auto is_digit = [](char c) { return c >= '0' && c <= '9'; };
  const auto figure = [](char c) { return static_cast<std::size_t>(c - '0'); };
  std::string words;
  for (const char c : hill_formula(molecule)) {
    words += is_digit(c) ? below[figure(c)] : std::string(1, c);
  }
  const int charge = molecule.charge();
  if (charge == 0) return words;
  if (std::abs(charge) > 1) words += superscript(std::abs(charge));
  return words + (charge > 0 ? "⁺" : "⁻");
}

std::string geometry_sentence(const LevelsResult& result, const std::string& source) {
  const MolecularSymmetry& symmetry = result.symmetry;
  std::string group = readable_group(symmetry.group.symbol().name());
  if (!symmetry.full_group.empty() && symmetry.full_group != symmetry.group.symbol().name()) {
    group += ", a subgroup of " + readable_group(symmetry.full_group);
  }
  std::string words =
      fmt::format("Geometry: {}, {}, {}", source, readable_formula(result.molecule), group);
  constexpr double worth_a_word_angstrom = 5e-5;
  if (symmetry.largest_shift_angstrom >= worth_a_word_angstrom) {
    words += fmt::format(" (atoms shifted by up to {:.4f} Å to be exact)",
                         symmetry.largest_shift_angstrom);
  }
  return words + ".";
}

std::string method_sentence(const LevelsResult& result) {
  const Levels& levels = result.levels;
  return fmt::format("Extended Hückel, {} rule{}, parameters: {}.", rule_name(levels.rule),
                     levels.k ? fmt::format(", K\u00A0=\u00A0{}", *levels.k) : "",
                     result.parameter_set);
}

std::string axes_sentence(const LevelsResult& result) {
  const std::vector<std::string>& axes = result.symmetry.axes;
  const bool as_given =
      axes.empty() || (axes.size() == 1 && axes.front().find('=') == std::string::npos);
  if (as_given) return "Axes as in the input.";
  std::string words;
  for (const std::string& axis : axes) words += (words.empty() ? "" : "; ") + axis;
  return "Axes: " + words + ".";
}

std::string frame_goal_words(const Molecule& molecule,
                             const std::vector<std::optional<LocalFrames>>& frames,
                             const std::optional<int>& central_atom) {
  if (central_atom) return atom_name(molecule, *central_atom);
  return any_frames(frames, &LocalFrames::to_own_metal)
             ? "the metal it is bonded to (to the midpoint of several), z of a metal to the centre"
             : "the centre";
}

std::string further_frame_sentences(const std::vector<std::optional<LocalFrames>>& frames) {
  std::string words;
  if (any_frames(frames, &LocalFrames::beyond_donors)) {
    words +=
        " Beyond the donors z points along the bond towards it; x and y are those of the atom "
        "before where the ligand is straight, otherwise x or y, whichever was nearer to it there, "
        "stands across the plane of the bonds.";
  }
  if (any_frames(frames, &LocalFrames::side_on)) {
    words +=
        " Of a ring or π bond over a metal, π is along the normal of its plane, on the side of the "
        "metal; in the plane r points to the neighbours that bind with it, t across r.";
  }
  return words;
}

}  // namespace irrepwise
