#include "basis/parameter_set.hpp"

#include <cmath>
#include <filesystem>
#include <fstream>
#include <sstream>
#include <string>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "core/file.hpp"
#include "core/yaml.hpp"
#include "support/eps.hpp"
#include "support/paths.hpp"

using namespace irrepwise;

namespace {

std::string refusal(const std::string& yaml) {
  try {
    (void)parse_parameters(yaml, "p.yaml");
  } catch (const Error& error) {
    return error.what();
  }
  return "accepted";
}

// A set of one element with one shell.
std::string one_shell(const std::string& shell) {
  return "elements:\n  Fe:\n    valence_electrons: 2\n    shells:\n      - {" + shell + "}\n";
}

}  // namespace

TEST_CASE("the published set holds its 66 elements and 163 shells") {
  // Counted in the table that was transcribed.
  const ParameterSet& set = published_parameters();
  CHECK(set.name() == "published");
  CHECK(set.elements().size() == 66);
  std::size_t n_shells = 0;
  for (const auto& [z, element] : set.elements()) {
    CAPTURE(z);
    n_shells += element.shells.size();
    CHECK(element.valence_electrons >= 1);
    CHECK(element.valence_electrons <= 12);
    for (const ShellParameters& shell : element.shells) {
      CHECK(shell.h_ii_ev < 0.0);
      CHECK(shell.n > shell.l);
      CHECK(shell.radial.n() == shell.n);
      CHECK(shell.source.find("transcribed from memory; confidence ") != std::string::npos);
    }
    // The outer s shell leads, and d lies one below it, f two (the aufbau order).
    CHECK(element.shells.front().l == 0);
    for (const ShellParameters& shell : element.shells) {
      CHECK(shell.n == element.shells.front().n - (shell.l <= 1 ? 0 : shell.l - 1));
    }
  }
  CHECK(n_shells == 163);
}

TEST_CASE("every published pair is normalised to 0.001 before it is made exact") {
  // The identity <R(n,a)|R(n,b)> = (2 sqrt(ab) / (a + b))^(2n+1), on the numbers as they stand in
  // the file: the library's own reading has already scaled them.
  const YamlNode file =
      YamlNode::parse(read_text_file(source_path("params/published.yaml")), "published");
  int n_pairs = 0;
  double worst = 0.0;
  for (const YamlNode::Entry& element : file.at("elements").map()) {
    for (const YamlNode& shell : element.value.at("shells").list()) {
      if (!shell.find("exponents")) continue;
      const auto zeta = shell.at("exponents").list();
      const auto c = shell.at("coefficients").list();
      const double a = zeta[0].number();
      const double b = zeta[1].number();
      const int n = shell.at("shell").word()[0] - '0';
      const double mixed = std::pow(2.0 * std::sqrt(a * b) / (a + b), 2 * n + 1);
      const double norm = c[0].number() * c[0].number() + c[1].number() * c[1].number() +
                          2.0 * c[0].number() * c[1].number() * mixed;
      CAPTURE(element.key.word());
      CHECK(std::abs(norm - 1.0) < 1e-3);
      worst = std::max(worst, std::abs(norm - 1.0));
      ++n_pairs;
    }
  }
  CHECK(n_pairs == 33);
  MESSAGE("largest error of a published norm: " << worst);
}

TEST_CASE("the set compiled in is the set in the file") {
  const ParameterSet from_file = read_parameters(source_path("params/published.yaml"));
  const ParameterSet& built_in = published_parameters();
  REQUIRE(from_file.elements().size() == built_in.elements().size());
  for (const auto& [z, element] : from_file.elements()) {
    const ElementParameters& other = built_in.at(z);
    REQUIRE(element.shells.size() == other.shells.size());
    for (std::size_t i = 0; i < other.shells.size(); ++i) {
      CHECK(element.shells[i].h_ii_ev == other.shells[i].h_ii_ev);
      CHECK(element.shells[i].radial.terms().front().function.zeta() ==
            other.shells[i].radial.terms().front().function.zeta());
      CHECK(element.shells[i].source == other.shells[i].source);
    }
  }
}

