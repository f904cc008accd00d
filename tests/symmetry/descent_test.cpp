#include "symmetry/descent.hpp"

#include <algorithm>
#include <cmath>
#include <set>
#include <string>
#include <vector>

#include <doctest/doctest.h>
#include <Eigen/LU>

#include "core/error.hpp"
#include "support/groups.hpp"
#include "support/molecules.hpp"
#include "symmetry/vibrations.hpp"

using namespace irrepwise;

namespace {

PointGroup group_of(const char* name) { return PointGroup(parse_schoenflies(name)); }

std::string descends(const char* group_name, const char* way, const char* label) {
  const PointGroup group = group_of(group_name);
  const Embedding embedding = find_embedding(group, way);
  const std::vector<int> row = correlate(group, embedding)[group.irrep_index(label)];
  std::string text;
  for (std::size_t j = 0; j < row.size(); ++j) {
    for (int k = 0; k < row[j]; ++k) {
      text += (text.empty() ? "" : " + ") + embedding.subgroup.irreps()[j].label;
    }
  }
  return text;
}

std::set<std::string> names(const char* group_name, const char* subgroup) {
  std::set<std::string> found;
  for (const Embedding& way : embeddings(group_of(group_name), parse_schoenflies(subgroup))) {
    found.insert(way.name);
  }
  return found;
}

}  // namespace

TEST_CASE("correlations are those of the tables") {
  // Wilson, Decius and Cross, appendix X; Cotton; Altmann and Herzig (from memory).
  CHECK(descends("Oh", "D4h", "eg") == "A1g + B1g");
  CHECK(descends("Oh", "D4h", "t2g") == "B2g + Eg");
  CHECK(descends("Oh", "D4h", "t1u") == "A2u + Eu");
  CHECK(descends("Oh", "D3d", "t2g") == "A1g + Eg");
  CHECK(descends("Oh", "D3d", "t1g") == "A2g + Eg");
  CHECK(descends("Oh", "Td", "t2g") == "T2");
  CHECK(descends("Oh", "Td", "t1u") == "T2");
  CHECK(descends("Oh", "Td", "a2u") == "A1");
  CHECK(descends("Oh", "O", "t1u") == "T1");
  CHECK(descends("Oh", "C4v", "t1u") == "A1 + E");
  CHECK(descends("Td", "C3v", "t2") == "A1 + E");
  CHECK(descends("Td", "C2v", "t2") == "A1 + B1 + B2");
  CHECK(descends("Td", "C2v", "e") == "A1 + A2");
  CHECK(descends("Td", "D2d", "t2") == "B2 + E");
  CHECK(descends("D4h", "C2v(C2,sigmav)", "b1g") == "A1");
  CHECK(descends("D4h", "C2v(C2,sigmav)", "b2g") == "A2");
  CHECK(descends("D4h", "C2v(C2,sigmad)", "b1g") == "A2");
  CHECK(descends("D4h", "C2v(C2,sigmad)", "b2g") == "A1");
  CHECK(descends("D4h", "D2h(C2')", "b1g") == "Ag");
  CHECK(descends("D4h", "D2h(C2'')", "b1g") == "B1g");
  CHECK(descends("D4h", "D2h(C2\")", "b2g") == "Ag");
  CHECK(descends("D4h", "C4v", "eu") == "E");
  CHECK(descends("D6h", "D3h(C2')", "b1u") == "A1'");
  CHECK(descends("D6h", "D2h", "e1g") == "B2g + B3g");
  CHECK(descends("D6h", "D2h", "e2g") == "Ag + B1g");
  CHECK(descends("Ih", "Th", "hg") == "Eg + Tg");
  CHECK(descends("Ih", "Th", "gg") == "Ag + Tg");
  CHECK(descends("Ih", "D5d", "t1u") == "A2u + E1u");
  CHECK(descends("Ih", "D5d", "t2u") == "A2u + E2u");
  CHECK(descends("Ih", "D5d", "hg") == "A1g + E1g + E2g");
  CHECK(descends("Ih", "D3d", "gg") == "A1g + A2g + Eg");
  CHECK(descends("C6", "C3", "b") == "A");
  CHECK(descends("C6", "C2", "e1") == "B + B");
  CHECK(descends("D2h", "C2v(z)", "b1u") == "A1");
}

