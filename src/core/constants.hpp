// Physical constants, CODATA 2022 (NIST, physics.nist.gov/constants).
#pragma once

namespace irrepwise {

inline constexpr double bohr_in_angstrom = 0.529177210544;  // atomic unit of length, 1 bohr in Å
inline constexpr double hartree_in_ev = 27.211386245981;    // atomic unit of energy, in eV

}  // namespace irrepwise
