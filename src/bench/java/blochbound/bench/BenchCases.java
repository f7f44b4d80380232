package blochbound.bench;

import blochbound.casefile.CaseFaultException;
import blochbound.casefile.CaseReader;
import blochbound.model.DesignCase;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;

/** Case texts of growing size for benchmarks of the bound. */
final class BenchCases {
  private static final List<String> PAIR_PARAMETERS =
      List.of(
          "pumpParity 1.0 0.2",
          "pumpPhase 1.0 0.2",
          "decayLeft 0.02 0.01",
          "decayRight 0.02 0.01",
          "dephaseLeft 0.01 0.005",
          "dephaseRight 0.01 0.005",
          "shiftLeft 0 0.05",
          "shiftRight 0 0.05",
          "fieldLeft 0 0.05",
          "coupling 0 0.05",
          "fieldRight 0 0.05",
          "exchange 0 0.05");

  private BenchCases() {}

  private static DesignCase read(String text) {
    try {
      return CaseReader.read(text, "bench.yaml", Path.of("."), CaseReader.RequirementRule.REQUIRED);
    } catch (CaseFaultException e) {
      throw new IllegalStateException(e);
    }
  }

  /**
   * The parity-pumped pair.
   *
   * @param uncertain how many of its parameters have a tolerance, 1 to 12
   * @param scale factor on all tolerances
   */
  static DesignCase pair(int uncertain, double scale) {
    StringBuilder parameters = new StringBuilder();
    for (int k = 0; k < PAIR_PARAMETERS.size(); k++) {
      String[] part = PAIR_PARAMETERS.get(k).split(" ", -1);
      parameters.append(
          parameter(part[0], part[1], Double.parseDouble(part[2]) * scale, k < uncertain));
    }
    return read(
        """
        format: blochbound-case/1
        title: "Parity-pumped pair"
        timeUnit: none
        sites:
          left:  {levels: [g, e]}
          right: {levels: [g, e]}
        parameters:
        %s
        operators:
          odd:   (1 - Z@left * Z@right) / 2
          minus: (1 - X@left * X@right) / 2
        hamiltonian: >-
          shiftLeft / 2 * Z@left + shiftRight / 2 * Z@right + fieldLeft / 2 * X@left
          + fieldRight / 2 * X@right + coupling / 4 * Z@left * Z@right
          + exchange / 4 * Y@left * Y@right
        jumps:
          - {rate: pumpParity,       operator: X@left * odd}
          - {rate: pumpPhase,        operator: Z@left * minus}
          - {rate: decayLeft,        operator: lower@left}
          - {rate: decayRight,       operator: lower@right}
          - {rate: dephaseLeft / 2,  operator: Z@left}
          - {rate: dephaseRight / 2, operator: Z@right}
        requirements:
          - {name: entangled, measure: "concurrence(left, right)", atLeast: 0.5}
        """
            .formatted(parameters));
  }

  /**
   * A chain of driven two-level sites with four parameters at 10 %, of which some are uncertain.
   */
  static DesignCase chain(int sites, int uncertain) {
    StringBuilder text =
        new StringBuilder("format: blochbound-case/1\ntitle: Chain\ntimeUnit: none\nsites:\n");
    StringBuilder hamiltonian = new StringBuilder("drive / 2 * X@s0");
    StringBuilder jumps = new StringBuilder();
    for (int s = 0; s < sites; s++) {
      text.append("  s").append(s).append(": {levels: [g, e]}\n");
      jumps.append("  - {rate: decay, operator: lower@s").append(s).append("}\n");
      jumps.append("  - {rate: dephasing, operator: Z@s").append(s).append("}\n");
      if (s > 0) {
        String pair = "(X@s%d * X@s%d + Y@s%d * Y@s%d)".formatted(s - 1, s, s - 1, s);
        hamiltonian.append(" + exchange / 4 * ").append(pair);
      }
    }
    text.append("parameters:\n");
    text.append(parameter("exchange", "1.0", 0.1, uncertain > 0));
    text.append(parameter("decay", "0.5", 0.05, uncertain > 1));
    text.append(parameter("drive", "0.6", 0.06, uncertain > 2));
    text.append(parameter("dephasing", "0.1", 0.01, uncertain > 3));
    text.append("hamiltonian: \"").append(hamiltonian).append("\"\njumps:\n").append(jumps);
    text.append(
        "requirements:\n  - {name: lit, measure: \"population(s%d, e)\", atLeast: 0.001}\n"
            .formatted(sites - 1));
    return read(text.toString());
  }

  private static String parameter(
      String name, String nominal, double tolerance, boolean uncertain) {
    return uncertain
        ? String.format(
            Locale.ROOT, "  %s: {nominal: %s, tolerance: %.6f}%n", name, nominal, tolerance)
        : "  %s: {nominal: %s}\n".formatted(name, nominal);
  }
}
