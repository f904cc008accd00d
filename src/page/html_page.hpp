// The frame of a page: head, style, sections, data and script in one self-contained HTML file.
#pragma once

#include <string>
#include <vector>

#include "output/report.hpp"

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

/// Names and lines of facts as a list of definitions.
[[nodiscard]] std::string facts_html(const std::vector<Fact>& facts);

/// Each text as a paragraph.
[[nodiscard]] std::string paragraphs_html(const std::vector<std::string>& texts);

/// Warnings in a box of their own, or nothing.
[[nodiscard]] std::string warnings_html(const std::vector<std::string>& warnings);

}  // namespace irrepwise
