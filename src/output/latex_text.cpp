#include "output/latex_text.hpp"

#include <algorithm>
#include <array>
#include <cctype>
#include <cstddef>
#include <utility>

#include "output/label_parts.hpp"
#include "output/orbital_notation.hpp"

namespace irrepwise {
namespace {

using Replacement = std::pair<std::string_view, std::string_view>;

constexpr std::array<Replacement, 19> in_text = {{
    {"\\", "\\textbackslash{}"},
    {"{", "\\{"},
    {"}", "\\}"},
    {"$", "\\$"},
    {"&", "\\&"},
    {"%", "\\%"},
    {"#", "\\#"},
    {"_", "\\_"},
    {"^", "\\textasciicircum{}"},
    {"~", "\\textasciitilde{}"},
    {"`", "\\textasciigrave{}"},
    {"<", "\\textless{}"},
    {">", "\\textgreater{}"},
    {"--", "-{}-"},
    {"\u00A0", "~"},
    {"Å", "\\AA{}"},
    {"°", "$^{\\circ}$"},
    {"–", "--"},
    {"…", "\\ldots{}"},
}};

// Written in mathematics.
constexpr std::array<Replacement, 58> in_mathematics = {{
    {"×", "\\times"},
    {"−", "-"},
    {"·", "\\cdot"},
    {"∞", "\\infty"},
    {"√", "\\surd"},
    {"→", "\\to"},
    {"↔", "\\leftrightarrow"},
    {"⊗", "\\otimes"},
    {"≡", "\\equiv"},
    {"′", "'"},
    {"″", "''"},
    {"ᵀ", "^{\\mathrm{T}}"},
    {"φ", "\\phi"},
    {"ϕ", "\\phi"},
    {"ε", "\\varepsilon"},
    {"ζ", "\\zeta"},
    {"χ", "\\chi"},
    {"σ", "\\sigma"},
    {"π", "\\pi"},
    {"δ", "\\delta"},
    {"γ", "\\gamma"},
    {"η", "\\eta"},
    {"ι", "\\iota"},
    {"κ", "\\kappa"},
    {"λ", "\\lambda"},
    {"Σ", "\\Sigma"},
    {"Π", "\\Pi"},
    {"Δ", "\\Delta"},
    {"Φ", "\\Phi"},
    {"Γ", "\\Gamma"},
    {"Λ", "\\Lambda"},
    {"Η", "\\mathrm{H}"},
    {"Ι", "\\mathrm{I}"},
    {"Κ", "\\mathrm{K}"},
    {"⁰", "^{0}"},
    {"₀", "_{0}"},
    {"¹", "^{1}"},
    {"₁", "_{1}"},
    {"²", "^{2}"},
    {"₂", "_{2}"},
    {"³", "^{3}"},
    {"₃", "_{3}"},
    {"⁴", "^{4}"},
    {"₄", "_{4}"},
    {"⁵", "^{5}"},
    {"₅", "_{5}"},
    {"⁶", "^{6}"},
    {"₆", "_{6}"},
    {"⁷", "^{7}"},
    {"₇", "_{7}"},
    {"⁸", "^{8}"},
    {"₈", "_{8}"},
    {"⁹", "^{9}"},
    {"₉", "_{9}"},
    {"┌", "\\lceil"},
    {"└", "\\lfloor"},
    {"⁺", "^{+}"},
    {"⁻", "^{-}"},
}};

template <std::size_t n>
const Replacement* start_of(std::string_view text, const std::array<Replacement, n>& list) {
  const auto* found = std::find_if(list.begin(), list.end(), [&](const Replacement& replacement) {
    return text.starts_with(replacement.first);
  });
  return found == list.end() ? nullptr : found;
}

bool is_word(char c) { return std::isalnum(static_cast<unsigned char>(c)) != 0; }
bool is_letter(char c) { return std::isalpha(static_cast<unsigned char>(c)) != 0; }

// "$C_{4h}$", "$C_{2}'$", "$C_{\infty v}$"
std::string latex_symbol(const NotationRun& run) {
  const auto in_symbols = [](std::string_view text) {
    std::string out;
    while (!text.empty()) {
      const Replacement* sign = start_of(text, in_mathematics);
      if (!out.empty() && out.back() != ' ' && sign) out += ' ';
      out += sign ? std::string(sign->second) + " " : std::string(1, text.front());
      text.remove_prefix(sign ? sign->first.size() : 1);
    }
    if (out.ends_with(' ')) out.pop_back();
    return out;
  };
  std::string primes;
  for (const char prime : run.primes) primes += prime == '"' ? "''" : "'";
  return "$" + in_symbols(run.text) + "_{" + in_symbols(run.below) + "}" + primes + "$";
}

}  // namespace

std::string latex_text(std::string_view text) {
  std::string out;
  bool after_symbol = false;  // a letter, a digit or a prime
  while (!text.empty()) {
    std::size_t used = 1;
    if (const Replacement* plain = start_of(text, in_text)) {
      out += plain->second;
      used = plain->first.size();
    } else if (const Replacement* sign = start_of(text, in_mathematics)) {
      out += "$" + std::string(sign->second) + "$";
      used = sign->first.size();
    } else if (text.front() == '\'' && after_symbol && (text.size() < 2 || !is_letter(text[1]))) {
      out += "$'$";
    } else {
      out += text.front();
    }
    const bool is_prime = out.ends_with("$'$");
    after_symbol = is_word(text[used - 1]) || is_prime;
    text.remove_prefix(used);
  }
  return out;
}

std::string latex_words(std::string_view words) {
  std::string out;
  for (const NotationRun& run : notation_runs(words)) {
    if (run.below.empty()) {
      out += latex_text(run.text);
      continue;
    }
    if (run.notation == Notation::Symmetry) {
      out += latex_symbol(run);
      continue;
    }
    // The letter of the shell stands upright, as where nothing is below: "2s".
    out += "$" + run.text.substr(0, 1) + "\\mathrm{" + run.text.substr(1) + "}_{";
    for (std::size_t i = 0; i < run.below.size();) {
      const std::string_view rest = std::string_view(run.below).substr(i);
      const Replacement* letter = start_of(rest, in_mathematics);
      if (is_exponent(run.below, i)) out += '^';
      out += letter ? std::string(letter->second) + " " : std::string(1, rest.front());
      i += letter ? letter->first.size() : 1;
    }
    if (out.ends_with(' ')) out.pop_back();
    out += "}$";
  }
  return out;
}

std::string latex_label(const std::string& ascii) {
  const LabelParts parts = label_parts(ascii);
  const Replacement* letter = start_of(parts.letter, in_mathematics);
  std::string out = "$" + parts.number + (letter ? std::string(letter->second) : parts.letter);
  if (!parts.below.empty()) out += "_{" + parts.below + "}";
  if (!parts.above.empty()) out += "^{" + parts.above + "}";
  return out + std::string(static_cast<std::size_t>(parts.primes), '\'') + "$";
}

}  // namespace irrepwise