TEST_CASE("values known from the literature stand where they belong") {
  // Common practice: Hoffmann's carbon (-21.4, -11.4 eV, 1.625) and Summerville's iron 3d.
  const ElementParameters& carbon = published_parameters().at(6);
  CHECK(carbon.valence_electrons == 4);
  CHECK(carbon.shells[0].h_ii_ev == -21.4);
  CHECK(carbon.shells[1].h_ii_ev == -11.4);
  CHECK(carbon.shells[1].radial.terms()[0].function.zeta() == 1.625);
  const ShellParameters& d = published_parameters().at(26).shells[2];
  CHECK(d.n == 3);
  CHECK(d.l == 2);
  CHECK(d.h_ii_ev == -12.6);
  REQUIRE(d.radial.terms().size() == 2);
  CHECK(d.radial.terms()[0].function.zeta() == 5.35);
  CHECK(std::abs(d.radial.terms()[0].coefficient - 0.5505) < 1e-3);  // renormalised
}

TEST_CASE("a set that extends another replaces and joins its elements; otherwise it stands alone") {
  const std::string hafnium =
      "elements:\n"
      "  Hf:\n"
      "    valence_electrons: 2\n"
      "    shells:\n"
      "      - {shell: 6s, h_ii: -8.0, exponent: 2.2, source: a guess}\n"
      "  H:\n"
      "    valence_electrons: 1\n"
      "    shells:\n"
      "      - {shell: 1s, h_ii: -13.6, exponent: 1.0}\n";
  const ParameterSet extended = parse_parameters("name: mine\nextends: published\n" + hafnium, "p");
  CHECK(extended.name() == "published + mine");
  CHECK(extended.elements().size() == 67);
  CHECK(extended.at(72).shells[0].source == "a guess");
  CHECK(extended.at(1).shells[0].radial.terms()[0].function.zeta() == 1.0);
  CHECK(extended.at(1).shells[0].source == "no source stated");
  CHECK(extended.at(6).valence_electrons == 4);

  const ParameterSet alone = parse_parameters(hafnium, "folder/own.yaml");
  CHECK(alone.name() == "own");
  CHECK(alone.elements().size() == 2);
}

TEST_CASE("an absent element is refused with the YAML to supply it") {
  CHECK_THROWS_WITH_AS(
      (void)published_parameters().at(72),
      "no parameters for Hf in the set 'published'; supply them, with numbers of your own for the "
      "dots, in a file for --parameters:\n"
      "extends: published\n"
      "elements:\n"
      "  Hf:\n"
      "    valence_electrons: 4\n"
      "    shells:\n"
      "      - {shell: 6s, h_ii: ..., exponent: ..., source: ...}\n"
      "      - {shell: 6p, h_ii: ..., exponent: ..., source: ...}\n"
      "      - {shell: 5d, h_ii: ..., exponents: [..., ...], coefficients: [..., ...], source: "
      "...}",
      Error);
}

TEST_CASE("the YAML shown for an absent element is read once its dots are numbers") {
  for (int z = 1; z <= 118; ++z) {
    CAPTURE(z);
    std::string message;
    try {
      (void)ParameterSet("empty", {}).at(z);
    } catch (const Error& error) {
      message = error.what();
    }
    std::string yaml = message.substr(message.find('\n') + 1);
    const auto replace_all = [&](const std::string& from, const std::string& to) {
      for (std::size_t at = yaml.find(from); at != std::string::npos; at = yaml.find(from)) {
        yaml.replace(at, from.size(), to);
      }
    };
    replace_all("[..., ...], coefficients: [..., ...]", "[2, 2], coefficients: [0.5, 0.5]");
    replace_all("h_ii: ...", "h_ii: -9");
    replace_all("exponent: ...", "exponent: 2");
    replace_all("source: ...", "source: own");
    const ParameterSet set = parse_parameters(yaml, "own.yaml");
    CHECK(set.elements().contains(z));
    // An independent fact: the published set has the same shells where it has a transition metal.
    const auto published = published_parameters().elements().find(z);
    const bool d_metal = (z >= 21 && z <= 29) || (z >= 40 && z <= 47) || (z >= 73 && z <= 80);
    if (published == published_parameters().elements().end() || !d_metal) continue;
    CHECK(set.at(z).valence_electrons == published->second.valence_electrons);
    CHECK(set.at(z).shells.size() == published->second.shells.size());
    for (std::size_t i = 0; i < set.at(z).shells.size(); ++i) {
      CHECK(set.at(z).shells[i].n == published->second.shells[i].n);
      CHECK(set.at(z).shells[i].l == published->second.shells[i].l);
    }
  }
}

