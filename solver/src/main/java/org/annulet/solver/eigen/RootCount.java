package org.annulet.solver.eigen;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.annulet.solver.dense.ComplexLu;
import org.annulet.solver.sparse.LogDeterminant;
import org.apache.commons.math3.complex.Complex;

/**
 * Zeros minus poles of an analytic function inside a rectangle, by the argument principle.
 *
 * <p>Roots and poles already known are divided out before the phase is followed and added back as
 * whole numbers: f is replaced by h = f Π(s − pole)/Π(s − root). That changes the count by a known
 * integer and nothing else, but leaves a function that turns slowly when the list is right and
 * quickly near a root that is missing from it. A step from a to b is accepted when the change of
 * log h (modulus and phase) is small and agrees with what the rates h′/h at both ends foretell; it
 * is halved otherwise. Once all steps are accepted, all of them are halved and the count is made
 * again: {@link Result#certain()} says whether both agree.
 */
public final class RootCount {
  private static final double LARGEST_TURN = Math.PI / 3;
  private static final double LARGEST_SURPRISE = 0.5;
  private static final double LARGEST_CHANGE_WITHOUT_RATE = 0.8;

  private RootCount() {}

  /**
   * A function on the contour.
   *
   * @param value its logarithm
   * @param rate d/ds of its logarithm in s, or null where unknown
   */
  public record Sample(LogDeterminant value, Complex rate) {}

  /** A function that can be sampled from several threads at once. */
  public interface Sampled {
    /** Value and rate at s. */
    Sample at(Complex s);
  }

  /**
   * What is known beforehand.
   *
   * @param roots divided out, each as often as its multiplicity; a wrong one does no harm but to
   *     the cost
   * @param poles multiplied in, each as often as its order
   */
  public record Known(List<Complex> roots, List<Complex> poles) {}

  /**
   * How finely to sample.
   *
   * @param step largest distance between starting points, in 1/s
   * @param largest points after which to give up
   */
  public record Fineness(double step, int largest) {}

  /**
   * A count.
   *
   * @param value zeros minus poles inside, with multiplicity
   * @param certain whether every step was accepted and the finer count agreed
   * @param evaluations of the function
   */
  public record Result(int value, boolean certain, int evaluations) {}

  private record Node(Complex s, Sample sample) {}

  static Result inside(Rectangle r, Sampled f, Known known, Fineness fineness) {
    List<Node> nodes = evaluate(start(r, fineness), f);
    List<Node> coarse = refine(nodes, f, known, fineness.largest());
    if (coarse == null) {
      return new Result(0, false, fineness.largest());
    }
    int first = turns(coarse, known) + shift(r, known);
    List<Node> fine = refine(halved(coarse, f, known, true), f, known, 2 * fineness.largest());
    if (fine == null) {
      return new Result(first, false, 2 * fineness.largest());
    }
    int second = turns(fine, known) + shift(r, known);
    return new Result(second, first == second, fine.size());
  }

  /** Samples log det of a small matrix; its rate is a difference quotient over 1e-5 |s|. */
  static Sampled determinant(MatrixFunction f) {
    return s -> {
      Complex step = new Complex(0, 1e-5 * s.abs());
      LogDeterminant here = new ComplexLu(f.value(s)).logDeterminant();
      LogDeterminant there = new ComplexLu(f.value(s.add(step))).logDeterminant();
      return new Sample(here, difference(here, there).divide(step));
    };
  }

  /**
   * Samples log det of the full operator. The rate of the low-rank factor is exact; that of the
   * sparse factor is a difference quotient over a step of 1e-5 |s|.
   */
  static Sampled determinant(PreparedOperator prepared) {
    return s -> {
      OperatorAt at = prepared.at(s);
      Complex step = new Complex(0, 1e-5 * s.abs());
      double[][] beside = prepared.sparseValues(s.add(step));
      LogDeterminant there =
          prepared.analysis().factorComplex(beside[0], beside[1]).logDeterminant();
      Complex rate = difference(at.sparseLogDeterminant(), there).divide(step);
      return new Sample(at.logDeterminant(), rate.add(at.smallRate()));
    };
  }

  private static Complex difference(LogDeterminant here, LogDeterminant there) {
    return new Complex(
        there.logModulus() - here.logModulus(), reduced(there.phase() - here.phase()));
  }

