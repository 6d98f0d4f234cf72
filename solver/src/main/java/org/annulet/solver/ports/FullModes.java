package org.annulet.solver.ports;

import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.eigen.PreparedOperator;
import org.apache.commons.math3.complex.Complex;

/** Eigenvalues found on the ports, solved again on the full operator. */
public final class FullModes {
  private FullModes() {}

  /**
   * An eigenvalue of the full operator.
   *
   * @param s in 1/s
   * @param fromPorts what the ports gave for it, in 1/s
   * @param backwardError ‖L(s)p‖₂/‖K p‖₂
   */
  public record FullMode(Complex s, Complex fromPorts, double backwardError) {}

  /**
   * Solves.
   *
   * @param operator the chamber with its dampers
   * @param roots eigenvalues from the ports, as often as they occur
   * @return one for each root, grouped by frequency
   */
  public static List<FullMode> of(PreparedOperator operator, List<Complex> roots) {
    PreparedOperator turned = Eigenspace.transposed(operator);
    return PortPoles.grouped(roots).parallelStream()
        .flatMap(
            pole -> {
              Eigenspace e = Eigenspace.of(operator, turned, pole);
              return IntStream.range(0, pole.multiplicity())
                  .mapToObj(j -> new FullMode(e.corrected()[j], pole.s(), e.backwardErrors()[j]));
            })
        .toList();
  }
}
