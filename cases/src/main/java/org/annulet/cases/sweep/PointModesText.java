package org.annulet.cases.sweep;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.annulet.cases.points.PointText;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;
import org.apache.commons.math3.complex.Complex;

/** The modes of a point as a line: eigenvalues to the last bit, shapes to five decimals. */
final class PointModesText implements PointText<PointModes> {
  @Override
  public String line(PointModes result) {
    StringBuilder b = new StringBuilder(result.complete() ? "complete" : "incomplete");
    for (PointMode m : result.modes()) {
      b.append('\t')
          .append(m.part())
          .append('|')
          .append(m.order() == null ? "-" : m.order().toString())
          .append('|')
          .append(m.copies())
          .append('|')
          .append(m.s().getReal())
          .append(' ')
          .append(m.s().getImaginary())
          .append(' ')
          .append(m.backwardError());
      append(b, m.shapeRe());
      append(b, m.shapeIm());
    }
    return b.toString();
  }

  private static void append(StringBuilder b, double[] values) {
    b.append('|');
    for (int i = 0; i < values.length; i++) {
      b.append(i == 0 ? "" : " ").append(String.format(Locale.ROOT, "%.5f", values[i]));
    }
  }

  @Override
  public PointModes parse(String line) {
    String[] parts = line.split("\t");
    List<PointMode> modes = new ArrayList<>();
    for (int i = 1; i < parts.length; i++) {
      String[] field = parts[i].split("\\|", -1);
      if (field.length != 6) {
        throw new IllegalArgumentException("not a mode of a point: " + parts[i]);
      }
      double[] s = numbers(field[3]);
      modes.add(
          new PointMode(
              new Complex(s[0], s[1]),
              field[0],
              field[1].equals("-") ? null : Integer.valueOf(field[1]),
              Integer.parseInt(field[2]),
              s[2],
              numbers(field[4]),
              numbers(field[5])));
    }
    return new PointModes(modes, parts[0].equals("complete"));
  }

  private static double[] numbers(String text) {
    String[] words = text.split(" ");
    double[] out = new double[words.length];
    for (int i = 0; i < out.length; i++) {
      out[i] = Double.parseDouble(words[i]);
    }
    return out;
  }
}
