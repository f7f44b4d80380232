package blochbound.measure;

import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Hermitian;
import blochbound.model.HilbertSpace;
import blochbound.model.MeasureSpec;
import blochbound.model.Site;
import blochbound.model.StateSpec;
import java.math.BigDecimal;
import java.util.List;
import org.junit.jupiter.api.Nested;

/** The contract of measures, run by every implementation. */
class MeasureContractTest {
  private static final Site TWO = new Site("left", List.of("g", "e"));
  private static final Site OTHER = new Site("right", List.of("g", "e"));
  private static final Site THREE = new Site("shelf", List.of("g", "e", "f"));
  static final HilbertSpace PAIR = new HilbertSpace(List.of(TWO, OTHER));
  static final HilbertSpace UNEVEN = new HilbertSpace(List.of(TWO, THREE));

  /** The exact density matrix (|gg> + |ee>)(<gg| + <ee|)/4 + |ge><ge|/4 + 1/16. */
  static final Hermitian MIXED =
      new Hermitian(
          ComplexMatrix.real(
              new double[][] {
                {0.3125, 0, 0, 0.25}, {0, 0.3125, 0, 0}, {0, 0, 0.0625, 0}, {0.25, 0, 0, 0.3125}
              }));

  /** The exact density matrix of rank two (3 |gg><gg| + |e,-><e,-| ...)/4. */
  static final Hermitian SINGULAR =
      new Hermitian(
          ComplexMatrix.real(
              new double[][] {
                {0.75, 0, 0, 0}, {0, 0, 0, 0}, {0, 0, 0.125, -0.125}, {0, 0, -0.125, 0.125}
              }));

  /** The exact pure state (|gg> + |ge> + |eg> - |ee>)/2. */
  static final ComplexMatrix KET = ComplexMatrix.real(new double[][] {{0.5}, {0.5}, {0.5}, {-0.5}});

  static Measure measure(MeasureSpec spec, HilbertSpace space) {
    return Measures.of(spec, space).measure();
  }

  static StateSpec mixed(Hermitian state) {
    return new StateSpec.Mixed(ComplexBall.exact(state.matrix()));
  }

  static StateSpec pure(ComplexMatrix ket) {
    return new StateSpec.Pure(ComplexBall.exact(ket));
  }

  static PreciseMatrix projector(ComplexMatrix ket) {
    return PreciseMatrix.of(ket.times(ket.adjoint()));
  }

  @Nested
  class MeanContract extends MeasureContract {
    private final Hermitian observable = new ExactStates(99, 2, 2).noise(3);

    @Override
    Measure measure() {
      return MeasureContractTest.measure(
          new MeasureSpec.Mean(ComplexBall.exact(observable.matrix())), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMatrix.of(observable).inner(state);
    }

    @Override
    double lowerLoss() {
      return 1e-15;
    }

    @Override
    double upperLoss() {
      return 1e-15;
    }
  }

  @Nested
  class PureFidelityContract extends MeasureContract {
    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.Fidelity(pure(KET)), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return projector(KET).inner(state);
    }

    @Override
    double lowerLoss() {
      return 1e-14;
    }

    @Override
    double upperLoss() {
      return 1e-14;
    }
  }

  abstract static class MixedFidelityContract extends MeasureContract {
    abstract Hermitian reference();

    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.Fidelity(mixed(reference())), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.fidelity(state, PreciseMatrix.of(reference()));
    }

    @Override
    double lowerLoss() {
      return 2e-6;
    }

    @Override
    double upperLoss() {
      return 2e-6;
    }
  }

  @Nested
  class FullRankFidelityContract extends MixedFidelityContract {
    @Override
    Hermitian reference() {
      return MIXED;
    }
  }

  @Nested
  class SingularFidelityContract extends MixedFidelityContract {
    @Override
    Hermitian reference() {
      return SINGULAR;
    }
  }

  @Nested
  class ConcurrenceContract extends MeasureContract {
    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.Concurrence(1, 0), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.concurrence(state);
    }

    @Override
    double lowerLoss() {
      return 1e-5;
    }

    @Override
    double upperLoss() {
      return 2e-4;
    }
  }

  @Nested
  class NegativityContract extends MeasureContract {
    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.Negativity(List.of(1)), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.negativity(state, 2);
    }

    @Override
    double lowerLoss() {
      return 1e-13;
    }

    @Override
    double upperLoss() {
      return 1e-13;
    }
  }

  @Nested
  class UnevenNegativityContract extends MeasureContract {
    @Override
    int[] factors() {
      return new int[] {2, 3};
    }

    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.Negativity(List.of(0)), UNEVEN);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.negativity(state, 3);
    }

    @Override
    double lowerLoss() {
      return 1e-13;
    }

    @Override
    double upperLoss() {
      return 1e-12;
    }
  }

  @Nested
  class PurityContract extends MeasureContract {
    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.Purity(), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.purity(state);
    }

    @Override
    double lowerLoss() {
      return 1e-14;
    }

    @Override
    double upperLoss() {
      return 1e-14;
    }
  }

  @Nested
  class TraceDistanceContract extends MeasureContract {
    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.TraceDistance(mixed(MIXED)), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.traceDistance(state, PreciseMatrix.of(MIXED));
    }

    @Override
    double lowerLoss() {
      return 1e-13;
    }

    @Override
    double upperLoss() {
      return 1e-13;
    }
  }

  @Nested
  class PureTraceDistanceContract extends MeasureContract {
    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.TraceDistance(pure(KET)), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.traceDistance(state, projector(KET));
    }

    @Override
    double lowerLoss() {
      return 1e-13;
    }

    @Override
    double upperLoss() {
      return 1e-13;
    }
  }

  @Nested
  class EntropyContract extends MeasureContract {
    @Override
    Measure measure() {
      return MeasureContractTest.measure(new MeasureSpec.Entropy(), PAIR);
    }

    @Override
    BigDecimal precise(PreciseMatrix state) {
      return PreciseMeasures.entropy(state);
    }

    @Override
    double lowerLoss() {
      return 1e-10;
    }

    @Override
    double upperLoss() {
      return 1e-10;
    }
  }
}
