package org.annulet.post.meaning;

import java.util.List;
import org.apache.commons.math3.complex.Complex;

/**
 * A distinguished member α p₁ + β p₂ of the plane spanned by an azimuthal pair. Where the two
 * eigenvalues are one, each of them is a mode; where they have moved apart, it is a motion of both.
 *
 * @param name what it does
 * @param first α
 * @param second β
 */
public record PairCombination(String name, Complex first, Complex second) {

  /**
   * The two spinning and the two standing combinations of a pair on a ring or a cross-section.
   *
   * <p>The spinning ones have no part e^{−imθ} (or e^{imθ}) in the strip where the pair is
   * strongest; the standing ones are their sum and difference, so one stands where the other has
   * its nodes.
   *
   * @return four combinations; none where the two fields are not a pair of that order
   */
  public static List<PairCombination> of(
      Chamber chamber, ModeView first, ModeView second, int order) {
    if (order < 1
        || (chamber.kind() != GeometryKind.RING && chamber.kind() != GeometryKind.CROSS_SECTION)) {
      return List.of();
    }
    RingSpectrum a = new RingSpectrum(chamber, first);
    RingSpectrum b = new RingSpectrum(chamber, second);
    int strip = a.strongestStrip(order);
    Complex aPlus = complex(a.coefficient(strip, order));
    Complex aMinus = complex(a.coefficient(strip, -order));
    Complex bPlus = complex(b.coefficient(strip, order));
    Complex bMinus = complex(b.coefficient(strip, -order));
    Complex det = aPlus.multiply(bMinus).subtract(aMinus.multiply(bPlus));
    double scale = (aPlus.abs() + aMinus.abs()) * (bPlus.abs() + bMinus.abs());
    if (!(det.abs() > 1e-3 * scale)) {
      return List.of();
    }
    // unit content of e^{imθ} and none of e^{−imθ}, and the reverse
    Complex[] plus = {bMinus.divide(det), aMinus.negate().divide(det)};
    Complex[] minus = {bPlus.negate().divide(det), aPlus.divide(det)};
    Complex half = new Complex(0.5);
    Complex quarter = new Complex(0, -0.5);
    return List.of(
        new PairCombination("spins towards smaller angles", plus[0], plus[1]),
        new PairCombination("spins towards larger angles", minus[0], minus[1]),
        new PairCombination(
            "stands, maximum at 0°",
            plus[0].add(minus[0]).multiply(half),
            plus[1].add(minus[1]).multiply(half)),
        new PairCombination(
            "stands, node at 0°",
            plus[0].subtract(minus[0]).multiply(quarter),
            plus[1].subtract(minus[1]).multiply(quarter)));
  }

  private static Complex complex(double[] c) {
    return new Complex(c[0], c[1]);
  }
}
