package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import org.annulet.cases.units.QuantityKind;
import org.annulet.solver.modes.Window;

/**
 * Reads {@code window}.
 *
 * @param frequency lowest and highest in Hz
 * @param growth lowest and highest in 1/s
 * @param orders azimuthal orders, rising; empty where there are none
 */
record WindowReader(double[] frequency, double[] growth, List<Integer> orders) {
  /** Lower frequency over the upper one where the file does not say. */
  private static final double LOWEST_SHARE = 0.02;

  private static final double GROWTH = 1000;
  private static final int HIGHEST_ORDER = 200;
  private static final int PRESET_ORDER = 4;

  static WindowReader read(Entry entry, Geometry geometry) {
    Mapping m = Mapping.of(entry, CaseKeys.WINDOW);
    double[] f = {Double.NaN, Double.NaN};
    m.get("frequency").ifPresent(e -> frequency(e, f));
    double[] g = {Double.NaN, Double.NaN};
    growth(m, g);
    return new WindowReader(f, g, orders(m, geometry));
  }

  /** The window; call only when there is no fault. */
  Window window() {
    return new Window(frequency[0], frequency[1], growth[0], growth[1]);
  }

  private static void frequency(Entry e, double[] f) {
    if (e.isText()) {
      f[1] = e.number(QuantityKind.FREQUENCY, Range.POSITIVE);
      f[0] = e.binder().preset(e.key() + ".lowest", LOWEST_SHARE * f[1], QuantityKind.FREQUENCY);
      return;
    }
    List<Double> both = e.numbers(QuantityKind.FREQUENCY, Range.POSITIVE, 2);
    f[0] = both.get(0);
    f[1] = both.get(1);
    if (f[0] >= f[1]) {
      e.fault(empty("frequencies", f, "Hz"), "write [lowest, highest]");
    }
  }

  private static void growth(Mapping m, double[] g) {
    Entry e = m.get("growth_rate").orElse(null);
    if (e == null) {
      String key = m.entry().key() + ".growth_rate";
      g[0] = m.entry().binder().preset(key + ".lowest", -GROWTH, QuantityKind.GROWTH_RATE);
      g[1] = m.entry().binder().preset(key + ".highest", GROWTH, QuantityKind.GROWTH_RATE);
      return;
    }
    List<Double> both = e.numbers(QuantityKind.GROWTH_RATE, Range.ANY, 2);
    g[0] = both.get(0);
    g[1] = both.get(1);
    if (g[0] >= g[1]) {
      e.fault(empty("growth rates", g, "1/s"), "write [lowest, highest]");
    }
  }

  private static String empty(String what, double[] ends, String unit) {
    return "the window is empty: "
        + what
        + " from "
        + Shown.number(ends[0])
        + " to "
        + Shown.number(ends[1])
        + " "
        + unit;
  }

  private static List<Integer> orders(Mapping m, Geometry geometry) {
    boolean section =
        geometry instanceof Geometry.Section
            || geometry instanceof Geometry.MeshFile f && f.plane() == Geometry.MeshPlane.SECTION;
    Entry e = m.get("azimuthal_orders").orElse(null);
    if (e != null && !section) {
      m.at("azimuthal_orders")
          .fault(
              "azimuthal orders outside a section",
              "leave them out: here every order comes out of one problem");
      return List.of();
    }
    int ducts = ductCount(geometry);
    List<Integer> orders = new ArrayList<>();
    if (!section) {
      return orders;
    }
    if (e == null) {
      int last = ducts > 0 ? (ducts - 1) / 2 : PRESET_ORDER;
      for (int order = 0; order <= Math.min(last, PRESET_ORDER); order++) {
        orders.add(order);
      }
      return List.copyOf(orders);
    }
    for (Entry item : e.items()) {
      int order = item.whole(0, HIGHEST_ORDER);
      if (ducts > 0 && 2 * order >= ducts) {
        item.fault(
            "order " + order + " with " + ducts + " separate ducts, which cannot carry it",
            "orders must satisfy 2 × order < " + ducts + ": at most " + (ducts - 1) / 2);
      }
      if (orders.contains(order)) {
        item.fault("order " + order + " stands here twice", "leave one out");
      }
      orders.add(order);
    }
    if (e.isList() && orders.isEmpty()) {
      e.fault("no azimuthal orders", "write for example [0, 1, 2]");
    }
    return List.copyOf(new TreeSet<>(orders));
  }

  /** Smallest number of separate ducts of any zone; 0 when there are none. */
  private static int ductCount(Geometry geometry) {
    if (geometry instanceof Geometry.Section s) {
      return s.outline().zones().values().stream()
          .flatMap(z -> z.separateDucts().stream())
          .mapToInt(Geometry.SeparateDucts::count)
          .min()
          .orElse(0);
    }
    if (geometry instanceof Geometry.MeshFile f) {
      return f.separateDucts().values().stream()
          .mapToInt(Geometry.SeparateDucts::count)
          .min()
          .orElse(0);
    }
    return 0;
  }
}
