#include "figure/isosurface.hpp"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <unordered_map>
#include <utility>
#include <vector>

namespace irrepwise {
namespace {

// The six tetrahedra of a cube share its diagonal 0-7; corner bits are steps along x, y, z. Each is
// listed so that its corners 1, 2, 3 run counter-clockwise seen from beyond them, from corner 0.
constexpr int tetrahedra[6][4] = {{0, 1, 3, 7}, {0, 1, 7, 5}, {0, 2, 7, 3},
                                  {0, 2, 6, 7}, {0, 4, 5, 7}, {0, 4, 7, 6}};

class Surface {
 public:
  Surface(const OrbitalField& field, const OrbitalGrid& grid, int orbital, double isovalue)
      : field_(field),
        shape_(grid.shape),
        values_(grid.values[static_cast<std::size_t>(orbital)]),
        orbital_(orbital),
        isovalue_(isovalue),
        sign_(isovalue < 0.0 ? -1.0 : 1.0) {}

  Mesh built() {
    const std::array<int, 3>& n = shape_.size;
    for (int k = 0; k + 1 < n[2]; ++k) {
      for (int j = 0; j + 1 < n[1]; ++j) {
        for (int i = 0; i + 1 < n[0]; ++i) cube(i, j, k);
      }
    }
    return std::move(mesh_);
  }

 private:
  // Positive inside the surface.
  [[nodiscard]] double inside(std::size_t point) const {
    return sign_ * (values_[point] - isovalue_);
  }

  void cube(int i, int j, int k) {
    std::size_t corner[8];
    int n_inside = 0;
    for (int c = 0; c < 8; ++c) {
      corner[c] = shape_.index(i + (c & 1), j + (c >> 1 & 1), k + (c >> 2));
      n_inside += inside(corner[c]) > 0.0 ? 1 : 0;
    }
    if (n_inside == 0 || n_inside == 8) return;
    for (const auto& t : tetrahedra) {
      tetrahedron({corner[t[0]], corner[t[1]], corner[t[2]], corner[t[3]]});
    }
  }

  // The winding follows from the order of the corners alone, so that neighbours always agree.
  void tetrahedron(const std::array<std::size_t, 4>& corners) {
    std::array<std::size_t, 4> ordered;  // those inside first
    std::size_t n_inside = 0;
    bool odd = false;
    for (std::size_t i = 0; i < 4; ++i) {
      if (!(inside(corners[i]) > 0.0)) continue;
      odd ^= (i - n_inside) % 2 == 1;  // it passes so many corners that lie outside
      ordered[n_inside++] = corners[i];
    }
    if (n_inside == 0 || n_inside == 4) return;
    std::size_t n = n_inside;
    for (const std::size_t c : corners) {
      if (!(inside(c) > 0.0)) ordered[n++] = c;
    }
    if (odd && n_inside < 3) std::swap(ordered[2], ordered[3]);  // both outside
    if (odd && n_inside == 3) std::swap(ordered[0], ordered[1]);
    const auto& [p, q, r, s] = ordered;
    if (n_inside == 1) {
      triangle(vertex(p, q), vertex(p, r), vertex(p, s));
    } else if (n_inside == 2) {
      const std::uint32_t a = vertex(p, r);
      const std::uint32_t b = vertex(p, s);
      const std::uint32_t c = vertex(q, s);
      const std::uint32_t d = vertex(q, r);
      triangle(a, b, c);
      triangle(a, c, d);
    } else {
      triangle(vertex(p, s), vertex(q, s), vertex(r, s));
    }
  }

  void triangle(std::uint32_t a, std::uint32_t b, std::uint32_t c) {
    mesh_.triangles.push_back({a, b, c});
  }

  [[nodiscard]] std::array<int, 3> lattice(std::size_t point) const {
    const auto nx = static_cast<std::size_t>(shape_.size[0]);
    const auto ny = static_cast<std::size_t>(shape_.size[1]);
    return {static_cast<int>(point % nx), static_cast<int>(point / nx % ny),
            static_cast<int>(point / (nx * ny))};
  }

  // Steepest ascent of the value, by central differences on the grid.
  [[nodiscard]] Eigen::Vector3d gradient(std::size_t point) const {
    const std::array<int, 3> at = lattice(point);
    Eigen::Vector3d g;
    for (int axis = 0; axis < 3; ++axis) {
      const auto a = static_cast<std::size_t>(axis);
      std::array<int, 3> low = at;
      std::array<int, 3> high = at;
      if (low[a] > 0) --low[a];
      if (high[a] + 1 < shape_.size[a]) ++high[a];
      g(axis) = (values_[shape_.index(high[0], high[1], high[2])] -
                 values_[shape_.index(low[0], low[1], low[2])]) /
                (high[a] - low[a]);
    }
    return g;
  }

