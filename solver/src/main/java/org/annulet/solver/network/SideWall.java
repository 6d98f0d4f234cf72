package org.annulet.solver.network;

import org.annulet.solver.boundary.ReactingWall;

/**
 * A reacting wall along a duct.
 *
 * @param wall what it does
 * @param perimeter in m: its area over the duct's length
 */
public record SideWall(ReactingWall wall, double perimeter) {}
