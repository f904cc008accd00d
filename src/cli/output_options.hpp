// The options that say in which format, how wide and where to write, the same for every command.
#pragma once

#include <optional>
#include <string>
#include <vector>

#include <CLI/CLI.hpp>

#include "output/report.hpp"

namespace irrepwise::cli {

enum class Format { Text, Json, Csv, Markdown, Latex, Html, Yaml };

struct OutputOptions {
  std::string format;  // as given; empty: by the ending of the output file, otherwise text
  std::string output;  // empty: standard output
  std::optional<int> width;
  std::vector<std::string> formats = {};  // that the command can write, set by add_output_options
};

/// @param formats  the names this command can write: "text", "json" …
void add_output_options(CLI::App& command, OutputOptions& options,
                        const std::vector<std::string>& formats);

/// @throws CLI::ValidationError  where the ending of the output file stands for a format that the
///                               command cannot write and no format was given
[[nodiscard]] Format chosen_format(const OutputOptions& options);

/// The report in the format chosen, where that is one for people; otherwise as text.
[[nodiscard]] std::string written_report(const Report& report, const OutputOptions& options);

/// Columns for text: as given, otherwise those of the terminal (then of COLUMNS), 100 in a file or
/// pipe; at least 40.
[[nodiscard]] int text_width(const OutputOptions& options);

/// @throws Error  where the output would overwrite a file that was read
void refuse_to_overwrite(const OutputOptions& options, const std::vector<std::string>& files_read);

/// Writes to the file or to standard output; a byte that cannot be written is an Error.
void emit(const OutputOptions& options, const std::string& text);

/// Warnings on standard error, but not where the user sees them in the text just printed.
void print_warnings(const OutputOptions& options, const std::vector<std::string>& warnings);

}  // namespace irrepwise::cli
