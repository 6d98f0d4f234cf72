package org.annulet.cases.read;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/** Files a case names: relative to its folder, and inside it. */
final class CaseFolder {
  private CaseFolder() {}

  /** The existing file an entry names, or a fault. */
  static Optional<Path> existing(Entry entry) {
    Optional<String> text = entry.text();
    if (text.isEmpty()) {
      return Optional.empty();
    }
    Path folder = entry.binder().folder();
    try {
      Path given = Path.of(text.get());
      Path file = folder.resolve(given).normalize();
      if (given.isAbsolute() || !file.startsWith(folder)) {
        entry.fault(
            "file '" + text.get() + "' lies outside the case folder",
            "copy it beside the case file and write its name alone");
        return Optional.empty();
      }
      if (Files.isRegularFile(file)) {
        return Optional.of(file);
      }
      entry.fault(
          Files.exists(file)
              ? "'" + text.get() + "' is no file"
              : "file '" + text.get() + "' does not exist in the case folder",
          Nearest.advice(given.getFileName().toString(), beside(file)));
    } catch (InvalidPathException e) {
      entry.fault(
          "'" + text.get() + "' is no file name", "write the name of a file beside the case");
    }
    return Optional.empty();
  }

  private static List<String> beside(Path file) {
    Path parent = file.getParent();
    if (parent == null || !Files.isDirectory(parent)) {
      return List.of();
    }
    try (Stream<Path> files = Files.list(parent)) {
      return files
          .filter(Files::isRegularFile)
          .map(f -> f.getFileName().toString())
          .sorted()
          .limit(20)
          .toList();
    } catch (IOException e) {
      return List.of(); // only a hint
    }
  }
}
