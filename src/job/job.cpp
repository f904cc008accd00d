#include "job/job.hpp"

#include <algorithm>
#include <filesystem>
#include <optional>
#include <string_view>
#include <system_error>
#include <utility>

#include <fmt/format.h>

#include "basis/parameter_yaml.hpp"
#include "core/error_about.hpp"
#include "core/file.hpp"
#include "core/yaml.hpp"
#include "job/job_file.hpp"
#include "molecule/xyz.hpp"

namespace irrepwise {
namespace {

// One spelling for one file, so that ./a.yaml and a.yaml are seen to be the same.
std::string canonical(const std::string& path) {
  std::error_code code;
  const std::filesystem::path found = std::filesystem::weakly_canonical(path, code);
  return code ? path : found.string();
}

// Reads a file that another names; where it cannot be read, the naming value is to blame.
std::string read_named(const YamlNode& from, const std::string& path) {
  try {
    return read_text_file(path);
  } catch (const Error& error) {
    throw error_at(from.place(), error);
  }
}

// The molecule with its own title, what its file says of electrons, and defaults for all else.
Job job_of(XyzFile file) {
  std::string title = file.molecule.title();
  Job job{std::move(title),
          std::move(file.molecule),
          published_parameters(),
          {},
          {},
          {},
          {},
          {},
          {},
          {}};
  job.hueckel.multiplicity = file.multiplicity;
  if (file.multiplicity) job.places["multiplicity"] = file.multiplicity_place;
  return job;
}

// What a variant says in place of the job.
const YamlNode* find_in(const YamlNode* variant, const char* key) {
  return variant ? variant->find(key) : nullptr;
}
const YamlNode* find_in(const YamlNode& job, const YamlNode* variant, const char* key) {
  const YamlNode* const own = find_in(variant, key);
  return own ? own : job.find(key);
}

void read_charge(const YamlNode& node, ComplexSpec& complex) {
  complex.charge = node.whole_number("a whole number of charges");
  complex.charge_place = node.place();
}

BuiltComplex built_at(const ComplexSpec& complex, const std::string& section,
                      const std::string& path) {
  try {
    return build_complex(complex);
  } catch (const Error& error) {
    // Where no value of the section is to blame, the section is.
    const bool has_place = std::string_view(error.what()).starts_with(path);
    if (has_place) throw;
    throw error_at(section, error);
  }
}

ComplexSpec replaced(const ComplexSpec& complex, const Substitution& change,
                     const std::string& path) {
  try {
    return substituted(complex, change);
  } catch (const Error& error) {
    const bool has_place = std::string_view(error.what()).starts_with(path);
    if (has_place) throw;
    throw error_at(change.place, error);
  }
}

// The molecule from `geometry` or `build`, the latter with what the variant replaces.
Job read_structure(const YamlNode& node, const YamlNode* variant, const Substitution* each,
                   const std::string& path, FileChain& files) {
  const YamlNode* const build = node.find("build");
  const YamlNode* const replace = find_in(variant, "replace");
  const YamlNode* const other = find_in(variant, "geometry");
  for (const char* const key : {"replace", "each"}) {
    const YamlNode* const change = find_in(variant, key);
    if (!change || (build && !other)) continue;
    change->fail(fmt::format(
        "`{}` changes what `build` makes; use `geometry` for a structure in a file", key));
  }
  if (other) return job_of(read_geometry(*other, path, files));
  if (!build) return job_of(read_geometry(node.at("geometry"), path, files));
  if (const YamlNode* const geometry = node.find("geometry")) {
    geometry->fail("`geometry` and `build` exclude each other; keep one");
  }
  ComplexSpec complex = read_build(*build, path, files);
  if (const YamlNode* const charge = node.find("charge")) read_charge(*charge, complex);
  std::string section = build->place();
  if (replace) {
    complex = replaced(complex, read_substitution(*replace), path);
    section = replace->place();
  }
  if (each) {
    complex = replaced(complex, *each, path);
    section = each->place;
  }
  if (const YamlNode* const charge = find_in(variant, "charge")) read_charge(*charge, complex);
  BuiltComplex built = built_at(complex, section, path);
  Job job = job_of({built.molecule});
  job.complex = std::move(complex);
  job.built = std::move(built);
  return job;
}

// What is checked only when symmetry and electrons are known.
void note_places(const YamlNode& job, const YamlNode* variant, Job& result) {
  const auto note = [&](const YamlNode* from, const char* key) {
    const YamlNode* const value = from ? from->find(key) : nullptr;
    if (value) result.places[key] = value->place();
  };
  for (const YamlNode* const from : {&job, variant}) {
    for (const char* const key : {"charge", "multiplicity", "occupations"}) note(from, key);
  }
  const YamlNode* const symmetry = find_in(job, variant, "symmetry");
  if (!symmetry) return;
  note(symmetry, "group");
  note(symmetry, "subgroup");
  for (const char* const key : {"z", "x"}) note(symmetry->find("axes"), key);
}

Job parse_job(const std::string& text, const std::string& path, FileChain& files) {
  return read_job_node(YamlNode::parse(text, path), nullptr, nullptr, path, files);
}

}  // namespace

Job read_job_node(const YamlNode& node, const YamlNode* variant, const Substitution* each,
                  const std::string& path, FileChain& files) {
  files.open.push_back(path);
  files.read.push_back(path);
  node.expect_keys("a job", {"title", "geometry", "build", "charge", "multiplicity", "occupations",
                             "parameters", "overrides", "rule", "k", "symmetry", "variants"});
  Job job = read_structure(node, variant, each, path, files);
  if (const YamlNode* const title = find_in(node, variant, "title")) {
    job.title = title->word("a title");
  }
  const YamlNode* const charge = find_in(node, variant, "charge");
  if (charge && !job.built) {
    const int value = charge->whole_number("a whole number of charges");
    try {
      job.molecule = job.molecule.with_charge(value);
    } catch (const Error& error) {
      throw error_at(charge->place(), error);
    }
  }
  if (const YamlNode* const parameters = find_in(node, variant, "parameters")) {
    job.parameters = read_job_parameters(*parameters, path, files);
  }
  if (const YamlNode* const overrides = node.find("overrides")) {
    // What the job says of an element concerns the variants that have it.
    const AbsentElement absent = variant ? AbsentElement::Skipped : AbsentElement::Refused;
    job.overrides = read_overrides(*overrides, job.molecule, job.parameters, absent);
  }
  if (const YamlNode* const overrides = find_in(variant, "overrides")) {
    for (ParameterOverride& change : read_overrides(*overrides, job.molecule, job.parameters)) {
      job.overrides.push_back(std::move(change));
    }
  }
  if (const YamlNode* const symmetry = find_in(node, variant, "symmetry")) {
    job.symmetry = read_symmetry(*symmetry, job.molecule);
  }
  const std::optional<int> multiplicity_of_file = job.hueckel.multiplicity;
  job.hueckel = read_hueckel(node, variant);
  const bool is_stated = job.hueckel.multiplicity || !job.hueckel.electrons_by_irrep.empty();
  if (!is_stated) job.hueckel.multiplicity = multiplicity_of_file;
  note_places(node, variant, job);
  files.open.pop_back();
  job.source_files = files.read;
  return job;
}

XyzFile read_geometry_file(const YamlNode& from, const std::string& path, FileChain& files) {
  if (!is_job_file(path)) {
    const std::string text = read_named(from, path);
    files.read.push_back(path);
    return parse_xyz(text, path);
  }
  for (const std::string& open : files.open) {
    if (canonical(open) != canonical(path)) continue;
    std::string chain;
    for (const std::string& file : files.open) chain += file + " → ";
    from.fail(fmt::format("the geometry leads back to this file: {}{}; name a file with atoms",
                          chain, path));
  }
  return {parse_job(read_named(from, path), path, files).molecule};
}

ParameterSet read_job_parameters(const YamlNode& node, const std::string& beside,
                                 FileChain& files) {
  if (node.kind() == YamlNode::Kind::Map) return read_parameter_set(node, "in place");
  const std::string& name = node.word("`published`, the name of a file, or a parameter set");
  if (name == "published") return published_parameters();
  const std::string path = path_beside(beside, name);
  const std::string text = read_named(node, path);
  files.read.push_back(path);
  return parse_parameters(text, path);
}

Job read_job(const std::string& path) {
  if (is_job_file(path)) {
    FileChain files;
    return parse_job(read_text_file(path), path, files);
  }
  Job job = job_of(read_xyz(path));
  job.source_files = {path};
  return job;
}

void set_charge(Job& job, int charge, const std::string& place) {
  if (job.complex) {
    job.complex->charge = charge;
    job.complex->charge_place = place;
    job.built = build_complex(*job.complex);
    job.molecule = job.built->molecule;
  } else {
    try {
      job.molecule = job.molecule.with_charge(charge);
    } catch (const Error& error) {
      throw error_at(place, error);
    }
  }
  job.places["charge"] = place;
}

Error error_in(const Job& job, const std::string& file, const Error& error) {
  const auto* const from = dynamic_cast<const ErrorAbout*>(&error);
  const auto place = from ? job.places.find(from->key()) : job.places.end();
  return error_at(place == job.places.end() ? file : place->second, error);
}

}  // namespace irrepwise
