package blochbound.study;

import blochbound.bound.VerifiedSteadyState;
import blochbound.check.BrokenGuaranteeException;
import blochbound.generator.BlochGenerator;
import blochbound.interval.Interval;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Parameter;
import blochbound.model.ParameterSpace;
import blochbound.model.Requirement.Sense;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Single devices inside the ball, named by decimals, and the values they attain.
 *
 * <p>Values carry the sign of the sense: small is bad.
 */
final class Devices {
  /**
   * A device with its rounded value.
   *
   * @param coordinates coordinates z near the decimals
   * @param point decimals inside the ball
   * @param signed value times sign; NaN when there is none
   */
  record Candidate(double[] coordinates, List<BigDecimal> point, double signed) {}

  /**
   * A device whose value was enclosed where possible.
   *
   * @param point decimals inside the ball
   * @param signed value times sign, inside the enclosure and not below the certified bound
   * @param enclosure proved enclosure of the signed value; empty when the steady state is not
   *     proved unique there
   */
  record Verified(List<BigDecimal> point, double signed, Optional<Interval> enclosure) {}

  private final BlochGenerator generator;
  private final ParameterSpace space;
  private final LocatedMeasure located;
  private final StationaryMeasure evaluator;
  private final int sign;

  Devices(BlochGenerator generator, LocatedMeasure located, Sense sense) {
    this.generator = generator;
    this.located = located;
    space = generator.space();
    evaluator = new StationaryMeasure(generator, located, sense);
    sign = sense.sign();
  }

  Candidate nominal() {
    List<BigDecimal> point = space.parameters().stream().map(Parameter::nominal).toList();
    return at(space.nominalCoordinates(), point);
  }

  /** The device with decimals nearest to the coordinates. */
  Candidate candidate(double[] z) {
    List<BigDecimal> point = space.decimalPointInside(z);
    return at(space.coordinatesOf(point), point);
  }

  private Candidate at(double[] z, List<BigDecimal> point) {
    Interval[] internal = space.internalValues(point);
    double[] p = new double[internal.length];
    for (int i = 0; i < p.length; i++) {
      p[i] = internal[i].middle();
    }
    return new Candidate(z, point, sign * evaluator.valueAt(p));
  }

  /** The one with the smaller signed value; the first when they tie or the second has none. */
  Candidate worse(Candidate first, Candidate second) {
    return second.signed() < first.signed() || Double.isNaN(first.signed()) ? second : first;
  }

  /**
   * Encloses the value of a device and holds it against a certified bound.
   *
   * @throws BrokenGuaranteeException when the whole enclosure lies beyond the bound
   */
  Verified verify(Candidate candidate, double certifiedLower) {
    Optional<Interval> enclosure =
        VerifiedSteadyState.at(generator, space.internalValues(candidate.point()))
            .map(s -> s.enclosure(located, evaluator, generator))
            .map(e -> sign > 0 ? e : e.negate());
    double value = candidate.signed();
    if (enclosure.isPresent()) {
      Interval e = enclosure.get();
      if (e.upper() < certifiedLower) {
        throw new BrokenGuaranteeException(
            "a verified device attains "
                + sign * e.upper()
                + " beyond the certified bound "
                + sign * certifiedLower);
      }
      value = Math.max(e.lower(), Math.min(e.upper(), value));
    }
    // What is left below the bound is the rounding of the value.
    return new Verified(candidate.point(), Math.max(value, certifiedLower), enclosure);
  }

  /** A candidate's value, not below that of the worst device by rounding. */
  double clamp(Candidate candidate, Verified worst) {
    return Math.max(candidate.signed(), worst.signed());
  }

  /** Deviation of each parameter from nominal as a share of its tolerance on that side. */
  List<Double> shares(List<BigDecimal> point) {
    List<Double> shares = new ArrayList<>();
    for (int i = 0; i < point.size(); i++) {
      Parameter p = space.parameters().get(i);
      double deviation = point.get(i).subtract(p.nominal()).doubleValue();
      double width =
          deviation < 0
              ? p.nominal().subtract(p.lower()).doubleValue()
              : p.upper().subtract(p.nominal()).doubleValue();
      shares.add(deviation == 0 ? 0.0 : deviation / width);
    }
    return shares;
  }
}
