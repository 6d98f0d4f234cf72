package org.annulet.mesher.geometry;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.geometry.GeometryFault.Fault;
import org.annulet.mesher.geometry.GeometryFault.Kind;

/**
 * Follows the loops of the zones, finds the sense of each edge and what lies on its two hands, and
 * then whether zones overlap or leak.
 */
final class ZoneLoops {
  /** One loop of one zone: its edges in order and whether each runs forward. */
  private record Loop(
      int zone, boolean hole, int[] edges, boolean[] forward, double area, double[] box) {}

  private final List<Zone> zones;
  private final List<Edge> edges;
  private final Map<String, Integer> edgeIndex;
  private final List<Point> points;
  private final List<Fault> faults;
  private final List<Loop> loops = new ArrayList<>();
  private final int[] left;
  private final int[] right;

  ZoneLoops(
      List<Zone> zones,
      List<Edge> edges,
      Map<String, Integer> edgeIndex,
      List<Point> points,
      List<Fault> faults) {
    this.zones = zones;
    this.edges = edges;
    this.edgeIndex = edgeIndex;
    this.points = points;
    this.faults = faults;
    left = new int[edges.size()];
    right = new int[edges.size()];
    Arrays.fill(left, -1);
    Arrays.fill(right, -1);
  }

  int[] left() {
    return left;
  }

  int[] right() {
    return right;
  }

  void resolve() {
    List<String> names = new ArrayList<>();
    for (int z = 0; z < zones.size(); z++) {
      Zone zone = zones.get(z);
      if (names.contains(zone.name())) {
        fault(Kind.NAME, "two zones are named '" + zone.name() + "'", null, "rename one of them");
      }
      names.add(zone.name());
      follow(z, zone.boundary(), false);
      for (List<String> hole : zone.holes()) {
        follow(z, hole, true);
      }
    }
    for (Loop loop : loops) {
      place(loop);
    }
    for (int e = 0; e < edges.size(); e++) {
      if (left[e] < 0 && right[e] < 0 && faults.isEmpty()) {
        fault(
            Kind.USE,
            "edge '" + edges.get(e).name() + "' belongs to no zone",
            points.get(edges.get(e).first()),
            "put it in the loop of a zone, or remove it");
      }
    }
  }

  private void follow(int z, List<String> names, boolean hole) {
    String owner = (hole ? "a hole of zone '" : "zone '") + zones.get(z).name() + "'";
    int[] index = new int[names.size()];
    for (int i = 0; i < index.length; i++) {
      Integer e = edgeIndex.get(names.get(i));
      if (e == null) {
        fault(
            Kind.NAME,
            owner + " is bounded by '" + names.get(i) + "', which is no edge",
            null,
            "edges are " + Nearest.list(names.get(i), edgeIndex.keySet()));
        return;
      }
      for (int k = 0; k < i; k++) {
        if (index[k] == e) {
          fault(
              Kind.USE,
              "edge '" + names.get(i) + "' is used twice by " + owner,
              points.get(edges.get(e).first()),
              "use each edge once in a loop");
          return;
        }
      }
      index[i] = e;
    }
    if (index.length == 0) {
      fault(Kind.OPEN, owner + " has no edges", null, "give a closed loop of edges");
      return;
    }
    boolean[] forward = new boolean[index.length];
    int bad = chain(index, forward, true);
    if (bad >= 0) {
      boolean[] other = new boolean[index.length];
      int second = chain(index, other, false);
      if (second < 0) {
        forward = other;
        bad = -1;
      } else if (second > bad) {
        forward = other;
        bad = second;
      }
    }
    if (bad >= 0) {
      open(owner, index, forward, bad);
      return;
    }
    double area = 0;
    for (int i = 0; i < index.length; i++) {
      double m = Sectors.moment(edges.get(index[i]), points.get(edges.get(index[0]).first()));
      area += forward[i] ? m : -m;
    }
    double[] box = OutlineCheck.box(Arrays.stream(index).mapToObj(edges::get).toList());
    loops.add(new Loop(z, hole, index, forward, area, box));
  }

  /** Follows the edges; −1 if the loop closes, else the place in it where it does not go on. */
  private int chain(int[] index, boolean[] forward, boolean firstForward) {
    Edge e = edges.get(index[0]);
    forward[0] = firstForward;
    int start = firstForward ? e.first() : e.last();
    int at = firstForward ? e.last() : e.first();
    for (int i = 1; i < index.length; i++) {
      e = edges.get(index[i]);
      if (e.first() == at) {
        forward[i] = true;
        at = e.last();
      } else if (e.last() == at) {
        forward[i] = false;
        at = e.first();
      } else {
        return i;
      }
    }
    return at == start ? -1 : index.length;
  }

  private void open(String owner, int[] index, boolean[] forward, int bad) {
    Edge before = edges.get(index[bad - 1]);
    Edge next = edges.get(index[bad % index.length]);
    Point end = points.get(forward[bad - 1] ? before.last() : before.first());
    fault(
        Kind.OPEN,
        owner
            + " is open: edge '"
            + before.name()
            + "' ends at point '"
            + end.name()
            + "', where '"
            + next.name()
            + "' (from '"
            + points.get(next.first()).name()
            + "' to '"
            + points.get(next.last()).name()
            + "') does not go on",
        end,
        "put the edges in the order in which they follow each other, or add the missing edge");
  }

