#include "symmetry/schoenflies.hpp"

#include <cctype>
#include <charconv>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/text.hpp"

namespace irrepwise {
namespace {

constexpr std::pair<std::string_view, Family> named_groups[] = {
    {"C1", Family::C1},     {"S1", Family::Cs},       {"Ci", Family::Ci},
    {"Cs", Family::Cs},     {"T", Family::T},         {"Td", Family::Td},
    {"Th", Family::Th},     {"O", Family::O},         {"Oh", Family::Oh},
    {"I", Family::I},       {"Ih", Family::Ih},       {"Cinfv", Family::Cinfv},
    {"C∞v", Family::Cinfv}, {"Dinfh", Family::Dinfh}, {"D∞h", Family::Dinfh},
    {"Kh", Family::Kh}};

Error unknown_group(std::string_view text) {
  std::vector<std::string> known;
  for (const auto& [name, family] : named_groups) known.emplace_back(name);
  for (int n = 2; n <= 12; ++n) {
    for (const char* form : {"C{}", "C{}v", "C{}h", "D{}", "D{}h", "D{}d"}) {
      known.push_back(fmt::format(fmt::runtime(form), n));
    }
    if (n % 2 == 0) known.push_back(fmt::format("S{}", n));
  }
  const std::string nearest = nearest_word(text, known);
  return Error(
      fmt::format("unknown point group '{}'; {}write a Schoenflies symbol such as C2v, D4h, "
                  "D5d, S6, Td, Oh, Ih or Cinfv",
                  text, nearest.empty() ? "" : fmt::format("did you mean {}? ", nearest)));
}

bool same_ignoring_case(std::string_view a, std::string_view b) {
  if (a.size() != b.size()) return false;
  for (std::size_t i = 0; i < a.size(); ++i) {
    if (std::tolower(static_cast<unsigned char>(a[i])) !=
        std::tolower(static_cast<unsigned char>(b[i]))) {
      return false;
    }
  }
  return true;
}

// Cn, Dn, Sn with a number and an optional v, h or d. The small n name groups that have other
// names; textbooks agree on which.
Schoenflies numbered_group(char letter, int n, char suffix, std::string_view text) {
  if (letter == 'C' && suffix == 0) return {Family::Cn, n};
  if (letter == 'C' && suffix == 'v') {
    return n == 1 ? Schoenflies{Family::Cs, 1} : Schoenflies{Family::Cnv, n};
  }
  if (letter == 'C' && suffix == 'h') {
    return n == 1 ? Schoenflies{Family::Cs, 1} : Schoenflies{Family::Cnh, n};
  }
  if (letter == 'D' && suffix == 0) {
    return n == 1 ? Schoenflies{Family::Cn, 2} : Schoenflies{Family::Dn, n};
  }
  if (letter == 'D' && suffix == 'h') {
    return n == 1 ? Schoenflies{Family::Cnv, 2} : Schoenflies{Family::Dnh, n};
  }
  if (letter == 'D' && suffix == 'd') {
    return n == 1 ? Schoenflies{Family::Cnh, 2} : Schoenflies{Family::Dnd, n};
  }
  if (letter == 'S' && suffix == 0 && n == 2) return {Family::Ci, 1};
  if (letter == 'S' && suffix == 0 && n % 2 == 0) return {Family::S2n, n / 2};
  if (letter == 'S' && suffix == 0) return {Family::Cnh, n};  // S3 is C3h, and so for every odd n
  throw unknown_group(text);
}

}  // namespace

std::string Schoenflies::name() const {
  switch (family) {
    case Family::C1:
      return "C1";
    case Family::Ci:
      return "Ci";
    case Family::Cs:
      return "Cs";
    case Family::Cn:
      return fmt::format("C{}", n);
    case Family::Cnv:
      return fmt::format("C{}v", n);
    case Family::Cnh:
      return fmt::format("C{}h", n);
    case Family::Dn:
      return fmt::format("D{}", n);
    case Family::Dnh:
      return fmt::format("D{}h", n);
    case Family::Dnd:
      return fmt::format("D{}d", n);
    case Family::S2n:
      return fmt::format("S{}", 2 * n);
    case Family::T:
      return "T";
    case Family::Td:
      return "Td";
    case Family::Th:
      return "Th";
    case Family::O:
      return "O";
    case Family::Oh:
      return "Oh";
    case Family::I:
      return "I";
    case Family::Ih:
      return "Ih";
    case Family::Cinfv:
      return "Cinfv";
    case Family::Dinfh:
      return "Dinfh";
    case Family::Kh:
      return "Kh";
  }
  return {};
}

bool Schoenflies::is_finite() const {
  return family != Family::Cinfv && family != Family::Dinfh && family != Family::Kh;
}

Schoenflies parse_schoenflies(std::string_view text) {
  for (const auto& [name, family] : named_groups) {
    if (same_ignoring_case(text, name)) return {family, 1};
  }
  if (text.empty()) throw unknown_group(text);
  const char letter = static_cast<char>(std::toupper(static_cast<unsigned char>(text[0])));
  int n = 0;
  const auto [end, status] = std::from_chars(text.data() + 1, text.data() + text.size(), n);
  const auto rest = static_cast<std::size_t>(text.data() + text.size() - end);
  if (status != std::errc() || rest > 1 || n < 1) throw unknown_group(text);
  if (n > Schoenflies::max_n) {
    throw Error(
        fmt::format("point group '{}': n = {}, expected 1 to {}", text, n, Schoenflies::max_n));
  }
  const char suffix =
      rest == 0 ? '\0' : static_cast<char>(std::tolower(static_cast<unsigned char>(*end)));
  return numbered_group(letter, n, suffix, text);
}

}  // namespace irrepwise
