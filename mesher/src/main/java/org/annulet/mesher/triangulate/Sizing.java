package org.annulet.mesher.triangulate;

import java.util.Map;
import java.util.TreeMap;
import java.util.function.DoubleBinaryOperator;

/**
 * How large the triangles may be; immutable.
 *
 * <p>Every size is the largest side of a triangle in m. The smallest of all that apply at a place
 * counts; away from a place with a small size the size grows by at most {@link #growth()} per unit
 * of distance.
 */
public final class Sizing {
  private final double largestSide;
  private final Map<String, Double> edges;
  private final Map<String, Double> zones;
  private final double growth;
  private final double cornerShare;
  private final double largestTurn;
  private final int nodeCap;
  private final DoubleBinaryOperator field;

  private Sizing(Builder b) {
    largestSide = b.largestSide;
    edges = Map.copyOf(b.edges);
    zones = Map.copyOf(b.zones);
    growth = b.growth;
    cornerShare = b.cornerShare;
    largestTurn = b.largestTurn;
    nodeCap = b.nodeCap;
    field = b.field;
  }

  /** One size everywhere, in m, with the usual grading into re-entrant corners. */
  public static Sizing of(double largestSide) {
    return new Builder(largestSide).build();
  }

  /** A builder that starts from one size everywhere, in m. */
  public static Builder builder(double largestSide) {
    return new Builder(largestSide);
  }

  /** A builder that starts from these sizes. */
  public Builder toBuilder() {
    Builder b = new Builder(largestSide);
    b.edges.putAll(edges);
    b.zones.putAll(zones);
    b.growth = growth;
    b.cornerShare = cornerShare;
    b.largestTurn = largestTurn;
    b.nodeCap = nodeCap;
    b.field = field;
    return b;
  }

  /** The same sizes, all multiplied by a factor; growth, turn and caps stay. */
  public Sizing scaled(double factor) {
    Builder b = toBuilder();
    b.largestSide = positive(largestSide * factor, "the largest side");
    b.edges.replaceAll((k, v) -> v * factor);
    b.zones.replaceAll((k, v) -> v * factor);
    if (field != null) {
      DoubleBinaryOperator f = field;
      b.field = (x, y) -> factor * f.applyAsDouble(x, y);
    }
    return b.build();
  }

  /** Largest side anywhere, in m. */
  public double largestSide() {
    return largestSide;
  }

  /** Sizes of named edges, in m. */
  public Map<String, Double> edges() {
    return edges;
  }

  /** Sizes of named zones, in m. */
  public Map<String, Double> zones() {
    return zones;
  }

  /** Growth of the size per unit of distance. */
  public double growth() {
    return growth;
  }

  /** Size at a re-entrant corner as a share of the size around it; 1 for no grading. */
  public double cornerShare() {
    return cornerShare;
  }

  /** Largest angle one side on a curved edge may span, in degrees. */
  public double largestTurn() {
    return largestTurn;
  }

  /** Most nodes the mesh may have. */
  public int nodeCap() {
    return nodeCap;
  }

  /** Size in m wanted at (x, y), or null where only the other rules count. */
  DoubleBinaryOperator field() {
    return field;
  }

  private static double positive(double v, String what) {
    if (!(v > 0) || Double.isInfinite(v)) {
      throw new IllegalArgumentException(
          what + " must be positive and finite, got " + v + " m; give a length in m");
    }
    return v;
  }

  /** Collects sizes; not thread-safe. */
  public static final class Builder {
    private double largestSide;
    private final Map<String, Double> edges = new TreeMap<>();
    private final Map<String, Double> zones = new TreeMap<>();
    private double growth = 0.3;
    private double cornerShare = 0.25;
    private double largestTurn = 15;
    private int nodeCap = 4_000_000;
    private DoubleBinaryOperator field;

    private Builder(double largestSide) {
      this.largestSide = positive(largestSide, "the largest side");
    }

    /** Size along a named edge, in m. */
    public Builder edge(String name, double size) {
      edges.put(name, positive(size, "the size at edge '" + name + "'"));
      return this;
    }

    /** Size in a named zone, in m. */
    public Builder zone(String name, double size) {
      zones.put(name, positive(size, "the size in zone '" + name + "'"));
      return this;
    }

    /** Growth of the size per unit of distance, in 0.001 … 1; 0.3 unless set. */
    public Builder growth(double growth) {
      if (!(growth >= 0.001 && growth <= 1)) {
        throw new IllegalArgumentException("growth must lie in 0.001 … 1, got " + growth);
      }
      this.growth = growth;
      return this;
    }

    /** Size at re-entrant corners as a share of the size around, in 0.001 … 1; 0.25 unless set. */
    public Builder cornerShare(double share) {
      if (!(share >= 0.001 && share <= 1)) {
        throw new IllegalArgumentException("corner share must lie in 0.001 … 1, got " + share);
      }
      this.cornerShare = share;
      return this;
    }

    /** Largest angle one side on a curved edge may span, in 1 … 30 degrees; 15 unless set. */
    public Builder largestTurn(double degrees) {
      if (!(degrees >= 1 && degrees <= 30)) {
        throw new IllegalArgumentException("largest turn must lie in 1 … 30°, got " + degrees);
      }
      this.largestTurn = degrees;
      return this;
    }

    /** Most nodes before meshing stops with an error; 4 million unless set. */
    public Builder nodeCap(int nodes) {
      if (nodes < 4) {
        throw new IllegalArgumentException("the node cap must be at least 4, got " + nodes);
      }
      this.nodeCap = nodes;
      return this;
    }

    /**
     * Size about a spot, as round the mouth of a damper: {@code size} within {@code radius}, and
     * growing from there.
     *
     * @param x of the spot in m
     * @param y of the spot in m
     * @param radius in m
     * @param size in m
     */
    public Builder near(double x, double y, double radius, double size) {
      positive(size, "the size near a spot");
      DoubleBinaryOperator before = field;
      double slope = growth;
      field =
          (px, py) -> {
            double own = size + slope * Math.max(0, Math.hypot(px - x, py - y) - radius);
            double other = before == null ? 0 : before.applyAsDouble(px, py);
            return other > 0 ? Math.min(own, other) : own;
          };
      return this;
    }

    /**
     * Size in m wanted at each place (x, y) in m, besides the other rules; a pure function. Sampled
     * at nodes, so it should not vary faster than the growth.
     */
    public Builder field(DoubleBinaryOperator size) {
      this.field = size;
      return this;
    }

    /** The sizing. */
    public Sizing build() {
      return new Sizing(this);
    }
  }
}
