package blochbound.measure;

import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import java.util.SplittableRandom;

/**
 * Random density matrices whose doubles are exactly a density matrix: dyadic mixtures of projectors
 * on vectors of Gaussian integers with squared length 64.
 */
public final class ExactStates {
  private final SplittableRandom random;
  private final int first;
  private final int second;

  /** Draws states of two factors with the given level counts. */
  public ExactStates(long seed, int first, int second) {
    this.random = new SplittableRandom(seed);
    this.first = first;
    this.second = second;
  }

  int size() {
    return first * second;
  }

  /** The k-th kind of state in turn: pure, product, mixed of each rank, near-pure, basis state. */
  Hermitian next(int k) {
    int n = size();
    switch (k % 8) {
      case 0:
        return pure(vector(n));
      case 1:
        return pure(vector(first).kron(vector(second)));
      case 2:
        return basis(random.nextInt(n));
      case 3:
        return mix(pure(vector(n)), 1 - 0x1p-20, mixed(n), 0x1p-20);
      case 4:
        return mix(pure(vector(n)), 1 - 0x1p-40, mixed(2), 0x1p-40);
      case 5:
        return mixed(2);
      case 6:
        return mixed(1 + random.nextInt(n));
      default:
        return mixed(n + 2);
    }
  }

  /** Mixture of {@code count} random pure states. */
  public Hermitian mixed(int count) {
    Hermitian state = pure(vector(size()));
    for (int k = 1; k < count; k++) {
      double weight = random.nextInt(1, 8) / 8.0;
      state = mix(state, weight, pure(vector(size())), 1 - weight);
    }
    return state;
  }

  /** A random ket of length one, whose doubles are exact. */
  public ComplexMatrix ket() {
    return vector(size()).scale(0.125);
  }

  private Hermitian basis(int k) {
    return new Hermitian(ComplexMatrix.unit(size(), k, k));
  }

  private static Hermitian mix(Hermitian a, double weightA, Hermitian b, double weightB) {
    return a.combine(weightA, b, weightB);
  }

  private static Hermitian pure(ComplexMatrix vector) {
    double square = vector.adjoint().times(vector).re(0, 0);
    return new Hermitian(vector.times(vector.adjoint()).scale(1 / square));
  }

  /** A column of Gaussian integers with squared length 64. */
  private ComplexMatrix vector(int n) {
    double[] re = new double[n];
    double[] im = new double[n];
    int reach = n <= 2 ? 8 : n <= 4 ? 5 : 3;
    double square = 0;
    while (square != 64) {
      square = 0;
      for (int i = 0; i < n; i++) {
        re[i] = random.nextInt(-reach, reach + 1);
        im[i] = random.nextInt(-reach, reach + 1);
        square += re[i] * re[i] + im[i] * im[i];
      }
    }
    return ComplexMatrix.of(n, 1, re, im);
  }

  /** A Hermitian matrix of Frobenius norm about {@code size}. */
  Hermitian noise(double size) {
    int n = size();
    double[] re = new double[n * n];
    double[] im = new double[n * n];
    for (int i = 0; i < re.length; i++) {
      re[i] = random.nextDouble(-1, 1) * size / n;
      im[i] = random.nextDouble(-1, 1) * size / n;
    }
    return Hermitian.part(ComplexMatrix.of(n, n, re, im));
  }

  /** A matrix to make bounds at: the state, near it, or a far one; not always a state. */
  Hermitian near(Hermitian state, int k) {
    switch (k % 6) {
      case 0:
        return state;
      case 1:
        return state.combine(1, noise(1e-13), 1);
      case 2:
        return state.combine(1, noise(1e-7), 1);
      case 3:
        return state.combine(1, noise(1e-3), 1);
      case 4:
        return mix(state, 0.9, mixed(3), 0.1);
      default:
        return mixed(4).combine(1, noise(0.1), 1);
    }
  }
}
