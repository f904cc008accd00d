#include "symmetry/functions.hpp"

#include <cmath>
#include <map>
#include <string>

#include <doctest/doctest.h>

#include "harmonics/real_harmonics.hpp"
#include "support/groups.hpp"
#include "symmetry/operation.hpp"
#include "symmetry/polynomial.hpp"

using namespace irrepwise;

namespace {

// Label -> "z; Rz; z2", the cubic ones only where asked for.
std::map<std::string, std::string> functions_of(const char* name, bool cubic = false) {
  const PointGroup group(parse_schoenflies(name));
  const auto assigned = assign_functions(group);
  std::map<std::string, std::string> text;
  for (std::size_t i = 0; i < assigned.size(); ++i) {
    std::string& entry = text[group.irreps()[i].label];
    for (const FunctionSet& set : assigned[i]) {
      if ((set.kind == FunctionKind::Cubic) != cubic) continue;
      entry += (entry.empty() ? "" : "; ") + function_text(set);
    }
  }
  return text;
}

}  // namespace

TEST_CASE("linear, rotational and quadratic functions stand where the handbooks have them") {
  // Cotton, Chemical Applications of Group Theory, appendix IIA (from memory).
  auto f = functions_of("C4v");
  CHECK(f["A1"] == "z; x2+y2; z2");
  CHECK(f["A2"] == "Rz");
  CHECK(f["B1"] == "x2-y2");
  CHECK(f["B2"] == "xy");
  CHECK(f["E"] == "(x, y); (Rx, Ry); (xz, yz)");

  f = functions_of("D3h");
  CHECK(f["A1'"] == "x2+y2; z2");
  CHECK(f["A2'"] == "Rz");
  CHECK(f["E'"] == "(x, y); (x2-y2, xy)");
  CHECK(f["A1\""].empty());
  CHECK(f["A2\""] == "z");
  CHECK(f["E\""] == "(Rx, Ry); (xz, yz)");

  f = functions_of("D4h");
  CHECK(f["A1g"] == "x2+y2; z2");
  CHECK(f["A2g"] == "Rz");
  CHECK(f["B1g"] == "x2-y2");
  CHECK(f["B2g"] == "xy");
  CHECK(f["Eg"] == "(Rx, Ry); (xz, yz)");
  CHECK(f["A2u"] == "z");
  CHECK(f["Eu"] == "(x, y)");
  CHECK(f["A1u"].empty());

  f = functions_of("D6h");
  CHECK(f["E1g"] == "(Rx, Ry); (xz, yz)");
  CHECK(f["E2g"] == "(x2-y2, xy)");
  CHECK(f["A2u"] == "z");
  CHECK(f["E1u"] == "(x, y)");
  CHECK(f["B1g"].empty());

  f = functions_of("Td");
  CHECK(f["A1"] == "x2+y2+z2");
  CHECK(f["A2"].empty());
  CHECK(f["E"] == "(2z2-x2-y2, x2-y2)");
  CHECK(f["T1"] == "(Rx, Ry, Rz)");
  CHECK(f["T2"] == "(x, y, z); (xy, xz, yz)");

  f = functions_of("Oh");
  CHECK(f["A1g"] == "x2+y2+z2");
  CHECK(f["Eg"] == "(2z2-x2-y2, x2-y2)");
  CHECK(f["T1g"] == "(Rx, Ry, Rz)");
  CHECK(f["T2g"] == "(xy, xz, yz)");
  CHECK(f["T1u"] == "(x, y, z)");

  f = functions_of("C2v");
  CHECK(f["A1"] == "z; x2; y2; z2");
  CHECK(f["A2"] == "Rz; xy");
  CHECK(f["B1"] == "x; Ry; xz");
  CHECK(f["B2"] == "y; Rx; yz");
  f = functions_of("D2");
  CHECK(f["B1"] == "z; Rz; xy");
  CHECK(f["B2"] == "y; Ry; xz");
  CHECK(f["B3"] == "x; Rx; yz");
  f = functions_of("C3");
  CHECK(f["E"] == "(x, y); (Rx, Ry); (x2-y2, xy); (xz, yz)");
  f = functions_of("S4");
  CHECK(f["B"] == "z; x2-y2; xy");

  // Altmann and Herzig, group Ih (from memory).
  f = functions_of("Ih");
  CHECK(f["T1g"] == "(Rx, Ry, Rz)");
  CHECK(f["T1u"] == "(x, y, z)");
  CHECK(f["Hg"] == "(2z2-x2-y2, x2-y2, xy, xz, yz)");
  f = functions_of("Dinfh");
  CHECK(f["Sigmag+"] == "x2+y2; z2");
  CHECK(f["Sigmag-"] == "Rz");
  CHECK(f["Pig"] == "(Rx, Ry); (xz, yz)");
  CHECK(f["Deltag"] == "(x2-y2, xy)");
  CHECK(f["Sigmau+"] == "z");
  f = functions_of("Kh");
  CHECK(f["Pu"] == "(x, y, z)");
  CHECK(f["Dg"] == "(2z2-x2-y2, x2-y2, xy, xz, yz)");
}

