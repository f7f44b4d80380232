"""10,000 random devices of the parity-pumped pair in numpy: steady states and concurrences.

python3 src/bench/python/pair_samples.py   prints the seconds, best of five; unset variables that pin
a slow BLAS kernel first.
"""
import time
import numpy as np

I2, X, Z = np.eye(2), np.array([[0, 1], [1, 0]]), np.diag([1.0, -1.0])
Y = np.array([[0, -1j], [1j, 0]])
LOWER = np.array([[0, 1], [0, 0]])
BASIS = np.array([np.kron(a, b) / 2 for a in (I2, X, Y, Z) for b in (I2, X, Y, Z)]).astype(complex)


def generator(image):
    return np.array([[np.trace(bi @ image(bj)).real for bj in BASIS] for bi in BASIS])


def unitary(h):
    return generator(lambda r: -1j * (h @ r - r @ h))


def jump(v):
    vv = v.conj().T @ v
    return generator(lambda r: v @ r @ v.conj().T - 0.5 * (vv @ r + r @ vv))


def pair():
    odd, minus = (np.eye(4) - np.kron(Z, Z)) / 2, (np.eye(4) - np.kron(X, X)) / 2
    one, two = (lambda a: np.kron(a, I2)), (lambda a: np.kron(I2, a))
    parts = [(1, .2, jump(one(X) @ odd)), (1, .2, jump(one(Z) @ minus)),
             (.02, .01, jump(one(LOWER))), (.02, .01, jump(two(LOWER))),
             (.01, .005, jump(one(Z)) / 2), (.01, .005, jump(two(Z)) / 2),
             (0, .05, unitary(one(Z) / 2)), (0, .05, unitary(two(Z) / 2)),
             (0, .05, unitary(one(X) / 2)), (0, .05, unitary(np.kron(Z, Z) / 4))]
    return sum(n * m for n, _, m in parts), np.array([w * m for _, w, m in parts])


def concurrences(centre, blocks, t):
    a = centre + np.tensordot(t, blocks, 1)
    r = np.empty((len(t), 16))
    r[:, 0] = 0.5
    r[:, 1:] = -np.linalg.solve(a[:, 1:, 1:], a[:, 1:, :1] * 0.5)[..., 0]
    rho = np.tensordot(r, BASIS, 1)
    yy = np.kron(Y, Y)
    lam = np.sort(np.sqrt(np.maximum(np.linalg.eigvals(rho @ yy @ rho.conj() @ yy).real, 0)))
    return np.maximum(0, lam[:, 3] - lam[:, 2] - lam[:, 1] - lam[:, 0])


if __name__ == "__main__":
    centre, blocks = pair()
    t = np.random.default_rng(1).uniform(-1, 1, (10_000, 10))
    seconds = []
    for _ in range(5):
        start = time.perf_counter()
        worst = concurrences(centre, blocks, t).min()
        seconds.append(time.perf_counter() - start)
    print(f"10,000 steady states and concurrences: {min(seconds):.3f} s (best of 5), worst {worst:.4f}")
