package org.hullsum.quadrature;

import java.util.function.DoubleBinaryOperator;
import java.util.function.DoubleUnaryOperator;

/** Integrands and switch functions from lambdas, for tests. */
final class Functions {
  private Functions() {}

  static SquareIntegrand integrand(DoubleBinaryOperator... components) {
    return new SquareIntegrand() {
      @Override
      public int components() {
        return components.length;
      }

      @Override
      public void evaluate(int count, double[] u, double[] v, double[][] values) {
        if (count < 1 || count > BLOCK) {
          throw new AssertionError("block of " + count + " points");
        }
        for (int c = 0; c < components.length; c++) {
          for (int i = 0; i < count; i++) {
            if (!(u[i] >= 0 && u[i] <= 1 && v[i] >= 0 && v[i] <= 1)) {
              throw new AssertionError("point outside the square: " + u[i] + ", " + v[i]);
            }
            values[c][i] = components[c].applyAsDouble(u[i], v[i]);
          }
        }
      }
    };
  }

  static SwitchFunctions switches(DoubleBinaryOperator... functions) {
    if (functions.length == 0) {
      return SwitchFunctions.none();
    }
    return new SwitchFunctions() {
      @Override
      public int count() {
        return functions.length;
      }

      @Override
      public void evaluate(int count, double[] u, double[] v, double[][] values) {
        for (int k = 0; k < functions.length; k++) {
          for (int i = 0; i < count; i++) {
            values[k][i] = functions[k].applyAsDouble(u[i], v[i]);
          }
        }
      }
    };
  }

  static LineIntegrand line(DoubleUnaryOperator... components) {
    return new LineIntegrand() {
      @Override
      public int components() {
        return components.length;
      }

      @Override
      public void evaluate(int count, double[] t, double[][] values) {
        for (int c = 0; c < components.length; c++) {
          for (int i = 0; i < count; i++) {
            values[c][i] = components[c].applyAsDouble(t[i]);
          }
        }
      }
    };
  }
}
