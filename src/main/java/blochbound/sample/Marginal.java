package blochbound.sample;

import blochbound.model.Distribution;
import blochbound.model.Parameter;
import org.apache.commons.math3.special.Erf;

/**
 * The declared distribution of one parameter in its share s: -1 and 1 are the ends of the range
 * that the ball gives it, cut off there.
 *
 * <p>The declared distribution itself does not depend on the radius of the ball: its support is the
 * tolerance range at radius 1.
 */
interface Marginal {
  /** Probability of the range under the distribution before it is cut off. */
  double mass();

  /** Inverse distribution function of the distribution cut off at the range, u in (0, 1). */
  double quantile(double u);

  /** Density before the cut, divided by {@link #peak}. */
  double relativeDensity(double s);

  /** Largest density, which is reached at the nominal value. */
  double peak();

  /**
   * The marginal of a parameter.
   *
   * @param low share of the lower end of its tolerance range
   * @param nominal share of its nominal value
   * @param high share of the upper end
   */
  static Marginal of(Parameter p, double low, double nominal, double high) {
    if (p.distribution() instanceof Distribution.Normal normal) {
      double perUnit = (high - low) / p.upper().subtract(p.lower()).doubleValue();
      return Normal.of(nominal, normal.sigma() * perUnit);
    }
    return p.distribution() instanceof Distribution.Triangular
        ? new Triangular(low, nominal, high)
        : new Uniform(low, high);
  }

  private static double clamp(double s) {
    return Math.max(-1, Math.min(1, s));
  }

  /** Equally likely between two shares. */
  record Uniform(double low, double high) implements Marginal {
    @Override
    public double mass() {
      return Math.min(1, (clamp(high) - clamp(low)) / (high - low));
    }

    @Override
    public double quantile(double u) {
      return clamp(low) + u * (clamp(high) - clamp(low));
    }

    @Override
    public double relativeDensity(double s) {
      return s >= low && s <= high ? 1 : 0;
    }

    @Override
    public double peak() {
      return 1 / (high - low);
    }
  }

  /** Density rising linearly from {@code low} to {@code mode} and falling to {@code high}. */
  record Triangular(double low, double mode, double high) implements Marginal {
    /** Probability of values up to s. */
    private double distribution(double s) {
      double x = Math.max(low, Math.min(high, s));
      return x < mode
          ? (x - low) * (x - low) / ((high - low) * (mode - low))
          : high == mode ? 1 : 1 - (high - x) * (high - x) / ((high - low) * (high - mode));
    }

    @Override
    public double mass() {
      return distribution(1) - distribution(-1);
    }

    @Override
    public double quantile(double u) {
      double q = distribution(-1) + u * mass();
      double s =
          q < (mode - low) / (high - low)
              ? low + Math.sqrt(q * (high - low) * (mode - low))
              : high - Math.sqrt(Math.max(0, 1 - q) * (high - low) * (high - mode));
      return clamp(s);
    }

    @Override
    public double relativeDensity(double s) {
      if (s < low || s > high) {
        return 0;
      }
      return s == mode ? 1 : s < mode ? (s - low) / (mode - low) : (high - s) / (high - mode);
    }

    @Override
    public double peak() {
      return 2 / (high - low);
    }
  }

  /**
   * Normal.
   *
   * @param mean mean
   * @param sigma standard deviation
   * @param lowErf error function of the scaled distance of -1 from the mean
   * @param highErf the same for 1
   */
  record Normal(double mean, double sigma, double lowErf, double highErf) implements Marginal {
    private static final double ROOT_2 = Math.sqrt(2);

    static Normal of(double mean, double sigma) {
      // The error function is centred at the mean, so a sigma far wider than the range loses
      // nothing.
      return new Normal(
          mean,
          sigma,
          Erf.erf((-1 - mean) / (sigma * ROOT_2)),
          Erf.erf((1 - mean) / (sigma * ROOT_2)));
    }

    /** Inverse distribution function of the standard normal distribution. */
    static double standardQuantile(double u) {
      return ROOT_2 * Erf.erfInv(2 * u - 1);
    }

    @Override
    public double mass() {
      return 0.5 * (highErf - lowErf);
    }

    @Override
    public double quantile(double u) {
      return clamp(mean + sigma * ROOT_2 * Erf.erfInv(lowErf + u * (highErf - lowErf)));
    }

    @Override
    public double relativeDensity(double s) {
      double x = (s - mean) / sigma;
      return Math.exp(-0.5 * x * x);
    }

    @Override
    public double peak() {
      return 1 / (sigma * Math.sqrt(2 * Math.PI));
    }
  }
}
