package blochbound.measure;

import blochbound.PreciseScalar;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.Device;
import blochbound.model.Jump;
import blochbound.model.MeasureSpec;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.StateSpec;
import java.math.BigDecimal;
import java.util.List;
import java.util.Map;
import java.util.SortedMap;

/**
 * A device at one point in 50-digit decimals: superoperator straight from the operators, steady
 * state by elimination, measures by their definitions. It shares no numerical code with the
 * program.
 */
public final class PreciseDevice {
  private final int n;
  private final BigDecimal[][] re;
  private final BigDecimal[][] im;

  /** The superoperator of a device with exact operators at parameters in internal units. */
  public PreciseDevice(Device device, List<BigDecimal> parameters) {
    n = device.space().dimension();
    re = zeros(n * n);
    im = zeros(n * n);
    PreciseMatrix unit = PreciseMatrix.of(ComplexMatrix.identity(n));
    PreciseMatrix h = at(device.hamiltonian(), parameters);
    // -i H rho + i rho H
    addSandwich(timesI(h, -1), unit, BigDecimal.ONE);
    addSandwich(unit, timesI(h, 1), BigDecimal.ONE);
    for (Jump jump : device.jumps()) {
      BigDecimal rate = PreciseScalar.value(jump.rate(), parameters);
      PreciseMatrix v = at(jump.operator(), parameters);
      PreciseMatrix vAdjoint = adjoint(v);
      PreciseMatrix square = vAdjoint.times(v);
      addSandwich(v, vAdjoint, rate);
      addSandwich(square, unit, rate.multiply(new BigDecimal("-0.5")));
      addSandwich(unit, square, rate.multiply(new BigDecimal("-0.5")));
    }
  }

  private static BigDecimal[][] zeros(int size) {
    BigDecimal[][] out = new BigDecimal[size][size];
    for (BigDecimal[] row : out) {
      java.util.Arrays.fill(row, BigDecimal.ZERO);
    }
    return out;
  }

  private static PreciseMatrix at(OperatorForm form, List<BigDecimal> p) {
    SortedMap<Monomial, ComplexBall> terms = form.terms();
    PreciseMatrix sum = new PreciseMatrix(form.dimension(), form.dimension());
    for (Map.Entry<Monomial, ComplexBall> e : terms.entrySet()) {
      // Operators of few binary digits are exact in their centre, whatever was bounded for them.
      if (e.getValue().radius() > 1e-12) {
        throw new IllegalArgumentException("the reference needs exact operators");
      }
      BigDecimal factor = PreciseScalar.value(e.getKey(), p);
      PreciseMatrix part = PreciseMatrix.of(e.getValue().centre());
      for (int i = 0; i < sum.rows; i++) {
        for (int j = 0; j < sum.columns; j++) {
          sum.re[i][j] = sum.re[i][j].add(factor.multiply(part.re[i][j]));
          sum.im[i][j] = sum.im[i][j].add(factor.multiply(part.im[i][j]));
        }
      }
    }
    return sum;
  }

  private static PreciseMatrix adjoint(PreciseMatrix m) {
    PreciseMatrix out = new PreciseMatrix(m.columns, m.rows);
    for (int i = 0; i < m.rows; i++) {
      for (int j = 0; j < m.columns; j++) {
        out.re[j][i] = m.re[i][j];
        out.im[j][i] = m.im[i][j].negate();
      }
    }
    return out;
  }

  private static PreciseMatrix timesI(PreciseMatrix m, int sign) {
    PreciseMatrix out = new PreciseMatrix(m.rows, m.columns);
    BigDecimal s = BigDecimal.valueOf(sign);
    for (int i = 0; i < m.rows; i++) {
      for (int j = 0; j < m.columns; j++) {
        out.re[i][j] = m.im[i][j].multiply(s).negate();
        out.im[i][j] = m.re[i][j].multiply(s);
      }
    }
    return out;
  }

