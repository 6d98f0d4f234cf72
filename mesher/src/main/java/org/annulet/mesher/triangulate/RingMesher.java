package org.annulet.mesher.triangulate;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.geometry.RingShape;
import org.annulet.mesher.geometry.RingShape.RingZone;
import org.annulet.mesher.geometry.RingShape.Shape;
import org.annulet.mesher.mesh.CellException;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.mesher.mesh.RingReplication;

/**
 * Meshes a ring: half a burner cell as an outline, mirrored and laid N times round.
 *
 * <p>All cells are equal to the last bit, mirrored or turned ({@link RingReplication}); the period
 * differs from 2πR₀ by rounding only.
 *
 * <p>Edge names: {@code <zone>.upstream} and {@code <zone>.downstream} for the walls at the ends of
 * a zone, {@code <ducts>.side} for the walls of ducts; inner edges are {@code <ducts>.inlet} and
 * {@code <ducts>.outlet} between ducts and an annulus, and {@code <downstream zone>.inlet} where
 * two annuli or two rows of ducts touch.
 */
public final class RingMesher {
  private RingMesher() {}

  /**
   * The mesh of a ring.
   *
   * @param shape the ring
   * @param sizing sizes; names as above, {@value RingCells#MIRROR} and {@value RingCells#SEAM}
   * @return half cell and whole ring; ducts of missing burners are left out and their openings are
   *     walls
   * @throws org.annulet.mesher.geometry.GeometryFault if the sizing has an unknown name
   * @throws MeshingLimitException if the node cap is reached
   */
  public static RingCells mesh(RingShape shape, Sizing sizing) {
    Sizing finer = sizing;
    if (shape.burnerCount() == 1 && sizing.largestSide() > shape.pitch() / 8) {
      // Sides must stay below half a period for a closed ring to know which way they run.
      finer = sizing.scaled(shape.pitch() / 8 / sizing.largestSide());
    }
    Mesh half = OutlineMesher.mesh(halfCell(shape), finer, RingMesher::plainName);
    return RingReplication.of(half, shape.burnerCount(), shape.pitch(), missing(shape));
  }

  private static String plainName(String name) {
    int i = name.indexOf('#');
    return i < 0 ? name : name.substring(0, i);
  }

  /** The half cell 0 ≤ y ≤ pitch/2 as an outline; edges of one name are told apart by #number. */
  static Outline halfCell(RingShape shape) {
    Outline.Builder b = Outline.builder();
    int n = shape.zones().size();
    double[] top = new double[n];
    for (int z = 0; z < n; z++) {
      top[z] = 0.5 * shape.arcWidth(z);
    }
    List<List<String>> loops = new ArrayList<>();
    for (int z = 0; z < n; z++) {
      loops.add(new ArrayList<>());
    }
    double[] x = new double[n + 1];
    for (int z = 0; z <= n; z++) {
      x[z] = shape.upstreamEnd(z);
      b.point("axis" + z, x[z], 0);
    }
    // Cross-sections: opening from the axis, then the wall beside it.
    List<List<String>> upstream = new ArrayList<>();
    List<List<String>> downstream = new ArrayList<>();
    for (int z = 0; z <= n; z++) {
      double before = z == 0 ? 0 : top[z - 1];
      double after = z == n ? 0 : top[z];
      double open = Math.min(before, after);
      double full = Math.max(before, after);
      List<String> narrow = new ArrayList<>();
      List<String> wide = new ArrayList<>();
      String from = "axis" + z;
      if (open > 0) {
        b.point("open" + z, x[z], open);
        String name = jointName(shape, z);
        b.line(name, from, "open" + z);
        narrow.add(name);
        wide.add(name);
        from = "open" + z;
      }
      if (full > open) {
        b.point("wall" + z, x[z], full);
        String name =
            before > after
                ? shape.zones().get(z - 1).name() + ".downstream"
                : shape.zones().get(z).name() + ".upstream";
        b.line(name, from, "wall" + z);
        wide.add(name);
      }
      downstream.add(before >= after ? wide : narrow);
      upstream.add(after >= before ? wide : narrow);
    }
    for (int z = 0; z < n; z++) {
      RingZone zone = shape.zones().get(z);
      String axis = RingCells.MIRROR + "#" + z;
      String side =
          zone.shape() == Shape.ANNULUS ? RingCells.SEAM + "#" + z : zone.name() + ".side";
      b.line(axis, "axis" + z, "axis" + (z + 1));
      String a = corner(z, top[z], z == 0 ? 0 : top[z - 1]);
      String c = corner(z + 1, top[z], z + 1 == n ? 0 : top[z + 1]);
      b.line(side, a, c);
      List<String> loop = loops.get(z);
      loop.add(axis);
      loop.addAll(downstream.get(z + 1));
      loop.add(side);
      List<String> back = new ArrayList<>(upstream.get(z));
      Collections.reverse(back);
      loop.addAll(back);
      b.zone(zone.name(), loop.toArray(String[]::new));
    }
    return b.build();
  }

  /** Name of the point at the top of a zone in cross-section z. */
  private static String corner(int z, double own, double other) {
    return other > 0 && own <= other ? "open" + z : "wall" + z;
  }

  private static String jointName(RingShape shape, int z) {
    RingZone before = shape.zones().get(z - 1);
    RingZone after = shape.zones().get(z);
    return before.shape() == Shape.DUCTS && after.shape() == Shape.ANNULUS
        ? before.name() + ".outlet"
        : after.name() + ".inlet";
  }

  /** What the cells of missing burners lack, and the walls their ducts leave behind. */
  private static List<CellException> missing(RingShape shape) {
    List<RingZone> zones = shape.zones();
    Set<String> ducts = new HashSet<>();
    Map<String, String> walls = new HashMap<>();
    for (int z = 0; z < zones.size(); z++) {
      if (zones.get(z).shape() == Shape.DUCTS) {
        ducts.add(zones.get(z).name());
      }
      if (z > 0 && zones.get(z).shape() != zones.get(z - 1).shape()) {
        walls.put(
            jointName(shape, z),
            zones.get(z).shape() == Shape.DUCTS
                ? zones.get(z - 1).name() + ".downstream"
                : zones.get(z).name() + ".upstream");
      }
    }
    return shape.missingBurners().stream()
        .map(j -> new CellException(j, ducts, Map.of(), walls))
        .toList();
  }
}
