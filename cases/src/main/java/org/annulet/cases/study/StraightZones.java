package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeSet;
import org.annulet.cases.read.CaseFile;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.assembly.Face;
import org.annulet.solver.assembly.Geometry;
import org.annulet.solver.assembly.Plane;
import org.annulet.solver.assembly.Ring;
import org.annulet.solver.assembly.Section;

/**
 * The zones of a chamber as rectangles behind each other along x, with the edges between and around
 * them.
 */
final class StraightZones {
  private static final double SAME = 1e-6;

  private final Mesh mesh;
  private final Geometry geometry;
  private final List<Box> boxes = new ArrayList<>();
  private final List<String> leftOut = new ArrayList<>();
  private String upstream = "";
  private String downstream = "";

  /** One zone; {@code y} is the radius on a section. */
  private record Box(int zone, String name, double x0, double x1, double y0, double y1) {}

  private StraightZones(Mesh mesh, Geometry geometry) {
    this.mesh = mesh;
    this.geometry = geometry;
  }

  /**
   * Of a case on its mesh.
   *
   * @throws IllegalArgumentException if its zones are not in a row, with the reason
   */
  static StraightZones of(CaseFile caseFile, Mesh mesh, Geometry geometry) {
    if (!(geometry instanceof Ring || geometry instanceof Section || geometry instanceof Plane)) {
      throw new IllegalArgumentException(
          "a cross-section has no axis along which ducts could stand in a row");
    }
    StraightZones zones = new StraightZones(mesh, geometry);
    zones.box();
    zones.check();
    zones.ends(caseFile);
    return zones;
  }

