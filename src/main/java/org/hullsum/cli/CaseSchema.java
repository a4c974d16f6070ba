package org.hullsum.cli;

final class CaseSchema {
  private CaseSchema() {}

  static String text() {
    return "";
  }
}
