// How a page looks: colours for light and dark, letters, the column of text.
#pragma once

#include <string_view>

namespace irrepwise {

/// CSS that sets --ink, --muted, --faint, --paper and --accent for light, dark and print, and
/// styles `main`, headings, `dl.facts`, `.warnings` and `.remark`. Needs no file and no network.
[[nodiscard]] std::string_view page_style();

}  // namespace irrepwise
