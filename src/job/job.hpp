// A job: everything the user says about one molecule, from a YAML file, an XYZ file and options.
#pragma once

#include <map>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "basis/basis.hpp"
#include "basis/parameter_set.hpp"
#include "complex/build.hpp"
#include "complex/spec.hpp"
#include "core/error.hpp"
#include "hueckel/options.hpp"
#include "molecule/molecule.hpp"
#include "symmetry/options.hpp"

namespace irrepwise {

struct Job {
  std::string title;
  Molecule molecule;  // with the charge
  ParameterSet parameters = published_parameters();
  std::vector<ParameterOverride> overrides;
  SymmetryOptions symmetry;
  HueckelOptions hueckel;
  // The job file and every file it read, so that no output overwrites an input.
  std::vector<std::string> source_files;
  // Where the user gave what only the computation can judge, by its key: "job.yaml:3:9",
  // "--charge".
  std::map<std::string, std::string> places;
  // Of a job that builds its complex: what it says, and what came of it.
  std::optional<ComplexSpec> complex;
  std::optional<BuiltComplex> built;
};

/// Reads a job: a name that ends in .yaml or .yml is a job file, any other an XYZ file.
/// Files named in a job file are looked for beside it.
///
/// @throws Error  with file, line and column, what is wrong and what to do
[[nodiscard]] Job read_job(const std::string& path);

/// Gives the molecule this charge in place of what the job says; a complex that the job builds gets
/// it by the rule for `charge` in the file.
/// @param place   where the charge stands, for messages: "--charge"
/// @throws Error  a charge out of range; one that contradicts the oxidation states
void set_charge(Job& job, int charge, const std::string& place);

/// @returns  the error with the place of the value that it is about, if the job knows it, or else
///           the file
[[nodiscard]] Error error_in(const Job& job, const std::string& file, const Error& error);

}  // namespace irrepwise
