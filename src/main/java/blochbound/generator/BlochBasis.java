package blochbound.generator;

import blochbound.interval.Rounding;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.HilbertSpace;
import java.util.ArrayList;
import java.util.List;

/**
 * Hermitian orthonormal product basis B_0 .. B_{N^2-1} of the operators on N levels, tr(B_j B_k) =
 * delta_jk, with B_0 = 1/sqrt(N).
 *
 * <p>Each site has the unit matrix, the symmetric and antisymmetric pairs and the diagonal matrices
 * of the generalised Gell-Mann basis (for two levels: 1, X, Y, Z over sqrt 2). Products keep local
 * operators sparse. Index k is written in the mixed radix d_1^2, d_2^2, .. with the first site most
 * significant. Source: R. A. Bertlmann, P. Krammer, J. Phys. A 41 (2008) 235303, section 3 (from
 * memory).
 *
 * <p>Each B_k is stored as an integer matrix P_k with B_k = P_k / sqrt(n_k), so that sums over a
 * basis of two-level sites are exact up to the entries of the operators.
 */
public final class BlochBasis {
  private final int[] dimensions;
  private final int levels;
  private final double[] squaredNorm;
  private final double[] scale;
  // Entries of the P_k at matrix position (i, j), and entries of each P_k.
  private final int[][] indexAt;
  private final double[][] reAt;
  private final double[][] imAt;
  private final List<List<Entry>> entriesOf;

  /** One entry of a basis matrix P_k. */
  record Entry(int row, int column, double re, double im) {}

  private record LocalEntry(int index, double re, double im) {}

  private BlochBasis(int[] dimensions) {
    this.dimensions = dimensions.clone();
    int product = 1;
    for (int d : dimensions) {
      product *= d;
    }
    levels = product;
    int size = levels * levels;
    squaredNorm = new double[size];
    scale = new double[size];
    indexAt = new int[size][];
    reAt = new double[size][];
    imAt = new double[size][];
    entriesOf = new ArrayList<>();
    for (int k = 0; k < size; k++) {
      squaredNorm[k] = squaredNormOf(k);
      scale[k] = 1 / Math.sqrt(squaredNorm[k]);
      entriesOf.add(new ArrayList<>());
    }
    for (int i = 0; i < levels; i++) {
      for (int j = 0; j < levels; j++) {
        fill(i, j);
      }
    }
  }

  /** Basis for all sites of a device. */
  public static BlochBasis of(HilbertSpace space) {
    return new BlochBasis(space.dimensions());
  }

  /** Basis for sites with the given level counts. */
  public static BlochBasis of(int... dimensions) {
    return new BlochBasis(dimensions);
  }

  private double squaredNormOf(int k) {
    double product = 1;
    int rest = k;
    for (int s = dimensions.length - 1; s >= 0; s--) {
      int d = dimensions[s];
      int local = rest % (d * d);
      rest /= d * d;
      int pairs = d * (d - 1);
      int l = local - pairs;
      product *= local == 0 ? d : local <= pairs ? 2 : l * (l + 1.0);
    }
    return product;
  }

  /** Entries at (a, b) of the one-site matrices: 0 unit, then pairs, then diagonals. */
  private static List<LocalEntry> localEntries(int d, int a, int b) {
    List<LocalEntry> found = new ArrayList<>();
    if (a == b) {
      found.add(new LocalEntry(0, 1, 0));
      for (int l = Math.max(1, a); l < d; l++) {
        found.add(new LocalEntry(d * (d - 1) + l, l == a ? -l : 1, 0));
      }
      return found;
    }
    int low = Math.min(a, b);
    int high = Math.max(a, b);
    int pair = high * (high - 1) / 2 + low;
    found.add(new LocalEntry(1 + 2 * pair, 1, 0));
    found.add(new LocalEntry(2 + 2 * pair, 0, a < b ? -1 : 1));
    return found;
  }

  private void fill(int i, int j) {
    List<LocalEntry> product = List.of(new LocalEntry(0, 1, 0));
    int stride = levels;
    for (int d : dimensions) {
      stride /= d;
      List<LocalEntry> next = new ArrayList<>();
      for (LocalEntry x : product) {
        for (LocalEntry y : localEntries(d, i / stride % d, j / stride % d)) {
          next.add(
              new LocalEntry(
                  x.index * d * d + y.index, x.re * y.re - x.im * y.im, x.re * y.im + x.im * y.re));
        }
      }
      product = next;
    }
    int position = i * levels + j;
    int count = product.size();
    indexAt[position] = new int[count];
    reAt[position] = new double[count];
    imAt[position] = new double[count];
    for (int c = 0; c < count; c++) {
      LocalEntry e = product.get(c);
      indexAt[position][c] = e.index;
      reAt[position][c] = e.re;
      imAt[position][c] = e.im;
      entriesOf.get(e.index).add(new Entry(i, j, e.re, e.im));
    }
  }

