package org.annulet.post.table;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import java.util.Optional;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Meshes;
import org.annulet.post.meaning.Chamber;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.ModeView;
import org.annulet.post.meaning.NodeLine;
import org.annulet.post.meaning.Results;
import org.annulet.solver.modes.Window;
import org.junit.jupiter.api.Test;

/** Mode shapes along lines, read back from the text. */
class ShapesCsvTest {
  private static Results results(ModeView view) {
    return new Results(
        "invented",
        "0",
        new Window(1, 2, -1, 1),
        List.of(),
        List.of(new ModeEntry(view, null, Optional.empty())),
        List.of(),
        List.of());
  }

  private static double[][] rows(String text) {
    return text.lines()
        .skip(1)
        .map(l -> l.substring(l.indexOf(',') + 1).split(","))
        .map(c -> java.util.Arrays.stream(c).mapToDouble(Double::parseDouble).toArray())
        .toArray(double[][]::new);
  }

  /** p = cos(πx) along the lower wall of a rig, from the upstream end, every node once. */
  @Test
  void halfWaveAlongAWall_isACosineOfTheDistance() {
    Mesh mesh = Meshes.rectangle(new double[] {1, 0, 0.2}, 20, 4, "gas");
    Chamber rig = Chamber.plane(mesh);
    ModeView view =
        Meshes.mode(
            mesh, new double[] {170, 0}, null, (x, y) -> Math.cos(Math.PI * x), (x, y) -> x);
    String text = ShapesCsv.text(results(view), rig, List.of(NodeLine.ofEdge(rig, "low")));
    assertThat(text.lines().findFirst().orElseThrow())
        .isEqualTo(
            "line,piece,distance_m,x_m,y_m,mode,frequency_hz,p_magnitude,p_phase_deg,p_real,p_imag");
    double[][] rows = rows(text);
    assertThat(rows).hasNumberOfRows(21);
    for (int k = 0; k < 21; k++) {
      double x = k / 20.0;
      double[] r = rows[k];
      assertThat(r[1]).isCloseTo(x, within(1e-6)); // distance; single precision
      assertThat(r[2]).isCloseTo(x, within(1e-6));
      assertThat(r[4]).isEqualTo(1);
      assertThat(r[5]).isEqualTo(170);
      double p = Math.cos(Math.PI * x);
      assertThat(r[8]).isCloseTo(p, within(1e-6));
      assertThat(r[9]).isCloseTo(x, within(1e-6));
      assertThat(r[6]).isCloseTo(Math.hypot(p, x), within(1e-6));
      assertThat(r[7]).isCloseTo(Math.toDegrees(Math.atan2(x, p)), within(1e-4));
    }
  }

  /** The end wall of a ring unrolled at 0.4 m, with its zone at 0.5 m: once round is 2π · 0.5 m. */
  @Test
  void endOfARing_isWalkedOnceRound_inTrueLength() {
    Mesh mesh = Meshes.ring(0.6, 2 * Math.PI * 0.4, 6, 36, "chamber");
    Chamber ring = Chamber.ring(mesh, new double[] {0.5});
    ModeView view =
        Meshes.mode(mesh, new double[] {300, 0}, null, (x, y) -> Math.cos(y / 0.4), (x, y) -> 0);
    List<NodeLine> usual = NodeLine.usual(ring);
    assertThat(usual)
        .extracting(NodeLine::name)
        .containsExactly("centre_of_burner_1", "left", "right");
    assertThat(usual.get(0).stops()).hasSize(7);
    double[][] rows = rows(ShapesCsv.text(results(view), ring, usual.subList(1, 2)));
    assertThat(rows).hasNumberOfRows(36);
    for (double[] r : rows) {
      double angle = Math.toRadians(r[3]);
      double either = Math.min(r[1], 2 * Math.PI * 0.5 - r[1]); // whichever way round
      assertThat(either).isCloseTo(0.5 * Math.min(angle, 2 * Math.PI - angle), within(1e-5));
      assertThat(r[8]).isCloseTo(Math.cos(angle), within(1e-6));
    }
    assertThat(rows[35][1]).isCloseTo(2 * Math.PI * 0.5 * 35 / 36, within(1e-5));
  }

  @Test
  void unknownEdge_isRefusedWithTheNamesThereAre() {
    Chamber rig = Chamber.plane(Meshes.rectangle(new double[] {1, 0, 0.2}, 4, 2, "gas"));
    assertThatThrownBy(() -> NodeLine.ofEdge(rig, "hub"))
        .isInstanceOf(IllegalArgumentException.class)
        .hasMessageContaining("no edge 'hub'")
        .hasMessageContaining("low");
  }
}
