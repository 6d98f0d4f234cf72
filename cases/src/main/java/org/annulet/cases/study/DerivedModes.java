package org.annulet.cases.study;

import java.util.List;
import org.annulet.solver.derivative.ModeDerivative;
import org.annulet.solver.modes.Mode;

/**
 * The modes of one eigenvalue of one operator, with their left vectors.
 *
 * @param part index of the operator in the problem
 * @param members one, or the two of an exact pair
 * @param derivative right and left vectors, one column for each member
 */
record DerivedModes(int part, List<Mode> members, ModeDerivative derivative) {}
