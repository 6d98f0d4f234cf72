package org.annulet.post.report;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.post.Demo;
import org.annulet.post.Meshes;
import org.annulet.post.meaning.ModeEntry;
import org.annulet.post.meaning.Results;
import org.annulet.post.vtk.Surface;
import org.junit.jupiter.api.Test;

class ThinMeshTest {
  @Test
  void thinnedMesh_coversTheSameAreaWithoutOverlap() {
    Mesh mesh = Meshes.ring(0.6, 2.5, 60, 240, "plenum", "burner", "chamber");
    Surface flat = Surface.flat(mesh);
    ThinMesh.Thinned thin = ThinMesh.of(mesh, flat, 2000);
    assertThat(thin.points().length).isLessThanOrEqualTo(2000);
    double area = 0;
    for (int t = 0; t < thin.triangles().length; t += 3) {
      int a = thin.points()[thin.triangles()[t]];
      int b = thin.points()[thin.triangles()[t + 1]];
      int c = thin.points()[thin.triangles()[t + 2]];
      double one =
          0.5
              * ((flat.coordinate(b, 0) - flat.coordinate(a, 0))
                      * (flat.coordinate(c, 1) - flat.coordinate(a, 1))
                  - (flat.coordinate(c, 0) - flat.coordinate(a, 0))
                      * (flat.coordinate(b, 1) - flat.coordinate(a, 1)));
      assertThat(one).isPositive();
      area += one;
    }
    // all triangles positive and the sum right: a tiling without overlap (outline is straight)
    assertThat(area).isCloseTo(1.5, within(1e-9));
  }

  @Test
  void circularOutline_losesLittleOfTheArea() {
    Mesh mesh = Meshes.annulus(0.3, 0.5, 40, 400);
    Surface flat = Surface.flat(mesh);
    ThinMesh.Thinned thin = ThinMesh.of(mesh, flat, 3000);
    assertThat(thin.points().length).isLessThanOrEqualTo(3000);
    double area = 0;
    for (int t = 0; t < thin.triangles().length; t += 3) {
      int a = thin.points()[thin.triangles()[t]];
      int b = thin.points()[thin.triangles()[t + 1]];
      int c = thin.points()[thin.triangles()[t + 2]];
      area +=
          0.5
              * ((flat.coordinate(b, 0) - flat.coordinate(a, 0))
                      * (flat.coordinate(c, 1) - flat.coordinate(a, 1))
                  - (flat.coordinate(c, 0) - flat.coordinate(a, 0))
                      * (flat.coordinate(b, 1) - flat.coordinate(a, 1)));
    }
    // sides of at most twice 3° of arc: a chord of angle α loses α²/24 of the radius
    assertThat(area).isCloseTo(Math.PI * (0.25 - 0.09), within(0.005));
  }

  @Test
  void pageOfAHundredThousandNodesAndTwentyModes_isBelowEightMegabytes() {
    Demo demo = new Demo(250, 400);
    List<ModeEntry> twenty = new ArrayList<>();
    for (int i = 0; i < 20; i++) {
      twenty.add(demo.results.modes().get(i % 6));
    }
    Results r = demo.results;
    Results big =
        new Results(
            r.caseName(),
            r.programVersion(),
            r.window(),
            r.certificates(),
            twenty,
            List.of(),
            List.of());
    String page = HtmlReport.html(ReportInput.of(big, demo.chamber));
    assertThat(page.length()).isBetween(500_000, 8_000_000);
  }
}
