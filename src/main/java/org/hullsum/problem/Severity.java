package org.hullsum.problem;

/** How much a finding weighs: an error decides the exit code, a warning and a note do not. */
public enum Severity {
  ERROR,
  WARNING,
  NOTE;

  /** Lower-case word of the result document. */
  public String word() {
    return name().toLowerCase(java.util.Locale.ROOT);
  }
}
