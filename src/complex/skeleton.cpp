#include "complex/skeleton.hpp"

#include <algorithm>
#include <bitset>
#include <cmath>
#include <cstddef>
#include <numeric>
#include <optional>
#include <set>
#include <string>
#include <utility>

#include "symmetry/molecular_symmetry.hpp"
#include "symmetry/product_table.hpp"
#include "symmetry/standard_operations.hpp"

namespace irrepwise {
namespace {

constexpr double same_angstrom = 0.01;
constexpr int largest_order = 240;  // D60h
using Members = std::bitset<largest_order>;

// Points that stand for the ligands, with kinds that tell them apart.
struct Points {
  std::vector<Atom> atoms;
  std::vector<int> kinds;
};

Points skeleton_points(const Assembly& assembly, const std::vector<int>& metals) {
  Points points;
  for (std::size_t m = 0; m < metals.size(); ++m) {
    points.atoms.push_back({metals[m], assembly.metals[m]});
    points.kinds.push_back(assembly.n_kinds + metals[m]);
  }
  // Of a terminal ligand the kind tells it apart, not the element.
  const auto add = [&](const Eigen::Vector3d& position, int kind, int element = 1) {
    points.atoms.push_back({element, position});
    points.kinds.push_back(kind);
  };
  for (const Site& site : assembly.sites) {
    const Eigen::Vector3d& metal = assembly.metals[static_cast<std::size_t>(site.centre)];
    for (const Eigen::Vector3d& tooth : site.body.teeth) {
      add(metal + site.candidates.front().axes * tooth, site.kind);
    }
  }
  for (const PlacedBridge& bridge : assembly.bridges) {
    for (std::size_t i = 0; i < bridge.positions.size(); ++i) {
      add(bridge.positions[i], bridge.kind, bridge.ligand->atoms[i].atomic_number);
    }
  }
  return points;
}

int least_common_order(const Assembly& assembly) {
  constexpr int most = 60;
  int order = 1;
  for (const Site& site : assembly.sites) {
    const int own = std::max(axial_order(site.body), 1);
    const int common = std::lcm(order, own);
    if (2 * common <= most) order = common;
  }
  return order;
}

// Site that the operation takes another to, or nothing where no such ligand is there.
std::optional<int> image_of(const Assembly& assembly, const Site& site,
                            const Eigen::Matrix3d& matrix, const Eigen::Vector3d& origin) {
  const Eigen::Vector3d metal = assembly.metals[static_cast<std::size_t>(site.centre)];
  const Eigen::Vector3d image_metal = matrix * (metal - origin) + origin;
  const Eigen::Vector3d image_along = matrix * site.along;
  for (std::size_t j = 0; j < assembly.sites.size(); ++j) {
    const Site& other = assembly.sites[j];
    if (other.kind != site.kind) continue;
    const Eigen::Vector3d& other_metal = assembly.metals[static_cast<std::size_t>(other.centre)];
    if ((other_metal - image_metal).norm() > same_angstrom) continue;
    if ((other.along - image_along).norm() > same_angstrom) continue;
    // The teeth of a chelate must land on teeth: across is kept up to its sign.
    if (site.seated.binding->denticity() == 2) {
      const Eigen::Vector3d across = matrix * site.candidates.front().axes.col(0);
      if (std::abs(across.dot(other.candidates.front().axes.col(0))) < 0.999) continue;
    }
    return static_cast<int>(j);
  }
  return {};
}

Members generated(const SkeletonGroup& group, const Members& start, int extra) {
  std::vector<int> generators;
  for (int g = 0; g < group.order(); ++g) {
    if (start[static_cast<std::size_t>(g)] || g == extra) generators.push_back(g);
  }
  Members members;
  members.set(0);
  std::vector<int> found = {0};
  for (std::size_t i = 0; i < found.size(); ++i) {
    for (const int g : generators) {
      const int product = group.products[static_cast<std::size_t>(g * group.order() + found[i])];
      if (members[static_cast<std::size_t>(product)]) continue;
      members.set(static_cast<std::size_t>(product));
      found.push_back(product);
    }
  }
  return members;
}

// Keeps the operations that take every ligand to one of its kind; they are a subgroup.
SkeletonGroup restricted(const Assembly& assembly, const std::vector<Eigen::Matrix3d>& matrices,
                         const Eigen::Vector3d& origin) {
  SkeletonGroup group;
  group.origin = origin;
  for (const Eigen::Matrix3d& matrix : matrices) {
    std::vector<int> images;
    for (const Site& site : assembly.sites) {
      const std::optional<int> image = image_of(assembly, site, matrix, origin);
      if (!image) break;
      images.push_back(*image);
    }
    if (images.size() != assembly.sites.size()) continue;
    group.matrices.push_back(matrix);
    group.images.push_back(std::move(images));
  }
  group.products = product_table(group.matrices);
  return group;
}

}  // namespace

SkeletonGroup skeleton_group(const Assembly& assembly, const std::vector<int>& metals) {
  const Points points = skeleton_points(assembly, metals);
  SymmetryOptions options;
  options.kinds = points.kinds;
  const MolecularSymmetry symmetry = find_symmetry(Molecule(points.atoms, 0), options);
  const Schoenflies& symbol = symmetry.group.symbol();
  std::vector<Eigen::Matrix3d> standard = symmetry.group.operations();
  if (symbol.family == Family::Cinfv) {
    standard = standard_operations({Family::Cnv, std::max(2, least_common_order(assembly))});
  } else if (symbol.family == Family::Dinfh) {
    standard = standard_operations({Family::Dnh, 2 * least_common_order(assembly)});
  }
  std::vector<Eigen::Matrix3d> matrices;
  for (const Eigen::Matrix3d& operation : standard) {
    matrices.push_back(symmetry.rotation.transpose() * operation * symmetry.rotation);
  }
  return restricted(assembly, matrices, symmetry.origin);
}

std::vector<std::vector<int>> subgroups_largest_first(const SkeletonGroup& group) {
  // Every subgroup is generated by a smaller one and one more operation.
  const auto less = [](const Members& a, const Members& b) {
    return a.to_string() < b.to_string();
  };
  Members identity;
  identity.set(0);
  std::set<Members, decltype(less)> all({identity}, less);
  std::vector<Members> queue = {identity};
  for (std::size_t i = 0; i < queue.size(); ++i) {
    for (int g = 0; g < group.order(); ++g) {
      if (queue[i][static_cast<std::size_t>(g)]) continue;
      const Members larger = generated(group, queue[i], g);
      if (all.insert(larger).second) queue.push_back(larger);
    }
  }
  std::vector<std::vector<int>> subgroups;
  for (const Members& members : queue) {
    std::vector<int> list;
    for (int g = 0; g < group.order(); ++g) {
      if (members[static_cast<std::size_t>(g)]) list.push_back(g);
    }
    subgroups.push_back(std::move(list));
  }
  std::sort(subgroups.begin(), subgroups.end(), [](const auto& a, const auto& b) {
    return a.size() != b.size() ? a.size() > b.size() : a < b;
  });
  return subgroups;
}

}  // namespace irrepwise
