#include "output/orbital_table_layout.hpp"

#include <algorithm>
#include <sstream>

#include <doctest/doctest.h>
#include <nlohmann/json.hpp>

#include "core/error.hpp"
#include "example.hpp"
#include "output/display_width.hpp"
#include "output/orbital_table_data.hpp"
#include "output/table_text.hpp"

using namespace irrepwise;

namespace {

std::vector<OrbitalChoice> every_orbital(const LevelsResult& result) {
  std::vector<OrbitalChoice> choices;
  for (int level = 0; level < static_cast<int>(result.levels.levels.size()); ++level) {
    for (const OrbitalChoice& choice : partners_of(result.levels, level)) choices.push_back(choice);
  }
  return choices;
}

bool holds(const std::string& text, const std::string& part) {
  return text.find(part) != std::string::npos;
}

// The entry of a row by its atom (repeated where blank) and orbital, nothing where blank or absent.
std::optional<double> entry(const Table& table, const std::string& atom, const std::string& orbital,
                            const std::string& key) {
  std::size_t column = 0;
  while (column < table.columns.size() && table.columns[column].key != key) ++column;
  if (column == table.columns.size()) return std::nullopt;
  std::string current;
  for (const auto& line : table.lines) {
    const Row* row = std::get_if<Row>(&line);
    if (row == nullptr) continue;
    const std::string name = cell_text(row->cells[0]);
    if (!name.empty()) current = name;
    if (current != atom || cell_text(row->cells[1]) != orbital) continue;
    const auto* number = std::get_if<Number>(&row->cells[column]);
    if (number != nullptr) return number->value;
  }
  return std::nullopt;
}

}  // namespace

TEST_CASE("a table broken by its width has every orbital once, whole levels, and fits") {
  const LevelsResult result = result_of(skew_square());
  const OrbitalTable table = orbital_table(result, every_orbital(result), {});
  for (const int width : {60, 80, 120}) {
    CAPTURE(width);
    OrbitalTableLayout layout;
    layout.width = width;
    layout.source = "square.xyz";
    const std::vector<Table> tables = orbital_tables(result, table, layout);
    std::vector<std::string> keys;
    for (const Table& part : tables) {
      for (std::size_t i = 2; i < part.columns.size(); ++i) {
        keys.push_back(part.columns[i].key);
        // The second partner stands beside the first.
        const std::string& key = keys.back();
        if (key.ends_with(":2"))
          CHECK(part.columns[i - 1].key == key.substr(0, key.size() - 1) + "1");
      }
      std::istringstream lines(table_text(part, width));
      for (std::string line; std::getline(lines, line);) CHECK(display_width(line) <= width);
    }
    REQUIRE(keys.size() == table.orbitals.size());
    for (std::size_t i = 0; i < keys.size(); ++i) CHECK(keys[i] == table.orbitals[i].name);
    CHECK(holds(tables.back().caption, "part " + std::to_string(tables.size())));
  }
}

TEST_CASE("the first table says what it needs to stand alone") {
  const LevelsResult result = result_of(skew_square());
  OrbitalTableLayout layout;
  layout.source = "square.xyz";
  const std::vector<Table> tables =
      orbital_tables(result, orbital_table(result, {{0, 0}}, {}), layout);
  REQUIRE(tables.size() == 1);
  CHECK(tables[0].caption == "Orbital coefficients over atomic orbitals: a square");
  for (const char* words : {"square.xyz", "Cl₄Pt²⁻", "D4h", "weighted rule, K\u00A0=\u00A01.75",
                            "parameters: published", "z = C4 through Pt1", "eV", "cᵀSc = 1"}) {
    CAPTURE(words);
    CHECK(holds(tables[0].legend, words));
  }
}

TEST_CASE("small entries are blank, empty rows gone, and the note says what that amounts to") {
  const LevelsResult result = result_of(skew_square());
  const auto homo = static_cast<std::size_t>(result.levels.frontier.homo.value());
  const std::vector<OrbitalChoice> choice = {{static_cast<int>(homo), 0}};
  OrbitalTableOptions options;
  options.entries = TableEntries::Shares;
  const OrbitalTable table = orbital_table(result, choice, options);
  OrbitalTableLayout layout;
  layout.threshold = 10.0;  // per cent: only dxy of the metal is left (86 %)
  const Table made = orbital_tables(result, table, layout).front();
  int rows = 0;
  for (const auto& line : made.lines) rows += std::holds_alternative<Row>(line) ? 1 : 0;
  CHECK(rows == 4);  // mark, energy, electrons, dxy
  const std::optional<double> dxy = entry(made, "Pt1", "5dxy", made.columns[2].key);
  REQUIRE(dxy);
  REQUIRE(made.notes.size() == 1);
  char amount[32];
  std::snprintf(amount, sizeof amount, "amount to %.1f", 100.0 - *dxy);
  CHECK(holds(made.notes[0], amount));
  CHECK(holds(made.notes[0], "24 of 25 atomic orbitals"));

  layout.threshold = 0.0;  // blank is only what symmetry makes zero: dxy and four in-plane π
  const Table whole = orbital_tables(result, table, layout).front();
  CHECK(holds(whole.notes[0], "Blank: zero by symmetry."));
  CHECK_FALSE(holds(whole.notes[0], "amount"));
}

