#include "page/page_data.hpp"

#include <cmath>

#include <fmt/format.h>

#include "figure/ball_and_stick.hpp"
#include "figure/palette.hpp"
#include "output/composition.hpp"
#include "output/html_text.hpp"
#include "output/json_text.hpp"

namespace irrepwise {
namespace {

// As many decimals as a person could want to see: the page stays small.
Json rounded(double value, double per_unit) {
  return finite_number(std::round(finite_number(value) * per_unit) / per_unit);
}

constexpr double to_coefficient = 1e5;
constexpr double to_length = 1e4;
constexpr double to_energy = 1e4;

Json colour_json(const Colour& colour) { return {colour.red, colour.green, colour.blue}; }

Json surface_json(const std::optional<PackedSurface>& surface) {
  if (!surface) return nullptr;
  Json json;
  json["middle"] = surface->middle;
  json["scale"] = surface->scale;
  json["places"] = surface->places;
  json["normals"] = surface->normals;
  json["triangles"] = surface->triangles;
  json["wide"] = surface->wide;
  return json;
}

Json orbitals_json(const std::vector<PageOrbital>& orbitals) {
  Json json = Json::array();
  for (const PageOrbital& orbital : orbitals) {
    json.push_back({{"isovalue", orbital.isovalue},
                    {"positive", surface_json(orbital.positive)},
                    {"negative", surface_json(orbital.negative)}});
  }
  return json;
}

Json coefficients_json(const LevelsResult& result, int level) {
  const Eigen::MatrixXd orbitals =
      level_orbitals(result.symmetry, result.basis, result.levels, level);
  Json json = Json::array();
  for (Eigen::Index partner = 0; partner < orbitals.cols(); ++partner) {
    Json& column = json.emplace_back(Json::array());
    for (Eigen::Index i = 0; i < orbitals.rows(); ++i) {
      column.push_back(rounded(orbitals(i, partner), to_coefficient));
    }
  }
  return json;
}

Json shares_json(const LevelsResult& result, int level) {
  Json json = Json::array();
  for (const double share : result.populations.shares.col(level)) {
    json.push_back(rounded(share, to_coefficient));
  }
  return json;
}

std::string mark_of(const Frontier& frontier, int level) {
  if (frontier.homo == level) return "HOMO";
  if (frontier.lumo == level) return "LUMO";
  return "";
}

Json level_json(const LevelsResult& result, const PageLevel& shown,
                const std::vector<AtomSet>& sets, const std::vector<ShellGroup>& groups) {
  const Level& level = result.levels.levels[static_cast<std::size_t>(shown.level)];
  Json json;
  json["label"] = html_label(level_name(result.symmetry.group, level));
  json["energy_ev"] = rounded(level.energy_ev, to_energy);
  json["occupation"] = rounded(level.occupation, to_coefficient);
  json["degeneracy"] = level.degeneracy;
  json["mark"] = mark_of(result.levels.frontier, shown.level);
  json["made_of"] = html_words(composition_words(result, sets, groups, shown.level));
  json["coefficients"] = coefficients_json(result, shown.level);
  json["shares"] = shares_json(result, shown.level);
  json["orbitals"] = orbitals_json(shown.orbitals);
  return json;
}

Json molecule_json(const PageMolecule& shown) {
  const LevelsResult& result = *shown.result;
  const Molecule& molecule = result.symmetry.molecule;
  Json json;
  json["name"] = shown.name;
  json["atoms"] = Json::array();
  for (int i = 0; i < molecule.size(); ++i) {
    const Atom& atom = molecule.atoms()[static_cast<std::size_t>(i)];
    json["atoms"].push_back({atom_name(molecule, i), rounded(atom.position.x(), to_length),
                             rounded(atom.position.y(), to_length),
                             rounded(atom.position.z(), to_length),
                             rounded(ball_radius_angstrom(atom.atomic_number), to_length),
                             colour_json(element_colour(atom.atomic_number))});
  }
  json["bonds"] = Json::array();
  for (const OverlapPopulation& pair : result.populations.overlap_populations) {
    if (pair.bonded) json["bonds"].push_back({pair.atom_a, pair.atom_b});
  }
  json["orbitals"] = Json::array();
  for (const Shell& shell : result.basis.shells) {
    for (int component = 0; component < shell.size(); ++component) {
      json["orbitals"].push_back(
          {atom_name(molecule, shell.atom), html_words(shell_orbital_name(shell, component))});
    }
  }
  const std::vector<AtomSet> sets = atom_sets(result.symmetry);
  const std::vector<ShellGroup> groups = shell_groups(result, sets);
  json["levels"] = Json::object();
  for (const PageLevel& level : shown.levels) {
    const Level& it = result.levels.levels[static_cast<std::size_t>(level.level)];
    json["levels"][level_name(result.symmetry.group, it)] = level_json(result, level, sets, groups);
  }
  return json;
}

Json first_json(const std::vector<PageMolecule>& molecules) {
  const LevelsResult& result = *molecules.front().result;
  const Frontier& frontier = result.levels.frontier;
  const std::optional<int> level = frontier.homo ? frontier.homo : frontier.lumo;
  return {{"molecule", 0},
          {"level", level ? level_name(result.symmetry.group,
                                       result.levels.levels[static_cast<std::size_t>(*level)])
                          : ""}};
}

}  // namespace

std::string page_data(const std::vector<PageMolecule>& molecules, const Eigen::Vector3d& eye) {
  Json json;
  json["look"] = {{"positive", colour_json(palette::positive)},
                  {"negative", colour_json(palette::negative)},
                  {"stick", colour_json(stick_colour)},
                  {"stick_radius", stick_radius_angstrom}};
  json["eye"] = {rounded(eye.x(), to_length), rounded(eye.y(), to_length),
                 rounded(eye.z(), to_length)};
  json["no_surface"] = "The page has no surface of this level: `irrepwise draw` makes its picture.";
  json["coefficient_note"] =
      "Coefficients over atomic orbitals in the standard frame, normalised with overlap; left out "
      "where below 0.05 with a share below 1 %. Shares are Mulliken's, means over the partners.";
  json["first"] = first_json(molecules);
  json["molecules"] = Json::array();
  for (const PageMolecule& molecule : molecules) {
    json["molecules"].push_back(molecule_json(molecule));
  }
  std::string text = json.dump(-1, ' ', false, Json::error_handler_t::replace);
  for (std::size_t at = text.find("</"); at != std::string::npos; at = text.find("</", at + 3)) {
    text.replace(at, 2, "<\\/");
  }
  // "<!--" would begin another state of the parser of HTML.
  for (std::size_t at = text.find("<!"); at != std::string::npos; at = text.find("<!", at + 6)) {
    text.replace(at, 2, "\\u003c!");
  }
  return text;
}

}  // namespace irrepwise
