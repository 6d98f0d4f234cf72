package org.annulet.solver.modes;

import java.util.List;

/**
 * The modes of one operator in a window, with the certificate that none is missing.
 *
 * @param window asked for
 * @param contour searched and counted, at least as large as the window
 * @param modes in the window, by frequency
 * @param outside modes found in the margin between window and contour
 * @param countByArgumentPrinciple eigenvalues inside the contour, with multiplicity, counted apart
 *     from the search; −1 when two counts of different fineness did not agree
 * @param complete whether that count equals the number of modes found inside the contour and every
 *     one of them converged
 * @param notes plain sentences on anything a reader should know (margin moved, poles in the window,
 *     count that disagreed)
 */
public record ModeSet(
    Window window,
    Window contour,
    List<Mode> modes,
    List<Mode> outside,
    int countByArgumentPrinciple,
    boolean complete,
    List<String> notes) {}
