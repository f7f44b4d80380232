package blochbound.linalg;

import blochbound.check.Check;
import blochbound.interval.Interval;
import blochbound.interval.Rounding;

/**
 * A complex matrix known up to an error: all matrices within a Frobenius distance of a centre.
 *
 * <p>Every operation returns a ball that contains all exact results, so that an operator written in
 * decimals, square roots and cycles enters the generator with a proved error bound.
 *
 * @param centre the computed matrix
 * @param radius bound of the Frobenius norm of the error
 */
public record ComplexBall(ComplexMatrix centre, double radius) {
  /** Checks the radius. */
  public ComplexBall {
    Check.that(radius >= 0, "radius must not be negative");
  }

  /** The matrix itself, exactly. */
  public static ComplexBall exact(ComplexMatrix matrix) {
    return new ComplexBall(matrix, 0);
  }

  /** Upper bound of the Frobenius norm of every member. */
  public double normUp() {
    return Rounding.addUp(centre.frobeniusNormUp(), radius);
  }

  /** Sum. */
  public ComplexBall plus(ComplexBall other) {
    ComplexMatrix sum = centre.plus(other.centre);
    double rounding = Rounding.timesUp(Rounding.UNIT, sum.frobeniusNormUp());
    return new ComplexBall(sum, sumUp(radius, other.radius, rounding));
  }

  /** Difference. */
  public ComplexBall minus(ComplexBall other) {
    return plus(other.negate());
  }

  /** The negative, exactly. */
  public ComplexBall negate() {
    return new ComplexBall(centre.scale(-1), radius);
  }

  /** Matrix product. */
  public ComplexBall times(ComplexBall other) {
    // Each part of an entry takes k + 1 roundings for k inner terms; the modulus sqrt(2) as much.
    long products = 4L * centre.rows() * centre.columns() * other.centre.columns();
    return product(centre.times(other.centre), other, 2L * centre.columns() + 2, products);
  }

  /** Kronecker product. */
  public ComplexBall kron(ComplexBall other) {
    ComplexMatrix product = centre.kron(other.centre);
    return product(product, other, 4, 4L * product.rows() * product.columns());
  }

  /** Multiple with a real factor that is known up to an interval. */
  public ComplexBall times(Interval factor) {
    if (factor.lower() == 1 && factor.upper() == 1) {
      return this;
    }
    double middle = factor.middle();
    double norm = centre.frobeniusNormUp();
    double fromFactor = Rounding.timesUp(factor.radius(), Rounding.addUp(norm, radius));
    double fromRadius = Rounding.timesUp(Math.abs(middle), radius);
    ComplexMatrix scaled = centre.scale(middle);
    return new ComplexBall(
        scaled, sumUp(fromFactor, fromRadius, scalingError(scaled, middle, norm)));
  }

  /** Bound of the rounding error of {@code scaled}; zero for powers of two without underflow. */
  private double scalingError(ComplexMatrix scaled, double factor, double norm) {
    boolean isExact =
        factor == 0
            || (isPowerOfTwo(factor)
                && scaled.scale(1 / factor).minus(centre).frobeniusNormUp() == 0);
    if (isExact) {
      return 0;
    }
    double relative = Rounding.timesUp(Rounding.UNIT, Rounding.timesUp(Math.abs(factor), norm));
    return Rounding.addUp(relative, underflow(2L * centre.rows() * centre.columns()));
  }

  /** Multiple with the imaginary unit, exactly. */
  public ComplexBall timesI() {
    return new ComplexBall(centre.scale(0, 1), radius);
  }

  /** Conjugate transpose, exactly. */
  public ComplexBall adjoint() {
    return new ComplexBall(centre.adjoint(), radius);
  }

  /** Tells whether the zero matrix may be a member; false is certain. */
  public boolean mayBeZero() {
    return centre.frobeniusNorm() <= radius * (1 + 1e-9);
  }

  /** Tells whether a Hermitian matrix may be a member; false is certain. */
  public boolean mayBeHermitian() {
    return centre.minus(centre.adjoint()).frobeniusNorm() <= 2 * radius * (1 + 1e-9);
  }

  private static boolean isPowerOfTwo(double value) {
    return Math.abs(value) == Math.ulp(value) * 0x1p52;
  }

  /** Bound of what underflow adds to sums of that many products. */
  private static double underflow(long products) {
    return products * Double.MIN_VALUE;
  }

  /**
   * The computed product of the two centres with the bound of its error, from the number of
   * roundings that an entry takes and the number of real products altogether.
   */
  private ComplexBall product(
      ComplexMatrix computed, ComplexBall other, long roundings, long products) {
    double a = centre.frobeniusNormUp();
    double b = other.centre.frobeniusNormUp();
    double cross =
        sumUp(
            Rounding.timesUp(a, other.radius),
            Rounding.timesUp(b, radius),
            Rounding.timesUp(radius, other.radius));
    double relative = Rounding.timesUp(Rounding.gamma(roundings), Rounding.timesUp(a, b));
    double lost = a == 0 || b == 0 ? 0 : underflow(products);
    return new ComplexBall(computed, sumUp(cross, relative, lost));
  }

  private static double sumUp(double a, double b, double c) {
    return a == 0 && b == 0 && c == 0 ? 0 : Rounding.addUp(Rounding.addUp(a, b), c);
  }
}
