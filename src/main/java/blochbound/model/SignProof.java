package blochbound.model;

import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import blochbound.model.Ball.Norm;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.fraction.BigFraction;

/**
 * Proves that a scalar expression keeps its sign over the whole tolerance ball.
 *
 * <p>Affine expressions are decided in exact arithmetic, so that a rate range may touch zero;
 * others by interval arithmetic over bisected boxes. A box that crosses the rim of the ball counts
 * as if it were inside. The expression must be defined on the whole ball: its {@link
 * Scalar#conditions()} are proved first, inner ones before outer ones.
 */
public final class SignProof {
  private static final int MOST_BOXES = 4096;

  /** What is to be proved. */
  public enum Claim {
    /** Never below zero. */
    NONNEGATIVE,
    /** Above zero everywhere, or below zero everywhere. */
    NONZERO
  }

  /** Outcome of a proof. */
  public sealed interface Outcome {
    /**
     * The claim holds on the whole ball.
     *
     * @param sign sign of the expression, 1 or -1; 1 for {@link Claim#NONNEGATIVE}
     */
    record Proved(int sign) implements Outcome {}

    /**
     * The claim is false or could not be proved.
     *
     * @param coordinates coordinates z where it fails, or near which no proof was found
     * @param value value of the expression there, rounded
     */
    record NotProved(List<Double> coordinates, double value) implements Outcome {
      /** Copies the list. */
      public NotProved {
        coordinates = List.copyOf(coordinates);
      }

      static NotProved at(double[] coordinates, double value) {
        return new NotProved(java.util.Arrays.stream(coordinates).boxed().toList(), value);
      }
    }
  }

  private SignProof() {}

  /** Tries to prove a claim about an expression over the ball. */
  public static Outcome of(Scalar expression, ParameterSpace space, Claim claim) {
    return affine(expression, space, claim).orElseGet(() -> byBisection(expression, space, claim));
  }

  /** Exact decision for affine expressions whose terms carry one common power of pi. */
  private static Optional<Outcome> affine(Scalar expression, ParameterSpace space, Claim claim) {
    Optional<List<ExactNumber>> form = expression.affine(space.parameters().size());
    if (form.isEmpty() || !space.isUncorrelated()) {
      return Optional.empty();
    }
    Optional<ExactNumber> middle = Optional.of(form.get().get(0));
    int m = space.coordinates();
    ExactNumber[] reach = new ExactNumber[m];
    for (int i = 0; i < space.parameters().size(); i++) {
      ExactNumber slope = form.get().get(i + 1).times(space.parameters().get(i).unit().factor());
      ExactNumber part = slope.times(space.exactCentre(i));
      middle = middle.flatMap(sum -> sum.plus(part));
      int j = space.coordinateOf(i);
      if (j >= 0) {
        reach[j] = slope.times(space.halfWidth(i));
      }
    }
    if (middle.isEmpty()) {
      return Optional.empty();
    }
    ExactNumber centre = middle.get();
    for (ExactNumber r : reach) {
      if (r.signum() != 0 && centre.signum() != 0 && r.piPower() != centre.piPower()) {
        return Optional.empty();
      }
    }
    return Optional.of(decide(centre, reach, space.norm(), claim));
  }

  private static Outcome decide(ExactNumber centre, ExactNumber[] reach, Norm norm, Claim claim) {
    int side = claim == Claim.NONNEGATIVE ? 1 : centre.signum();
    int compared = compareWithReach(centre.ratio().abs(), reach, norm);
    boolean mayTouchZero = claim == Claim.NONNEGATIVE;
    boolean onSide = centre.signum() == side || (centre.signum() == 0 && mayTouchZero);
    boolean holds = side != 0 && onSide && (compared > 0 || (compared == 0 && mayTouchZero));
    return holds ? new Outcome.Proved(side) : failure(centre, reach, norm, side == 0 ? 1 : side);
  }

  /** Sign of |centre| - max over the ball of the deviation, exactly. */
  private static int compareWithReach(BigFraction size, ExactNumber[] reach, Norm norm) {
    BigFraction total = BigFraction.ZERO;
    for (ExactNumber r : reach) {
      BigFraction a = r.ratio().abs();
      total =
          switch (norm) {
            case BOX -> total.add(a);
            case DIAMOND -> total.compareTo(a) >= 0 ? total : a;
            case ELLIPSOID -> total.add(a.multiply(a));
          };
    }
    return norm == Norm.ELLIPSOID ? size.multiply(size).compareTo(total) : size.compareTo(total);
  }

