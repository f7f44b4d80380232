package blochbound.bound;

import blochbound.generator.BlochGenerator;
import blochbound.generator.GeneratorTerm;
import blochbound.generator.MultiIndexTable;
import blochbound.generator.RegionExpansion;
import blochbound.generator.SteadyStateSolver;
import blochbound.generator.TaylorModel;
import blochbound.interval.Rounding;
import blochbound.linalg.LuDecomposition;
import blochbound.model.Region;
import java.time.Duration;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Deque;
import java.util.List;

/**
 * Proof that A(p) is regular on the whole ball, so that every device has exactly one steady state.
 *
 * <p>On a region with A(x) = sum_b x^b A_b and an approximate inverse R of A_0, let D = |1 - R A_0|
 * + sum_{b != 0} |R A_b|, entry by entry, plus error bounds. A vector v &gt; 0 with D v &lt; v
 * shows that the spectral radius of D is below 1, so that R A(x) is regular for all x in [-1, 1]^m
 * (H. Beeck, Computing 10 (1972) 231; A. Neumaier, <i>Interval Methods for Systems of
 * Equations</i>, 1990, section 4.1; both from memory). v is a power iterate, scaled like the Perron
 * vector. Regions where this fails are halved.
 */
public final class UniquenessProof {
  private static final int ITERATIONS = 12;
  private static final double SMALLEST_HALF_WIDTH = 1e-3;

  private final BlochGenerator generator;
  private final MultiIndexTable table;
  private final LuDecomposition lu;
  private final SteadyStateSolver solver;
  private final BallConstraint ball;
  private final int n;

  private UniquenessProof(BlochGenerator generator) {
    this.generator = generator;
    table = MultiIndexTable.of(generator.space().coordinates(), generator.degree());
    n = generator.unknowns();
    lu = new LuDecomposition(n);
    solver = new SteadyStateSolver(generator);
    ball = new BallConstraint(generator.space().norm());
  }

  /** Outcome of the proof. */
  public sealed interface Outcome {
    /** A(p) is regular on the whole ball. */
    record Unique() implements Outcome {}

    /**
     * No proof within the budget, and no singular point found.
     *
     * @param near centre of a region where the proof failed
     */
    record Unproved(double[] near) implements Outcome {}

    /**
     * A(p) is singular to rounding at a point of the ball.
     *
     * @param point its coordinates
     */
    record Singular(double[] point) implements Outcome {}
  }

  /**
   * Tries to prove uniqueness.
   *
   * @param generator the generator
   * @param regions most regions
   * @param time most time
   */
  public static Outcome run(BlochGenerator generator, long regions, Duration time) {
    return new UniquenessProof(generator).run(regions, time);
  }

  private Outcome run(long regions, Duration time) {
    long end = System.nanoTime() + time.toNanos();
    int m = generator.space().coordinates();
    for (double[] point : suspects(Region.whole(m))) {
      if (isSingular(point)) {
        return new Outcome.Singular(ball.project(point));
      }
    }
    Deque<Region> open = new ArrayDeque<>(List.of(Region.whole(m)));
    for (long count = 0; !open.isEmpty(); count++) {
      Region region = open.pop();
      int split = provedOrSplit(region);
      if (split == PROVED) {
        continue;
      }
      boolean isSmall = split < 0 || region.halfWidth(split) < SMALLEST_HALF_WIDTH;
      if (isSmall || count >= regions || System.nanoTime() > end) {
        for (double[] point : suspects(region)) {
          if (isSingular(point)) {
            return new Outcome.Singular(ball.project(point));
          }
        }
        return new Outcome.Unproved(ball.project(region.centre()));
      }
      ball.tighten(region.half(split, 1)).ifPresent(open::push);
      ball.tighten(region.half(split, -1)).ifPresent(open::push);
    }
    return new Outcome.Unique();
  }

  /** Centre, face centres and the two extreme vertices of a region. */
  private static List<double[]> suspects(Region region) {
    int m = region.coordinates();
    List<double[]> points = new ArrayList<>(List.of(region.centre()));
    for (int side = -1; side <= 1; side += 2) {
      double[] x = new double[m];
      Arrays.fill(x, side);
      points.add(region.at(x));
      for (int j = 0; j < m; j++) {
        double[] face = new double[m];
        face[j] = side;
        points.add(region.at(face));
      }
    }
    return points;
  }

  private boolean isSingular(double[] point) {
    return !solver.solve(generator.space().parametersAt(ball.project(point)));
  }

  private static final int PROVED = -2;

  /** {@link #PROVED}, or the coordinate to split, or -1 when there is none. */
  private int provedOrSplit(Region region) {
    RegionExpansion expansion = RegionExpansion.over(generator, region, table);
    double[] centre = expansion.atCentre();
    double[][] a = new double[n][n];
    generator.assemble(centre, a, new double[n]);
    for (int i = 0; i < n; i++) {
      System.arraycopy(a[i], 0, lu.rows()[i], 0, n);
    }
    lu.factor();
    double[] weight = new double[region.coordinates()];
    if (!lu.isRegular()) {
      return widest(region, weight);
    }
    double[][] inverse = lu.inverse();
    double[][] d = absoluteDefect(inverse, a);
    double error = addDeviations(expansion, inverse, d, weight);
    return isContraction(d, error) ? PROVED : widest(region, weight);
  }

