package blochbound.cli;

import java.util.Arrays;

/** Exit codes in ascending severity: of several outcomes the most severe one is reported. */
enum ExitCode {
  /** Every requirement is certified, or the command succeeded. */
  SUCCESS(0),
  /** No requirement is refuted and at least one is undecided. */
  UNDECIDED(4),
  /** At least one requirement is refuted. */
  REFUTED(3),
  /** Stopped from outside; the brackets so far are printed. */
  INTERRUPTED(130),
  /** An output could not be written. */
  CANNOT_WRITE(6),
  /** Bad usage or bad input. */
  BAD_INPUT(2),
  /** A defect of the program. */
  INTERNAL_ERROR(1);

  private final int number;

  ExitCode(int number) {
    this.number = number;
  }

  /** The number that the operating system sees. */
  int number() {
    return number;
  }

  /** The exit code of that number. */
  static ExitCode of(int number) {
    return Arrays.stream(values()).filter(c -> c.number == number).findFirst().orElseThrow();
  }

  /** The more severe of the two. */
  ExitCode orWorse(ExitCode other) {
    return compareTo(other) >= 0 ? this : other;
  }
}
