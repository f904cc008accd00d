// Builds the tree of core/yaml.hpp from the parser's events: this is quicker than the parser's own
// tree, which a program that starts for every molecule would notice, and keeps every place.
#include <memory>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include <fmt/format.h>
#include <yaml-cpp/anchor.h>
#include <yaml-cpp/emitterstyle.h>
#include <yaml-cpp/eventhandler.h>
#include <yaml-cpp/exceptions.h>
#include <yaml-cpp/mark.h>
#include <yaml-cpp/parser.h>

#include <sstream>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/yaml.hpp"

namespace irrepwise {

class YamlBuilder final : public YAML::EventHandler {
 public:
  YamlBuilder(std::string_view text, const std::string& name)
      : source_(
            std::make_shared<const YamlNode::Source>(YamlNode::Source{name, std::string(text)})) {
    root_ = node({});
  }

  [[nodiscard]] YamlNode take() { return std::move(root_); }

  void OnDocumentStart(const YAML::Mark&) override {}
  void OnDocumentEnd() override {}

  void OnNull(const YAML::Mark& mark, YAML::anchor_t) override { add(node(mark)); }

  void OnAlias(const YAML::Mark& mark, YAML::anchor_t) override {
    node(mark).fail("aliases are not used here; write the value out");
  }

  void OnScalar(const YAML::Mark& mark, const std::string& tag, YAML::anchor_t,
                const std::string& value) override {
    YamlNode word = node(mark);
    word.kind_ = YamlNode::Kind::Word;
    word.plain_ = tag == "?";
    word.word_ = value;
    add(std::move(word));
  }

  void OnSequenceStart(const YAML::Mark& mark, const std::string&, YAML::anchor_t,
                       YAML::EmitterStyle::value) override {
    open_.push_back({node(mark), false, {}});
    open_.back().node.kind_ = YamlNode::Kind::List;
  }

  void OnSequenceEnd() override { close(); }

  void OnMapStart(const YAML::Mark& mark, const std::string&, YAML::anchor_t,
                  YAML::EmitterStyle::value) override {
    open_.push_back({node(mark), false, {}});
    open_.back().node.kind_ = YamlNode::Kind::Map;
  }

  void OnMapEnd() override { close(); }

 private:
  struct Open {
    YamlNode node;
    bool has_key = false;
    YamlNode key;
  };

  [[nodiscard]] YamlNode node(const YAML::Mark& mark) const {
    YamlNode made;
    made.source_ = source_;
    made.line_ = mark.line + 1;
    made.column_ = mark.column + 1;
    return made;
  }

  void close() {
    YamlNode done = std::move(open_.back().node);
    open_.pop_back();
    add(std::move(done));
  }

  void add(YamlNode value) {
    if (open_.empty()) {
      root_ = std::move(value);
      return;
    }
    Open& parent = open_.back();
    if (parent.node.kind_ == YamlNode::Kind::List) {
      parent.node.items_.push_back(std::move(value));
    } else if (!parent.has_key) {
      if (value.kind_ != YamlNode::Kind::Word) value.fail_expected("a key");
      for (const YamlNode::Entry& entry : parent.node.entries_) {
        if (entry.key.word_ != value.word_) continue;
        value.fail(fmt::format("the key {} stands here twice (first in line {}); keep one",
                               quoted(value.word_), entry.key.line_));
      }
      parent.key = std::move(value);
      parent.has_key = true;
    } else {
      // The parser finds the end of nothing on the next line, where there is nothing to mend.
      if (value.kind_ == YamlNode::Kind::Nothing && value.line_ > parent.key.line_) {
        value.line_ = parent.key.line_;
        value.column_ = parent.key.column_;
      }
      parent.node.entries_.push_back({std::move(parent.key), std::move(value)});
      parent.has_key = false;
    }
  }

  std::shared_ptr<const YamlNode::Source> source_;
  YamlNode root_;
  std::vector<Open> open_;
};

// One document is all there may be.
class SecondDocument final : public YAML::EventHandler {
 public:
  explicit SecondDocument(const std::string& name) : name_(name) {}

  void OnDocumentStart(const YAML::Mark& mark) override {
    throw error_at(file_place(name_, mark.line + 1),
                   Error("a second YAML document begins with '---'; keep one"));
  }
  void OnDocumentEnd() override {}
  void OnNull(const YAML::Mark&, YAML::anchor_t) override {}
  void OnAlias(const YAML::Mark&, YAML::anchor_t) override {}
  void OnScalar(const YAML::Mark&, const std::string&, YAML::anchor_t,
                const std::string&) override {}
  void OnSequenceStart(const YAML::Mark&, const std::string&, YAML::anchor_t,
                       YAML::EmitterStyle::value) override {}
  void OnSequenceEnd() override {}
  void OnMapStart(const YAML::Mark&, const std::string&, YAML::anchor_t,
                  YAML::EmitterStyle::value) override {}
  void OnMapEnd() override {}

 private:
  const std::string& name_;
};

YamlNode YamlNode::parse(std::string_view text, const std::string& file_name) {
  YamlBuilder builder(text, file_name);
  try {
    std::istringstream stream{std::string(text)};
    YAML::Parser parser(stream);
    parser.HandleNextDocument(builder);
    SecondDocument rest(file_name);
    parser.HandleNextDocument(rest);
  } catch (const YAML::Exception& error) {
    throw error_at(file_place(file_name, error.mark.line + 1, error.mark.column + 1),
                   Error(fmt::format("this is not YAML: {}; check indentation, brackets and quotes",
                                     error.msg)));
  }
  return builder.take();
}

}  // namespace irrepwise
