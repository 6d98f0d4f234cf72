package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.DoubleUnaryOperator;
import org.annulet.cases.read.Geometry;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.RingCells;
import org.annulet.mesher.mesh.RingReplication;

/**
 * The mesh of a ring drawn out to slightly other dimensions: x stretched zone by zone, y within the
 * half cell from the centre line to the side of the duct and from there to the seam. Triangles and
 * numbering stay, so that operators on both meshes can be subtracted.
 */
final class RingMorph {
  private RingMorph() {}

  /**
   * The same mesh for other dimensions.
   *
   * @param shape mesh of the ring as drawn in {@code from}
   * @param from zones of the mesh
   * @param to the same zones, other dimensions
   * @return empty where one stretch cannot serve all zones: ducts of one width that change
   *     differently
   */
  static Optional<ChamberShape> of(ChamberShape shape, Geometry.Ring from, Geometry.Ring to) {
    RingCells cells = shape.cells().orElseThrow();
    Optional<DoubleUnaryOperator> x = stretch(lengths(from), lengths(to));
    Optional<DoubleUnaryOperator> y = stretch(widths(from), widths(to));
    if (x.isEmpty() || y.isEmpty()) {
      return Optional.empty();
    }
    Mesh half = cells.half();
    Mesh.Builder b = Mesh.builder();
    for (int v = 0; v < half.nodeCount(); v++) {
      b.node(x.get().applyAsDouble(half.x(v)), y.get().applyAsDouble(half.y(v)));
    }
    for (int t = 0; t < half.triangleCount(); t++) {
      b.triangle(
          half.corner(t, 0),
          half.corner(t, 1),
          half.corner(t, 2),
          half.zoneNames().get(half.zone(t)));
    }
    for (int e = 0; e < half.segmentCount(); e++) {
      b.segment(
          half.segmentStart(e), half.segmentEnd(e), half.edgeNames().get(half.segmentEdge(e)));
    }
    RingCells out =
        RingReplication.of(
            b.build(), cells.count(), 2 * Math.PI * to.unrolledRadius() / cells.count());
    return Optional.of(
        new ChamberShape(out.whole(), Optional.of(out), ChamberShape.ringGeometry(to)));
  }

  /** x of the joints of the zones, from 0. */
  private static List<Double> lengths(Geometry.Ring ring) {
    List<Double> x = new ArrayList<>(List.of(0.0));
    for (Geometry.RingZone z : ring.zones()) {
      x.add(x.get(x.size() - 1) + z.length());
    }
    return x;
  }

  /** y of the sides of the ducts in the half cell, between centre line and seam. */
  private static List<Double> widths(Geometry.Ring ring) {
    List<Double> y = new ArrayList<>(List.of(0.0));
    for (Geometry.RingZone z : ring.zones()) {
      if (z instanceof Geometry.Ducts d) {
        y.add(0.5 * d.bore() * ring.unrolledRadius() / d.meanRadius());
      }
    }
    y.add(Math.PI * ring.unrolledRadius() / ring.burnerCount());
    return y;
  }

  /** Straight between the places; empty where one place would have to go to two. */
  private static Optional<DoubleUnaryOperator> stretch(List<Double> from, List<Double> to) {
    List<Integer> order = new ArrayList<>();
    for (int i = 0; i < from.size(); i++) {
      order.add(i);
    }
    order.sort((i, j) -> Double.compare(from.get(i), from.get(j)));
    double size = from.get(order.get(order.size() - 1));
    List<double[]> knots = new ArrayList<>();
    for (int i : order) {
      double[] knot = {from.get(i), to.get(i)};
      double[] last = knots.isEmpty() ? null : knots.get(knots.size() - 1);
      if (last != null && knot[0] - last[0] < 1e-9 * size) {
        if (Math.abs(knot[1] - last[1]) > 1e-12 * size) {
          return Optional.empty();
        }
      } else {
        knots.add(knot);
      }
    }
    return Optional.of(v -> between(knots, v));
  }

  private static double between(List<double[]> knots, double v) {
    int k = 1;
    while (k < knots.size() - 1 && v > knots.get(k)[0]) {
      k++;
    }
    double[] a = knots.get(k - 1);
    double[] b = knots.get(k);
    double part = (v - a[0]) / (b[0] - a[0]);
    return (1 - part) * a[1] + part * b[1];
  }
}
