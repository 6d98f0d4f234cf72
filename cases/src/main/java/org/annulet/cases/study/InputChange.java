package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseSource;
import org.annulet.cases.read.Geometry;

/**
 * One number of a case and the case with that number a little smaller and a little larger.
 *
 * @param value as it stands in the case
 * @param smaller the case with value · (1 − step)
 * @param larger the case with value · (1 + step)
 */
record InputChange(CaseSource.Value value, CaseFile smaller, CaseFile larger) {
  /**
   * Relative step. The operator's first difference errs by a sixth of the square of step · ωτ for a
   * delay of ωτ turns; its second difference by rounding over the square of the step.
   */
  static final double STEP = 2e-4;

  /** m, mm, cm and µm in m. */
  private static final double[] LENGTH_UNITS = {1, 1e-3, 1e-2, 1e-6};

  /** Parts of a case that do not enter its operators, or only through the mesh. */
  private static final List<String> NOT_INPUTS =
      List.of("geometry", "window", "studies", "outputs", "variants");

  /**
   * The numbers of a case that can be changed by themselves on the same mesh, which of a ring may
   * be drawn out: all but those of an outline and of the mesh's sizes, those that are zero and
   * those bound to others, as the parts of a blend.
   */
  static List<CaseSource.Value> candidates(CaseFile caseFile) {
    boolean ownDampers =
        caseFile
            .with(Map.of())
            .caseFile()
            .map(c -> c.dampers().equals(caseFile.dampers()))
            .orElse(false);
    return caseFile.source().values().stream()
        .filter(v -> ownDampers || !in("dampers", v.key()))
        .filter(v -> v.si() != 0 && Double.isFinite(v.si()))
        .filter(v -> !v.text().equals(CaseSource.Value.DEFAULT))
        .filter(
            v ->
                NOT_INPUTS.stream().noneMatch(part -> in(part, v.key()))
                    || isRingDimension(caseFile, v.key()))
        .toList();
  }

  /** Length, gap, radius, bore or area of a ring's zone: the mesh can be drawn out to it. */
  private static boolean isRingDimension(CaseFile caseFile, String key) {
    return caseFile.geometry() instanceof Geometry.Ring && in("geometry.zones", key);
  }

  private static boolean in(String part, String key) {
    return key.equals(part) || key.startsWith(part + ".");
  }

  /** The two changed cases; empty where the number cannot be changed by itself. */
  static Optional<InputChange> of(CaseFile caseFile, CaseSource.Value value) {
    Optional<CaseFile> smaller = changed(caseFile, value, 1 - STEP);
    Optional<CaseFile> larger = changed(caseFile, value, 1 + STEP);
    return smaller.isPresent() && larger.isPresent()
        ? Optional.of(new InputChange(value, smaller.get(), larger.get()))
        : Optional.empty();
  }

  private static Optional<CaseFile> changed(
      CaseFile caseFile, CaseSource.Value value, double factor) {
    double wanted = value.si() * factor;
    // A list may state its unit once; there the numbers carry none.
    return changed(
        caseFile, value, wanted, List.of(withUnit(value, wanted), scaled(value.text(), factor)));
  }

  /**
   * The case with a length set to another value, which may have been zero.
   *
   * @param wanted in m
   */
  static Optional<CaseFile> to(CaseFile caseFile, CaseSource.Value value, double wanted) {
    List<String> texts = new ArrayList<>(List.of(withUnit(value, wanted)));
    // Bare numbers take the unit their list states: the reading tells which it is.
    for (double unit : LENGTH_UNITS) {
      texts.add(String.format(Locale.ROOT, "%.17g", wanted / unit));
    }
    return changed(caseFile, value, wanted, texts);
  }

  private static String withUnit(CaseSource.Value value, double wanted) {
    return (wanted + " " + value.kind().siUnit()).strip();
  }

  private static Optional<CaseFile> changed(
      CaseFile caseFile, CaseSource.Value value, double wanted, List<String> texts) {
    for (String text : texts) {
      if (text.isEmpty()) {
        continue;
      }
      Optional<CaseFile> c =
          caseFile
              .with(Map.of(value.key(), text))
              .caseFile()
              .map(changed -> withDampersOf(caseFile, changed, value.key()));
      if (c.isPresent() && c.get().source().values().stream().anyMatch(v -> is(v, value, wanted))) {
        return c;
      }
    }
    return Optional.empty();
  }

  /** A study may have put dampers on the case that its file does not hold. */
  private static CaseFile withDampersOf(CaseFile caseFile, CaseFile changed, String key) {
    return in("dampers", key) || changed.dampers().equals(caseFile.dampers())
        ? changed
        : changed.withDampers(caseFile.dampers());
  }

  private static boolean is(CaseSource.Value got, CaseSource.Value value, double wanted) {
    return got.key().equals(value.key()) && Math.abs(got.si() - wanted) < 1e-9 * Math.abs(wanted);
  }

  /** The number at the beginning of a text, scaled; empty without one. */
  private static String scaled(String text, double factor) {
    String number = text.strip().replaceFirst("[^0-9.eE+-].*", "");
    try {
      return String.format(Locale.ROOT, "%.15g", Double.parseDouble(number) * factor);
    } catch (NumberFormatException e) {
      return "";
    }
  }
}
