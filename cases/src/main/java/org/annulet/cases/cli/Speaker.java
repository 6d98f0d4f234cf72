package org.annulet.cases.cli;

import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;

/** What all verbs share: a console to speak on, and silence when asked for. */
@Command(mixinStandardHelpOptions = true, versionProvider = Version.class)
abstract class Speaker implements Callable<Integer> {
  @Option(names = "--quiet", description = "print faults only")
  private boolean quiet;

  private Console console;

  void useConsole(Console console) {
    this.console = console;
  }

  /** The console, silent when the user asked for silence. */
  Console console() {
    if (quiet) {
      console.beQuiet();
    }
    return console;
  }
}
