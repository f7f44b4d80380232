package blochbound.casefile;

import blochbound.interval.Interval;
import blochbound.interval.Rounding;
import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * Reads one square matrix in the NIST Matrix Market exchange format, coordinate or array.
 *
 * <p>Source: R. F. Boisvert, R. Pozo, K. A. Remington, <i>The Matrix Market Exchange Formats:
 * Initial Design</i>, NISTIR 5935 (1996). Fields real, complex and integer; symmetries general,
 * symmetric, hermitian and skew-symmetric, of which only the part on and below the diagonal is
 * stored. Decimals are rounded to the nearest double; the error bound counts what is lost.
 */
final class MatrixMarket {
  private static final List<String> LAYOUTS = List.of("coordinate", "array");
  private static final List<String> FIELDS = List.of("real", "complex", "integer");
  private static final List<String> SYMMETRIES =
      List.of("general", "symmetric", "hermitian", "skew-symmetric");

  private final String file;
  private final String[] lines;
  private final int size;
  private int line;
  private String field = "";
  private String symmetry = "";
  private double[] re = new double[0];
  private double[] im = new double[0];
  private boolean[] given = new boolean[0];
  private double[] errors = new double[0];

  private MatrixMarket(String file, String text, int size) {
    this.file = file;
    this.lines = text.split("\r\n|\r|\n", -1);
    this.size = size;
  }

  /** The matrix of a text, which must have {@code size} rows and columns. */
  static ComplexBall read(String file, String text, int size) {
    return new MatrixMarket(file, text, size).read();
  }

  private ComplexBall read() {
    String layout = header();
    re = new double[size * size];
    im = new double[size * size];
    given = new boolean[size * size];
    errors = new double[2 * size * size];
    String[] sizes = nextLine("the sizes");
    if (layout.equals("coordinate")) {
      coordinate(sizes);
    } else {
      array(sizes);
    }
    Optional<String[]> more = words();
    if (more.isPresent()) {
      throw fault("there are more entries than the sizes tell");
    }
    boolean exact = java.util.Arrays.stream(errors).allMatch(e -> e == 0);
    return new ComplexBall(
        ComplexMatrix.of(size, size, re, im), exact ? 0 : Rounding.normUp(errors));
  }

  /** Reads the first line and returns the layout. */
  private String header() {
    String[] words = lines[line++].trim().toLowerCase(Locale.ROOT).split("\\s+", -1);
    boolean known =
        words.length == 5
            && words[0].equals("%%matrixmarket")
            && words[1].equals("matrix")
            && LAYOUTS.contains(words[2])
            && FIELDS.contains(words[3])
            && SYMMETRIES.contains(words[4]);
    if (!known) {
      throw fault(
          "the first line must be `%%MatrixMarket matrix` with one of coordinate, array, one of"
              + " real, complex, integer, and one of general, symmetric, hermitian,"
              + " skew-symmetric");
    }
    field = words[3];
    symmetry = words[4];
    if (symmetry.equals("hermitian") && !field.equals("complex")) {
      throw fault("hermitian needs the field complex; a real one is symmetric");
    }
    return words[2];
  }

  private void coordinate(String[] sizes) {
    checkSizes(sizes, 3);
    long count = whole(sizes[2], Integer.MAX_VALUE);
    for (long k = 0; k < count; k++) {
      String[] words = nextLine("entry " + (k + 1) + " of " + count);
      checkLength(words, 2 + parts());
      put(index(words[0]), index(words[1]), words, 2);
    }
  }

  private void array(String[] sizes) {
    checkSizes(sizes, 2);
    boolean all = symmetry.equals("general");
    int skip = symmetry.equals("skew-symmetric") ? 1 : 0;
    for (int column = 0; column < size; column++) {
      for (int row = all ? 0 : column + skip; row < size; row++) {
        String[] words = nextLine("the entry of row " + (row + 1) + ", column " + (column + 1));
        checkLength(words, parts());
        put(row, column, words, 0);
      }
    }
  }

  private int parts() {
    return field.equals("complex") ? 2 : 1;
  }

  private void checkSizes(String[] words, int length) {
    checkLength(words, length);
    if (whole(words[0], Integer.MAX_VALUE) != size || whole(words[1], Integer.MAX_VALUE) != size) {
      throw fault(
          "the matrix is "
              + words[0]
              + " by "
              + words[1]
              + " but its sites have "
              + size
              + " levels together");
    }
  }

  private void checkLength(String[] words, int length) {
    if (words.length != length) {
      throw fault("expected " + length + " numbers in this line, not " + words.length);
    }
  }

  private int index(String word) {
    int index = whole(word, size);
    if (index < 1) {
      throw fault("the index " + word + " must lie between 1 and " + size);
    }
    return index - 1;
  }

  private int whole(String word, int most) {
    if (!word.matches("\\d{1,9}") || Integer.parseInt(word) > most) {
      throw fault("`" + word + "` is no whole number up to " + most);
    }
    return Integer.parseInt(word);
  }

  private void put(int row, int column, String[] words, int from) {
    int at = row * size + column;
    if (given[at]) {
      throw fault("this entry is given twice");
    }
    given[at] = true;
    set(re, at, words[from], at);
    if (parts() == 2) {
      set(im, at, words[from + 1], size * size + at);
    }
    if (symmetry.equals("general")) {
      return;
    }
    if (row < column) {
      throw fault("a " + symmetry + " matrix is stored on and below the diagonal");
    }
    mirror(row, column);
  }

  private void mirror(int row, int column) {
    int from = row * size + column;
    boolean skew = symmetry.equals("skew-symmetric");
    boolean hermitian = symmetry.equals("hermitian");
    if (row == column) {
      if (skew && (re[from] != 0 || im[from] != 0)) {
        throw fault("the diagonal of a skew-symmetric matrix is zero");
      }
      if (hermitian && im[from] != 0) {
        throw fault("the diagonal of a hermitian matrix is real");
      }
      return;
    }
    int to = column * size + row;
    // Adding zero keeps negative zeros out.
    re[to] = 0.0 + (skew ? -re[from] : re[from]);
    im[to] = 0.0 + (skew || hermitian ? -im[from] : im[from]);
    errors[to] = errors[from];
    errors[size * size + to] = errors[size * size + from];
  }

  private void set(double[] target, int at, String word, int errorAt) {
    boolean negative = word.startsWith("-");
    String size = word.replaceFirst("^[+-]", "");
    Optional<String> complaint = DecimalText.complaint(size);
    if (complaint.isEmpty() && field.equals("integer") && !size.matches("\\d+")) {
      complaint = Optional.of("`" + word + "` is no whole number");
    }
    if (complaint.isPresent()) {
      throw fault(complaint.get());
    }
    Interval value = Interval.fromDecimal(DecimalText.value(size));
    target[at] = negative ? -value.middle() : value.middle();
    errors[errorAt] = value.radius();
  }

  private String[] nextLine(String what) {
    return words().orElseThrow(() -> fault("the file ends before " + what));
  }

  /** The words of the next line that is neither empty nor a comment. */
  private Optional<String[]> words() {
    while (line < lines.length) {
      String text = lines[line++].trim();
      if (!text.isEmpty() && !text.startsWith("%")) {
        return Optional.of(text.split("\\s+", -1));
      }
    }
    return Optional.empty();
  }

  private FaultSignal fault(String message) {
    return FaultSignal.of(new Fault(file, Math.max(1, line), 1, message));
  }
}
