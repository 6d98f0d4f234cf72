package org.annulet.cases.read;

import java.util.List;
import java.util.OptionalDouble;
import org.annulet.solver.flame.HeatDensity;

/**
 * A flame: the same at every burner, with exceptions.
 *
 * @param name of the flame
 * @param heatRelease mean, all burners together, in W
 * @param fuelFlow mass flow of fuel, all burners together, in kg/s, to check the heat release
 *     against; empty when not given
 * @param place where the heat is released
 * @param reference where the velocity is taken that it answers to
 * @param referenceVelocity mean velocity there in m/s; NaN for a flame that answers to pressure
 * @param response (q̂/Q̄)/(û/ū)
 * @param staging exceptions for single burners, later ones win
 */
public record Flame(
    String name,
    double heatRelease,
    OptionalDouble fuelFlow,
    Place place,
    Reference reference,
    double referenceVelocity,
    Response response,
    List<StagedBurners> staging) {

  /** Where heat is released. */
  public sealed interface Place {}

  /** How a sheet answers. */
  public enum Answer {
    /** One answer to the mean velocity. */
    UNIFORM,
    /** Each point answers to the velocity just upstream of it. */
    POINTWISE
  }

  /**
   * Thin, on an inner edge.
   *
   * @param edge name of the inner edge
   * @param answer how it answers
   */
  public record Sheet(String edge, Answer answer) implements Place {}

  /**
   * Spread evenly over a zone, or the part of it between two axial coordinates.
   *
   * @param zone name of the zone
   * @param from smallest x in m; −∞ for the whole zone
   * @param to largest x in m; +∞ for the whole zone
   * @param width on a ring the extent along the zone's mean radius around each burner's centre
   *     line, in m; +∞ for the burner's whole share of the ring, and on other kinds
   */
  public record Spread(String zone, double from, double to, double width) implements Place {}

  /**
   * Spread over a zone by a density.
   *
   * @param zone name of the zone
   * @param width as in {@link Spread}
   * @param density of the heat release, up to a factor
   */
  public record Brush(String zone, double width, HeatDensity density) implements Place {}

  /** Where the reference velocity is taken. */
  public sealed interface Reference {}

  /**
   * Mean velocity through an inner edge, by the consistent flux of its upstream side.
   *
   * @param edge name of the inner edge
   * @param flowFrom name of the zone the mean flow comes from; velocity counts positive out of it
   */
  public record EdgeFlux(String edge, String flowFrom) implements Reference {}

  /**
   * Mean velocity over a patch: a zone, or the part of it between two axial coordinates.
   *
   * @param zone name of the zone
   * @param from smallest x in m; −∞ for the whole zone
   * @param to largest x in m; +∞ for the whole zone
   * @param width as in {@link Spread}
   * @param directionX first component of the unit vector along which velocity counts positive
   * @param directionY second component
   */
  public record Patch(
      String zone, double from, double to, double width, double directionX, double directionY)
      implements Reference {}

  /**
   * Mean pressure on an edge: the flame answers (q̂/Q̄)/(p̂/p̄).
   *
   * @param edge name of the edge
   */
  public record EdgePressure(String edge) implements Reference {}

  /**
   * Mean pressure over a patch, as in {@link Patch}.
   *
   * @param zone name of the zone
   * @param from smallest x in m; −∞ for the whole zone
   * @param to largest x in m; +∞ for the whole zone
   * @param width as in {@link Spread}
   */
  public record PatchPressure(String zone, double from, double to, double width)
      implements Reference {}

  /** Flame response over s. */
  public sealed interface Response {}

  /**
   * n–τ: F(s) = n e^{−sτ}.
   *
   * @param gain n
   * @param delay τ in s, not negative
   */
  public record GainDelay(double gain, double delay) implements Response {}

  /**
   * Delays spread as a normal distribution: F(s) = n e^{−sτ + s²σ²/2}.
   *
   * @param gain n
   * @param delay mean τ in s, not negative
   * @param deviation σ in s, not negative
   */
  public record SpreadDelay(double gain, double delay, double deviation) implements Response {}

  /**
   * A delayed response through a first-order low-pass: F(s) = n e^{−sτ}/(1 + s/2πf).
   *
   * @param gain n
   * @param delay τ in s, not negative
   * @param cutoff f in Hz, positive
   */
  public record LowPass(double gain, double delay, double cutoff) implements Response {}

  /**
   * Several delayed responses side by side.
   *
   * @param parts at least one
   */
  public record DelaySum(List<GainDelay> parts) implements Response {}

  /** What is known of F at zero frequency. */
  public enum Limit {
    /** F(0) = 1. */
    PREMIXED,
    /** F(0) = 0. */
    TECHNICALLY_PREMIXED,
    /** What the table says. */
    AS_MEASURED
  }

  /**
   * A table over frequency.
   *
   * @param table F at s = 2πi f
   * @param limit at zero frequency
   */
  public record Measured(FrequencyTable table, Limit limit) implements Response {}

  /**
   * What differs at some burners.
   *
   * @param burners counted from 1
   * @param gain n there
   * @param delay τ there in s
   * @param heatShare heat release there over that of the rule
   */
  public record StagedBurners(
      List<Integer> burners, OptionalDouble gain, OptionalDouble delay, OptionalDouble heatShare) {}

  /** Response at a burner, counted from 1, with its exceptions. */
  public Response responseAt(int burner) {
    Response here = response;
    for (StagedBurners e : staging) {
      if (e.burners().contains(burner)) {
        here = changed(here, e.gain(), e.delay());
      }
    }
    return here;
  }

  /** The response with another gain or delay; sums and tables have none of their own. */
  private static Response changed(Response r, OptionalDouble gain, OptionalDouble delay) {
    if (r instanceof GainDelay n) {
      return new GainDelay(gain.orElse(n.gain()), delay.orElse(n.delay()));
    }
    if (r instanceof SpreadDelay n) {
      return new SpreadDelay(gain.orElse(n.gain()), delay.orElse(n.delay()), n.deviation());
    }
    if (r instanceof LowPass n) {
      return new LowPass(gain.orElse(n.gain()), delay.orElse(n.delay()), n.cutoff());
    }
    return r;
  }

  /** Heat release at a burner, counted from 1, over that of the rule, with its exceptions. */
  public double heatShareAt(int burner) {
    double share = 1;
    for (StagedBurners e : staging) {
      if (e.burners().contains(burner)) {
        share = e.heatShare().orElse(share);
      }
    }
    return share;
  }
}
