package org.annulet.cases.uncertainty;

import java.util.ArrayList;
import java.util.List;
import org.annulet.cases.points.PointText;
import org.apache.commons.math3.complex.Complex;

/**
 * The modes of one sample.
 *
 * @param members what has become of each nominal mode; NaN where it could not be followed
 * @param strangers modes that grow in the window and come from no nominal mode in it
 * @param complete whether a count confirms that no others are in the window; with scatter, whether
 *     all were found
 */
record Sample(List<Complex> members, int strangers, boolean complete) {
  /** Text form. */
  static final PointText<Sample> TEXT =
      new PointText<>() {
        @Override
        public String line(Sample s) {
          StringBuilder b =
              new StringBuilder()
                  .append(s.complete ? "complete" : "incomplete")
                  .append(' ')
                  .append(s.strangers);
          s.members.forEach(
              m -> b.append(' ').append(m.getReal()).append(' ').append(m.getImaginary()));
          return b.toString();
        }

        @Override
        public Sample parse(String line) {
          String[] words = line.split(" ");
          List<Complex> members = new ArrayList<>();
          for (int k = 2; k + 1 < words.length; k += 2) {
            members.add(
                new Complex(Double.parseDouble(words[k]), Double.parseDouble(words[k + 1])));
          }
          return new Sample(members, Integer.parseInt(words[1]), words[0].equals("complete"));
        }
      };
}
