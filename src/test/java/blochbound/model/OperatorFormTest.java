package blochbound.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.interval.ExactNumber;
import blochbound.interval.Interval;
import blochbound.linalg.BigMatrix;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.linalg.Matrices;
import blochbound.model.Atom.Function;
import java.math.BigDecimal;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Operators that depend on parameters, collected exactly. */
class OperatorFormTest {
  private static final Scalar S = Scalar.parameter(0);
  private static final HilbertSpace PAIR =
      new HilbertSpace(
          List.of(new Site("left", List.of("g", "e")), new Site("right", List.of("g", "e"))));
  private static final ComplexMatrix LOWER = ComplexMatrix.unit(2, 0, 1);

  private static OperatorForm lower(int site) {
    return OperatorForm.constant(PAIR.lift(site, ComplexBall.exact(LOWER)));
  }

  private static ComplexMatrix matrix(OperatorForm form, Monomial monomial) {
    ComplexBall ball = form.terms().get(monomial);
    assertTrue(ball != null, "no term " + monomial);
    return ball.centre();
  }

  private static void assertSame(ComplexMatrix expected, ComplexMatrix actual) {
    assertEquals(0, expected.minus(actual).frobeniusNormUp(), () -> expected + "\n" + actual);
  }

  @Test
  void aCollectiveJumpWithAnUncertainAmplitudeIsAPolynomialOfDegreeTwo() {
    OperatorForm jump = lower(0).plus(lower(1).times(S));
    OperatorForm square = jump.adjoint().times(jump);
    Monomial one = Monomial.ONE;
    Monomial s = Monomial.parameter(0);
    Monomial s2 = s.times(s);
    assertEquals(Set.of(one, s, s2), square.terms().keySet());
    ComplexMatrix a = LOWER.kron(ComplexMatrix.identity(2));
    ComplexMatrix b = ComplexMatrix.identity(2).kron(LOWER);
    // [closed form] (a + s b)^+ (a + s b) = a^+ a + s (a^+ b + b^+ a) + s^2 b^+ b
    assertSame(a.adjoint().times(a), matrix(square, one));
    assertSame(a.adjoint().times(b).plus(b.adjoint().times(a)), matrix(square, s));
    assertSame(b.adjoint().times(b), matrix(square, s2));
  }

  @Test
  void aSquareRootAmplitudeGivesARateWithoutRoots() {
    OperatorForm jump = lower(0).times(S.apply(Function.SQRT));
    OperatorForm square = jump.adjoint().times(jump);
    // [closed form] |sqrt(s)|^2 = s
    assertEquals(Set.of(Monomial.parameter(0)), square.terms().keySet());
    ComplexMatrix excited = ComplexMatrix.unit(2, 1, 1).kron(ComplexMatrix.identity(2));
    assertSame(excited, matrix(square, Monomial.parameter(0)));
  }

  @Test
  void multiplesWithSumsSpreadOverTheirTerms() {
    Scalar factor = S.plus(Scalar.constant(ExactNumber.of(2)));
    OperatorForm form = lower(0).times(factor);
    assertEquals(Set.of(Monomial.ONE, Monomial.parameter(0)), form.terms().keySet());
    ComplexMatrix a = LOWER.kron(ComplexMatrix.identity(2));
    assertSame(a.scale(2), matrix(form, Monomial.ONE));
    assertSame(a, matrix(form, Monomial.parameter(0)));
    assertFalse(form.isConstant());
    assertTrue(lower(1).isConstant());
  }

