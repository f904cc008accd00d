// The colours of the figures: told apart by colour-blind readers, and in grey print by lightness.
#pragma once

#include "figure/figure.hpp"

namespace irrepwise::palette {

inline constexpr Colour ink{0x1f, 0x29, 0x33};       // text, occupied levels
inline constexpr Colour muted{0x62, 0x6d, 0x79};     // what explains: axes, method
inline constexpr Colour faint{0xb9, 0xc1, 0xc9};     // leaders, links
inline constexpr Colour grid{0xec, 0xef, 0xf2};      // pale lines behind everything
inline constexpr Colour empty{0x8a, 0x95, 0xa1};     // levels without electrons
inline constexpr Colour homo{0x08, 0x3f, 0x80};      // dark blue
inline constexpr Colour lumo{0xb8, 0x5c, 0x00};      // lighter orange
inline constexpr Colour positive{0x2b, 0x6c, 0xb8};  // dark blue
inline constexpr Colour negative{0xf2, 0xb1, 0x3c};  // light amber
inline constexpr Colour positive_pale{0xa9, 0xc6, 0xe6};
inline constexpr Colour negative_pale{0xfd, 0xef, 0xd2};
inline constexpr Colour negative_line{0xa8, 0x5f, 0x00};

}  // namespace irrepwise::palette
