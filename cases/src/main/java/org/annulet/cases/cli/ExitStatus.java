package org.annulet.cases.cli;

/** What the program answers to the shell. */
enum ExitStatus {
  /** Everything asked for was done. */
  DONE(0),
  /** A computed answer could not be certified or did not converge; files are written and say so. */
  NOT_CERTIFIED(1),
  /** The input is at fault. */
  INPUT_FAULT(2),
  /** Memory, disk or permission was missing. */
  OUT_OF_RESOURCES(3);

  private final int code;

  ExitStatus(int code) {
    this.code = code;
  }

  int code() {
    return code;
  }
}
