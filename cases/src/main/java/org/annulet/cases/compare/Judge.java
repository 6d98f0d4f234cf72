package org.annulet.cases.compare;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import java.util.function.ToDoubleFunction;
import org.annulet.cases.read.ModeTable;
import org.annulet.post.meaning.ParameterSensitivity;
import org.annulet.post.table.Numbers;
import org.annulet.solver.modes.Window;

/** What a match says. */
final class Judge {
  private static final int LEVERS = 3;

  private final Window window;

  Judge(Window window) {
    this.window = window;
  }

  /**
   * The line of a match.
   *
   * @param inputs sensitivities of our mode; empty where no levers are wanted
   */
  Line of(Match m, List<ParameterSensitivity> inputs) {
    if (m.theirs().isEmpty()) {
      return alone(m, Line.Verdict.ONLY_HERE, "only here");
    }
    ModeTable.Row theirs = m.theirs().get();
    if (m.ours().isEmpty()) {
      double growth = theirs.hasGrowth() ? theirs.growthRate() : window.highestGrowth();
      return window.contains(growth, theirs.frequency())
          ? alone(m, Line.Verdict.ONLY_THERE, "only there")
          : alone(
              m,
              Line.Verdict.NOT_LOOKED_FOR,
              "only there; outside the window, not looked for here");
    }
    OurMode ours = m.ours().get();
    double df = theirs.frequency() - ours.frequency();
    double dg = theirs.hasGrowth() ? theirs.growthRate() - ours.growthRate() : Double.NaN;
    double nf = Math.abs(df) / (ours.frequencyError() + theirs.frequencyTolerance());
    double ng = Math.abs(dg) / (ours.growthError() + theirs.growthTolerance());
    boolean agrees = nf <= 1 && (Double.isNaN(dg) || ng <= 1);
    List<String> said = new ArrayList<>();
    if (m.rival().isPresent()) {
      said.add("ambiguous: " + m.rival().get());
    }
    said.add(agrees ? "agrees within the bars" : differs(ours, df, nf, dg, ng));
    boolean grow = ours.growthRate() > 0;
    if (theirs.hasGrowth() && grow != theirs.growthRate() > 0 && !agrees) {
      said.add(grow ? "GROWS here, decays there" : "decays here, GROWS there");
    }
    m.second()
        .ifPresent(o -> said.add("their one row stands for the pair of modes " + pair(ours, o)));
    if (!ours.inside()) {
      said.add("ours lies just outside the window");
    }
    Line.Verdict verdict =
        m.rival().isPresent()
            ? Line.Verdict.AMBIGUOUS
            : agrees ? Line.Verdict.AGREES : Line.Verdict.DIFFERS;
    List<String> levers = new ArrayList<>();
    if (!(nf <= 1)) {
      levers(inputs, df, ParameterSensitivity::frequencyPerPercent)
          .ifPresent(l -> levers.add("frequency: " + l));
    }
    if (!Double.isNaN(dg) && !(ng <= 1)) {
      levers(inputs, dg, ParameterSensitivity::growthPerPercent)
          .ifPresent(l -> levers.add("growth rate: " + l));
    }
    return new Line(m, verdict, df, dg, nf, ng, String.join("; ", said), Optional.empty(), levers);
  }

  private static Line alone(Match m, Line.Verdict verdict, String words) {
    double nan = Double.NaN;
    return new Line(m, verdict, nan, nan, nan, nan, words, Optional.empty(), List.of());
  }

  private static String pair(OurMode a, OurMode b) {
    double apart =
        Math.hypot(a.frequency() - b.frequency(), (a.growthRate() - b.growthRate()) / 6.3);
    String numbers = Math.min(a.number(), b.number()) + " and " + Math.max(a.number(), b.number());
    return apart > 1e-6 * a.frequency()
        ? numbers
            + ", which lie "
            + Numbers.signed(b.frequency() - a.frequency())
            + " Hz and "
            + Numbers.signed(b.growthRate() - a.growthRate())
            + " 1/s apart"
        : numbers;
  }

  private static String differs(OurMode ours, double df, double nf, double dg, double ng) {
    StringBuilder b = new StringBuilder("differs: frequency ");
    b.append(Numbers.signed(df)).append(" Hz there (");
    b.append(Numbers.signed(100 * df / ours.frequency()))
        .append(" %, ")
        .append(bars(nf))
        .append(')');
    if (!Double.isNaN(dg)) {
      b.append(", growth rate ").append(Numbers.signed(dg)).append(" 1/s (").append(bars(ng));
      b.append(')');
    }
    return b.toString();
  }

  private static String bars(double n) {
    if (Double.isNaN(n) || Double.isInfinite(n)) {
      return "bars not known";
    }
    return n <= 1 ? "within the bars" : Numbers.fixed(n, n < 10 ? 1 : 0) + " bars";
  }

  /** The inputs with the smallest moves that would close a difference, to first order. */
  private static Optional<String> levers(
      List<ParameterSensitivity> inputs,
      double difference,
      ToDoubleFunction<ParameterSensitivity> slope) {
    record Lever(ParameterSensitivity input, double percent) {}
    List<Lever> best =
        inputs.stream()
            .filter(p -> slope.applyAsDouble(p) != 0)
            .filter(p -> !p.key().endsWith(".gamma") && !p.key().endsWith(".gas_constant"))
            .map(p -> new Lever(p, difference / slope.applyAsDouble(p)))
            .sorted(Comparator.comparingDouble(l -> Math.abs(l.percent)))
            .limit(LEVERS)
            .toList();
    if (best.isEmpty()) {
      return Optional.empty();
    }
    StringBuilder b = new StringBuilder();
    for (Lever l : best) {
      b.append(b.isEmpty() ? "" : ", or ")
          .append(l.input.key())
          .append(" by ")
          .append(Numbers.signed(l.percent))
          .append(" %")
          .append(
              Math.abs(l.percent) > l.input.linearRange()
                  ? " (beyond the range in which this is linear)"
                  : "");
    }
    return Optional.of(b + " would close it (linear, each alone)");
  }
}
