#include "cli/output_options.hpp"

#include <algorithm>
#include <charconv>
#include <cstdio>
#include <cstdlib>
#include <cstring>
#include <map>

#include <sys/ioctl.h>
#include <unistd.h>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/output_file.hpp"
#include "core/text.hpp"

namespace irrepwise::cli {
namespace {

constexpr int default_width = 100;
constexpr int least_width = 40;

const std::map<std::string, Format> formats_by_name = {
    {"text", Format::Text},         {"json", Format::Json},   {"csv", Format::Csv},
    {"markdown", Format::Markdown}, {"latex", Format::Latex}, {"html", Format::Html},
    {"yaml", Format::Yaml}};

const std::map<std::string, std::string> names_by_ending = {
    {".json", "json"}, {".csv", "csv"},  {".md", "markdown"}, {".tex", "latex"},
    {".html", "html"}, {".htm", "html"}, {".yaml", "yaml"},   {".yml", "yaml"}};

std::string ending(const std::string& path) {
  const std::string name = file_name(path);
  const std::size_t point = name.rfind('.');
  return point == std::string::npos ? std::string() : name.substr(point);
}

int terminal_width() {
  winsize size{};
  if (::ioctl(STDOUT_FILENO, TIOCGWINSZ, &size) == 0 && size.ws_col > 0) return size.ws_col;
  if (const char* columns = std::getenv("COLUMNS")) {
    int width = 0;
    const char* end = columns + std::strlen(columns);
    if (std::from_chars(columns, end, width).ptr == end && width > 0) return width;
  }
  return default_width;
}

bool prints_on_terminal(const OutputOptions& options) {
  return options.output.empty() && ::isatty(STDOUT_FILENO) == 1;
}

}  // namespace

void add_output_options(CLI::App& command, OutputOptions& options,
                        const std::vector<std::string>& formats) {
  options.formats = formats;
  std::string names;
  for (const std::string& name : formats) names += (names.empty() ? "" : ", ") + name;
  command
      .add_option("-f,--format", options.format,
                  names + "; by default what the ending of the output file says, otherwise text")
      ->check([formats, names](const std::string& name) {
        const bool known = std::find(formats.begin(), formats.end(), name) != formats.end();
        return known ? std::string() : fmt::format("'{}' is none of {}", name, names);
      })
      ->option_text("FORMAT")
      ->group("Output");
  command
      .add_option("-o,--output", options.output,
                  "Write to this file, whole or not at all, instead of standard output")
      ->option_text("FILE")
      ->group("Output");
  command
      .add_option("--width", options.width,
                  "Columns of text; by default those of the terminal, 100 in a file or pipe")
      ->option_text("N")
      ->check(CLI::Range(least_width, 1000))
      ->group("Output");
}

Format chosen_format(const OutputOptions& options) {
  if (!options.format.empty()) return formats_by_name.at(options.format);
  const auto by_ending = names_by_ending.find(ending(options.output));
  const std::vector<std::string>& known = options.formats;
  if (by_ending == names_by_ending.end()) {
    const std::string unknown = ending(options.output);
    if (unknown.empty() || unknown == ".txt" || known.empty()) return Format::Text;
    throw CLI::ValidationError(fmt::format(
        "{}: no format ends in {}; let the file end in .txt or that of a format, or give --format "
        "{}",
        options.output, unknown, joined(known, "or")));
  }
  if (std::find(known.begin(), known.end(), by_ending->second) == known.end()) {
    throw CLI::ValidationError(
        fmt::format("{}: this command does not write {}; it writes {}, by --format or the ending",
                    options.output, by_ending->second, joined(known)));
  }
  return formats_by_name.at(by_ending->second);
}

std::string written_report(const Report& report, const OutputOptions& options) {
  switch (chosen_format(options)) {
    case Format::Markdown:
      return report_markdown(report);
    case Format::Latex:
      return report_latex(report);
    case Format::Html:
      return report_html(report);
    case Format::Text:
    case Format::Json:
    case Format::Csv:
    case Format::Yaml:
      break;
  }
  return report_text(report, text_width(options));
}

int text_width(const OutputOptions& options) {
  if (options.width) return *options.width;
  return prints_on_terminal(options) ? std::max(least_width, terminal_width()) : default_width;
}

void refuse_to_overwrite(const OutputOptions& options, const std::vector<std::string>& files_read) {
  for (const std::string& file : files_read) {
    if (!options.output.empty() && same_file(options.output, file)) {
      throw Error(
          fmt::format("{}: is an input of this run; give another output file", options.output));
    }
  }
}

void emit(const OutputOptions& options, const std::string& text) {
  if (options.output.empty()) {
    write_descriptor(STDOUT_FILENO, text, "standard output");
  } else {
    write_file(options.output, text);
  }
}

void print_warnings(const OutputOptions& options, const std::vector<std::string>& warnings) {
  if (chosen_format(options) == Format::Text && prints_on_terminal(options)) return;
  for (const std::string& warning : warnings) {
    std::fprintf(stderr, "irrepwise: warning: %s\n", warning.c_str());
  }
}

}  // namespace irrepwise::cli
