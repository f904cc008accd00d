#include "molecule/element_block.hpp"

namespace irrepwise {

bool is_d_or_f_block(int z) {
  return (z >= 21 && z <= 30) || (z >= 39 && z <= 48) || (z >= 57 && z <= 80) ||
         (z >= 89 && z <= 112);
}

bool is_metal(int z) {
  return z == 3 || z == 4 || (z >= 11 && z <= 13) || (z >= 19 && z <= 31) || (z >= 37 && z <= 50) ||
         (z >= 55 && z <= 83) || (z >= 87 && z <= 116);
}

}  // namespace irrepwise
