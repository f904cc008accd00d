#include "cli/orbital_choice.hpp"

#include <algorithm>
#include <cctype>
#include <optional>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"

namespace irrepwise::cli {
namespace {

class Chooser {
 public:
  Chooser(const PointGroup& group, const Levels& levels) : levels_(levels) {
    for (const Level& level : levels.levels) names_.push_back(level_name(group, level));
  }

  std::vector<OrbitalChoice> chosen(std::span<const std::string> words) {
    for (const std::string& word : words) add_word(word);
    return std::move(choices_);
  }

 private:
  void add_word(const std::string& given) {
    std::string word = given;
    std::transform(word.begin(), word.end(), word.begin(),
                   [](unsigned char c) { return static_cast<char>(std::tolower(c)); });
    if (word == "frontier") {
      add_level(frontier_level("homo", given));
      add_level(frontier_level("lumo", given));
      return;
    }
    const std::size_t dots = word.find("..");
    if (dots != std::string::npos) {
      const int first = level_of(word.substr(0, dots), given);
      const int last = level_of(word.substr(dots + 2), given);
      if (first > last) {
        throw Error(
            fmt::format("{} runs downwards in energy; write the lower level first", quoted(given)));
      }
      for (int level = first; level <= last; ++level) add_level(level);
      return;
    }
    const std::size_t colon = word.find(':');
    const int level = level_of(word.substr(0, colon), given);
    if (colon == std::string::npos) {
      add_level(level);
      return;
    }
    const int degeneracy = levels_.levels[static_cast<std::size_t>(level)].degeneracy;
    const std::optional<int> partner = parse_whole_number(word.substr(colon + 1));
    if (!partner || *partner < 1 || *partner > degeneracy) {
      throw Error(
          fmt::format("{}: {} has {}; give a number from 1 to {}", quoted(given),
                      names_[static_cast<std::size_t>(level)],
                      degeneracy == 1 ? "one partner only" : fmt::format("{} partners", degeneracy),
                      degeneracy));
    }
    add({level, *partner - 1});
  }

  [[nodiscard]] int level_of(const std::string& word, const std::string& given) const {
    if (word.starts_with("homo") || word.starts_with("lumo")) return frontier_level(word, given);
    const auto found = std::find(names_.begin(), names_.end(), word);
    if (found != names_.end()) return static_cast<int>(found - names_.begin());
    const std::string nearest = nearest_word(word, names_);
    throw Error(fmt::format(
        "no level is called {}{}; levels are named as `irrepwise levels` prints them (2e1g), or "
        "homo, lumo, homo-1 …",
        quoted(given), nearest.empty() ? "" : ", did you mean '" + nearest + "'?"));
  }

  [[nodiscard]] int frontier_level(const std::string& word, const std::string& given) const {
    const bool homo = word.starts_with("homo");
    const std::optional<int> start = homo ? levels_.frontier.homo : levels_.frontier.lumo;
    if (!start) {
      throw Error(fmt::format("{}: no level is {}; name the level itself", quoted(given),
                              homo ? "occupied" : "empty"));
    }
    int shift = 0;
    if (word.size() > 4) {
      const bool has_sign = word[4] == '+' || word[4] == '-';
      const std::optional<int> number =
          has_sign ? parse_whole_number(word.substr(4)) : std::nullopt;
      if (!number) {
        throw Error(fmt::format("{} is no level; expected homo, homo-1, lumo+2 …", quoted(given)));
      }
      shift = *number;
    }
    const int n = static_cast<int>(levels_.levels.size());
    // Checked without adding, which could overflow.
    if (shift < -*start || shift > n - 1 - *start) {
      throw Error(
          fmt::format("{} lies beyond the levels, of which there are {}: {} below and {} "
                      "above the {}",
                      quoted(given), n, *start, n - 1 - *start, homo ? "HOMO" : "LUMO"));
    }
    return *start + shift;
  }

  void add_level(int level) {
    const int degeneracy = levels_.levels[static_cast<std::size_t>(level)].degeneracy;
    for (int partner = 0; partner < degeneracy; ++partner) add({level, partner});
  }

  void add(OrbitalChoice choice) {
    const bool known = std::any_of(choices_.begin(), choices_.end(), [&](const OrbitalChoice& c) {
      return c.level == choice.level && c.partner == choice.partner;
    });
    if (!known) choices_.push_back(choice);
  }

  const Levels& levels_;
  std::vector<std::string> names_;
  std::vector<OrbitalChoice> choices_;
};

}  // namespace

std::vector<OrbitalChoice> choose_orbitals(std::span<const std::string> words,
                                           const PointGroup& group, const Levels& levels) {
  return Chooser(group, levels).chosen(words);
}

}  // namespace irrepwise::cli
