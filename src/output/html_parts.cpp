#include "output/html_parts.hpp"

#include "output/html_text.hpp"

namespace irrepwise {

std::string facts_html(const std::vector<Fact>& facts) {
  if (facts.empty()) return {};
  std::string out = "<dl class=\"facts\">\n";
  for (const Fact& fact : facts) {
    out += "<dt>" + html_text(fact.name) + "</dt>";
    for (const std::string& line : fact.lines) out += "<dd>" + html_words(line) + "</dd>";
    out += '\n';
  }
  return out + "</dl>\n";
}

std::string warnings_html(const std::vector<std::string>& warnings) {
  if (warnings.empty()) return {};
  std::string out = "<section class=\"warnings\">\n<h2>Warnings</h2>\n<ul>\n";
  for (const std::string& warning : warnings) out += "<li>" + html_words(warning) + "</li>\n";
  return out + "</ul>\n</section>\n";
}

std::string remarks_html(const std::vector<std::string>& remarks) {
  std::string out;
  for (const std::string& remark : remarks) {
    out += "<p class=\"remark\">" + html_words(remark) + "</p>\n";
  }
  return out;
}

}  // namespace irrepwise
