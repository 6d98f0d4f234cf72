package org.annulet.mesher.mesh;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;

/**
 * The laws of a mesh. Every check returns its findings, an empty list if the law holds; nothing is
 * printed or thrown, except by {@link #requireSound}. Cost O(N log N). All lengths are judged
 * relative to the sides around them.
 */
public final class MeshCheck {
  private static final double ROUNDING = 1e-10;

  private MeshCheck() {}

  /** What a finding offends. */
  public enum Law {
    /** Every triangle encloses a positive area, clear of rounding, and is anticlockwise. */
    POSITIVE_AREA,
    /** Triangles meet in whole sides: nothing hangs, overlaps, crosses, is doubled or unused. */
    CONFORMING,
    /** Every boundary side has one name, and its gas on the left. */
    NAMED_BOUNDARY,
    /** The boundary falls into simple closed loops, as many as Euler's formula wants. */
    CLOSED_LOOPS,
    /** The boundary's normals point out of the gas: the divergence theorem returns the area. */
    OUTWARD_NORMALS,
    /** No corner lies inside the circle of the neighbour across a side without name. */
    DELAUNAY,
    /** Names of zones and edges are all there, and each has something to it. */
    NAMES,
    /** Areas are those of the outline. */
    AREA,
    /** Lengths of named edges are those of the outline. */
    LENGTH
  }

  /**
   * One offence.
   *
   * @param law the law
   * @param what what was found, in words
   * @param x where, in m; NaN when it concerns the whole mesh
   * @param y where, in m; NaN when it concerns the whole mesh
   */
  public record Finding(Law law, String what, double x, double y) {
    static Finding ofWhole(Law law, String what) {
      return new Finding(law, what, Double.NaN, Double.NaN);
    }

    @Override
    public String toString() {
      String where = Double.isNaN(x) ? "" : " at (" + x + ", " + y + ") m";
      return law.name().toLowerCase(Locale.ROOT).replace('_', ' ') + ": " + what + where;
    }
  }

  /**
   * What the outline says of the mesh.
   *
   * @param zoneAreas area of each zone in m², by name
   * @param edgeLengths length of each named edge in m, by name
   * @param relativeTolerance allowed relative difference; rounding for straight edges, (h/R)²/24
   *     for arcs of radius R
   */
  public record Expected(
      Map<String, Double> zoneAreas, Map<String, Double> edgeLengths, double relativeTolerance) {
    public Expected {
      zoneAreas = Map.copyOf(zoneAreas);
      edgeLengths = Map.copyOf(edgeLengths);
    }
  }

  /**
   * All laws a mesh obeys by itself, whatever made it: {@link Law#POSITIVE_AREA}, {@link
   * Law#CONFORMING}, {@link Law#NAMED_BOUNDARY}, {@link Law#CLOSED_LOOPS}, {@link
   * Law#OUTWARD_NORMALS}.
   */
  public static List<Finding> of(Mesh mesh) {
    List<Finding> findings = new ArrayList<>();
    if (mesh.triangleCount() == 0) {
      findings.add(Finding.ofWhole(Law.CONFORMING, "the mesh has no triangles"));
      return findings;
    }
    positiveArea(mesh, findings);
    new BoundaryLaws(mesh, findings).check();
    return findings;
  }

  /**
   * What any mesh must obey to be computed on: triangles clear of rounding that cover their domain
   * once. Laxer than {@link #of}: walls without thickness, whose two sides lie on one another,
   * pass.
   */
  public static List<Finding> tiling(Mesh mesh) {
    List<Finding> findings = new ArrayList<>();
    positiveArea(mesh, findings);
    new BoundaryLaws(mesh, findings).tiling();
    return findings;
  }

  /**
   * The Delaunay property on sides without a name: the two angles facing a side add up to no more
   * than π. A mesh that was refined, moved or drawn by hand need not have it.
   */
  public static List<Finding> delaunay(Mesh mesh) {
    List<Finding> findings = new ArrayList<>();
    MeshSides sides = MeshSides.of(mesh);
    for (int s = 0; s < sides.count(); s++) {
      int other = sides.secondTriangle(s);
      if (other < 0 || sides.segment(s) >= 0) {
        continue;
      }
      double[] p = facing(mesh, sides, s, sides.firstTriangle(s));
      double[] q = facing(mesh, sides, s, other);
      // sin(α + β) < 0 when α + β > π; normalised, so free of the mesh size
      if (p[0] * q[1] + p[1] * q[0] < -ROUNDING) {
        int a = sides.lowNode(s);
        findings.add(
            new Finding(
                Law.DELAUNAY,
                "the angles facing side " + a + "–" + sides.highNode(s) + " exceed π together",
                mesh.x(a),
                mesh.y(a)));
      }
    }
    return findings;
  }

