package org.hullsum.quadrature;

/** A rectangle of a cell with what is known of the integral over it; refined in place or split. */
final class Region {
  final Cell cell;
  final int order;
  final double fromX;
  final double toX;
  final double fromY;
  final double toY;

  DirectionRule ruleX;
  DirectionRule ruleY;
  final double[] value;
  final double[] error;
  final double[] magnitude;
  final double[] magnitudeError;
  final double[] topX;
  final double[] middleX;
  final double[] topY;
  final double[] middleY;

  /** How often a rule has been applied; the first look alone is never believed. */
  int looks;

  /** Largest ratio of an error to what is allowed, when the region was queued. */
  double urgency;

  /** Whether the magnitude, not the integral, is the reason for the urgency. */
  boolean magnitudeIsUrgent;

  Region(Cell cell, int order, double[] bounds, DirectionRule ruleX, DirectionRule ruleY) {
    this.cell = cell;
    this.order = order;
    this.fromX = bounds[0];
    this.toX = bounds[1];
    this.fromY = bounds[2];
    this.toY = bounds[3];
    this.ruleX = ruleX;
    this.ruleY = ruleY;
    int n = cell.components();
    value = new double[n];
    error = new double[n];
    magnitude = new double[n];
    magnitudeError = new double[n];
    topX = new double[n];
    middleX = new double[n];
    topY = new double[n];
    middleY = new double[n];
  }

  double ratioX(int c) {
    return Decay.ratio(ruleX, topX[c], middleX[c], magnitude[c]);
  }

  double ratioY(int c) {
    return Decay.ratio(ruleY, topY[c], middleY[c], magnitude[c]);
  }

  double errorX(int c) {
    return Decay.error(ruleX, topX[c], ratioX(c), magnitude[c]);
  }

  double errorY(int c) {
    return Decay.error(ruleY, topY[c], ratioY(c), magnitude[c]);
  }

  int neededX(int c, double tolerance) {
    return Decay.neededSize(ruleX, topX[c], ratioX(c), magnitude[c], tolerance);
  }

  int neededY(int c, double tolerance) {
    return Decay.neededSize(ruleY, topY[c], ratioY(c), magnitude[c], tolerance);
  }
}
