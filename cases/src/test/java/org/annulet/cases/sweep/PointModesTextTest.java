package org.annulet.cases.sweep;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;
import org.apache.commons.math3.complex.Complex;
import org.junit.jupiter.api.Test;

/** Points as lines of text. */
class PointModesTextTest {
  private static PointMode mode(String part, double growth, double hertz, double... shape) {
    return new PointMode(
        new Complex(growth, 2 * Math.PI * hertz), part, null, 1, 1e-12, shape, shape.clone());
  }

  @Test
  void lines_readBackToTheLastBit() {
    PointModesText text = new PointModesText();
    PointModes modes =
        new PointModes(
            List.of(
                mode("Bloch number 3", -1.0 / 3, 1234.567890123, 0.3, -0.7, 1e-9),
                mode("", 2.5e-11, 99, 1, 2, 3)),
            false);

    String line = text.line(modes);

    assertThat(text.line(text.parse(line))).isEqualTo(line);
    assertThat(text.parse(line).modes().get(0).s()).isEqualTo(modes.modes().get(0).s());
    assertThat(text.parse(line).complete()).isFalse();
  }
}
