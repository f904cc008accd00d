#include "molecule/element_block.hpp"

namespace irrepwise {

bool is_d_or_f_block(int z) {
  return (z >= 21 && z <= 30) || (z >= 39 && z <= 48) || (z >= 57 && z <= 80) ||
         (z >= 89 && z <= 112);
}

}  // namespace irrepwise
