package org.annulet.cases.uncertainty;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.IntStream;
import org.annulet.cases.points.ModeLinks;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.CaseSource;
import org.annulet.cases.read.Problem;
import org.annulet.cases.read.Reading;
import org.annulet.cases.read.Uncertainty;
import org.annulet.cases.study.PointMode;
import org.annulet.cases.study.PointModes;
import org.annulet.cases.study.Progress;
import org.annulet.cases.study.ReducedPoints;
import org.annulet.solver.modes.Window;
import org.apache.commons.math3.complex.Complex;

/** Inputs of the whole chamber: every sample is a case of its own, solved on a reduced model. */
final class InputEngine implements Engine {
  /** Step of the differences, in widths. */
  private static final double STEP = 0.25;

  /** With more inputs than this the mixed second derivatives are left out. */
  private static final int MOST_MIXED = 8;

  private final CaseFile caseFile;
  private final Uncertainty study;
  private final List<CaseSource.Value> values = new ArrayList<>();
  private final double[] width;
  private final ReducedPoints points;
  private final PointModes start;
  private final List<Integer> followed = new ArrayList<>();
  private final List<Nominal> nominal = new ArrayList<>();
  private final double[][] gradient;
  private final double[][][] hessian;

  InputEngine(CaseFile caseFile, Uncertainty study, Progress progress) {
    this.caseFile = caseFile;
    this.study = study;
    List<Problem> problems = new ArrayList<>();
    width = new double[study.inputs().size()];
    for (int i = 0; i < width.length; i++) {
      Uncertainty.Input in = study.inputs().get(i);
      CaseSource.Value value =
          caseFile.source().values().stream()
              .filter(v -> v.key().equals(in.key()))
              .findFirst()
              .orElse(null);
      String at = "studies.uncertainty.inputs." + in.key();
      if (value == null) {
        problems.add(
            caseFile
                .source()
                .problem(
                    at,
                    "the case gives no number at '" + in.key() + "'",
                    "name the path of a number of the case, as in flames.main.response.delay"));
      } else {
        values.add(value);
        try {
          width[i] = Widths.of(in.spread(), value);
        } catch (IllegalArgumentException e) {
          problems.add(
              caseFile.source().problem(at, e.getMessage(), "write '3 %', or a width in its unit"));
        }
      }
    }
    if (!problems.isEmpty()) {
      throw new CaseFaultException(problems);
    }
    List<CaseFile> training = new ArrayList<>();
    training.add(changed(new double[width.length]));
    for (double sign : new double[] {1, -1}) {
      double[] all = new double[width.length];
      for (int i = 0; i < all.length; i++) {
        double[] one = new double[width.length];
        one[i] = sign * Draws.reach(study.inputs().get(i).spread().shape());
        all[i] = one[i];
        if (width.length <= MOST_MIXED) {
          training.add(changed(one));
        }
      }
      if (width.length > 1) {
        training.add(changed(all));
      }
    }
    points = ReducedPoints.trainedOn(caseFile, training, progress);
    start = points.at(training.get(0), 0);
    Window w = caseFile.window();
    List<Integer> byFrequency = new ArrayList<>();
    for (int k = 0; k < start.modes().size(); k++) {
      byFrequency.add(k);
    }
    byFrequency.sort(Comparator.comparingDouble(k -> start.modes().get(k).frequency()));
    for (int k : byFrequency) {
      PointMode m = start.modes().get(k);
      if (w.contains(m.growthRate(), m.frequency())) {
        followed.add(k);
        String what = m.part().isEmpty() ? "whole chamber" : m.part();
        nominal.add(new Nominal(m.s(), m.copies() > 1 ? what + ", pair" : what, m.copies()));
      }
    }
    gradient = new double[nominal.size()][width.length];
    hessian = new double[nominal.size()][width.length][width.length];
    differentiate(progress);
  }

  /** The case at departures in widths. */
  private CaseFile changed(double... x) {
    Map<String, String> set = new LinkedHashMap<>();
    for (int i = 0; i < width.length; i++) {
      CaseSource.Value v = values.get(i);
      set.put(
          v.key(), (Double.toString(v.si() + x[i] * width[i]) + " " + v.kind().siUnit()).strip());
    }
    Reading reading = caseFile.with(set);
    if (reading.caseFile().isPresent()) {
      return reading.caseFile().get();
    }
    List<Problem> problems = new ArrayList<>();
    for (Problem p : reading.problems()) {
      problems.add(
          caseFile
              .source()
              .problem(
                  "studies.uncertainty.inputs",
                  "a sample leaves what is allowed: " + p.key() + ": " + p.what(),
                  "narrow the spread, or choose 'uniform' or 'triangular'"));
    }
    throw new CaseFaultException(problems);
  }

  private PointModes solve(double... x) {
    return points.at(changed(x), 0);
  }

