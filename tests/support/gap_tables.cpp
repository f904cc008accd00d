#include "support/gap_tables.hpp"

#include <complex>
#include <fstream>
#include <sstream>

#include "core/error.hpp"
#include "support/paths.hpp"

namespace {

using irrepwise::Error;

// Numbers after the first comma of a line.
std::vector<double> numbers_of(const std::string& line, const std::string& place) {
  std::istringstream cells(line.substr(line.find(',') + 1));
  std::vector<double> numbers;
  std::string cell;
  while (std::getline(cells, cell, ',')) {
    std::istringstream text(cell);
    double number = 0.0;
    if (!(text >> number)) throw irrepwise::error_at(place, Error("no number: " + cell));
    numbers.push_back(number);
  }
  return numbers;
}

std::vector<int> whole_numbers_of(const std::string& line, const std::string& place) {
  std::vector<int> whole;
  for (const double number : numbers_of(line, place)) whole.push_back(static_cast<int>(number));
  return whole;
}

void add_irrep(GapTable& table, const std::vector<double>& parts, const std::string& place) {
  const Eigen::Index n_classes = static_cast<Eigen::Index>(table.class_sizes.size());
  if (n_classes == 0 || static_cast<Eigen::Index>(parts.size()) != 2 * n_classes) {
    throw irrepwise::error_at(place, Error("expected two numbers for each class"));
  }
  const Eigen::Index row = table.characters.rows();
  table.characters.conservativeResize(row + 1, n_classes);
  for (Eigen::Index k = 0; k < n_classes; ++k) {
    table.characters(row, k) = std::complex<double>(parts[2 * k], parts[2 * k + 1]);
  }
}

}  // namespace

std::map<std::string, GapTable> read_gap_tables() {
  const std::string path = reference_path("gap_character_tables.csv");
  std::ifstream file(path);
  if (!file) throw irrepwise::error_at(path, Error("cannot be read"));

  std::map<std::string, GapTable> tables;
  std::string symbols;
  GapTable table;
  const auto store = [&] {
    std::istringstream words(symbols);
    std::string symbol;
    while (words >> symbol) tables[symbol] = table;
  };

  std::string line;
  for (int number = 1; std::getline(file, line); ++number) {
    const std::string place = irrepwise::file_place(path, number);
    if (line.starts_with('#')) continue;
    const std::string keyword = line.substr(0, line.find(','));
    if (keyword == "group") {
      store();
      table = {};
      symbols = line.substr(line.find(',') + 1);
    } else if (keyword == "class_sizes") {
      table.class_sizes = whole_numbers_of(line, place);
    } else if (keyword == "element_orders") {
      table.element_orders = whole_numbers_of(line, place);
    } else if (keyword == "irrep") {
      add_irrep(table, numbers_of(line, place), place);
    } else {
      throw irrepwise::error_at(place, Error("unknown row: " + keyword));
    }
  }
  store();
  return tables;
}
