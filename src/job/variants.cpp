#include "job/variants.hpp"

#include <cstddef>
#include <filesystem>
#include <memory>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/file.hpp"
#include "core/yaml.hpp"
#include "job/job_file.hpp"

namespace irrepwise {
namespace {

void check_keys(const YamlNode& variant) {
  variant.expect_keys("a variant",
                      {"name", "title", "geometry", "replace", "each", "charge", "multiplicity",
                       "occupations", "parameters", "overrides", "rule", "k", "symmetry"});
}

std::string replaced_in(std::string text, std::string_view what, const std::string& by) {
  for (std::size_t at = 0; (at = text.find(what, at)) != std::string::npos; at += by.size()) {
    text.replace(at, what.size(), by);
  }
  return text;
}

// "Pd CO"; or what the user calls it, with {metal} and {ligand} filled in.
std::string name_of(const YamlNode& variant, const EachChange& change) {
  const YamlNode* const name = variant.find("name");
  if (!name) {
    const bool both = !change.metal.empty() && !change.ligand.empty();
    return change.metal + (both ? " " : "") + change.ligand;
  }
  return replaced_in(replaced_in(name->word("a name"), "{metal}", change.metal), "{ligand}",
                     change.ligand);
}

// "family.yaml:9:5: variant 'water': what is wrong". The place may be that of the job itself, which
// does not say which variant it is.
Error with_variant(const Error& error, const std::string& name, const std::string& path,
                   const std::string& place) {
  const std::string text = error.what();
  const std::size_t end =
      text.starts_with(path + ":") ? text.find(": ", path.size()) : std::string::npos;
  if (end == std::string::npos) {
    return Error(fmt::format("{}: variant '{}': {}", place, name, text));
  }
  return Error(fmt::format("{}: variant '{}'{}", text.substr(0, end), name, text.substr(end)));
}

struct NamedChange {
  std::string name;
  std::string place;
  std::optional<Substitution> change;  // one of `each`
};

// What one item of the list stands for: itself, or one for each of its changes.
std::vector<NamedChange> named_changes(const YamlNode& item) {
  const YamlNode* const each = item.find("each");
  if (!each) return {{item.at("name").word("a name"), item.place(), {}}};
  std::vector<NamedChange> named;
  for (EachChange& change : read_each(*each)) {
    std::string place = each->place();
    if (const auto& ligands = change.change.ligands; !ligands.empty()) {
      place = ligands.front().place;
    }
    std::string name = name_of(item, change);
    change.change.place = place;
    named.push_back({std::move(name), std::move(place), std::move(change.change)});
  }
  if (named.empty()) each->fail("found nothing to put in, expected at least one");
  return named;
}

const YamlNode* find_list(const YamlNode& job) {
  return job.kind() == YamlNode::Kind::Map ? job.find("variants") : nullptr;
}

}  // namespace

bool has_variants(const std::string& path) {
  return is_job_file(path) && find_list(YamlNode::parse(read_text_file(path), path)) != nullptr;
}

std::vector<VariantJob> variant_jobs(const std::string& path) {
  const auto whole = [&] {
    return std::vector<VariantJob>{{std::filesystem::path(path).stem().string(), path,
                                    [path] { return read_job(path); },
                                    [](const Error& error) { return error; }}};
  };
  if (!is_job_file(path)) return whole();
  const auto node = std::make_shared<const YamlNode>(YamlNode::parse(read_text_file(path), path));
  const YamlNode* const list = find_list(*node);
  if (!list) return whole();
  const std::span<const YamlNode> items = list->list("a list of variants");
  if (items.empty()) list->fail("found no variant, expected at least one");
  std::vector<VariantJob> jobs;
  for (const YamlNode& item : items) {
    check_keys(item);
    for (NamedChange& named : named_changes(item)) {
      for (const VariantJob& other : jobs) {
        if (other.name != named.name) continue;
        const YamlNode* const name = item.find("name");
        throw Error(fmt::format("{}: the name '{}' is used already at {}; names must differ",
                                name ? name->place() : named.place, named.name, other.place));
      }
      const auto with_name = [name = named.name, path, place = item.place()](const Error& error) {
        return with_variant(error, name, path, place);
      };
      // The tree is kept alive by `node`, of which the item is a part.
      jobs.push_back({named.name, named.place,
                      [node, &item, path, with_name, change = named.change] {
                        try {
                          FileChain files;
                          return read_job_node(*node, &item, change ? &*change : nullptr, path,
                                               files);
                        } catch (const Error& error) {
                          throw with_name(error);
                        }
                      },
                      with_name});
    }
  }
  return jobs;
}

}  // namespace irrepwise
