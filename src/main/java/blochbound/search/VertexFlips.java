package blochbound.search;

import java.util.Arrays;
import java.util.Comparator;
import java.util.stream.IntStream;

/**
 * Flips the coordinates of a point that lie on faces of the box to the opposite faces, one at a
 * time, until no single flip makes the objective smaller.
 */
final class VertexFlips {
  private VertexFlips() {}

  /** The vertex that the gradient at a point descends to; the nearest side where it is zero. */
  static double[] downhill(Iterate at) {
    double[] vertex = new double[at.x().length];
    Arrays.setAll(
        vertex,
        j -> {
          double slope = at.gradient()[j];
          return slope == 0 ? (at.x()[j] < 0 ? -1 : 1) : -Math.signum(slope);
        });
    return vertex;
  }

  /**
   * Runs from a point; coordinates off the faces stay as they are.
   *
   * @return the last point, which no flip of one coordinate improves unless the budget is spent
   */
  static double[] run(Evaluator evaluator, double[] start) {
    Iterate first = Iterate.at(evaluator, start);
    double[] point = start.clone();
    double value = first.value();
    int[] order = mostPromisingFirst(first);
    int sinceGain = 0;
    for (int k = 0; sinceGain < order.length && !evaluator.isExhausted(); k++) {
      int j = order[k % order.length];
      double[] flipped = point.clone();
      flipped[j] = -flipped[j];
      double candidate = evaluator.value(flipped);
      if (candidate < value) {
        value = candidate;
        point = flipped;
        sinceGain = 0;
      } else {
        sinceGain++;
      }
    }
    return point;
  }

  /** Coordinates on faces, those first whose flip promises most to first order. */
  private static int[] mostPromisingFirst(Iterate at) {
    return IntStream.range(0, at.x().length)
        .filter(j -> Math.abs(at.x()[j]) == 1)
        .boxed()
        .sorted(Comparator.comparingDouble(j -> -at.gradient()[j] * at.x()[j]))
        .mapToInt(Integer::intValue)
        .toArray();
  }
}
