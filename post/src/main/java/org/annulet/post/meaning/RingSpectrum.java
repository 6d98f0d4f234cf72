package org.annulet.post.meaning;

import org.annulet.mesher.mesh.Mesh;

/**
 * The azimuthal content of a field on a ring or a cross-section: each zone is cut into strips
 * (along x on a ring, along r on a cross-section), each strip is projected on e^{imθ}, and the
 * squares are summed, so that a node of the strip's amplitude elsewhere cannot cancel it.
 *
 * <p>A zone that does not close round the axis (separate ducts) cannot tell m from m ± N; the order
 * is read from the zones that close, where there are any.
 */
final class RingSpectrum {
  static final int HIGHEST_ORDER = 48;
  private static final int ANGLES = 720;
  private static final int STRIPS = 16;

  private final double[][] energy; // [zone][order + HIGHEST_ORDER]
  private final boolean[] closed;
  private final double[] crossRe = new double[HIGHEST_ORDER + 1];
  private final double[] crossIm = new double[HIGHEST_ORDER + 1];
  private final double[][][] coefficient; // [zone × strip][order + HIGHEST_ORDER][re, im]

  RingSpectrum(Chamber chamber, ModeView view) {
    Mesh mesh = chamber.mesh();
    int zones = mesh.zoneNames().size();
    energy = new double[zones][2 * HIGHEST_ORDER + 1];
    closed = closed(chamber);
    double[][] range = Samples.alongRange(chamber);
    coefficient = new double[zones * STRIPS][2 * HIGHEST_ORDER + 1][2];
    double[][][] sum = new double[zones * STRIPS][2][ANGLES];
    double[] area = new double[zones * STRIPS];
    Samples.forEach(
        chamber,
        view,
        (t, along, across, weight, re, im) -> {
          int z = mesh.zone(t);
          int strip = bin(along, range[z], STRIPS);
          int a = Math.floorMod((int) Math.floor(across / (2 * Math.PI) * ANGLES), ANGLES);
          sum[z * STRIPS + strip][0][a] += weight * re;
          sum[z * STRIPS + strip][1][a] += weight * im;
          area[z * STRIPS + strip] += weight;
        });
    double[] cos = new double[2 * ANGLES]; // of half steps: bin a has its middle at a + 1/2
    double[] sin = new double[2 * ANGLES];
    for (int a = 0; a < cos.length; a++) {
      cos[a] = Math.cos(Math.PI * a / ANGLES);
      sin[a] = Math.sin(Math.PI * a / ANGLES);
    }
    for (int q = 0; q < sum.length; q++) {
      if (area[q] > 0) {
        addStrip(q, sum[q], area[q], new double[][] {cos, sin});
      }
    }
  }

  private void addStrip(int strip, double[][] p, double area, double[][] turn) {
    int zone = strip / STRIPS;
    for (int m = 0; m <= HIGHEST_ORDER; m++) {
      double cr = 0;
      double ci = 0;
      double sr = 0;
      double si = 0;
      for (int a = 0; a < ANGLES; a++) {
        int k = m * (2 * a + 1) % (2 * ANGLES);
        double c = turn[0][k];
        double s = turn[1][k];
        cr += p[0][a] * c;
        ci += p[1][a] * c;
        sr += p[0][a] * s;
        si += p[1][a] * s;
      }
      double plusRe = cr + si;
      double plusIm = ci - sr;
      double minusRe = cr - si;
      double minusIm = ci + sr;
      coefficient[strip][HIGHEST_ORDER + m] = new double[] {plusRe, plusIm};
      coefficient[strip][HIGHEST_ORDER - m] = new double[] {minusRe, minusIm};
      energy[zone][HIGHEST_ORDER + m] += (plusRe * plusRe + plusIm * plusIm) / area;
      if (m > 0) {
        energy[zone][HIGHEST_ORDER - m] += (minusRe * minusRe + minusIm * minusIm) / area;
      }
      // c_−m times the conjugate of c_m: its angle is 2m times the angle of the pressure maximum.
      crossRe[m] += (minusRe * plusRe + minusIm * plusIm) / area;
      crossIm[m] += (minusIm * plusRe - minusRe * plusIm) / area;
    }
  }

