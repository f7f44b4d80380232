package blochbound.sample;

import blochbound.model.Requirement.Sense;
import java.util.Comparator;
import java.util.List;

/**
 * A device and its value of one measure: an estimate.
 *
 * @param value value of the measure in internal units
 * @param z coordinates of the device in the tolerance ball
 */
public record SampledDevice(double value, List<Double> z) {
  /** Copies the list. */
  public SampledDevice {
    z = List.copyOf(z);
  }

  /** Order in which the worst value for a sense comes first; a stable sort keeps ties in order. */
  static Comparator<SampledDevice> worstFirst(Sense sense) {
    return Comparator.comparingDouble(d -> sense.sign() * d.value);
  }
}
