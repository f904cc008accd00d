#include "figure/raster.hpp"

#include <cassert>
#include <cstring>

#include <png.h>

#include <fmt/format.h>

#include "core/error.hpp"

namespace irrepwise {

Raster::Raster(int width_px, int height_px, std::array<std::uint8_t, 4> colour)
    : width(width_px), height(height_px) {
  assert(width > 0 && height > 0);
  rgba.resize(4 * static_cast<std::size_t>(width) * static_cast<std::size_t>(height));
  for (std::size_t i = 0; i < rgba.size(); ++i) rgba[i] = colour[i % 4];
}

namespace {

png_image image_of(int width, int height) {
  png_image image;
  std::memset(&image, 0, sizeof image);
  image.version = PNG_IMAGE_VERSION;
  image.width = static_cast<png_uint_32>(width);
  image.height = static_cast<png_uint_32>(height);
  image.format = PNG_FORMAT_RGBA;
  return image;
}

}  // namespace

std::string png_bytes(const Raster& raster) {
  png_image image = image_of(raster.width, raster.height);
  png_alloc_size_t size = PNG_IMAGE_PNG_SIZE_MAX(image);
  std::string bytes(size, '\0');
  const int done =
      png_image_write_to_memory(&image, bytes.data(), &size, 0, raster.rgba.data(), 0, nullptr);
  if (done == 0) throw Error(fmt::format("PNG: {}; try a smaller picture", image.message));
  bytes.resize(size);
  return bytes;
}

Raster read_png(std::string_view bytes) {
  png_image image = image_of(0, 0);
  if (png_image_begin_read_from_memory(&image, bytes.data(), bytes.size()) == 0) {
    throw Error(fmt::format("PNG: {}", image.message));
  }
  image.format = PNG_FORMAT_RGBA;
  Raster raster(static_cast<int>(image.width), static_cast<int>(image.height), {0, 0, 0, 0});
  if (png_image_finish_read(&image, nullptr, raster.rgba.data(), 0, nullptr) == 0) {
    throw Error(fmt::format("PNG: {}", image.message));
  }
  return raster;
}

}  // namespace irrepwise
