package blochbound.study;

import blochbound.model.DesignCase;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * The main study: for every requirement nominal value, worst found, guarantee, samples, verdict.
 */
public final class Certification {
  private Certification() {}

  /**
   * Runs the study.
   *
   * @param designCase the case
   * @param options how far to go
   * @param stop set from outside to end early with the brackets so far
   */
  public static CertificationResult run(
      DesignCase designCase, CertificationOptions options, AtomicBoolean stop) {
    throw new UnsupportedOperationException();
  }
}
