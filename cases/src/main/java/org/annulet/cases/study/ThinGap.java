package org.annulet.cases.study;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.solver.assembly.Ring;

/**
 * What unrolling a ring into thin annuli costs: the model takes each zone at its mean radius R, a
 * true annulus of gap h has the frequency of an azimuthal mode higher by about h²/(24 R²) of it.
 * The factor 1/24 is that of the first azimuthal mode of a hard annulus (0.203 % for h/R = 0.222:
 * rows A5.10 and A6 of the reference values; 0.206 % by the formula). Zones count by their share of
 * the mode's energy; order 0 is not touched.
 */
final class ThinGap {
  private ThinGap() {}

  /** Estimate for one mode in Hz; not negative. */
  static double hertz(Ring ring, ModeEntry mode, List<String> zones) {
    Integer order = mode.label().azimuthalOrder();
    if (order == null || order == 0) {
      return 0;
    }
    double relative = 0;
    for (int z = 0; z < zones.size(); z++) {
      Ring.Annulus zone = ring.zones().get(zones.get(z));
      double ratio = zone.gap() / zone.meanRadius();
      relative += mode.label().energy().total(z) * ratio * ratio / 24;
    }
    return relative * mode.view().mode().frequency();
  }

  /** A sentence for the results; empty when no azimuthal mode is among them. */
  static Optional<String> sentence(Ring ring, List<ModeEntry> modes, List<String> zones) {
    double[] all =
        modes.stream().mapToDouble(m -> hertz(ring, m, zones)).filter(d -> d > 0).toArray();
    if (all.length == 0) {
      return Optional.empty();
    }
    double low = Double.POSITIVE_INFINITY;
    double high = 0;
    for (double d : all) {
      low = Math.min(low, d);
      high = Math.max(high, d);
    }
    double ratio = 0;
    for (Map.Entry<String, Ring.Annulus> z : ring.zones().entrySet()) {
      ratio = Math.max(ratio, z.getValue().gap() / z.getValue().meanRadius());
    }
    return Optional.of(
        String.format(
            Locale.ROOT,
            "Thin-gap model: the frequencies of the azimuthal modes come out too low by about %.2g to %.2g Hz (gap over radius up to"
                + " %.2f); this is beside the mesh error in the table.",
            low,
            high,
            ratio));
  }
}
