package blochbound.measure;

import blochbound.interval.Interval;
import blochbound.linalg.Hermitian;
import java.util.List;

/**
 * Negativity for a cut: minus the sum of the negative eigenvalues of the partial transpose, that is
 * tr Y_+ with Y = -rho^PT (G. Vidal, R. F. Werner, Phys. Rev. A 65 (2002) 032314).
 *
 * <p>The partial transpose keeps the Frobenius norm and tr(A^PT B) = tr(A B^PT), so the bounds of
 * {@link PositivePart} carry over with W = -(P)^PT. The largest value is (m - 1)/2, m the smaller
 * side of the cut, reached by pure states (Schmidt) and kept by convexity.
 */
final class Negativity extends CertifiedMeasure {
  private final PartialTranspose transpose;
  private final double largest;

  /**
   * Prepares a cut.
   *
   * @param dimensions level counts of all sites
   * @param side whether each site is on the first side of the cut
   */
  Negativity(int[] dimensions, boolean[] side) {
    super(product(dimensions));
    this.transpose = new PartialTranspose(dimensions, side);
    int first = 1;
    for (int k = 0; k < dimensions.length; k++) {
      first *= side[k] ? dimensions[k] : 1;
    }
    this.largest = (Math.min(first, dimension() / first) - 1) / 2.0;
  }

  private static int product(int[] dimensions) {
    int product = 1;
    for (int dimension : dimensions) {
      product *= dimension;
    }
    return product;
  }

  @Override
  public double value(Hermitian state) {
    double sum = 0;
    for (double value : transpose.of(state).eigen().values()) {
      sum += Math.max(0, -value);
    }
    return sum;
  }

  @Override
  public Hermitian gradient(Hermitian state) {
    return witness(positivePart(state)).centre();
  }

  @Override
  public Interval range() {
    return Interval.of(0, largest);
  }

  private PositivePart positivePart(Hermitian near) {
    return PositivePart.near(transpose.of(near).scale(-1));
  }

  private ApproximateOperator witness(PositivePart part) {
    ApproximateOperator p = part.projector();
    return new ApproximateOperator(transpose.of(p.centre()).scale(-1), p.error());
  }

  @Override
  List<AffineBound> lowerWitnesses(Hermitian near) {
    ApproximateOperator w = witness(positivePart(near));
    return List.of(AffineBound.global(w.centre(), w.error()));
  }

  @Override
  List<AffineBound> upperWitnesses(Hermitian near) {
    PositivePart part = positivePart(near);
    ApproximateOperator w = witness(part);
    Hermitian zero = Hermitian.identity(dimension()).scale(0);
    return List.of(
        AffineBound.local(w.centre(), distance -> Math.nextUp(w.error() + part.excessUp(distance))),
        AffineBound.local(zero, distance -> part.positiveUp(distance, -1)));
  }
}
