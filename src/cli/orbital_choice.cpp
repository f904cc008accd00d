#include "cli/orbital_choice.hpp"

#include <algorithm>
#include <cctype>
#include <limits>
#include <optional>

#include <fmt/format.h>

#include "analysis/d_block.hpp"
#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "output/equivalence.hpp"

namespace irrepwise::cli {
namespace {

std::string lower_case(std::string word) {
  std::transform(word.begin(), word.end(), word.begin(),
                 [](unsigned char c) { return static_cast<char>(std::tolower(c)); });
  return word;
}

bool has_d_shell(const Basis& basis, int atom) {
  const auto at = static_cast<std::size_t>(atom);
  for (int s = basis.first_shell[at]; s < basis.first_shell[at + 1]; ++s) {
    if (basis.shells[static_cast<std::size_t>(s)].l == 2) return true;
  }
  return false;
}

class Chooser {
 public:
  explicit Chooser(const LevelsResult& result)
      : result_(result), levels_(result.levels), n_(static_cast<int>(levels_.levels.size())) {
    const PointGroup& group = result.symmetry.group;
    for (const Level& level : levels_.levels) {
      names_.push_back(level_name(group, level));
      irreps_.push_back(level_label(group.irreps()[static_cast<std::size_t>(level.irrep)].label));
    }
  }

  std::vector<OrbitalChoice> chosen(std::span<const std::string> words) {
    for (const std::string& word : words) add_word(word);
    return std::move(choices_);
  }

 private:
  void add_word(const std::string& given) {
    const std::string word = lower_case(given);
    if (word == "all") return add_range(0, n_ - 1);
    if (word == "d") return add_d_block(given);
    if (word.starts_with("frontier")) return add_frontier(word, given);
    const std::size_t dots = word.find("..");
    if (dots != std::string::npos) {
      return add_between(word.substr(0, dots), word.substr(dots + 2), given);
    }
    const std::size_t colon = word.find(':');
    const std::string name = word.substr(0, colon);
    const bool is_irrep = std::find(irreps_.begin(), irreps_.end(), name) != irreps_.end();
    const std::vector<int> levels =
        is_irrep ? levels_of_irrep(name) : std::vector<int>{level_of(name, given)};
    for (const int level : levels) {
      if (colon == std::string::npos) {
        add_level(level);
      } else {
        add_partner(level, word.substr(colon + 1), given);
      }
    }
  }

  void add_frontier(const std::string& word, const std::string& given) {
    const int homo = frontier_level("homo", given);
    const int lumo = frontier_level("lumo", given);
    const std::string rest = word.substr(std::string_view("frontier").size());
    int more = 0;
    if (!rest.empty()) {
      std::optional<int> number;
      for (const std::string_view sign : {"+-", "±", "+"}) {
        if (!rest.starts_with(sign)) continue;
        const std::string digits = rest.substr(sign.size());
        if (!digits.empty() && std::isdigit(static_cast<unsigned char>(digits.front())) != 0) {
          number = parse_whole_number(digits);
        }
        break;
      }
      if (!number) {
        throw Error(
            fmt::format("{} is no choice of levels; expected frontier, or frontier+5 for "
                        "five more levels on either side",
                        irrepwise::quoted(given)));
      }
      more = std::min(*number, n_);
    }
    if (more == 0) {
      add_level(homo);
      add_level(lumo);
      return;
    }
    const auto [below, above] = std::minmax(homo, lumo);
    add_range(std::max(0, below - more), std::min(n_ - 1, above + more));
  }

  void add_between(const std::string& first, const std::string& last, const std::string& given) {
    constexpr double unlimited = std::numeric_limits<double>::infinity();
    // "1e1" is a level of C5v, not ten: energies are written without exponents.
    const auto energy_ev = [](const std::string& word) {
      return word.find_first_of("eEdD") == std::string::npos ? parse_number(word) : std::nullopt;
    };
    const std::optional<double> from_ev = first.empty() ? -unlimited : energy_ev(first);
    const std::optional<double> to_ev = last.empty() ? unlimited : energy_ev(last);
    if (first.empty() && last.empty()) {
      throw Error(fmt::format("{} has neither end; write a range such as homo-2..lumo+2 or -14..-8",
                              irrepwise::quoted(given)));
    }
    if (from_ev && to_ev) return add_energies(*from_ev, *to_ev, given);
    const int from = first.empty() ? 0 : level_of(first, given);
    const int to = last.empty() ? n_ - 1 : level_of(last, given);
    if (from > to) {
      throw Error(fmt::format("{} runs downwards in energy; write the lower level first",
                              irrepwise::quoted(given)));
    }
    add_range(from, to);
  }

  void add_energies(double from_ev, double to_ev, const std::string& given) {
    if (from_ev > to_ev) {
      throw Error(fmt::format("{} runs downwards in energy; write the lower end first",
                              irrepwise::quoted(given)));
    }
    bool any = false;
    for (int level = 0; level < n_; ++level) {
      const double energy_ev = levels_.levels[static_cast<std::size_t>(level)].energy_ev;
      if (energy_ev < from_ev || energy_ev > to_ev) continue;
      add_level(level);
      any = true;
    }
    if (any) return;
    throw Error(fmt::format("{}: no level lies there; they run from {:.3f} to {:.3f} eV",
                            irrepwise::quoted(given), levels_.levels.front().energy_ev,
                            levels_.levels.back().energy_ev));
  }