TEST_CASE("energies, electrons and frontier marks stand on top") {
  const LevelsResult result = result_of(skew_square());
  const int homo = result.levels.frontier.homo.value();
  const int lumo = result.levels.frontier.lumo.value();
  const OrbitalTable table = orbital_table(result, {{homo, 0}, {lumo, 0}}, {});
  const Table made = orbital_tables(result, table, {}).front();
  const Row& marks = std::get<Row>(made.lines[0]);
  CHECK(cell_text(marks.cells[2]) == "HOMO");
  CHECK(cell_text(marks.cells[3]) == "LUMO");
  const Row& energies = std::get<Row>(made.lines[1]);
  CHECK(cell_exact(energies.cells[2]) ==
        cell_exact(Number{result.levels.levels[static_cast<std::size_t>(homo)].energy_ev}));
  CHECK(cell_text(std::get<Row>(made.lines[2]).cells[2]) == "2");
  CHECK(made.columns[2].label == "2b2g");
}

TEST_CASE("over SALCs there is a table for each irrep, with one column for a level") {
  const LevelsResult result = result_of(benzene());
  OrbitalTableOptions options;
  options.functions = TableFunctions::Salcs;
  const OrbitalTable table = orbital_table(result, every_orbital(result), options);
  CHECK(table.orbitals.size() == result.levels.levels.size());
  OrbitalTableLayout layout;
  layout.width = 1000;
  const std::vector<Table> tables = orbital_tables(result, table, layout);
  // Valence orbitals of benzene in D6h: π a2u + b2g + e1g + e2u, σ 2a1g.. : all but a2g's partner
  // irreps a1u and b1g, which no s or p orbital on a plane ring spans (common practice).
  CHECK(tables.size() == 10);
  for (const Table& part : tables) {
    CHECK(holds(part.caption, "over SALCs"));
    for (std::size_t i = 2; i < part.columns.size(); ++i) CHECK(part.columns[i].header.empty());
  }
}

TEST_CASE("in local frames a molecule without a centre is refused") {
  const LevelsResult result =
      result_of(Molecule({{1, {0, 0, 0}}, {17, {0, 0, 1.27}}}, 0, "hydrogen chloride"));
  OrbitalTableOptions options;
  options.frame = OrbitalFrame::Local;
  CHECK_THROWS_WITH_AS(
      static_cast<void>(orbital_table(result, {{0, 0}}, options)),
      "no atom has a local frame: the molecule has neither a central atom nor several metals; use "
      "the standard frame",
      Error);
}

TEST_CASE("JSON and CSV hold every digit, and leave out what is small only when asked") {
  const LevelsResult result = result_of(skew_square());
  const OrbitalTable table = orbital_table(result, every_orbital(result), {});
  const auto document = nlohmann::json::parse(orbital_table_json(result, table, {0.0, "a.xyz"}));
  REQUIRE(document["rows"].size() == 25);
  REQUIRE(document["orbitals"].size() == 25);
  CHECK(document["geometry"] == "a.xyz");
  for (std::size_t i = 0; i < 25; ++i) {
    for (std::size_t j = 0; j < 25; ++j) {
      CHECK(document["rows"][i]["values"][table.orbitals[j].name].get<double>() ==
            table.coefficients(static_cast<Eigen::Index>(i), static_cast<Eigen::Index>(j)) + 0.0);
    }
  }
  const auto large = nlohmann::json::parse(orbital_table_json(result, table, {0.9, "a.xyz"}));
  CHECK(large["rows"].size() < 25);
  for (const auto& row : large["rows"]) {
    for (const auto& value : row["values"]) {
      CHECK((value.is_null() || std::abs(value.get<double>()) >= 0.9));
    }
  }
  CHECK(holds(orbital_table_csv(result, table, {}), "quantity,set,atom,orbital,1a1g,1eu:1,1eu:2"));
}
