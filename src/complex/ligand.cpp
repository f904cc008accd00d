#include "complex/ligand.hpp"

#include <algorithm>
#include <utility>

#include <fmt/format.h>

#include "core/error.hpp"
#include "core/file.hpp"
#include "core/parse.hpp"
#include "core/text.hpp"

namespace irrepwise {
namespace {

std::string lower(std::string_view text) {
  std::string out(text);
  for (char& c : out) c = c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
  return out;
}

bool has_name(const Ligand& ligand, std::string_view name) {
  return ligand.name == name ||
         std::find(ligand.names.begin(), ligand.names.end(), name) != ligand.names.end();
}

bool has_name_in_any_case(const Ligand& ligand, std::string_view name) {
  const std::string wanted = lower(name);
  return lower(ligand.name) == wanted ||
         std::any_of(ligand.names.begin(), ligand.names.end(),
                     [&](const std::string& other) { return lower(other) == wanted; });
}

}  // namespace

LigandLibrary::LigandLibrary(std::vector<Ligand> ligands) : ligands_(std::move(ligands)) {
  std::map<std::string, const Ligand*> owners;
  for (const Ligand& ligand : ligands_) {
    std::vector<std::string> all = ligand.names;
    all.push_back(ligand.name);
    for (const std::string& name : all) {
      const auto [found, is_new] = owners.emplace(name, &ligand);
      if (is_new || found->second == &ligand) continue;
      throw Error(fmt::format("{} is a name of both {} and {}; names must differ", quoted(name),
                              found->second->name, ligand.name));
    }
  }
}

const Ligand& LigandLibrary::find(std::string_view name) const {
  for (const Ligand& ligand : ligands_) {
    if (has_name(ligand, name)) return ligand;
  }
  const Ligand* only = nullptr;
  int n_found = 0;
  for (const Ligand& ligand : ligands_) {
    if (!has_name_in_any_case(ligand, name)) continue;
    only = &ligand;
    ++n_found;
  }
  if (n_found == 1) return *only;
  std::vector<std::string> known;
  for (const Ligand& ligand : ligands_) {
    known.push_back(ligand.name);
    known.insert(known.end(), ligand.names.begin(), ligand.names.end());
  }
  const std::string nearest = nearest_word(name, known);
  throw Error(fmt::format("no ligand is called {}{} `irrepwise build --list ligands` shows all",
                          quoted(name),
                          nearest.empty() ? ";" : ", did you mean '" + nearest + "'?"));
}

LigandLibrary LigandLibrary::extended_by(const LigandLibrary& other) const {
  std::vector<Ligand> ligands;
  for (const Ligand& ligand : ligands_) {
    const bool replaced = std::any_of(other.ligands_.begin(), other.ligands_.end(),
                                      [&](const Ligand& o) { return o.name == ligand.name; });
    if (!replaced) ligands.push_back(ligand);
  }
  ligands.insert(ligands.end(), other.ligands_.begin(), other.ligands_.end());
  return LigandLibrary(std::move(ligands));
}

LigandLibrary read_ligands(const std::string& path) {
  return parse_ligands(read_text_file(path), path);
}

}  // namespace irrepwise
