"""Steady states by numpy's batched solve: the yardstick of SteadyStateBenchmark.

A = A0 + sum t_i A_i and b = b0 + sum t_i b_i are assembled for a stack of devices by tensordot and
solved by numpy.linalg.solve; one thread. LAPACK does not look at zeros, so full random matrices of
the same size and number of terms stand for every device. Times are microseconds for one device;
stacks are small enough to often run undisturbed, so compare the best ones on a busy machine.

Run: OPENBLAS_NUM_THREADS=1 python3 src/bench/python/steady_states.py
"""

import statistics
import time

import numpy as np

# device name, unknowns n, terms k, devices in a stack, repetitions
SIZES = [
    ("chain1", 3, 4, 4096, 400),
    ("chain2", 15, 9, 1024, 200),
    ("chain3", 63, 14, 64, 200),
    ("chain4", 255, 19, 8, 60),
    ("full4", 15, 8, 1024, 200),
    ("full8", 63, 8, 64, 200),
]


def best_and_median(n, terms, stack, repetitions):
    """Smallest and median time for one device."""
    rng = np.random.default_rng(1)
    a0 = rng.standard_normal((n, n)) - n * np.eye(n)
    a = rng.standard_normal((terms, n, n))
    b0 = rng.standard_normal(n)
    b = rng.standard_normal((terms, n))
    times = []
    for _ in range(repetitions):
        t = rng.uniform(-0.2, 0.2, (stack, terms))
        start = time.perf_counter()
        matrices = a0 + np.tensordot(t, a, 1)
        right = b0 + t @ b
        np.linalg.solve(matrices, -right[:, :, None])
        times.append((time.perf_counter() - start) / stack * 1e6)
    return min(times), statistics.median(times)


if __name__ == "__main__":
    for name, n, terms, stack, repetitions in SIZES:
        best, median = best_and_median(n, terms, stack, repetitions)
        print(f"{name} n={n} terms={terms} best={best:.3f} median={median:.3f} us")