  private void place(Loop loop) {
    boolean inward = loop.area > 0 != loop.hole;
    for (int i = 0; i < loop.edges.length; i++) {
      int e = loop.edges[i];
      int[] side = loop.forward[i] == inward ? left : right;
      if (side[e] >= 0) {
        boolean same = side[e] == loop.zone;
        String a = zones.get(side[e]).name();
        String b = zones.get(loop.zone).name();
        fault(
            same ? Kind.USE : Kind.OVERLAP,
            same
                ? "edge '" + edges.get(e).name() + "' is used twice by zone '" + a + "'"
                : "zones '"
                    + a
                    + "' and '"
                    + b
                    + "' lie on the same side of edge '"
                    + edges.get(e).name()
                    + "'",
            points.get(edges.get(e).first()),
            same
                ? "use each edge once in a zone"
                : "an edge divides two zones or bounds one; give one of the zones another loop");
      } else {
        side[e] = loop.zone;
      }
    }
    if (loop.area == 0) {
      fault(
          Kind.OPEN,
          "a loop of zone '" + zones.get(loop.zone).name() + "' encloses no area",
          points.get(edges.get(loop.edges[0]).first()),
          "give a loop that goes round an area");
    }
  }

  /** Holes inside their zones, no zone inside another; edges do not cross when this is called. */
  void checkPlaces() {
    for (Loop loop : loops) {
      for (Loop other : loops) {
        if (other != loop) {
          compare(loop, other);
        }
      }
    }
  }

  private void compare(Loop loop, Loop other) {
    int e = firstNotIn(loop, other);
    boolean sameZone = loop.zone == other.zone;
    if (e < 0) {
      return;
    }
    double[] p = middle(edges.get(e));
    boolean inside = contains(other, p[0], p[1]);
    Point at = new Point("", p[0], p[1]);
    if (sameZone && loop.hole && !other.hole && !inside) {
      fault(
          Kind.LEAK,
          "a hole of zone '"
              + zones.get(loop.zone).name()
              + "' lies outside the zone, at edge '"
              + edges.get(e).name()
              + "'",
          at,
          "move the hole inside, or remove it");
    } else if (sameZone && loop.hole && other.hole && inside) {
      fault(
          Kind.OVERLAP,
          "two holes of zone '"
              + zones.get(loop.zone).name()
              + "' overlap, at edge '"
              + edges.get(e).name()
              + "'",
          at,
          "remove the inner one");
    } else if (!sameZone && !loop.hole && !other.hole && inside && !inHole(other.zone, loop, p)) {
      fault(
          Kind.OVERLAP,
          "zone '"
              + zones.get(loop.zone).name()
              + "' lies on zone '"
              + zones.get(other.zone).name()
              + "', at edge '"
              + edges.get(e).name()
              + "'",
          at,
          "list the loop of '"
              + zones.get(loop.zone).name()
              + "' among the holes of '"
              + zones.get(other.zone).name()
              + "'");
    }
  }

  private boolean inHole(int zone, Loop loop, double[] p) {
    for (Loop hole : loops) {
      if (hole.zone == zone && hole.hole) {
        if (contains(hole, p[0], p[1])) {
          return true;
        }
        for (int h : hole.edges) {
          for (int e : loop.edges) {
            if (h == e) {
              return true;
            }
          }
        }
      }
    }
    return false;
  }

  private static int firstNotIn(Loop loop, Loop other) {
    for (int e : loop.edges) {
      boolean found = false;
      for (int o : other.edges) {
        found |= o == e;
      }
      if (!found) {
        return e;
      }
    }
    return -1;
  }

  private static double[] middle(Edge e) {
    CurvePiece c = e.pieces().get(e.pieces().size() / 2);
    return new double[] {c.x(0.4375), c.y(0.4375)};
  }

  /** Crossing number of a ray to the right with the true curves, taken as 64 chords each. */
  private boolean contains(Loop loop, double x, double y) {
    double[] b = loop.box;
    double slack = 0.01 * (b[2] - b[0] + b[3] - b[1]);
    if (x < b[0] - slack || x > b[2] + slack || y < b[1] - slack || y > b[3] + slack) {
      return false;
    }
    boolean in = false;
    for (int e : loop.edges) {
      for (CurvePiece c : edges.get(e).pieces()) {
        int n = c.isStraight() ? 1 : 64;
        for (int i = 0; i < n; i++) {
          double t0 = i / (double) n;
          double t1 = (i + 1) / (double) n;
          double ya = c.y(t0);
          double yb = c.y(t1);
          if (ya > y != yb > y) {
            double xa = c.x(t0);
            in ^= x < xa + (y - ya) / (yb - ya) * (c.x(t1) - xa);
          }
        }
      }
    }
    return in;
  }

  private void fault(Kind kind, String what, Point at, String mend) {
    faults.add(
        new Fault(
            kind, what, at == null ? Double.NaN : at.x(), at == null ? Double.NaN : at.y(), mend));
  }
}