  @Override
  public List<Group> groups() {
    List<Group> groups = new ArrayList<>();
    for (int i = 0; i < width.length; i++) {
      groups.add(new Group(study.inputs().get(i).key(), i, 1));
    }
    return groups;
  }

  @Override
  public List<Nominal> nominal() {
    return nominal;
  }

  @Override
  public Sample at(double... x) {
    PointModes end = solve(x);
    int[] to =
        ModeLinks.follow(
                new ModeLinks.Place(0, start),
                new ModeLinks.Place(1, end),
                t -> solve(IntStream.range(0, x.length).mapToDouble(i -> t * x[i]).toArray()))
            .to();
    List<Complex> members = new ArrayList<>();
    boolean[] known = new boolean[end.modes().size()];
    for (int k : followed) {
      members.add(to[k] < 0 ? Complex.NaN : end.modes().get(to[k]).s());
      if (to[k] >= 0) {
        known[to[k]] = true;
      }
    }
    Window w = caseFile.window();
    int strangers = 0;
    for (int j = 0; j < known.length; j++) {
      PointMode m = end.modes().get(j);
      boolean grows = m.growthRate() > 0 && w.contains(m.growthRate(), m.frequency());
      strangers += grows && !known[j] ? m.copies() : 0;
    }
    return new Sample(members, strangers, end.complete());
  }

  /** Central differences on the modes followed. */
  private void differentiate(Progress progress) {
    int d = width.length;
    List<int[]> moves = new ArrayList<>();
    for (int i = 0; i < d; i++) {
      moves.add(new int[] {i, i});
      for (int j = 0; j < i && d <= MOST_MIXED; j++) {
        moves.add(new int[] {i, j});
      }
    }
    progress.step("derivatives", 0, 1);
    moves.parallelStream().forEach(m -> differentiate(m[0], m[1]));
    progress.step("derivatives", 1, 1);
  }

  private void differentiate(int i, int j) {
    double[] x = new double[width.length];
    if (i == j) {
      x[i] = STEP;
      Sample more = at(x);
      x[i] = -STEP;
      Sample less = at(x);
      for (int k = 0; k < nominal.size(); k++) {
        double up = more.members().get(k).getReal();
        double down = less.members().get(k).getReal();
        double here = nominal.get(k).s().getReal();
        gradient[k][i] = (up - down) / (2 * STEP);
        hessian[k][i][i] = (up - 2 * here + down) / (STEP * STEP);
      }
      return;
    }
    double[][] corner = new double[4][];
    for (int c = 0; c < 4; c++) {
      x[i] = c % 2 == 0 ? STEP : -STEP;
      x[j] = c / 2 == 0 ? STEP : -STEP;
      corner[c] = at(x).members().stream().mapToDouble(Complex::getReal).toArray();
    }
    for (int k = 0; k < nominal.size(); k++) {
      double mixed =
          (corner[0][k] - corner[1][k] - corner[2][k] + corner[3][k]) / (4 * STEP * STEP);
      hessian[k][i][j] = mixed;
      hessian[k][j][i] = mixed;
    }
  }

  @Override
  public double[] first(double... x) {
    double[] out = new double[nominal.size()];
    for (int k = 0; k < out.length; k++) {
      out[k] = nominal.get(k).s().getReal();
      for (int i = 0; i < x.length; i++) {
        out[k] += gradient[k][i] * x[i];
      }
    }
    return out;
  }

  @Override
  public Optional<double[]> second(double... x) {
    double[] out = first(x);
    for (int k = 0; k < out.length; k++) {
      for (int i = 0; i < x.length; i++) {
        for (int j = 0; j < x.length; j++) {
          out[k] += 0.5 * hessian[k][i][j] * x[i] * x[j];
        }
      }
    }
    return Optional.of(out);
  }

  @Override
  public double difference(double... x) {
    PointModes full = points.full().at(changed(x));
    Sample here = at(x);
    double largest = 0;
    for (int k = 0; k < followed.size(); k++) {
      Complex s = here.members().get(k);
      String part = start.modes().get(followed.get(k)).part();
      if (!s.isNaN() && caseFile.window().contains(s.getReal(), s.getImaginary() / 2 / Math.PI)) {
        double nearest =
            full.modes().stream()
                .filter(m -> m.part().equals(part))
                .mapToDouble(m -> m.s().subtract(s).abs() / s.abs())
                .min()
                .orElse(1);
        largest = Math.max(largest, nearest);
      }
    }
    return largest;
  }

  @Override
  public String method() {
    return points.reduced()
        ? "Every sample is a case of its own, solved and counted on a reduced model; its modes are"
            + " followed from the nominal ones along the straight way."
        : "Every sample is solved and counted on the full operators; its modes are followed from"
            + " the nominal ones along the straight way.";
  }
}
