#include "output/table_html.hpp"

#include <doctest/doctest.h>

#include "output/html_text.hpp"
#include "output/report.hpp"

using namespace irrepwise;

namespace {

Table small_table() {
  Table table;
  table.caption = "Levels <of> \"a\" & b";
  table.columns = {{"label", "level", "", Align::Left, 0, false},
                   {"energy_ev", "energy", "eV", Align::Decimal, 0, false},
                   {"2e1g", ":2", "", Align::Right, 0, false, "2e1g"}};
  table.lines.emplace_back(Row{{SymmetryLabel{"1a1\""}, Number{-9.8765, 3}, std::string("x<y")}});
  table.lines.emplace_back(Separator{"gap & more"});
  table.lines.emplace_back(Row{{SymmetryLabel{"piu"}, Number{12, 0}, Cell{}}});
  table.notes = {"a note"};
  return table;
}

bool holds(const std::string& text, const std::string& part) {
  return text.find(part) != std::string::npos;
}

}  // namespace

TEST_CASE("words are safe between tags and in attributes") {
  CHECK(html_text("a<b> & \"c\" 'd' é") == "a&lt;b&gt; &amp; &quot;c&quot; &#39;d&#39; é");
  CHECK(html_text(std::string("a\x01z\x7F")) == "a\uFFFDz\uFFFD");
}

TEST_CASE("labels are typeset with what stands below and above the line") {
  // Mulliken, J. Chem. Phys. 23, 1997 (1955): number, letter, subscripts, primes and signs above.
  CHECK(html_label("2e1g") == "2<i>e</i><sub>1g</sub>");
  CHECK(html_label("A1\"") == "<i>A</i><sub>1</sub>″");
  CHECK(html_label("3e'") == "3<i>e</i>′");
  CHECK(html_label("Sigmag+") == "<i>Σ</i><sub>g</sub><sup>+</sup>");
  CHECK(html_label("Sigma-") == "<i>Σ</i><sup>−</sup>");
  CHECK(html_label("1sigmag+") == "1<i>σ</i><sub>g</sub>");  // a level's σ has no sign
  CHECK(html_label("10t2") == "10<i>t</i><sub>2</sub>");
}

TEST_CASE("every cell carries its exact value, every head its key") {
  const std::string html = table_html(small_table());
  CHECK(holds(
      html,
      "<caption><div class=\"caption\">Levels &lt;of&gt; &quot;a&quot; &amp; b</div></caption>"));
  CHECK(holds(html, "<th scope=\"col\" class=\"word\" data-key=\"label\">level</th>"));
  CHECK(holds(html,
              "<th scope=\"col\" class=\"number\" data-key=\"energy_ev\">energy <span "
              "class=\"unit\">/ eV</span></th>"));
  CHECK(holds(html, "data-key=\"2e1g\">2<i>e</i><sub>1g</sub>:2</th>"));
  CHECK(holds(html, "<td class=\"word\" data-value=\"1a1&quot;\">1<i>a</i><sub>1</sub>″</td>"));
  CHECK(holds(html, "data-value=\"-9.8765\""));
  CHECK(holds(html, "data-value=\"x&lt;y\">x&lt;y</td>"));
  CHECK(holds(html, "data-value=\"\"></td>"));
  CHECK(holds(html, "<p class=\"note\">a note</p>"));
}

TEST_CASE("numbers of a column end at the same width behind the point") {
  const std::string html = table_html(small_table());
  CHECK(holds(html, ">−9.877</td>"));
  CHECK(holds(html, ">12\u2008\u2007\u2007\u2007</td>"));
}

TEST_CASE("a separator starts a new part with its words across the table") {
  const std::string html = table_html(small_table());
  CHECK(holds(html,
              "</tr>\n</tbody>\n<tbody>\n<tr class=\"separator\"><th scope=\"rowgroup\" "
              "colspan=\"3\">gap &amp; more</th></tr>\n"));
  Table table = small_table();
  table.lines.insert(table.lines.begin(), Separator{"first"});
  // No empty part before a separator that comes first.
  CHECK(holds(table_html(table), "</thead>\n<tbody>\n<tr class=\"separator\">"));
}

TEST_CASE("a page stands alone: style inside, nothing to fetch, everything escaped") {
  Report report;
  report.title = "<script>alert(1)</script>";
  report.facts = {{"formula", {"A & B", "second"}}};
  report.tables = {small_table()};
  report.warnings = {"mind > this"};
  report.remarks = {"a remark"};
  const std::string page = report_html(report);
  CHECK(page.starts_with("<!DOCTYPE html>\n<html lang=\"en\">"));
  CHECK(page.ends_with("</html>\n"));
  CHECK_FALSE(holds(page, "<script"));
  CHECK_FALSE(holds(page, "http"));
  CHECK_FALSE(holds(page, "url("));
  CHECK(holds(page, "<title>&lt;script&gt;alert(1)&lt;/script&gt;</title>"));
  CHECK(holds(page, "<dt>formula</dt><dd>A &amp; B</dd><dd>second</dd>"));
  CHECK(holds(page, "<li>mind &gt; this</li>"));
  CHECK(holds(page, "<p class=\"remark\">a remark</p>"));
  CHECK(holds(page, "prefers-color-scheme: dark"));
  CHECK(holds(page, "@media print"));
}

TEST_CASE("lines of a DOS file lose their carriage returns, bytes outside UTF-8 become marks") {
  CHECK(html_text("3\r\nwater\r\n") == "3\nwater\n");
  CHECK(html_text("a\rb") ==
        "a\uFFFD"
        "b");
  CHECK(html_text("caf\xe9") == "caf\uFFFD");
  CHECK(html_text("caf\u00e9") == "caf\u00e9");
}
