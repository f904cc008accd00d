#include "symmetry/character_table.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>

#include <fmt/format.h>
#include <boost/math/special_functions/cos_pi.hpp>

#include "core/error.hpp"
#include "symmetry/angular_label.hpp"

namespace irrepwise {
namespace {

double cosine_of_turn(int k, int n) { return boost::math::cos_pi(2.0 * k / n); }

// Nodes 0 to n - 1 are the turns by k/n of a circle.
std::vector<int> cycle_of_turn(int k, int n) {
  std::vector<int> cycle = {0};
  for (int node = k % n; node != 0; node = (node + k) % n) cycle.push_back(node);
  return cycle;
}

}  // namespace

CharacterTable::CharacterTable(const PointGroup& group, int largest_m) : symbol_(group.symbol()) {
  switch (symbol_.family) {
    case Family::Cinfv:
      add_linear(largest_m, false);
      break;
    case Family::Dinfh:
      add_linear(largest_m, true);
      break;
    case Family::Kh:
      add_spherical(largest_m);
      break;
    default:
      add_finite(group);
      break;
  }
}

void CharacterTable::add_finite(const PointGroup& group) {
  const std::vector<ConjugacyClass>& classes = group.classes();
  std::vector<int> class_of(static_cast<std::size_t>(group.order()));
  for (std::size_t c = 0; c < classes.size(); ++c) {
    for (int g : classes[c].operations) class_of[g] = static_cast<int>(c);
  }
  for (const ConjugacyClass& members : classes) {
    weights_.push_back(static_cast<double>(members.operations.size()) / group.order());
    const int g = members.operations.front();
    std::vector<int> cycle = {class_of[0]};
    for (int power = g; power != 0; power = group.product(g, power)) {
      cycle.push_back(class_of[power]);
    }
    cycles_.push_back(std::move(cycle));
  }
  for (const Irrep& irrep : group.irreps()) {
    TableIrrep entry{irrep.label, irrep.dimension, irrep.complex_pair, {}};
    for (const ConjugacyClass& members : classes) {
      entry.characters.push_back(irrep.characters[members.operations.front()]);
    }
    irreps_.push_back(std::move(entry));
  }
}

void CharacterTable::add_linear(int largest_m, bool inversion) {
  // Products of a representation and an irrep reach |m| = 2 largest_m.
  const int n = 2 * largest_m + 1;
  for (int k = 0; k < n; ++k) {
    weights_.push_back(0.5 / n);
    cycles_.push_back(cycle_of_turn(k, n));
  }
  weights_.push_back(0.5);  // all mirrors are conjugate
  cycles_.push_back({0, n});
  for (int m = 0; m <= largest_m; ++m) {
    for (int reflection : {1, -1}) {
      if (m > 0 && reflection < 0) continue;
      TableIrrep irrep{angular_label(Family::Cinfv, {m, reflection, 0}), m == 0 ? 1 : 2, false, {}};
      for (int k = 0; k < n; ++k) {
        irrep.characters.push_back(m == 0 ? 1.0 : 2.0 * cosine_of_turn(m * k % n, n));
      }
      irrep.characters.push_back(m == 0 ? reflection : 0.0);
      irreps_.push_back(std::move(irrep));
    }
  }
  if (!inversion) return;
  double_by_inversion();
  std::size_t at = 0;
  for (int parity : {1, -1}) {
    for (int m = 0; m <= largest_m; ++m) {
      for (int reflection : {1, -1}) {
        if (m > 0 && reflection < 0) continue;
        irreps_[at++].label = angular_label(Family::Dinfh, {m, reflection, parity});
      }
    }
  }
}

void CharacterTable::add_spherical(int largest_l) {
  // One degree more than products of two reach, for the weight 1 - cos φ.
  const int n = 2 * largest_l + 2;
  for (int k = 0; k < n; ++k) {
    weights_.push_back((1.0 - cosine_of_turn(k, n)) / n);
    cycles_.push_back(cycle_of_turn(k, n));
  }
  for (int l = 0; l <= largest_l; ++l) {
    TableIrrep irrep{{}, 2 * l + 1, false, {}};
    for (int k = 0; k < n; ++k) {
      double character = 1.0;
      for (int m = 1; m <= l; ++m) character += 2.0 * cosine_of_turn(m * k % n, n);
      irrep.characters.push_back(character);
    }
    irreps_.push_back(std::move(irrep));
  }
  double_by_inversion();
  for (std::size_t i = 0; i < irreps_.size(); ++i) {
    const int count = largest_l + 1, index = static_cast<int>(i);
    irreps_[i].label = angular_label(Family::Kh, {index % count, 1, index < count ? 1 : -1});
  }
}

// Every node g once as it is and once as i g; every irrep once even and once odd.
void CharacterTable::double_by_inversion() {
  const int n = size();
  for (int node = 0; node < n; ++node) {
    weights_[node] *= 0.5;
    weights_.push_back(weights_[node]);
    const std::vector<int> cycle = cycles_[node];
    const std::size_t order = cycle.size() % 2 == 0 ? cycle.size() : 2 * cycle.size();
    std::vector<int> doubled;
    for (std::size_t power = 0; power < order; ++power) {
      doubled.push_back(cycle[power % cycle.size()] + (power % 2 == 0 ? 0 : n));
    }
    cycles_.push_back(std::move(doubled));
  }
  const std::vector<TableIrrep> proper = irreps_;
  irreps_.clear();
  for (double parity : {1.0, -1.0}) {
    for (TableIrrep irrep : proper) {
      for (int node = 0; node < n; ++node) {
        irrep.characters.push_back(parity * irrep.characters[node]);
      }
      irreps_.push_back(std::move(irrep));
    }
  }
}

int CharacterTable::power(int node, int exponent) const {
  const std::vector<int>& cycle = cycles_[node];
  return cycle[static_cast<std::size_t>(exponent) % cycle.size()];
}

const TableIrrep& CharacterTable::irrep(std::string_view label) const {
  const auto found = std::find_if(irreps_.begin(), irreps_.end(),
                                  [&](const TableIrrep& entry) { return entry.label == label; });
  assert(found != irreps_.end());
  return *found;
}

Reduction CharacterTable::reduce(std::span<const double> characters) const {
  assert(characters.size() == weights_.size());
  Reduction reduction;
  for (const TableIrrep& irrep : irreps_) {
    double sum = 0.0;
    for (int node = 0; node < size(); ++node) {
      sum += weights_[node] * irrep.characters[node] * characters[node];
    }
    if (irrep.complex_pair) sum /= 2.0;
    const double count = std::round(sum);
    const double scale = std::max(1.0, std::abs(characters[0]));
    if (std::abs(sum - count) > 1e-12 * scale + 1e-6 || count < 0.0) {
      throw Error(
          fmt::format("the characters are those of no representation of {}: {} would occur "
                      "{} times",
                      symbol_.name(), irrep.label, sum));
    }
    if (count > 0.0) {
      reduction.push_back({irrep.label, irrep.dimension, static_cast<int>(count)});
    }
  }
  return reduction;
}

std::string table_label(const PointGroup& group, std::string_view text) {
  if (group.symbol().is_finite()) {
    return group.irreps()[group.irrep_index(ascii_label(text))].label;
  }
  return angular_label(group.symbol().family, parse_angular_label(group.symbol(), text));
}

int angular_number(const PointGroup& group, std::string_view label) {
  return group.symbol().is_finite() ? 0 : parse_angular_label(group.symbol(), label).m;
}

}  // namespace irrepwise
