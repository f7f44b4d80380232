package blochbound.bound;

import blochbound.generator.BlochBasis;
import blochbound.generator.BlochGenerator;
import blochbound.generator.GeneratorTerm;
import blochbound.generator.MultiIndexTable;
import blochbound.generator.RegionExpansion;
import blochbound.generator.SteadyStateSolver;
import blochbound.generator.TaylorModel;
import blochbound.interval.Rounding;
import blochbound.linalg.LuDecomposition;
import blochbound.linalg.SparseMatrix;
import java.util.Arrays;
import java.util.Objects;
import org.jspecify.annotations.Nullable;

/**
 * The polynomial trial observable on one region and the certified size of what it leaves over.
 *
 * <p>For Y(x) = sum_{|a| &lt;= K} x^a Y_a and phi(x) = sum phi_a x^a, every stationary state rho of
 * L(x) has tr(W rho) = phi(x) + tr(S(x) rho) with S = W + L^+[Y] - phi 1
 * (notes/dual-observable.md), hence tr(W rho) &gt;= phi(x) - sum_a kappa_a - error on x in [-1,
 * 1]^m. The Y_a solve Lambda_0^+ Y_a = phi_a 1 - V_a approximately; whatever is left appears in
 * S_a, all of which are counted.
 *
 * <p>All matrices are vectors of Bloch coordinates of length N^2. Workspace for one thread; no
 * allocation for a multi-index.
 */
final class DualKernel {
  /** Inverses pay up to this size; beyond it each right side is solved by substitution. */
  private static final int LARGEST_INVERSE = 40;

  private final BlochGenerator generator;
  private final int size;
  private final double rootLevels;
  private final LuDecomposition lu;
  private final double[] offset;
  private final double[] y;
  private final double[] image;
  private final double[] right;
  private final double[] solution;
  private final double[] scratch;
  private final double[] frobenius;
  private double[][] inverse = {};
  private @Nullable RegionExpansion expansion;
  private double[][] s = {};
  private double[] phi = {};
  private int solved;
  private int reached;
  private double sumOfY;
  private double[] sumOfImages;
  private double shift;

  DualKernel(BlochGenerator generator) {
    this.generator = generator;
    size = generator.basis().size();
    rootLevels = Math.sqrt(generator.basis().levels());
    lu = new LuDecomposition(size - 1);
    offset = new double[size - 1];
    y = new double[size];
    image = new double[size];
    right = new double[size - 1];
    solution = new double[size - 1];
    scratch = new double[size - 1];
    frobenius = generator.terms().stream().mapToDouble(t -> t.matrix().frobeniusUp()).toArray();
    sumOfImages = new double[frobenius.length];
  }

  /**
   * Factors the generator at the centre of a region, shifted when it is singular to rounding: (A -
   * s) stands for the resolvent, whose residual s Y_a is counted like any other.
   */
  void prepare(RegionExpansion region) {
    expansion = region;
    double[] centre = region.atCentre();
    generator.assemble(centre, lu.rows(), offset);
    for (int i = 0; i < offset.length; i++) {
      offset[i] *= rootLevels;
    }
    shift = 0;
    lu.factor();
    if (lu.smallestRelativePivot() < SteadyStateSolver.SINGULAR_PIVOT) {
      prepareShifted(centre);
    }
    inverse = size - 1 <= LARGEST_INVERSE ? lu.inverse() : new double[0][];
  }

  private RegionExpansion expansion() {
    return Objects.requireNonNull(expansion, "a region is prepared first");
  }

  private void prepareShifted(double[] centre) {
    generator.assemble(centre, lu.rows(), scratch);
    double most = 0;
    for (double[] row : lu.rows()) {
      for (double entry : row) {
        most = Math.max(most, Math.abs(entry));
      }
    }
    shift = most == 0 ? 1 : 1e-7 * most;
    for (int i = 0; i < size - 1; i++) {
      lu.rows()[i][i] -= shift;
    }
    lu.factor();
  }

  /** Tells whether the generator at the centre was regular, so that its steady state is unique. */
  boolean isRegular() {
    return shift == 0 && lu.isRegular();
  }

  /** Writes the Bloch coordinates of the steady state at the centre, an estimate. */
  void steadyState(double[] state) {
    state[0] = 1 / rootLevels;
    for (int i = 0; i < offset.length; i++) {
      right[i] = -offset[i] / rootLevels;
    }
    lu.solve(right, solution);
    System.arraycopy(solution, 0, state, 1, size - 1);
  }

  /**
   * Builds Y, phi and all S_a for a witness.
   *
   * @param witness Bloch coordinates of W
   * @param table multi-indices up to order K + degree of the generator
   * @param order K
   */
  void run(double[] witness, MultiIndexTable table, int order) {
    reserve(table.count());
    solved = table.firstOfDegree(order + 1);
    sumOfY = 0;
    Arrays.fill(sumOfImages, 0);
    System.arraycopy(witness, 0, s[0], 0, size);
    for (int a = 0; a < solved; a++) {
      solve(s[a]);
      double sum = s[a][0];
      for (int i = 0; i < offset.length; i++) {
        sum += offset[i] * solution[i];
      }
      phi[a] = sum / rootLevels;
      s[a][0] -= phi[a] * rootLevels;
      scatter(a, table);
    }
  }

