package blochbound.model;

import blochbound.check.Check;
import java.math.BigDecimal;
import java.util.List;

/**
 * The set of allowed devices around the nominal one, in normalised coordinates t = (p - p0)/w.
 *
 * @param norm norm of the ball
 * @param radius radius, a positive decimal or zero
 * @param correlations correlations between parameters, for the ellipsoid only
 */
public record Ball(Norm norm, BigDecimal radius, List<Correlation> correlations) {
  /** Shape of the ball. */
  public enum Norm {
    /** Maximum norm: every parameter anywhere inside its own range. */
    BOX("inf"),
    /** Euclidean norm, perhaps with correlations. */
    ELLIPSOID("2"),
    /** Sum norm. */
    DIAMOND("1");

    private final String text;

    Norm(String text) {
      this.text = text;
    }

    /** The norm as the case file writes it. */
    public String text() {
      return text;
    }
  }

  /**
   * Correlation of two parameters.
   *
   * @param first index of the first parameter
   * @param second index of the second parameter
   * @param value correlation coefficient, strictly between -1 and 1
   */
  public record Correlation(int first, int second, BigDecimal value) {
    /** Checks that two parameters are named and that they may differ. */
    public Correlation {
      Check.that(first != second, "a correlation is between two different parameters");
      Check.that(
          value.abs().compareTo(BigDecimal.ONE) < 0,
          "a correlation lies strictly between -1 and 1; parameters that always move together are"
              + " one shared parameter");
    }
  }

  /** Copies the list and checks the radius. */
  public Ball {
    correlations = List.copyOf(correlations);
    Check.that(radius.signum() >= 0, "ball radius must not be negative");
    Check.that(correlations.isEmpty() || norm == Norm.ELLIPSOID, "correlations need the norm 2");
  }

  /** The box of radius 1. */
  public static Ball unitBox() {
    return new Ball(Norm.BOX, BigDecimal.ONE, List.of());
  }
}
