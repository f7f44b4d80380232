package blochbound.generator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.RandomDevices;
import blochbound.TestCases;
import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.measure.PreciseDevice;
import blochbound.model.Ball;
import blochbound.model.Device;
import blochbound.model.Jump;
import blochbound.model.Monomial;
import blochbound.model.Scalar;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BlochGeneratorTest {
  private static Hermitian hermitian(SplittableRandom random, int n) {
    return new Hermitian(RandomDevices.hermitian(random, n));
  }

  private static Hermitian image(PreciseDevice device, ComplexMatrix rho) {
    int n = rho.rows();
    BigDecimal[][] image = device.image(rho);
    double[] re = Arrays.stream(image[0]).mapToDouble(BigDecimal::doubleValue).toArray();
    double[] im = Arrays.stream(image[1]).mapToDouble(BigDecimal::doubleValue).toArray();
    return Hermitian.part(ComplexMatrix.of(n, n, re, im));
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16})
  void theSumOfTermsIsTheSuperoperator(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Device device = RandomDevices.draw(random, RandomDevices.shape(random), 5, Ball.unitBox());
    BlochGenerator generator = BlochGenerator.of(device);
    double[] z = random.doubles(generator.space().coordinates(), -1, 1).toArray();
    double[] p = generator.space().parametersAt(z);
    List<BigDecimal> exact = Arrays.stream(p).mapToObj(BigDecimal::new).toList();
    // [independent] the superoperator straight from the operators in 50-digit decimals
    PreciseDevice reference = new PreciseDevice(device, exact);
    Hermitian rho = hermitian(random, device.space().dimension());
    double[] expected = generator.basis().coordinates(image(reference, rho.matrix()));
    double[] r = generator.basis().coordinates(rho);
    double[] sum = new double[r.length];
    double[] part = new double[r.length];
    double[] coefficients = generator.coefficients(p);
    for (int j = 0; j < coefficients.length; j++) {
      generator.terms().get(j).matrix().times(r, part);
      for (int i = 0; i < sum.length; i++) {
        sum[i] += coefficients[j] * part[i];
      }
    }
    for (int i = 0; i < sum.length; i++) {
      assertEquals(expected[i], sum[i], 1e-12);
    }
  }

  @ParameterizedTest(name = "seed {0}")
  @ValueSource(longs = {1, 2, 3, 4})
  void theTraceIsKeptExactly(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Device device = RandomDevices.draw(random, RandomDevices.shape(random), 5, Ball.unitBox());
    for (GeneratorTerm term : BlochGenerator.of(device).terms()) {
      // [invariant] tr L[rho] = 0: nothing is stored in the first row
      term.matrix().forEach((row, column, entry) -> assertTrue(row > 0 && entry != 0));
    }
  }

  @ParameterizedTest(name = "{0} jumps")
  @ValueSource(ints = {0, 1, 4, 25})
  void theRadiusCoversTheMatrixInDecimals(int jumps) {
    SplittableRandom random = new SplittableRandom(jumps);
    int n = jumps > 4 ? 2 : 4;
    List<Jump> list = new ArrayList<>();
    for (int k = 0; k < jumps; k++) {
      // Rates of a third and operators of any doubles: nothing is exact in binary.
      Scalar rate = Scalar.constant(ExactNumber.ONE.dividedBy(ExactNumber.of(k + 3)));
      list.add(new Jump(rate, RandomDevices.exact(rough(random, n))));
    }
    ComplexMatrix h = Hermitian.part(rough(random, n)).matrix();
    Device device =
        new Device(
            n == 2 ? RandomDevices.space(2) : RandomDevices.space(2, 2),
            List.of(),
            Ball.unitBox(),
            RandomDevices.exact(h),
            list);
    BlochGenerator generator = BlochGenerator.of(device);
    assertEquals(1, generator.terms().size());
    GeneratorTerm term = generator.terms().get(0);
    BigDecimal distance = distance(generator.basis(), term, new PreciseDevice(device, List.of()));
    assertTrue(
        distance.compareTo(new BigDecimal(term.radius())) <= 0,
        distance + " above " + term.radius());
    // The radius is rounding, not a fudge.
    assertTrue(term.radius() < 1e-11 * term.matrix().frobeniusUp());
  }

  private static ComplexMatrix rough(SplittableRandom random, int n) {
    double[] re = random.doubles((long) n * n, -1, 1).toArray();
    double[] im = random.doubles((long) n * n, -1, 1).toArray();
    return ComplexMatrix.of(n, n, re, im);
  }

  /** Frobenius distance of the stored matrix from tr(B_k L[B_l]) in decimals. */
  private static BigDecimal distance(BlochBasis basis, GeneratorTerm term, PreciseDevice device) {
    int size = basis.size();
    int n = basis.levels();
    double[][] stored = new double[size][size];
    term.matrix().forEach((row, column, entry) -> stored[row][column] = entry);
    BigDecimal sum = BigDecimal.ZERO;
    for (int l = 0; l < size; l++) {
      double[] re = new double[size];
      double[] im = new double[size];
      for (BlochBasis.Entry e : basis.entriesOf(l)) {
        re[e.row() * n + e.column()] = e.re();
        im[e.row() * n + e.column()] = e.im();
      }
      BigDecimal[][] image = device.image(ComplexMatrix.of(n, n, re, im));
      for (int k = 0; k < size; k++) {
        BigDecimal trace = BigDecimal.ZERO;
        for (BlochBasis.Entry e : basis.entriesOf(k)) {
          int at = e.column() * n + e.row();
          trace =
              trace
                  .add(image[0][at].multiply(new BigDecimal(e.re())))
                  .subtract(image[1][at].multiply(new BigDecimal(e.im())));
        }
        BigDecimal root =
            new BigDecimal(basis.squaredNorm(k) * basis.squaredNorm(l)).sqrt(BigReference.DIGITS);
        BigDecimal entry = trace.divide(root, BigReference.DIGITS);
        sum = sum.add(entry.subtract(new BigDecimal(stored[k][l])).pow(2), BigReference.DIGITS);
      }
    }
    return sum.sqrt(BigReference.DIGITS);
  }

  @Test
  void anUncertainAmplitudeGivesItsExactPowers() {
    Device device =
        TestCases.device(
            "sites: {q: {levels: [g, e]}}",
            "parameters: {amp: {nominal: 0.5, tolerance: 0.1}}",
            "jumps: [{operator: lower@q + amp * Z@q}]");
    BlochGenerator generator = BlochGenerator.of(device);
    Monomial s = Monomial.parameter(0);
    // [closed form] V = V_0 + s V_1 gives products with 1, s and s^2
    assertEquals(
        java.util.Set.of(Monomial.ONE, s, s.times(s)),
        generator.terms().stream()
            .map(GeneratorTerm::monomial)
            .collect(java.util.stream.Collectors.toSet()));
    assertEquals(2, generator.degree());
  }

  @Test
  void theDegreeOfSmoothAndHighCoefficientsIsCut() {
    // [invariant] polynomials up to LARGEST_DEGREE as they are, others up to SMOOTH_DEGREE
    assertEquals(1, degree("X@q"));
    assertEquals(1, degree("x * X@q"));
    assertEquals(3, degree("x^3 * X@q"));
    assertEquals(BlochGenerator.LARGEST_DEGREE, degree("x^7 * X@q"));
    assertEquals(BlochGenerator.SMOOTH_DEGREE, degree("exp(x) * X@q"));
  }

  private static int degree(String hamiltonian) {
    return BlochGenerator.of(
            TestCases.device(
                "sites: {q: {levels: [g, e]}}",
                "parameters: {x: {nominal: 0.5, tolerance: 0.1}}",
                "hamiltonian: \"" + hamiltonian + "\"",
                "jumps: [{operator: lower@q}]"))
        .degree();
  }
}
