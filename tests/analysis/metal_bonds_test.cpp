#include "analysis/metal_bonds.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <set>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "analysis/donors.hpp"
#include "complex/build.hpp"
#include "job/job.hpp"
#include "support/complexes.hpp"
#include "support/molecules.hpp"
#include "support/moved.hpp"
#include "support/paths.hpp"
#include "support/run.hpp"

using namespace irrepwise;

namespace {

struct Bonds {
  Run r;
  Populations populations;
  std::vector<BondType> types;
};

Bonds bonds_of(const Molecule& molecule) {
  Run r = run(molecule);
  Populations populations = mulliken_populations(r.symmetry, r.basis, r.levels);
  const int metal = metal_atoms(r.symmetry.molecule, r.basis).front();
  std::vector<BondType> types = bond_types(r.symmetry, populations, metal);
  return {std::move(r), std::move(populations), std::move(types)};
}

Molecule built(const std::string& metal, const std::string& polyhedron, int oxidation,
               const std::vector<std::string>& ligands) {
  return build_complex(spec_of(metal, polyhedron, oxidation, ligands)).molecule;
}

// "4 N of H3N opposite N": what a chemist would say of a type.
std::multiset<std::string> words(const std::vector<BondType>& types) {
  std::multiset<std::string> all;
  for (const BondType& type : types) {
    all.insert(std::to_string(type.bonds.size()) + " " + (type.bridging ? "bridging " : "") +
               type.element + " of " + type.ligand +
               (type.opposite == Opposite::None ? "" : " opposite " + type.opposite_element) +
               (type.length == BondLength::Short  ? ", short"
                : type.length == BondLength::Long ? ", long"
                                                  : ""));
  }
  return all;
}

using Words = std::multiset<std::string>;

}  // namespace

TEST_CASE("bonds of one element are told apart by the ligand and by what stands opposite") {
  // By the vertices: 1 and 3 of SP-4, 1 and 6 of OC-6 are opposite.
  CHECK(words(bonds_of(built("Pt", "SP-4", 2, {"PH3", "PH3", "H", "PH3"})).types) ==
        Words{"1 H of H opposite P", "1 P of H3P opposite H", "2 P of H3P opposite P"});
  CHECK(words(bonds_of(built("Co", "OC-6", 3, {"py", "NH3", "NH3", "NH3", "NH3", "NH3"})).types) ==
        Words{"1 N of C5H5N opposite N", "1 N of H3N opposite N", "4 N of H3N opposite N"});
  CHECK(words(bonds_of(built("Co", "OC-6", 3, {"CN", "CN", "NH3", "NH3", "NH3", "CN"})).types) ==
        Words{"1 C of CN opposite N", "1 N of H3N opposite C", "2 C of CN opposite C",
              "2 N of H3N opposite N"});
  CHECK(words(bonds_of(built("Fe", "TBPY-5", 0, {"CO", "CO", "CO", "CO", "CO"})).types) ==
        Words{"2 C of CO opposite C", "3 C of CO"});
  CHECK(words(bonds_of(built("Co", "T-4", 2, {"Cl", "Cl", "Cl", "Cl"})).types) ==
        Words{"4 Cl of Cl"});
}

TEST_CASE("a stretched octahedron has short and long bonds, and a dimer bridging ones") {
  const Molecule even = built("Cu", "OC-6", 2, {"Cl", "Cl", "Cl", "Cl", "Cl", "Cl"});
  CHECK(words(bonds_of(even).types) == Words{"6 Cl of Cl opposite Cl"});
  const auto with_axis = [&](double factor) {
    Eigen::Matrix3Xd positions = even.positions();
    positions.row(2) *= factor;
    return bonds_of(even.with_positions(positions)).types;
  };
  CHECK(words(with_axis(1.10)) ==
        Words{"2 Cl of Cl opposite Cl, long", "4 Cl of Cl opposite Cl, short"});
  // Two per cent of 2.3 Å stay below the gap that parts them.
  CHECK(words(with_axis(1.02)) == Words{"6 Cl of Cl opposite Cl"});
  CHECK(words(bonds_of(read_job(source_path("inputs/bridged_pd2cl6.yaml")).molecule).types) ==
        Words{"2 Cl of Cl opposite Cl", "2 bridging Cl of Cl opposite Cl"});
}

