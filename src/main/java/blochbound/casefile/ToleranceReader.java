package blochbound.casefile;

import blochbound.casefile.YamlNode.Sequence;
import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.List;
import java.util.Optional;

/** Reads {@code tolerance} or {@code range} of a parameter into decimals of its own unit. */
final class ToleranceReader {
  private static final BigDecimal HUNDRED = BigDecimal.valueOf(100);

  /**
   * Ends of the tolerance range in the unit of the nominal value.
   *
   * @param lower lower end
   * @param upper upper end
   */
  record Range(BigDecimal lower, BigDecimal upper) {}

  private final QuantityReader quantities;

  ToleranceReader(QuantityReader quantities) {
    this.quantities = quantities;
  }

  /** The range of a parameter; without one it is constant. */
  Range range(Fields fields, Quantity nominal) {
    Optional<YamlNode> range = fields.node("range");
    Optional<YamlScalar> tolerance =
        fields.scalar("tolerance", "a tolerance such as 20 %, 8 kHz or +10 % -5 %");
    if (range.isPresent() && tolerance.isPresent()) {
      throw FaultSignal.of(
          range.get().fault("a parameter has either `tolerance` or `range`, not both"));
    }
    if (range.isPresent()) {
      return range(range.get(), nominal);
    }
    return tolerance
        .map(t -> tolerance(t.passage(), nominal))
        .orElseGet(() -> new Range(nominal.value(), nominal.value()));
  }

  private Range range(YamlNode node, Quantity nominal) {
    Sequence ends = node.asSequence("a range as [lowest, highest]");
    if (ends.items().size() != 2) {
      throw FaultSignal.of(ends.fault("a range has two ends, as in [lowest, highest]"));
    }
    BigDecimal lower = end(ends.items().get(0), nominal, RoundingMode.FLOOR);
    BigDecimal upper = end(ends.items().get(1), nominal, RoundingMode.CEILING);
    if (lower.compareTo(upper) > 0) {
      throw FaultSignal.of(ends.fault("the ends of the range are in the wrong order"));
    }
    if (lower.compareTo(nominal.value()) > 0 || nominal.value().compareTo(upper) > 0) {
      throw FaultSignal.of(ends.fault("the range must contain the nominal value " + text(nominal)));
    }
    return new Range(lower, upper);
  }

  private BigDecimal end(YamlNode node, Quantity nominal, RoundingMode mode) {
    YamlScalar scalar = node.asScalar("an end of the range");
    Quantity end = quantities.one(scalar);
    requireSameDimension(end, nominal, scalar.passage(), "an end of the range");
    return UnitConversion.convert(end.value(), end.unit(), nominal.unit(), mode);
  }

  private Range tolerance(Passage passage, Quantity nominal) {
    List<Quantity> parts = quantities.all(passage, QuantityReader.Percent.ALLOWED);
    if (parts.size() == 1) {
      if (parts.get(0).value().signum() < 0) {
        throw passage.fault("a tolerance must not be negative; write 5 %, or +0 % -5 %");
      }
      BigDecimal width = width(parts.get(0), nominal, passage);
      return new Range(nominal.value().subtract(width), nominal.value().add(width));
    }
    String text = passage.scalar().text();
    boolean bothSigned =
        parts.size() == 2
            && text.charAt(parts.get(0).at()) != text.charAt(parts.get(1).at())
            && "+-".indexOf(text.charAt(parts.get(0).at())) >= 0;
    if (!bothSigned) {
      throw passage.fault(
          parts.get(1).at(), "a tolerance is x %, a quantity, or two sides as in +10 % -5 %");
    }
    boolean upFirst = text.charAt(parts.get(0).at()) == '+';
    BigDecimal up = width(parts.get(upFirst ? 0 : 1), nominal, passage);
    BigDecimal down = width(parts.get(upFirst ? 1 : 0), nominal, passage);
    return new Range(nominal.value().subtract(down), nominal.value().add(up));
  }

  /** Size of a tolerance in the unit of the nominal value. */
  private BigDecimal width(Quantity tolerance, Quantity nominal, Passage passage) {
    BigDecimal size = tolerance.value().abs();
    if (tolerance.isPercent()) {
      if (nominal.value().signum() == 0) {
        throw passage.fault(
            tolerance.at(), "% of a nominal value of 0 is nothing; give the tolerance with a unit");
      }
      return size.multiply(nominal.value().abs()).divide(HUNDRED);
    }
    requireSameDimension(tolerance, nominal, passage, "the tolerance");
    return UnitConversion.convert(size, tolerance.unit(), nominal.unit(), RoundingMode.CEILING);
  }

  /** Checks that a quantity has the dimension of the nominal value. */
  void requireSameDimension(Quantity q, Quantity nominal, Passage passage, String what) {
    Dimension wanted = Dimension.of(nominal.unit());
    if (!Dimension.of(q.unit()).equals(wanted)) {
      String hint =
          nominal.value().signum() == 0 && nominal.unit().symbol().isEmpty()
              ? "; write the nominal value with its unit, too, as in 0 kHz"
              : "";
      throw passage.fault(
          q.at(),
          what
              + " is "
              + Dimension.of(q.unit())
              + " but the nominal value "
              + text(nominal)
              + " is "
              + wanted
              + hint);
    }
  }

  private static String text(Quantity q) {
    return (q.value() + " " + q.unit().symbol()).trim();
  }
}
