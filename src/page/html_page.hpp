// The frame of a page: head, style, sections, data and script in one self-contained HTML file.
#pragma once

#include <string>
#include <vector>

#include "output/table.hpp"

namespace irrepwise {

/// A part of the page under its own heading, reached from the list at its top.
struct PageSection {
  std::string id;       // "symmetry"
  std::string heading;  // words
  std::string html;
};

struct HtmlPage {
  std::string title;      // words
  std::string head_html;  // what stands below the title
  std::vector<PageSection> sections;
  std::string data;       // JSON as from `page_data`
  std::string generator;  // "irrepwise 0.1.0"
};

/// @returns  HTML (the living standard of WHATWG) that asks the network for nothing
[[nodiscard]] std::string html_document(const HtmlPage& page);

[[nodiscard]] std::string tables_html(const std::vector<Table>& tables);

}  // namespace irrepwise
