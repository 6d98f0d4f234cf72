package org.annulet.solver.assembly;

/** What the plane coordinates (x, y) of the mesh mean. */
public sealed interface Geometry permits Section, Ring, CrossSection, Plane {}