  /** Number N of levels. */
  public int levels() {
    return levels;
  }

  /** Number N^2 of basis matrices. */
  public int size() {
    return levels * levels;
  }

  /** Level counts of the sites. */
  public int[] dimensions() {
    return dimensions.clone();
  }

  /** Entries of the integer matrix P_k. */
  List<Entry> entriesOf(int k) {
    return entriesOf.get(k);
  }

  /** Squared Frobenius norm n_k of P_k. */
  double squaredNorm(int k) {
    return squaredNorm[k];
  }

  /** Indices k with an entry of P_k at (row, column). */
  int[] indicesAt(int row, int column) {
    return indexAt[row * levels + column];
  }

  /** Real parts that belong to {@link #indicesAt}. */
  double[] realsAt(int row, int column) {
    return reAt[row * levels + column];
  }

  /** Imaginary parts that belong to {@link #indicesAt}. */
  double[] imaginariesAt(int row, int column) {
    return imAt[row * levels + column];
  }

  /** Writes r_k = tr(B_k M) of a Hermitian matrix to {@code out}. */
  public void coordinates(Hermitian matrix, double[] out) {
    java.util.Arrays.fill(out, 0);
    for (int i = 0; i < levels; i++) {
      for (int j = 0; j < levels; j++) {
        double re = matrix.re(i, j);
        double im = matrix.im(i, j);
        if (re == 0 && im == 0) {
          continue;
        }
        int position = j * levels + i;
        int[] index = indexAt[position];
        for (int c = 0; c < index.length; c++) {
          out[index[c]] += re * reAt[position][c] - im * imAt[position][c];
        }
      }
    }
    for (int k = 0; k < out.length; k++) {
      out[k] *= scale[k];
    }
  }

  /** Coordinates r_k = tr(B_k M) of a Hermitian matrix. */
  public double[] coordinates(Hermitian matrix) {
    double[] out = new double[size()];
    coordinates(matrix, out);
    return out;
  }

  /**
   * Writes the matrix sum_k r_k B_k as flat row-major real and imaginary parts; {@code scaled} is
   * overwritten scratch of length N^2. Hermitian to the last bit.
   */
  public void matrix(double[] r, double[] scaled, double[] re, double[] im) {
    for (int k = 0; k < r.length; k++) {
      scaled[k] = r[k] * scale[k];
    }
    for (int i = 0; i < levels; i++) {
      for (int j = i; j < levels; j++) {
        int position = i * levels + j;
        int[] index = indexAt[position];
        double[] pRe = reAt[position];
        double[] pIm = imAt[position];
        double sumRe = 0;
        double sumIm = 0;
        for (int c = 0; c < index.length; c++) {
          sumRe += scaled[index[c]] * pRe[c];
          sumIm += scaled[index[c]] * pIm[c];
        }
        re[position] = sumRe;
        im[position] = sumIm;
        re[j * levels + i] = sumRe;
        im[j * levels + i] = -sumIm;
      }
    }
  }

  /** The Hermitian matrix sum_k r_k B_k. */
  public Hermitian matrix(double[] r) {
    double[] re = new double[size()];
    double[] im = new double[size()];
    matrix(r, new double[size()], re, im);
    return new Hermitian(ComplexMatrix.of(levels, levels, re, im));
  }

  /**
   * Relative Frobenius error of {@link #coordinates} and {@link #matrix}: the result differs from
   * the exact one by at most this number times the norm of the argument.
   *
   * <p>Every entry is a sum of at most N products with basis entries; the matrix of absolute values
   * of the orthogonal transform has row and column sums of at most N, so its norm is at most N.
   */
  public double transformError() {
    return Rounding.timesUp(Rounding.gamma(levels + 8L), levels);
  }

  /** Position in this basis of each basis matrix of some sites, the rest being unit matrices. */
  public int[] embedding(List<Integer> sites) {
    int[] embedded = {0};
    for (int s = 0; s < dimensions.length; s++) {
      int d2 = dimensions[s] * dimensions[s];
      int choices = sites.contains(s) ? d2 : 1;
      int[] next = new int[embedded.length * choices];
      for (int a = 0; a < embedded.length; a++) {
        for (int b = 0; b < choices; b++) {
          next[a * choices + b] = embedded[a] * d2 + b;
        }
      }
      embedded = next;
    }
    return embedded;
  }

  /** Product of the level counts of the sites that are not listed. */
  public int tracedLevels(List<Integer> sites) {
    int product = 1;
    for (int s = 0; s < dimensions.length; s++) {
      product *= sites.contains(s) ? 1 : dimensions[s];
    }
    return product;
  }

  /** Basis of the reduced space of some sites, in ascending order. */
  public BlochBasis reduced(List<Integer> sites) {
    return new BlochBasis(sites.stream().sorted().mapToInt(s -> dimensions[s]).toArray());
  }
}
