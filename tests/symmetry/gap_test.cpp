// Character tables generated here against those of GAP, an outside computer algebra system.
#include <algorithm>
#include <cmath>
#include <complex>
#include <map>
#include <numeric>
#include <string>
#include <utility>
#include <vector>

#include <doctest/doctest.h>

#include "support/gap_tables.hpp"
#include "symmetry/point_group.hpp"

using namespace irrepwise;

namespace {

int element_order(const PointGroup& group, int g) {
  int order = 1;
  for (int power = g; power != 0; power = group.product(g, power)) ++order;
  return order;
}

// Our table in the form of GAP's: a pair of complex conjugates becomes two rows, z = D11 + i D21
// and its conjugate.
GapTable our_table(const PointGroup& group) {
  GapTable table;
  for (const ConjugacyClass& c : group.classes()) {
    table.class_sizes.push_back(static_cast<int>(c.operations.size()));
    table.element_orders.push_back(element_order(group, c.operations.front()));
  }
  const auto n = static_cast<Eigen::Index>(group.classes().size());
  std::vector<Eigen::VectorXcd> rows;
  for (const Irrep& irrep : group.irreps()) {
    Eigen::VectorXcd row(n);
    for (Eigen::Index c = 0; c < n; ++c) {
      const int g = group.classes()[static_cast<std::size_t>(c)].operations.front();
      row[c] = irrep.complex_pair ? std::complex(irrep.matrices[g](0, 0), irrep.matrices[g](1, 0))
                                  : std::complex(irrep.characters[g], 0.0);
    }
    rows.push_back(row);
    if (irrep.complex_pair) rows.push_back(row.conjugate());
  }
  table.characters.resize(static_cast<Eigen::Index>(rows.size()), n);
  for (std::size_t r = 0; r < rows.size(); ++r) {
    table.characters.row(static_cast<Eigen::Index>(r)) = rows[r].transpose();
  }
  return table;
}

// Looks for an order of columns that makes the rows of two tables the same set, column by column;
// a choice stands as long as the beginnings of the rows are the same set.
class Matching {
 public:
  Matching(const GapTable& ours, const GapTable& theirs) : ours_(ours), theirs_(theirs) {}

  [[nodiscard]] bool found() {
    const auto n = static_cast<std::size_t>(ours_.characters.cols());
    if (ours_.characters.rows() != theirs_.characters.rows() ||
        n != static_cast<std::size_t>(theirs_.characters.cols())) {
      return false;
    }
    taken_.assign(n, false);
    const Labels start(static_cast<std::size_t>(ours_.characters.rows()), 0);
    return extend(0, start, start);
  }

 private:
  using Labels = std::vector<int>;  // per row: rows with equal beginnings bear equal labels
  using Entry = std::pair<int, std::pair<long, long>>;

  // Characters agree to 1e-12 where they are the same and differ by 0.01 or more where not (sums
  // of few roots of unity of order up to 24), so rounding to 1e-6 cannot part equal ones unless
  // they lie on the edge of a step; half a step is added, and no character of ours lies there.
  static std::vector<Entry> entries(const Eigen::MatrixXcd& characters, Eigen::Index column,
                                    const Labels& labels) {
    std::vector<Entry> list;
    for (std::size_t r = 0; r < labels.size(); ++r) {
      const std::complex<double> z = characters(static_cast<Eigen::Index>(r), column);
      list.push_back({labels[r], {std::lround(z.real() * 1e6), std::lround(z.imag() * 1e6)}});
    }
    return list;
  }

  static Labels refined(const std::vector<Entry>& list, const std::vector<Entry>& sorted) {
    Labels labels;
    for (const Entry& entry : list) {
      const auto at = std::lower_bound(sorted.begin(), sorted.end(), entry);
      labels.push_back(static_cast<int>(at - sorted.begin()));
    }
    return labels;
  }

  bool extend(std::size_t column, const Labels& ours, const Labels& theirs) {
    if (column == taken_.size()) return true;
    const std::vector<Entry> here =
        entries(ours_.characters, static_cast<Eigen::Index>(column), ours);
    std::vector<Entry> here_sorted = here;
    std::sort(here_sorted.begin(), here_sorted.end());
    for (std::size_t other = 0; other < taken_.size(); ++other) {
      if (taken_[other] || ours_.class_sizes[column] != theirs_.class_sizes[other] ||
          ours_.element_orders[column] != theirs_.element_orders[other]) {
        continue;
      }
      const std::vector<Entry> there =
          entries(theirs_.characters, static_cast<Eigen::Index>(other), theirs);
      std::vector<Entry> there_sorted = there;
      std::sort(there_sorted.begin(), there_sorted.end());
      if (here_sorted != there_sorted) continue;
      taken_[other] = true;
      if (extend(column + 1, refined(here, here_sorted), refined(there, there_sorted))) return true;
      taken_[other] = false;
    }
    return false;
  }

  const GapTable& ours_;
  const GapTable& theirs_;
  std::vector<bool> taken_;  // columns of theirs
};

}  // namespace

TEST_CASE(
    "characters, sizes of classes and orders of operations are GAP's, for every group to n = 12") {
  // Source: tests/reference/gap_character_tables.csv, by GAP and its library of character tables.
  const std::map<std::string, GapTable> tables = read_gap_tables();
  REQUIRE(tables.size() == 87);  // 10 without n, and 7 families for n = 2 to 12
  for (const auto& [symbol, theirs] : tables) {
    CAPTURE(symbol);
    const GapTable ours = our_table(PointGroup(parse_schoenflies(symbol)));
    CHECK(std::accumulate(ours.class_sizes.begin(), ours.class_sizes.end(), 0) ==
          std::accumulate(theirs.class_sizes.begin(), theirs.class_sizes.end(), 0));
    CHECK(Matching(ours, theirs).found());
  }
}

TEST_CASE("the comparison with GAP tells tables apart") {
  // D4 and the quaternion group share all characters but not the orders of elements; of our groups
  // C6v and D3d share the table, C8 and C4h do not though both are abelian of order 8.
  const std::map<std::string, GapTable> tables = read_gap_tables();
  CHECK(Matching(our_table(PointGroup(parse_schoenflies("C6v"))), tables.at("D3d")).found());
  CHECK_FALSE(Matching(our_table(PointGroup(parse_schoenflies("C8"))), tables.at("C4h")).found());
  GapTable spoilt = our_table(PointGroup(parse_schoenflies("Ih")));
  spoilt.characters(3, 2) *= -1.0;
  CHECK_FALSE(Matching(spoilt, tables.at("Ih")).found());
}
