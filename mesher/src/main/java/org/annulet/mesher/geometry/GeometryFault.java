package org.annulet.mesher.geometry;

import java.util.List;
import java.util.Locale;

/** The shape cannot be meshed; carries every fault found, each with place and remedy. */
public final class GeometryFault extends IllegalArgumentException {
  private static final long serialVersionUID = 1L;

  /** What kind of fault; for callers that react to one. */
  public enum Kind {
    /** A name that is used twice, unknown or empty. */
    NAME,
    /** A coordinate or length that is not finite or not positive. */
    VALUE,
    /** An edge or part of one without length, or an arc through three points in line. */
    ZERO_LENGTH,
    /** Two edges cross. */
    CROSSING,
    /** Two edges, or an edge and a point, touch away from a common end. */
    TOUCHING,
    /** A loop of edges does not close. */
    OPEN,
    /** An edge belongs to more than two zones, twice to one, or to none. */
    USE,
    /** Two zones cover the same ground. */
    OVERLAP,
    /** A hole lies outside its zone or a zone reaches beyond its loop. */
    LEAK
  }

  /**
   * One fault.
   *
   * @param kind its kind
   * @param what what is wrong, with the names concerned
   * @param x where, in m; NaN if it has no place
   * @param y where, in m; NaN if it has no place
   * @param mend how to mend it
   */
  public record Fault(Kind kind, String what, double x, double y, String mend) {
    @Override
    public String toString() {
      String where = Double.isNaN(x) ? "" : String.format(Locale.ROOT, " at (%.6g, %.6g) m", x, y);
      return what + where + System.lineSeparator() + "    mend: " + mend;
    }
  }

  /**
   * An edge as far as it could be drawn, for a picture of the spot.
   *
   * @param edge its name
   * @param x first coordinates of points along it in m, not modified
   * @param y second coordinates in m, not modified
   */
  public record Line(String edge, double[] x, double[] y) {}

  private final transient List<Fault> faults;
  private final transient List<Line> drawing;

  /**
   * An exception for these faults.
   *
   * @param faults at least one
   */
  public GeometryFault(List<Fault> faults) {
    this(faults, List.of());
  }

  /**
   * An exception for these faults.
   *
   * @param faults at least one
   * @param drawing the edges as far as they could be drawn
   */
  public GeometryFault(List<Fault> faults, List<Line> drawing) {
    super(text(faults));
    this.faults = List.copyOf(faults);
    this.drawing = List.copyOf(drawing);
  }

  /** The edges as far as they could be drawn; may be empty. */
  public List<Line> drawing() {
    return drawing;
  }

  /** The faults, at least one. */
  public List<Fault> faults() {
    return faults;
  }

  private static String text(List<Fault> faults) {
    StringBuilder s = new StringBuilder();
    for (Fault f : faults) {
      if (s.length() > 0) {
        s.append(System.lineSeparator());
      }
      s.append(f);
    }
    return s.toString();
  }
}
