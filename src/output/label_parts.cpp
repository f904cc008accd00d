#include "output/label_parts.hpp"

#include <cstddef>

#include "symmetry/irrep.hpp"

namespace irrepwise {
namespace {

bool is_digit(char c) { return c >= '0' && c <= '9'; }
bool goes_on(char c) { return (static_cast<unsigned char>(c) & 0xC0u) == 0x80u; }  // UTF-8

}  // namespace

LabelParts label_parts(const std::string& ascii) {
  const std::string label = readable_label(ascii);
  LabelParts parts;
  std::size_t at = 0;
  while (at < label.size() && is_digit(label[at])) parts.number += label[at++];
  if (at < label.size()) parts.letter += label[at++];
  while (at < label.size() && goes_on(label[at])) parts.letter += label[at++];
  for (; at < label.size(); ++at) {
    const char c = label[at];
    if (c == '\'') {
      parts.primes += 1;
    } else if (c == '"') {
      parts.primes += 2;
    } else if (c == '+' || c == '-') {
      parts.above += c;
    } else {
      parts.below += c;
    }
  }
  return parts;
}

}  // namespace irrepwise