  private void box() {
    int n = mesh.zoneNames().size();
    double[][] b = new double[n][];
    double[] area = new double[n];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      int z = mesh.zone(t);
      area[z] += mesh.area(t);
      for (int k = 0; k < 3; k++) {
        double x = mesh.cornerX(t, k);
        double y = mesh.cornerY(t, k);
        if (b[z] == null) {
          b[z] = new double[] {x, x, y, y};
        }
        b[z][0] = Math.min(b[z][0], x);
        b[z][1] = Math.max(b[z][1], x);
        b[z][2] = Math.min(b[z][2], y);
        b[z][3] = Math.max(b[z][3], y);
      }
    }
    for (int z = 0; z < n; z++) {
      String name = mesh.zoneNames().get(z);
      double full = (b[z][1] - b[z][0]) * (b[z][3] - b[z][2]);
      if (!(geometry instanceof Ring) && Math.abs(area[z] - full) > SAME * full) {
        throw new IllegalArgumentException(
            "zone '" + name + "' is no straight duct along x, so there is no row of ducts");
      }
      boxes.add(new Box(z, name, b[z][0], b[z][1], b[z][2], b[z][3]));
    }
    boxes.sort(Comparator.comparingDouble(Box::x0));
  }

  private void check() {
    double length = boxes.get(boxes.size() - 1).x1 - boxes.get(0).x0;
    for (int k = 1; k < boxes.size(); k++) {
      if (Math.abs(boxes.get(k).x0 - boxes.get(k - 1).x1) > SAME * length) {
        throw new IllegalArgumentException(
            "zones '"
                + boxes.get(k - 1).name
                + "' and '"
                + boxes.get(k).name
                + "' do not follow each other along x, so there is no row of ducts");
      }
    }
    for (int k = 1; k < boxes.size(); k++) {
      double a = area(k - 1);
      double b = area(k);
      if (Math.abs(a - b) > SAME * a) {
        leftOut.add(
            "the near field at the jump of area between " + name(k - 1) + " and " + name(k));
      }
    }
  }

  /** Names of the walls across both ends. */
  private void ends(CaseFile caseFile) {
    TreeSet<String> up = new TreeSet<>();
    TreeSet<String> down = new TreeSet<>();
    double x0 = boxes.get(0).x0;
    double x1 = boxes.get(boxes.size() - 1).x1;
    double length = x1 - x0;
    for (int e = 0; e < mesh.segmentCount(); e++) {
      double a = mesh.x(mesh.segmentStart(e));
      double b = mesh.x(mesh.segmentEnd(e));
      if (mesh.segmentRight(e) >= 0 || Math.abs(a - b) > SAME * length) {
        continue;
      }
      String name = mesh.edgeNames().get(mesh.segmentEdge(e));
      if (Math.abs(a - x0) < SAME * length) {
        up.add(name);
      } else if (Math.abs(a - x1) < SAME * length) {
        down.add(name);
      } else if (caseFile.walls().containsKey(name)) {
        leftOut.add("the wall '" + name + "', which stands across the row");
      }
    }
    upstream = one(up, "upstream", caseFile);
    downstream = one(down, "downstream", caseFile);
  }

  private static String one(TreeSet<String> names, String which, CaseFile caseFile) {
    List<String> said = names.stream().filter(n -> caseFile.walls().containsKey(n)).toList();
    if (said.size() > 1) {
      throw new IllegalArgumentException(
          "several walls stand across the " + which + " end: " + String.join(", ", said));
    }
    return said.isEmpty() ? names.isEmpty() ? "" : names.first() : said.get(0);
  }

  Mesh mesh() {
    return mesh;
  }

  int count() {
    return boxes.size();
  }

  String name(int k) {
    return boxes.get(k).name;
  }

  /** Number of the zone in the mesh. */
  int zone(int k) {
    return boxes.get(k).zone;
  }

  double[] range(int k) {
    return new double[] {boxes.get(k).x0, boxes.get(k).x1};
  }

  List<String> leftOut() {
    return leftOut;
  }

  String upstreamWall() {
    return upstream;
  }

  String downstreamWall() {
    return downstream;
  }

  int index(String zone) {
    for (int k = 0; k < boxes.size(); k++) {
      if (boxes.get(k).name.equals(zone)) {
        return k;
      }
    }
    throw new IllegalArgumentException("no zone '" + zone + "' in the row");
  }

  /** Cross-section in m², on a ring of the whole ring. */
  double area(int k) {
    Box b = boxes.get(k);
    if (geometry instanceof Ring ring) {
      Ring.Annulus zone = ring.zones().get(b.name);
      double share = separate(k) ? ring.burnerCount() * width(k) : 2 * Math.PI * zone.meanRadius();
      return share * zone.gap();
    }
    if (geometry instanceof Section section) {
      Section.Ducts ducts = section.ducts().get(b.name);
      double full = Math.PI * (b.y1 * b.y1 - b.y0 * b.y0);
      return ducts == null ? full : full * ducts.openShare();
    }
    return ((Plane) geometry).depth() * (b.y1 - b.y0);
  }

  /** Whether a zone consists of tubes that do not talk to each other. */
  private boolean separate(int k) {
    Box b = boxes.get(k);
    if (geometry instanceof Ring ring) {
      double whole = 0;
      for (int t = 0; t < mesh.triangleCount(); t++) {
        whole += mesh.zone(t) == b.zone ? mesh.area(t) : 0;
      }
      double round = 2 * Math.PI * ring.unrolledRadius() * (b.x1 - b.x0);
      return whole < (1 - SAME) * round;
    }
    return geometry instanceof Section section && section.ducts().containsKey(b.name);
  }

  /** True width of one duct of a ring in m. */
  private double width(int k) {
    Ring ring = (Ring) geometry;
    Box b = boxes.get(k);
    double whole = 0;
    for (int t = 0; t < mesh.triangleCount(); t++) {
      whole += mesh.zone(t) == b.zone ? mesh.area(t) : 0;
    }
    double scale = ring.zones().get(b.name).meanRadius() / ring.unrolledRadius();
    return whole / (b.x1 - b.x0) / ring.burnerCount() * scale;
  }

  /** Mean radius in m of the annulus that waves of an order run round in; ∞ where none do. */
  double radius(int k, int order) {
    if (order == 0 || separate(k) || geometry instanceof Plane) {
      return Double.POSITIVE_INFINITY;
    }
    Box b = boxes.get(k);
    if (geometry instanceof Section && b.y0 < 0.5 * b.y1) {
      leftOut.add("the curvature of zone " + b.name + ", no thin annulus");
    }
    return geometry instanceof Ring ring
        ? ring.zones().get(b.name).meanRadius()
        : 0.5 * (b.y0 + b.y1);
  }

  /** Perimeter in m of each side wall of a zone that has a name. */
  Map<String, Double> faces(int k) {
    Box b = boxes.get(k);
    Map<String, Double> out = new LinkedHashMap<>();
    if (geometry instanceof Ring ring) {
      Ring.Annulus zone = ring.zones().get(b.name);
      double share = separate(k) ? ring.burnerCount() * width(k) : 2 * Math.PI * zone.meanRadius();
      for (Face face : Face.values()) {
        String name = b.name + (face == Face.INNER ? ".inner_face" : ".outer_face");
        out.put(name, share * face.radius(zone) / zone.meanRadius());
      }
      return out;
    }
    for (int e = 0; e < mesh.segmentCount(); e++) {
      double y = mesh.y(mesh.segmentStart(e));
      boolean along = Math.abs(y - mesh.y(mesh.segmentEnd(e))) < SAME * (b.x1 - b.x0);
      if (!along || mesh.segmentRight(e) >= 0 || mesh.zone(mesh.segmentLeft(e)) != b.zone) {
        continue;
      }
      String name = mesh.edgeNames().get(mesh.segmentEdge(e));
      double around =
          geometry instanceof Plane plane ? plane.depth() : 2 * Math.PI * y * openShare(k);
      out.merge(name, around * mesh.segmentLength(e) / (b.x1 - b.x0), Double::sum);
    }
    return out;
  }

  private double openShare(int k) {
    Section.Ducts ducts = ((Section) geometry).ducts().get(boxes.get(k).name);
    return ducts == null ? 1 : ducts.openShare();
  }

  /** The joint an inner edge is: number of the zone upstream of it. */
  int joint(String edge) {
    int index = mesh.edgeNames().indexOf(edge);
    double length = boxes.get(boxes.size() - 1).x1 - boxes.get(0).x0;
    for (int e = 0; e < mesh.segmentCount(); e++) {
      if (mesh.segmentEdge(e) != index) {
        continue;
      }
      double a = mesh.x(mesh.segmentStart(e));
      double b = mesh.x(mesh.segmentEnd(e));
      for (int k = 0; k + 1 < boxes.size(); k++) {
        double x = boxes.get(k).x1;
        if (Math.abs(a - x) < SAME * length && Math.abs(b - x) < SAME * length) {
          return k;
        }
      }
    }
    throw new IllegalArgumentException(
        "edge '" + edge + "' is no joint between two ducts of the row");
  }

  /** The smaller cross-section at a joint in m². */
  double passage(int joint) {
    return Math.min(area(joint), area(joint + 1));
  }

  /** Azimuthal orders of a case. */
  List<Integer> orders(CaseFile caseFile) {
    if (geometry instanceof Ring ring) {
      List<Integer> orders = new ArrayList<>();
      for (int m = 0; 2 * m <= ring.burnerCount(); m++) {
        orders.add(m);
      }
      leftOut.add(
          "orders beyond half the number of burners, which the burners couple to lower ones");
      return orders;
    }
    return geometry instanceof Section ? caseFile.azimuthalOrders() : List.of(0);
  }

  int copies(int order) {
    if (order == 0) {
      return 1;
    }
    return geometry instanceof Ring ring && 2 * order == ring.burnerCount() ? 1 : 2;
  }
}
