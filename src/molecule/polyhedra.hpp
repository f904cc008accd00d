// Coordination polyhedra by their IUPAC symbols, with numbered vertices.
//
// The numbers run from the top (+z) to the bottom, within one height anticlockwise as seen from
// above, from +x on where a vertex lies there. Opposite vertices: SP-4 1-3 and 2-4; TBPY-5 1-5;
// OC-6 1-6, 2-4 and 3-5; PBPY-7 1-7; HBPY-8 1-8; CU-8 and the prisms have 5 below 1, or 4 below 1.
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include <Eigen/Core>

namespace irrepwise {

/// What a polyhedral symbol stands for, of IUPAC's Red Book 2005, IR-9.3.2.1.
struct PolyhedronKind {
  std::string_view symbol;      // "OC-6"
  std::string_view name;        // "octahedron"
  std::string_view vertices;    // where they are, in words
  std::string_view group;       // Schoenflies symbol of a complex with equal ligands
  std::string_view free_angle;  // what `angle` sets, in words; empty where the shape is fixed
  double angle_degrees = 0.0;   // default of that angle
};

/// @returns  every kind, by number of vertices
[[nodiscard]] const std::vector<PolyhedronKind>& polyhedron_kinds();

/// Unit vectors from the centre to each vertex, 2 to 9 of them. Always valid: they are apart.
class Polyhedron {
 public:
  /// @param symbol         any case, "oc-6", "OC6"
  /// @param angle_degrees  of a shape with a free angle
  /// @throws Error         unknown symbol, with the nearest one; an angle that the shape does not
  ///                       have or that is out of its range
  explicit Polyhedron(std::string_view symbol, std::optional<double> angle_degrees = {});

  [[nodiscard]] const PolyhedronKind& kind() const noexcept { return *kind_; }
  [[nodiscard]] double angle_degrees() const noexcept { return angle_degrees_; }
  [[nodiscard]] int size() const noexcept { return static_cast<int>(vertices_.size()); }

  /// @param number  from 1 to size()
  [[nodiscard]] const Eigen::Vector3d& vertex(int number) const;

 private:
  const PolyhedronKind* kind_;
  double angle_degrees_;
  std::vector<Eigen::Vector3d> vertices_;
};

}  // namespace irrepwise
