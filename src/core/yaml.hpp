// YAML as jobs and parameter files use it: a tree in which every value knows its place.
//
// Private: not installed. Words keep the text of the file, so that N, Y and No stay elements and
// are never taken for truth values; what a word means is decided by the function that reads it.
#pragma once

#include <cstddef>
#include <initializer_list>
#include <memory>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace irrepwise {

class YamlNode {
 public:
  enum class Kind { Nothing, Word, List, Map };

  struct Entry;

  struct Line {
    std::string_view text;
    std::string place;  // "file:line", to which the column is added
    int column = 0;     // of the first character of the text in the file, from 1; 0 where unknown
  };

  /// @param text       one YAML document, without anchors
  /// @param file_name  how messages call it
  /// @throws Error     with file, line and column: syntax, duplicate key, key that is not a word,
  ///                   alias, second document
  [[nodiscard]] static YamlNode parse(std::string_view text, const std::string& file_name);

  [[nodiscard]] Kind kind() const noexcept { return kind_; }
  [[nodiscard]] std::string place() const;  // "file:line:column"
  [[noreturn]] void fail(const std::string& message) const;
  /// @throws Error  "found …, expected `what`", at this place
  [[noreturn]] void fail_expected(std::string_view what) const;

  // Each reads the value as one thing, or throws an Error that says what was found and expected.
  [[nodiscard]] const std::string& word(std::string_view what = "a word") const;
  [[nodiscard]] double number(std::string_view what = "a number") const;
  [[nodiscard]] int whole_number(std::string_view what = "a whole number") const;
  [[nodiscard]] std::span<const YamlNode> list(std::string_view what = "a list") const;
  [[nodiscard]] std::span<const YamlNode> list_of(std::size_t size, std::string_view what) const;
  [[nodiscard]] std::span<const Entry> map(std::string_view what = "keys with values") const;

  /// The lines of a block of text that starts with '|'.
  [[nodiscard]] std::vector<Line> lines(std::string_view what) const;

  /// Of a map: refuses any key that is not in the list, with the nearest one that is.
  void expect_keys(std::string_view what, std::initializer_list<std::string_view> known) const;
  /// Of a map: the value of a key; null where the key is absent.
  [[nodiscard]] const YamlNode* find(std::string_view key) const;
  /// Of a map: the value of a key that must be there.
  [[nodiscard]] const YamlNode& at(std::string_view key) const;

 private:
  friend class YamlBuilder;

  struct Source {
    std::string name;
    std::string text;
  };

  [[nodiscard]] std::string_view source_line(int line) const;  // from 1; empty beyond the end

  std::shared_ptr<const Source> source_;
  int line_ = 0;    // from 1
  int column_ = 0;  // from 1
  Kind kind_ = Kind::Nothing;
  bool plain_ = true;  // of a word: without quotes, so that it may be a number
  std::string word_;
  std::vector<YamlNode> items_;
  std::vector<Entry> entries_;
};

struct YamlNode::Entry {
  YamlNode key;  // a word
  YamlNode value;
};

}  // namespace irrepwise
