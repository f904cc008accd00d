#include "output/frontier_fate.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <utility>

#include <fmt/format.h>

#include "core/text.hpp"

namespace irrepwise {
namespace {

constexpr double weak_match = 0.3;  // below it, "is now" would say too much

const VariantResult& variant_of(const Comparison& comparison, int index) {
  return comparison.variants[static_cast<std::size_t>(index)];
}

std::optional<int> frontier_level(const VariantResult& variant, FrontierSide side) {
  const Frontier& frontier = variant.levels.levels.frontier;
  return side == FrontierSide::Homo ? frontier.homo : frontier.lumo;
}

// Whether it is the HOMO (LUMO), or filled (empty) as that is and so near that the method cannot
// tell the two apart.
bool is_at_frontier(const VariantResult& variant, int level, FrontierSide side) {
  const std::optional<int> frontier = frontier_level(variant, side);
  if (!frontier) return false;
  if (level == *frontier) return true;
  const bool occupied = level_of(variant, level).occupation > 0.0;
  return occupied == (side == FrontierSide::Homo) &&
         std::abs(level_of(variant, level).energy_ev - level_of(variant, *frontier).energy_ev) <
             tied_below_ev;
}

int orbitals_in_common(const VariantResult& reference, const VariantResult& variant,
                       const LevelMatch& match) {
  return std::min(level_of(reference, match.reference).degeneracy,
                  level_of(variant, match.variant).degeneracy);
}

// The words of one fate, all of one variant and one side.
class Teller {
 public:
  Teller(const Comparison& comparison, int variant, FrontierSide side, const FrontierFate& fate)
      : reference_(variant_of(comparison, comparison.reference)),
        other_(variant_of(comparison, variant)),
        which_(side == FrontierSide::Homo ? "HOMO" : "LUMO"),
        fate_(fate),
        was_(readable(reference_, fate.reference_level)) {
    for (const FatePart& part : fate.parts) {
      (part.match.reference == fate.reference_level ? own_ : tied_).push_back(&part);
    }
  }

  [[nodiscard]] std::string sentence() const {
    std::string words = fmt::format("{} of {}: ", which_, other_.name);
    switch (fate_.stays) {
      case Stays::Whole:
        return {};
      case Stays::No:
        words += own_.empty() ? fmt::format("nothing resembles {} of {}; the {} is {}", was_,
                                            reference_.name, which_, readable(other_, *fate_.now))
                              : moved_words();
        return words + now_words() + ".";
      case Stays::InPart:
        break;
    }
    return words + (tied_.empty() ? split_words() : tied_words()) + ".";
  }

 private:
  static std::string readable(const VariantResult& of, int level) {
    return readable_label(name_of_level(of, level));
  }

  [[nodiscard]] std::string name(const FatePart& part) const {
    return readable(other_, part.match.variant);
  }

  // With the share that it has in common where that is small.
  [[nodiscard]] std::string hedged_name(const FatePart& part) const {
    return part.match.overlap < weak_match
               ? fmt::format("{} ({:.0f} %)", name(part), 100.0 * part.match.overlap)
               : name(part);
  }

  [[nodiscard]] double apart_ev(const FatePart& part) const {
    return level_of(other_, part.match.variant).energy_ev - level_of(other_, *fate_.now).energy_ev;
  }

  [[nodiscard]] std::string distance(const FatePart& part) const {
    return fmt::format("{:.3f} eV {}", std::abs(apart_ev(part)),
                       apart_ev(part) < 0.0 ? "below" : "above");
  }

  [[nodiscard]] std::string now_words() const {
    return fate_.now_was ? fmt::format(", which was {}", readable(reference_, *fate_.now_was))
                         : ", which has no counterpart there";
  }

  // "5b2 of chloride is now 7b2, 0.040 eV below the HOMO 10a1"
  [[nodiscard]] std::string moved_words() const {
    const std::string frontier = fmt::format(" the {} {}", which_, readable(other_, *fate_.now));
    if (own_.size() > 1) return several_moved_words() + frontier;
    const FatePart& part = *own_.front();
    return (part.match.overlap < weak_match
                ? fmt::format("what resembles {} of {} most is {}", was_, reference_.name,
                              hedged_name(part))
                : fmt::format("{} of {} is now {}", was_, reference_.name, name(part))) +
           ", " + distance(part) + frontier;
  }

  // "5t2 of chloride splits into 8b1, 9b2 and 13a1, 1.754, 1.497 and 0.456 eV above"
  [[nodiscard]] std::string several_moved_words() const {
    std::vector<std::string> names, distances;
    bool above = false, below = false;
    for (const FatePart* part : own_) {
      (apart_ev(*part) < 0.0 ? below : above) = true;
      names.push_back(hedged_name(*part));
    }
    const bool both = above && below;
    for (const FatePart* part : own_) {
      distances.push_back(both ? fmt::format("{:+.3f}", apart_ev(*part))
                               : fmt::format("{:.3f}", std::abs(apart_ev(*part))));
    }
    return fmt::format("{} of {} splits into {}, {} eV {}", was_, reference_.name, joined(names),
                       joined(distances),
                       both    ? "from"
                       : above ? "above"
                               : "below");
  }

