package org.annulet.mesher.files;

import java.io.IOException;

/** A mesh file cannot be used; says what is wrong, where and how to mend it. */
public final class MeshFileException extends IOException {
  private static final long serialVersionUID = 1L;

  MeshFileException(String where, String what, String mend) {
    super(where + ": " + what + "\n    mend: " + mend);
  }
}
