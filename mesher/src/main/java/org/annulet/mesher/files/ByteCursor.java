package org.annulet.mesher.files;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.ByteOrder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;

/** Reads text and numbers from the bytes of a file and knows where it is; not thread-safe. */
final class ByteCursor {
  static final String WRITE_AGAIN = "the file is cut short or damaged: write it again";

  private final String file;
  private final byte[] bytes;
  private final ByteBuffer buffer;
  private int at;

  ByteCursor(String file, byte[] bytes) {
    this.file = file;
    this.bytes = bytes;
    this.buffer = ByteBuffer.wrap(bytes).order(ByteOrder.LITTLE_ENDIAN);
  }

  /** The whole file, refused if it would not fit well into memory. */
  static byte[] load(Path path) throws IOException {
    long size = Files.size(path);
    long limit = Math.min(Integer.MAX_VALUE - 16L, Runtime.getRuntime().maxMemory() / 4);
    if (size > limit) {
      throw new MeshFileException(
          path.toString(),
          "",
          "the file has " + size + " bytes, " + limit + " can be read",
          "give the Java virtual machine more memory (-Xmx), or write a coarser mesh");
    }
    return Files.readAllBytes(path);
  }

  void order(ByteOrder order) {
    buffer.order(order);
  }

  int position() {
    return at;
  }

  int remaining() {
    return bytes.length - at;
  }

  MeshFileException fault(String what, String mend) {
    return faultAt(at, what, mend);
  }

  MeshFileException faultAt(int position, String what, String mend) {
    return new MeshFileException(file, bytes.length == 0 ? "" : " " + place(position), what, mend);
  }

  /** Line where the text is text, byte always. */
  private String place(int position) {
    int end = Math.min(position, bytes.length);
    int line = 1;
    for (int i = 0; i < end; i++) {
      byte b = bytes[i];
      if (b == '\n') {
        line++;
      } else if (b >= 0 && b < 9) {
        return "byte " + position;
      }
    }
    return "line " + line;
  }

  /** Refuses a count that the rest of the file cannot hold. */
  int count(long stated, int bytesEach, String of) throws MeshFileException {
    if (stated < 0 || stated > remaining() / bytesEach) {
      throw fault(
          "says " + stated + " " + of + ", but only " + remaining() + " bytes follow", WRITE_AGAIN);
    }
    return (int) stated;
  }

  /** The rest of the line without its end; the empty string at the end of the file. */
  String line() {
    int start = at;
    while (at < bytes.length && bytes[at] != '\n') {
      at++;
    }
    String line = new String(bytes, start, at - start, StandardCharsets.UTF_8);
    if (at < bytes.length) {
      at++;
    }
    return line.strip();
  }

  private String word(String wanted) throws MeshFileException {
    while (at < bytes.length && bytes[at] <= ' ' && bytes[at] >= 0) {
      at++;
    }
    int start = at;
    while (at < bytes.length && (bytes[at] > ' ' || bytes[at] < 0) && at - start < 64) {
      at++;
    }
    if (at == start) {
      throw fault("the file ends where " + wanted + " should stand", WRITE_AGAIN);
    }
    return new String(bytes, start, at - start, StandardCharsets.ISO_8859_1);
  }

  long integerWord(String wanted) throws MeshFileException {
    String word = word(wanted);
    try {
      return Long.parseLong(word);
    } catch (NumberFormatException e) {
      throw badWord(word, wanted);
    }
  }

  double realWord(String wanted) throws MeshFileException {
    String word = word(wanted);
    try {
      return Double.parseDouble(word);
    } catch (NumberFormatException e) {
      throw badWord(word, wanted);
    }
  }

  private MeshFileException badWord(String word, String wanted) {
    return faultAt(
        at - word.length(), "'" + word + "' stands where " + wanted + " should", WRITE_AGAIN);
  }

  private void need(int count, String wanted) throws MeshFileException {
    if (remaining() < count) {
      throw fault("the file ends where " + wanted + " should stand", WRITE_AGAIN);
    }
    at += count;
  }

  int int32(String wanted) throws MeshFileException {
    need(4, wanted);
    return buffer.getInt(at - 4);
  }

  long int64(String wanted) throws MeshFileException {
    need(8, wanted);
    return buffer.getLong(at - 8);
  }

  double float64(String wanted) throws MeshFileException {
    need(8, wanted);
    return buffer.getDouble(at - 8);
  }

  /** Moves behind the next occurrence of {@code text}; false and to the end if there is none. */
  boolean skipPast(String text) {
    byte[] wanted = text.getBytes(StandardCharsets.ISO_8859_1);
    int found = indexOf(bytes, wanted, at);
    at = found < 0 ? bytes.length : found + wanted.length;
    return found >= 0;
  }

  static int indexOf(byte[] bytes, byte[] wanted, int from) {
    for (int i = from; i <= bytes.length - wanted.length; i++) {
      int k = 0;
      while (k < wanted.length && bytes[i + k] == wanted[k]) {
        k++;
      }
      if (k == wanted.length) {
        return i;
      }
    }
    return -1;
  }
}
