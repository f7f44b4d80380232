package blochbound.bound;

import blochbound.bound.BranchOutcome.Reason;
import blochbound.bound.CellBound.Cell;
import blochbound.certificate.RegionCertificate;
import blochbound.model.Ball.Norm;
import blochbound.model.Region;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.PriorityQueue;
import java.util.concurrent.atomic.AtomicBoolean;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;

/**
 * Best-first branch and bound for the minimum of a function over the tolerance ball.
 *
 * <p>The region with the smallest bound is halved along the coordinate that the cell bound names;
 * halves without a part in the ball are dropped, others are drawn together around it. All regions
 * that were not dropped stay in the queue, so that the smallest bound in it, together with those
 * being worked on, holds for the whole ball at any time. With one thread the run is deterministic.
 */
public final class BranchAndBound {
  private static final double SMALLEST_HALF_WIDTH = 0x1p-40;

  /** Relative width at which a bracket is closed to rounding, whatever was asked. */
  private static final double CLOSED = 1e-10;

  /** Width below which a gap relative to a vanishing loss is not narrowed. */
  private static final double LEAST_RELATIVE = 1e-8;

  private record Node(
      Region region,
      Cell cell,
      double certifiedLower,
      Optional<RegionCertificate> certificate,
      long number) {}

  private final Supplier<CellBound> bounds;
  private final BallConstraint ball;
  private final BranchOptions options;
  private final AtomicBoolean stop;
  private final long started = System.nanoTime();
  private final PriorityQueue<Node> open =
      new PriorityQueue<>(
          (a, b) ->
              a.certifiedLower != b.certifiedLower
                  ? Double.compare(a.certifiedLower, b.certifiedLower)
                  : Long.compare(a.number, b.number));
  private final List<Node> unsplittable = new ArrayList<>();
  private final List<Node> working = new ArrayList<>();
  private double attained;
  private double[] point;
  private long regions;
  private Optional<Reason> ended = Optional.empty();
  private Optional<Throwable> failure = Optional.empty();

  private BranchAndBound(
      Supplier<CellBound> bounds, Norm norm, BranchOptions options, AtomicBoolean stop) {
    this.bounds = bounds;
    this.ball = new BallConstraint(norm);
    this.options = options;
    this.stop = stop;
    attained = Double.POSITIVE_INFINITY;
    point = new double[0];
  }

  /**
   * Brackets the minimum.
   *
   * @param bounds makes the cell bound of each worker thread
   * @param coordinates number m of coordinates
   * @param norm norm of the unit ball in those coordinates
   * @param options when to end
   * @param start a point of the ball with its value, found before, or an infinite value
   * @param stop set from outside to end early
   */
  public static BranchOutcome minimise(
      Supplier<CellBound> bounds,
      int coordinates,
      Norm norm,
      BranchOptions options,
      Start start,
      AtomicBoolean stop) {
    BranchAndBound run = new BranchAndBound(bounds, norm, options, stop);
    run.attained = start.value;
    run.point = start.point;
    return run.run(Region.whole(coordinates));
  }

  /**
   * A point found before.
   *
   * @param point coordinates; empty for none
   * @param value value there; infinite for none
   */
  public record Start(double[] point, double value) {
    /** No point. */
    public static Start none() {
      return new Start(new double[0], Double.POSITIVE_INFINITY);
    }
  }

  private BranchOutcome run(Region whole) {
    CellBound first = bounds.get();
    Cell root = first.bound(whole, enough());
    accept(whole, root, Double.NEGATIVE_INFINITY, Optional.empty());
    List<Thread> helpers = new ArrayList<>();
    for (int k = 1; k < options.threads() && !finished(); k++) {
      Thread helper = new Thread(() -> work(bounds.get()), "bound-" + k);
      helper.setDaemon(true);
      helpers.add(helper);
      helper.start();
    }
    work(first);
    for (Thread helper : helpers) {
      joinUninterruptibly(helper);
    }
    if (failure.isPresent()) {
      throw failure.get() instanceof RuntimeException e
          ? e
          : new IllegalStateException("a worker failed", failure.get());
    }
    return outcome();
  }

  private static void joinUninterruptibly(Thread thread) {
    boolean interrupted = false;
    while (thread.isAlive()) {
      try {
        thread.join();
      } catch (InterruptedException e) {
        interrupted = true;
      }
    }
    if (interrupted) {
      Thread.currentThread().interrupt();
    }
  }

  private void work(CellBound bound) {
    try {
      Node node = take();
      while (node != null) {
        List<Region> halves = halves(node);
        List<Cell> cells = new ArrayList<>();
        for (Region half : halves) {
          cells.add(bound.bound(half, enough()));
        }
        give(node, halves, cells);
        node = take();
      }
    } catch (RuntimeException | Error e) {
      fail(e);
    }
  }

  private List<Region> halves(Node node) {
    List<Region> halves = new ArrayList<>();
    for (int side = -1; side <= 1; side += 2) {
      ball.tighten(node.region.half(node.cell.split(), side)).ifPresent(halves::add);
    }
    return halves;
  }

