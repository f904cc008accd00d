#include "output/html_text.hpp"

#include <cstddef>

#include "core/parse.hpp"
#include "output/label_parts.hpp"
#include "output/orbital_notation.hpp"

namespace irrepwise {

std::string html_text(std::string_view text) {
  std::string out;
  const std::string valid = valid_utf8(text);
  for (std::size_t i = 0; i < valid.size(); ++i) {
    const char c = valid[i];
    if (c == '\r' && i + 1 < valid.size() && valid[i + 1] == '\n') continue;  // of a DOS file
    switch (c) {
      case '&':
        out += "&amp;";
        break;
      case '<':
        out += "&lt;";
        break;
      case '>':
        out += "&gt;";
        break;
      case '"':
        out += "&quot;";
        break;
      case '\'':
        out += "&#39;";
        break;
      default: {
        const auto byte = static_cast<unsigned char>(c);
        const bool control = (byte < 0x20 && c != '\t' && c != '\n') || byte == 0x7F;
        if (control) {
          out += "\uFFFD";
        } else {
          out += c;
        }
      }
    }
  }
  return out;
}

namespace {

// A line may not break behind the hyphens of "--variants".
std::string with_whole_options(const std::string& html) {
  const auto is_letter = [&](std::size_t at) {
    return at < html.size() && html[at] >= 'a' && html[at] <= 'z';
  };
  std::string out;
  for (std::size_t at = 0; at < html.size();) {
    const bool starts = html.compare(at, 2, "--") == 0 && is_letter(at + 2) &&
                        (at == 0 || html[at - 1] == ' ' || html[at - 1] == '(');
    if (!starts) {
      out += html[at++];
      continue;
    }
    std::size_t end = at + 2;
    while (is_letter(end) || (end < html.size() && html[end] == '-')) ++end;
    out += "<span style=\"white-space:nowrap\">" + html.substr(at, end - at) + "</span>";
    at = end;
  }
  return out;
}

}  // namespace

std::string html_words(std::string_view words) {
  std::string out;
  for (const NotationRun& run : notation_runs(words)) {
    if (run.below.empty()) {
      out += with_whole_options(html_text(run.text));
      continue;
    }
    out += html_text(run.text);
    if (run.notation == Notation::Symmetry) {
      out += "<sub>" + run.below + "</sub>";
      for (const char prime : run.primes) out += prime == '"' ? "″" : "′";
      continue;
    }
    std::string below;
    for (std::size_t i = 0; i < run.below.size(); ++i) {
      const char c = run.below[i];
      if (is_exponent(run.below, i)) {
        below += c == '2' ? "²" : "³";
      } else {
        below += c == '-' ? "−" : std::string(1, c);
      }
    }
    out += "<sub>" + below + "</sub>";
  }
  return out;
}

std::string html_label(const std::string& ascii) {
  const LabelParts parts = label_parts(ascii);
  std::string out = html_text(parts.number);
  if (!parts.letter.empty()) out += "<i>" + html_text(parts.letter) + "</i>";
  if (!parts.below.empty()) out += "<sub>" + html_text(parts.below) + "</sub>";
  if (!parts.above.empty()) out += "<sup>" + std::string(parts.above == "-" ? "−" : "+") + "</sup>";
  if (parts.primes == 1) out += "′";
  if (parts.primes > 1) out += "″";
  return out;
}

}  // namespace irrepwise