  /** Integral of p̂ e^{−imθ} over one strip, {re, im}; m may be negative. */
  double[] coefficient(int strip, int m) {
    return coefficient[strip][HIGHEST_ORDER + m];
  }

  /** Strip with the largest content of order |m|. */
  int strongestStrip(int m) {
    int best = 0;
    double most = -1;
    for (int q = 0; q < coefficient.length; q++) {
      double[] a = coefficient(q, m);
      double[] b = coefficient(q, -m);
      double e = a[0] * a[0] + a[1] * a[1] + b[0] * b[0] + b[1] * b[1];
      if (e > most) {
        most = e;
        best = q;
      }
    }
    return best;
  }

  /** Order |m| that carries most, the lowest of equals. */
  int order() {
    boolean any = false;
    for (boolean c : closed) {
      any |= c;
    }
    int best = 0;
    for (int m = 1; m <= HIGHEST_ORDER; m++) {
      if (of(m, any) > 1.001 * of(best, any)) {
        best = m;
      }
    }
    return best;
  }

  /** Share of order |m| in the zones that tell the order. */
  double share(int m) {
    boolean any = false;
    for (boolean c : closed) {
      any |= c;
    }
    double total = 0;
    for (int k = 0; k <= HIGHEST_ORDER; k++) {
      total += of(k, any);
    }
    return total > 0 ? of(m, any) / total : 0;
  }

  /**
   * (E_m − E_−m)/(E_m + E_−m): +1 runs towards smaller θ, −1 towards larger θ, 0 stands (or m = 0).
   */
  double spin(int m) {
    double plus = 0;
    double minus = 0;
    for (double[] zone : energy) {
      plus += zone[HIGHEST_ORDER + m];
      minus += zone[HIGHEST_ORDER - m];
    }
    return m == 0 || plus + minus == 0 ? 0 : (plus - minus) / (plus + minus);
  }

  /** Angle of a pressure maximum of order m in rad, in [0, π/m); meaningless where it spins. */
  double antinode(int m) {
    double period = Math.PI / m;
    double angle = Math.atan2(crossIm[m], crossRe[m]) / (2 * m);
    return angle - period * Math.floor(angle / period);
  }

  private double of(int m, boolean closedOnly) {
    double sum = 0;
    for (int z = 0; z < energy.length; z++) {
      if (!closedOnly || closed[z]) {
        sum += energy[z][HIGHEST_ORDER + m] + (m == 0 ? 0 : energy[z][HIGHEST_ORDER - m]);
      }
    }
    return sum;
  }

  private static int bin(double v, double[] range, int bins) {
    double width = range[1] - range[0];
    int b = width > 0 ? (int) ((v - range[0]) / width * bins) : 0;
    return Math.min(Math.max(b, 0), bins - 1);
  }

  /** Whether the triangles of each zone cover all angles. */
  private static boolean[] closed(Chamber chamber) {
    Mesh mesh = chamber.mesh();
    boolean[][] seen = new boolean[mesh.zoneNames().size()][ANGLES];
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double first = Samples.angle(chamber, t, 0);
      double low = first;
      double high = first;
      for (int k = 1; k < 3; k++) {
        double a = Samples.angle(chamber, t, k);
        a -= 2 * Math.PI * Math.rint((a - first) / (2 * Math.PI));
        low = Math.min(low, a);
        high = Math.max(high, a);
      }
      int from = (int) Math.floor(low / (2 * Math.PI) * ANGLES);
      int to = (int) Math.ceil(high / (2 * Math.PI) * ANGLES);
      for (int a = from; a < to; a++) {
        seen[mesh.zone(t)][Math.floorMod(a, ANGLES)] = true;
      }
    }
    boolean[] closed = new boolean[seen.length];
    for (int z = 0; z < seen.length; z++) {
      int count = 0;
      for (boolean s : seen[z]) {
        count += s ? 1 : 0;
      }
      closed[z] = count >= ANGLES - 2;
    }
    return closed;
  }
}
