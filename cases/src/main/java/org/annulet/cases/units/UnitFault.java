package org.annulet.cases.units;

/** A quantity that cannot be read without guessing: what is wrong, and what to write instead. */
public final class UnitFault extends IllegalArgumentException {
  private static final long serialVersionUID = 1L;

  private final String mend;

  UnitFault(String what, String mend) {
    super(what);
    this.mend = mend;
  }

  /** What is wrong, with the text read. */
  public String what() {
    return getMessage();
  }

  /** How to mend it. */
  public String mend() {
    return mend;
  }
}
