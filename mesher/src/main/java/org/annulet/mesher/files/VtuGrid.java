package org.annulet.mesher.files;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;

/**
 * What stands in an unstructured grid of VTK's XML format (.vtu): points, cells, and the arrays on
 * them. All pieces of the file are put one behind the other.
 *
 * @param points coordinates in the file's unit, shape [points × 3]
 * @param corners point numbers of all cells in a row
 * @param offsets end of each cell in {@code corners}, shape [cells]
 * @param types VTK's number for the shape of each cell (3 line, 5 triangle, 9 quadrilateral, 10
 *     tetrahedron, 12 hexahedron), shape [cells]
 * @param pointData arrays on the points by name
 * @param cellData arrays on the cells by name
 * @param texts lists of words that belong to the whole file, by name
 */
public record VtuGrid(
    double[] points,
    int[] corners,
    int[] offsets,
    int[] types,
    Map<String, Field> pointData,
    Map<String, Field> cellData,
    Map<String, List<String>> texts) {

  /**
   * One array.
   *
   * @param values shape [points or cells × components]
   * @param components numbers for each point or cell
   */
  public record Field(double[] values, int components) {}

  /**
   * Reads a file: text, base64 or raw, inline or appended, as it is or compressed by zlib, either
   * byte order, headers of 32 or 64 bits.
   *
   * @throws MeshFileException if it is not such a file or is damaged
   * @throws IOException if it cannot be read
   */
  public static VtuGrid read(Path file) throws IOException {
    return new VtuParser(file.toString(), ByteCursor.load(file)).read();
  }

  /** Number of points. */
  public int pointCount() {
    return points.length / 3;
  }

  /** Number of cells. */
  public int cellCount() {
    return types.length;
  }

  /** First corner of cell {@code c} in {@link #corners()}; its last is before the cell's offset. */
  public int begin(int c) {
    return c == 0 ? 0 : offsets[c - 1];
  }
}
