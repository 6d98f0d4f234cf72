package org.annulet.solver.assembly;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.solver.medium.Medium;

/**
 * A coarse ring of plenum, separate burners and chamber for tests, made of mirrored half cells.
 * Zones "0" plenum, "1" burners, "2" chamber; inner edges "burners.inlet" and "burners.outlet",
 * boundary "wall" and "outlet".
 */
final class SmallRings {
  static final double R0 = 0.33;
  private static final double[] X = {0, 0.1, 0.2, 0.25, 0.3, 0.4, 0.5, 0.6};
  private static final int[] ZONE = {0, 0, 1, 1, 2, 2, 2};

  private SmallRings() {}

  static RingCells of(int count) {
    double half = Math.PI * R0 / count;
    double[] y = {0, 0.25 * half, 0.6 * half, half};
    Mesh.Builder small = Mesh.builder();
    new Grid(y, small).build(true);
    Mesh.Builder large = Mesh.periodicBuilder(2 * Math.PI * R0);
    Grid ring = new Grid(y, large);
    ring.wrapped(count);
    Mesh whole = large.build();
    return new RingCells(
        small.build(), whole, count, ints(ring.cell), ints(ring.half), mirrored(ring));
  }

  private static int[] ints(List<Integer> list) {
    return list.stream().mapToInt(i -> i).toArray();
  }

  private static boolean[] mirrored(Grid ring) {
    boolean[] out = new boolean[ring.mirrored.size()];
    for (int v = 0; v < out.length; v++) {
      out[v] = ring.mirrored.get(v);
    }
    return out;
  }

  /** Half cells laid side by side; the half cell numbers its nodes as they come. */
  private static final class Grid {
    private final double[] y;
    private final Mesh.Builder b;
    private final Map<Long, Integer> halfIndex = new HashMap<>();
    private final List<Integer> cell = new ArrayList<>();
    private final List<Integer> half = new ArrayList<>();
    private final List<Boolean> mirrored = new ArrayList<>();

    Grid(double[] y, Mesh.Builder b) {
      this.y = y;
      this.b = b;
      int n = 0;
      for (int i = 0; i < X.length; i++) {
        for (int j = 0; j < y.length; j++) {
          if (inGas(i, j)) {
            halfIndex.put(key(i, j), n++);
          }
        }
      }
    }

    /** Burner nodes exist up to row 1 only. */
    private boolean inGas(int i, int j) {
      return i != 3 || j <= 1;
    }

    private static long key(int i, int j) {
      return 100L * i + j;
    }

    private boolean cellInGas(int i, int j) {
      return ZONE[i] != 1 || j == 0;
    }

    void build(boolean seams) {
      for (int i = 0; i < X.length; i++) {
        for (int j = 0; j < y.length; j++) {
          if (inGas(i, j)) {
            b.node(X[i], y[j]);
          }
        }
      }
      lay(halfIndex, seams);
    }

    void wrapped(int count) {
      Map<Long, Integer> first = null;
      Map<Long, Integer> lower = null;
      for (int c = 0; c < count; c++) {
        double centre = c * 2 * y[y.length - 1];
        Map<Long, Integer> up = new HashMap<>();
        Map<Long, Integer> down = new HashMap<>();
        for (Map.Entry<Long, Integer> e : new java.util.TreeMap<>(halfIndex).entrySet()) {
          int i = (int) (e.getKey() / 100);
          int j = (int) (e.getKey() % 100);
          boolean top = j == y.length - 1;
          boolean bottomKnown = top && lower != null;
          boolean topKnown = top && c == count - 1 && count > 1;
          up.put(e.getKey(), topKnown ? first.get(e.getKey()) : node(i, j, c, centre, false));
          int low =
              j == 0
                  ? up.get(e.getKey())
                  : bottomKnown ? lower.get(e.getKey()) : node(i, j, c, centre, true);
          down.put(e.getKey(), low);
        }
        if (first == null) {
          first = down;
        }
        lower = up;
        lay(up, false);
        lay(down, false);
      }
    }

    private int node(int i, int j, int c, double centre, boolean mirror) {
      cell.add(c);
      half.add(halfIndex.get(key(i, j)));
      mirrored.add(mirror);
      double period = 2 * Math.PI * R0;
      double at = centre + (mirror ? -y[j] : y[j]);
      return b.node(X[i], at < 0 ? at + period : at >= period ? at - period : at);
    }

    private void lay(Map<Long, Integer> node, boolean seams) {
      int rows = y.length - 1;
      for (int i = 0; i + 1 < X.length; i++) {
        for (int j = 0; j < rows; j++) {
          if (!cellInGas(i, j)) {
            continue;
          }
          int p = node.get(key(i, j));
          int q = node.get(key(i + 1, j));
          int r = node.get(key(i + 1, j + 1));
          int s = node.get(key(i, j + 1));
          String name = Integer.toString(ZONE[i]);
          b.triangle(p, q, r, name);
          b.triangle(p, r, s, name);
          boolean burner = ZONE[i] == 1;
          if (i == 0) {
            b.segment(p, s, "wall");
          }
          if (i + 2 == X.length) {
            b.segment(q, r, "outlet");
          }
          if (burner) {
            b.segment(s, r, "burners.side");
            if (i == 2) {
              b.segment(p, s, "burners.inlet");
            } else {
              b.segment(q, r, "burners.outlet");
            }
          } else if (j > 0 && i == 1) {
            b.segment(q, r, "plenum.downstream");
          } else if (j > 0 && i == 4) {
            b.segment(p, s, "chamber.upstream");
          }
          if (seams && j == 0) {
            b.segment(p, q, RingCells.MIRROR);
          }
          if (seams && j == rows - 1 && !burner) {
            b.segment(s, r, RingCells.SEAM);
          }
        }
      }
    }
  }

  static Ring geometry(int count) {
    return new Ring(
        count,
        R0,
        Map.of(
            "0", new Ring.Annulus(0.36, 0.08),
            "1", new Ring.Annulus(0.345, 0.05),
            "2", new Ring.Annulus(0.33, 0.115)));
  }

  static Medium gas(Mesh mesh) {
    return Gases.of(mesh, 500, 500, 820);
  }
}
