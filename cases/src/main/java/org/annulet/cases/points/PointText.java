package org.annulet.cases.points;

/** The result of a point as a line of text. */
public interface PointText<R> {
  /** One line, without line breaks. */
  String line(R result);

  /**
   * The result a line stands for: {@code line(parse(t))} is {@code t}.
   *
   * @throws IllegalArgumentException if the line was not made by {@link #line}
   */
  R parse(String line);
}
