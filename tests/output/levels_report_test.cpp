#include "output/levels_report.hpp"

#include <algorithm>
#include <sstream>
#include <string>

#include <doctest/doctest.h>

#include "analysis/d_block.hpp"
#include "analysis/donors.hpp"
#include "core/error.hpp"
#include "job/job.hpp"
#include "molecule/contacts.hpp"
#include "output/composition.hpp"
#include "output/display_width.hpp"
#include "output/example.hpp"
#include "output/levels_json.hpp"
#include "support/molecules.hpp"
#include "support/paths.hpp"
#include "support/result.hpp"

using namespace irrepwise;

namespace {

int rows_of(const Table& table) {
  int rows = 0;
  for (const auto& line : table.lines) rows += std::holds_alternative<Row>(line) ? 1 : 0;
  return rows;
}

}  // namespace

TEST_CASE("equivalent atoms form sets, named by element where that is enough") {
  const LevelsResult result = result_of(benzene());
  const std::vector<AtomSet> sets = atom_sets(result.symmetry);
  REQUIRE(sets.size() == 2);
  CHECK(sets[0].name == "C");
  CHECK(sets[0].atoms == std::vector<int>{0, 1, 2, 3, 4, 5});
  CHECK(sets[1].name == "H");
  CHECK(set_of_atom(sets, 12)[11] == 1);
}

TEST_CASE("pairs of benzene's carbon atoms fall into ortho, meta and para") {
  const MolecularSymmetry symmetry = result_of(benzene()).symmetry;
  CHECK(first_equivalent_pair(symmetry, 4, 5) == std::pair{0, 1});
  CHECK(first_equivalent_pair(symmetry, 5, 3) == std::pair{0, 2});
  CHECK(first_equivalent_pair(symmetry, 2, 5) == std::pair{0, 3});
}

TEST_CASE("shares of shell groups sum to one in every level") {
  const LevelsResult result = result_of(skew_square());
  const std::vector<ShellGroup> groups = shell_groups(result, atom_sets(result.symmetry));
  REQUIRE(groups.size() == 5);
  CHECK(groups[2].name == "Pt 5d");
  for (int level = 0; level < static_cast<int>(result.levels.levels.size()); ++level) {
    double sum = 0.0;
    for (const ShellGroup& group : groups) sum += group_share(result, group, level);
    CHECK(std::abs(sum - 1.0) < 1e-10);
  }
}

TEST_CASE("a square d8 complex has an empty b1g level of dx2-y2 as its LUMO") {
  // Common practice: ligand-field theory of square planar d8 complexes.
  const LevelsResult result = result_of(skew_square());
  const Report report = levels_report(result);
  const std::vector<AtomSet> sets = atom_sets(result.symmetry);
  const int lumo = result.levels.frontier.lumo.value();
  const std::string words = composition_words(result, sets, shell_groups(result, sets), lumo);
  CHECK(words.find("%\u00A0Pt\u00A05dx2-y2") != std::string::npos);
  CHECK(words.find("%\u00A0Cl\u00A03p") != std::string::npos);
  const std::string text = report_text(report, 80);
  CHECK(text.find("LUMO") != std::string::npos);
  CHECK(text.find("HOMO") > text.find("LUMO"));  // from high to low
  CHECK(text.find("Open shell") == std::string::npos);
}

TEST_CASE("orbitals of equivalent atoms are named where they are the same on all") {
  // A quadruple bond, x towards chlorine: sigma and sigma* are a1g and a2u of dz2, pi and pi* eu
  // and eg of dxz and dyz, delta and delta* b2g and b1u of dxy (Cotton, from memory).
  const LevelsResult result = result_of(test_molecule("octachlorodirhenate(III)").molecule);
  const std::vector<AtomSet> sets = atom_sets(result.symmetry);
  const std::vector<ShellGroup> groups = shell_groups(result, sets);
  int seen = 0;
  for (std::size_t i = 0; i < result.levels.levels.size(); ++i) {
    const std::string words = composition_words(result, sets, groups, static_cast<int>(i));
    const std::string irrep =
        result.symmetry.group.irreps()[static_cast<std::size_t>(result.levels.levels[i].irrep)]
            .label;
    const std::size_t at = words.find("Re\u00A05d");
    if (at == std::string::npos) continue;
    const std::string named = words.substr(at + std::string("Re\u00A05").size());
    CAPTURE(irrep);
    if (irrep == "A1g" || irrep == "A2u") CHECK(named.starts_with("dz2"));
    if (irrep == "Eg" || irrep == "Eu") CHECK(named.starts_with("d(xz,yz)"));
    if (irrep == "B2g" || irrep == "B1u") CHECK(named.starts_with("dxy"));
    ++seen;
  }
  CHECK(seen >= 6);
  // Of the chlorines of a square, some have px and some py: no name is right for all.
  const LevelsResult square = result_of(skew_square());
  const std::vector<AtomSet> square_sets = atom_sets(square.symmetry);
  const int lumo = square.levels.frontier.lumo.value();
  const std::string words =
      composition_words(square, square_sets, shell_groups(square, square_sets), lumo);
  CHECK(words.ends_with("Cl\u00A03p"));
}

