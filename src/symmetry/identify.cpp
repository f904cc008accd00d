#include "symmetry/identify.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <numbers>

#include <Eigen/Geometry>

#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

int order_of(const PartialTable& table, int g) {
  int order = 1;
  for (int power = g; power != 0; power = table.product(g, power)) ++order;
  return order;
}

struct Element {
  int order = 1;
  bool proper = true;
  Eigen::Vector3d axis;
  double trace = 0.0;

  [[nodiscard]] bool is_mirror() const { return !proper && order == 2 && trace > -1.0; }
  [[nodiscard]] bool is_inversion() const { return !proper && order == 2 && trace <= -1.0; }
};

std::vector<Element> elements_of(const PartialTable& table,
                                 const std::vector<Eigen::Matrix3d>& operations,
                                 const Subset& subset) {
  std::vector<Element> elements;
  for (int g : subset) {
    const Eigen::Matrix3d& matrix = operations[g];
    elements.push_back(
        {order_of(table, g), determinant_sign(matrix) > 0, operation_axis(matrix), matrix.trace()});
  }
  return elements;
}

const Element& highest_rotation(const std::vector<Element>& elements) {
  const Element* best = &elements.front();
  for (const Element& element : elements) {
    if (element.proper && element.order > best->order) best = &element;
  }
  return *best;
}

bool parallel(const Eigen::Vector3d& a, const Eigen::Vector3d& b) {
  return std::abs(a.dot(b)) > std::numbers::sqrt2 / 2.0;  // true angles are 0 or at least 54°
}

// Frame with z along one direction and x along another as nearly as perpendicularity allows.
Eigen::Matrix3d frame_of(const Eigen::Vector3d& z, const Eigen::Vector3d& x_hint) {
  const Eigen::Vector3d x = (x_hint - x_hint.dot(z) * z).normalized();
  Eigen::Matrix3d frame;
  frame.row(0) = x;
  frame.row(1) = z.cross(x);
  frame.row(2) = z;
  return frame;
}

Eigen::Vector3d any_perpendicular(const Eigen::Vector3d& z) {
  Eigen::Index smallest = 0;
  z.cwiseAbs().minCoeff(&smallest);
  return Eigen::Vector3d::Unit(smallest).cross(z).normalized();
}

std::vector<Eigen::Vector3d> distinct_axes(const std::vector<Element>& elements, bool proper,
                                           int order) {
  std::vector<Eigen::Vector3d> axes;
  for (const Element& element : elements) {
    if (element.proper != proper || element.order != order || element.axis.isZero()) continue;
    const bool known = std::any_of(axes.begin(), axes.end(), [&](const Eigen::Vector3d& axis) {
      return std::abs(axis.dot(element.axis)) > 0.95;  // distinct axes are at least 31° apart
    });
    if (!known) axes.push_back(element.axis);
  }
  return axes;
}

// Two perpendicular directions of the list (they exist wherever this is called).
Eigen::Matrix3d perpendicular_frame(const std::vector<Eigen::Vector3d>& axes) {
  for (const Eigen::Vector3d& other : axes) {
    if (std::abs(axes.front().dot(other)) < 0.2) return frame_of(axes.front(), other);
  }
  assert(false && "no two perpendicular axes");
  return Eigen::Matrix3d::Identity();
}

Eigen::Matrix3d icosahedral_frame(const std::vector<Element>& elements) {
  const Eigen::Matrix3d frame = perpendicular_frame(distinct_axes(elements, true, 2));
  // Of the two ways to lay a triple of C2 axes, one has a C5 along (0, 1, φ), the other along
  // (0, φ, 1); a quarter turn about z exchanges them with the other axes following.
  const Eigen::Vector3d five = Eigen::Vector3d(0, 1, std::numbers::phi).normalized();
  for (const Eigen::Vector3d& axis : distinct_axes(elements, true, 5)) {
    if (std::abs((frame * axis).dot(five)) > 0.95) return frame;
  }
  Eigen::Matrix3d quarter;
  quarter << 0, -1, 0, 1, 0, 0, 0, 0, 1;
  return quarter * frame;
}

}  // namespace

