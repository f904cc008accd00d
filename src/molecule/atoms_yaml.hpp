// Atoms in YAML, as jobs and ligand libraries write them.
//
// Private: not installed, since YAML stays out of public headers.
#pragma once

#include <vector>

#include "core/yaml.hpp"
#include "molecule/molecule.hpp"

namespace irrepwise {

/// A list of [symbol, x, y, z], or lines of "symbol x y z" behind '|'.
/// @throws Error  with line and column: not four words, not a number, unknown element
[[nodiscard]] std::vector<Atom> read_yaml_atoms(const YamlNode& node);

}  // namespace irrepwise
