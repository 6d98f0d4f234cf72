package org.annulet.mesher.files;

import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Base64;
import java.util.List;
import java.util.StringTokenizer;
import java.util.zip.DataFormatException;
import java.util.zip.Inflater;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.Text;

/** The numbers of the data arrays of one .vtu file, however they are written. */
final class VtuArrays {
  private final VtuParser parser;
  private final ByteOrder order;
  private final int headerBytes;
  private final boolean compressed;
  private final byte[] appended;
  private final boolean appendedBase64;

  VtuArrays(VtuParser parser, Element root, byte[] appended, boolean appendedBase64)
      throws MeshFileException {
    this.parser = parser;
    this.appended = appended;
    this.appendedBase64 = appendedBase64;
    order =
        root.getAttribute("byte_order").equals("BigEndian")
            ? ByteOrder.BIG_ENDIAN
            : ByteOrder.LITTLE_ENDIAN;
    headerBytes = root.getAttribute("header_type").equals("UInt64") ? 8 : 4;
    String compressor = root.getAttribute("compressor");
    compressed = !compressor.isEmpty();
    if (compressed && !compressor.equals("vtkZLibDataCompressor")) {
      throw parser.fault(
          "data compressed by " + compressor, "write it compressed by zlib, or not compressed");
    }
  }

  static boolean isNumeric(Element array) {
    return array.getAttribute("type").matches("U?Int(8|16|32|64)|Float(32|64)");
  }

  double[] doubles(Element array, long expected) throws MeshFileException {
    String type = array.getAttribute("type");
    if (!isNumeric(array)) {
      throw fault(array, "the type '" + type + "' is not known");
    }
    if (array.getAttribute("format").equals("ascii")) {
      return text(array, expected);
    }
    int width = Integer.parseInt(type.replaceAll("\\D", "")) / 8;
    byte[] raw = raw(array, expected * width);
    if (raw.length != expected * width) {
      throw fault(array, "it has " + raw.length / width + " values where " + expected + " belong");
    }
    ByteBuffer b = ByteBuffer.wrap(raw).order(order);
    double[] values = new double[(int) expected];
    for (int i = 0; i < values.length; i++) {
      values[i] =
          switch (type) {
            case "Float64" -> b.getDouble();
            case "Float32" -> b.getFloat();
            case "Int64", "UInt64" -> b.getLong();
            case "Int32" -> b.getInt();
            case "UInt32" -> Integer.toUnsignedLong(b.getInt());
            case "Int16" -> b.getShort();
            case "UInt16" -> Short.toUnsignedInt(b.getShort());
            case "Int8" -> b.get();
            default -> Byte.toUnsignedInt(b.get());
          };
    }
    return values;
  }

  int[] integers(Element array, int expected) throws MeshFileException {
    double[] values = doubles(array, expected);
    int[] whole = new int[values.length];
    for (int i = 0; i < whole.length; i++) {
      whole[i] = (int) values[i];
      if (whole[i] != values[i]) {
        throw fault(array, "value " + values[i] + " is no whole number");
      }
    }
    return whole;
  }

  /** Words, each ended by a zero byte. */
  List<String> words(Element array) throws MeshFileException {
    byte[] raw;
    if (array.getAttribute("format").equals("ascii")) {
      StringTokenizer t = new StringTokenizer(ownText(array));
      raw = new byte[t.countTokens()];
      for (int i = 0; i < raw.length; i++) {
        try {
          raw[i] = (byte) Integer.parseInt(t.nextToken());
        } catch (NumberFormatException e) {
          throw fault(array, "a character is no number");
        }
      }
    } else {
      raw = raw(array, Integer.MAX_VALUE);
    }
    List<String> words = new ArrayList<>();
    int start = 0;
    for (int i = 0; i < raw.length; i++) {
      if (raw[i] == 0) {
        words.add(new String(raw, start, i - start, StandardCharsets.UTF_8));
        start = i + 1;
      }
    }
    return List.copyOf(words);
  }

  private double[] text(Element array, long expected) throws MeshFileException {
    StringTokenizer t = new StringTokenizer(ownText(array));
    if (t.countTokens() != expected) {
      throw fault(array, "it has " + t.countTokens() + " values where " + expected + " belong");
    }
    double[] values = new double[(int) expected];
    for (int i = 0; i < values.length; i++) {
      String word = t.nextToken();
      try {
        values[i] = Double.parseDouble(word);
      } catch (NumberFormatException e) {
        throw fault(array, "'" + word + "' is no number");
      }
    }
    return values;
  }

