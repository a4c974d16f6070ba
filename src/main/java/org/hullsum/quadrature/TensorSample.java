package org.hullsum.quadrature;

import java.util.Optional;

/**
 * Accumulates one tensor rule over a rectangle of a cell: integral, magnitude and the coefficients
 * that tell the decay in both directions, for each component. Reused from region to region.
 *
 * <p>A direction's coefficient is summed in absolute value over the rows in the other direction, so
 * that errors of different rows cannot hide one another.
 */
final class TensorSample {
  final double[] value;
  final double[] magnitude;
  final double[] opposite;
  final double[] topX;
  final double[] middleX;
  final double[] topY;
  final double[] middleY;

  private double[] x = new double[0];
  private double[] y = new double[0];
  private double[] column = new double[0];
  private double[][] values;
  private Optional<ParameterPoint> nonFiniteAt = Optional.empty();

  TensorSample(int components) {
    value = new double[components];
    magnitude = new double[components];
    opposite = new double[components];
    topX = new double[components];
    middleX = new double[components];
    topY = new double[components];
    middleY = new double[components];
    values = new double[components][0];
  }

  /** Where a value was not finite in the sample last taken. */
  Optional<ParameterPoint> nonFiniteAt() {
    return nonFiniteAt;
  }

  /** Takes the sample; false where the cell reports a surprise. */
  boolean take(Region region, DirectionRule ruleX, DirectionRule ruleY) {
    int nx = ruleX.size();
    int ny = ruleY.size();
    reserve(nx, ny);
    place(ruleX, region.fromX, region.toX, x);
    place(ruleY, region.fromY, region.toY, y);
    nonFiniteAt = Optional.empty();
    if (!region.cell.sample(nx, x, ny, y, values)) {
      return false;
    }
    double area = (region.toX - region.fromX) * (region.toY - region.fromY);
    for (int c = 0; c < value.length; c++) {
      sum(c, ruleX, ruleY, area);
      if (!Double.isFinite(magnitude[c])) {
        nonFiniteAt = findNonFinite(region, nx, ny);
        if (nonFiniteAt.isPresent()) {
          return true;
        }
      }
      topX[c] = area * coefficientX(c, ruleX.topModes(), ruleX, ruleY);
      middleX[c] = area * coefficientX(c, ruleX.middleModes(), ruleX, ruleY);
      topY[c] = area * coefficientY(c, ruleY.topModes(), ruleX, ruleY);
      middleY[c] = area * coefficientY(c, ruleY.middleModes(), ruleX, ruleY);
    }
    return true;
  }

  /** The values last sampled: component c at (x_i, y_j) in {@code [c][i·ny + j]}. */
  double[][] values() {
    return values;
  }

  private void reserve(int nx, int ny) {
    if (x.length < nx) {
      x = new double[nx];
    }
    if (y.length < ny) {
      y = new double[ny];
      column = new double[ny];
    }
    if (values[0].length < nx * ny) {
      for (int c = 0; c < values.length; c++) {
        values[c] = new double[nx * ny];
      }
    }
  }

  private static void place(DirectionRule rule, double from, double to, double[] target) {
    double[] nodes = rule.nodes();
    for (int i = 0; i < nodes.length; i++) {
      target[i] = from + (to - from) * nodes[i];
    }
  }

  private void sum(int c, DirectionRule ruleX, DirectionRule ruleY, double area) {
    double[] f = values[c];
    double[] wx = ruleX.weights();
    double[] wy = ruleY.weights();
    double positive = 0;
    double negative = 0;
    for (int i = 0; i < wx.length; i++) {
      double above = 0;
      double below = 0;
      int row = i * wy.length;
      for (int j = 0; j < wy.length; j++) {
        double term = wy[j] * f[row + j];
        above += Math.max(term, 0);
        below += Math.min(term, 0);
      }
      positive += wx[i] * above;
      negative += wx[i] * below;
    }
    value[c] = area * (positive + negative);
    magnitude[c] = area * (positive - negative);
    opposite[c] = area * Math.min(positive, -negative);
  }

  private double coefficientX(int c, double[][] modes, DirectionRule ruleX, DirectionRule ruleY) {
    double[] f = values[c];
    double[] wy = ruleY.weights();
    int ny = wy.length;
    double largest = 0;
    for (double[] mode : modes) {
      java.util.Arrays.fill(column, 0, ny, 0);
      for (int i = 0; i < ruleX.size(); i++) {
        double factor = mode[i];
        int row = i * ny;
        for (int j = 0; j < ny; j++) {
          column[j] += factor * f[row + j];
        }
      }
      double norm = 0;
      for (int j = 0; j < ny; j++) {
        norm += wy[j] * Math.abs(column[j]);
      }
      largest = Math.max(largest, norm);
    }
    return largest;
  }

  private double coefficientY(int c, double[][] modes, DirectionRule ruleX, DirectionRule ruleY) {
    double[] f = values[c];
    double[] wx = ruleX.weights();
    int ny = ruleY.size();
    double largest = 0;
    for (double[] mode : modes) {
      double norm = 0;
      for (int i = 0; i < wx.length; i++) {
        int row = i * ny;
        double coefficient = 0;
        for (int j = 0; j < ny; j++) {
          coefficient += mode[j] * f[row + j];
        }
        norm += wx[i] * Math.abs(coefficient);
      }
      largest = Math.max(largest, norm);
    }
    return largest;
  }

  private Optional<ParameterPoint> findNonFinite(Region region, int nx, int ny) {
    for (int i = 0; i < nx; i++) {
      for (int j = 0; j < ny; j++) {
        for (double[] f : values) {
          if (!Double.isFinite(f[i * ny + j])) {
            return Optional.of(region.cell.place(x[i], y[j]));
          }
        }
      }
    }
    return Optional.empty();
  }
}
