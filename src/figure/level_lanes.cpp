#include "figure/level_lanes.hpp"

#include <cmath>
#include <cstddef>

namespace irrepwise {

std::vector<int> level_lanes(const std::vector<double>& heights, double least_apart,
                             const std::vector<std::size_t>& served_first) {
  constexpr int none = -1;
  std::vector<int> lanes(heights.size(), none);
  const auto choose = [&](std::size_t i) {
    if (lanes[i] != none) return;
    std::vector<bool> taken(heights.size() + 1, false);
    for (std::size_t j = 0; j < heights.size(); ++j) {
      if (lanes[j] != none && std::abs(heights[i] - heights[j]) < least_apart) {
        taken[static_cast<std::size_t>(lanes[j])] = true;
      }
    }
    int lane = 0;
    while (taken[static_cast<std::size_t>(lane)]) ++lane;
    lanes[i] = lane;
  };
  for (const std::size_t i : served_first) choose(i);
  for (std::size_t i = 0; i < heights.size(); ++i) choose(i);
  return lanes;
}

std::vector<double> spread_apart(const std::vector<double>& places, double least_apart) {
  // Neighbours that would collide form a block about the mean of their wishes.
  struct Block {
    double sum = 0.0;  // of each place minus its offset in the block
    std::size_t count = 0;
    [[nodiscard]] double start() const { return sum / static_cast<double>(count); }
  };
  std::vector<Block> blocks;
  for (const double place : places) {
    Block block{place, 1};
    while (!blocks.empty()) {
      const Block& before = blocks.back();
      const double length = static_cast<double>(before.count) * least_apart;
      if (before.start() + length <= block.start()) break;
      block = {before.sum + block.sum - static_cast<double>(block.count) * length,
               before.count + block.count};
      blocks.pop_back();
    }
    blocks.push_back(block);
  }
  std::vector<double> moved;
  for (const Block& block : blocks) {
    for (std::size_t i = 0; i < block.count; ++i) {
      moved.push_back(block.start() + static_cast<double>(i) * least_apart);
    }
  }
  return moved;
}

}  // namespace irrepwise
