package blochbound.measure;

import java.util.List;

/**
 * A measure together with the sites of the device whose reduced state it looks at.
 *
 * @param measure the measure on the product space of the sites, in the order given
 * @param sites positions of the sites in ascending order
 */
public record LocatedMeasure(Measure measure, List<Integer> sites) {
  /** Copies the list. */
  public LocatedMeasure {
    sites = List.copyOf(sites);
  }
}
