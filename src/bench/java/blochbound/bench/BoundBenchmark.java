package blochbound.bench;

import blochbound.bound.BranchAndBound;
import blochbound.bound.BranchOptions;
import blochbound.bound.BranchOutcome;
import blochbound.bound.CellBound;
import blochbound.bound.SteadyCellBound;
import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.Measures;
import blochbound.measure.StationaryMeasure;
import blochbound.model.DesignCase;
import blochbound.model.Region;
import blochbound.model.Requirement;
import java.time.Duration;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Times of the bound: whole brackets and single regions. */
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MILLISECONDS)
@Fork(1)
@Warmup(iterations = 4, time = 2)
@Measurement(iterations = 6, time = 2)
@State(Scope.Thread)
public class BoundBenchmark {
  private final Problem pair10 = new Problem(BenchCases.pair(10, 1));
  private final Problem chain4 = new Problem(BenchCases.chain(4, 4));
  private final CellBound sixParameters = new Problem(BenchCases.pair(6, 1)).cells(2);
  private final SplittableRandom random = new SplittableRandom(1);

  /** A case with everything made that does not depend on the bound. */
  static final class Problem {
    private final BlochGenerator generator;
    private final LocatedMeasure measure;
    private final Requirement requirement;
    private final double nominal;

    Problem(DesignCase designCase) {
      generator = BlochGenerator.stationary(designCase.device());
      requirement = designCase.requirements().get(0);
      measure = Measures.of(requirement.measure(), designCase.device().space());
      nominal =
          new StationaryMeasure(generator, measure, requirement.sense())
              .value(generator.space().nominalCoordinates());
    }

    CellBound cells(int order) {
      return new SteadyCellBound(generator, measure, requirement.sense(), order);
    }

    int suitableOrder() {
      return SteadyCellBound.suitableOrder(generator);
    }

    BranchOutcome bracket(double gap, double relativeGap, int order, int threads) {
      return BranchAndBound.minimise(
          () -> cells(order),
          generator.space().coordinates(),
          generator.space().norm(),
          new BranchOptions(
              gap, relativeGap, nominal, Double.NaN, Duration.ofMinutes(2), 1_000_000, threads),
          BranchAndBound.Start.none(),
          new AtomicBoolean());
    }
  }

  /** Pair, 10 parameters, concurrence to 1e-3, K = 2, two threads. */
  @Benchmark
  public BranchOutcome pairOrder2() {
    return pair10.bracket(1e-3, 0, 2, 2);
  }

  /** The same with K = 3. */
  @Benchmark
  public BranchOutcome pairOrder3() {
    return pair10.bracket(1e-3, 0, 3, 2);
  }

  /** One region of the pair with 6 parameters, concurrence, K = 2, one thread. */
  @Benchmark
  @OutputTimeUnit(TimeUnit.MICROSECONDS)
  public CellBound.Cell regionOrder2() {
    double[] centre = new double[6];
    double[] half = new double[6];
    for (int j = 0; j < 6; j++) {
      centre[j] = random.nextDouble() - 0.5;
      half[j] = 0.25;
    }
    return sixParameters.bound(new Region(centre, half), Double.POSITIVE_INFINITY);
  }

  /** Four two-level sites, 4 parameters at 10 %, to 1 % of the loss, two threads. */
  @Benchmark
  public BranchOutcome fourSites() {
    return chain4.bracket(Double.POSITIVE_INFINITY, 0.01, chain4.suitableOrder(), 2);
  }
}
