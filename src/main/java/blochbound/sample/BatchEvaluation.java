package blochbound.sample;

import blochbound.generator.BlochGenerator;
import blochbound.measure.LocatedMeasure;
import blochbound.measure.StationaryMeasure;
import blochbound.model.Requirement.Sense;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import java.util.stream.Stream;

/** Evaluates all measures at the steady states of batches of devices; workspace for one thread. */
final class BatchEvaluation {
  /** What one batch gave. */
  static final class Values {
    private final int index;
    private final double[][] values;
    private final List<List<SampledDevice>> worst;
    private final int devices;
    private final int notUnique;

    private Values(
        BatchQueue.Batch batch, double[][] values, List<List<SampledDevice>> worst, int notUnique) {
      index = batch.index();
      devices = batch.devices().size();
      this.values = values;
      this.worst = worst;
      this.notUnique = notUnique;
    }

    /** Number of the batch. */
    int index() {
      return index;
    }

    /** Number of its devices. */
    int devices() {
      return devices;
    }

    /** Values of a measure, device by device. */
    DoubleStream values(int measure) {
      return Arrays.stream(values[measure]);
    }

    /** Its worst devices for a measure, worst first. */
    Stream<SampledDevice> worst(int measure) {
      return worst.get(measure).stream();
    }

    /** Number of its devices without a unique steady state. */
    int notUnique() {
      return notUnique;
    }
  }

  private final LaneSolver solver;
  private final List<LocatedMeasure> measures;
  private final List<Sense> senses;
  private final List<StationaryMeasure> stationary = new ArrayList<>();
  private final double[] state;

  BatchEvaluation(
      LaneSolver solver,
      BlochGenerator generator,
      List<LocatedMeasure> measures,
      List<Sense> senses) {
    this.solver = solver;
    this.measures = measures;
    this.senses = senses;
    for (int k = 0; k < measures.size(); k++) {
      stationary.add(new StationaryMeasure(generator, measures.get(k), senses.get(k)));
    }
    state = new double[generator.basis().size()];
  }

  /** Takes batches until there are no more. */
  List<Values> work(BatchQueue queue) {
    List<Values> done = new ArrayList<>();
    BatchQueue.Batch batch = queue.take();
    while (!batch.devices().isEmpty()) {
      done.add(evaluate(batch));
      batch = queue.take();
    }
    return done;
  }

  private Values evaluate(BatchQueue.Batch batch) {
    List<double[]> devices = batch.devices();
    solver.solve(devices);
    double[][] values = new double[measures.size()][devices.size()];
    int notUnique = 0;
    for (int l = 0; l < devices.size(); l++) {
      solver.state(l, state);
      notUnique += solver.isUnique(l) ? 0 : 1;
      for (int k = 0; k < values.length; k++) {
        values[k][l] = value(k, solver.isUnique(l), devices.get(l));
      }
    }
    List<List<SampledDevice>> worst = new ArrayList<>();
    for (int k = 0; k < values.length; k++) {
      worst.add(worst(values[k], devices, senses.get(k)));
    }
    return new Values(batch, values, worst, notUnique);
  }

  /** Value of a measure at the state, or the worst over the stationary states of the device. */
  private double value(int k, boolean isUnique, double[] z) {
    StationaryMeasure at = stationary.get(k);
    double value = isUnique ? measures.get(k).measure().value(at.reduced(state)) : at.value(z);
    if (Double.isNaN(value)) {
      throw new IllegalStateException(
          "measure " + k + " has no value at the coordinates " + Arrays.toString(z));
    }
    return value;
  }

  private static List<SampledDevice> worst(double[] values, List<double[]> devices, Sense sense) {
    return IntStream.range(0, values.length)
        .mapToObj(l -> new SampledDevice(values[l], Arrays.stream(devices.get(l)).boxed().toList()))
        .sorted(SampledDevice.worstFirst(sense))
        .limit(SampleStudy.WORST_KEPT)
        .toList();
  }
}
