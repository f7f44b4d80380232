package blochbound.generator;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.ConcurrentHashMap;

/**
 * All multi-indices of m variables up to an order, by ascending degree, with their neighbours.
 *
 * <p>Index 0 is the empty one, index i + 1 is variable i. Tables are made once for each (m, order).
 */
public final class MultiIndexTable {
  private record Key(int variables, int order) {}

  private static final Map<Key, MultiIndexTable> TABLES = new ConcurrentHashMap<>();

  private final int variables;
  private final int order;
  private final int[][] factors;
  private final int[][] plus;
  private final int[] firstOfDegree;
  private final boolean[] even;
  private final double[] multinomial;

  private MultiIndexTable(int variables, int order) {
    this.variables = variables;
    this.order = order;
    List<int[]> all = new ArrayList<>();
    Map<List<Integer>, Integer> position = new HashMap<>();
    firstOfDegree = new int[order + 2];
    all.add(new int[0]);
    position.put(List.of(), 0);
    int from = 0;
    for (int degree = 1; degree <= order; degree++) {
      firstOfDegree[degree] = all.size();
      int until = all.size();
      for (int a = from; a < until; a++) {
        int[] parent = all.get(a);
        for (int i = parent.length == 0 ? 0 : parent[degree - 2]; i < variables; i++) {
          int[] child = Arrays.copyOf(parent, degree);
          child[degree - 1] = i;
          position.put(asList(child), all.size());
          all.add(child);
        }
      }
      from = until;
    }
    firstOfDegree[order + 1] = all.size();
    factors = all.toArray(new int[0][]);
    plus = new int[firstOfDegree[order]][variables];
    even = new boolean[factors.length];
    multinomial = new double[factors.length];
    for (int a = 0; a < factors.length; a++) {
      fillProperties(a);
      for (int i = 0; i < variables && a < plus.length; i++) {
        int[] sum = Arrays.copyOf(factors[a], factors[a].length + 1);
        sum[sum.length - 1] = i;
        Arrays.sort(sum);
        plus[a][i] = Objects.requireNonNull(position.get(asList(sum)));
      }
    }
  }

  private void fillProperties(int a) {
    int[] exponent = new int[variables];
    double ways = 1;
    for (int k = 0; k < factors[a].length; k++) {
      exponent[factors[a][k]]++;
      ways = ways * (k + 1) / exponent[factors[a][k]];
    }
    even[a] = Arrays.stream(exponent).allMatch(e -> e % 2 == 0);
    multinomial[a] = ways;
  }

  private static List<Integer> asList(int[] tuple) {
    return Arrays.stream(tuple).boxed().toList();
  }

  /** The table for some variables and order. */
  public static MultiIndexTable of(int variables, int order) {
    return TABLES.computeIfAbsent(
        new Key(variables, order), k -> new MultiIndexTable(variables, order));
  }

  /** Number of multi-indices C(m + order, order), without making a table. */
  public static double count(int variables, int order) {
    double count = 1;
    for (int k = 1; k <= order; k++) {
      count = count * (variables + k) / k;
    }
    return count;
  }

  /** Number m of variables. */
  public int variables() {
    return variables;
  }

  /** Largest degree in the table. */
  public int order() {
    return order;
  }

  /** Number of multi-indices. */
  public int count() {
    return factors.length;
  }

  /** Position of the first multi-index of a degree, up to order + 1. */
  public int firstOfDegree(int degree) {
    return firstOfDegree[degree];
  }

  /** Degree |a|. */
  public int degree(int a) {
    return factors[a].length;
  }

  /** The variables of multi-index a with repetition, ascending; not to be changed. */
  public int[] factors(int a) {
    return factors[a];
  }

  /** Position of a + e_i; the sum must be in the table. */
  public int plus(int a, int variable) {
    return plus[a][variable];
  }

  /** Position of a + b; the sum must be in the table. */
  public int sum(int a, int b) {
    if (b <= variables) {
      return b == 0 ? a : plus[a][b - 1];
    }
    int index = a;
    for (int variable : factors[b]) {
      index = plus[index][variable];
    }
    return index;
  }

  /** Tells whether all exponents of a are even. */
  public boolean isEven(int a) {
    return even[a];
  }

  /** Multinomial coefficient |a|! / (a_1! .. a_m!), exact for the orders in use. */
  public double multinomial(int a) {
    return multinomial[a];
  }
}
