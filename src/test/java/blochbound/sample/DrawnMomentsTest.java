package blochbound.sample;

import static blochbound.sample.DeviceSamplerTest.SIGMAS;
import static blochbound.sample.DeviceSamplerTest.TRIANGULAR;
import static blochbound.sample.DeviceSamplerTest.UNIFORM;
import static blochbound.sample.DeviceSamplerTest.assertAcceptance;
import static blochbound.sample.DeviceSamplerTest.ball;
import static blochbound.sample.DeviceSamplerTest.correlated;
import static blochbound.sample.DeviceSamplerTest.monteCarlo;
import static blochbound.sample.DeviceSamplerTest.uniform;
import static org.junit.jupiter.api.Assertions.assertEquals;

import blochbound.model.Ball;
import blochbound.model.Ball.Norm;
import blochbound.model.Distribution.Normal;
import blochbound.model.ParameterSpace;
import blochbound.sample.DeviceSampler.Proposal;
import java.math.BigDecimal;
import java.util.List;
import java.util.function.ToDoubleFunction;
import org.apache.commons.math3.special.Erf;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;

/** Moments of drawn devices against closed forms. */
class DrawnMomentsTest {
  private static double mean(List<double[]> devices, ToDoubleFunction<double[]> value) {
    return devices.stream().mapToDouble(value).average().orElseThrow();
  }

  /** Checks a mean against its expectation, with the spread taken from the sample itself. */
  private static void assertMean(
      double expected, List<double[]> devices, ToDoubleFunction<double[]> value) {
    double mean = mean(devices, value);
    double variance = mean(devices, d -> Math.pow(value.applyAsDouble(d) - mean, 2));
    assertEquals(expected, mean, SIGMAS * Math.sqrt(variance / devices.size()));
  }

  @Test
  void normalInABoxIsCutOff() {
    double sigma = 0.7;
    ParameterSpace space = Chips.symmetric(ball(Norm.BOX, "1"), new Normal(sigma));
    DeviceSampler sampler = new DeviceSampler(space, SamplePoints.MONTE_CARLO, 5);
    List<double[]> devices = sampler.next(50_000);
    double end = 1 / sigma;
    double mass = Erf.erf(end / Math.sqrt(2));
    // [closed form] probability of the range
    assertEquals(mass, sampler.acceptance(), 1e-14);
    assertMean(0, devices, z -> z[0]);
    double density = Math.exp(-0.5 * end * end) / Math.sqrt(2 * Math.PI);
    // [closed form] variance of a doubly cut normal distribution
    assertMean(sigma * sigma * (1 - 2 * end * density / mass), devices, z -> z[0] * z[0]);
  }

  @Test
  void veryWideNormalIsUniform() {
    ParameterSpace space = Chips.symmetric(ball(Norm.BOX, "1"), new Normal(1e9));
    DeviceSampler sampler = new DeviceSampler(space, SamplePoints.SOBOL, 5);
    List<double[]> devices = sampler.next(256);
    double[] sorted = devices.stream().mapToDouble(z -> z[0]).sorted().toArray();
    for (int k = 1; k < sorted.length; k++) {
      // [closed form] 256 shifted points of a regular grid over a range of length 2
      assertEquals(2 / 256.0, sorted[k] - sorted[k - 1], 1e-9);
    }
  }

  @Test
  void uniformAndTriangularHaveTheirMoments() {
    ParameterSpace space = Chips.symmetric(ball(Norm.BOX, "1"), UNIFORM, TRIANGULAR);
    List<double[]> devices = new DeviceSampler(space, SamplePoints.MONTE_CARLO, 7).next(50_000);
    assertMean(0, devices, z -> z[0]);
    assertMean(0, devices, z -> z[1]);
    // [closed form] variances of the two distributions over [-1, 1]
    assertMean(1 / 3.0, devices, z -> z[0] * z[0]);
    assertMean(1 / 6.0, devices, z -> z[1] * z[1]);
    // [closed form] independence
    assertMean(0, devices, z -> z[0] * z[1]);
  }

  @ParameterizedTest(name = "nominal {0} of 0 to 4")
  @CsvSource({"0", "1", "4"})
  void offCentreTriangularPeaksAtTheNominalValue(String nominal) {
    ParameterSpace space = Chips.single("0", nominal, "4", TRIANGULAR);
    List<double[]> devices = new DeviceSampler(space, SamplePoints.MONTE_CARLO, 8).next(20_000);
    double c = Double.parseDouble(nominal);
    // [closed form] mean (a + b + c) / 3 and variance (a^2 + b^2 + c^2 - ab - ac - bc) / 18
    double mean = (4 + c) / 3;
    assertMean(mean, devices, z -> 2 + 2 * z[0]);
    assertMean((16 + c * c - 4 * c) / 18, devices, z -> Math.pow(2 + 2 * z[0] - mean, 2));
  }