TEST_CASE("equivalent charges and bonds stand once, and each by itself with all") {
  const LevelsResult result = result_of(benzene());
  const Report few = levels_report(result);
  REQUIRE(few.tables.size() == 3);
  CHECK(rows_of(few.tables[1]) == 2);  // C, H
  CHECK(rows_of(few.tables[2]) == 2);  // C–C, C–H
  const Report all = levels_report(result, {.all = true});
  CHECK(rows_of(all.tables[1]) == 12);
  CHECK(rows_of(all.tables[2]) == 66);  // 12 * 11 / 2
}

TEST_CASE("a range of energies shows just its levels, and an empty one is refused") {
  const LevelsResult result = result_of(benzene());
  const double homo = result.levels.levels[std::size_t(*result.levels.frontier.homo)].energy_ev;
  const Report report = levels_report(result, {.from_ev = homo - 1e-6, .to_ev = homo + 1e-6});
  CHECK(rows_of(report.tables[0]) == 1);
  CHECK_THROWS_AS(static_cast<void>(levels_report(result, {.from_ev = 1e4})), Error);
}

TEST_CASE("the default window holds the frontier and the whole d block of every metal") {
  int widened = 0;
  for (const TestMolecule& test : test_molecules()) {
    const std::string name = test.name;
    CAPTURE(name);
    const std::vector<int> metals =
        metal_atoms(test.molecule, make_basis(test.molecule, published_parameters()));
    if (metals.empty()) continue;
    const LevelsResult result = result_of(test.molecule);
    const Table table = levels_report(result).tables.front();
    std::vector<std::string> shown;
    for (const auto& line : table.lines) {
      if (const Row* row = std::get_if<Row>(&line)) shown.push_back(cell_exact(row->cells[1]));
    }
    const auto is_shown = [&](int level) {
      const Level& wanted = result.levels.levels[static_cast<std::size_t>(level)];
      return std::count(shown.begin(), shown.end(), level_name(result.symmetry.group, wanted)) == 1;
    };
    if (result.levels.frontier.homo) CHECK(is_shown(*result.levels.frontier.homo));
    if (result.levels.frontier.lumo) CHECK(is_shown(*result.levels.frontier.lumo));
    for (const int metal : metals) {
      const DBlock block =
          find_d_block(result.symmetry, result.basis, result.levels, result.populations, metal);
      for (const DLevel& level : block.levels) {
        CHECK(is_shown(level.level));
        const int above = level.level - result.levels.frontier.homo.value_or(0);
        widened += above > 6 || above < -9 ? 1 : 0;
      }
    }
  }
  CHECK(widened > 5);  // in some the d block reaches beyond ten levels down and six up
}

TEST_CASE("a terminal alone is told which option shows the levels left out") {
  const LevelsResult result = result_of(benzene());
  LevelWindow window{.from_ev = -20.0, .to_ev = 0.0};
  CHECK(levels_report(result, window).tables.front().caption.find("--all") == std::string::npos);
  window.hint = LevelsHint::NameAllOption;
  CHECK(levels_report(result, window).tables.front().caption.ends_with("(--all shows every one)"));
  CHECK(levels_report(result, {.all = true, .hint = LevelsHint::NameAllOption})
            .tables.front()
            .caption == "Levels");
}

TEST_CASE("the whole report keeps to 40 columns and more, but for the narrow tables themselves") {
  const Report report = levels_report(result_of(benzene()));
  for (const int width : {60, 80, 100, 200}) {
    std::istringstream stream(report_text(report, width));
    for (std::string line; std::getline(stream, line);) {
      CAPTURE(line);
      CHECK(display_width(line) <= width);
    }
  }
}

