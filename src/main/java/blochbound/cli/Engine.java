package blochbound.cli;

import blochbound.casefile.CaseFaultException;
import blochbound.casefile.CaseReader;
import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.model.DesignCase;
import blochbound.study.Certification;
import blochbound.study.CertificationOptions;
import blochbound.study.CertificationResult;
import java.nio.file.Path;
import java.util.concurrent.atomic.AtomicBoolean;

/** What the commands have done for them; tests put another one in its place. */
interface Engine {
  /** The real one. */
  Engine STANDARD =
      new Engine() {
        @Override
        public DesignCase read(Path file, RequirementRule rule) throws CaseFaultException {
          return CaseReader.read(file, rule);
        }

        @Override
        public CertificationResult certify(
            DesignCase designCase, CertificationOptions options, AtomicBoolean stop) {
          return Certification.run(designCase, options, stop);
        }
      };

  /**
   * Reads a case file.
   *
   * @throws CaseFaultException with all faults of the file
   */
  DesignCase read(Path file, RequirementRule rule) throws CaseFaultException;

  /** Runs the main study; ends early with the brackets so far once {@code stop} is set. */
  CertificationResult certify(
      DesignCase designCase, CertificationOptions options, AtomicBoolean stop);
}
