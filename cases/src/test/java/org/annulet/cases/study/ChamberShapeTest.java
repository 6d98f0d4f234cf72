package org.annulet.cases.study;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.file.Path;
import java.util.Map;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseReader;
import org.annulet.mesher.mesh.Mesh;
import org.annulet.mesher.mesh.Quality;
import org.junit.jupiter.api.Test;

class ChamberShapeTest {
  /** Cold gas carries shorter waves: its triangles become smaller, the hot zone's hardly so. */
  @Test
  void sidesPerWavelength_refineTheZonesThatNeedIt() {
    Path ring = Path.of("reverse-flow");
    CaseFile plain = CaseReader.read(ring, Map.of("geometry.mesh_size", "30 mm")).orThrow();
    CaseFile ruled =
        CaseReader.read(
                ring, Map.of("geometry.mesh_size", "30 mm", "geometry.sides_per_wavelength", "30"))
            .orThrow();
    Mesh coarse = ChamberShape.of(plain).mesh();
    Mesh fine = ChamberShape.of(ruled).mesh();
    double top = plain.window().highestFrequency();
    double cold = Math.sqrt(1.371 * 287 * 650);
    double hot = Math.sqrt(1.288 * 297 * 1740);
    assertThat(Quality.of(coarse).pointsPerWavelength("plenum", cold, top)).isLessThan(20);
    assertThat(Quality.of(fine).pointsPerWavelength("plenum", cold, top)).isBetween(29.0, 40.0);
    assertThat(Quality.of(fine).pointsPerWavelength("chamber", hot, top)).isGreaterThan(29);
    assertThat(fine.triangleCount()).isGreaterThan(coarse.triangleCount());
  }
}
