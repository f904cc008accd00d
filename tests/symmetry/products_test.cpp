#include "symmetry/products.hpp"

#include <string>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/groups.hpp"

using namespace irrepwise;

namespace {

PointGroup group_of(const char* name) { return PointGroup(parse_schoenflies(name)); }

std::string product(const char* group, const char* a, const char* b) {
  return reduction_text(direct_product(group_of(group), a, b));
}
std::string symmetric(const char* group, const char* label, int n = 2) {
  return reduction_text(symmetric_power(group_of(group), label, n));
}
std::string antisymmetric(const char* group, const char* label, int n = 2) {
  return reduction_text(antisymmetric_power(group_of(group), label, n));
}

int dimension_of(const PointGroup& group, const std::string& label) {
  return group.irreps()[group.irrep_index(label)].dimension;
}

}  // namespace

TEST_CASE("icosahedral products are those of the tables") {
  // Altmann and Herzig, Point-Group Theory Tables, group I (from memory).
  CHECK(product("I", "T1", "T1") == "A + T1 + H");
  CHECK(product("I", "T2", "T2") == "A + T2 + H");
  CHECK(product("I", "T1", "T2") == "G + H");
  CHECK(product("I", "T1", "G") == "T2 + G + H");
  CHECK(product("I", "T2", "G") == "T1 + G + H");
  CHECK(product("I", "T1", "H") == "T1 + T2 + G + H");
  CHECK(product("I", "G", "G") == "A + T1 + T2 + G + H");
  CHECK(product("I", "G", "H") == "T1 + T2 + G + 2H");
  CHECK(product("I", "H", "H") == "A + T1 + T2 + 2G + 2H");
  CHECK(product("Ih", "t1u", "hg") == "T1u + T2u + Gu + Hu");
  CHECK(symmetric("I", "H") == "A + G + 2H");
  CHECK(antisymmetric("I", "H") == "T1 + T2 + G");
  CHECK(symmetric("I", "G") == "A + G + H");
  CHECK(antisymmetric("I", "T2") == "T2");
}

TEST_CASE("cubic and axial products are those of the textbooks") {
  // Cotton, Chemical Applications of Group Theory; Wilson, Decius and Cross, appendix X (from
  // memory).
  CHECK(product("Oh", "eg", "eg") == "A1g + A2g + Eg");
  CHECK(product("Oh", "t1g", "t2u") == "A2u + Eu + T1u + T2u");
  CHECK(product("Oh", "t2g", "t2g") == "A1g + Eg + T1g + T2g");
  CHECK(product("Oh", "eg", "t2g") == "T1g + T2g");
  CHECK(symmetric("Oh", "t2g") == "A1g + Eg + T2g");
  CHECK(antisymmetric("Oh", "t2g") == "T1g");
  // The cube's antisymmetric part is the determinant: 1 for turns of (Rx, Ry, Rz), and T2g = T1g
  // A2g.
  CHECK(antisymmetric("Oh", "t1g", 3) == "A1g");
  CHECK(antisymmetric("Oh", "t2g", 3) == "A2g");
  CHECK(product("D4h", "eg", "eu") == "A1u + A2u + B1u + B2u");
  CHECK(symmetric("D4h", "eg") == "A1g + B1g + B2g");
  CHECK(antisymmetric("D4h", "eg") == "A2g");
  CHECK(product("D6h", "e1g", "e2u") == "B1u + B2u + E1u");
  CHECK(product("D6h", "e1g", "e1g") == "A1g + A2g + E2g");
  CHECK(product("D3h", "e'", "e\"") == "A1\" + A2\" + E\"");
  CHECK(product("C2v", "b1", "b2") == "A2");
  CHECK(product("D2", "b1", "b2") == "B3");
  CHECK(product("D4d", "e1", "e3") == "B1 + B2 + E2");
  CHECK(product("C5v", "e1", "e2") == "E1 + E2");
  CHECK(product("C3", "e", "e") == "2A + E");  // both members of the pair
  CHECK(product("C4", "e", "e") == "2A + 2B");
}

