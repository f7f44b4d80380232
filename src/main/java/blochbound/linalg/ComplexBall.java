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
    return Rounding.addUp(centreNormUp(), radius);
  }

  private double centreNormUp() {
    return Rounding.inflate(centre.frobeniusNorm(), 2L * centre.rows() * centre.columns() + 4);
  }

  /** Sum. */
  public ComplexBall plus(ComplexBall other) {
    ComplexMatrix sum = centre.plus(other.centre);
    double rounding =
        Rounding.UNIT * Rounding.inflate(sum.frobeniusNorm(), 2L * sum.rows() * sum.columns() + 4);
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
    double a = centreNormUp();
    double b = other.centreNormUp();
    double rounding =
        Rounding.timesUp(Rounding.gamma(2L * centre.columns() + 2), Rounding.timesUp(a, b));
    return new ComplexBall(centre.times(other.centre), productRadius(a, b, other.radius, rounding));
  }

  /** Kronecker product. */
  public ComplexBall kron(ComplexBall other) {
    double a = centreNormUp();
    double b = other.centreNormUp();
    double rounding = Rounding.timesUp(Rounding.gamma(4), Rounding.timesUp(a, b));
    return new ComplexBall(centre.kron(other.centre), productRadius(a, b, other.radius, rounding));
  }

  /** Multiple with a real factor that is known up to an interval. */
  public ComplexBall times(Interval factor) {
    if (factor.lower() == 1 && factor.upper() == 1) {
      return this;
    }
    double middle = factor.middle();
    double norm = centreNormUp();
    double fromFactor = Rounding.timesUp(factor.radius(), Rounding.addUp(norm, radius));
    double fromRadius = Rounding.timesUp(Math.abs(middle), radius);
    double rounding = Rounding.timesUp(Rounding.UNIT, Rounding.timesUp(Math.abs(middle), norm));
    return new ComplexBall(
        centre.scale(middle), sumUp(fromFactor, fromRadius, isPowerOfTwo(middle) ? 0 : rounding));
  }

  /** Multiple with the imaginary unit, exactly. */
  public ComplexBall timesI() {
    return new ComplexBall(centre.scale(0, 1), radius);
  }

  /** Conjugate transpose, exactly. */
  public ComplexBall adjoint() {
    return new ComplexBall(centre.adjoint(), radius);
  }

  /** Tells whether the zero matrix is a member. */
  public boolean mayBeZero() {
    return centre.frobeniusNorm() <= radius;
  }

  /** Tells whether a Hermitian matrix may be a member. */
  public boolean mayBeHermitian() {
    return centre.minus(centre.adjoint()).frobeniusNorm() <= 2 * radius * (1 + 1e-9);
  }

  private static boolean isPowerOfTwo(double value) {
    return value == 0 || Math.abs(value) == Math.ulp(value) * 0x1p52;
  }

  private double productRadius(double a, double b, double otherRadius, double rounding) {
    double cross =
        sumUp(
            Rounding.timesUp(a, otherRadius),
            Rounding.timesUp(b, radius),
            Rounding.timesUp(radius, otherRadius));
    return cross == 0 ? rounding : Rounding.addUp(cross, rounding);
  }

  private static double sumUp(double a, double b, double c) {
    return a == 0 && b == 0 && c == 0 ? 0 : Rounding.addUp(Rounding.addUp(a, b), c);
  }
}
