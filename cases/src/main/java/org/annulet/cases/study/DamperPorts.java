package org.annulet.cases.study;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.cases.read.CaseFile;
import org.annulet.cases.read.Damper;
import org.annulet.cases.read.DamperSearch;
import org.annulet.solver.eigen.ModeSearch;
import org.annulet.solver.eigen.PreparedOperator;
import org.annulet.solver.eigen.SearchSettings;
import org.annulet.solver.modes.Mode;
import org.annulet.solver.modes.ModeSet;
import org.annulet.solver.modes.Window;
import org.annulet.solver.operator.AcousticOperator;
import org.annulet.solver.operator.AnalyticFunction;
import org.annulet.solver.operator.LowRankTerm;
import org.annulet.solver.operator.SparseVector;
import org.annulet.solver.ports.DampedRoots;
import org.annulet.solver.ports.PortPole;
import org.annulet.solver.ports.PortPoles;
import org.annulet.solver.ports.PortSampling;
import org.annulet.solver.ports.PortTransfer;
import org.apache.commons.math3.complex.Complex;

/** A chamber condensed onto the positions at which dampers may sit. */
final class DamperPorts {
  /** Modes this far to the left of the window, over half its height, still bend the transfer. */
  private static final double LEFTWARD = 0.5;

  private final CaseFile caseFile;
  private final DamperSearch search;
  private final ChamberShape shape;
  private final Window window;
  private final List<Undamped> undamped = new ArrayList<>();
  private final List<double[]> gas = new ArrayList<>();
  private final int[] firstPort;
  private final String method;
  private final boolean complete;
  private final PortTransfer transfer;

  /**
   * A mode without the dampers.
   *
   * @param s in 1/s
   * @param part of the case's operators it belongs to
   */
  record Undamped(Complex s, CaseProblem.Part part) {}

  DamperPorts(CaseFile caseFile, DamperSearch search, Progress progress) {
    this.caseFile = caseFile;
    this.search = search;
    Window asked = caseFile.window();
    window =
        new Window(
            search.lowestFrequency(),
            search.highestFrequency(),
            asked.lowestGrowth(),
            asked.highestGrowth());
    List<Damper> all = new ArrayList<>(caseFile.dampers());
    search.candidates().forEach(c -> all.add(c.at(search.positions())));
    CaseFile everywhere = caseFile.withDampers(all);
    shape = ChamberShape.of(everywhere);
    CaseProblem problem = CaseProblem.on(caseFile, shape);
    method = problem.method();
    complete = modes(problem, progress);
    CaseProblem ports = CaseProblem.whole(everywhere, shape);
    AcousticOperator full = ports.parts().get(0).assembled().operator();
    int candidates = search.candidates().size();
    int places = search.positions().size();
    List<LowRankTerm> terms = full.lowRankTerms();
    int own = terms.size() - candidates * places; // dampers come last, in their order
    List<SparseVector> mouths = new ArrayList<>();
    firstPort = new int[candidates];
    for (int c = 0; c < candidates; c++) {
      Damper damper = search.candidates().get(c).at(search.positions());
      gas.add(CaseDampers.gas(damper, search.positions().get(0), shape.mesh(), ports.medium()));
      firstPort[c] = -1;
      for (int d = 0; d < c; d++) {
        if (width(d) == width(c)) {
          firstPort[c] = firstPort[d];
        }
      }
      if (firstPort[c] < 0) {
        firstPort[c] = mouths.size();
        for (int p = 0; p < places; p++) {
          mouths.add(terms.get(own + c * places + p).left().get(0));
        }
      }
    }
    progress.step("condensing onto the ports", 0, 1);
    PreparedOperator prepared =
        new PreparedOperator(
            new AcousticOperator(
                full.pattern(),
                full.stiffness(),
                full.mass(),
                full.sparseTerms(),
                terms.subList(0, own),
                full.coordinates()));
    transfer =
        PortSampling.of(
            prepared,
            mouths,
            PortPoles.grouped(
                undamped.stream()
                    .flatMap(u -> IntStream.range(0, u.part.copies()).mapToObj(k -> u.s))
                    .toList()),
            widened(window, 0.03, 0.03));
    progress.step("condensing onto the ports", 1, 1);
  }

  private double width(int candidate) {
    DamperSearch.Candidate c = search.candidates().get(candidate);
    return CaseDampers.mouthWidth(c.at(search.positions()));
  }

