package org.annulet.cases.uncertainty;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.apache.commons.math3.linear.SingularMatrixException;
import org.apache.commons.math3.stat.StatUtils;
import org.apache.commons.math3.stat.correlation.Covariance;
import org.apache.commons.math3.stat.interval.ConfidenceInterval;
import org.apache.commons.math3.stat.interval.WilsonScoreInterval;
import org.apache.commons.math3.stat.regression.OLSMultipleLinearRegression;
import org.apache.commons.math3.util.FastMath;

/**
 * What the samples say of one mode.
 *
 * @param nominal the mode of the case as it stands
 * @param followed samples in which it was found
 * @param grows share of those in which it grows, with its 95 % interval {low, high}
 * @param growth mean, standard deviation, 5 %, 50 % and 95 % point in 1/s
 * @param frequency the same in Hz
 * @param first share foretold to first order from the same samples
 * @param second share foretold to second order; empty where there is no such theory
 * @param shares of the variance of the growth rate by group; NaN where they cannot be told
 * @param explained R² of the linear regression behind the shares
 * @param tightened share foretold with one group's widths halved, by group
 */
record ModeStatistics(
    Engine.Nominal nominal,
    int followed,
    double grows,
    double[] interval,
    double[] growth,
    double[] frequency,
    double first,
    Optional<Double> second,
    double[] shares,
    double explained,
    double[] tightened) {
  private static final double CONFIDENCE = 0.95;

  /** The samples with their departures. */
  record Drawn(List<double[]> x, List<Sample> samples) {}

  static List<ModeStatistics> of(Engine engine, Drawn drawn) {
    int n = drawn.samples().size();
    List<double[]> first = drawn.x().parallelStream().map(engine::first).toList();
    List<Optional<double[]>> second = drawn.x().parallelStream().map(engine::second).toList();
    List<List<double[]>> halved = new ArrayList<>();
    for (Engine.Group g : engine.groups()) {
      halved.add(
          drawn.x().parallelStream()
              .map(
                  x -> {
                    double[] y = x.clone();
                    for (int i = g.first(); i < g.first() + g.count(); i++) {
                      y[i] *= 0.5;
                    }
                    return engine.second(y).orElseGet(() -> engine.first(y));
                  })
              .toList());
    }
    List<ModeStatistics> out = new ArrayList<>();
    for (int k = 0; k < engine.nominal().size(); k++) {
      int mode = k;
      List<Integer> found = new ArrayList<>();
      for (int i = 0; i < n; i++) {
        if (!drawn.samples().get(i).members().get(k).isNaN()) {
          found.add(i);
        }
      }
      double[] growth =
          found.stream()
              .mapToDouble(i -> drawn.samples().get(i).members().get(mode).getReal())
              .toArray();
      double[] hertz =
          found.stream()
              .mapToDouble(
                  i -> drawn.samples().get(i).members().get(mode).getImaginary() / 2 / Math.PI)
              .toArray();
      int growing = (int) Arrays.stream(growth).filter(g -> g > 0).count();
      double[] shares = new double[engine.groups().size()];
      double explained = shares(engine, drawn, found, growth, shares);
      boolean twice = second.get(0).isPresent();
      out.add(
          new ModeStatistics(
              engine.nominal().get(k),
              found.size(),
              found.isEmpty() ? Double.NaN : (double) growing / found.size(),
              interval(growing, found.size()),
              summary(growth),
              summary(hertz),
              share(first, k),
              twice
                  ? Optional.of(share(second.stream().map(Optional::orElseThrow).toList(), k))
                  : Optional.empty(),
              shares,
              explained,
              halved.stream().mapToDouble(h -> share(h, mode)).toArray()));
    }
    return out;
  }

  private static double share(List<double[]> growth, int mode) {
    return (double) growth.stream().filter(g -> g[mode] > 0).count() / growth.size();
  }

  /** Wilson's interval of a share. */
  static double[] interval(int hits, int trials) {
    if (trials == 0) {
      return new double[] {0, 1};
    }
    ConfidenceInterval c = new WilsonScoreInterval().createInterval(trials, hits, CONFIDENCE);
    return new double[] {Math.max(0, c.getLowerBound()), Math.min(1, c.getUpperBound())};
  }

  private static double[] summary(double[] v) {
    if (v.length < 2) {
      return new double[] {Double.NaN, Double.NaN, Double.NaN, Double.NaN, Double.NaN};
    }
    return new double[] {
      StatUtils.mean(v),
      FastMath.sqrt(StatUtils.variance(v)),
      StatUtils.percentile(v, 5),
      StatUtils.percentile(v, 50),
      StatUtils.percentile(v, 95)
    };
  }

  /** b_i Cov(x_i, σ)/Var σ, summed over each group; all of them add up to R², which is returned. */
  private static double shares(
      Engine engine, Drawn drawn, List<Integer> found, double[] growth, double[] shares) {
    Arrays.fill(shares, Double.NaN);
    int d = drawn.x().get(0).length;
    if (found.size() < 2 * d + 4 || !(StatUtils.variance(growth) > 0)) {
      return Double.NaN;
    }
    double[][] x = found.stream().map(i -> drawn.x().get(i)).toArray(double[][]::new);
    OLSMultipleLinearRegression regression = new OLSMultipleLinearRegression();
    try {
      regression.newSampleData(growth, x);
      double[] b = regression.estimateRegressionParameters();
      double total = StatUtils.variance(growth);
      for (int g = 0; g < shares.length; g++) {
        Engine.Group group = engine.groups().get(g);
        shares[g] = 0;
        for (int i = group.first(); i < group.first() + group.count(); i++) {
          int column = i;
          double[] own = Arrays.stream(x).mapToDouble(row -> row[column]).toArray();
          shares[g] += b[i + 1] * new Covariance().covariance(own, growth) / total;
        }
      }
      return regression.calculateRSquared();
    } catch (SingularMatrixException e) {
      return Double.NaN;
    }
  }
}
