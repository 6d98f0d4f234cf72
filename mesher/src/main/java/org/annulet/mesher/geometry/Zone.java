package org.annulet.mesher.geometry;

import java.util.List;

/**
 * A named zone of an outline: the part of the plane inside one closed loop of edges and outside its
 * holes.
 *
 * @param name its name, unique in the outline
 * @param boundary names of the edges of the outer loop, in order; each may run either way
 * @param holes loops of edge names, each as {@code boundary}
 */
public record Zone(String name, List<String> boundary, List<List<String>> holes) {
  /** Copies the lists. */
  public Zone {
    boundary = List.copyOf(boundary);
    holes = holes.stream().map(List::copyOf).toList();
  }
}
