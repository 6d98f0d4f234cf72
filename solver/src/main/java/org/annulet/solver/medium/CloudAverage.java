package org.annulet.solver.medium;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Map;

/**
 * A three-dimensional temperature field brought onto the plane of a mesh: averaged over the angle θ
 * onto a section, or over the gap onto a ring. The chamber's axis is x; θ = atan2(z, y).
 *
 * <pre>
 *   T = ( mean of T^(−1/2) )^(−2)
 * </pre>
 *
 * keeps the mean travel time along the averaged direction (c ∝ √T). Which mean a mode sees depends
 * on its direction: between the harmonic mean (waves along it, layers in series) and the arithmetic
 * mean (waves across it, layers side by side), the bounds of Wiener 1912. Their spread is reported.
 *
 * <p>Points are gathered in square cells as fine as the data's finest decile; at each cell the
 * space is sampled along θ or r at the median spacing by the same local fit as plane data, so a
 * crowd of points on one side does not weigh more.
 *
 * @param field on the plane
 * @param spacing side of the cells in m
 * @param largestSpread largest relative difference in sound speed between the two bounds
 * @param meanSpread its mean over the cells
 */
public record CloudAverage(
    ScatteredTemperature field, double spacing, double largestSpread, double meanSpread) {
  /** Most samples of one average: some ten seconds. */
  private static final double MOST_SAMPLES = 3e6;

  /** Samples a small cloud may always take. */
  private static final double FREE_SAMPLES = 2e5;

  /** Samples for each point of the cloud; more would tell nothing the points do not hold. */
  private static final double SAMPLES_PER_POINT = 6;

  private static final int FEWEST = 8;
  private static final int MOST = 720;

  /** The field averaged over θ, for a section; the angles averaged over are those the data span. */
  public static CloudAverage overAngle(PointCloud cloud) {
    int n = cloud.size();
    double[] r = new double[n];
    double[] theta = new double[n];
    for (int i = 0; i < n; i++) {
      r[i] = Math.hypot(cloud.y()[i], cloud.z()[i]);
      theta[i] = Math.atan2(cloud.z()[i], cloud.y()[i]);
    }
    LocalFit fit = fit(cloud);
    double[] sector = span(theta);
    double width = sector[1];
    double[] spacing = spacings(fit);
    Cells cells =
        Cells.of(cloud.x(), r, spacing[0], c -> count(width * c[1], Math.max(spacing[1], c[2])));
    return cells.average(
        (x, rr, k, m) -> {
          double angle = sector[0] + width * (k + 0.5) / m;
          return new double[] {fit.at(x, rr * Math.cos(angle), rr * Math.sin(angle)), 1};
        },
        0);
  }

  /**
   * The field averaged over the gap, for a ring.
   *
   * @param cloud points; those outside the gap do not count as places, only as neighbours
   * @param shell the gap
   * @throws IllegalArgumentException if no point lies in the gap
   */
  public static CloudAverage overGap(PointCloud cloud, RingShell shell) {
    double period = shell.period();
    double[] x = new double[cloud.size()];
    double[] arc = new double[cloud.size()];
    int n = 0;
    for (int i = 0; i < cloud.size(); i++) {
      double r = Math.hypot(cloud.y()[i], cloud.z()[i]);
      if (r >= shell.innerRadius() && r <= shell.outerRadius()) {
        x[n] = cloud.x()[i];
        arc[n++] = shell.unrolledRadius() * Math.atan2(cloud.z()[i], cloud.y()[i]);
      }
    }
    if (n == 0) {
      throw new IllegalArgumentException(
          "no point of the cloud lies between the radii "
              + shell.innerRadius()
              + " and "
              + shell.outerRadius()
              + " m; the chamber's axis must be x, lengths in m");
    }
    LocalFit fit = fit(cloud);
    double gap = shell.outerRadius() - shell.innerRadius();
    double[] spacing = spacings(fit);
    Cells cells =
        Cells.of(
            Arrays.copyOf(x, n),
            Arrays.copyOf(arc, n),
            spacing[0],
            c -> count(gap, Math.max(spacing[1], c[2])));
    return cells.average(
        (xx, y, k, m) -> {
          double r = shell.innerRadius() + gap * (k + 0.5) / m;
          double angle = y / shell.unrolledRadius();
          return new double[] {fit.at(xx, r * Math.cos(angle), r * Math.sin(angle)), r};
        },
        period);
  }

  private static LocalFit fit(PointCloud cloud) {
    return new LocalFit(new double[][] {cloud.x(), cloud.y(), cloud.z()}, cloud.temperature());
  }

  private static int count(double length, double spacing) {
    return (int) Math.max(FEWEST, Math.min(MOST, Math.ceil(length / spacing)));
  }

  /**
   * First decile and median of the distance to the nearest other point, from at most 2000 points
   * taken evenly: the wall layers are as thin as the one, the bulk as coarse as the other.
   */
  private static double[] spacings(LocalFit fit) {
    PointTree tree = fit.tree();
    int step = Math.max(1, tree.size() / 2000);
    List<Double> found = new ArrayList<>();
    int[] index = new int[4];
    double[] squared = new double[4];
    for (int i = 0; i < tree.size(); i += step) {
      double[] q = {tree.coordinate(0, i), tree.coordinate(1, i), tree.coordinate(2, i)};
      int n = tree.nearest(q, index, squared);
      for (int k = 0; k < n; k++) {
        if (squared[k] > 0) {
          found.add(Math.sqrt(squared[k]));
          break;
        }
      }
    }
    if (found.isEmpty()) {
      throw new IllegalArgumentException("all points of the cloud coincide");
    }
    found.sort(null);
    return new double[] {found.get(found.size() / 10), found.get(found.size() / 2)};
  }

  /** First angle and width of the angles the data span: the circle without its largest gap. */
  private static double[] span(double[] theta) {
    double[] sorted = theta.clone();
    Arrays.sort(sorted);
    double largest = sorted[0] + 2 * Math.PI - sorted[sorted.length - 1];
    double start = sorted[0];
    for (int i = 1; i < sorted.length; i++) {
      if (sorted[i] - sorted[i - 1] > largest) {
        largest = sorted[i] - sorted[i - 1];
        start = sorted[i];
      }
    }
    return new double[] {start, 2 * Math.PI - largest};
  }

  /** One sample of a cell: {temperature, weight} of sample k of m. */
  @FunctionalInterface
  private interface Sampler {
    double[] at(double x, double y, int k, int m);
  }

  /** Number of samples of a cell at (x, y) when the spacing is s. */
  @FunctionalInterface
  private interface Counter {
    int of(double[] xys);
  }

  /** Places on the plane: the mean positions of the points of each occupied square. */
  private record Cells(double[] x, double[] y, int[] samples, double spacing) {
    static Cells of(double[] x, double[] y, double finest, Counter counter) {
      double most = Math.min(MOST_SAMPLES, Math.max(FREE_SAMPLES, SAMPLES_PER_POINT * x.length));
      for (double s = finest; ; s *= 1.26) {
        Map<Long, double[]> sums = new HashMap<>();
        List<double[]> inOrder = new ArrayList<>();
        for (int i = 0; i < x.length; i++) {
          long key =
              ((long) Math.floor(x[i] / s) << 32) ^ ((long) Math.floor(y[i] / s) & 0xffffffffL);
          double[] sum = sums.get(key);
          if (sum == null) {
            sum = new double[3];
            sums.put(key, sum);
            inOrder.add(sum);
          }
          sum[0] += x[i];
          sum[1] += y[i];
          sum[2]++;
        }
        double total = 0;
        double[] cx = new double[inOrder.size()];
        double[] cy = new double[cx.length];
        int[] samples = new int[cx.length];
        for (int c = 0; c < cx.length; c++) {
          double[] sum = inOrder.get(c);
          cx[c] = sum[0] / sum[2];
          cy[c] = sum[1] / sum[2];
          samples[c] = counter.of(new double[] {cx[c], cy[c], s});
          total += samples[c];
        }
        if (total <= most) {
          return new Cells(cx, cy, samples, s);
        }
      }
    }

    CloudAverage average(Sampler sampler, double period) {
      double[] kelvin = new double[x.length];
      double largest = 0;
      double spread = 0;
      for (int c = 0; c < x.length; c++) {
        double weight = 0;
        double arithmetic = 0;
        double travel = 0;
        double harmonic = 0;
        for (int k = 0; k < samples[c]; k++) {
          double[] s = sampler.at(x[c], y[c], k, samples[c]);
          weight += s[1];
          arithmetic += s[1] * s[0];
          travel += s[1] / Math.sqrt(s[0]);
          harmonic += s[1] / s[0];
        }
        kelvin[c] = Math.pow(weight / travel, 2);
        double cell = Math.sqrt(arithmetic * harmonic) / weight - 1;
        largest = Math.max(largest, cell);
        spread += cell / x.length;
      }
      ScatteredTemperature field =
          period == 0
              ? ScatteredTemperature.onSection(x, y, kelvin)
              : ScatteredTemperature.onRing(x, y, kelvin, period);
      return new CloudAverage(field, spacing, largest, spread);
    }
  }
}
