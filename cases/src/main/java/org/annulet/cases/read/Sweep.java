package org.annulet.cases.read;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * Inputs that vary together along one axis or two.
 *
 * @param along the first axis
 * @param across the second; empty for a sweep along a line
 */
public record Sweep(Axis along, Optional<Axis> across) {
  /**
   * One axis.
   *
   * @param name for charts and tables
   * @param from number shown at its beginning
   * @param to number shown at its end
   * @param points on it, at least 2
   * @param inputs what is set on the way, by key path
   */
  public record Axis(String name, double from, double to, int points, Map<String, Knots> inputs) {
    /** Copies the inputs. */
    public Axis {
      inputs = java.util.Collections.unmodifiableMap(new LinkedHashMap<>(inputs));
    }

    /** The number shown at a share of the way. */
    public double shown(double share) {
      return from + share * (to - from);
    }

    /** What is set at a share of the way, 0 to 1: text by key path. */
    public Map<String, String> at(double share) {
      Map<String, String> set = new LinkedHashMap<>();
      inputs.forEach((key, knots) -> set.put(key, knots.at(share)));
      return set;
    }
  }

  /**
   * Values of one input, evenly spaced along its axis and joined by straight lines.
   *
   * @param values at least 2, in {@code unit}
   * @param unit as written; empty for a plain number
   */
  public record Knots(List<Double> values, String unit) {
    /** Copies the values. */
    public Knots {
      values = List.copyOf(values);
    }

    /** The value at a share of the way as text for the case file; whole numbers without a point. */
    public String at(double share) {
      double place = Math.max(0, Math.min(1, share)) * (values.size() - 1);
      int k = Math.min((int) place, values.size() - 2);
      double t = place - k;
      double v = t == 0 ? values.get(k) : (1 - t) * values.get(k) + t * values.get(k + 1);
      String number =
          v == Math.rint(v) && Math.abs(v) < 1e9 ? Long.toString((long) v) : Double.toString(v);
      return (number + " " + unit).strip();
    }
  }
}
