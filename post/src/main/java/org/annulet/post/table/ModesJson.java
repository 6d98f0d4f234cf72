package org.annulet.post.table;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import org.annulet.post.files.WholeFile;
import org.annulet.post.meaning.Certificate;
import org.annulet.post.meaning.GrowthBudget;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeLabel;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.meaning.PointSensitivity;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Mode;

/** {@code modes.json}: the results for other programs. Not estimated error bars are null. */
public final class ModesJson {
  private ModesJson() {}

  /**
   * Writes the file, whole or not at all.
   *
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path file, Results results) throws IOException {
    WholeFile.write(file, text(results));
  }

  /** The text of the file. */
  public static String text(Results results) {
    JsonWriter json = new JsonWriter();
    json.object()
        .text("case", results.caseName())
        .text("program", "annulet " + results.programVersion())
        .text("sign_convention", Results.SIGN_CONVENTION)
        .object("window")
        .numbers(
            "frequency_hz", results.window().lowestFrequency(), results.window().highestFrequency())
        .numbers(
            "growth_rate_per_s", results.window().lowestGrowth(), results.window().highestGrowth())
        .endObject();
    json.numberOrNull(
            "modes_by_argument_principle", results.count() < 0 ? null : (Integer) results.count())
        .truth("complete", results.complete())
        .array("certificates");
    for (Certificate c : results.certificates()) {
      json.object()
          .text("problem", c.operatorName())
          .numberOrNull("azimuthal_order", c.order())
          .numberOrNull("modes_by_argument_principle", c.count() < 0 ? null : (Integer) c.count())
          .number("modes_found", c.found())
          .truth("complete", c.complete());
      texts(json, "notes", c.notes());
      json.endObject();
    }
    json.endArray();
    modes(json, "modes", results.modes());
    modes(json, "modes_outside_window", results.outside());
    texts(json, "notes", results.notes());
    return json.endObject().toString();
  }

  private static void texts(JsonWriter json, String key, List<String> texts) {
    json.array(key);
    texts.forEach(json::text);
    json.endArray();
  }

  private static void sensitivities(JsonWriter json, List<ParameterSensitivity> all) {
    json.array("sensitivities");
    for (ParameterSensitivity s : all) {
      json.object()
          .text("key", s.key())
          .text("value", s.value())
          .number("growth_rate_change_per_s_per_percent", s.growthPerPercent())
          .number("frequency_change_hz_per_percent", s.frequencyPerPercent())
          .number("linear_range_percent", s.linearRange())
          .endObject();
    }
    json.endArray();
  }

  private static void points(JsonWriter json, List<PointSensitivity> all) {
    json.array("point_sensitivities");
    for (PointSensitivity s : all) {
      json.object()
          .text("key", s.key())
          .text("point", s.point())
          .text("coordinate", s.coordinate())
          .text("value", s.value())
          .number("growth_rate_change_per_s_per_mm", s.growthPerMillimetre())
          .number("frequency_change_hz_per_mm", s.frequencyPerMillimetre())
          .number("linear_range_mm", s.linearRange())
          .endObject();
    }
    json.endArray();
  }

  private static void modes(JsonWriter json, String key, List<ModeEntry> modes) {
    json.array(key);
    for (ModeEntry entry : modes) {
      Mode mode = entry.view().mode();
      ModeLabel label = entry.label();
      json.object()
          .number("frequency_hz", mode.frequency())
          .number("growth_rate_per_s", mode.growthRate())
          .numberOrNull("azimuthal_order", label.azimuthalOrder())
          .text("label", label.text())
          .number("multiplicity", mode.multiplicity())
          .number("backward_error", mode.backwardError())
          .number("frequency_error_hz", entry.view().frequencyError())
          .number("growth_rate_error_per_s", entry.view().growthError())
          .text("problem", entry.view().operatorName())
          .text("verdict", mode.verdict().name().toLowerCase(Locale.ROOT))
          .text("stability", entry.stability().name().toLowerCase(Locale.ROOT))
          .text("zone", label.zone())
          .number("zone_energy_share", label.zoneShare())
          .number("axial_nodes", label.axialNodes())
          .number("radial_nodes", label.radialNodes())
          .truth("bulk", label.bulk())
          .text("pairing", label.pairing().name().toLowerCase(Locale.ROOT))
          .text("pattern", label.pattern())
          .text("origin", label.origin().name().toLowerCase(Locale.ROOT));
      if (entry.budget().isPresent()) {
        GrowthBudget budget = entry.budget().get();
        json.array("growth_budget");
        for (GrowthBudget.Item item : budget.items()) {
          json.object()
              .text("item", item.name())
              .number("growth_share_per_s", item.growthShare())
              .number("first_order_frequency_shift_hz", item.frequencyShift())
              .endObject();
        }
        json.endArray().number("growth_budget_remainder_per_s", budget.remainder());
      }
      sensitivities(json, entry.sensitivities());
      points(json, entry.points());
      json.endObject();
    }
    json.endArray();
  }
}
