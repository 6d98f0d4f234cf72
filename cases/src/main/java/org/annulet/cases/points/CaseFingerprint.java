package org.annulet.cases.points;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.stream.Stream;
import org.annulet.cases.read.CaseFile;

/** What the points of a study depend on, in one word. */
public final class CaseFingerprint {
  private static final int DEEPEST = 4;

  private CaseFingerprint() {}

  /**
   * A digest of the case file, of every file below its folder whose path it mentions, and of the
   * program's version.
   *
   * @throws IOException if a file cannot be read
   */
  public static String of(CaseFile caseFile, String version) throws IOException {
    try {
      MessageDigest digest = MessageDigest.getInstance("SHA-256");
      byte[] text = Files.readAllBytes(caseFile.file());
      digest.update(text);
      digest.update(version.getBytes(StandardCharsets.UTF_8));
      String words = new String(text, StandardCharsets.UTF_8);
      Path folder = caseFile.file().toAbsolutePath().getParent();
      try (Stream<Path> all = Files.walk(folder, DEEPEST)) {
        List<Path> beside =
            all.filter(Files::isRegularFile)
                .filter(p -> !p.equals(caseFile.file().toAbsolutePath()))
                .filter(p -> words.contains(folder.relativize(p).toString().replace('\\', '/')))
                .sorted()
                .toList();
        for (Path p : beside) {
          digest.update(p.getFileName().toString().getBytes(StandardCharsets.UTF_8));
          digest.update(Files.readAllBytes(p));
        }
      }
      return HexFormat.of().formatHex(digest.digest(), 0, 12);
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }
}
