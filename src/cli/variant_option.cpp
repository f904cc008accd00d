#include "cli/variant_option.hpp"

#include <algorithm>
#include <cstddef>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"
#include "job/variants.hpp"

namespace irrepwise::cli {
namespace {

// "chloride, fluoride, water", of many the first ones; "1 more" would be as long as the name.
std::string listed(const std::vector<std::string>& names) {
  constexpr std::size_t most = 12;
  if (names.size() <= most + 1) return joined(names);
  std::vector<std::string> shown(names.begin(), names.begin() + static_cast<std::ptrdiff_t>(most));
  shown.push_back(fmt::format("{} more", names.size() - most));
  return joined(shown);
}

// A name may hold commas, at which the option was split: pieces that make a name together are one.
std::vector<std::string> whole_names(const std::vector<std::string>& pieces,
                                     const std::vector<std::string>& names) {
  std::vector<std::string> out;
  for (std::size_t i = 0; i < pieces.size();) {
    std::string word = pieces[i];
    std::size_t end = i + 1;
    std::string longer = word;
    for (std::size_t j = i + 1; j < pieces.size(); ++j) {
      longer += "," + pieces[j];
      if (std::find(names.begin(), names.end(), longer) == names.end()) continue;
      word = longer;
      end = j + 1;
    }
    out.push_back(std::move(word));
    i = end;
  }
  return out;
}

}  // namespace

void add_variant_option(CLI::App& command, std::string& name) {
  command
      .add_option("--variant", name,
                  "Of a job with `variants:` this one; without it the job as it is")
      ->option_text("NAME");
}

int find_variant(const char* option, const std::vector<std::string>& names,
                 const std::string& name) {
  const auto found = std::find(names.begin(), names.end(), name);
  if (found != names.end()) return static_cast<int>(found - names.begin());
  const std::string nearest = nearest_word(name, names);
  throw Error(fmt::format("{}: there is no variant {}{}; there {} {}", option,
                          irrepwise::quoted(name),
                          nearest.empty() ? "" : " (did you mean '" + nearest + "'?)",
                          names.size() == 1 ? "is" : "are", listed(names)));
}

std::vector<int> find_variants(const char* option, const std::vector<std::string>& names,
                               const std::vector<std::string>& pieces) {
  std::vector<int> out;
  for (const std::string& name : whole_names(pieces, names)) {
    const int index = find_variant(option, names, name);
    if (std::find(out.begin(), out.end(), index) != out.end()) {
      throw Error(fmt::format("{}: '{}' is named twice; name each once", option, name));
    }
    out.push_back(index);
  }
  return out;
}

Job read_job_or_variant(const std::string& file, const std::string& variant) {
  if (variant.empty()) return read_job(file);
  if (!has_variants(file)) {
    throw Error(fmt::format(
        "--variant: {} has no variants; leave the option out, or list them under `variants:`",
        file));
  }
  const std::vector<VariantJob> jobs = variant_jobs(file);
  std::vector<std::string> names;
  for (const VariantJob& job : jobs) names.push_back(job.name);
  const int index = find_variant("--variant", names, variant);
  Job job = jobs[static_cast<std::size_t>(index)].read();
  job.title += (job.title.empty() ? "variant " : ", variant ") + variant;
  return job;
}

std::string job_place(const std::string& file, const std::string& variant) {
  return variant.empty() ? file : fmt::format("{}: variant '{}'", file, variant);
}

std::string words_on_variants(const std::string& file, const std::string& variant) {
  if (!variant.empty() || !has_variants(file)) return {};
  std::vector<std::string> names;
  for (VariantJob& job : variant_jobs(file)) names.push_back(std::move(job.name));
  const std::string which =
      names.size() == 1 ? "the only one" : fmt::format("one of {}", names.size());
  return fmt::format("none, the job as it is; --variant NAME takes {}: {}", which, listed(names));
}

void add_variants_fact(Report& report, const std::string& file, const std::string& variant) {
  std::string words = words_on_variants(file, variant);
  if (!words.empty()) report.facts.push_back({"variant", {std::move(words)}});
}

}  // namespace irrepwise::cli
