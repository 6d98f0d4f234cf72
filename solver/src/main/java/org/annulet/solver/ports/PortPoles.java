package org.annulet.solver.ports;

import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.complex.Complex;

/** Eigenvalues with their multiplicity. */
public final class PortPoles {
  /** Eigenvalues nearer than this share of their size are one. */
  private static final double SAME = 1e-8;

  private PortPoles() {}

  /**
   * Puts equal eigenvalues together.
   *
   * @param eigenvalues in 1/s, as often as they occur
   * @return by frequency
   */
  public static List<PortPole> grouped(List<Complex> eigenvalues) {
    List<PortPole> groups = new ArrayList<>();
    for (Complex s : eigenvalues) {
      boolean placed = false;
      for (int k = 0; k < groups.size() && !placed; k++) {
        PortPole g = groups.get(k);
        if (g.s().subtract(s).abs() <= SAME * s.abs()) {
          groups.set(k, new PortPole(g.s(), g.multiplicity() + 1));
          placed = true;
        }
      }
      if (!placed) {
        groups.add(new PortPole(s, 1));
      }
    }
    groups.sort((a, b) -> Double.compare(a.s().getImaginary(), b.s().getImaginary()));
    return groups;
  }
}
