package org.annulet.solver.boundary;

/** A wall that does not move: û·n = 0, the natural condition of the weak form. */
public record Rigid() implements Wall {}
