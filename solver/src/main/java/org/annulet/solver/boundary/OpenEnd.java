package org.annulet.solver.boundary;

/** An end at constant pressure: p̂ = 0; its unknowns are eliminated. */
public record OpenEnd() implements Wall {}
