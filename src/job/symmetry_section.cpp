#include <cstddef>
#include <optional>
#include <set>
#include <span>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "job/job_file.hpp"

namespace irrepwise {
namespace {

constexpr double largest_tolerance_angstrom = 1.0;  // beyond a bond's half every atom is an image

int read_atom(const YamlNode& node, const Molecule& molecule) {
  const int number = node.whole_number("the number of an atom");
  if (number < 1 || number > molecule.size()) {
    node.fail(fmt::format("there is no atom {}, expected 1 to {}", number, molecule.size()));
  }
  return number - 1;
}

std::vector<int> read_atoms(const YamlNode& node, std::size_t size, std::string_view what,
                            const Molecule& molecule) {
  std::vector<int> atoms;
  for (const YamlNode& item : node.list_of(size, what)) {
    atoms.push_back(read_atom(item, molecule));
  }
  if (std::set<int>(atoms.begin(), atoms.end()).size() != atoms.size()) {
    node.fail("one atom stands here twice");
  }
  return atoms;
}

AxisDirection read_direction(const YamlNode& node, const Molecule& molecule) {
  node.expect_keys("an axis", {"vector", "atom", "atoms", "normal"});
  if (node.map().size() != 1) {
    node.fail("expected one of `vector`, `atom`, `atoms` (two) and `normal` (three atoms)");
  }
  const YamlNode& value = node.map().front().value;
  const std::string& kind = node.map().front().key.word();
  if (kind == "atom") return std::vector<int>{read_atom(value, molecule)};
  if (kind == "atoms") return read_atoms(value, 2, "two atoms", molecule);
  if (kind == "normal") return read_atoms(value, 3, "the three atoms of a plane", molecule);
  Eigen::Vector3d vector;
  const std::span<const YamlNode> parts = value.list_of(3, "three components");
  for (int i = 0; i < 3; ++i) {
    vector[i] = parts[static_cast<std::size_t>(i)].number("a component");
  }
  const double longest = vector.cwiseAbs().maxCoeff();
  if (longest == 0.0) value.fail("a vector of zeros has no direction");
  return Eigen::Vector3d((vector / longest).normalized());
}

}  // namespace

SymmetryOptions read_symmetry(const YamlNode& node, const Molecule& molecule) {
  node.expect_keys("the symmetry", {"tolerance", "limit", "axes", "group", "subgroup"});
  SymmetryOptions options;
  if (const YamlNode* const tolerance = node.find("tolerance")) {
    options.tolerance_angstrom = tolerance->number("a tolerance in Å");
    if (!(options.tolerance_angstrom > 0.0 &&
          options.tolerance_angstrom <= largest_tolerance_angstrom)) {
      tolerance->fail(fmt::format("found a tolerance of {} Å, expected more than 0 and at most {}",
                                  options.tolerance_angstrom, largest_tolerance_angstrom));
    }
  }
  if (const YamlNode* const limit = node.find("limit")) {
    options.limit_angstrom = limit->number("a limit in Å");
    if (!(options.limit_angstrom > 0.0 && options.limit_angstrom <= largest_tolerance_angstrom)) {
      limit->fail(fmt::format("found a limit of {} Å, expected more than 0 and at most {}",
                              options.limit_angstrom, largest_tolerance_angstrom));
    }
  }
  if (const YamlNode* const group = node.find("group")) {
    options.group = group->word("the symbol of a point group");
  }
  if (const YamlNode* const axes = node.find("axes")) {
    axes->expect_keys("the axes", {"z", "x"});
    if (const YamlNode* const z = axes->find("z")) options.z = read_direction(*z, molecule);
    if (const YamlNode* const x = axes->find("x")) options.x = read_direction(*x, molecule);
  }
  if (const YamlNode* const subgroup = node.find("subgroup")) {
    options.subgroup = subgroup->word("the symbol of a point group");
  }
  return options;
}

}  // namespace irrepwise
