package org.annulet.mesher.triangulate;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.annulet.mesher.geometry.Outline;
import org.annulet.mesher.geometry.Zone;

/** Outlines to try a mesher on: invented chambers, and the shapes mesh generators fail on. */
final class Gallery {
  private Gallery() {}

  /** An outline with the sizes it is meshed with. */
  record Piece(Outline outline, Sizing sizing) {}

  /** Built on first use only. */
  private static final class Built {
    private static final Map<String, Piece> ALL = Collections.unmodifiableMap(build());
  }

  static Map<String, Piece> all() {
    return Built.ALL;
  }

  private static Map<String, Piece> build() {
    Map<String, Piece> g = new LinkedHashMap<>();
    put(g, "straight duct", 0.02, polygon(0, 0, 1, 0, 1, 0.1, 0, 0.1));
    put(g, "annular chamber", 0.015, Chambers.annularChamber());
    put(g, "can-annular chamber", 0.012, Chambers.canAnnular());
    put(g, "reverse-flow chamber", 0.012, Chambers.reverseFlow());
    put(g, "stepped chamber", 0.02, Chambers.steppedChamber());
    put(g, "slot of 1 mm in 300 mm", 0.02, Chambers.slot());
    put(
        g,
        "tapered chamber",
        0.015,
        polygon(0, 0.2, 0.5, 0.28, 0.6, 0.3, 0.6, 0.33, 0.5, 0.42, 0, 0.5));
    put(g, "wedge of 0.5°", 0.05, wedge(0.5));
    put(g, "wedge of 5°", 0.05, wedge(5));
    put(g, "wedge of 45°", 0.05, wedge(45));
    put(g, "crescent of tangent circles", 0.02, crescent());
    put(g, "gap between tangent circles", 0.02, outerTangents());
    put(g, "200 small holes", 0.05, holes(200));
    put(g, "boundary of 10,000 points", 0.05, wavyBoundary(10_000));
    put(g, "smooth walls", 0.02, smoothWalls());
    put(g, "disc", 0.1, disc());
    put(g, "annulus", 0.03, annulus());
    put(g, "swirler ports as zones", 0.03, portsAsZones());
    put(g, "L", 0.1, polygon(0, 0, 1, 0, 1, 0.5, 0.5, 0.5, 0.5, 1, 0, 1));
    put(g, "star of twelve tips", 0.05, star(12));
    put(g, "comb", 0.02, comb(15));
    put(g, "resonator on a thin neck", 0.02, resonator());
    put(g, "double wall", 0.02, doubleWall());
    put(g, "four zones at a point", 0.1, fourZones());
    put(g, "hole 0.1 mm from the wall", 0.05, nearHole());
    put(g, "closed smooth hole", 0.05, smoothHole());
    put(g, "turned and far away", 0.05, farAway());
    put(g, "a micrometre", 1e-7, scaled(1e-6));
    put(g, "a kilometre", 100, scaled(1e3));
    put(g, "hole on a corner", 0.05, holeOnCorner());
    put(g, "spiral", 0.02, spiral());
    put(
        g,
        "local sizes",
        Chambers.annularChamber(),
        Sizing.builder(0.03).edge("flame", 0.002).zone("burner", 0.006).growth(0.2).build());
    put(
        g,
        "size field",
        polygon(0, 0, 1, 0, 1, 1, 0, 1),
        Sizing.builder(0.1).field((x, y) -> 0.01 + 0.2 * Math.hypot(x - 0.4, y - 0.6)).build());
    return g;
  }

  private static void put(Map<String, Piece> g, String name, double size, Outline outline) {
    put(g, name, outline, Sizing.of(size));
  }

  private static void put(Map<String, Piece> g, String name, Outline outline, Sizing sizing) {
    g.put(name, new Piece(outline, sizing));
  }

  /** A polygon as one zone 'gas' inside one edge 'wall'. */
  static Outline polygon(double... xy) {
    Outline.Builder b = Outline.builder();
    closed(b, "wall", xy);
    return b.zone("gas", "wall").build();
  }

  static void closed(Outline.Builder b, String edge, double... xy) {
    int n = xy.length / 2;
    String[] names = new String[n + 1];
    for (int i = 0; i < n; i++) {
      names[i] = edge + i;
      b.point(names[i], xy[2 * i], xy[2 * i + 1]);
    }
    names[n] = names[0];
    b.line(edge, names);
  }

  static void circle(Outline.Builder b, String name, double x, double y, double r) {
    b.point(name + "e", x + r, y)
        .point(name + "n", x, y + r)
        .point(name + "w", x - r, y)
        .point(name + "s", x, y - r)
        .arc(name + "upper", name + "e", name + "n", name + "w")
        .arc(name + "lower", name + "w", name + "s", name + "e");
  }

  static Outline wedge(double degrees) {
    double a = Math.toRadians(degrees);
    return polygon(0, 0, 1, 0, Math.cos(a), Math.sin(a));
  }

