package org.annulet.cases.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;
import picocli.CommandLine.IVersionProvider;

/** Version and commit, as the build wrote them down. */
final class Version implements IVersionProvider {
  @Override
  public String[] getVersion() {
    return new String[] {text()};
  }

  /** One line: name, version, commit. */
  static String text() {
    return "annulet " + number();
  }

  /** Version and commit. */
  static String number() {
    Properties p = new Properties();
    try (InputStream in = Version.class.getResourceAsStream("version.properties")) {
      p.load(in);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return p.getProperty("version") + " (commit " + p.getProperty("commit") + ")";
  }
}
