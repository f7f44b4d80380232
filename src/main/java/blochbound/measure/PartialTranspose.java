package blochbound.measure;

import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;

/** The partial transpose over some sites of a product space: a permutation of entries, exact. */
final class PartialTranspose {
  private final int size;
  private final int[] source;

  /**
   * Prepares the permutation.
   *
   * @param dimensions level counts of the sites, most significant first
   * @param transposed whether each site is transposed
   */
  PartialTranspose(int[] dimensions, boolean[] transposed) {
    int n = 1;
    for (int dimension : dimensions) {
      n *= dimension;
    }
    this.size = n;
    this.source = new int[n * n];
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        source[i * n + j] = swapped(i, j, dimensions, transposed);
      }
    }
  }

  /** Index of the entry (i, j) after the digits of the transposed sites are exchanged. */
  private int swapped(int i, int j, int[] dimensions, boolean[] transposed) {
    int row = 0;
    int column = 0;
    int weight = 1;
    int restI = i;
    int restJ = j;
    for (int k = dimensions.length - 1; k >= 0; k--) {
      int digitI = restI % dimensions[k];
      int digitJ = restJ % dimensions[k];
      row += weight * (transposed[k] ? digitJ : digitI);
      column += weight * (transposed[k] ? digitI : digitJ);
      weight *= dimensions[k];
      restI /= dimensions[k];
      restJ /= dimensions[k];
    }
    return row * size + column;
  }

  /** The partial transpose. */
  Hermitian of(Hermitian operator) {
    double[] re = operator.matrix().realParts();
    double[] im = operator.matrix().imaginaryParts();
    double[] outRe = new double[re.length];
    double[] outIm = new double[im.length];
    for (int k = 0; k < re.length; k++) {
      outRe[k] = re[source[k]];
      outIm[k] = im[source[k]];
    }
    return new Hermitian(ComplexMatrix.of(size, size, outRe, outIm));
  }
}
