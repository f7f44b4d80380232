package blochbound.sample;

import static blochbound.sample.LaneArithmetic.LANES;

import blochbound.sample.LaneProgram.Assembly;
import java.util.Arrays;

/**
 * Assembles, factors and solves A x = -b for all lanes at once by a fixed {@link LaneProgram}, and
 * measures for each lane how far the result can be trusted.
 *
 * <p>No pivoting happens here, so a lane may be solved badly or not at all: {@link #growth}, {@link
 * #pivotSpread} and {@link #residual} tell. Lower factor entries are stored with their sign
 * reversed, so that all sums are additions.
 */
final class LaneKernel {
  private final LaneProgram program;
  private final int n;
  private final double[][] assembled;
  private final double[][] factor;
  private final boolean[] isShared;
  private final double[][] minusInverse;
  private final double[][] x;
  private final double[] zero = new double[LANES];
  private final double[] residual = new double[LANES];
  private final double[] growthSquares = new double[LANES];
  private final double[] pivotSquares = new double[LANES];
  private final double[] inverseSquares = new double[LANES];
  private final double[] residualSquares = new double[LANES];
  private final LaneArithmetic sum;

  LaneKernel(LaneProgram program) {
    this.program = program;
    n = program.size();
    assembled = new double[program.assemblies().size()][LANES];
    factor = new double[program.entries()][];
    isShared = new boolean[program.entries()];
    minusInverse = new double[n][LANES];
    x = new double[n][LANES];
    sum = new LaneArithmetic(n + 1);
    placeFactors();
  }

  /** An upper entry that elimination does not touch is the assembled entry itself. */
  private void placeFactors() {
    for (int i = 0; i < n; i++) {
      for (int e = program.rowStart(i); e < program.rowStart(i + 1); e++) {
        boolean isUntouched = program.productStart(e) == program.productStart(e + 1);
        int source = program.assemblyAt(i, program.column(e));
        isShared[e] = isUntouched && source >= 0 && program.column(e) > i;
        factor[e] = isShared[e] ? assembled[source] : new double[LANES];
      }
    }
  }

  /** Solves for coefficients given as lanes for each generator term. */
  void solve(double[][] coefficients) {
    for (int q = 0; q < assembled.length; q++) {
      assemble(assembled[q], program.assemblies().get(q), coefficients);
    }
    Arrays.fill(growthSquares, 0);
    Arrays.fill(pivotSquares, 0);
    Arrays.fill(inverseSquares, 0);
    Arrays.fill(residualSquares, 0);
    for (int i = 0; i < n; i++) {
      factorRow(i);
      eliminateRightSide(i);
    }
    for (int i = n - 1; i >= 0; i--) {
      substituteBack(i);
    }
    for (int i = 0; i < n; i++) {
      addResidual(i);
    }
  }

  private static void assemble(double[] target, Assembly assembly, double[][] coefficients) {
    Arrays.fill(target, assembly.constant());
    int[] terms = assembly.terms();
    int t = 0;
    for (; t + 3 < terms.length; t += 4) {
      addFourTerms(target, assembly, coefficients, t);
    }
    for (; t < terms.length; t++) {
      LaneArithmetic.addMultiple(target, coefficients[terms[t]], assembly.factors()[t]);
    }
  }

  private static void addFourTerms(
      double[] target, Assembly assembly, double[][] coefficients, int t) {
    double[] m0 = coefficients[assembly.terms()[t]];
    double[] m1 = coefficients[assembly.terms()[t + 1]];
    double[] m2 = coefficients[assembly.terms()[t + 2]];
    double[] m3 = coefficients[assembly.terms()[t + 3]];
    double c0 = assembly.factors()[t];
    double c1 = assembly.factors()[t + 1];
    double c2 = assembly.factors()[t + 2];
    double c3 = assembly.factors()[t + 3];
    for (int l = 0; l < LANES; l++) {
      target[l] += (c0 * m0[l] + c1 * m1[l]) + (c2 * m2[l] + c3 * m3[l]);
    }
  }

  private void factorRow(int i) {
    int[] left = program.left();
    int[] right = program.right();
    for (int e = program.rowStart(i); e < program.rowStart(i + 1); e++) {
      if (isShared[e]) {
        continue;
      }
      sum.clear();
      for (int q = program.productStart(e); q < program.productStart(e + 1); q++) {
        sum.add(factor[left[q]], factor[right[q]]);
      }
      int j = program.column(e);
      sum.sumInto(factor[e], source(i, j));
      if (j < i) {
        scale(factor[e], minusInverse[j]);
      } else if (j == i) {
        invert(factor[e], minusInverse[i]);
      }
    }
  }

  /** The column b is eliminated as one more column; x holds it until back substitution. */
  private void eliminateRightSide(int i) {
    sum.clear();
    for (int e = program.rowStart(i); program.column(e) < i; e++) {
      sum.add(factor[e], x[program.column(e)]);
    }
    sum.sumInto(x[i], source(i, n));
  }

  private double[] source(int row, int column) {
    int position = program.assemblyAt(row, column);
    return position < 0 ? zero : assembled[position];
  }

  private void scale(double[] target, double[] minusInverse) {
    LaneArithmetic.multiply(target, minusInverse);
    LaneArithmetic.addProduct(growthSquares, target, target);
  }

  private void invert(double[] pivot, double[] minusInverse) {
    for (int l = 0; l < LANES; l++) {
      minusInverse[l] = -1 / pivot[l];
    }
    LaneArithmetic.addProduct(pivotSquares, pivot, pivot);
    LaneArithmetic.addProduct(inverseSquares, minusInverse, minusInverse);
  }

  private void substituteBack(int i) {
    sum.clear();
    for (int e = program.rowStart(i + 1) - 1; program.column(e) > i; e--) {
      sum.add(factor[e], x[program.column(e)]);
    }
    sum.sumInto(x[i], x[i]);
    LaneArithmetic.multiply(x[i], minusInverse[i]);
  }

  private void addResidual(int i) {
    sum.clear();
    for (int e = program.rowStart(i); e < program.rowStart(i + 1); e++) {
      int position = program.assemblyAt(i, program.column(e));
      if (position >= 0) {
        sum.add(assembled[position], x[program.column(e)]);
      }
    }
    sum.sumInto(residual, source(i, n));
    LaneArithmetic.addProduct(residualSquares, residual, residual);
  }

  /** Lanes of the unknown that belongs to a pivot; not a copy. */
  double[] unknown(int pivot) {
    return x[pivot];
  }

  /** Root of the sum of the squared multipliers of a lane: at least the largest multiplier. */
  double growth(int lane) {
    return Math.sqrt(growthSquares[lane]);
  }

  /**
   * At least the ratio of the largest to the smallest pivot of a lane, to rounding; infinite or NaN
   * where a pivot is zero.
   */
  double pivotSpread(int lane) {
    return Math.sqrt(pivotSquares[lane]) * Math.sqrt(inverseSquares[lane]);
  }

  /** Euclidean norm of A x + b of a lane, rounded. */
  double residual(int lane) {
    return Math.sqrt(residualSquares[lane]);
  }
}
