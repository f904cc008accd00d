// The commands of the program: each is added to the parser and, once chosen, run.
#pragma once

#include <functional>
#include <string>

#include <CLI/CLI.hpp>

namespace irrepwise::cli {

struct Command {
  CLI::App* app;              // parsed() tells whether the user chose it
  std::function<void()> run;  // throws Error, or CLI::ParseError for options that contradict
};

[[nodiscard]] Command add_compare(CLI::App& program);
[[nodiscard]] Command add_draw(CLI::App& program);
[[nodiscard]] Command add_build(CLI::App& program);
[[nodiscard]] Command add_levels(CLI::App& program);
[[nodiscard]] Command add_parameters(CLI::App& program);
/// @param command  the command line as the user wrote it, which the page repeats
[[nodiscard]] Command add_report(CLI::App& program, const std::string& command);
[[nodiscard]] Command add_symmetry(CLI::App& program);
[[nodiscard]] Command add_table(CLI::App& program);

}  // namespace irrepwise::cli
