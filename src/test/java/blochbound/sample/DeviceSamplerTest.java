package blochbound.sample;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball;
import blochbound.model.Ball.Norm;
import blochbound.model.Distribution;
import blochbound.model.Distribution.Normal;
import blochbound.model.Distribution.Triangular;
import blochbound.model.Distribution.Uniform;
import blochbound.model.ParameterSpace;
import blochbound.sample.DeviceSampler.Proposal;
import java.math.BigDecimal;
import java.util.Collections;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Acceptance and ball membership of drawn devices, and their reproducible order. */
class DeviceSamplerTest {
  static final Uniform UNIFORM = new Uniform();
  static final Triangular TRIANGULAR = new Triangular();

  /**
   * Statistical claims hold to five standard deviations: a seed fails by chance once in 2 million.
   */
  static final double SIGMAS = 5;

  static Ball ball(Norm norm, String radius) {
    return new Ball(norm, new BigDecimal(radius), List.of());
  }

  static Ball correlated(String value) {
    return new Ball(
        Norm.ELLIPSOID, BigDecimal.ONE, List.of(new Ball.Correlation(0, 1, new BigDecimal(value))));
  }

  static ParameterSpace uniform(Norm norm, int dimension) {
    return Chips.symmetric(
        ball(norm, "1"), Collections.nCopies(dimension, UNIFORM).toArray(Distribution[]::new));
  }

  static DeviceSampler monteCarlo(ParameterSpace space, Proposal proposal) {
    return new DeviceSampler(space, SamplePoints.MONTE_CARLO, 20, proposal);
  }

  static void assertAcceptance(double expected, DeviceSampler sampler) {
    double sigma = Math.sqrt(expected * (1 - expected) / sampler.candidates());
    assertEquals(expected, sampler.acceptance(), SIGMAS * sigma);
  }

  @ParameterizedTest(name = "dimension {0}")
  @CsvSource({
    // [closed form] pi^(d/2) / (Gamma(d/2 + 1) 2^d)
    "2, 0.785398163397448",
    "3, 0.523598775598299",
    "5, 0.164493406684823",
    "10, 0.00249039457019272"
  })
  void acceptanceOfAnEllipsoidIsItsShareOfTheBox(int dimension, double share) {
    ParameterSpace space = uniform(Norm.ELLIPSOID, dimension);
    DeviceSampler counted = monteCarlo(space, Proposal.DECLARED);
    counted.next(dimension == 10 ? 200 : 20_000);
    assertAcceptance(share, counted);
    DeviceSampler direct = monteCarlo(space, Proposal.BALL);
    direct.next(100);
    assertEquals(share, direct.acceptance(), 1e-12);
    assertEquals(100, direct.candidates());
  }

  @ParameterizedTest(name = "dimension {0}")
  @CsvSource({"2, 0.5", "3, 0.16666666666666667", "5, 0.00833333333333333"})
  void acceptanceOfADiamondIsItsShareOfTheBox(int dimension, double share) {
    ParameterSpace space = uniform(Norm.DIAMOND, dimension);
    DeviceSampler counted = monteCarlo(space, Proposal.DECLARED);
    counted.next(2_000);
    // [closed form] (2^d / d!) / 2^d
    assertAcceptance(share, counted);
    DeviceSampler direct = monteCarlo(space, Proposal.BALL);
    direct.next(100);
    assertEquals(share, direct.acceptance(), 1e-12);
  }

  @ParameterizedTest
  @EnumSource(Proposal.class)
  void acceptanceOfACorrelatedEllipsoidIsItsShareOfTheBox(Proposal proposal) {
    ParameterSpace space = Chips.symmetric(correlated("0.6"), UNIFORM, UNIFORM);
    DeviceSampler sampler = monteCarlo(space, proposal);
    sampler.next(20_000);
    // [closed form] the disc's share times sqrt(det R) = 0.8
    assertAcceptance(0.8 * Math.PI / 4, sampler);
  }

  @Test
  void boxesKeepEveryCandidate() {
    ParameterSpace space = Chips.symmetric(ball(Norm.BOX, "1"), UNIFORM, TRIANGULAR);
    DeviceSampler sampler = new DeviceSampler(space, SamplePoints.MONTE_CARLO, 1);
    sampler.next(500);
    // [invariant] both distributions live on the box
    assertEquals(500, sampler.candidates());
    assertEquals(1, sampler.acceptance());
  }

  @Test
  void smallerRadiusAcceptsItsShareAndLargerRadiusAll() {
    DeviceSampler half =
        new DeviceSampler(
            Chips.symmetric(ball(Norm.BOX, "0.5"), UNIFORM, TRIANGULAR),
            SamplePoints.MONTE_CARLO,
            1);
    half.next(10);
    // [closed form] half of a uniform, 1 - 0.5^2 of a triangular distribution
    assertEquals(0.5 * 0.75, half.acceptance(), 1e-15);
    ParameterSpace wide = Chips.symmetric(ball(Norm.BOX, "2"), UNIFORM);
    DeviceSampler twice = new DeviceSampler(wide, SamplePoints.MONTE_CARLO, 1);
    List<double[]> devices = twice.next(1_000);
    assertEquals(1, twice.acceptance());
    // [invariant] the declared range is that of radius 1: half of the coordinate's
    assertTrue(devices.stream().allMatch(z -> Math.abs(z[0]) <= 0.5));
    assertTrue(devices.stream().anyMatch(z -> Math.abs(z[0]) > 0.49));
  }