  private static Outline crescent() {
    return Outline.builder()
        .point("t", 0, 0)
        .point("r", 0.1, 0.1)
        .point("u", 0, 0.2)
        .point("l", -0.1, 0.1)
        .point("r2", 0.06, 0.06)
        .point("u2", 0, 0.12)
        .point("l2", -0.06, 0.06)
        .arc("outer right", "t", "r", "u")
        .arc("outer left", "u", "l", "t")
        .arc("inner right", "t", "r2", "u2")
        .arc("inner left", "u2", "l2", "t")
        .zone(
            new Zone(
                "gas",
                List.of("outer right", "outer left"),
                List.of(List.of("inner right", "inner left"))))
        .build();
  }

  /** A triangle-like gap between three circles that touch each other: three cusps of 0°. */
  private static Outline outerTangents() {
    double h = Math.sqrt(3);
    return Outline.builder()
        .point("ab", 0, 0)
        .point("bc", 0.5, 0.5 * h)
        .point("ca", -0.5, 0.5 * h)
        .point("ma", -1 + Math.cos(Math.PI / 6), 0.5)
        .point("mb", 1 - Math.cos(Math.PI / 6), 0.5)
        .point("mc", 0, h - 1)
        .arc("a", "ab", "ma", "ca")
        .arc("b", "ab", "mb", "bc")
        .arc("c", "bc", "mc", "ca")
        .zone("gas", "a", "c", "b")
        .build();
  }

