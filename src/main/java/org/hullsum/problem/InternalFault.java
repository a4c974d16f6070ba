package org.hullsum.problem;

/** "Cannot happen" has happened: a fault of the program itself, to be reported; exit code 70. */
public final class InternalFault extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /**
   * @param rule the rule that was broken, with the values that broke it
   */
  public InternalFault(String rule) {
    super(rule);
  }
}
