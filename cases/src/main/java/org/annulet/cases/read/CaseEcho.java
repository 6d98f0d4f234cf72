package org.annulet.cases.read;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.units.QuantityKind;

/** What was understood, as lines of text: key, text of the file, value in SI. */
public final class CaseEcho {
  private CaseEcho() {}

  /**
   * One line per value, in the order of reading.
   *
   * @param caseFile a case
   * @return lines without line ends
   */
  public static List<String> lines(CaseFile caseFile) {
    List<CaseSource.Value> values = caseFile.source().values();
    int keys = values.stream().mapToInt(v -> v.key().length()).max().orElse(0);
    int texts = values.stream().mapToInt(v -> v.text().length()).max().orElse(0);
    List<String> lines = new ArrayList<>();
    lines.add(caseFile.title());
    for (CaseSource.Value v : values) {
      lines.add(
          String.format(
                  Locale.ROOT,
                  "  %-" + Math.max(1, keys) + "s  %-" + Math.max(1, texts) + "s  = %s %s",
                  v.key(),
                  v.text(),
                  number(v.si()),
                  unit(v.kind()))
              .stripTrailing());
    }
    if (!caseFile.azimuthalOrders().isEmpty()) {
      lines.add("  azimuthal orders " + caseFile.azimuthalOrders());
    }
    for (CaseFile.Variant variant : caseFile.variants()) {
      lines.add("variant " + variant.name() + differences(caseFile, variant.caseFile()));
    }
    return List.copyOf(lines);
  }

  private static String differences(CaseFile base, CaseFile changed) {
    StringBuilder text = new StringBuilder();
    for (CaseSource.Value v : changed.source().values()) {
      boolean same =
          base.source().values().stream()
              .anyMatch(b -> b.key().equals(v.key()) && b.si() == v.si());
      if (!same) {
        text.append(System.lineSeparator())
            .append("  ")
            .append(v.key())
            .append("  ")
            .append(v.text())
            .append("  = ")
            .append((number(v.si()) + " " + unit(v.kind())).strip());
      }
    }
    return text.toString();
  }

  /** Shortest decimal that reads back as the same number, rounded to 12 digits. */
  private static String number(double x) {
    double rounded = Double.parseDouble(String.format(Locale.ROOT, "%.11e", x));
    String text = Double.toString(rounded);
    return text.endsWith(".0") ? text.substring(0, text.length() - 2) : text;
  }

  private static String unit(QuantityKind kind) {
    return kind.siUnit();
  }
}
