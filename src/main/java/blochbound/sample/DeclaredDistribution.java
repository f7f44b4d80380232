package blochbound.sample;

import blochbound.model.Parameter;
import blochbound.model.ParameterSpace;
import java.util.List;
import java.util.stream.IntStream;

/**
 * Joint distribution of the parameters with a tolerance, before it is conditioned on the ball.
 *
 * <p>Parameters are independent, except that normal ones in a correlated ellipsoid are jointly
 * normal with the declared correlations. Uniform and triangular ones in a correlated ellipsoid are
 * independent as declared; conditioning on the ellipsoid then correlates them, and where all are
 * uniform the result is uniform in the ellipsoid.
 *
 * <p>Shares s are deviations from the centre over half of each parameter's range in the ball;
 * coordinates z are those of {@link ParameterSpace}, s = C z with a triangular C.
 */
final class DeclaredDistribution {
  private final Marginal[] marginals;
  private final double[][] factor;
  private final boolean isCorrelated;
  private final int[] normal;
  private final double[][] normalFactor;

  DeclaredDistribution(ParameterSpace space) {
    isCorrelated = !space.isUncorrelated();
    factor = isCorrelated ? correlationFactor(space) : new double[0][];
    marginals = marginals(space);
    normal =
        IntStream.range(0, isCorrelated ? marginals.length : 0)
            .filter(j -> marginals[j] instanceof Marginal.Normal)
            .toArray();
    normalFactor = normalFactor();
  }

  private Marginal[] marginals(ParameterSpace space) {
    List<Parameter> all = space.parameters();
    double[] low = space.coordinatesOf(all.stream().map(Parameter::lower).toList());
    double[] nominal = space.coordinatesOf(all.stream().map(Parameter::nominal).toList());
    double[] high = space.coordinatesOf(all.stream().map(Parameter::upper).toList());
    Marginal[] made = new Marginal[low.length];
    for (int j = 0; j < made.length; j++) {
      Parameter p = all.get(space.parameterOf(j));
      made[j] = Marginal.of(p, share(low, j), share(nominal, j), share(high, j));
    }
    return made;
  }

  /** Rows of the slopes at unit length: a Cholesky factor of the correlation matrix. */
  private static double[][] correlationFactor(ParameterSpace space) {
    int m = space.coordinates();
    double[][] c = new double[m][m];
    for (int i = 0; i < m; i++) {
      double squares = 0;
      for (int j = 0; j <= i; j++) {
        c[i][j] = space.slope(i, j).middle();
        squares += c[i][j] * c[i][j];
      }
      for (int j = 0; j <= i; j++) {
        c[i][j] /= Math.sqrt(squares);
      }
    }
    return c;
  }

  /** Cholesky factor of the correlations among the normal parameters. */
  private double[][] normalFactor() {
    int k = normal.length;
    double[][] c = new double[k][k];
    for (int a = 0; a < k; a++) {
      for (int b = 0; b <= a; b++) {
        double sum = 0;
        for (int j = 0; j <= normal[b]; j++) {
          sum += factor[normal[a]][j] * factor[normal[b]][j];
        }
        for (int j = 0; j < b; j++) {
          sum -= c[a][j] * c[b][j];
        }
        c[a][b] = a == b ? Math.sqrt(sum) : sum / c[b][b];
      }
    }
    return c;
  }

  /** Number m of parameters with a tolerance. */
  int dimension() {
    return marginals.length;
  }

  /** Probability of every parameter's own range: what {@link #draw} leaves out beforehand. */
  double mass() {
    double product = 1;
    for (int j = 0; j < marginals.length; j++) {
      product *= isJointlyNormal(j) ? 1 : marginals[j].mass();
    }
    return product;
  }

  private boolean isJointlyNormal(int j) {
    return isCorrelated && marginals[j] instanceof Marginal.Normal;
  }

  /** Writes the coordinates z of a draw inside every parameter's own range, from m numbers. */
  void draw(double[] u, double[] z) {
    for (int j = 0; j < marginals.length; j++) {
      z[j] =
          isJointlyNormal(j) ? Marginal.Normal.standardQuantile(u[j]) : marginals[j].quantile(u[j]);
    }
    for (int a = normal.length - 1; a >= 0; a--) {
      double sum = 0;
      for (int b = 0; b <= a; b++) {
        sum += normalFactor[a][b] * z[normal[b]];
      }
      z[normal[a]] = sum;
    }
    for (int j : normal) {
      z[j] *= ((Marginal.Normal) marginals[j]).sigma();
    }
    solve(factor, z);
  }

  /** Solves C z = s in place, with s given in z; C without rows is the unit matrix. */
  private static void solve(double[][] c, double[] z) {
    for (int i = 0; i < c.length; i++) {
      for (int j = 0; j < i; j++) {
        z[i] -= c[i][j] * z[j];
      }
      z[i] /= c[i][i];
    }
  }

  /** Density at z divided by the largest one. */
  double relativeDensity(double[] z) {
    double density = 1;
    double[] scaled = new double[normal.length];
    int next = 0;
    for (int i = 0; i < marginals.length; i++) {
      double s = share(z, i);
      if (isJointlyNormal(i)) {
        scaled[next++] = s / ((Marginal.Normal) marginals[i]).sigma();
      } else {
        density *= marginals[i].relativeDensity(s);
      }
    }
    solve(normalFactor, scaled);
    for (double x : scaled) {
      density *= Math.exp(-0.5 * x * x);
    }
    return density;
  }

  private double share(double[] z, int i) {
    if (!isCorrelated) {
      return z[i];
    }
    double sum = 0;
    for (int j = 0; j <= i; j++) {
      sum += factor[i][j] * z[j];
    }
    return sum;
  }

  /** Largest density with respect to the volume in z. */
  double peak() {
    double product = 1;
    for (int j = 0; j < marginals.length; j++) {
      product *= marginals[j].peak() * (isCorrelated ? factor[j][j] : 1);
    }
    for (int a = 0; a < normal.length; a++) {
      product /= normalFactor[a][a];
    }
    return product;
  }
}
