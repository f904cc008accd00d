// Variants of a complex: another ligand, metal or distance in place of the one there.
#include <algorithm>
#include <cstddef>

#include <fmt/format.h>

#include "complex/spec.hpp"
#include "core/error.hpp"

namespace irrepwise {
namespace {

bool meets(const std::vector<int>& a, const std::vector<int>& b) {
  return std::any_of(a.begin(), a.end(),
                     [&](int vertex) { return std::find(b.begin(), b.end(), vertex) != b.end(); });
}

}  // namespace

ComplexSpec substituted(const ComplexSpec& complex, const Substitution& change) {
  const int centre = change.centre;
  if (centre < 0 || centre >= static_cast<int>(complex.centres.size())) {
    throw Error(
        fmt::format("there is no centre {}, expected 1 to {}", centre + 1, complex.centres.size()));
  }
  ComplexSpec variant = complex;
  CentreSpec& spec = variant.centres[static_cast<std::size_t>(centre)];
  // A charge given for the whole becomes an oxidation state, which the variants keep: their charge
  // follows from their own ligands.
  std::vector<int> taken;
  for (const BridgeRequest& bridge : complex.bridges) {
    taken.push_back(bridge.vertices[static_cast<std::size_t>(centre)]);
  }
  const std::vector<SeatedLigand> seated = seat_ligands(spec, taken, complex.library);
  if (!change.place.empty()) spec.place = change.place;
  if (change.metal) spec.atomic_number = *change.metal;
  if (change.polyhedron) spec.polyhedron = *change.polyhedron;
  if (variant.charge && complex.centres.size() == 1 && !change.oxidation) {
    int ligands = 0;
    for (const SeatedLigand& one : seated) ligands += one.ligand->charge;
    spec.oxidation = *variant.charge - ligands;
    spec.oxidation_place = variant.charge_place;
  }
  variant.charge.reset();
  if (change.oxidation) spec.oxidation = change.oxidation;
  std::vector<LigandRequest> requests;
  for (const SeatedLigand& one : seated) {
    const bool leaves = std::any_of(change.ligands.begin(), change.ligands.end(),
                                    [&](const LigandRequest& request) {
                                      return meets(request.vertices, one.request.vertices);
                                    });
    if (!leaves) requests.push_back(one.request);
  }
  for (const LigandRequest& request : change.ligands) {
    if (request.vertices.empty()) {
      throw error_at(request.place.empty() ? request.ligand : request.place,
                     Error("name the vertices that this ligand takes over"));
    }
    requests.push_back(request);
  }
  for (const auto& [vertex, distance] : change.distances_angstrom) {
    const auto held = std::find_if(requests.begin(), requests.end(), [&](const auto& request) {
      return meets(request.vertices, {vertex});
    });
    if (held == requests.end()) {
      throw Error(fmt::format("no ligand is on vertex {}, whose distance is to change", vertex));
    }
    held->distance_angstrom = distance;
  }
  spec.ligands = std::move(requests);
  return variant;
}

}  // namespace irrepwise
