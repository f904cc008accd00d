#include "symmetry/irreps.hpp"

namespace irrepwise {

std::vector<Irrep> generate_irreps(const Schoenflies& symbol,
                                   const std::vector<Eigen::Matrix3d>& operations) {
  switch (symbol.family) {
    case Family::T:
    case Family::Td:
    case Family::Th:
    case Family::O:
    case Family::Oh:
    case Family::I:
    case Family::Ih:
    case Family::Kh:
      return polyhedral_irreps(symbol, operations);
    default:
      return axial_irreps(symbol, operations);
  }
}

}  // namespace irrepwise