  @Test
  void offCentreNormalIsCentredAtTheNominalValue() {
    ParameterSpace space = Chips.single("0", "1", "4", new Normal(0.1));
    List<double[]> devices = new DeviceSampler(space, SamplePoints.MONTE_CARLO, 8).next(20_000);
    // [closed form] the ends are ten and thirty deviations away
    assertMean(1, devices, z -> 2 + 2 * z[0]);
    assertMean(0.01, devices, z -> Math.pow(1 + 2 * z[0], 2));
  }

  @ParameterizedTest
  @EnumSource(Proposal.class)
  void uniformEllipsoidAndDiamondHaveTheirMoments(Proposal proposal) {
    List<double[]> round = monteCarlo(uniform(Norm.ELLIPSOID, 3), proposal).next(20_000);
    assertMean(0, round, z -> z[0]);
    // [closed form] 1 / (m + 2) in the unit ball of m = 3 dimensions
    assertMean(1 / 5.0, round, z -> z[1] * z[1]);
    assertMean(0, round, z -> z[0] * z[2]);
    List<double[]> pointed = monteCarlo(uniform(Norm.DIAMOND, 3), proposal).next(20_000);
    assertMean(0, pointed, z -> z[2]);
    // [closed form] E|z_j| = 1 / (m + 1) in the unit ball of the sum norm
    assertMean(1 / 4.0, pointed, z -> Math.abs(z[0]));
  }

  @ParameterizedTest
  @EnumSource(Proposal.class)
  void jointlyNormalParametersKeepTheirCorrelation(Proposal proposal) {
    double sigma = 0.5;
    ParameterSpace space = Chips.symmetric(correlated("0.6"), new Normal(sigma), new Normal(sigma));
    DeviceSampler sampler = monteCarlo(space, proposal);
    List<double[]> devices = sampler.next(20_000);
    // [closed form] chi-squared with two degrees of freedom up to 1 / sigma^2
    double inside = 1 - Math.exp(-0.5 / (sigma * sigma));
    if (proposal == Proposal.DECLARED) {
      assertAcceptance(inside, sampler);
    } else {
      // The estimate is a multiple of the share kept, whose spread is binomial.
      double scale = 0.5 / (sigma * sigma);
      double kept = inside / scale;
      double spread = Math.sqrt(kept * (1 - kept) / sampler.candidates());
      assertEquals(inside, sampler.acceptance(), SIGMAS * scale * spread);
    }
    assertMean(0, devices, z -> z[0]);
    // [closed form] shares s = C z with z isotropic, so E s0 s1 = 0.6 E s0^2
    assertMean(0, devices, z -> z[0] * (0.6 * z[0] + 0.8 * z[1]) - 0.6 * z[0] * z[0]);
    double y = 0.5 / (sigma * sigma);
    // [closed form] E z^2 of an isotropic plane normal cut off at radius 1
    double expected = sigma * sigma * (1 - y * Math.exp(-y) / (1 - Math.exp(-y)));
    assertMean(expected, devices, z -> z[0] * z[0]);
  }

  @Test
  void bothProposalsGiveTheSameDistribution() {
    ParameterSpace space =
        Chips.symmetric(
            new Ball(
                Norm.ELLIPSOID,
                new BigDecimal("0.9"),
                List.of(new Ball.Correlation(1, 2, new BigDecimal("-0.4")))),
            TRIANGULAR,
            new Normal(0.6),
            UNIFORM,
            new Normal(0.8));
    DeviceSampler declared = monteCarlo(space, Proposal.DECLARED);
    DeviceSampler ball = monteCarlo(space, Proposal.BALL);
    List<double[]> a = declared.next(20_000);
    List<double[]> b = ball.next(20_000);
    for (int j = 0; j < 4; j++) {
      int coordinate = j;
      double first = mean(a, z -> z[coordinate] * z[coordinate]);
      double second = mean(b, z -> z[coordinate] * z[coordinate]);
      double fourth = mean(a, z -> Math.pow(z[coordinate], 4));
      // [invariant] two rejection samplers of one density
      double sigma = Math.sqrt(2 * (fourth - first * first) / a.size());
      assertEquals(first, second, SIGMAS * sigma);
    }
    // [invariant] the same probability by two estimates, each with 20000 successes or more
    assertEquals(1, ball.acceptance() / declared.acceptance(), SIGMAS * Math.sqrt(2 / 20_000.0));
  }
}
