#include "core/yaml.hpp"

#include <string>

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;

namespace {

YamlNode parsed(const std::string& text) { return YamlNode::parse(text, "a.yaml"); }

// The message with which `read` refuses the text, or "accepted".
template <typename Read>
std::string refusal(const std::string& text, Read&& read) {
  try {
    read(parsed(text));
  } catch (const Error& error) {
    return error.what();
  }
  return "accepted";
}

std::string refusal(const std::string& text) {
  return refusal(text, [](const YamlNode&) {});
}

}  // namespace

TEST_CASE("words keep the text of the file, and numbers are read from plain words only") {
  const YamlNode node = parsed("{a: No, b: 1.50, c: '2', d: [1, 2], e: {f: -3}}");
  CHECK(node.at("a").word() == "No");
  CHECK(node.at("b").word() == "1.50");
  CHECK(node.at("b").number() == 1.5);
  CHECK(node.at("d").list_of(2, "two").back().whole_number() == 2);
  CHECK(node.at("e").at("f").whole_number() == -3);
  CHECK(node.find("g") == nullptr);
  CHECK(node.at("c").place() == "a.yaml:1:21");
}

TEST_CASE("a value of the wrong kind is refused with what was found and expected") {
  const auto number = [](const YamlNode& node) { (void)node.at("k").number("a number of eV"); };
  CHECK(refusal("k: '2'", number) == "a.yaml:1:4: found text in quotes, expected a number of eV");
  CHECK(refusal("k: two", number) == "a.yaml:1:4: found 'two', expected a number");
  CHECK(refusal("k: .nan", number) == "a.yaml:1:4: found '.nan', expected a finite number");
  CHECK(refusal("k: -.inf", number) == "a.yaml:1:4: found '-.inf', expected a finite number");
  CHECK(refusal("k: [1]", number) == "a.yaml:1:4: found a list, expected a number of eV");
  CHECK(refusal("k:\nl: 1\n", number) == "a.yaml:1:1: found nothing, expected a number of eV");
  CHECK(refusal("\nl: 1", number) == "a.yaml:2:1: the key 'k' is missing here");
  CHECK(refusal("- 1", number) == "a.yaml:1:1: found a list, expected keys with values");
  const auto whole = [](const YamlNode& node) { (void)node.at("k").whole_number(); };
  CHECK(refusal("k: 1.0", whole) == "a.yaml:1:4: found '1.0', expected a whole number");
  const auto pair = [](const YamlNode& node) { (void)node.at("k").list_of(2, "two numbers"); };
  CHECK(refusal("k: [1, 2, 3]", pair) == "a.yaml:1:4: found a list of 3, expected two numbers");
}

TEST_CASE("unknown keys are refused with the nearest known key") {
  const auto keys = [](const YamlNode& node) { node.expect_keys("a job", {"charge", "title"}); };
  CHECK(refusal("charge: 1\ntitel: x\n", keys) ==
        "a.yaml:2:1: unknown key 'titel' in a job; did you mean 'title'?");
  CHECK(refusal("something: 1\n", keys) ==
        "a.yaml:1:1: unknown key 'something' in a job; known keys are charge and title");
}

TEST_CASE("what is no single plain YAML document is refused") {
  CHECK(refusal("a: 1\nb: 2\n\na: 3\n") ==
        "a.yaml:4:1: the key 'a' stands here twice (first in line 1); keep one");
  CHECK(refusal("a: [1, 2\nb: 3\n").starts_with("a.yaml:2:2: this is not YAML: "));
  CHECK(refusal("a: &x 1\nb: *x\n") ==
        "a.yaml:2:4: aliases are not used here; write the value out");
  CHECK(refusal("? [a]\n: 1\n") == "a.yaml:1:3: found a list, expected a key");
  CHECK(refusal("a: 1\n---\nb: 2\n") ==
        "a.yaml:2: a second YAML document begins with '---'; keep one");
  CHECK(refusal(std::string(100000, '[')).find("this is not YAML") != std::string::npos);
  CHECK(parsed("").kind() == YamlNode::Kind::Nothing);
}

TEST_CASE("a block of text gives its lines with their places") {
  const YamlNode node = parsed("a:\n  b: |\n    one\n\n      two words\n  c: x\n");
  const auto lines = node.at("a").at("b").lines("lines");
  REQUIRE(lines.size() == 3);
  CHECK(lines[0].text == "one");
  CHECK(lines[0].place == "a.yaml:3");
  CHECK(lines[0].column == 5);
  CHECK(lines[1].text.empty());
  CHECK(lines[2].text == "  two words");
  CHECK(lines[2].place == "a.yaml:5");
  CHECK(lines[2].column == 5);
  CHECK(refusal("b: one two\n", [](const YamlNode& n) { (void)n.at("b").lines("lines"); }) ==
        "a.yaml:1:4: found 'one two', expected lines behind '|'");
}