  // The part of the way from p to q at which the orbital has the value: false position with the
  // Illinois change, which keeps the root bracketed.
  [[nodiscard]] double root(const Eigen::Vector3d& p, const Eigen::Vector3d& q, double f_p,
                            double f_q) const {
    double low = 0.0;
    double high = 1.0;
    double t = 0.0;
    int last_side = 0;
    for (int step = 0; step < 30; ++step) {
      t = low + (high - low) * f_p / (f_p - f_q);
      const double f = sign_ * (field_.value(p + t * (q - p), orbital_) - isovalue_);
      if (std::abs(f) < 1e-7 * std::abs(isovalue_)) break;
      if (f > 0.0) {
        low = t;
        f_p = f;
        if (last_side == 1) f_q *= 0.5;
        last_side = 1;
      } else {
        high = t;
        f_q = f;
        if (last_side == -1) f_p *= 0.5;
        last_side = -1;
      }
    }
    return t;
  }

  // The vertex on the edge from a point inside to one outside; each edge has one.
  std::uint32_t vertex(std::size_t in, std::size_t out) {
    const std::uint64_t points = values_.size();
    const std::uint64_t key = in * points + out;
    const auto [place, is_new] =
        known_.try_emplace(key, static_cast<std::uint32_t>(mesh_.vertices.size()));
    if (!is_new) return place->second;
    const std::array<int, 3> a = lattice(in);
    const std::array<int, 3> b = lattice(out);
    const Eigen::Vector3d p = shape_.point(a[0], a[1], a[2]);
    const Eigen::Vector3d q = shape_.point(b[0], b[1], b[2]);
    const double t = root(p, q, inside(in), inside(out));
    Eigen::Vector3d normal = -sign_ * ((1.0 - t) * gradient(in) + t * gradient(out));
    const double length = normal.norm();
    normal =
        length > 0.0 ? Eigen::Vector3d(normal / length) : Eigen::Vector3d((q - p).normalized());
    mesh_.vertices.push_back((p + t * (q - p)).cast<float>());
    mesh_.normals.push_back(normal.cast<float>());
    return place->second;
  }

  const OrbitalField& field_;
  const GridShape& shape_;
  const std::vector<double>& values_;
  int orbital_;
  double isovalue_;
  double sign_;
  Mesh mesh_;
  std::unordered_map<std::uint64_t, std::uint32_t> known_;
};

// A part of a mesh that hangs together.
struct Piece {
  std::vector<std::uint32_t> vertices;  // indices, ascending
  std::size_t triangles = 0;
  Eigen::Vector3f low;
  Eigen::Vector3f high;
};

std::vector<Piece> pieces_of(const Mesh& mesh, std::vector<std::size_t>& piece_of_vertex) {
  std::vector<std::uint32_t> root(mesh.vertices.size());
  std::iota(root.begin(), root.end(), 0u);
  const auto find = [&](std::uint32_t v) {
    while (root[v] != v) v = root[v] = root[root[v]];
    return v;
  };
  for (const auto& t : mesh.triangles) {
    for (const std::uint32_t v : {t[1], t[2]}) {
      const std::uint32_t a = find(t[0]);
      const std::uint32_t b = find(v);
      root[std::max(a, b)] = std::min(a, b);
    }
  }
  std::vector<Piece> pieces;
  piece_of_vertex.assign(mesh.vertices.size(), 0);
  for (std::uint32_t v = 0; v < root.size(); ++v) {
    const std::uint32_t r = find(v);
    if (r == v) {
      piece_of_vertex[v] = pieces.size();
      pieces.push_back({{}, 0, mesh.vertices[v], mesh.vertices[v]});
    }
    piece_of_vertex[v] = piece_of_vertex[r];
    Piece& piece = pieces[piece_of_vertex[v]];
    piece.vertices.push_back(v);
    piece.low = piece.low.cwiseMin(mesh.vertices[v]);
    piece.high = piece.high.cwiseMax(mesh.vertices[v]);
  }
  for (const auto& t : mesh.triangles) ++pieces[piece_of_vertex[t[0]]].triangles;
  return pieces;
}

// Those pieces of a mesh that are wanted, the others left out.
void append_pieces(Mesh& to, const Mesh& from, const std::vector<std::size_t>& piece_of_vertex,
                   const std::vector<bool>& wanted) {
  std::vector<std::uint32_t> moved(from.vertices.size());
  for (std::size_t v = 0; v < from.vertices.size(); ++v) {
    if (!wanted[piece_of_vertex[v]]) continue;
    moved[v] = static_cast<std::uint32_t>(to.vertices.size());
    to.vertices.push_back(from.vertices[v]);
    to.normals.push_back(from.normals[v]);
  }
  for (const auto& t : from.triangles) {
    if (wanted[piece_of_vertex[t[0]]])
      to.triangles.push_back({moved[t[0]], moved[t[1]], moved[t[2]]});
  }
}

std::size_t nearest_vertex(const Mesh& mesh, const Eigen::Vector3f& place) {
  std::size_t nearest = 0;
  for (std::size_t v = 1; v < mesh.vertices.size(); ++v) {
    if ((mesh.vertices[v] - place).squaredNorm() < (mesh.vertices[nearest] - place).squaredNorm()) {
      nearest = v;
    }
  }
  return nearest;
}

// Lobes of the size of a few cells would look like splinters: they are made again on finer points.
class FineLobes {
 public:
  FineLobes(const OrbitalField& field, int orbital, double isovalue, double spacing_angstrom,
            const SmallLobes& lobes)
      : field_(field),
        orbital_(orbital),
        isovalue_(isovalue),
        spacing_(spacing_angstrom / lobes.finer),
        lobes_(lobes) {}

