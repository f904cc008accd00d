#include "core/text.hpp"

#include <algorithm>
#include <cctype>
#include <numeric>
#include <utility>

namespace irrepwise {
namespace {

char lower(char c) { return static_cast<char>(std::tolower(static_cast<unsigned char>(c))); }

bool begins_with(std::string_view word, std::string_view start) {
  return word.size() >= start.size() &&
         std::equal(start.begin(), start.end(), word.begin(),
                    [](char a, char b) { return lower(a) == lower(b); });
}

constexpr std::string_view white_space = " \t\r\n\v\f";

}  // namespace

std::size_t edit_distance(std::string_view a, std::string_view b) {
  // Rows of the table of distances between the first i letters of a and the first j of b.
  std::vector<std::size_t> before;
  std::vector<std::size_t> last(b.size() + 1);
  std::iota(last.begin(), last.end(), std::size_t{0});
  for (std::size_t i = 1; i <= a.size(); ++i) {
    std::vector<std::size_t> row(b.size() + 1, i);
    for (std::size_t j = 1; j <= b.size(); ++j) {
      const auto same = [&](std::size_t m, std::size_t n) { return lower(a[m]) == lower(b[n]); };
      row[j] = std::min({last[j] + 1, row[j - 1] + 1, last[j - 1] + (same(i - 1, j - 1) ? 0 : 1)});
      if (i > 1 && j > 1 && same(i - 1, j - 2) && same(i - 2, j - 1)) {
        row[j] = std::min(row[j], before[j - 2] + 1);
      }
    }
    before = std::move(last);
    last = std::move(row);
  }
  return last.back();
}

std::string nearest_word(std::string_view word, std::span<const std::string> known) {
  constexpr std::size_t shortest_start = 3;
  std::string best;
  for (const std::string& candidate : known) {
    if (word.size() < shortest_start || !begins_with(candidate, word)) continue;
    if (best.empty() || candidate.size() < best.size()) best = candidate;
  }
  if (!best.empty()) return best;
  std::size_t best_distance = 0;
  for (const std::string& candidate : known) {
    const std::size_t distance = edit_distance(word, candidate);
    const std::size_t limit = std::max<std::size_t>(2, std::max(word.size(), candidate.size()) / 3);
    if (distance <= limit && (best.empty() || distance < best_distance)) {
      best = candidate;
      best_distance = distance;
    }
  }
  return best;
}

std::string joined(std::span<const std::string> words, std::string_view last) {
  std::string text;
  for (std::size_t i = 0; i < words.size(); ++i) {
    if (i > 0 && i + 1 == words.size()) {
      text.append(" ").append(last).append(" ");
    } else if (i > 0) {
      text += ", ";
    }
    text += words[i];
  }
  return text;
}

std::string_view trimmed(std::string_view text) {
  const std::size_t first = text.find_first_not_of(white_space);
  if (first == std::string_view::npos) return {};
  return text.substr(first, text.find_last_not_of(white_space) - first + 1);
}

std::vector<std::string_view> split_words(std::string_view text) {
  std::vector<std::string_view> words;
  std::size_t at = text.find_first_not_of(white_space);
  while (at != std::string_view::npos) {
    const std::size_t end = std::min(text.find_first_of(white_space, at), text.size());
    words.push_back(text.substr(at, end - at));
    at = text.find_first_not_of(white_space, end);
  }
  return words;
}

std::string file_name(const std::string& path) {
  const std::size_t slash = path.rfind('/');
  return slash == std::string::npos ? path : path.substr(slash + 1);
}

}  // namespace irrepwise
