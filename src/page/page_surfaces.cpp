#include "page/page_surfaces.hpp"

#include <algorithm>
#include <cstdlib>
#include <utility>

#include "core/parallel.hpp"

namespace irrepwise {
namespace {

constexpr int batch = 4;  // levels computed before the size is looked at again

struct Task {
  int rank = 0;  // 0: HOMO or LUMO, 1: the level next to them …
  std::size_t molecule = 0;
  std::size_t level = 0;
};

std::vector<Task> tasks_for(const std::vector<PageMolecule>& molecules, int levels_around) {
  std::vector<Task> tasks;
  for (std::size_t m = 0; m < molecules.size(); ++m) {
    for (std::size_t i = 0; i < molecules[m].levels.size(); ++i) {
      const int rank =
          levels_from_frontier(molecules[m].result->levels, molecules[m].levels[i].level);
      if (rank <= levels_around) tasks.push_back({rank, m, i});
    }
  }
  std::stable_sort(tasks.begin(), tasks.end(),
                   [](const Task& a, const Task& b) { return a.rank < b.rank; });
  return tasks;
}

// So many that all orbitals find room, where that still gives a picture.
double vertices_for(const std::vector<PageMolecule>& molecules, const std::vector<Task>& tasks,
                    std::size_t most) {
  constexpr double characters_per_vertex = 29.0;  // two triangles to a vertex, in base64
  constexpr double fewest = 1'000.0;
  constexpr double enough = 3'000.0;
  double orbitals = 1.0;
  for (const Task& task : tasks) {
    const PageMolecule& molecule = molecules[task.molecule];
    const auto level = static_cast<std::size_t>(molecule.levels[task.level].level);
    orbitals += molecule.result->levels.levels[level].degeneracy;
  }
  return std::clamp(static_cast<double>(most) / orbitals / characters_per_vertex, fewest, enough);
}

}  // namespace

int levels_from_frontier(const Levels& levels, int level) {
  const int homo = levels.frontier.homo.value_or(-1);
  const int lumo = levels.frontier.lumo.value_or(static_cast<int>(levels.levels.size()));
  return std::min(std::abs(level - homo), std::abs(level - lumo));
}

void add_surfaces(std::vector<PageMolecule>& molecules, int levels_around, int threads,
                  std::size_t most) {
  const std::vector<Task> tasks = tasks_for(molecules, levels_around);
  const double vertices = vertices_for(molecules, tasks, most);
  std::size_t characters = 0;
  for (std::size_t first = 0; first < tasks.size() && characters < most; first += batch) {
    const std::size_t end = std::min(tasks.size(), first + batch);
    std::vector<std::vector<PageOrbital>> found(end - first);
    run_parallel(static_cast<int>(end - first), threads, [&](int i) {
      const Task& task = tasks[first + static_cast<std::size_t>(i)];
      const PageMolecule& molecule = molecules[task.molecule];
      found[static_cast<std::size_t>(i)] =
          page_orbitals(*molecule.result, molecule.levels[task.level].level, vertices);
    });
    for (std::size_t i = first; i < end; ++i) {
      std::size_t more = 0;
      for (const PageOrbital& orbital : found[i - first]) more += orbital.bytes();
      if (characters + more > most) return;
      characters += more;
      molecules[tasks[i].molecule].levels[tasks[i].level].orbitals = std::move(found[i - first]);
    }
  }
}

}  // namespace irrepwise
