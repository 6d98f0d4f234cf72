package org.annulet.cases.read;

import java.util.List;
import java.util.Optional;

/**
 * Modes of the chamber known from elsewhere.
 *
 * @param name given in the case
 * @param about free text; may be empty
 * @param origin where they come from
 * @param file name of the table
 * @param rows its modes
 */
public record ModeTable(String name, String about, Origin origin, String file, List<Row> rows) {
  /** Copies the rows. */
  public ModeTable {
    rows = List.copyOf(rows);
  }

  /** Where modes come from. */
  public enum Origin {
    /** Another model. */
    NETWORK_MODEL,
    /** A test. */
    MEASURED
  }

  /**
   * One mode.
   *
   * @param line of the file it stands on
   * @param frequency in Hz
   * @param frequencyTolerance in Hz; 0 where none is given
   * @param growthRate in 1/s; NaN where none is given
   * @param growthTolerance in 1/s; 0 where none is given
   * @param order azimuthal order, not negative; −1 where none is given
   * @param shape along the axis, where given
   */
  public record Row(
      int line,
      double frequency,
      double frequencyTolerance,
      double growthRate,
      double growthTolerance,
      int order,
      Optional<Shape> shape) {
    /** Whether a growth rate is given. */
    public boolean hasGrowth() {
      return !Double.isNaN(growthRate);
    }
  }

  /**
   * A mode shape along the axis, up to a complex factor. Arrays are not copied and must not be
   * modified.
   *
   * @param x axial coordinate in m, increasing
   * @param re real part of p̂
   * @param im imaginary part
   */
  public record Shape(double[] x, double[] re, double[] im) {}
}
