package org.annulet.cases.cli;

import java.io.FileDescriptor;
import java.io.FileOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.FileSystemException;
import org.annulet.cases.read.CaseFaultException;
import org.annulet.cases.read.Problem;
import org.annulet.solver.eigen.MemoryLimitException;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import picocli.CommandLine.UnmatchedArgumentException;

/** The program {@code annulet}: verbs, and what becomes of every fault. */
@Command(
    name = "annulet",
    mixinStandardHelpOptions = true,
    versionProvider = Version.class,
    description = "Acoustic modes of annular combustion chambers with active flames.",
    footer = {
      "",
      "Exit status: 0 done; 1 an answer could not be certified or did not converge (files are written);",
      "2 the input is at fault; 3 out of memory, disk or permission.",
      "A computed growth rate does not clear an engine to run."
    },
    subcommands = {
      CheckVerb.class,
      MeshVerb.class,
      ModesVerb.class,
      SweepVerb.class,
      UncertaintyVerb.class,
      DampersVerb.class,
      CompareVerb.class,
      MergeVerb.class,
      VerifyVerb.class
    })
public final class Main implements Runnable {
  @Spec private CommandSpec spec;

  private Main() {}

  /** Runs the program and leaves the Java machine with its exit status. */
  public static void main(String[] args) {
    Console console =
        new Console(
            new PrintStream(
                new FileOutputStream(FileDescriptor.out), false, StandardCharsets.UTF_8),
            new PrintStream(new FileOutputStream(FileDescriptor.err), true, StandardCharsets.UTF_8),
            Boolean.getBoolean("annulet.terminal"));
    System.exit(run(console, args).code());
  }

  /** Runs the program on a console of the caller's. */
  static ExitStatus run(Console console, String... args) {
    CommandLine line = new CommandLine(new Main());
    line.setCaseInsensitiveEnumValuesAllowed(false);
    line.getSubcommands().values().forEach(s -> ((Speaker) s.getCommand()).useConsole(console));
    line.setParameterExceptionHandler((e, a) -> misuse(console, e));
    line.setExecutionExceptionHandler((e, c, r) -> failure(console, e).code());
    line.setOut(console.outWriter());
    line.setErr(console.errWriter());
    int code;
    try {
      code = line.execute(args);
    } catch (OutOfMemoryError e) {
      console.fault(
          "annulet: out of memory; choose larger triangles, or give Java more memory:"
              + " ANNULET_JAVA_OPTIONS=-Xmx8g");
      return ExitStatus.OUT_OF_RESOURCES;
    }
    for (ExitStatus status : ExitStatus.values()) {
      if (status.code() == code) {
        return status;
      }
    }
    return ExitStatus.NOT_CERTIFIED;
  }

  @Override
  public void run() {
    throw new ParameterException(spec.commandLine(), "which verb?");
  }

  private static int misuse(Console console, ParameterException e) {
    StringBuilder text = new StringBuilder("annulet: " + e.getMessage());
    CommandLine at = e.getCommandLine();
    if (e instanceof UnmatchedArgumentException unmatched) {
      var near = unmatched.getSuggestions();
      if (!near.isEmpty()) {
        text.append("\n    mend: did you mean ").append(String.join(" or ", near)).append("?");
      }
    }
    text.append("\n    'annulet ")
        .append(at.getParent() == null ? "" : at.getCommandName() + " ")
        .append("--help' shows what can be said");
    console.fault(text.toString());
    return ExitStatus.INPUT_FAULT.code();
  }

  private static ExitStatus failure(Console console, Exception e) {
    if (e instanceof CaseFaultException fault) {
      for (Problem p : fault.problems()) {
        console.fault(p.toString());
      }
      int n = fault.problems().size();
      console.fault(
          n == 1 ? "annulet: 1 fault in the case" : "annulet: " + n + " faults in the case");
      return ExitStatus.INPUT_FAULT;
    }
    if (e instanceof FileSystemException file) {
      String reason = file.getReason() == null ? file.getClass().getSimpleName() : file.getReason();
      console.fault(
          "annulet: "
              + file.getFile()
              + ": "
              + reason
              + "\n    mend: make room, or give a folder that can be written with --out");
      return ExitStatus.OUT_OF_RESOURCES;
    }
    if (e instanceof MemoryLimitException) {
      console.fault("annulet: " + e.getMessage());
      return ExitStatus.OUT_OF_RESOURCES;
    }
    if (e instanceof IOException) {
      console.fault(
          "annulet: "
              + e.getMessage()
              + "\n    mend: make room, or give another folder with --out");
      return ExitStatus.OUT_OF_RESOURCES;
    }
    console.fault(
        "annulet: a fault of the program itself: "
            + e
            + "\n    please report it with the case file and 'annulet --version'");
    if (System.getenv("ANNULET_TRACE") != null) {
      console.trace(e);
    }
    return ExitStatus.NOT_CERTIFIED;
  }
}
