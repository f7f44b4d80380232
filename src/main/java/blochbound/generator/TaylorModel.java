package blochbound.generator;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.model.Atom.Function;

/**
 * A function on [-1, 1]^m as a sparse polynomial up to a degree plus a bounded remainder: every
 * exact value lies within {@link #remainder()} of the polynomial's, rounding included.
 *
 * <p>Source: K. Makino, M. Berz, Int. J. Pure Appl. Math. 4 (2003) 379 (from memory).
 */
public final class TaylorModel {
  private final MultiIndexTable table;
  private final int degree;
  private final int[] index;
  private final double[] coefficient;
  private final double remainder;

  private TaylorModel(
      MultiIndexTable table, int degree, int[] index, double[] coefficient, double remainder) {
    this.table = table;
    this.degree = degree;
    this.index = index;
    this.coefficient = coefficient;
    this.remainder = remainder;
  }

  /** A constant known up to an interval. */
  static TaylorModel constant(MultiIndexTable table, int degree, Interval value) {
    return new TaylorModel(
        table, degree, new int[] {0}, new double[] {value.middle()}, value.radius());
  }

  /**
   * The affine function c + sum s_i x_i, known up to {@code remainder}; zero slopes are left out.
   */
  static TaylorModel affine(
      MultiIndexTable table, int degree, double[] slopes, double constant, double remainder) {
    int count = 1;
    for (double s : slopes) {
      count += s != 0 ? 1 : 0;
    }
    int[] index = new int[count];
    double[] coefficient = new double[count];
    coefficient[0] = constant;
    int k = 1;
    for (int i = 0; i < slopes.length; i++) {
      if (slopes[i] != 0) {
        index[k] = i + 1;
        coefficient[k++] = slopes[i];
      }
    }
    return new TaylorModel(table, degree, index, coefficient, remainder);
  }

  /** Number of stored coefficients. */
  public int size() {
    return index.length;
  }

  /** Multi-index of the k-th coefficient; the constant term stands first. */
  public int index(int k) {
    return index[k];
  }

  /** The k-th coefficient. */
  public double coefficient(int k) {
    return coefficient[k];
  }

  /** Bound of the distance between function and polynomial. */
  public double remainder() {
    return remainder;
  }

  /** The constant term. */
  public double constantTerm() {
    return coefficient[0];
  }

  /** Upper bound of the sum of the absolute values of all coefficients. */
  public double sumUp() {
    double sum = 0;
    for (double c : coefficient) {
      sum += Math.abs(c);
    }
    return Rounding.inflate(sum, coefficient.length);
  }

  /** Sum. */
  TaylorModel plus(TaylorModel other) {
    double[] dense = new double[table.count()];
    boolean[] used = new boolean[table.count()];
    scatter(dense, used, 1);
    other.scatter(dense, used, 1);
    double rounding = Rounding.timesUp(Rounding.UNIT * 2, Rounding.addUp(sumUp(), other.sumUp()));
    return gather(
        dense, used, Rounding.addUp(Rounding.addUp(remainder, other.remainder), rounding));
  }

  private void scatter(double[] dense, boolean[] used, double factor) {
    for (int k = 0; k < index.length; k++) {
      dense[index[k]] += factor * coefficient[k];
      used[index[k]] = true;
    }
  }

  private TaylorModel gather(double[] dense, boolean[] used, double rest) {
    used[0] = true;
    int count = 0;
    for (boolean u : used) {
      count += u ? 1 : 0;
    }
    int[] newIndex = new int[count];
    double[] newCoefficient = new double[count];
    int k = 0;
    for (int a = 0; a < used.length; a++) {
      if (used[a]) {
        newIndex[k] = a;
        newCoefficient[k++] = dense[a];
      }
    }
    return new TaylorModel(table, degree, newIndex, newCoefficient, rest);
  }