TEST_CASE("CSV has a row for each level and shares that sum to one") {
  std::istringstream stream(levels_csv(result_of(benzene())));
  std::string line;
  std::getline(stream, line);
  CHECK(line == "label,irrep,number,degeneracy,energy_ev,occupation,frontier,C 2s,C 2p,H 1s\r");
  int rows = 0;
  for (; std::getline(stream, line); ++rows) {
    std::istringstream fields(line);
    std::string field;
    double sum = 0.0;
    for (int i = 0; std::getline(fields, field, ','); ++i) {
      if (i >= 7) sum += std::stod(field);
    }
    CHECK(std::abs(sum - 1.0) < 1e-10);
  }
  CHECK(rows == static_cast<int>(result_of(benzene()).levels.levels.size()));
}

TEST_CASE("an open shell is said so") {
  const Molecule oxygen({{8, {0.0, 0.0, 0.0}}, {8, {0.0, 0.0, 1.21}}}, 0, "");
  const std::string text = report_text(levels_report(result_of(oxygen)), 100);
  CHECK(text.find("Open shell: the HOMO holds 2 of 4 electrons") != std::string::npos);
  CHECK(text.starts_with("O₂\n"));  // no title: the formula stands for it
}

TEST_CASE("every level that a multiplicity leaves partly filled is named") {
  HueckelOptions options;
  options.multiplicity = 5;
  const LevelsResult result = result_of(skew_square(), options);
  const std::string text = report_text(levels_report(result), 2000);
  const std::size_t at = text.find("Open shell: ");
  REQUIRE(at != std::string::npos);
  const std::string note = text.substr(at, text.find(". The method", at) - at);
  double unpaired = 0.0;
  int open_levels = 0;
  for (std::size_t i = 0; i < result.levels.levels.size(); ++i) {
    const Level& level = result.levels.levels[i];
    const int room = 2 * level.degeneracy;
    if (level.occupation == 0.0 || level.occupation == room) continue;
    ++open_levels;
    unpaired += std::min(level.occupation, room - level.occupation);
    const bool is_homo = result.levels.frontier.homo == static_cast<int>(i);
    const std::string name =
        is_homo ? "the HOMO" : readable_label(level_name(result.symmetry.group, level));
    CAPTURE(name);
    CHECK(note.find(name + " holds ") != std::string::npos);
  }
  CHECK(open_levels > 1);
  CHECK(unpaired == 4.0);  // a quintet: 2 S, the multiplicity less one
  int named = 0;
  for (std::size_t i = note.find(" holds "); i != std::string::npos;
       i = note.find(" holds ", i + 1)) {
    ++named;
  }
  CHECK(named == open_levels);
}

TEST_CASE("a spin state that partly fills orbitals of the ligands gets a warning") {
  // The sextet of an octahedral d5 complex has its five unpaired electrons in t2g and eg (common
  // practice); six more must go elsewhere.
  Job job = read_job(source_path("inputs/high_spin_octahedron.yaml"));
  CHECK(levels_result(job).warnings.empty());
  const int stated = job.hueckel.multiplicity.value();
  job.hueckel.multiplicity = stated + 6;
  const LevelsResult forced = levels_result(job);
  REQUIRE(forced.warnings.size() == 1);
  const std::string& warning = forced.warnings.front();
  CAPTURE(warning);
  CHECK(warning.starts_with("the multiplicity " + std::to_string(stated + 6) + " leaves "));
  // Every level that it names is partly filled, and has its share beside it.
  int named = 0;
  for (const Level& level : forced.levels.levels) {
    const std::string name = level_name(forced.symmetry.group, level) + " (";
    if (warning.find(" " + name) == std::string::npos) continue;
    ++named;
    CHECK(level.occupation > 0.0);
    CHECK(level.occupation < 2.0 * level.degeneracy);
  }
  CHECK(named > 0);
  CHECK(warning.find("less than half metal d: ") != std::string::npos);
  // Electrons that nobody placed are no reason for a word.
  job.hueckel.multiplicity.reset();
  CHECK(levels_result(job).warnings.empty());
}

TEST_CASE("two metals in a bridged dimer are not listed as a bond, and the criterion is told") {
  const LevelsResult result = input_result("bridged_pd2cl6.yaml");
  const Report report = levels_report(result);
  const Table& bonds = report.tables.back();
  CHECK(bonds.caption == "Overlap populations of bonds");
  for (const auto& line : bonds.lines) {
    const std::string pair = cell_text(std::get<Row>(line).cells.front());
    CHECK(pair.find("Pd1–Pd2") == std::string::npos);
  }
  REQUIRE(bonds.notes.size() == 1);
  CHECK(bonds.notes.front() == bond_criterion(result.molecule));
}
