package blochbound.search;

/**
 * Where a run of a search began.
 *
 * @param origin kind of start
 * @param ordinal position among the starts of that kind, from 0
 */
public record SearchStart(Origin origin, int ordinal) {
  /** Kinds of starts. */
  public enum Origin {
    /** The centre of the ball. */
    CENTRE,
    /** A start that the caller gave. */
    GIVEN,
    /** The corner of the box or diamond that the gradient points to. */
    GRADIENT_VERTEX,
    /** A random point of the ball. */
    RANDOM,
    /** The vertex that the gradient at a random point of a box points to. */
    RANDOM_VERTEX,
    /** One of many random points that were evaluated once. */
    DRAWN,
    /** One of the best of the points drawn. */
    SCREENED,
    /** Covariance matrix adaptation. */
    EVOLUTION,
    /** Coordinate flips from the best point of all other runs. */
    FLIPPED_BEST
  }
}
