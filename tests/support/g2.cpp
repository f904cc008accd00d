#include "support/g2.hpp"

#include <fstream>
#include <optional>
#include <sstream>
#include <utility>

#include "core/error.hpp"
#include "molecule/element.hpp"
#include "support/paths.hpp"

namespace {

using irrepwise::Error, irrepwise::Atom;

// The lines of the file but for comments, each as a keyword and the rest.
class Lines {
 public:
  explicit Lines(const std::string& path) : path_(path), file_(path) {
    if (!file_) throw irrepwise::error_at(path, Error("cannot be read"));
    advance();
  }

  [[nodiscard]] bool at_end() const { return at_end_; }
  [[nodiscard]] bool is(const std::string& keyword) const {
    return !at_end_ && keyword_ == keyword;
  }

  std::string take(const std::string& keyword) {
    if (!is(keyword)) fail("expected " + keyword);
    return take();
  }

  // The rest of the line as an element's line: its keyword is the symbol.
  Atom take_atom() {
    const std::optional<int> number = irrepwise::atomic_number(keyword_);
    if (at_end_ || !number) fail("expected an atom");
    std::istringstream numbers(rest_);
    Atom atom{*number, {}};
    for (double& coordinate : atom.position) {
      if (!(numbers >> coordinate)) fail("expected three coordinates");
    }
    advance();
    return atom;
  }

  int take_count(const std::string& keyword) {
    if (!is(keyword)) fail("expected " + keyword);
    std::istringstream number(rest_);
    int count = 0;
    if (!(number >> count) || count < 0) fail("expected a count");
    advance();
    return count;
  }

 private:
  [[noreturn]] void fail(const std::string& message) const {
    throw irrepwise::error_at(irrepwise::file_place(path_, line_), Error(message));
  }

  std::string take() {
    std::string rest = rest_;
    advance();
    return rest;
  }

  void advance() {
    std::string text;
    do {
      at_end_ = !std::getline(file_, text);
      ++line_;
    } while (!at_end_ && text.starts_with('#'));
    const std::size_t space = text.find(' ');
    keyword_ = text.substr(0, space);
    rest_ = space == std::string::npos ? std::string() : text.substr(space + 1);
  }

  std::string path_;
  std::ifstream file_;
  int line_ = 0;
  bool at_end_ = false;
  std::string keyword_;
  std::string rest_;
};

}  // namespace

std::vector<G2Molecule> read_g2() {
  Lines lines(reference_path("g2.txt"));
  std::vector<G2Molecule> all;
  while (!lines.at_end()) {
    std::string name = lines.take("molecule");
    std::string group = lines.take("group");
    const int unpaired = lines.take_count("unpaired");
    std::string note = lines.is("note") ? lines.take("note") : std::string();
    std::vector<Atom> atoms(static_cast<std::size_t>(lines.take_count("atoms")));
    for (Atom& atom : atoms) atom = lines.take_atom();
    all.push_back({name, irrepwise::Molecule(std::move(atoms), 0, name), std::move(group), unpaired,
                   std::move(note)});
  }
  return all;
}
