#include "figure/orbital_field.hpp"

#include <algorithm>
#include <cassert>
#include <cmath>

#include "core/constants.hpp"
#include "harmonics/real_harmonics.hpp"

namespace irrepwise {
namespace {

// Y_00, and what Y_1m is along its own axis.
const double s_harmonic = real_harmonics(0, Eigen::Vector3d::UnitX())(0);
const double p_harmonic = real_harmonics(1, Eigen::Vector3d::UnitX())(0);

// N = (2 zeta)^(n + 1/2) / sqrt((2n)!)
double radial_norm(const SlaterRadial& function) {
  const int n = function.n();
  return std::exp((n + 0.5) * std::log(2.0 * function.zeta()) - 0.5 * std::lgamma(2.0 * n + 1.0));
}

double power(double r, int exponent) {
  double result = 1.0;
  for (int i = 0; i < exponent; ++i) result *= r;
  return result;
}

double radial_value(const ContractedRadial& radial, double r) {
  double value = 0.0;
  for (const ContractedRadial::Term& term : radial.terms()) {
    value += term.coefficient * radial_norm(term.function) * power(r, term.function.n() - 1) *
             std::exp(-term.function.zeta() * r);
  }
  return value;
}

struct Reaches {
  double value_bohr = 0.0;
  double density_bohr = 0.0;
};

// Walks inwards from where nothing is left.
Reaches shell_reaches(const ContractedRadial& radial, double largest_coefficient) {
  constexpr double least_value = 1e-7;    // bohr^(-3/2)
  constexpr double least_density = 2e-4;  // electrons
  constexpr double step = 0.1;            // bohr
  double zeta = radial.terms().front().function.zeta();
  for (const auto& term : radial.terms()) zeta = std::min(zeta, term.function.zeta());
  double r = (40.0 + 4.0 * radial.n()) / zeta;  // where exp(-zeta r) is below 1e-17
  Reaches reaches;
  double outside = 0.0;
  while (r > 0.0 && reaches.density_bohr == 0.0) {
    const double value = std::abs(radial_value(radial, r) * largest_coefficient);
    if (reaches.value_bohr == 0.0 && value > least_value) reaches.value_bohr = r + step;
    outside += value * value * r * r * step;
    if (outside > least_density) reaches.density_bohr = r;
    r -= step;
  }
  return reaches;
}

}  // namespace

OrbitalField::OrbitalField(const Molecule& molecule, const Basis& basis,
                           const Eigen::Ref<const Eigen::MatrixXd>& orbitals)
    : count_(static_cast<int>(orbitals.cols())) {
  assert(orbitals.rows() == basis.n_orbitals);
  first_shell_.push_back(0);
  for (int atom = 0; atom < molecule.size(); ++atom) {
    Centre centre;
    centre.position_angstrom = molecule.atoms()[static_cast<std::size_t>(atom)].position;
    const int first = basis.first_shell[static_cast<std::size_t>(atom)];
    const int end = basis.first_shell[static_cast<std::size_t>(atom) + 1];
    for (int s = first; s < end; ++s) {
      const Shell& shell = basis.shells[static_cast<std::size_t>(s)];
      FieldShell field;
      field.l = shell.l;
      const Eigen::MatrixXd rows = orbitals.middleRows(shell.first_orbital, shell.size());
      field.coefficients.assign(rows.data(), rows.data() + rows.size());
      const double largest = rows.colwise().norm().maxCoeff();
      if (largest < 1e-12) continue;
      field.first_term = static_cast<int>(terms_.size());
      for (const auto& term : shell.radial.terms()) {
        terms_.push_back({term.coefficient * radial_norm(term.function), term.function.n() - 1,
                          term.function.zeta()});
      }
      field.end_term = static_cast<int>(terms_.size());
      const Reaches reaches = shell_reaches(shell.radial, largest);
      centre.reach_angstrom =
          std::max(centre.reach_angstrom, reaches.value_bohr * bohr_in_angstrom);
      centre.density_angstrom =
          std::max(centre.density_angstrom, reaches.density_bohr * bohr_in_angstrom);
      shells_.push_back(std::move(field));
    }
    centres_.push_back(centre);
    first_shell_.push_back(static_cast<int>(shells_.size()));
  }
}

void OrbitalField::add(int centre, const Eigen::Vector3d& point_angstrom, double* values) const {
  add_some(centre, point_angstrom, 0, count_, values);
}

// Only the orbitals `first` to `end` - 1, the value of the first at values[0].
void OrbitalField::add_some(int centre, const Eigen::Vector3d& point_angstrom, int first, int end,
                            double* values) const {
  const auto c = static_cast<std::size_t>(centre);
  const Eigen::Vector3d from_atom =
      (point_angstrom - centres_[c].position_angstrom) / bohr_in_angstrom;
  const double r = from_atom.norm();
  // On the atom itself only s functions of n = 1 are not zero, and they need no direction.
  const Eigen::Vector3d direction =
      r > 0.0 ? Eigen::Vector3d(from_atom / r) : Eigen::Vector3d(0.0, 0.0, 1.0);
  double zeta = -1.0;
  double decay = 0.0;
  for (int s = first_shell_[c]; s < first_shell_[c + 1]; ++s) {
    const FieldShell& shell = shells_[static_cast<std::size_t>(s)];
    double radial = 0.0;
    for (int t = shell.first_term; t < shell.end_term; ++t) {
      const Term& term = terms_[static_cast<std::size_t>(t)];
      if (term.zeta != zeta) {  // shells of one atom often share it
        zeta = term.zeta;
        decay = std::exp(-zeta * r);
      }
      radial += term.weight * power(r, term.power) * decay;
    }
    const double* row = &shell.coefficients[static_cast<std::size_t>(first * (2 * shell.l + 1))];
    switch (shell.l) {  // s and p, most of all shells, without a call
      case 0:
        radial *= s_harmonic;
        for (int k = first; k < end; ++k) values[k - first] += radial * *row++;
        break;
      case 1:
        radial *= p_harmonic;
        for (int k = first; k < end; ++k, row += 3) {
          values[k - first] +=
              radial * (row[0] * direction.x() + row[1] * direction.y() + row[2] * direction.z());
        }
        break;
      default: {
        const HarmonicVector harmonics = real_harmonics(shell.l, direction);
        for (int k = first; k < end; ++k) {
          double angular = 0.0;
          for (int m = 0; m < 2 * shell.l + 1; ++m) angular += *row++ * harmonics(m);
          values[k - first] += radial * angular;
        }
      }
    }
  }
}

Eigen::VectorXd OrbitalField::values(const Eigen::Vector3d& point_angstrom) const {
  Eigen::VectorXd result = Eigen::VectorXd::Zero(count_);
  for (std::size_t c = 0; c < centres_.size(); ++c) {
    const double distance = (point_angstrom - centres_[c].position_angstrom).norm();
    if (distance <= centres_[c].reach_angstrom)
      add(static_cast<int>(c), point_angstrom, result.data());
  }
  return result;
}

double OrbitalField::value(const Eigen::Vector3d& point_angstrom, int orbital) const {
  double result = 0.0;
  for (std::size_t c = 0; c < centres_.size(); ++c) {
    const double distance = (point_angstrom - centres_[c].position_angstrom).norm();
    if (distance <= centres_[c].reach_angstrom)
      add_some(static_cast<int>(c), point_angstrom, orbital, orbital + 1, &result);
  }
  return result;
}

}  // namespace irrepwise
