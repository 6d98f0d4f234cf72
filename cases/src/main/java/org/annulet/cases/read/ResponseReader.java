package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code response}: the answer of a flame over frequency. */
final class ResponseReader {
  private static final List<String> KINDS = List.of("gain", "sum", "table");
  private static final List<String> LIMITS =
      List.of("premixed", "technically_premixed", "as_measured");

  private ResponseReader() {}

  static Optional<Flame.Response> read(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.RESPONSE);
    Optional<String> kind = m.exactlyOne(KINDS);
    if (kind.isEmpty()) {
      return Optional.empty();
    }
    return switch (kind.get()) {
      case "gain" -> Optional.of(withGain(m));
      case "sum" -> sum(m);
      default -> table(m);
    };
  }

  private static Flame.Response withGain(Mapping m) {
    absent(m, List.of("low_frequency_limit"), "goes with a table");
    Flame.GainDelay plain = gainDelay(m);
    if (m.has("delay_deviation") && m.has("cutoff")) {
      m.at("cutoff").fault("both 'delay_deviation' and 'cutoff'", "give one of the two");
    }
    if (m.has("delay_deviation")) {
      return new Flame.SpreadDelay(
          plain.gain(),
          plain.delay(),
          m.number("delay_deviation", QuantityKind.TIME, Range.NOT_NEGATIVE));
    }
    if (m.has("cutoff")) {
      return new Flame.LowPass(
          plain.gain(), plain.delay(), m.number("cutoff", QuantityKind.FREQUENCY, Range.POSITIVE));
    }
    return plain;
  }

  private static Flame.GainDelay gainDelay(Mapping m) {
    double gain = m.number("gain", QuantityKind.FRACTION, Range.ANY);
    if (Math.abs(gain) > 5) {
      m.get("gain")
          .ifPresent(e -> e.caution("a gain of " + e.shown() + " is unusual", "check the value"));
    }
    return new Flame.GainDelay(gain, m.number("delay", QuantityKind.TIME, Range.NOT_NEGATIVE));
  }

  private static Optional<Flame.Response> sum(Mapping m) {
    absent(
        m,
        List.of("delay", "delay_deviation", "cutoff", "low_frequency_limit"),
        "does not go with a sum");
    List<Flame.GainDelay> parts = new ArrayList<>();
    for (Entry item : m.get("sum").orElseThrow().items()) {
      parts.add(gainDelay(Mapping.of(item, CaseKeys.RESPONSE_PART)));
    }
    if (parts.isEmpty()) {
      m.at("sum").fault("a sum of nothing", "write [{gain: 1, delay: 2 ms}, …]");
      return Optional.empty();
    }
    return Optional.of(new Flame.DelaySum(parts));
  }

  private static Optional<Flame.Response> table(Mapping m) {
    absent(m, List.of("delay", "delay_deviation", "cutoff"), "does not go with a table");
    Flame.Limit limit =
        m.get("low_frequency_limit")
            .flatMap(e -> e.choice(LIMITS))
            .map(w -> Flame.Limit.values()[LIMITS.indexOf(w)])
            .orElse(Flame.Limit.AS_MEASURED);
    Entry file = m.get("table").orElseThrow();
    Optional<FrequencyTable> table = FrequencyTable.read(file);
    table.ifPresent(t -> rising(file, t));
    return table.map(t -> new Flame.Measured(t, limit));
  }

  /** A phase that rises with frequency means an answer before its cause. */
  private static void rising(Entry entry, FrequencyTable t) {
    double turn = 0;
    for (int k = 1; k < t.frequency().length; k++) {
      double step = Math.atan2(t.im()[k], t.re()[k]) - Math.atan2(t.im()[k - 1], t.re()[k - 1]);
      turn += Math.IEEEremainder(step, 2 * Math.PI);
    }
    if (turn > 0.1) {
      entry.caution(
          "the phase rises with frequency: heat would be released before the velocity that causes"
              + " it",
          "check the sign; a delay gives the phase −ωτ");
    }
  }

  private static void absent(Mapping m, List<String> keys, String why) {
    for (String key : keys) {
      if (m.has(key)) {
        m.at(key).fault("'" + key + "' " + why, "leave it out");
      }
    }
  }
}
