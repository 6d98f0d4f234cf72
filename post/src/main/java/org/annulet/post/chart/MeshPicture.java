package org.annulet.post.chart;

import static org.annulet.post.chart.Svg.at;

import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.vtk.Surface;

/**
 * A mesh as SVG: every triangle in the colour of its zone, the named edges drawn thicker and named
 * by a tool tip. Of a mesh with more than {@value #MOST} triangles only the zones and edges are
 * drawn, since the lines would run together.
 */
public final class MeshPicture {
  private static final int MOST = 60_000;
  private static final double WIDTH = 1200;
  private static final double MARGIN = 12;
  private static final String[] TINT = {
    "#e9e1cf", "#d3e2e0", "#f0d8c6", "#dcdcea", "#e3e8cd", "#ead6de"
  };

  private MeshPicture() {}

  /** The picture as a file of its own. */
  public static String svg(Mesh mesh, PlaneView view) {
    Surface flat = Surface.flat(mesh);
    int n = flat.pointCount();
    double[] right = new double[n];
    double[] down = new double[n];
    double[] low = {Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY};
    double[] high = {Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY};
    for (int p = 0; p < n; p++) {
      right[p] = view.right(flat.coordinate(p, 0), flat.coordinate(p, 1));
      down[p] = view.down(flat.coordinate(p, 0), flat.coordinate(p, 1));
      low[0] = Math.min(low[0], right[p]);
      high[0] = Math.max(high[0], right[p]);
      low[1] = Math.min(low[1], down[p]);
      high[1] = Math.max(high[1], down[p]);
    }
    double scale = (WIDTH - 2 * MARGIN) / Math.max(high[0] - low[0], high[1] - low[1]);
    for (int p = 0; p < n; p++) {
      right[p] = MARGIN + scale * (right[p] - low[0]);
      down[p] = MARGIN + scale * (down[p] - low[1]);
    }
    boolean lines = flat.triangleCount() <= MOST;
    StringBuilder b = new StringBuilder(64 * flat.triangleCount());
    b.append("<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 ")
        .append(at(scale * (high[0] - low[0]) + 2 * MARGIN))
        .append(' ')
        .append(at(scale * (high[1] - low[1]) + 2 * MARGIN))
        .append(
            "\" stroke-linejoin=\"round\">\n<rect width=\"100%\" height=\"100%\" fill=\"#fff\"/>\n");
    for (int z = 0; z < mesh.zoneNames().size(); z++) {
      String tint = TINT[z % TINT.length];
      b.append("<path fill=\"")
          .append(tint)
          .append("\" stroke=\"")
          .append(lines ? "#6b6f78" : tint)
          .append("\" stroke-width=\"0.4\" d=\"");
      for (int t = 0; t < flat.triangleCount(); t++) {
        if (mesh.zone(flat.sourceTriangle(t)) == z) {
          for (int k = 0; k < 3; k++) {
            int p = flat.corner(t, k);
            b.append(k == 0 ? 'M' : 'L').append(at(right[p])).append(' ').append(at(down[p]));
          }
          b.append('Z');
        }
      }
      b.append("\"><title>zone ")
          .append(Svg.escape(mesh.zoneNames().get(z)))
          .append("</title></path>\n");
    }
    for (int name = 0; name < mesh.edgeNames().size(); name++) {
      b.append("<path fill=\"none\" stroke=\"#222\" stroke-width=\"1.6\" d=\"");
      for (int e = 0; e < mesh.segmentCount(); e++) {
        if (mesh.segmentEdge(e) == name) {
          segment(b, mesh, view, e, new double[] {low[0], low[1], scale});
        }
      }
      b.append("\"><title>edge ")
          .append(Svg.escape(mesh.edgeNames().get(name)))
          .append("</title></path>\n");
    }
    return b.append("</svg>\n").toString();
  }

  private static void segment(StringBuilder b, Mesh mesh, PlaneView view, int e, double[] frame) {
    double x0 = mesh.x(mesh.segmentStart(e));
    double y0 = mesh.y(mesh.segmentStart(e));
    double x1 = mesh.x(mesh.segmentEnd(e));
    double y1 = mesh.y(mesh.segmentEnd(e));
    if (mesh.period() > 0 && Math.abs(y1 - y0) > 0.5 * mesh.period()) {
      return; // across the seam: seen from both sides already
    }
    b.append('M')
        .append(at(MARGIN + frame[2] * (view.right(x0, y0) - frame[0])))
        .append(' ')
        .append(at(MARGIN + frame[2] * (view.down(x0, y0) - frame[1])))
        .append('L')
        .append(at(MARGIN + frame[2] * (view.right(x1, y1) - frame[0])))
        .append(' ')
        .append(at(MARGIN + frame[2] * (view.down(x1, y1) - frame[1])));
  }
}
