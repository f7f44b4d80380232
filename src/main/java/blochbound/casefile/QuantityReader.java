package blochbound.casefile;

import blochbound.interval.ExactNumber;
import blochbound.model.Unit;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Reads numbers with units, such as {@code 1.0 /us}, {@code 8 kHz} or {@code +10 % -5 %}. */
final class QuantityReader {
  /** Whether a quantity may be relative. */
  enum Percent {
    /** Only absolute quantities. */
    FORBIDDEN,
    /** Per cent, too. */
    ALLOWED
  }

  private static final Pattern UNIT =
      Pattern.compile("\\s*(%|(?:(?:1|rad)?\\s*/\\s*)?[A-Za-z]+|)\\s*");
  private static final double LARGEST = 1e300;

  private final UnitTable units;

  QuantityReader(UnitTable units) {
    this.units = units;
  }

  /** The units of the case. */
  UnitTable units() {
    return units;
  }

  /** Exactly one quantity without per cent. */
  Quantity one(YamlScalar scalar) {
    return one(scalar.passage());
  }

  /** Exactly one quantity without per cent. */
  Quantity one(Passage passage) {
    List<Quantity> all = all(passage, Percent.FORBIDDEN);
    if (all.size() > 1) {
      throw passage.fault(all.get(1).at(), "expected one number with a unit, not several");
    }
    return all.get(0);
  }

  /** Exactly one pure number. */
  BigDecimal pureNumber(YamlScalar scalar, String what) {
    Quantity q = one(scalar);
    if (!q.unit().symbol().isEmpty()) {
      throw scalar.passage().fault(what + " is a number without a unit");
    }
    return q.value();
  }

  /** Exactly one quantity of the given dimension; {@code what} names it in messages. */
  Quantity of(Dimension dimension, YamlScalar scalar, String what) {
    Quantity q = one(scalar);
    Dimension wanted = units.isDimensionless() ? Dimension.NONE : dimension;
    if (!Dimension.of(q.unit()).equals(wanted)) {
      throw scalar
          .passage()
          .fault(what + " must be " + wanted + ", not " + Dimension.of(q.unit()) + example(wanted));
    }
    return q;
  }

  private static String example(Dimension dimension) {
    return dimension.equals(Dimension.RATE)
        ? "; write a unit such as /us or kHz"
        : dimension.equals(Dimension.TIME) ? "; write a unit such as us" : "";
  }

  /** One or more quantities that stand one behind the other, each further one with a sign. */
  List<Quantity> all(Passage passage, Percent percent) {
    String text = passage.scalar().text();
    List<Quantity> found = new ArrayList<>();
    int position = passage.from();
    do {
      int at = position;
      boolean signed = position < passage.to() && "+-".indexOf(text.charAt(position)) >= 0;
      boolean negative = signed && text.charAt(position) == '-';
      position = skipBlanks(text, signed ? position + 1 : position, passage.to());
      Matcher number = DecimalText.UNSIGNED.matcher(text).region(position, passage.to());
      if (!number.lookingAt() || (!found.isEmpty() && !signed)) {
        throw noNumber(passage, at);
      }
      Optional<String> complaint = DecimalText.complaint(number.group());
      if (complaint.isPresent()) {
        throw passage.fault(position, complaint.get());
      }
      BigDecimal value = DecimalText.value(number.group());
      Matcher unit = UNIT.matcher(text).region(number.end(), passage.to());
      unit.lookingAt();
      found.add(quantity(passage, negative ? value.negate() : value, unit, percent, at));
      position = unit.end();
    } while (position < passage.to());
    return found;
  }

  private Quantity quantity(
      Passage passage, BigDecimal value, Matcher unit, Percent percent, int at) {
    String symbol = unit.group(1).replaceAll("\\s", "");
    if (symbol.equals(Quantity.PERCENT_SYMBOL)) {
      if (percent == Percent.FORBIDDEN) {
        throw passage.fault(unit.start(1), "% is allowed in tolerances only");
      }
      return new Quantity(value, new Unit(symbol, ExactNumber.ONE, 0), at);
    }
    Unit known =
        units.find(symbol).orElseThrow(() -> passage.fault(unit.start(1), units.unknown(symbol)));
    if (ExactNumber.of(value).times(known.factor()).enclosure().magnitude() > LARGEST) {
      throw passage.fault(at, "the quantity is over 1e300 in the time unit of the case");
    }
    return new Quantity(value, known, at);
  }

  private static FaultSignal noNumber(Passage passage, int at) {
    String rest = passage.scalar().text().substring(at, passage.to());
    String shown = rest.length() > 40 ? rest.substring(0, 40) + "..." : rest;
    return passage.fault(
        at,
        (shown.isEmpty() ? "a number is missing" : "`" + shown + "` is no number")
            + "; allowed is "
            + DecimalText.ALLOWED
            + ", with a unit where it has one");
  }

  private static int skipBlanks(String text, int from, int to) {
    int position = from;
    while (position < to && Character.isWhitespace(text.charAt(position))) {
      position++;
    }
    return position;
  }
}
