package blochbound.generator;

import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.SparseMatrix;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Matrix of a sum of maps rho -> Left rho Right in the Bloch basis, with a proved error bound.
 *
 * <p>The sum must map Hermitian matrices to Hermitian ones; only real parts are kept then.
 */
final class SuperoperatorMatrix {
  /** One map rho -> left rho right. */
  record Sandwich(ComplexBall left, ComplexBall right) {}

  private record Line(int[] index, double[] re, double[] im) {}

  private final BlochBasis basis;
  private final int levels;
  private final List<Line[]> leftColumns = new ArrayList<>();
  private final List<Line[]> rightRows = new ArrayList<>();
  private final double[] re;
  private final double[] im;
  private final double[] abs;
  private double radius;

  private SuperoperatorMatrix(BlochBasis basis, List<Sandwich> maps) {
    this.basis = basis;
    this.levels = basis.levels();
    re = new double[basis.size()];
    im = new double[basis.size()];
    abs = new double[basis.size()];
    for (Sandwich map : maps) {
      leftColumns.add(lines(map.left.centre().transpose()));
      rightRows.add(lines(map.right.centre()));
      // |L (x) R - L' (x) R'| in the Frobenius norm, for members L', R' of the balls.
      radius =
          Rounding.addUp(
              radius,
              Rounding.addUp(
                  Rounding.timesUp(map.left.radius(), map.right.normUp()),
                  Rounding.timesUp(map.left.normUp(), map.right.radius())));
    }
  }

  /** The matrix as a term of the given monomial's coefficient and the radius of its error. */
  static GeneratorTerm of(
      BlochBasis basis, blochbound.model.Monomial monomial, List<Sandwich> maps) {
    SuperoperatorMatrix work = new SuperoperatorMatrix(basis, maps);
    SparseMatrix matrix = work.build();
    return new GeneratorTerm(monomial, matrix, work.radius);
  }

  private static Line[] lines(ComplexMatrix matrix) {
    Line[] lines = new Line[matrix.rows()];
    for (int i = 0; i < lines.length; i++) {
      int row = i;
      int[] index =
          java.util.stream.IntStream.range(0, matrix.columns())
              .filter(j -> matrix.re(row, j) != 0 || matrix.im(row, j) != 0)
              .toArray();
      lines[i] =
          new Line(
              index,
              Arrays.stream(index).mapToDouble(j -> matrix.re(row, j)).toArray(),
              Arrays.stream(index).mapToDouble(j -> matrix.im(row, j)).toArray());
    }
    return lines;
  }

  private SparseMatrix build() {
    int size = basis.size();
    SparseMatrix.Builder builder = new SparseMatrix.Builder(size);
    double[] column = new double[size];
    double[] bound = new double[size];
    // Each image entry is a sum of at most N products for every map, each coordinate one of at most
    // N image entries; a complex product takes a few roundings more.
    double gamma = Rounding.gamma((leftColumns.size() + 1L) * levels + 24);
    double dropped = 0;
    double errors = 0;
    for (int l = 0; l < size; l++) {
      image(l);
      project(l, column, bound);
      for (int k = 1; k < size; k++) {
        double error = gamma * bound[k];
        if (Math.abs(column[k]) <= error) {
          // A rounding residue: leave it out and count it as an error.
          dropped += 4 * error * error;
        } else {
          builder.add(k, column[k]);
          errors += error * error;
        }
      }
      builder.endColumn();
    }
    double rounding =
        Rounding.inflate(Math.sqrt(Rounding.inflate(dropped + errors, 2L * size * size)), 4);
    radius = rounding == 0 ? radius : Rounding.addUp(radius, rounding);
    return builder.build();
  }

  /** Sum of all maps applied to the integer basis matrix P_l. */
  private void image(int l) {
    Arrays.fill(re, 0);
    Arrays.fill(im, 0);
    Arrays.fill(abs, 0);
    for (BlochBasis.Entry entry : basis.entriesOf(l)) {
      for (int m = 0; m < leftColumns.size(); m++) {
        addImage(entry, leftColumns.get(m)[entry.row()], rightRows.get(m)[entry.column()]);
      }
    }
  }

  private void addImage(BlochBasis.Entry entry, Line left, Line right) {
    for (int a = 0; a < left.index.length; a++) {
      double leftRe = left.re[a] * entry.re() - left.im[a] * entry.im();
      double leftIm = left.re[a] * entry.im() + left.im[a] * entry.re();
      int row = left.index[a] * levels;
      for (int b = 0; b < right.index.length; b++) {
        double productRe = leftRe * right.re[b] - leftIm * right.im[b];
        double productIm = leftRe * right.im[b] + leftIm * right.re[b];
        int position = row + right.index[b];
        re[position] += productRe;
        im[position] += productIm;
        abs[position] +=
            (Math.abs(leftRe) + Math.abs(leftIm)) * (Math.abs(right.re[b]) + Math.abs(right.im[b]));
      }
    }
  }

  /** Real parts of tr(B_k image) and the same with absolute values. */
  private void project(int l, double[] column, double[] bound) {
    Arrays.fill(column, 0);
    Arrays.fill(bound, 0);
    for (int i = 0; i < levels; i++) {
      for (int j = 0; j < levels; j++) {
        int position = i * levels + j;
        if (abs[position] == 0) {
          continue;
        }
        int[] index = basis.indicesAt(j, i);
        double[] pRe = basis.realsAt(j, i);
        double[] pIm = basis.imaginariesAt(j, i);
        for (int c = 0; c < index.length; c++) {
          column[index[c]] += pRe[c] * re[position] - pIm[c] * im[position];
          bound[index[c]] += (Math.abs(pRe[c]) + Math.abs(pIm[c])) * abs[position];
        }
      }
    }
    for (int k = 0; k < column.length; k++) {
      double scale = 1 / Math.sqrt(basis.squaredNorm(k) * basis.squaredNorm(l));
      column[k] *= scale;
      bound[k] *= scale;
    }
  }
}