  /** Adds factor * (rho -> left rho right), rho row-major. */
  private void addSandwich(PreciseMatrix left, PreciseMatrix right, BigDecimal factor) {
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        for (int k = 0; k < n; k++) {
          for (int l = 0; l < n; l++) {
            BigDecimal a = left.re[i][k];
            BigDecimal b = left.im[i][k];
            BigDecimal c = right.re[l][j];
            BigDecimal d = right.im[l][j];
            if ((a.signum() == 0 && b.signum() == 0) || (c.signum() == 0 && d.signum() == 0)) {
              continue;
            }
            int row = i * n + j;
            int column = k * n + l;
            BigDecimal real = a.multiply(c).subtract(b.multiply(d)).multiply(factor);
            BigDecimal imaginary = a.multiply(d).add(b.multiply(c)).multiply(factor);
            re[row][column] = re[row][column].add(real, PreciseMatrix.DIGITS);
            im[row][column] = im[row][column].add(imaginary, PreciseMatrix.DIGITS);
          }
        }
      }
    }
  }

  /** The image L[rho] of a matrix of doubles, as real parts then imaginary parts, row-major. */
  public BigDecimal[][] image(ComplexMatrix rho) {
    BigDecimal[][] out = {new BigDecimal[n * n], new BigDecimal[n * n]};
    for (int row = 0; row < n * n; row++) {
      BigDecimal sumRe = BigDecimal.ZERO;
      BigDecimal sumIm = BigDecimal.ZERO;
      for (int column = 0; column < n * n; column++) {
        BigDecimal x = new BigDecimal(rho.re(column / n, column % n));
        BigDecimal y = new BigDecimal(rho.im(column / n, column % n));
        sumRe = sumRe.add(re[row][column].multiply(x)).subtract(im[row][column].multiply(y));
        sumIm = sumIm.add(re[row][column].multiply(y)).add(im[row][column].multiply(x));
      }
      out[0][row] = sumRe;
      out[1][row] = sumIm;
    }
    return out;
  }

  /**
   * The steady state, whose first equation is replaced by the trace.
   *
   * @throws ArithmeticException when it is not unique to 50 digits
   */
  public PreciseState steadyState() {
    int size = n * n;
    BigDecimal[][] a = new BigDecimal[size][];
    BigDecimal[][] b = new BigDecimal[size][];
    for (int i = 0; i < size; i++) {
      a[i] = java.util.Arrays.copyOf(re[i], size + 1);
      b[i] = java.util.Arrays.copyOf(im[i], size + 1);
      a[i][size] = BigDecimal.ZERO;
      b[i][size] = BigDecimal.ZERO;
    }
    for (int j = 0; j <= size; j++) {
      a[0][j] = j == size || j % (n + 1) == 0 ? BigDecimal.ONE : BigDecimal.ZERO;
      b[0][j] = BigDecimal.ZERO;
    }
    eliminate(a, b);
    PreciseMatrix rho = new PreciseMatrix(n, n);
    for (int i = size - 1; i >= 0; i--) {
      rho.re[i / n][i % n] = a[i][size];
      rho.im[i / n][i % n] = b[i][size];
    }
    return new PreciseState(rho);
  }

  /** Gauss and Jordan with partial pivoting. */
  private static void eliminate(BigDecimal[][] a, BigDecimal[][] b) {
    int size = a.length;
    for (int k = 0; k < size; k++) {
      int best = k;
      for (int i = k + 1; i < size; i++) {
        if (size(a[i][k], b[i][k]).compareTo(size(a[best][k], b[best][k])) > 0) {
          best = i;
        }
      }
      if (size(a[best][k], b[best][k]).compareTo(new BigDecimal("1e-35")) < 0) {
        throw new ArithmeticException("several stationary states");
      }
      swap(a, k, best);
      swap(b, k, best);
      normalise(a[k], b[k], k);
      for (int i = 0; i < size; i++) {
        if (i != k && (a[i][k].signum() != 0 || b[i][k].signum() != 0)) {
          subtract(a[i], b[i], a[k], b[k], k);
        }
      }
    }
  }

  private static void swap(BigDecimal[][] rows, int i, int j) {
    BigDecimal[] row = rows[i];
    rows[i] = rows[j];
    rows[j] = row;
  }

  private static BigDecimal size(BigDecimal x, BigDecimal y) {
    return x.abs().add(y.abs());
  }

  private static void normalise(BigDecimal[] a, BigDecimal[] b, int k) {
    BigDecimal x = a[k];
    BigDecimal y = b[k];
    BigDecimal square = x.multiply(x).add(y.multiply(y));
    for (int j = k; j < a.length; j++) {
      BigDecimal real = a[j].multiply(x).add(b[j].multiply(y));
      BigDecimal imaginary = b[j].multiply(x).subtract(a[j].multiply(y));
      a[j] = real.divide(square, PreciseMatrix.DIGITS);
      b[j] = imaginary.divide(square, PreciseMatrix.DIGITS);
    }
  }

  private static void subtract(
      BigDecimal[] a, BigDecimal[] b, BigDecimal[] fromA, BigDecimal[] fromB, int k) {
    BigDecimal x = a[k];
    BigDecimal y = b[k];
    for (int j = k; j < a.length; j++) {
      a[j] =
          a[j].subtract(x.multiply(fromA[j]).subtract(y.multiply(fromB[j])), PreciseMatrix.DIGITS);
      b[j] = b[j].subtract(x.multiply(fromB[j]).add(y.multiply(fromA[j])), PreciseMatrix.DIGITS);
    }
  }

  /** A steady state in decimals. */
  public static final class PreciseState {
    private final PreciseMatrix rho;

    private PreciseState(PreciseMatrix rho) {
      this.rho = rho;
    }

    /** Frobenius distance from a matrix of doubles. */
    public BigDecimal distance(Hermitian other) {
      return rho.minus(PreciseMatrix.of(other)).frobeniusNorm();
    }

    /** The same state rounded to doubles. */
    public Hermitian rounded() {
      double[] x = new double[rho.rows * rho.rows];
      double[] y = new double[rho.rows * rho.rows];
      for (int k = 0; k < x.length; k++) {
        x[k] = rho.re[k / rho.rows][k % rho.rows].doubleValue();
        y[k] = rho.im[k / rho.rows][k % rho.rows].doubleValue();
      }
      return Hermitian.part(ComplexMatrix.of(rho.rows, rho.rows, x, y));
    }

    /**
     * A measure by its definition; errs by less than 1e-20.
     *
     * @param spec the measure; a negativity must be that of the first site
     * @param dimensions level counts of the sites
     */
    public BigDecimal value(MeasureSpec spec, int... dimensions) {
      if (spec instanceof MeasureSpec.Mean mean) {
        return rho.inner(PreciseMatrix.of(mean.observable().centre()));
      }
      if (spec instanceof MeasureSpec.Population population) {
        return population(population, dimensions);
      }
      if (spec instanceof MeasureSpec.Fidelity fidelity) {
        return fidelity.state() instanceof StateSpec.Mixed mixed
            ? PreciseMeasures.fidelity(rho, PreciseMatrix.of(mixed.density().centre()))
            : rho.inner(projector(fidelity.state()));
      }
      if (spec instanceof MeasureSpec.TraceDistance distance) {
        PreciseMatrix reference =
            distance.state() instanceof StateSpec.Mixed mixed
                ? PreciseMatrix.of(mixed.density().centre())
                : projector(distance.state());
        return PreciseMeasures.traceDistance(rho, reference);
      }
      if (spec instanceof MeasureSpec.Negativity) {
        return PreciseMeasures.negativity(rho, rho.rows / dimensions[0]);
      }
      if (spec instanceof MeasureSpec.Concurrence) {
        return PreciseMeasures.concurrence(rho);
      }
      return spec instanceof MeasureSpec.Purity
          ? PreciseMeasures.purity(rho)
          : PreciseMeasures.entropy(rho);
    }

    private static PreciseMatrix projector(StateSpec state) {
      PreciseMatrix ket = PreciseMatrix.of(((StateSpec.Pure) state).ket().centre());
      return ket.times(adjoint(ket));
    }

    private BigDecimal population(MeasureSpec.Population spec, int... dimensions) {
      BigDecimal sum = BigDecimal.ZERO;
      int after = 1;
      for (int s = spec.site() + 1; s < dimensions.length; s++) {
        after *= dimensions[s];
      }
      for (int i = 0; i < rho.rows; i++) {
        if (spec.levels().contains(i / after % dimensions[spec.site()])) {
          sum = sum.add(rho.re[i][i]);
        }
      }
      return sum;
    }
  }
}
