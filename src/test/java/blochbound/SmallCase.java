package blochbound;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/** A two-level emitter with a closed form, as a case file for whole-program tests. */
final class SmallCase {
  private SmallCase() {}

  /**
   * Writes an emitter with decay 1 /us and heating 0.1 /us, both +-20 %, whose population of e is
   * heating / (heating + decay): nominal 1/11, between 0.08/1.28 = 0.0625 and 0.12/0.92 = 0.1304...
   *
   * @param requirement the rest of the one requirement, such as {@code atMost: 0.2}
   */
  static Path write(Path directory, String name, String requirement) throws IOException {
    return Files.writeString(
        directory.resolve(name),
        """
        format: blochbound-case/1
        title: "Warm emitter"
        timeUnit: us
        sites:
          emitter: {levels: [g, e]}
        parameters:
          decay:   {nominal: 1.0 /us, tolerance: 20 %}
          heating: {nominal: 0.1 /us, tolerance: 20 %}
        jumps:
          - {rate: decay,   operator: lower@emitter}
          - {rate: heating, operator: raise@emitter}
        requirements:
          - {name: cold, REQUIREMENT}
        """
            .replace("REQUIREMENT", requirement));
  }

  /** The population of e must not exceed a limit. */
  static Path coldest(Path directory, String name, String limit) throws IOException {
    return write(directory, name, "measure: \"population(emitter, e)\", atMost: " + limit);
  }
}
