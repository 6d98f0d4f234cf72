package org.annulet.mesher.mesh;

/**
 * A ring mesh and the half burner cell it was made of: the half cell is mirrored about the burner's
 * centre line and laid N times round the ring, so the whole has the ring's rotational and mirror
 * symmetry to the last bit.
 *
 * <p>The half cell spans 0 ≤ y ≤ pitch/2: y = 0 is the centre line of the burner (edge {@value
 * #MIRROR}), y = pitch/2 the seam to the next cell (edge {@value #SEAM}). Cell j of the whole has
 * its burner's centre at y = j · pitch, j = 0 … N − 1.
 *
 * @param half the half cell, not periodic; edges as in the whole plus {@value #MIRROR} and {@value
 *     #SEAM}
 * @param whole the ring, periodic with N · pitch
 * @param count number of burners N
 * @param cell cell j of each node of the whole, shape [nodes of whole]; a node on the seam between
 *     cells j and j + 1 belongs to cell j, a node on a centre line is not mirrored
 * @param halfNode node of the half cell each node of the whole is an image of, shape [nodes of
 *     whole]
 * @param mirrored whether the image is mirrored (y &lt; centre line), shape [nodes of whole]
 */
public record RingCells(
    Mesh half, Mesh whole, int count, int[] cell, int[] halfNode, boolean[] mirrored) {
  /** Name of the edge on the burner's centre line in the half cell. */
  public static final String MIRROR = "mirror";

  /** Name of the edge between two neighbouring cells in the half cell. */
  public static final String SEAM = "seam";
}
