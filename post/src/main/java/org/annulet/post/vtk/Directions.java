package org.annulet.post.vtk;

import org.annulet.mesher.mesh.Mesh;

/**
 * Directions in space of the coordinates of a mesh laid on a surface: x, y, and round the axis, as
 * unit vectors for each triangle.
 */
final class Directions {
  private final Mesh mesh;
  private final Surface surface;

  Directions(Mesh mesh, Surface surface) {
    this.mesh = mesh;
    this.surface = surface;
  }

  /** Unit vectors along x, along y and round the axis, shape [3][3]. */
  double[][] of(int t) {
    if (surface.isSwept()) {
      double c = Math.cos(surface.angle(t));
      double s = Math.sin(surface.angle(t));
      return new double[][] {{1, 0, 0}, {0, c, s}, {0, -s, c}};
    }
    int source = surface.sourceTriangle(t);
    double x0 = mesh.cornerX(source, 0);
    double y0 = mesh.cornerY(source, 0);
    double x1 = mesh.cornerX(source, 1) - x0;
    double y1 = mesh.cornerY(source, 1) - y0;
    double x2 = mesh.cornerX(source, 2) - x0;
    double y2 = mesh.cornerY(source, 2) - y0;
    double[] alongX = new double[3];
    double[] alongY = new double[3];
    for (int axis = 0; axis < 3; axis++) {
      double p0 = surface.coordinate(surface.corner(t, 0), axis);
      double p1 = surface.coordinate(surface.corner(t, 1), axis) - p0;
      double p2 = surface.coordinate(surface.corner(t, 2), axis) - p0;
      alongX[axis] = p1 * y2 - p2 * y1; // times twice the area, which drops out
      alongY[axis] = x1 * p2 - x2 * p1;
    }
    unit(alongX);
    unit(alongY);
    return new double[][] {
      alongX,
      alongY,
      {
        alongX[1] * alongY[2] - alongX[2] * alongY[1],
        alongX[2] * alongY[0] - alongX[0] * alongY[2],
        alongX[0] * alongY[1] - alongX[1] * alongY[0]
      }
    };
  }

  private static void unit(double[] a) {
    double norm = Math.sqrt(a[0] * a[0] + a[1] * a[1] + a[2] * a[2]);
    for (int k = 0; k < 3; k++) {
      a[k] /= norm;
    }
  }
}