TEST_CASE("linear molecules and atoms descend by their angular functions") {
  CHECK(descends("Dinfh", "D2h", "piu") == "B2u + B3u");
  CHECK(descends("Dinfh", "D2h", "sigmag-") == "B1g");
  CHECK(descends("Dinfh", "D2h", "sigmau+") == "B1u");
  CHECK(descends("Dinfh", "D2h", "deltag") == "Ag + B1g");
  CHECK(descends("Dinfh", "D4h", "deltag") == "B1g + B2g");
  CHECK(descends("Dinfh", "Cinfv", "piu") == "Pi");
  CHECK(descends("Dinfh", "Cinfv", "sigmau-") == "Sigma-");
  CHECK(descends("Dinfh", "C2v(Cinf)", "sigmau+") == "A1");
  CHECK(descends("Dinfh", "C2v(C2)", "sigmau+") == "B2");  // z of the molecule is y there
  CHECK(descends("Cinfv", "Cs", "pi") == "A' + A\"");
  CHECK(descends("Kh", "Oh", "dg") == "Eg + T2g");
  CHECK(descends("Kh", "Oh", "fu") == "A2u + T1u + T2u");
  CHECK(descends("Kh", "Ih", "fu") == "T2u + Gu");
  CHECK(descends("Kh", "Dinfh", "dg") == "Sigmag+ + Pig + Deltag");
}

TEST_CASE("the ways into a subgroup are named by what they keep") {
  using Names = std::set<std::string>;
  CHECK(names("D4h", "C2v") == Names{"C2v(C2,sigmav)", "C2v(C2,sigmad)", "C2v(C2')", "C2v(C2'')"});
  CHECK(names("D4h", "D2h") == Names{"D2h(C2')", "D2h(C2'')"});
  CHECK(names("D4h", "D2d") == Names{"D2d(C2')", "D2d(C2'')"});
  CHECK(names("D4h", "C2") == Names{"C2(C2)", "C2(C2')", "C2(C2'')"});
  CHECK(names("D4h", "Cs") == Names{"Cs(sigmah)", "Cs(sigmav)", "Cs(sigmad)"});
  CHECK(names("D4h", "C4v") == Names{"C4v"});
  CHECK(names("D6h", "C3v") == Names{"C3v(sigmav)", "C3v(sigmad)"});
  CHECK(names("D6h", "D3d") == Names{"D3d(C2')", "D3d(C2'')"});
  CHECK(names("D2h", "C2v") == Names{"C2v(x)", "C2v(y)", "C2v(z)"});
  CHECK(names("D2h", "Cs") == Names{"Cs(xy)", "Cs(xz)", "Cs(yz)"});
  CHECK(names("C2v", "Cs") == Names{"Cs(xz)", "Cs(yz)"});
  CHECK(names("Oh", "D2") == Names{"D2(C2)", "D2(C2')"});
  CHECK(names("Oh", "C2v") == Names{"C2v(C2,sigmah)", "C2v(C2,sigmad)", "C2v(C2')"});
  CHECK(names("Dinfh", "Cs") == Names{"Cs(sigmah)", "Cs(sigmav)"});
  CHECK(names("Dinfh", "D2h") == Names{"D2h"});
  CHECK(names("Td", "Oh").empty());
  CHECK(names("C3v", "C2").empty());
}

TEST_CASE("the ways and their conjugates are all subgroups that there are") {
  // A second way: every closed subset, by brute force.
  for (const char* name : {"Oh", "Td", "Th", "D6h", "D4h", "D2h", "D5d", "D6d", "D4d", "S8", "C6v",
                           "C4h", "D8", "I", "O"}) {
    const std::string group_name = name;
    CAPTURE(group_name);
    const PointGroup group = group_of(name);
    PartialTable table{group.order(), {}};
    for (int g = 0; g < group.order(); ++g) {
      for (int h = 0; h < group.order(); ++h) table.products.push_back(group.product(g, h));
    }
    const std::vector<Subset> all = closed_subsets(table);
    std::set<Subset> found;
    std::size_t number = 0;
    std::set<std::string> all_names;
    for (const Schoenflies& symbol : subgroup_symbols(group)) {
      for (const Embedding& way : embeddings(group, symbol)) {
        const std::vector<Subset> copies = conjugates(group, way);
        number += copies.size();
        found.insert(copies.begin(), copies.end());
        CHECK(all_names.insert(way.name).second);
      }
    }
    CHECK(number == found.size());  // no two ways share a subgroup
    CHECK(found.size() + 1 == all.size());
    CHECK(std::all_of(all.begin(), all.end() - 1,
                      [&](const Subset& s) { return found.contains(s); }));
  }
}