  /** Whether {@code after} has the zone and edge names of {@code before}, none of them empty. */
  public static List<Finding> namesKept(Mesh before, Mesh after) {
    List<Finding> findings = new ArrayList<>();
    Set<String> zones = usedZones(before);
    zones.addAll(before.zoneNames());
    sameNames("zone", zones, usedZones(after), findings);
    Set<String> edges = usedEdges(before);
    edges.addAll(before.edgeNames());
    sameNames("edge", edges, usedEdges(after), findings);
    return findings;
  }

  /** Names, zone areas and edge lengths against the outline's. */
  public static List<Finding> against(Mesh mesh, Expected expected) {
    List<Finding> findings = new ArrayList<>();
    sameNames("zone", expected.zoneAreas().keySet(), usedZones(mesh), findings);
    sameNames("edge", expected.edgeLengths().keySet(), usedEdges(mesh), findings);
    double[] areas = MeshMeasures.zoneAreas(mesh);
    for (int i = 0; i < areas.length; i++) {
      String name = mesh.zoneNames().get(i);
      Double want = expected.zoneAreas().get(name);
      if (want != null && !(Math.abs(areas[i] - want) <= expected.relativeTolerance() * want)) {
        String what = "zone '" + name + "' has " + areas[i] + " m² instead of " + want + " m²";
        findings.add(Finding.ofWhole(Law.AREA, what));
      }
    }
    double[] lengths = MeshMeasures.edgeLengths(mesh);
    for (int i = 0; i < lengths.length; i++) {
      String name = mesh.edgeNames().get(i);
      Double want = expected.edgeLengths().get(name);
      if (want != null && !(Math.abs(lengths[i] - want) <= expected.relativeTolerance() * want)) {
        String what = "edge '" + name + "' is " + lengths[i] + " m long instead of " + want + " m";
        findings.add(Finding.ofWhole(Law.LENGTH, what));
      }
    }
    return findings;
  }

  /**
   * Hands {@code mesh} back if {@link #of} finds nothing.
   *
   * @throws UnsoundMeshException with all findings otherwise
   */
  public static Mesh requireSound(Mesh mesh) {
    List<Finding> findings = of(mesh);
    if (!findings.isEmpty()) {
      throw new UnsoundMeshException(findings);
    }
    return mesh;
  }

  private static void positiveArea(Mesh mesh, List<Finding> findings) {
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double longest = 0;
      for (int k = 0; k < 3; k++) {
        double dx = mesh.cornerX(t, (k + 1) % 3) - mesh.cornerX(t, k);
        double dy = mesh.cornerY(t, (k + 1) % 3) - mesh.cornerY(t, k);
        longest = Math.max(longest, dx * dx + dy * dy);
      }
      if (!(mesh.area(t) > ROUNDING * longest)) {
        String what = "triangle " + t + " encloses " + mesh.area(t) + " m²";
        findings.add(new Finding(Law.POSITIVE_AREA, what, mesh.cornerX(t, 0), mesh.cornerY(t, 0)));
      }
    }
  }

  /** Cosine and sine of the angle of triangle {@code t} that faces side {@code s}. */
  private static double[] facing(Mesh mesh, MeshSides sides, int s, int t) {
    int k = 0;
    while (sides.side(t, k) != s) {
      k++;
    }
    int apex = (k + 2) % 3;
    double ax = mesh.cornerX(t, k) - mesh.cornerX(t, apex);
    double ay = mesh.cornerY(t, k) - mesh.cornerY(t, apex);
    double bx = mesh.cornerX(t, (k + 1) % 3) - mesh.cornerX(t, apex);
    double by = mesh.cornerY(t, (k + 1) % 3) - mesh.cornerY(t, apex);
    double scale = Math.hypot(ax, ay) * Math.hypot(bx, by);
    return new double[] {(ax * bx + ay * by) / scale, (ax * by - ay * bx) / scale};
  }

  private static Set<String> usedZones(Mesh mesh) {
    Set<String> names = new HashSet<>();
    for (int t = 0; t < mesh.triangleCount(); t++) {
      names.add(mesh.zoneNames().get(mesh.zone(t)));
    }
    return names;
  }

  private static Set<String> usedEdges(Mesh mesh) {
    Set<String> names = new HashSet<>();
    for (int e = 0; e < mesh.segmentCount(); e++) {
      names.add(mesh.edgeNames().get(mesh.segmentEdge(e)));
    }
    return names;
  }

  private static void sameNames(
      String kind, Set<String> wanted, Set<String> present, List<Finding> findings) {
    Map<String, String> offences = new TreeMap<>();
    for (String name : wanted) {
      if (!present.contains(name)) {
        offences.put(name, "' is lost; present are ");
      }
    }
    for (String name : present) {
      if (!wanted.contains(name)) {
        offences.put(name, "' is new; present are ");
      }
    }
    List<String> sorted = present.stream().sorted().toList();
    offences.forEach(
        (name, how) ->
            findings.add(
                Finding.ofWhole(Law.NAMES, kind + " '" + name + how + String.join(", ", sorted))));
  }
}
