package org.annulet.mesher.mesh;

import java.util.Map;
import java.util.Set;

/**
 * What one burner cell of a ring has that the others do not. It changes names and leaves zones out;
 * the nodes and triangles that stay are the same, to the last bit, as in every other cell.
 *
 * @param cell number of the cell, 0 … N − 1
 * @param zonesLeftOut zones this cell does not have (a burner left out); where such a zone bordered
 *     on one that stays, the border becomes a wall and must have a name
 * @param zoneNames new names for zones of this cell, by their name in the half cell
 * @param edgeNames new names for edges of this cell, by their name in the half cell
 */
public record CellException(
    int cell,
    Set<String> zonesLeftOut,
    Map<String, String> zoneNames,
    Map<String, String> edgeNames) {
  public CellException {
    zonesLeftOut = Set.copyOf(zonesLeftOut);
    zoneNames = Map.copyOf(zoneNames);
    edgeNames = Map.copyOf(edgeNames);
  }

  /** A cell without the given zones. */
  public static CellException without(int cell, Set<String> zones) {
    return new CellException(cell, zones, Map.of(), Map.of());
  }

  /** A cell in which edges have other names, say a damper port where the others have a wall. */
  public static CellException withEdges(int cell, Map<String, String> edgeNames) {
    return new CellException(cell, Set.of(), Map.of(), edgeNames);
  }
}
