package org.annulet.cases.compare;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.study.ChainOfCase;
import org.annulet.solver.network.Piece;

/** A chain of ducts in words. */
final class ChainWords {
  private ChainWords() {}

  /** What the chain is made of, for the reader. */
  static List<String> of(ChainOfCase.Chain chain) {
    List<String> out = new ArrayList<>();
    double x = chain.start();
    for (Piece p : chain.plain().pieces()) {
      if (p instanceof Piece.Duct d) {
        out.add(
            String.format(
                Locale.ROOT,
                "duct from x = %.1f to %.1f mm, area %.4g m², c = %.1f m/s, ρ = %.3f kg/m³%s",
                1e3 * x,
                1e3 * (x + d.length()),
                d.area(),
                d.gas().soundSpeed(),
                d.gas().density(),
                Double.isInfinite(d.radius())
                    ? ""
                    : String.format(Locale.ROOT, ", mean radius %.1f mm", 1e3 * d.radius())));
        x += d.length();
      }
    }
    return out;
  }
}
