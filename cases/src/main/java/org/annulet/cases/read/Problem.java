package org.annulet.cases.read;

/**
 * One fault of a case file: where, what, and how to mend it.
 *
 * @param file file name as the user knows it
 * @param line counted from 1; 0 when the whole file is meant
 * @param column counted from 1; 0 when the whole line is meant
 * @param key path of the key, as in {@code geometry.zones.chamber.length}; may be empty
 * @param what what is wrong, with the value read
 * @param mend what is allowed, or what to write; may be empty
 * @param picture SVG of the spot in the drawing; empty where there is none
 */
public record Problem(
    String file, int line, int column, String key, String what, String mend, String picture) {
  /** A fault without a picture. */
  public Problem(String file, int line, int column, String key, String what, String mend) {
    this(file, line, column, key, what, mend, "");
  }

  /** The same fault with a picture of the spot. */
  public Problem withPicture(String svg) {
    return new Problem(file, line, column, key, what, mend, svg);
  }

  /** Two lines for the terminal: {@code case.yaml:41:7: key: what} and {@code mend: …}. */
  @Override
  public String toString() {
    StringBuilder text = new StringBuilder(file);
    if (line > 0) {
      text.append(':').append(line);
    }
    if (line > 0 && column > 0) {
      text.append(':').append(column);
    }
    text.append(": ");
    if (!key.isEmpty()) {
      text.append(key).append(": ");
    }
    text.append(what);
    if (!mend.isEmpty()) {
      text.append(System.lineSeparator()).append("    mend: ").append(mend);
    }
    return text.toString();
  }
}
