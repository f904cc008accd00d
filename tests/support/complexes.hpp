// Complexes to build, in one line each.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "complex/build.hpp"
#include "complex/spec.hpp"

/// @param ligands  names, on the lowest free vertices
[[nodiscard]] irrepwise::ComplexSpec spec_of(const std::string& metal,
                                             const std::string& polyhedron,
                                             std::optional<int> oxidation,
                                             const std::vector<std::string>& ligands);

/// A ligand with its vertices.
[[nodiscard]] irrepwise::LigandRequest on(const std::string& ligand,
                                          const std::vector<int>& vertices);

/// A π ligand over several vertices.
[[nodiscard]] irrepwise::LigandRequest over(const std::string& ligand,
                                            const std::vector<int>& vertices);

/// @returns  the distances between two elements up to `longest`, ascending
[[nodiscard]] std::vector<double> distances(const irrepwise::Molecule& molecule, int element_a,
                                            int element_b, double longest);

/// Degrees at atom b.
[[nodiscard]] double angle(const irrepwise::Molecule& molecule, int a, int b, int c);
