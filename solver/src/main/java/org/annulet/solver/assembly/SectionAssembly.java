package org.annulet.solver.assembly;

import java.util.EnumMap;
import java.util.Map;

/**
 * A section at any azimuthal order: stiffness without order, its m² part, mass and walls are
 * assembled once; an order costs one sum of two arrays. All orders share one pattern, and so one
 * analysis; if the section reaches the axis, order 0 has another than the rest, since p̂ = 0 on the
 * axis from order 1. Thread-safe.
 */
public final class SectionAssembly {
  private final Setup setup;
  private final Section section;
  private final boolean reachesAxis;
  private final Map<Setup.Axis, Setup.Matrices> matrices = new EnumMap<>(Setup.Axis.class);

  SectionAssembly(Setup setup, Section section) {
    this.setup = setup;
    this.section = section;
    this.reachesAxis = setup.metric().reachesAxis();
  }

  /**
   * The problem of order m.
   *
   * @param m azimuthal order, not negative; with separate ducts, less than half their number
   * @throws IllegalArgumentException if m is negative or too large for a zone of separate ducts
   */
  public AssembledProblem order(int m) {
    Section here = section.withOrder(m);
    here.ducts()
        .forEach(
            (zone, ducts) -> {
              if (2 * m >= ducts.count() && m > 0) {
                throw new IllegalArgumentException(
                    "order "
                        + m
                        + " is too large for the "
                        + ducts.count()
                        + " separate ducts of zone '"
                        + zone
                        + "': one term per order holds for 2m < "
                        + ducts.count());
              }
            });
    Setup.Axis axis = reachesAxis && m > 0 ? Setup.Axis.NO_PRESSURE : Setup.Axis.FREE;
    Setup.Matrices shared;
    synchronized (matrices) {
      shared = matrices.computeIfAbsent(axis, a -> setup.matrices(setup.assembler(a)));
    }
    UnknownMap map = shared.assembler().even();
    return new AssembledProblem(
        setup.operator(shared, m, (double) m * m),
        setup.mesh(),
        here,
        (re, im) -> setup.expand(map, re, im));
  }
}
