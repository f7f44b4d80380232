package blochbound.bound;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.generator.MultiIndexTable;
import blochbound.model.Ball.Norm;
import blochbound.model.Region;
import java.math.BigDecimal;
import java.util.Optional;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class BallConstraintTest {
  private static Region region(SplittableRandom random, int m) {
    double[] centre = random.doubles(m, -1, 1).toArray();
    double[] half = random.doubles(m, 0, 1).map(h -> h * h * h).toArray();
    return new Region(centre, half);
  }

  /** |z| at most 1 in exact arithmetic. */
  private static boolean isInside(Norm norm, double[] z) {
    BigDecimal size = BigDecimal.ZERO;
    for (double x : z) {
      BigDecimal part = new BigDecimal(x).abs();
      size =
          switch (norm) {
            case BOX -> size.max(part);
            case ELLIPSOID -> size.add(part.pow(2));
            case DIAMOND -> size.add(part);
          };
    }
    return size.compareTo(BigDecimal.ONE) <= 0;
  }

  private static boolean isIn(Region region, double[] z) {
    for (int j = 0; j < z.length; j++) {
      BigDecimal distance = new BigDecimal(z[j]).subtract(new BigDecimal(region.centre(j))).abs();
      if (distance.compareTo(new BigDecimal(region.halfWidth(j))) > 0) {
        return false;
      }
    }
    return true;
  }

  @ParameterizedTest
  @EnumSource(Norm.class)
  void tighteningLosesNoPointOfTheBall(Norm norm) {
    SplittableRandom random = new SplittableRandom(9);
    BallConstraint ball = new BallConstraint(norm);
    int covered = 0;
    for (int k = 0; k < 400; k++) {
      int m = random.nextInt(1, 5);
      Region region = region(random, m);
      Optional<Region> tight = ball.tighten(region);
      for (int draw = 0; draw < 30; draw++) {
        boolean isVertex = draw % 2 == 0;
        double[] x =
            random.doubles(m, -1, 1).map(v -> isVertex ? Math.copySign(1, v) : v).toArray();
        double[] z = ball.project(region.at(x));
        if (isIn(region, z) && isInside(norm, z)) {
          covered++;
          assertTrue(isIn(tight.orElseThrow(), z));
        }
      }
    }
    assertTrue(covered > 1000, "points met: " + covered);
  }

  @Test
  void regionsOutsideAreDroppedAndOthersDrawnTogether() {
    BallConstraint ball = new BallConstraint(Norm.ELLIPSOID);
    Region corner = new Region(new double[] {0.9, 0.9}, new double[] {0.1, 0.1});
    assertTrue(ball.tighten(corner).isEmpty());
    Region edge = new Region(new double[] {0.75, 0.5}, new double[] {0.25, 0.5});
    Region tight = ball.tighten(edge).orElseThrow();
    // [closed form] z_0 >= 0.5 leaves |z_1| <= sqrt(3)/2 = 0.8660254
    assertEquals(0.8660254037844386, tight.centre(1) + tight.halfWidth(1), 1e-12);
    Region diamondEdge = new Region(new double[] {0.75, 0.5}, new double[] {0.25, 0.5});
    Region cut = new BallConstraint(Norm.DIAMOND).tighten(diamondEdge).orElseThrow();
    // [closed form] z_0 >= 0.5 leaves z_1 <= 0.5
    assertEquals(0.5, cut.centre(1) + cut.halfWidth(1), 1e-12);
    Region box = new Region(new double[] {0.9, 0.9}, new double[] {0.1, 0.1});
    assertSame(box, new BallConstraint(Norm.BOX).tighten(box).orElseThrow());
  }

  @Test
  void aRegionThatOnlyTouchesTheBallIsKept() {
    Region touching = new Region(new double[] {1.5, 0}, new double[] {0.5, 0.25});
    for (Norm norm : new Norm[] {Norm.ELLIPSOID, Norm.DIAMOND}) {
      Region tight = new BallConstraint(norm).tighten(touching).orElseThrow();
      // [closed form] the point (1, 0) lies on the rim of either ball
      assertTrue(isIn(tight, new double[] {1, 0}));
    }
  }

  @ParameterizedTest
  @EnumSource(Norm.class)
  void projectionsLieInTheBallToRoundingAndInnerPointsStay(Norm norm) {
    SplittableRandom random = new SplittableRandom(2);
    BallConstraint ball = new BallConstraint(norm);
    for (int k = 0; k < 200; k++) {
      double[] z = random.doubles(random.nextInt(1, 6), -1.5, 1.5).toArray();
      double[] inside = ball.project(z);
      double size = 0;
      for (double x : inside) {
        size =
            norm == Norm.BOX
                ? Math.max(size, Math.abs(x))
                : size + (norm == Norm.ELLIPSOID ? x * x : Math.abs(x));
      }
      assertTrue(size <= 1 + 1e-15);
      if (isInside(norm, z)) {
        assertArrayEquals(z, inside, 1e-15);
      }
    }
  }

  @ParameterizedTest
  @EnumSource(
      value = Norm.class,
      names = {"ELLIPSOID", "DIAMOND"})
  void theMultiplierLowersThePolynomialInsideTheBall(Norm norm) {
    SplittableRandom random = new SplittableRandom(12);
    BallConstraint ball = new BallConstraint(norm);
    for (int k = 0; k < 300; k++) {
      int m = random.nextInt(1, 5);
      MultiIndexTable table = MultiIndexTable.of(m, 3);
      Region region = region(random, m);
      double[] plain = new double[table.firstOfDegree(3)];
      for (int a = 0; a < plain.length; a++) {
        plain[a] = random.nextDouble(-1, 1);
      }
      double[] added = plain.clone();
      double lambda = random.nextDouble(0, 3);
      double slack = ball.add(added, table, region, lambda);
      for (int draw = 0; draw < 20; draw++) {
        double[] x = random.doubles(m, -1, 1).toArray();
        if (isInside(norm, exactRim(region, x))) {
          BigDecimal before = value(plain, table, x);
          BigDecimal after = value(added, table, x).subtract(new BigDecimal(slack));
          // [closed form] lambda (|z| - 1) is not positive in the ball
          assertTrue(after.compareTo(before) <= 0);
        }
      }
    }
  }

  private static double[] exactRim(Region region, double[] x) {
    double[] z = region.at(x);
    for (int j = 0; j < z.length; j++) {
      // Rounded away from zero, so that what counts as inside is inside.
      z[j] = Math.copySign(Math.abs(z[j]) + 2 * Math.ulp(1.0), z[j]);
    }
    return z;
  }

  private static BigDecimal value(double[] c, MultiIndexTable table, double[] x) {
    BigDecimal sum = BigDecimal.ZERO;
    for (int a = 0; a < c.length; a++) {
      BigDecimal product = new BigDecimal(c[a]);
      for (int variable : table.factors(a)) {
        product = product.multiply(new BigDecimal(x[variable]));
      }
      sum = sum.add(product);
    }
    return sum;
  }

  @Test
  void cuttingIsToldFromLyingInside() {
    Region inside = new Region(new double[] {0.2, -0.1}, new double[] {0.3, 0.3});
    // [closed form] the farthest corner (0.5, -0.4) has lengths 0.6403 and 0.9
    assertFalse(new BallConstraint(Norm.ELLIPSOID).cuts(inside));
    assertFalse(new BallConstraint(Norm.DIAMOND).cuts(inside));
    Region crossing = new Region(new double[] {0.4, 0.4}, new double[] {0.2, 0.2});
    // [closed form] the farthest corner (0.6, 0.6) has lengths 0.8485 and 1.2
    assertFalse(new BallConstraint(Norm.ELLIPSOID).cuts(crossing));
    assertTrue(new BallConstraint(Norm.DIAMOND).cuts(crossing));
    assertFalse(new BallConstraint(Norm.BOX).cuts(Region.whole(2)));
  }
}
