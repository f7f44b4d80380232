package blochbound.generator;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.model.Atom;
import blochbound.model.Atom.FunctionAtom;
import blochbound.model.Atom.ParameterAtom;
import blochbound.model.Coefficient;
import blochbound.model.Monomial;
import blochbound.model.ParameterSpace;
import blochbound.model.Region;
import blochbound.model.Scalar;
import java.util.Map;

/**
 * The generator on one region: every coefficient as a polynomial in x in [-1, 1]^m, with z = centre
 * + x * halfWidth, plus a remainder that covers truncation and rounding.
 *
 * <p>Polynomial coefficients up to {@link BlochGenerator#LARGEST_DEGREE} are expanded without
 * truncation, so that their remainder is rounding only; others are cut at {@link
 * BlochGenerator#degree}.
 */
public final class RegionExpansion {
  private final BlochGenerator generator;
  private final TaylorModel[] coefficients;

  private RegionExpansion(BlochGenerator generator, TaylorModel[] coefficients) {
    this.generator = generator;
    this.coefficients = coefficients;
  }

  /** Expansion over a region; the table's order must reach {@link BlochGenerator#degree}. */
  public static RegionExpansion over(
      BlochGenerator generator, Region region, MultiIndexTable table) {
    ParameterSpace space = generator.space();
    TaylorModel[] parameters = new TaylorModel[space.parameters().size()];
    int degree = generator.degree();
    for (int i = 0; i < parameters.length; i++) {
      parameters[i] = parameter(space, i, region, table, degree);
    }
    return new RegionExpansion(generator, expand(generator, parameters, table, degree));
  }

  /** Expansion at a single point whose parameters, in internal units, are known up to intervals. */
  public static RegionExpansion at(BlochGenerator generator, Interval[] point) {
    MultiIndexTable table = MultiIndexTable.of(0, generator.degree());
    TaylorModel[] parameters = new TaylorModel[point.length];
    for (int i = 0; i < point.length; i++) {
      parameters[i] = TaylorModel.constant(table, 0, point[i]);
    }
    return new RegionExpansion(generator, expand(generator, parameters, table, 0));
  }

  private static TaylorModel parameter(
      ParameterSpace space, int parameter, Region region, MultiIndexTable table, int degree) {
    Interval centre = space.centre(parameter);
    int row = space.coordinateOf(parameter);
    if (row < 0) {
      return TaylorModel.constant(table, degree, centre);
    }
    int m = space.coordinates();
    double[] slopes = new double[m];
    double value = centre.middle();
    double size = Math.abs(value);
    double error = centre.radius();
    for (int j = 0; j < m; j++) {
      Interval slope = space.slope(row, j);
      double middle = slope.middle();
      if (middle == 0 && slope.radius() == 0) {
        continue;
      }
      slopes[j] = middle * region.halfWidth(j);
      value += middle * region.centre(j);
      double reach = Math.abs(region.centre(j)) + region.halfWidth(j);
      size += Math.abs(middle) * reach;
      error += slope.radius() * reach;
    }
    // Each of the 2 m + 1 sums and 2 m products errs by at most u times the sum of sizes.
    double rounding = Rounding.gamma(4L * m + 8) * size;
    return TaylorModel.affine(
        table, degree, slopes, value, Rounding.inflate(error + rounding, 4L * m + 8));
  }

  private static TaylorModel[] expand(
      BlochGenerator generator, TaylorModel[] parameters, MultiIndexTable table, int degree) {
    TaylorModel[] expanded = new TaylorModel[generator.terms().size()];
    for (int j = 0; j < expanded.length; j++) {
      expanded[j] = expand(generator.terms().get(j).monomial(), parameters, table, degree);
    }
    return expanded;
  }

  private static TaylorModel expand(
      Monomial monomial, TaylorModel[] parameters, MultiIndexTable table, int degree) {
    TaylorModel product = null;
    for (Map.Entry<Atom, Integer> e : monomial.powers().entrySet()) {
      TaylorModel base =
          e.getKey() instanceof ParameterAtom p
              ? parameters[p.index()]
              : function((FunctionAtom) e.getKey(), parameters, table, degree);
      if (e.getValue() < 0) {
        base = base.compose(Atom.Function.RECIPROCAL);
      }
      for (int k = 0; k < Math.abs(e.getValue()); k++) {
        product = product == null ? base : product.times(base);
      }
    }
    return product == null ? TaylorModel.constant(table, degree, Interval.ONE) : product;
  }

  private static TaylorModel function(
      FunctionAtom atom, TaylorModel[] parameters, MultiIndexTable table, int degree) {
    return expand(atom.argument(), parameters, table, degree).compose(atom.function());
  }

  private static TaylorModel expand(
      Scalar scalar, TaylorModel[] parameters, MultiIndexTable table, int degree) {
    TaylorModel sum = TaylorModel.constant(table, degree, Interval.ZERO);
    for (Map.Entry<Monomial, Coefficient> e : scalar.terms().entrySet()) {
      sum = sum.plus(expand(e.getKey(), parameters, table, degree).times(e.getValue().enclosure()));
    }
    return sum;
  }

  /** The generator that is expanded. */
  public BlochGenerator generator() {
    return generator;
  }

  /** The coefficient of the j-th term. */
  public TaylorModel coefficient(int j) {
    return coefficients[j];
  }

  /** The constant terms of all coefficients: the generator at the centre. */
  public double[] atCentre() {
    double[] values = new double[coefficients.length];
    for (int j = 0; j < values.length; j++) {
      values[j] = coefficients[j].constantTerm();
    }
    return values;
  }
}