  private static Outline holes(int n) {
    Outline.Builder b = Outline.builder();
    closed(b, "wall", 0, 0, 1, 0, 1, 0.5, 0, 0.5);
    List<List<String>> holes = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      String name = "hole" + i + " ";
      circle(b, name, 0.025 + 0.05 * (i % 20), 0.025 + 0.05 * (i / 20), 0.002 + 0.00001 * (i % 7));
      holes.add(List.of(name + "upper", name + "lower"));
    }
    return b.zone(new Zone("gas", List.of("wall"), holes)).build();
  }

  static Outline wavyBoundary(int n) {
    double[] xy = new double[2 * n];
    for (int i = 0; i < n; i++) {
      double a = 2 * Math.PI * i / n;
      double r = 1 + 0.1 * Math.sin(7 * a) + 0.02 * Math.sin(61 * a);
      xy[2 * i] = r * Math.cos(a);
      xy[2 * i + 1] = r * Math.sin(a);
    }
    return polygon(xy);
  }

  private static Outline smoothWalls() {
    return Outline.builder()
        .point("a", 0, 0.1)
        .point("b", 0.2, 0.08)
        .point("c", 0.4, 0.12)
        .point("d", 0.7, 0.02)
        .point("e", 0.7, 0.2)
        .point("f", 0.5, 0.3)
        .point("g", 0.2, 0.25)
        .point("h", 0, 0.2)
        .curve("hub", "a", "b", "c", "d")
        .line("exit", "d", "e")
        .curve("shroud", "e", "f", "g", "h")
        .line("inlet", "h", "a")
        .zone("gas", "hub", "exit", "shroud", "inlet")
        .build();
  }

  private static Outline disc() {
    Outline.Builder b = Outline.builder();
    circle(b, "", 0, 0, 1);
    return b.zone("gas", "upper", "lower").build();
  }

  private static Outline annulus() {
    Outline.Builder b = Outline.builder();
    circle(b, "outer ", 0, 0, 0.4);
    circle(b, "inner ", 0, 0, 0.3);
    return b.zone(
            new Zone(
                "gas",
                List.of("outer upper", "outer lower"),
                List.of(List.of("inner upper", "inner lower"))))
        .build();
  }

  private static Outline portsAsZones() {
    Outline.Builder b = Outline.builder();
    circle(b, "outer ", 0, 0, 0.4);
    circle(b, "inner ", 0, 0, 0.25);
    List<List<String>> holes = new ArrayList<>();
    holes.add(List.of("inner upper", "inner lower"));
    for (int i = 0; i < 9; i++) {
      double a = 2 * Math.PI * i / 9;
      circle(b, "port" + i + " ", 0.325 * Math.cos(a), 0.325 * Math.sin(a), 0.03);
      b.zone("port" + i, "port" + i + " lower", "port" + i + " upper");
      holes.add(List.of("port" + i + " upper", "port" + i + " lower"));
    }
    return b.zone(new Zone("face", List.of("outer upper", "outer lower"), holes)).build();
  }

  private static Outline star(int tips) {
    double[] xy = new double[4 * tips];
    for (int i = 0; i < 2 * tips; i++) {
      double r = i % 2 == 0 ? 1 : 0.3;
      xy[2 * i] = r * Math.cos(Math.PI * i / tips);
      xy[2 * i + 1] = r * Math.sin(Math.PI * i / tips);
    }
    return polygon(xy);
  }

  private static Outline comb(int teeth) {
    double[] xy = new double[8 * teeth + 4];
    int k = 0;
    for (int i = 0; i < teeth; i++) {
      double x = 0.02 * i;
      for (double v : new double[] {x, 0.1, x + 0.001, 0.02, x + 0.019, 0.02, x + 0.02, 0.1}) {
        xy[k++] = v;
      }
      xy[k - 2] -= 1e-4;
    }
    xy[k++] = 0.02 * teeth;
    xy[k++] = 0;
    xy[k++] = 0;
    xy[k] = 0;
    return polygon(xy);
  }

  private static Outline resonator() {
    return Outline.builder()
        .point("a", 0, 0)
        .point("b", 0.4, 0)
        .point("c", 0.4, 0.1)
        .point("d", 0.204, 0.1)
        .point("e", 0.204, 0.13)
        .point("f", 0.23, 0.13)
        .point("g", 0.23, 0.18)
        .point("h", 0.17, 0.18)
        .point("i", 0.17, 0.13)
        .point("j", 0.2, 0.13)
        .point("k", 0.2, 0.1)
        .point("l", 0, 0.1)
        .line("chamber wall", "d", "c", "b", "a", "l", "k")
        .line("neck right", "d", "e")
        .line("neck left", "k", "j")
        .line("cavity wall", "e", "f", "g", "h", "i", "j")
        .line("mouth", "k", "d")
        .line("throat", "j", "e")
        .zone("chamber", "chamber wall", "mouth")
        .zone("neck", "mouth", "neck right", "throat", "neck left")
        .zone("cavity", "cavity wall", "throat")
        .build();
  }

  private static Outline doubleWall() {
    return Outline.builder()
        .point("a", 0, 0)
        .point("b", 0.3, 0)
        .point("c", 0.3, 0.1)
        .point("d", 0, 0.1)
        .point("e", 0.3, 0.102)
        .point("f", 0, 0.102)
        .line("hub", "a", "b")
        .line("exit", "b", "c")
        .line("liner", "c", "d")
        .line("inlet", "d", "a")
        .line("gap exit", "c", "e")
        .line("casing", "e", "f")
        .line("gap inlet", "f", "d")
        .zone("chamber", "hub", "exit", "liner", "inlet")
        .zone("gap", "gap exit", "casing", "gap inlet", "liner")
        .build();
  }

  private static Outline fourZones() {
    return Outline.builder()
        .point("o", 0, 0)
        .point("e", 1, 0)
        .point("n", 0, 1)
        .point("w", -1, 0)
        .point("s", 0, -1)
        .line("oe", "o", "e")
        .line("on", "o", "n")
        .line("ow", "o", "w")
        .line("os", "o", "s")
        .line("en", "e", "n")
        .line("nw", "n", "w")
        .line("ws", "w", "s")
        .line("se", "s", "e")
        .zone("1", "oe", "en", "on")
        .zone("2", "on", "nw", "ow")
        .zone("3", "ow", "ws", "os")
        .zone("4", "os", "se", "oe")
        .build();
  }

  private static Outline nearHole() {
    Outline.Builder b = Outline.builder();
    closed(b, "wall", 0, 0, 1, 0, 1, 0.5, 0, 0.5);
    circle(b, "", 0.4, 0.1001, 0.1);
    return b.zone(new Zone("gas", List.of("wall"), List.of(List.of("upper", "lower")))).build();
  }

  private static Outline smoothHole() {
    Outline.Builder b = Outline.builder();
    closed(b, "wall", 0, 0, 1, 0, 1, 0.5, 0, 0.5);
    b.point("p", 0.3, 0.2)
        .point("q", 0.6, 0.15)
        .point("r", 0.7, 0.3)
        .point("s", 0.4, 0.35)
        .curve("island", "p", "q", "r", "s", "p");
    return b.zone(new Zone("gas", List.of("wall"), List.of(List.of("island")))).build();
  }

  private static Outline farAway() {
    double c = Math.cos(0.3);
    double s = Math.sin(0.3);
    return polygon(
        1000,
        1000,
        1000 + c,
        1000 + s,
        1000 + c - 0.3 * s,
        1000 + s + 0.3 * c,
        1000 - 0.3 * s,
        1000 + 0.3 * c);
  }

  private static Outline scaled(double m) {
    return polygon(0, 0, m, 0, m, 0.3 * m, 0.5 * m, 0.3 * m, 0.5 * m, 0.6 * m, 0, 0.6 * m);
  }

  private static Outline holeOnCorner() {
    Outline.Builder b = Outline.builder();
    closed(b, "wall", 0, 0, 1, 0, 1, 0.5, 0, 0.5);
    b.point("p", 0.3, 0.1).point("q", 0.2, 0.3).line("hole", "wall0", "p", "q", "wall0");
    return b.zone(new Zone("gas", List.of("wall"), List.of(List.of("hole")))).build();
  }

  private static Outline spiral() {
    int n = 60;
    double[] xy = new double[4 * n];
    for (int i = 0; i < n; i++) {
      double a = 0.25 * i;
      double r = 0.02 * a + 0.05;
      xy[2 * i] = r * Math.cos(a);
      xy[2 * i + 1] = r * Math.sin(a);
      xy[4 * n - 2 - 2 * i] = (r + 0.03) * Math.cos(a);
      xy[4 * n - 1 - 2 * i] = (r + 0.03) * Math.sin(a);
    }
    return polygon(xy);
  }
}
