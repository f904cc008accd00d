#include "figure/vti.hpp"

#include <bit>
#include <cassert>
#include <cstdint>

#include <fmt/format.h>

#include "figure/svg.hpp"

namespace irrepwise {
namespace {

void put(std::string& bytes, std::uint32_t bits) {
  for (int shift = 0; shift < 32; shift += 8) bytes += static_cast<char>(bits >> shift & 0xFFu);
}

std::string quoted_attribute(const std::string& text) {
  std::string out;
  for (const char c : text) {
    out += c == '"' ? "&quot;" : c == '&' ? "&amp;" : c == '<' ? "&lt;" : std::string(1, c);
  }
  return out;
}

// The number of bytes, then the values, in one stretch of base64.
std::string array(const std::string& name, const std::vector<float>& values,
                  const std::string& attributes) {
  std::string bytes;
  bytes.reserve(4 * values.size() + 4);
  put(bytes, static_cast<std::uint32_t>(4 * values.size()));
  for (const float value : values) put(bytes, std::bit_cast<std::uint32_t>(value));
  return fmt::format(
      "<DataArray type=\"Float32\" Name=\"{}\"{} format=\"binary\">\n{}\n</DataArray>\n",
      quoted_attribute(name), attributes, base64(bytes));
}

}  // namespace

std::string vti_document(const OrbitalGrid& grid, const std::vector<std::string>& names,
                         const Molecule& molecule) {
  assert(names.size() == grid.values.size() && !names.empty());
  const GridShape& shape = grid.shape;
  const Eigen::Vector3d origin = shape.point(0, 0, 0);
  const std::string extent =
      fmt::format("0 {} 0 {} 0 {}", shape.size[0] - 1, shape.size[1] - 1, shape.size[2] - 1);
  std::string out = fmt::format(
      "<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n"
      "<!-- Orbitals in bohr^(-3/2); lengths in angstrom, standard frame of the point group. -->\n"
      "<VTKFile type=\"ImageData\" version=\"1.0\" byte_order=\"LittleEndian\" "
      "header_type=\"UInt32\">\n"
      "<ImageData WholeExtent=\"{0}\" Origin=\"{1} {2} {3}\" Spacing=\"{4} {4} {4}\">\n",
      extent, origin.x(), origin.y(), origin.z(), shape.spacing_angstrom);
  std::vector<float> numbers;
  std::vector<float> positions;
  for (const Atom& atom : molecule.atoms()) {
    numbers.push_back(static_cast<float>(atom.atomic_number));
    for (int i = 0; i < 3; ++i) positions.push_back(static_cast<float>(atom.position(i)));
  }
  const std::vector<float> integrals(grid.integrals.begin(), grid.integrals.end());
  out += "<FieldData>\n";
  out += array("atomic_numbers", numbers, fmt::format(" NumberOfTuples=\"{}\"", numbers.size()));
  out += array("positions_angstrom", positions,
               fmt::format(" NumberOfComponents=\"3\" NumberOfTuples=\"{}\"", numbers.size()));
  out += array("density_integrals", integrals,
               fmt::format(" NumberOfTuples=\"{}\"", integrals.size()));
  out += fmt::format("</FieldData>\n<Piece Extent=\"{}\">\n<PointData Scalars=\"{}\">\n", extent,
                     quoted_attribute(names.front()));
  for (std::size_t i = 0; i < names.size(); ++i) {
    const std::vector<float> values(grid.values[i].begin(), grid.values[i].end());
    out += array(names[i], values, "");
  }
  return out + "</PointData>\n<CellData/>\n</Piece>\n</ImageData>\n</VTKFile>\n";
}

}  // namespace irrepwise
