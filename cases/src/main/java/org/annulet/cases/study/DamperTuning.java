package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.DamperSearch;
import org.annulet.solver.ports.DampedRoots;
import org.apache.commons.math3.analysis.UnivariateFunction;
import org.apache.commons.math3.optim.MaxEval;
import org.apache.commons.math3.optim.nonlinear.scalar.GoalType;
import org.apache.commons.math3.optim.univariate.BrentOptimizer;
import org.apache.commons.math3.optim.univariate.SearchInterval;
import org.apache.commons.math3.optim.univariate.UnivariateObjectiveFunction;
import org.apache.commons.math3.optim.univariate.UnivariatePointValuePair;

/** What other tuning, resistance, detuning and a failed damper do to the best pattern. */
final class DamperTuning {
  /** Detuning of the robustness check, relative. */
  static final double DETUNED = 0.05;

  private static final double[] TUNING = {0.7, 1.4};
  private static final double[] RESISTANCE = {0.005, 5};
  private static final int SCAN = 21;
  private static final int EVALUATIONS = 40;

  private final DamperPorts ports;
  private final int[] pattern;

  DamperTuning(DamperPorts ports, int[] pattern) {
    this.ports = ports;
    this.pattern = pattern;
  }

  /**
   * The best value of one property of one design, all else as given.
   *
   * @param given value, as the case file has it
   * @param best value
   * @param worst largest growth rate in 1/s with it
   */
  record Optimum(double given, double best, double worst) {}

  /**
   * What was found for one design.
   *
   * @param name of the design
   * @param frequency of its resonance against a hard wall, in Hz, from 0.7 to 1.4 times the given
   * @param resistance over ρc of the gas in it, from 0.005 to 5
   */
  record OfDesign(String name, Optimum frequency, Optimum resistance) {}

  /**
   * What becomes of the worst growth rate in 1/s.
   *
   * @param tooLow all dampers tuned 5 % too low
   * @param tooHigh all dampers tuned 5 % too high
   * @param failed by position, with the damper there shut; NaN where none sits
   */
  record Robustness(double tooLow, double tooHigh, double[] failed) {}

  Robustness robustness() {
    double[] failed = new double[pattern.length];
    Arrays.fill(failed, Double.NaN);
    for (int p = 0; p < pattern.length; p++) {
      if (pattern[p] > 0) {
        int[] without = pattern.clone();
        without[p] = 0;
        failed[p] = worst(ports.damped(without));
      }
    }
    return new Robustness(detuned(1 - DETUNED), detuned(1 + DETUNED), failed);
  }

  private double detuned(double factor) {
    Damper.Design[] designs = ports.nominal();
    for (int c = 0; c < designs.length; c++) {
      designs[c] = tuned(designs[c], factor);
    }
    return worst(ports.damped(pattern, designs));
  }

  List<OfDesign> optima() {
    List<OfDesign> all = new ArrayList<>();
    List<DamperSearch.Candidate> candidates = ports.search().candidates();
    for (int c = 0; c < candidates.size(); c++) {
      int own = c;
      Damper.Design given = candidates.get(c).design();
      double f = frequency(given, ports.soundSpeed(c));
      double total = given.resistance(ports.soundSpeed(c));
      Optimum tuning = least(TUNING, 1, x -> with(own, tuned(given, x)));
      Optimum loss = least(RESISTANCE, total, r -> with(own, resisting(given, r)));
      all.add(
          new OfDesign(
              candidates.get(c).name(),
              new Optimum(f, f * tuning.best, tuning.worst),
              new Optimum(total, loss.best, loss.worst)));
    }
    return all;
  }

  private double with(int candidate, Damper.Design design) {
    Damper.Design[] designs = ports.nominal();
    designs[candidate] = design;
    return worst(ports.damped(pattern, designs));
  }

  /** A count that is not certain leaves a lower bound of the worst growth. */
  private double worst(DampedRoots roots) {
    double worst = roots.all().worst();
    return Math.max(worst, ports.window().lowestGrowth());
  }

  /**
   * A scan on a logarithmic scale, then Brent's method about its best point: the worst of several
   * modes has kinks and more than one valley.
   */
  private Optimum least(double[] range, double given, DoubleUnaryOperator worst) {
    double low = Math.log(range[0]);
    double high = Math.log(range[1]);
    double[] values = new double[SCAN];
    Arrays.parallelSetAll(
        values, k -> worst.applyAsDouble(Math.exp(low + (high - low) * k / (SCAN - 1))));
    int best = 0;
    for (int k = 1; k < SCAN; k++) {
      best = values[k] < values[best] ? k : best;
    }
    double step = (high - low) / (SCAN - 1);
    UnivariateFunction f = x -> worst.applyAsDouble(Math.exp(x));
    UnivariatePointValuePair found =
        new BrentOptimizer(1e-4, 1e-6)
            .optimize(
                new MaxEval(10 * EVALUATIONS),
                new UnivariateObjectiveFunction(f),
                GoalType.MINIMIZE,
                new SearchInterval(
                    Math.max(low, low + (best - 1) * step),
                    Math.min(high, low + (best + 1) * step),
                    low + best * step));
    double asGiven = worst.applyAsDouble(given);
    return asGiven <= found.getValue() + 1e-6
        ? new Optimum(given, given, asGiven)
        : new Optimum(given, Math.exp(found.getPoint()), found.getValue());
  }

  /** Resonance against a hard wall in Hz: where the reactance of the damper is zero. */
  static double frequency(Damper.Design design, double soundSpeed) {
    if (design instanceof Damper.Resonator r) {
      return soundSpeed
          / (2 * Math.PI)
          * Math.sqrt(r.mouthArea() / (r.volume() * r.effectiveLength()));
    }
    return soundSpeed / (4 * ((Damper.QuarterWave) design).effectiveLength());
  }

  /** Tuned by its volume, or by its length. */
  static Damper.Design tuned(Damper.Design design, double factor) {
    if (design instanceof Damper.Resonator r) {
      return new Damper.Resonator(
          r.neckBore(),
          r.necks(),
          r.neckLength(),
          r.addedLength(),
          r.volume() / (factor * factor),
          r.resistance(),
          r.lossVelocity());
    }
    Damper.QuarterWave t = (Damper.QuarterWave) design;
    return new Damper.QuarterWave(
        t.bore(), t.length() / factor, t.addedLength() / factor, t.resistance(), t.lossVelocity());
  }

  /** With this resistance in all. */
  private static Damper.Design resisting(Damper.Design design, double resistance) {
    if (design instanceof Damper.Resonator r) {
      return new Damper.Resonator(
          r.neckBore(), r.necks(), r.neckLength(), r.addedLength(), r.volume(), resistance, 0);
    }
    Damper.QuarterWave t = (Damper.QuarterWave) design;
    // exactly 1 has no description
    return new Damper.QuarterWave(
        t.bore(),
        t.length(),
        t.addedLength(),
        Math.abs(resistance - 1) < 1e-6 ? 1 + 1e-6 : resistance,
        0);
  }
}
