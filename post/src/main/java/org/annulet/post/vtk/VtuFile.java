package org.annulet.post.vtk;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.zip.Deflater;
import org.annulet.post.files.WholeFile;

/**
 * An unstructured grid of triangles in VTK's XML format, version 1.0: appended raw data in blocks
 * of zlib, little-endian, headers of 64 bits. Arrays are added, then the file is written whole. Not
 * thread-safe.
 */
public final class VtuFile {
  /** Binary digits kept of an array on triangles. */
  private static final int STEPS = 18;

  private static final int BLOCK = 1 << 20;
  private static final byte TRIANGLE_CELL = 5;
  private static final byte LINE_CELL = 3;

  private final Surface surface;
  private final int[] lines;
  private final StringBuilder fieldData = new StringBuilder();
  private final StringBuilder pointData = new StringBuilder();
  private final StringBuilder cellData = new StringBuilder();
  private final List<byte[]> blocks = new ArrayList<>();
  private long offset;

  /** A file that shows fields on a surface. */
  public VtuFile(Surface surface) {
    this(surface, new int[0]);
  }

  /**
   * A file that shows fields on a surface and on lines, whose cells come after the triangles.
   *
   * @param lines numbers of the two points of each line, shape [lines × 2]
   */
  public VtuFile(Surface surface, int[] lines) {
    this.surface = surface;
    this.lines = lines.clone();
  }

  private int cellCount() {
    return surface.triangleCount() + lines.length / 2;
  }

  /** Adds a number that belongs to the whole file. */
  public VtuFile field(String name, double value) {
    fieldData
        .append("<DataArray type=\"Float64\" Name=\"")
        .append(escape(name))
        .append("\" NumberOfTuples=\"1\" format=\"ascii\">")
        .append(value)
        .append("</DataArray>\n");
    return this;
  }

  /** Adds texts that belong to the whole file (names of zones, in order). */
  public VtuFile field(String name, List<String> texts) {
    fieldData
        .append("<DataArray type=\"String\" Name=\"")
        .append(escape(name))
        .append("\" NumberOfTuples=\"")
        .append(texts.size())
        .append("\" format=\"ascii\">");
    for (String text : texts) {
      for (byte b : text.getBytes(StandardCharsets.UTF_8)) {
        fieldData.append(b & 0xff).append(' ');
      }
      fieldData.append("0 ");
    }
    fieldData.append("</DataArray>\n");
    return this;
  }

  /**
   * Adds one number for each point.
   *
   * @param values shape [points of the surface]
   */
  public VtuFile points(String name, double[] values) {
    check(name, values.length, surface.pointCount());
    pointData.append(array("Float64", name, 1, bytes(values)));
    return this;
  }

  /**
   * Adds one number in single precision for each point.
   *
   * @param values shape [points of the surface]
   */
  public VtuFile points(String name, float[] values) {
    check(name, values.length, surface.pointCount());
    pointData.append(array("Float32", name, 1, bytes(values)));
    return this;
  }

  /**
   * Adds one whole number for each triangle and line.
   *
   * @param values shape [triangles of the surface + lines]
   */
  public VtuFile cells(String name, int[] values) {
    check(name, values.length, cellCount());
    cellData.append(array("Int32", name, 1, bytes(values)));
    return this;
  }

  /**
   * Adds numbers for each triangle and line.
   *
   * @param values shape [(triangles of the surface + lines) × components]
   */
  public VtuFile cells(String name, double[] values, int components) {
    check(name, values.length, cellCount() * components);
    cellData.append(array("Float64", name, components, bytes(values)));
    return this;
  }

  /**
   * Adds numbers in single precision for each triangle, in steps of 2⁻¹⁸ of the largest: what is
   * constant on a triangle is not known better, and rounding noise would not shrink.
   *
   * @param values shape [triangles of the surface × components]
   */
  public VtuFile cells(String name, float[] values, int components) {
    check(name, values.length, surface.triangleCount() * components);
    cellData.append(array("Float32", name, components, bytes(stepped(values))));
    return this;
  }

  private static float[] stepped(float[] values) {
    float largest = 0;
    for (float x : values) {
      largest = Math.max(largest, Math.abs(x));
    }
    double step = Math.scalb(1.0, Math.getExponent(largest) + 1 - STEPS);
    float[] out = values.clone();
    for (int i = 0; step > 0 && i < out.length; i++) {
      out[i] = (float) (step * Math.rint(values[i] / step)) + 0f; // no negative zero
    }
    return out;
  }

  private static void check(String name, int got, int expected) {
    if (got != expected) {
      throw new IllegalArgumentException(
          "array '" + name + "' has " + got + " values, expected " + expected);
    }
  }