  private static Window widened(Window w, double frequency, double growth) {
    double f = frequency * (w.highestFrequency() - w.lowestFrequency());
    double g = growth * (w.highestGrowth() - w.lowestGrowth());
    return new Window(
        Math.max(0.6 * w.lowestFrequency(), w.lowestFrequency() - f),
        w.highestFrequency() + f,
        w.lowestGrowth() - g,
        w.highestGrowth() + g);
  }

  /** All modes in a wide window round the one wanted; whether every part is certified. */
  private boolean modes(CaseProblem problem, Progress progress) {
    double half = Math.PI * (window.highestFrequency() - window.lowestFrequency());
    Window wide =
        new Window(
            0.5 * window.lowestFrequency(),
            window.highestFrequency()
                + 0.25 * (window.highestFrequency() - window.lowestFrequency()),
            window.lowestGrowth() - LEFTWARD * half,
            window.highestGrowth() + 0.2 * (window.highestGrowth() - window.lowestGrowth()));
    int n = problem.parts().size();
    int[] done = {0};
    progress.step("modes without the dampers", 0, n);
    List<ModeSet> sets =
        problem.parts().parallelStream()
            .map(
                part -> {
                  ModeSet set =
                      ModeSearch.find(part.assembled().operator(), wide, SearchSettings.standard());
                  synchronized (done) {
                    progress.step("modes without the dampers", ++done[0], n);
                  }
                  return set;
                })
            .toList();
    boolean certified = true;
    for (int i = 0; i < n; i++) {
      List<Mode> modes = new ArrayList<>(sets.get(i).modes());
      modes.addAll(sets.get(i).outside());
      for (Mode m : modes) {
        undamped.add(
            new Undamped(
                new Complex(m.growthRate(), 2 * Math.PI * m.frequency()), problem.parts().get(i)));
      }
      certified &= sets.get(i).complete();
    }
    return certified;
  }

  CaseFile caseFile() {
    return caseFile;
  }

  DamperSearch search() {
    return search;
  }

  ChamberShape shape() {
    return shape;
  }

  /** Where modes are tamed. */
  Window window() {
    return window;
  }

  /** How the chamber without dampers was solved. */
  String method() {
    return method;
  }

  /** Whether the modes without dampers are certified. */
  boolean complete() {
    return complete;
  }

  PortTransfer transfer() {
    return transfer;
  }

  /** The mode without dampers nearest to a pole of the transfer. */
  Undamped at(PortPole pole) {
    return undamped.stream()
        .min((a, b) -> Double.compare(distance(a, pole), distance(b, pole)))
        .orElseThrow();
  }

  private static double distance(Undamped u, PortPole pole) {
    return u.s.subtract(pole.s()).abs();
  }

  /** The designs as they are given. */
  Damper.Design[] nominal() {
    return search.candidates().stream()
        .map(DamperSearch.Candidate::design)
        .toArray(Damper.Design[]::new);
  }

  /** The dampers of a pattern on their ports. */
  DampedRoots damped(int[] pattern) {
    return damped(pattern, nominal());
  }

  /** The same with other designs in place of the given ones. */
  DampedRoots damped(int[] pattern, Damper.Design... designs) {
    AnalyticFunction[] flow = new AnalyticFunction[designs.length];
    for (int c = 0; c < flow.length; c++) {
      flow[c] = CaseDampers.solved(designs[c], gas.get(c)).flow();
    }
    int count = (int) Arrays.stream(pattern).filter(d -> d > 0).count();
    int[] ports = new int[count];
    AnalyticFunction[] flows = new AnalyticFunction[count];
    int q = 0;
    for (int p = 0; p < pattern.length; p++) {
      if (pattern[p] > 0) {
        ports[q] = firstPort[pattern[p] - 1] + p;
        flows[q++] = flow[pattern[p] - 1];
      }
    }
    return new DampedRoots(transfer, ports, flows, window);
  }

  /** Sound speed in m/s of the gas in a design. */
  double soundSpeed(int candidate) {
    return gas.get(candidate)[1];
  }

  /** The case with the dampers of a pattern. */
  CaseFile with(int[] pattern) {
    List<Damper> all = new ArrayList<>(caseFile.dampers());
    for (int c = 0; c < search.candidates().size(); c++) {
      List<Damper.Place> places = new ArrayList<>();
      for (int p = 0; p < pattern.length; p++) {
        if (pattern[p] == c + 1) {
          places.add(search.positions().get(p));
        }
      }
      if (!places.isEmpty()) {
        all.add(search.candidates().get(c).at(places));
      }
    }
    return caseFile.withDampers(all);
  }
}
