package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;

/** Reads {@code outputs}. */
final class OutputsReader {
  private final EdgeNames names;

  /**
   * @param names edges of the geometry
   */
  OutputsReader(EdgeNames names) {
    this.names = names;
  }

  CaseFile.Outputs read(Entry e) {
    Mapping m = Mapping.of(e, CaseKeys.OUTPUTS);
    return new CaseFile.Outputs(
        m.get("field_files").map(OutputsReader::fieldFiles).orElse(Integer.MAX_VALUE),
        m.get("cycles").map(OutputsReader::cycles).orElse(OptionalInt.of(1)),
        m.get("shapes_along").map(this::lines).orElse(List.of()));
  }

  private static int fieldFiles(Entry files) {
    Optional<String> text = files.text();
    if (text.equals(Optional.of("all"))) {
      return Integer.MAX_VALUE;
    }
    if (text.equals(Optional.of("none"))) {
      return 0;
    }
    if (!text.orElse("").matches("[0-9]{1,6}")) {
      files.fault("field_files is " + files.shown(), "write all, none or a number");
      return 0;
    }
    return Integer.parseInt(text.get());
  }

  private static OptionalInt cycles(Entry cycles) {
    String text = cycles.text().orElse("");
    if (text.equals("growing")) {
      return OptionalInt.empty();
    }
    if (!text.matches("[0-9]{1,6}")) {
      cycles.fault("cycles is " + cycles.shown(), "write growing or a number, 0 for none");
      return OptionalInt.of(0);
    }
    return OptionalInt.of(Integer.parseInt(text));
  }

  private List<String> lines(Entry entry) {
    List<String> edges =
        names.all().stream()
            .filter(n -> !n.endsWith(".inner_face") && !n.endsWith(".outer_face"))
            .toList();
    List<String> lines = new ArrayList<>();
    for (Entry item : entry.items()) {
      Optional<String> name = names.known() ? item.nameOf("edge", edges) : item.text();
      if (name.isPresent() && lines.contains(name.get())) {
        item.fault("edge '" + name.get() + "' stands here twice", "leave one out");
      }
      name.ifPresent(lines::add);
    }
    return List.copyOf(lines);
  }
}
