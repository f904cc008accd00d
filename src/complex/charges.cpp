#include "complex/charges.hpp"

#include <cstddef>
#include <optional>

#include <fmt/format.h>

#include "complex/electron_count.hpp"
#include "core/error.hpp"

namespace irrepwise {
namespace {

[[noreturn]] void fail_at(const std::string& place, const std::string& message) {
  if (place.empty()) throw Error(message);
  throw error_at(place, Error(message));
}

int ligand_charge(const Assembly& assembly) {
  int sum = 0;
  for (const Site& site : assembly.sites) sum += site.seated.ligand->charge;
  for (const PlacedBridge& bridge : assembly.bridges) sum += bridge.ligand->charge;
  return sum;
}

}  // namespace

Charges settle_charges(const ComplexSpec& complex, const Assembly& assembly) {
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
            "`charge`");
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
