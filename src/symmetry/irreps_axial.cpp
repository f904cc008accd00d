// Irreps of the groups with one principal axis, linear molecules included.

#include <algorithm>
#include <cmath>
#include <functional>
#include <numbers>
#include <optional>

#include <fmt/format.h>
#include <boost/math/special_functions/cos_pi.hpp>
#include <boost/math/special_functions/sin_pi.hpp>

#include "symmetry/irreps.hpp"

namespace irrepwise {
namespace {

// An operation as it acts on the azimuth and on z: φ -> φ + a, or φ -> 2t - φ, and z -> s z.
struct PlaneAction {
  bool flips;    // det M = -1
  double angle;  // a or 2t, in units of π
  int z_sign;
};

PlaneAction plane_action(const Eigen::Matrix3d& g) {
  const double angle = std::atan2(g(1, 0), g(0, 0)) / std::numbers::pi;
  const bool flips = g(0, 0) * g(1, 1) - g(0, 1) * g(1, 0) < 0;
  return {flips, angle, g(2, 2) < 0 ? -1 : 1};
}

// What the pair (cos kφ, sin kφ) becomes: columns are the images of the two functions.
Eigen::Matrix2d pair_matrix(const PlaneAction& action, int k) {
  const double c = boost::math::cos_pi(k * action.angle), s = boost::math::sin_pi(k * action.angle);
  Eigen::Matrix2d matrix;
  if (action.flips) {
    matrix << c, s, s, -c;
  } else {
    matrix << c, -s, s, c;
  }
  return matrix;
}

struct AxialShape {
  int n = 1;                    // order of the cyclic group that numbers the irreps
  bool flips = false;           // vertical mirrors or perpendicular C2 axes
  bool doubled = false;         // times {1, s}: a horizontal mirror or an inversion beside the axis
  bool rotoreflection = false;  // the generator is S_n rather than C_n
  bool linear = false;
};

AxialShape shape_of(const Schoenflies& symbol) {
  const int n = symbol.n;
  const bool odd = n % 2 == 1;
  switch (symbol.family) {
    case Family::C1:
      return {.n = 1};
    case Family::Ci:
    case Family::Cs:
      return {.n = 1, .doubled = true};
    case Family::Cn:
      return {.n = n};
    case Family::Cnv:
      return {.n = n, .flips = true};
    case Family::Cnh:
      return {.n = n, .doubled = true};
    case Family::Dn:
      return {.n = n, .flips = true};
    case Family::Dnh:
      return {.n = n, .flips = true, .doubled = true};
    case Family::Dnd:
      return odd ? AxialShape{.n = n, .flips = true, .doubled = true}
                 : AxialShape{.n = 2 * n, .flips = true, .rotoreflection = true};
    case Family::S2n:
      return odd ? AxialShape{.n = n, .doubled = true}
                 : AxialShape{.n = 2 * n, .rotoreflection = true};
    case Family::Cinfv:
      return {.flips = true, .linear = true};
    case Family::Dinfh:
      return {.flips = true, .doubled = true, .linear = true};
    default:
      return {};
  }
}

// A representation before it has a label.
struct Candidate {
  int k = 0;
  std::function<Eigen::MatrixXd(const PlaneAction&)> matrix;
  bool complex_pair = false;
};

std::vector<Candidate> candidates_of(const AxialShape& shape) {
  std::vector<Candidate> found;
  const auto add = [&](int k, std::function<Eigen::MatrixXd(const PlaneAction&)> matrix,
                       bool complex_pair = false) {
    found.push_back({k, matrix, complex_pair});
    if (shape.doubled) {
      found.push_back(
          {k, [matrix](const PlaneAction& a) -> Eigen::MatrixXd { return a.z_sign * matrix(a); },
           complex_pair});
    }
  };
  const auto number = [](double value) { return Eigen::MatrixXd::Constant(1, 1, value); };

  add(0, [=](const PlaneAction&) { return number(1.0); });
  if (shape.flips) add(0, [=](const PlaneAction& a) { return number(a.flips ? -1.0 : 1.0); });
  const int last_k = shape.linear ? 3 : shape.n / 2;
  for (int k = 1; k <= last_k; ++k) {
    if (!shape.linear && 2 * k == shape.n) {
      add(k, [=](const PlaneAction& a) { return number(std::round(pair_matrix(a, k)(0, 0))); });
      if (shape.flips)
        add(k, [=](const PlaneAction& a) { return number(std::round(pair_matrix(a, k)(1, 1))); });
    } else {
      add(
          k, [k](const PlaneAction& a) { return Eigen::MatrixXd(pair_matrix(a, k)); },
          !shape.flips);
    }
  }
  return found;
}

// Operations that decide the labels.
struct Landmarks {
  std::optional<std::size_t> principal;  // C_n or S_n that generates the cyclic part
  std::optional<std::size_t> flip;       // C2' along x, or the mirror xz where there is no C2'
  std::optional<std::size_t> inversion;
  std::optional<std::size_t> horizontal;  // σh
  std::optional<std::size_t> c2y;         // C2 along y, for D2 and D2h
};

Landmarks find_landmarks(const std::vector<PlaneAction>& actions, const AxialShape& shape) {
  Landmarks marks;
  std::optional<std::size_t> mirror_xz;
  for (std::size_t g = 0; g < actions.size(); ++g) {
    const PlaneAction& a = actions[g];
    const auto angle_is = [&](double value) {  // in units of π, so modulo 2
      return std::abs(std::remainder(a.angle - value, 2.0)) < 1e-9;
    };
    const bool down = a.z_sign < 0;
    if (!a.flips && angle_is(2.0 / shape.n) && down == shape.rotoreflection) marks.principal = g;
    if (!a.flips && angle_is(1.0) && down) marks.inversion = g;
    if (!a.flips && angle_is(0.0) && down) marks.horizontal = g;
    if (a.flips && angle_is(0.0)) (down ? marks.flip : mirror_xz) = g;
    if (a.flips && angle_is(1.0) && down) marks.c2y = g;
  }
  if (!marks.flip) marks.flip = mirror_xz;
  return marks;
}

std::string parity_of(const Irrep& irrep, const Landmarks& marks) {
  if (marks.inversion) return irrep.characters[*marks.inversion] > 0 ? "g" : "u";
  if (marks.horizontal) return irrep.characters[*marks.horizontal] > 0 ? "'" : "\"";
  return "";
}

std::string label_of(const Irrep& irrep, int k, const Schoenflies& symbol, const AxialShape& shape,
                     const Landmarks& marks, bool only_e) {
  const std::string parity = parity_of(irrep, marks);
  if (shape.linear) {
    static constexpr const char* letters[] = {"Sigma", "Pi", "Delta", "Phi"};
    const std::string sign =
        k > 0 ? ""
        : irrep.characters[*marks.flip] *
                    (symbol.family == Family::Dinfh && parity == "u" ? -1 : 1) >
                0
            ? "+"
            : "-";
    return letters[k] + parity + sign;
  }
  if (irrep.dimension == 2) return (only_e ? "E" : fmt::format("E{}", k)) + parity;

  const auto positive = [&](std::optional<std::size_t> g) { return irrep.characters[*g] > 0; };
  const bool d2 = symbol.n == 2 && (symbol.family == Family::Dn || symbol.family == Family::Dnh);
  if (d2) {
    const bool z = positive(marks.principal), y = positive(marks.c2y), x = positive(marks.flip);
    if (x && y && z) return "A" + parity;
    return (z ? "B1" : y ? "B2" : "B3") + parity;
  }
  const bool a = shape.n % 2 == 1 || positive(marks.principal);
  const std::string subscript = !marks.flip ? "" : positive(marks.flip) ? "1" : "2";
  return (a ? "A" : "B") + subscript + parity;
}

}  // namespace

std::vector<Irrep> axial_irreps(const Schoenflies& symbol,
                                const std::vector<Eigen::Matrix3d>& operations) {
  const AxialShape shape = shape_of(symbol);
  std::vector<PlaneAction> actions;
  for (const Eigen::Matrix3d& g : operations) actions.push_back(plane_action(g));
  const Landmarks marks = find_landmarks(actions, shape);
  const bool only_e = (shape.n - 1) / 2 == 1;

  std::vector<Irrep> irreps;
  for (const Candidate& candidate : candidates_of(shape)) {
    Irrep irrep;
    irrep.complex_pair = candidate.complex_pair;
    for (const PlaneAction& action : actions) {
      irrep.matrices.push_back(candidate.matrix(action));
      irrep.characters.push_back(irrep.matrices.back().trace());
    }
    irrep.dimension = static_cast<int>(irrep.matrices.front().rows());
    irrep.label = label_of(irrep, candidate.k, symbol, shape, marks, only_e);
    irreps.push_back(std::move(irrep));
  }

  // Customary order: by parity, then A, B, E (Sigma, Pi ... keep theirs), then by number.
  const auto rank = [&](const Irrep& irrep) {
    const bool odd = irrep.label.find('u') != std::string::npos || irrep.label.back() == '"';
    return odd ? 1 : 0;
  };
  std::stable_sort(irreps.begin(), irreps.end(), [&](const Irrep& a, const Irrep& b) {
    if (rank(a) != rank(b)) return rank(a) < rank(b);
    if (shape.linear) return false;
    return a.label[0] != b.label[0] ? a.label[0] < b.label[0]
           : a.dimension > 1        ? false
                                    : a.label < b.label;
  });
  return irreps;
}

}  // namespace irrepwise
