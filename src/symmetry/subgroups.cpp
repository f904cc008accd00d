#include "symmetry/subgroups.hpp"

#include <algorithm>
#include <set>

namespace irrepwise {

bool PartialTable::is_closed() const {
  return std::none_of(products.begin(), products.end(), [](int product) { return product < 0; });
}

std::optional<Subset> generated_by(const PartialTable& table, const Subset& generators) {
  Subset members = {0};
  std::vector<bool> inside(static_cast<std::size_t>(table.size), false);
  inside[0] = true;
  for (std::size_t done = 0; done < members.size(); ++done) {
    for (int generator : generators) {
      const int image = table.product(generator, members[done]);
      if (image < 0) return std::nullopt;
      if (!inside[image]) {
        inside[image] = true;
        members.push_back(image);
      }
    }
  }
  // In a finite group the products of generators from the left reach every member; a partial
  // table must be asked for the rest as well.
  for (int g : members) {
    for (int h : members) {
      const int image = table.product(g, h);
      if (image < 0 || !inside[image]) return std::nullopt;
    }
  }
  std::sort(members.begin(), members.end());
  return members;
}

std::vector<Subset> closed_subsets(const PartialTable& table) {
  std::set<Subset> all = {{0}};
  std::set<Subset> newest = all;
  for (int round = 0; round < 3; ++round) {
    std::set<Subset> next;
    for (const Subset& subset : newest) {
      std::vector<bool> inside(static_cast<std::size_t>(table.size), false);
      for (int g : subset) inside[g] = true;
      for (int g = 0; g < table.size; ++g) {
        if (inside[g]) continue;
        Subset generators = subset;
        generators.push_back(g);
        const auto grown = generated_by(table, generators);
        if (grown && all.insert(*grown).second) next.insert(*grown);
      }
    }
    newest = std::move(next);
  }
  std::vector<Subset> ordered(all.begin(), all.end());
  std::stable_sort(ordered.begin(), ordered.end(),
                   [](const Subset& a, const Subset& b) { return a.size() < b.size(); });
  return ordered;
}

}  // namespace irrepwise
