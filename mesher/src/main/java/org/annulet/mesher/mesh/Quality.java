package org.annulet.mesher.mesh;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.PriorityQueue;

/**
 * How good a mesh is: counts, angles, sizes, the worst triangles, and how finely it resolves a
 * wave. The size h of a triangle is its longest side. Immutable.
 */
public final class Quality {
  private static final int ANGLE_BINS = 6;
  private static final double BIN_DEGREES = 10;
  private static final int SIZE_BINS = 12;
  private static final int WORST = 5;

  private final int nodes;
  private final int triangles;
  private final int segments;
  private final List<String> zoneNames;
  private final double[] largestOfZone;
  private final double smallestAngle;
  private final double largestAngle;
  private final double smallestSize;
  private final double largestSize;
  private final int[] angleHistogram = new int[ANGLE_BINS];
  private final int[] sizeHistogram = new int[SIZE_BINS];
  private final List<Triangle> worst;

  /**
   * A triangle worth looking at.
   *
   * @param index its number
   * @param zone its zone
   * @param smallestAngle in degrees
   * @param size longest side in m
   * @param x first coordinate of its centroid in m
   * @param y second coordinate of its centroid in m
   */
  public record Triangle(
      int index, String zone, double smallestAngle, double size, double x, double y) {}

  private Quality(Mesh mesh) {
    nodes = mesh.nodeCount();
    triangles = mesh.triangleCount();
    segments = mesh.segmentCount();
    zoneNames = mesh.zoneNames();
    largestOfZone = new double[zoneNames.size()];
    double[] sizes = new double[triangles];
    double lowest = 180;
    double highest = 0;
    PriorityQueue<Triangle> poorest =
        new PriorityQueue<>(
            Comparator.comparingDouble(Triangle::smallestAngle)
                .thenComparingInt(Triangle::index)
                .reversed());
    for (int t = 0; t < triangles; t++) {
      double[] shape = shape(mesh, t);
      sizes[t] = shape[2];
      lowest = Math.min(lowest, shape[0]);
      highest = Math.max(highest, shape[1]);
      int zone = mesh.zone(t);
      largestOfZone[zone] = Math.max(largestOfZone[zone], shape[2]);
      angleHistogram[Math.min(ANGLE_BINS - 1, (int) (shape[0] / BIN_DEGREES))]++;
      if (poorest.size() < WORST || shape[0] < poorest.peek().smallestAngle()) {
        double x = (mesh.cornerX(t, 0) + mesh.cornerX(t, 1) + mesh.cornerX(t, 2)) / 3;
        double y = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
        poorest.add(new Triangle(t, zoneNames.get(zone), shape[0], shape[2], x, y));
        if (poorest.size() > WORST) {
          poorest.poll();
        }
      }
    }
    smallestAngle = lowest;
    largestAngle = highest;
    smallestSize = Arrays.stream(sizes).min().orElse(0);
    largestSize = Arrays.stream(sizes).max().orElse(0);
    double span = Math.log(largestSize / smallestSize);
    for (double size : sizes) {
      double share = span > 0 ? Math.log(size / smallestSize) / span : 0;
      sizeHistogram[Math.min(SIZE_BINS - 1, (int) (share * SIZE_BINS))]++;
    }
    List<Triangle> sorted = new ArrayList<>(poorest);
    sorted.sort(
        Comparator.comparingDouble(Triangle::smallestAngle).thenComparingInt(Triangle::index));
    worst = List.copyOf(sorted);
  }

  /** Quality of {@code mesh}. */
  public static Quality of(Mesh mesh) {
    return new Quality(mesh);
  }

  /** Number of nodes. */
  public int nodes() {
    return nodes;
  }

  /** Number of triangles. */
  public int triangles() {
    return triangles;
  }

  /** Number of segments of named edges. */
  public int segments() {
    return segments;
  }

  /** Smallest angle of all triangles, in degrees. */
  public double smallestAngle() {
    return smallestAngle;
  }

  /** Largest angle of all triangles, in degrees. */
  public double largestAngle() {
    return largestAngle;
  }

  /** Smallest triangle size in m. */
  public double smallestSize() {
    return smallestSize;
  }

  /** Largest triangle size in m. */
  public double largestSize() {
    return largestSize;
  }

  /** The triangles with the smallest angles, worst first, at most five. */
  public List<Triangle> worst() {
    return worst;
  }

  /**
   * Number of triangles whose smallest angle lies in [10 i, 10 i + 10) degrees.
   *
   * @return new array, shape [6]
   */
  public int[] angleHistogram() {
    return angleHistogram.clone();
  }

