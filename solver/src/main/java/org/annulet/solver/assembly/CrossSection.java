package org.annulet.solver.assembly;

/**
 * A cross-section of a duct: x and y span the plane across it, the field varies as e^{ikx'} along
 * it; all integrals are per metre of duct.
 *
 * @param axialWavenumber k in 1/m
 */
public record CrossSection(double axialWavenumber) implements Geometry {
  /** Checks that the wavenumber is finite. */
  public CrossSection {
    if (!Double.isFinite(axialWavenumber)) {
      throw new IllegalArgumentException(
          "axial wavenumber must be finite, got " + axialWavenumber + " 1/m");
    }
  }
}
