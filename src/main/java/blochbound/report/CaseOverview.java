package blochbound.report;

import blochbound.generator.BlochGenerator;
import blochbound.generator.SteadyStateSolver;
import blochbound.linalg.Hermitian;
import blochbound.measure.Measures;
import blochbound.measure.StationaryMeasure;
import blochbound.model.DesignCase;
import blochbound.model.MeasureSpec;
import blochbound.model.Requirement;
import blochbound.model.When;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.stream.IntStream;

/**
 * What {@code show} tells about a case beyond its file: the generator and the nominal device's
 * steady state, all rounded values.
 *
 * @param designCase the case
 * @param generator the Bloch generator, exactly as the case is written
 * @param steadyState steady state of the nominal device; empty when it is not unique
 * @param nominalValues nominal values of the requirements in their units; empty where the
 *     requirement is not about the steady state
 */
public record CaseOverview(
    DesignCase designCase,
    BlochGenerator generator,
    Optional<SteadyState> steadyState,
    List<OptionalDouble> nominalValues) {
  /** Copies the list. */
  public CaseOverview {
    nominalValues = List.copyOf(nominalValues);
  }

  /**
   * A steady state.
   *
   * @param purity tr(rho^2)
   * @param populations probabilities of the basis states, largest first
   */
  public record SteadyState(double purity, List<Population> populations) {
    /** Copies the list. */
    public SteadyState {
      populations = List.copyOf(populations);
    }
  }

  /**
   * Probability of a basis state.
   *
   * @param index index of the basis state
   * @param probability its probability
   */
  public record Population(int index, double probability) {}

  /** Overview of a case. */
  public static CaseOverview of(DesignCase designCase) {
    BlochGenerator generator = BlochGenerator.of(designCase.device());
    return new CaseOverview(
        designCase,
        generator,
        steadyState(generator),
        designCase.requirements().stream().map(r -> nominal(designCase, generator, r)).toList());
  }

  private static Optional<SteadyState> steadyState(BlochGenerator generator) {
    SteadyStateSolver solver = new SteadyStateSolver(generator);
    double[] z = generator.space().nominalCoordinates();
    if (!solver.solve(generator.space().parametersAt(z))) {
      return Optional.empty();
    }
    Hermitian state = generator.basis().matrix(solver.state());
    List<Population> populations =
        IntStream.range(0, state.size())
            .mapToObj(i -> new Population(i, state.re(i, i)))
            .sorted(Comparator.comparingDouble(Population::probability).reversed())
            .toList();
    return Optional.of(new SteadyState(state.inner(state), populations));
  }

  private static OptionalDouble nominal(
      DesignCase designCase, BlochGenerator generator, Requirement requirement) {
    if (!(requirement.when() instanceof When.Steady) || !isOfState(requirement.measure())) {
      return OptionalDouble.empty();
    }
    StationaryMeasure measure =
        new StationaryMeasure(
            generator,
            Measures.of(requirement.measure(), designCase.device().space()),
            requirement.sense());
    double value = measure.value(generator.space().nominalCoordinates());
    return measure.wasUnique()
        ? OptionalDouble.of(value / requirement.unit().factor().doubleValue())
        : OptionalDouble.empty();
  }

  private static boolean isOfState(MeasureSpec measure) {
    return !(measure instanceof MeasureSpec.Gap
        || measure instanceof MeasureSpec.Settling
        || measure instanceof MeasureSpec.GateFidelity);
  }
}
