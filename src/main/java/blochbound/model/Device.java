package blochbound.model;

import java.util.List;

/**
 * An open quantum device: d rho/dt = -i [H, rho] + sum_k g_k (V_k rho V_k^+ - {V_k^+ V_k, rho}/2).
 *
 * @param space the sites
 * @param parameters all parameters in the order of the case file
 * @param ball the allowed deviations
 * @param hamiltonian H in angular frequency
 * @param jumps the dissipative terms
 */
public record Device(
    HilbertSpace space,
    List<Parameter> parameters,
    Ball ball,
    OperatorForm hamiltonian,
    List<Jump> jumps) {
  /** Copies the lists. */
  public Device {
    parameters = List.copyOf(parameters);
    jumps = List.copyOf(jumps);
  }

  /** Coordinates of the ball. */
  public ParameterSpace parameterSpace() {
    return ParameterSpace.of(parameters, ball);
  }
}
