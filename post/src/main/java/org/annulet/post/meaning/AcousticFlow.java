package org.annulet.post.meaning;

import org.annulet.mesher.mesh.Mesh;
import org.apache.commons.math3.complex.Complex;

/**
 * Velocity and intensity of a mode on the triangles of its mesh, where the gradient of the linear
 * pressure is constant.
 *
 * <pre>
 *   û = −∇p̂/(sρ),      I = ½ Re(p̂ û*)
 * </pre>
 *
 * <p>Three components each: along x; along y (the radius on a section, the arc on a ring); round
 * the axis on a section, −(im/r) p̂/(sρ), nought in separate ducts and on other kinds. The
 * intensity is the mean over one cycle, growth left aside, with p̂ at the middle of the triangle.
 * Units: p̂ in Pa gives m/s and W/m². Of the mode's mesh size: first order.
 *
 * @param re real part of û, shape [triangles × 3]
 * @param im imaginary part
 * @param intensity I, shape [triangles × 3]
 */
public record AcousticFlow(double[] re, double[] im, double[] intensity) {
  /** Velocity and intensity of a mode. */
  public static AcousticFlow of(Chamber chamber, ModeView view) {
    Mesh mesh = chamber.mesh();
    int n = mesh.triangleCount();
    double[] re = new double[3 * n];
    double[] im = new double[3 * n];
    double[] intensity = new double[3 * n];
    Complex s = new Complex(view.mode().growthRate(), 2 * Math.PI * view.mode().frequency());
    boolean section = chamber.kind() == GeometryKind.SECTION;
    for (int t = 0; t < n; t++) {
      int zone = mesh.zone(t);
      double[] a = EnergyShares.gradient(mesh, t, view.re());
      double[] b = EnergyShares.gradient(mesh, t, view.im());
      Complex factor = s.multiply(-chamber.density(t)).reciprocal();
      double scale = chamber.arcScale(zone);
      Complex p = new Complex(mean(mesh, t, view.re()), mean(mesh, t, view.im()));
      Complex round = Complex.ZERO;
      if (section && view.order() != null && !chamber.separateDucts(zone)) {
        double r = (mesh.cornerY(t, 0) + mesh.cornerY(t, 1) + mesh.cornerY(t, 2)) / 3;
        round = p.multiply(new Complex(0, view.order() / r));
      }
      Complex[] slope = {new Complex(a[0], b[0]), new Complex(a[1] / scale, b[1] / scale), round};
      for (int k = 0; k < 3; k++) {
        Complex u = slope[k].multiply(factor);
        re[3 * t + k] = u.getReal();
        im[3 * t + k] = u.getImaginary();
        intensity[3 * t + k] = 0.5 * p.multiply(u.conjugate()).getReal();
      }
    }
    return new AcousticFlow(re, im, intensity);
  }

  private static double mean(Mesh mesh, int t, double[] f) {
    return (f[mesh.corner(t, 0)] + f[mesh.corner(t, 1)] + f[mesh.corner(t, 2)]) / 3;
  }
}
