package blochbound.bound;

import blochbound.interval.Interval;

/**
 * Natural interval extensions of textbook functions of global optimisation: Dixon, Szego, Towards
 * Global Optimisation 2 (1978), Jamil, Yang (2013), Rosenbrock (1960), all from memory.
 */
final class TextbookFunctions {
  private TextbookFunctions() {}

  private static Interval n(double value) {
    return Interval.of(value);
  }

  static Interval camel(Interval[] x) {
    Interval x2 = x[0].square();
    Interval y2 = x[1].square();
    Interval third = Interval.ONE.dividedBy(n(3));
    Interval first = n(4).minus(n(2.1).times(x2)).plus(x2.square().times(third)).times(x2);
    return first.plus(x[0].times(x[1])).plus(n(4).times(y2.minus(Interval.ONE)).times(y2));
  }

  static Interval branin(Interval[] x) {
    Interval pi = Interval.PI;
    Interval b = n(5.1).dividedBy(n(4).times(pi.square()));
    Interval c = n(5).dividedBy(pi);
    Interval inner = x[1].minus(b.times(x[0].square())).plus(c.times(x[0])).minus(n(6));
    Interval scale = Interval.ONE.minus(Interval.ONE.dividedBy(n(8).times(pi)));
    return inner.square().plus(n(10).times(scale).times(x[0].cos())).plus(n(10));
  }

  static Interval goldsteinPrice(Interval[] x) {
    Interval a = x[0].plus(x[1]).plus(Interval.ONE).square();
    Interval b = n(2).times(x[0]).minus(n(3).times(x[1])).square();
    Interval xx = x[0].square();
    Interval yy = x[1].square();
    Interval xy = x[0].times(x[1]);
    Interval p =
        n(19)
            .minus(n(14).times(x[0]))
            .plus(n(3).times(xx))
            .minus(n(14).times(x[1]))
            .plus(n(6).times(xy))
            .plus(n(3).times(yy));
    Interval q =
        n(18)
            .minus(n(32).times(x[0]))
            .plus(n(12).times(xx))
            .plus(n(48).times(x[1]))
            .minus(n(36).times(xy))
            .plus(n(27).times(yy));
    return Interval.ONE.plus(a.times(p)).times(n(30).plus(b.times(q)));
  }

  static Interval mcCormick(Interval[] x) {
    return x[0].plus(x[1])
        .sin()
        .plus(x[0].minus(x[1]).square())
        .minus(n(1.5).times(x[0]))
        .plus(n(2.5).times(x[1]))
        .plus(Interval.ONE);
  }

  static Interval styblinskiTang(Interval[] x) {
    Interval sum = Interval.ZERO;
    for (Interval y : x) {
      sum = sum.plus(y.square().square()).minus(n(16).times(y.square())).plus(n(5).times(y));
    }
    return sum.times(n(0.5));
  }

  static Interval rosenbrock(Interval[] x) {
    Interval a = x[1].minus(x[0].square()).square().times(n(100));
    return a.plus(Interval.ONE.minus(x[0]).square());
  }
}
