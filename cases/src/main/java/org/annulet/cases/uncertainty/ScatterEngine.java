package org.annulet.cases.uncertainty;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Flame;
import org.annulet.cases.read.Geometry;
import org.annulet.cases.read.Uncertainty;
import org.annulet.cases.study.CaseProblem;
import org.annulet.cases.study.ChamberShape;
import org.annulet.cases.study.Progress;
import org.annulet.cases.units.QuantityKind;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.Analytic;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.ports.FlameScatter;
import org.annulet.solver.ports.FullModes;
import org.apache.commons.math3.complex.Complex;

/** Scatter from burner to burner of an otherwise symmetric ring, condensed onto the burners. */
final class ScatterEngine implements Engine {
  private static final String BLOCH = "Bloch number ";

  private final CaseFile caseFile;
  private final Uncertainty.Scatter scatter;
  private final int burners;
  private final ChamberShape shape;
  private final double gainWidth;
  private final double delayWidth;
  private final FlameScatter condensed;
  private final boolean certified;
  private final List<Nominal> nominal = new ArrayList<>();
  private final List<int[]> members = new ArrayList<>(); // pole and member of each nominal mode
  private AcousticOperator whole;

  ScatterEngine(CaseFile caseFile, Uncertainty study, Progress progress) {
    this.caseFile = caseFile;
    this.scatter = study.scatter().orElseThrow();
    this.burners = ((Geometry.Ring) caseFile.geometry()).burnerCount();
    Flame flame =
        caseFile.flames().stream()
            .filter(f -> f.name().equals(scatter.flame()))
            .findFirst()
            .orElseThrow();
    gainWidth = scatter.gain().map(s -> width("gain", s, 1, QuantityKind.FRACTION)).orElse(0.0);
    double delay =
        flame.response() instanceof Flame.GainDelay n
            ? n.delay()
            : flame.response() instanceof Flame.SpreadDelay n
                ? n.delay()
                : flame.response() instanceof Flame.LowPass n ? n.delay() : 0;
    delayWidth = scatter.delay().map(s -> width("delay", s, delay, QuantityKind.TIME)).orElse(0.0);
    shape = ChamberShape.of(caseFile);
    CaseProblem problem = CaseProblem.on(caseFile, shape);
    if (problem.parts().stream().anyMatch(p -> !p.name().startsWith(BLOCH))) {
      throw fault(
          "",
          "the burners differ before any scatter",
          "take 'staging' and single dampers out of the case");
    }
    Window asked = caseFile.window();
    Window wide = wide(asked);
    int n = problem.parts().size();
    int[] done = {0};
    progress.step("modes without scatter", 0, n);
    List<ModeSet> sets = new ArrayList<>();
    List<PreparedOperator> operators =
        problem.parts().stream().map(p -> new PreparedOperator(p.assembled().operator())).toList();
    IntStream.range(0, n)
        .parallel()
        .mapToObj(
            i -> {
              ModeSet set = ModeSearch.find(operators.get(i), wide, SearchSettings.standard());
              synchronized (done) {
                progress.step("modes without scatter", ++done[0], n);
              }
              return set;
            })
        .toList()
        .forEach(sets::add);
    certified = sets.stream().allMatch(ModeSet::complete);
    List<FlameScatter.Cell> cells = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      List<Complex> modes = new ArrayList<>();
      sets.get(i).modes().forEach(m -> modes.add(s(m)));
      sets.get(i).outside().forEach(m -> modes.add(s(m)));
      CaseProblem.Part part = problem.parts().get(i);
      int number = Integer.parseInt(part.name().substring(BLOCH.length()));
      cells.add(new FlameScatter.Cell(number, part.copies(), operators.get(i), modes));
    }
    progress.step("condensing onto the burners", 0, 1);
    try {
      condensed = FlameScatter.of(cells, "flame " + scatter.flame(), burners, wide);
    } catch (IllegalArgumentException e) {
      throw fault(
          "", e.getMessage(), "scatter needs a flame that answers to one velocity a burner");
    }
    progress.step("condensing onto the burners", 1, 1);
    for (int p = 0; p < condensed.poles().size(); p++) {
      Complex s = condensed.poles().get(p).s();
      if (asked.contains(s.getReal(), s.getImaginary() / (2 * Math.PI))) {
        boolean pair = condensed.poles().get(p).multiplicity() == 2;
        for (int j = 0; j < condensed.poles().get(p).multiplicity(); j++) {
          String member = pair ? j == 0 ? ", faster member" : ", slower member" : "";
          nominal.add(new Nominal(s, BLOCH + condensed.number(p) + member, 1));
          members.add(new int[] {p, j});
        }
      }
    }
    List<Integer> order = IntStream.range(0, nominal.size()).boxed().toList();
    List<Integer> sorted = new ArrayList<>(order);
    sorted.sort(
        Comparator.<Integer>comparingDouble(i -> nominal.get(i).s().getImaginary())
            .thenComparing(i -> i));
    List<Nominal> a = sorted.stream().map(nominal::get).toList();
    List<int[]> b = sorted.stream().map(members::get).toList();
    nominal.clear();
    nominal.addAll(a);
    members.clear();
    members.addAll(b);
  }

  private double width(String what, Uncertainty.Spread spread, double value, QuantityKind kind) {
    try {
      return Widths.of(spread, value, kind);
    } catch (IllegalArgumentException e) {
      throw fault("." + what, e.getMessage(), "write '5 %', or a width in its unit");
    }
  }

  private CaseFaultException fault(String at, String what, String mend) {
    return new CaseFaultException(
        List.of(
            caseFile
                .source()
                .problem(
                    "studies.uncertainty.burner_scatter." + scatter.flame() + at, what, mend)));
  }

  private static Window wide(Window w) {
    double f = w.highestFrequency() - w.lowestFrequency();
    double g = w.highestGrowth() - w.lowestGrowth();
    return new Window(
        0.6 * w.lowestFrequency(),
        w.highestFrequency() + 0.2 * f,
        w.lowestGrowth() - 0.4 * g,
        w.highestGrowth() + 0.2 * g);
  }

  private static Complex s(Mode m) {
    return new Complex(m.growthRate(), 2 * Math.PI * m.frequency());
  }

  @Override
  public List<Group> groups() {
    List<Group> groups = new ArrayList<>();
    if (gainWidth > 0) {
      groups.add(new Group("gain of flame " + scatter.flame(), 0, burners));
    }
    if (delayWidth > 0) {
      groups.add(
          new Group("delay of flame " + scatter.flame(), gainWidth > 0 ? burners : 0, burners));
    }
    return groups;
  }

  @Override
  public List<Nominal> nominal() {
    return nominal;
  }

  private double gain(double[] x, int burner) {
    return gainWidth > 0 ? gainWidth * x[burner] : 0;
  }

  private double later(double[] x, int burner) {
    return delayWidth > 0 ? delayWidth * x[burner + (gainWidth > 0 ? burners : 0)] : 0;
  }

  /** ρ(s) = (1 + a) e^{−sδ}. */
  private record Response(double gain, double later)
      implements FlameScatter.Ratio, AnalyticFunction {
    @Override
    public Complex value(Complex s) {
      return s.multiply(-later).exp().multiply(1 + gain);
    }

    @Override
    public Complex derivative(Complex s) {
      return value(s).multiply(-later);
    }

    @Override
    public Complex[] at(Complex s) {
      Complex rho = value(s);
      return new Complex[] {rho, rho.multiply(-later)};
    }

    @Override
    public double longestDelay() {
      return Math.abs(later);
    }
  }

  private List<FlameScatter.Ratio> ratios(double... x) {
    List<FlameScatter.Ratio> ratios = new ArrayList<>();
    for (int j = 0; j < burners; j++) {
      ratios.add(new Response(gain(x, j), later(x, j)));
    }
    return ratios;
  }

  @Override
  public Sample at(double... x) {
    Complex[][] roots = condensed.roots(caseFile.window(), ratios(x));
    List<Complex> found = new ArrayList<>();
    boolean all = certified;
    for (int[] m : members) {
      Complex s = roots[m[0]][m[1]];
      found.add(s);
      all &= !s.isNaN();
    }
    Window w = caseFile.window();
    int strangers = 0;
    for (int p = 0; p < roots.length; p++) {
      int pole = p;
      if (members.stream().anyMatch(m -> m[0] == pole)) {
        continue;
      }
      for (Complex s : roots[p]) {
        all &= !s.isNaN(); // it might have come into the window
        boolean grows =
            s.getReal() > 0 && w.contains(s.getReal(), s.getImaginary() / (2 * Math.PI));
        strangers += grows ? 1 : 0;
      }
    }
    return new Sample(found, strangers, all);
  }

  /**
   * σ₀ + Re D(m₀ ± √(m₊m₋)), D = ds/dρ, m_k components of the scatter round the ring: 0 and ±2q.
   */
  @Override
  public double[] first(double... x) {
    double[] out = new double[nominal.size()];
    for (int k = 0; k < out.length; k++) {
      int pole = members.get(k)[0];
      Complex s = condensed.poles().get(pole).s();
      int q = condensed.number(pole);
      Complex mean = component(s, 0, x);
      Complex slope = condensed.slope(pole);
      if (condensed.poles().get(pole).multiplicity() == 1) {
        out[k] = s.add(slope.multiply(mean)).getReal();
        continue;
      }
      Complex split = component(s, 2 * q, x).multiply(component(s, -2 * q, x)).sqrt();
      double a = s.add(slope.multiply(mean.add(split))).getReal();
      double b = s.add(slope.multiply(mean.subtract(split))).getReal();
      out[k] = members.get(k)[1] == 0 ? Math.max(a, b) : Math.min(a, b);
    }
    return out;
  }

  /** 1/N Σ_j (a_j − sδ_j) e^{2πikj/N}. */
  private Complex component(Complex s, int k, double... x) {
    Complex sum = Complex.ZERO;
    for (int j = 0; j < burners; j++) {
      double turn = 2 * Math.PI * k * j / burners;
      Complex d = s.multiply(-later(x, j)).add(gain(x, j));
      sum = sum.add(d.multiply(new Complex(Math.cos(turn), Math.sin(turn))));
    }
    return sum.divide(burners);
  }

  @Override
  public Optional<double[]> second(double... x) {
    return Optional.empty();
  }

  @Override
  public double difference(double... x) {
    List<Complex> inside = new ArrayList<>();
    for (Complex s : at(x).members()) {
      if (!s.isNaN() && caseFile.window().contains(s.getReal(), s.getImaginary() / (2 * Math.PI))) {
        inside.add(s);
      }
    }
    double largest = 0;
    for (FullModes.FullMode m : FullModes.of(new PreparedOperator(scattered(x)), inside)) {
      largest = Math.max(largest, m.s().subtract(m.fromPorts()).abs() / m.s().abs());
    }
    return largest;
  }

  /** The whole ring with every burner's own response. */
  private AcousticOperator scattered(double... x) {
    synchronized (this) {
      if (whole == null) {
        whole = CaseProblem.whole(caseFile, shape).parts().get(0).assembled().operator();
      }
    }
    List<LowRankTerm> terms = new ArrayList<>();
    for (LowRankTerm t : whole.lowRankTerms()) {
      String prefix = "flame " + scatter.flame() + " burner ";
      if (!t.name().startsWith(prefix)) {
        terms.add(t);
        continue;
      }
      int burner = Integer.parseInt(t.name().substring(prefix.length())) - 1;
      Response own = new Response(gain(x, burner), later(x, burner));
      AnalyticFunction[][] phi = new AnalyticFunction[1][t.right().size()];
      for (int k = 0; k < phi[0].length; k++) {
        phi[0][k] =
            t.coefficient()[0][k] == null ? null : Analytic.product(own, t.coefficient()[0][k]);
      }
      terms.add(new LowRankTerm(t.name(), t.left(), t.right(), phi));
    }
    return new AcousticOperator(
        whole.pattern(),
        whole.stiffness(),
        whole.mass(),
        whole.sparseTerms(),
        terms,
        whole.coordinates());
  }

  @Override
  public String method() {
    return String.format(
        Locale.ROOT,
        "The ring is condensed onto its %d burners, exactly for any strength of the scatter; at"
            + " points of their own the condensed responses of the chamber differ from full solves"
            + " by %.1e. Modes that come into the window from outside are counted as strangers.",
        burners,
        condensed.error());
  }
}
