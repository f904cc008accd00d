#include "complex/charges.hpp"

#include <cstddef>
#include <optional>

#include <fmt/format.h>

#include "complex/electron_count.hpp"
#include "core/error.hpp"

namespace irrepwise {
namespace {

constexpr int largest_oxidation = 20;  // far beyond any; keeps sums in range
constexpr int largest_charge = 1000;

[[noreturn]] void fail_at(const std::string& place, const std::string& message) {
  throw place.empty() ? Error(message) : error_at(place, Error(message));
}

void check_ranges(const ComplexSpec& complex) {
  for (const CentreSpec& centre : complex.centres) {
    const int oxidation = centre.oxidation.value_or(0);
    if (oxidation >= -largest_oxidation && oxidation <= largest_oxidation) continue;
    fail_at(centre.oxidation_place, fmt::format("found an oxidation state of {}, expected {} to {}",
                                                oxidation, -largest_oxidation, largest_oxidation));
  }
  const int charge = complex.charge.value_or(0);
  if (charge >= -largest_charge && charge <= largest_charge) return;
  fail_at(complex.charge_place, fmt::format("found a charge of {}, expected {} to {}", charge,
                                            -largest_charge, largest_charge));
}

int ligand_charge(const Assembly& assembly) {
  int sum = 0;
  for (const Site& site : assembly.sites) sum += site.seated.ligand->charge;
  for (const PlacedBridge& bridge : assembly.bridges) sum += bridge.ligand->charge;
  return sum;
}

}  // namespace

Charges settle_charges(const ComplexSpec& complex, const Assembly& assembly) {
  check_ranges(complex);
  const int ligands = ligand_charge(assembly);
  int known = 0;
  int n_open = 0;
  for (const CentreSpec& centre : complex.centres) {
    known += centre.oxidation.value_or(0);
    n_open += centre.oxidation ? 0 : 1;
  }
  if (n_open > 0 && !complex.charge) {
    fail_at(complex.centres.front().place,
            "neither the oxidation state of the metal nor the charge is known; give `oxidation` or "
            "`charge` (--oxidation or --charge on the command line)");
  }
  if (n_open == 0) {
    const int total = known + ligands;
    if (complex.charge && *complex.charge != total) {
      fail_at(complex.charge_place,
              fmt::format("the charge {} contradicts oxidation state {} and ligands {}, which "
                          "make {}; correct one, or leave one out",
                          signed_number(*complex.charge), signed_number(known),
                          signed_number(ligands), signed_number(total)));
    }
    Charges charges{{}, total};
    for (const CentreSpec& centre : complex.centres) charges.oxidation.push_back(*centre.oxidation);
    return charges;
  }
  const int left = *complex.charge - ligands - known;
  if (left % n_open != 0) {
    fail_at(complex.charge_place,
            fmt::format("the charge {} leaves an odd sum of oxidation states, {}, for two "
                        "metals; give `oxidation` for each",
                        signed_number(*complex.charge), signed_number(left)));
  }
  Charges charges{{}, *complex.charge};
  for (const CentreSpec& centre : complex.centres) {
    charges.oxidation.push_back(centre.oxidation.value_or(left / n_open));
  }
  return charges;
}

}  // namespace irrepwise