  /** The next region to split, or null when the work has ended. */
  private synchronized @Nullable Node take() {
    while (true) {
      if (finished()) {
        notifyAll();
        return null;
      }
      Node next = open.poll();
      if (next != null && isSplittable(next)) {
        working.add(next);
        return next;
      }
      if (next != null) {
        unsplittable.add(next);
        continue;
      }
      if (working.isEmpty()) {
        ended = Optional.of(Reason.RESOLUTION);
        continue;
      }
      try {
        wait(50);
      } catch (InterruptedException e) {
        stop.set(true);
      }
    }
  }

  private static boolean isSplittable(Node node) {
    return node.cell.split() >= 0 && node.region.halfWidth(node.cell.split()) > SMALLEST_HALF_WIDTH;
  }

  private synchronized void give(Node parent, List<Region> halves, List<Cell> cells) {
    working.remove(parent);
    for (int k = 0; k < halves.size(); k++) {
      accept(halves.get(k), cells.get(k), parent.certifiedLower, parent.certificate);
    }
    notifyAll();
  }

  private synchronized void accept(
      Region region, Cell cell, double parentLower, Optional<RegionCertificate> parentProof) {
    regions++;
    // What holds on the parent holds on its halves; a bound that is no number adds nothing.
    boolean isBetter = cell.certifiedLower() > parentLower;
    double lower = isBetter ? cell.certifiedLower() : parentLower;
    Optional<RegionCertificate> proof =
        isBetter || parentProof.isEmpty() ? cell.certificate() : parentProof;
    open.add(new Node(region, cell, lower, proof, regions));
    if (cell.attained() < attained) {
      attained = cell.attained();
      point = cell.candidate();
    }
  }

  private synchronized void fail(Throwable e) {
    failure = failure.or(() -> Optional.of(e));
    ended = Optional.of(Reason.STOPPED);
    notifyAll();
  }

  /** A bound beyond which a region has no influence on the outcome any more. */
  private synchronized double enough() {
    double width = allowedGap();
    double narrow = attained - width;
    boolean hasLimit = !Double.isNaN(options.limit());
    return Double.isInfinite(width)
        ? options.limit()
        : hasLimit && attained >= options.limit() ? Math.max(narrow, options.limit()) : narrow;
  }

  private double allowedGap() {
    if (options.relativeGap() == 0) {
      return options.gap();
    }
    double loss = Math.max(0, options.reference() - attained);
    double relative =
        Math.max(options.relativeGap() * loss, LEAST_RELATIVE * (1 + Math.abs(attained)));
    // With both gaps given, the wider one is narrow enough.
    return Double.isInfinite(options.gap()) ? relative : Math.max(options.gap(), relative);
  }

  /** Decides whether the work has ended, and why. */
  private synchronized boolean finished() {
    if (ended.isPresent()) {
      return true;
    }
    double lower = certifiedLower();
    double width = allowedGap();
    double closed = CLOSED * (1 + Math.abs(attained));
    boolean decideOnly = Double.isInfinite(width);
    boolean certified = lower >= options.limit();
    boolean refuted = attained < options.limit() - 10 * closed;
    boolean decided = Double.isNaN(options.limit()) || certified || refuted;
    if (stop.get()) {
      ended = Optional.of(Reason.STOPPED);
    } else if (decideOnly && certified) {
      ended = Optional.of(Reason.CERTIFIED);
    } else if (decideOnly && refuted) {
      ended = Optional.of(Reason.REFUTED);
    } else if (attained - lower <= closed || (decided && attained - lower <= width)) {
      ended = Optional.of(Reason.NARROW);
    } else if (System.nanoTime() - started > options.time().toNanos()) {
      ended = Optional.of(Reason.TIME);
    } else if (regions >= options.regions()) {
      ended = Optional.of(Reason.REGIONS);
    } else if (!unsplittable.isEmpty() && smallest(unsplittable) <= lower) {
      // The bracket cannot become narrower from below.
      ended = Optional.of(Reason.RESOLUTION);
    }
    return ended.isPresent();
  }

  private double certifiedLower() {
    double queued = open.isEmpty() ? Double.POSITIVE_INFINITY : open.peek().certifiedLower;
    return Math.min(queued, Math.min(smallest(working), smallest(unsplittable)));
  }

  private static double smallest(List<Node> nodes) {
    double least = Double.POSITIVE_INFINITY;
    for (Node node : nodes) {
      least = Math.min(least, node.certifiedLower);
    }
    return least;
  }

  private BranchOutcome outcome() {
    List<RegionCertificate> certificates = new ArrayList<>();
    for (List<Node> nodes : List.of(new ArrayList<>(open), working, unsplittable)) {
      for (Node node : nodes) {
        node.certificate.ifPresent(certificates::add);
      }
    }
    return new BranchOutcome(
        certifiedLower(),
        attained,
        point.clone(),
        regions,
        (System.nanoTime() - started) * 1e-9,
        ended.orElse(Reason.STOPPED),
        certificates);
  }
}
