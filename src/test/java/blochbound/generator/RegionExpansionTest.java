package blochbound.generator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.BigReference;
import blochbound.PreciseScalar;
import blochbound.TestCases;
import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import blochbound.model.Device;
import blochbound.model.ParameterSpace;
import blochbound.model.Region;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class RegionExpansionTest {
  private static Device device(String ball) {
    return TestCases.device(
        "sites: {q: {levels: [g, e]}}",
        "parameters:",
        "  x: {nominal: 0.7, tolerance: 0.3}",
        "  k: {nominal: 0.3}",
        "  y: {nominal: 1.1, tolerance: 0.45}",
        "ball: " + ball,
        "hamiltonian: \"x^3*y*X@q + exp(x-y)*Y@q + sin(2*x)*cos(y)*Z@q + x^5*X@q\"",
        "jumps:",
        "  - {rate: x^2*y, operator: lower@q}",
        "  - {rate: 1/(x+y), operator: raise@q}",
        "  - {rate: k/x^2, operator: Z@q}",
        "  - {rate: sqrt(x+k), operator: X@q + x*lower@q}");
  }

  /** Exact parameters at z; the correlation of the two coordinates stands in {@code r}. */
  private static List<BigDecimal> parameters(
      ParameterSpace space, List<BigDecimal> z, String correlation) {
    BigDecimal r = new BigDecimal(correlation);
    BigDecimal rest = BigDecimal.ONE.subtract(r.pow(2)).sqrt(BigReference.DIGITS);
    List<BigDecimal> p = new ArrayList<>();
    for (int i = 0; i < space.parameters().size(); i++) {
      BigDecimal value = decimal(space.exactCentre(i));
      int row = space.coordinateOf(i);
      if (row >= 0) {
        // [closed form] Cholesky factor of two correlated coordinates: (1, 0), (r, sqrt(1 - r^2))
        BigDecimal t = row == 0 ? z.get(0) : r.multiply(z.get(0)).add(rest.multiply(z.get(1)));
        value = value.add(t.multiply(decimal(space.halfWidth(i))));
      }
      p.add(value);
    }
    return p;
  }

  private static BigDecimal decimal(ExactNumber exact) {
    return new BigDecimal(exact.numerator())
        .divide(new BigDecimal(exact.denominator()), BigReference.DIGITS);
  }

  private static Region region(SplittableRandom random, int kind) {
    double[] centre = new double[2];
    double[] half = new double[2];
    for (int j = 0; j < 2; j++) {
      half[j] = kind == 0 ? 1 : Math.scalb(random.nextDouble(), -random.nextInt(40));
      centre[j] = kind == 0 ? 0 : random.nextDouble(-1 + half[j], Math.nextUp(1 - half[j]));
    }
    return new Region(centre, half);
  }

  @ParameterizedTest
  @ValueSource(strings = {"0", "0.6", "-0.93"})
  void coefficientsContainTheirValuesInDecimals(String correlation) {
    String ball =
        correlation.equals("0")
            ? "{norm: inf, radius: 1}"
            : "{norm: 2, radius: 1, correlations: [{between: [x, y], value: " + correlation + "}]}";
    BlochGenerator generator = BlochGenerator.of(device(ball));
    MultiIndexTable table = MultiIndexTable.of(2, generator.degree());
    SplittableRandom random = new SplittableRandom(17);
    for (int k = 0; k < 20; k++) {
      Region region = region(random, k);
      RegionExpansion expansion = RegionExpansion.over(generator, region, table);
      for (int draw = 0; draw < 4; draw++) {
        boolean isVertex = draw == 0;
        double[] x =
            random.doubles(2, -1, 1).map(v -> isVertex ? Math.copySign(1, v) : v).toArray();
        List<BigDecimal> z = new ArrayList<>();
        for (int j = 0; j < 2; j++) {
          z.add(
              new BigDecimal(region.centre(j))
                  .add(new BigDecimal(x[j]).multiply(new BigDecimal(region.halfWidth(j)))));
        }
        check(generator, expansion, table, x, parameters(generator.space(), z, correlation));
      }
    }
  }

  private static void check(
      BlochGenerator generator,
      RegionExpansion expansion,
      MultiIndexTable table,
      double[] x,
      List<BigDecimal> p) {
    for (int j = 0; j < generator.terms().size(); j++) {
      TaylorModel model = expansion.coefficient(j);
      BigDecimal sum = BigDecimal.ZERO;
      for (int k = 0; k < model.size(); k++) {
        BigDecimal product = new BigDecimal(model.coefficient(k));
        for (int variable : table.factors(model.index(k))) {
          product = product.multiply(new BigDecimal(x[variable]));
        }
        sum = sum.add(product);
      }
      BigDecimal value = PreciseScalar.value(generator.terms().get(j).monomial(), p);
      assertTrue(Double.isFinite(model.remainder()));
      assertTrue(
          value.subtract(sum).abs().compareTo(new BigDecimal(model.remainder())) <= 0,
          generator.terms().get(j).monomial() + " at " + p);
    }
  }

  @Test
  void polynomialsOfLowDegreeHaveRoundingRemaindersOnly() {
    BlochGenerator generator =
        BlochGenerator.of(
            TestCases.device(
                "sites: {q: {levels: [g, e]}}",
                "parameters:",
                "  x: {nominal: 0.7, tolerance: 0.3}",
                "  y: {nominal: 1.1, tolerance: 0.45}",
                "hamiltonian: \"x^2*y*X@q + x*Y@q\"",
                "jumps: [{rate: y^3, operator: lower@q}]"));
    RegionExpansion expansion =
        RegionExpansion.over(generator, Region.whole(2), MultiIndexTable.of(2, 3));
    for (int j = 0; j < generator.terms().size(); j++) {
      // [common practice, no source] a few dozen roundings of numbers of size 3
      assertTrue(expansion.coefficient(j).remainder() < 1e-13);
    }
  }

  @Test
  void aPointGivesConstantsThatContainTheValues() {
    BlochGenerator generator = BlochGenerator.of(device("{norm: inf, radius: 1}"));
    List<BigDecimal> point =
        List.of(new BigDecimal("0.61"), new BigDecimal("0.3"), new BigDecimal("1.27"));
    Interval[] enclosed = generator.space().internalValues(point);
    RegionExpansion expansion = RegionExpansion.at(generator, enclosed);
    for (int j = 0; j < generator.terms().size(); j++) {
      BigDecimal value = PreciseScalar.value(generator.terms().get(j).monomial(), point);
      TaylorModel model = expansion.coefficient(j);
      assertEquals(1, model.size());
      BigDecimal distance = value.subtract(new BigDecimal(model.constantTerm())).abs();
      assertTrue(distance.compareTo(new BigDecimal(model.remainder())) <= 0);
      assertTrue(model.remainder() < 1e-13);
    }
  }
}
