package org.annulet.cases.read;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Function;
import org.annulet.cases.units.Quantity;
import org.annulet.cases.units.QuantityKind;

/** What is gathered while the tree is read: faults, cautions, places and values. */
final class Binder {
  private final String file;
  private final Path folder;
  private final DataFiles dataFiles;
  private final Set<Problem> problems = new LinkedHashSet<>();
  private final Set<Problem> cautions = new LinkedHashSet<>();
  private final Map<String, CaseSource.Place> places = new HashMap<>();
  private final List<CaseSource.Value> values = new ArrayList<>();

  /**
   * A new binder.
   *
   * @param file name for messages
   * @param folder case folder, absolute
   */
  Binder(String file, Path folder) {
    this(file, folder, new DataFiles());
  }

  /** A binder that shares what was made of data files. */
  Binder(String file, Path folder, DataFiles dataFiles) {
    this.file = file;
    this.folder = folder;
    this.dataFiles = dataFiles;
  }

  DataFiles dataFiles() {
    return dataFiles;
  }

  String file() {
    return file;
  }

  Path folder() {
    return folder;
  }

  void add(Problem problem) {
    problems.add(problem);
  }

  void caution(Problem caution) {
    cautions.add(caution);
  }

  void place(String key, int line, int column) {
    places.putIfAbsent(key, new CaseSource.Place(line, column));
  }

  void value(String key, Quantity q) {
    values.add(new CaseSource.Value(key, q.source(), q.si(), q.kind()));
  }

  /** Notes a value the file does not give; returns it. */
  double preset(String key, double si, QuantityKind kind) {
    values.add(new CaseSource.Value(key, CaseSource.Value.DEFAULT, si, kind));
    return si;
  }

  boolean clean() {
    return problems.isEmpty();
  }

  List<Problem> problems() {
    return sorted(problems);
  }

  List<Problem> cautions() {
    return sorted(cautions);
  }

  /** What was read; cannot be read again with other values. */
  CaseSource source() {
    return source(changes -> new Reading(Optional.empty(), List.of(), List.of()));
  }

  /** What was read, and how to read it again with some values replaced. */
  CaseSource source(Function<Map<String, String>, Reading> again) {
    return new CaseSource(file, places, values, dataFiles, again);
  }

  private static List<Problem> sorted(Set<Problem> all) {
    return all.stream()
        .sorted(Comparator.comparingInt(Problem::line).thenComparingInt(Problem::column))
        .toList();
  }
}
