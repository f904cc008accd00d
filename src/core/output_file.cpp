#include "core/output_file.hpp"

#include <cerrno>
#include <cstring>
#include <filesystem>
#include <system_error>

#include <fcntl.h>
#include <sys/stat.h>
#include <unistd.h>

#include <fmt/format.h>

#include "core/error.hpp"

namespace irrepwise {
namespace {

std::string reason(int error_number) {
  return std::generic_category().message(error_number);  // strerror without its shared buffer
}

bool folder_exists(const std::string& path) {
  std::error_code ignored;
  const std::filesystem::path folder = std::filesystem::path(path).parent_path();
  return folder.empty() || std::filesystem::is_directory(folder, ignored);
}

Error cannot_write(const std::string& path, int error_number) {
  const char* remedy = "give another path";
  switch (error_number) {
    case ENOENT:
      remedy = folder_exists(path) ? "choose another folder"
                                   : "make the folder first, or give another path";
      break;
    case ENOTDIR:
      remedy = "a part of the path before the last is no folder; give another path";
      break;
    case EACCES:
    case EPERM:
    case EROFS:
      remedy = "choose a folder in which you may write";
      break;
    case ENOSPC:
    case EDQUOT:
    case EFBIG:
      remedy = "make room";
      break;
    default:
      break;
  }
  return Error(fmt::format("{}: cannot write: {}; {}", path, reason(error_number), remedy));
}

/// @returns  0, or the number of the error
int write_all(int descriptor, std::string_view text) {
  while (!text.empty()) {
    const ssize_t written = ::write(descriptor, text.data(), text.size());
    if (written < 0) {
      if (errno == EINTR) continue;
      return errno;
    }
    text.remove_prefix(static_cast<std::size_t>(written));
  }
  return 0;
}

int write_directly(const std::string& path, std::string_view text) {
  const int descriptor = ::open(path.c_str(), O_WRONLY | O_CLOEXEC);
  if (descriptor < 0) return errno;
  const int failed = write_all(descriptor, text);
  const int closed = ::close(descriptor) == 0 ? 0 : errno;
  return failed != 0 ? failed : closed;
}

int write_beside(const std::string& path, std::string_view text, mode_t mode) {
  const std::filesystem::path target(path);
  const std::string beside =
      (target.parent_path() / fmt::format(".{}.{}.part", target.filename().string(), ::getpid()))
          .string();
  const int descriptor = ::open(beside.c_str(), O_WRONLY | O_CREAT | O_EXCL | O_CLOEXEC, mode);
  if (descriptor < 0) return errno;
  int failed = write_all(descriptor, text);
  if (failed == 0 && ::fsync(descriptor) != 0) failed = errno;
  if (::close(descriptor) != 0 && failed == 0) failed = errno;
  if (failed == 0 && ::rename(beside.c_str(), path.c_str()) != 0) failed = errno;
  if (failed != 0) ::unlink(beside.c_str());
  return failed;
}

}  // namespace

void write_file(const std::string& path, std::string_view text) {
  if (path.empty()) throw Error("the output path is empty; name a file");
  struct stat status {};
  int failed = 0;
  if (::stat(path.c_str(), &status) != 0) {
    failed = write_beside(path, text, 0666);
  } else if (S_ISDIR(status.st_mode)) {
    throw Error(fmt::format("{}: is a folder; name a file in it", path));
  } else if (!S_ISREG(status.st_mode)) {
    failed = write_directly(path, text);  // renaming would replace the device by a file
  } else {
    std::error_code ignored;
    const std::filesystem::path target = std::filesystem::canonical(path, ignored);
    failed = write_beside(ignored ? path : target.string(), text, status.st_mode & 0777);
  }
  if (failed != 0) throw cannot_write(path, failed);
}

void write_descriptor(int descriptor, std::string_view text, const std::string& name) {
  const int failed = write_all(descriptor, text);
  if (failed != 0) throw cannot_write(name, failed);
}

bool same_file(const std::string& path_a, const std::string& path_b) {
  std::error_code missing;
  return std::filesystem::equivalent(path_a, path_b, missing) && !missing;
}

}  // namespace irrepwise
