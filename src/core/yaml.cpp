#include "core/yaml.hpp"

#include <algorithm>
#include <optional>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"

namespace irrepwise {
namespace {

std::string found(const YamlNode& node) {
  switch (node.kind()) {
    case YamlNode::Kind::Nothing:
      return "nothing";
    case YamlNode::Kind::Word:
      return quoted(node.word());
    case YamlNode::Kind::List:
      return "a list";
    case YamlNode::Kind::Map:
      return "keys with values";
  }
  return {};
}

}  // namespace

std::string YamlNode::place() const { return file_place(source_->name, line_, column_); }

void YamlNode::fail(const std::string& message) const { throw error_at(place(), Error(message)); }

void YamlNode::fail_expected(std::string_view what) const {
  fail(fmt::format("found {}, expected {}", found(*this), what));
}

const std::string& YamlNode::word(std::string_view what) const {
  if (kind_ != Kind::Word) fail_expected(what);
  return word_;
}

double YamlNode::number(std::string_view what) const {
  if (kind_ != Kind::Word) fail_expected(what);
  if (!plain_) fail(fmt::format("found text in quotes, expected {}", what));
  const std::optional<double> value = parse_number(word_);
  if (!value) fail(why_not_a_number(word_));
  return *value;
}

int YamlNode::whole_number(std::string_view what) const {
  if (kind_ != Kind::Word) fail_expected(what);
  if (!plain_) fail(fmt::format("found text in quotes, expected {}", what));
  const std::optional<int> value = parse_whole_number(word_);
  if (!value) fail_expected(what);
  return *value;
}

std::span<const YamlNode> YamlNode::list(std::string_view what) const {
  if (kind_ != Kind::List) fail_expected(what);
  return items_;
}

std::span<const YamlNode> YamlNode::list_of(std::size_t size, std::string_view what) const {
  if (kind_ != Kind::List) fail_expected(what);
  if (items_.size() != size) {
    fail(fmt::format("found a list of {}, expected {}", items_.size(), what));
  }
  return items_;
}

std::span<const YamlNode::Entry> YamlNode::map(std::string_view what) const {
  if (kind_ != Kind::Map) fail_expected(what);
  return entries_;
}

std::string_view YamlNode::source_line(int line) const {
  std::string_view rest = source_->text;
  for (int i = 1; i < line; ++i) {
    const std::size_t end = rest.find('\n');
    if (end == std::string_view::npos) return {};
    rest.remove_prefix(end + 1);
  }
  return rest.substr(0, rest.find('\n'));
}

std::vector<YamlNode::Line> YamlNode::lines(std::string_view what) const {
  const std::string_view start = source_line(line_);
  const auto at = static_cast<std::size_t>(std::max(column_ - 1, 0));
  const bool literal = kind_ == Kind::Word && at < start.size() && start[at] == '|';
  if (!literal) fail_expected(fmt::format("{} behind '|'", what));
  std::vector<Line> lines;
  std::string_view rest = word_;
  for (int number = line_ + 1; !rest.empty(); ++number) {
    const std::size_t end = rest.find('\n');
    const std::string_view text = rest.substr(0, end);
    rest.remove_prefix(end == std::string_view::npos ? rest.size() : end + 1);
    const std::size_t indent = source_line(number).find(text);
    lines.push_back({text, file_place(source_->name, number),
                     indent == std::string_view::npos ? 0 : static_cast<int>(indent) + 1});
  }
  return lines;
}

void YamlNode::expect_keys(std::string_view what,
                           std::initializer_list<std::string_view> known) const {
  for (const Entry& entry : map(what)) {
    if (std::find(known.begin(), known.end(), entry.key.word_) != known.end()) continue;
    const std::vector<std::string> names(known.begin(), known.end());
    const std::string nearest = nearest_word(entry.key.word_, names);
    entry.key.fail(fmt::format("unknown key {} in {}; {}", quoted(entry.key.word_), what,
                               nearest.empty() ? fmt::format("known keys are {}", joined(names))
                                               : fmt::format("did you mean '{}'?", nearest)));
  }
}

const YamlNode* YamlNode::find(std::string_view key) const {
  for (const Entry& entry : map()) {
    if (entry.key.word_ == key) return &entry.value;
  }
  return nullptr;
}

const YamlNode& YamlNode::at(std::string_view key) const {
  if (const YamlNode* value = find(key)) return *value;
  fail(fmt::format("the key '{}' is missing here", key));
}

}  // namespace irrepwise
