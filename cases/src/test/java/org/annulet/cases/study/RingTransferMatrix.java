package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import org.apache.commons.math3.complex.Complex;

/**
 * The one-dimensional transfer-matrix model of plenum, burners and chamber for azimuthal order 0:
 * closed form, independent of the finite elements. Per burner sector p and volume flow U run
 * through three uniform ducts (Munjal, Acoustics of Ducts and Mufflers, from memory); across the
 * flame U grows by 1 + N e^{−sτ}.
 */
record RingTransferMatrix(
    double[] area,
    double[] length,
    double[] density,
    double[] soundSpeed,
    double inletAdmittance,
    double outletAdmittance,
    double flame,
    double delay) {

  /** Vanishes where p̂, û of both sides of the chamber's outlet agree. */
  Complex determinant(Complex s) {
    Complex p = Complex.ONE;
    Complex u = new Complex(-inletAdmittance * area[0] / (density[0] * soundSpeed[0]));
    for (int z = 0; z < 3; z++) {
      Complex k = s.multiply(length[z] / soundSpeed[z]);
      double impedance = density[z] * soundSpeed[z] / area[z];
      Complex q = k.cosh().multiply(p).subtract(k.sinh().multiply(u).multiply(impedance));
      u = k.cosh().multiply(u).subtract(k.sinh().multiply(p).divide(impedance));
      p = q;
      if (z == 1) {
        u = u.multiply(s.multiply(-delay).exp().multiply(flame).add(1));
      }
    }
    return u.subtract(p.multiply(outletAdmittance * area[2] / (density[2] * soundSpeed[2])));
  }

  /** The root Newton's method (with a central difference) reaches from {@code start}. */
  Complex rootNear(Complex start) {
    Complex s = start;
    for (int i = 0; i < 50; i++) {
      double h = 1e-5 * s.abs();
      Complex slope = determinant(s.add(h)).subtract(determinant(s.subtract(h))).divide(2 * h);
      Complex step = determinant(s).divide(slope);
      s = s.subtract(step);
      if (step.abs() < 1e-11 * s.abs()) {
        return s;
      }
    }
    throw new AssertionError("no root near " + start);
  }

  /** Number of roots in a rectangle, by the winding of the determinant round its edge. */
  int count(double lowestGrowth, double highestGrowth, double lowestHertz, double highestHertz) {
    List<Complex> edge = new ArrayList<>();
    int n = 4000;
    double w = 2 * Math.PI;
    for (int i = 0; i < n; i++) {
      double t = i / (double) n;
      edge.add(new Complex(lowestGrowth + t * (highestGrowth - lowestGrowth), w * lowestHertz));
    }
    for (int i = 0; i < n; i++) {
      double t = i / (double) n;
      edge.add(new Complex(highestGrowth, w * (lowestHertz + t * (highestHertz - lowestHertz))));
    }
    for (int i = 0; i < n; i++) {
      double t = i / (double) n;
      edge.add(new Complex(highestGrowth - t * (highestGrowth - lowestGrowth), w * highestHertz));
    }
    for (int i = 0; i < n; i++) {
      double t = i / (double) n;
      edge.add(new Complex(lowestGrowth, w * (highestHertz - t * (highestHertz - lowestHertz))));
    }
    double turn = 0;
    for (int i = 0; i < edge.size(); i++) {
      Complex a = determinant(edge.get(i));
      Complex b = determinant(edge.get((i + 1) % edge.size()));
      turn += b.divide(a).getArgument();
    }
    return (int) Math.rint(turn / w);
  }
}
