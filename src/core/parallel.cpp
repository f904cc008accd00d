#include "core/parallel.hpp"

#include <algorithm>
#include <atomic>
#include <exception>
#include <mutex>
#include <thread>
#include <vector>

namespace irrepwise {

void run_parallel(int count, int threads, const std::function<void(int)>& task,
                  const std::function<void(int)>& finished) {
  std::atomic<int> next = 0;
  std::mutex mutex;  // guards what follows
  int done = 0;
  int failed = count;
  std::exception_ptr failure;
  const auto work = [&] {
    for (int i = next++; i < count; i = next++) {
      try {
        task(i);
      } catch (...) {
        const std::lock_guard lock(mutex);
        if (i < failed) {
          failed = i;
          failure = std::current_exception();
        }
        next = count;  // tasks of smaller index have been taken already and will end
        return;
      }
      const std::lock_guard lock(mutex);
      ++done;
      if (finished) finished(done);
    }
  };
  {
    std::vector<std::jthread> helpers;
    for (int i = 1; i < std::min(threads, count); ++i) helpers.emplace_back(work);
    work();
  }
  if (failure) std::rethrow_exception(failure);
}

int hardware_threads() {
  return std::max(1, static_cast<int>(std::thread::hardware_concurrency()));
}

}  // namespace irrepwise
