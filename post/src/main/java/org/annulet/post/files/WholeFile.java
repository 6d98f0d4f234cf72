package org.annulet.post.files;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.FileAlreadyExistsException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/**
 * Writes a file whole or not at all: the bytes go to a temporary neighbour, which then takes the
 * name. A reader never meets half a file, and a full disk leaves the old one in place.
 */
public final class WholeFile {
  private WholeFile() {}

  /** What fills a file. */
  @FunctionalInterface
  public interface Content {
    /**
     * Writes all of it.
     *
     * @param part a path that may be written
     * @throws IOException if it cannot be
     */
    void into(Path part) throws IOException;
  }

  /**
   * Makes a folder for results and tries whether it takes a file, so that nobody computes for an
   * hour what cannot be kept.
   *
   * @throws FileSystemException if it cannot be written; names the folder
   */
  public static void prepare(Path folder) throws FileSystemException {
    Path trial = folder.resolve(".annulet.part");
    try {
      Files.createDirectories(folder);
      Files.write(trial, new byte[] {0});
      Files.deleteIfExists(trial);
    } catch (FileAlreadyExistsException e) {
      throw new FileSystemException(e.getFile(), null, "is a file, not a folder");
    } catch (IOException e) {
      throw new FileSystemException(folder.toString(), null, "cannot be written: " + reason(e));
    }
  }

  /**
   * Writes a file through a writer of its own; parent folders are made, an existing file is
   * replaced.
   *
   * @throws FileSystemException if it cannot be written; names the file
   */
  public static void write(Path file, Content content) throws FileSystemException {
    Path target = file.toAbsolutePath();
    Path folder = target.getParent();
    Path part = folder.resolve("." + target.getFileName() + ".part");
    try {
      Files.createDirectories(folder);
      try {
        content.into(part);
        try {
          Files.move(part, target, StandardCopyOption.ATOMIC_MOVE);
        } catch (AtomicMoveNotSupportedException e) {
          Files.move(part, target, StandardCopyOption.REPLACE_EXISTING);
        }
      } finally {
        Files.deleteIfExists(part);
      }
    } catch (IOException e) {
      throw new FileSystemException(file.toString(), null, "cannot be written: " + reason(e));
    }
  }

  private static String reason(IOException e) {
    if (e instanceof FileSystemException f) {
      return f.getReason() == null ? f.getClass().getSimpleName() : f.getReason();
    }
    return e.getMessage();
  }

  /**
   * Writes the bytes; parent folders are made, an existing file is replaced.
   *
   * @throws FileSystemException if the file cannot be written
   */
  public static void write(Path file, byte[] bytes) throws FileSystemException {
    write(file, (Content) part -> Files.write(part, bytes));
  }

  /** Writes text as UTF-8. */
  public static void write(Path file, String text) throws FileSystemException {
    write(file, text.getBytes(StandardCharsets.UTF_8));
  }
}
