#include "cli/job_options.hpp"

#include <utility>

#include <fmt/format.h>

#include "cli/axis.hpp"
#include "cli/variant_option.hpp"
#include "core/at_place.hpp"
#include "core/error.hpp"
#include "symmetry/schoenflies.hpp"

namespace irrepwise::cli {
namespace {

// The same limits as in a job file: beyond them the decimal point has slipped.
constexpr double largest_k = 10.0;
constexpr double largest_tolerance_angstrom = 1.0;

double in_range(const char* option, double value, double largest) {
  if (!(value > 0.0 && value <= largest)) {
    throw Error(
        fmt::format("{}: found {}, expected more than 0 and at most {}", option, value, largest));
  }
  return value;
}

}  // namespace

bool JobOptions::is_used() const {
  return charge || multiplicity || k || tolerance || limit || !parameters.empty() ||
         !rule.empty() || !z.empty() || !x.empty() || !subgroup.empty() || !group.empty();
}

void add_job_options(CLI::App& command, JobOptions& options, FileOption file) {
  if (file != FileOption::None) {
    command
        .add_option("file", options.file,
                    "Coordinates in XYZ format (Å), or a job file that ends in .yaml or .yml")
        ->required(file == FileOption::Required)
        ->option_text("FILE");
  }
  add_variant_option(command, options.variant);
  const auto add = [&](const char* name, auto& value, const char* text, const char* help,
                       const char* group) {
    command.add_option(name, value, help)->option_text(text)->group(group);
  };
  add("-c,--charge", options.charge, "N", "Charge of the molecule", "Electrons");
  add("-m,--multiplicity", options.multiplicity, "N",
      "2S + 1; without it levels are filled from below", "Electrons");
  add("-p,--parameters", options.parameters, "FILE",
      "Parameter file (YAML) that replaces or extends the set in the program", "Method");
  add("--rule", options.rule, "RULE",
      "weighted (default), wolfsberg-helmholz, geometric-mean or cusachs", "Method");
  add("--k", options.k, "K", "Constant of the rule: 1.75 by default, 2 for geometric-mean",
      "Method");
  add("--tolerance", options.tolerance, "Å",
      "How near atoms must come to each other's images; 0.01 by default", "Symmetry");
  add("--z", options.z, "AXIS",
      "z axis: a vector (0,0,1), an atom (Pt1), two atoms (C1,C2) or the normal of three",
      "Symmetry");
  add("--x", options.x, "AXIS", "x axis, in the same way", "Symmetry");
  add("--symmetry", options.group, "GROUP",
      "Make the structure exact in this group, though it holds only roughly", "Symmetry");
  add("--limit", options.limit, "Å",
      "How far off --symmetry and the ladder of groups may look; 0.5 by default", "Symmetry");
  add("--subgroup", options.subgroup, "GROUP", "Work in this subgroup: D2h, C2v …", "Symmetry");
}

std::string job_place(const JobOptions& options) {
  return job_place(options.file, options.variant);
}

Job read_job_with(const JobOptions& options) {
  Job job = read_job_or_variant(options.file, options.variant);
  if (options.charge) set_charge(job, *options.charge, "--charge");
  if (options.multiplicity) {
    if (*options.multiplicity < 1) {
      throw Error(
          fmt::format("--multiplicity: found {}, expected 1 or more", *options.multiplicity));
    }
    job.hueckel.multiplicity = options.multiplicity;
    job.hueckel.electrons_by_irrep.clear();
    job.places["multiplicity"] = "--multiplicity";
  }
  if (!options.parameters.empty()) {
    job.parameters = read_parameters(options.parameters);
    job.source_files.push_back(options.parameters);
  }
  if (!options.rule.empty()) {
    const Rule rule = at_place("--rule", [&] { return parse_rule(options.rule); });
    if (rule != job.hueckel.rule) job.hueckel.k.reset();  // the job's K was meant for its rule
    job.hueckel.rule = rule;
  }
  if (options.k) {
    if (!default_k(job.hueckel.rule)) {
      throw Error(
          fmt::format("--k: the rule {} has no K; leave it out", rule_name(job.hueckel.rule)));
    }
    job.hueckel.k = in_range("--k", *options.k, largest_k);
  }
  if (options.tolerance)
    job.symmetry.tolerance_angstrom =
        in_range("--tolerance", *options.tolerance, largest_tolerance_angstrom);
  if (!options.z.empty()) {
    job.symmetry.z = at_place("--z", [&] { return parse_axis(options.z, job.molecule); });
    job.places["z"] = "--z";
  }
  if (!options.x.empty()) {
    job.symmetry.x = at_place("--x", [&] { return parse_axis(options.x, job.molecule); });
    job.places["x"] = "--x";
  }
  if (!options.group.empty()) {
    job.symmetry.group =
        at_place("--symmetry", [&] { return parse_schoenflies(options.group).name(); });
    job.places["group"] = "--symmetry";
  }
  if (options.limit) {
    job.symmetry.limit_angstrom = in_range("--limit", *options.limit, largest_tolerance_angstrom);
  }
  if (!options.subgroup.empty()) {
    job.symmetry.subgroup = options.subgroup;
    job.places["subgroup"] = "--subgroup";
  }
  return job;
}

}  // namespace irrepwise::cli
