package org.annulet.post.meaning;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Objects;
import org.annulet.post.meaning.ModeLabel.Origin;
import org.annulet.post.meaning.ModeLabel.Pairing;

/**
 * Labels read off the fields of the modes. The rules:
 *
 * <ul>
 *   <li>azimuthal order: given on a section; on a ring and a cross-section the order with the
 *       largest projection ({@code RingSpectrum});
 *   <li>zone: the one with the largest share of potential plus kinetic energy;
 *   <li>bulk: order 0 and, in that zone, |∫p̂|² ≥ 0.98 · V ∫|p̂|² (a quarter wave has 0.81);
 *   <li>axial and radial nodes: sign changes of the best separable shape in that zone ({@code
 *       NodeCount});
 *   <li>pair: exact when the mode's multiplicity is above one, or on a section for m ≥ 1, where the
 *       mode stands for e^{imθ} and e^{−imθ}; split when on a ring another mode has the same order
 *       ≥ 1, zone and nodes, within 3 % in frequency.
 * </ul>
 */
public final class Labels {
  private static final double BULK = 0.98;
  private static final double SPLIT = 0.03;

  private Labels() {}

  /** Labels of all modes of one chamber, in the order of the modes. */
  public static List<ModeLabel> of(Chamber chamber, List<ModeView> modes) {
    List<ModeLabel> raw = new ArrayList<>();
    for (ModeView view : modes) {
      raw.add(single(chamber, view));
    }
    List<ModeLabel> labels = new ArrayList<>();
    for (int i = 0; i < raw.size(); i++) {
      labels.add(paired(i, modes, raw, chamber));
    }
    return List.copyOf(labels);
  }

  private static ModeLabel single(Chamber chamber, ModeView view) {
    Integer order = null;
    double share = 1;
    SignedOrder signed = new SignedOrder(0);
    String pattern = "";
    switch (chamber.kind()) {
      case SECTION -> {
        int given = view.order() == null ? 0 : view.order();
        order = Math.abs(given);
        signed = new SignedOrder(given);
      }
      case RING, CROSS_SECTION -> {
        RingSpectrum spectrum = new RingSpectrum(chamber, view);
        order = spectrum.order();
        share = spectrum.share(order);
        signed = new SignedOrder(spectrum.spin(order) >= 0 ? order : -order);
        pattern = pattern(spectrum, order);
      }
      case PLANE -> {}
    }
    EnergyShares energy = EnergyShares.of(chamber, view);
    int zone = energy.largest();
    NodeCount nodes = NodeCount.of(chamber, view, signed, zone);
    NodeCount overall =
        chamber.mesh().zoneNames().size() == 1 ? nodes : NodeCount.of(chamber, view, signed, -1);
    boolean polar = chamber.kind() == GeometryKind.CROSS_SECTION;
    boolean bulk = (order == null || order == 0) && uniformity(chamber, view, zone) >= BULK;
    return new ModeLabel(
        order,
        share,
        chamber.mesh().zoneNames().get(zone),
        energy.total(zone),
        energy,
        polar ? 0 : nodes.along(),
        polar ? 0 : overall.along(),
        polar ? nodes.along() : nodes.across(),
        bulk,
        Pairing.SINGLE,
        -1,
        pattern,
        Origin.NOT_TRACED,
        "");
  }

  private static String pattern(RingSpectrum spectrum, int order) {
    if (order == 0) {
      return "";
    }
    double spin = spectrum.spin(order);
    if (Math.abs(spin) > 0.9) {
      return spin > 0 ? "spins towards smaller angles" : "spins towards larger angles";
    }
    double step = 180.0 / order;
    double node = Math.toDegrees(spectrum.antinode(order)) + step / 2;
    node -= step * Math.floor(node / step);
    return String.format(
        Locale.ROOT,
        "%s nodal lines at %.1f° + k·%.1f°",
        Math.abs(spin) < 0.1 ? "stands," : "partly spins,",
        node,
        step);
  }

