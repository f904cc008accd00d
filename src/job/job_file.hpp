// The parts of a job file, each read by a function of its own.
//
// Private: not installed, since YAML stays out of public headers.
#pragma once

#include <map>
#include <optional>
#include <string>
#include <vector>

#include "basis/basis.hpp"
#include "basis/parameter_set.hpp"
#include "complex/spec.hpp"
#include "core/yaml.hpp"
#include "hueckel/options.hpp"
#include "job/job.hpp"
#include "molecule/molecule.hpp"
#include "molecule/xyz.hpp"
#include "symmetry/options.hpp"

namespace irrepwise {

/// The files that lead to the one being read, each named by the one before: a file that comes up
/// twice includes itself.
struct FileChain {
  std::vector<std::string> open;  // from the outermost
  std::vector<std::string> read;  // every file read so far
};

/// `geometry`: the name of a file, or `file`, or `atoms` with an optional `unit`.
/// @param beside  the job file
/// @returns       a molecule with the charge that its file states, otherwise 0; the multiplicity
///                that an XYZ file states
[[nodiscard]] XyzFile read_geometry(const YamlNode& node, const std::string& beside,
                                    FileChain& files);

/// `build`: a metal, a polyhedron and ligands, or two centres with bridges, in place of `geometry`.
/// @param beside  the job file, beside which a library of ligands is looked for
[[nodiscard]] ComplexSpec read_build(const YamlNode& node, const std::string& beside,
                                     FileChain& files);

/// One ligand: its name, or a map with `ligand`, `vertices` and more.
[[nodiscard]] LigandRequest read_ligand_request(const YamlNode& node);

/// A change of a complex: `metal`, `oxidation`, `polyhedron`, `ligands` with the vertices that they
/// take over, `distances` by vertex, `centre` of two.
[[nodiscard]] Substitution read_substitution(const YamlNode& node);

/// One of the changes that `each` of a variant stands for.
struct EachChange {
  std::string metal;  // as the file has them; empty where there is none
  std::string ligand;
  Substitution change;
};

/// `each`: lists of `metals` and of `ligands` for the same `vertices`, in all combinations.
[[nodiscard]] std::vector<EachChange> read_each(const YamlNode& node);

/// `parameters`: `published`, the name of a file, or a parameter set in place.
[[nodiscard]] ParameterSet read_job_parameters(const YamlNode& node, const std::string& beside,
                                               FileChain& files);

enum class AbsentElement { Refused, Skipped };

/// `overrides`: a list, each for an `element` or an `atom`.
/// @param absent  what to do with an override of an element that the molecule lacks
[[nodiscard]] std::vector<ParameterOverride> read_overrides(
    const YamlNode& node, const Molecule& molecule, const ParameterSet& parameters,
    AbsentElement absent = AbsentElement::Refused);

/// `symmetry`: `tolerance`, `limit`, `axes`, `group`, `subgroup`.
[[nodiscard]] SymmetryOptions read_symmetry(const YamlNode& node, const Molecule& molecule);

/// `rule`, `k`, `multiplicity` and `occupations` of the job itself, unless the variant has its own.
[[nodiscard]] HueckelOptions read_hueckel(const YamlNode& job, const YamlNode* variant = nullptr);

/// A whole job, with the keys of one of its `variants` in place of its own.
/// @param variant  null for the job as it is
/// @param each     a change of what `build` makes, after the variant's own; null for none
[[nodiscard]] Job read_job_node(const YamlNode& node, const YamlNode* variant,
                                const Substitution* each, const std::string& path,
                                FileChain& files);

/// The atoms of a job or an XYZ file, through a chain of files.
/// @param from  the value that names the file; its place is blamed where the file cannot be read
[[nodiscard]] XyzFile read_geometry_file(const YamlNode& from, const std::string& path,
                                         FileChain& files);

/// Whether a name ends as those of job files do: .yaml or .yml.
[[nodiscard]] bool is_job_file(const std::string& path);

}  // namespace irrepwise
