package org.hullsum.casefile;

import java.util.Locale;
import java.util.Optional;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;

/** Turns what the YAML parser says into a problem with a hint that a writer of cases can use. */
final class YamlFaults {
  private static final String NEEDS_QUOTES = "*&!%@|>`";

  private YamlFaults() {}

  static void report(YamlEngineException fault, SourceText source, ProblemAccumulator problems) {
    if (fault instanceof BoundedParser.Refusal refusal) {
      problems.add(refusal.kind(), place(refusal.mark(), source), refusal.getMessage());
    } else if (fault instanceof MarkedYamlEngineException marked) {
      reportMarked(marked, source, problems);
    } else {
      reportUnmarked(fault, source, problems);
    }
  }

  private static void reportUnmarked(
      YamlEngineException fault, SourceText source, ProblemAccumulator problems) {
    String message = String.valueOf(fault.getMessage());
    if (message.toLowerCase(Locale.ROOT).contains("aliases")) {
      problems.add(
          ProblemKind.LIMIT_EXCEEDED,
          source.wholeFile(),
          "the file uses more aliases than allowed");
    } else {
      problems.add(
          ProblemKind.SYNTAX, source.wholeFile(), "this is not YAML: " + firstLine(message));
    }
  }

  private static void reportMarked(
      MarkedYamlEngineException fault, SourceText source, ProblemAccumulator problems) {
    Optional<Mark> mark =
        fault.getProblemMark().isPresent() ? fault.getProblemMark() : fault.getContextMark();
    if (mark.isEmpty()) {
      reportUnmarked(fault, source, problems);
      return;
    }
    String said = String.valueOf(fault.getProblem());
    int line = Math.min(mark.get().getLine(), source.lineCount() - 1);
    int index = source.indexOf(mark.get().getLine(), mark.get().getColumn());
    Place place = source.place(index);
    int tab = tabInIndent(source.line(line));
    if (tab >= 0) {
      place = new Place(source.file(), line + 1, tab + 1);
      problems.add(
          ProblemKind.SYNTAX, place, "a tab stands in the indentation; YAML indents with blanks");
      return;
    }
    String trap = trap(fault, source, place);
    String hint = gluedKey(source, line);
    if (hint.isEmpty() && trap.isEmpty()) {
      trap = quoting(source, index);
    }
    if (hint.isEmpty()) {
      hint = flowEnd(said);
    }
    problems.add(
        ProblemKind.SYNTAX,
        place,
        trap.isEmpty() ? "this is not YAML: " + plain(said) + hint : trap);
  }

  /** Faults that have a name of their own. */
  private static String trap(MarkedYamlEngineException fault, SourceText source, Place place) {
    String said = String.valueOf(fault.getProblem());
    if (said.contains("another document")) {
      return "a case file holds one document; here a second one begins";
    }
    String context = String.valueOf(fault.getContext());
    if (context.contains("quoted scalar") && fault.getContextMark().isPresent()) {
      int opened = fault.getContextMark().get().getLine() + 1;
      return said.contains("end of stream")
          ? "the quote that opens on line " + opened + " is never closed"
          : "in the quoted text that begins on line " + opened + ": " + firstLine(said);
    }
    return source.text().startsWith("%YAML") && place.line() == 1
        ? "leave the %YAML line out; a case is read as YAML 1.2"
        : "";
  }

  private static int tabInIndent(String line) {
    int first = 0;
    while (first < line.length() && Character.isWhitespace(line.charAt(first))) {
      if (line.charAt(first) == '\t') {
        return first;
      }
      first++;
    }
    return -1;
  }

  /** A key without a blank after its colon, on the line of the fault or just before it. */
  private static String gluedKey(SourceText source, int line) {
    for (int at = line; at >= Math.max(0, line - 1); at--) {
      String key = YamlTraps.gluedKey(source.line(at));
      if (!key.isEmpty()) {
        return "; a blank is missing after `" + key + ":` on line " + (at + 1);
      }
    }
    return "";
  }

  /** A value that begins with a character that means something to YAML. */
  private static String quoting(SourceText source, int index) {
    int line = source.lineAt(Math.min(index, source.text().length()));
    String text = source.line(line);
    int column = index - source.indexOf(line, 0);
    int start = Math.min(column, text.length());
    while (start > 0 && !startsValue(text, start)) {
      start--;
    }
    if (start >= text.length()) {
      return "";
    }
    char first = text.charAt(start);
    boolean dash = text.startsWith("- ", start) && start > 0;
    if (NEEDS_QUOTES.indexOf(first) < 0 && !dash) {
      return text.indexOf(": ", start) > 0 && text.indexOf(": ") != text.lastIndexOf(": ")
          ? "a text that holds `: ` must be quoted; YAML takes it for a key"
          : "";
    }
    return "a text that begins with `"
        + (dash ? "- " : first)
        + "` must be quoted, as in \""
        + (dash ? "- " : first)
        + "…\"";
  }

  private static boolean startsValue(String text, int at) {
    String before = text.substring(0, at).stripTrailing();
    return !Character.isWhitespace(at < text.length() ? text.charAt(at) : 'x')
        && (before.isEmpty()
            || before.endsWith(":")
            || before.endsWith("[")
            || before.endsWith(",")
            || before.endsWith("-") && before.strip().equals("-"));
  }

  private static String flowEnd(String said) {
    return said.contains("expected ',' or")
        ? "; is a bracket or a brace left open, or a quote missing?"
        : "";
  }

  private static String plain(String said) {
    return firstLine(said)
        .replace("<block end>", "the end of the block")
        .replace("<scalar>", "a text");
  }

  private static String firstLine(String message) {
    int end = message.indexOf('\n');
    return end < 0 ? message : message.substring(0, end);
  }

  private static Place place(Optional<Mark> mark, SourceText source) {
    return mark.map(m -> source.place(source.indexOf(m.getLine(), m.getColumn())))
        .orElse(source.wholeFile());
  }
}
