#include "symmetry/relabelled.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>

#include "symmetry/product_table.hpp"

namespace irrepwise {
namespace {

bool same_characters(const Irrep& before, const Irrep& after, const std::vector<int>& before_of) {
  for (std::size_t g = 0; g < before_of.size(); ++g) {
    if (std::abs(after.characters[g] - before.characters[before_of[g]]) > 1e-6) return false;
  }
  return true;
}

std::string class_of(const PointGroup& group, int operation) {
  for (const ConjugacyClass& conjugacy : group.classes()) {
    const auto& members = conjugacy.operations;
    if (std::find(members.begin(), members.end(), operation) == members.end()) continue;
    return conjugacy.symbol.substr(conjugacy.symbol.find_first_not_of("0123456789"));
  }
  return {};
}

}  // namespace

AxisEffect axis_effect(const MolecularSymmetry& before, const MolecularSymmetry& after) {
  AxisEffect effect;
  const PointGroup& group = after.group;
  if (!(before.group.symbol() == group.symbol()) || !group.symbol().is_finite()) return effect;
  const Eigen::Matrix3d turn = after.rotation * before.rotation.transpose();
  const OperationIndex index(before.group.operations());
  std::vector<int> before_of;
  for (const Eigen::Matrix3d& g : group.operations()) {
    before_of.push_back(index.find(turn.transpose() * g * turn));
    if (before_of.back() < 0) return effect;
  }
  for (const Irrep& old_irrep : before.group.irreps()) {
    for (const Irrep& new_irrep : group.irreps()) {
      if (!same_characters(old_irrep, new_irrep, before_of)) continue;
      if (old_irrep.label != new_irrep.label) {
        effect.irreps.push_back({old_irrep.label, new_irrep.label});
      }
      break;  // conjugate pairs with equal characters are told apart by no label either
    }
  }
  for (const ConjugacyClass& conjugacy : group.classes()) {
    const int g = conjugacy.operations.front();
    const std::string now = class_of(group, g);
    const std::string then = class_of(before.group, before_of[g]);
    if (now != then) effect.classes.push_back({then, now});
  }
  return effect;
}

}  // namespace irrepwise
