#include "complex/conformation.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numbers>
#include <optional>
#include <utility>

#include <Eigen/Geometry>

#include <fmt/format.h>

#include "complex/clash.hpp"
#include "complex/skeleton.hpp"
#include "core/error.hpp"
#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

constexpr double twist_step = 15.0 * std::numbers::pi / 180.0;
constexpr int n_twists = 24;
constexpr double wide_enough = 1.3;  // contacts beyond this are all as good

// The poses that a ligand may take by itself, those of the request first.
std::vector<Pose> own_poses(const Site& site) {
  if (!site.any_twist) return site.candidates;
  std::vector<Pose> poses;
  for (int step = 0; step < n_twists; ++step) {
    for (const Pose& candidate : site.candidates) {
      poses.push_back({axes_along(site.along, twist_step * step), candidate.mirrored});
    }
  }
  return poses;
}

Pose image_of(const Pose& pose, const Eigen::Matrix3d& matrix) {
  const Eigen::Vector3d x = matrix * pose.axes.col(0);
  const Eigen::Vector3d z = matrix * pose.axes.col(2);
  Eigen::Matrix3d axes;
  axes << x, z.cross(x), z;
  return {axes, pose.mirrored != (determinant_sign(matrix) < 0)};
}

bool looks_the_same(const Site& site, const Pose& a, const Pose& b) {
  const Eigen::Vector3d centre = Eigen::Vector3d::Zero();
  return same_atoms(site.body.atoms, posed(site.body.atoms, a, centre),
                    posed(site.body.atoms, b, centre));
}

bool allowed(const Site& site, const Pose& pose) {
  if (site.any_twist && (site.candidates.size() > 1 || !site.body.has_hand)) return true;
  if (site.any_twist) return pose.mirrored == site.candidates.front().mirrored;
  return std::any_of(site.candidates.begin(), site.candidates.end(),
                     [&](const Pose& own) { return looks_the_same(site, own, pose); });
}

// Poses of all sites of one orbit; the others keep what they have.
using OrbitPoses = std::vector<std::pair<int, Pose>>;

// The images of one pose under a subgroup, or nothing where an operation does not fit the ligand.
std::optional<OrbitPoses> images_of(const Assembly& assembly, const SkeletonGroup& group,
                                    const std::vector<int>& subgroup, int first, const Pose& pose) {
  std::vector<std::optional<Pose>> reached(assembly.sites.size());
  reached[static_cast<std::size_t>(first)] = pose;
  for (const int g : subgroup) {
    const auto target = static_cast<std::size_t>(
        group.images[static_cast<std::size_t>(g)][static_cast<std::size_t>(first)]);
    const Site& site = assembly.sites[target];
    const Pose image = image_of(pose, group.matrices[static_cast<std::size_t>(g)]);
    if (reached[target]) {
      if (!looks_the_same(site, *reached[target], image)) return {};
    } else if (!allowed(site, image)) {
      return {};
    } else {
      reached[target] = image;
    }
  }
  OrbitPoses poses;
  for (std::size_t i = 0; i < reached.size(); ++i) {
    if (reached[i]) poses.emplace_back(static_cast<int>(i), *reached[i]);
  }
  return poses;
}

// For each set of equivalent ligands all ways to stand; nothing where one set has none.
std::optional<std::vector<std::vector<OrbitPoses>>> choices(const Assembly& assembly,
                                                            const SkeletonGroup& group,
                                                            const std::vector<int>& subgroup) {
  std::vector<std::vector<OrbitPoses>> all;
  std::vector<bool> done(assembly.sites.size(), false);
  for (std::size_t i = 0; i < assembly.sites.size(); ++i) {
    if (done[i]) continue;
    std::vector<int> orbit;
    for (const int g : subgroup) {
      const int image = group.images[static_cast<std::size_t>(g)][i];
      if (!done[static_cast<std::size_t>(image)]) orbit.push_back(image);
      done[static_cast<std::size_t>(image)] = true;
    }
    // One whose twist was requested must be the model for the others.
    const auto fixed = std::find_if(orbit.begin(), orbit.end(), [&](int site) {
      return !assembly.sites[static_cast<std::size_t>(site)].any_twist;
    });
    const int model = fixed == orbit.end() ? static_cast<int>(i) : *fixed;
    std::vector<OrbitPoses> ways;
    for (const Pose& pose : own_poses(assembly.sites[static_cast<std::size_t>(model)])) {
      std::optional<OrbitPoses> way = images_of(assembly, group, subgroup, model, pose);
      if (way) ways.push_back(std::move(*way));
    }
    if (ways.empty()) return {};
    all.push_back(std::move(ways));
  }
  return all;
}

