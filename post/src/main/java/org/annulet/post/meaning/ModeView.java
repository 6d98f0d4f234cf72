package org.annulet.post.meaning;

import org.annulet.solver.modes.Mode;

/**
 * A mode as results need it: the eigenpair, its pressure on the nodes of the mesh and its error
 * bars. Arrays are kept by reference and must not be modified.
 *
 * @param mode eigenpair on the unknowns of its operator
 * @param re real part of p̂ at the nodes of the mesh, shape [nodes]
 * @param im imaginary part, shape [nodes]
 * @param order azimuthal order m of the operator it was found in (field turns with e^{imθ}); null
 *     where the operator has none, as on a whole ring
 * @param operatorName problem it was found in, for the reader ("order 1")
 * @param frequencyError estimate of the discretisation error of the frequency in Hz; NaN when not
 *     estimated
 * @param growthError the same for the growth rate in 1/s
 */
public record ModeView(
    Mode mode,
    double[] re,
    double[] im,
    Integer order,
    String operatorName,
    double frequencyError,
    double growthError) {
  /** Checks the shapes. */
  public ModeView {
    if (re.length != im.length) {
      throw new IllegalArgumentException(
          "real and imaginary part differ in length: " + re.length + " and " + im.length);
    }
  }

  /** |s|² in 1/s². */
  double squaredRate() {
    double omega = 2 * Math.PI * mode.frequency();
    return mode.growthRate() * mode.growthRate() + omega * omega;
  }
}
