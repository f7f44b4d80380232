package blochbound.sample;

import static blochbound.sample.LaneArithmetic.LANES;

import blochbound.check.Check;
import blochbound.generator.BlochGenerator;
import blochbound.generator.SteadyStateSolver;
import blochbound.interval.Rounding;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/**
 * Steady states of many devices at once: estimates, each with a checked residual. Workspace for one
 * thread.
 *
 * <p>All devices of a batch are factored in step, in the pivot order of the nominal device and with
 * the sparsity of the generator known beforehand. A lane is solved again by {@link
 * SteadyStateSolver}, which pivots for itself, when its multipliers exceed {@link #GROWTH_LIMIT},
 * its pivots spread beyond {@link #SPREAD_LIMIT}, or its residual |L r| exceeds 8 n u times the sum
 * of |mu_j| |M_j| (Frobenius norms, u the unit roundoff, n unknowns). A lane that is singular there
 * is marked as not unique. Generators whose factors fill too much are solved one by one.
 */
public final class LaneSolver {
  /**
   * Root of the sum of the squared multipliers above which a lane is solved again.
   *
   * <p>Below, a zero pivot is hidden by rounding to at most about 1e5 u = 1e-11 of the others,
   * which {@link #SPREAD_LIMIT} sees; what accuracy growth costs is seen by the residual.
   */
  public static final double GROWTH_LIMIT = 1e5;

  /** Ratio of pivots above which a lane is solved again: only such a lane may be not unique. */
  public static final double SPREAD_LIMIT = 1e9;

  /** Most unknowns for which a pivot order is planned. */
  static final int LARGEST_PLANNED = 400;

  /** Most factor entries, one kibibyte each: beyond, one device at a time is faster. */
  static final int MOST_ENTRIES = 32_768;

  /** Unknowns up to which lanes are faster even without any sparsity. */
  static final int ALWAYS_IN_LANES = 100;

  private static final int ONE_BY_ONE = 4;

  private final BlochGenerator generator;
  private final SteadyStateSolver single;
  private final LaneCoefficients coefficients;
  private final Optional<LaneProgram> program;
  private final Optional<LaneKernel> kernel;
  private final double[] termNorms;
  private final double[][] states;
  private final boolean[] unique;
  private long solvedAgain;

  /** Plans the pivot order for a generator. */
  public LaneSolver(BlochGenerator generator) {
    this(
        generator,
        generator.unknowns() > LARGEST_PLANNED
            ? Optional.empty()
            : LaneProgram.of(generator).filter(LaneSolver::paysOff));
  }

  /** Solver by a given program, or one device at a time without one. */
  LaneSolver(BlochGenerator generator, Optional<LaneProgram> program) {
    this.generator = generator;
    this.program = program;
    single = new SteadyStateSolver(generator);
    coefficients = new LaneCoefficients(generator);
    kernel = program.map(LaneKernel::new);
    termNorms = generator.terms().stream().mapToDouble(t -> t.matrix().frobeniusUp()).toArray();
    states = new double[generator.unknowns() + 1][lanes()];
    unique = new boolean[lanes()];
    Arrays.fill(states[0], 1 / Math.sqrt(generator.basis().levels()));
  }

  /** Tells whether lanes are faster than one device at a time; the limits are measured. */
  private static boolean paysOff(LaneProgram program) {
    double n = program.size();
    return program.entries() <= MOST_ENTRIES
        && (n <= ALWAYS_IN_LANES || 2.0 * program.left().length <= n * n * n / 3);
  }

  /** Another workspace with the same plan, for another thread. */
  public LaneSolver another() {
    return new LaneSolver(generator, program);
  }

  /** Largest number of devices in a batch. */
  public int lanes() {
    return program.isPresent() ? LANES : ONE_BY_ONE;
  }

  /**
   * Solves a batch of devices.
   *
   * @param devices coordinates z of 1 to {@link #lanes} devices; device l is lane l
   */
  public void solve(List<double[]> devices) {
    Check.that(
        !devices.isEmpty() && devices.size() <= lanes(),
        "a batch has 1 to " + lanes() + " devices");
    kernel.ifPresent(k -> solveTogether(k, devices));
    for (int l = 0; l < devices.size(); l++) {
      if (kernel.isEmpty() || !isTrusted(kernel.get(), l)) {
        solveAgain(l, devices.get(l));
      } else {
        unique[l] = true;
      }
    }
  }

  private void solveTogether(LaneKernel lanes, List<double[]> devices) {
    coefficients.set(devices);
    lanes.solve(coefficients.values());
    LaneProgram order = program.orElseThrow();
    for (int i = 0; i < order.size(); i++) {
      System.arraycopy(lanes.unknown(i), 0, states[order.unknownOf(i) + 1], 0, LANES);
    }
  }

  /** Comparisons are written so that NaN is not trusted. */
  private boolean isTrusted(LaneKernel lanes, int lane) {
    double size = 0;
    for (int t = 0; t < termNorms.length; t++) {
      size += Math.abs(coefficients.values()[t][lane]) * termNorms[t];
    }
    double limit = 8 * generator.unknowns() * Rounding.UNIT * size;
    return lanes.growth(lane) <= GROWTH_LIMIT
        && lanes.pivotSpread(lane) <= SPREAD_LIMIT
        && lanes.residual(lane) <= limit;
  }

  private void solveAgain(int lane, double[] z) {
    solvedAgain++;
    unique[lane] = single.solve(generator.space().parametersAt(z));
    for (int k = 1; k < states.length; k++) {
      states[k][lane] = unique[lane] ? single.state()[k] : Double.NaN;
    }
  }

  /** Tells whether the steady state of a lane of the batch solved last is unique to rounding. */
  public boolean isUnique(int lane) {
    return unique[lane];
  }

  /**
   * Writes the Bloch coordinates of a lane's steady state, r_0 = 1/sqrt(N) first; all others are
   * NaN where it is not unique.
   */
  public void state(int lane, double[] out) {
    for (int k = 0; k < out.length; k++) {
      out[k] = states[k][lane];
    }
  }

  /** Number of devices so far that {@link SteadyStateSolver} had to solve. */
  public long solvedAgain() {
    return solvedAgain;
  }

  /** Number of stored factor entries, or -1 when devices are solved one by one. */
  int entries() {
    return program.map(LaneProgram::entries).orElse(-1);
  }
}
