#include "cli/help_format.hpp"

#include <cstddef>
#include <sstream>
#include <string>
#include <utility>

#include <CLI/CLI.hpp>

#include "output/display_width.hpp"

namespace irrepwise::cli {
namespace {

constexpr int names_width = 30;  // columns, of what an option is called
constexpr int page_width = 100;  // columns

std::string two_columns(const std::string& name, const std::string& description) {
  const std::string indent(names_width, ' ');
  std::string out = padded_right("  " + name, names_width);
  if (out.back() != ' ') out += "\n" + indent;  // a long name has its line for itself
  std::istringstream paragraphs(description);
  bool first = true;
  for (std::string paragraph; std::getline(paragraphs, paragraph);) {
    for (const std::string& line : wrapped(paragraph, page_width - names_width)) {
      out += (first ? "" : indent) + line + "\n";
      first = false;
    }
  }
  return first ? "  " + name + "\n" : out;
}

class HelpFormat : public CLI::Formatter {
 public:
  std::string make_option(const CLI::Option* option, bool is_positional) const override {
    return two_columns(make_option_name(option, is_positional) + make_option_opts(option),
                       make_option_desc(option));
  }

  std::string make_subcommand(const CLI::App* command) const override {
    return two_columns(command->get_display_name(true), command->get_description());
  }

  // Each group starts with a blank line of its own; the base adds another between them.
  std::string make_help(const CLI::App* app, std::string name,
                        CLI::AppFormatMode mode) const override {
    std::string help = Formatter::make_help(app, std::move(name), mode);
    for (std::size_t at; (at = help.find("\n\n\n")) != std::string::npos;) help.erase(at, 1);
    return help;
  }
};

}  // namespace

std::shared_ptr<CLI::FormatterBase> help_format() { return std::make_shared<HelpFormat>(); }

}  // namespace irrepwise::cli
