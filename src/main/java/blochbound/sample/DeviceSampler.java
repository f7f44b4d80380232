package blochbound.sample;

import blochbound.model.Ball.Norm;
import blochbound.model.ParameterSpace;
import java.util.ArrayList;
import java.util.List;

/**
 * Devices drawn from the declared distributions conditioned on the tolerance ball, as coordinates
 * z; exactly that distribution up to rounding, by rejection.
 *
 * <p>Each parameter has its declared distribution: uniform or triangular over its tolerance range
 * (at radius 1, whatever the radius of the ball), or normal about its nominal value. They are
 * independent, but normal parameters with declared correlations are jointly normal. Candidates come
 * from these distributions, each cut off at the range that the ball leaves to the parameter, and
 * are kept when they lie in the ball; or, where that keeps more, equally likely from the ball and
 * are kept with probability density over largest density. Which of the two is decided by a short
 * trial run that does not depend on the seed.
 *
 * <p>The sequence depends on kind and seed only. {@link #next} may be called by several threads;
 * devices are handed out in the order of the sequence.
 */
public final class DeviceSampler {
  /** Most candidates for each device asked for, on average: beyond, fewer devices are given. */
  public static final int CANDIDATES_PER_DEVICE = 2_000;

  private static final int TRIAL_CANDIDATES = 2_000;

  /** Where candidates come from. */
  public enum Proposal {
    /** From the declared distributions. */
    DECLARED,
    /** Equally likely anywhere in the ball. */
    BALL
  }

  private final DeclaredDistribution declared;
  private final UnitBall ball;
  private final Proposal proposal;
  private final UnitPoints points;
  private final double[] u;
  private final double scale;
  private long candidates;
  private long accepted;

  /**
   * Sampler for a tolerance ball.
   *
   * @throws IllegalArgumentException when a Sobol sequence does not reach the number of parameters
   */
  public DeviceSampler(ParameterSpace space, SamplePoints kind, long seed) {
    this(space, kind, seed, choose(space));
  }

  DeviceSampler(ParameterSpace space, SamplePoints kind, long seed, Proposal proposal) {
    declared = new DeclaredDistribution(space);
    ball = new UnitBall(space.norm(), space.coordinates());
    this.proposal = proposal;
    // The ball needs one number for the radius and one for the decision to keep.
    u = new double[declared.dimension() + (proposal == Proposal.BALL ? 2 : 0)];
    points = u.length == 0 ? v -> {} : UnitPoints.of(kind, u.length, seed);
    scale = proposal == Proposal.BALL ? ball.volume() * declared.peak() : declared.mass();
  }

  private static Proposal choose(ParameterSpace space) {
    if (space.norm() == Norm.BOX || space.coordinates() < 2) {
      return Proposal.DECLARED;
    }
    boolean ballKeepsMore = kept(space, Proposal.BALL) > kept(space, Proposal.DECLARED);
    return ballKeepsMore ? Proposal.BALL : Proposal.DECLARED;
  }

  private static long kept(ParameterSpace space, Proposal proposal) {
    DeviceSampler trial = new DeviceSampler(space, SamplePoints.MONTE_CARLO, 0, proposal);
    trial.draw(TRIAL_CANDIDATES, TRIAL_CANDIDATES);
    return trial.accepted;
  }

  /**
   * The next devices of the sequence.
   *
   * @param count how many are asked for
   * @return that many, or fewer after {@link #CANDIDATES_PER_DEVICE} candidates for each
   */
  public synchronized List<double[]> next(int count) {
    return draw(count, (long) count * CANDIDATES_PER_DEVICE);
  }

  private List<double[]> draw(int count, long most) {
    List<double[]> devices = new ArrayList<>(count);
    for (long k = 0; k < most && devices.size() < count; k++) {
      double[] z = new double[declared.dimension()];
      candidates++;
      if (isKept(z)) {
        accepted++;
        devices.add(z);
      }
    }
    return devices;
  }

  /** Writes the next candidate and decides on it. */
  private boolean isKept(double[] z) {
    points.next(u);
    if (proposal == Proposal.DECLARED) {
      declared.draw(u, z);
      return ball.contains(z);
    }
    ball.point(u, z);
    return ball.contains(z) && u[u.length - 1] <= declared.relativeDensity(z);
  }

  /** Where candidates come from. */
  public Proposal proposal() {
    return proposal;
  }

  /**
   * Probability that a draw of the declared distributions lies in the ball: an estimate from the
   * candidates so far, times factors known in closed form. NaN before the first candidate.
   *
   * <p>For a box, and for uniform parameters drawn from the ball, nothing is left to estimate: all
   * candidates are kept.
   */
  public synchronized double acceptance() {
    return Math.min(1, scale * accepted / candidates);
  }

  /** Number of candidates so far. */
  public synchronized long candidates() {
    return candidates;
  }
}
