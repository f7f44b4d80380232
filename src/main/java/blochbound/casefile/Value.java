package blochbound.casefile;

import blochbound.linalg.ComplexBall;
import blochbound.model.OperatorForm;
import blochbound.model.Scalar;

/** The value of an expression with its dimension. */
sealed interface Value {
  /** Power of time that it carries. */
  Dimension dimension();

  /** The same value with another dimension. */
  Value with(Dimension dimension);

  /** Tells whether it is exactly zero, which agrees with every dimension. */
  boolean isZero();

  /** The negative. */
  Value negate();

  /**
   * A complex number that may depend on the parameters.
   *
   * @param re real part
   * @param im imaginary part
   * @param dimension its dimension
   */
  record Numeric(Scalar re, Scalar im, Dimension dimension) implements Value {
    static final Numeric ONE = real(Scalar.ONE, Dimension.NONE);
    static final Numeric I = new Numeric(Scalar.ZERO, Scalar.ONE, Dimension.NONE);

    static Numeric real(Scalar re, Dimension dimension) {
      return new Numeric(re, Scalar.ZERO, dimension);
    }

    @Override
    public Numeric with(Dimension other) {
      return new Numeric(re, im, other);
    }

    @Override
    public boolean isZero() {
      return re.isZero() && im.isZero();
    }

    boolean isReal() {
      return im.isZero();
    }

    /** Tells whether the imaginary part is zero within its rounding errors. */
    boolean mayBeReal() {
      return im.terms().values().stream().allMatch(c -> c.enclosure().contains(0));
    }

    boolean isConstant() {
      return re.isConstant() && im.isConstant();
    }

    @Override
    public Numeric negate() {
      return new Numeric(re.negate(), im.negate(), dimension);
    }

    Numeric conjugate() {
      return new Numeric(re, im.negate(), dimension);
    }

    Numeric plus(Numeric other) {
      return new Numeric(re.plus(other.re), im.plus(other.im), dimension);
    }

    Numeric times(Numeric other) {
      return new Numeric(
          re.times(other.re).minus(im.times(other.im)),
          re.times(other.im).plus(im.times(other.re)),
          dimension.plus(other.dimension));
    }
  }

  /** A sum of monomials times matrices: an operator or a ket. */
  sealed interface Array extends Value {
    /** The sum, N by N for operators and N by 1 for kets. */
    OperatorForm form();

    /** A value of the same kind. */
    Array of(OperatorForm form, Dimension dimension);

    @Override
    default Array with(Dimension other) {
      return of(form(), other);
    }

    @Override
    default boolean isZero() {
      return form().terms().values().stream().allMatch(Array::isZero);
    }

    private static boolean isZero(ComplexBall matrix) {
      return matrix.radius() == 0 && matrix.mayBeZero();
    }

    @Override
    default Array negate() {
      return of(form().negate(), dimension());
    }

    /** Multiple with a complex number. */
    default Array times(Numeric factor) {
      OperatorForm product = form().times(factor.re());
      return of(
          factor.isReal() ? product : product.plus(form().timesI().times(factor.im())),
          dimension().plus(factor.dimension()));
    }
  }

  /**
   * An operator on all sites.
   *
   * @param form the operator
   * @param dimension its dimension
   */
  record Operator(OperatorForm form, Dimension dimension) implements Array {
    @Override
    public Operator of(OperatorForm other, Dimension otherDimension) {
      return new Operator(other, otherDimension);
    }

    @Override
    public Operator times(Numeric factor) {
      return (Operator) Array.super.times(factor);
    }
  }

  /**
   * A ket of all sites, not normalised.
   *
   * @param form the column of amplitudes
   * @param dimension its dimension
   */
  record Ket(OperatorForm form, Dimension dimension) implements Array {
    @Override
    public Ket of(OperatorForm other, Dimension otherDimension) {
      return new Ket(other, otherDimension);
    }
  }
}
