// Every point group up to a given order of axis, for tests that hold for all of them.
#pragma once

#include <vector>

#include "symmetry/schoenflies.hpp"

/// @param largest_n  of Cn to Dnd; S2n up to S_(largest_n) and its even neighbours
inline std::vector<irrepwise::Schoenflies> all_groups(int largest_n) {
  using irrepwise::Family;
  std::vector<irrepwise::Schoenflies> groups = {
      {Family::C1, 1}, {Family::Ci, 1},    {Family::Cs, 1},   {Family::T, 1}, {Family::Td, 1},
      {Family::Th, 1}, {Family::O, 1},     {Family::Oh, 1},   {Family::I, 1}, {Family::Ih, 1},
      {Family::Kh, 1}, {Family::Cinfv, 1}, {Family::Dinfh, 1}};
  for (int n = 2; n <= largest_n; ++n) {
    for (Family family : {Family::Cn, Family::Cnv, Family::Cnh, Family::Dn, Family::Dnh,
                          Family::Dnd, Family::S2n}) {
      groups.push_back({family, n});
    }
  }
  return groups;
}
