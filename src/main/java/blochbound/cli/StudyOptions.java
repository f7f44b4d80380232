package blochbound.cli;

import blochbound.study.CertificationOptions;
import java.math.BigInteger;
import java.time.Duration;
import java.util.Optional;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.Option;
import picocli.CommandLine.TypeConversionException;

/** Options for how far a study goes, shared by commands. */
final class StudyOptions {
  private static final int MOST_THREADS = 1024;

  @Option(
      names = "--seed",
      paramLabel = "N",
      converter = Seed.class,
      description = "Seed of all random draws (default 1).")
  private Optional<Long> seed = Optional.empty();

  @Option(
      names = "--gap",
      paramLabel = "X",
      converter = Gap.class,
      description = {
        "Narrow every bracket to this width, in the unit of",
        "the limit, even when it is decided earlier."
      })
  private Optional<Double> gap = Optional.empty();

  @Option(
      names = "--rel",
      paramLabel = "X",
      converter = RelativeGap.class,
      description = "The same as a share of the worst loss found, such as 0.01.")
  private Optional<Double> relativeGap = Optional.empty();

  @Option(
      names = "--time",
      paramLabel = "DURATION",
      converter = Time.class,
      description = "Most time for one requirement, such as 20s (default 60s).")
  private Optional<Duration> time = Optional.empty();

  @Option(
      names = "--threads",
      paramLabel = "N",
      converter = Threads.class,
      description = "Worker threads (default: all cores).")
  private Optional<Integer> threads = Optional.empty();

  @Option(
      names = "--samples",
      paramLabel = "N",
      converter = Samples.class,
      description = "Random devices (default: by the size of the case).")
  private Optional<Integer> samples = Optional.empty();

  /** The options given, on top of the defaults. */
  CertificationOptions options() {
    CertificationOptions options = CertificationOptions.withDefaults();
    options = seed.map(options::withSeed).orElse(options);
    options = gap.map(options::withGap).orElse(options);
    options = relativeGap.map(options::withRelativeGap).orElse(options);
    options = time.map(options::withTime).orElse(options);
    options = threads.map(options::withThreads).orElse(options);
    return samples.map(options::withSamples).orElse(options);
  }

  /** A positive number. */
  static final class Gap implements ITypeConverter<Double> {
    @Override
    public Double convert(String text) {
      return real(text, Double.MAX_VALUE, "a positive number such as 1e-3");
    }
  }

  /** A number between 0 and 1. */
  static final class RelativeGap implements ITypeConverter<Double> {
    @Override
    public Double convert(String text) {
      return real(text, Math.nextDown(1.0), "a number between 0 and 1 such as 0.01");
    }
  }

  /** A duration. */
  static final class Time implements ITypeConverter<Duration> {
    @Override
    public Duration convert(String text) {
      try {
        return DurationText.parse(text);
      } catch (IllegalArgumentException e) {
        throw new TypeConversionException(e.getMessage());
      }
    }
  }

  /** A seed. */
  static final class Seed implements ITypeConverter<Long> {
    @Override
    public Long convert(String text) {
      return whole(text, Long.MIN_VALUE, Long.MAX_VALUE);
    }
  }

  /** A number of threads. */
  static final class Threads implements ITypeConverter<Integer> {
    @Override
    public Integer convert(String text) {
      return (int) whole(text, 1, MOST_THREADS);
    }
  }

  /** A number of samples. */
  static final class Samples implements ITypeConverter<Integer> {
    @Override
    public Integer convert(String text) {
      return (int) whole(text, 1, Integer.MAX_VALUE);
    }
  }

  private static double real(String text, double most, String allowed) {
    double value;
    try {
      value = Double.parseDouble(text);
    } catch (NumberFormatException e) {
      value = Double.NaN;
    }
    if (value > 0 && value <= most) {
      return value;
    }
    throw notAllowed(text, allowed);
  }

  private static long whole(String text, long least, long most) {
    BigInteger value;
    try {
      value = new BigInteger(text);
    } catch (NumberFormatException e) {
      throw notAllowed(text, "a whole number");
    }
    if (value.bitLength() < Long.SIZE && value.longValue() >= least && value.longValue() <= most) {
      return value.longValue();
    }
    throw notAllowed(text, "a whole number from " + least + " to " + most);
  }

  private static TypeConversionException notAllowed(String text, String allowed) {
    return new TypeConversionException("`" + text + "`; allowed is " + allowed);
  }
}