  /** Product; terms beyond the degree go into the remainder. */
  TaylorModel times(TaylorModel other) {
    double[] dense = new double[table.count()];
    boolean[] used = new boolean[table.count()];
    double cut = 0;
    for (int i = 0; i < index.length; i++) {
      for (int j = 0; j < other.index.length; j++) {
        double product = coefficient[i] * other.coefficient[j];
        if (table.degree(index[i]) + table.degree(other.index[j]) > degree) {
          cut += Math.abs(product);
        } else {
          int sum = table.sum(index[i], other.index[j]);
          dense[sum] += product;
          used[sum] = true;
        }
      }
    }
    double a = sumUp();
    double b = other.sumUp();
    long operations = (long) index.length * other.index.length + 2;
    double rounding = Rounding.timesUp(Rounding.gamma(operations), Rounding.timesUp(a, b));
    double rest = Rounding.addUp(Rounding.inflate(cut, operations), rounding);
    rest = Rounding.addUp(rest, Rounding.timesUp(a, other.remainder));
    rest = Rounding.addUp(rest, Rounding.timesUp(remainder, Rounding.addUp(b, other.remainder)));
    return gather(dense, used, rest);
  }

  /** Multiple with a constant known up to an interval. */
  TaylorModel times(Interval factor) {
    return times(constant(table, degree, factor));
  }

  /** Enclosure of all values. */
  Interval range() {
    double spread = remainder;
    for (int k = 1; k < coefficient.length; k++) {
      spread = Rounding.addUp(spread, Math.abs(coefficient[k]));
    }
    return Interval.of(
        Rounding.addDown(coefficient[0], -spread), Rounding.addUp(coefficient[0], spread));
  }

  /**
   * A function of this one by Taylor's theorem with the Lagrange remainder; where the function is
   * not smooth on the range, a constant with the whole range as remainder.
   */
  TaylorModel compose(Function function) {
    Interval range = range();
    double centre = coefficient[0];
    Interval spread = Interval.of(0, range.minus(Interval.of(centre)).magnitude());
    Interval last = derivative(function, range, degree + 1);
    if (last.isEmpty() || !Double.isFinite(last.magnitude())) {
      return constant(table, degree, function.enclosure(range));
    }
    double[] noConstant = coefficient.clone();
    noConstant[0] = 0;
    TaylorModel deviation = new TaylorModel(table, degree, index, noConstant, remainder);
    TaylorModel power = constant(table, degree, Interval.ONE);
    TaylorModel sum = constant(table, degree, function.enclosure(Interval.of(centre)));
    for (int k = 1; k <= degree; k++) {
      power = power.times(deviation);
      sum = sum.plus(power.times(derivative(function, Interval.of(centre), k)));
    }
    double rest = last.times(spread.power(degree + 1)).magnitude();
    return new TaylorModel(
        table, degree, sum.index, sum.coefficient, Rounding.addUp(sum.remainder, rest));
  }

  /** Enclosure of the k-th derivative divided by k!. */
  private static Interval derivative(Function function, Interval x, int k) {
    Interval factorial = Interval.ONE;
    for (int i = 2; i <= k; i++) {
      factorial = factorial.times(Interval.of(i));
    }
    return switch (function) {
      case EXP -> x.exp().dividedBy(factorial);
      case SIN -> cycle(x, k).dividedBy(factorial);
      case COS -> cycle(x, k + 1).dividedBy(factorial);
      case RECIPROCAL -> {
        Interval power = Interval.ONE.dividedBy(x.power(k + 1));
        yield x.contains(0) ? Interval.ENTIRE : k % 2 == 0 ? power : power.negate();
      }
      case SQRT -> x.lower() <= 0 ? Interval.ENTIRE : rootDerivative(x, k);
    };
  }

  /** The k-th derivative of the sine. */
  private static Interval cycle(Interval x, int k) {
    Interval value = k % 2 == 0 ? x.sin() : x.cos();
    return k % 4 < 2 ? value : value.negate();
  }

  /** Binomial coefficient (1/2 over k) times x^(1/2 - k). */
  private static Interval rootDerivative(Interval x, int k) {
    Interval product = x.sqrt();
    for (int i = 0; i < k; i++) {
      product = product.times(Interval.of(0.5 - i)).dividedBy(Interval.of(i + 1.0)).dividedBy(x);
    }
    return product;
  }
}
