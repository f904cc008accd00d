#include "molecule/atoms_yaml.hpp"

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "molecule/label.hpp"

namespace irrepwise {
namespace {

constexpr std::string_view atom_shape = "an atom: symbol, x, y, z";

int read_element(const YamlNode& node) {
  try {
    return atomic_number_of_label(node.word(atom_shape));
  } catch (const Error& error) {
    if (node.kind() != YamlNode::Kind::Word) throw;
    throw error_at(node.place(), error);
  }
}

std::vector<Atom> read_atom_list(const YamlNode& node) {
  std::vector<Atom> atoms;
  for (const YamlNode& item : node.list()) {
    const std::span<const YamlNode> parts = item.list_of(4, atom_shape);
    Atom atom{read_element(parts[0]), {}};
    for (int i = 0; i < 3; ++i) {
      atom.position[i] = parts[static_cast<std::size_t>(i + 1)].number("a coordinate");
    }
    atoms.push_back(atom);
  }
  return atoms;
}

Atom read_atom_line(const YamlNode::Line& line) {
  const std::vector<std::string_view> words = split_words(line.text);
  const auto fail = [&](std::string_view at, const std::string& message) {
    const int column = line.column + static_cast<int>(at.data() - line.text.data());
    throw error_at(line.column > 0 ? fmt::format("{}:{}", line.place, column) : line.place,
                   Error(message));
  };
  if (words.size() != 4) {
    fail(words[0], fmt::format("found {}, expected {}", quoted(trimmed(line.text)), atom_shape));
  }
  Atom atom;
  try {
    atom.atomic_number = atomic_number_of_label(words[0]);
  } catch (const Error& error) {
    fail(words[0], error.what());
  }
  for (int i = 0; i < 3; ++i) {
    const std::string_view word = words[static_cast<std::size_t>(i + 1)];
    const std::optional<double> value = parse_number(word);
    if (!value) fail(word, why_not_a_number(word));
    atom.position[i] = *value;
  }
  return atom;
}

std::vector<Atom> read_atom_block(const YamlNode& node) {
  std::vector<Atom> atoms;
  for (const YamlNode::Line& line : node.lines("a list of atoms, or lines of atoms")) {
    const std::string_view text = trimmed(line.text);
    if (text.empty() || text.starts_with('#')) continue;
    atoms.push_back(read_atom_line(line));
  }
  return atoms;
}

}  // namespace

std::vector<Atom> read_yaml_atoms(const YamlNode& node) {
  return node.kind() == YamlNode::Kind::List ? read_atom_list(node) : read_atom_block(node);
}

}  // namespace irrepwise
