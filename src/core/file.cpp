#include "core/file.hpp"

#include <array>
#include <cerrno>
#include <cstddef>
#include <cstdio>
#include <filesystem>
#include <memory>
#include <string_view>
#include <system_error>

#include "core/error.hpp"

namespace irrepwise {
namespace {

constexpr std::size_t largest_file = std::size_t{256} << 20;  // a million atoms take a fifth of it

[[noreturn]] void fail(const std::string& path, const std::string& message) {
  throw error_at(path.empty() ? "''" : path, Error(message));
}

struct Close {
  void operator()(std::FILE* file) const { std::fclose(file); }
};

}  // namespace

std::string read_text_file(const std::string& path) {
  std::error_code code;
  const std::filesystem::file_status status = std::filesystem::status(path, code);
  if (status.type() == std::filesystem::file_type::not_found) {
    fail(path, "there is no such file; check its name and folder");
  }
  if (status.type() == std::filesystem::file_type::directory) {
    fail(path, "this is a folder; name a file in it");
  }
  errno = 0;
  const std::unique_ptr<std::FILE, Close> file(std::fopen(path.c_str(), "rb"));
  if (!file) {
    fail(path,
         "cannot be opened: " + std::generic_category().message(errno) + "; check who may read it");
  }
  std::string text;
  std::array<char, 65536> chunk;
  while (const std::size_t got = std::fread(chunk.data(), 1, chunk.size(), file.get())) {
    if (text.size() + got > largest_file) fail(path, "is larger than 256 MiB; not an input file?");
    text.append(chunk.data(), got);
  }
  if (std::ferror(file.get())) {
    fail(path, "cannot be read: " + std::generic_category().message(errno));
  }
  constexpr std::string_view byte_order_mark = "\xEF\xBB\xBF";
  if (text.starts_with(byte_order_mark)) text.erase(0, byte_order_mark.size());
  if (text.find_first_not_of(" \t\r\n") == std::string::npos) {
    fail(path, "the file is empty; check that it was written");
  }
  return text;
}

std::string path_beside(const std::string& beside, const std::string& name) {
  return (std::filesystem::path(beside).parent_path() / name).string();
}

}  // namespace irrepwise
