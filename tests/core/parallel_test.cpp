#include "core/parallel.hpp"

#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "core/error.hpp"

using namespace irrepwise;

TEST_CASE("every task runs once, on any number of threads") {
  for (const int threads : {1, 2, 5}) {
    std::vector<int> runs(100, 0);
    int last = 0;
    run_parallel(
        100, threads, [&](int i) { ++runs[static_cast<std::size_t>(i)]; },
        [&](int done) { last = done; });
    CHECK(runs == std::vector<int>(100, 1));
    CHECK(last == 100);
  }
  run_parallel(0, 2, [](int) { throw Error("there is no task"); });
}

TEST_CASE("of several failures that of the smallest index is thrown") {
  for (const int threads : {1, 2, 4}) {
    CHECK_THROWS_WITH_AS(run_parallel(50, threads,
                                      [](int i) {
                                        if (i >= 7) throw Error("task " + std::to_string(i));
                                      }),
                         "task 7", Error);
  }
}
