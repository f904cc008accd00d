#include "figure/utf8.hpp"

#include <cstddef>

namespace irrepwise {

std::u32string code_points(std::string_view utf8) {
  constexpr char32_t broken = 0xFFFD;
  std::u32string out;
  std::size_t i = 0;
  while (i < utf8.size()) {
    const auto first = static_cast<unsigned char>(utf8[i++]);
    if (first < 0x80) {
      out += static_cast<char32_t>(first);
      continue;
    }
    const int more = first >= 0xF0 && first < 0xF8 ? 3 : first >= 0xE0 ? 2 : first >= 0xC2 ? 1 : 0;
    if (more == 0 || first >= 0xF8) {
      out += broken;
      continue;
    }
    char32_t code = first & (0x3Fu >> more);
    int found = 0;
    while (found < more && i < utf8.size() &&
           (static_cast<unsigned char>(utf8[i]) & 0xC0u) == 0x80u) {
      code = (code << 6) | (static_cast<unsigned char>(utf8[i]) & 0x3Fu);
      ++i;
      ++found;
    }
    out += found == more ? code : broken;
  }
  return out;
}

}  // namespace irrepwise
