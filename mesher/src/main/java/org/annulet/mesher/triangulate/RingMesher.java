package org.annulet.mesher.triangulate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.geometry.RingShape;
import org.annulet.mesher.geometry.RingShape.RingZone;
import org.annulet.mesher.geometry.RingShape.Shape;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;

/**
 * Meshes a ring: half a burner cell as an outline, mirrored and laid N times round.
 *
 * <p>All arc coordinates are rounded to multiples of one power of two that is exact up to the whole
 * period, and the period is N such pitches, so every difference of two arc coordinates is exact and
 * all cells are equal to the last bit. The period differs from 2πR₀ by rounding only.
 *
 * <p>Edge names: {@code <zone>.upstream} and {@code <zone>.downstream} for the walls at the ends of
 * a zone, {@code <ducts>.side} for the walls of ducts; inner edges are {@code <ducts>.inlet} and
 * {@code <ducts>.outlet} between ducts and an annulus, and {@code <downstream zone>.inlet} where two
 * annuli or two rows of ducts touch.
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
    double quantum = quantum(shape);
    Outline outline = halfCell(shape, quantum);
    Mesh rough = OutlineMesher.mesh(outline, finer, RingMesher::plainName);
    Mesh half = rounded(rough, quantum);
    return new RingLayout(shape, half, 2 * halfPitch(shape, quantum)).cells();
  }

  /** Spacing of arc coordinates in m: exact sums up to one period and a bit. */
  private static double quantum(RingShape shape) {
    double period = 2 * Math.PI * shape.unrolledRadius();
    return Math.scalb(1.0, Math.getExponent(period) + 2 - 52);
  }

  private static double halfPitch(RingShape shape, double quantum) {
    return Math.rint(0.5 * shape.pitch() / quantum) * quantum;
  }

  private static String plainName(String name) {
    int i = name.indexOf('#');
    return i < 0 ? name : name.substring(0, i);
  }

  /** The half cell 0 ≤ y ≤ pitch/2 as an outline; edges of one name are told apart by #number. */
  static Outline halfCell(RingShape shape, double quantum) {
    Outline.Builder b = Outline.builder();
    int n = shape.zones().size();
    double[] top = new double[n];
    for (int z = 0; z < n; z++) {
      top[z] =
          shape.zones().get(z).shape() == Shape.ANNULUS
              ? halfPitch(shape, quantum)
              : Math.rint(0.5 * shape.arcWidth(z) / quantum) * quantum;
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
      java.util.Collections.reverse(back);
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

  private static Mesh rounded(Mesh m, double quantum) {
    Mesh.Builder b = Mesh.builder();
    for (int v = 0; v < m.nodeCount(); v++) {
      b.node(m.x(v), Math.rint(m.y(v) / quantum) * quantum);
    }
    for (int t = 0; t < m.triangleCount(); t++) {
      b.triangle(m.corner(t, 0), m.corner(t, 1), m.corner(t, 2), m.zoneNames().get(m.zone(t)));
    }
    for (int e = 0; e < m.segmentCount(); e++) {
      b.segment(m.segmentStart(e), m.segmentEnd(e), m.edgeNames().get(m.segmentEdge(e)));
    }
    return b.build();
  }

  /** Lays a half cell round the ring. */
  private static final class RingLayout {
    private final RingShape shape;
    private final Mesh half;
    private final double pitch;
    private final int n;
    private final boolean[] onAxis;
    private final boolean[] onSeam;
    private final boolean[] onlyDuct;
    private final int[][] direct;
    private final int[][] mirror;

    RingLayout(RingShape shape, Mesh half, double pitch) {
      this.shape = shape;
      this.half = half;
      this.pitch = pitch;
      n = shape.burnerCount();
      int nodes = half.nodeCount();
      onAxis = new boolean[nodes];
      onSeam = new boolean[nodes];
      onlyDuct = new boolean[nodes];
      for (int v = 0; v < nodes; v++) {
        onAxis[v] = half.y(v) == 0;
        onSeam[v] = half.y(v) == 0.5 * pitch;
      }
      Arrays.fill(onlyDuct, true);
      for (int t = 0; t < half.triangleCount(); t++) {
        if (!isDuct(half.zone(t))) {
          for (int k = 0; k < 3; k++) {
            onlyDuct[half.corner(t, k)] = false;
          }
        }
      }
      direct = new int[n][nodes];
      mirror = new int[n][nodes];
    }

    private boolean isDuct(int zone) {
      String name = half.zoneNames().get(zone);
      return shape.zones().stream()
          .anyMatch(z -> z.name().equals(name) && z.shape() == Shape.DUCTS);
    }

    RingCells cells() {
      double period = n * pitch;
      Mesh.Builder b = Mesh.periodicBuilder(period);
      List<int[]> kept = new ArrayList<>();
      for (int j = 0; j < n; j++) {
        boolean missing = shape.missingBurners().contains(j);
        for (int v = 0; v < half.nodeCount(); v++) {
          if (missing && onlyDuct[v]) {
            direct[j][v] = -1;
            mirror[j][v] = -1;
            continue;
          }
          direct[j][v] = b.node(half.x(v), wrapped(j * pitch + half.y(v), period));
          kept.add(new int[] {j, v, 0});
          if (onAxis[v]) {
            mirror[j][v] = direct[j][v];
          } else if (!onSeam[v]) {
            mirror[j][v] = b.node(half.x(v), wrapped(j * pitch - half.y(v), period));
            kept.add(new int[] {j, v, 1});
          }
        }
      }
      for (int j = 0; j < n; j++) {
        for (int v = 0; v < half.nodeCount(); v++) {
          if (onSeam[v]) {
            mirror[j][v] = direct[(j + n - 1) % n][v];
          }
        }
      }
      for (int j = 0; j < n; j++) {
        fill(b, direct[j], shape.missingBurners().contains(j));
        fill(b, mirror[j], shape.missingBurners().contains(j));
      }
      int[] cell = new int[kept.size()];
      int[] node = new int[kept.size()];
      boolean[] mirrored = new boolean[kept.size()];
      for (int i = 0; i < cell.length; i++) {
        cell[i] = kept.get(i)[0];
        node[i] = kept.get(i)[1];
        mirrored[i] = kept.get(i)[2] == 1;
      }
      return new RingCells(half, b.build(), n, cell, node, mirrored);
    }

    private static double wrapped(double y, double period) {
      return y < 0 ? y + period : y >= period ? y - period : y;
    }

    private void fill(Mesh.Builder b, int[] image, boolean missing) {
      for (int t = 0; t < half.triangleCount(); t++) {
        if (!missing || !isDuct(half.zone(t))) {
          b.triangle(
              image[half.corner(t, 0)],
              image[half.corner(t, 1)],
              image[half.corner(t, 2)],
              half.zoneNames().get(half.zone(t)));
        }
      }
      for (int e = 0; e < half.segmentCount(); e++) {
        String name = half.edgeNames().get(half.segmentEdge(e));
        if (name.equals(RingCells.MIRROR) || name.equals(RingCells.SEAM)) {
          continue;
        }
        if (missing) {
          name = nameWithoutDuct(e, name);
        }
        if (name != null) {
          b.segment(image[half.segmentStart(e)], image[half.segmentEnd(e)], name);
        }
      }
    }

    /** Name of a segment in a cell without ducts: an opening becomes the annulus's wall. */
    private String nameWithoutDuct(int e, String name) {
      int left = half.zone(half.segmentLeft(e));
      boolean leftDuct = isDuct(left);
      if (half.segmentRight(e) < 0) {
        return leftDuct ? null : name;
      }
      int right = half.zone(half.segmentRight(e));
      boolean rightDuct = isDuct(right);
      if (leftDuct == rightDuct) {
        return leftDuct ? null : name;
      }
      String annulus = half.zoneNames().get(leftDuct ? right : left);
      String duct = half.zoneNames().get(leftDuct ? left : right);
      return annulus + (index(annulus) < index(duct) ? ".downstream" : ".upstream");
    }

    private int index(String zone) {
      for (int z = 0; z < shape.zones().size(); z++) {
        if (shape.zones().get(z).name().equals(zone)) {
          return z;
        }
      }
      throw new IllegalStateException("no zone '" + zone + "'");
    }
  }
}
