#include "figure/svg.hpp"

#include <doctest/doctest.h>

#include "figure/rich_text.hpp"

using namespace irrepwise;

TEST_CASE("base64 is that of RFC 4648, section 10") {
  CHECK(base64("") == "");
  CHECK(base64("f") == "Zg==");
  CHECK(base64("fo") == "Zm8=");
  CHECK(base64("foo") == "Zm9v");
  CHECK(base64("foob") == "Zm9vYg==");
  CHECK(base64("fooba") == "Zm9vYmE=");
  CHECK(base64("foobar") == "Zm9vYmFy");
}

TEST_CASE(
    "an SVG document has title and description, escapes what it quotes, and shifts scripts "
    "back to the base line") {
  Figure figure;
  figure.width = 100;
  figure.height = 50;
  figure.title = "a < b & \"c\"";
  figure.description = "two\nlines";
  Text text;
  text.at = {10, 20};
  text.runs = label_text("1a2\"");
  figure.groups.push_back({"level", "1a2\"", "", {text}});
  const std::string svg = svg_document(figure);
  const auto holds = [&](const char* part) { return svg.find(part) != std::string::npos; };
  CHECK(holds("<title id=\"figure-title\">a &lt; b &amp; &quot;c&quot;</title>"));
  CHECK(holds("<desc id=\"figure-description\">two lines</desc>"));
  CHECK(holds("<g class=\"level\" data-name=\"1a2&quot;\">"));
  // 12 px: the subscript drops by 0.22 of it and the prime comes back up by the same.
  CHECK(holds("1a<tspan dy=\"2.64\" font-size=\"8.64\">2</tspan><tspan dy=\"-2.64\">″</tspan>"));
}
