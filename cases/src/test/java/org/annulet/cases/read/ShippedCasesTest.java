package org.annulet.cases.read;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.file.Path;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The shipped cases read without a fault or caution, and say what their files say. */
class ShippedCasesTest {
  static final Path CASES = Path.of("").toAbsolutePath();

  @ParameterizedTest
  @ValueSource(strings = {"hydrogen-ring", "reverse-flow", "quiet-loud-quiet"})
  void shippedCase_readsWithoutFault_andSaysItIsInvented(String name) {
    Reading reading = CaseReader.read(CASES.resolve(name));
    assertThat(reading.problems()).isEmpty();
    assertThat(reading.cautions()).isEmpty();
    assertThat(reading.orThrow().about()).contains("Invented");
  }

  @Test
  void hydrogenRing_isInSi() {
    CaseFile c = CaseReader.read(CASES.resolve("hydrogen-ring")).orThrow();
    Geometry.Ring ring = (Geometry.Ring) c.geometry();
    assertThat(ring.burnerCount()).isEqualTo(14);
    assertThat(ring.unrolledRadius()).isEqualTo(0.33);
    assertThat(ring.zone("burners")).isEqualTo(new Geometry.Ducts("burners", 0.345, 0.052, 0.1));
    assertThat(ring.start("chamber")).isCloseTo(0.3, within(1e-15));
    assertThat(c.gas().meanPressure()).isEqualTo(1.2e6);
    assertThat(c.gas().zones().get("burners")).isEqualTo(c.gas().zones().get("plenum"));
    assertThat(c.flames()).hasSize(1);
    Flame flame = c.flames().get(0);
    assertThat(flame.heatRelease()).isEqualTo(15.5e6);
    assertThat(flame.reference()).isEqualTo(new Flame.EdgeFlux("burners.outlet", "burners"));
    assertThat(flame.responseAt(3)).isEqualTo(new Flame.GainDelay(0.7, 2.15e-3));
    assertThat(c.window().lowestFrequency()).isEqualTo(60);
    assertThat(c.window().lowestGrowth()).isEqualTo(-600);
    assertThat(c.wall("chamber.downstream")).isEqualTo(new Wall.Admittance(0.06, 0));
    assertThat(c.twoPorts())
        .containsExactly(
            new TwoPort(
                "burners.inlet", "plenum", OptionalDouble.of(0.9), OptionalDouble.empty(), 57, 0));
    assertThat(c.wall("burners.side")).isEqualTo(new Wall.Rigid());
  }

  @Test
  void variants_changeOnlyWhatTheySet() {
    CaseFile c = CaseReader.read(CASES.resolve("quiet-loud-quiet")).orThrow();
    assertThat(c.variants())
        .extracting(CaseFile.Variant::name)
        .containsExactly("hydrogen_30", "hydrogen_45", "hydrogen_60");
    CaseFile last = c.variants().get(2).caseFile();
    assertThat(last.flames().get(0).responseAt(1)).isEqualTo(new Flame.GainDelay(0.8, 1.7e-3));
    assertThat(last.geometry()).isEqualTo(c.geometry());
    assertThat(last.gas()).isEqualTo(c.gas());
    assertThat(last.window()).isEqualTo(c.window());
  }
}
