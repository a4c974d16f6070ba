package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.MatrixUtils;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class CorrelationMatrixTest {
  private static final long SEED = 41;

  private static double[][] ofThree(double ab, double ac, double bc) {
    return new double[][] {{1, ab, ac}, {ab, 1, bc}, {ac, bc, 1}};
  }

  @ParameterizedTest
  @CsvSource({
    "0, 0, 0, true",
    "1, 1, 1, true",
    "1, -1, -1, true",
    "1, 1, 0.9, false",
    "0.9, 0.9, -0.9, false",
    "0.5, 0.5, -0.5, true",
    "0.5, 0.5, -0.51, false"
  })
  void matrixOfThreeIsPossibleOrNot(double ab, double ac, double bc, boolean possible) {
    assertEquals(possible, CorrelationMatrix.isPossible(ofThree(ab, ac, bc)));
  }

  @Test
  void judgementIsThatOfTheLeastEigenvalue() {
    Random random = new Random(SEED);
    int possible = 0;
    for (int i = 0; i < 500; i++) {
      double[][] matrix =
          ofThree(
              2 * random.nextDouble() - 1,
              2 * random.nextDouble() - 1,
              2 * random.nextDouble() - 1);
      double[] eigenvalues =
          new EigenDecomposition(MatrixUtils.createRealMatrix(matrix)).getRealEigenvalues();
      boolean expected = eigenvalues[2] >= 0;
      possible += expected ? 1 : 0;
      assertEquals(expected, CorrelationMatrix.isPossible(matrix), "seed " + SEED + ", " + i);
    }
    assertEquals(true, possible > 100 && possible < 400);
  }
}
