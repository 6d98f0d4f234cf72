package org.annulet.post.report;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.util.Base64;
import java.util.List;
import java.util.Locale;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.chart.ChamberPicture;
import org.annulet.post.chart.PlaneView;
import org.annulet.post.meaning.GeometryKind;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel.Pairing;
import org.annulet.post.meaning.ModeMaps;
import org.annulet.post.meaning.PairCombination;
import org.annulet.post.table.JsonWriter;
import org.annulet.post.vtk.Surface;

/**
 * The fields for the page's script: thinned mesh in px of the chamber's picture as 32-bit floats,
 * triangles as 32-bit integers, real and imaginary part of each mode as 16-bit integers scaled to
 * the largest |p̂|; all little-endian in base 64.
 */
final class PageData {
  private static final int POINTS = 7000;

  private PageData() {}

  static String json(ReportInput input, ChamberPicture picture, PlaneView view) {
    Mesh mesh = input.chamber().mesh();
    Surface flat = Surface.flat(mesh);
    ThinMesh.Thinned thin = ThinMesh.of(mesh, flat, POINTS);
    ByteBuffer place = buffer(8 * thin.points().length);
    for (int p : thin.points()) {
      double x = flat.coordinate(p, 0);
      double y = flat.coordinate(p, 1);
      place.putFloat((float) ((view.right(x, y) - picture.frame()[0]) * picture.frame()[2]));
      place.putFloat((float) ((view.down(x, y) - picture.frame()[1]) * picture.frame()[2]));
    }
    ByteBuffer corners = buffer(4 * thin.triangles().length);
    for (int c : thin.triangles()) {
      corners.putInt(c);
    }
    JsonWriter json = new JsonWriter();
    json.object()
        .numbers("size", picture.size())
        .text("outline", picture.outline())
        .text("points", base64(place))
        .text("triangles", base64(corners))
        .array("modes");
    boolean walls = input.chamber().kind() != GeometryKind.RING;
    List<ModeEntry> modes = input.results().modes();
    for (int i = 0; i < modes.size(); i++) {
      mode(json, input, i, new int[][] {thin.points(), nodes(flat, thin.points())});
    }
    json.endArray();
    List<ModeMaps> targets = DamperPlaces.targets(input.results());
    if (!targets.isEmpty()) {
      json.object("worst");
      map(json, ModeMaps.worst(targets), nodes(flat, thin.points()));
      json.text("how", walls ? "walls" : "gas").endObject();
    }
    return json.endObject().toString();
  }

  private static int[] nodes(Surface flat, int[] points) {
    int[] nodes = new int[points.length];
    for (int q = 0; q < nodes.length; q++) {
      nodes[q] = flat.node(points[q]);
    }
    return nodes;
  }

  private static void mode(JsonWriter json, ReportInput input, int i, int[][] thin) {
    List<ModeEntry> modes = input.results().modes();
    ModeEntry e = modes.get(i);
    double largest = largest(e);
    ByteBuffer field = buffer(4 * thin[1].length);
    for (double[] part : new double[][] {e.view().re(), e.view().im()}) {
      for (int v : thin[1]) {
        field.putShort((short) Math.round(32767 * part[v] / largest));
      }
    }
    json.object().text("field", base64(field)).array("combinations");
    int partner = e.label().partner();
    if (partner >= 0 && partner < modes.size() && e.label().pairing() != Pairing.SINGLE) {
      ModeEntry other = modes.get(partner);
      int order = e.label().azimuthalOrder() == null ? 0 : e.label().azimuthalOrder();
      double scale = largest(other);
      for (PairCombination c : PairCombination.of(input.chamber(), e.view(), other.view(), order)) {
        json.object()
            .text("name", c.name())
            .number("partner", partner)
            .numbers(
                "weights",
                c.first().getReal() * largest,
                c.first().getImaginary() * largest,
                c.second().getReal() * scale,
                c.second().getImaginary() * scale)
            .endObject();
      }
    }
    json.endArray().array("maps");
    if (e.maps().isPresent()) {
      boolean walls = input.chamber().kind() != GeometryKind.RING;
      double most = largest(e.maps().get().damper()) * DamperPlaces.PER_CM2;
      String end = String.format(Locale.ROOT, "%.2g", most);
      json.object()
          .text("name", "where a damper helps")
          .text("low", "−" + end)
          .text("high", "+" + end + " 1/s per cm² of damper; blue-green damps");
      map(json, e.maps().get().damper(), thin[1]);
      json.text("how", walls ? "walls" : "gas").endObject();
      if (largest(e.maps().get().drive()) > 0) {
        json.object()
            .text("name", "where the flame drives")
            .text("low", "damps")
            .text("high", "drives; share of the growth rate per volume");
        map(json, e.maps().get().drive(), thin[1]);
        json.text("how", "spots").endObject();
      }
    }
    json.endArray().endObject();
  }

  /** A map at the points, over its largest size, nought where it is not defined. */
  private static void map(JsonWriter json, double[] values, int[] nodes) {
    double largest = Math.max(largest(values), Double.MIN_NORMAL);
    ByteBuffer field = buffer(2 * nodes.length);
    for (int v : nodes) {
      field.putShort(
          (short) (Double.isNaN(values[v]) ? 0 : Math.round(32767 * values[v] / largest)));
    }
    json.text("field", base64(field));
  }

  private static double largest(double[] values) {
    double max = 0;
    for (double v : values) {
      max = Double.isNaN(v) ? max : Math.max(max, Math.abs(v));
    }
    return max;
  }

  private static double largest(ModeEntry e) {
    double max = Double.MIN_NORMAL;
    for (int v = 0; v < e.view().re().length; v++) {
      max = Math.max(max, Math.hypot(e.view().re()[v], e.view().im()[v]));
    }
    return max;
  }

  private static ByteBuffer buffer(int bytes) {
    return ByteBuffer.allocate(bytes).order(ByteOrder.LITTLE_ENDIAN);
  }

  private static String base64(ByteBuffer b) {
    return Base64.getEncoder().encodeToString(b.array());
  }
}
