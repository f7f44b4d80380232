package blochbound.casefile;

import static blochbound.casefile.Matrices.assertClose;
import static blochbound.casefile.Matrices.at;
import static blochbound.casefile.Matrices.real;
import static blochbound.casefile.Matrices.row;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.DesignCase;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.util.HexFormat;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.FieldSource;

/** Matrix Market operators: matrices by hand from the definition of the format. */
class MatrixMarketTest {
  private static final String HEAD = "%%MatrixMarket matrix ";

  private static final String HEADER =
      "the first line must be `%%MatrixMarket matrix` with one of coordinate, array, one of real,"
          + " complex, integer, and one of general, symmetric, hermitian, skew-symmetric";

  @TempDir Path directory;

  private static ComplexBall read(String text) {
    return MatrixMarket.read("op.mtx", HEAD + text, 2);
  }

  @Test
  void coordinateMatricesAreRead() {
    assertEquals(
        real(row(0, 1.5), row(0, -2)),
        read("coordinate real general\n% note\n\n2 2 2\n1 2 1.5\n2 2 -2e0\n").centre());
    assertEquals(
        real(row(1, 3), row(3, 0)),
        read("coordinate integer symmetric\n2 2 2\n1 1 1\n2 1 3\n").centre());
    assertEquals(
        real(row(0, -3), row(3, 0)),
        read("coordinate integer skew-symmetric\n2 2 1\n2 1 3\n").centre());
    ComplexMatrix hermitian =
        read("coordinate complex hermitian\n2 2 2\n1 1 1 0\n2 1 .5 2\n").centre();
    assertEquals(
        ComplexMatrix.of(2, 2, new double[] {1, .5, .5, 0}, new double[] {0, -2, 2, 0}), hermitian);
  }

  @Test
  void arraysAreReadByColumns() {
    assertEquals(
        real(row(1, 3), row(2, 4)), read("array real general\n2 2\n1\n2\n3\n4\n").centre());
    assertEquals(real(row(1, 2), row(2, 3)), read("array real symmetric\n2 2\n1\n2\n3\n").centre());
    assertEquals(real(row(0, -2), row(2, 0)), read("array real skew-symmetric\n2 2\n2\n").centre());
    assertEquals(
        ComplexMatrix.of(2, 2, new double[] {1, 2, 2, 3}, new double[] {0, -1, 1, 0}),
        read("array complex hermitian\r\n2 2\r\n1 0\r\n2 1\r\n3 0").centre());
  }

  @Test
  void theErrorBoundCountsRoundedDecimalsOnly() {
    assertEquals(0, read("array real general\n2 2\n1\n0.5\n3\n-0.25\n").radius());
    double radius = read("coordinate real symmetric\n2 2 1\n2 1 0.1\n").radius();
    // [closed form] 0.1 is off its nearest double by less than 2^-56, twice
    assertTrue(radius > 0 && radius < 3e-17);
  }

  static final List<Arguments> FAULTS =
      List.of(
          fault(1, "matrix\n2 2 0\n", HEADER),
          fault(1, HEAD + "coordinate pattern general\n2 2 0\n", HEADER),
          fault(
              1,
              HEAD + "coordinate real hermitian\n2 2 0\n",
              "hermitian needs the field complex; a real one is symmetric"),
          fault(
              3,
              HEAD + "array real general\n% x\n3 3\n",
              "the matrix is 3 by 3 but its sites have 2 levels together"),
          fault(2, HEAD + "coordinate real general\n2 2\n", numbers(3, 2)),
          fault(3, HEAD + "coordinate real general\n2 2 1\n1 1\n", numbers(3, 2)),
          fault(3, HEAD + "coordinate complex general\n2 2 1\n1 1 1\n", numbers(4, 3)),
          fault(
              3,
              HEAD + "coordinate real general\n2 2 1\n3 1 1\n",
              "`3` is no whole number up to 2"),
          fault(
              3,
              HEAD + "coordinate real general\n2 2 1\n0 1 1\n",
              "the index 0 must lie between 1 and 2"),
          fault(
              3,
              HEAD + "coordinate real general\n2 2 1\n1 1 NaN\n",
              "`NaN` is no number; allowed is a finite decimal such as 0.5 or 2e-3"),
          fault(
              3,
              HEAD + "coordinate real general\n2 2 1\n1 1 1e999999999\n",
              "the number 1e999999999 is out of range; allowed are 0 and 1e-300 to 1e300"),
          fault(
              3, HEAD + "coordinate integer general\n2 2 1\n1 1 1.5\n", "`1.5` is no whole number"),
          fault(
              4,
              HEAD + "coordinate real general\n2 2 2\n1 1 1\n1 1 1\n",
              "this entry is given twice"),
          fault(
              3,
              HEAD + "coordinate real symmetric\n2 2 1\n1 2 1\n",
              "a symmetric matrix is stored on and below the diagonal"),
          fault(
              3,
              HEAD + "coordinate complex hermitian\n2 2 1\n1 1 1 1\n",
              "the diagonal of a hermitian matrix is real"),
          fault(
              3,
              HEAD + "coordinate real skew-symmetric\n2 2 1\n1 1 1\n",
              "the diagonal of a skew-symmetric matrix is zero"),
          fault(
              3,
              HEAD + "coordinate real general\n2 2 2\n1 1 1",
              "the file ends before entry 2 of 2"),
          fault(
              5,
              HEAD + "array real general\n2 2\n1\n2\n",
              "the file ends before the entry of row 1, column 2"),
          fault(
              4,
              HEAD + "coordinate real general\n2 2 1\n1 1 1\n2 2 1\n",
              "there are more entries than the sizes tell"));

