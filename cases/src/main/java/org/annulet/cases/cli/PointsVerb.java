package org.annulet.cases.cli;

import java.nio.file.Path;
import org.annulet.cases.points.Slice;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;
import picocli.CommandLine.TypeConversionException;

/** What verbs on studies of many points share. */
@Command
abstract class PointsVerb extends Verb {
  @Option(
      names = "--part",
      paramLabel = "I/N",
      converter = Parts.class,
      description = "compute the I-th of N parts only; 'annulet merge CASE' puts them together")
  private Slice part;

  Slice part() {
    return part == null ? Slice.WHOLE : part;
  }

  /** What to say when a part is computed. */
  ExitStatus partDone(Path folder) {
    console()
        .result(
            "Part "
                + part().number()
                + " of "
                + part().of()
                + " is in "
                + folder
                + "; when all are there: annulet merge CASE");
    return ExitStatus.DONE;
  }

  /** Reads {@code 2/8}. */
  static final class Parts implements picocli.CommandLine.ITypeConverter<Slice> {
    @Override
    public Slice convert(String text) {
      if (!text.matches("[0-9]{1,6}/[0-9]{1,6}")) {
        throw new TypeConversionException("a part is written like 2/8, got '" + text + "'");
      }
      String[] n = text.split("/");
      try {
        return new Slice(Integer.parseInt(n[0]), Integer.parseInt(n[1]));
      } catch (IllegalArgumentException e) {
        throw new TypeConversionException(e.getMessage());
      }
    }
  }
}
