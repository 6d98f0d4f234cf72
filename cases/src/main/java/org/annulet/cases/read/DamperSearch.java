package org.annulet.cases.read;

import java.util.List;

/**
 * Dampers to be placed on a ring.
 *
 * @param candidates designs and how many of each are used
 * @param positions where one may sit, all free, at least as many as dampers
 * @param lowestFrequency of the modes to be tamed, in Hz
 * @param highestFrequency of the modes to be tamed, in Hz
 */
public record DamperSearch(
    List<Candidate> candidates,
    List<Damper.OnFace> positions,
    double lowestFrequency,
    double highestFrequency) {
  /** Copies the lists. */
  public DamperSearch {
    candidates = List.copyOf(candidates);
    positions = List.copyOf(positions);
  }

  /**
   * A design.
   *
   * @param name of the design
   * @param count how many are used, at least one
   * @param design what it is
   * @param gasOf zone whose mean gas fills it; empty for the gas at the mouth
   * @param mouthWidth width of the patch of wall it sees, in m; NaN for √(mouth area)
   */
  public record Candidate(
      String name, int count, Damper.Design design, String gasOf, double mouthWidth) {
    /** The dampers of this design at some places. */
    public Damper at(List<? extends Damper.Place> places) {
      return new Damper(name, design, gasOf, List.copyOf(places), mouthWidth);
    }
  }

  /** How many dampers are placed. */
  public int count() {
    return candidates.stream().mapToInt(Candidate::count).sum();
  }
}
