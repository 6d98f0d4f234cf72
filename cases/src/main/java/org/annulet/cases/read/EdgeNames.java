package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.annulet.mesher.mesh.Mesh;

/**
 * Names walls, flames and references may use.
 *
 * <p>On a ring they follow from the zones: {@code <zone>.upstream} and {@code <zone>.downstream}
 * are walls at the ends of a zone, {@code <ducts>.side} the walls along the ducts; where ducts meet
 * the zone before and after, the inner edges {@code <ducts>.inlet} and {@code <ducts>.outlet};
 * where two annuli meet, the inner edge {@code <second>.inlet}; the faces of an annulus are {@code
 * <zone>.inner_face} and {@code <zone>.outer_face}. Elsewhere an edge of one zone is a wall, an
 * edge of two is an inner edge.
 *
 * @param walls edges and faces on the boundary
 * @param inner inner edges, each with the zones on its two sides; on a ring upstream first
 */
record EdgeNames(List<String> walls, Map<String, List<String>> inner) {
  /** Walls and inner edges. */
  List<String> all() {
    List<String> all = new ArrayList<>(walls);
    all.addAll(inner.keySet());
    return all;
  }

  /** Whether the names are known at all. */
  boolean known() {
    return !walls.isEmpty() || !inner.isEmpty();
  }

  /** Stands for a ring zone whose shape could not be read: edge names are then not known. */
  static Geometry.RingZone shapeless(String name) {
    return new Geometry.Annulus(name, Double.NaN, Double.NaN, Double.NaN);
  }

  /** Names of a geometry; none for a mesh file that could not be read. */
  static EdgeNames of(Geometry geometry) {
    if (geometry instanceof Geometry.Ring ring) {
      return ofRing(ring);
    }
    if (geometry instanceof Geometry.Section s) {
      return ofOutline(s.outline());
    }
    if (geometry instanceof Geometry.CrossSection c) {
      return ofOutline(c.outline());
    }
    if (geometry instanceof Geometry.Plane p) {
      return ofOutline(p.outline());
    }
    if (geometry instanceof Geometry.MeshFile f && f.mesh() != null) {
      return ofMesh(f.mesh());
    }
    return new EdgeNames(List.of(), Map.of());
  }

  /** An edge with gas on both sides anywhere is an inner edge. */
  private static EdgeNames ofMesh(Mesh mesh) {
    Map<String, Set<String>> beside = new LinkedHashMap<>();
    Set<String> inside = new TreeSet<>();
    mesh.edgeNames().forEach(e -> beside.put(e, new TreeSet<>()));
    for (int e = 0; e < mesh.segmentCount(); e++) {
      String name = mesh.edgeNames().get(mesh.segmentEdge(e));
      for (int t : new int[] {mesh.segmentLeft(e), mesh.segmentRight(e)}) {
        if (t >= 0) {
          beside.get(name).add(mesh.zoneNames().get(mesh.zone(t)));
        }
      }
      if (mesh.segmentLeft(e) >= 0 && mesh.segmentRight(e) >= 0) {
        inside.add(name);
      }
    }
    List<String> walls = new ArrayList<>();
    Map<String, List<String>> inner = new LinkedHashMap<>();
    beside.forEach(
        (name, zones) -> {
          if (!inside.contains(name)) {
            walls.add(name);
          } else if (zones.size() == 2) {
            inner.put(name, List.copyOf(zones));
          }
        });
    return new EdgeNames(walls, inner);
  }

  private static EdgeNames ofRing(Geometry.Ring ring) {
    List<String> walls = new ArrayList<>();
    Map<String, List<String>> inner = new LinkedHashMap<>();
    List<Geometry.RingZone> zones = ring.zones();
    if (zones.stream().anyMatch(z -> z.equals(shapeless(z.name())))) {
      return new EdgeNames(List.of(), Map.of());
    }
    for (int i = 0; i < zones.size(); i++) {
      Geometry.RingZone zone = zones.get(i);
      Geometry.RingZone before = i > 0 ? zones.get(i - 1) : null;
      Geometry.RingZone after = i + 1 < zones.size() ? zones.get(i + 1) : null;
      boolean ducts = zone instanceof Geometry.Ducts;
      if (before == null || share(zone) > share(before)) {
        walls.add(zone.name() + ".upstream");
      }
      if (after == null || share(zone) > share(after)) {
        walls.add(zone.name() + ".downstream");
      }
      if (ducts) {
        walls.add(zone.name() + ".side");
      } else {
        walls.add(zone.name() + ".inner_face");
        walls.add(zone.name() + ".outer_face");
      }
      if (before != null && (ducts || before instanceof Geometry.Annulus)) {
        inner.put(zone.name() + ".inlet", List.of(before.name(), zone.name()));
      }
      if (after != null && ducts && after instanceof Geometry.Annulus) {
        inner.put(zone.name() + ".outlet", List.of(zone.name(), after.name()));
      }
    }
    return new EdgeNames(walls, inner);
  }

  /**
   * Angle of the ring that one burner's part of a zone covers, in rad; all of it for an annulus.
   */
  private static double share(Geometry.RingZone zone) {
    return zone instanceof Geometry.Ducts d ? d.bore() / d.meanRadius() : Double.POSITIVE_INFINITY;
  }

  private static EdgeNames ofOutline(Outline outline) {
    List<String> walls = new ArrayList<>();
    Map<String, List<String>> inner = new LinkedHashMap<>();
    for (String edge : outline.edges().keySet()) {
      List<String> zones = outline.zonesAt(edge);
      if (zones.size() == 1) {
        walls.add(edge);
      } else if (zones.size() == 2) {
        inner.put(edge, zones);
      }
    }
    return new EdgeNames(walls, inner);
  }
}
