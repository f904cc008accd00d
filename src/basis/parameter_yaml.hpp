// The YAML of parameter sets, piece by piece, as parameter files and jobs share it.
//
// Private: not installed, since YAML stays out of public headers.
#pragma once

#include <string>

#include "basis/parameter_set.hpp"
#include "basis/shell.hpp"
#include "core/yaml.hpp"

namespace irrepwise {

/// n and l of a shell named as in "3d".
struct ShellName {
  int n = 0;
  int l = 0;
};

/// @throws Error  not such a name, n above 7, or l not below n
[[nodiscard]] ShellName read_shell_name(const YamlNode& node);

/// Diagonal element of the Hamiltonian, eV.
/// @throws Error  not a number between -1000 and 0
[[nodiscard]] double read_h_ii_ev(const YamlNode& node);

/// @returns  whether the map has `exponent`, or `exponents` with `coefficients`
[[nodiscard]] bool has_radial(const YamlNode& map);

/// Reads `exponent`, or two `exponents` with their `coefficients`, of a map.
/// @throws Error  if neither or both are there, or the contraction is not normalised
[[nodiscard]] ContractedRadial read_radial(const YamlNode& map, int n);

/// Reads a whole set: `name`, `extends`, `sources`, `elements`.
/// @param default_name  of the set where it states none
[[nodiscard]] ParameterSet read_parameter_set(const YamlNode& node,
                                              const std::string& default_name);

}  // namespace irrepwise
