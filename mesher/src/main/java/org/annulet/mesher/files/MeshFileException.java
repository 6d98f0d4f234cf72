package org.annulet.mesher.files;

import java.io.IOException;

/** A mesh file cannot be used; says what is wrong, where and how to mend it. */
public final class MeshFileException extends IOException {
  private static final long serialVersionUID = 1L;

  private final String place;
  private final String what;
  private final String mend;

  MeshFileException(String file, String place, String what, String mend) {
    super(file + place + ": " + what + "\n    mend: " + mend);
    this.place = place;
    this.what = what;
    this.mend = mend;
  }

  /** Where in the file, beginning with a space; empty where it is the whole file. */
  public String place() {
    return place;
  }

  /** What is wrong. */
  public String what() {
    return what;
  }

  /** What to do about it. */
  public String mend() {
    return mend;
  }
}