TEST_CASE("equivalent donors are of one type, the types hold every donor once") {
  for (const TestMolecule& entry : test_molecules()) {
    if (entry.molecule.size() > 25) continue;
    const std::vector<int> metals =
        metal_atoms(entry.molecule, make_basis(entry.molecule, published_parameters()));
    if (metals.empty()) continue;
    CAPTURE(entry.name);
    const Bonds bonds = bonds_of(entry.molecule);
    const Run& r = bonds.r;
    std::map<int, std::size_t> type_of;
    std::map<std::string, std::pair<double, int>> by_element, by_type;
    for (std::size_t t = 0; t < bonds.types.size(); ++t) {
      for (const MetalBond& bond : bonds.types[t].bonds) {
        CHECK(type_of.emplace(bond.donor, t).second);
      }
      auto& [sum, count] = by_type[bonds.types[t].element];
      const auto n = static_cast<int>(bonds.types[t].bonds.size());
      sum += n * bonds.types[t].overlap_population();
      count += n;
    }
    // Where the metal stays in place, the images of its donors are donors of it.
    for (const std::vector<int>& image : r.symmetry.images) {
      if (image[static_cast<std::size_t>(metals.front())] != metals.front()) continue;
      for (const auto& [donor, type] : type_of) {
        CHECK(type_of.at(image[static_cast<std::size_t>(donor)]) == type);
      }
    }
    // The weighted mean of the types is the mean over the element, taken from the pairs.
    for (const DonorSite& site : donor_sites(r.symmetry.molecule, metals.front())) {
      for (const int donor : site.atoms) {
        const int first = std::min(donor, metals.front()), second = std::max(donor, metals.front());
        for (const OverlapPopulation& pair : bonds.populations.overlap_populations) {
          if (pair.atom_a != first || pair.atom_b != second) continue;
          auto& [sum, count] = by_element[bonds.types[type_of.at(donor)].element];
          sum += pair.value;
          ++count;
        }
      }
    }
    REQUIRE(by_element.size() == by_type.size());
    for (const auto& [element, mean] : by_element) {
      CHECK(mean.second == by_type[element].second);
      CHECK(std::abs(mean.first - by_type[element].first) < 1e-12 * (1 + mean.second));
    }
  }
}

TEST_CASE("turning and renumbering change neither types nor what they hold") {
  for (const auto& ligands : {std::vector<std::string>{"py", "NH3", "NH3", "Cl", "NH3", "NH3"},
                              std::vector<std::string>{"CN", "CN", "NH3", "NH3", "NH3", "CN"}}) {
    const Molecule molecule = built("Co", "OC-6", 3, ligands);
    const auto facts = [](const Bonds& bonds) {
      std::vector<std::pair<std::string, double>> list;
      for (const BondType& type : bonds.types) {
        list.emplace_back(*words({type}).begin(), type.overlap_population());
      }
      std::sort(list.begin(), list.end());
      return list;
    };
    const auto before = facts(bonds_of(molecule));
    for (const unsigned seed : {1u, 2u}) {
      const auto after = facts(bonds_of(moved(molecule, seed).molecule));
      REQUIRE(after.size() == before.size());
      for (std::size_t i = 0; i < before.size(); ++i) {
        CHECK(after[i].first == before[i].first);
        CHECK(std::abs(after[i].second - before[i].second) < 1e-7);
      }
    }
  }
}

TEST_CASE("operations that exchange two metals do not mix what stands opposite at either") {
  // trans-[Pt2Cl2(μ-Cl)2(PH3)2], C2h: each bridge is trans to Cl at one metal, to P at the other.
  const double s = 1.63;  // Å; bonds of 2.3 Å
  const Molecule dimer({{78, {s, 0, 0}},
                        {78, {-s, 0, 0}},
                        {17, {0, s, 0}},
                        {17, {0, -s, 0}},
                        {17, {s + s, s, 0}},
                        {17, {-s - s, -s, 0}},
                        {15, {s + s, -s, 0}},
                        {15, {-s - s, s, 0}}},
                       -4);
  const Bonds bonds = bonds_of(dimer);
  REQUIRE(bonds.r.symmetry.group.symbol().name() == "C2h");
  std::map<int, std::string> opposite;
  for (const BondType& type : bonds.types) {
    for (const MetalBond& bond : type.bonds) opposite[bond.donor] = type.opposite_element;
  }
  CHECK(bonds.types.front().bonds.size() == 2);
  CHECK(opposite[2] == "Cl, P");  // the type of both bridges
  CHECK(opposite[3] == "Cl, P");
  CHECK(opposite[4] == "Cl");
  CHECK(opposite[6] == "Cl");
}

TEST_CASE("a metal without a d shell is no donor of another") {
  const Molecule chain(
      {{17, {0, 0, -3.4}}, {30, {0, 0, -1.2}}, {30, {0, 0, 1.2}}, {17, {0, 0, 3.4}}}, 0);
  const Run r = run(chain);
  const Populations populations = mulliken_populations(r.symmetry, r.basis, r.levels);
  const std::vector<BondType> types = bond_types(r.symmetry, populations, 1);
  CHECK(words(types) == Words{"1 Cl of Cl"});
}

TEST_CASE("a gap of the very limit is none, however the molecule lies") {
  for (const unsigned seed : {1u, 2u, 3u, 4u}) {
    const Molecule square({{78, {0, 0, 0}},
                           {17, {2.20, 0, 0}},
                           {17, {-2.20, 0, 0}},
                           {17, {0, 2.25, 0}},
                           {17, {0, -2.25, 0}}},
                          -2);
    CHECK(bonds_of(moved(square, seed).molecule).types.size() == 1);
  }
}
