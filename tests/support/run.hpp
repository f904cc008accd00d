// The whole way from a molecule to its levels and populations, for tests.
#pragma once

#include "analysis/populations.hpp"
#include "basis/basis.hpp"
#include "hueckel/levels.hpp"
#include "symmetry/molecular_symmetry.hpp"

struct Run {
  irrepwise::MolecularSymmetry symmetry;
  irrepwise::Basis basis;
  irrepwise::Levels levels;
};

inline Run run(const irrepwise::Molecule& molecule, const irrepwise::HueckelOptions& hueckel = {},
               const irrepwise::SymmetryOptions& options = {},
               const irrepwise::ParameterSet& parameters = irrepwise::published_parameters()) {
  irrepwise::MolecularSymmetry symmetry = irrepwise::find_symmetry(molecule, options);
  irrepwise::Basis basis = irrepwise::make_basis(symmetry.molecule, parameters);
  irrepwise::Levels levels = irrepwise::solve_levels(symmetry, basis, hueckel);
  return {std::move(symmetry), std::move(basis), std::move(levels)};
}
