package org.annulet.cases.read;

import java.util.List;
import java.util.Optional;

/**
 * Inputs that are not known exactly.
 *
 * @param samples how many are drawn
 * @param seed of the draws
 * @param inputs with their spreads, in the order of the file; empty with scatter
 * @param correlations between inputs
 * @param scatter from burner to burner; empty with inputs
 */
public record Uncertainty(
    int samples,
    long seed,
    List<Input> inputs,
    List<Correlation> correlations,
    Optional<Scatter> scatter) {
  /** Copies the lists. */
  public Uncertainty {
    inputs = List.copyOf(inputs);
    correlations = List.copyOf(correlations);
  }

  /** How a value spreads. */
  public enum Shape {
    /** Normal distribution; the width is one standard deviation. */
    NORMAL,
    /** Evenly between value − width and value + width. */
    UNIFORM,
    /** As a triangle on value ± width with its tip over the value. */
    TRIANGULAR
  }

  /**
   * A spread about the value of the case.
   *
   * @param shape of the distribution
   * @param width as written: a share of the value in %, or a number with the value's unit
   */
  public record Spread(Shape shape, String width) {}

  /**
   * An input and its spread.
   *
   * @param key path of its key
   * @param spread about its value
   */
  public record Input(String key, Spread spread) {}

  /**
   * A correlation of the normal scores of two inputs.
   *
   * @param first position among the inputs
   * @param second position among the inputs
   * @param coefficient between −1 and 1
   */
  public record Correlation(int first, int second, double coefficient) {}

  /**
   * Every burner's own departure from the common response of a flame.
   *
   * @param flame its name
   * @param gain spread of the gain; empty when it does not scatter
   * @param delay spread of the delay
   */
  public record Scatter(String flame, Optional<Spread> gain, Optional<Spread> delay) {}
}
