#include "output/symmetry_words.hpp"

#include <array>
#include <cctype>
#include <utility>

#include <fmt/format.h>

#include "symmetry/irrep.hpp"

namespace irrepwise {
namespace {

constexpr std::array<std::string_view, 10> superscripts = {"⁰", "¹", "²", "³", "⁴",
                                                           "⁵", "⁶", "⁷", "⁸", "⁹"};

enum class Of { Levels, States };  // lower-case labels, or those of irreps

// A number right before a lower-case label is that of a level, 3eg the third one: counts of such
// labels keep away from them.
Words sum_words(const Reduction& reduction, Of of, const char* joiner) {
  std::string words;
  for (const IrrepCount& part : reduction) {
    if (!words.empty()) words += joiner;
    if (part.count > 1)
      words += std::to_string(part.count) + (of == Of::Levels ? "\u00A0×\u00A0" : "");
    words += "{" + (of == Of::Levels ? level_label(part.label) : part.label) + "}";
  }
  return {words.empty() ? "nothing" : words};
}

}  // namespace

std::string superscript(int number) {
  std::string text;
  for (const char digit : std::to_string(number)) {
    text += superscripts[static_cast<std::size_t>(digit - '0')];
  }
  return text;
}

std::string readable_class(std::string_view symbol) {
  std::string text(symbol);
  for (const auto& [ascii, letter] :
       {std::pair<std::string_view, std::string_view>{"sigma", "σ"}, {"phi", "(φ)"}}) {
    if (const std::size_t at = text.find(ascii); at != std::string::npos) {
      text.replace(at, ascii.size(), letter);
    }
  }
  const std::size_t power = text.find('^');
  if (power == std::string::npos) return text;
  std::size_t end = power + 1;
  while (end < text.size() && std::isdigit(static_cast<unsigned char>(text[end])) != 0) ++end;
  const std::string exponent = superscript(std::stoi(text.substr(power + 1, end - power - 1)));
  return text.substr(0, power) + exponent + text.substr(end);
}

std::string readable_functions(const FunctionSet& set) {
  std::string ascii = function_text(set);
  for (const auto& [name, letter] :
       {std::pair<std::string_view, std::string_view>{"phi*", "φ"}, {"phi", "φ"}}) {
    for (std::size_t at = ascii.find(name); at != std::string::npos; at = ascii.find(name)) {
      ascii.replace(at, name.size(), letter);
    }
  }
  std::string text;
  for (const char c : ascii) {
    if (std::isdigit(static_cast<unsigned char>(c)) != 0) {
      // A digit behind a letter is a power, in front of one a factor.
      const bool is_power =
          !text.empty() && std::string_view("(,/−+ ").find(text.back()) == std::string_view::npos;
      text += is_power ? std::string(superscripts[static_cast<std::size_t>(c - '0')])
                       : std::string(1, c);
    } else {
      text += c == '-' ? std::string("−") : std::string(1, c);
    }
  }
  return text;
}

Words reduction_words(const Reduction& reduction) {
  return sum_words(reduction, Of::Levels, " + ");
}

Words mode_words(const Reduction& reduction) { return sum_words(reduction, Of::Levels, ", "); }

Words state_words(const Reduction& reduction) { return sum_words(reduction, Of::States, " + "); }

Words term_words(const std::vector<Term>& terms) {
  std::string words;
  for (const Term& term : terms) {
    if (!words.empty()) words += ", ";
    if (term.count > 1) words += std::to_string(term.count) + " ";
    words += superscript(term.multiplicity) + "{" + term.irrep + "}";
  }
  return {words};
}

}  // namespace irrepwise
