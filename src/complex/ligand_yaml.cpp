// Reads ligand libraries: params/ligands.yaml says what the keys mean.
#include <cmath>
#include <cstddef>
#include <span>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "complex/ligand.hpp"
#include "core/error.hpp"
#include "core/yaml.hpp"
#include "molecule/atoms_yaml.hpp"

namespace irrepwise {

extern const std::string_view ligands_yaml;  // params/ligands.yaml, embedded by the build

namespace {

using Sources = std::map<std::string, std::string>;

constexpr int most_teeth = 2;
constexpr int largest_charge = 20;

Eigen::Vector3d read_point(const YamlNode& node) {
  const std::span<const YamlNode> parts = node.list_of(3, "three coordinates in Å");
  Eigen::Vector3d point;
  for (int i = 0; i < 3; ++i) point[i] = parts[static_cast<std::size_t>(i)].number("a coordinate");
  return point;
}

int read_donor(const YamlNode& node, std::size_t n_atoms) {
  const int number = node.whole_number("the number of an atom");
  if (number < 1 || number > static_cast<int>(n_atoms)) {
    node.fail(fmt::format("there is no atom {}, expected 1 to {}", number, n_atoms));
  }
  return number - 1;
}

Binding read_binding(const YamlNode& node, const std::vector<Atom>& atoms) {
  node.expect_keys("a binding", {"donors", "electrons", "metal"});
  Binding binding;
  std::vector<bool> used(atoms.size(), false);
  for (const YamlNode& item : node.at("donors").list("for each tooth a list of its donors")) {
    std::vector<int> tooth;
    for (const YamlNode& donor : item.list("a list of donors")) {
      const int atom = read_donor(donor, atoms.size());
      if (used[static_cast<std::size_t>(atom)]) donor.fail("this atom stands here twice");
      used[static_cast<std::size_t>(atom)] = true;
      tooth.push_back(atom);
    }
    if (tooth.empty()) item.fail("found no atom in this tooth, expected at least one");
    binding.teeth.push_back(std::move(tooth));
  }
  if (binding.teeth.empty() || binding.denticity() > most_teeth) {
    node.at("donors").fail(
        fmt::format("found {} teeth, expected 1 or {}", binding.teeth.size(), most_teeth));
  }
  if (binding.denticity() > 1 && (binding.teeth[0].size() > 1 || binding.teeth[1].size() > 1)) {
    node.at("donors").fail("each tooth of a chelate is one atom");
  }
  binding.electrons = node.at("electrons").whole_number("a whole number of electrons");
  if (binding.electrons < 0) node.at("electrons").fail("expected 0 or more electrons");
  if (const YamlNode* const metal = node.find("metal")) {
    binding.metal = read_point(*metal);
    for (const Atom& atom : atoms) {
      if ((atom.position - binding.metal).norm() < 0.5) metal->fail("an atom lies at the metal");
    }
  }
  return binding;
}

std::string read_source(const YamlNode& node, const Sources& sources) {
  const std::string& word = node.word("a key of `sources`, or words");
  const auto found = sources.find(word);
  return found == sources.end() ? word : found->second;
}

std::map<std::string, std::vector<double>> read_lengths(const YamlNode& node) {
  std::map<std::string, std::vector<double>> lengths;
  for (const YamlNode::Entry& entry : node.map("pairs of elements with their lengths in Å")) {
    for (const YamlNode& length : entry.value.list("a list of lengths in Å")) {
      lengths[entry.key.word()].push_back(length.number("a length in Å"));
    }
  }
  return lengths;
}

std::vector<Atom> read_atoms(const YamlNode& node) {
  std::vector<Atom> atoms = read_yaml_atoms(node);
  try {
    return Molecule(std::move(atoms), 0).atoms();  // refuses atoms upon each other
  } catch (const Error& error) {
    throw error_at(node.place(), error);
  }
}

double read_shortening(const YamlNode& ligand, const char* key) {
  const YamlNode* const node = ligand.find(key);
  if (!node) return 0.0;
  const double angstrom = node->number("a length in Å");
  if (std::abs(angstrom) > 1.0) node->fail("found a shortening of more than 1 Å");
  return angstrom;
}

Ligand read_ligand(const std::string& name, const YamlNode& node, const Sources& sources) {
  node.expect_keys("a ligand", {"names", "charge", "binding", "bridging", "bridging_angle",
                                "bridging_shortening", "bridging_shortening_source", "shortening",
                                "shortening_source", "geometry", "source", "lengths", "atoms"});
  Ligand ligand;
  ligand.name = name;
  if (const YamlNode* const names = node.find("names")) {
    for (const YamlNode& other : names->list("a list of names")) {
      ligand.names.push_back(other.word("a name"));
    }
  }
  ligand.charge = node.at("charge").whole_number("a whole number of charges");
  if (std::abs(ligand.charge) > largest_charge) {
    node.at("charge").fail(fmt::format("found a charge beyond {}", largest_charge));
  }
  ligand.atoms = read_atoms(node.at("atoms"));
  for (const YamlNode& binding : node.at("binding").list("a list of ways to bind")) {
    ligand.bindings.push_back(read_binding(binding, ligand.atoms));
  }
  if (ligand.bindings.empty()) node.at("binding").fail("expected at least one way to bind");
  if (const YamlNode* const bridging = node.find("bridging")) {
    ligand.bridging_electrons = bridging->whole_number("a whole number of electrons");
    if (*ligand.bridging_electrons < 0) bridging->fail("expected 0 or more electrons");
  }
  if (const YamlNode* const angle = node.find("bridging_angle")) {
    ligand.bridging_angle_degrees = angle->number("an angle in degrees");
    if (!(*ligand.bridging_angle_degrees >= 80.0 && *ligand.bridging_angle_degrees <= 180.0)) {
      angle->fail(
          fmt::format("found an angle of {}°, expected 80 to 180", *ligand.bridging_angle_degrees));
    }
  }
  ligand.shortening_angstrom = read_shortening(node, "shortening");
  ligand.bridging_shortening_angstrom = read_shortening(node, "bridging_shortening");
  if (const YamlNode* const source = node.find("shortening_source")) {
    ligand.shortening_source = source->word("words");
  }
  if (const YamlNode* const words = node.find("geometry")) ligand.geometry = words->word("words");
  if (const YamlNode* const source = node.find("source")) {
    ligand.source = read_source(*source, sources);
  }
  if (const YamlNode* const lengths = node.find("lengths")) {
    ligand.lengths = read_lengths(*lengths);
  }
  return ligand;
}

}  // namespace

LigandLibrary parse_ligands(std::string_view yaml, const std::string& file_name) {
  const YamlNode node = YamlNode::parse(yaml, file_name);
  node.expect_keys("a ligand library", {"sources", "ligands"});
  Sources sources;
  if (const YamlNode* const words = node.find("sources")) {
    for (const YamlNode::Entry& entry : words->map("names of sources with their words")) {
      sources[entry.key.word()] = entry.value.word("the words of a source");
    }
  }
  std::vector<Ligand> ligands;
  for (const YamlNode::Entry& entry : node.at("ligands").map("names with their ligands")) {
    ligands.push_back(read_ligand(entry.key.word(), entry.value, sources));
  }
  try {
    return LigandLibrary(std::move(ligands));
  } catch (const Error& error) {
    throw error_at(node.at("ligands").place(), error);
  }
}

const LigandLibrary& built_in_ligands() {
  static const LigandLibrary library = parse_ligands(ligands_yaml, "params/ligands.yaml");
  return library;
}

}  // namespace irrepwise
