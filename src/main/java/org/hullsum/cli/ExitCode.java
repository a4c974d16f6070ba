package org.hullsum.cli;

import org.hullsum.audit.CaseResult;
import org.hullsum.audit.Verdict;

/** How a run ends, as in {@code docs/results.md}; the later the worse. */
enum ExitCode {
  /** Every balance is balanced and no finding is an error. */
  FINE(0),
  /** Nothing worse than undecided. */
  UNDECIDED(20),
  /** A balance is imbalanced, or a finding that is not waived is an error. */
  IMBALANCED(10),
  /** The command line is wrong; alone, for nothing is done then. */
  WRONG_USE(64),
  /** A case or a data file is missing or wrong. */
  WRONG_INPUT(65),
  /** An output can't be written. */
  CANNOT_WRITE(74),
  /** A fault of the program itself. */
  FAULT(70);

  private final int status;

  ExitCode(int status) {
    this.status = status;
  }

  /** The number that the process ends with. */
  int status() {
    return status;
  }

  /** The worse of two. */
  ExitCode and(ExitCode other) {
    return compareTo(other) >= 0 ? this : other;
  }

  /** What one case asks for. */
  static ExitCode of(CaseResult result) {
    if (result.isUnreadable()) {
      return WRONG_INPUT;
    }
    if (result.hasError()) {
      return IMBALANCED;
    }
    return result.verdict().map(ExitCode::of).orElse(FINE);
  }

  private static ExitCode of(Verdict verdict) {
    return switch (verdict) {
      case BALANCED -> FINE;
      case UNDECIDED -> UNDECIDED;
      case IMBALANCED -> IMBALANCED;
    };
  }
}
