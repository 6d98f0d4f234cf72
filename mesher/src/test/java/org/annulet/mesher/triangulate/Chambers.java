package org.annulet.mesher.triangulate;

import org.annulet.mesher.geometry.Outline;

/** Outlines of invented chambers, for the gallery and the benchmark. */
final class Chambers {
  private Chambers() {}

  static Outline annularChamber() {
    return Outline.builder()
        .point("a", 0, 0.32)
        .point("b", 0.2, 0.32)
        .point("c", 0.2, 0.34)
        .point("d", 0.3, 0.34)
        .point("e", 0.3, 0.28)
        .point("f", 0.6, 0.28)
        .point("g", 0.6, 0.395)
        .point("h", 0.3, 0.395)
        .point("i", 0.3, 0.37)
        .point("j", 0.2, 0.37)
        .point("k", 0.2, 0.4)
        .point("l", 0, 0.4)
        .line("plenum hub", "a", "b")
        .line("lower face", "b", "c")
        .line("inner side", "c", "d")
        .line("lower step", "d", "e")
        .line("hub", "e", "f")
        .line("nozzle", "f", "g")
        .line("shroud", "g", "h")
        .line("upper step", "h", "i")
        .line("outer side", "i", "j")
        .line("upper face", "j", "k")
        .line("plenum shroud", "k", "l")
        .line("inlet", "l", "a")
        .line("port", "c", "j")
        .line("flame", "d", "i")
        .zone("plenum", "plenum hub", "lower face", "port", "upper face", "plenum shroud", "inlet")
        .zone("burner", "inner side", "flame", "outer side", "port")
        .zone("chamber", "lower step", "hub", "nozzle", "shroud", "upper step", "flame")
        .build();
  }

  static Outline canAnnular() {
    double s = Math.sqrt(0.5) * 0.08;
    return Outline.builder()
        .point("o", 0, 0)
        .point("p", 0.1, 0)
        .point("q", 0.45, 0)
        .point("r", 0.6, 0)
        .point("dome", 0.08 - s + 0.02, s)
        .point("top", 0.1, 0.08)
        .point("bend", 0.45, 0.08)
        .point("throat", 0.55, 0.05)
        .point("exit", 0.6, 0.045)
        .point("cap", 0.02, 0)
        .line("axis of dome", "cap", "p")
        .line("axis of can", "p", "q")
        .line("axis of transition", "q", "r")
        .arc("dome wall", "cap", "dome", "top")
        .line("can wall", "top", "bend")
        .curve("transition wall", "bend", "throat", "exit")
        .line("exit", "r", "exit")
        .line("can inlet", "p", "top")
        .line("can outlet", "q", "bend")
        .zone("dome", "axis of dome", "can inlet", "dome wall")
        .zone("can", "axis of can", "can outlet", "can wall", "can inlet")
        .zone("transition", "axis of transition", "exit", "transition wall", "can outlet")
        .build();
  }

  static Outline reverseFlow() {
    double c = 0.35;
    double s = Math.sqrt(0.5);
    return Outline.builder()
        .point("a", 0, c + 0.10)
        .point("b", 0.3, c + 0.10)
        .point("m", 0.3 + 0.10 * s, c + 0.10 * s)
        .point("n", 0.40, c)
        .point("o", 0.3 + 0.10 * s, c - 0.10 * s)
        .point("d", 0.3, c - 0.10)
        .point("e", 0, c - 0.10)
        .point("f", 0, c - 0.02)
        .point("g", 0.3, c - 0.02)
        .point("u", 0.3 + 0.02 * s, c - 0.02 * s)
        .point("h", 0.32, c)
        .point("v", 0.3 + 0.02 * s, c + 0.02 * s)
        .point("i", 0.3, c + 0.02)
        .point("j", 0, c + 0.02)
        .line("casing", "a", "b")
        .arc("outer end", "b", "m", "n")
        .arc("inner end", "n", "o", "d")
        .line("inner casing", "d", "e")
        .line("exit", "e", "f")
        .line("liner inside", "f", "g")
        .arc("inner lip", "g", "u", "h")
        .arc("outer lip", "h", "v", "i")
        .line("liner outside", "i", "j")
        .line("inlet", "j", "a")
        .line("turn", "h", "n")
        .zone("supply", "casing", "outer end", "turn", "outer lip", "liner outside", "inlet")
        .zone("chamber", "inner end", "inner casing", "exit", "liner inside", "inner lip", "turn")
        .build();
  }

  static Outline steppedChamber() {
    return Gallery.polygon(
        0, 0, 0.2, 0, 0.2, -0.05, 0.5, -0.05, 0.5, 0.02, 0.7, 0.02, 0.7, 0.1, 0.5, 0.1, 0.5, 0.2,
        0.2, 0.2, 0.2, 0.12, 0, 0.12);
  }

  static Outline slot() {
    return Gallery.polygon(
        0, 0, 0.3, 0, 0.3, 0.1, 0.1505, 0.1, 0.1505, 0.02, 0.1495, 0.02, 0.1495, 0.1, 0, 0.1);
  }
}
