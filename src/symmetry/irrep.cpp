#include "symmetry/irrep.hpp"

#include <cctype>
#include <string_view>
#include <utility>

namespace irrepwise {

std::string level_label(const std::string& irrep_label) {
  std::string label = irrep_label;
  if (!label.empty()) {
    label[0] = static_cast<char>(std::tolower(static_cast<unsigned char>(label[0])));
  }
  return label;
}

std::string readable_label(const std::string& ascii_label) {
  static constexpr std::pair<std::string_view, std::string_view> greek[] = {
      {"Sigma", "Σ"},  {"sigma", "σ"},  {"Pi", "Π"},    {"pi", "π"},    {"Delta", "Δ"},
      {"delta", "δ"},  {"Phi", "Φ"},    {"phi", "φ"},   {"Gamma", "Γ"}, {"gamma", "γ"},
      {"Lambda", "Λ"}, {"lambda", "λ"}, {"Kappa", "Κ"}, {"kappa", "κ"}, {"Iota", "Ι"},
      {"iota", "ι"},   {"Eta", "Η"},    {"eta", "η"}};
  for (const auto& [ascii, letter] : greek) {
    const std::size_t at = ascii_label.find(ascii);
    if (at == std::string::npos) continue;
    std::string label = ascii_label;
    label.replace(at, ascii.size(), letter);
    if (ascii == "sigma" && label.back() == '+') label.pop_back();
    return label;
  }
  return ascii_label;
}

}  // namespace irrepwise
