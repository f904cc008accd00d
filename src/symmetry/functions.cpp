#include "symmetry/functions.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <optional>
#include <string_view>

#include "harmonics/real_harmonics.hpp"
#include "symmetry/operation.hpp"
#include "symmetry/polynomial.hpp"

namespace irrepwise {
namespace {

constexpr double tolerance = 1e-9;  // of coefficients of order 1

struct Candidates {
  FunctionKind kind;
  int degree;
  std::vector<std::vector<std::string>> sets;  // preferred ones first
};

const std::vector<Candidates>& all_candidates() {
  static const std::vector<Candidates> candidates = {
      {FunctionKind::Linear, 1, {{"x"}, {"y"}, {"z"}, {"x", "y"}, {"x", "y", "z"}}},
      {FunctionKind::Rotation, 1, {{"Rx"}, {"Ry"}, {"Rz"}, {"Rx", "Ry"}, {"Rx", "Ry", "Rz"}}},
      {FunctionKind::Quadratic,
       2,
       {{"x2"},
        {"y2"},
        {"x2+y2"},
        {"z2"},
        {"x2+y2+z2"},
        {"x2-y2"},
        {"xy"},
        {"xz"},
        {"yz"},
        {"x2-y2", "xy"},
        {"xz", "yz"},
        {"2z2-x2-y2", "x2-y2"},
        {"xy", "xz", "yz"},
        {"2z2-x2-y2", "x2-y2", "xy", "xz", "yz"}}},
      {FunctionKind::Cubic,
       3,
       {{"x3"},
        {"xy2"},
        {"xz2"},
        {"y3"},
        {"x2y"},
        {"yz2"},
        {"z3"},
        {"x2z"},
        {"y2z"},
        {"z(x2+y2)"},
        {"z(x2-y2)"},
        {"xyz"},
        {"x(x2-3y2)"},
        {"y(3x2-y2)"},
        {"x3", "y3"},
        {"xy2", "x2y"},
        {"xz2", "yz2"},
        {"x(x2+y2)", "y(x2+y2)"},
        {"z(x2-y2)", "xyz"},
        {"x(x2-3y2)", "y(3x2-y2)"},
        {"x3", "y3", "z3"},
        {"x(y2+z2)", "y(x2+z2)", "z(x2+y2)"},
        {"x(z2-y2)", "y(z2-x2)", "z(x2-y2)"},
        {"x(x2+y2+z2)", "y(x2+y2+z2)", "z(x2+y2+z2)"},
        // The icosahedral ones, for a C5 axis along (0, 1, phi).
        {"x(x2-3phi*y2+3z2/phi)", "y(y2-3phi*z2+3x2/phi)", "z(z2-3phi*x2+3y2/phi)"},
        {"xyz", "x(x2-y2/phi2-phi2*z2)", "y(y2-z2/phi2-phi2*x2)", "z(z2-x2/phi2-phi2*y2)"},
        {"z(2z2-3x2-3y2)", "x(4z2-x2-y2)", "y(4z2-x2-y2)", "z(x2-y2)", "xyz", "x(x2-3y2)",
         "y(3x2-y2)"}}}};
  return candidates;
}

// Operations that decide, and the characters of every irrep under them.
struct Witnesses {
  std::vector<Eigen::Matrix3d> operations;
  std::vector<std::vector<double>> characters;  // [irrep][operation]
};

Witnesses witnesses_of(const PointGroup& group) {
  Witnesses witnesses;
  witnesses.characters.resize(group.irreps().size());
  if (group.symbol().family == Family::Kh) {
    // Two turns without a common period generate a set that is dense among all rotations.
    witnesses.operations = {Eigen::Matrix3d::Identity(), -Eigen::Matrix3d::Identity(),
                            rotation_about(Eigen::Vector3d::UnitZ(), 1.0),
                            rotation_about(Eigen::Vector3d(1, 2, 2) / 3.0, 1.0)};
    for (int l = 0; l < static_cast<int>(group.irreps().size()); ++l) {
      for (const Eigen::Matrix3d& g : witnesses.operations) {
        witnesses.characters[l].push_back(harmonic_rotation(l, g).trace());
      }
    }
    return witnesses;
  }
  std::vector<int> chosen;
  if (group.symbol().is_finite()) {
    // No proper subgroup meets every class (Jordan), so what the representatives keep, all keep.
    for (const ConjugacyClass& members : group.classes()) chosen.push_back(members.operations[0]);
  } else {
    for (int g = 0; g < group.order(); ++g) chosen.push_back(g);
  }
  for (int g : chosen) {
    witnesses.operations.push_back(group.operations()[g]);
    for (std::size_t i = 0; i < group.irreps().size(); ++i) {
      witnesses.characters[i].push_back(group.irreps()[i].characters[g]);
    }
  }
  return witnesses;
}

// Orthonormal vectors of the coefficients of what has been taken so far.
class Span {
 public:
  // @returns  whether the vector was independent of those before
  bool add(const Eigen::VectorXd& vector) {
    const Eigen::VectorXd rest = outside(vector);
    if (rest.norm() < tolerance * vector.norm()) return false;
    basis_.push_back(rest.normalized());
    return true;
  }
  [[nodiscard]] Eigen::VectorXd outside(Eigen::VectorXd vector) const {
    for (const Eigen::VectorXd& unit : basis_) vector -= unit.dot(vector) * unit;
    return vector;
  }
  [[nodiscard]] const std::vector<Eigen::VectorXd>& basis() const noexcept { return basis_; }

