package blochbound.search;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import blochbound.model.Ball.Norm;
import blochbound.search.SearchOptions.Effort;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The published global minima of standard functions on boxes. */
class StandardFunctionSearchTest {
  private static final SearchOptions THOROUGH =
      SearchOptions.withDefaults().withEffort(Effort.THOROUGH);

  /**
   * [published] minima of Dixon and Szego (1978), Trefethen (2002) and Jamil and Yang (2013), from
   * memory, with digits recomputed by high-precision stationarity at the published minimisers.
   */
  static Stream<StandardFunction> functions() {
    return Stream.of(
        new StandardFunction(
            "six-hump camel",
            new double[] {-3, -2},
            new double[] {3, 2},
            -1.031628453489877,
            StandardFunction::sixHumpCamel),
        new StandardFunction(
            "Branin",
            new double[] {-5, 0},
            new double[] {10, 15},
            0.397887357729738,
            StandardFunction::branin),
        StandardFunction.onCube("Goldstein-Price", 2, -2, 2, 3, StandardFunction::goldsteinPrice),
        new StandardFunction(
            "McCormick",
            new double[] {-1.5, -3},
            new double[] {4, 4},
            -1.913222954981037,
            StandardFunction::mccormick),
        StandardFunction.onCube(
            "Hartmann 3", 3, 0, 1, -3.862779787332663, StandardFunction::hartmann3),
        StandardFunction.onCube(
            "Hartmann 6", 6, 0, 1, -3.322368011415515, StandardFunction::hartmann6),
        StandardFunction.onCube(
            "Shekel 5", 4, 0, 10, -10.15319967905823, x -> StandardFunction.shekel(x, 5)),
        StandardFunction.onCube(
            "Shekel 7", 4, 0, 10, -10.40294056681866, x -> StandardFunction.shekel(x, 7)),
        StandardFunction.onCube(
            "Shekel 10", 4, 0, 10, -10.53640981669204, x -> StandardFunction.shekel(x, 10)),
        StandardFunction.onCube("Trid 2", 2, -4, 4, -2, StandardFunction::trid),
        StandardFunction.onCube("Trid 6", 6, -36, 36, -50, StandardFunction::trid),
        StandardFunction.onCube("Trid 10", 10, -100, 100, -210, StandardFunction::trid),
        StandardFunction.onCube(
            "Schwefel 2", 2, -500, 500, -2 * 418.9828872724337, StandardFunction::schwefel),
        StandardFunction.onCube(
            "Schwefel 4", 4, -500, 500, -4 * 418.9828872724337, StandardFunction::schwefel),
        StandardFunction.onCube(
            "Styblinski-Tang 4",
            4,
            -5,
            5,
            -4 * 39.16616570377142,
            StandardFunction::styblinskiTang),
        StandardFunction.onCube(
            "Michalewicz", 2, 0, Math.PI, -1.801303410098553, StandardFunction::michalewicz),
        StandardFunction.onCube("Easom", 2, -100, 100, -1, StandardFunction::easom),
        StandardFunction.onCube(
            "Trefethen", 2, -1, 1, -3.306868647475237, StandardFunction::trefethen));
  }

  @ParameterizedTest(name = "{0}")
  @MethodSource("functions")
  void thoroughSearchAttainsThePublishedMinimum(StandardFunction function) {
    SearchResult found =
        WorstCaseSearch.run(
            function::objective, function.dimension(), Norm.BOX, THOROUGH.withSeed(3));
    assertEquals(function.minimum(), found.value(), 1e-6);
    // The published minimum is global: nothing lies below it but rounding.
    assertTrue(found.value() >= function.minimum() - 1e-9 * (1 + Math.abs(function.minimum())));
  }
}