  void add_d_block(const std::string& given) {
    std::vector<int> found;
    for (const AtomSet& set : atom_sets(result_.symmetry)) {
      if (!has_d_shell(result_.basis, set.atoms.front())) continue;
      const DBlock block = find_d_block(result_.symmetry, result_.basis, levels_,
                                        result_.populations, set.atoms.front());
      for (const DLevel& level : block.levels) found.push_back(level.level);
    }
    if (found.empty()) {
      throw Error(
          fmt::format("{} stands for the d block, and no atom here has a d shell; name "
                      "levels, an irrep or frontier",
                      irrepwise::quoted(given)));
    }
    std::sort(found.begin(), found.end());
    for (const int level : found) add_level(level);
  }

  void add_partner(int level, const std::string& number, const std::string& given) {
    const int degeneracy = levels_.levels[static_cast<std::size_t>(level)].degeneracy;
    const std::optional<int> partner = parse_whole_number(number);
    if (!partner || *partner < 1 || *partner > degeneracy) {
      throw Error(
          fmt::format("{}: {} has {}; give a number from 1 to {}", irrepwise::quoted(given),
                      names_[static_cast<std::size_t>(level)],
                      degeneracy == 1 ? "one partner only" : fmt::format("{} partners", degeneracy),
                      degeneracy));
    }
    add({level, *partner - 1});
  }

  [[nodiscard]] std::vector<int> levels_of_irrep(const std::string& irrep) const {
    std::vector<int> levels;
    for (int level = 0; level < n_; ++level) {
      if (irreps_[static_cast<std::size_t>(level)] == irrep) levels.push_back(level);
    }
    return levels;
  }

  [[nodiscard]] int level_of(const std::string& word, const std::string& given) const {
    if (word.starts_with("homo") || word.starts_with("lumo")) return frontier_level(word, given);
    const auto found = std::find(names_.begin(), names_.end(), word);
    if (found != names_.end()) return static_cast<int>(found - names_.begin());
    std::vector<std::string> known = names_;
    known.insert(known.end(), irreps_.begin(), irreps_.end());
    known.insert(known.end(), {"frontier", "homo", "lumo", "all"});
    const std::string nearest = nearest_word(word, known);
    throw Error(fmt::format(
        "no level is called {}{}; levels are named as `irrepwise levels` prints them (2e1g), or "
        "homo, lumo, homo-1 …; an irrep (e1g) stands for all its levels",
        irrepwise::quoted(given), nearest.empty() ? "" : ", did you mean '" + nearest + "'?"));
  }

  [[nodiscard]] int frontier_level(const std::string& word, const std::string& given) const {
    const bool homo = word.starts_with("homo");
    const std::optional<int> start = homo ? levels_.frontier.homo : levels_.frontier.lumo;
    if (!start) {
      throw Error(fmt::format("{}: no level is {}; name the level itself", irrepwise::quoted(given),
                              homo ? "occupied" : "empty"));
    }
    int shift = 0;
    if (word.size() > 4) {
      const bool has_sign = word[4] == '+' || word[4] == '-';
      const std::optional<int> number =
          has_sign ? parse_whole_number(word.substr(4)) : std::nullopt;
      if (!number) {
        throw Error(fmt::format("{} is no level; expected homo, homo-1, lumo+2 …",
                                irrepwise::quoted(given)));
      }
      shift = *number;
    }
    // Checked without adding, which could overflow.
    if (shift < -*start || shift > n_ - 1 - *start) {
      throw Error(fmt::format(
          "{} lies beyond the levels, of which there are {}: {} below and {} "
          "above the {}",
          irrepwise::quoted(given), n_, *start, n_ - 1 - *start, homo ? "HOMO" : "LUMO"));
    }
    return *start + shift;
  }

  void add_range(int first, int last) {
    for (int level = first; level <= last; ++level) add_level(level);
  }

  void add_level(int level) {
    for (const OrbitalChoice& choice : partners_of(levels_, level)) add(choice);
  }

  void add(OrbitalChoice choice) {
    const bool known = std::any_of(choices_.begin(), choices_.end(), [&](const OrbitalChoice& c) {
      return c.level == choice.level && c.partner == choice.partner;
    });
    if (!known) choices_.push_back(choice);
  }

  const LevelsResult& result_;
  const Levels& levels_;
  int n_;
  std::vector<std::string> names_;
  std::vector<std::string> irreps_;  // of each level
  std::vector<OrbitalChoice> choices_;
};

}  // namespace

std::vector<OrbitalChoice> choose_orbitals(std::span<const std::string> words,
                                           const LevelsResult& result) {
  return Chooser(result).chosen(words);
}

}  // namespace irrepwise::cli
