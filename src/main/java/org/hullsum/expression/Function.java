package org.hullsum.expression;

import java.util.Arrays;
import java.util.Locale;
import java.util.Optional;

/** The functions of the expression language; angles are in radians. */
public enum Function {
  SIN(1, 1),
  COS(1, 1),
  TAN(1, 1),
  ASIN(1, 1),
  ACOS(1, 1),
  ATAN(1, 1),
  ATAN2(2, 2),
  SINH(1, 1),
  COSH(1, 1),
  TANH(1, 1),
  EXP(1, 1),
  LN(1, 1),
  LOG10(1, 1),
  SQRT(1, 1),
  CBRT(1, 1),
  ABS(1, 1),
  MIN(2, 16),
  MAX(2, 16),
  SIGN(1, 1),
  HYPOT(2, 2),
  ERF(1, 1),
  ERFC(1, 1);

  private final int fewest;
  private final int most;

  Function(int fewest, int most) {
    this.fewest = fewest;
    this.most = most;
  }

  /** The name in a formula. */
  public String word() {
    return name().toLowerCase(Locale.ROOT);
  }

  public int fewestArguments() {
    return fewest;
  }

  public int mostArguments() {
    return most;
  }

  /** The function of that name. */
  public static Optional<Function> named(String word) {
    return Arrays.stream(values()).filter(f -> f.word().equals(word)).findFirst();
  }

  void requireArguments(int count) {
    if (count < fewest || count > most) {
      throw new IllegalArgumentException(
          word() + " takes " + fewest + " to " + most + " arguments, not " + count);
    }
  }
}
