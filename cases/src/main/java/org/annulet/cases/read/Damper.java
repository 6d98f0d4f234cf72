package org.annulet.cases.read;

import java.util.List;

/**
 * Equal dampers at one or several places.
 *
 * @param name of the entry
 * @param design what they are
 * @param gasOf zone whose mean gas fills them; empty for the gas at the mouth
 * @param places where they sit, at least one
 * @param mouthWidth width of the patch of wall each one sees, in m; NaN for √(mouth area)
 */
public record Damper(
    String name, Design design, String gasOf, List<Place> places, double mouthWidth) {
  /** Copies the places. */
  public Damper {
    places = List.copyOf(places);
  }

  /** What a damper is. */
  public sealed interface Design {
    /** Area of the mouth in m². */
    double mouthArea();

    /** Resistance over ρc of the gas in it, without that of a flow through it. */
    double resistance();

    /** Loss coefficient times velocity of a flow through it, ζū in m/s. */
    double lossVelocity();

    /**
     * All of its resistance over ρc: to Δp = ζρu²/2 with a mean velocity ū belongs ζū/c.
     *
     * @param soundSpeed c of the gas in it in m/s
     */
    default double resistance(double soundSpeed) {
      return resistance() + lossVelocity() / soundSpeed;
    }
  }

  /**
   * Neck and volume (Helmholtz).
   *
   * @param neckBore diameter of one neck in m
   * @param necks number of equal necks side by side
   * @param neckLength as drawn, in m
   * @param addedLength end correction in radii of a neck
   * @param volume in m³
   * @param resistance of the neck over ρc of the gas in it, without that of a flow through it
   * @param lossVelocity loss coefficient times velocity of the flow through the neck in m/s; 0
   *     without
   */
  public record Resonator(
      double neckBore,
      int necks,
      double neckLength,
      double addedLength,
      double volume,
      double resistance,
      double lossVelocity)
      implements Design {
    @Override
    public double mouthArea() {
      return necks * Math.PI / 4 * neckBore * neckBore;
    }

    /** Length of the neck with its end correction in m. */
    public double effectiveLength() {
      return neckLength + addedLength * neckBore / 2;
    }
  }

  /**
   * A tube closed at its far end.
   *
   * @param bore in m
   * @param length as drawn, in m
   * @param addedLength end correction in radii
   * @param resistance at the mouth over ρc of the gas in it, without that of a flow through it
   * @param lossVelocity loss coefficient times velocity of the flow through the mouth in m/s; 0
   *     without
   */
  public record QuarterWave(
      double bore, double length, double addedLength, double resistance, double lossVelocity)
      implements Design {
    @Override
    public double mouthArea() {
      return Math.PI / 4 * bore * bore;
    }

    /** Length with its end correction in m. */
    public double effectiveLength() {
      return length + addedLength * bore / 2;
    }
  }

  /** Where one damper sits, or N equal ones round a section. */
  public sealed interface Place {}

  /**
   * On a boundary edge, at the point of it nearest to (x, y).
   *
   * @param edge name of the edge
   * @param x in m
   * @param y in m; radius on a section
   * @param count equal dampers round a section; 1 elsewhere
   */
  public record OnEdge(String edge, double x, double y, int count) implements Place {}

  /**
   * On a face of a ring's annulus.
   *
   * @param face name of the face, as in {@code chamber.outer_face}
   * @param x in m
   * @param angle in rad; burner 1 is at 0
   */
  public record OnFace(String face, double x, double angle) implements Place {
    /** The zone the face belongs to. */
    public String zone() {
      return face.substring(0, face.lastIndexOf('.'));
    }
  }
}
