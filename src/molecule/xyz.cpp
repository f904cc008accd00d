#include "molecule/xyz.hpp"

#include <algorithm>
#include <cstddef>
#include <span>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/file.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "molecule/element.hpp"
#include "molecule/label.hpp"
#include "molecule/xyz_comment.hpp"

namespace irrepwise {
namespace {

struct Line {
  std::string_view text;  // without its line end
  int number = 0;         // from 1
};

std::vector<Line> split_lines(std::string_view text) {
  std::vector<Line> lines;
  while (!text.empty()) {
    const std::size_t end = std::min(text.find_first_of("\r\n"), text.size());
    lines.push_back({text.substr(0, end), static_cast<int>(lines.size()) + 1});
    text.remove_prefix(end);
    if (text.starts_with("\r\n")) {
      text.remove_prefix(2);
    } else if (!text.empty()) {
      text.remove_prefix(1);
    }
  }
  while (!lines.empty() && trimmed(lines.back().text).empty()) lines.pop_back();
  return lines;
}

bool looks_like_atom(std::string_view text) {
  const std::vector<std::string_view> words = split_words(text);
  return words.size() == 4 && atomic_number(words[0]) && parse_number(words[1]) &&
         parse_number(words[2]) && parse_number(words[3]);
}

class Reader {
 public:
  Reader(std::string_view text, const std::string& name) : name_(name), lines_(split_lines(text)) {}

  XyzFile read() const {
    const int count = read_count();
    const Comment comment = lines_.size() > 1 ? read_comment(lines_[1]) : Comment{};
    refuse_fewer(count);
    std::vector<Atom> atoms;
    for (const Line& line : std::span(lines_).subspan(2, static_cast<std::size_t>(count))) {
      atoms.push_back(read_atom(line, comment.columns));
    }
    refuse_more(count);
    try {
      return {Molecule(std::move(atoms), comment.charge.value_or(0), comment.title), comment.charge,
              comment.multiplicity, comment.multiplicity_place};
    } catch (const Error& error) {
      throw error_at(name_, error);
    }
  }

 private:
  [[noreturn]] void fail(const Line& line, int column, const std::string& message) const {
    throw error_at(file_place(name_, line.number, column), Error(message));
  }

  [[noreturn]] void fail_at_word(const Line& line, std::string_view word,
                                 const std::string& message) const {
    fail(line, static_cast<int>(word.data() - line.text.data()) + 1, message);
  }

  int read_count() const {
    if (lines_.empty()) throw error_at(name_, Error("the text is empty; expected an XYZ file"));
    const std::vector<std::string_view> words = split_words(lines_[0].text);
    const std::optional<int> count =
        words.size() == 1 ? parse_whole_number(words[0]) : std::nullopt;
    if (!count) {
      fail(lines_[0], 1,
           fmt::format("found {}, expected the number of atoms alone on the first line of an XYZ "
                       "file",
                       quoted(trimmed(lines_[0].text))));
    }
    if (*count < 1) {
      fail_at_word(lines_[0], words[0],
                   fmt::format("found {} atoms, expected at least one", *count));
    }
    return *count;
  }

  // What the comment says, besides the atoms.
  struct Comment {
    std::string title;
    AtomColumns columns;
    std::optional<int> charge;
    std::optional<int> multiplicity;
    std::string multiplicity_place;
  };

  Comment read_comment(const Line& line) const {
    const std::vector<CommentPiece> pieces = comment_pieces(line.text);
    bool extended = std::all_of(pieces.begin(), pieces.end(),
                                [](const CommentPiece& piece) { return piece.value.has_value(); });
    Comment comment;
    for (const CommentPiece& piece : pieces) {
      if (!piece.value) continue;
      const std::string key = comment_key(piece.key);
      if (piece.key == "Properties") {
        extended = true;
        try {
          comment.columns = atom_columns(*piece.value);
        } catch (const Error& error) {
          throw error_at(file_place(name_, line.number, piece.column), error);
        }
      } else if (key == "charge") {
        read_stated(line, piece, "charge", "a whole number such as charge=-2", comment.charge);
      } else if (key == "multiplicity") {
        read_stated(line, piece, "multiplicity", "2S + 1, 1 or more, such as multiplicity=3",
                    comment.multiplicity);
        comment.multiplicity_place = file_place(name_, line.number, piece.value_column);
        if (*comment.multiplicity < 1) {
          fail(line, piece.value_column,
               fmt::format("found multiplicity={}, expected 2S + 1, 1 or more",
                           *comment.multiplicity));
        }
      } else if (key == "title") {
        comment.title = *piece.value;
      } else if (const std::string meant = misspelt_key(piece.key); !meant.empty()) {
        fail(line, piece.column,
             fmt::format("{}= has no meaning here (did you mean {}=?); correct it or take it out",
                         quoted_key(piece.key), meant));
      }
    }
    if (!extended) comment.title = std::string(trimmed(line.text));
    return comment;
  }

  static std::string quoted_key(const std::string& key) {
    const std::string text = quoted(key);  // safe for a terminal
    return text.substr(1, text.size() - 2);
  }

