package blochbound.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.ExactNumber;
import blochbound.model.Distribution;
import blochbound.model.Parameter;
import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import org.apache.commons.math3.fraction.BigFraction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Units, tolerances and the exactness of decimals. */
class ParameterReaderTest {
  private static Parameter read(String fields) throws CaseFaultException {
    return CaseText.pair()
        .set("parameters", "{p: {" + fields + "}}")
        .set("hamiltonian", "1 kHz * X@a")
        .set("jumps", "[]")
        .read()
        .device()
        .parameters()
        .get(0);
  }

  // [closed form] factor of one unit in microseconds: ratio * pi^power, by hand
  @ParameterizedTest
  @CsvSource({
    "/s, 1, 1000000, 0, -1",
    "/ms, 1, 1000, 0, -1",
    "/us, 1, 1, 0, -1",
    "/ns, 1000, 1, 0, -1",
    "1/ns, 1000, 1, 0, -1",
    "rad/ms, 1, 1000, 0, -1",
    "Hz, 1, 500000, 1, -1",
    "kHz, 1, 500, 1, -1",
    "MHz, 2, 1, 1, -1",
    "GHz, 2000, 1, 1, -1",
    "s, 1000000, 1, 0, 1",
    "ms, 1000, 1, 0, 1",
    "us, 1, 1, 0, 1",
    "ns, 1, 1000, 0, 1",
  })
  void unitsHaveExactFactors(String symbol, long numerator, long denominator, int pi, int time)
      throws CaseFaultException {
    Parameter p = read("nominal: 3 " + symbol);
    assertEquals(symbol, p.unit().symbol());
    assertEquals(new ExactNumber(new BigFraction(numerator, denominator), pi), p.unit().factor());
    assertEquals(time, p.unit().timePower());
    assertTrue(p.isConstant());
  }

  @Test
  void factorsFollowTheTimeUnit() throws CaseFaultException {
    Parameter p = CaseText.pair().set("timeUnit", "s").read().device().parameters().get(0);
    // [closed form] 1/us = 1e6 / s
    assertEquals(ExactNumber.of(1_000_000), p.unit().factor());
  }

  // [closed form] ends of the range by hand
  @ParameterizedTest
  @CsvSource(
      delimiter = ';',
      value = {
        "nominal: 1.0 /us, tolerance: 20 %; 0.8; 1.2",
        "nominal: -2 /us, tolerance: 25%; -2.5; -1.5",
        "nominal: 0.3 /us, tolerance: 0.1 %; 0.2997; 0.3003",
        "nominal: 0 kHz, tolerance: 8 kHz; -8; 8",
        "nominal: 1 MHz, tolerance: 20 kHz; 0.98; 1.02",
        "nominal: 5 GHz, tolerance: 1 Hz; 4.999999999; 5.000000001",
        "nominal: 1 /us, tolerance: 1 /ms; 0.999; 1.001",
        "nominal: 1 rad/us, tolerance: 1 /us; 0; 2",
        "nominal: 3 us, tolerance: 250 ns; 2.75; 3.25",
        "nominal: 1 /us, tolerance: +10 % -5 %; 0.95; 1.1",
        "nominal: 1 /us, tolerance: -5 % +10 %; 0.95; 1.1",
        "nominal: 7 kHz, tolerance: +2 kHz -1 kHz; 6; 9",
        "nominal: 7 kHz, tolerance: +2kHz-1kHz; 6; 9",
        "nominal: 7 kHz, tolerance: +10 % -500 Hz; 6.5; 7.7",
        "nominal: 1 /us, tolerance: +10 % -0 %; 1; 1.1",
        "nominal: 1 /us, tolerance: 0 %; 1; 1",
        "nominal: 1 /us, range: [0.5 /us, 2000 /ms]; 0.5; 2",
        "nominal: 0.1 /us, range: [0.1 /us, 0.1 /us]; 0.1; 0.1",
        "nominal: 1e-3 MHz, tolerance: 1E-4 MHz; 0.0009; 0.0011",
        "nominal: 0.1234567890123456789012345 /us, tolerance: 10 %;"
            + " 0.11111111011111111101111105; 0.13580246791358024679135795",
      })
  void tolerancesAreExact(String fields, String lower, String upper) throws CaseFaultException {
    Parameter p = read(fields);
    assertEquals(0, new BigDecimal(lower).compareTo(p.lower()), () -> "lower " + p.lower());
    assertEquals(0, new BigDecimal(upper).compareTo(p.upper()), () -> "upper " + p.upper());
  }

