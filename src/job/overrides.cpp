#include <algorithm>
#include <optional>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "basis/parameter_yaml.hpp"
#include "core/parse.hpp"
#include "job/job_file.hpp"
#include "molecule/element.hpp"
#include "molecule/label.hpp"

namespace irrepwise {
namespace {

bool has_element(const Molecule& molecule, int z) {
  return std::any_of(molecule.atoms().begin(), molecule.atoms().end(),
                     [&](const Atom& atom) { return atom.atomic_number == z; });
}

bool concerns_absent_element(const YamlNode& node, const Molecule& molecule) {
  const YamlNode* const element =
      node.kind() == YamlNode::Kind::Map ? node.find("element") : nullptr;
  if (!element || element->kind() != YamlNode::Kind::Word) return false;
  const std::optional<int> z = atomic_number(element->word());
  return z && !has_element(molecule, *z);
}

void read_target(const YamlNode& node, const Molecule& molecule, ParameterOverride& change) {
  const YamlNode* const element = node.find("element");
  const YamlNode* const atom = node.find("atom");
  if ((element != nullptr) == (atom != nullptr)) {
    node.fail("expected either `element` or `atom` in an override");
  }
  if (atom) {
    const int number = atom->whole_number("the number of an atom");
    if (number < 1 || number > molecule.size()) {
      atom->fail(fmt::format("there is no atom {}, expected 1 to {}", number, molecule.size()));
    }
    change.atom = number - 1;
    return;
  }
  const std::string& symbol = element->word("the symbol of an element");
  change.atomic_number = atomic_number(symbol);
  if (!change.atomic_number) {
    element->fail(fmt::format("{} is not an element{}", quoted(symbol), symbol_hint(symbol)));
  }
  if (!has_element(molecule, *change.atomic_number)) {
    element->fail(fmt::format("there is no {} in {}", element_symbol(*change.atomic_number),
                              hill_formula(molecule)));
  }
}

// The shell must be one that the parameter set has, so that a slip in n is seen.
void check_shell(const YamlNode& node, const ShellName& name, int z,
                 const ParameterSet& parameters) {
  const auto found = parameters.elements().find(z);
  if (found == parameters.elements().end()) return;  // the basis says so, and how to mend it
  std::string known;
  for (const ShellParameters& shell : found->second.shells) {
    if (shell.n == name.n && shell.l == name.l) return;
    known += fmt::format("{}{}{}", known.empty() ? "" : ", ", shell.n, shell_letter(shell.l));
  }
  node.fail(fmt::format("{} has no {}{} shell in the parameter set, only {}", element_symbol(z),
                        name.n, shell_letter(name.l), known));
}

ParameterOverride read_override(const YamlNode& node, const Molecule& molecule,
                                const ParameterSet& parameters) {
  node.expect_keys("an override", {"element", "atom", "shell", "h_ii", "exponent", "exponents",
                                   "coefficients", "valence_electrons"});
  ParameterOverride change;
  read_target(node, molecule, change);
  const int z = change.atom ? molecule.atoms()[static_cast<std::size_t>(*change.atom)].atomic_number
                            : *change.atomic_number;
  if (const YamlNode* const electrons = node.find("valence_electrons")) {
    constexpr int most = 32;  // two in each orbital of s, p, d and f
    change.valence_electrons = electrons->whole_number("a whole number of valence electrons");
    if (*change.valence_electrons < 0 || *change.valence_electrons > most) {
      electrons->fail(fmt::format("found {} valence electrons, expected 0 to {}",
                                  *change.valence_electrons, most));
    }
  }
  const YamlNode* const shell = node.find("shell");
  const YamlNode* const h_ii = node.find("h_ii");
  if (!shell) {
    if (h_ii || has_radial(node)) node.fail("name the shell that this is for, e.g. `shell: 3d`");
    if (!change.valence_electrons) node.fail("this override changes nothing");
    return change;
  }
  const ShellName name = read_shell_name(*shell);
  check_shell(*shell, name, z, parameters);
  change.l = name.l;
  if (h_ii) change.h_ii_ev = read_h_ii_ev(*h_ii);
  if (has_radial(node)) change.radial = read_radial(node, name.n);
  if (!change.h_ii_ev && !change.radial) {
    node.fail("this override changes nothing of the shell; give `h_ii` or an exponent");
  }
  return change;
}

}  // namespace

std::vector<ParameterOverride> read_overrides(const YamlNode& node, const Molecule& molecule,
                                              const ParameterSet& parameters,
                                              AbsentElement absent) {
  std::vector<ParameterOverride> overrides;
  for (const YamlNode& item : node.list("a list of overrides")) {
    if (absent == AbsentElement::Skipped && concerns_absent_element(item, molecule)) continue;
    overrides.push_back(read_override(item, molecule, parameters));
  }
  return overrides;
}

}  // namespace irrepwise
