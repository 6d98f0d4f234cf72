package org.annulet.mesher.triangulate;

/**
 * Where the new node of a bad triangle goes: on the bisector of its shortest side, at the least of
 * the distances of circumcentre, off-centre (Üngör 2004) and the apex of a triangle with sides of
 * the wanted size.
 */
final class Placement {
  /** Height over side of an off-centre that sees the side under one degree more than is needed. */
  private static final double OFF_CENTRE =
      0.5 / Math.tan(Math.toRadians(0.5 * (Refiner.LEAST_ANGLE + 1)));

  /** Wanted side of new triangles, in parts of the largest allowed. */
  private static final double AIM = 0.85;

  private final Triangulation mesh;

  /** The place, in m. */
  double x;

  /** The place, in m. */
  double y;

  Placement(Triangulation mesh) {
    this.mesh = mesh;
  }

  /**
   * Chooses the place.
   *
   * @param e shortest side of the bad triangle
   * @param least its length squared
   * @param twice twice the area of the triangle
   * @param h largest side allowed where the triangle is too big, else 0
   * @param thin whether its least angle is too small
   */
  void choose(int e, double least, double twice, double h, boolean thin) {
    int a = mesh.start[e];
    int b = mesh.start[Triangulation.next(e)];
    int c = mesh.start[Triangulation.prev(e)];
    double length = Math.sqrt(least);
    double distance = 0.5 * length * dot(c, a, b) / twice;
    if (thin) {
      distance = Math.min(distance, OFF_CENTRE * length);
    }
    if (h > 0) {
      double aim = AIM * h;
      double apex = Math.sqrt(Math.max(aim * aim - 0.25 * least, 0.25 * least));
      if (apex < distance) {
        distance = Math.max(apex, behind(e, length));
      }
    }
    double share = distance / length;
    x = 0.5 * (mesh.x[a] + mesh.x[b]) - share * (mesh.y[b] - mesh.y[a]);
    y = 0.5 * (mesh.y[a] + mesh.y[b]) + share * (mesh.x[b] - mesh.x[a]);
  }

  /** Signed height over side e of the neighbour's circumcentre: the disc is empty from there on. */
  private double behind(int e, double length) {
    int f = mesh.twin[e];
    if (mesh.seg[e] >= 0) {
      return 0;
    }
    int a = mesh.start[f];
    int b = mesh.start[Triangulation.next(f)];
    int c = mesh.start[Triangulation.prev(f)];
    double twice =
        (mesh.x[b] - mesh.x[a]) * (mesh.y[c] - mesh.y[a])
            - (mesh.x[c] - mesh.x[a]) * (mesh.y[b] - mesh.y[a]);
    return -0.5 * length * dot(c, a, b) / twice;
  }

  private double dot(int c, int a, int b) {
    return (mesh.x[a] - mesh.x[c]) * (mesh.x[b] - mesh.x[c])
        + (mesh.y[a] - mesh.y[c]) * (mesh.y[b] - mesh.y[c]);
  }
}
