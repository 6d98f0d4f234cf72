package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.vtk.Surface;

/**
 * The chamber in the plane of its mesh: zones as tinted areas, named edges with numbered dots,
 * flames and ports as marks.
 *
 * @param svg the picture as an SVG element
 * @param edges names of the edges, in the order of their numbers from 1
 * @param outline the outlines of the zones as path data, in px of the picture
 * @param frame {left, top, px per m}: a place (right, down) in m lies at ((right − left)·scale,
 *     (down − top)·scale) px
 * @param size {width, height} in px
 */
public record ChamberPicture(
    String svg, List<String> edges, String outline, double[] frame, double[] size) {
  private static final double WIDTH = 760;
  private static final double TALLEST = 560;
  private static final double MARGIN = 16;

  /** Mean width of a letter of the key in px. */
  private static final double LETTER = 7;

  /** Tints of zones where the page sets none. */
  private static final List<String> TINTS =
      List.of("#d9e4e6", "#ecd9d0", "#e8e2d6", "#dde3d3", "#e3dbe8", "#e6e6da");

  /** Draws a chamber. */
  public static ChamberPicture of(Mesh mesh, PlaneView view, List<Marker> markers) {
    Surface flat = Surface.flat(mesh);
    double[] box = {
      Double.POSITIVE_INFINITY,
      Double.POSITIVE_INFINITY,
      Double.NEGATIVE_INFINITY,
      Double.NEGATIVE_INFINITY
    };
    for (int p = 0; p < flat.pointCount(); p++) {
      double r = view.right(flat.coordinate(p, 0), flat.coordinate(p, 1));
      double d = view.down(flat.coordinate(p, 0), flat.coordinate(p, 1));
      box[0] = Math.min(box[0], r);
      box[1] = Math.min(box[1], d);
      box[2] = Math.max(box[2], r);
      box[3] = Math.max(box[3], d);
    }
    double scale =
        Math.min(
            (WIDTH - 2 * MARGIN) / (box[2] - box[0]), (TALLEST - 2 * MARGIN) / (box[3] - box[1]));
    double[] frame = {box[0] - MARGIN / scale, box[1] - MARGIN / scale, scale};
    double[] size = {
      (box[2] - box[0]) * scale + 2 * MARGIN, (box[3] - box[1]) * scale + 2 * MARGIN
    };
    Drawing d = new Drawing(view, frame);
    StringBuilder outline = new StringBuilder();
    StringBuilder b = new StringBuilder();
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(size[0]))
        .append(' ')
        .append(at(size[1]))
        .append("\" role=\"img\" aria-label=\"Chamber with its zones and edges\"")
        .append(" font-family=\"system-ui,sans-serif\" font-size=\"13\">\n");
    for (int z = 0; z < mesh.zoneNames().size(); z++) {
      String path = d.zone(mesh, flat, z);
      outline.append(path);
      b.append("<path fill-rule=\"evenodd\" fill=\"var(--zone-")
          .append(z % 6)
          .append(',')
          .append(TINTS.get(z % 6))
          .append(")\" stroke=\"var(--ink,#222)\" stroke-width=\"1.2\" d=\"")
          .append(path)
          .append("\"><title>")
          .append(Svg.escape(mesh.zoneNames().get(z)))
          .append("</title></path>\n");
    }
    d.inner(b, mesh);
    for (Marker m : markers) {
      d.marker(b, m);
    }
    d.edges(b, mesh);
    return new ChamberPicture(
        b.append("</svg>\n").toString(), mesh.edgeNames(), outline.toString(), frame, size);
  }

  /**
   * The picture with a key below it: tints of the zones, and the edges by number with what holds on
   * each.
   *
   * @param zones names of the zones, in the order of the mesh
   * @param conditions what holds on each edge, in the order of {@link #edges()}
   * @return an SVG element
   */
  public String withKey(List<String> zones, List<String> conditions) {
    double line = 20;
    int longest = 0;
    for (int e = 0; e < edges.size(); e++) {
      longest = Math.max(longest, edges.get(e).length() + conditions.get(e).length() + 6);
    }
    int columns = LETTER * longest < (size[0] - MARGIN) / 2 ? 2 : 1;
    double column = (size[0] - MARGIN) / columns;
    int rows = (edges.size() + columns - 1) / columns;
    int zoneRows = (zones.size() + columns - 1) / columns;
    double height = size[1] + (rows + zoneRows + 1) * line;
    StringBuilder b = new StringBuilder();
    for (int z = 0; z < zones.size(); z++) {
      double x = MARGIN + z / zoneRows * column;
      double y = size[1] + (z % zoneRows) * line;
      b.append(
          String.format(
              Locale.ROOT,
              "<rect x=\"%.2f\" y=\"%.2f\" width=\"14\" height=\"14\" fill=\"var(--zone-%d,%s)\""
                  + " stroke=\"var(--ink,#222)\"/><text x=\"%.2f\" y=\"%.2f\""
                  + " fill=\"var(--ink,#222)\">%s</text>%n",
              x,
              y,
              z % 6,
              TINTS.get(z % 6),
              x + 22,
              y + 12,
              Svg.escape(zones.get(z))));
    }
    for (int e = 0; e < edges.size(); e++) {
      double x = MARGIN + e / rows * column;
      double y = size[1] + (zoneRows + e % rows + 0.6) * line + 8;
      b.append(
          String.format(
              Locale.ROOT,
              "<text x=\"%.2f\" y=\"%.2f\" fill=\"var(--ink,#222)\">%d  %s: %s</text>%n",
              x,
              y,
              e + 1,
              Svg.escape(edges.get(e)),
              Svg.escape(conditions.get(e))));
    }
    String frameOf = "viewBox=\"0 0 " + at(size[0]) + " ";
    return svg.replace(frameOf + at(size[1]), frameOf + at(height)).replace("</svg>", b + "</svg>");
  }

  /** Pen with a view and a frame. */
  private record Drawing(PlaneView view, double[] frame) {
    double px(double x, double y) {
      return (view.right(x, y) - frame[0]) * frame[2];
    }

    double py(double x, double y) {
      return (view.down(x, y) - frame[1]) * frame[2];
    }

    /** Outline of a zone: its sides without a neighbour in the same zone, chained to loops. */
    String zone(Mesh mesh, Surface flat, int zone) {
      Map<Long, Integer> once = new HashMap<>();
      for (int t = 0; t < flat.triangleCount(); t++) {
        if (mesh.zone(flat.sourceTriangle(t)) == zone) {
          for (int k = 0; k < 3; k++) {
            long a = flat.corner(t, k);
            long c = flat.corner(t, (k + 1) % 3);
            if (once.remove(c << 32 | a) == null) {
              once.put(a << 32 | c, 1);
            }
          }
        }
      }
      Map<Integer, List<Integer>> next = new HashMap<>();
      once.keySet().stream()
          .sorted()
          .forEach(
              s ->
                  next.computeIfAbsent((int) (s >>> 32), q -> new ArrayList<>())
                      .add((int) (long) s));
      StringBuilder path = new StringBuilder();
      for (int start : next.keySet().stream().sorted().toList()) {
        while (!next.get(start).isEmpty()) {
          List<double[]> loop = new ArrayList<>();
          int v = start;
          do {
            double x = flat.coordinate(v, 0);
            double y = flat.coordinate(v, 1);
            loop.add(new double[] {px(x, y), py(x, y)});
            v = next.get(v).remove(0);
          } while (v != start && !next.get(v).isEmpty());
          append(path, loop);
        }
      }
      return path.toString();
    }

    private static void append(StringBuilder path, List<double[]> loop) {
      boolean first = true;
      double[] last = loop.get(loop.size() - 1);
      for (int i = 0; i < loop.size(); i++) {
        double[] p = loop.get(i);
        double[] q = loop.get((i + 1) % loop.size());
        double cross = (p[0] - last[0]) * (q[1] - p[1]) - (p[1] - last[1]) * (q[0] - p[0]);
        double length = Math.hypot(q[0] - last[0], q[1] - last[1]);
        if (Math.abs(cross) > 0.02 * Math.max(length, 1e-3)) { // px off the straight line
          path.append(first ? 'M' : 'L').append(at(p[0])).append(' ').append(at(p[1]));
          first = false;
          last = p;
        }
      }
      path.append(first ? "" : "Z");
    }

    void inner(StringBuilder b, Mesh mesh) {
      for (int s = 0; s < mesh.segmentCount(); s++) {
        if (mesh.segmentRight(s) != -1) {
          double[] p = segment(mesh, s);
          b.append(
              String.format(
                  Locale.ROOT,
                  "<line x1=\"%.2f\" y1=\"%.2f\" x2=\"%.2f\" y2=\"%.2f\" stroke=\"var(--ink,#222)\""
                      + " stroke-dasharray=\"5 3\"/>%n",
                  p[0],
                  p[1],
                  p[2],
                  p[3]));
        }
      }
    }

    /** Numbered dots, each at another part of its edge so that parallel edges keep them apart. */
    void edges(StringBuilder b, Mesh mesh) {
      int n = mesh.edgeNames().size();
      List<List<Integer>> of = new ArrayList<>();
      for (int e = 0; e < n; e++) {
        of.add(new ArrayList<>());
      }
      for (int s = 0; s < mesh.segmentCount(); s++) {
        of.get(mesh.segmentEdge(s)).add(s);
      }
      for (int e = 0; e < n; e++) {
        if (!of.get(e).isEmpty()) {
          double part = mesh.period() > 0 ? 0.1 + 0.8 * (0.618 * e % 1) : 1.0 / 3;
          double[] p = segment(mesh, of.get(e).get((int) (part * of.get(e).size())));
          b.append(
              String.format(
                  Locale.ROOT,
                  "<g><title>%s</title><circle cx=\"%.2f\" cy=\"%.2f\" r=\"10\""
                      + " fill=\"var(--paper,#fff)\" stroke=\"var(--ink,#222)\"/><text x=\"%.2f\""
                      + " y=\"%.2f\" text-anchor=\"middle\" fill=\"var(--ink,#222)\">%d</text></g>%n",
                  Svg.escape(mesh.edgeNames().get(e)),
                  (p[0] + p[2]) / 2,
                  (p[1] + p[3]) / 2,
                  (p[0] + p[2]) / 2,
                  (p[1] + p[3]) / 2 + 4.5,
                  e + 1));
        }
      }
    }

    private double[] segment(Mesh mesh, int s) {
      int a = mesh.segmentStart(s);
      int c = mesh.segmentEnd(s);
      double ya = mesh.y(a);
      double yc = mesh.y(c);
      if (mesh.period() > 0) { // across the seam the copy beyond the higher side is drawn
        double lap = mesh.period() * Math.rint((yc - ya) / mesh.period());
        yc += lap < 0 ? -lap : 0;
        ya += lap > 0 ? lap : 0;
      }
      return new double[] {
        px(mesh.x(a), ya), py(mesh.x(a), ya), px(mesh.x(c), yc), py(mesh.x(c), yc)
      };
    }

    void marker(StringBuilder b, Marker m) {
      double x = px(m.x(), m.y());
      double y = py(m.x(), m.y());
      b.append("<g><title>").append(Svg.escape(m.name())).append("</title>");
      if (m.kind() == Marker.Kind.FLAME) {
        b.append(
            String.format(
                Locale.ROOT,
                "<path d=\"M%.2f %.2fc7 6 6 15 0 17c-6 -2 -7 -11 0 -17z\" fill=\"var(--grow,#b4431a)\""
                    + " stroke=\"var(--paper,#fff)\"/>",
                x,
                y - 9));
      } else {
        b.append(
            String.format(
                Locale.ROOT,
                "<rect x=\"%.2f\" y=\"%.2f\" width=\"11\" height=\"11\" rx=\"2\""
                    + " fill=\"var(--decay,#1f6f78)\" stroke=\"var(--paper,#fff)\"/>",
                x - 5.5,
                y - 5.5));
      }
      b.append("</g>\n");
    }
  }
}