  /** The point of the ball where side * expression is smallest. */
  private static Outcome failure(ExactNumber centre, ExactNumber[] reach, Norm norm, int side) {
    int m = reach.length;
    double[] z = new double[m];
    double[] r = new double[m];
    int largest = 0;
    double square = 0;
    for (int j = 0; j < m; j++) {
      r[j] = reach[j].doubleValue();
      square += r[j] * r[j];
      largest = Math.abs(r[j]) > Math.abs(r[largest]) ? j : largest;
    }
    double value = centre.doubleValue();
    for (int j = 0; j < m; j++) {
      z[j] =
          switch (norm) {
            case BOX -> -side * Math.signum(r[j]);
            case DIAMOND -> j == largest ? -side * Math.signum(r[j]) : 0;
            case ELLIPSOID -> square == 0 ? 0 : -side * r[j] / Math.sqrt(square);
          };
      value += r[j] * z[j];
    }
    return Outcome.NotProved.at(z, value);
  }

  private static Outcome byBisection(Scalar expression, ParameterSpace space, Claim claim) {
    int m = space.coordinates();
    Interval[] whole = space.ranges();
    double[] low = new double[m];
    double[] high = new double[m];
    java.util.Arrays.fill(low, -1);
    java.util.Arrays.fill(high, 1);
    double atCentre = expression.value(space.parametersAt(new double[m]));
    int sign = claim == Claim.NONNEGATIVE || atCentre > 0 ? 1 : -1;
    Deque<double[][]> open = new ArrayDeque<>();
    open.push(new double[][] {low, high});
    for (int count = 0; !open.isEmpty(); count++) {
      double[][] box = open.pop();
      double[] centre = new double[m];
      for (int j = 0; j < m; j++) {
        centre[j] = 0.5 * (box[0][j] + box[1][j]);
      }
      Optional<Interval[]> ranges = ranges(space, whole, box);
      if (ranges.isEmpty() || outside(box, space.norm())) {
        continue;
      }
      Interval range = expression.enclosure(ranges.get());
      range = sign > 0 ? range : range.negate();
      if (claim == Claim.NONNEGATIVE ? range.lower() >= 0 : range.lower() > 0) {
        continue;
      }
      double value = expression.value(space.parametersAt(centre));
      boolean inside = !outside(new double[][] {centre, centre}, space.norm());
      if (count >= MOST_BOXES || m == 0 || (inside && !(sign * value > 0))) {
        return Outcome.NotProved.at(centre, value);
      }
      open.addAll(halves(box, expression, space));
    }
    return new Outcome.Proved(sign);
  }

  private static boolean outside(double[][] box, Norm norm) {
    double size = 0;
    for (int j = 0; j < box[0].length; j++) {
      double nearest = Math.max(0, Math.max(box[0][j], -box[1][j]));
      size += norm == Norm.DIAMOND ? nearest : norm == Norm.ELLIPSOID ? nearest * nearest : 0;
    }
    return size > 1 + 1e-9;
  }

  private static List<double[][]> halves(double[][] box, Scalar expression, ParameterSpace space) {
    int m = box[0].length;
    int widest = -1;
    for (int j = 0; j < m; j++) {
      boolean matters = !space.isUncorrelated() || expression.dependsOn(space.parameterOf(j));
      if (matters && (widest < 0 || box[1][j] - box[0][j] > box[1][widest] - box[0][widest])) {
        widest = j;
      }
    }
    int split = Math.max(widest, 0);
    List<double[][]> parts = new ArrayList<>();
    double middle = 0.5 * (box[0][split] + box[1][split]);
    double[] upperOfFirst = box[1].clone();
    upperOfFirst[split] = middle;
    double[] lowerOfSecond = box[0].clone();
    lowerOfSecond[split] = middle;
    parts.add(new double[][] {box[0], upperOfFirst});
    parts.add(new double[][] {lowerOfSecond, box[1]});
    return parts;
  }

  /** Parameter ranges over the part of a box that lies in the ball; empty when there is none. */
  private static Optional<Interval[]> ranges(
      ParameterSpace space, Interval[] whole, double[][] box) {
    Interval[] ranges = new Interval[space.parameters().size()];
    for (int i = 0; i < ranges.length; i++) {
      int j = space.coordinateOf(i);
      Interval range = space.centre(i);
      if (j >= 0) {
        for (int k = 0; k < space.coordinates(); k++) {
          range = range.plus(space.slope(j, k).times(Interval.of(box[0][k], box[1][k])));
        }
        // The exact ends of the whole range keep a zero end at zero.
        double low = Math.max(range.lower(), whole[i].lower());
        double high = Math.min(range.upper(), whole[i].upper());
        if (low > high) {
          return Optional.empty();
        }
        range = Interval.of(low, high);
      }
      ranges[i] = range;
    }
    return Optional.of(ranges);
  }
}
