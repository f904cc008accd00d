#include "page/html_page.hpp"

#include <array>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "figure/palette.hpp"
#include "figure/svg.hpp"
#include "output/html_text.hpp"
#include "output/page_style.hpp"
#include "output/table_html.hpp"

namespace irrepwise {

// Embedded by the build from src/page/assets.
extern const std::string_view page_css;
extern const std::string_view page_surfaces_js;
extern const std::string_view page_view_js;
extern const std::string_view page_tables_js;
extern const std::string_view page_levels_js;

namespace {

// Colours of figures that follow the page from light to dark, and the variable that each becomes.
constexpr std::array<std::pair<std::string_view, Colour>, 7> themed = {{
    {"ink", palette::ink},
    {"muted", palette::muted},
    {"faint", palette::faint},
    {"grid", palette::grid},
    {"empty", palette::empty},
    {"accent", palette::homo},
    {"lumo", palette::lumo},
}};

std::string themed_figures() {
  std::string rules;
  for (const auto& [variable, colour] : themed) {
    const std::string code = colour_code(colour);
    rules += fmt::format(
        "svg [fill=\"{0}\"] {{ fill: var(--{1}); }}\nsvg [stroke=\"{0}\"] {{ stroke: var(--{1}); "
        "}}\n",
        code, variable);
  }
  return std::string(page_style()) + std::string(table_style()) + std::string(page_css) + rules;
}

std::string navigation(const std::vector<PageSection>& sections) {
  std::string html = "<nav aria-label=\"Sections\">\n";
  for (const PageSection& section : sections) {
    html += fmt::format("<a href=\"#{}\">{}</a>\n", section.id, html_text(section.heading));
  }
  return html + "</nav>\n";
}

}  // namespace

std::string html_document(const HtmlPage& page) {
  std::string html = fmt::format(
      "<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n"
      "<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n"
      "<meta name=\"generator\" content=\"{}\">\n<title>{}</title>\n"
      // An icon of nothing: a browser that is shown a file over http would ask for one.
      "<link rel=\"icon\" href=\"data:,\">\n<style>\n{}</style>\n</head>\n<body>\n",
      html_text(page.generator), html_text(page.title), themed_figures());
  html += fmt::format(
      "<header>\n<div class=\"top\"><h1>{}</h1>"
      "<button type=\"button\" id=\"theme\">Dark</button></div>\n{}{}</header>\n"
      "<main>\n",
      html_text(page.title), page.head_html, navigation(page.sections));
  for (const PageSection& section : page.sections) {
    html += fmt::format(
        "<section id=\"{0}\" aria-labelledby=\"{0}-heading\">\n"
        "<h2 id=\"{0}-heading\">{1}</h2>\n{2}</section>\n",
        section.id, html_text(section.heading), section.html);
  }
  html += fmt::format(
      "</main>\n<footer class=\"small\">{}</footer>\n"
      "<script type=\"application/json\" id=\"page-data\">{}</script>\n<script>\n",
      html_text(page.generator), page.data);
  html += page_surfaces_js;
  html += page_view_js;
  html += page_tables_js;
  html += page_levels_js;
  return html + "</script>\n</body>\n</html>\n";
}

std::string tables_html(const std::vector<Table>& tables) {
  std::string html;
  for (const Table& table : tables) html += table_html(table);
  return html;
}

}  // namespace irrepwise
