package blochbound.generator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import java.math.BigDecimal;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class BlochBasisTest {
  static Stream<int[]> shapes() {
    return Stream.of(
        new int[] {1},
        new int[] {2},
        new int[] {3},
        new int[] {5},
        new int[] {2, 2},
        new int[] {2, 3},
        new int[] {3, 1, 2},
        new int[] {2, 2, 2});
  }

  private static Hermitian random(SplittableRandom random, int n) {
    double[] re = random.doubles((long) n * n, -1, 1).toArray();
    double[] im = random.doubles((long) n * n, -1, 1).toArray();
    return Hermitian.part(ComplexMatrix.of(n, n, re, im));
  }

  private static Hermitian element(BlochBasis basis, int k) {
    double[] r = new double[basis.size()];
    r[k] = 1;
    return basis.matrix(r);
  }

  @ParameterizedTest
  @MethodSource("shapes")
  void matricesAreOrthonormal(int[] shape) {
    BlochBasis basis = BlochBasis.of(shape);
    List<Hermitian> all =
        IntStream.range(0, basis.size()).mapToObj(k -> element(basis, k)).toList();
    for (int j = 0; j < all.size(); j++) {
      for (int k = 0; k <= j; k++) {
        // [closed form] tr(B_j B_k) = delta_jk
        assertEquals(j == k ? 1 : 0, all.get(j).inner(all.get(k)), 1e-15);
      }
    }
  }

  @ParameterizedTest
  @MethodSource("shapes")
  void theFirstMatrixIsTheUnitOverTheRootOfTheLevels(int[] shape) {
    BlochBasis basis = BlochBasis.of(shape);
    int n = basis.levels();
    // [closed form] B_0 = 1/sqrt(N)
    ComplexMatrix expected = ComplexMatrix.identity(n).scale(1 / Math.sqrt(n));
    assertTrue(element(basis, 0).matrix().minus(expected).frobeniusNorm() < 1e-15);
  }

  @ParameterizedTest
  @MethodSource("shapes")
  void coordinatesAndMatrixUndoEachOther(int[] shape) {
    BlochBasis basis = BlochBasis.of(shape);
    SplittableRandom random = new SplittableRandom(11);
    Hermitian matrix = random(random, basis.levels());
    double[] r = basis.coordinates(matrix);
    double error = 2 * basis.transformError() * matrix.matrix().frobeniusNorm();
    assertTrue(basis.matrix(r).matrix().minus(matrix.matrix()).frobeniusNorm() <= error);
    assertArrayEquals(r, basis.coordinates(basis.matrix(r)), error);
  }

  @ParameterizedTest
  @MethodSource("shapes")
  void theTransformErrorCoversCoordinatesInDecimals(int[] shape) {
    BlochBasis basis = BlochBasis.of(shape);
    Hermitian matrix = random(new SplittableRandom(5), basis.levels());
    double[] r = basis.coordinates(matrix);
    BigDecimal squares = BigDecimal.ZERO;
    for (int k = 0; k < r.length; k++) {
      BigDecimal sum = BigDecimal.ZERO;
      for (BlochBasis.Entry e : basis.entriesOf(k)) {
        BigDecimal x = new BigDecimal(matrix.matrix().re(e.column(), e.row()));
        BigDecimal y = new BigDecimal(matrix.matrix().im(e.column(), e.row()));
        sum =
            sum.add(x.multiply(new BigDecimal(e.re())))
                .subtract(y.multiply(new BigDecimal(e.im())));
      }
      BigDecimal root = new BigDecimal(basis.squaredNorm(k)).sqrt(BigReference.DIGITS);
      BigDecimal exact = sum.divide(root, BigReference.DIGITS);
      squares = squares.add(exact.subtract(new BigDecimal(r[k])).pow(2));
    }
    double bound = basis.transformError() * matrix.matrix().frobeniusNormUp();
    assertTrue(squares.compareTo(new BigDecimal(bound).pow(2)) <= 0);
  }

  private record Part(int[] shape, List<Integer> sites) {}

  static Stream<Part> parts() {
    return Stream.of(
        new Part(new int[] {2, 3}, List.of(0)),
        new Part(new int[] {2, 3}, List.of(1)),
        new Part(new int[] {3, 2, 2}, List.of(0, 2)),
        new Part(new int[] {2, 2, 3}, List.of(1, 2)),
        new Part(new int[] {2, 2}, List.of(0, 1)));
  }

  @ParameterizedTest
  @MethodSource("parts")
  void embeddedCoordinatesAreThePartialTrace(Part part) {
    BlochBasis basis = BlochBasis.of(part.shape);
    Hermitian whole = random(new SplittableRandom(3), basis.levels());
    double[] r = basis.coordinates(whole);
    BlochBasis reduced = basis.reduced(part.sites);
    int[] embedding = basis.embedding(part.sites);
    double root = Math.sqrt(basis.tracedLevels(part.sites));
    double[] partial = Arrays.stream(embedding).mapToDouble(k -> r[k] * root).toArray();
    ComplexMatrix expected = partialTrace(whole.matrix(), part);
    assertTrue(reduced.matrix(partial).matrix().minus(expected).frobeniusNorm() < 1e-14);
  }

  /** Sum over equal levels of the sites that are not kept: the definition. */
  private static ComplexMatrix partialTrace(ComplexMatrix whole, Part part) {
    int kept = part.sites.stream().mapToInt(s -> part.shape[s]).reduce(1, (a, b) -> a * b);
    double[] re = new double[kept * kept];
    double[] im = new double[kept * kept];
    for (int i = 0; i < whole.rows(); i++) {
      for (int j = 0; j < whole.rows(); j++) {
        if (index(i, part, false) == index(j, part, false)) {
          int k = index(i, part, true) * kept + index(j, part, true);
          re[k] += whole.re(i, j);
          im[k] += whole.im(i, j);
        }
      }
    }
    return ComplexMatrix.of(kept, kept, re, im);
  }

  /** Mixed-radix number of the levels of the kept or of the other sites. */
  private static int index(int state, Part part, boolean ofKept) {
    int rest = state;
    int[] level = new int[part.shape.length];
    for (int s = part.shape.length - 1; s >= 0; s--) {
      level[s] = rest % part.shape[s];
      rest /= part.shape[s];
    }
    int index = 0;
    for (int s = 0; s < level.length; s++) {
      if (part.sites.contains(s) == ofKept) {
        index = index * part.shape[s] + level[s];
      }
    }
    return index;
  }
}
