package org.annulet.cases.points;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Map;
import java.util.TreeMap;
import java.util.zip.CRC32;

/**
 * A file of finished points: a head line, then a line a point with its number and checksum, written
 * as it is finished. A line cut off by a stop is noticed and left out. One writer at a time.
 */
final class Journal implements AutoCloseable {
  private final FileChannel channel;
  private final FileLock lock;

  private Journal(FileChannel channel, FileLock lock) {
    this.channel = channel;
    this.lock = lock;
  }

  /**
   * What a file holds.
   *
   * @param head its first line; empty when the file is absent or its head was cut off
   * @param lines text by point
   * @param sound bytes from the beginning that are whole lines
   */
  record Content(String head, Map<Integer, String> lines, long sound) {}

  static Content read(Path file) throws IOException {
    Map<Integer, String> lines = new TreeMap<>();
    if (!Files.exists(file)) {
      return new Content("", lines, 0);
    }
    byte[] bytes = Files.readAllBytes(file);
    String head = "";
    int sound = 0;
    int start = 0;
    for (int i = 0; i < bytes.length; i++) {
      if (bytes[i] != '\n') {
        continue;
      }
      String line = new String(bytes, start, i - start, StandardCharsets.UTF_8);
      if (start == 0) {
        head = line;
      } else if (!take(line, lines)) {
        break;
      }
      start = i + 1;
      sound = start;
    }
    return new Content(head, lines, sound);
  }

  private static boolean take(String line, Map<Integer, String> lines) {
    String[] parts = line.split(" ", 3);
    if (parts.length < 3 || !parts[0].matches("[0-9]{1,9}") || !parts[1].equals(sum(parts[2]))) {
      return false;
    }
    lines.put(Integer.parseInt(parts[0]), parts[2]);
    return true;
  }

  private static String sum(String text) {
    CRC32 crc = new CRC32();
    crc.update(text.getBytes(StandardCharsets.UTF_8));
    return Long.toHexString(crc.getValue());
  }

  /**
   * Opens a file for more points: what follows its whole lines is cut off.
   *
   * @param head written when the file is new
   * @throws FileSystemException if another run writes to it
   */
  static Journal open(Path file, String head) throws IOException {
    FileChannel channel =
        FileChannel.open(
            file, StandardOpenOption.CREATE, StandardOpenOption.READ, StandardOpenOption.WRITE);
    FileLock lock = null;
    try {
      lock = channel.tryLock();
    } catch (OverlappingFileLockException e) {
      lock = null;
    }
    if (lock == null) {
      channel.close();
      throw new FileSystemException(
          file.toString(), null, "another run is writing this part; wait for it, or stop it");
    }
    Journal journal = new Journal(channel, lock);
    Content content = read(file);
    channel.truncate(content.sound());
    channel.position(content.sound());
    if (content.sound() == 0) {
      journal.put(head + "\n");
    }
    return journal;
  }

  synchronized void add(int point, String text) throws IOException {
    put(point + " " + sum(text) + " " + text + "\n");
  }

  private void put(String text) throws IOException {
    ByteBuffer buffer = ByteBuffer.wrap(text.getBytes(StandardCharsets.UTF_8));
    while (buffer.hasRemaining()) {
      channel.write(buffer);
    }
  }

  @Override
  public void close() throws IOException {
    lock.release();
    channel.close();
  }
}
