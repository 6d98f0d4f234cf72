/** Modes, the window they are sought in and the certificate that none is missing. */
package org.annulet.solver.modes;