  // A whole number that the comment may say twice, but not with two values.
  void read_stated(const Line& line, const CommentPiece& piece, const char* key,
                   const char* expected, std::optional<int>& stated) const {
    const std::optional<int> value = whole(*piece.value);
    if (!value) {
      fail(line, piece.value_column,
           fmt::format("found {}={}, expected {}", key, quoted(*piece.value), expected));
    }
    if (stated && *stated != *value) {
      fail(line, piece.column,
           fmt::format("{}= stands here twice with different values; keep one", key));
    }
    stated = value;
  }

  // Some programs write every number with a decimal point: "-2.0" is as whole as "-2".
  static std::optional<int> whole(std::string_view word) {
    if (const std::size_t point = word.find('.'); point != std::string_view::npos && point > 0) {
      if (word.find_first_not_of('0', point + 1) == std::string_view::npos) {
        word = word.substr(0, point);
      }
    }
    return parse_whole_number(word);
  }

  void refuse_fewer(int count) const {
    const std::size_t n_lines = lines_.size() < 2 ? 0 : lines_.size() - 2;
    const auto wanted = static_cast<std::size_t>(count);
    if (n_lines < wanted) {
      std::string message = fmt::format(
          "the first line announces {} {}, but {} {}; correct the "
          "number or complete the file",
          count, count == 1 ? "atom" : "atoms", n_lines, n_lines == 1 ? "follows" : "follow");
      if (lines_.size() > 1 && looks_like_atom(lines_[1].text)) {
        message += "; line 2 reads like an atom, where a comment (or an empty line) belongs";
      }
      fail(lines_[0], 1, message);
    }
  }

  void refuse_more(int count) const {
    const auto wanted = static_cast<std::size_t>(count);
    if (lines_.size() == wanted + 2) return;
    std::size_t extra = wanted + 2;
    while (trimmed(lines_[extra].text).empty()) ++extra;  // the last line is never blank
    const std::vector<std::string_view> words = split_words(lines_[extra].text);
    if (words.size() == 1 && parse_whole_number(words[0])) {
      fail_at_word(lines_[extra], words[0],
                   "a second structure begins here; give a file with one structure");
    }
    fail_at_word(lines_[extra], words[0],
                 fmt::format("the first line announces {} {}, but more text follows; correct the "
                             "number or remove the rest",
                             count, count == 1 ? "atom" : "atoms"));
  }

  Atom read_atom(const Line& line, const AtomColumns& columns) const {
    const std::vector<std::string_view> words = split_words(line.text);
    const int n_needed = std::max(columns.species + 1, columns.position + 3);
    if (static_cast<int>(words.size()) < n_needed) {
      if (words.empty()) fail(line, 1, "found an empty line, expected an atom: symbol, x, y, z");
      if (n_needed == 4) {
        fail_at_word(
            line, words[0],
            fmt::format("found {}, expected an atom: symbol, x, y, z", quoted(trimmed(line.text))));
      }
      fail_at_word(line, words[0],
                   fmt::format("found {} columns, expected at least {} by Properties= in line 2",
                               words.size(), n_needed));
    }
    Atom atom;
    const std::string_view species = words[static_cast<std::size_t>(columns.species)];
    try {
      atom.atomic_number = atomic_number_of_label(species);
    } catch (const Error& error) {
      fail_at_word(line, species, error.what());
    }
    for (int i = 0; i < 3; ++i) {
      const std::string_view word = words[static_cast<std::size_t>(columns.position + i)];
      const std::optional<double> value = parse_number(word);
      if (!value) fail_at_word(line, word, why_not_a_number(word));
      atom.position[i] = *value;
    }
    return atom;
  }

  std::string name_;
  std::vector<Line> lines_;
};

}  // namespace

XyzFile read_xyz(const std::string& path) { return parse_xyz(read_text_file(path), path); }

XyzFile parse_xyz(std::string_view text, const std::string& name) {
  constexpr std::string_view byte_order_mark = "\xEF\xBB\xBF";
  if (text.starts_with(byte_order_mark)) text.remove_prefix(byte_order_mark.size());
  return Reader(text, name).read();
}

namespace {

// `key="words"` as a further part of a comment; nothing for no words.
std::string comment_part(const char* key, const std::string& words) {
  if (words.empty()) return {};
  std::string text = fmt::format(" {}=\"", key);
  for (const char c : words) {
    if (c == '"' || c == '\\') text += '\\';
    text += c == '\n' || c == '\r' ? ' ' : c;
  }
  return text + '"';
}

}  // namespace

std::string xyz_text(const Molecule& molecule, const std::string& title, const std::string& made) {
  std::string text =
      fmt::format("{}\nProperties=species:S:1:pos:R:3 charge={}{}{}\n", molecule.size(),
                  molecule.charge(), comment_part("title", title), comment_part("made", made));
  for (const Atom& atom : molecule.atoms()) {
    // Adding zero turns -0 into 0, so that mirror images print the same.
    text += fmt::format("{:<2} {:15.10f} {:15.10f} {:15.10f}\n", element_symbol(atom.atomic_number),
                        atom.position.x() + 0.0, atom.position.y() + 0.0, atom.position.z() + 0.0);
  }
  return text;
}

}  // namespace irrepwise