  /** The bytes of an array, at most {@code limit} of them. */
  private byte[] raw(Element array, long limit) throws MeshFileException {
    byte[] source;
    boolean base64;
    if (array.getAttribute("format").equals("appended")) {
      long offset;
      try {
        offset = Long.parseLong(array.getAttribute("offset").strip());
      } catch (NumberFormatException e) {
        offset = -1;
      }
      if (offset < 0 || offset > appended.length) {
        throw fault(array, "its offset lies outside the appended data");
      }
      source = Arrays.copyOfRange(appended, (int) offset, appended.length);
      base64 = appendedBase64;
    } else {
      source = ownText(array).strip().getBytes(StandardCharsets.ISO_8859_1);
      base64 = true;
    }
    try {
      return compressed ? inflate(array, source, base64, limit) : plain(source, base64);
    } catch (IllegalArgumentException | IndexOutOfBoundsException | DataFormatException e) {
      throw fault(array, "its bytes cannot be read (" + e.getMessage() + ")");
    }
  }

  /** One header that says how many bytes follow. */
  private byte[] plain(byte[] source, boolean base64) {
    if (!base64) {
      long size = header(source, 0);
      return range(source, headerBytes, size);
    }
    // Header and data are one string of base64.
    byte[] first = decode(source, 0, encoded(headerBytes));
    long size = header(first, 0);
    byte[] all = decode(source, 0, encoded(headerBytes + size));
    return range(all, headerBytes, size);
  }

  /** Headers: number of blocks, their size, size of the last, compressed sizes; then the blocks. */
  private byte[] inflate(Element array, byte[] source, boolean base64, long limit)
      throws DataFormatException, MeshFileException {
    byte[] head = base64 ? decode(source, 0, encoded(3L * headerBytes)) : source;
    long blocks = header(head, 0);
    long size = header(head, 1);
    long last = header(head, 2);
    if (blocks < 0 || blocks > source.length || size < 0 || last < 0) {
      throw fault(array, "it says that it has " + blocks + " blocks");
    }
    long whole = blocks == 0 ? 0 : (blocks - 1) * size + (last == 0 ? size : last);
    if (whole > limit || whole > Integer.MAX_VALUE - 16) {
      throw fault(array, "it holds " + whole + " bytes where " + limit + " belong");
    }
    long headSize = (3 + blocks) * headerBytes;
    int at = (int) (base64 ? encoded(headSize) : headSize);
    byte[] full = base64 ? decode(source, 0, at) : source;
    long stored = 0;
    for (int k = 0; k < blocks; k++) {
      stored += header(full, 3 + k);
    }
    byte[] data = base64 ? decode(source, at, encoded(stored)) : range(source, at, stored);
    byte[] out = new byte[(int) whole];
    int from = 0;
    int to = 0;
    Inflater inflater = new Inflater();
    try {
      for (int k = 0; k < blocks; k++) {
        int part = (int) header(full, 3 + k);
        int want = (int) (k == blocks - 1 && last != 0 ? last : size);
        inflater.reset();
        inflater.setInput(data, from, part);
        if (inflater.inflate(out, to, want) != want) {
          throw fault(array, "a compressed block is too short");
        }
        from += part;
        to += want;
      }
    } finally {
      inflater.end();
    }
    return out;
  }

  private long header(byte[] bytes, int k) {
    ByteBuffer b = ByteBuffer.wrap(bytes).order(order);
    return headerBytes == 8
        ? b.getLong(k * headerBytes)
        : Integer.toUnsignedLong(b.getInt(k * headerBytes));
  }

  private static byte[] range(byte[] bytes, long from, long size) {
    if (size < 0 || from + size > bytes.length) {
      throw new IndexOutOfBoundsException("they end too early");
    }
    return Arrays.copyOfRange(bytes, (int) from, (int) (from + size));
  }

  private static long encoded(long bytes) {
    return (bytes + 2) / 3 * 4;
  }

  private static byte[] decode(byte[] source, long from, long size) {
    return Base64.getDecoder().decode(range(source, from, size));
  }

  private MeshFileException fault(Element array, String what) {
    return parser.fault(
        "array '" + array.getAttribute("Name") + "': " + what, ByteCursor.WRITE_AGAIN);
  }

  /** Text of the element itself; VTK also nests elements with ranges in it. */
  private static String ownText(Element array) {
    StringBuilder text = new StringBuilder();
    for (Node n = array.getFirstChild(); n != null; n = n.getNextSibling()) {
      if (n instanceof Text t) {
        text.append(t.getData());
      }
    }
    return text.toString();
  }

  static double[] joined(double[] a, double[] b) {
    double[] all = Arrays.copyOf(a, a.length + b.length);
    System.arraycopy(b, 0, all, a.length, b.length);
    return all;
  }
}
