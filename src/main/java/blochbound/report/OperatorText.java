package blochbound.report;

import blochbound.linalg.ComplexBall;
import blochbound.linalg.ComplexMatrix;
import blochbound.model.HilbertSpace;
import blochbound.model.Monomial;
import blochbound.model.OperatorForm;
import blochbound.model.Site;
import blochbound.model.StateSpec;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;

/**
 * Operators and kets in the basis of the level labels, in the syntax of case files where they are
 * short; coefficients are in internal units, rounded, and entries within the error bound of a
 * matrix count as zero.
 */
final class OperatorText {
  private static final int MOST_ENTRIES = 8;

  private final HilbertSpace space;
  private final FormulaText formulas;

  OperatorText(HilbertSpace space, FormulaText formulas) {
    this.space = space;
    this.formulas = formulas;
  }

  /** One text for each monomial, such as {@code shift * (|e><e| - |g><g|)}; none for zero. */
  List<String> terms(OperatorForm form) {
    List<String> terms = new ArrayList<>();
    for (Map.Entry<Monomial, ComplexBall> e : form.terms().entrySet()) {
      String matrix = matrix(e.getValue());
      String factor = e.getKey().isOne() ? "" : formulas.monomial(e.getKey()) + " * ";
      terms.add(factor + (factor.isEmpty() || !matrix.contains(" ") ? matrix : "(" + matrix + ")"));
    }
    return terms;
  }

  /** A square matrix as a sum of {@code |row><column|}, or its size where that is long. */
  String matrix(ComplexBall ball) {
    ComplexMatrix m = ball.centre();
    if (isMultipleOfIdentity(ball)) {
      return complex(m.re(0, 0), m.im(0, 0));
    }
    List<String> entries = new ArrayList<>();
    for (int i = 0; i < m.rows(); i++) {
      for (int j = 0; j < m.columns(); j++) {
        if (isPresent(ball, i, j)) {
          entries.add(scaled(m.re(i, j), m.im(i, j), "|" + label(i) + "><" + label(j) + "|"));
        }
      }
    }
    return sum(entries, m.frobeniusNorm());
  }

  /** A column as a sum of kets, or its size where that is long. */
  String ket(ComplexBall ball) {
    ComplexMatrix m = ball.centre();
    List<String> entries = new ArrayList<>();
    for (int i = 0; i < m.rows(); i++) {
      if (isPresent(ball, i, 0)) {
        entries.add(scaled(m.re(i, 0), m.im(i, 0), "|" + label(i) + ">"));
      }
    }
    return sum(entries, m.frobeniusNorm());
  }

  /** A pure state as a sum of kets, a mixed one as its density matrix. */
  String state(StateSpec state) {
    return state instanceof StateSpec.Pure pure
        ? ket(pure.ket())
        : matrix(((StateSpec.Mixed) state).density());
  }

  /** Labels of the levels of a basis state, such as {@code g,e}. */
  String label(int index) {
    List<String> labels = new ArrayList<>();
    int rest = index;
    for (int k = space.sites().size() - 1; k >= 0; k--) {
      Site site = space.sites().get(k);
      labels.add(0, site.levels().get(rest % site.dimension()));
      rest /= site.dimension();
    }
    return String.join(",", labels);
  }

  private static boolean isPresent(ComplexBall ball, int i, int j) {
    ComplexMatrix m = ball.centre();
    return Math.hypot(m.re(i, j), m.im(i, j)) > ball.radius();
  }

  private static boolean isMultipleOfIdentity(ComplexBall ball) {
    ComplexMatrix m = ball.centre();
    ComplexMatrix multiple = ComplexMatrix.identity(m.rows()).scale(m.re(0, 0), m.im(0, 0));
    return m.minus(multiple).frobeniusNorm() <= ball.radius();
  }

  private static String sum(List<String> entries, double norm) {
    if (entries.size() > MOST_ENTRIES) {
      return entries.size() + " entries of norm " + FormulaText.number(norm);
    }
    String text =
        entries.stream()
            .map(e -> e.startsWith("-") ? " - " + e.substring(1) : " + " + e)
            .collect(Collectors.joining());
    if (text.isEmpty()) {
      return "0";
    }
    return text.startsWith(" + ") ? text.substring(3) : "-" + text.substring(3);
  }

  private static String scaled(double re, double im, String what) {
    String number = complex(re, im);
    return switch (number) {
      case "1" -> what;
      case "-1" -> "-" + what;
      default -> number + " * " + what;
    };
  }

  private static String complex(double re, double im) {
    if (im == 0) {
      return FormulaText.number(re);
    }
    String size = FormulaText.number(Math.abs(im));
    String imaginary = (im < 0 ? "-" : "") + (size.equals("1") ? "i" : size + "*i");
    if (re == 0) {
      return imaginary;
    }
    return "(" + FormulaText.number(re) + (im < 0 ? "" : "+") + imaginary + ")";
  }
}
