#include "output/composition.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

namespace irrepwise {
namespace {

constexpr double tie = 1e-9;         // shares that differ by rounding only keep their order
constexpr double takes_part = 0.02;  // of the group's share, for an orbital to be named

const Shell& first_shell(const LevelsResult& result, const ShellGroup& group) {
  return result.basis.shells[static_cast<std::size_t>(group.shells.front())];
}

// Which orbitals of a shell take part, of those that carry this share together.
std::vector<int> orbitals_taking_part(const LevelsResult& result, const Shell& shell, int level,
                                      double whole) {
  std::vector<int> taking_part;
  for (int m = 0; m < shell.size(); ++m) {
    const double share = result.populations.shares(shell.first_orbital + m, level);
    if (std::abs(share) >= takes_part * std::abs(whole)) taking_part.push_back(m);
  }
  return taking_part;
}

// "5dx2-y2", "5d(xz,yz)" or, where more take part or others on every atom, "5d".
std::string orbitals_in_words(const LevelsResult& result, const ShellGroup& group, int level,
                              double whole) {
  const Shell& shell = first_shell(result, group);
  const std::string letter(1, shell_letter(shell.l));
  const std::string plain = fmt::format("{}{}", shell.n(), letter);
  if (shell.l == 0) return plain;
  const double of_atom = whole / static_cast<double>(group.shells.size());
  const std::vector<int> on_first = orbitals_taking_part(result, shell, level, of_atom);
  for (const int s : group.shells) {
    const Shell& other = result.basis.shells[static_cast<std::size_t>(s)];
    if (orbitals_taking_part(result, other, level, of_atom) != on_first) return plain;
  }
  std::vector<std::string> named;
  for (const int m : on_first) named.emplace_back(orbital_name(shell.l, m).substr(1));
  if (named.empty() || static_cast<int>(named.size()) > (shell.size() + 1) / 2) return plain;
  if (named.size() == 1) return plain + named.front();
  std::string text = plain + "(";
  for (std::size_t i = 0; i < named.size(); ++i) text += (i > 0 ? "," : "") + named[i];
  return text + ")";
}

}  // namespace

std::vector<OrbitalShare> orbital_shares(const LevelsResult& result, int level, double threshold) {
  std::vector<OrbitalShare> shares;
  for (std::size_t s = 0; s < result.basis.shells.size(); ++s) {
    const Shell& shell = result.basis.shells[s];
    for (int orbital = shell.first_orbital; orbital < shell.first_orbital + shell.size();
         ++orbital) {
      const double share = result.populations.shares(orbital, level);
      if (std::abs(share) >= threshold) shares.push_back({orbital, static_cast<int>(s), share});
    }
  }
  // Rounded keys keep the comparison transitive, which "equal within a tie" is not.
  const auto key = [](const OrbitalShare& share) { return std::llround(share.share / tie); };
  std::stable_sort(shares.begin(), shares.end(),
                   [&](const OrbitalShare& a, const OrbitalShare& b) { return key(a) > key(b); });
  return shares;
}

std::vector<ShellGroup> shell_groups(const LevelsResult& result, const std::vector<AtomSet>& sets) {
  std::vector<ShellGroup> groups;
  for (std::size_t set = 0; set < sets.size(); ++set) {
    const std::size_t first_group = groups.size();
    for (const int atom : sets[set].atoms) {
      const auto at = static_cast<std::size_t>(atom);
      std::size_t group = first_group;
      for (int s = result.basis.first_shell[at]; s < result.basis.first_shell[at + 1];
           ++s, ++group) {
        const Shell& shell = result.basis.shells[static_cast<std::size_t>(s)];
        if (group == groups.size()) {
          groups.push_back(
              {static_cast<int>(set),
               shell.n(),
               shell.l,
               {},
               fmt::format("{} {}{}", sets[set].name, shell.n(), shell_letter(shell.l))});
        }
        groups[group].shells.push_back(s);
      }
    }
  }
  return groups;
}

double group_share(const LevelsResult& result, const ShellGroup& group, int level) {
  double sum = 0.0;
  for (const int s : group.shells) {
    const Shell& shell = result.basis.shells[static_cast<std::size_t>(s)];
    sum += result.populations.shares.col(level).segment(shell.first_orbital, shell.size()).sum();
  }
  return sum;
}

std::string composition_words(const LevelsResult& result, const std::vector<AtomSet>& sets,
                              const std::vector<ShellGroup>& groups, int level, double threshold) {
  struct Part {
    const ShellGroup* group;
    double share;
  };
  std::vector<Part> parts;
  for (const ShellGroup& group : groups) {
    parts.push_back({&group, group_share(result, group, level)});
  }
  const auto key = [](const Part& part) { return std::llround(part.share / tie); };
  std::stable_sort(parts.begin(), parts.end(),
                   [&](const Part& a, const Part& b) { return key(a) > key(b); });
  std::string text;
  for (const Part& part : parts) {
    if (!text.empty() && std::abs(part.share) < threshold) continue;
    if (!text.empty()) text += ", ";
    text += fmt::format("{:.0f}\u00A0%\u00A0{}\u00A0{}", 100.0 * part.share,
                        sets[static_cast<std::size_t>(part.group->set)].name,
                        orbitals_in_words(result, *part.group, level, part.share));
  }
  return text;
}

}  // namespace irrepwise