  private static double uniformity(Chamber chamber, ModeView view, int zone) {
    double[] sum = new double[4];
    Samples.forEach(
        chamber,
        view,
        (t, along, across, w, re, im) -> {
          if (chamber.mesh().zone(t) == zone) {
            sum[0] += w;
            sum[1] += w * re;
            sum[2] += w * im;
            sum[3] += w * (re * re + im * im);
          }
        });
    return sum[3] > 0 ? (sum[1] * sum[1] + sum[2] * sum[2]) / (sum[0] * sum[3]) : 0;
  }

  private static ModeLabel paired(
      int i, List<ModeView> modes, List<ModeLabel> raw, Chamber chamber) {
    ModeLabel a = raw.get(i);
    int order = a.azimuthalOrder() == null ? 0 : a.azimuthalOrder();
    boolean exact =
        modes.get(i).mode().multiplicity() > 1
            || (chamber.kind() == GeometryKind.SECTION && order > 0);
    int partner = chamber.kind() == GeometryKind.SECTION ? -1 : partner(i, modes, raw, exact);
    Pairing pairing =
        exact ? Pairing.EXACT : partner >= 0 && order > 0 ? Pairing.SPLIT : Pairing.SINGLE;
    if (pairing == Pairing.SINGLE) {
      partner = -1;
    }
    StringBuilder text = new StringBuilder(shape(a, chamber.kind()));
    text.append(", ").append(a.zone());
    if (pairing == Pairing.EXACT) {
      text.append(", pair, orientation open");
    } else if (pairing == Pairing.SPLIT) {
      text.append(
          String.format(
              Locale.ROOT,
              ", split pair (%.3g Hz and %.3g 1/s apart), %s",
              Math.abs(modes.get(i).mode().frequency() - modes.get(partner).mode().frequency()),
              Math.abs(modes.get(i).mode().growthRate() - modes.get(partner).mode().growthRate()),
              a.pattern()));
    }
    return new ModeLabel(
        a.azimuthalOrder(),
        a.orderShare(),
        a.zone(),
        a.zoneShare(),
        a.energy(),
        a.axialNodes(),
        a.overallAxialNodes(),
        a.radialNodes(),
        a.bulk(),
        pairing,
        partner,
        pairing == Pairing.EXACT ? "" : a.pattern(),
        a.origin(),
        text.toString());
  }

  private static String shape(ModeLabel a, GeometryKind kind) {
    if (a.bulk()) {
      return "bulk";
    }
    List<String> parts = new ArrayList<>();
    if (a.azimuthalOrder() != null && a.azimuthalOrder() > 0) {
      parts.add("azimuthal " + a.azimuthalOrder());
    }
    if (a.axialNodes() > 0) {
      parts.add("axial " + a.axialNodes());
    }
    if (a.radialNodes() > 0) {
      parts.add((kind == GeometryKind.PLANE ? "transverse " : "radial ") + a.radialNodes());
    }
    return parts.isEmpty() ? "axial, no node" : String.join(" + ", parts);
  }

  private static int partner(int i, List<ModeView> modes, List<ModeLabel> raw, boolean exact) {
    ModeLabel a = raw.get(i);
    double f = modes.get(i).mode().frequency();
    int best = -1;
    double distance = exact ? 1e-4 * f : SPLIT * f;
    for (int j = 0; j < raw.size(); j++) {
      ModeLabel b = raw.get(j);
      double d =
          Math.abs(modes.get(j).mode().frequency() - f)
              + Math.abs(modes.get(j).mode().growthRate() - modes.get(i).mode().growthRate())
                  / (2 * Math.PI);
      if (j != i
          && d < distance
          && Objects.equals(a.azimuthalOrder(), b.azimuthalOrder())
          && a.zone().equals(b.zone())
          && a.axialNodes() == b.axialNodes()
          && a.radialNodes() == b.radialNodes()) {
        best = j;
        distance = d;
      }
    }
    return best;
  }
}
