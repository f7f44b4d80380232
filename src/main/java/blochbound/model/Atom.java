package blochbound.model;

import blochbound.interval.Interval;

/** A factor of a monomial: a parameter, or a function of parameters that is not a polynomial. */
public sealed interface Atom extends Comparable<Atom> {
  /** Text that names the atom uniquely; monomials are ordered by it. */
  String key();

  /** Value at the parameters {@code p} in internal units. */
  double value(double[] p);

  /** Enclosure of the values over parameter ranges. */
  Interval enclosure(Interval[] p);

  /** Tells whether the value depends on parameter {@code index}. */
  boolean dependsOn(int index);

  /** Derivative with respect to parameter {@code index} at the parameters {@code p}. */
  double derivative(double[] p, int index);

  @Override
  default int compareTo(Atom other) {
    // Parameters come first, by position; the rest is rare and compared by its text.
    if (this instanceof ParameterAtom a && other instanceof ParameterAtom b) {
      return Integer.compare(a.index(), b.index());
    }
    boolean first = this instanceof ParameterAtom;
    boolean second = other instanceof ParameterAtom;
    return first == second ? key().compareTo(other.key()) : first ? -1 : 1;
  }

  /**
   * A parameter itself.
   *
   * @param index its position in the case
   */
  record ParameterAtom(int index) implements Atom {
    @Override
    public String key() {
      return "p" + (10_000 + index);
    }

    @Override
    public double value(double[] p) {
      return p[index];
    }

    @Override
    public Interval enclosure(Interval[] p) {
      return p[index];
    }

    @Override
    public boolean dependsOn(int parameter) {
      return parameter == index;
    }

    @Override
    public double derivative(double[] p, int parameter) {
      return parameter == index ? 1 : 0;
    }
  }

  /** The functions that may stand in a coefficient. */
  enum Function {
    /** Square root; its argument must not be negative. */
    SQRT,
    /** Exponential. */
    EXP,
    /** Sine. */
    SIN,
    /** Cosine. */
    COS,
    /** Reciprocal of a sum; its argument must not be zero. */
    RECIPROCAL;

    /** Value at {@code x}. */
    public double value(double x) {
      return switch (this) {
        case SQRT -> Math.sqrt(x);
        case EXP -> Math.exp(x);
        case SIN -> Math.sin(x);
        case COS -> Math.cos(x);
        case RECIPROCAL -> 1 / x;
      };
    }

    /** Derivative at {@code x}. */
    public double derivative(double x) {
      return switch (this) {
        case SQRT -> 0.5 / Math.sqrt(x);
        case EXP -> Math.exp(x);
        case SIN -> Math.cos(x);
        case COS -> -Math.sin(x);
        case RECIPROCAL -> -1 / (x * x);
      };
    }

    /** Enclosure of the values over {@code x}. */
    public Interval enclosure(Interval x) {
      return switch (this) {
        case SQRT -> x.sqrt();
        case EXP -> x.exp();
        case SIN -> x.sin();
        case COS -> x.cos();
        case RECIPROCAL -> Interval.ONE.dividedBy(x);
      };
    }
  }

  /**
   * A function of a scalar.
   *
   * @param function which function
   * @param argument its argument, not a constant
   */
  record FunctionAtom(Function function, Scalar argument) implements Atom {
    @Override
    public String key() {
      return "z" + function + "(" + argument.key() + ")";
    }

    @Override
    public double value(double[] p) {
      return function.value(argument.value(p));
    }

    @Override
    public Interval enclosure(Interval[] p) {
      return function.enclosure(argument.enclosure(p));
    }

    @Override
    public boolean dependsOn(int index) {
      return argument.dependsOn(index);
    }

    @Override
    public double derivative(double[] p, int index) {
      double inner = argument.derivative(p, index);
      return inner == 0 ? 0 : function.derivative(argument.value(p)) * inner;
    }
  }
}
