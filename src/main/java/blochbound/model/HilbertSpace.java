package blochbound.model;

import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import java.util.List;

/**
 * The tensor product of all sites, first site most significant.
 *
 * @param sites the sites in the order of the case file
 */
public record HilbertSpace(List<Site> sites) {
  /** Copies the list. */
  public HilbertSpace {
    sites = List.copyOf(sites);
  }

  /** Product N of the level counts. */
  public int dimension() {
    return sites.stream().mapToInt(Site::dimension).reduce(1, Math::multiplyExact);
  }

  /** Level counts in order. */
  public int[] dimensions() {
    return sites.stream().mapToInt(Site::dimension).toArray();
  }

  /** Position of the site of that name, or -1. */
  public int indexOf(String name) {
    for (int i = 0; i < sites.size(); i++) {
      if (sites.get(i).name().equals(name)) {
        return i;
      }
    }
    return -1;
  }

  /** Index of the basis state with the given level of each site. */
  public int basisIndex(int[] levels) {
    int index = 0;
    for (int i = 0; i < levels.length; i++) {
      index = index * sites.get(i).dimension() + levels[i];
    }
    return index;
  }

  /** The operator that acts as {@code local} on one site and as the identity elsewhere. */
  public ComplexBall lift(int site, ComplexBall local) {
    int before = 1;
    int after = 1;
    for (int i = 0; i < sites.size(); i++) {
      if (i < site) {
        before *= sites.get(i).dimension();
      } else if (i > site) {
        after *= sites.get(i).dimension();
      }
    }
    // Products with a unit matrix are exact, so the radius grows with its norm only.
    ComplexMatrix centre =
        ComplexMatrix.identity(before).kron(local.centre()).kron(ComplexMatrix.identity(after));
    double radius =
        local.radius() == 0 ? 0 : local.radius() * Math.sqrt((double) before * after) * (1 + 1e-15);
    return new ComplexBall(centre, radius);
  }
}
