// The parts that the corpus is put together from, one source each.
#pragma once

#include <string>
#include <vector>

#include "support/molecules.hpp"
#include "support/shapes.hpp"

/// @returns  the orbits of the seeds under the generators of the group; it is for the caller to
///           choose seeds that leave no higher symmetry
[[nodiscard]] TestMolecule by_orbits(const std::string& name, const std::string& point_group,
                                     int charge, const std::vector<shapes::Seed>& seeds);

/// @returns  every atom as given: for linear molecules, single atoms and C1
[[nodiscard]] TestMolecule by_atoms(const std::string& name, const std::string& point_group,
                                    int charge, const std::vector<shapes::Seed>& atoms);

[[nodiscard]] std::vector<TestMolecule> main_group_molecules();
[[nodiscard]] std::vector<TestMolecule> organic_molecules();
[[nodiscard]] std::vector<TestMolecule> cages();
[[nodiscard]] std::vector<TestMolecule> complexes();
[[nodiscard]] std::vector<TestMolecule> sandwiches();
[[nodiscard]] std::vector<TestMolecule> synthetic_clusters();
