package org.annulet.mesher.files;

import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.concurrent.TimeUnit;
import org.junit.jupiter.api.Assumptions;

/** Foreign programs for cross-checks; a test is skipped where one is absent. */
final class Programs {
  private Programs() {}

  static void assume(String program) {
    boolean there =
        Arrays.stream(System.getenv("PATH").split(File.pathSeparator))
            .anyMatch(d -> new File(d, program).canExecute());
    Assumptions.assumeTrue(there, program + " is not installed");
  }

  static void assumePython(String module) throws IOException, InterruptedException {
    Assumptions.assumeTrue(new File("/usr/bin/python3").canExecute(), "python3 is not installed");
    Process p = new ProcessBuilder("/usr/bin/python3", "-c", "import " + module).start();
    Assumptions.assumeTrue(p.waitFor() == 0, "python module " + module + " is not installed");
  }

  static String run(String... command) throws IOException, InterruptedException {
    Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
    String said = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
    if (!process.waitFor(60, TimeUnit.SECONDS) || process.exitValue() != 0) {
      throw new AssertionError(String.join(" ", command) + "\n" + said);
    }
    return said;
  }
}
