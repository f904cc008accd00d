// irrepwise build: from a metal, a polyhedron and ligands to coordinates.
#include <memory>
#include <optional>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "cli/commands.hpp"
#include "cli/output_options.hpp"
#include "cli/variant_option.hpp"
#include "complex/build.hpp"
#include "core/error.hpp"
#include "core/parse.hpp"
#include "job/job.hpp"
#include "molecule/element.hpp"
#include "molecule/label.hpp"
#include "output/build_report.hpp"

namespace irrepwise::cli {
namespace {

struct BuildOptions {
  std::vector<std::string> words;
  std::optional<int> oxidation;
  std::optional<int> charge;
  std::optional<double> angle;
  std::string ligands;
  std::string list;
  std::string variant;
  OutputOptions output;
};

bool ends_with(const std::string& text, std::string_view end) {
  return std::string_view(text).ends_with(end);
}

bool is_job(const std::string& word) { return ends_with(word, ".yaml") || ends_with(word, ".yml"); }

bool wants_xyz(const OutputOptions& output) {
  return output.format == "xyz" || (output.format.empty() && ends_with(output.output, ".xyz"));
}

int vertex_number(std::string_view text, const std::string& word) {
  const std::optional<int> number = parse_whole_number(text);
  if (!number) {
    throw error_at(word, Error(fmt::format("found {}, expected the number of a vertex, as in "
                                           "Cl@1,3 or Cp@1+2+3",
                                           irrepwise::quoted(text))));
  }
  return *number;
}

// "NH3", "Cl@1,3" (one on each vertex), "Cp@1+2+3", "OAc@1+2" (one over all of them).
LigandRequest parse_ligand(const std::string& word) {
  LigandRequest request;
  request.place = word;
  const std::size_t at = word.rfind('@');
  request.ligand = word.substr(0, at);
  if (at == std::string::npos) return request;
  const std::string list = word.substr(at + 1);
  request.covers = list.find('+') != std::string::npos;
  const char separator = request.covers ? '+' : ',';
  std::size_t start = 0;
  for (;;) {
    const std::size_t end = list.find(separator, start);
    request.vertices.push_back(
        vertex_number(std::string_view(list).substr(start, end - start), word));
    if (end == std::string::npos) return request;
    start = end + 1;
  }
}

LigandLibrary library(const BuildOptions& options) {
  if (options.ligands.empty()) return built_in_ligands();
  return built_in_ligands().extended_by(read_ligands(options.ligands));
}

// One ligand on several vertices is a chelate where it has as many teeth.
void settle_teeth(LigandRequest& request, const LigandLibrary& library) {
  if (!request.covers) return;
  try {
    for (const Binding& binding : library.find(request.ligand).bindings) {
      const int n_vertices = static_cast<int>(request.vertices.size());
      if (binding.denticity() < 2 || binding.denticity() != n_vertices) continue;
      request.covers = false;
      request.denticity = n_vertices;
    }
  } catch (const Error& error) {
    throw error_at(request.place, error);
  }
}

ComplexSpec spec_of_words(const BuildOptions& options) {
  const std::vector<std::string>& words = options.words;
  CentreSpec centre;
  const std::optional<int> metal = atomic_number(words[0]);
  if (!metal) {
    throw Error(fmt::format("{} is neither an element nor a job file (.yaml){}",
                            irrepwise::quoted(words[0]), symbol_hint(words[0])));
  }
  centre.atomic_number = *metal;
  centre.polyhedron = Polyhedron(words[1], options.angle);
  centre.oxidation = options.oxidation;
  centre.oxidation_place = "--oxidation";
  ComplexSpec complex;
  complex.library = library(options);
  for (std::size_t i = 2; i < words.size(); ++i) {
    centre.ligands.push_back(parse_ligand(words[i]));
    settle_teeth(centre.ligands.back(), complex.library);
  }
  complex.charge = options.charge;
  complex.charge_place = "--charge";
  complex.centres.push_back(std::move(centre));
  return complex;
}

struct Built {
  BuiltComplex complex;
  std::string title;
  std::vector<std::string> files_read;
};

Built build(const BuildOptions& options) {
  if (options.words.size() >= 2 && !is_job(options.words[0])) {
    if (!options.variant.empty()) {
      throw CLI::ValidationError("--variant is one of a job file; a complex in words has none");
    }
    std::vector<std::string> files;
    if (!options.ligands.empty()) files.push_back(options.ligands);
    return {build_complex(spec_of_words(options)), "", files};
  }
  if (options.words.size() != 1 || !is_job(options.words[0])) {
    throw CLI::ValidationError(
        "expected a job file (.yaml), or a metal, a polyhedron and ligands such as "
        "Pt SP-4 Cl NH3 Cl NH3 --oxidation 2");
  }
  if (options.oxidation || options.angle || !options.ligands.empty()) {
    throw CLI::ValidationError(
        "--oxidation, --angle and --ligands go with a complex on the command line; in a job they "
        "stand in the file");
  }
  Job job = read_job_or_variant(options.words[0], options.variant);
  if (!job.built) {
    throw Error(
        fmt::format("{}: has no section `build`; give a metal, a polyhedron and ligands "
                    "there",
                    job_place(options.words[0], options.variant)));
  }
  if (options.charge) set_charge(job, *options.charge, "--charge");
  return {std::move(*job.built), job.title, job.source_files};
}

Report report_of(const Built& built, const BuildOptions& options) {
  Report report = build_report(built.complex, built.title);
  const std::string& file = options.words[0];
  if (is_job(file)) add_variants_fact(report, file, options.variant);
  return report;
}

void run_list(const BuildOptions& options) {
  if (!options.words.empty() || !options.variant.empty()) {
    throw CLI::ValidationError("--list stands alone");
  }
  if (wants_xyz(options.output) || options.output.format == "json") {
    throw CLI::ValidationError("--list is written as text, markdown, latex or html");
  }
  const bool ligands = options.list == "ligands";
  emit(options.output,
       written_report(ligands ? ligands_report(library(options)) : polyhedra_report(),
                      options.output));
}

void run(const BuildOptions& options) {
  if (!options.list.empty()) return run_list(options);
  const Built built = build(options);
  refuse_to_overwrite(options.output, built.files_read);
  if (!wants_xyz(options.output)) {
    const bool json = chosen_format(options.output) == Format::Json;
    return emit(options.output, json ? build_json(built.complex, built.title)
                                     : written_report(report_of(built, options), options.output));
  }
  emit(options.output, build_xyz(built.complex, built.title));
  if (options.output.output.empty()) return;
  OutputOptions terminal;
  terminal.width = options.output.width;
  emit(terminal, written_report(report_of(built, options), terminal));
}

}  // namespace

Command add_build(CLI::App& program) {
  CLI::App* app = program.add_subcommand(
      "build", "Coordinates of a complex from its metal, polyhedron and ligands");
  const auto options = std::make_shared<BuildOptions>();
  app->set_help_flag("-h,--help", "Show this help");
  app->add_option("complex", options->words,
                  "A job file with a section build, or: metal, polyhedral symbol, ligands in the "
                  "order of the vertices. NAME@1,3 puts a ligand on each of these vertices, "
                  "NAME@1+2+3 one over all of them: a π ligand, or a chelate with as many teeth")
      ->option_text("JOB | METAL POLYHEDRON LIGAND ...");
  add_variant_option(*app, options->variant);
  app->add_option("--oxidation", options->oxidation, "Oxidation state of the metal")
      ->option_text("N")
      ->group("Complex");
  app->add_option("-c,--charge", options->charge,
                  "Charge of the complex, from which the oxidation state follows")
      ->option_text("N")
      ->group("Complex");
  app->add_option("--angle", options->angle, "Free angle of the polyhedron, see --list polyhedra")
      ->option_text("DEGREES")
      ->group("Complex");
  app->add_option("--ligands", options->ligands,
                  "File of ligands (YAML) that adds to those in the program or replaces them")
      ->option_text("FILE")
      ->group("Complex");
  app->add_option("--list", options->list, "Show what is known: ligands or polyhedra")
      ->check(CLI::IsMember({"ligands", "polyhedra"}))
      ->option_text("WHAT")
      ->group("Complex");
  add_output_options(*app, options->output, {"text", "xyz", "json", "markdown", "latex", "html"});
  app->footer(
      "An output file that ends in .xyz gets the coordinates, and the report is printed.\n\n"
      "Examples:\n"
      "  irrepwise build Pt SP-4 Cl Cl NH3 NH3 --oxidation 2\n"
      "  irrepwise build Co OC-6 en en en --oxidation 3 --output tris.xyz\n"
      "  irrepwise build Mn OC-6 Cp@1+2+3 CO CO CO --charge 0\n"
      "  irrepwise build Pd SP-4 OAc@1+2 PMe3 PMe3 --oxidation 2\n"
      "  irrepwise build --list ligands");
  return {app, [options] { run(*options); }};
}

}  // namespace irrepwise::cli
