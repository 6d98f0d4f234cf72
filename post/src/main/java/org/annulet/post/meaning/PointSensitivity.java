package org.annulet.post.meaning;

/**
 * How a mode moves when one coordinate of one named point of the outline is raised by a millimetre,
 * all other points held; the edges through the point follow.
 *
 * <p>First order, so the effects of several points add: an edge that moves as a whole does the sum
 * of what its points do.
 *
 * @param key path of the coordinate in the case file
 * @param point name of the point
 * @param coordinate what the coordinate is called: x, r, y or z
 * @param value as written in the case file
 * @param growthPerMillimetre change of the growth rate in 1/s for one millimetre more
 * @param frequencyPerMillimetre change of the frequency in Hz for one millimetre more
 * @param linearRange change of the coordinate in mm, up or down, within which these values hold to
 *     a tenth (from the second derivative)
 */
public record PointSensitivity(
    String key,
    String point,
    String coordinate,
    String value,
    double growthPerMillimetre,
    double frequencyPerMillimetre,
    double linearRange) {}
