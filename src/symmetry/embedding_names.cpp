#include "symmetry/embedding_names.hpp"

#include <algorithm>
#include <cmath>
#include <set>

#include <fmt/format.h>

#include "symmetry/operation.hpp"

namespace irrepwise {
namespace {

// "2C2'" -> "C2'": the symbol of one operation of the class.
std::string without_size(const std::string& symbol) {
  return symbol.substr(symbol.find_first_not_of("0123456789"));
}

// "C2(z)" -> "z", where the letters in brackets alone say which.
std::string bracketed(const std::string& symbol) {
  const std::size_t open = symbol.find('(');
  return open == std::string::npos ? symbol : symbol.substr(open + 1, symbol.size() - open - 2);
}

// What the subgroup keeps, as classes of the group.
struct Kept {
  std::set<int> principal;      // the axis along its z
  std::set<int> perpendicular;  // C2 axes across it
  std::set<int> mirrors;
};

Kept kept_by(const PointGroup& group, const PointGroup& subgroup, const std::vector<int>& way) {
  std::vector<int> class_of(static_cast<std::size_t>(group.order()));
  for (std::size_t c = 0; c < group.classes().size(); ++c) {
    for (int g : group.classes()[c].operations) class_of[g] = static_cast<int>(c);
  }
  Kept kept;
  int highest = 1;
  for (std::size_t s = 0; s < way.size(); ++s) {
    const SymmetryOperation op = classify_operation(subgroup.operations()[s]);
    const double z = std::abs(op.axis[2]);
    if (op.kind == OperationKind::Reflection) kept.mirrors.insert(class_of[way[s]]);
    if (op.kind != OperationKind::Rotation) continue;
    if (z > 0.99 && op.n > highest) {
      highest = op.n;
      kept.principal = {class_of[way[s]]};
    } else if (op.n == 2 && z < 0.01) {
      kept.perpendicular.insert(class_of[way[s]]);
    }
  }
  return kept;
}

}  // namespace

std::vector<std::string> embedding_names(const PointGroup& group, const PointGroup& subgroup,
                                         const std::vector<std::vector<int>>& ways) {
  std::vector<Kept> kept;
  for (const std::vector<int>& way : ways) kept.push_back(kept_by(group, subgroup, way));

  // Ways with the same marks so far take on more, where these differ among them.
  std::vector<std::vector<int>> marks(ways.size());
  for (const auto feature : {&Kept::principal, &Kept::perpendicular, &Kept::mirrors}) {
    const std::vector<std::vector<int>> before = marks;
    for (std::size_t a = 0; a < ways.size(); ++a) {
      bool differs = false;
      for (std::size_t b = 0; b < ways.size(); ++b) {
        differs = differs || (before[a] == before[b] && kept[a].*feature != kept[b].*feature);
      }
      if (differs)
        marks[a].insert(marks[a].end(), (kept[a].*feature).begin(), (kept[a].*feature).end());
    }
  }

  std::vector<std::string> names;
  for (const std::vector<int>& way_marks : marks) {
    std::vector<std::string> symbols;
    for (int c : way_marks) symbols.push_back(without_size(group.classes()[c].symbol));
    const bool all_bracketed = std::all_of(symbols.begin(), symbols.end(), [](const auto& symbol) {
      return symbol.find('(') != std::string::npos;
    });
    std::string inside;
    for (const std::string& symbol : symbols) {
      if (!inside.empty()) inside += ",";
      inside += all_bracketed ? bracketed(symbol) : symbol;
    }
    std::string name = subgroup.symbol().name();
    if (!inside.empty()) name += "(" + inside + ")";
    names.push_back(name);
  }
  // What classes do not tell apart is numbered.
  const std::vector<std::string> plain = names;
  for (std::size_t a = 0; a < names.size(); ++a) {
    if (std::count(plain.begin(), plain.end(), plain[a]) < 2) continue;
    const auto at = static_cast<std::ptrdiff_t>(a);
    names[a] += fmt::format("#{}", 1 + std::count(plain.begin(), plain.begin() + at, plain[a]));
  }
  return names;
}

}  // namespace irrepwise
