package blochbound.linalg;

import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Kernels of every region bound: proved norms and eigenvalues of Hermitian matrices. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Fork(1)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
public class SmallMatrixBenchmark {
  private static final int MATRICES = 256;

  /** Levels of the matrices. */
  @Param({"4", "16"})
  public int levels;

  // Many matrices in turn: one matrix repeated would flatter the branch prediction.
  private final Hermitian[] matrices = new Hermitian[MATRICES];
  private int next;

  /** Draws the matrices. */
  @Setup
  public void draw() {
    SplittableRandom random = new SplittableRandom(1);
    for (int i = 0; i < MATRICES; i++) {
      matrices[i] = Matrices.hermitian(random, levels, 0);
    }
  }

  private Hermitian matrix() {
    next = (next + 1) % MATRICES;
    return matrices[next];
  }

  /** Certified spectral norm by trace powers. */
  @Benchmark
  public double spectralNormUp() {
    return SpectralNorm.upperBound(matrix());
  }

  /** Certified smallest eigenvalue by Jacobi rotations and the residual. */
  @Benchmark
  public double smallestEigenvalueDown() {
    return matrix().eigen().smallest().lower();
  }

  /** Product of two balls with its error bound. */
  @Benchmark
  public double ballProduct() {
    ComplexBall ball = ComplexBall.exact(matrix().matrix());
    return ball.times(ball).radius();
  }
}
