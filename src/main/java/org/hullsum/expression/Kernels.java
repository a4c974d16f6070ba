package org.hullsum.expression;

import org.hullsum.numeric.ErrorFunction;

/**
 * The operations over the first n values of arrays; each loop is a method of its own, so that the
 * compiler of the virtual machine vectorises it.
 */
final class Kernels {
  private Kernels() {}

  /** Carries out one operation: out[i] from a[i], b[i], c[i] for i below n. */
  static void run(Operation operation, double[] out, double[] a, double[] b, double[] c, int n) {
    switch (operation) {
      case ADD -> add(out, a, b, n);
      case SUBTRACT -> subtract(out, a, b, n);
      case MULTIPLY -> multiply(out, a, b, n);
      case DIVIDE -> divide(out, a, b, n);
      case POWER -> power(out, a, b, n);
      case NEGATE -> negate(out, a, n);
      case SIN -> sin(out, a, n);
      case COS -> cos(out, a, n);
      case EXP -> exp(out, a, n);
      case LN -> ln(out, a, n);
      case SQRT -> sqrt(out, a, n);
      case ABS -> abs(out, a, n);
      case MIN -> min(out, a, b, n);
      case MAX -> max(out, a, b, n);
      case SELECT -> select(out, a, b, c, n);
      case LESS, LESS_OR_EQUAL, GREATER, GREATER_OR_EQUAL, EQUAL, NOT_EQUAL, AND, OR, NOT ->
          condition(operation, out, a, b, n);
      default -> slow(operation, out, a, b, n);
    }
  }

  private static void add(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] + b[i];
    }
  }

  private static void subtract(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] - b[i];
    }
  }

  private static void multiply(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] * b[i];
    }
  }

  private static void divide(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] / b[i];
    }
  }

  private static void power(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.pow(a[i], b[i]);
    }
  }

  private static void negate(double[] out, double[] a, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = -a[i];
    }
  }

  private static void sin(double[] out, double[] a, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.sin(a[i]);
    }
  }

  private static void cos(double[] out, double[] a, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.cos(a[i]);
    }
  }

  private static void exp(double[] out, double[] a, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.exp(a[i]);
    }
  }

  private static void ln(double[] out, double[] a, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.log(a[i]);
    }
  }

  private static void sqrt(double[] out, double[] a, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.sqrt(a[i]);
    }
  }

  private static void abs(double[] out, double[] a, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.abs(a[i]);
    }
  }

  private static void min(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.min(a[i], b[i]);
    }
  }

  private static void max(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = Math.max(a[i], b[i]);
    }
  }

  private static void select(double[] out, double[] a, double[] b, double[] c, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] != 0 ? b[i] : c[i];
    }
  }

  private static void condition(Operation operation, double[] out, double[] a, double[] b, int n) {
    switch (operation) {
      case LESS -> less(out, a, b, n);
      case GREATER -> less(out, b, a, n);
      case LESS_OR_EQUAL -> lessOrEqual(out, a, b, n);
      case GREATER_OR_EQUAL -> lessOrEqual(out, b, a, n);
      default -> slow(operation, out, a, b, n);
    }
  }

  private static void less(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] < b[i] ? 1.0 : 0.0;
    }
  }

  private static void lessOrEqual(double[] out, double[] a, double[] b, int n) {
    for (int i = 0; i < n; i++) {
      out[i] = a[i] <= b[i] ? 1.0 : 0.0;
    }
  }

  /** Operations whose own cost hides that of choosing them at each point, and rare ones. */
  private static void slow(Operation operation, double[] out, double[] a, double[] b, int n) {
    switch (operation) {
      case TAN -> {
        for (int i = 0; i < n; i++) {
          out[i] = Math.tan(a[i]);
        }
      }
      case ATAN2 -> {
        for (int i = 0; i < n; i++) {
          out[i] = Math.atan2(a[i], b[i]);
        }
      }
      case HYPOT -> {
        for (int i = 0; i < n; i++) {
          out[i] = Math.hypot(a[i], b[i]);
        }
      }
      case ERF -> {
        for (int i = 0; i < n; i++) {
          out[i] = ErrorFunction.erf(a[i]);
        }
      }
      default -> {
        boolean binary = operation.arity() > 1;
        for (int i = 0; i < n; i++) {
          out[i] = operation.apply(a[i], binary ? b[i] : 0, 0);
        }
      }
    }
  }
}
