#include <cmath>

#include <doctest/doctest.h>

#include "figure/font.hpp"
#include "figure/rich_text.hpp"
#include "figure/text_layout.hpp"
#include "figure/utf8.hpp"

using namespace irrepwise;

namespace {

std::string marked(const RichText& runs) {
  std::string text;
  for (const TextRun& run : runs) {
    text += run.script == Script::Sub ? "_" : run.script == Script::Super ? "^" : "";
    text += run.text;
    if (run.script != Script::Normal) text += "|";
  }
  return text;
}

}  // namespace

TEST_CASE("signs that stand below and above in a heading are set as scripts") {
  CHECK(marked(heading_text("Cl₄Pt²⁻, trans")) == "Cl_4|Pt^2−|, trans");
  CHECK(marked(heading_text("C₁₂H⁺")) == "C_12|H^+|");
  CHECK(marked(heading_text("η5-ring")) == "η5-ring");
}

TEST_CASE("labels are set with their number in line, the rest below, primes after it") {
  // As Mulliken's symbols are printed (J. Chem. Phys. 23, 1997 (1955)).
  CHECK(marked(label_text("2e1g")) == "2e_1g|");
  CHECK(marked(label_text("12t2u")) == "12t_2u|");
  CHECK(marked(label_text("1a2\"")) == "1a_2|″");
  CHECK(marked(label_text("3e'")) == "3e′");
  CHECK(marked(label_text("1sigmag+")) == "1σ_g|");
  CHECK(marked(label_text("Sigmau-")) == "Σ_u|^−|");
  CHECK(marked(label_text("2piu")) == "2π_u|");
  CHECK(marked(label_text("1a")) == "1a");
}

TEST_CASE("formulas and groups are set as chemists write them") {
  const Molecule molecule({{78, {0, 0, 0}}, {17, {2.3, 0, 0}}, {17, {-2.3, 0, 0}}}, -2);
  CHECK(marked(formula_text(molecule)) == "Cl_2|Pt^2−|");
  CHECK(marked(group_text("D4h")) == "D_4h|");
  CHECK(marked(group_text("Dinfh")) == "D_∞h|");
}

TEST_CASE("lines are broken at spaces, keep every word, and are no wider than asked") {
  const Font font;
  const RichText text =
      plain_text("one two D") + RichText{{"4h", Script::Sub}} + plain_text(" three four five");
  const std::vector<RichText> lines = wrapped(font, text, 12.0, 60.0);
  CHECK(lines.size() > 1);
  std::string all;
  for (const RichText& line : lines) {
    CHECK(font.width(line, 12.0) <= 60.0);
    all += (all.empty() ? "" : " ") + marked(line);
  }
  CHECK(all == "one two D_4h| three four five");
}

TEST_CASE("energies have a true minus sign and never a minus zero") {
  CHECK(energy_words(-11.3042) == "−11.304 eV");
  CHECK(energy_words(-0.0001) == "0.000 eV");
  CHECK(energy_words(2.5, 1) == "2.5 eV");
}

TEST_CASE("the font has the widths of Helvetica") {
  // Adobe's Core 14 font metrics for Helvetica, in thousandths of an em (from memory); the font is
  // made to the same widths, in units of 1/2048 em.
  const Font font;
  const std::pair<const char*, double> widths[] = {{"0", 556}, {"e", 556}, {"W", 944}, {" ", 278},
                                                   {"i", 222}, {"m", 833}, {"H", 722}};
  for (const auto& [letter, width] : widths) {
    CAPTURE(letter);
    CHECK(std::abs(font.width(plain_text(letter), 1000.0) - width) < 1.0);
  }
}

TEST_CASE("the outlines of text stay in its box, whatever its anchor and direction") {
  const Font font;
  for (const Anchor anchor : {Anchor::Start, Anchor::Middle, Anchor::End}) {
    for (const bool upwards : {false, true}) {
      Text text;
      text.at = {100, 100};
      text.runs = label_text("2t1g") + plain_text(" fgjÅ");
      text.size = 20;
      text.anchor = anchor;
      text.upwards = upwards;
      const Box box = font.box(text);
      for (const std::vector<Point2>& polygon : font.outlines(text)) {
        for (const Point2& p : polygon) {
          CHECK(p.x > box.left - 0.5);
          CHECK(p.x < box.right + 0.5);
          CHECK(p.y > box.top - 0.5);
          CHECK(p.y < box.bottom + 0.5);
        }
      }
    }
  }
}

TEST_CASE("every character that figures use has a glyph of its own") {
  const Font font;
  const auto shape = [&](const std::string& text) {
    Text glyph;
    glyph.runs = plain_text(text);
    std::vector<double> numbers;
    for (const auto& polygon : font.outlines(glyph)) {
      for (const Point2& p : polygon) numbers.push_back(p.x + 1000 * p.y);
    }
    return numbers;
  };
  const std::vector<double> missing = shape("\U0010FFFD");  // a private code point
  for (const char* c :
       {"σ", "π", "δ", "φ", "Σ", "Π", "Δ", "Φ", "′", "″", "−", "Å", "±", "·", "ü"}) {
    CAPTURE(c);
    CHECK(shape(c) != missing);
  }
}

TEST_CASE("UTF-8 is read as RFC 3629 says, and broken bytes show as such") {
  CHECK(code_points("aσ″\U0001D6D1") == U"aσ″\U0001D6D1");
  CHECK(code_points("\xCF") == U"\uFFFD");
  CHECK(code_points("a\xFFz") == U"a\uFFFDz");
}
