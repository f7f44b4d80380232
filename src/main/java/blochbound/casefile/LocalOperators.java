package blochbound.casefile;

import blochbound.casefile.Token.Label;
import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.HilbertSpace;
import blochbound.model.Site;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * Standard operators, transitions and kets of the sites as matrices with proved error bounds.
 *
 * <p>The first label of a two-level site is the +1 eigenstate of Z; Y = -i {@code |first><second|}
 * + h.c.; lower takes level k to level k - 1 with the weight sqrt(k), so that lower = (X + iY)/2 on
 * two levels; number = diag(0, 1, 2, ...).
 */
final class LocalOperators {
  private final HilbertSpace space;
  private final Map<String, ComplexBall> known = new HashMap<>();

  LocalOperators(HilbertSpace space) {
    this.space = space;
  }

  /** The sites. */
  HilbertSpace space() {
    return space;
  }

  /** Number N of levels of all sites together. */
  int dimension() {
    return space.dimension();
  }

  /** Names of the sites. */
  List<String> siteNames() {
    return space.sites().stream().map(Site::name).toList();
  }

  /** Position of a named site. */
  int site(String name, Passage passage, int at) {
    int index = space.indexOf(name);
    if (index < 0) {
      throw passage.fault(
          at,
          "unknown site `"
              + name
              + "`"
              + Vocabulary.nearest(name, siteNames())
              + "; sites are "
              + Vocabulary.list(siteNames()));
    }
    return index;
  }

  /** Position of a label among the levels of a site. */
  int level(int site, String label, Passage passage, int at) {
    Site s = space.sites().get(site);
    int level = s.levels().indexOf(label);
    if (level < 0) {
      throw passage.fault(
          at,
          "the site "
              + s.name()
              + " has no level `"
              + label
              + "`"
              + Vocabulary.nearest(label, s.levels())
              + "; its levels are "
              + Vocabulary.list(s.levels()));
    }
    return level;
  }

  /** A standard operator on all sites. */
  ComplexBall standard(Expression.Local node, Passage passage) {
    int site = site(node.site().text(), passage, node.site().at());
    int levels = space.sites().get(site).dimension();
    String name = node.operator();
    if (levels != 2 && List.of("X", "Y", "Z").contains(name)) {
      throw passage.fault(
          node.at(),
          name
              + " is for two-level sites, "
              + node.site().text()
              + " has "
              + levels
              + " levels; use lower, raise, number or |a><b|");
    }
    return known.computeIfAbsent(name + "@" + site, k -> space.lift(site, matrix(name, levels)));
  }

  private static ComplexBall matrix(String name, int levels) {
    ComplexMatrix up = ComplexMatrix.unit(levels, 0, levels > 1 ? 1 : 0);
    ComplexMatrix down = up.adjoint();
    return switch (name) {
      case "X" -> ComplexBall.exact(up.plus(down));
      case "Y" -> ComplexBall.exact(up.scale(0, -1).plus(down.scale(0, 1)));
      case "Z" -> ComplexBall.exact(ComplexMatrix.real(new double[][] {{1, 0}, {0, -1}}));
      case "lower" -> lower(levels);
      case "raise" -> lower(levels).adjoint();
      case "number" -> number(levels);
      default -> throw new IllegalArgumentException("no standard operator: " + name);
    };
  }

  private static ComplexBall lower(int levels) {
    double[][] entries = new double[levels][levels];
    double[] errors = new double[levels];
    for (int k = 1; k < levels; k++) {
      double root = Math.sqrt(k);
      entries[k - 1][k] = root;
      // The square root is correctly rounded, and exact when its square is.
      errors[k] = root == Math.rint(root) ? 0 : 0.5 * Math.ulp(root);
    }
    double error = java.util.Arrays.stream(errors).sum() == 0 ? 0 : Rounding.normUp(errors);
    return new ComplexBall(ComplexMatrix.real(entries), error);
  }

  private static ComplexBall number(int levels) {
    double[][] entries = new double[levels][levels];
    for (int k = 0; k < levels; k++) {
      entries[k][k] = k;
    }
    return ComplexBall.exact(ComplexMatrix.real(entries));
  }

  /** The transition {@code |a><b|} of one site on all sites. */
  ComplexBall transition(int site, int a, int b) {
    int levels = space.sites().get(site).dimension();
    return known.computeIfAbsent(
        "|" + a + "><" + b + "|@" + site,
        k -> space.lift(site, ComplexBall.exact(ComplexMatrix.unit(levels, a, b))));
  }

  /** The transition {@code |a><b|} between basis states of all sites. */
  ComplexBall transition(int a, int b) {
    return ComplexBall.exact(ComplexMatrix.unit(dimension(), a, b));
  }

  /** The basis column at {@code index}. */
  ComplexBall basisKet(int index) {
    double[] re = new double[dimension()];
    re[index] = 1;
    return ComplexBall.exact(ComplexMatrix.of(re.length, 1, re, new double[re.length]));
  }

  /** Index of the basis state with one label for each site. */
  int basisIndex(List<Label> labels, Passage passage) {
    List<String> names = siteNames();
    if (labels.size() != names.size()) {
      throw passage.fault(
          labels.get(0).at(),
          "expected one label for each of the sites ("
              + String.join(", ", names)
              + "), not "
              + labels.size()
              + (labels.size() == 1 ? "; for one site write |a><b|@site" : ""));
    }
    int[] levels = new int[labels.size()];
    for (int i = 0; i < levels.length; i++) {
      levels[i] = level(i, labels.get(i).text(), passage, labels.get(i).at());
    }
    return space.basisIndex(levels);
  }

  /** The identity on all sites. */
  ComplexBall identity() {
    return ComplexBall.exact(ComplexMatrix.identity(dimension()));
  }

  /** A matrix on some sites, given in the order of the list, as an operator on all sites. */
  ComplexBall embed(List<Integer> on, ComplexBall local) {
    int n = dimension();
    int[][] levels = levelsOfBasisStates();
    double[] re = new double[n * n];
    double[] im = new double[n * n];
    for (int row = 0; row < n; row++) {
      for (int column = 0; column < n; column++) {
        if (agreeElsewhere(levels[row], levels[column], on)) {
          int r = localIndex(levels[row], on);
          int c = localIndex(levels[column], on);
          re[row * n + column] = local.centre().re(r, c);
          im[row * n + column] = local.centre().im(r, c);
        }
      }
    }
    double copies = (double) n / local.centre().rows();
    double radius =
        local.radius() == 0
            ? 0
            : Interval.of(copies).sqrt().times(Interval.of(local.radius())).upper();
    return new ComplexBall(ComplexMatrix.of(n, n, re, im), radius);
  }

  private int[][] levelsOfBasisStates() {
    int[] sizes = space.dimensions();
    List<int[]> states = new ArrayList<>();
    for (int index = 0; index < dimension(); index++) {
      int[] levels = new int[sizes.length];
      int rest = index;
      for (int i = sizes.length - 1; i >= 0; i--) {
        levels[i] = rest % sizes[i];
        rest /= sizes[i];
      }
      states.add(levels);
    }
    return states.toArray(new int[0][]);
  }

  private static boolean agreeElsewhere(int[] a, int[] b, List<Integer> on) {
    for (int i = 0; i < a.length; i++) {
      if (a[i] != b[i] && !on.contains(i)) {
        return false;
      }
    }
    return true;
  }

  private int localIndex(int[] levels, List<Integer> on) {
    int index = 0;
    for (int site : on) {
      index = index * space.sites().get(site).dimension() + levels[site];
    }
    return index;
  }
}
