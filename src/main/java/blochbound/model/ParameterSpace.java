package blochbound.model;

import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import blochbound.model.Ball.Norm;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.fraction.BigFraction;

/**
 * Coordinates of the tolerance ball: p_i = centre_i + sum_j slope_ij z_j with |z| at most 1 in the
 * norm of the ball.
 *
 * <p>Only parameters with a tolerance have a coordinate. The radius is part of the slopes. For a
 * correlated ellipsoid the slopes are a Cholesky factor, enclosed in interval arithmetic; otherwise
 * each parameter has one slope. For a box the centre is the middle of the range, which need not be
 * the nominal value.
 */
public final class ParameterSpace {
  private static final int SIGNIFICANT_DIGITS = 12;

  private final List<Parameter> parameters;
  private final Ball ball;
  private final int[] varying;
  private final BigFraction[] centre;
  private final BigFraction[] halfWidth;
  private final Interval[] centreInternal;
  private final Interval[][] slopeInternal;
  private final BigFraction[][] correlation;

  private ParameterSpace(List<Parameter> parameters, Ball ball) {
    this.parameters = List.copyOf(parameters);
    this.ball = ball;
    int n = parameters.size();
    centre = new BigFraction[n];
    halfWidth = new BigFraction[n];
    centreInternal = new Interval[n];
    List<Integer> moving = new ArrayList<>();
    BigFraction radius = fraction(ball.radius());
    for (int i = 0; i < n; i++) {
      Parameter p = parameters.get(i);
      BigFraction nominal = fraction(p.nominal());
      BigFraction down = nominal.subtract(fraction(p.lower())).multiply(radius);
      BigFraction up = fraction(p.upper()).subtract(nominal).multiply(radius);
      centre[i] = nominal.add(up.subtract(down).divide(2));
      halfWidth[i] = up.add(down).divide(2);
      centreInternal[i] = new ExactNumber(centre[i], 0).times(p.unit().factor()).enclosure();
      if (halfWidth[i].getNumerator().signum() != 0) {
        moving.add(i);
      }
    }
    varying = moving.stream().mapToInt(Integer::intValue).toArray();
    correlation = correlationMatrix();
    slopeInternal = slopes();
  }

  /**
   * Coordinates of the given parameters and ball.
   *
   * @throws IllegalArgumentException when the correlation matrix is not proved positive definite,
   *     or a norm other than inf meets an off-centre nominal value
   */
  public static ParameterSpace of(List<Parameter> parameters, Ball ball) {
    for (Parameter p : parameters) {
      if (ball.norm() != Norm.BOX && !p.isCentred()) {
        throw new IllegalArgumentException(
            "an off-centre nominal value of " + p.name() + " needs the norm inf");
      }
    }
    return new ParameterSpace(parameters, ball);
  }

  private static BigFraction fraction(BigDecimal value) {
    return ExactNumber.of(value).ratio();
  }

