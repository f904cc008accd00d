#include "fuzz/targets.hpp"

#include <exception>
#include <fstream>

#include <fmt/format.h>

#include "basis/parameter_set.hpp"
#include "core/error.hpp"
#include "job/job.hpp"
#include "molecule/xyz.hpp"

using namespace irrepwise;

namespace {

template <typename Read>
Outcome outcome(const std::string& place, Read read) {
  try {
    return {true, read()};
  } catch (const Error& error) {
    const std::string message = error.what();
    if (message.find(place) == std::string::npos) {
      return {false, "a refusal without its place: " + message};
    }
    return {};
  } catch (const std::exception& error) {
    return {false, fmt::format("another exception: {}", error.what())};
  }
}

std::string fault_of(const Molecule& molecule) {
  if (!molecule.positions().allFinite()) return "a position that is not finite";
  return {};
}

// What is written is read again as the same molecule.
std::string round_trip_fault(const Molecule& molecule) {
  const Molecule again = parse_xyz(xyz_text(molecule, ""), "fuzz").molecule;
  if (again.size() != molecule.size()) return "atoms lost in writing";
  const double error = (again.positions() - molecule.positions()).cwiseAbs().maxCoeff();
  return error < 1e-9 ? "" : fmt::format("positions moved by {} Å in writing", error);
}

}  // namespace

Outcome fuzz_xyz(const std::string& text) {
  return outcome("fuzz", [&] {
    const Molecule molecule = parse_xyz(text, "fuzz").molecule;
    const std::string fault = fault_of(molecule);
    return fault.empty() ? round_trip_fault(molecule) : fault;
  });
}

Outcome fuzz_parameters(const std::string& text) {
  return outcome("fuzz", [&]() -> std::string {
    const ParameterSet set = parse_parameters(text, "fuzz");
    for (const auto& [number, element] : set.elements()) {
      if (element.shells.empty()) return fmt::format("element {} without shells", number);
    }
    return {};
  });
}

Outcome fuzz_job(const std::string& text) {
  const std::string name = "fuzzed_job.yaml";
  std::ofstream(name, std::ios::binary | std::ios::trunc)
      .write(text.data(), static_cast<std::streamsize>(text.size()));
  // A refusal may lie in a geometry file named there, but then that file is named.
  return outcome(":", [&] { return fault_of(read_job(name).molecule); });
}
