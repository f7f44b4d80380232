package blochbound.report;

import blochbound.interval.ExactNumber;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.Ball;
import blochbound.model.Coefficient;
import blochbound.model.DesignCase;
import blochbound.model.Device;
import blochbound.model.Distribution;
import blochbound.model.HilbertSpace;
import blochbound.model.Jump;
import blochbound.model.MeasureSpec;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.Parameter;
import blochbound.model.Requirement;
import blochbound.model.Requirement.Sense;
import blochbound.model.Scalar;
import blochbound.model.Site;
import blochbound.model.Unit;
import blochbound.model.When;
import blochbound.study.CertificationResult;
import blochbound.study.FoundPoint;
import blochbound.study.Guarantee;
import blochbound.study.RequirementResult;
import blochbound.study.SampledTruth;
import blochbound.study.SampledTruth.Quantile;
import blochbound.study.SteadyStateStatus;
import blochbound.study.Verdict;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/** Records written by hand: a pumped emitter with a decay and a shift, and results about it. */
public final class HandMade {
  /** Rate per microsecond, the internal unit. */
  public static final Unit PER_MICROSECOND = new Unit("/us", ExactNumber.ONE, -1);

  /** Microsecond, the internal unit. */
  public static final Unit MICROSECOND = new Unit("us", ExactNumber.ONE, 1);

  private HandMade() {}

  /** A parameter in units per microsecond. */
  public static Parameter parameter(String name, String nominal, String lower, String upper) {
    return new Parameter(
        name,
        new BigDecimal(nominal),
        new BigDecimal(lower),
        new BigDecimal(upper),
        PER_MICROSECOND,
        new Distribution.Uniform());
  }

  /** One emitter of two levels: pump up, decay down, a shift of the upper level. */
  public static Device emitter(Parameter pump, Parameter decay, Parameter shift) {
    HilbertSpace space = new HilbertSpace(List.of(new Site("left", List.of("g", "e"))));
    ComplexMatrix down = ComplexMatrix.unit(2, 0, 1);
    ComplexBall excited = ComplexBall.exact(ComplexMatrix.unit(2, 1, 1));
    OperatorForm hamiltonian =
        OperatorForm.constant(excited).times(Scalar.term(Monomial.parameter(2), Coefficient.ONE));
    OperatorForm lower = OperatorForm.constant(ComplexBall.exact(down));
    return new Device(
        space,
        List.of(pump, decay, shift),
        Ball.unitBox(),
        hamiltonian,
        List.of(
            new Jump(Scalar.parameter(0), lower.adjoint()), new Jump(Scalar.parameter(1), lower)));
  }

  /** The emitter with a pump of 1 +- 20 %, a decay of 0.02 from 0.01 to 0.03, and no shift. */
  public static Device emitter() {
    return emitter(
        parameter("pump", "1.0", "0.8", "1.2"),
        parameter("decay", "0.02", "0.01", "0.03"),
        parameter("shift", "0", "0", "0"));
  }

  /** A requirement on the population of the upper level. */
  public static Requirement requirement(String name, Sense sense, String limit, Unit unit) {
    return new Requirement(
        name,
        "population(left, e)",
        new MeasureSpec.Population(0, List.of(1)),
        sense,
        new BigDecimal(limit),
        unit,
        new When.Steady(),
        Optional.empty());
  }

  /** A point at the ends of pump and decay. */
  public static FoundPoint found(double value) {
    return new FoundPoint(
        value,
        List.of(new BigDecimal("0.8"), new BigDecimal("0.03"), BigDecimal.ZERO),
        List.of(-1.0, 1.0, 0.0),
        true);
  }

  /** A bound by a method called branch and bound. */
  public static Guarantee guarantee(double value) {
    return new Guarantee(value, "dual-observable branch and bound", 15, 0.0234, List.of());
  }

  /** A result with all its values. */
  public static RequirementResult full(
      Requirement requirement, double guaranteed, double found, double nominal, Verdict verdict) {
    return new RequirementResult(
        requirement,
        OptionalDouble.of(nominal),
        Optional.of(found(found)),
        Optional.of(guarantee(guaranteed)),
        Optional.of(
            new SampledTruth(
                20000,
                1,
                found,
                nominal,
                List.of(new Quantile(0.01, found), new Quantile(0.5, nominal)))),
        verdict,
        List.of());
  }

  /** A result without any value. */
  public static RequirementResult empty(Requirement requirement, String remark) {
    return new RequirementResult(
        requirement,
        OptionalDouble.empty(),
        Optional.empty(),
        Optional.empty(),
        Optional.empty(),
        Verdict.UNDECIDED,
        List.of(remark));
  }

  /** A case without requirements of its own. */
  public static DesignCase designCase(String title, Device device) {
    return new DesignCase(title, "us", device, Optional.empty(), List.of(), "00ff");
  }

  /** A result of the emitter with a unique steady state. */
  public static CertificationResult result(Verdict verdict, RequirementResult... requirements) {
    return new CertificationResult(
        designCase("Pumped emitter", emitter()),
        1,
        Optional.of(new SteadyStateStatus(SteadyStateStatus.Kind.UNIQUE, Optional.empty(), "")),
        List.of(requirements),
        verdict,
        false);
  }

  /** A certified result: population at least 0.90. */
  public static CertificationResult certified() {
    return result(
        Verdict.CERTIFIED,
        full(
            requirement("bright", Sense.AT_LEAST, "0.90", Unit.NONE),
            0.9142,
            0.915139,
            0.952747,
            Verdict.CERTIFIED));
  }

  /** The same result with another verdict. */
  public static CertificationResult certifiedBut(Verdict verdict, boolean interrupted) {
    CertificationResult r = certified();
    return new CertificationResult(
        r.designCase(), r.seed(), r.status(), r.requirements(), verdict, interrupted);
  }
}
