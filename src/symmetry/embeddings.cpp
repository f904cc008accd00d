// The ways in which a subgroup lies in a group.

#include <algorithm>
#include <cmath>
#include <optional>
#include <set>
#include <utility>

#include <fmt/format.h>

#include "symmetry/descent.hpp"
#include "symmetry/embedding_names.hpp"
#include "symmetry/frames.hpp"
#include "symmetry/identify.hpp"
#include "symmetry/operation.hpp"
#include "symmetry/product_table.hpp"

namespace irrepwise {
namespace {

PartialTable table_of(const PointGroup& group) {
  PartialTable table{group.order(), {}};
  for (int g = 0; g < group.order(); ++g) {
    for (int h = 0; h < group.order(); ++h) table.products.push_back(group.product(g, h));
  }
  return table;
}

// Few operations that generate the group, the first one of highest order.
Subset generators_of(const PointGroup& group) {
  const PartialTable table = table_of(group);
  Subset generators, reached = {0};
  while (static_cast<int>(reached.size()) < group.order()) {
    int best = -1;
    Subset best_reached = reached;
    for (int g = 1; g < group.order() && static_cast<int>(best_reached.size()) < group.order();
         ++g) {
      if (std::binary_search(reached.begin(), reached.end(), g)) continue;
      Subset tried = generators;
      tried.push_back(g);
      Subset grown = *generated_by(table, tried);
      if (grown.size() > best_reached.size()) {
        best = g;
        best_reached = std::move(grown);
      }
    }
    generators.push_back(best);
    reached = std::move(best_reached);
  }
  return generators;
}

Subset conjugate(const PointGroup& group, const Subset& subset, int by) {
  Subset image;
  for (int h : subset) image.push_back(group.product(group.product(by, h), group.inverse(by)));
  std::sort(image.begin(), image.end());
  return image;
}

// Searches for images of the subgroup's generators that multiply alike. Traces and determinants of
// the generators and their products are kept by every embedding; that the images generate the right
// group is checked at the end.
class Search {
 public:
  Search(const PointGroup& group, const PointGroup& subgroup)
      : group_(group),
        subgroup_(subgroup),
        table_(table_of(group)),
        generators_(generators_of(subgroup)) {
    for (const Eigen::Matrix3d& g : group.operations()) kinds_.push_back(kind_of(g));
  }

  // One set of conjugate subgroups for each way.
  std::vector<std::set<Subset>> run() {
    std::vector<int> images;
    extend(images);
    return std::move(found_);
  }

 private:
  struct Kind {
    double trace;
    int sign;
  };
  static Kind kind_of(const Eigen::Matrix3d& g) { return {g.trace(), determinant_sign(g)}; }

  [[nodiscard]] bool alike(int g, int h) const {  // g of the group, h of the subgroup
    const Kind kind = kind_of(subgroup_.operations()[h]);
    return kinds_[g].sign == kind.sign && std::abs(kinds_[g].trace - kind.trace) < 1e-6;
  }

  [[nodiscard]] bool fits(const std::vector<int>& images, int g) const {
    const int h = generators_[images.size()];
    if (!alike(g, h)) return false;
    int all_g = 0, all_h = 0;
    for (std::size_t i = 0; i < images.size(); ++i) {
      if (!alike(group_.product(images[i], g), subgroup_.product(generators_[i], h))) return false;
      all_g = group_.product(all_g, images[i]);
      all_h = subgroup_.product(all_h, generators_[i]);
    }
    return alike(group_.product(all_g, g), subgroup_.product(all_h, h));
  }

  void extend(std::vector<int>& images) {
    if (images.size() == generators_.size()) {
      record(images);
      return;
    }
    if (images.empty()) {  // up to conjugation one member of each class is enough
      for (const ConjugacyClass& members : group_.classes())
        try_image(images, members.operations[0]);
    } else {
      for (int g = 0; g < group_.order(); ++g) try_image(images, g);
    }
  }

