// A complex that was built, the library of ligands and the polyhedra, in every format.
#pragma once

#include <string>

#include "complex/build.hpp"
#include "complex/ligand.hpp"
#include "output/report.hpp"

namespace irrepwise {

/// @param title  empty: the formula
[[nodiscard]] Report build_report(const BuiltComplex& complex, const std::string& title);
[[nodiscard]] std::string build_json(const BuiltComplex& complex, const std::string& title);

/// Extended XYZ; its comment says how the complex was made, its group and its electrons.
[[nodiscard]] std::string build_xyz(const BuiltComplex& complex, const std::string& title);

[[nodiscard]] Report ligands_report(const LigandLibrary& library);
[[nodiscard]] Report polyhedra_report();

}  // namespace irrepwise
