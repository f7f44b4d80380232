package blochbound.model;

import blochbound.check.Check;
import java.util.List;

/**
 * A part of the device with finitely many levels.
 *
 * @param name name in the case file
 * @param levels level labels, lowest first
 */
public record Site(String name, List<String> levels) {
  /** Copies the labels and checks that there is one. */
  public Site {
    levels = List.copyOf(levels);
    Check.atLeast(levels.size(), 1, "number of levels of site " + name);
  }

  /** Number of levels. */
  public int dimension() {
    return levels.size();
  }
}
