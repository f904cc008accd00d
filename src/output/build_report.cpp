#include "output/build_report.hpp"

#include <cmath>
#include <cstddef>
#include <cstdlib>

#include <fmt/format.h>

#include "core/text.hpp"
#include "molecule/element.hpp"
#include "molecule/polyhedra.hpp"
#include "molecule/xyz.hpp"
#include "output/caption_words.hpp"
#include "output/json_text.hpp"

namespace irrepwise {
namespace {

constexpr double close_angstrom = 5e-4;

// "d8", "f2"; "2 valence electrons" for other elements.
std::string configuration(const ElectronCount& count) {
  if (count.shell == 'p') return fmt::format("{} valence electrons of its own", count.metal);
  return fmt::format("{}{}", count.shell, count.metal);
}

std::string electron_words(const ElectronCount& count) {
  const std::string bonds =
      count.other_metal > 0 ? fmt::format(" + {} from the other metal", count.other_metal) : "";
  return fmt::format("{}, {} electrons ({} + {} from ligands{})", configuration(count), count.total,
                     count.metal, count.donated, bonds);
}

std::string metal_name(const BuiltComplex& complex, std::size_t centre) {
  return atom_name(complex.molecule, complex.centres[centre].atom);
}

std::string vertex_words(const BuiltComplex& complex, const BuiltLigand& ligand) {
  std::vector<std::string> words;
  for (std::size_t i = 0; i < ligand.vertices.size(); ++i) {
    const bool bridge = ligand.centres.size() == 2;
    words.push_back(bridge ? fmt::format("{} of {}", ligand.vertices[i], metal_name(complex, i))
                           : std::to_string(ligand.vertices[i]));
  }
  std::string text = words.front();
  for (std::size_t i = 1; i < words.size(); ++i) text += ", " + words[i];
  if (ligand.centres.size() == 1 && complex.centres.size() == 2) {
    text += " of " + metal_name(complex, static_cast<std::size_t>(ligand.centres[0]));
  }
  return text;
}

std::string binding_words(int denticity, int hapticity) {
  if (denticity > 1) return fmt::format("κ{}", denticity);
  return hapticity > 1 ? fmt::format("η{}", hapticity) : "κ1";
}

std::string distance_words(const BuiltLigand& ligand) {
  std::string words;
  double last = -1.0;
  for (const double distance : ligand.distances_angstrom) {
    if (std::abs(distance - last) < close_angstrom) continue;
    words += fmt::format("{}{:.3f}", words.empty() ? "" : ", ", distance);
    last = distance;
  }
  return words;
}

std::string pose_words(const BuiltLigand& ligand) {
  std::vector<std::string> words;
  if (ligand.turns) words.push_back(fmt::format("twist {:.0f}°", ligand.twist_degrees));
  if (ligand.denticity > 1) words.push_back(fmt::format("bite {:.1f}°", ligand.bite_degrees));
  if (ligand.mirrored) words.push_back("mirror image");
  return joined(words);
}

Table ligand_table(const BuiltComplex& complex) {
  Table table;
  table.caption = "Ligands";
  table.columns = {{"vertex", "vertex", "", Align::Left, 0, false},
                   {"ligand", "ligand", "", Align::Left, 0, false},
                   {"binding", "binding", "", Align::Left, 1, false},
                   {"charge", "charge", "", Align::Right, 1, false},
                   {"electrons", "electrons", "", Align::Right, 1, false},
                   {"distance_angstrom", "distance", "Å", Align::Left, 0, false},
                   {"pose", "pose", "", Align::Left, 2, false}};
  for (const BuiltLigand& ligand : complex.ligands) {
    const bool bridge = ligand.centres.size() == 2;
    table.lines.emplace_back(
        Row{{vertex_words(complex, ligand), ligand.name,
             bridge ? std::string("bridge") : binding_words(ligand.denticity, ligand.hapticity),
             Number{double(ligand.charge), 0, true}, Number{double(ligand.electrons), 0},
             distance_words(ligand), pose_words(ligand)}});
  }
  if (complex.centres.size() == 2) {
    const int order = complex.centres.front().electrons.other_metal;
    table.notes.push_back(
        "electrons of a bridge: to each metal; " +
        (order > 0 ? fmt::format("of the bond between the metals, {} to each as "
                                 "`metal_metal_bond` says",
                                 order)
                   : "a bond between the metals is counted where `metal_metal_bond` gives its "
                     "order, here none"));
  }
  return table;
}

Table atom_table(const Molecule& molecule) {
  Table table;
  table.caption = "Atoms";
  table.columns = {{"atom", "atom", "", Align::Left, 0, false},
                   {"x", "x", "Å", Align::Decimal, 0, false},
                   {"y", "y", "Å", Align::Decimal, 0, false},
                   {"z", "z", "Å", Align::Decimal, 0, false}};
  for (int i = 0; i < molecule.size(); ++i) {
    const Eigen::Vector3d& r = molecule.atoms()[static_cast<std::size_t>(i)].position;
    table.lines.emplace_back(
        Row{{atom_name(molecule, i), Number{r.x(), 4}, Number{r.y(), 4}, Number{r.z(), 4}}});
  }
  return table;
}

std::string title_or_formula(const BuiltComplex& complex, const std::string& title) {
  return title.empty() ? readable_formula(complex.molecule) : title;
}

}  // namespace

Report build_report(const BuiltComplex& complex, const std::string& title) {
  Report report;
  report.title = title_or_formula(complex, title);
  report.facts.push_back({"formula", {readable_formula(complex.molecule)}});
  report.facts.push_back({"group", {complex.point_group}});
  for (std::size_t c = 0; c < complex.centres.size(); ++c) {
    const BuiltCentre& centre = complex.centres[c];
    const Polyhedron polyhedron(centre.polyhedron);
    report.facts.push_back(
        {metal_name(complex, c),
         {fmt::format("oxidation state {}, {} ({})", signed_number(centre.electrons.oxidation),
                      centre.polyhedron, polyhedron.kind().name),
          electron_words(centre.electrons)}});
  }
  report.tables = {ligand_table(complex), atom_table(complex.molecule)};
  report.warnings = geometry_warnings(complex.molecule);
  report.remarks.push_back(
      "Distances from covalent radii and the usual shape of each ligand: a model to compute with, "
      "not a prediction of the structure.");
  return report;
}

std::string build_json(const BuiltComplex& complex, const std::string& title) {
  Json centres = Json::array();
  for (const BuiltCentre& centre : complex.centres) {
    const ElectronCount& count = centre.electrons;
    centres.push_back(
        {{"atom", centre.atom + 1},
         {"element",
          element_symbol(
              complex.molecule.atoms()[static_cast<std::size_t>(centre.atom)].atomic_number)},
         {"polyhedron", centre.polyhedron},
         {"oxidation", count.oxidation},
         {"metal_electrons", count.metal},
         {"metal_shell", std::string(1, count.shell)},
         {"donated_electrons", count.donated},
         {"other_metal_electrons", count.other_metal},
         {"valence_electrons", count.total}});
  }
  Json ligands = Json::array();
  for (const BuiltLigand& ligand : complex.ligands) {
    Json atoms = Json::array();
    for (const int atom : ligand.atoms) atoms.push_back(atom + 1);
    Json holders = Json::array();
    for (const int centre : ligand.centres) holders.push_back(centre + 1);
    Json distances = Json::array();
    for (const double d : ligand.distances_angstrom) distances.push_back(finite_number(d));
    ligands.push_back({{"ligand", ligand.name},
                       {"charge", ligand.charge},
                       {"centres", holders},
                       {"vertices", ligand.vertices},
                       {"atoms", atoms},
                       {"denticity", ligand.denticity},
                       {"hapticity", ligand.hapticity},
                       {"electrons", ligand.electrons},
                       {"distances_angstrom", distances},
                       {"twist_degrees", finite_number(ligand.twist_degrees)},
                       {"mirrored", ligand.mirrored}});
  }
  Json atoms = Json::array();
  for (int i = 0; i < complex.molecule.size(); ++i) {
    const Atom& atom = complex.molecule.atoms()[static_cast<std::size_t>(i)];
    atoms.push_back({{"index", i + 1},
                     {"element", element_symbol(atom.atomic_number)},
                     {"x", finite_number(atom.position.x())},
                     {"y", finite_number(atom.position.y())},
                     {"z", finite_number(atom.position.z())}});
  }
  return json_text(Json{{"schema", "irrepwise.build.1"},
                        {"title", title_or_formula(complex, title)},
                        {"formula", hill_formula(complex.molecule)},
                        {"charge", complex.molecule.charge()},
                        {"point_group", complex.point_group},
                        {"how", complex.how},
                        {"centres", centres},
                        {"ligands", ligands},
                        {"atoms", atoms}});
}

std::string build_xyz(const BuiltComplex& complex, const std::string& title) {
  std::string made = complex.how;
  made += "; group " + complex.point_group;
  for (const BuiltCentre& centre : complex.centres) made += "; " + electron_words(centre.electrons);
  return xyz_text(complex.molecule, title, made);
}

Report ligands_report(const LigandLibrary& library) {
  Report report;
  Table table;
  table.caption = fmt::format("{} ligands", library.ligands().size());
  table.columns = {{"ligand", "ligand", "", Align::Left, 0, false},
                   {"names", "also called", "", Align::Left, 2, true},
                   {"charge", "charge", "", Align::Right, 0, false},
                   {"binding", "binding: electrons", "", Align::Left, 0, false},
                   {"shortening_angstrom", "shorter by", "Å", Align::Decimal, 1, false},
                   {"geometry", "geometry", "", Align::Left, 3, true}};
  for (const Ligand& ligand : library.ligands()) {
    std::vector<std::string> ways;
    for (const Binding& binding : ligand.bindings) {
      ways.push_back(fmt::format("{}: {}", binding_words(binding.denticity(), binding.hapticity()),
                                 binding.electrons));
    }
    if (ligand.bridging_electrons) {
      ways.push_back(fmt::format("bridge: {} each", *ligand.bridging_electrons));
    }
    std::string ways_text = ways.front();
    for (std::size_t i = 1; i < ways.size(); ++i) ways_text += ", " + ways[i];
    std::string names;
    for (const std::string& name : ligand.names) names += (names.empty() ? "" : ", ") + name;
    table.lines.emplace_back(
        Row{{ligand.name, names, Number{double(ligand.charge), 0, true}, ways_text,
             Number{ligand.shortening_angstrom, 2}, ligand.geometry}});
  }
  report.tables.push_back(std::move(table));
  report.remarks.push_back(
      "Charges and electrons by the counting of closed-shell ligands. The distance to the metal is "
      "the sum of the covalent radii less the length in the fifth column, or as you give it.");
  return report;
}

Report polyhedra_report() {
  Report report;
  Table table;
  table.caption = "Coordination polyhedra";
  table.columns = {{"symbol", "symbol", "", Align::Left, 0, false},
                   {"name", "shape", "", Align::Left, 1, false},
                   {"group", "group", "", Align::Left, 0, false},
                   {"vertices", "vertices", "", Align::Left, 0, true}};
  std::string angles;
  for (const PolyhedronKind& kind : polyhedron_kinds()) {
    table.lines.emplace_back(Row{{std::string(kind.symbol), std::string(kind.name),
                                  std::string(kind.group), std::string(kind.vertices)}});
    if (kind.free_angle.empty()) continue;
    angles += fmt::format("{}{} ({}, {:.1f}°)", angles.empty() ? "" : ", ", kind.symbol,
                          kind.free_angle, kind.angle_degrees);
  }
  table.notes.push_back("Angles that can be set, with their defaults: " + angles + ".");
  report.tables.push_back(std::move(table));
  report.remarks.push_back(
      "Symbols of IUPAC's Red Book (2005), IR-9.3. The group is that of equal ligands of one atom. "
      "Up is +z; vertices at one height are numbered anticlockwise as seen from above.");
  return report;
}

}  // namespace irrepwise
