#include "output/symmetry_report.hpp"

#include <algorithm>
#include <sstream>
#include <string>

#include <doctest/doctest.h>
#include <nlohmann/json.hpp>

#include "basis/parameter_set.hpp"
#include "output/display_width.hpp"
#include "output/salc_tables.hpp"
#include "output/symmetry_json.hpp"
#include "output/symmetry_tables.hpp"
#include "output/symmetry_words.hpp"
#include "output/table_text.hpp"
#include "support/groups.hpp"
#include "support/molecules.hpp"

using namespace irrepwise;

namespace {

SymmetryResult symmetry_of_test_molecule(const std::string& name) {
  const Molecule& molecule = test_molecule(name).molecule;
  return symmetry_of(molecule, {}, make_basis(molecule, published_parameters()));
}

int widest_line(const std::string& text) {
  std::istringstream lines(text);
  int widest = 0;
  for (std::string line; std::getline(lines, line);) widest = std::max(widest, display_width(line));
  return widest;
}

}  // namespace

TEST_CASE("reports of all kinds of molecules fit 100 columns") {
  for (const std::string name :
       {"water", "sulfur hexafluoride", "buckminsterfullerene", "ferrocene, staggered",
        "octachlorodirhenate(III)", "carbon dioxide", "tris(ethylenediamine)cobalt(III)",
        "tetrahydroxoborate", "helium atom", "dinitrogen", "tetrachloroplatinate(II)",
        "six different ligands on platinum(IV)"}) {
    CAPTURE(name);
    SymmetryResult result = symmetry_of_test_molecule(name);
    result.orbitals->salcs =
        salc_table(result.symmetry, result.orbitals->basis, result.sets, result.frames);
    const Report report = symmetry_report(result, {}, {true, true, true}, 100);
    CHECK(widest_line(report_text(report, 100)) <= 100);
  }
}

TEST_CASE("tables of groups fit too, whatever the order") {
  for (const Schoenflies& symbol : all_groups(12)) {
    const std::string name = symbol.name();
    CAPTURE(name);
    CHECK(widest_line(report_text(group_report(PointGroup(symbol), {}, 100), 100)) <= 100);
  }
}

TEST_CASE("in a square complex b1g bonds by σ, and a2g of the ligands finds no partner") {
  // Common practice: ligand-field theory of the square plane.
  const SymmetryResult result = symmetry_of_test_molecule("tetrachloroplatinate(II)");
  const PointGroup& group = result.symmetry.group;
  bool met_b1g = false, met_a2g = false;
  for (const BondingIrrep& row : bonding_by_irrep(result)) {
    if (row.irrep == group.irrep_index("B1g")) {
      met_b1g = true;
      CHECK(row.can_bond);
      CHECK(row.parts[0] == std::vector<std::string>{"5dx2-y2"});
      CHECK(row.parts[1] == std::vector<std::string>{"σ"});
    }
    if (row.irrep == group.irrep_index("A2g")) {
      met_a2g = true;
      CHECK_FALSE(row.can_bond);
      CHECK(row.parts[0].empty());
    }
  }
  CHECK(met_b1g);
  CHECK(met_a2g);
}

TEST_CASE("the document has the keys that README lists, and reductions that add up") {
  const nlohmann::json document =
      nlohmann::json::parse(symmetry_json(symmetry_of_test_molecule("sulfur hexafluoride"), {}));
  for (const std::string key :
       {"point_group", "order", "classes", "irreps", "ladder", "equivalent_atoms", "reductions",
        "salcs", "transitions", "terms", "axes", "bonding", "vibrations"}) {
    CAPTURE(key);
    CHECK(document.contains(key));
  }
  CHECK(document["point_group"] == "Oh");
  CHECK(document["order"] == 48);
  CHECK(document["ladder"][0]["tolerance_angstrom"] == 0.0);
  bool met = false;
  for (const auto& reduction : document["reductions"]) {
    if (reduction["part"] != "sigma") continue;
    met = true;
    CHECK(reduction["irreps"] == nlohmann::json{{"a1g", 1}, {"eg", 1}, {"t1u", 1}});
    CHECK(reduction["set"].size() == 6);
  }
  CHECK(met);
}

TEST_CASE("words of symmetry are those of the trade") {
  CHECK(readable_class("2C5^2") == "2C5²");
  CHECK(readable_class("3sigmad") == "3σd");
  CHECK(readable_class("2Cphi") == "2C(φ)");
  CHECK(cell_text(term_words({{3, "T1g", 3, 1}})) == "³T1g");
  CHECK(cell_text(term_words({{1, "Eg", 2, 2}})) == "2 ¹Eg");
  CHECK(readable_functions({FunctionKind::Quadratic, {"x2-y2"}}) == "x²−y²");
  CHECK(coefficient_text(0.0) == "·");
  CHECK(coefficient_text(-0.37174) == "-0.3717");
}

TEST_CASE("counts of lower-case labels do not read as levels") {
  const Reduction reduction = {{"A1g", 1, 1}, {"Eg", 2, 3}};
  CHECK(cell_text(reduction_words(reduction)) == "a1g + 3\u00A0×\u00A0eg");
  CHECK(cell_text(mode_words(reduction)) == "a1g, 3\u00A0×\u00A0eg");
  CHECK(cell_text(state_words(reduction)) == "A1g + 3Eg");
}

TEST_CASE("what can bond leaves out no set of atoms, however narrow the text") {
  const SymmetryResult result = symmetry_of_test_molecule("tricarbonylcyclopentadienylmanganese");
  REQUIRE(result.sets.size() > 6);
  for (const int width : {40, 80, 1000}) {
    CAPTURE(width);
    std::size_t columns = 0;
    std::size_t tables = 0;
    for (const Table& table : bonding_tables(result, width)) {
      ++tables;
      columns += table.columns.size() - 1;  // the irreps stand in each
      const std::string text = table_text(table, width);
      CHECK(text.find("Left out") == std::string::npos);
      CHECK(widest_line(text) <= width);
      CHECK(std::get<Row>(table.lines.front()).cells.size() == table.columns.size());
    }
    CHECK(columns == result.sets.size() + 1);  // and the verdict
    CHECK((tables == 1) == (width == 1000));
  }
}
