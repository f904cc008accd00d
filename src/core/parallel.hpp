// A list of independent tasks on several threads.
#pragma once

#include <functional>

namespace irrepwise {

/// Runs task(0) to task(count - 1), each once, on so many threads; the caller's is one of them. A
/// task must touch nothing that another writes, so that the number of threads changes no result.
///
/// @param threads   1 or more
/// @param finished  told how many are done, from any thread, one call at a time; may be empty
/// @throws          what the task of the smallest index threw, once all have ended; later tasks may
///                  then not have run
void run_parallel(int count, int threads, const std::function<void(int)>& task,
                  const std::function<void(int)>& finished = {});

/// @returns  threads that this machine runs at once, at least 1
[[nodiscard]] int hardware_threads();

}  // namespace irrepwise
