package blochbound.bench;

import blochbound.generator.BlochGenerator;
import blochbound.generator.SteadyStateSolver;
import blochbound.sample.DeviceSampler;
import blochbound.sample.LaneSolver;
import blochbound.sample.SamplePoints;
import java.util.List;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/**
 * Steady states of random devices, assembling included, in lanes and one by one; one thread.
 *
 * <p>Times are for one steady state. The devices differ from call to call. The lowest percentile
 * (p0.00) is the figure to compare on a machine that is not quiet. The counterpart in another
 * language is src/bench/python/steady_states.py.
 */
@State(Scope.Thread)
@BenchmarkMode(Mode.SampleTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 3, time = 2)
@Measurement(iterations = 4, time = 2)
@Fork(1)
public class SteadyStateBenchmark {
  private static final int DEVICES = 128;
  private static final int SETS = 16;

  @Param({"chain1", "chain2", "chain3", "chain4", "full4", "full8"})
  String device = "";

  private LaneSolver lanes = new LaneSolver(BenchDevices.named("chain1"));
  private BlochGenerator generator = BenchDevices.named("chain1");
  private SteadyStateSolver single = new SteadyStateSolver(generator);
  private List<double[]> devices = List.of();
  private int next;

  /** Draws all devices. */
  @Setup
  public void draw() {
    generator = BenchDevices.named(device);
    lanes = new LaneSolver(generator);
    single = new SteadyStateSolver(generator);
    devices =
        new DeviceSampler(generator.space(), SamplePoints.MONTE_CARLO, 1).next(DEVICES * SETS);
  }

  private List<double[]> nextSet() {
    next = (next + 1) % SETS;
    return devices.subList(next * DEVICES, (next + 1) * DEVICES);
  }

  /** All devices of a set at once, or in the batches that the solver takes. */
  @Benchmark
  @OperationsPerInvocation(DEVICES)
  public boolean inLanes() {
    List<double[]> set = nextSet();
    for (int from = 0; from < DEVICES; from += lanes.lanes()) {
      lanes.solve(set.subList(from, from + lanes.lanes()));
    }
    return lanes.isUnique(0);
  }

  /** One device after the other, with pivoting. */
  @Benchmark
  @OperationsPerInvocation(DEVICES)
  public boolean oneByOne() {
    boolean isUnique = true;
    for (double[] z : nextSet()) {
      isUnique &= single.solve(generator.space().parametersAt(z));
    }
    return isUnique;
  }
}
