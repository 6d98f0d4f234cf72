package org.annulet.solver.assembly;

import org.annulet.mesher.mesh.Mesh;
import org.annulet.solver.medium.Medium;

/**
 * Matrices of one linear triangle, lower triangle row by row: (0,0), (1,0), (1,1), (2,0), (2,1),
 * (2,2).
 */
final class Element {
  /** Points of the seven-point rule of degree five, barycentric, and their weights (sum 1). */
  private static final double[][] POINTS = sevenPoints();

  private final Metric metric;
  private final Medium medium;
  private final double[] gradX = new double[3];
  private final double[] gradY = new double[3];

  Element(Metric metric, Medium medium) {
    this.metric = metric;
    this.medium = medium;
  }

  private static double[][] sevenPoints() {
    double root = Math.sqrt(15);
    double[][] p = new double[7][];
    p[0] = new double[] {1.0 / 3, 1.0 / 3, 1.0 / 3, 0.225};
    for (int k = 0; k < 3; k++) {
      double near = (6 - root) / 21;
      double far = (6 + root) / 21;
      p[1 + k] = point(k, near, (155 - root) / 1200);
      p[4 + k] = point(k, far, (155 + root) / 1200);
    }
    return p;
  }

  private static double[] point(int k, double a, double weight) {
    double[] p = {a, a, a, weight};
    p[k] = 1 - 2 * a;
    return p;
  }

  /** The rule: rows of three barycentric coordinates and a weight, shape [7][4]. */
  static double[][] quadrature() {
    return POINTS;
  }

  /** Gradients of the three shape functions in true lengths on triangle t, in 1/m. */
  void gradients(int t, double[] outX, double[] outY) {
    Mesh mesh = metric.mesh();
    double twice = 2 * mesh.area(t);
    double scale = metric.arcScale(t);
    for (int k = 0; k < 3; k++) {
      int a = (k + 1) % 3;
      int b = (k + 2) % 3;
      outX[k] = (mesh.cornerY(t, a) - mesh.cornerY(t, b)) / twice;
      outY[k] = (mesh.cornerX(t, b) - mesh.cornerX(t, a)) / twice / scale;
    }
  }

  /** ∫ w/ρ ∇φ_i·∇φ_k, without order. */
  void stiffness(int t, double[] out) {
    Mesh mesh = metric.mesh();
    gradients(t, gradX, gradY);
    double factor = mesh.area(t) * (area(t, 0) + area(t, 1) + area(t, 2)) / 3 / medium.density(t);
    int q = 0;
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k <= i; k++) {
        out[q++] = factor * (gradX[i] * gradX[k] + gradY[i] * gradY[k]);
      }
    }
  }

  /** ∫ w/ρ κ φ_i φ_k with κ = 1/r² on a section (0 in separate ducts), 1 on a cross-section. */
  void crossStiffness(int t, double[] out) {
    Mesh mesh = metric.mesh();
    java.util.Arrays.fill(out, 0);
    for (double[] p : POINTS) {
      double y = p[0] * mesh.cornerY(t, 0) + p[1] * mesh.cornerY(t, 1) + p[2] * mesh.cornerY(t, 2);
      double factor =
          p[3] * mesh.area(t) * metric.area(t, y) * metric.crossTerm(t, y) / medium.density(t);
      int q = 0;
      for (int i = 0; i < 3; i++) {
        for (int k = 0; k <= i; k++) {
          out[q++] += factor * p[i] * p[k];
        }
      }
    }
  }

  /** ∫ w/(γp̄) φ_i φ_k. */
  void mass(int t, double[] out) {
    weighted(t, area(t, 0), area(t, 1), area(t, 2), 1 / medium.bulkModulus(t), out);
  }

  /** ∫ w_face/(ρc) φ_i φ_k over a face of a ring. */
  void face(int t, Face face, double[] out) {
    double w = metric.face(t, face);
    weighted(t, w, w, w, 1 / (medium.density(t) * medium.soundSpeed(t)), out);
  }

  private double area(int t, int k) {
    return metric.area(t, metric.mesh().cornerY(t, k));
  }

  /** factor · ∫ w φ_i φ_k for a weight that is linear between the three corner values; exact. */
  private void weighted(int t, double w0, double w1, double w2, double factor, double[] out) {
    double[] w = {w0, w1, w2};
    double a = factor * metric.mesh().area(t) / 60;
    double sum = w0 + w1 + w2;
    int q = 0;
    for (int i = 0; i < 3; i++) {
      for (int k = 0; k <= i; k++) {
        // ∫ φ_i² φ_l: A/10 for l = i, A/30 else; ∫ φ_i φ_k φ_l: A/30 for l = i or k, A/60 else
        out[q++] = i == k ? a * (2 * sum + 4 * w[i]) : a * (sum + w[i] + w[k]);
      }
    }
  }
}
