#include "output/levels_json.hpp"

#include <doctest/doctest.h>

#include <nlohmann/json.hpp>

#include "output/example.hpp"

using namespace irrepwise;
using Json = nlohmann::ordered_json;

namespace {

std::vector<std::string> keys_of(const Json& object) {
  std::vector<std::string> keys;
  for (const auto& item : object.items()) keys.push_back(item.key());
  return keys;
}

Eigen::MatrixXd matrix_of(const Json& rows) {
  Eigen::MatrixXd matrix(static_cast<int>(rows.size()), static_cast<int>(rows.front().size()));
  for (int i = 0; i < matrix.rows(); ++i) {
    for (int j = 0; j < matrix.cols(); ++j) matrix(i, j) = rows[std::size_t(i)][std::size_t(j)];
  }
  return matrix;
}

}  // namespace

TEST_CASE("the document has the keys that README lists, in that order") {
  const Json document = Json::parse(levels_json(result_of(skew_square())));
  CHECK(keys_of(document) ==
        std::vector<std::string>{"schema", "title", "formula", "charge", "electrons", "point_group",
                                 "symmetry", "method", "orbitals", "frontier", "atoms",
                                 "overlap_populations", "sum_of_occupied_ev", "warnings"});
  CHECK(keys_of(document["orbitals"][0]) == std::vector<std::string>{"label", "irrep", "number",
                                                                     "degeneracy", "energy_ev",
                                                                     "occupation", "composition"});
  CHECK(keys_of(document["frontier"]) ==
        std::vector<std::string>{"homo", "lumo", "homo_ev", "lumo_ev", "gap_ev", "open_shell"});
  CHECK(document["point_group"] == "D4h");  // common practice for a square MX4
  CHECK(document["formula"] == "Cl4Pt");
  CHECK(document["electrons"] == 10 + 4 * 7 + 2);
}

TEST_CASE("numbers read back as the very doubles of the result") {
  const LevelsResult result = result_of(skew_square());
  const Json document = Json::parse(levels_json(result));
  for (std::size_t i = 0; i < result.levels.levels.size(); ++i) {
    CHECK(document["orbitals"][i]["energy_ev"].get<double>() == result.levels.levels[i].energy_ev);
  }
  CHECK(document["atoms"][0]["charge"].get<double>() == result.populations.charge[0]);
  CHECK(levels_json(result) == levels_json(result_of(skew_square())));
}

TEST_CASE("coefficients and matrices are of one frame, that of the input") {
  // A second way: the levels came from symmetry blocks in the standard frame, S and H are formed
  // directly over atomic orbitals in the turned frame. C^T S C = 1 and C^T H C = energies tie them.
  const Json document =
      Json::parse(levels_json(result_of(skew_square()), {.matrices = true, .coefficients = true}));
  const Eigen::MatrixXd overlap = matrix_of(document["matrices"]["overlap"]);
  const Eigen::MatrixXd hamiltonian = matrix_of(document["matrices"]["hamiltonian_ev"]);
  const auto n = overlap.rows();
  REQUIRE(static_cast<Eigen::Index>(document["matrices"]["orbitals"].size()) == n);
  CHECK(document["matrices"]["orbitals"][0] == "Pt1 6s");
  Eigen::MatrixXd orbitals(n, n);
  Eigen::VectorXd energies(n);
  Eigen::Index column = 0;
  for (const Json& level : document["orbitals"]) {
    CHECK(level["coefficients"].size() == level["degeneracy"].get<std::size_t>());
    for (const Json& partner : level["coefficients"]) {
      REQUIRE(column < n);
      for (Eigen::Index i = 0; i < n; ++i) orbitals(i, column) = partner[std::size_t(i)];
      energies[column++] = level["energy_ev"];
    }
  }
  REQUIRE(column == n);
  const Eigen::MatrixXd one = orbitals.transpose() * overlap * orbitals;
  const Eigen::MatrixXd diagonal = orbitals.transpose() * hamiltonian * orbitals;
  CHECK((one - Eigen::MatrixXd::Identity(n, n)).cwiseAbs().maxCoeff() < 1e-11);
  CHECK((diagonal - Eigen::MatrixXd(energies.asDiagonal())).cwiseAbs().maxCoeff() < 1e-9);
}

TEST_CASE("atoms stand where the input has them, within the largest shift") {
  const Molecule molecule = skew_square();
  const Json document = Json::parse(levels_json(result_of(molecule)));
  const double limit = document["symmetry"]["largest_shift_angstrom"].get<double>() + 1e-12;
  double electrons = 0.0;
  for (int i = 0; i < molecule.size(); ++i) {
    const Json& atom = document["atoms"][static_cast<std::size_t>(i)];
    const Eigen::Vector3d found(atom["x"], atom["y"], atom["z"]);
    CHECK((found - molecule.atoms()[static_cast<std::size_t>(i)].position).norm() <= limit);
    CHECK(atom["index"] == i + 1);
    electrons += atom["gross_population"].get<double>();
  }
  CHECK(std::abs(electrons - document["electrons"].get<double>()) < 1e-9);
  CHECK(document["overlap_populations"].size() == 10);  // 5 atoms: 5 * 4 / 2 pairs
}

TEST_CASE("compositions are sorted, and what is left out is small") {
  const Json document = Json::parse(levels_json(result_of(benzene())));
  for (const Json& level : document["orbitals"]) {
    double sum = 0.0;
    double last = 2.0;
    for (const Json& part : level["composition"]) {
      const double share = part["share"];
      CHECK(std::abs(share) >= 1e-4);
      CHECK(share <= last + 1e-8);
      last = share;
      sum += share;
    }
    CHECK(std::abs(sum - 1.0) < 30 * 1e-4);  // 30 orbitals, each left out below 1e-4
  }
}
