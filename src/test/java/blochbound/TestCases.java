package blochbound;

import blochbound.casefile.CaseFaultException;
import blochbound.casefile.CaseReader;
import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.model.DesignCase;
import blochbound.model.Device;
import java.nio.file.Path;

/** Cases written as texts, for tests of the packages that a case runs through. */
public final class TestCases {
  private TestCases() {}

  /** A case without a unit of time from the lines of its sections. */
  public static DesignCase plain(String... lines) {
    return read("timeUnit: none\n" + String.join("\n", lines) + "\n");
  }

  /** The device of such a case. */
  public static Device device(String... lines) {
    return plain(lines).device();
  }

  /** A case from everything but its first line. */
  public static DesignCase read(String text) {
    try {
      return CaseReader.read(
          "format: blochbound-case/1\n" + text,
          "test.yaml",
          Path.of("."),
          RequirementRule.OPTIONAL);
    } catch (CaseFaultException e) {
      throw new IllegalArgumentException(e.faults().toString(), e);
    }
  }
}