TEST_CASE("cubic functions stand where the handbooks have them") {
  // Cotton as above; f orbitals in cubic fields: common practice.
  auto f = functions_of("C4v", true);
  CHECK(f["A1"] == "z3; z(x2+y2)");
  CHECK(f["B1"] == "z(x2-y2)");
  CHECK(f["B2"] == "xyz");
  CHECK(f["E"] == "(x3, y3); (xy2, x2y); (xz2, yz2)");
  f = functions_of("D3h", true);
  CHECK(f["A1'"] == "x(x2-3y2)");
  CHECK(f["A2'"] == "y(3x2-y2)");
  CHECK(f["E\""] == "(z(x2-y2), xyz)");
  f = functions_of("D6h", true);
  CHECK(f["B1u"] == "x(x2-3y2)");
  CHECK(f["B2u"] == "y(3x2-y2)");
  CHECK(f["E2u"] == "(z(x2-y2), xyz)");
  f = functions_of("Oh", true);
  CHECK(f["A2u"] == "xyz");
  CHECK(f["T1u"] == "(x3, y3, z3); (x(y2+z2), y(x2+z2), z(x2+y2))");
  CHECK(f["T2u"] == "(x(z2-y2), y(z2-x2), z(x2-y2))");
  f = functions_of("Td", true);
  CHECK(f["A1"] == "xyz");
  CHECK(f["T1"] == "(x(z2-y2), y(z2-x2), z(x2-y2))");
  f = functions_of("Dinfh", true);
  CHECK(f["Phiu"] == "(x(x2-3y2), y(3x2-y2))");
  f = functions_of("Ih", true);  // l = 3 is T2u + Gu
  CHECK(f["T2u"] == "(x(x2-3phi*y2+3z2/phi), y(y2-3phi*z2+3x2/phi), z(z2-3phi*x2+3y2/phi))");
  CHECK(f["Gu"].starts_with("(xyz, "));
}

TEST_CASE("in every group as many functions of each irrep are named as there are") {
  for (const Schoenflies& symbol : all_groups(10)) {
    if (symbol.family == Family::Kh) continue;
    const PointGroup group(symbol);
    const std::string name = symbol.name();
    CAPTURE(name);
    const auto assigned = assign_functions(group);
    // A second way: characters of the harmonics; r2 times a lower one for the rest.
    for (std::size_t i = 0; i < assigned.size(); ++i) {
      const Irrep& irrep = group.irreps()[i];
      std::map<FunctionKind, int> named;
      for (const FunctionSet& set : assigned[i]) {
        CHECK(static_cast<int>(set.functions.size()) == irrep.dimension);
        ++named[set.kind];
      }
      double linear = 0, rotation = 0, quadratic = 0, cubic = 0;
      for (int g = 0; g < group.order(); ++g) {
        const Eigen::Matrix3d& matrix = group.operations()[g];
        const double l1 = matrix.trace(), l2 = harmonic_rotation(2, matrix).trace(),
                     l3 = harmonic_rotation(3, matrix).trace();
        const double share =
            irrep.characters[g] / (group.order() * (irrep.complex_pair ? 2.0 : 1.0));
        linear += share * l1;
        rotation += share * determinant_sign(matrix) * l1;
        quadratic += share * (l2 + 1.0);
        cubic += share * (l3 + l1);
      }
      CHECK(named[FunctionKind::Linear] == std::lround(linear));
      CHECK(named[FunctionKind::Rotation] == std::lround(rotation));
      CHECK(named[FunctionKind::Quadratic] == std::lround(quadratic));
      CHECK(named[FunctionKind::Cubic] == std::lround(cubic));
    }
  }
}

TEST_CASE("names of functions are read as polynomials") {
  const Polynomial difference = parse_polynomial("z(x2-y2)");
  CHECK(difference == Polynomial{{{2, 0, 1}, 1.0}, {{0, 2, 1}, -1.0}});
  CHECK(parse_polynomial("y(3x2-y2)") == Polynomial{{{2, 1, 0}, 3.0}, {{0, 3, 0}, -1.0}});
  const Polynomial golden = parse_polynomial("x(x2-3phi*y2+3z2/phi)");
  CHECK(golden.at({1, 2, 0}) == doctest::Approx(-3 * 1.6180339887498949).epsilon(1e-15).scale(0));
  CHECK(golden.at({1, 0, 2}) == doctest::Approx(3 * 0.6180339887498949).epsilon(1e-15).scale(0));
  // A quarter turn about z takes x to y and y to -x: the image of x2y is -xy2.
  Eigen::Matrix3d quarter;
  quarter << 0, -1, 0, 1, 0, 0, 0, 0, 1;
  CHECK(coefficients(transformed(parse_polynomial("x2y"), quarter), 3) ==
        -coefficients(parse_polynomial("xy2"), 3));
}
