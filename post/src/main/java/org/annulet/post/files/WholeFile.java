package org.annulet.post.files;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/**
 * Writes a file whole or not at all: the bytes go to a temporary neighbour, which then takes the
 * name. A reader never meets half a file, and a full disk leaves the old one in place.
 */
public final class WholeFile {
  private WholeFile() {}

  /**
   * Writes the bytes; parent folders are made, an existing file is replaced.
   *
   * @throws IOException if the folder cannot be written
   */
  public static void write(Path file, byte[] bytes) throws IOException {
    Path target = file.toAbsolutePath();
    Path folder = target.getParent();
    Files.createDirectories(folder);
    Path part = folder.resolve("." + target.getFileName() + ".part");
    try {
      Files.write(part, bytes);
      try {
        Files.move(part, target, StandardCopyOption.ATOMIC_MOVE);
      } catch (AtomicMoveNotSupportedException e) {
        Files.move(part, target, StandardCopyOption.REPLACE_EXISTING);
      }
    } finally {
      Files.deleteIfExists(part);
    }
  }

  /** Writes text as UTF-8. */
  public static void write(Path file, String text) throws IOException {
    write(file, text.getBytes(StandardCharsets.UTF_8));
  }
}
