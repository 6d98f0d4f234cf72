package org.annulet.post.meaning;

/**
 * How a mode moves when one input of the case is raised by one percent, all others held.
 *
 * <p>First order and exact in that order. Of an exact pair the two members move apart where the
 * input breaks the symmetry; the first entry of the pair then has the larger change of growth rate.
 *
 * @param key path of the input in the case file
 * @param value as written there
 * @param growthPerPercent change of the growth rate in 1/s for one percent more
 * @param frequencyPerPercent change of the frequency in Hz for one percent more
 * @param linearRange change of the input in percent, up or down, within which these values hold to
 *     a tenth (from the second derivative); infinite where the mode moves along a straight line
 */
public record ParameterSensitivity(
    String key,
    String value,
    double growthPerPercent,
    double frequencyPerPercent,
    double linearRange) {}
