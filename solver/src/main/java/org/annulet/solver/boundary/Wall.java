package org.annulet.solver.boundary;

/**
 * What one named edge, or one face of a ring's zone, does to the gas. An edge without a wall is
 * rigid.
 */
public sealed interface Wall permits Rigid, OpenEnd, ReactingWall {}
