#include "symmetry/angular_label.hpp"

#include <array>
#include <cctype>
#include <charconv>
#include <optional>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"

namespace irrepwise {
namespace {

constexpr std::array<std::string_view, 9> greek_names = {"Sigma", "Pi",   "Delta", "Phi",   "Gamma",
                                                         "Eta",   "Iota", "Kappa", "Lambda"};
constexpr std::string_view atomic_letters = "SPDFGHIKLMNOQRTUV";
constexpr int largest_label = 1000;  // keeps numbers that people type in bounds

std::string lower(std::string_view text) {
  std::string result;
  for (char c : text) {
    result.push_back(static_cast<char>(std::tolower(static_cast<unsigned char>(c))));
  }
  return result;
}

// "m12g" or "l17u": the number after the letter, which is removed from the text with it.
std::optional<int> take_number(std::string_view& text, char letter) {
  if (text.size() < 2 || text[0] != letter) return std::nullopt;
  int number = 0;
  const auto [end, status] = std::from_chars(text.data() + 1, text.data() + text.size(), number);
  if (status != std::errc() || number < 0 || number > largest_label) return std::nullopt;
  text.remove_prefix(static_cast<std::size_t>(end - text.data()));
  return number;
}

std::optional<int> take_linear_name(std::string_view& text) {
  if (const auto number = take_number(text, 'm')) return number;
  for (std::size_t m = 0; m < greek_names.size(); ++m) {
    if (text.starts_with(lower(greek_names[m]))) {
      text.remove_prefix(greek_names[m].size());
      return static_cast<int>(m);
    }
  }
  if (text.starts_with('h')) {  // a capital eta looks like it
    text.remove_prefix(1);
    return 5;
  }
  return std::nullopt;
}

std::optional<int> take_atomic_name(std::string_view& text) {
  if (const auto number = take_number(text, 'l')) return number;
  if (text.empty()) return std::nullopt;
  const std::size_t l =
      atomic_letters.find(static_cast<char>(std::toupper(static_cast<unsigned char>(text[0]))));
  if (l == std::string_view::npos) return std::nullopt;
  text.remove_prefix(1);
  return static_cast<int>(l);
}

int take_inversion(std::string_view& text) {
  if (text.empty() || (text[0] != 'g' && text[0] != 'u')) return 0;
  const int inversion = text[0] == 'g' ? 1 : -1;
  text.remove_prefix(1);
  return inversion;
}

Error unknown_irrep(const Schoenflies& group, std::string_view text) {
  const char* expected =
      group.family == Family::Kh
          ? "s, p, d, f and so on, with g or u where it is not that of an orbital"
      : group.family == Family::Dinfh
          ? "sigmag+, sigmau-, pig, piu, deltag, phiu and so on, up to lambda, then m9g"
          : "sigma+, sigma-, pi, delta, phi and so on, up to lambda, then m9";
  return Error(fmt::format("{} has no irrep '{}'; expected {}", group.name(), text, expected));
}

}  // namespace

std::string angular_label(Family family, const AngularIrrep& irrep) {
  const auto m = static_cast<std::size_t>(irrep.m);
  const std::string_view parity = irrep.inversion > 0 ? "g" : irrep.inversion < 0 ? "u" : "";
  if (family == Family::Kh) {
    return m < atomic_letters.size() ? fmt::format("{}{}", atomic_letters[m], parity)
                                     : fmt::format("l{}{}", m, parity);
  }
  if (m >= greek_names.size()) return fmt::format("m{}{}", m, parity);
  const std::string_view sign = m > 0 ? "" : irrep.reflection > 0 ? "+" : "-";
  return fmt::format("{}{}{}", greek_names[m], parity, sign);
}

AngularIrrep parse_angular_label(const Schoenflies& group, std::string_view text) {
  const bool spherical = group.family == Family::Kh;
  const std::string lowered = lower(ascii_label(text));
  std::string_view rest = lowered;
  const std::optional<int> m = spherical ? take_atomic_name(rest) : take_linear_name(rest);
  if (!m) throw unknown_irrep(group, text);
  AngularIrrep irrep{*m, 1, take_inversion(rest)};
  if (!spherical && irrep.m == 0 && (rest == "+" || rest == "-")) {
    irrep.reflection = rest == "+" ? 1 : -1;
    rest = {};
  }
  if (spherical && irrep.inversion == 0) irrep.inversion = irrep.m % 2 == 0 ? 1 : -1;
  const bool needs_inversion = group.family != Family::Cinfv;
  if (!rest.empty() || needs_inversion != (irrep.inversion != 0)) throw unknown_irrep(group, text);
  return irrep;
}

std::string ascii_label(std::string_view text) {
  static constexpr std::pair<std::string_view, std::string_view> written[] = {
      {"Σ", "Sigma"}, {"σ", "sigma"}, {"Π", "Pi"},     {"π", "pi"},     {"Δ", "Delta"},
      {"δ", "delta"}, {"Φ", "Phi"},   {"φ", "phi"},    {"ϕ", "phi"},    {"Γ", "Gamma"},
      {"γ", "gamma"}, {"Η", "Eta"},   {"η", "eta"},    {"Ι", "Iota"},   {"ι", "iota"},
      {"Κ", "Kappa"}, {"κ", "kappa"}, {"Λ", "Lambda"}, {"λ", "lambda"}, {"′", "'"},
      {"″", "\""},    {"’", "'"},     {"”", "\""},     {"''", "\""},    {"⁺", "+"},
      {"⁻", "-"},     {"−", "-"},     {"₀", "0"},      {"₁", "1"},      {"₂", "2"},
      {"₃", "3"},     {"₄", "4"},     {"₅", "5"},      {"₆", "6"},      {"₇", "7"},
      {"₈", "8"},     {"₉", "9"}};
  static constexpr std::string_view superscripts[] = {"⁰", "¹", "²", "³", "⁴",
                                                      "⁵", "⁶", "⁷", "⁸", "⁹"};
  std::string result;
  bool in_power = false;
  while (!text.empty()) {
    bool replaced = false;
    for (int digit = 0; digit < 10 && !replaced; ++digit) {
      if (!text.starts_with(superscripts[digit])) continue;
      if (!in_power) result.push_back('^');
      in_power = replaced = true;
      result.push_back(static_cast<char>('0' + digit));
      text.remove_prefix(superscripts[digit].size());
    }
    if (replaced) continue;
    in_power = false;
    for (const auto& [form, ascii] : written) {
      if (!text.starts_with(form)) continue;
      result += ascii;
      text.remove_prefix(form.size());
      replaced = true;
      break;
    }
    if (replaced) continue;
    result.push_back(text[0]);
    text.remove_prefix(1);
  }
  return result;
}

}  // namespace irrepwise
