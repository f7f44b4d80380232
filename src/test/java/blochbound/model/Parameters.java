package blochbound.model;

import blochbound.interval.ExactNumber;
import java.math.BigDecimal;
import java.util.List;
import java.util.SplittableRandom;

/** Parameters and balls for tests. */
final class Parameters {
  /** Cycles per millisecond in radians per microsecond: 2 pi / 1000. */
  static final Unit KILOHERTZ =
      new Unit("kHz", ExactNumber.PI.times(ExactNumber.of(2)).dividedBy(ExactNumber.of(1000)), -1);

  private Parameters() {}

  static Parameter of(String name, String lower, String nominal, String upper, Unit unit) {
    return new Parameter(
        name,
        new BigDecimal(nominal),
        new BigDecimal(lower),
        new BigDecimal(upper),
        unit,
        new Distribution.Uniform());
  }

  static Parameter of(String name, String lower, String nominal, String upper) {
    return of(name, lower, nominal, upper, Unit.NONE);
  }

  /** Space of one to four parameters in a ball of any norm, some constant, some in kHz. */
  static ParameterSpace random(SplittableRandom random) {
    List<Ball.Norm> norms = List.of(Ball.Norm.values());
    Ball.Norm norm = norms.get(random.nextInt(norms.size()));
    int n = random.nextInt(1, 5);
    Parameter[] all = new Parameter[n];
    for (int i = 0; i < n; i++) {
      int scale = random.nextInt(0, 6);
      BigDecimal nominal = BigDecimal.valueOf(random.nextInt(-500, 500), scale);
      BigDecimal down = BigDecimal.valueOf(random.nextInt(1, 300), scale);
      BigDecimal up =
          norm == Ball.Norm.BOX ? BigDecimal.valueOf(random.nextInt(1, 300), scale) : down;
      boolean isConstant = i > 0 && random.nextInt(5) == 0;
      all[i] =
          new Parameter(
              "p" + i,
              nominal,
              isConstant ? nominal : nominal.subtract(down),
              isConstant ? nominal : nominal.add(up),
              random.nextBoolean() ? Unit.NONE : KILOHERTZ,
              new Distribution.Uniform());
    }
    boolean correlated =
        norm == Ball.Norm.ELLIPSOID && n >= 2 && !all[1].isConstant() && random.nextBoolean();
    List<Ball.Correlation> correlations =
        correlated
            ? List.of(new Ball.Correlation(1, 0, BigDecimal.valueOf(random.nextInt(-99, 100), 2)))
            : List.of();
    BigDecimal radius = BigDecimal.valueOf(random.nextInt(1, 40), 1);
    return ParameterSpace.of(List.of(all), new Ball(norm, radius, correlations));
  }

  /** Coordinates inside the ball, at times on its rim or at a corner. */
  static double[] coordinates(SplittableRandom random, ParameterSpace space) {
    double[] z = new double[space.coordinates()];
    double size = 0;
    boolean isCorner = random.nextInt(3) == 0;
    for (int j = 0; j < z.length; j++) {
      z[j] = isCorner ? random.nextInt(-1, 2) : random.nextDouble(-1, 1);
      size =
          switch (space.norm()) {
            case BOX -> Math.max(size, Math.abs(z[j]));
            case ELLIPSOID -> Math.hypot(size, z[j]);
            case DIAMOND -> size + Math.abs(z[j]);
          };
    }
    double share = random.nextInt(3) == 0 ? random.nextDouble() : 1;
    for (int j = 0; j < z.length && size > 0; j++) {
      z[j] *= share / size;
    }
    return z;
  }
}