  Mesh applied(const Mesh& coarse) {
    std::vector<std::size_t> piece_of_vertex;
    const std::vector<Piece> pieces = pieces_of(coarse, piece_of_vertex);
    std::vector<bool> kept(pieces.size(), true);
    for (std::size_t i = 0; i < pieces.size(); ++i) {
      if (pieces[i].triangles <= lobes_.few_triangles) kept[i] = !replaced(coarse, pieces[i]);
    }
    Mesh out;
    append_pieces(out, coarse, piece_of_vertex, kept);
    append_pieces(out, fine_, std::vector<std::size_t>(fine_.vertices.size(), 0), {true});
    return out;
  }

 private:
  bool replaced(const Mesh& coarse, const Piece& piece) {
    const Eigen::Vector3f& place = coarse.vertices[piece.vertices.front()];
    // On the finer points two pieces may have become one, which is there already.
    if (!fine_.vertices.empty() &&
        (fine_.vertices[nearest_vertex(fine_, place)] - place).norm() < spacing_) {
      return true;
    }
    GridShape shape;
    shape.spacing_angstrom = spacing_;
    for (int axis = 0; axis < 3; ++axis) {
      const int around = lobes_.finer + 2;
      const int first = static_cast<int>(std::floor(piece.low(axis) / spacing_)) - around;
      const int last = static_cast<int>(std::ceil(piece.high(axis) / spacing_)) + around;
      shape.first[static_cast<std::size_t>(axis)] = first;
      shape.size[static_cast<std::size_t>(axis)] = last - first + 1;
    }
    const OrbitalGrid grid = sample_on(field_, shape);
    const Mesh mesh = Surface(field_, grid, orbital_, isovalue_).built();
    std::vector<std::size_t> piece_of_vertex;
    const std::vector<Piece> found = pieces_of(mesh, piece_of_vertex);
    if (found.empty()) return false;
    const std::size_t same = piece_of_vertex[nearest_vertex(mesh, place)];
    const Eigen::Vector3f low = shape.point(0, 0, 0).cast<float>();
    const Eigen::Vector3f high =
        shape.point(shape.size[0] - 1, shape.size[1] - 1, shape.size[2] - 1).cast<float>();
    const auto margin = static_cast<float>(0.5 * spacing_);
    const bool whole = (found[same].low - low).minCoeff() > margin &&
                       (high - found[same].high).minCoeff() > margin;
    if (!whole) return false;  // it goes on beyond: a part of something larger
    std::vector<bool> wanted(found.size(), false);
    wanted[same] = true;
    append_pieces(fine_, mesh, piece_of_vertex, wanted);
    return true;
  }

  const OrbitalField& field_;
  int orbital_;
  double isovalue_;
  double spacing_;
  SmallLobes lobes_;
  Mesh fine_;
};

}  // namespace

Mesh isosurface(const OrbitalField& field, const OrbitalGrid& grid, int orbital, double isovalue,
                const SmallLobes& lobes) {
  const Mesh coarse = Surface(field, grid, orbital, isovalue).built();
  return FineLobes(field, orbital, isovalue, grid.shape.spacing_angstrom, lobes).applied(coarse);
}

}  // namespace irrepwise
