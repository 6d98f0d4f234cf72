package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.units.QuantityKind;

/** Reads {@code studies.uncertainty}. */
final class UncertaintyReader {
  private static final int MOST_SAMPLES = 1_000_000;
  private static final int MOST_INPUTS = 40;
  private static final int SAMPLES = 1000;
  private static final List<String> SHAPES = List.of("normal", "uniform", "triangular");

  private final Geometry geometry;
  private final List<String> flames;

  UncertaintyReader(Geometry geometry, List<String> flames) {
    this.geometry = geometry;
    this.flames = flames;
  }

  Optional<Uncertainty> read(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.UNCERTAINTY);
    int samples = m.get("samples").map(e -> e.whole(10, MOST_SAMPLES)).orElse(SAMPLES);
    long seed = m.get("seed").map(e -> (long) e.whole(0, Integer.MAX_VALUE - 1)).orElse(1L);
    List<Uncertainty.Input> inputs = new ArrayList<>();
    m.get("inputs")
        .map(Mapping::named)
        .ifPresent(
            all ->
                all.entries()
                    .forEach(
                        (key, e) ->
                            spread(e).ifPresent(s -> inputs.add(new Uncertainty.Input(key, s)))));
    if (inputs.size() > MOST_INPUTS) {
      m.at("inputs").fault(inputs.size() + " inputs", "name at most " + MOST_INPUTS);
    }
    List<Uncertainty.Correlation> correlations = new ArrayList<>();
    m.get("correlated")
        .ifPresent(
            e -> e.items().forEach(i -> correlation(i, inputs).ifPresent(correlations::add)));
    Optional<Uncertainty.Scatter> scatter = m.get("burner_scatter").flatMap(this::scatter);
    if (m.has("inputs") == m.has("burner_scatter") && entry.isMapping()) {
      entry.fault(
          m.has("inputs")
              ? "inputs of the whole chamber and scatter from burner to burner at once"
              : "nothing is uncertain",
          "give either 'inputs' or 'burner_scatter'");
      return Optional.empty();
    }
    return inputs.isEmpty() && scatter.isEmpty()
        ? Optional.empty()
        : Optional.of(new Uncertainty(samples, seed, inputs, correlations, scatter));
  }

  private static Optional<Uncertainty.Spread> spread(Entry entry) {
    Mapping m = Mapping.of(entry, CaseKeys.SPREAD);
    return m.exactlyOne(SHAPES)
        .flatMap(
            shape ->
                m.get(shape)
                    .flatMap(Entry::text)
                    .map(
                        width ->
                            new Uncertainty.Spread(
                                Uncertainty.Shape.values()[SHAPES.indexOf(shape)], width)));
  }

  private static Optional<Uncertainty.Correlation> correlation(
      Entry entry, List<Uncertainty.Input> inputs) {
    Mapping m = Mapping.of(entry, CaseKeys.CORRELATED);
    double c =
        m.get("coefficient")
            .map(e -> e.number(QuantityKind.FRACTION, Range.ANY))
            .orElse(Double.NaN);
    List<String> keys = inputs.stream().map(Uncertainty.Input::key).toList();
    List<Integer> found = new ArrayList<>();
    m.get("between")
        .ifPresent(
            e ->
                e.items()
                    .forEach(
                        i -> i.nameOf("input", keys).ifPresent(k -> found.add(keys.indexOf(k)))));
    if (!(Math.abs(c) < 1)) {
      m.at("coefficient")
          .fault("the coefficient must lie between −1 and 1", "write for example 0.5");
      return Optional.empty();
    }
    if (found.size() != 2 || found.get(0).equals(found.get(1))) {
      m.at("between").fault("two different inputs are wanted", "write [first key, second key]");
      return Optional.empty();
    }
    return Optional.of(new Uncertainty.Correlation(found.get(0), found.get(1), c));
  }

  private Optional<Uncertainty.Scatter> scatter(Entry entry) {
    Mapping all = Mapping.named(entry);
    if (!(geometry instanceof Geometry.Ring)) {
      entry.fault("burners are single on a ring only", "use 'kind: ring', or give 'inputs'");
      return Optional.empty();
    }
    if (all.entries().size() != 1) {
      entry.fault(
          all.entries().size() + " flames", "write one flame's name and its 'gain' and 'delay'");
      return Optional.empty();
    }
    Map.Entry<String, Entry> one = all.entries().entrySet().iterator().next();
    if (!flames.contains(one.getKey())) {
      all.at(one.getKey())
          .fault("no flame '" + one.getKey() + "'", Nearest.advice(one.getKey(), flames));
      return Optional.empty();
    }
    Mapping m = Mapping.of(one.getValue(), CaseKeys.BURNER_SCATTER);
    Optional<Uncertainty.Spread> gain = m.get("gain").flatMap(UncertaintyReader::spread);
    Optional<Uncertainty.Spread> delay = m.get("delay").flatMap(UncertaintyReader::spread);
    if (gain.isEmpty() && delay.isEmpty()) {
      one.getValue().fault("nothing scatters", "add 'gain: {normal: 5 %}' or 'delay: …'");
      return Optional.empty();
    }
    return Optional.of(new Uncertainty.Scatter(one.getKey(), gain, delay));
  }
}
