package blochbound.casefile;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.TreeSet;
import java.util.function.Supplier;

/** Collects the faults of one reading, up to a limit. */
final class FaultLog {
  static final int MOST_FAULTS = 200;

  private final TreeSet<Fault> faults = new TreeSet<>(Fault.BY_PLACE);
  private boolean cut;

  /** Adds a fault; beyond the limit it is only counted as left out. */
  void add(Fault fault) {
    if (faults.size() < MOST_FAULTS) {
      faults.add(fault);
    } else {
      cut = true;
    }
  }

  /** Tells whether no fault was found. */
  boolean isEmpty() {
    return faults.isEmpty();
  }

  /** Tells whether no more faults are listed. */
  boolean isFull() {
    return faults.size() >= MOST_FAULTS;
  }

  /** Runs one piece of reading and keeps its fault. */
  <T> Optional<T> attempt(Supplier<T> reading) {
    try {
      return Optional.of(reading.get());
    } catch (FaultSignal signal) {
      signal.fault().ifPresent(this::add);
      return Optional.empty();
    }
  }

  /** Runs one piece of reading that has no result. */
  void attempt(Runnable reading) {
    attempt(
        () -> {
          reading.run();
          return true;
        });
  }

  /** All faults in the order of their places. */
  List<Fault> sorted() {
    List<Fault> sorted = new ArrayList<>(faults);
    if (cut) {
      Fault last = sorted.get(sorted.size() - 1);
      String message = "there are more than " + MOST_FAULTS + " faults; the rest is not listed";
      sorted.add(new Fault(last.file(), last.line(), last.column(), message));
    }
    return sorted;
  }

  /**
   * Ends the reading when there are faults.
   *
   * @throws CaseFaultException with all faults, when there is one
   */
  void throwIfAny() throws CaseFaultException {
    if (!isEmpty()) {
      throw new CaseFaultException(sorted());
    }
  }
}
