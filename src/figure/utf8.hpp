// UTF-8 to code points, for text that is drawn glyph by glyph.
#pragma once

#include <string>
#include <string_view>

namespace irrepwise {

/// @returns  one code point per character; a broken sequence gives U+FFFD
/// @source   RFC 3629
[[nodiscard]] std::u32string code_points(std::string_view utf8);

}  // namespace irrepwise
