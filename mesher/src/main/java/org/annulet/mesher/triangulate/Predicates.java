package org.annulet.mesher.triangulate;

import org.locationtech.jts.algorithm.CGAlgorithmsDD;
import org.locationtech.jts.math.DD;

/**
 * Signs of orientation and in-circle: doubles behind Shewchuk's error bound (Discrete Comput. Geom.
 * 18, 1997, stage A), then double-double where the bound does not decide.
 */
final class Predicates {
  private Predicates() {}

  /** (3 + 16 ε) ε with ε = 2⁻⁵³. */
  private static final double ORIENT_BOUND = 3.3306690738754716e-16;

  /** (10 + 96 ε) ε with ε = 2⁻⁵³. */
  private static final double CIRCLE_BOUND = 1.1102230246251577e-15;

  /** Relative size below which a double-double in-circle value is its own rounding. */
  private static final double CIRCLE_ZERO = 1e-28;

  /** Positive if a, b, c turn left, negative if right, zero if in line. */
  static int orient(double ax, double ay, double bx, double by, double cx, double cy) {
    double l = (ax - cx) * (by - cy);
    double r = (ay - cy) * (bx - cx);
    double det = l - r;
    double bound = ORIENT_BOUND * (Math.abs(l) + Math.abs(r));
    if (det > bound) {
      return 1;
    }
    if (-det > bound) {
      return -1;
    }
    return CGAlgorithmsDD.orientationIndex(ax, ay, bx, by, cx, cy);
  }

  /** Positive if d lies inside the circle through a, b, c, which turn left. */
  static boolean inCircle(
      double ax, double ay, double bx, double by, double cx, double cy, double dx, double dy) {
    double adx = ax - dx;
    double ady = ay - dy;
    double bdx = bx - dx;
    double bdy = by - dy;
    double cdx = cx - dx;
    double cdy = cy - dy;
    double bc = bdx * cdy;
    double cb = cdx * bdy;
    double ca = cdx * ady;
    double ac = adx * cdy;
    double ab = adx * bdy;
    double ba = bdx * ady;
    double a2 = adx * adx + ady * ady;
    double b2 = bdx * bdx + bdy * bdy;
    double c2 = cdx * cdx + cdy * cdy;
    double det = a2 * (bc - cb) + b2 * (ca - ac) + c2 * (ab - ba);
    double size =
        (Math.abs(bc) + Math.abs(cb)) * a2
            + (Math.abs(ca) + Math.abs(ac)) * b2
            + (Math.abs(ab) + Math.abs(ba)) * c2;
    double bound = CIRCLE_BOUND * size;
    if (det > bound) {
      return true;
    }
    if (-det > bound) {
      return false;
    }
    return doubleDouble(ax, ay, bx, by, cx, cy, dx, dy) > CIRCLE_ZERO * size;
  }

  private static double doubleDouble(
      double ax, double ay, double bx, double by, double cx, double cy, double dx, double dy) {
    DD adx = DD.valueOf(ax).selfSubtract(dx);
    DD ady = DD.valueOf(ay).selfSubtract(dy);
    DD bdx = DD.valueOf(bx).selfSubtract(dx);
    DD bdy = DD.valueOf(by).selfSubtract(dy);
    DD cdx = DD.valueOf(cx).selfSubtract(dx);
    DD cdy = DD.valueOf(cy).selfSubtract(dy);
    DD a2 = adx.multiply(adx).selfAdd(ady.multiply(ady));
    DD b2 = bdx.multiply(bdx).selfAdd(bdy.multiply(bdy));
    DD c2 = cdx.multiply(cdx).selfAdd(cdy.multiply(cdy));
    DD bc = bdx.multiply(cdy).selfSubtract(cdx.multiply(bdy));
    DD ca = cdx.multiply(ady).selfSubtract(adx.multiply(cdy));
    DD ab = adx.multiply(bdy).selfSubtract(bdx.multiply(ady));
    return a2.selfMultiply(bc)
        .selfAdd(b2.selfMultiply(ca))
        .selfAdd(c2.selfMultiply(ab))
        .doubleValue();
  }
}
