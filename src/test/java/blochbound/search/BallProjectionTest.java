package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball.Norm;
import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class BallProjectionTest {
  @Test
  void knownPointsAreProjectedWhereTheyBelong() {
    // [closed form] cutting, division by the length 5, and the simplex threshold (2 + 0.5 - 1)/2
    // with the third entry below it.
    assertArrayEquals(
        new double[] {1, -1, 0.2}, new BallProjection(Norm.BOX).project(new double[] {3, -4, 0.2}));
    assertArrayEquals(
        new double[] {0.6, -0.8},
        new BallProjection(Norm.ELLIPSOID).project(new double[] {3, -4}),
        1e-15);
    assertArrayEquals(
        new double[] {1, 0, 0},
        new BallProjection(Norm.DIAMOND).project(new double[] {2, -0.5, 0.1}),
        1e-15);
    // [closed form] threshold (1 + 0.8 - 1)/2 = 0.4.
    assertArrayEquals(
        new double[] {-0.6, 0.4, 0},
        new BallProjection(Norm.DIAMOND).project(new double[] {-1, 0.8, 0.3}),
        1e-15);
  }

  @ParameterizedTest(name = "{0}, seed 5")
  @EnumSource(Norm.class)
  void projectionIsInsideIdempotentAndKeepsPointsInside(Norm norm) {
    BallProjection ball = new BallProjection(norm);
    SplittableRandom random = new SplittableRandom(5);
    for (int draw = 0; draw < 2000; draw++) {
      double[] z = anywhere(random, 1 + draw % 9);
      double[] once = ball.project(z);
      assertTrue(ball.contains(once));
      assertArrayEquals(once, ball.project(once), 0.0);
      if (ball.contains(z)) {
        assertArrayEquals(z, once, 0.0);
      }
    }
  }

  @ParameterizedTest(name = "{0}, seed 6")
  @EnumSource(Norm.class)
  void projectionDoesNotExpandDistances(Norm norm) {
    BallProjection ball = new BallProjection(norm);
    SplittableRandom random = new SplittableRandom(6);
    for (int draw = 0; draw < 2000; draw++) {
      double[] a = anywhere(random, 1 + draw % 9);
      double[] b = anywhere(random, 1 + draw % 9);
      // [invariant] |P(a) - P(b)| <= |a - b| for a convex set, plus rounding of coordinates below
      // 30.
      assertTrue(distance(ball.project(a), ball.project(b)) <= distance(a, b) + 1e-13);
    }
  }

  @ParameterizedTest(name = "{0}, seed 7")
  @EnumSource(Norm.class)
  void noPointOfTheBallIsNearerAndTheObtuseAngleHolds(Norm norm) {
    BallProjection ball = new BallProjection(norm);
    SplittableRandom random = new SplittableRandom(7);
    for (int draw = 0; draw < 300; draw++) {
      int m = 1 + draw % 9;
      double[] z = anywhere(random, m);
      double[] nearest = ball.project(z);
      for (int k = 0; k < 30; k++) {
        double[] other = ball.random(random, m);
        assertTrue(ball.contains(other));
        assertTrue(distance(z, nearest) <= distance(z, other) + 1e-13);
        // [invariant] (z - P(z))'(y - P(z)) <= 0 for all y of the ball, exactly the projection.
        double angle =
            Iterate.inner(Iterate.difference(z, nearest), Iterate.difference(other, nearest));
        assertTrue(angle <= 1e-12, norm + " " + angle);
      }
    }
  }

  @ParameterizedTest(name = "{0}, seed 8")
  @EnumSource(Norm.class)
  void randomPointsAreUniform(Norm norm) {
    BallProjection ball = new BallProjection(norm);
    SplittableRandom random = new SplittableRandom(8);
    int draws = 20000;
    int m = 3;
    int inHalf = 0;
    double[] mean = new double[m];
    for (int k = 0; k < draws; k++) {
      double[] z = ball.random(random, m);
      double[] doubled = Arrays.stream(z).map(x -> 2 * x).toArray();
      inHalf += ball.contains(doubled) ? 1 : 0;
      for (int j = 0; j < m; j++) {
        mean[j] += z[j] / draws;
      }
    }
    // [closed form] the ball of half the radius holds 1/8 of the volume; 4 standard deviations.
    assertEquals(0.125, (double) inHalf / draws, 4 * Math.sqrt(0.125 * 0.875 / draws));
    for (double average : mean) {
      // [closed form] mean 0; a coordinate of the box has the largest variance, 1/3.
      assertEquals(0, average, 4 * Math.sqrt(1.0 / 3 / draws));
    }
  }

  @Test
  void pointsThatAreNotFiniteAreRefused() {
    for (Norm norm : Norm.values()) {
      BallProjection ball = new BallProjection(norm);
      assertFalse(ball.contains(new double[] {Double.NaN}));
      assertThrows(
          IllegalArgumentException.class, () -> ball.project(new double[] {0, Double.NaN}));
      assertThrows(
          IllegalArgumentException.class,
          () -> ball.project(new double[] {Double.POSITIVE_INFINITY}));
    }
  }

  @Test
  void extremeSizesNeitherOverflowNorVanish() {
    for (Norm norm : Norm.values()) {
      BallProjection ball = new BallProjection(norm);
      double[] far = ball.project(new double[] {1e200, 1e-200});
      assertTrue(ball.contains(far));
      assertEquals(1, far[0], 1e-15);
      assertArrayEquals(new double[] {1e-310, 0}, ball.project(new double[] {1e-310, 0}), 0.0);
    }
  }

  private static double[] anywhere(SplittableRandom random, int m) {
    double scale = Math.exp(random.nextDouble(-2, 2));
    return random.doubles(m, -scale, scale).toArray();
  }

  private static double distance(double[] a, double[] b) {
    double[] d = Iterate.difference(a, b);
    return Math.sqrt(Iterate.inner(d, d));
  }
}