  private static String numbers(int expected, int found) {
    return "expected " + expected + " numbers in this line, not " + found;
  }

  private static Arguments fault(int line, String text, String message) {
    return Arguments.of(line, text, message);
  }

  @ParameterizedTest
  @FieldSource("FAULTS")
  void faultsNameTheLine(int line, String text, String message) {
    FaultSignal signal =
        assertThrows(FaultSignal.class, () -> MatrixMarket.read("op.mtx", text, 2));
    assertEquals("op.mtx:" + line + ":1: " + message, signal.fault().orElseThrow().toString());
  }

  private DesignCase withOperator(String operator) throws CaseFaultException {
    String text =
        CaseText.dimensionless()
            .set("sites", "{a: {levels: 2}, b: {levels: 3}, c: {levels: 2}}")
            .set("operators", "{o: " + operator + "}")
            .set("hamiltonian", "0")
            .set("jumps", "[{operator: o}]")
            .text();
    return CaseReader.read(text, "lot/pair.yaml", directory, RequirementRule.OPTIONAL);
  }

  @Test
  void operatorsOfFilesActOnTheListedSites() throws Exception {
    // The transition |0 of c, 2 of b><1 of c, 0 of b| in the order c, b: row 2, column 3
    write("t.mtx", HEAD + "coordinate real general\n6 6 1\n3 4 1\n");
    ComplexMatrix t =
        at(withOperator("{file: t.mtx, sites: [c, b]}").device().jumps().get(0).operator());
    String same = "'|0,2,0><0,0,1| + |1,2,0><1,0,1|'";
    assertEquals(at(withOperator(same).device().jumps().get(0).operator()), t);
    write("x.mtx", HEAD + "coordinate real symmetric\n2 2 1\n2 1 1\n");
    assertClose(
        at(withOperator("X@c").device().jumps().get(0).operator()),
        at(withOperator("{file: x.mtx, sites: [c]}").device().jumps().get(0).operator()));
    write("one.mtx", HEAD + "coordinate real general\n12 12 1\n12 1 1\n");
    assertEquals(
        ComplexMatrix.unit(12, 11, 0),
        at(withOperator("{file: one.mtx}").device().jumps().get(0).operator()));
  }

  @Test
  void theErrorBoundGrowsWithTheOtherSites() throws Exception {
    write("x.mtx", HEAD + "coordinate real symmetric\n2 2 1\n2 1 0.1\n");
    double local = MatrixMarket.read("x", Files.readString(directory.resolve("x.mtx")), 2).radius();
    ComplexBall whole =
        withOperator("{file: x.mtx, sites: [c]}")
            .device()
            .jumps()
            .get(0)
            .operator()
            .terms()
            .values()
            .iterator()
            .next();
    // [closed form] six copies of the block: sqrt(6) times the error
    assertTrue(whole.radius() >= local * Math.sqrt(6) && whole.radius() < local * 2.45);
  }

  @Test
  void faultsOfFilesNameTheFile() throws Exception {
    write("bad.mtx", "nonsense\n");
    assertFaults("{file: bad.mtx, sites: [a]}", "lot/bad.mtx:1:1: " + HEADER);
    assertFaults(
        "{file: none.mtx, sites: [a]}",
        "lot/pair.yaml:7:23: the file `lot/none.mtx` cannot be read: there is no such file");
    assertFaults(
        "{file: x.mtx, sites: [a, d]}", "lot/pair.yaml:7:41: unknown site `d`; sites are a, b, c");
    assertFaults("{file: x.mtx, sites: [a, a]}", "lot/pair.yaml:7:41: the site `a` occurs twice");
    assertFaults(
        "{file: x.mtx, sites: []}", "lot/pair.yaml:7:37: the operator needs at least one site");
    assertFaults("{sites: [a]}", "lot/pair.yaml:7:16: `file` is missing in an operator");
    assertFaults(
        "[a]", "lot/pair.yaml:7:16: expected an expression or {file: name.mtx, sites: [a, b]}");
    Files.write(directory.resolve("big.mtx"), new byte[ReferencedFiles.MOST_BYTES + 1]);
    assertFaults(
        "{file: big.mtx, sites: [a]}",
        "lot/pair.yaml:7:23: the file `lot/big.mtx` is over 4194304 bytes long");
  }

  private void assertFaults(String operator, String message) {
    CaseFaultException e = assertThrows(CaseFaultException.class, () -> withOperator(operator));
    assertEquals(message, e.getMessage());
  }

  @Test
  void theDigestGoesOnWithTheReferencedFiles() throws Exception {
    byte[] x = write("x.mtx", HEAD + "coordinate real symmetric\n2 2 1\n2 1 1\n");
    byte[] y = write("y.mtx", HEAD + "coordinate real symmetric\n2 2 0\n");
    Path file = directory.resolve("pair.yaml");
    String text =
        CaseText.pair()
            .set("operators", "{o: {file: y.mtx, sites: [a]}, p: {file: x.mtx, sites: [b]}}")
            .text();
    Files.writeString(file, text);
    MessageDigest digest = MessageDigest.getInstance("SHA-256");
    digest.update(text.getBytes(StandardCharsets.UTF_8));
    digest.update(y);
    digest.update(x);
    assertEquals(HexFormat.of().formatHex(digest.digest()), CaseReader.read(file).sha256());
  }

  private byte[] write(String name, String text) throws IOException {
    byte[] bytes = text.getBytes(StandardCharsets.US_ASCII);
    Files.write(directory.resolve(name), bytes);
    return bytes;
  }
}
