// A picture made of pixels, and PNG (ISO/IEC 15948).
#pragma once

#include <array>
#include <cstddef>
#include <cstdint>
#include <string>
#include <string_view>
#include <vector>

namespace irrepwise {

/// Red, green, blue and opacity of each pixel, rows from the top, opacity not multiplied in.
struct Raster {
  int width = 0;
  int height = 0;
  std::vector<std::uint8_t> rgba;  // 4 * width * height

  Raster() = default;
  Raster(int width_px, int height_px, std::array<std::uint8_t, 4> colour);

  [[nodiscard]] std::uint8_t* pixel(int x, int y) { return rgba.data() + offset(x, y); }
  [[nodiscard]] const std::uint8_t* pixel(int x, int y) const { return rgba.data() + offset(x, y); }

 private:
  [[nodiscard]] std::size_t offset(int x, int y) const {
    return 4 * (static_cast<std::size_t>(y) * static_cast<std::size_t>(width) +
                static_cast<std::size_t>(x));
  }
};

/// @returns  the bytes of a PNG file, 8 bits for each of the four channels; the same for the same
///           pixels, no time stamp
[[nodiscard]] std::string png_bytes(const Raster& raster);

/// @throws Error  where the bytes are no PNG
[[nodiscard]] Raster read_png(std::string_view bytes);

}  // namespace irrepwise