  @Test
  void cyclesMixedWithPlainRatesHaveFortyDigitsRoundedOutwards() throws CaseFaultException {
    Parameter p = read("nominal: 100 /us, tolerance: 1 MHz");
    // [independent] Python 3.11 with the digits of machin() below: 2 pi to 40 digits, rounded up
    BigDecimal twoPiUp = new BigDecimal("6.283185307179586476925286766559005768395");
    assertEquals(twoPiUp, p.upper().subtract(new BigDecimal(100)));
    assertTrue(p.isCentred());
    Parameter r = read("nominal: 1 MHz, range: [1 /us, 7 /us]");
    BigDecimal pi = machin();
    BigDecimal two = BigDecimal.valueOf(2);
    // [closed form] r MHz = 2 pi r / us
    BigDecimal low = r.lower().multiply(two).multiply(pi);
    BigDecimal high = r.upper().multiply(two).multiply(pi);
    assertTrue(low.compareTo(BigDecimal.ONE) < 0 && high.compareTo(BigDecimal.valueOf(7)) > 0);
    BigDecimal tiny = new BigDecimal("1e-38");
    assertTrue(BigDecimal.ONE.subtract(low).compareTo(tiny) < 0);
    assertTrue(high.subtract(BigDecimal.valueOf(7)).compareTo(tiny) < 0);
    Parameter n = read("nominal: -1 MHz, range: [-7 /us, -1 /us]");
    assertEquals(r.upper().negate(), n.lower());
    assertEquals(r.lower().negate(), n.upper());
  }

  @Test
  void theStoredDigitsOfPiEncloseIt() {
    BigDecimal pi = machin();
    assertTrue(UnitConversion.PI_BELOW.compareTo(pi) < 0);
    assertTrue(UnitConversion.PI_ABOVE.compareTo(pi) > 0);
  }

  /** Pi to 80 digits: [closed form] J. Machin, pi/4 = 4 arctan(1/5) - arctan(1/239). */
  private static BigDecimal machin() {
    BigDecimal quarter = BigDecimal.valueOf(4).multiply(arctan(5)).subtract(arctan(239));
    return quarter.multiply(BigDecimal.valueOf(4));
  }

  private static BigDecimal arctan(long inverse) {
    MathContext context = new MathContext(90, RoundingMode.HALF_EVEN);
    BigDecimal power = BigDecimal.ONE.divide(BigDecimal.valueOf(inverse), context);
    BigDecimal square = BigDecimal.valueOf(inverse * inverse);
    BigDecimal sum = power;
    for (int k = 1; k < 80; k++) {
      power = power.divide(square, context).negate();
      sum = sum.add(power.divide(BigDecimal.valueOf(2L * k + 1), context));
    }
    return sum;
  }

  @Test
  void distributionsAreRead() throws CaseFaultException {
    assertEquals(
        new Distribution.Uniform(), read("nominal: 1 /us, distribution: uniform").distribution());
    assertEquals(
        new Distribution.Triangular(),
        read("nominal: 1 /us, distribution: triangular").distribution());
    assertEquals(
        new Distribution.Normal(0.003),
        read("nominal: 1 MHz, distribution: normal, sigma: 3 kHz").distribution());
  }

  @Test
  void theOrderOfParametersIsKept() throws CaseFaultException {
    assertEquals(
        "[z, a, m]",
        CaseText.dimensionless()
            .set("parameters", "{z: {nominal: 1}, a: {nominal: 1}, m: {nominal: 1}}")
            .set("hamiltonian", "z * X@s1")
            .set("sites", "{s1: {levels: 2}}")
            .set("jumps", "[]")
            .read()
            .device()
            .parameters()
            .stream()
            .map(Parameter::name)
            .toList()
            .toString());
  }
}