TEST_CASE("every embedding keeps products and turns the frame, and characters add up") {
  for (const Schoenflies& symbol : all_groups(6)) {
    if (!symbol.is_finite()) continue;
    const PointGroup group(symbol);
    const std::string group_name = symbol.name();
    CAPTURE(group_name);
    for (const Schoenflies& sub : subgroup_symbols(group)) {
      for (const Embedding& way : embeddings(group, sub)) {
        const PointGroup& subgroup = way.subgroup;
        const std::vector<std::vector<int>> counts = correlate(group, way);
        const std::string name = way.name;
        CAPTURE(name);
        CHECK(way.rotation.determinant() == doctest::Approx(1.0).epsilon(1e-12).scale(0));
        double worst_matrix = 0.0, worst_character = 0.0;
        for (int h = 0; h < subgroup.order(); ++h) {
          const int g = way.operations[h];
          REQUIRE(g >= 0);
          worst_matrix = std::max(worst_matrix, (way.rotation * group.operations()[g] -
                                                 subgroup.operations()[h] * way.rotation)
                                                    .cwiseAbs()
                                                    .maxCoeff());
          for (std::size_t i = 0; i < counts.size(); ++i) {
            double sum = 0.0;
            for (std::size_t j = 0; j < counts[i].size(); ++j) {
              sum += counts[i][j] * subgroup.irreps()[j].characters[h];
            }
            worst_character =
                std::max(worst_character, std::abs(sum - group.irreps()[i].characters[g]));
          }
        }
        CHECK(worst_matrix < 1e-12);
        CHECK(worst_character < 1e-11);
      }
    }
  }
}

TEST_CASE("where the frame can stay, it stays") {
  for (const char* way : {"D2h(C2')", "C4v", "D4", "C2v(C2,sigmav)", "C4h", "Ci"}) {
    const Embedding embedding = find_embedding(group_of("D4h"), way);
    CHECK(embedding.rotation.isIdentity(1e-12));
  }
}

TEST_CASE("an unclear or impossible wish is refused, and the choices are named") {
  const PointGroup d4h = group_of("D4h");
  CHECK_THROWS_WITH_AS((void)find_embedding(d4h, "D2h"),
                       "'D2h': D2h lies in D4h in 2 ways; choose D2h(C2') or D2h(C2'')", Error);
  CHECK_THROWS_WITH_AS((void)find_embedding(d4h, "C4v(C2)"),
                       "'C4v(C2)': there is only one way from D4h to C4v; write C4v", Error);
  CHECK_THROWS_WITH_AS((void)find_embedding(group_of("C3v"), "D3"),
                       "D3 is no subgroup of C3v; its subgroups are C3, Cs and C1", Error);
  CHECK_THROWS_AS((void)find_embedding(d4h, "Q7"), Error);
}

TEST_CASE("a molecule is laid in the very way named") {
  // The number of displacements that keep all symmetry does not depend on axes or labels, but on
  // which operations are kept: from the correlation, and counted again in the subgroup.
  for (const char* name : {"tetrachloroplatinate(II)", "benzene", "sulfur hexafluoride", "methane",
                           "carbon dioxide", "water", "ammonia"}) {
    const Molecule& molecule = test_molecule(name).molecule;
    const MolecularSymmetry whole = find_symmetry(molecule);
    const Reduction displacements = displacement_irreps(whole).displacements;
    for (const char* symbol : {"C2v", "Cs", "C2", "D2h", "D2", "C2h", "D2d", "C3v", "D3d", "D3h"}) {
      for (const Embedding& way : embeddings(whole.group, parse_schoenflies(symbol))) {
        const std::string molecule_name = name, way_name = way.name;
        CAPTURE(molecule_name);
        CAPTURE(way_name);
        SymmetryOptions options;
        options.subgroup = way.name;
        const MolecularSymmetry lowered = find_symmetry(molecule, options);
        CHECK(lowered.group.symbol().name() == symbol);
        const std::vector<std::vector<int>> counts = correlate(whole.group, way);
        int expected = 0;
        for (const IrrepCount& irrep : displacements) {
          expected += irrep.count * counts[whole.group.irrep_index(irrep.label)][0];
        }
        const std::string& trivial = lowered.group.irreps().front().label;
        CHECK(count_of(displacement_irreps(lowered).displacements, trivial) == expected);
      }
    }
  }
  const Molecule& square = test_molecule("tetrachloroplatinate(II)").molecule;
  SymmetryOptions options;
  options.subgroup = "D2h(C3)";
  CHECK_THROWS_WITH_AS((void)find_symmetry(square, options),
                       "'D2h(C3)': D2h lies in D4h in 2 ways; choose D2h(C2') or D2h(C2'')", Error);
}
