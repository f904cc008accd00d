#include <filesystem>
#include <string>
#include <utility>
#include <vector>

#include "core/constants.hpp"
#include "core/error.hpp"
#include "core/file.hpp"
#include "job/job.hpp"
#include "job/job_file.hpp"
#include "molecule/atoms_yaml.hpp"
#include "molecule/xyz.hpp"

namespace irrepwise {
namespace {

Molecule read_atoms(const YamlNode& geometry, const YamlNode& node) {
  std::vector<Atom> atoms = read_yaml_atoms(node);
  if (const YamlNode* const unit = geometry.find("unit")) {
    const std::string& word = unit->word("angstrom or bohr");
    if (word != "angstrom" && word != "bohr") unit->fail_expected("angstrom or bohr");
    if (word == "bohr") {
      for (Atom& atom : atoms) atom.position *= bohr_in_angstrom;
    }
  }
  try {
    return Molecule(std::move(atoms), 0);
  } catch (const Error& error) {
    throw error_at(node.place(), error);
  }
}

}  // namespace

bool is_job_file(const std::string& path) {
  const std::string extension = std::filesystem::path(path).extension().string();
  return extension == ".yaml" || extension == ".yml";
}

XyzFile read_geometry(const YamlNode& node, const std::string& beside, FileChain& files) {
  const auto from_file = [&](const YamlNode& name) {
    return read_geometry_file(name, path_beside(beside, name.word("the name of a file")), files);
  };
  if (node.kind() == YamlNode::Kind::Word) return from_file(node);
  node.expect_keys("the geometry", {"file", "atoms", "unit"});
  const YamlNode* const file = node.find("file");
  const YamlNode* const atoms = node.find("atoms");
  if ((file != nullptr) == (atoms != nullptr)) {
    node.fail("expected either `file` or `atoms` in the geometry");
  }
  if (atoms) return {read_atoms(node, *atoms)};
  if (const YamlNode* const unit = node.find("unit")) {
    unit->fail("`unit` goes with `atoms`; an XYZ file is in Å");
  }
  return from_file(*file);
}

}  // namespace irrepwise
