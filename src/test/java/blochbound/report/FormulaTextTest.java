package blochbound.report;

import static org.junit.jupiter.api.Assertions.assertEquals;

import blochbound.interval.ExactNumber;
import blochbound.model.Atom.Function;
import blochbound.model.Monomial;
import blochbound.model.Scalar;
import java.math.BigDecimal;
import java.util.List;
import org.junit.jupiter.api.Test;

// [invariant] the expected texts spell the expressions built in each test
class FormulaTextTest {
  private static final FormulaText FORMULAS =
      new FormulaText(
          List.of(HandMade.parameter("g", "1", "1", "2"), HandMade.parameter("k", "1", "1", "2")));
  private static final Scalar G = Scalar.parameter(0);
  private static final Scalar K = Scalar.parameter(1);

  private static Scalar number(String decimal) {
    return Scalar.constant(ExactNumber.of(new BigDecimal(decimal)));
  }

  @Test
  void sumsHaveSignsAndPowers() {
    Scalar sum = number("2").times(G).minus(number("0.5").times(K.power(2))).plus(number("-3"));
    assertEquals("-3 + 2 * g - 0.5 * k^2", FORMULAS.scalar(sum));
    assertEquals("0", FORMULAS.scalar(Scalar.ZERO));
    assertEquals("-g", FORMULAS.scalar(G.negate()));
  }

  @Test
  void quotientsStandBehindTheProduct() {
    assertEquals("g^2 / k", FORMULAS.scalar(G.power(2).dividedBy(K)));
    assertEquals("1 / k^2", FORMULAS.scalar(K.power(-2)));
    assertEquals("g / (g + k)", FORMULAS.scalar(G.dividedBy(G.plus(K))));
  }

  @Test
  void functionsKeepTheirArguments() {
    assertEquals(
        "sin(2 * k) * sqrt(g)",
        FORMULAS.scalar(G.apply(Function.SQRT).times(K.times(number("2")).apply(Function.SIN))));
  }

  @Test
  void emptyProductIsOne() {
    assertEquals("1", FORMULAS.monomial(Monomial.ONE));
  }

  @Test
  void piIsRounded() {
    // [closed form] 2 pi to six digits
    assertEquals("6.28319", FORMULAS.scalar(number("2").times(Scalar.constant(ExactNumber.PI))));
  }
}
