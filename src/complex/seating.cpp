// Which ligand stands on which vertices.
#include <algorithm>
#include <cmath>
#include <cstddef>
#include <numbers>

#include <fmt/format.h>

#include "complex/spec.hpp"
#include "core/at_place.hpp"
#include "core/error.hpp"
#include "core/text.hpp"

namespace irrepwise {
namespace {

std::string binding_words(const Binding& binding) {
  if (binding.denticity() > 1) return "two teeth";
  return binding.hapticity() > 1 ? fmt::format("η{}", binding.hapticity()) : "one tooth";
}

const Binding& choose_binding(const Ligand& ligand, const LigandRequest& request) {
  for (const Binding& binding : ligand.bindings) {
    const bool teeth_fit = !request.denticity || binding.denticity() == *request.denticity;
    const bool donors_fit = !request.hapticity || binding.hapticity() == *request.hapticity;
    if (teeth_fit && donors_fit) return binding;
  }
  std::vector<std::string> known;
  for (const Binding& binding : ligand.bindings) known.push_back(binding_words(binding));
  throw Error(fmt::format("{} does not bind with {}; it binds with {}", ligand.name,
                          request.hapticity ? fmt::format("hapticity {}", *request.hapticity)
                                            : fmt::format("denticity {}", *request.denticity),
                          joined(known, "or")));
}

double angle_between(const Polyhedron& polyhedron, int a, int b) {
  const double cosine = polyhedron.vertex(a).dot(polyhedron.vertex(b));
  return std::acos(std::clamp(cosine, -1.0, 1.0)) * 180.0 / std::numbers::pi;
}

// Who holds each vertex, from 1; empty where nobody does.
class Seats {
 public:
  explicit Seats(const Polyhedron& polyhedron)
      : polyhedron_(&polyhedron), holders_(static_cast<std::size_t>(polyhedron.size()) + 1) {}

  void take(int vertex, const std::string& holder) {
    if (vertex < 1 || vertex > polyhedron_->size()) {
      throw Error(fmt::format("{} has no vertex {}, expected 1 to {}", polyhedron_->kind().symbol,
                              vertex, polyhedron_->size()));
    }
    std::string& now = holders_[static_cast<std::size_t>(vertex)];
    if (!now.empty()) {
      throw Error(
          fmt::format("vertex {} is taken twice, by {} and {}; give each vertex to one "
                      "ligand",
                      vertex, now, holder));
    }
    now = holder;
  }

  [[nodiscard]] std::vector<int> free() const {
    std::vector<int> vertices;
    for (int v = 1; v <= polyhedron_->size(); ++v) {
      if (holders_[static_cast<std::size_t>(v)].empty()) vertices.push_back(v);
    }
    return vertices;
  }

  // The lowest free vertex, and for a second tooth the lowest within its reach.
  [[nodiscard]] std::vector<int> next(int n_teeth, const std::string& name) const {
    std::vector<int> vertices = free();
    if (static_cast<int>(vertices.size()) < n_teeth) {
      throw Error(fmt::format("no vertex is left for {}; {} has {}", name,
                              polyhedron_->kind().symbol, polyhedron_->size()));
    }
    if (n_teeth == 2) {
      const auto near = std::find_if(vertices.begin() + 1, vertices.end(), [&](int v) {
        return angle_between(*polyhedron_, vertices[0], v) <= widest_chelate_degrees;
      });
      if (near != vertices.end()) std::swap(vertices[1], *near);
    }
    vertices.resize(static_cast<std::size_t>(n_teeth));
    return vertices;
  }

