package org.hullsum.units;

import java.util.Arrays;

/**
 * A physical dimension: powers of length, mass, time, current, temperature, amount of substance and
 * luminous intensity.
 *
 * <p>Exponents are rational with denominator 12, so that square and cube roots of dimensions stay
 * exact. A plane angle has no dimension. Immutable.
 */
public final class Dimension {
  private static final int BASES = 7;
  private static final int DENOMINATOR = 12;
  private static final String[] SYMBOLS = {"m", "kg", "s", "A", "K", "mol", "cd"};

  public static final Dimension NONE = new Dimension(new int[BASES]);
  public static final Dimension LENGTH = base(0);
  public static final Dimension MASS = base(1);
  public static final Dimension TIME = base(2);
  public static final Dimension CURRENT = base(3);
  public static final Dimension TEMPERATURE = base(4);
  public static final Dimension AMOUNT = base(5);
  public static final Dimension LUMINOUS_INTENSITY = base(6);

  private final int[] twelfths;

  private Dimension(int[] twelfths) {
    this.twelfths = twelfths;
  }

  private static Dimension base(int index) {
    int[] exponents = new int[BASES];
    exponents[index] = DENOMINATOR;
    return new Dimension(exponents);
  }

  public Dimension times(Dimension other) {
    int[] sum = new int[BASES];
    for (int i = 0; i < BASES; i++) {
      sum[i] = twelfths[i] + other.twelfths[i];
    }
    return new Dimension(sum);
  }

  public Dimension dividedBy(Dimension other) {
    int[] difference = new int[BASES];
    for (int i = 0; i < BASES; i++) {
      difference[i] = twelfths[i] - other.twelfths[i];
    }
    return new Dimension(difference);
  }

  /**
   * This dimension to a power.
   *
   * @throws ArithmeticException if an exponent would not be a multiple of 1/12
   */
  public Dimension power(double exponent) {
    int[] scaled = new int[BASES];
    for (int i = 0; i < BASES; i++) {
      double exact = twelfths[i] * exponent;
      long rounded = Math.round(exact);
      if (Math.abs(exact - rounded) > 1e-9 || Math.abs(rounded) > 1_000_000) {
        throw new ArithmeticException("power " + exponent + " of " + this + " is not a dimension");
      }
      scaled[i] = (int) rounded;
    }
    return new Dimension(scaled);
  }

  public boolean isNone() {
    return equals(NONE);
  }

  /**
   * Exponent of a base.
   *
   * @param base 0 length, 1 mass, 2 time, 3 current, 4 temperature, 5 amount, 6 luminous intensity
   */
  public double exponent(int base) {
    return twelfths[base] / (double) DENOMINATOR;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof Dimension that && Arrays.equals(twelfths, that.twelfths);
  }

  @Override
  public int hashCode() {
    return Arrays.hashCode(twelfths);
  }

  /** In SI base units, such as {@code m2.kg.s-3}; {@code 1} for none. */
  @Override
  public String toString() {
    StringBuilder text = new StringBuilder();
    for (int i = 0; i < BASES; i++) {
      if (twelfths[i] == 0) {
        continue;
      }
      if (!text.isEmpty()) {
        text.append('.');
      }
      text.append(SYMBOLS[i]);
      if (twelfths[i] % DENOMINATOR != 0) {
        text.append('^').append(twelfths[i]).append("/").append(DENOMINATOR);
      } else if (twelfths[i] != DENOMINATOR) {
        text.append(twelfths[i] / DENOMINATOR);
      }
    }
    return text.isEmpty() ? "1" : text.toString();
  }
}
