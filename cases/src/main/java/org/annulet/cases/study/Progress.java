package org.annulet.cases.study;

/** Where a study says how far it is; called from one thread at a time. */
@FunctionalInterface
public interface Progress {
  /** Says nothing. */
  Progress SILENT = (what, done, of) -> {};

  /**
   * One step more is done.
   *
   * @param what the work at hand, in a few words
   * @param done steps finished
   * @param of steps in all
   */
  void step(String what, int done, int of);
}
