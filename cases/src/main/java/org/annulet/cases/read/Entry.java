package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import org.annulet.cases.units.Quantity;
import org.annulet.cases.units.QuantityKind;
import org.annulet.cases.units.UnitFault;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;

/** One value of the file with the path of its key; a value that cannot be read reports itself. */
final class Entry {
  private final String key;
  private final Node node;
  private final Binder binder;

  Entry(String key, Node node, Binder binder) {
    this.key = key;
    this.node = node;
    this.binder = binder;
    node.getStartMark().ifPresent(m -> binder.place(key, m.getLine() + 1, m.getColumn() + 1));
  }

  String key() {
    return key;
  }

  Node node() {
    return node;
  }

  Binder binder() {
    return binder;
  }

  boolean isMapping() {
    return node instanceof MappingNode;
  }

  boolean isList() {
    return node instanceof SequenceNode;
  }

  boolean isText() {
    return node instanceof ScalarNode;
  }

  void fault(String what, String mend) {
    binder.add(problem(what, mend));
  }

  void caution(String what, String mend) {
    binder.caution(problem(what, mend));
  }

  private Problem problem(String what, String mend) {
    Optional<Mark> mark = node.getStartMark();
    return new Problem(
        binder.file(),
        mark.map(Mark::getLine).orElse(-1) + 1,
        mark.map(Mark::getColumn).orElse(-1) + 1,
        key,
        what,
        mend);
  }

  /** What was written, in a word or a few. */
  String shown() {
    if (node instanceof ScalarNode s) {
      String text = s.getValue();
      return text.isEmpty()
          ? "nothing"
          : "'" + (text.length() > 40 ? text.substring(0, 40) + "…" : text) + "'";
    }
    return isMapping() ? "a mapping" : "a list";
  }

  /** Text of a scalar that is not empty. */
  Optional<String> text() {
    if (node instanceof ScalarNode s && !s.getValue().isBlank()) {
      return Optional.of(s.getValue().strip());
    }
    fault("a text is wanted, got " + shown(), "write one word or line after the colon");
    return Optional.empty();
  }

  /** One of the words. */
  Optional<String> choice(List<String> words) {
    Optional<String> text = isText() ? text() : Optional.empty();
    if (text.isPresent() && words.contains(text.get())) {
      return text;
    }
    if (text.isPresent() || !isText()) {
      fault(
          shown() + " is not one of the words allowed here",
          Nearest.advice(text.orElse(""), words));
    }
    return Optional.empty();
  }

  /** A name that exists. */
  Optional<String> nameOf(String what, List<String> known) {
    Optional<String> text = text();
    if (text.isPresent() && !known.contains(text.get())) {
      fault("no " + what + " '" + text.get() + "'", Nearest.advice(text.get(), known));
      return Optional.empty();
    }
    return text;
  }

  /** A number with its unit, in SI; NaN after a fault. */
  double number(QuantityKind kind, Range range) {
    if (!isText()) {
      fault("one value is wanted, got " + shown(), "write for example '" + kind.example() + "'");
      return Double.NaN;
    }
    return read(((ScalarNode) node).getValue(), "", kind, range);
  }

  /** A whole number from {@code low} to {@code high}; {@code low} − 1 after a fault. */
  int whole(int low, int high) {
    String text = isText() ? ((ScalarNode) node).getValue().strip() : "";
    if (text.matches("[+-]?[0-9]{1,9}")) {
      int value = Integer.parseInt(text);
      if (value >= low && value <= high) {
        return value;
      }
    }
    fault(
        "a whole number is wanted, got " + shown(),
        high == Integer.MAX_VALUE
            ? "write " + low + " or above"
            : "write a number from " + low + " to " + high);
    return low - 1;
  }

  /** Numbers of a list that carry their unit each, or state it once as the last item. */
  List<Double> numbers(QuantityKind kind, Range range) {
    return numbers(kind, range, "");
  }

  private List<Double> numbers(QuantityKind kind, Range range, String stated) {
    List<Entry> items = items();
    List<Double> result = new ArrayList<>();
    String unit = stated;
    if (unit.isEmpty()
        && items.size() > 1
        && items.get(0).isBareNumber()
        && !items.get(items.size() - 1).looksLikeNumber("[+-]?[0-9.](?!/).*")) {
      unit = items.get(items.size() - 1).text().orElse("");
      items = items.subList(0, items.size() - 1);
    }
    for (Entry item : items) {
      if (item.isText()) {
        result.add(item.read(((ScalarNode) item.node).getValue(), unit, kind, range));
      } else {
        result.add(item.number(kind, range));
      }
    }
    return result;
  }

  /** As {@link #numbers}, of a stated count; all NaN after a fault. */
  List<Double> numbers(QuantityKind kind, Range range, int count) {
    return numbers(kind, range, count, "");
  }

  /** As above; {@code stated} is the unit of all numbers, or empty when they carry their own. */
  List<Double> numbers(QuantityKind kind, Range range, int count, String stated) {
    List<Double> all = isList() ? numbers(kind, range, stated) : List.of();
    if (all.size() != count) {
      String example = kind.example().replaceFirst(" or .*", "");
      fault(
          count + " values are wanted, got " + (isList() ? all.size() : shown()),
          "write for example [" + String.join(", ", Collections.nCopies(count, example)) + "]");
      return Collections.nCopies(count, Double.NaN);
    }
    return all;
  }

  /** Whether it is a number without a unit. */
  boolean isBareNumber() {
    return looksLikeNumber("[0-9.eE+-]+");
  }

  private boolean looksLikeNumber(String pattern) {
    return node instanceof ScalarNode s && s.getValue().strip().matches(pattern);
  }

  private double read(String text, String unit, QuantityKind kind, Range range) {
    try {
      Quantity q = unit.isEmpty() ? Quantity.parse(text, kind) : Quantity.parse(text, unit, kind);
      if (range.excludes(q.si())) {
        fault(
            "'" + q.source() + "' is out of range for a " + kind.words(),
            "the " + kind.words() + " must be " + range.words());
        return Double.NaN;
      }
      binder.value(key, q);
      return q.si();
    } catch (UnitFault f) {
      fault(f.what(), f.mend());
      return Double.NaN;
    }
  }

  /** Items of a list; a fault when it is none. */
  List<Entry> items() {
    List<Entry> items = new ArrayList<>();
    if (node instanceof SequenceNode list) {
      int i = 0;
      for (Node item : list.getValue()) {
        i++;
        items.add(new Entry(key + "." + YamlPath.itemName(item, i), item, binder));
      }
    } else {
      fault("a list is wanted, got " + shown(), "write [ … , … ], or lines beginning with '- '");
    }
    return items;
  }
}
