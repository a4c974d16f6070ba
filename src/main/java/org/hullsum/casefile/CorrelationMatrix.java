package org.hullsum.casefile;

/** Judges matrices of correlation coefficients. */
final class CorrelationMatrix {
  /** Rounding in the elimination of a matrix with unit diagonal. */
  private static final double ROUNDING = 1e-12;

  private CorrelationMatrix() {}

  /**
   * Whether a symmetric matrix with unit diagonal is positive semidefinite, by symmetric Gauss
   * elimination with the largest pivot first. Cost: n³/3. The matrix is overwritten.
   */
  static boolean isPossible(double[][] matrix) {
    int n = matrix.length;
    boolean[] done = new boolean[n];
    for (int step = 0; step < n; step++) {
      int pivot = -1;
      for (int i = 0; i < n; i++) {
        if (!done[i] && (pivot < 0 || matrix[i][i] > matrix[pivot][pivot])) {
          pivot = i;
        }
      }
      done[pivot] = true;
      if (matrix[pivot][pivot] <= ROUNDING) {
        return restVanishes(matrix, done, pivot);
      }
      for (int i = 0; i < n; i++) {
        double factor = matrix[i][pivot] / matrix[pivot][pivot];
        for (int j = 0; j < n && !done[i]; j++) {
          if (!done[j]) {
            matrix[i][j] -= factor * matrix[pivot][j];
          }
        }
      }
    }
    return true;
  }

  /** Where no pivot is left, everything that is left must vanish. */
  private static boolean restVanishes(double[][] matrix, boolean[] done, int pivot) {
    double largest = Math.abs(matrix[pivot][pivot]);
    for (int i = 0; i < matrix.length; i++) {
      if (!done[i]) {
        for (int j = 0; j < matrix.length; j++) {
          largest = done[j] && j != pivot ? largest : Math.max(largest, Math.abs(matrix[i][j]));
        }
      }
    }
    return largest <= Math.sqrt(ROUNDING);
  }
}
