package blochbound.model;

import blochbound.check.Check;

/**
 * A box in the coordinates z of the tolerance ball: centre +- half width in each coordinate.
 *
 * <p>Halving keeps both numbers exact as long as they have few binary digits; whatever they are,
 * the box is the exact one that they describe.
 */
public final class Region {
  private final double[] centre;
  private final double[] halfWidth;

  /** Box with the given centre and half widths, which are copied. */
  public Region(double[] centre, double[] halfWidth) {
    Check.that(centre.length == halfWidth.length, "one half width for each coordinate");
    this.centre = centre.clone();
    this.halfWidth = halfWidth.clone();
  }

  /** The box [-1, 1]^m, which holds every ball. */
  public static Region whole(int coordinates) {
    double[] ones = new double[coordinates];
    java.util.Arrays.fill(ones, 1);
    return new Region(new double[coordinates], ones);
  }

  /** Number m of coordinates. */
  public int coordinates() {
    return centre.length;
  }

  /** Centre along one coordinate. */
  public double centre(int coordinate) {
    return centre[coordinate];
  }

  /** Half width along one coordinate. */
  public double halfWidth(int coordinate) {
    return halfWidth[coordinate];
  }

  /** Copy of the centre. */
  public double[] centre() {
    return centre.clone();
  }

  /** The point centre + x * halfWidth for x in [-1, 1]^m. */
  public double[] at(double[] x) {
    double[] z = centre.clone();
    for (int j = 0; j < z.length; j++) {
      z[j] += x[j] * halfWidth[j];
    }
    return z;
  }

  /**
   * The lower (side -1) or upper (side 1) half along a coordinate.
   *
   * <p>The half width is rounded upwards where halving or shifting is not exact, so that the two
   * halves always cover the box.
   */
  public Region half(int coordinate, int side) {
    double[] c = centre.clone();
    double[] h = halfWidth.clone();
    h[coordinate] *= 0.5;
    double shifted = c[coordinate] + side * h[coordinate];
    if (shifted - c[coordinate] != side * h[coordinate]
        || (shifted - side * h[coordinate]) != c[coordinate]) {
      h[coordinate] += 2 * Math.ulp(shifted);
    }
    c[coordinate] = shifted;
    return new Region(c, h);
  }
}
