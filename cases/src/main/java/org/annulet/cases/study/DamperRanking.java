package org.annulet.cases.study;

import java.math.BigInteger;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.Set;
import java.util.stream.IntStream;
import org.annulet.cases.read.Damper;
import org.annulet.solver.ports.DampedRoots;

/**
 * The best patterns by their worst growth rate. Every distinct pattern is looked at where that is
 * feasible; one that shows a mode growing faster than the last of the best so far is dropped there
 * and then, which is exact. Beyond that, seeded exchange searches. The answer does not depend on
 * the number of threads: patterns are judged in blocks against the same bound.
 */
final class DamperRanking {
  /** Patterns, images included, up to which all are looked at. */
  private static final BigInteger MOST = BigInteger.valueOf(40_000_000);

  private static final long MOST_DISTINCT = 3_000_000;
  private static final int BLOCK = 512;
  private static final int STARTS = 12;
  private static final int KEPT = 10;

  private final DamperPorts ports;
  private final DamperPatterns patterns;
  private final Progress progress;
  private final Comparator<Ranked> order =
      Comparator.comparingDouble(Ranked::worst).thenComparing(Ranked::pattern, Arrays::compare);
  private List<Ranked> best = new ArrayList<>();
  private long looked;
  private long dropped;
  private long unsure;

  /**
   * A pattern and what it does.
   *
   * @param pattern design of each position, counted from 1; 0 for none
   * @param worst largest growth rate in 1/s of the modes to be tamed; −∞ when all decay faster than
   *     the window goes
   * @param complete whether the count confirms the modes
   */
  record Ranked(int[] pattern, double worst, boolean complete) {}

  /**
   * What was found.
   *
   * @param best patterns, the best first
   * @param even the best of those as evenly spaced as the positions allow; null where no row of
   *     positions holds all dampers
   * @param all patterns there are, images included
   * @param distinct patterns looked at
   * @param dropped of them: early, on proof that they are worse
   * @param unsure of them: the count did not confirm the modes
   * @param everyOne whether every distinct pattern was looked at
   */
  record Outcome(
      List<Ranked> best,
      Ranked even,
      BigInteger all,
      long distinct,
      long dropped,
      long unsure,
      boolean everyOne) {}

  DamperRanking(DamperPorts ports, Progress progress) {
    this.ports = ports;
    this.patterns = new DamperPatterns(ports.caseFile(), ports.search());
    this.progress = progress;
  }

  Outcome run() {
    BigInteger all = patterns.all();
    boolean feasible =
        all.compareTo(MOST) <= 0
            && all.longValueExact() / patterns.symmetries().size() <= MOST_DISTINCT;
    return feasible ? outcome(true, this::everyPattern) : byExchange();
  }

  /** Without looking at every pattern. */
  Outcome byExchange() {
    return outcome(false, this::exchange);
  }

  private Outcome outcome(boolean everyOne, Runnable search) {
    List<Ranked> spaced = even().parallelStream().map(this::judged).toList();
    Ranked even = spaced.stream().min(order).orElse(null);
    spaced.forEach(this::offer);
    search.run();
    return new Outcome(List.copyOf(best), even, patterns.all(), looked, dropped, unsure, everyOne);
  }

  private void everyPattern() {
    long[] total = {0};
    patterns.forEachDistinct(p -> total[0]++);
    // A spread sample first: a good bound early spares the rest.
    List<int[]> block = new ArrayList<>();
    long stride = Math.max(1, total[0] / 64);
    long[] at = {0};
    if (stride > 4) {
      patterns.forEachDistinct(
          p -> {
            if (at[0]++ % stride == 0) {
              block.add(p);
            }
          });
      block.parallelStream().map(this::judged).toList().forEach(this::offer);
      block.clear();
    }
    String what = "patterns";
    patterns.forEachDistinct(
        p -> {
          block.add(p);
          if (block.size() == BLOCK) {
            judge(block);
            block.clear();
            progress.step(what, (int) looked, (int) total[0]);
          }
        });
    judge(block);
    progress.step(what, (int) looked, (int) total[0]);
  }

  private void judge(List<int[]> block) {
    double bound = bound();
    List<Ranked> results =
        block.parallelStream()
            .map(
                p ->
                    ports.damped(p).someRootBeyond(bound)
                        ? new Ranked(p, Double.POSITIVE_INFINITY, true)
                        : judged(p))
            .toList();
    looked += block.size();
    for (Ranked r : results) {
      if (r.worst == Double.POSITIVE_INFINITY) {
        dropped++;
      } else {
        unsure += r.complete ? 0 : 1;
        offer(r);
      }
    }
  }

  private double bound() {
    return best.size() < KEPT ? Double.POSITIVE_INFINITY : best.get(KEPT - 1).worst + 1e-6;
  }

  private Ranked judged(int[] pattern) {
    DampedRoots.Found found = ports.damped(pattern).all();
    return new Ranked(pattern, found.worst(), found.complete());
  }

  private void offer(Ranked r) {
    Ranked own = new Ranked(patterns.representative(r.pattern), r.worst, r.complete);
    if (best.stream().noneMatch(b -> Arrays.equals(b.pattern, own.pattern))) {
      List<Ranked> next = new ArrayList<>(best);
      next.add(own);
      next.sort(order);
      best = next.subList(0, Math.min(KEPT, next.size()));
    }
  }