  // "3eg of regular splits: 5a1g is the HOMO, 3b1g 0.447 eV below it"
  [[nodiscard]] std::string split_words() const {
    std::string words = fmt::format("{} of {} {}: ", was_, reference_.name,
                                    own_.size() > 1 ? "splits" : "stays in part");
    for (std::size_t i = 0; i < own_.size(); ++i) {
      words += i == 0 ? "" : ", ";
      words += hedged_name(*own_[i]);
      if (own_[i]->match.variant == fate_.now) {
        words += fmt::format(" is the {}", which_);
      } else if (own_[i]->at_frontier) {
        words += fmt::format(" counts as the {} {}", which_, readable(other_, *fate_.now));
      } else {
        words += fmt::format(" {} it", distance(*own_[i]));
      }
    }
    return words + (fate_.found_whole ? "" : ", the rest has no counterpart");
  }

  // "5b2 and 5b1 of chloride share a place: 6b1, which was 5b1, is the HOMO, 5b2, which was 5b2,
  // 0.310 eV below the HOMO"
  [[nodiscard]] std::string tied_words() const {
    std::vector<std::string> tied = {was_};
    std::string now;
    for (const FatePart& part : fate_.parts) {
      const std::string was = readable(reference_, part.match.reference);
      if (std::find(tied.begin(), tied.end(), was) == tied.end()) tied.push_back(was);
      now += fmt::format("{}{}, which was {}, ", now.empty() ? "" : ", ", hedged_name(part), was);
      now += part.match.variant == fate_.now ? fmt::format("is the {}", which_)
             : part.at_frontier
                 ? fmt::format("counts as the {} {}", which_, readable(other_, *fate_.now))
                 : fmt::format("{} the {}", distance(part), which_);
    }
    return fmt::format("{} of {} share a place; {}", joined(tied), reference_.name, now);
  }

  const VariantResult& reference_;
  const VariantResult& other_;
  const char* which_;
  const FrontierFate& fate_;
  std::string was_;
  std::vector<const FatePart*> own_;   // of the reference's frontier level itself
  std::vector<const FatePart*> tied_;  // of levels tied with it
};

}  // namespace

const char* stays_word(Stays stays) {
  switch (stays) {
    case Stays::No:
      return "no";
    case Stays::InPart:
      return "in part";
    case Stays::Whole:
      return "yes";
  }
  return "";
}

double shift_ev(const Comparison& comparison, int variant, const LevelMatch& match) {
  return level_of(variant_of(comparison, variant), match.variant).energy_ev -
         level_of(variant_of(comparison, comparison.reference), match.reference).energy_ev;
}

std::optional<FrontierFate> frontier_fate(const Comparison& comparison, int variant,
                                          FrontierSide side) {
  const VariantResult& reference = variant_of(comparison, comparison.reference);
  const VariantResult& other = variant_of(comparison, variant);
  const std::optional<int> level = frontier_level(reference, side);
  if (!level) return {};
  FrontierFate fate;
  fate.reference_level = *level;
  fate.now = frontier_level(other, side);
  std::vector<FatePart> tied;
  int found = 0, at_frontier = 0;
  double best_now = 0.0;
  for (const LevelMatch& match : comparison.matchings[static_cast<std::size_t>(variant)].matches) {
    const FatePart part{match, is_at_frontier(other, match.variant, side)};
    if (match.reference == *level) {
      const int orbitals = orbitals_in_common(reference, other, match);
      found += orbitals;
      if (part.at_frontier) at_frontier += orbitals;
      fate.parts.push_back(part);
    } else if (part.at_frontier && is_at_frontier(reference, match.reference, side)) {
      tied.push_back(part);
    }
    if (match.variant == fate.now && match.overlap > best_now) {
      best_now = match.overlap;
      fate.now_was = match.reference;
    }
  }
  const int wanted = level_of(reference, *level).degeneracy;
  fate.found_whole = found >= wanted;
  if (at_frontier >= wanted) {
    fate.stays = Stays::Whole;
  } else {
    fate.parts.insert(fate.parts.end(), tied.begin(), tied.end());
    if (at_frontier > 0 || !tied.empty()) fate.stays = Stays::InPart;
  }
  const auto rank = [&](const FatePart& part) {
    return part.match.variant == fate.now ? 0 : part.at_frontier ? 1 : 2;
  };
  std::stable_sort(fate.parts.begin(), fate.parts.end(), [&](const FatePart& a, const FatePart& b) {
    return rank(a) != rank(b) ? rank(a) < rank(b) : a.match.overlap > b.match.overlap;
  });
  return fate;
}

std::string crossing_words(const Comparison& comparison, int variant, FrontierSide side) {
  const std::optional<FrontierFate> fate = frontier_fate(comparison, variant, side);
  if (!fate || !fate->now) return {};
  return Teller(comparison, variant, side, *fate).sentence();
}

}  // namespace irrepwise
