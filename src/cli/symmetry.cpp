// irrepwise symmetry: the group of a structure and all that follows from it, or a group alone.
#include <algorithm>
#include <memory>

#include <fmt/format.h>

#include "basis/atom_kinds.hpp"
#include "cli/commands.hpp"
#include "cli/job_options.hpp"
#include "cli/output_options.hpp"
#include "core/error.hpp"
#include "core/text.hpp"
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
};

void compute_orbitals(SymmetryResult& result, const Job& job, const Basis& basis,
                      const SymmetryCommandOptions& options) {
  const MolecularSymmetry& symmetry = result.symmetry;
  result.orbitals =
      OrbitalSymmetry{basis, orbital_reductions(symmetry, basis, result.sets, result.frames), {}};
  if (options.sections.salcs) {
    result.orbitals->salcs = options.local
                                 ? salc_table(symmetry, basis, result.sets, result.frames)
                                 : salc_table(symmetry, basis, result.sets);
  }
  if (!options.transitions) return;
  FrontierSymmetry frontier{solve_levels(symmetry, basis, job.hueckel), {}, {}, {}, {}};
  frontier.transitions = frontier_transitions(symmetry.group, frontier.levels);
  frontier.open = open_levels(symmetry.group, frontier.levels);
  if (!frontier.open.empty()) {
    frontier.terms = find_terms(symmetry.group, frontier.open);
    frontier.ground = ground_terms(symmetry, frontier.terms);
  }
  for (const std::string& warning : frontier.levels.warnings) result.warnings.push_back(warning);
  result.frontier = std::move(frontier);
}

SymmetryResult compute(const Job& job, const SymmetryCommandOptions& options) {
  SymmetryOptions symmetry_options = job.symmetry;
  std::optional<Basis> basis;
  std::vector<std::string> warnings = geometry_warnings(job.molecule);
  try {
    basis = make_basis(job.molecule, job.parameters, job.overrides);
    symmetry_options.kinds = atom_kinds(*basis);
  } catch (const Error& error) {
    // The group does not need parameters; what does is refused only where asked for.
    if (options.sections.salcs || options.transitions) throw;
    const std::string message = error.what();
    warnings.push_back("no reductions of orbitals: " + message.substr(0, message.find('\n')));
  }
  MolecularSymmetry symmetry = find_symmetry(job.molecule, symmetry_options);
  std::vector<EquivalentAtoms> sets = equivalent_atoms(symmetry);
  std::vector<AtomSet> named_sets = atom_sets(symmetry);
  auto frames = frames_of_sets(symmetry, sets);
  SymmetryResult result{job.title,
                        job.molecule,
                        std::move(symmetry),
                        symmetry_options.limit_angstrom,
                        symmetry_ladder(job.molecule, symmetry_options),
                        {},
                        symmetry_options.z || symmetry_options.x,
                        std::move(sets),
                        std::move(named_sets),
                        std::move(frames),
                        {},
                        {},
                        {},
                        {},
                        {},
                        std::move(warnings)};
  if (result.user_axes) {
    SymmetryOptions by_convention = symmetry_options;
    by_convention.z.reset();
    by_convention.x.reset();
    result.axis_effect = axis_effect(find_symmetry(job.molecule, by_convention), result.symmetry);
  }
  if (const auto centre = find_centre(result.symmetry)) result.central_atom = centre->atom;
  result.displacements = displacement_irreps(result.symmetry);
  if (basis) compute_orbitals(result, job, *basis, options);
  result.answers = answer_group(result.symmetry.group, options.products, options.terms,
                                options.descents);
  return result;
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

std::string written(const SymmetryResult& result, const SymmetryCommandOptions& options) {
  switch (chosen_format(options.output)) {
    case Format::Json:
      return symmetry_json(result);
    case Format::Csv:
      return symmetry_csv(result);
    case Format::Markdown:
      return report_markdown(symmetry_report(result, options.sections, 1000));
    case Format::Text:
    case Format::Latex:
    case Format::Yaml:
      break;
  }
  const int width = text_width(options.output);
  return report_text(symmetry_report(result, options.sections, width), width);
}

std::string written(const PointGroup& group, const GroupAnswers& answers,
                    const SymmetryCommandOptions& options) {
  switch (chosen_format(options.output)) {
    case Format::Json:
      return group_json(group, answers);
    case Format::Csv:
      return group_csv(group, answers);
    case Format::Markdown:
      return report_markdown(group_report(group, answers, 1000));
    case Format::Text:
    case Format::Latex:
    case Format::Yaml:
      break;
  }
  const int width = text_width(options.output);
  return report_text(group_report(group, answers, width), width);
}

void run_group(const SymmetryCommandOptions& options) {
  const PointGroup group = [&] {
    try {
      return PointGroup(parse_schoenflies(options.group));
    } catch (const Error& error) {
      throw error_at("--group", error);
    }
  }();
  const GroupAnswers answers =
      answer_group(group, options.products, options.terms, options.descents);
  emit(options.output, written(group, answers, options));
}

void check_usage(const SymmetryCommandOptions& options) {
  if (options.job.file.empty() == options.group.empty()) {
    throw CLI::ValidationError("give a FILE, or --group for a group without a molecule");
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
  // A program that reads JSON picks what it needs; all that is cheap is there.
  if (chosen_format(options.output) == Format::Json && options.group.empty()) {
    options.sections.salcs = options.transitions = true;
  }
  check_usage(options);
  if (!options.group.empty()) return run_group(options);
  const Job job = read_job_with(options.job);
  refuse_to_overwrite(options.output, job.source_files);
  try {
    if (!options.symmetrise.empty()) return emit(options.output, symmetrised_xyz(job, options));
    const SymmetryResult result = compute(job, options);
    const std::string text = written(result, options);
    print_warnings(options.output, result.warnings);
    emit(options.output, text);
  } catch (const Error& error) {
    throw error_at(options.job.file, error);
  }
}

}  // namespace

Command add_symmetry(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "symmetry", "Point group, axes, character table, reductions, SALCs and selection rules");
  const auto options = std::make_shared<SymmetryCommandOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  add_job_options(*app, options->job, FileOption::Optional);
  add_output_options(*app, options->output, {"text", "json", "csv", "markdown"});
  const auto flag = [&](const char* name, bool& value, const char* help) {
    app->add_flag(name, value, help)->group("Sections");
  };
  flag("--operations", options->sections.operations, "Each operation and what it does to the atoms");
  flag("--salcs", options->sections.salcs, "SALCs of each set, shell and irrep");
  flag("--local", options->local, "SALCs in each atom's own frame: σ and π about the centre");
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
