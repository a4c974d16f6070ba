package org.hullsum.numeric;

import org.apache.commons.numbers.gamma.Erf;
import org.apache.commons.numbers.gamma.Erfc;

/**
 * The error function erf(x) = 2/√π ∫_0^x exp(−t²) dt and its complement 1 − erf(x), each accurate
 * to a few units in the last place, the complement also where it is tiny. NaN gives NaN.
 */
public final class ErrorFunction {
  private ErrorFunction() {}

  public static double erf(double x) {
    return Erf.value(x);
  }

  public static double erfc(double x) {
    return Erfc.value(x);
  }
}
