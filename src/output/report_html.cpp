#include "output/html_parts.hpp"
#include "output/html_text.hpp"
#include "output/page_style.hpp"
#include "output/report.hpp"
#include "output/table_html.hpp"

namespace irrepwise {
std::string report_html(const Report& report) {
  std::string out =
      "<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n"
      "<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n"
      "<meta name=\"color-scheme\" content=\"light dark\">\n";
  out += "<title>" + html_text(report.title) + "</title>\n<style>\n";
  out += page_style();
  out += table_style();
  out += "</style>\n</head>\n<body>\n<main>\n<h1>" + html_text(report.title) + "</h1>\n";
  out += facts_html(report.facts);
  for (const Table& table : report.tables) out += table_html(table);
  out += warnings_html(report.warnings) + remarks_html(report.remarks);
  return out + "</main>\n</body>\n</html>\n";
}

}  // namespace irrepwise
