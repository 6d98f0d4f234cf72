package org.annulet.cases.cli;

import java.io.PrintStream;
import java.io.PrintWriter;
import java.util.Locale;
import org.annulet.cases.study.Progress;

/** Where the command line speaks: results on standard output, everything else on standard error. */
final class Console {
  private final PrintStream out;
  private final PrintStream err;
  private final boolean terminal;
  private boolean quiet;
  private boolean lineOpen;

  Console(PrintStream out, PrintStream err, boolean terminal) {
    this.out = out;
    this.err = err;
    this.terminal = terminal;
  }

  void beQuiet() {
    quiet = true;
  }

  PrintWriter outWriter() {
    return new PrintWriter(out, true);
  }

  PrintWriter errWriter() {
    return new PrintWriter(err, true);
  }

  /** The whole chain of a fault of the program itself, for those who asked for it. */
  void trace(Exception e) {
    e.printStackTrace(err);
  }

  /** A result the user asked for; left out when quiet. */
  void result(String text) {
    endLine();
    if (!quiet) {
      out.println(text);
      out.flush();
    }
  }

  /** Something that is wrong; always said. */
  void fault(String text) {
    endLine();
    err.println(text);
    err.flush();
  }

  /**
   * One line on the terminal that is overwritten by the next; nothing where standard error is no
   * terminal.
   */
  Progress progress() {
    if (!terminal || quiet) {
      return Progress.SILENT;
    }
    Clock clock = new Clock();
    return (what, done, of) -> {
      String line =
          String.format(Locale.ROOT, "  %s %d/%d%s", what, done, of, clock.left(what, done, of));
      err.print("\r" + line + " ".repeat(Math.max(0, 60 - line.length())));
      err.flush();
      lineOpen = true;
    };
  }

  /** Time left of one piece of work, from the pace so far. */
  private static final class Clock {
    private static final double SOON = 2;
    private String work = "";
    private long start;

    /** In words, or nothing while it cannot be known or is short. */
    String left(String what, int done, int of) {
      if (!what.equals(work)) {
        work = what;
        start = System.nanoTime();
      }
      double seconds = (System.nanoTime() - start) / 1e9;
      double left = done > 0 ? seconds / done * (of - done) : 0;
      if (left < SOON) {
        return "";
      }
      return left < 100
          ? String.format(Locale.ROOT, ", %.0f s left", left)
          : String.format(Locale.ROOT, ", %.0f min left", left / 60);
    }
  }

  private void endLine() {
    if (lineOpen) {
      err.print("\r" + " ".repeat(62) + "\r");
      lineOpen = false;
    }
  }
}