  @ParameterizedTest(name = "{0}, {1}")
  @CsvSource({
    "BOX, MONTE_CARLO",
    "BOX, SOBOL",
    "ELLIPSOID, MONTE_CARLO",
    "ELLIPSOID, SOBOL",
    "DIAMOND, MONTE_CARLO",
    "DIAMOND, SOBOL"
  })
  void everyDeviceLiesInTheBall(Norm norm, SamplePoints kind) {
    ParameterSpace space =
        Chips.symmetric(ball(norm, "1.5"), UNIFORM, TRIANGULAR, new Normal(0.4), new Normal(5));
    for (Proposal proposal : Proposal.values()) {
      if (norm == Norm.BOX && proposal == Proposal.BALL) {
        continue;
      }
      List<double[]> devices = new DeviceSampler(space, kind, 3, proposal).next(2_000);
      assertEquals(2_000, devices.size());
      for (double[] z : devices) {
        double size = 0;
        for (double x : z) {
          size =
              norm == Norm.BOX
                  ? Math.max(size, Math.abs(x))
                  : size + (norm == Norm.DIAMOND ? Math.abs(x) : x * x);
        }
        assertTrue(size <= 1, "size " + size);
        // [invariant] uniform and triangular parameters stay in their range at radius 1
        assertTrue(Math.abs(1.5 * z[0]) <= 1 + 1e-15);
        assertTrue(Math.abs(1.5 * z[1]) <= 1 + 1e-15);
      }
    }
  }

  @Test
  void hopelessBallsAreDrawnDirectly() {
    DeviceSampler sampler =
        new DeviceSampler(uniform(Norm.DIAMOND, 20), SamplePoints.MONTE_CARLO, 1);
    assertEquals(Proposal.BALL, sampler.proposal());
    assertEquals(1_000, sampler.next(1_000).size());
    double factorial = 1;
    for (int k = 2; k <= 20; k++) {
      factorial *= k;
    }
    // [closed form] 1 / 20!
    assertEquals(1, sampler.acceptance() * factorial, 1e-11);
  }

  @Test
  void exhaustedCandidatesGiveFewerDevices() {
    Distribution narrow = new Normal(0.2);
    ParameterSpace space =
        Chips.symmetric(
            ball(Norm.ELLIPSOID, "1"),
            Collections.nCopies(80, narrow).toArray(Distribution[]::new));
    DeviceSampler sampler = new DeviceSampler(space, SamplePoints.MONTE_CARLO, 1);
    // [closed form] a chi-squared number of 80 degrees of freedom is below 25 about once in 1e9
    assertEquals(0, sampler.next(2).size());
    assertEquals(2L * DeviceSampler.CANDIDATES_PER_DEVICE, sampler.candidates());
    assertEquals(0, sampler.acceptance());
  }

  @Test
  void sobolPointsFillEveryIntervalOnce() {
    ParameterSpace space = uniform(Norm.BOX, 3);
    List<double[]> devices = new DeviceSampler(space, SamplePoints.SOBOL, 9).next(256);
    for (int j = 0; j < 3; j++) {
      int coordinate = j;
      double[] sorted = devices.stream().mapToDouble(z -> z[coordinate]).sorted().toArray();
      for (int k = 1; k < sorted.length; k++) {
        // [closed form] each coordinate of the first 2^8 Sobol points is a grid of step 2^-8
        assertEquals(2 / 256.0, sorted[k] - sorted[k - 1], 1e-12);
      }
    }
  }

  @Test
  void sequenceDependsOnTheSeedOnly() {
    ParameterSpace space = uniform(Norm.ELLIPSOID, 4);
    for (SamplePoints kind : SamplePoints.values()) {
      double[][] once = new DeviceSampler(space, kind, 4).next(50).toArray(double[][]::new);
      DeviceSampler parts = new DeviceSampler(space, kind, 4);
      parts.next(20);
      // [invariant] the sequence goes on where it stopped
      assertArrayEquals(once[20], parts.next(30).get(0), 0.0);
      double[] other = new DeviceSampler(space, kind, 5).next(1).get(0);
      assertTrue(other[0] != once[0][0]);
    }
  }

  @Test
  void tooManySobolDimensionsAreRefused() {
    String message =
        assertThrows(
                IllegalArgumentException.class, () -> UnitPoints.of(SamplePoints.SOBOL, 1001, 1))
            .getMessage();
    assertEquals(
        "Sobol points have at most 1000 dimensions, not 1001; take Monte Carlo points", message);
  }

  @Test
  void constantParametersGiveTheNominalDevice() {
    ParameterSpace space = Chips.single("2", "2", "2", UNIFORM);
    DeviceSampler sampler = new DeviceSampler(space, SamplePoints.SOBOL, 1);
    assertEquals(0, sampler.next(1).get(0).length);
    assertEquals(1, sampler.acceptance());
  }
}