  private static List<Complex> start(Rectangle r, Fineness fineness) {
    Complex[] corner = {
      r.lower(), new Complex(r.right(), r.bottom()), r.upper(), new Complex(r.left(), r.top())
    };
    List<Complex> points = new ArrayList<>();
    for (int e = 0; e < 4; e++) {
      Complex a = corner[e];
      Complex b = corner[(e + 1) % 4];
      int n = Math.max(4, (int) Math.ceil(b.subtract(a).abs() / fineness.step()));
      for (int k = 0; k < n; k++) {
        points.add(a.add(b.subtract(a).multiply((double) k / n)));
      }
    }
    return points;
  }

  private static List<Node> evaluate(List<Complex> points, Sampled f) {
    return IntStream.range(0, points.size())
        .parallel()
        .mapToObj(i -> new Node(points.get(i), f.at(points.get(i))))
        .toList();
  }

  /** Halves steps until all are accepted; null when there are too many points. */
  private static List<Node> refine(List<Node> nodes, Sampled f, Known known, int largest) {
    List<Node> current = nodes;
    while (current.size() <= largest) {
      List<Node> next = halved(current, f, known, false);
      if (next.size() == current.size()) {
        return current;
      }
      current = next;
    }
    return null;
  }

  private static List<Node> halved(List<Node> nodes, Sampled f, Known known, boolean all) {
    int n = nodes.size();
    List<Complex> middle = new ArrayList<>();
    boolean[] split = new boolean[n];
    for (int i = 0; i < n; i++) {
      Node a = nodes.get(i);
      Node b = nodes.get((i + 1) % n);
      split[i] = all || !accepted(a, b, known);
      if (split[i]) {
        middle.add(a.s().add(b.s()).multiply(0.5));
      }
    }
    List<Node> fresh = evaluate(middle, f);
    List<Node> merged = new ArrayList<>(n + fresh.size());
    int next = 0;
    for (int i = 0; i < n; i++) {
      merged.add(nodes.get(i));
      if (split[i]) {
        merged.add(fresh.get(next++));
      }
    }
    return merged;
  }

  private static boolean accepted(Node a, Node b, Known known) {
    Complex change = change(a, b, known);
    if (!Double.isFinite(change.getReal()) || !Double.isFinite(change.getImaginary())) {
      return false;
    }
    if (a.sample().rate() == null || b.sample().rate() == null) {
      return change.abs() <= LARGEST_CHANGE_WITHOUT_RATE;
    }
    Complex foretold =
        rate(a, known).add(rate(b, known)).multiply(b.s().subtract(a.s())).multiply(0.5);
    return Math.abs(change.getImaginary()) <= LARGEST_TURN
        && change.subtract(foretold).abs() <= LARGEST_SURPRISE;
  }

  private static Complex rate(Node a, Known known) {
    Complex r = a.sample().rate();
    for (Complex root : known.roots()) {
      r = r.subtract(a.s().subtract(root).reciprocal());
    }
    for (Complex pole : known.poles()) {
      r = r.add(a.s().subtract(pole).reciprocal());
    }
    return r;
  }

  /** Change of log h from a to b, the phase reduced to (−π, π]. */
  private static Complex change(Node a, Node b, Known known) {
    double modulus = b.sample().value().logModulus() - a.sample().value().logModulus();
    double phase = b.sample().value().phase() - a.sample().value().phase();
    for (Complex root : known.roots()) {
      Complex q = b.s().subtract(root).divide(a.s().subtract(root));
      modulus -= Math.log(q.abs());
      phase -= q.getArgument();
    }
    for (Complex pole : known.poles()) {
      Complex q = b.s().subtract(pole).divide(a.s().subtract(pole));
      modulus += Math.log(q.abs());
      phase += q.getArgument();
    }
    return new Complex(modulus, reduced(phase));
  }

  private static int turns(List<Node> nodes, Known known) {
    double sum = 0;
    for (int i = 0; i < nodes.size(); i++) {
      sum += change(nodes.get(i), nodes.get((i + 1) % nodes.size()), known).getImaginary();
    }
    return (int) Math.round(sum / (2 * Math.PI));
  }

  private static int shift(Rectangle r, Known known) {
    long roots = known.roots().stream().filter(r::contains).count();
    long poles = known.poles().stream().filter(r::contains).count();
    return (int) (roots - poles);
  }

  private static double reduced(double phase) {
    return phase - 2 * Math.PI * Math.rint(phase / (2 * Math.PI));
  }
}
