package org.hullsum.problem;

import java.util.Locale;

/** What is wrong with a case file or a data file; the code is stable and printed in the results. */
public enum ProblemKind {
  /** The file does not exist, is a folder, or can't be read. */
  FILE_UNREADABLE,
  /** Not UTF-8 text, or empty. */
  NOT_TEXT,
  /** Not YAML. */
  SYNTAX,
  /** Too large, too deep, too many aliases, too long an expression. */
  LIMIT_EXCEEDED,
  UNKNOWN_KEY,
  MISSING_KEY,
  DUPLICATE_KEY,
  MERGE_KEY,
  /** A list where a mapping is expected, and the like. */
  WRONG_TYPE,
  /** A value of the right type that is out of range or contradicts another. */
  WRONG_VALUE,
  UNKNOWN_NAME,
  /** A name that is not allowed, or is taken. */
  BAD_NAME,
  /** An expression that does not follow the grammar. */
  EXPRESSION,
  UNIT,
  DIMENSION,
  UNCERTAINTY,
  CYCLE,
  /** A key of the format that this version does not carry out yet. */
  NOT_SUPPORTED,
  /** Accepted, but probably not what was meant: a warning, the case is still audited. */
  SUSPICIOUS;

  /** The code printed in results, such as {@code unknown-key}. */
  public String code() {
    return name().toLowerCase(Locale.ROOT).replace('_', '-');
  }

  /** Whether the case can't be audited because of it. */
  public boolean fatal() {
    return this != SUSPICIOUS;
  }
}
