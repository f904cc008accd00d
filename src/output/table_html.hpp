// A table as HTML.
#pragma once

#include <string>
#include <string_view>

#include "output/table.hpp"

namespace irrepwise {

/// A fragment: `<div class="table">` with a `<table>` (caption, head, a `<tbody>` for each part
/// between separators, the separator's words as its first row, a `<th>` across) and the notes
/// below. Every head cell carries `data-key`, every cell `data-value` with `cell_exact`, so that a
/// script can sort and copy. Numbers of a decimal column are filled up with figure spaces and stand
/// to the right by `table_style`, so that they align at the point.
[[nodiscard]] std::string table_html(const Table& table);

/// CSS for the fragment. It takes its colours from the custom properties --ink, --muted, --faint
/// and
/// --paper of the page.
[[nodiscard]] std::string_view table_style();

}  // namespace irrepwise
