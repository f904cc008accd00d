#include "cli/computed.hpp"

#include "basis/atom_kinds.hpp"
#include "core/error.hpp"

namespace irrepwise::cli {
namespace {

LevelsResult compute(const Job& job) {
  Basis basis = make_basis(job.molecule, job.parameters, job.overrides);
  SymmetryOptions symmetry_options = job.symmetry;
  symmetry_options.kinds = atom_kinds(basis);
  MolecularSymmetry symmetry = find_symmetry(job.molecule, symmetry_options);
  Levels levels = solve_levels(symmetry, basis, job.hueckel);
  Populations populations = mulliken_populations(symmetry, basis, levels);
  std::vector<std::string> warnings = geometry_warnings(job.molecule);
  warnings.insert(warnings.end(), levels.warnings.begin(), levels.warnings.end());
  return {job.title,        job.parameters.name(), job.molecule,           std::move(symmetry),
          std::move(basis), std::move(levels),     std::move(populations), std::move(warnings)};
}

}  // namespace

LevelsResult computed(const Job& job, const std::string& file) {
  try {
    return compute(job);
  } catch (const Error& error) {
    throw error_at(file, error);
  }
}

}  // namespace irrepwise::cli