  /**
   * Writes the file, whole or not at all.
   *
   * @throws IOException if the folder cannot be written
   */
  public void write(Path file) throws IOException {
    int n = cellCount();
    int triangles = surface.triangleCount();
    int[] corners = Arrays.copyOf(surface.triangles(), 3 * triangles + lines.length);
    System.arraycopy(lines, 0, corners, 3 * triangles, lines.length);
    int[] offsets = new int[n];
    byte[] types = new byte[n];
    for (int t = 0; t < n; t++) {
      offsets[t] = 3 * Math.min(t + 1, triangles) + 2 * Math.max(0, t + 1 - triangles);
      types[t] = t < triangles ? TRIANGLE_CELL : LINE_CELL;
    }
    StringBuilder head = new StringBuilder(2000);
    head.append("<?xml version=\"1.0\"?>\n")
        .append("<VTKFile type=\"UnstructuredGrid\" version=\"1.0\" byte_order=\"LittleEndian\"")
        .append(" header_type=\"UInt64\" compressor=\"vtkZLibDataCompressor\">\n")
        .append("<UnstructuredGrid>\n<FieldData>\n")
        .append(fieldData)
        .append("</FieldData>\n<Piece NumberOfPoints=\"")
        .append(surface.pointCount())
        .append("\" NumberOfCells=\"")
        .append(n)
        .append("\">\n<PointData>\n")
        .append(pointData)
        .append("</PointData>\n<CellData>\n")
        .append(cellData)
        .append("</CellData>\n<Points>\n")
        .append(array("Float64", "Points", 3, bytes(surface.points())))
        .append("</Points>\n<Cells>\n")
        .append(array("Int32", "connectivity", 1, bytes(corners)))
        .append(array("Int32", "offsets", 1, bytes(offsets)))
        .append(array("UInt8", "types", 1, types))
        .append("</Cells>\n</Piece>\n</UnstructuredGrid>\n")
        .append("<AppendedData encoding=\"raw\">\n_");
    ByteArrayOutputStream out = new ByteArrayOutputStream((int) offset + head.length() + 100);
    out.writeBytes(head.toString().getBytes(StandardCharsets.UTF_8));
    blocks.forEach(out::writeBytes);
    out.writeBytes("\n</AppendedData>\n</VTKFile>\n".getBytes(StandardCharsets.UTF_8));
    WholeFile.write(file, out.toByteArray());
  }

  private String array(String type, String name, int components, byte[] raw) {
    byte[] block = compress(raw);
    String text =
        "<DataArray type=\""
            + type
            + "\" Name=\""
            + escape(name)
            + "\""
            + (components > 1 ? " NumberOfComponents=\"" + components + "\"" : "")
            + " format=\"appended\" offset=\""
            + offset
            + "\"/>\n";
    blocks.add(block);
    offset += block.length;
    return text;
  }

  /** Header (block count, block size, size of the last, compressed sizes) and zlib blocks. */
  private static byte[] compress(byte[] raw) {
    int count = (raw.length + BLOCK - 1) / BLOCK;
    ByteBuffer header = ByteBuffer.allocate(8 * (3 + count)).order(ByteOrder.LITTLE_ENDIAN);
    header.putLong(count).putLong(BLOCK).putLong(raw.length % BLOCK);
    ByteArrayOutputStream data = new ByteArrayOutputStream(raw.length / 2 + 64);
    Deflater deflater = new Deflater();
    byte[] buffer = new byte[1 << 16];
    for (int b = 0; b < count; b++) {
      deflater.reset();
      deflater.setInput(raw, b * BLOCK, Math.min(BLOCK, raw.length - b * BLOCK));
      deflater.finish();
      long size = 0;
      while (!deflater.finished()) {
        int got = deflater.deflate(buffer);
        data.write(buffer, 0, got);
        size += got;
      }
      header.putLong(size);
    }
    deflater.end();
    ByteArrayOutputStream all = new ByteArrayOutputStream(header.capacity() + data.size());
    all.writeBytes(header.array());
    all.writeBytes(data.toByteArray());
    return all.toByteArray();
  }

  private static byte[] bytes(float[] values) {
    ByteBuffer b = ByteBuffer.allocate(4 * values.length).order(ByteOrder.LITTLE_ENDIAN);
    b.asFloatBuffer().put(values);
    return b.array();
  }

  private static byte[] bytes(double[] values) {
    ByteBuffer b = ByteBuffer.allocate(8 * values.length).order(ByteOrder.LITTLE_ENDIAN);
    b.asDoubleBuffer().put(values);
    return b.array();
  }

  private static byte[] bytes(int[] values) {
    ByteBuffer b = ByteBuffer.allocate(4 * values.length).order(ByteOrder.LITTLE_ENDIAN);
    b.asIntBuffer().put(values);
    return b.array();
  }

  static String escape(String text) {
    return text.replace("&", "&amp;")
        .replace("<", "&lt;")
        .replace(">", "&gt;")
        .replace("\"", "&quot;");
  }
}
