package blochbound.generator;

import blochbound.interval.Interval;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.Coefficient;
import blochbound.model.Device;
import blochbound.model.Jump;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.ParameterSpace;
import blochbound.model.Scalar;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.UnaryOperator;

/**
 * The GKSL generator in Bloch coordinates, r' = A(p) r + b(p), as a sum of monomials in the
 * parameters times constant sparse matrices.
 *
 * <p>Amplitudes inside jump operators are expanded exactly: V = V_0 + s V_1 gives terms with 1, s
 * and s^2. Each matrix carries a proved bound of its error. Coordinates: r_k = tr(B_k rho) in the
 * basis {@link BlochBasis}; the first one is fixed by the trace.
 */
public final class BlochGenerator {
  /** Degree at which coefficients that are no polynomials are cut on a region. */
  public static final int SMOOTH_DEGREE = 2;

  /** Degree at which polynomial coefficients are cut on a region, too. */
  public static final int LARGEST_DEGREE = 3;

  private final BlochBasis basis;
  private final ParameterSpace space;
  private final List<GeneratorTerm> terms;
  private final int degree;

  private BlochGenerator(BlochBasis basis, ParameterSpace space, List<GeneratorTerm> terms) {
    this.basis = basis;
    this.space = space;
    this.terms = List.copyOf(terms);
    degree =
        terms.stream()
            .map(GeneratorTerm::monomial)
            .mapToInt(
                m ->
                    m.isPolynomial() || m.isOne()
                        ? Math.min(m.degree(), LARGEST_DEGREE)
                        : SMOOTH_DEGREE)
            .max()
            .orElse(0);
  }

  /** Generator of a device, exactly as written. */
  public static BlochGenerator of(Device device) {
    return build(device, UnaryOperator.identity());
  }

  /**
   * Generator with the same stationary states as the device, in the cheapest form to expand: where
   * its degree stays small, multiplied by a common denominator that is proved positive on the ball,
   * so that rational coefficients become polynomials; else as written.
   */
  public static BlochGenerator stationary(Device device) {
    BlochGenerator cleared = build(device, CommonDenominator.of(device)::clear);
    boolean isExact =
        cleared.terms.stream()
            .map(GeneratorTerm::monomial)
            .allMatch(m -> m.isOne() || (m.isPolynomial() && m.degree() <= LARGEST_DEGREE));
    return isExact ? cleared : of(device);
  }

  private static BlochGenerator build(Device device, UnaryOperator<Scalar> clear) {
    BlochBasis basis = BlochBasis.of(device.space());
    TreeMap<Monomial, List<SuperoperatorMatrix.Sandwich>> maps = new TreeMap<>();
    Collector collector = new Collector(maps, clear, basis.levels());
    collector.addHamiltonian(device.hamiltonian());
    device.jumps().forEach(collector::addJump);
    List<GeneratorTerm> terms = new ArrayList<>();
    maps.forEach((monomial, list) -> terms.add(SuperoperatorMatrix.of(basis, monomial, list)));
    return new BlochGenerator(basis, device.parameterSpace(), terms);
  }

  /** Collects maps rho -> L rho R by monomial. */
  private record Collector(
      TreeMap<Monomial, List<SuperoperatorMatrix.Sandwich>> maps,
      UnaryOperator<Scalar> clear,
      int levels) {
    void addHamiltonian(OperatorForm hamiltonian) {
      ComplexBall unit = ComplexBall.exact(ComplexMatrix.identity(levels));
      for (Map.Entry<Monomial, ComplexBall> e : hamiltonian.terms().entrySet()) {
        ComplexBall turned = e.getValue().timesI();
        Scalar coefficient = clear.apply(Scalar.term(e.getKey(), Coefficient.ONE));
        add(coefficient, turned.negate(), unit);
        add(coefficient, unit, turned);
      }
    }

    void addJump(Jump jump) {
      ComplexBall unit = ComplexBall.exact(ComplexMatrix.identity(levels));
      for (Map.Entry<Monomial, ComplexBall> a : jump.operator().terms().entrySet()) {
        for (Map.Entry<Monomial, ComplexBall> b : jump.operator().terms().entrySet()) {
          Scalar coefficient =
              clear.apply(
                  Scalar.term(a.getKey(), Coefficient.ONE)
                      .times(Scalar.term(b.getKey(), Coefficient.ONE))
                      .times(jump.rate()));
          ComplexBall bAdjoint = b.getValue().adjoint();
          ComplexBall half = bAdjoint.times(a.getValue()).times(Interval.of(-0.5));
          add(coefficient, a.getValue(), bAdjoint);
          add(coefficient, half, unit);
          add(coefficient, unit, half);
        }
      }
    }

    private void add(Scalar coefficient, ComplexBall left, ComplexBall right) {
      coefficient
          .terms()
          .forEach(
              (monomial, c) ->
                  maps.computeIfAbsent(monomial, m -> new ArrayList<>())
                      .add(new SuperoperatorMatrix.Sandwich(left.times(c.enclosure()), right)));
    }
  }

  /** The operator basis. */
  public BlochBasis basis() {
    return basis;
  }

  /** The tolerance ball's coordinates. */
  public ParameterSpace space() {
    return space;
  }

  /** The terms in a fixed order. */
  public List<GeneratorTerm> terms() {
    return terms;
  }

  /**
   * Largest degree of a coefficient's expansion on a region: that of the monomial for polynomials
   * up to {@link #LARGEST_DEGREE}, {@link #SMOOTH_DEGREE} for others; at least 1.
   */
  public int degree() {
    return Math.max(1, degree);
  }

  /** Number n = N^2 - 1 of unknowns. */
  public int unknowns() {
    return basis.size() - 1;
  }

  /** Values of the coefficients mu_j at parameters in internal units, rounded. */
  public double[] coefficients(double[] parameters) {
    double[] values = new double[terms.size()];
    for (int j = 0; j < values.length; j++) {
      values[j] = terms.get(j).monomial().value(parameters);
    }
    return values;
  }

  /** Writes A and b for the given coefficients; the arrays are overwritten. */
  public void assemble(double[] coefficients, double[][] a, double[] b) {
    for (double[] row : a) {
      java.util.Arrays.fill(row, 0);
    }
    java.util.Arrays.fill(b, 0);
    // The first coordinate of a state is 1 / sqrt(N).
    double first = 1 / Math.sqrt(basis.levels());
    for (int j = 0; j < coefficients.length; j++) {
      terms.get(j).matrix().addInnerTo(a, coefficients[j]);
      terms.get(j).matrix().addFirstColumnTo(b, coefficients[j] * first);
    }
  }
}