TEST_CASE("a contraction further than 0.01 from normal is refused where it stands") {
  const auto iron_d = [](const std::string& second) {
    return one_shell("shell: 3d, h_ii: -12.6, exponents: [5.35, 2.0], coefficients: [0.5505, " +
                     second + "]");
  };
  CHECK(refusal(iron_d("0.6260")) == "accepted");
  // 0.5505^2 + 0.6620^2 + 2 x 0.5505 x 0.6620 x (2 sqrt(10.7) / 7.35)^7 = 1.0639
  CHECK(refusal(iron_d("0.6620")) ==
        "p.yaml:5:72: contraction: norm 1.0639, expected 1 within 0.01; check coefficients and "
        "exponents for a misprint");
}

TEST_CASE("wrong parameters are refused where they stand") {
  CHECK(refusal(one_shell("shell: 2d, h_ii: -5, exponent: 1")) ==
        "p.yaml:5:17: there is no 2d shell: d shells begin at 3d");
  CHECK(refusal(one_shell("shell: 8s, h_ii: -5, exponent: 1")) ==
        "p.yaml:5:17: found n = 8, expected 1 to 7");
  CHECK(refusal(one_shell("shell: s, h_ii: -5, exponent: 1")) ==
        "p.yaml:5:17: found 's', expected a shell such as 3d");
  CHECK(refusal(one_shell("shell: 4s, h_ii: 5, exponent: 1")) ==
        "p.yaml:5:27: found H_ii = 5 eV, expected a negative number down to -1000");
  CHECK(refusal(one_shell("shell: 4s, h_ii: .nan, exponent: 1")) ==
        "p.yaml:5:27: found '.nan', expected a finite number");
  CHECK(refusal(one_shell("shell: 4s, h_ii: -5, exponent: -1")) ==
        "p.yaml:5:41: Slater function: zeta = -1 bohr^-1, expected 0.001 to 1000");
  CHECK(refusal(one_shell("shell: 4s, h_ii: -5")) ==
        "p.yaml:5:9: expected `exponent`, or two `exponents` with their `coefficients`");
  CHECK(refusal(one_shell("shell: 4s, h_ii: -5, exponent: 1, exponents: [1, 2]")) ==
        "p.yaml:5:9: both `exponent` and a pair stand here; keep one of them");
  CHECK(refusal(one_shell("shell: 4s, h_ii: -5, exponents: [1], coefficients: [1]")) ==
        "p.yaml:5:42: found a list of 1, expected two exponents; write a single one as `exponent`");
  CHECK(refusal(one_shell("shell: 4s, hii: -5, exponent: 1")) ==
        "p.yaml:5:21: unknown key 'hii' in a shell; did you mean 'h_ii'?");
  CHECK(refusal(one_shell("shell: 4s, exponent: 1")) ==
        "p.yaml:5:9: the key 'h_ii' is missing here");
  CHECK(refusal(one_shell("shell: 4s, h_ii: -5, exponent: 1, confidence: sure")) ==
        "p.yaml:5:56: found 'sure', expected high or medium");
  CHECK(refusal("elements:\n  Fee: {valence_electrons: 1, shells: []}\n") ==
        "p.yaml:2:3: 'Fee' is not an element; did you mean 'Fe'?");
  CHECK(refusal("elements:\n  Fe: {valence_electrons: 1, shells: []}\n") ==
        "p.yaml:2:38: found no shell, expected at least one");
  CHECK(refusal("elements:\n  H:\n    valence_electrons: 3\n    shells:\n"
                "      - {shell: 1s, h_ii: -13.6, exponent: 1}\n") ==
        "p.yaml:3:24: found 3 valence electrons, expected 0 to 2, which the shells hold");
  CHECK(refusal("elements:\n  H:\n    valence_electrons: 1\n    shells:\n"
                "      - {shell: 1s, h_ii: -13.6, exponent: 1}\n"
                "      - {shell: 2s, h_ii: -3, exponent: 1}\n") ==
        "p.yaml:6:9: a second s shell; an element has at most one of each kind");
  CHECK(refusal("extends: mine\n" + one_shell("shell: 4s, h_ii: -5, exponent: 1")) ==
        "p.yaml:1:10: found 'mine', expected `published`");
  CHECK(refusal("name: x\n") == "p.yaml:1:1: the key 'elements' is missing here");
}