  @Test
  void liftedOperatorsActOnTheirSiteAloneAndKeepTheirErrorBound() {
    HilbertSpace space =
        new HilbertSpace(
            List.of(
                new Site("a", List.of("0", "1", "2")),
                new Site("b", List.of("g", "e")),
                new Site("c", List.of("0", "1"))));
    assertEquals(12, space.dimension());
    assertEquals(1, space.indexOf("b"));
    assertEquals(-1, space.indexOf("d"));
    // [closed form] first site most significant: (2, 1, 0) is 2 * 4 + 1 * 2 + 0
    assertEquals(10, space.basisIndex(new int[] {2, 1, 0}));
    ComplexBall lifted = space.lift(1, new ComplexBall(LOWER, 0.5));
    ComplexMatrix expected = ComplexMatrix.identity(3).kron(LOWER).kron(ComplexMatrix.identity(2));
    assertSame(expected, lifted.centre());
    // [closed form] six copies of an error of norm 0.5
    assertTrue(new BigDecimal(lifted.radius()).pow(2).compareTo(new BigDecimal("1.5")) >= 0);
    assertTrue(lifted.radius() <= 0.5 * Math.sqrt(6) * (1 + 1e-14));
    assertEquals(0, space.lift(1, ComplexBall.exact(LOWER)).radius());
  }

  @Test
  void hermitianFormsAreRecognised() {
    OperatorForm x = lower(0).plus(lower(0).adjoint());
    assertTrue(x.times(S).mayBeHermitian());
    assertFalse(lower(0).mayBeHermitian());
    assertFalse(x.timesI().mayBeHermitian());
    assertTrue(lower(0).minus(lower(0).adjoint()).timesI().mayBeHermitian());
  }

  /** A form a + s b + t c with the exact operators that it stands for. */
  private record Drawn(OperatorForm form, Map<Monomial, BigMatrix> exact) {
    BigMatrix at(BigDecimal s, BigDecimal t) {
      return exact
          .get(Monomial.ONE)
          .plus(exact.get(Monomial.parameter(0)).times(s))
          .plus(exact.get(Monomial.parameter(1)).times(t));
    }
  }

  private static Drawn draw(SplittableRandom random) {
    List<ComplexBall> balls =
        List.of(
            Matrices.ball(random, 2, 2, 0),
            Matrices.ball(random, 2, 2, 0),
            Matrices.ball(random, 2, 2, 0));
    OperatorForm form =
        OperatorForm.constant(balls.get(0))
            .plus(OperatorForm.constant(balls.get(1)).times(S))
            .plus(OperatorForm.constant(balls.get(2)).times(Scalar.parameter(1)));
    return new Drawn(
        form,
        Map.of(
            Monomial.ONE,
            BigMatrix.memberOf(balls.get(0), random),
            Monomial.parameter(0),
            BigMatrix.memberOf(balls.get(1), random),
            Monomial.parameter(1),
            BigMatrix.memberOf(balls.get(2), random)));
  }

  /** The operator of a form at a point, with the error bounds of its terms. */
  private static ComplexBall at(OperatorForm form, double s, double t) {
    ComplexBall sum = ComplexBall.exact(ComplexMatrix.zero(2, 2));
    Interval[] p = {Interval.of(s), Interval.of(t)};
    for (Map.Entry<Monomial, ComplexBall> e : form.terms().entrySet()) {
      sum = sum.plus(e.getValue().times(e.getKey().enclosure(p)));
    }
    return sum;
  }

  @ParameterizedTest(name = "seed {0}")
  @MethodSource("blochbound.Draws#seeds")
  void sumsProductsAndAdjointsHoldTheExactOperatorAtEveryPoint(long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    Drawn a = draw(random);
    Drawn b = draw(random);
    double s = random.nextDouble(-2, 2);
    double t = random.nextDouble(-2, 2);
    BigMatrix x = a.at(new BigDecimal(s), new BigDecimal(t));
    BigMatrix y = b.at(new BigDecimal(s), new BigDecimal(t));
    // [invariant] a proved error bound holds for every member
    assertTrue(x.times(y).isIn(at(a.form.times(b.form), s, t)));
    assertTrue(x.plus(y).isIn(at(a.form.plus(b.form), s, t)));
    assertTrue(
        x.adjoint().times(x).timesI().isIn(at(a.form.adjoint().times(a.form).timesI(), s, t)));
    Scalar factor = S.minus(Scalar.parameter(1).times(S));
    BigDecimal value = new BigDecimal(s).subtract(new BigDecimal(t).multiply(new BigDecimal(s)));
    assertTrue(x.times(value).isIn(at(a.form.times(factor), s, t)));
  }
}
