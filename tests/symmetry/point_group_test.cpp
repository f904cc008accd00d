#include "symmetry/point_group.hpp"

#include <cmath>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"
#include "support/groups.hpp"
#include "symmetry/operation.hpp"

using namespace irrepwise;

TEST_CASE(
    "every group is closed and its irreps are homomorphisms that obey the orthogonality theorem") {
  for (const Schoenflies& symbol : all_groups(12)) {
    if (!symbol.is_finite()) continue;
    const PointGroup group(symbol);
    const std::string name = symbol.name();
    CAPTURE(name);
    int sum_of_squares = 0;
    double worst_product = 0.0, worst_orthogonality = 0.0;
    for (const Irrep& irrep : group.irreps()) {
      sum_of_squares += irrep.complex_pair ? 2 : irrep.dimension * irrep.dimension;
      for (int g = 0; g < group.order(); ++g) {
        for (int h = 0; h < group.order(); ++h) {
          const Eigen::MatrixXd error =
              irrep.matrices[g] * irrep.matrices[h] - irrep.matrices[group.product(g, h)];
          worst_product = std::max(worst_product, error.cwiseAbs().maxCoeff());
        }
      }
    }
    // Great orthogonality theorem over the real numbers; a pair of complex conjugates has, besides
    // D_rs, the commuting turn, and its elements are normalised to order / 2 with partners
    // D_11 = D_22 and D_12 = -D_21.
    for (std::size_t a = 0; a < group.irreps().size(); ++a) {
      for (std::size_t b = a; b < group.irreps().size(); ++b) {
        const Irrep &ia = group.irreps()[a], &ib = group.irreps()[b];
        const int da = ia.complex_pair ? 1 : ia.dimension, db = ib.complex_pair ? 1 : ib.dimension;
        for (int r = 0; r < ia.dimension; ++r) {
          for (int s = 0; s < da; ++s) {
            for (int t = 0; t < ib.dimension; ++t) {
              for (int u = 0; u < db; ++u) {
                double sum = 0.0;
                for (int g = 0; g < group.order(); ++g) {
                  sum += ia.matrices[g](r, s) * ib.matrices[g](t, u);
                }
                const bool same = a == b && r == t && s == u;
                const double expected =
                    !same ? 0.0 : static_cast<double>(group.order()) / ia.dimension;
                worst_orthogonality = std::max(worst_orthogonality, std::abs(sum - expected));
              }
            }
          }
        }
      }
    }
    CHECK(sum_of_squares == group.order());
    CHECK(worst_product < 1e-13);
    CHECK(worst_orthogonality < 1e-11);
    int members = 0;
    for (const ConjugacyClass& c : group.classes())
      members += static_cast<int>(c.operations.size());
    CHECK(members == group.order());
    std::size_t complex_irreps = 0;
    for (const Irrep& irrep : group.irreps()) complex_irreps += irrep.complex_pair ? 2 : 1;
    CHECK(group.classes().size() == complex_irreps);
  }
}

TEST_CASE("labels of the irreps and classes are those of the character tables") {
  // Common practice; Cotton, Chemical Applications of Group Theory, appendix (from memory).
  const auto labels = [](const char* name) {
    const PointGroup group(parse_schoenflies(name));
    std::string text;
    for (const Irrep& irrep : group.irreps()) {
      text += (text.empty() ? "" : " ") + irrep.label;
    }
    return text;
  };
  const auto classes = [](const char* name) {
    const PointGroup group(parse_schoenflies(name));
    std::string text;
    for (const ConjugacyClass& c : group.classes()) {
      text += (text.empty() ? "" : " ") + c.symbol;
    }
    return text;
  };
  CHECK(labels("C1") == "A");
  CHECK(labels("Cs") == "A' A\"");
  CHECK(labels("Ci") == "Ag Au");
  CHECK(labels("C3") == "A E");
  CHECK(labels("C4") == "A B E");
  CHECK(labels("C5") == "A E1 E2");
  CHECK(labels("C2v") == "A1 A2 B1 B2");
  CHECK(labels("C3v") == "A1 A2 E");
  CHECK(labels("C4v") == "A1 A2 B1 B2 E");
  CHECK(labels("C3h") == "A' E' A\" E\"");
  CHECK(labels("C2h") == "Ag Bg Au Bu");
  CHECK(labels("D2") == "A B1 B2 B3");
  CHECK(labels("D2h") == "Ag B1g B2g B3g Au B1u B2u B3u");
  CHECK(labels("D3h") == "A1' A2' E' A1\" A2\" E\"");
  CHECK(labels("D4h") == "A1g A2g B1g B2g Eg A1u A2u B1u B2u Eu");
  CHECK(labels("D5h") == "A1' A2' E1' E2' A1\" A2\" E1\" E2\"");
  CHECK(labels("D6h") == "A1g A2g B1g B2g E1g E2g A1u A2u B1u B2u E1u E2u");
  CHECK(labels("D2d") == "A1 A2 B1 B2 E");
  CHECK(labels("D3d") == "A1g A2g Eg A1u A2u Eu");
  CHECK(labels("D4d") == "A1 A2 B1 B2 E1 E2 E3");
  CHECK(labels("D5d") == "A1g A2g E1g E2g A1u A2u E1u E2u");
  CHECK(labels("S4") == "A B E");
  CHECK(labels("S6") == "Ag Eg Au Eu");
  CHECK(labels("S8") == "A B E1 E2 E3");
  CHECK(labels("T") == "A E T");
  CHECK(labels("Td") == "A1 A2 E T1 T2");
  CHECK(labels("Oh") == "A1g A2g Eg T1g T2g A1u A2u Eu T1u T2u");
  CHECK(labels("Ih") == "Ag T1g T2g Gg Hg Au T1u T2u Gu Hu");
  CHECK(labels("Cinfv") == "Sigma+ Sigma- Pi Delta Phi");
  CHECK(labels("Kh") == "Sg Pu Dg Fu");
  CHECK(classes("C4v") == "E 2C4 C2 2sigmav 2sigmad");
  CHECK(classes("D3h") == "E 2C3 3C2' 2S3 sigmah 3sigmav");
  CHECK(classes("D4h") == "E 2C4 C2 2C2' 2C2'' i 2S4 sigmah 2sigmav 2sigmad");
  CHECK(classes("Td") == "E 8C3 3C2 6S4 6sigmad");
  CHECK(classes("Oh") == "E 6C4 8C3 3C2 6C2' i 8S6 6S4 3sigmah 6sigmad");
  CHECK(classes("Ih") == "E 12C5 12C5^2 20C3 15C2 i 12S10 12S10^3 20S6 15sigma");
  CHECK(classes("C3h") == "E C3 C3^2 S3 S3^5 sigmah");
  CHECK(classes("D4d") == "E 2C4 C2 4C2' 2S8 2S8^3 4sigmad");
}
