// What a user may say about the Hamiltonian and the occupation.
#pragma once

#include <map>
#include <optional>
#include <string>

namespace irrepwise {

/// Off-diagonal rules, see DEVELOPERS.md for formulas and sources.
enum class Rule { Weighted, WolfsbergHelmholz, GeometricMean, Cusachs };

/// @returns  "weighted", "wolfsberg-helmholz", "geometric-mean", "cusachs"
[[nodiscard]] std::string rule_name(Rule rule);

/// @throws Error  with the nearest rule and the list of all
[[nodiscard]] Rule parse_rule(const std::string& name);

/// @returns  1.75, or 2 for the geometric mean; Cusachs' rule has no K
[[nodiscard]] std::optional<double> default_k(Rule rule);

struct HueckelOptions {
  Rule rule = Rule::Weighted;
  std::optional<double> k;          // default_k(rule) where absent; refused for `cusachs`
  std::optional<int> multiplicity;  // 2S + 1; absent: filled from below
  std::map<std::string, int> electrons_by_irrep;  // "a1g" -> electrons; empty: not used
};

}  // namespace irrepwise