 private:
  const Polyhedron* polyhedron_;
  std::vector<std::string> holders_;
};

void check_span(const Polyhedron& polyhedron, const Ligand& ligand, const std::vector<int>& v) {
  const double angle = angle_between(polyhedron, v[0], v[1]);
  if (angle <= widest_chelate_degrees) return;
  throw Error(fmt::format(
      "{} cannot span vertices {} and {} of {}, which are {:.0f}° apart; give "
      "it two neighbouring vertices, at most {:.0f}° apart",
      ligand.name, v[0], v[1], polyhedron.kind().symbol, angle, widest_chelate_degrees));
}

// The vertices of each single ligand that a request stands for.
std::vector<std::vector<int>> split(const LigandRequest& request, const Ligand& ligand,
                                    const Binding& binding, const Seats& seats) {
  if (request.covers) {
    if (binding.denticity() > 1 || binding.hapticity() < 2) {
      throw Error(fmt::format("{} has no side to lie over several vertices with; give it {}",
                              ligand.name, binding.denticity() > 1 ? "`vertices`" : "one vertex"));
    }
    if (request.vertices.size() < 2) throw Error("expected two or more vertices to lie over");
    return {request.vertices};
  }
  const auto n_teeth = static_cast<std::size_t>(binding.denticity());
  if (request.vertices.empty()) return {seats.next(binding.denticity(), ligand.name)};
  if (request.vertices.size() % n_teeth != 0) {
    throw Error(fmt::format("{} has {} teeth and was given {} {}; expected a multiple of {}",
                            ligand.name, n_teeth, request.vertices.size(),
                            request.vertices.size() == 1 ? "vertex" : "vertices", n_teeth));
  }
  std::vector<std::vector<int>> groups;
  for (std::size_t i = 0; i < request.vertices.size(); i += n_teeth) {
    groups.emplace_back(request.vertices.begin() + static_cast<std::ptrdiff_t>(i),
                        request.vertices.begin() + static_cast<std::ptrdiff_t>(i + n_teeth));
  }
  return groups;
}

std::string teeth_words(int teeth) {
  return fmt::format("{} {}", teeth, teeth == 1 ? "tooth" : "teeth");
}

// "1+2+3": an example of so many vertices, as the command line takes them.
std::string first_vertices(int count) {
  std::string words;
  for (int vertex = 1; vertex <= count; ++vertex) {
    words += fmt::format("{}{}", vertex == 1 ? "" : "+", vertex);
  }
  return words;
}

// What could fill more vertices: a ligand that binds by fewer teeth than it can.
std::string more_teeth_words(const std::vector<std::vector<SeatedLigand>>& seated) {
  for (const std::vector<SeatedLigand>& group : seated) {
    for (const SeatedLigand& one : group) {
      for (const Binding& binding : one.ligand->bindings) {
        if (binding.denticity() <= one.binding->denticity()) continue;
        return fmt::format(
            "; {0} binds by {1} here and can bind by {2}: {{ligand: {0}, denticity: {3}}}, or "
            "{0}@{4} "
            "on the command line",
            one.ligand->name, teeth_words(one.binding->denticity()),
            teeth_words(binding.denticity()), binding.denticity(),
            first_vertices(binding.denticity()));
      }
    }
  }
  return {};
}

}  // namespace

std::vector<SeatedLigand> seat_ligands(const CentreSpec& centre, const std::vector<int>& taken,
                                       const LigandLibrary& library) {
  const Polyhedron& polyhedron = centre.polyhedron;
  Seats seats(polyhedron);
  at_place(centre.place, [&] {
    for (const int vertex : taken) seats.take(vertex, "a bridge");
  });
  // Those with vertices choose first; the others take what is left, in their order.
  std::vector<std::vector<SeatedLigand>> seated(centre.ligands.size());
  for (const bool has_vertices : {true, false}) {
    for (std::size_t i = 0; i < centre.ligands.size(); ++i) {
      const LigandRequest& request = centre.ligands[i];
      if (request.vertices.empty() == has_vertices) continue;
      at_place(request.place, [&] {
        const Ligand& ligand = library.find(request.ligand);
        const Binding& binding = choose_binding(ligand, request);
        for (const std::vector<int>& vertices : split(request, ligand, binding, seats)) {
          for (const int vertex : vertices) seats.take(vertex, ligand.name);
          if (binding.denticity() == 2) check_span(polyhedron, ligand, vertices);
          SeatedLigand one{&ligand, &binding, request};
          one.request.vertices = vertices;
          seated[i].push_back(std::move(one));
        }
      });
    }
  }
  if (const std::vector<int> left = seats.free(); !left.empty()) {
    std::vector<std::string> names;
    for (const int vertex : left) names.push_back(std::to_string(vertex));
    at_place(centre.place, [&] {
      throw Error(
          fmt::format("nothing is on {} {} of {}; give it a ligand, or choose a smaller "
                      "polyhedron{}",
                      left.size() == 1 ? "vertex" : "vertices", joined(names),
                      polyhedron.kind().symbol, more_teeth_words(seated)));
    });
  }
  std::vector<SeatedLigand> all;
  for (std::vector<SeatedLigand>& group : seated) {
    for (SeatedLigand& one : group) all.push_back(std::move(one));
  }
  return all;
}

}  // namespace irrepwise
