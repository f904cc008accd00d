// irrepwise symmetry: the group of a structure and all that follows from it, or a group alone.
#include <memory>
#include <optional>
#include <utility>

#include <fmt/format.h>

#include "basis/atom_kinds.hpp"
#include "cli/commands.hpp"
#include "cli/job_options.hpp"
#include "cli/output_options.hpp"
#include "cli/variant_option.hpp"
#include "core/at_place.hpp"
#include "core/error.hpp"
#include "molecule/xyz.hpp"
#include "output/symmetry_json.hpp"
#include "output/symmetry_report.hpp"

namespace irrepwise::cli {
namespace {

struct SymmetryCommandOptions {
  JobOptions job;
  OutputOptions output;
  SymmetrySections sections;
  bool local = false;
  bool transitions = false;
  bool all = false;
  std::string group;
  std::string symmetrise;
  std::vector<std::string> products;
  std::vector<std::string> terms;
  std::vector<std::string> descents;

  [[nodiscard]] bool asks_for_salcs() const { return sections.salcs || local; }
};

struct Computed {
  SymmetryResult result;
  std::vector<std::string> warnings;
};

// The reason of an error without the long remedy.
std::string first_words(const Error& error) {
  const std::string message = error.what();
  return message.substr(0, message.find(';'));
}

Computed compute(const Job& job, const SymmetryCommandOptions& options) {
  std::vector<std::string> warnings = geometry_warnings(job.molecule);
  SymmetryOptions symmetry_options = job.symmetry;
  std::optional<Basis> basis;
  try {
    basis = make_basis(job.molecule, job.parameters, job.overrides);
    symmetry_options.kinds = atom_kinds(*basis);
  } catch (const Error& error) {
    // The group does not need parameters; what does is refused only where asked for.
    if (options.asks_for_salcs() || options.transitions) throw;
    warnings.push_back("no reductions of orbitals: " + first_words(error));
  }
  SymmetryResult result = symmetry_of(job.molecule, symmetry_options, basis);
  const bool is_json = chosen_format(options.output) == Format::Json;
  // A program that reads JSON picks what it needs; all that is cheap is there.
  if (basis && (options.asks_for_salcs() || is_json)) {
    result.orbitals->salcs = options.local
                                 ? salc_table(result.symmetry, *basis, result.sets, result.frames)
                                 : salc_table(result.symmetry, *basis, result.sets);
  }
  if (basis && (options.transitions || is_json)) {
    try {
      Levels levels = solve_levels(result.symmetry, *basis, job.hueckel);
      warnings.insert(warnings.end(), levels.warnings.begin(), levels.warnings.end());
      result.frontier = frontier_symmetry(result.symmetry, std::move(levels));
    } catch (const Error& error) {
      if (options.transitions) throw;
      warnings.push_back("no transitions and terms: " + first_words(error));
    }
  }
  return {std::move(result), std::move(warnings)};
}

// Adds the place of what is wrong in the job.
template <typename Action>
auto for_job(const Job& job, const SymmetryCommandOptions& options, Action action) {
  try {
    return action();
  } catch (const Error& error) {
    throw error_in(job, job_place(options.job), error);
  }
}

// The questions of the command line, each with its option as the place of any error.
GroupAnswers answers(const PointGroup& group, const SymmetryCommandOptions& options) {
  return {at_place("--product", [&] { return answer_products(group, options.products); }),
          at_place("--terms", [&] { return answer_terms(group, options.terms); }),
          at_place("--descent", [&] { return answer_descents(group, options.descents); })};
}

// The structure made exact, turned and shifted back to where the input had it.
std::string symmetrised_xyz(const Job& job, const SymmetryCommandOptions& options) {
  SymmetryOptions symmetry_options = job.symmetry;
  symmetry_options.group = options.symmetrise;
  const MolecularSymmetry symmetry = find_symmetry(job.molecule, symmetry_options);
  const Eigen::Matrix3Xd positions =
      (symmetry.rotation.transpose() * symmetry.molecule.positions()).colwise() + symmetry.origin;
  return xyz_text(job.molecule.with_positions(positions), job.title);
}

// Character tables are broken by the width of what they are written for.
int width_of_tables(const OutputOptions& output) {
  constexpr int page = 84;         // of a LaTeX page, in columns of text
  constexpr int unlimited = 1000;  // Markdown and HTML scroll
  switch (chosen_format(output)) {
    case Format::Latex:
      return page;
    case Format::Markdown:
    case Format::Html:
      return unlimited;
    case Format::Text:
    case Format::Json:
    case Format::Csv:
    case Format::Yaml:
      break;
  }
  return text_width(output);
}

std::string written(const SymmetryResult& result, const SymmetryHeadings& headings,
                    const SymmetryCommandOptions& options) {
  switch (chosen_format(options.output)) {
    case Format::Json:
      return symmetry_json(result, headings);
    case Format::Csv:
      return symmetry_csv(result);
    case Format::Text:
    case Format::Markdown:
    case Format::Latex:
    case Format::Html:
    case Format::Yaml:
      break;
  }
  Report report =
      symmetry_report(result, headings, options.sections, width_of_tables(options.output));
  add_variants_fact(report, options.job.file, options.job.variant);
  return written_report(report, options.output);
}

std::string written(const PointGroup& group, const GroupAnswers& asked,
                    const SymmetryCommandOptions& options) {
  switch (chosen_format(options.output)) {
    case Format::Json:
      return group_json(group, asked);
    case Format::Csv:
      return group_csv(group, asked);
    case Format::Text:
    case Format::Markdown:
    case Format::Latex:
    case Format::Html:
    case Format::Yaml:
      break;
  }
  return written_report(group_report(group, asked, width_of_tables(options.output)),
                        options.output);
}

void check_usage(const SymmetryCommandOptions& options) {
  if (options.job.file.empty() && options.group.empty()) {
    throw CLI::ValidationError("give a FILE, or --group for a group without a molecule");
  }
  if (!options.job.file.empty() && !options.group.empty()) {
    throw CLI::ValidationError(
        "--group is for a group without a molecule; leave it or the FILE out (--symmetry makes the "
        "structure exact in a group)");
  }
  if (!options.group.empty() && !options.job.variant.empty()) {
    throw CLI::ValidationError("--variant is one of a job FILE; --group has none");
  }
  if (!options.group.empty() && (options.sections.salcs || options.sections.operations ||
                                 options.transitions || !options.symmetrise.empty())) {
    throw CLI::ValidationError("--group has no molecule; the option needs a FILE");
  }
}

void run(SymmetryCommandOptions options) {
  if (options.all) {
    options.sections = {true, true, true};
    options.transitions = true;
  }
  if (options.local) options.sections.salcs = true;
  if (options.transitions) options.sections.vibrations = true;
  check_usage(options);
  if (!options.group.empty()) {
    const PointGroup group(at_place("--group", [&] { return parse_schoenflies(options.group); }));
    return emit(options.output, written(group, answers(group, options), options));
  }
  if (!options.symmetrise.empty()) {
    options.symmetrise =
        at_place("--symmetrise", [&] { return parse_schoenflies(options.symmetrise).name(); });
  }
  Job job = read_job_with(options.job);
  refuse_to_overwrite(options.output, job.source_files);
  if (!options.symmetrise.empty()) {
    job.places["group"] = "--symmetrise";
    return emit(options.output,
                for_job(job, options, [&] { return symmetrised_xyz(job, options); }));
  }
  Computed computed = for_job(job, options, [&] { return compute(job, options); });
  computed.result.answers = answers(computed.result.symmetry.group, options);
  const std::string text = written(computed.result, {job.title, computed.warnings}, options);
  print_warnings(options.output, computed.warnings);
  emit(options.output, text);
}

}  // namespace

Command add_symmetry(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "symmetry", "Point group, axes, character table, reductions, SALCs and selection rules");
  const auto options = std::make_shared<SymmetryCommandOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  add_job_options(*app, options->job, FileOption::Optional);
  add_output_options(*app, options->output, {"text", "json", "csv", "markdown", "latex", "html"});
  const auto flag = [&](const char* name, bool& value, const char* help) {
    app->add_flag(name, value, help)->group("Sections");
  };
  flag("--operations", options->sections.operations,
       "Each operation and what it does to the atoms");
  flag("--salcs", options->sections.salcs, "SALCs of each set, shell and irrep");
  flag("--local", options->local,
       "SALCs in each atom's own frame: σ and π along its bond towards the centre");
  flag("--transitions", options->transitions,
       "Selection rules between frontier levels, terms of an open shell, vibrations");
  flag("-a,--all", options->all, "All of these");
  const auto ask = [&](const char* name, std::vector<std::string>& value, const char* text,
                       const char* help) {
    app->add_option(name, value, help)
        ->option_text(text)
        ->expected(1)
        ->take_all()
        ->group("Questions");
  };
  ask("--product", options->products, "IRREPS", "Direct product: e1g,t2u or eg^2; may be repeated");
  ask("--terms", options->terms, "CONFIG", "Terms of a configuration: t2g^2 or \"t2g^4 eg^2\"");
  ask("--descent", options->descents, "GROUP",
      "What becomes of the irreps in a subgroup: C2v, or one way to it as in C2v(C2')");
  app->add_option("--group", options->group, "A group without a molecule: D5h, S8, Ih …")
      ->option_text("GROUP")
      ->group("Questions");
  app->add_option("--symmetrise", options->symmetrise,
                  "Write the structure made exact in this group (XYZ), and nothing else")
      ->option_text("GROUP")
      ->group("Output");
  app->footer(
      "Exit code: 0 done, 1 something is wrong with input or computation, 2 with the options.\n\n"
      "Examples:\n"
      "  irrepwise symmetry complex.xyz\n"
      "  irrepwise symmetry complex.xyz --local --z Pt1,Cl2\n"
      "  irrepwise symmetry crystal.xyz --symmetrise D4h --output exact.xyz\n"
      "  irrepwise symmetry complex.xyz --descent C2v --product eg,eu\n"
      "  irrepwise symmetry --group D5h --terms \"e1'^2\"");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
