package org.annulet.cases.read;

import java.util.Collection;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;
import org.annulet.cases.units.QuantityKind;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;

/** A mapping of the file whose keys are known beforehand, or are names the user chose. */
final class Mapping {
  private static final Pattern NAME = Pattern.compile("[A-Za-z][A-Za-z0-9_-]*");

  private final Entry entry;
  private final Map<String, Entry> entries = new LinkedHashMap<>();
  private final Map<String, Entry> keyEntries = new LinkedHashMap<>();

  private Mapping(Entry entry) {
    this.entry = entry;
    if (!(entry.node() instanceof MappingNode map)) {
      entry.fault("'key: value' pairs are wanted, got " + entry.shown(), "indent them below");
      return;
    }
    for (NodeTuple t : map.getValue()) {
      if (!(t.getKeyNode() instanceof ScalarNode k)) {
        new Entry(entry.key(), t.getKeyNode(), entry.binder())
            .fault("a key is a single word", "write 'key: value'");
        continue;
      }
      String name = k.getValue();
      String path = entry.key().isEmpty() ? name : entry.key() + "." + name;
      Entry here = new Entry(path, k, entry.binder());
      Entry before = keyEntries.putIfAbsent(name, here);
      if (before != null) {
        int line = before.node().getStartMark().map(m -> m.getLine() + 1).orElse(0);
        here.fault(
            "the key '" + name + "' stands here twice, first on line " + line, "keep one of them");
        continue;
      }
      entries.put(name, new Entry(path, t.getValueNode(), entry.binder()));
    }
  }

  /** A mapping with the keys the format defines; unknown and missing ones are faults. */
  static Mapping of(Entry entry, CaseKeys keys) {
    Mapping m = new Mapping(entry);
    if (!entry.isMapping()) {
      return m;
    }
    List<String> allowed = keys.all();
    for (String name : List.copyOf(m.entries.keySet())) {
      if (!allowed.contains(name)) {
        Entry at = m.keyEntries.get(name);
        if (name.equals("<<")) {
          at.fault("merge keys (<<) are not part of YAML 1.2", "write the values out");
        } else if (keys == CaseKeys.CASE && CaseKeys.STUDIES.all().contains(name)) {
          at.fault(
              "'" + name + "' is a study and stands under 'studies'",
              "write 'studies: {" + name + ": …}'");
        } else if (CaseKeys.RESERVED.contains(name)) {
          at.fault("'" + name + "' is not supported in this version", "leave it out");
        } else if (name.matches("[0-9].*")) {
          at.fault(
              "unknown key '" + name + "' after a comma",
              "decimals are written with a point: a comma begins the next entry");
        } else {
          at.fault("unknown key '" + name + "'", Nearest.advice(name, allowed));
        }
        m.entries.remove(name);
      }
    }
    for (String name : keys.required()) {
      if (!m.keyEntries.containsKey(name)) {
        entry.fault("the key '" + name + "' is missing", "add '" + name + ": …'");
      }
    }
    return m;
  }

  /** A mapping whose keys are names the user chose, or names of things that exist. */
  static Mapping named(Entry entry) {
    return new Mapping(entry);
  }

  /** Reports names that are not a letter followed by letters, digits, _ or -. */
  Mapping checkNames() {
    for (String name : List.copyOf(entries.keySet())) {
      checkName(keyEntries.get(name), name);
    }
    return this;
  }

  static void checkName(Entry at, String name) {
    if (!NAME.matcher(name).matches()) {
      at.fault(
          "'" + name + "' is not a name",
          "a name begins with a letter and holds letters, digits, _ and -");
    }
  }

  Entry entry() {
    return entry;
  }

  boolean has(String key) {
    return entries.containsKey(key);
  }

  Optional<Entry> get(String key) {
    return Optional.ofNullable(entries.get(key));
  }

  /** The place of a key, for faults about the key itself. */
  Entry at(String key) {
    return keyEntries.getOrDefault(key, entry);
  }

  Collection<String> names() {
    return entries.keySet();
  }

  Collection<Entry> values() {
    return entries.values();
  }

  Map<String, Entry> entries() {
    return entries;
  }

  /** A required value: NaN when absent, which was reported. */
  double number(String key, QuantityKind kind, Range range) {
    return get(key).map(e -> e.number(kind, range)).orElse(Double.NaN);
  }

  /** A value with a preset, which is noted in the echo. */
  double number(String key, QuantityKind kind, Range range, double preset) {
    return get(key)
        .map(e -> e.number(kind, range))
        .orElseGet(() -> entry.binder().preset(entry.key() + "." + key, preset, kind));
  }

  /** The one key of {@code keys} that is present; a fault when there is none or more than one. */
  Optional<String> exactlyOne(List<String> keys) {
    List<String> present = keys.stream().filter(this::has).toList();
    if (present.size() == 1) {
      return Optional.of(present.get(0));
    }
    if (entry.isMapping()) {
      entry.fault(
          present.isEmpty()
              ? "one of these keys is wanted: " + String.join(", ", keys)
              : "these keys exclude each other: " + String.join(", ", present),
          present.isEmpty() ? "add one of them" : "keep one of them");
    }
    return Optional.empty();
  }
}
