package blochbound.sample;

/** Where the points come from that are turned into devices. */
public enum SamplePoints {
  /** Independent pseudo-random points. */
  MONTE_CARLO,
  /**
   * A Sobol sequence with one random shift modulo 1: more even coverage, up to 1000 dimensions.
   *
   * <p>Source: I. M. Sobol', USSR Comput. Math. Math. Phys. 7 (1967) 86; R. Cranley, T. N. L.
   * Patterson, SIAM J. Numer. Anal. 13 (1976) 904 (both from memory).
   */
  SOBOL
}