 private:
  std::vector<Eigen::VectorXd> basis_;
};

Polynomial polynomial_of(const std::string& function, FunctionKind kind) {
  return parse_polynomial(kind == FunctionKind::Rotation ? function.substr(1) : function);
}

Polynomial image_of(const Polynomial& polynomial, FunctionKind kind, const Eigen::Matrix3d& g) {
  const double sign = kind == FunctionKind::Rotation ? determinant_sign(g) : 1;  // axial vector
  return transformed(polynomial, sign * g);
}

// Trace of the operation among the functions, or nothing where it leads out of their span.
std::optional<double> trace_among(const std::vector<Polynomial>& functions, FunctionKind kind,
                                  int degree, const Eigen::Matrix3d& g) {
  Span span;
  Eigen::MatrixXd columns((degree + 1) * (degree + 2) / 2, functions.size());
  Eigen::MatrixXd images(columns.rows(), columns.cols());
  for (std::size_t i = 0; i < functions.size(); ++i) {
    const auto column = static_cast<Eigen::Index>(i);
    columns.col(column) = coefficients(functions[i], degree);
    images.col(column) = coefficients(image_of(functions[i], kind, g), degree);
    span.add(columns.col(column));
  }
  double trace = 0.0;
  for (Eigen::Index i = 0; i < images.cols(); ++i) {
    if (span.outside(images.col(i)).norm() > tolerance * columns.col(i).norm()) return std::nullopt;
  }
  // images = columns D; in the orthonormal basis Q, columns = Q C, so tr D = tr (C^-1 Q^T images).
  // The names of a set are linearly independent, so C, triangular, is solved from below.
  const auto n = images.cols();
  Eigen::MatrixXd c(n, n), rhs(n, n);
  for (Eigen::Index i = 0; i < n; ++i) {
    const Eigen::VectorXd& unit = span.basis()[static_cast<std::size_t>(i)];
    for (Eigen::Index j = 0; j < n; ++j) {
      c(i, j) = unit.dot(columns.col(j));
      rhs(i, j) = unit.dot(images.col(j));
    }
  }
  for (Eigen::Index j = 0; j < n; ++j) {
    for (Eigen::Index i = n - 1; i >= 0; --i) {
      for (Eigen::Index k = i + 1; k < n; ++k) rhs(i, j) -= c(i, k) * rhs(k, j);
      rhs(i, j) /= c(i, i);
    }
    trace += rhs(j, j);
  }
  return trace;
}

// The irrep whose partners the functions are, if any.
std::optional<std::size_t> irrep_of(const std::vector<Polynomial>& functions, FunctionKind kind,
                                    int degree, const PointGroup& group,
                                    const Witnesses& witnesses) {
  std::vector<double> traces;
  for (const Eigen::Matrix3d& g : witnesses.operations) {
    const std::optional<double> trace = trace_among(functions, kind, degree, g);
    if (!trace) return std::nullopt;
    traces.push_back(*trace);
  }
  for (std::size_t i = 0; i < group.irreps().size(); ++i) {
    const bool same = std::equal(traces.begin(), traces.end(), witnesses.characters[i].begin(),
                                 [](double a, double b) { return std::abs(a - b) < 1e-6; });
    if (same) return i;
  }
  return std::nullopt;
}

}  // namespace

std::vector<std::vector<FunctionSet>> assign_functions(const PointGroup& group) {
  const Witnesses witnesses = witnesses_of(group);
  std::vector<std::vector<FunctionSet>> assigned(group.irreps().size());
  for (const Candidates& candidates : all_candidates()) {
    Span taken;
    for (const std::vector<std::string>& names : candidates.sets) {
      std::vector<Polynomial> functions;
      for (const std::string& name : names) {
        functions.push_back(polynomial_of(name, candidates.kind));
      }
      const Eigen::VectorXd first = coefficients(functions.front(), candidates.degree);
      if (taken.outside(first).norm() < tolerance) continue;
      const auto irrep = irrep_of(functions, candidates.kind, candidates.degree, group, witnesses);
      if (!irrep) continue;
      // Partners are independent of what is taken together or not at all.
      for (const Polynomial& function : functions) {
        taken.add(coefficients(function, candidates.degree));
      }
      assigned[*irrep].push_back({candidates.kind, names});
    }
    [[maybe_unused]] const auto all =
        static_cast<std::size_t>((candidates.degree + 1) * (candidates.degree + 2) / 2);
    assert(taken.basis().size() == all || group.symbol().family == Family::Kh);
  }
  return assigned;
}

std::string function_text(const FunctionSet& set) {
  if (set.functions.size() == 1) return set.functions.front();
  std::string text = "(";
  for (const std::string& function : set.functions) {
    if (text.size() > 1) text += ", ";
    text += function;
  }
  return text + ")";
}

}  // namespace irrepwise
