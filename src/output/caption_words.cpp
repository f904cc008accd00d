#include "output/caption_words.hpp"

#include <string>
#include <vector>

#include <fmt/format.h>

namespace irrepwise {

std::string readable_group(std::string name) {
  const std::size_t at = name.find("inf");
  return at == std::string::npos ? name : name.replace(at, 3, "∞");
}

std::string geometry_sentence(const LevelsResult& result, const std::string& source) {
  const MolecularSymmetry& symmetry = result.symmetry;
  std::string group = readable_group(symmetry.group.symbol().name());
  if (!symmetry.full_group.empty() && symmetry.full_group != symmetry.group.symbol().name()) {
    group += ", a subgroup of " + readable_group(symmetry.full_group);
  }
  std::string words =
      fmt::format("Geometry: {}, {}, {}", source, charged_formula(result.molecule), group);
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

}  // namespace irrepwise
