package org.annulet.cases.study;

import java.util.Optional;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Geometry;
import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.network.Piece;

/**
 * A step of the area between two ducts.
 *
 * @param c the case
 * @param a upstream
 * @param b downstream
 */
record ChainStep(CaseFile c, ChainLinks.Link a, ChainLinks.Link b) {
  /**
   * The inertia of a step as a long wave feels it: of a channel of height w that opens
   * symmetrically into one of height P, α = w/P, an added length of the wide channel of (P/π) [ (1
   * − α)²/(2α) ln((1 + α)/(1 − α)) + ln((1 + α)²/(4α)) ] (plane flow through a step, by conformal
   * mapping; from memory of Miles 1946, checked against finite elements).
   */
  Optional<Piece> inertia(EdgeGas before, EdgeGas behind) {
    boolean narrowFirst = a.area() < b.area();
    ChainLinks.Link wide = narrowFirst ? b : a;
    ChainLinks.Link narrow = narrowFirst ? a : b;
    double pitch;
    double share;
    if (c.geometry() instanceof Geometry.Ring ring) {
      if (Double.isInfinite(a.radius()) == Double.isInfinite(b.radius())) {
        return Optional.empty(); // steps of the gap have no near field in the unrolled plane
      }
      Geometry.RingZone ducts = ring.zone(Double.isInfinite(a.radius()) ? a.zone() : b.zone());
      Geometry.RingZone annulus = ring.zone(Double.isInfinite(a.radius()) ? b.zone() : a.zone());
      wide = Double.isInfinite(a.radius()) ? b : a;
      pitch = 2 * Math.PI * annulus.meanRadius() / ring.burnerCount();
      share =
          ((Geometry.Ducts) ducts).bore() * ring.burnerCount() / (2 * Math.PI * ducts.meanRadius());
    } else {
      double height = wide.high() - wide.low();
      share = (narrow.high() - narrow.low()) / height;
      boolean flush =
          Math.min(Math.abs(a.low() - b.low()), Math.abs(a.high() - b.high())) < 1e-6 * height;
      pitch = flush ? 2 * height : height;
    }
    if (share > 0.999 || share <= 0) {
      return Optional.empty();
    }
    double length =
        pitch
            / Math.PI
            * (Math.pow(1 - share, 2) / (2 * share) * Math.log((1 + share) / (1 - share))
                + Math.log(Math.pow(1 + share, 2) / (4 * share)));
    EdgeGas gas = wide == a ? before : behind;
    return Optional.of(new Piece.Inertia(gas.density() * length / wide.area()));
  }
}
