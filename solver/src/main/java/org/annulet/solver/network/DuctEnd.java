package org.annulet.solver.network;

import org.annulet.solver.boundary.EdgeGas;
import org.annulet.solver.boundary.Wall;

/**
 * An end of the chain.
 *
 * @param wall what stands there
 * @param gas at it
 * @param area in m²
 */
public record DuctEnd(Wall wall, EdgeGas gas, double area) {}
