#include "output/varied_bonds.hpp"

#include <algorithm>
#include <cstddef>
#include <map>
#include <string>
#include <utility>

namespace irrepwise {
namespace {

// Donors of the first metal, each with the ligand that it belongs to.
std::map<int, std::string> ligands_of(const VariantResult& variant) {
  std::map<int, std::string> ligands;
  if (!variant.metal()) return ligands;
  for (const BondType& type : variant.metal()->bonds) {
    for (const MetalBond& bond : type.bonds) ligands[bond.donor] = type.ligand;
  }
  return ligands;
}

// By the reference's donor, that of the variant in its place, where it is of the same ligand.
std::map<int, int> donors_kept(const std::map<int, std::string>& reference,
                               const std::map<int, std::string>& variant,
                               const Matching& matching) {
  std::map<int, int> kept;
  for (const auto& [ours, theirs] : matching.atoms) {
    const auto a = reference.find(ours);
    const auto b = variant.find(theirs);
    if (a == reference.end() || b == variant.end() || a->second != b->second) continue;
    kept[ours] = theirs;
  }
  return kept;
}

}  // namespace

void find_varied_bonds(Comparison& comparison) {
  const std::map<int, std::string> reference =
      ligands_of(comparison.variants[static_cast<std::size_t>(comparison.reference)]);
  std::vector<int> in_all;
  for (const auto& [donor, ligand] : reference) in_all.push_back(donor);
  std::vector<std::map<int, int>> kept;
  for (std::size_t i = 0; i < comparison.variants.size(); ++i) {
    kept.push_back(
        donors_kept(reference, ligands_of(comparison.variants[i]), comparison.matchings[i]));
    std::erase_if(in_all, [&](int donor) { return !kept.back().contains(donor); });
  }
  for (std::size_t i = 0; i < comparison.variants.size(); ++i) {
    VariantResult& variant = comparison.variants[i];
    variant.varied_bonds.clear();
    if (in_all.empty() || !variant.metal()) continue;
    std::vector<int> same;
    for (const int donor : in_all) same.push_back(kept[i].at(donor));
    for (const BondType& type : variant.metal()->bonds) {
      for (const MetalBond& bond : type.bonds) {
        if (std::find(same.begin(), same.end(), bond.donor) != same.end()) continue;
        variant.varied_bonds.push_back(bond);
      }
    }
    std::sort(variant.varied_bonds.begin(), variant.varied_bonds.end(),
              [](const MetalBond& a, const MetalBond& b) { return a.donor < b.donor; });
  }
}

}  // namespace irrepwise