  private void reserve(int count) {
    if (s.length < count) {
      s = new double[count][size];
      phi = new double[count];
    } else {
      for (int a = 0; a < count; a++) {
        Arrays.fill(s[a], 0);
      }
    }
    reached = count;
  }

  /** Solves (A - s)' y = -v without the first coordinate. */
  private void solve(double[] v) {
    if (inverse.length == 0) {
      for (int i = 0; i < right.length; i++) {
        right[i] = -v[i + 1];
      }
      lu.solveTransposed(right, solution, scratch);
      return;
    }
    Arrays.fill(solution, 0);
    for (int i = 0; i < inverse.length; i++) {
      double factor = v[i + 1];
      if (factor != 0) {
        subtract(solution, inverse[i], factor);
      }
    }
  }

  private static void subtract(double[] target, double[] row, double factor) {
    for (int j = 0; j < target.length; j++) {
      target[j] -= factor * row[j];
    }
  }

  /** Adds L^+[Y_a] to all S_{a+b}. */
  private void scatter(int a, MultiIndexTable table) {
    y[0] = 0;
    System.arraycopy(solution, 0, y, 1, size - 1);
    sumOfY += norm(y);
    for (int j = 0; j < frobenius.length; j++) {
      SparseMatrix matrix = generator.terms().get(j).matrix();
      TaylorModel coefficient = expansion().coefficient(j);
      boolean needsNorm = coefficient.remainder() > 1e-11 * Math.abs(coefficient.constantTerm());
      if (!needsNorm && coefficient.size() <= 2 && matrix.entries() <= 2 * size) {
        for (int k = 0; k < coefficient.size(); k++) {
          double[] target = s[table.sum(a, coefficient.index(k))];
          matrix.addTransposeTimes(coefficient.coefficient(k), y, target);
        }
        continue;
      }
      matrix.transposeTimes(y, image);
      for (int k = 0; k < coefficient.size(); k++) {
        add(s[table.sum(a, coefficient.index(k))], image, coefficient.coefficient(k));
      }
      sumOfImages[j] += needsNorm ? norm(image) : 0;
    }
  }

  private static void add(double[] target, double[] source, double factor) {
    for (int i = 0; i < target.length; i++) {
      target[i] += factor * source[i];
    }
  }

  private static double norm(double[] vector) {
    double sum = 0;
    for (double x : vector) {
      sum += x * x;
    }
    return Math.sqrt(sum);
  }

  /** Coefficients of phi for |a| at most K; not a copy. */
  double[] phi() {
    return phi;
  }

  /** Number of multi-indices up to order K. */
  int solved() {
    return solved;
  }

  /** Number of multi-indices with an S_a. */
  int reached() {
    return reached;
  }

  /** Bloch coordinates of S_a; not a copy. */
  double[] remainder(int a) {
    return s[a];
  }

  /** Bloch basis of the generator. */
  BlochBasis basis() {
    return generator.basis();
  }

  /**
   * Certified bound of |sum_a x^a (S_a - computed S_a)| in the Frobenius norm over x in [-1, 1]^m.
   *
   * <pre>
   * rounding of the sums    gamma_q (sum_j |mu_j| |M_j| sum_a |Y_a| + |W| + sqrt(N) sum |phi_a|)
   * remainder of mu_j       sum_j r_j min(|M_j| sum_a |Y_a|, sum_a |M_j^+ Y_a|) (with its rounding)
   * error of M_j            sum_j (|mu_j| + r_j) e_j sum_a |Y_a|
   * </pre>
   *
   * <p>q counts every product and addition that may go into one entry of one S_a, and a few
   * scalings.
   */
  double errorUp(double[] witness) {
    double trial = Rounding.inflate(sumOfY, size + solved + 8L);
    double rounding = 0;
    double other = 0;
    long operations = 12;
    for (int j = 0; j < frobenius.length; j++) {
      GeneratorTerm term = generator.terms().get(j);
      TaylorModel coefficient = expansion().coefficient(j);
      double sum = coefficient.sumUp();
      double rest = coefficient.remainder();
      operations += coefficient.size() * (term.matrix().longestColumn() + 2L);
      rounding += sum * frobenius[j] * trial;
      double gamma = Rounding.gamma(term.matrix().longestColumn() + 2L);
      double most = frobenius[j] * trial;
      if (sumOfImages[j] > 0) {
        most = Math.min(most, Rounding.inflate(sumOfImages[j], size + solved + 8L) + gamma * most);
      }
      other += rest == 0 ? 0 : rest * most;
      other += (sum + rest) * term.radius() * trial;
    }
    double phiSum = 0;
    for (int a = 0; a < solved; a++) {
      phiSum += Math.abs(phi[a]);
    }
    rounding += norm(witness) + rootLevels * phiSum;
    return Rounding.inflate(
        Rounding.gamma(operations) * rounding + other, 8L * frobenius.length + solved + size);
  }

  /** Bound of the sum of the Frobenius norms of all Y_a. */
  double trialNormUp() {
    return Rounding.inflate(sumOfY, size + solved + 8L);
  }
}
