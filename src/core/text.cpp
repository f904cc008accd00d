#include "core/text.hpp"

#include <algorithm>
#include <cctype>
#include <numeric>

namespace irrepwise {
namespace {

char lower(char c) { return static_cast<char>(std::tolower(static_cast<unsigned char>(c))); }

std::size_t edit_distance(std::string_view a, std::string_view b) {
  std::vector<std::size_t> row(b.size() + 1);
  std::iota(row.begin(), row.end(), std::size_t{0});
  for (std::size_t i = 0; i < a.size(); ++i) {
    std::size_t diagonal = row[0];
    row[0] = i + 1;
    for (std::size_t j = 0; j < b.size(); ++j) {
      const std::size_t changed = diagonal + (lower(a[i]) == lower(b[j]) ? 0 : 1);
      diagonal = row[j + 1];
      row[j + 1] = std::min({changed, row[j] + 1, diagonal + 1});
    }
  }
  return row.back();
}

constexpr std::string_view white_space = " \t\r\n\v\f";

}  // namespace

std::string nearest_word(std::string_view word, std::span<const std::string> known) {
  std::string best;
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
