#include "figure/render.hpp"

#include <algorithm>
#include <cmath>
#include <limits>
#include <vector>

namespace irrepwise {
namespace {

constexpr int samples = 3;  // along each side of a pixel
constexpr float touching_angstrom = 0.05f;

struct Layer {
  std::vector<float> depth;
  std::vector<std::array<std::uint8_t, 3>> colour;
  std::vector<float> opacity;

  explicit Layer(std::size_t n)
      : depth(n, -std::numeric_limits<float>::infinity()), colour(n), opacity(n, 0.0f) {}
};

std::uint8_t channel(double value) {
  return static_cast<std::uint8_t>(std::lround(std::clamp(value, 0.0, 255.0)));
}

// @param n  unit normal in the frame of the camera: right, up, towards
std::array<std::uint8_t, 3> shaded(const Colour& colour, const Eigen::Vector3d& n) {
  static const Eigen::Vector3d light = Eigen::Vector3d(-0.45, 0.65, 0.85).normalized();
  static const Eigen::Vector3d halfway = (light + Eigen::Vector3d(0.0, 0.0, 1.0)).normalized();
  const double diffuse = std::max(0.0, n.dot(light));
  const double from_above = 0.5 + 0.5 * n.y();
  const double shine = 0.24 * std::pow(std::max(0.0, n.dot(halfway)), 40.0);
  const double rim = std::clamp(n.z() / 0.38, 0.0, 1.0);
  const double brightness = (0.56 + 0.12 * from_above + 0.42 * diffuse) * (0.55 + 0.45 * rim);
  const double white = 255.0 * shine;
  return {channel(colour.red * brightness + white), channel(colour.green * brightness + white),
          channel(colour.blue * brightness + white)};
}

struct Seen {
  double x, y, depth;  // samples from the left and from the top; Å towards the eye
  Eigen::Vector3d normal;
};

void draw_triangle(Layer& layer, int width, const Seen& a, const Seen& b, const Seen& c,
                   const SceneBody& body) {
  const double area = (b.x - a.x) * (c.y - a.y) - (c.x - a.x) * (b.y - a.y);
  if (std::abs(area) < 1e-12) return;
  const auto first = [](double v) { return std::max(0, static_cast<int>(std::ceil(v - 0.5))); };
  const auto last = [&](double v) {
    return std::min(width - 1, static_cast<int>(std::floor(v - 0.5)));
  };
  const int x0 = first(std::min({a.x, b.x, c.x}));
  const int x1 = last(std::max({a.x, b.x, c.x}));
  const int y0 = first(std::min({a.y, b.y, c.y}));
  const int y1 = last(std::max({a.y, b.y, c.y}));
  for (int y = y0; y <= y1; ++y) {
    for (int x = x0; x <= x1; ++x) {
      const double px = x + 0.5;
      const double py = y + 0.5;
      const double wa = ((b.x - px) * (c.y - py) - (c.x - px) * (b.y - py)) / area;
      const double wb = ((c.x - px) * (a.y - py) - (a.x - px) * (c.y - py)) / area;
      const double wc = 1.0 - wa - wb;
      if (wa < 0.0 || wb < 0.0 || wc < 0.0) continue;
      const double depth = wa * a.depth + wb * b.depth + wc * c.depth;
      const auto at = static_cast<std::size_t>(y) * static_cast<std::size_t>(width) +
                      static_cast<std::size_t>(x);
      if (static_cast<float>(depth) <= layer.depth[at]) continue;
      Eigen::Vector3d normal = (wa * a.normal + wb * b.normal + wc * c.normal).normalized();
      if (normal.z() < 0.0) normal.z() = 0.0;  // interpolation just beyond the edge
      layer.depth[at] = static_cast<float>(depth);
      layer.colour[at] = shaded(body.colour, normal);
      layer.opacity[at] = static_cast<float>(body.opacity);
    }
  }
}

void draw_body(Layer& layer, int width, const SceneBody& body, const Camera& camera,
               const Frame& frame) {
  const double scale = 0.5 * width / frame.half_width;
  std::vector<Seen> seen;
  seen.reserve(body.mesh.vertices.size());
  for (std::size_t v = 0; v < body.mesh.vertices.size(); ++v) {
    const Eigen::Vector3d r = body.mesh.vertices[v].cast<double>() - frame.centre;
    const Eigen::Vector3d n = body.mesh.normals[v].cast<double>();
    seen.push_back({0.5 * width + scale * camera.right.dot(r),
                    0.5 * width - scale * camera.up.dot(r),
                    camera.towards.dot(r),
                    {camera.right.dot(n), camera.up.dot(n), camera.towards.dot(n)}});
  }
  for (const auto& t : body.mesh.triangles) {
    draw_triangle(layer, width, seen[t[0]], seen[t[1]], seen[t[2]], body);
  }
}

}  // namespace

Frame frame_of(const Scene& scene, const Camera& camera) {
  double low[2] = {1e9, 1e9};
  double high[2] = {-1e9, -1e9};
  for (const SceneBody& body : scene.bodies) {
    for (const Eigen::Vector3f& vertex : body.mesh.vertices) {
      const Eigen::Vector3d r = vertex.cast<double>();
      const double seen[2] = {camera.right.dot(r), camera.up.dot(r)};
      for (int i = 0; i < 2; ++i) {
        low[i] = std::min(low[i], seen[i]);
        high[i] = std::max(high[i], seen[i]);
      }
    }
  }
  Frame frame;
  if (high[0] < low[0]) return frame;
  frame.centre = 0.5 * (low[0] + high[0]) * camera.right + 0.5 * (low[1] + high[1]) * camera.up;
  frame.half_width = 0.5 * std::max(high[0] - low[0], high[1] - low[1]) * 1.05;
  return frame;
}

Raster rendered(const Scene& scene, const Camera& camera, const Frame& frame, int size_px) {
  const int width = size_px * samples;
  const auto n = static_cast<std::size_t>(width) * static_cast<std::size_t>(width);
  Layer solid(n);
  Layer veil(n);
  for (const SceneBody& body : scene.bodies) {
    draw_body(body.opacity < 1.0 ? veil : solid, width, body, camera, frame);
  }
  Raster raster(size_px, size_px, {0, 0, 0, 0});
  for (int y = 0; y < size_px; ++y) {
    for (int x = 0; x < size_px; ++x) {
      double sum[4] = {0.0, 0.0, 0.0, 0.0};  // colour times opacity, opacity
      for (int s = 0; s < samples * samples; ++s) {
        const auto at =
            static_cast<std::size_t>(y * samples + s / samples) * static_cast<std::size_t>(width) +
            static_cast<std::size_t>(x * samples + s % samples);
        const double behind = solid.opacity[at];
        // What all but touches counts as in front, so that surfaces just below do not show in
        // specks.
        const bool veiled = veil.depth[at] + touching_angstrom > solid.depth[at];
        const double front = veiled ? veil.opacity[at] : 0.0;
        for (std::size_t c = 0; c < 3; ++c) {
          sum[c] += front * veil.colour[at][c] + (1.0 - front) * behind * solid.colour[at][c];
        }
        sum[3] += front + (1.0 - front) * behind;
      }
      if (sum[3] <= 0.0) continue;
      std::uint8_t* pixel = raster.pixel(x, y);
      for (int c = 0; c < 3; ++c) pixel[c] = channel(sum[c] / sum[3]);
      pixel[3] = channel(255.0 * sum[3] / (samples * samples));
    }
  }
  return raster;
}

}  // namespace irrepwise
