package org.annulet.cases.compare;

import org.annulet.cases.read.ModeTable;

/**
 * A mode of the chamber as the comparison sees it.
 *
 * @param number in the table of modes, from 1; of those outside the window after the others
 * @param frequency in Hz
 * @param frequencyError error bar in Hz; NaN where not estimated
 * @param growthRate in 1/s
 * @param growthError error bar in 1/s; NaN where not estimated
 * @param order azimuthal order; −1 where the geometry has none
 * @param partner number of the other member of its pair; 0 without one
 * @param label in words
 * @param inside whether it lies in the window
 * @param shape along the axis; null where there is none
 */
record OurMode(
    int number,
    double frequency,
    double frequencyError,
    double growthRate,
    double growthError,
    int order,
    int partner,
    String label,
    boolean inside,
    ModeTable.Shape shape) {}
