package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Geometry;
import org.annulet.cases.read.Outline;
import org.annulet.cases.read.Wall;

/**
 * The zones of a case as straight ducts one behind the other along x.
 *
 * @param links from upstream to downstream
 * @param joints names of the inner edges between them, one less than links
 * @param upstream name of the edge at the upstream end
 * @param downstream name of the edge at the downstream end
 * @param leftOut reacting walls that have no place in the chain, in words
 */
record ChainLinks(
    List<Link> links,
    List<String> joints,
    String upstream,
    String downstream,
    List<String> leftOut) {
  private static final double SAME = 1e-9;

  /** Why a case is no chain. */
  static final class NoChain extends Exception {
    private static final long serialVersionUID = 1;

    NoChain(String why) {
      super(why);
    }
  }

  /**
   * One duct.
   *
   * @param zone name
   * @param start x of its upstream end in m
   * @param length in m
   * @param area in m²
   * @param radius mean radius of an annulus in m; ∞ where no wave runs round
   * @param low lowest transverse coordinate in m (radius on a section)
   * @param high highest
   * @param walls names of reacting walls along it with their perimeters in m
   */
  record Link(
      String zone,
      double start,
      double length,
      double area,
      double radius,
      double low,
      double high,
      Map<String, Double> walls) {}

  static ChainLinks of(CaseFile c) throws NoChain {
    Geometry g = c.geometry();
    if (g instanceof Geometry.Ring ring) {
      return ofRing(c, ring);
    }
    if (g instanceof Geometry.Section s) {
      return new OfOutline(c, s.outline(), 0).links();
    }
    if (g instanceof Geometry.Plane p) {
      return new OfOutline(c, p.outline(), p.depth()).links();
    }
    throw new NoChain(
        g instanceof Geometry.CrossSection
            ? "a plane across the axis has no ducts along it"
            : "the ducts of a mesh made elsewhere are not known");
  }

  private static ChainLinks ofRing(CaseFile c, Geometry.Ring ring) {
    List<Link> links = new ArrayList<>();
    List<String> joints = new ArrayList<>();
    List<String> used = new ArrayList<>();
    double x = 0;
    for (int k = 0; k < ring.zones().size(); k++) {
      Geometry.RingZone z = ring.zones().get(k);
      Map<String, Double> walls = new java.util.LinkedHashMap<>();
      double area;
      if (z instanceof Geometry.Annulus a) {
        area = 2 * Math.PI * a.meanRadius() * a.gap();
        walls.put(z.name() + ".inner_face", 2 * Math.PI * (a.meanRadius() - 0.5 * a.gap()));
        walls.put(z.name() + ".outer_face", 2 * Math.PI * (a.meanRadius() + 0.5 * a.gap()));
      } else {
        double bore = ((Geometry.Ducts) z).bore();
        area = ring.burnerCount() * Math.PI / 4 * bore * bore;
        walls.put(z.name() + ".side", ring.burnerCount() * Math.PI / 2 * bore);
      }
      walls.keySet().removeIf(w -> !reacts(c.wall(w)));
      used.addAll(walls.keySet());
      boolean annulus = z instanceof Geometry.Annulus;
      links.add(
          new Link(
              z.name(),
              x,
              z.length(),
              area,
              annulus ? z.meanRadius() : Double.POSITIVE_INFINITY,
              0,
              0,
              walls));
      if (k > 0) {
        Geometry.RingZone before = ring.zones().get(k - 1);
        joints.add(
            annulus && before instanceof Geometry.Ducts
                ? before.name() + ".outlet"
                : z.name() + ".inlet");
      }
      x += z.length();
    }
    String up = ring.zones().get(0).name() + ".upstream";
    String down = ring.zones().get(ring.zones().size() - 1).name() + ".downstream";
    used.add(up);
    used.add(down);
    return new ChainLinks(links, joints, up, down, unused(c, used));
  }

  static boolean reacts(Wall wall) {
    return !(wall instanceof Wall.Rigid);
  }

  private static List<String> unused(CaseFile c, List<String> used) {
    return c.walls().entrySet().stream()
        .filter(e -> reacts(e.getValue()) && !used.contains(e.getKey()))
        .map(e -> "the wall " + e.getKey() + " (" + CaseConditions.words(e.getValue()) + ")")
        .toList();
  }

  /** Rectangles of an outline. */
  private static final class OfOutline {
    private final CaseFile c;
    private final Outline outline;
    private final double depth;
    private final List<String> used = new ArrayList<>();

    /** A section where {@code depth} is 0. */
    OfOutline(CaseFile c, Outline outline, double depth) {
      this.c = c;
      this.outline = outline;
      this.depth = depth;
    }

    private Outline.Point point(String name) {
      return outline.points().get(name);
    }

    ChainLinks links() throws NoChain {
      List<Link> links = new ArrayList<>();
      for (Outline.Zone z : outline.zones().values()) {
        links.add(link(z));
      }
      links.sort(Comparator.comparingDouble(Link::start));
      List<String> joints = new ArrayList<>();
      for (int k = 1; k < links.size(); k++) {
        Link a = links.get(k - 1);
        Link b = links.get(k);
        double end = a.start + a.length;
        Optional<String> joint =
            outline.edges().keySet().stream()
                .filter(e -> outline.zonesAt(e).containsAll(List.of(a.zone, b.zone)))
                .findFirst();
        if (Math.abs(b.start - end) > SAME * end + SAME || joint.isEmpty()) {
          throw new NoChain(
              "zones " + a.zone + " and " + b.zone + " do not follow each other along x");
        }
        joints.add(joint.get());
      }
      Link last = links.get(links.size() - 1);
      String up = end(links.get(0).zone, links.get(0).start);
      String down = end(last.zone, last.start + last.length);
      return new ChainLinks(links, joints, up, down, unused(c, used));
    }

    private Link link(Outline.Zone z) throws NoChain {
      double[] box = {1e300, -1e300, 1e300, -1e300};
      double twice = 0;
      Outline.Point before = null;
      Outline.Point first = null;
      if (!z.holes().isEmpty()) {
        throw new NoChain("zone " + z.name() + " has holes");
      }
      for (Outline.Point p : loop(z)) {
        box[0] = Math.min(box[0], p.x());
        box[1] = Math.max(box[1], p.x());
        box[2] = Math.min(box[2], p.y());
        box[3] = Math.max(box[3], p.y());
        if (before != null) {
          twice += before.x() * p.y() - p.x() * before.y();
        }
        first = first == null ? p : first;
        before = p;
      }
      twice += before.x() * first.y() - first.x() * before.y();
      double full = (box[1] - box[0]) * (box[3] - box[2]);
      if (Math.abs(Math.abs(twice) / 2 - full) > 1e-6 * full) {
        throw new NoChain("zone " + z.name() + " is no straight duct along x");
      }
      double share = z.separateDucts().map(Geometry.SeparateDucts::openShare).orElse(1.0);
      double area =
          depth > 0
              ? depth * (box[3] - box[2])
              : Math.PI * (box[3] * box[3] - box[2] * box[2]) * share;
      boolean round = depth == 0 && z.separateDucts().isEmpty();
      return new Link(
          z.name(),
          box[0],
          box[1] - box[0],
          area,
          round ? 0.5 * (box[2] + box[3]) : Double.POSITIVE_INFINITY,
          box[2],
          box[3],
          sides(z, box, share));
    }

    /** Corners of a zone's outer loop in order. */
    private List<Outline.Point> loop(Outline.Zone z) throws NoChain {
      List<Outline.Point> all = new ArrayList<>();
      List<String> names = new ArrayList<>();
      for (String e : z.boundary()) {
        Outline.Edge edge = outline.edges().get(e);
        if (edge.shape() != Outline.Shape.LINE) {
          throw new NoChain("zone " + z.name() + " has the bent edge " + e);
        }
        List<String> p = new ArrayList<>(edge.points());
        boolean backwards =
            !names.isEmpty()
                ? !p.get(0).equals(names.get(names.size() - 1))
                : z.boundary().size() > 1
                    && outline.edges().get(z.boundary().get(1)).points().contains(p.get(0))
                    && !outline
                        .edges()
                        .get(z.boundary().get(1))
                        .points()
                        .contains(p.get(p.size() - 1));
        if (backwards) {
          java.util.Collections.reverse(p);
        }
        names.addAll(names.isEmpty() ? p : p.subList(1, p.size()));
      }
      names.forEach(n -> all.add(point(n)));
      return all;
    }

    private Map<String, Double> sides(Outline.Zone z, double[] box, double share) {
      Map<String, Double> walls = new java.util.LinkedHashMap<>();
      for (String e : z.boundary()) {
        List<Outline.Point> p = outline.edges().get(e).points().stream().map(this::point).toList();
        double y = p.get(0).y();
        if (outline.zonesAt(e).size() == 1
            && reacts(c.wall(e))
            && p.stream().allMatch(q -> Math.abs(q.y() - y) < SAME)
            && !(c.wall(e) instanceof Wall.Open)) {
          double length = Math.abs(p.get(p.size() - 1).x() - p.get(0).x()) / (box[1] - box[0]);
          walls.put(e, length * (depth > 0 ? depth : 2 * Math.PI * y * share));
          used.add(e);
        }
      }
      return walls;
    }

    /** The edge at an end; any of them where all are rigid. */
    private String end(String zone, double x) throws NoChain {
      List<String> there =
          outline.zones().get(zone).boundary().stream()
              .filter(e -> outline.zonesAt(e).size() == 1)
              .filter(
                  e ->
                      outline.edges().get(e).points().stream()
                              .filter(p -> Math.abs(point(p).x() - x) < SAME)
                              .count()
                          >= 2)
              .toList();
      if (there.isEmpty()) {
        throw new NoChain(
            String.format(
                Locale.ROOT, "zone %s has no wall at its end x = %.1f mm", zone, 1e3 * x));
      }
      for (String e : there) {
        boolean whole =
            there.size() == 1
                && outline.edges().get(e).points().stream()
                    .allMatch(p -> Math.abs(point(p).x() - x) < SAME);
        if (reacts(c.wall(e)) && !whole) {
          throw new NoChain("the wall " + e + " covers more or less than the end of the duct");
        }
      }
      used.add(there.get(0));
      return there.get(0);
    }
  }
}