  private BigFraction[][] correlationMatrix() {
    int m = varying.length;
    BigFraction[][] r = new BigFraction[m][m];
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < m; j++) {
        r[i][j] = i == j ? BigFraction.ONE : BigFraction.ZERO;
      }
    }
    for (Ball.Correlation c : ball.correlations()) {
      int a = coordinateOf(c.first());
      int b = coordinateOf(c.second());
      if (a >= 0 && b >= 0) {
        r[a][b] = fraction(c.value());
        r[b][a] = r[a][b];
      }
    }
    return r;
  }

  /** Half widths times the Cholesky factor of the correlation matrix, as enclosures. */
  private Interval[][] slopes() {
    int m = varying.length;
    Interval[][] factor = new Interval[m][m];
    for (int i = 0; i < m; i++) {
      for (int j = 0; j < m; j++) {
        factor[i][j] = Interval.ZERO;
      }
      for (int j = 0; j <= i; j++) {
        Interval sum = Interval.fromFraction(correlation[i][j]);
        for (int k = 0; k < j; k++) {
          sum = sum.minus(factor[i][k].times(factor[j][k]));
        }
        if (i == j && !(sum.lower() > 0)) {
          throw new IllegalArgumentException(
              "the correlations are not positive definite (at "
                  + parameters.get(varying[i]).name()
                  + "); parameters that always move together are one shared parameter");
        }
        factor[i][j] =
            i != j ? sum.dividedBy(factor[j][j]) : isOne(sum) ? Interval.ONE : sum.sqrt();
      }
    }
    for (int i = 0; i < m; i++) {
      Parameter p = parameters.get(varying[i]);
      Interval width =
          new ExactNumber(halfWidth[varying[i]], 0).times(p.unit().factor()).enclosure();
      for (int j = 0; j < m; j++) {
        factor[i][j] = factor[i][j].times(width);
      }
    }
    return factor;
  }

  private static boolean isOne(Interval value) {
    return value.lower() == 1 && value.upper() == 1;
  }

  /** All parameters. */
  public List<Parameter> parameters() {
    return parameters;
  }

  /** Norm of the ball. */
  public Norm norm() {
    return ball.norm();
  }

  /** Number m of coordinates: parameters with a tolerance. */
  public int coordinates() {
    return varying.length;
  }

  /** Parameter that belongs to a coordinate. */
  public int parameterOf(int coordinate) {
    return varying[coordinate];
  }

  /** Coordinate that belongs to a parameter, or -1 when it is constant. */
  public int coordinateOf(int parameter) {
    for (int j = 0; j < varying.length; j++) {
      if (varying[j] == parameter) {
        return j;
      }
    }
    return -1;
  }

  /** Tells whether each parameter moves with its own coordinate only. */
  public boolean isUncorrelated() {
    return ball.correlations().isEmpty();
  }

  /** Enclosure of the centre value of a parameter in internal units. */
  public Interval centre(int parameter) {
    return centreInternal[parameter];
  }

  /** Enclosure of the slope of a coordinate's parameter along {@code coordinate}. */
  public Interval slope(int ofCoordinate, int coordinate) {
    return slopeInternal[ofCoordinate][coordinate];
  }

  /** Parameters at the coordinates z, in internal units, rounded. */
  public double[] parametersAt(double[] z) {
    double[] p = new double[parameters.size()];
    for (int i = 0; i < p.length; i++) {
      p[i] = centreInternal[i].middle();
    }
    for (int i = 0; i < varying.length; i++) {
      for (int j = 0; j < varying.length; j++) {
        p[varying[i]] += slopeInternal[i][j].middle() * z[j];
      }
    }
    return p;
  }

  /** Ranges of all parameters over the ball, in internal units. */
  public Interval[] ranges() {
    Interval[] ranges = new Interval[parameters.size()];
    for (int i = 0; i < ranges.length; i++) {
      Parameter p = parameters.get(i);
      Interval low =
          new ExactNumber(centre[i].subtract(halfWidth[i]), 0).times(p.unit().factor()).enclosure();
      Interval high =
          new ExactNumber(centre[i].add(halfWidth[i]), 0).times(p.unit().factor()).enclosure();
      ranges[i] = low.hull(high);
    }
    return ranges;
  }

  /** Exact half width of a parameter's range over the ball, in its own unit. */
  public ExactNumber halfWidth(int parameter) {
    return new ExactNumber(halfWidth[parameter], 0);
  }

  /** Exact centre of a parameter's range over the ball, in its own unit. */
  public ExactNumber exactCentre(int parameter) {
    return new ExactNumber(centre[parameter], 0);
  }

  /** Nominal coordinates z; zero unless a box has an off-centre nominal value. */
  public double[] nominalCoordinates() {
    List<BigDecimal> nominal = parameters.stream().map(Parameter::nominal).toList();
    return coordinatesOf(nominal);
  }

  /** Coordinates z of parameter values in their own units, rounded. */
  public double[] coordinatesOf(List<BigDecimal> point) {
    int m = varying.length;
    double[] z = new double[m];
    for (int i = 0; i < m; i++) {
      int k = varying[i];
      double t = fraction(point.get(k)).subtract(centre[k]).divide(halfWidth[k]).doubleValue();
      double width = slopeInternal[i][i].middle();
      double full =
          new ExactNumber(halfWidth[k], 0).times(parameters.get(k).unit().factor()).doubleValue();
      double rest = t * full;
      for (int j = 0; j < i; j++) {
        rest -= slopeInternal[i][j].middle() * z[j];
      }
      z[i] = i == 0 || isUncorrelated() ? t : rest / width;
    }
    return z;
  }

  /** Internal values of parameters given as decimals of their own units, enclosed. */
  public Interval[] internalValues(List<BigDecimal> point) {
    Interval[] values = new Interval[point.size()];
    for (int i = 0; i < values.length; i++) {
      values[i] = ExactNumber.of(point.get(i)).times(parameters.get(i).unit().factor()).enclosure();
    }
    return values;
  }

  /** Tells, in exact arithmetic, whether decimals of the parameters' own units lie in the ball. */
  public boolean contains(List<BigDecimal> point) {
    int m = varying.length;
    for (int i = 0; i < parameters.size(); i++) {
      if (coordinateOf(i) < 0 && fraction(point.get(i)).compareTo(centre[i]) != 0) {
        return false;
      }
    }
    BigFraction[] t = new BigFraction[m];
    for (int i = 0; i < m; i++) {
      int k = varying[i];
      t[i] = fraction(point.get(k)).subtract(centre[k]).divide(halfWidth[k]);
    }
    return switch (ball.norm()) {
      case BOX -> java.util.Arrays.stream(t).allMatch(x -> x.abs().compareTo(BigFraction.ONE) <= 0);
      case DIAMOND ->
          java.util.Arrays.stream(t)
                  .map(BigFraction::abs)
                  .reduce(BigFraction.ZERO, BigFraction::add)
                  .compareTo(BigFraction.ONE)
              <= 0;
      case ELLIPSOID -> quadraticForm(t).compareTo(BigFraction.ONE) <= 0;
    };
  }

  /** t' R^-1 t by exact elimination. */
  private BigFraction quadraticForm(BigFraction[] t) {
    int m = t.length;
    BigFraction[][] r = new BigFraction[m][];
    for (int i = 0; i < m; i++) {
      r[i] = correlation[i].clone();
    }
    BigFraction[] y = t.clone();
    BigFraction sum = BigFraction.ZERO;
    for (int k = 0; k < m; k++) {
      sum = sum.add(y[k].multiply(y[k]).divide(r[k][k]));
      for (int i = k + 1; i < m; i++) {
        BigFraction factor = r[i][k].divide(r[k][k]);
        if (factor.getNumerator().signum() == 0) {
          continue;
        }
        y[i] = y[i].subtract(factor.multiply(y[k]));
        for (int j = k; j < m; j++) {
          r[i][j] = r[i][j].subtract(factor.multiply(r[k][j]));
        }
      }
    }
    return sum;
  }

  /**
   * Decimal parameter values near the coordinates z that lie in the ball exactly as written.
   *
   * <p>Ends of a box are met exactly; other values are rounded to twelve digits of the tolerance
   * and drawn towards the centre as far as needed.
   */
  public List<BigDecimal> decimalPointInside(double[] z) {
    double shrink = 0;
    for (int attempt = 0; attempt < 60; attempt++) {
      List<BigDecimal> point = new ArrayList<>();
      for (int i = 0; i < parameters.size(); i++) {
        point.add(decimal(i, z, shrink));
      }
      if (contains(point)) {
        return point;
      }
      shrink = shrink == 0 ? 1e-13 : Math.min(1, 2 * shrink);
    }
    throw new IllegalStateException("no decimal point found inside the ball");
  }

  private BigDecimal decimal(int parameter, double[] z, double shrink) {
    Parameter p = parameters.get(parameter);
    int i = coordinateOf(parameter);
    if (i < 0) {
      return p.nominal();
    }
    double t = 0;
    double width = halfWidth[parameter].doubleValue();
    double full = new ExactNumber(halfWidth[parameter], 0).times(p.unit().factor()).doubleValue();
    for (int j = 0; j < z.length; j++) {
      t += isUncorrelated() ? (j == i ? z[j] : 0) : slopeInternal[i][j].middle() * z[j] / full;
    }
    t *= 1 - shrink;
    if (ball.norm() == Norm.BOX && Math.abs(t) >= 1 - 1e-12) {
      BigFraction end =
          t > 0
              ? centre[parameter].add(halfWidth[parameter])
              : centre[parameter].subtract(halfWidth[parameter]);
      return toDecimal(end, RoundingMode.HALF_EVEN).stripTrailingZeros();
    }
    int quantum = SIGNIFICANT_DIGITS - (int) Math.floor(Math.log10(width)) - 1;
    BigDecimal middle = toDecimal(centre[parameter], RoundingMode.HALF_EVEN);
    BigDecimal value =
        middle.add(new BigDecimal(t * width)).setScale(quantum, RoundingMode.HALF_EVEN);
    return value.signum() == 0 ? BigDecimal.ZERO : value.stripTrailingZeros();
  }

  /** Ends and centres of ranges are finite decimals: sums, products and halves of decimals. */
  private static BigDecimal toDecimal(BigFraction value, RoundingMode mode) {
    return new BigDecimal(value.getNumerator())
        .divide(new BigDecimal(value.getDenominator()), new MathContext(60, mode));
  }
}
