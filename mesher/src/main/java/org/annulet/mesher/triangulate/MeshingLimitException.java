package org.annulet.mesher.triangulate;

/**
 * The mesh cannot be finished within the caps on nodes or steps; the message names the place and
 * the remedy.
 */
public final class MeshingLimitException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** An exception with this message. */
  public MeshingLimitException(String message) {
    super(message);
  }
}