TEST_CASE("products of linear molecules and atoms go beyond the irreps listed") {
  // m adds and subtracts; l by the Clebsch-Gordan series.
  CHECK(product("Cinfv", "pi", "pi") == "Sigma+ + Sigma- + Delta");
  CHECK(product("Cinfv", "phi", "phi") == "Sigma+ + Sigma- + Iota");
  CHECK(product("Cinfv", "gamma", "eta") == "Pi + m9");
  CHECK(product("Cinfv", "sigma-", "delta") == "Delta");
  CHECK(product("Dinfh", "piu", "deltag") == "Piu + Phiu");
  CHECK(product("Dinfh", "sigmau-", "sigmag-") == "Sigmau+");
  CHECK(symmetric("Dinfh", "piu") == "Sigmag+ + Deltag");
  CHECK(antisymmetric("Dinfh", "piu") == "Sigmag-");
  CHECK(product("Kh", "p", "d") == "Pu + Du + Fu");
  CHECK(symmetric("Kh", "d") == "Sg + Dg + Gg");
  CHECK(antisymmetric("Kh", "d") == "Pg + Fg");
}

TEST_CASE(
    "in every group products commute, keep dimensions and meet the totally symmetric irrep once") {
  for (const Schoenflies& symbol : all_groups(8)) {
    if (!symbol.is_finite()) continue;
    const PointGroup group(symbol);
    const std::string name = symbol.name(), trivial = group.irreps().front().label;
    CAPTURE(name);
    for (const Irrep& a : group.irreps()) {
      const Reduction square = direct_product(group, a.label, a.label);
      Reduction parts = symmetric_power(group, a.label, 2);
      CHECK(total_dimension(parts) == a.dimension * (a.dimension + 1) / 2);
      CHECK(count_of(parts, trivial) == 1);  // the real irrep has one invariant metric
      const Reduction other = antisymmetric_power(group, a.label, 2);
      for (const IrrepCount& irrep : square) {
        CHECK(irrep.count == count_of(parts, irrep.label) + count_of(other, irrep.label));
      }
      for (const Irrep& b : group.irreps()) {
        const Reduction ab = direct_product(group, a.label, b.label);
        CHECK(total_dimension(ab) == a.dimension * dimension_of(group, b.label));
        CHECK(ab == direct_product(group, b.label, a.label));
        CHECK(count_of(ab, trivial) == (a.label != b.label ? 0 : a.complex_pair ? 2 : 1));
      }
    }
  }
}

TEST_CASE("questions are read as people write them") {
  const PointGroup oh = group_of("Oh"), linear = group_of("Dinfh");
  using Factors = std::vector<Factor>;
  CHECK(parse_factors(oh, "eg x t2u") == Factors{{"Eg", 1}, {"T2u", 1}});
  CHECK(parse_factors(oh, "Eg×t2u") == Factors{{"Eg", 1}, {"T2u", 1}});
  CHECK(parse_factors(oh, "eg,t2u") == Factors{{"Eg", 1}, {"T2u", 1}});
  CHECK(parse_factors(oh, "t2g^2 eg") == Factors{{"T2g", 2}, {"Eg", 1}});
  CHECK(parse_factors(oh, "t₂g² ⊗ eg") == Factors{{"T2g", 2}, {"Eg", 1}});
  CHECK(parse_factors(linear, "πu² * σg+") == Factors{{"Piu", 2}, {"Sigmag+", 1}});
  CHECK(factors_text({{"T2g", 2}, {"Eg", 1}}) == "T2g^2 x Eg");

  const ProductAnswer square = answer_product(oh, "t2g x t2g");
  CHECK(square.has_parts);
  CHECK(reduction_text(square.symmetric) == "A1g + Eg + T2g");
  CHECK(reduction_text(square.antisymmetric) == "T1g");
  CHECK(answer_product(oh, "t2g^2").product == square.product);
  CHECK_FALSE(answer_product(oh, "t2g^2 eg").has_parts);
  CHECK(reduction_text(answer_product(oh, "eg^3").antisymmetric) == "0");
}

TEST_CASE("questions that cannot be answered are refused with the remedy") {
  const PointGroup oh = group_of("Oh");
  CHECK_THROWS_WITH_AS((void)parse_factors(oh, "t2g^0"),
                       "'t2g^0': the exponent must be a whole number from 1 to 20", Error);
  CHECK_THROWS_WITH_AS((void)parse_factors(oh, "t2g^"),
                       "'t2g^': the exponent must be a whole number from 1 to 20", Error);
  CHECK_THROWS_WITH_AS((void)parse_factors(oh, " x "),
                       "' x ' names no irrep; write them like t2u^2", Error);
  CHECK_THROWS_WITH_AS(
      (void)answer_product(oh, "t2g^20"),
      "the product has 3.49e+09 dimensions, at most 1e+06 are reduced; take fewer factors", Error);
  CHECK_THROWS_AS((void)parse_factors(oh, "t2g eh"), Error);
}
