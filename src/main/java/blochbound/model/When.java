package blochbound.model;

import java.math.BigDecimal;

/** The moment at which a requirement must hold. */
public sealed interface When {
  /** In every steady state. */
  record Steady() implements When {}

  /**
   * At one time.
   *
   * @param time the time in {@code unit}
   * @param unit a unit of time
   */
  record At(BigDecimal time, Unit unit) implements When {}

  /** At the end of the sequence. */
  record AtEnd() implements When {}

  /**
   * At all times of an interval.
   *
   * @param from start in {@code fromUnit}
   * @param fromUnit a unit of time
   * @param until end in {@code untilUnit}
   * @param untilUnit a unit of time
   */
  record During(BigDecimal from, Unit fromUnit, BigDecimal until, Unit untilUnit) implements When {}
}
