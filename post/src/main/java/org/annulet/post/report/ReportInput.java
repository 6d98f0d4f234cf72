package org.annulet.post.report;

import java.util.List;
import org.annulet.post.chart.Marker;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.Results;

/**
 * All the report shows.
 *
 * @param results modes, certificates, notes
 * @param chamber mesh and kind of geometry
 * @param facts the case as understood
 * @param markers flames and ports in the picture
 */
public record ReportInput(
    Results results, Chamber chamber, List<Fact> facts, List<Marker> markers) {

  /** Without case and marks. */
  public static ReportInput of(Results results, Chamber chamber) {
    return new ReportInput(results, chamber, List.of(), List.of());
  }
}
