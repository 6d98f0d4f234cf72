package org.annulet.post.chart;

/**
 * A thing to show in the picture of the chamber.
 *
 * @param name what it is
 * @param kind how to draw it
 * @param x first coordinate of the mesh in m
 * @param y second coordinate in m
 */
public record Marker(String name, Kind kind, double x, double y) {
  /** How to draw it. */
  public enum Kind {
    /** A flame. */
    FLAME,
    /** A damper or another port. */
    PORT
  }
}
