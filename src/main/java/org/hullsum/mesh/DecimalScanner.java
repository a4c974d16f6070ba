package org.hullsum.mesh;

import java.nio.charset.StandardCharsets;

/**
 * Reads one decimal number from bytes, correctly rounded. Numbers whose digits make a whole number
 * up to 2⁵³ and whose power of ten is at most 22 take one exact multiplication or division (W. D.
 * Clinger, How to read floating point numbers accurately, PLDI 1990); the others go to the
 * platform.
 */
final class DecimalScanner {
  private static final long LARGEST_EXACT = 1L << 53;

  /** Another digit cannot make the digits' whole number overflow below this. */
  private static final long ROOM_FOR_A_DIGIT = Long.MAX_VALUE / 10 - 1;

  /** Far beyond what a double holds, far below what an int holds. */
  private static final int LARGEST_EXPONENT = 100_000;

  private static final double[] POWERS_OF_TEN = {
    1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16,
    1e17, 1e18, 1e19, 1e20, 1e21, 1e22
  };

  private int end;

  /** The index after the number that was scanned last; its start where there was none. */
  int end() {
    return end;
  }

  /**
   * Scans sign, digits, point, digits, exponent.
   *
   * @return the number, infinite where it is too large; what is returned without a number at {@code
   *     from} ({@code end() == from}) has no meaning
   */
  double scan(byte[] text, int from, int to) {
    int at = from;
    boolean negative = false;
    if (at < to && (text[at] == '-' || text[at] == '+')) {
      negative = text[at] == '-';
      at++;
    }
    long digits = 0;
    int power = 0;
    boolean exact = true;
    int firstDigit = at;
    for (; at < to && isDigit(text[at]); at++) {
      if (digits < ROOM_FOR_A_DIGIT) {
        digits = 10 * digits + (text[at] - '0');
      } else {
        exact = false;
      }
    }
    int count = at - firstDigit;
    if (at < to && text[at] == '.') {
      int point = at++;
      for (; at < to && isDigit(text[at]); at++) {
        if (digits < ROOM_FOR_A_DIGIT) {
          digits = 10 * digits + (text[at] - '0');
          power--;
        } else {
          exact = false;
        }
      }
      count += at - point - 1;
    }
    if (count == 0) {
      end = from;
      return 0;
    }
    end = at;
    power += exponent(text, at, to);
    if (exact && digits <= LARGEST_EXACT && Math.abs(power) < POWERS_OF_TEN.length) {
      double size = power < 0 ? digits / POWERS_OF_TEN[-power] : digits * POWERS_OF_TEN[power];
      return negative ? -size : size;
    }
    return Double.parseDouble(new String(text, from, end - from, StandardCharsets.ISO_8859_1));
  }

  /** The exponent at an index, 0 where there is none; moves the end of the number behind it. */
  private int exponent(byte[] text, int from, int to) {
    if (from >= to || (text[from] | 0x20) != 'e') {
      return 0;
    }
    int at = from + 1;
    boolean negative = false;
    if (at < to && (text[at] == '-' || text[at] == '+')) {
      negative = text[at] == '-';
      at++;
    }
    int firstDigit = at;
    int exponent = 0;
    for (; at < to && isDigit(text[at]); at++) {
      exponent = Math.min(LARGEST_EXPONENT, 10 * exponent + (text[at] - '0'));
    }
    if (at > firstDigit) {
      end = at;
    }
    return negative ? -exponent : exponent;
  }

  private static boolean isDigit(byte letter) {
    return letter >= '0' && letter <= '9';
  }
}
