// The program: parses the command line, runs one command, turns errors into messages and codes.
#include <algorithm>
#include <csignal>
#include <cstdio>
#include <exception>
#include <sstream>
#include <string>
#include <vector>

#include <CLI/CLI.hpp>

#include <unistd.h>

#include "cli/commands.hpp"
#include "cli/help_format.hpp"
#include "core/error.hpp"
#include "core/output_file.hpp"
#include "core/text.hpp"

namespace {

using namespace irrepwise;

constexpr int failed = 1;       // input or computation
constexpr int wrong_usage = 2;  // command line

int report(const std::string& message, int code) {
  std::fprintf(stderr, "irrepwise: %s\n", message.c_str());
  return code;
}

std::string did_you_mean(const std::string& word, const std::vector<std::string>& known) {
  const std::string nearest = nearest_word(word, known);
  return nearest.empty() ? "" : "; did you mean '" + nearest + "'?";
}

// What the parser found wrong, in our words where its own do not say what to do.
std::string usage_message(const CLI::App& program, const CLI::ParseError& error,
                          const std::vector<std::string>& arguments) {
  const std::vector<CLI::App*> chosen = program.get_subcommands();
  if (chosen.empty()) {
    std::vector<std::string> commands;
    for (const CLI::App* command : program.get_subcommands({})) {
      commands.push_back(command->get_name());
    }
    if (arguments.empty()) return "name a command: " + joined(commands, "or");
    return "'" + arguments.front() + "' is no command" + did_you_mean(arguments.front(), commands);
  }
  if (dynamic_cast<const CLI::ExtrasError*>(&error) != nullptr) {
    std::vector<std::string> known;
    for (const CLI::Option* option : chosen.back()->get_options()) {
      for (const std::string& name : option->get_lnames()) known.push_back("--" + name);
    }
    for (const std::string& argument : arguments) {
      if (argument.starts_with("--") &&
          std::find(known.begin(), known.end(), argument) == known.end()) {
        return "there is no option " + argument + did_you_mean(argument, known);
      }
    }
  }
  if (dynamic_cast<const CLI::ConversionError*>(&error) != nullptr) {
    const std::string message = error.what();  // "Could not convert: --charge = one"
    const std::size_t option = message.find("--");
    const std::size_t equals = message.find(" = ", option);
    if (option != std::string::npos && equals != std::string::npos) {
      const std::string name = message.substr(option, equals - option);
      const CLI::Option* const known = chosen.back()->get_option_no_throw(name);
      const bool whole = known != nullptr && known->get_type_name() == "INT";
      return name + ": found '" + message.substr(equals + 3) + "', expected a " +
             (whole ? "whole number" : "number");
    }
  }
  return error.what();
}

int answer_parse_error(const CLI::App& program, const CLI::ParseError& error,
                       const std::vector<std::string>& arguments) {
  if (error.get_exit_code() == 0) {  // --help or --version
    std::ostringstream out;
    std::ostringstream unused;
    static_cast<void>(program.exit(error, out, unused));
    write_descriptor(STDOUT_FILENO, out.str(), "standard output");
    return 0;
  }
  std::string help = "irrepwise";
  for (const CLI::App* chosen : program.get_subcommands()) help += " " + chosen->get_name();
  return report(usage_message(program, error, arguments) + "; see " + help + " --help",
                wrong_usage);
}

// An empty word is a variable of a script that was not set: passed over, it would mean the default.
int refuse_empty_words(int argc, char** argv) {
  for (int i = 1; i < argc; ++i) {
    const std::string word = argv[i];
    const bool lacks_value = word.starts_with("--") && word.ends_with("=");
    if (!word.empty() && !lacks_value) continue;
    const std::string before = i > 1 ? argv[i - 1] : "irrepwise";
    const std::string place = lacks_value ? word.substr(0, word.size() - 1) : "behind " + before;
    return report(place + ": found nothing, expected a value or name; give one, or leave it out",
                  wrong_usage);
  }
  return 0;
}

// The command line so that a shell reads it back as the same words.
std::string repeated(int argc, char** argv) {
  std::string command = "irrepwise";
  for (int i = 1; i < argc; ++i) {
    const std::string word = argv[i];
    const bool plain =
        !word.empty() &&
        word.find_first_not_of(
            "abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789-_.,:/+=@%") ==
            std::string::npos;
    command += ' ';
    if (plain) {
      command += word;
      continue;
    }
    command += '\'';
    for (const char c : word) command += c == '\'' ? "'\\''" : std::string(1, c);
    command += '\'';
  }
  return command;
}

int run(int argc, char** argv) {
  CLI::App program(
      "Extended Hückel orbitals of molecules, labelled by symmetry.\n"
      "Takes a geometry, finds its point group, and answers with the orbital energies, each with\n"
      "its irreducible representation, what it is made of, and the charges and bonds that follow.",
      "irrepwise");
  program.formatter(cli::help_format());  // commands take it over as they are added
  program.set_help_flag("-h,--help", "Show this help");
  program.set_version_flag("--version", "irrepwise " IRREPWISE_VERSION, "Show the version");
  program.require_subcommand(1);
  program.footer(
      "Examples:\n"
      "  irrepwise levels complex.xyz --charge -2\n"
      "  irrepwise levels job.yaml --format json --output levels.json\n"
      "  irrepwise symmetry complex.xyz --salcs --local\n"
      "  irrepwise build Pt SP-4 Cl Cl NH3 NH3 --oxidation 2 --output cis.xyz\n"
      "  irrepwise compare family.yaml --reference chloride\n"
      "  irrepwise table complex.xyz frontier+5 --of shares\n"
      "  irrepwise report complex.xyz --output report.html\n"
      "  irrepwise parameters Pt Cl\n"
      "Each command has its own help: irrepwise levels --help");
  const std::vector<cli::Command> commands = {cli::add_levels(program),
                                              cli::add_symmetry(program),
                                              cli::add_compare(program),
                                              cli::add_build(program),
                                              cli::add_table(program),
                                              cli::add_draw(program),
                                              cli::add_report(program, repeated(argc, argv)),
                                              cli::add_parameters(program)};
  if (const int code = refuse_empty_words(argc, argv); code != 0) return code;
  try {
    program.parse(argc, argv);
    for (const cli::Command& command : commands) {
      if (command.app->parsed()) command.run();
    }
    return 0;
  } catch (const CLI::ParseError& error) {
    return answer_parse_error(program, error, {argv + 1, argv + argc});
  }
}

}  // namespace

int main(int argc, char** argv) {
  // A file-size limit then fails a write instead of killing us with half a file beside.
  static_cast<void>(std::signal(SIGXFSZ, SIG_IGN));
  try {
    return run(argc, argv);
  } catch (const Error& error) {
    return report(error.what(), failed);
  } catch (const std::bad_alloc&) {
    return report("not enough memory for a molecule of this size", failed);
  } catch (const std::exception& error) {
    return report(std::string("internal error: ") + error.what(), failed);
  }
}
