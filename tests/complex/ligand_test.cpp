#include "complex/ligand.hpp"

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "molecule/element.hpp"

using namespace irrepwise;

namespace {

// "C-O": the symbols in alphabetical order.
std::string pair_key(int a, int b) {
  std::string first(element_symbol(a));
  std::string second(element_symbol(b));
  if (second < first) std::swap(first, second);
  return first + "-" + second;
}

std::string refusal(const std::string& yaml) {
  try {
    (void)parse_ligands(yaml, "mine.yaml");
  } catch (const Error& error) {
    return error.what();
  }
  return "accepted";
}

}  // namespace

TEST_CASE("the library has the usual ligands under their usual names") {
  CHECK(built_in_ligands().ligands().size() >= 50);
  for (const char* name : {"hydride",     "fluoride",   "chloride",
                           "bromide",     "iodide",     "oxo",
                           "nitrido",     "hydroxo",    "aqua",
                           "ammine",      "carbonyl",   "cyanide",
                           "NC-",         "NO",         "nitrosyl (bent)",
                           "dinitrogen",  "azide",      "NCS-",
                           "SCN-",        "NO2-",       "ONO-",
                           "PH3",         "PMe3",       "PF3",
                           "AsH3",        "SH-",        "SMe",
                           "methyl",      "phenyl",     "vinyl",
                           "ethynyl",     "carbene",    "carbyne",
                           "MeCN",        "pyridine",   "imidazole",
                           "carboxylate", "nitrate",    "sulfate",
                           "en",          "bipyridine", "phenanthroline",
                           "acac",        "oxalate",    "dithiolene",
                           "diphosphine", "ethylene",   "acetylene",
                           "allyl",       "butadiene",  "cyclopentadienyl",
                           "benzene",     "C7H7",       "C8H8",
                           "peroxo",      "dihydrogen"}) {
    CAPTURE(name);
    CHECK_NOTHROW(static_cast<void>(built_in_ligands().find(name)));
  }
  CHECK(built_in_ligands().find("PYRIDINE").name == "py");
  CHECK(built_in_ligands().find("no").name == "NO");
}

TEST_CASE("bonds inside ligands are sums of covalent radii or the lengths of the cited source") {
  int n_bonds = 0;
  for (const Ligand& ligand : built_in_ligands().ligands()) {
    const Molecule free(ligand.atoms, 0);
    std::vector<int> n_neighbours(ligand.atoms.size(), 0);
    for (int a = 0; a < free.size(); ++a) {
      for (int b = 0; b < a; ++b) {
        const Atom& atom_a = free.atoms()[static_cast<std::size_t>(a)];
        const Atom& atom_b = free.atoms()[static_cast<std::size_t>(b)];
        const double found = (atom_a.position - atom_b.position).norm();
        const double sum = covalent_radius_angstrom(atom_a.atomic_number).value() +
                           covalent_radius_angstrom(atom_b.atomic_number).value();
        const std::string key = pair_key(atom_a.atomic_number, atom_b.atomic_number);
        std::vector<double> expected = {sum};
        if (const auto cited = ligand.lengths.find(key); cited != ligand.lengths.end()) {
          expected.insert(expected.end(), cited->second.begin(), cited->second.end());
        }
        const bool fits = std::any_of(expected.begin(), expected.end(), [&](double length) {
          return std::abs(found - length) <= 0.06;
        });
        const std::string& name = ligand.name;
        CAPTURE(name);
        CAPTURE(key);
        CAPTURE(found);
        if (fits) {
          ++n_bonds;
          ++n_neighbours[static_cast<std::size_t>(a)];
          ++n_neighbours[static_cast<std::size_t>(b)];
        } else {
          CHECK(found > 1.3 * sum);  // no bond
        }
      }
    }
    if (free.size() > 1) {
      CHECK_FALSE(ligand.geometry.empty());
      CHECK_FALSE(ligand.source.empty());
      for (const int n : n_neighbours) CHECK(n > 0);
    }
    if (ligand.shortening_angstrom != 0.0) CHECK_FALSE(ligand.shortening_source.empty());
  }
  CHECK(n_bonds > 300);
}

TEST_CASE("closed-shell ligands have an even number of electrons") {
  // Nuclear charges less the charge of the ligand: odd would be a radical.
  for (const Ligand& ligand : built_in_ligands().ligands()) {
    const std::string& name = ligand.name;
    CAPTURE(name);
    int electrons = -ligand.charge;
    for (const Atom& atom : ligand.atoms) electrons += atom.atomic_number;
    CHECK(electrons % 2 == 0);
    for (const Binding& binding : ligand.bindings) CHECK(binding.electrons % 2 == 0);
  }
}

TEST_CASE("a library of the user's own adds ligands and replaces them") {
  const LigandLibrary mine = parse_ligands(
      "ligands:\n"
      "  Cl:\n"
      "    charge: -1\n"
      "    binding: [{donors: [[1]], electrons: 2}]\n"
      "    shortening: 0.05\n"
      "    atoms: [[Cl, 0, 0, 0]]\n"
      "  xenon:\n"
      "    names: [Xe]\n"
      "    charge: 0\n"
      "    binding: [{donors: [[1]], electrons: 2}]\n"
      "    atoms: [[Xe, 0, 0, 0]]\n",
      "mine.yaml");
  const LigandLibrary both = built_in_ligands().extended_by(mine);
  CHECK(both.ligands().size() == built_in_ligands().ligands().size() + 1);
  CHECK(both.find("Cl").shortening_angstrom == 0.05);
  CHECK(both.find("Xe").name == "xenon");
  CHECK(built_in_ligands().find("Cl").shortening_angstrom == 0.0);
}

TEST_CASE("unknown ligands and wrong libraries are refused with what to do") {
  CHECK_THROWS_WITH_AS(static_cast<void>(built_in_ligands().find("amine")),
                       "no ligand is called 'amine', did you mean 'ammine'? `irrepwise build "
                       "--list ligands` shows all",
                       Error);
  const std::string head = "ligands:\n  A:\n    charge: 0\n    atoms: [[N, 0, 0, 0]]\n";
  CHECK(refusal(head + "    binding: [{donors: [[2]], electrons: 2}]\n") ==
        "mine.yaml:5:26: there is no atom 2, expected 1 to 1");
  CHECK(refusal(head + "    binding: []\n") == "mine.yaml:5:14: expected at least one way to bind");
  CHECK(refusal(head) == "mine.yaml:3:5: the key 'binding' is missing here");
  CHECK(refusal(head + "    binding: [{donors: [[1]], electrons: 2}]\n    denticity: 1\n") ==
        "mine.yaml:6:5: unknown key 'denticity' in a ligand; known keys are names, charge, "
        "binding, bridging, bridging_angle, bridging_shortening, bridging_shortening_source, "
        "shortening, "
        "shortening_source, geometry, source, lengths and atoms");
}