Schoenflies identify_group(const PartialTable& table,
                           const std::vector<Eigen::Matrix3d>& operations, const Subset& subset) {
  const std::vector<Element> elements = elements_of(table, operations, subset);
  const auto count = [&](auto&& holds) {
    return static_cast<int>(std::count_if(elements.begin(), elements.end(), holds));
  };
  const int n_proper = count([](const Element& e) { return e.proper; });
  const bool improper = n_proper < static_cast<int>(elements.size());
  const bool inversion = count([](const Element& e) { return e.is_inversion(); }) > 0;

  if (count([](const Element& e) { return e.proper && e.order == 3; }) > 2) {
    if (n_proper == 60) return {improper ? Family::Ih : Family::I, 1};
    if (n_proper == 24) return {improper ? Family::Oh : Family::O, 1};
    return {!improper ? Family::T : inversion ? Family::Th : Family::Td, 1};
  }
  const Element& principal = highest_rotation(elements);
  const int n = principal.order;
  if (n == 1) {
    if (!improper) return {Family::C1, 1};
    return {inversion ? Family::Ci : Family::Cs, 1};
  }
  const bool horizontal = count([&](const Element& e) {
                            return e.is_mirror() && parallel(e.axis, principal.axis);
                          }) > 0;
  const bool mirrors = count([](const Element& e) { return e.is_mirror(); }) > 0;
  if (n_proper == n) {
    if (!improper) return {Family::Cn, n};
    if (horizontal) return {Family::Cnh, n};
    return {mirrors ? Family::Cnv : Family::S2n, n};
  }
  if (!improper) return {Family::Dn, n};
  // Three perpendicular C2 axes: none is principal, and the inversion tells D2h from D2d.
  if (n == 2) return {inversion ? Family::Dnh : Family::Dnd, 2};
  return {horizontal ? Family::Dnh : Family::Dnd, n};
}

Eigen::Matrix3d some_standard_frame(const Schoenflies& symbol, const PartialTable& table,
                                    const std::vector<Eigen::Matrix3d>& operations,
                                    const Subset& subset) {
  const std::vector<Element> elements = elements_of(table, operations, subset);
  switch (symbol.family) {
    case Family::T:
    case Family::Th:
    case Family::Td:
      return perpendicular_frame(distinct_axes(elements, true, 2));
    case Family::O:
    case Family::Oh:
      return perpendicular_frame(distinct_axes(elements, true, 4));
    case Family::I:
    case Family::Ih:
      return icosahedral_frame(elements);
    case Family::Cs: {
      const Eigen::Vector3d z = distinct_axes(elements, false, 2).front();
      return frame_of(z, any_perpendicular(z));
    }
    case Family::Dn:
    case Family::Dnh:
      if (symbol.n == 2) return perpendicular_frame(distinct_axes(elements, true, 2));
      break;
    case Family::Dnd:
      if (symbol.n == 2) {
        const Eigen::Vector3d z = distinct_axes(elements, false, 4).front();
        for (const Eigen::Vector3d& axis : distinct_axes(elements, true, 2)) {
          if (!parallel(axis, z)) return frame_of(z, axis);
        }
      }
      break;
    default:
      break;
  }
  if (symbol.n == 1) return Eigen::Matrix3d::Identity();  // C1, Ci
  const Eigen::Vector3d z = highest_rotation(elements).axis;
  for (const Element& element : elements) {
    const bool across = !element.axis.isZero() && !parallel(element.axis, z);
    if (!across) continue;
    if (symbol.family == Family::Cnv && element.is_mirror()) {
      return frame_of(z, element.axis.cross(z));
    }
    if (symbol.family != Family::Cnv && element.proper && element.order == 2) {
      return frame_of(z, element.axis);
    }
  }
  return frame_of(z, any_perpendicular(z));
}

}  // namespace irrepwise
