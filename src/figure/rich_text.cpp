#include "figure/rich_text.hpp"

#include <algorithm>
#include <array>
#include <cctype>
#include <cmath>
#include <cstddef>
#include <cstdlib>
#include <string_view>

#include <fmt/format.h>

#include "symmetry/irrep.hpp"

namespace irrepwise {
namespace {

bool is_digit(char c) { return std::isdigit(static_cast<unsigned char>(c)) != 0; }

// Bytes of the first UTF-8 character.
std::size_t first_character(std::string_view text) {
  std::size_t size = 1;
  while (size < text.size() && (static_cast<unsigned char>(text[size]) & 0xC0u) == 0x80u) ++size;
  return size;
}

void add(RichText& runs, const std::string& text, Script script) {
  if (text.empty()) return;
  if (!runs.empty() && runs.back().script == script) {
    runs.back().text += text;
  } else {
    runs.push_back({text, script});
  }
}

}  // namespace

RichText label_text(const std::string& ascii) {
  const std::string label = readable_label(ascii);
  RichText runs;
  std::size_t at = 0;
  while (at < label.size() && is_digit(label[at])) ++at;  // the number of the level
  if (at < label.size()) at += first_character(std::string_view(label).substr(at));
  add(runs, label.substr(0, at), Script::Normal);
  std::string sub;
  std::string super;
  for (; at < label.size(); ++at) {
    const char c = label[at];
    if (c == '\'') {
      super += "′";
    } else if (c == '"') {
      super += "″";
    } else if (c == '+') {
      super += "+";
    } else if (c == '-') {
      super += "−";
    } else {
      sub += c;
    }
  }
  add(runs, sub, Script::Sub);
  // Primes are drawn high already and need no smaller size.
  if (!super.empty()) {
    const bool sign = super == "+" || super == "−";
    add(runs, super, sign ? Script::Super : Script::Normal);
  }
  return runs;
}

RichText plain_text(const std::string& text) { return {{text, Script::Normal}}; }

RichText heading_text(const std::string& text) {
  struct Sign {
    std::string_view sign;
    const char* plain;
    Script script;
  };
  constexpr std::array<Sign, 22> signs = {
      {{"₀", "0", Script::Sub},   {"₁", "1", Script::Sub},   {"₂", "2", Script::Sub},
       {"₃", "3", Script::Sub},   {"₄", "4", Script::Sub},   {"₅", "5", Script::Sub},
       {"₆", "6", Script::Sub},   {"₇", "7", Script::Sub},   {"₈", "8", Script::Sub},
       {"₉", "9", Script::Sub},   {"⁰", "0", Script::Super}, {"¹", "1", Script::Super},
       {"²", "2", Script::Super}, {"³", "3", Script::Super}, {"⁴", "4", Script::Super},
       {"⁵", "5", Script::Super}, {"⁶", "6", Script::Super}, {"⁷", "7", Script::Super},
       {"⁸", "8", Script::Super}, {"⁹", "9", Script::Super}, {"⁺", "+", Script::Super},
       {"⁻", "−", Script::Super}}};
  RichText runs;
  for (std::string_view rest = text; !rest.empty();) {
    const std::string_view character = rest.substr(0, first_character(rest));
    const auto sign = std::find_if(signs.begin(), signs.end(),
                                   [&](const Sign& one) { return one.sign == character; });
    if (sign != signs.end()) {
      add(runs, sign->plain, sign->script);
    } else {
      add(runs, std::string(character), Script::Normal);
    }
    rest.remove_prefix(character.size());
  }
  return runs;
}

RichText formula_text(const Molecule& molecule) {
  RichText runs;
  for (const char c : hill_formula(molecule)) {
    add(runs, std::string(1, c), is_digit(c) ? Script::Sub : Script::Normal);
  }
  const int charge = molecule.charge();
  if (charge != 0) {
    const std::string size = std::abs(charge) == 1 ? "" : std::to_string(std::abs(charge));
    add(runs, size + (charge > 0 ? "+" : "−"), Script::Super);
  }
  return runs;
}

RichText group_text(const std::string& symbol) {
  RichText runs;
  add(runs, symbol.substr(0, 1), Script::Normal);
  std::string rest = symbol.substr(1);
  if (rest.starts_with("inf")) rest.replace(0, 3, "∞");
  add(runs, rest, Script::Sub);
  return runs;
}

std::string energy_words(double energy_ev, int digits) {
  const std::string size = fmt::format("{:.{}f}", std::abs(energy_ev), digits);
  const bool zero = size.find_first_not_of("0.") == std::string::npos;
  return (energy_ev < 0.0 && !zero ? "−" : "") + size + " eV";
}

RichText operator+(RichText first, const RichText& second) {
  first.insert(first.end(), second.begin(), second.end());
  return first;
}

}  // namespace irrepwise
