package org.annulet.mesher.geometry;

/**
 * A named point of an outline.
 *
 * @param name its name, unique in the outline
 * @param x first coordinate in m
 * @param y second coordinate in m
 */
public record Point(String name, double x, double y) {}