void put(const OrbitPoses& way, std::vector<Pose>& poses) {
  for (const auto& [site, pose] : way) poses[static_cast<std::size_t>(site)] = pose;
}

struct Conformation {
  std::vector<Pose> poses;
  Contact contact;
};

double merit(const Contact& contact) { return std::min(contact.relative, wide_enough); }

// One set after the other takes the way with the widest contacts, twice over.
Conformation widest(const Assembly& assembly, const std::vector<int>& metals,
                    const std::vector<std::vector<OrbitPoses>>& sets) {
  Conformation best;
  best.poses.resize(assembly.sites.size());
  for (const std::vector<OrbitPoses>& ways : sets) put(ways.front(), best.poses);
  best.contact = nearest_contact(assembly, metals, best.poses);
  for (int sweep = 0; sweep < 2; ++sweep) {
    for (const std::vector<OrbitPoses>& ways : sets) {
      if (merit(best.contact) >= wide_enough) return best;
      for (const OrbitPoses& way : ways) {
        std::vector<Pose> poses = best.poses;
        put(way, poses);
        const Contact contact = nearest_contact(assembly, metals, poses);
        if (merit(contact) > merit(best.contact) + 1e-6) best = {std::move(poses), contact};
      }
    }
  }
  return best;
}

// Turns two ligands at once, each two of them, as gears that cannot pass one by one. Symmetry is
// lost on the way, so this is for complexes that would not fit otherwise.
void turn_in_pairs(const Assembly& assembly, const std::vector<int>& metals, Conformation& best) {
  constexpr int most_rounds = 4;
  const std::size_t n = assembly.sites.size();
  std::vector<std::vector<Pose>> own;
  for (const Site& site : assembly.sites) own.push_back(own_poses(site));
  for (int round = 0; round < most_rounds && best.contact.relative < 1.0; ++round) {
    const double before = best.contact.crowding;
    for (std::size_t i = 0; i < n * n && best.contact.relative < 1.0; ++i) {
      const std::size_t a = i / n, b = i % n;
      if (a >= b) continue;
      std::vector<Pose> poses = best.poses;
      for (const Pose& one : own[a]) {
        for (const Pose& other : own[b]) {
          poses[a] = one;
          poses[b] = other;
          const Contact contact = nearest_contact(assembly, metals, poses);
          if (contact.crowding < best.contact.crowding - 1e-6) best = {poses, contact};
        }
      }
    }
    if (best.contact.crowding > before - 1e-6) return;
  }
}

// A ring on one vertex of a polyhedron made for small ligands takes the room of several.
std::string covering_words(const Assembly& assembly, const Contact& contact) {
  for (const Site& site : assembly.sites) {
    if (site.words != contact.first && site.words != contact.second) continue;
    if (site.seated.binding->hapticity() < 3 || site.seated.request.vertices.size() > 1) continue;
    const std::string& name = site.seated.ligand->name;
    return fmt::format(", or let {} cover several vertices", name);
  }
  return {};
}

Error clash_error(const Assembly& assembly, const Contact& contact) {
  return Error(fmt::format(
      "{} and {} clash: atoms come as near as {:.2f} Å, expected {:.2f} Å or more, in every "
      "conformation tried; give longer distances, a twist, other vertices or smaller ligands{}",
      contact.first, contact.second, contact.distance_angstrom, contact.limit_angstrom,
      covering_words(assembly, contact)));
}

}  // namespace

std::vector<Pose> most_symmetric_poses(const Assembly& assembly, const std::vector<int>& metals) {
  std::vector<Pose> fixed;
  bool is_free = false;
  for (const Site& site : assembly.sites) {
    fixed.push_back(site.candidates.front());
    is_free = is_free || site.any_twist || site.candidates.size() > 1;
  }
  Conformation best{fixed, nearest_contact(assembly, metals, fixed)};
  if (!is_free) {
    if (best.contact.relative < 1.0) throw clash_error(assembly, best.contact);
    return fixed;
  }
  const SkeletonGroup group = skeleton_group(assembly, metals);
  std::size_t order = 0;  // of the largest subgroup that worked
  for (const std::vector<int>& subgroup : subgroups_largest_first(group)) {
    if (order > subgroup.size()) break;
    const auto sets = choices(assembly, group, subgroup);
    if (!sets) continue;
    Conformation found = widest(assembly, metals, *sets);
    const bool works = found.contact.relative >= 1.0;
    if (works && order == 0) {
      order = subgroup.size();
      best = std::move(found);
    } else if (merit(found.contact) > merit(best.contact) + 1e-6) {
      best = std::move(found);
    }
  }
  if (best.contact.relative < 1.0) turn_in_pairs(assembly, metals, best);
  if (best.contact.relative < 1.0) throw clash_error(assembly, best.contact);
  return best.poses;
}

}  // namespace irrepwise