  /**
   * Number of triangles by size, in twelve classes of equal ratio from {@link #smallestSize()} to
   * {@link #largestSize()}; all in the first if every triangle has the same size.
   *
   * @return new array, shape [12]
   */
  public int[] sizeHistogram() {
    return sizeHistogram.clone();
  }

  /**
   * Points per wavelength c/(f h) where the mesh of a zone is coarsest.
   *
   * @param zone name of the zone
   * @param soundSpeed slowest sound speed c in it, in m/s, positive
   * @param frequency f in Hz, positive
   * @throws IllegalArgumentException if there is no such zone or a value is not positive
   */
  public double pointsPerWavelength(String zone, double soundSpeed, double frequency) {
    int i = zoneNames.indexOf(zone);
    if (i < 0) {
      throw new IllegalArgumentException(
          "no zone '" + zone + "' in the mesh; zones are " + String.join(", ", zoneNames));
    }
    return ratio(soundSpeed, frequency, largestOfZone[i]);
  }

  /** Points per wavelength c/(f h) where the mesh is coarsest; c in m/s, f in Hz. */
  public double pointsPerWavelength(double soundSpeed, double frequency) {
    return ratio(soundSpeed, frequency, largestSize);
  }

  private static double ratio(double soundSpeed, double frequency, double size) {
    if (!(soundSpeed > 0) || !(frequency > 0)) {
      throw new IllegalArgumentException(
          "sound speed and frequency must be positive, got "
              + soundSpeed
              + " m/s and "
              + frequency
              + " Hz");
    }
    return soundSpeed / (frequency * size);
  }

  /** The figures as lines of text, the same on every machine; lengths in mm, angles in degrees. */
  public List<String> lines() {
    List<String> lines = new ArrayList<>();
    lines.add(text("%d nodes, %d triangles, %d named segments", nodes, triangles, segments));
    lines.add(text("angles from %.2f° to %.2f°", smallestAngle, largestAngle));
    lines.add(text("longest sides from %.4g mm to %.4g mm", 1e3 * smallestSize, 1e3 * largestSize));
    lines.add("smallest angle of a triangle:");
    for (int i = 0; i < ANGLE_BINS; i++) {
      lines.add(text("  %3d° to %3d°  %s", 10 * i, 10 * i + 10, bar(angleHistogram[i], triangles)));
    }
    lines.add("longest side of a triangle:");
    double step = Math.pow(largestSize / smallestSize, 1.0 / SIZE_BINS);
    for (int i = 0; i < SIZE_BINS; i++) {
      double from = 1e3 * smallestSize * Math.pow(step, i);
      lines.add(
          text("  %9.4g to %9.4g mm  %s", from, from * step, bar(sizeHistogram[i], triangles)));
    }
    lines.add("worst triangles:");
    for (Triangle t : worst) {
      lines.add(
          text(
              "  %.2f° in zone '%s' at (%.6g, %.6g) mm, longest side %.4g mm",
              t.smallestAngle(), t.zone(), 1e3 * t.x(), 1e3 * t.y(), 1e3 * t.size()));
    }
    return lines;
  }

  private static String bar(int count, int all) {
    double share = all == 0 ? 0 : (double) count / all;
    String bar = "█".repeat((int) Math.ceil(40 * share));
    return text("%8d  %5.1f %% %s", count, 100 * share, bar).stripTrailing();
  }

  private static String text(String format, Object... values) {
    return String.format(Locale.ROOT, format, values);
  }

  /** Smallest and largest angle in degrees and longest side in m. */
  private static double[] shape(Mesh mesh, int t) {
    double smallest = 180;
    double largest = 0;
    double longest = 0;
    for (int k = 0; k < 3; k++) {
      int p = (k + 1) % 3;
      int q = (k + 2) % 3;
      double ax = mesh.cornerX(t, p) - mesh.cornerX(t, k);
      double ay = mesh.cornerY(t, p) - mesh.cornerY(t, k);
      double bx = mesh.cornerX(t, q) - mesh.cornerX(t, k);
      double by = mesh.cornerY(t, q) - mesh.cornerY(t, k);
      double angle = Math.toDegrees(Math.atan2(ax * by - ay * bx, ax * bx + ay * by));
      smallest = Math.min(smallest, angle);
      largest = Math.max(largest, angle);
      longest = Math.max(longest, Math.hypot(ax, ay));
    }
    return new double[] {smallest, largest, longest};
  }
}
