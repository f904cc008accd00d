#include "basis/parameter_yaml.hpp"

#include <algorithm>
#include <map>
#include <optional>
#include <string_view>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "molecule/element.hpp"
#include "molecule/label.hpp"

namespace irrepwise {
namespace {

using Sources = std::map<std::string, std::string, std::less<>>;

Sources read_sources(const YamlNode& node) {
  Sources sources;
  for (const YamlNode::Entry& entry : node.map("names of sources with their words")) {
    sources[entry.key.word()] = entry.value.word("the words of a source");
  }
  return sources;
}

std::string read_source(const YamlNode& shell, const Sources& sources) {
  std::string source = "no source stated";
  if (const YamlNode* const node = shell.find("source")) {
    source = node->word("a key of `sources`, or words");
    if (const auto found = sources.find(source); found != sources.end()) source = found->second;
  }
  if (const YamlNode* const node = shell.find("confidence")) {
    const std::string& confidence = node->word("high or medium");
    if (confidence != "high" && confidence != "medium") node->fail_expected("high or medium");
    source += "; confidence " + confidence;
  }
  return source;
}

ShellParameters read_shell(const YamlNode& node, const Sources& sources) {
  node.expect_keys("a shell", {"shell", "h_ii", "exponent", "exponents", "coefficients", "source",
                               "confidence"});
  const ShellName name = read_shell_name(node.at("shell"));
  const double h_ii_ev = read_h_ii_ev(node.at("h_ii"));
  return {name.n, name.l, h_ii_ev, read_radial(node, name.n), read_source(node, sources)};
}

ElementParameters read_element(const YamlNode& node, const Sources& sources) {
  node.expect_keys("an element", {"valence_electrons", "shells"});
  ElementParameters element;
  int n_places = 0;
  for (const YamlNode& item : node.at("shells").list("a list of shells")) {
    const ShellParameters shell = read_shell(item, sources);
    for (const ShellParameters& other : element.shells) {
      if (other.l != shell.l) continue;
      item.fail(fmt::format("a second {} shell; an element has at most one of each kind",
                            shell_letter(shell.l)));
    }
    n_places += 2 * (2 * shell.l + 1);
    element.shells.push_back(shell);
  }
  if (element.shells.empty()) node.at("shells").fail("found no shell, expected at least one");
  const YamlNode& electrons = node.at("valence_electrons");
  element.valence_electrons = electrons.whole_number("a whole number of valence electrons");
  if (element.valence_electrons < 0 || element.valence_electrons > n_places) {
    electrons.fail(
        fmt::format("found {} valence electrons, expected 0 to {}, which the shells hold",
                    element.valence_electrons, n_places));
  }
  return element;
}

std::map<int, ElementParameters> read_elements(const YamlNode& node, const Sources& sources) {
  std::map<int, ElementParameters> elements;
  for (const YamlNode::Entry& entry : node.map("symbols of elements with their parameters")) {
    const std::optional<int> z = atomic_number(entry.key.word());
    if (!z) {
      entry.key.fail(fmt::format("{} is not an element{}", quoted(entry.key.word()),
                                 symbol_hint(entry.key.word())));
    }
    if (elements.contains(*z)) {
      entry.key.fail(fmt::format("{} stands here twice; keep one", element_symbol(*z)));
    }
    elements.emplace(*z, read_element(entry.value, sources));
  }
  return elements;
}

// One Slater function of the given n; the message of a refusal points at the exponent.
SlaterRadial read_exponent(const YamlNode& node, int n) {
  const double zeta = node.number("an exponent in 1/bohr");
  try {
    return SlaterRadial(n, zeta);
  } catch (const Error& error) {
    throw error_at(node.place(), error);
  }
}

}  // namespace

ShellName read_shell_name(const YamlNode& node) {
  constexpr std::string_view what = "a shell such as 3d";
  const std::string& word = node.word(what);
  const std::size_t l = word.size() == 2 ? std::string_view("spdf").find(word[1]) : 4;
  if (l >= 4 || word[0] < '1' || word[0] > '9') node.fail_expected(what);
  const ShellName name{word[0] - '0', static_cast<int>(l)};
  if (name.n > SlaterRadial::max_n) {
    node.fail(fmt::format("found n = {}, expected 1 to {}", name.n, SlaterRadial::max_n));
  }
  if (name.l >= name.n) {
    node.fail(fmt::format("there is no {} shell: {} shells begin at {}{}", word, word[1], l + 1,
                          word[1]));
  }
  return name;
}

double read_h_ii_ev(const YamlNode& node) {
  constexpr double lowest_ev = -1000.0;  // no valence shell is near it: a slip of unit
  const double value = node.number("H_ii in eV");
  if (!(value < 0.0 && value >= lowest_ev)) {
    node.fail(
        fmt::format("found H_ii = {} eV, expected a negative number down to {}", value, lowest_ev));
  }
  return value;
}

bool has_radial(const YamlNode& map) {
  return map.find("exponent") || map.find("exponents") || map.find("coefficients");
}

ContractedRadial read_radial(const YamlNode& map, int n) {
  const YamlNode* const single = map.find("exponent");
  const YamlNode* const pair = map.find("exponents");
  const YamlNode* const coefficients = map.find("coefficients");
  if (single && (pair || coefficients)) {
    map.fail("both `exponent` and a pair stand here; keep one of them");
  }
  if (single) return ContractedRadial({{read_exponent(*single, n), 1.0}});
  if (!pair || !coefficients) {
    map.fail("expected `exponent`, or two `exponents` with their `coefficients`");
  }
  const auto exponents = pair->list_of(2, "two exponents; write a single one as `exponent`");
  const auto factors = coefficients->list_of(2, "two coefficients");
  std::vector<ContractedRadial::Term> terms;
  for (std::size_t i = 0; i < exponents.size(); ++i) {
    terms.push_back({read_exponent(exponents[i], n), factors[i].number("a coefficient")});
  }
  try {
    return ContractedRadial(std::move(terms));
  } catch (const Error& error) {
    throw error_at(coefficients->place(), error);
  }
}

ParameterSet read_parameter_set(const YamlNode& node, const std::string& default_name) {
  node.expect_keys("a parameter set", {"name", "extends", "sources", "elements"});
  const YamlNode* const name = node.find("name");
  const YamlNode* const sources = node.find("sources");
  ParameterSet set(
      name ? name->word("a name") : default_name,
      read_elements(node.at("elements"), sources ? read_sources(*sources) : Sources{}));
  const YamlNode* const base = node.find("extends");
  if (!base) return set;
  if (base->word("`published`") != "published") base->fail_expected("`published`");
  return published_parameters().extended_by(set);
}

}  // namespace irrepwise
