package org.annulet.cases.study;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Geometry;
import org.annulet.cases.read.TwoPort;
import org.annulet.cases.read.Wall;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.chart.Marker;

/** What holds where in a case, for pictures and lists. */
final class CaseConditions {
  private CaseConditions() {}

  /** What holds on each edge of a mesh, in words, in the order of its edge names. */
  static List<String> of(CaseFile caseFile, Mesh mesh) {
    boolean[] inner = new boolean[mesh.edgeNames().size()];
    for (int e = 0; e < mesh.segmentCount(); e++) {
      inner[mesh.segmentEdge(e)] |= mesh.segmentRight(e) >= 0;
    }
    List<String> all = new ArrayList<>();
    for (int k = 0; k < inner.length; k++) {
      all.add(on(caseFile, mesh.edgeNames().get(k), inner[k]));
    }
    return all;
  }

  private static String on(CaseFile caseFile, String edge, boolean inner) {
    List<String> parts = new ArrayList<>();
    if (!inner) {
      parts.add(words(caseFile.wall(edge)));
    }
    for (TwoPort port : caseFile.twoPorts()) {
      if (port.edge().equals(edge)) {
        parts.add(words(port));
      }
    }
    for (Flame flame : caseFile.flames()) {
      if (flame.place() instanceof Flame.Sheet sheet && sheet.edge().equals(edge)) {
        parts.add("flame " + flame.name());
      }
    }
    for (Damper damper : caseFile.dampers()) {
      for (Damper.Place place : damper.places()) {
        if (place instanceof Damper.OnEdge on && on.edge().equals(edge)) {
          parts.add(on.count() + " × damper " + damper.name());
        }
      }
    }
    return parts.isEmpty() ? "gas on both sides" : String.join(", ", parts);
  }

  /** A wall in words. */
  static String words(Wall wall) {
    if (wall instanceof Wall.Impedance z) {
      return "Z/ρc = " + complex(z.re(), z.im());
    }
    if (wall instanceof Wall.Admittance y) {
      return "ρc/Z = " + complex(y.re(), y.im());
    }
    if (wall instanceof Wall.ChokedNozzle n) {
      return "choked nozzle, Mach " + number(n.mach());
    }
    if (wall instanceof Wall.Tabulated t) {
      return t.quantity().name().toLowerCase(Locale.ROOT) + " from " + t.table().file();
    }
    if (wall instanceof Wall.Perforated p) {
      return "perforated, bias flow " + number(p.biasVelocity()) + " m/s";
    }
    if (wall instanceof Wall.RadiatingEnd e) {
      return e.rim().name().toLowerCase(Locale.ROOT) + " opening";
    }
    return wall instanceof Wall.Open ? "open" : "rigid";
  }

  /** A two-port in words. */
  static String words(TwoPort port) {
    if (port.special().isPresent()) {
      return (port.special().get() instanceof TwoPort.Screen s
              ? "perforated plate, flow of " + number(s.plate().biasVelocity()) + " m/s"
              : "measured transfer matrix")
          + ", flow from "
          + port.flowFrom();
    }
    List<String> parts = new ArrayList<>();
    String at = " at " + number(port.velocity()) + " m/s";
    port.lossCoefficient().ifPresent(z -> parts.add("ζ = " + number(z) + at));
    port.pressureDrop().ifPresent(p -> parts.add("loss of " + number(p / 1000) + " kPa" + at));
    if (port.effectiveLength() > 0) {
      parts.add("effective length " + number(1e3 * port.effectiveLength()) + " mm");
    }
    return String.join(", ", parts) + ", flow from " + port.flowFrom();
  }

  private static String complex(double re, double im) {
    return im == 0
        ? number(re)
        : number(re) + (im < 0 ? " − " : " + ") + number(Math.abs(im)) + " i";
  }

  /** At most four digits, no trailing zeros. */
  private static String number(double x) {
    return new BigDecimal(x).round(new MathContext(4)).stripTrailingZeros().toPlainString();
  }

  /** Flames and dampers as marks in the plane of the mesh. */
  static List<Marker> markers(CaseFile caseFile, Mesh mesh) {
    List<Marker> markers = new ArrayList<>();
    for (Flame flame : caseFile.flames()) {
      flameMarkers(flame, caseFile.geometry(), mesh, markers);
    }
    for (Damper damper : caseFile.dampers()) {
      int number = 0;
      for (Damper.Place place : damper.places()) {
        String name = "damper " + damper.name() + " " + ++number;
        if (place instanceof Damper.OnEdge e) {
          markers.add(new Marker(name, Marker.Kind.PORT, e.x(), e.y()));
        } else {
          Damper.OnFace f = (Damper.OnFace) place;
          Geometry.Ring ring = (Geometry.Ring) caseFile.geometry();
          double arc = f.angle() * ring.unrolledRadius();
          double period = mesh.period();
          markers.add(
              new Marker(name, Marker.Kind.PORT, f.x(), arc - period * Math.floor(arc / period)));
        }
      }
    }
    return markers;
  }

  /** In the middle of a sheet or of what a flame fills; on a ring behind every burner. */
  private static void flameMarkers(
      Flame flame, Geometry geometry, Mesh mesh, List<Marker> markers) {
    double x = 0;
    double y = 0;
    double weight = 0;
    if (flame.place() instanceof Flame.Sheet sheet) {
      for (int e = 0; e < mesh.segmentCount(); e++) {
        if (mesh.edgeNames().get(mesh.segmentEdge(e)).equals(sheet.edge())) {
          double w = mesh.segmentLength(e);
          x += w * 0.5 * (mesh.x(mesh.segmentStart(e)) + mesh.x(mesh.segmentEnd(e)));
          y += w * 0.5 * (mesh.y(mesh.segmentStart(e)) + mesh.y(mesh.segmentEnd(e)));
          weight += w;
        }
      }
    } else if (flame.place() instanceof Flame.Spread spread) {
      for (int t = 0; t < mesh.triangleCount(); t++) {
        double cx = (mesh.cornerX(t, 0) + mesh.cornerX(t, 1) + mesh.cornerX(t, 2)) / 3;
        boolean inside = cx >= spread.from() && cx <= spread.to();
        if (inside && mesh.zoneNames().get(mesh.zone(t)).equals(spread.zone())) {
          double w = mesh.area(t);
          x += w * cx;
          y += w * (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
          weight += w;
        }
      }
    }
    if (flame.place() instanceof Flame.Brush brush) {
      for (int t = 0; t < mesh.triangleCount(); t++) {
        if (mesh.zoneNames().get(mesh.zone(t)).equals(brush.zone())) {
          double cx = (mesh.cornerX(t, 0) + mesh.cornerX(t, 1) + mesh.cornerX(t, 2)) / 3;
          double cy = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
          double w = mesh.area(t) * brush.density().at(cx, cy);
          x += w * cx;
          y += w * cy;
          weight += w;
        }
      }
    }
    if (weight == 0) {
      return;
    }
    if (geometry instanceof Geometry.Ring ring) {
      for (int burner = 0; burner < ring.burnerCount(); burner++) {
        double arc = burner * mesh.period() / ring.burnerCount();
        markers.add(new Marker("flame " + flame.name(), Marker.Kind.FLAME, x / weight, arc));
      }
    } else {
      markers.add(new Marker("flame " + flame.name(), Marker.Kind.FLAME, x / weight, y / weight));
    }
  }
}
