// A table as Markdown.
#pragma once

#include <string>
#include <string_view>

#include "output/table.hpp"

namespace irrepwise {

/// A pipe table, readable in source too. Numbers of a decimal column are filled up with figure
/// spaces, so that they align at the point when rendered as well.
[[nodiscard]] std::string table_markdown(const Table& table);

/// Plain words as Markdown: characters that mean something there get a backslash.
[[nodiscard]] std::string markdown_text(std::string_view text);

}  // namespace irrepwise
