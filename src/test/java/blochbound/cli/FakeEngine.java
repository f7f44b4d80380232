package blochbound.cli;

import blochbound.casefile.CaseFaultException;
import blochbound.casefile.CaseReader.RequirementRule;
import blochbound.casefile.Fault;
import blochbound.model.DesignCase;
import blochbound.report.HandMade;
import blochbound.study.CertificationOptions;
import blochbound.study.CertificationResult;
import blochbound.study.Verdict;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.atomic.AtomicBoolean;

/**
 * An engine whose outcome is the name of the case file: {@code certified}, {@code refuted}, {@code
 * undecided}, {@code faulty}, {@code defect}, {@code exhausted}, {@code endless} or {@code
 * stopped}.
 */
final class FakeEngine implements Engine {
  final List<CertificationOptions> options = new ArrayList<>();
  final List<RequirementRule> rules = new ArrayList<>();

  @Override
  public DesignCase read(Path file, RequirementRule rule) throws CaseFaultException {
    rules.add(rule);
    if (file.toString().equals("faulty")) {
      throw new CaseFaultException(List.of(new Fault("faulty", 3, 7, "unknown key `sties`")));
    }
    if (file.toString().equals("endless")) {
      throw new StackOverflowError();
    }
    return HandMade.designCase(file.toString(), HandMade.emitter());
  }

  @Override
  public CertificationResult certify(
      DesignCase designCase, CertificationOptions given, AtomicBoolean stop) {
    options.add(given);
    return switch (designCase.title()) {
      case "certified" -> HandMade.certifiedBut(Verdict.CERTIFIED, false);
      case "refuted" -> HandMade.certifiedBut(Verdict.REFUTED, false);
      case "undecided" -> HandMade.certifiedBut(Verdict.UNDECIDED, false);
      case "defect" -> throw new IllegalStateException("the bracket is inside out");
      case "exhausted" -> throw new OutOfMemoryError();
      case "stopped" -> {
        stop.set(true);
        yield HandMade.certifiedBut(Verdict.UNDECIDED, true);
      }
      default -> throw new AssertionError(designCase.title());
    };
  }
}
