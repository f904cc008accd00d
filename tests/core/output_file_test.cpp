#include "core/output_file.hpp"

#include <csignal>
#include <filesystem>
#include <fstream>
#include <iterator>

#include <sys/resource.h>
#include <unistd.h>

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;
namespace fs = std::filesystem;

namespace {

// A folder of its own that goes when the test ends.
struct Folder {
  fs::path path = fs::temp_directory_path() / ("irrepwise-" + std::to_string(::getpid()));
  Folder() { fs::create_directory(path); }
  ~Folder() { fs::remove_all(path); }
  [[nodiscard]] std::string file(const std::string& name) const { return (path / name).string(); }
  [[nodiscard]] auto entries() const {
    return std::distance(fs::directory_iterator(path), fs::directory_iterator());
  }
};

std::string content(const std::string& path) {
  std::ifstream stream(path, std::ios::binary);
  return {std::istreambuf_iterator<char>(stream), {}};
}

}  // namespace

TEST_CASE("a file is replaced whole and nothing else is left behind") {
  const Folder folder;
  write_file(folder.file("out"), "first");
  write_file(folder.file("out"), "second");
  CHECK(content(folder.file("out")) == "second");
  CHECK(folder.entries() == 1);
}

TEST_CASE("a link stays a link and its target is replaced") {
  const Folder folder;
  write_file(folder.file("target"), "old");
  fs::create_symlink(folder.file("target"), folder.file("link"));
  write_file(folder.file("link"), "new");
  CHECK(fs::is_symlink(folder.file("link")));
  CHECK(content(folder.file("target")) == "new");
}

TEST_CASE("a write that fails halfway leaves the old file and no other") {
  const Folder folder;
  write_file(folder.file("out"), "old");
  rlimit before{};
  REQUIRE(::getrlimit(RLIMIT_FSIZE, &before) == 0);
  const rlimit small{4096, before.rlim_max};
  const auto old_handler = std::signal(SIGXFSZ, SIG_IGN);
  REQUIRE(::setrlimit(RLIMIT_FSIZE, &small) == 0);
  CHECK_THROWS_WITH_AS(write_file(folder.file("out"), std::string(10000, 'x')),
                       (folder.file("out") + ": cannot write: File too large; make room").c_str(),
                       Error);
  REQUIRE(::setrlimit(RLIMIT_FSIZE, &before) == 0);
  std::signal(SIGXFSZ, old_handler);
  CHECK(content(folder.file("out")) == "old");
  CHECK(folder.entries() == 1);
}

TEST_CASE("what cannot be written to is refused with the reason and a remedy") {
  const Folder folder;
  CHECK_THROWS_WITH_AS(write_file(folder.file("no/out"), "x"),
                       (folder.file("no/out") + ": cannot write: No such file or directory; make "
                                                "the folder first, or give another path")
                           .c_str(),
                       Error);
  CHECK_THROWS_WITH_AS(write_file(folder.path.string(), "x"),
                       (folder.path.string() + ": is a folder; name a file in it").c_str(), Error);
  CHECK_THROWS_WITH_AS(write_file("", "x"), "the output path is empty; name a file", Error);
  CHECK_THROWS_AS(write_file("/dev/full", "x"), Error);
  CHECK(fs::is_character_file("/dev/full"));
}

TEST_CASE("two names of one file are known as such") {
  const Folder folder;
  write_file(folder.file("a"), "x");
  fs::create_symlink(folder.file("a"), folder.file("b"));
  CHECK(same_file(folder.file("a"), folder.file("b")));
  CHECK(same_file(folder.file("a"), folder.file("./a")));
  CHECK_FALSE(same_file(folder.file("a"), folder.file("absent")));
}
