// What a page says of its own making.
#pragma once

#include <string>
#include <vector>

namespace irrepwise {

/// A file that the run read, or wrote for it to be repeated.
struct SourceText {
  std::string name;
  std::string text;
};

/// What is needed to do the run again.
struct Provenance {
  std::string command;  // "irrepwise report complex.xyz --charge -2 --output report.html"
  std::string version;  // "0.1.0"
  std::vector<SourceText> files;
};

}  // namespace irrepwise
