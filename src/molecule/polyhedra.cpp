#include "molecule/polyhedra.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>
#include <cstddef>
#include <numbers>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"

namespace irrepwise {
namespace {

using Vertices = std::vector<Eigen::Vector3d>;

// Shapes that symmetry alone leaves open are fixed as follows.
//   TPR-6, SAPR-8, DD-8, TPRS-9: edges as equal as can be. All nine edges of the prism, all sixteen
//     of the antiprism; all but the four longest of the dodecahedron (angles 36.85° and 69.46° of
//     Hoard and Silverton, Inorg. Chem. 2, 235 (1963)); triangles and edges to the caps in TPRS-9.
//   SPY-5, SPY-4, OCF-7, TPRS-7: least sum of r^-6 between vertices (Kepert, Prog. Inorg. Chem. 25,
//     41 (1979)). The sources are from memory; tests check both conditions.
constexpr double pyramid_angle = 101.32196691;
const double prism_angle = std::atan(2.0 / std::sqrt(3.0)) * 180.0 / std::numbers::pi;
const double antiprism_angle = std::atan(std::pow(2.0, 0.75)) * 180.0 / std::numbers::pi;
const double tricapped_angle = std::asin(2.0 / 3.0) * 180.0 / std::numbers::pi;
const double tetrahedral_angle = std::acos(-1.0 / 3.0) * 180.0 / std::numbers::pi;

const std::vector<PolyhedronKind>& kinds() {
  static const std::vector<PolyhedronKind> all = {
      {"L-2", "linear", "1 up, 2 down", "Dinfh", "", 0.0},
      {"A-2", "angular", "1 and 2 in the xz plane, z between them", "C2v", "angle 1-M-2", 120.0},
      {"TP-3", "trigonal plane", "1 on x, on anticlockwise in the xy plane", "D3h", "", 0.0},
      {"TPY-3", "trigonal pyramid", "1 to 3 below, the metal on top", "C3v", "angle 1-M-2",
       tetrahedral_angle},
      {"TS-3", "T-shape", "1 up, 2 on y and 3 opposite to 2", "C2v", "", 0.0},
      {"T-4", "tetrahedron", "1 at (1,1,1), 2 at (-1,-1,1), 3 at (-1,1,-1), 4 at (1,-1,-1)", "Td",
       "angle 1-M-2", tetrahedral_angle},
      {"SP-4", "square plane", "1 on x, on anticlockwise; 3 opposite to 1", "D4h", "", 0.0},
      {"SPY-4", "square pyramid, metal on top", "1 to 4 below, 3 across from 1", "C4v",
       "angle between z and M-1", pyramid_angle},
      {"SS-4", "see-saw", "1 up, 4 down, 2 and 3 equatorial", "C2v", "equatorial angle 2-M-3",
       120.0},
      {"TBPY-5", "trigonal bipyramid", "1 up, 5 down, 2 to 4 equatorial", "D3h", "", 0.0},
      {"SPY-5", "square pyramid", "1 up, 2 to 5 the base, 4 across from 2", "C4v", "angle 1-M-2",
       pyramid_angle},
      {"OC-6", "octahedron", "1 up, 6 down, 2 to 5 equatorial from x; 4 opposite to 2", "Oh", "",
       0.0},
      {"TPR-6", "trigonal prism", "1 to 3 above, 4 to 6 below them", "D3h",
       "angle between z and M-1", prism_angle},
      {"PBPY-7", "pentagonal bipyramid", "1 up, 7 down, 2 to 6 equatorial", "D5h", "", 0.0},
      {"OCF-7", "octahedron, face monocapped", "1 the cap, 2 to 4 the capped face, 5 to 7 below",
       "C3v", "", 0.0},
      {"TPRS-7", "trigonal prism, square face monocapped",
       "1 the cap, 2 to 5 the capped face, 6 and 7 the edge below along x", "C2v", "", 0.0},
      {"CU-8", "cube", "1 to 4 above, 5 to 8 below them; 7 opposite to 1", "Oh", "", 0.0},
      {"SAPR-8", "square antiprism", "1 to 4 above, 5 to 8 below, turned by 45°", "D4d",
       "angle between z and M-1", antiprism_angle},
      {"DD-8", "dodecahedron",
       "1 and 2 the upper edge along x, 3 and 4 below it along y; 5 and 6 below along x, 7 and 8 "
       "the lower edge along y",
       "D2d", "", 0.0},
      {"HBPY-8", "hexagonal bipyramid", "1 up, 8 down, 2 to 7 equatorial", "D6h", "", 0.0},
      {"TPRS-9", "trigonal prism, square faces tricapped",
       "1 to 3 above, 4 to 6 the caps, 7 to 9 below 1 to 3", "D3h", "angle between z and M-1",
       tricapped_angle}};
  return all;
}

// The cosines and sines of multiples of 30° and 45° are exact, so that axes lie on axes.
double cosine(double degrees) {
  const double turn = std::fmod(std::abs(degrees), 360.0);
  if (turn == 90.0 || turn == 270.0) return 0.0;
  if (turn == 180.0) return -1.0;
  return std::cos(turn * std::numbers::pi / 180.0);
}

Eigen::Vector3d at(double polar, double azimuth) {
  const double sine = cosine(polar - 90.0);
  return {sine * cosine(azimuth), sine * cosine(azimuth - 90.0), cosine(polar)};
}

// Adds n vertices at one height, equally spaced from the azimuth on.
void add_ring(Vertices& vertices, int n, double polar, double azimuth = 0.0) {
  for (int k = 0; k < n; ++k) vertices.push_back(at(polar, azimuth + 360.0 * k / n));
}

Vertices dodecahedron() {
  constexpr double a = 36.846725741;  // polar angles, both from the condition above
  constexpr double b = 69.459822794;
  return {at(a, 0),       at(a, 180),       at(b, 90),       at(b, 270),
          at(180 - b, 0), at(180 - b, 180), at(180 - a, 90), at(180 - a, 270)};
}

Vertices monocapped_prism() {
  constexpr double face = 79.382586825;
  constexpr double half_width = 48.726768368;  // azimuth of the face's corners
  constexpr double edge = 143.299570023;
  return {at(0, 0),
          at(face, half_width),
          at(face, 180 - half_width),
          at(face, 180 + half_width),
          at(face, 360 - half_width),
          at(edge, 0),
          at(edge, 180)};
}

Vertices octahedron_face_capped() {
  Vertices vertices = {at(0, 0)};
  add_ring(vertices, 3, 74.625640583);
  add_ring(vertices, 3, 130.254311248, 60);
  return vertices;
}

// As vertices 1 and 2 open, 3 and 4 close in the way of hybrids: cos = -s / (1 - s) for two of
// equal s character, which add up to 1 (Coulson, Valence, 1952; from memory). Bent metallocenes
// follow this: 131° between the rings of a titanocene dichloride go with 97° between the chlorides.
Vertices tetrahedron(double angle) {
  if (angle == tetrahedral_angle) {
    const double c = 1.0 / std::sqrt(3.0);
    return {{c, c, c}, {-c, -c, c}, {-c, c, -c}, {c, -c, -c}};
  }
  const double upper_s = cosine(angle) / (cosine(angle) - 1.0);
  const double lower_s = 0.5 - upper_s;
  const double lower = std::acos(-lower_s / (1.0 - lower_s)) * 180.0 / std::numbers::pi;
  return {at(angle / 2, 45), at(angle / 2, 225), at(180.0 - lower / 2, 135),
          at(180.0 - lower / 2, 315)};
}

Vertices bipyramid(int n) {
  Vertices vertices = {at(0, 0)};
  add_ring(vertices, n, 90);
  vertices.push_back(at(180, 0));
  return vertices;
}

Vertices rings(int n, double upper, double lower_azimuth, int n_between = 0) {
  Vertices vertices;
  add_ring(vertices, n, upper);
  add_ring(vertices, n_between, 90, 180.0 / n);
  add_ring(vertices, n, 180 - upper, lower_azimuth);
  return vertices;
}

Vertices make_vertices(std::string_view symbol, double angle) {
  Vertices v;
  if (symbol == "L-2") return {at(0, 0), at(180, 0)};
  if (symbol == "A-2") return {at(angle / 2, 0), at(angle / 2, 180)};
  if (symbol == "TP-3") add_ring(v, 3, 90);
  if (symbol == "TPY-3") {
    // Three vertices at a common polar angle are 2 asin(√3/2 sin θ) apart.
    const double sine = std::sin(angle * std::numbers::pi / 360.0) * 2.0 / std::sqrt(3.0);
    add_ring(v, 3, 180.0 - std::asin(std::min(sine, 1.0)) * 180.0 / std::numbers::pi);
  }
  if (symbol == "TS-3") return {at(0, 0), at(90, 90), at(90, 270)};
  if (symbol == "T-4") return tetrahedron(angle);
  if (symbol == "SP-4") add_ring(v, 4, 90);
  if (symbol == "SPY-4") add_ring(v, 4, angle);
  if (symbol == "SS-4") return {at(0, 0), at(90, -angle / 2), at(90, angle / 2), at(180, 0)};
  if (symbol == "TBPY-5") return bipyramid(3);
  if (symbol == "SPY-5") {
    v = {at(0, 0)};
    add_ring(v, 4, angle);
  }
  if (symbol == "OC-6") return bipyramid(4);
  if (symbol == "TPR-6") return rings(3, angle, 0);
  if (symbol == "PBPY-7") return bipyramid(5);
  if (symbol == "OCF-7") return octahedron_face_capped();
  if (symbol == "TPRS-7") return monocapped_prism();
  if (symbol == "CU-8")
    return rings(4, std::acos(1.0 / std::sqrt(3.0)) * 180.0 / std::numbers::pi, 0);
  if (symbol == "SAPR-8") return rings(4, angle, 45);
  if (symbol == "DD-8") return dodecahedron();
  if (symbol == "HBPY-8") return bipyramid(6);
  if (symbol == "TPRS-9") return rings(3, angle, 0, 3);
  assert(!v.empty());
  return v;
}

// Upper case without the hyphen, so that oc-6 and OC6 are OC-6.
std::string plain(std::string_view text) {
  std::string out;
  for (const char c : text) {
    if (c == '-' || c == ' ' || c == '_') continue;
    out += c >= 'a' && c <= 'z' ? static_cast<char>(c - 'a' + 'A') : c;
  }
  return out;
}

const PolyhedronKind& find_kind(std::string_view symbol) {
  std::vector<std::string> known;
  for (const PolyhedronKind& kind : kinds()) {
    if (plain(kind.symbol) == plain(symbol)) return kind;
    known.emplace_back(kind.symbol);
  }
  const std::string nearest = nearest_word(symbol, known);
  throw Error(fmt::format("{} is no polyhedral symbol; {}the known ones are {}", quoted(symbol),
                          nearest.empty() ? "" : "did you mean " + nearest + "? Otherwise ",
                          joined(known)));
}

struct Range {
  double least;
  double most;
};

// Within it no two vertices come nearer than about 40°.
Range angle_range(std::string_view symbol) {
  if (symbol == "TPY-3") return {40.0, 119.9};
  if (symbol == "SPY-4" || symbol == "SPY-5") return {60.0, 140.0};
  if (symbol == "T-4") return {90.0, 180.0};
  if (symbol == "TPR-6") return {30.0, 70.0};
  if (symbol == "SAPR-8") return {35.0, 75.0};
  if (symbol == "TPRS-9") return {30.0, 60.0};
  return {40.0, 180.0};
}

double checked_angle(const PolyhedronKind& kind, std::optional<double> angle) {
  if (!angle) return kind.angle_degrees;
  if (kind.free_angle.empty()) {
    throw Error(fmt::format("{} has no angle that could be set; leave it out", kind.symbol));
  }
  const Range range = angle_range(kind.symbol);
  if (!(*angle >= range.least && *angle <= range.most)) {
    throw Error(fmt::format("found {}° for the {} of {}, expected {} to {}°", *angle,
                            kind.free_angle, kind.symbol, range.least, range.most));
  }
  return *angle;
}

}  // namespace

const std::vector<PolyhedronKind>& polyhedron_kinds() { return kinds(); }

Polyhedron::Polyhedron(std::string_view symbol, std::optional<double> angle_degrees)
    : kind_(&find_kind(symbol)),
      angle_degrees_(checked_angle(*kind_, angle_degrees)),
      vertices_(make_vertices(kind_->symbol, angle_degrees_)) {}

const Eigen::Vector3d& Polyhedron::vertex(int number) const {
  assert(number >= 1 && number <= size());
  return vertices_[static_cast<std::size_t>(number - 1)];
}

}  // namespace irrepwise
