// The reference tables from outside are read right, and are what they say.
#include <cmath>
#include <complex>
#include <map>
#include <numeric>
#include <string>
#include <vector>

#include <Eigen/Core>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "basis/parameter_set.hpp"
#include "support/g2.hpp"
#include "support/gap_tables.hpp"

TEST_CASE("GAP's tables are there for every family up to n = 12") {
  const std::map<std::string, GapTable> tables = read_gap_tables();
  std::vector<std::string> symbols = {"C1", "Cs", "Ci", "T", "Td", "Th", "O", "Oh", "I", "Ih"};
  for (int n = 2; n <= 12; ++n) {
    for (const char* tail : {"", "v", "h"}) symbols.push_back(fmt::format("C{}{}", n, tail));
    for (const char* tail : {"", "d", "h"}) symbols.push_back(fmt::format("D{}{}", n, tail));
    symbols.push_back(fmt::format("S{}", 2 * n));
  }
  for (const std::string& symbol : symbols) {
    CAPTURE(symbol);
    CHECK(tables.contains(symbol));
  }
  CHECK(tables.size() == symbols.size());
}

TEST_CASE("GAP's tables obey the orthogonality theorem in doubles") {
  const std::map<std::string, GapTable> tables = read_gap_tables();
  for (const auto& [symbol, table] : tables) {
    CAPTURE(symbol);
    const Eigen::Index n = table.characters.rows();
    REQUIRE(table.characters.cols() == n);
    REQUIRE(table.class_sizes.size() == static_cast<std::size_t>(n));
    REQUIRE(table.element_orders.size() == static_cast<std::size_t>(n));
    const int order = std::accumulate(table.class_sizes.begin(), table.class_sizes.end(), 0);
    Eigen::VectorXcd weights(n);
    for (Eigen::Index k = 0; k < n; ++k) {
      weights(k) = static_cast<double>(table.class_sizes[k]) / order;
      CHECK(order % table.class_sizes[k] == 0);
      CHECK(order % table.element_orders[k] == 0);  // Lagrange
    }
    const Eigen::MatrixXcd products =
        table.characters * weights.asDiagonal() * table.characters.adjoint();
    // Worst found 2.2e-16: the characters are correctly rounded.
    CHECK((products - Eigen::MatrixXcd::Identity(n, n)).cwiseAbs().maxCoeff() < 1e-15);
  }
}

TEST_CASE("GAP's tables have the orders and numbers of irreps of the textbook") {
  // Cotton's tables (from memory): h and the number of rows, conjugate pairs counted twice.
  struct Row {
    const char* symbol;
    int order, n_irreps;
  };
  const Row rows[] = {{"C3v", 6, 3}, {"D4h", 16, 10}, {"D5d", 20, 8},  {"D4d", 16, 7},
                      {"S6", 6, 6},  {"C4h", 8, 8},   {"D6h", 24, 12}, {"Td", 24, 5},
                      {"Th", 24, 8}, {"Oh", 48, 10},  {"I", 60, 5},    {"Ih", 120, 10}};
  const std::map<std::string, GapTable> tables = read_gap_tables();
  for (const Row& row : rows) {
    const GapTable& table = tables.at(row.symbol);
    CAPTURE(row.symbol);
    CHECK(std::accumulate(table.class_sizes.begin(), table.class_sizes.end(), 0) == row.order);
    CHECK(table.characters.rows() == row.n_irreps);
  }
}

TEST_CASE("the G2 molecules are read whole, and their spins fit their electrons") {
  const std::vector<G2Molecule> all = read_g2();
  CHECK(all.size() == 162);  // 148 molecules and 14 atoms in ASE's module
  int atoms = 0;
  int corrected = 0;
  for (const G2Molecule& entry : all) {
    CAPTURE(entry.name);
    int electrons = 0;
    for (const irrepwise::Atom& atom : entry.molecule.atoms()) {
      electrons += atom.atomic_number;
      CHECK_NOTHROW((void)irrepwise::published_parameters().at(atom.atomic_number));
    }
    CHECK((electrons - entry.unpaired_electrons) % 2 == 0);
    CHECK((entry.molecule.size() == 1) == (entry.point_group == "Kh"));
    atoms += entry.molecule.size() == 1;
    corrected += !entry.note.empty();
  }
  CHECK(atoms == 14);
  CHECK(corrected == 3);
}
