package blochbound.casefile;

import static blochbound.casefile.Matrices.assertClose;
import static blochbound.casefile.Matrices.assertContains;
import static blochbound.casefile.Matrices.real;
import static blochbound.casefile.Matrices.row;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;

import blochbound.linalg.ComplexMatrix;
import blochbound.model.MeasureSpec;
import blochbound.model.Requirement;
import blochbound.model.StateSpec;
import blochbound.model.When;
import java.math.BigDecimal;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class RequirementReaderTest {
  private static Requirement read(String fields) throws CaseFaultException {
    return CaseText.pair().requirement(fields).read().requirements().get(0);
  }

  private static MeasureSpec measure(String text) throws CaseFaultException {
    return read("measure: \"" + text + "\", atLeast: 0.5").measure();
  }

  @Test
  void measuresOfStatesAreRead() throws CaseFaultException {
    assertEquals(new MeasureSpec.Population(1, List.of(1)), measure("population(b, e)"));
    assertEquals(new MeasureSpec.Population(1, List.of(1, 0)), measure("population( b , e,g )"));
    assertEquals(new MeasureSpec.Concurrence(1, 0), measure("concurrence(b, a)"));
    assertEquals(new MeasureSpec.Negativity(List.of(1)), measure("negativity(b)"));
    assertEquals(new MeasureSpec.Purity(), measure("purity"));
    assertEquals(new MeasureSpec.Entropy(), measure("entropy"));
    MeasureSpec.Mean mean = assertInstanceOf(MeasureSpec.Mean.class, measure("mean(Z@a)"));
    // [closed form] Z x 1
    assertClose(
        real(row(1, 0, 0, 0), row(0, 1, 0, 0), row(0, 0, -1, 0), row(0, 0, 0, -1)),
        mean.observable().centre());
  }

  @Test
  void statesOfMeasuresAreRead() throws CaseFaultException {
    MeasureSpec.Fidelity f =
        assertInstanceOf(MeasureSpec.Fidelity.class, measure("fidelity(|g,e> + i*|e,g>)"));
    StateSpec.Pure pure = assertInstanceOf(StateSpec.Pure.class, f.state());
    // [closed form] (|g,e> + i |e,g>)/sqrt(2)
    double h = Math.sqrt(0.5);
    assertContains(
        pure.ket(), ComplexMatrix.of(4, 1, new double[] {0, h, 0, 0}, new double[] {0, 0, h, 0}));
    MeasureSpec.TraceDistance d =
        assertInstanceOf(
            MeasureSpec.TraceDistance.class,
            measure("traceDistance(0.25*|g,g><g,g| + 0.75*|e,e><e,e|)"));
    StateSpec.Mixed mixed = assertInstanceOf(StateSpec.Mixed.class, d.state());
    assertClose(
        real(row(.25, 0, 0, 0), row(0, 0, 0, 0), row(0, 0, 0, 0), row(0, 0, 0, .75)),
        mixed.density().centre());
  }

  @Test
  void limitsKeepTheirDecimalsAndUnits() throws CaseFaultException {
    Requirement gap = read("measure: gap, atMost: 3.50 kHz");
    assertEquals(new BigDecimal("3.50"), gap.limit());
    assertEquals("kHz", gap.unit().symbol());
    assertEquals(Requirement.Sense.AT_MOST, gap.sense());
    assertEquals("rad/us", read("measure: gap, atLeast: 1 rad/us").unit().symbol());
    assertEquals("1/us", read("measure: gap, atLeast: 1 1/us").unit().symbol());
    assertEquals("kHz", read("measure: mean(3 kHz * Z@a), atLeast: 0 kHz").unit().symbol());
    assertEquals("", read("measure: purity, atLeast: 0.5").unit().symbol());
    assertEquals(new BigDecimal("-1"), read("measure: mean(Z@a), atLeast: -1").limit());
  }

  @Test
  void momentsAreRead() throws CaseFaultException {
    assertEquals(new When.Steady(), read("measure: purity, atLeast: 0, at: steady").when());
    String start = "measure: purity, atLeast: 0, start: \"|g,g>\", ";
    When.At at = assertInstanceOf(When.At.class, read(start + "at: 1500 ns").when());
    assertEquals(new BigDecimal("1500"), at.time());
    assertEquals("ns", at.unit().symbol());
    assertEquals(new When.AtEnd(), read(start + "at: end").when());
    When.During during =
        assertInstanceOf(When.During.class, read(start + "during: [500 ns, 20 us]").when());
    assertEquals(new BigDecimal("20"), during.until());
    assertEquals("ns", during.fromUnit().symbol());
  }

  @Test
  void gapSettlingAndGatesAreRead() throws CaseFaultException {
    Requirement settling = read("measure: settling(0.01), atMost: 5 us, start: any");
    assertEquals(new MeasureSpec.Settling(0.01), settling.measure());
    assertEquals("us", settling.unit().symbol());
    assertEquals(Optional.empty(), settling.start());
    MeasureSpec.GateFidelity gate =
        assertInstanceOf(
            MeasureSpec.GateFidelity.class,
            measure("gateFidelity((X@a + Z@a)/sqrt(2), |g,g>, |e,g>)"));
    assertEquals(2, gate.subspace().size());
    assertEquals(
        ComplexMatrix.unit(4, 2, 0).kron(real(row(1))), padded(gate.subspace().get(1).centre()));
    assertEquals(new When.AtEnd(), read("measure: gateFidelity(X@a), atLeast: 0.99").when());
  }

  private static ComplexMatrix padded(ComplexMatrix column) {
    return column.times(real(row(1, 0, 0, 0)));
  }

  @Test
  void withoutATimeUnitEverythingIsAPureNumber() throws CaseFaultException {
    Requirement r =
        CaseText.dimensionless()
            .requirement("measure: purity, at: 12, start: \"|g,g>\", atLeast: 0")
            .read()
            .requirements()
            .get(0);
    assertEquals(new BigDecimal("12"), assertInstanceOf(When.At.class, r.when()).time());
    assertEquals(
        "",
        CaseText.dimensionless()
            .requirement("measure: gap, atLeast: 1")
            .read()
            .requirements()
            .get(0)
            .unit()
            .symbol());
  }

  @Test
  void labelsMayHoldSigns() throws CaseFaultException {
    Requirement r =
        CaseText.pair()
            .set("sites", "{a: {levels: ['+', '-']}, b: {levels: [01, e-1]}}")
            .requirement("measure: 'population(b, e-1)', atLeast: 0")
            .set("target", "'|+,01> - |-,e-1>'")
            .read()
            .requirements()
            .get(0);
    assertEquals(new MeasureSpec.Population(1, List.of(1)), r.measure());
  }
}
