package org.hullsum.closure;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SignSearchTest {
  private static double[] times(double[][] form, int[] signs) {
    double[] values = new double[form.length];
    for (int row = 0; row < form.length; row++) {
      for (int g = 0; g < signs.length; g++) {
        values[row] += form[row][g] * signs[g];
      }
    }
    return values;
  }

  private static double distance(double[][] form, int[] signs, double[] values) {
    double sum = 0;
    double[] reached = times(form, signs);
    for (int row = 0; row < values.length; row++) {
      sum += (reached[row] - values[row]) * (reached[row] - values[row]);
    }
    return sum;
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 3, 9, SignSearch.FEW, SignSearch.FEW + 1, 40})
  void signsAreFoundFromTheirValues(int count) {
    Random random = new Random(count);
    for (int round = 0; round < 5; round++) {
      double[][] form = new double[4 * count][count];
      int[] signs = new int[count];
      for (int g = 0; g < count; g++) {
        signs[g] = random.nextBoolean() ? 1 : -1;
        for (double[] row : form) {
          row[g] = random.nextGaussian();
        }
      }
      double[] values = times(form, signs);
      for (int row = 0; row < values.length; row++) {
        values[row] += 0.1 * random.nextGaussian();
      }
      SignSearch search = SignSearch.of(form, values);
      assertArrayEquals(signs, search.best());
      for (int g = 0; g < count; g++) {
        int[] otherwise = search.otherwise(g);
        assertEquals(-signs[g], otherwise[g]);
        assertTrue(distance(form, otherwise, values) > distance(form, signs, values), "sign " + g);
      }
    }
  }

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3, 4})
  void fewSignsAreTheBestOfAll(long seed) {
    Random random = new Random(seed);
    int count = 8;
    double[][] form = new double[5][count];
    double[] values = new double[form.length];
    for (int row = 0; row < form.length; row++) {
      values[row] = random.nextGaussian();
      for (int g = 0; g < count; g++) {
        form[row][g] = random.nextGaussian();
      }
    }
    double least = Double.POSITIVE_INFINITY;
    for (int code = 0; code < 1 << count; code++) {
      int[] signs = new int[count];
      for (int g = 0; g < count; g++) {
        signs[g] = (code >> g & 1) == 1 ? 1 : -1;
      }
      least = Math.min(least, distance(form, signs, values));
    }
    assertEquals(least, distance(form, SignSearch.of(form, values).best(), values), 1e-12);
  }
}
