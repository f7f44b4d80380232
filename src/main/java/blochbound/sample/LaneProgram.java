package blochbound.sample;

import blochbound.generator.BlochGenerator;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import java.util.TreeMap;

/**
 * The fixed sequence of operations that assembles and factors A(p) in a given pivot order, as index
 * lists: entries of A and b as sums over terms, entries of the factors as sums of products.
 *
 * <p>Rows and columns are counted in pivot order; b is column n. Entries of the factors are
 * numbered row by row, columns ascending.
 */
final class LaneProgram {
  /**
   * One stored entry of [A b].
   *
   * @param constant part that does not depend on the parameters
   * @param terms generator terms of the other parts
   * @param factors factor of each of these terms
   */
  record Assembly(double constant, int[] terms, double[] factors) {}

  private final int n;
  private final int[] columnOrder;
  private final List<Assembly> assemblies = new ArrayList<>();
  private final int[][] assemblyAt;
  private final int[] rowStart;
  private final int[] column;
  private final int[] productStart;
  private final int[] left;
  private final int[] right;

  private LaneProgram(BlochGenerator generator, PivotPlan plan) {
    n = plan.size();
    columnOrder = plan.columnOrder();
    assemblyAt = new int[n][n + 1];
    collectAssemblies(generator, inverse(plan.rowOrder()), inverse(columnOrder));
    rowStart = new int[n + 1];
    int[][] entryAt = new int[n][n];
    List<Integer> columns = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      for (int j = 0; j < n; j++) {
        entryAt[i][j] = plan.mayHave(i, j) ? columns.size() : -1;
        if (plan.mayHave(i, j)) {
          columns.add(j);
        }
      }
      rowStart[i + 1] = columns.size();
    }
    column = columns.stream().mapToInt(Integer::intValue).toArray();
    productStart = new int[column.length + 1];
    IntList lefts = new IntList();
    IntList rights = new IntList();
    collectProducts(entryAt, lefts, rights);
    left = lefts.toArray();
    right = rights.toArray();
  }

  /**
   * Program for a generator with the pivot order of the nominal device, or of the centre of the
   * ball where the nominal device has no unique steady state; empty when neither has one.
   */
  static Optional<LaneProgram> of(BlochGenerator generator) {
    double[] centre = new double[generator.space().coordinates()];
    return plan(generator, generator.space().nominalCoordinates())
        .or(() -> plan(generator, centre))
        .map(plan -> new LaneProgram(generator, plan));
  }

  private static Optional<PivotPlan> plan(BlochGenerator generator, double[] z) {
    int n = generator.unknowns();
    double[][] a = new double[n][n];
    double[] coefficients = generator.coefficients(generator.space().parametersAt(z));
    generator.assemble(coefficients, a, new double[n]);
    boolean[][] pattern = new boolean[n][n];
    generator
        .terms()
        .forEach(
            t ->
                t.matrix()
                    .forEach(
                        (row, col, entry) -> {
                          if (row > 0 && col > 0) {
                            pattern[row - 1][col - 1] = true;
                          }
                        }));
    return PivotPlan.of(a, pattern);
  }

  private static int[] inverse(int[] order) {
    int[] inverse = new int[order.length];
    for (int k = 0; k < order.length; k++) {
      inverse[order[k]] = k;
    }
    return inverse;
  }

  private void collectAssemblies(BlochGenerator generator, int[] rowAt, int[] columnAt) {
    // The first coordinate of a state is 1 / sqrt(N): it scales the column that becomes b.
    double first = 1 / Math.sqrt(generator.basis().levels());
    TreeMap<Integer, TreeMap<Integer, Double>> found = new TreeMap<>();
    for (int t = 0; t < generator.terms().size(); t++) {
      int term = generator.terms().get(t).monomial().isOne() ? -1 : t;
      generator
          .terms()
          .get(t)
          .matrix()
          .forEach(
              (row, col, entry) -> {
                if (row > 0) {
                  int j = col == 0 ? n : columnAt[col - 1];
                  found
                      .computeIfAbsent(rowAt[row - 1] * (n + 1) + j, k -> new TreeMap<>())
                      .merge(term, col == 0 ? entry * first : entry, Double::sum);
                }
              });
    }
    for (int[] row : assemblyAt) {
      Arrays.fill(row, -1);
    }
    found.forEach(
        (position, parts) -> {
          assemblyAt[position / (n + 1)][position % (n + 1)] = assemblies.size();
          double constant = parts.getOrDefault(-1, 0.0);
          parts.remove(-1);
          int[] terms = parts.keySet().stream().mapToInt(Integer::intValue).toArray();
          double[] factors = parts.values().stream().mapToDouble(Double::doubleValue).toArray();
          assemblies.add(new Assembly(constant, terms, factors));
        });
  }

  /** Products l_ik u_kj with k below min(i, j) for each entry (i, j). */
  private void collectProducts(int[][] entryAt, IntList lefts, IntList rights) {
    for (int i = 0; i < n; i++) {
      for (int e = rowStart[i]; e < rowStart[i + 1]; e++) {
        int j = column[e];
        for (int f = rowStart[i]; f < e && column[f] < i; f++) {
          int u = entryAt[column[f]][j];
          if (u >= 0) {
            lefts.add(f);
            rights.add(u);
          }
        }
        productStart[e + 1] = lefts.size();
      }
    }
  }

  /** Number n of unknowns. */
  int size() {
    return n;
  }

  /** Unknown that belongs to a pivot. */
  int unknownOf(int pivot) {
    return columnOrder[pivot];
  }

  /** The entries of [A b] that are assembled. */
  List<Assembly> assemblies() {
    return assemblies;
  }

  /** Position in {@link #assemblies} of an entry of [A b], or -1. */
  int assemblyAt(int row, int col) {
    return assemblyAt[row][col];
  }

  /** Number of the first factor entry of a row. */
  int rowStart(int row) {
    return rowStart[row];
  }

  /** Column of a factor entry. */
  int column(int entry) {
    return column[entry];
  }

  /** Number of factor entries. */
  int entries() {
    return column.length;
  }

  /** Number of the first product of a factor entry. */
  int productStart(int entry) {
    return productStart[entry];
  }

  /** Entries of the lower factor in each product; not a copy. */
  int[] left() {
    return left;
  }

  /** Entries of the upper factor in each product; not a copy. */
  int[] right() {
    return right;
  }

  /** A growing list of numbers. */
  private static final class IntList {
    private int[] values = new int[1024];
    private int count;

    void add(int value) {
      if (count == values.length) {
        values = Arrays.copyOf(values, 2 * count);
      }
      values[count++] = value;
    }

    int size() {
      return count;
    }

    int[] toArray() {
      return Arrays.copyOf(values, count);
    }
  }
}
