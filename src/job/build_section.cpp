// The section `build` of a job, which says how to make a complex, and changes of it.
#include <array>
#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/file.hpp"
#include "core/parse.hpp"
#include "job/job_file.hpp"
#include "molecule/element.hpp"
#include "molecule/label.hpp"

namespace irrepwise {
namespace {

std::optional<double> read_optional(const YamlNode& node, std::string_view key,
                                    std::string_view what) {
  const YamlNode* const value = node.find(key);
  return value ? std::optional(value->number(what)) : std::nullopt;
}

std::optional<int> read_optional_whole(const YamlNode& node, std::string_view key,
                                       std::string_view what) {
  const YamlNode* const value = node.find(key);
  return value ? std::optional(value->whole_number(what)) : std::nullopt;
}

int read_metal(const YamlNode& node) {
  const std::string& symbol = node.word("the symbol of the metal");
  if (const std::optional<int> z = atomic_number(symbol)) return *z;
  node.fail(fmt::format("{} is not an element{}", quoted(symbol), symbol_hint(symbol)));
}

Polyhedron read_polyhedron(const YamlNode& node) {
  std::optional<double> angle;
  const YamlNode* symbol = &node;
  if (node.kind() == YamlNode::Kind::Map) {
    node.expect_keys("the polyhedron", {"symbol", "angle"});
    symbol = &node.at("symbol");
    angle = read_optional(node, "angle", "an angle in degrees");
  }
  const std::string& word = symbol->word("a polyhedral symbol such as OC-6");
  try {
    return Polyhedron(word, angle);
  } catch (const Error& error) {
    throw error_at(node.place(), error);
  }
}

std::vector<int> read_vertices(const YamlNode& node) {
  if (node.kind() == YamlNode::Kind::Word) return {node.whole_number("the number of a vertex")};
  std::vector<int> vertices;
  for (const YamlNode& item : node.list("a vertex or a list of vertices")) {
    vertices.push_back(item.whole_number("the number of a vertex"));
  }
  if (vertices.empty()) node.fail("found no vertex, expected at least one");
  return vertices;
}

bool read_truth(const YamlNode& node) {
  const std::string& word = node.word("true or false");
  if (word == "true") return true;
  if (word == "false") return false;
  node.fail_expected("true or false");
}

CentreSpec read_centre(const YamlNode& node) {
  CentreSpec centre;
  centre.place = node.place();
  centre.atomic_number = read_metal(node.at("metal"));
  centre.polyhedron = read_polyhedron(node.at("polyhedron"));
  if (const YamlNode* const oxidation = node.find("oxidation")) {
    centre.oxidation = oxidation->whole_number("a whole number, the oxidation state");
    centre.oxidation_place = oxidation->place();
  }
  if (const YamlNode* const ligands = node.find("ligands")) {
    for (const YamlNode& item : ligands->list("a list of ligands")) {
      centre.ligands.push_back(read_ligand_request(item));
    }
  }
  return centre;
}

double read_distance_angstrom(const YamlNode& node) {
  const double distance = node.number("a distance in Å");
  if (!(distance >= 0.5 && distance <= 6.0)) {
    node.fail(fmt::format("found a distance of {} Å, expected 0.5 to 6", distance));
  }
  return distance;
}

BridgeRequest read_bridge(const YamlNode& node) {
  node.expect_keys("a bridge", {"ligand", "vertices", "distance", "distances", "mirrored"});
  BridgeRequest bridge;
  bridge.place = node.place();
  bridge.ligand = node.at("ligand").word("the name of a ligand");
  const std::span<const YamlNode> vertices =
      node.at("vertices").list_of(2, "a vertex of each of the two centres");
  for (std::size_t i = 0; i < 2; ++i) {
    bridge.vertices[i] = vertices[i].whole_number("the number of a vertex");
  }
  const YamlNode* const distance = node.find("distance");
  const YamlNode* const distances = node.find("distances");
  if (distance && distances) distances->fail("`distance` and `distances` exclude each other");
  if (distance) bridge.distances_angstrom.fill(read_distance_angstrom(*distance));
  if (distances) {
    const std::span<const YamlNode> both = distances->list_of(2, "a distance to each metal");
    for (std::size_t i = 0; i < 2; ++i) {
      bridge.distances_angstrom[i] = read_distance_angstrom(both[i]);
    }
  }
  if (const YamlNode* const mirrored = node.find("mirrored")) {
    bridge.mirrored = read_truth(*mirrored);
  }
  return bridge;
}

}  // namespace

LigandRequest read_ligand_request(const YamlNode& node) {
  LigandRequest request;
  request.place = node.place();
  if (node.kind() == YamlNode::Kind::Word) {
    request.ligand = node.word();
    return request;
  }
  node.expect_keys("a ligand", {"ligand", "vertices", "covers", "denticity", "hapticity",
                                "distance", "twist", "angle", "bite", "mirrored"});
  request.ligand = node.at("ligand").word("the name of a ligand");
  const YamlNode* const vertices = node.find("vertices");
  const YamlNode* const covers = node.find("covers");
  if (vertices && covers) covers->fail("`vertices` and `covers` exclude each other; keep one");
  if (vertices) request.vertices = read_vertices(*vertices);
  if (covers) {
    request.vertices = read_vertices(*covers);
    request.covers = true;
  }
  request.denticity = read_optional_whole(node, "denticity", "a whole number of teeth");
  request.hapticity = read_optional_whole(node, "hapticity", "a whole number of atoms");
  if (const YamlNode* const distance = node.find("distance")) {
    request.distance_angstrom = read_distance_angstrom(*distance);
  }
  request.twist_degrees = read_optional(node, "twist", "an angle in degrees");
  request.angle_degrees = read_optional(node, "angle", "an angle in degrees");
  request.bite_degrees = read_optional(node, "bite", "an angle in degrees");
  if (const YamlNode* const mirrored = node.find("mirrored")) {
    request.mirrored = read_truth(*mirrored);
  }
  return request;
}

ComplexSpec read_build(const YamlNode& node, const std::string& beside, FileChain& files) {
  node.expect_keys("the section `build`",
                   {"metal", "polyhedron", "oxidation", "ligands", "centres", "bridges",
                    "bridge_angle", "torsion", "metal_metal_bond", "library"});
  ComplexSpec complex;
  if (const YamlNode* const library = node.find("library")) {
    const std::string path = path_beside(beside, library->word("the name of a file"));
    try {
      complex.library = built_in_ligands().extended_by(read_ligands(path));
    } catch (const Error& error) {
      throw error_at(library->place(), error);
    }
    files.read.push_back(path);
  }
  if (const YamlNode* const centres = node.find("centres")) {
    for (const char* const key : {"metal", "polyhedron", "oxidation", "ligands"}) {
      if (const YamlNode* const extra = node.find(key)) {
        extra->fail(fmt::format("`{}` belongs into the items of `centres`", key));
      }
    }
    for (const YamlNode& item : centres->list_of(2, "two centres")) {
      item.expect_keys("a centre", {"metal", "polyhedron", "oxidation", "ligands"});
      complex.centres.push_back(read_centre(item));
    }
  } else {
    complex.centres.push_back(read_centre(node));
  }
  if (const YamlNode* const bridges = node.find("bridges")) {
    for (const YamlNode& item : bridges->list("a list of bridges")) {
      complex.bridges.push_back(read_bridge(item));
    }
  }
  complex.bridge_angle_degrees = read_optional(node, "bridge_angle", "an angle in degrees");
  complex.torsion_degrees = read_optional(node, "torsion", "an angle in degrees");
  if (const YamlNode* const bond = node.find("metal_metal_bond")) {
    complex.metal_metal_bond = bond->whole_number("the order of the bond between the metals");
    complex.metal_metal_bond_place = bond->place();
  }
  return complex;
}

std::vector<EachChange> read_each(const YamlNode& node) {
  node.expect_keys("`each`", {"ligands", "vertices", "metals", "centre"});
  const YamlNode* const ligands = node.find("ligands");
  const YamlNode* const metals = node.find("metals");
  const YamlNode* const vertices = node.find("vertices");
  if (!ligands && !metals) node.fail("give a list of `ligands`, of `metals`, or both");
  if (vertices && !ligands) vertices->fail("`vertices` goes with `ligands`");
  Substitution start;
  start.place = node.place();
  if (const YamlNode* const centre = node.find("centre")) {
    start.centre = centre->whole_number("1 or 2, the number of a centre") - 1;
  }
  std::vector<EachChange> changes = {{"", "", start}};
  if (metals) {
    changes.clear();
    for (const YamlNode& item : metals->list("a list of metals")) {
      EachChange change{item.word(), "", start};
      change.change.metal = read_metal(item);
      changes.push_back(std::move(change));
    }
  }
  if (!ligands) return changes;
  const std::vector<int> taken = read_vertices(node.at("vertices"));
  std::vector<EachChange> all;
  for (const EachChange& first : changes) {
    for (const YamlNode& item : ligands->list("a list of ligands")) {
      EachChange both = first;
      LigandRequest request = read_ligand_request(item);
      if (!request.vertices.empty()) item.fail("the vertices stand beside the list of ligands");
      request.vertices = taken;
      both.ligand = request.ligand;
      both.change.ligands.push_back(std::move(request));
      all.push_back(std::move(both));
    }
  }
  return all;
}

Substitution read_substitution(const YamlNode& node) {
  node.expect_keys("a substitution",
                   {"metal", "oxidation", "polyhedron", "ligands", "distances", "centre"});
  Substitution change;
  change.place = node.place();
  if (const YamlNode* const centre = node.find("centre")) {
    change.centre = centre->whole_number("1 or 2, the number of a centre") - 1;
  }
  if (const YamlNode* const metal = node.find("metal")) change.metal = read_metal(*metal);
  change.oxidation = read_optional_whole(node, "oxidation", "a whole number, the oxidation state");
  if (const YamlNode* const polyhedron = node.find("polyhedron")) {
    change.polyhedron = read_polyhedron(*polyhedron);
  }
  if (const YamlNode* const ligands = node.find("ligands")) {
    for (const YamlNode& item : ligands->list("a list of ligands with their vertices")) {
      change.ligands.push_back(read_ligand_request(item));
      if (change.ligands.back().vertices.empty()) {
        item.fail("name the vertices that this ligand takes over, e.g. {ligand: CO, vertices: 1}");
      }
    }
  }
  if (const YamlNode* const distances = node.find("distances")) {
    for (const YamlNode::Entry& entry : distances->map("vertices with distances in Å")) {
      change.distances_angstrom.emplace_back(entry.key.whole_number("the number of a vertex"),
                                             read_distance_angstrom(entry.value));
    }
  }
  return change;
}

}  // namespace irrepwise
