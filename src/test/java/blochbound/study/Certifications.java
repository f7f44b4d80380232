package blochbound.study;

import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.TestCases;
import blochbound.model.DesignCase;
import blochbound.model.Requirement.Sense;
import java.time.Duration;
import java.util.concurrent.atomic.AtomicBoolean;

/** Small runs of the main study, whose ordering is held against every result. */
final class Certifications {
  private Certifications() {}

  /** One thread, few samples: deterministic and quick. */
  static CertificationOptions options() {
    return CertificationOptions.withDefaults()
        .withThreads(1)
        .withSamples(400)
        .withTime(Duration.ofSeconds(20));
  }

  static CertificationResult run(DesignCase designCase, CertificationOptions options) {
    CertificationResult result = Certification.run(designCase, options, new AtomicBoolean());
    result.requirements().forEach(r -> isOrdered(designCase, r));
    return result;
  }

  /** The only requirement of a case of the given lines. */
  static RequirementResult only(CertificationOptions options, String... lines) {
    return run(TestCases.plain(lines), options).requirements().get(0);
  }

  /** Guaranteed, found, and sampled values in order, and the worst point inside the ball. */
  private static void isOrdered(DesignCase designCase, RequirementResult result) {
    if (result.guaranteed().isEmpty()) {
      return;
    }
    double sign = result.requirement().sense() == Sense.AT_LEAST ? 1 : -1;
    double guaranteed = sign * result.guaranteed().get().value();
    double found = sign * result.worstFound().orElseThrow().value();
    assertTrue(guaranteed <= found, result.toString());
    result.nominal().ifPresent(n -> assertTrue(found <= sign * n));
    result.sampled().ifPresent(s -> assertTrue(found <= sign * s.worst()));
    assertTrue(designCase.device().parameterSpace().contains(result.worstFound().get().point()));
  }

  static double guaranteed(RequirementResult result) {
    return result.guaranteed().orElseThrow().value();
  }

  static double found(RequirementResult result) {
    return result.worstFound().orElseThrow().value();
  }
}
