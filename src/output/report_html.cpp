#include "output/html_text.hpp"
#include "output/page_style.hpp"
#include "output/report.hpp"
#include "output/table_html.hpp"

namespace irrepwise {
namespace {

std::string facts_html(const std::vector<Fact>& facts) {
  if (facts.empty()) return {};
  std::string out = "<dl class=\"facts\">\n";
  for (const Fact& fact : facts) {
    out += "<dt>" + html_text(fact.name) + "</dt>";
    for (const std::string& line : fact.lines) out += "<dd>" + html_text(line) + "</dd>";
    out += '\n';
  }
  return out + "</dl>\n";
}

}  // namespace

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
  if (!report.warnings.empty()) {
    out += "<section class=\"warnings\">\n<h2>Warnings</h2>\n<ul>\n";
    for (const std::string& warning : report.warnings) {
      out += "<li>" + html_text(warning) + "</li>\n";
    }
    out += "</ul>\n</section>\n";
  }
  for (const std::string& remark : report.remarks) {
    out += "<p class=\"remark\">" + html_text(remark) + "</p>\n";
  }
  return out + "</main>\n</body>\n</html>\n";
}

}  // namespace irrepwise
