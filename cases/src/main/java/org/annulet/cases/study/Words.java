package org.annulet.cases.study;

import org.annulet.post.table.Numbers;
import org.apache.commons.math3.complex.Complex;

/** Numbers in the sentences of the damper study. */
final class Words {
  private Words() {}

  static String fixed(double value, int decimals) {
    return Numbers.fixed(value, decimals);
  }

  static String growth(double value) {
    return Double.isInfinite(value) || Double.isNaN(value) ? "–" : Numbers.signed(value);
  }

  static String hertz(Complex s) {
    return s.isNaN() ? "–" : fixed(s.getImaginary() / (2 * Math.PI), 1);
  }
}
