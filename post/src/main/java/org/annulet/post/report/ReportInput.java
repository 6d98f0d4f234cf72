package org.annulet.post.report;

import java.util.List;
import org.annulet.post.chart.Marker;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.Results;
import org.annulet.post.meaning.TermSensitivity;

/**
 * All the report shows.
 *
 * @param results modes, certificates, notes
 * @param chamber mesh and kind of geometry
 * @param facts the case as understood
 * @param markers flames and ports in the picture
 * @param sensitivities for each mode its sensitivities, an empty list where they were not made;
 *     shape [modes] or empty
 */
public record ReportInput(
    Results results,
    Chamber chamber,
    List<Fact> facts,
    List<Marker> markers,
    List<List<TermSensitivity>> sensitivities) {
  /** Checks the shapes. */
  public ReportInput {
    if (!sensitivities.isEmpty() && sensitivities.size() != results.modes().size()) {
      throw new IllegalArgumentException(
          "sensitivities of "
              + sensitivities.size()
              + " modes for "
              + results.modes().size()
              + " modes; give one list for each or none at all");
    }
  }

  /** Without case, marks and sensitivities. */
  public static ReportInput of(Results results, Chamber chamber) {
    return new ReportInput(results, chamber, List.of(), List.of(), List.of());
  }
}
