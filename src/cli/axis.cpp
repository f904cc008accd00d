#include "cli/axis.hpp"

#include <algorithm>
#include <optional>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"

namespace irrepwise::cli {
namespace {

std::vector<std::string> split_at_commas(const std::string& text) {
  std::vector<std::string> parts;
  std::size_t start = 0;
  for (;;) {
    const std::size_t comma = std::min(text.find(',', start), text.size());
    parts.emplace_back(trimmed(std::string_view(text).substr(start, comma - start)));
    if (comma == text.size()) return parts;
    start = comma + 1;
  }
}

int find_atom(const std::string& name, const Molecule& molecule) {
  std::vector<std::string> names;
  for (int atom = 0; atom < molecule.size(); ++atom) {
    names.push_back(atom_name(molecule, atom));
    if (names.back() == name) return atom;
  }
  const std::string nearest = nearest_word(name, names);
  throw Error(fmt::format(
      "no atom is called {}{}; atoms are named by symbol and number in the "
      "order of the input, {} to {}",
      irrepwise::quoted(name), nearest.empty() ? "" : ", did you mean '" + nearest + "'?",
      names.front(), names.back()));
}

}  // namespace

AxisDirection parse_axis(const std::string& text, const Molecule& molecule) {
  const std::vector<std::string> parts = split_at_commas(text);
  std::vector<double> numbers;
  for (const std::string& part : parts) {
    if (const std::optional<double> number = parse_number(part)) numbers.push_back(*number);
  }
  if (numbers.size() == 3 && parts.size() == 3) {
    return Eigen::Vector3d(numbers[0], numbers[1], numbers[2]);
  }
  if (!numbers.empty() || parts.size() > 3) {
    throw Error(
        fmt::format("{} is no axis; expected a vector such as 0,0,1 or one to three atoms "
                    "such as {}",
                    irrepwise::quoted(text), atom_name(molecule, 0)));
  }
  std::vector<int> atoms;
  for (const std::string& part : parts) {
    const int atom = find_atom(part, molecule);
    if (std::find(atoms.begin(), atoms.end(), atom) != atoms.end()) {
      throw Error(
          fmt::format("{} names {} twice; give different atoms", irrepwise::quoted(text), part));
    }
    atoms.push_back(atom);
  }
  return atoms;
}

}  // namespace irrepwise::cli
