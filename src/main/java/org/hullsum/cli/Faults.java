package org.hullsum.cli;

/** A fault of the program itself, in one line. */
final class Faults {
  private static final String OURS = "org.hullsum.";

  private Faults() {}

  /** What happened and where, for a report to the program's makers; never a stack trace. */
  static String describe(Throwable fault) {
    if (fault instanceof OutOfMemoryError) {
      return "the program ran out of memory; give it more with JAVA_TOOL_OPTIONS=-Xmx4g, or ask for"
          + " fewer digits";
    }
    String message = fault.getMessage();
    return "a fault of the program itself, please report it with the case: "
        + fault.getClass().getSimpleName()
        + (message == null ? "" : " (" + message.replaceAll("\\p{Cntrl}+", " ") + ")")
        + place(fault.getStackTrace());
  }

  private static String place(StackTraceElement[] trace) {
    for (StackTraceElement element : trace) {
      if (element.getClassName().startsWith(OURS)) {
        return " at "
            + element.getClassName().substring(OURS.length())
            + ":"
            + element.getLineNumber();
      }
    }
    return "";
  }
}
