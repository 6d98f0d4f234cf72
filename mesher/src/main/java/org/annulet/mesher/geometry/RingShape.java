package org.annulet.mesher.geometry;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.SortedSet;
import java.util.TreeSet;
import org.annulet.mesher.geometry.GeometryFault.Fault;
import org.annulet.mesher.geometry.GeometryFault.Kind;

/**
 * A ring chamber of N equal burner cells: thin annuli and rows of N ducts, one behind the other
 * along x, unrolled at radius R₀ into the plane (x, arc).
 *
 * <p>An annulus of mean radius R_z covers the whole arc 2πR₀. A duct of bore d at radius R_z covers
 * the arc d·R₀/R_z, so that its true width is the bore, and has the gap height πd/4, so that its
 * true cross-section is πd²/4.
 *
 * @param burnerCount number N of burner cells, at least 1
 * @param unrolledRadius radius R₀ in m at which the arc is measured
 * @param zones zones from upstream to downstream, touching each other; the first starts at x = 0
 * @param missingBurners cells, counted from 0, whose ducts are left out
 */
public record RingShape(
    int burnerCount,
    double unrolledRadius,
    List<RingZone> zones,
    SortedSet<Integer> missingBurners) {

  /** What a zone of the ring is. */
  public enum Shape {
    /** One annular gap all round. */
    ANNULUS,
    /** One duct per burner. */
    DUCTS
  }

  /**
   * One zone of the ring.
   *
   * @param name its name
   * @param shape annulus or ducts
   * @param meanRadius mean radius R_z in m
   * @param width gap of an annulus or bore of a duct, in m
   * @param length in m, along x
   */
  public record RingZone(String name, Shape shape, double meanRadius, double width, double length) {
    /** Radial height in m that multiplies the plane's area: the gap, or π·bore/4 for ducts. */
    public double gapHeight() {
      return shape == Shape.ANNULUS ? width : 0.25 * Math.PI * width;
    }

    /** An annulus. */
    public static RingZone annulus(String name, double meanRadius, double gap, double length) {
      return new RingZone(name, Shape.ANNULUS, meanRadius, gap, length);
    }

    /** A row of one round duct per burner. */
    public static RingZone ducts(String name, double meanRadius, double bore, double length) {
      return new RingZone(name, Shape.DUCTS, meanRadius, bore, length);
    }
  }

  /**
   * Checks and copies.
   *
   * @throws GeometryFault with every fault found
   */
  public RingShape {
    zones = List.copyOf(zones);
    missingBurners = java.util.Collections.unmodifiableSortedSet(new TreeSet<>(missingBurners));
    List<Fault> faults = new ArrayList<>();
    if (burnerCount < 1) {
      value(faults, "the ring has " + burnerCount + " burners", "give at least one");
    }
    positive(faults, unrolledRadius, "the unrolled radius");
    if (zones.isEmpty()) {
      value(faults, "the ring has no zones", "give at least one");
    }
    Set<String> names = new HashSet<>();
    for (RingZone z : zones) {
      if (!names.add(z.name())) {
        faults.add(
            new Fault(
                Kind.NAME,
                "two zones of the ring are named '" + z.name() + "'",
                Double.NaN,
                Double.NaN,
                "rename one of them"));
      }
      String zone = " of zone '" + z.name() + "'";
      positive(faults, z.meanRadius(), "the mean radius" + zone);
      positive(faults, z.width(), (z.shape() == Shape.ANNULUS ? "the gap" : "the bore") + zone);
      positive(faults, z.length(), "the length" + zone);
      if (z.width() >= 2 * z.meanRadius()) {
        value(
            faults,
            "zone '" + z.name() + "' is wider (" + z.width() + " m) than its mean diameter",
            "give a mean radius above half the gap or bore");
      }
      if (z.shape() == Shape.DUCTS
          && burnerCount >= 1
          && z.width() >= 2 * Math.PI * z.meanRadius() / burnerCount) {
        value(
            faults,
            burnerCount
                + " ducts of bore "
                + z.width()
                + " m do not fit round the mean radius "
                + z.meanRadius()
                + " m"
                + zone,
            "the pitch there is "
                + 2 * Math.PI * z.meanRadius() / burnerCount
                + " m; give a smaller bore, or make it an annulus");
      }
    }
    for (int m : missingBurners) {
      if (m < 0 || m >= burnerCount) {
        value(
            faults,
            "burner cell " + m + " is to be missing, but cells are 0 to " + (burnerCount - 1),
            "give a cell of the ring");
      }
    }
    if (!missingBurners.isEmpty()
        && (missingBurners.size() >= burnerCount
            || zones.stream().allMatch(z -> z.shape() == Shape.DUCTS))) {
      value(
          faults,
          "leaving out "
              + missingBurners.size()
              + " of "
              + burnerCount
              + " burners breaks the ring",
          "keep at least one burner and one annulus");
    }
    if (!faults.isEmpty()) {
      throw new GeometryFault(faults);
    }
  }

  /** A ring with all its burners. */
  public RingShape(int burnerCount, double unrolledRadius, List<RingZone> zones) {
    this(burnerCount, unrolledRadius, zones, new TreeSet<>());
  }

  /** This ring without the ducts of some cells, counted from 0. */
  public RingShape without(Set<Integer> cells) {
    return new RingShape(burnerCount, unrolledRadius, zones, new TreeSet<>(cells));
  }

  /** Arc length in m of one burner cell at the unrolled radius. */
  public double pitch() {
    return 2 * Math.PI * unrolledRadius / burnerCount;
  }

  /** Arc in m, at the unrolled radius, that zone {@code z} covers of one cell. */
  public double arcWidth(int z) {
    RingZone zone = zones.get(z);
    return zone.shape() == Shape.ANNULUS
        ? pitch()
        : zone.width() * unrolledRadius / zone.meanRadius();
  }

  /** x in m of the upstream end of zone {@code z}; for z = number of zones, the ring's end. */
  public double upstreamEnd(int z) {
    double x = 0;
    for (int i = 0; i < z; i++) {
      x += zones.get(i).length();
    }
    return x;
  }

  private static void positive(List<Fault> faults, double v, String what) {
    if (!(v > 0) || Double.isInfinite(v)) {
      value(faults, what + " is " + v + " m", "give a positive length");
    }
  }

  private static void value(List<Fault> faults, String what, String mend) {
    faults.add(new Fault(Kind.VALUE, what, Double.NaN, Double.NaN, mend));
  }
}