  void try_image(std::vector<int>& images, int g) {
    if (!fits(images, g)) return;
    images.push_back(g);
    extend(images);
    images.pop_back();
  }

  void record(const std::vector<int>& images) {
    const auto holds_all = [&](const Subset& subset) {
      return std::all_of(images.begin(), images.end(), [&](int g) {
        return std::binary_search(subset.begin(), subset.end(), g);
      });
    };
    for (const std::set<Subset>& way : found_) {
      if (std::any_of(way.begin(), way.end(), holds_all)) return;
    }
    const Subset subset = *generated_by(table_, images);
    if (static_cast<int>(subset.size()) != subgroup_.order()) return;
    if (!(identify_group(table_, group_.operations(), subset) == subgroup_.symbol())) return;
    std::set<Subset> way;
    for (int g = 0; g < group_.order(); ++g) way.insert(conjugate(group_, subset, g));
    found_.push_back(std::move(way));
  }

  const PointGroup& group_;
  const PointGroup& subgroup_;
  PartialTable table_;
  Subset generators_;
  std::vector<Kind> kinds_;
  std::vector<std::set<Subset>> found_;
};

Eigen::Matrix3d frame_about(const Eigen::Vector3d& z) {
  // x as near to the old x as it can be; z along x leaves y, or else z, for it.
  Eigen::Vector3d x = Eigen::Vector3d::UnitX() - z[0] * z;
  if (x.norm() < 1e-6) x = -z[0] * Eigen::Vector3d::UnitZ();
  x.normalize();
  Eigen::Matrix3d frame;
  frame.row(0) = x;
  frame.row(1) = Eigen::Vector3d(z[1] * x[2] - z[2] * x[1], z[2] * x[0] - z[0] * x[2],
                                 z[0] * x[1] - z[1] * x[0]);
  frame.row(2) = z;
  return frame;
}

std::vector<Eigen::Matrix3d> standard_frames(const Schoenflies& symbol, const PartialTable& table,
                                             const PointGroup& group, const Subset& subset) {
  if (symbol.family == Family::C1 || symbol.family == Family::Ci) {
    return {Eigen::Matrix3d::Identity()};
  }
  const Eigen::Matrix3d some = some_standard_frame(symbol, table, group.operations(), subset);
  if (turns_freely(symbol.family)) {
    const Eigen::Vector3d z = some.row(2);
    return {frame_about(z), frame_about(-z)};
  }
  std::vector<Eigen::Matrix3d> frames;
  for (const Eigen::Matrix3d& turn : standard_turns(symbol)) frames.push_back(turn * some);
  return frames;
}

// Nearest to the group's frame, z before all; rounding must not decide.
Eigen::Matrix3d nearest_frame(const PointGroup& group, const Schoenflies& symbol,
                              const PartialTable& table, const std::set<Subset>& way) {
  std::optional<Eigen::Matrix3d> best;
  std::vector<double> best_merit;
  for (const Subset& subset : way) {
    for (const Eigen::Matrix3d& frame : standard_frames(symbol, table, group, subset)) {
      const std::vector<double> merit = {frame(2, 2), frame.trace()};
      if (best && !better_merit(merit, best_merit)) continue;
      best = frame;
      best_merit = merit;
    }
  }
  return best->unaryExpr([](double value) { return std::abs(value) < 1e-14 ? 0.0 : value; });
}

std::vector<int> operations_within(const PointGroup& group, const PointGroup& subgroup,
                                   const Eigen::Matrix3d& rotation) {
  const OperationIndex index(group.operations());
  std::vector<int> operations;
  for (const Eigen::Matrix3d& h : subgroup.operations()) {
    operations.push_back(index.find(rotation.transpose() * h * rotation));
  }
  return operations;
}

std::vector<Embedding> finite_embeddings(const PointGroup& group, const Schoenflies& symbol) {
  const PointGroup subgroup(symbol);
  if (group.order() % subgroup.order() != 0) return {};
  const std::vector<std::set<Subset>> ways = Search(group, subgroup).run();
  const PartialTable table = table_of(group);
  std::vector<Eigen::Matrix3d> rotations;
  std::vector<std::vector<int>> operations;
  for (const std::set<Subset>& way : ways) {
    rotations.push_back(nearest_frame(group, symbol, table, way));
    operations.push_back(operations_within(group, subgroup, rotations.back()));
  }
  const std::vector<std::string> names = embedding_names(group, subgroup, operations);
  std::vector<Embedding> found;
  for (std::size_t i = 0; i < ways.size(); ++i) {
    found.push_back({names[i], subgroup, operations[i], rotations[i]});
  }
  std::stable_sort(found.begin(), found.end(), [](const Embedding& a, const Embedding& b) {
    return a.rotation(2, 2) > b.rotation(2, 2) + 1e-9;
  });
  return found;
}

// Kh holds every orthogonal matrix, the linear groups those that keep the axis, up to its sign
// where there is a centre.
bool holds(const Schoenflies& group, const Eigen::Matrix3d& g) {
  if (group.family == Family::Kh) return true;
  const double z = group.family == Family::Dinfh ? std::abs(g(2, 2)) : g(2, 2);
  return std::abs(z - 1.0) < 1e-9;
}

// How the operations lie to the molecular axis: traces and what becomes of z, without their order.
std::vector<std::pair<long, long>> lie_of(const PointGroup& subgroup,
                                          const Eigen::Matrix3d& rotation) {
  std::vector<std::pair<long, long>> lie;
  for (const Eigen::Matrix3d& h : subgroup.operations()) {
    const Eigen::Matrix3d g = rotation.transpose() * h * rotation;
    lie.emplace_back(std::lround(1e6 * g.trace()), std::lround(g(2, 2)));
  }
  std::sort(lie.begin(), lie.end());
  return lie;
}

std::vector<Embedding> infinite_embeddings(const PointGroup& group, const Schoenflies& symbol) {
  const bool spherical = group.symbol().family == Family::Kh;
  if (symbol.family == Family::Kh && !spherical) return {};
  const PointGroup subgroup(symbol);
  Eigen::Matrix3d to_y;  // molecular axis along y, so that a C2v keeps it in the plane yz
  to_y << 0, 1, 0, 0, 0, 1, 1, 0, 0;
  std::vector<Embedding> found;
  for (const Eigen::Matrix3d& rotation : {Eigen::Matrix3d(Eigen::Matrix3d::Identity()), to_y}) {
    if (spherical && !found.empty()) break;
    const bool all = std::all_of(
        subgroup.operations().begin(), subgroup.operations().end(), [&](const Eigen::Matrix3d& h) {
          return holds(group.symbol(), rotation.transpose() * h * rotation);
        });
    if (!all) continue;
    if (!found.empty() && lie_of(subgroup, found[0].rotation) == lie_of(subgroup, rotation))
      continue;
    found.push_back({symbol.name(), subgroup, {}, rotation});
  }
  if (found.size() == 2) {
    const bool mirror = symbol.family == Family::Cs;
    found[0].name += mirror ? "(sigmah)" : "(Cinf)";
    found[1].name += mirror ? "(sigmav)" : "(C2)";
  }
  return found;
}

}  // namespace

std::vector<Embedding> embeddings(const PointGroup& group, const Schoenflies& subgroup) {
  return group.symbol().is_finite()
             ? subgroup.is_finite() ? finite_embeddings(group, subgroup) : std::vector<Embedding>{}
             : infinite_embeddings(group, subgroup);
}

std::vector<Subset> conjugates(const PointGroup& group, const Embedding& embedding) {
  Subset subset = embedding.operations;
  std::sort(subset.begin(), subset.end());
  std::set<Subset> all;
  for (int g = 0; g < group.order(); ++g) all.insert(conjugate(group, subset, g));
  return {all.begin(), all.end()};
}

}  // namespace irrepwise
