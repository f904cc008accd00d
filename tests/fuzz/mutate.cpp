#include "fuzz/mutate.hpp"

#include <algorithm>
#include <array>
#include <cstddef>
#include <string_view>

namespace {

// The engine's own numbers, so that a seed gives the same run with every library.
std::size_t below(std::size_t n, std::mt19937_64& random) {
  return n == 0 ? 0 : static_cast<std::size_t>(random() % n);
}

// Words that mean something somewhere, or often mean trouble.
using namespace std::string_view_literals;
constexpr std::array words = {"nan"sv,
                              "-inf"sv,
                              "1e999"sv,
                              "-1e-999"sv,
                              "0x10"sv,
                              "99999999999999999999"sv,
                              "-1"sv,
                              "0"sv,
                              "1e5"sv,
                              "H"sv,
                              "Xx"sv,
                              "Pt1"sv,
                              "charge="sv,
                              "charge=1e9"sv,
                              "Lattice=\""sv,
                              "\t"sv,
                              "\r\n"sv,
                              "\n\n"sv,
                              "# "sv,
                              ": "sv,
                              "- "sv,
                              "{"sv,
                              "}"sv,
                              "["sv,
                              "[[[[[[[["sv,
                              "&a "sv,
                              "*a"sv,
                              "<<: *a"sv,
                              "!!int "sv,
                              "|\n"sv,
                              "'"sv,
                              "\""sv,
                              "~"sv,
                              "null"sv,
                              "geometry: "sv,
                              "atoms: "sv,
                              "charge: "sv,
                              "multiplicity: "sv,
                              "symmetry: "sv,
                              "elements: "sv,
                              "shells: "sv,
                              "zeta: "sv,
                              "\xEF\xBB\xBF"sv,
                              "\xC3"sv,
                              "\xE2\x88\x9E"sv,
                              "\0"sv,
                              "\x80"sv,
                              "%YAML 9"sv};

void mutate_once(std::string& text, const std::vector<std::string>& seeds,
                 std::mt19937_64& random) {
  const std::size_t at = below(text.size() + 1, random);
  const std::size_t some = below(12, random) + 1;
  switch (below(8, random)) {
    case 0:  // another byte
      if (at < text.size()) text[at] = static_cast<char>(random() & 0xFF);
      break;
    case 1:
      text.erase(at, some);
      break;
    case 2:
      text.insert(at, words[below(words.size(), random)]);
      break;
    case 3:
      text.replace(at, std::min(some, text.size() - at), words[below(words.size(), random)]);
      break;
    case 4:
      text.insert(at, text.substr(below(text.size() + 1, random), 3 * some));
      break;
    case 5:
      text.resize(at);
      break;   // a file cut short
    case 6: {  // a line twice
      const std::size_t start = text.rfind('\n', at);
      const std::size_t first = start == std::string::npos ? 0 : start + 1;
      const std::size_t end = text.find('\n', first);
      if (end != std::string::npos) text.insert(first, text.substr(first, end - first + 1));
      break;
    }
    default: {  // half of another input
      const std::string& other = seeds[below(seeds.size(), random)];
      text = text.substr(0, at) + other.substr(below(other.size() + 1, random));
      break;
    }
  }
}

}  // namespace

std::string mutant(const std::vector<std::string>& seeds, std::mt19937_64& random) {
  std::string text = seeds[below(seeds.size(), random)];
  const std::size_t times = 1 + below(6, random);
  for (std::size_t i = 0; i < times; ++i) mutate_once(text, seeds, random);
  constexpr std::size_t largest = 1 << 16;  // repeated doubling must not eat the time
  if (text.size() > largest) text.resize(largest);
  return text;
}