  /** From random starts, the best change of one damper's place or of two unlike ones, till none. */
  private void exchange() {
    Random random = new Random(20_240_611);
    Map<String, Ranked> known = new HashMap<>();
    for (int start = 0; start < STARTS; start++) {
      progress.step("exchange searches", start, STARTS);
      Ranked now =
          start == 0 && !best.isEmpty()
              ? best.get(0)
              : judged(patterns.representative(any(random)));
      while (true) {
        offer(now);
        double bound = now.worst;
        Ranked next = now;
        Set<String> met = new LinkedHashSet<>();
        List<int[]> near = new ArrayList<>();
        for (int[] p : neighbours(now.pattern)) {
          int[] own = patterns.representative(p);
          Ranked before = known.get(Arrays.toString(own));
          if (before != null) {
            next = before.worst < next.worst - 1e-9 ? before : next;
          } else if (met.add(Arrays.toString(own))) {
            near.add(own);
          }
        }
        List<Ranked> tried =
            near.parallelStream()
                .map(
                    p ->
                        ports.damped(p).someRootBeyond(bound)
                            ? new Ranked(p, Double.POSITIVE_INFINITY, true)
                            : judged(p))
                .toList();
        looked += near.size();
        for (Ranked r : tried) {
          if (r.worst == Double.POSITIVE_INFINITY) {
            dropped++;
            continue;
          }
          unsure += r.complete ? 0 : 1;
          offer(r);
          known.put(Arrays.toString(r.pattern), r);
          next = r.worst < next.worst - 1e-9 ? r : next;
        }
        if (next == now) {
          break;
        }
        now = next;
      }
    }
    progress.step("exchange searches", STARTS, STARTS);
  }

  private int[] any(Random random) {
    int[] pattern = new int[ports.search().positions().size()];
    for (int c = 0; c < ports.search().candidates().size(); c++) {
      for (int k = 0; k < ports.search().candidates().get(c).count(); ) {
        int p = random.nextInt(pattern.length);
        if (pattern[p] == 0) {
          pattern[p] = c + 1;
          k++;
        }
      }
    }
    return pattern;
  }

  private static List<int[]> neighbours(int[] pattern) {
    List<int[]> near = new ArrayList<>();
    for (int a = 0; a < pattern.length; a++) {
      for (int b = 0; b < pattern.length; b++) {
        if (pattern[a] != pattern[b] && pattern[a] > 0 && (pattern[b] == 0 || a < b)) {
          int[] p = pattern.clone();
          p[a] = pattern[b];
          p[b] = pattern[a];
          near.add(p);
        }
      }
    }
    return near;
  }

  /** Patterns whose dampers lie as evenly round one row of positions as any row allows. */
  private List<int[]> even() {
    List<Damper.OnFace> places = ports.search().positions();
    int count = ports.search().count();
    int[] designs = interleaved();
    List<int[]> out = new ArrayList<>();
    Set<String> seen = new LinkedHashSet<>();
    double least = Double.POSITIVE_INFINITY;
    List<Integer> done = new ArrayList<>();
    for (int p = 0; p < places.size(); p++) {
      Damper.OnFace one = places.get(p);
      if (done.contains(p)) {
        continue;
      }
      int[] row =
          IntStream.range(0, places.size())
              .filter(q -> places.get(q).face().equals(one.face()) && places.get(q).x() == one.x())
              .boxed()
              .sorted(Comparator.comparingDouble(q -> positive(places.get(q).angle())))
              .mapToInt(q -> q)
              .toArray();
      Arrays.stream(row).forEach(done::add);
      for (int start = 0; start < row.length && row.length >= count; start++) {
        int[] pattern = new int[places.size()];
        double uneven = 0;
        for (int k = 0; k < count; k++) {
          double wanted = places.get(row[start]).angle() + 2 * Math.PI * k / count;
          int nearest = -1;
          for (int q : row) {
            if (pattern[q] == 0
                && (nearest < 0
                    || turn(places.get(q), wanted) < turn(places.get(nearest), wanted) - 1e-9)) {
              nearest = q;
            }
          }
          pattern[nearest] = designs[k];
          uneven += Math.pow(turn(places.get(nearest), wanted), 2);
        }
        if (uneven > least + 1e-9) {
          continue;
        }
        if (uneven < least - 1e-9) {
          out.clear();
          least = uneven;
        }
        int[] own = patterns.representative(pattern);
        if (seen.add(Arrays.toString(own))) {
          out.add(own);
        }
      }
    }
    return out;
  }

  private static double positive(double angle) {
    return angle - 2 * Math.PI * Math.floor(angle / (2 * Math.PI));
  }

  private static double turn(Damper.OnFace f, double angle) {
    return Math.abs(Math.IEEEremainder(f.angle() - angle, 2 * Math.PI));
  }

  /** Designs in an order in which each is spread as evenly as its number allows. */
  private int[] interleaved() {
    record Turn(double at, int design) {}
    List<Turn> turns = new ArrayList<>();
    for (int c = 0; c < ports.search().candidates().size(); c++) {
      int n = ports.search().candidates().get(c).count();
      for (int k = 0; k < n; k++) {
        turns.add(new Turn((k + 0.5) / n, c + 1));
      }
    }
    turns.sort(Comparator.comparingDouble(Turn::at).thenComparingInt(Turn::design));
    return turns.stream().mapToInt(Turn::design).toArray();
  }
}