  private static int widest(Region region, double[] weight) {
    int split = -1;
    for (int j = 0; j < weight.length; j++) {
      double gain = weight[j] + 1e-9 * region.halfWidth(j);
      if (region.halfWidth(j) > 0
          && (split < 0 || gain > weight[split] + 1e-9 * region.halfWidth(split))) {
        split = j;
      }
    }
    return split;
  }

  /** The matrix |1 - R A_0|, rounded; its rounding is part of the error of the deviations. */
  private double[][] absoluteDefect(double[][] inverse, double[][] a) {
    double[][] d = new double[n][n];
    for (int i = 0; i < n; i++) {
      for (int k = 0; k < n; k++) {
        double factor = inverse[i][k];
        double[] from = a[k];
        double[] to = d[i];
        for (int j = 0; j < n; j++) {
          to[j] += factor * from[j];
        }
      }
      d[i][i] -= 1;
      for (int j = 0; j < n; j++) {
        d[i][j] = Math.abs(d[i][j]);
      }
    }
    return d;
  }

  /**
   * Adds |R A_b| for all b other than 0 and returns a Frobenius bound of everything left out:
   * rounding of all products with R, errors of the matrices and remainders of the coefficients.
   */
  private double addDeviations(
      RegionExpansion expansion, double[][] inverse, double[][] d, double[] weight) {
    double[][][] byIndex = new double[table.count()][][];
    double size = 0;
    double error = 0;
    for (int j = 0; j < generator.terms().size(); j++) {
      GeneratorTerm term = generator.terms().get(j);
      TaylorModel coefficient = expansion.coefficient(j);
      double norm = term.matrix().frobeniusUp();
      size += coefficient.sumUp() * norm;
      error +=
          coefficient.sumUp() * term.radius() + coefficient.remainder() * (norm + term.radius());
      for (int k = 0; k < coefficient.size(); k++) {
        if (coefficient.index(k) != 0) {
          addTo(byIndex, coefficient.index(k), term, coefficient.coefficient(k));
        }
      }
    }
    for (int b = 1; b < byIndex.length; b++) {
      if (byIndex[b] != null) {
        addAbsolute(inverse, byIndex[b], d, weight, table.factors(b));
      }
    }
    double inverseNorm = 0;
    for (double[] row : inverse) {
      inverseNorm += Rounding.timesUp(Rounding.normUp(row), Rounding.normUp(row));
    }
    inverseNorm = Rounding.inflate(Math.sqrt(Rounding.inflate(inverseNorm, 2L * n)), 4);
    long operations = n + 2L * generator.terms().size() + table.count() + 8;
    double rounding =
        Rounding.gamma(operations) * (inverseNorm * Rounding.inflate(size, operations) + n);
    return Rounding.inflate(rounding + inverseNorm * error, operations);
  }

  private void addTo(double[][][] byIndex, int index, GeneratorTerm term, double factor) {
    if (byIndex[index] == null) {
      byIndex[index] = new double[n][n];
    }
    term.matrix().addInnerTo(byIndex[index], factor);
  }

  private void addAbsolute(
      double[][] inverse, double[][] part, double[][] d, double[] weight, int[] factors) {
    double[] row = new double[n];
    double sum = 0;
    for (int i = 0; i < n; i++) {
      Arrays.fill(row, 0);
      for (int k = 0; k < n; k++) {
        double factor = inverse[i][k];
        double[] from = part[k];
        for (int j = 0; j < n; j++) {
          row[j] += factor * from[j];
        }
      }
      for (int j = 0; j < n; j++) {
        d[i][j] += Math.abs(row[j]);
        sum += row[j] * row[j];
      }
    }
    for (int variable : factors) {
      weight[variable] += Math.sqrt(sum);
    }
  }

  /** Whether D v + error |v| is below v for some v &gt; 0. */
  private boolean isContraction(double[][] d, double error) {
    double[] v = new double[n];
    Arrays.fill(v, 1);
    double[] next = new double[n];
    for (int iteration = 0; iteration < ITERATIONS; iteration++) {
      double norm = Rounding.normUp(v);
      boolean contracts = true;
      double most = 0;
      for (int i = 0; i < n; i++) {
        double sum = 0;
        for (int j = 0; j < n; j++) {
          sum += d[i][j] * v[j];
        }
        next[i] = sum;
        most = Math.max(most, sum);
        contracts &= Rounding.inflate(sum + error * norm, n + 4L) < v[i];
      }
      if (contracts) {
        return true;
      }
      for (int i = 0; i < n; i++) {
        // A share of the old vector keeps every entry positive.
        v[i] = most == 0 ? 1 : 0.9 * next[i] / most + 0.1 * v[i];
      }
    }
    return false;
  }
}
