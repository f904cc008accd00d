#include "figure/palette.hpp"

#include <algorithm>
#include <cmath>
#include <cstdint>

#include <doctest/doctest.h>

using namespace irrepwise;

namespace {

// Relative luminance and contrast as WCAG 2.1 defines them (W3C).
double linear(std::uint8_t channel) {
  const double v = channel / 255.0;
  return v <= 0.03928 ? v / 12.92 : std::pow((v + 0.055) / 1.055, 2.4);
}

double luminance(Colour c) {
  return 0.2126 * linear(c.red) + 0.7152 * linear(c.green) + 0.0722 * linear(c.blue);
}

double contrast(Colour a, Colour b) {
  const double high = std::max(luminance(a), luminance(b));
  const double low = std::min(luminance(a), luminance(b));
  return (high + 0.05) / (low + 0.05);
}

constexpr Colour white{255, 255, 255};

}  // namespace

TEST_CASE("the two phases, and HOMO and LUMO, differ in lightness, so that grey print tells them") {
  CHECK(contrast(palette::positive, palette::negative) > 2.5);
  CHECK(contrast(palette::homo, palette::lumo) > 2.0);
  CHECK(contrast(palette::positive_pale, palette::negative_pale) > 1.5);
}

TEST_CASE("what is written is dark enough on white by the AA level of WCAG") {
  for (const Colour c : {palette::ink, palette::muted, palette::homo, palette::lumo}) {
    CHECK(contrast(c, white) >= 4.5);
  }
}
