package org.hullsum.units;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/** What to tell a person whose unit was not understood, or was perhaps understood otherwise. */
final class UnitAdvice {
  private static final int MAX_SUGGESTIONS = 3;
  private static final int MAX_QUOTED = 40;

  private UnitAdvice() {}

  /** The fault of a place where a unit should begin and none does. */
  static TextFault noUnit(String text, int at) {
    if (at >= text.length()) {
      int last = Math.max(0, text.length() - 1);
      return fault(last, text.length(), "expected a unit after '" + quoted(text) + "'");
    }
    char found = text.charAt(at);
    int end = at + Character.charCount(text.codePointAt(at));
    String what =
        switch (found) {
          case '/', '.', '·', '⋅' -> "two operators side by side: expected a unit after the first";
          case '*' -> "expected a unit here; a power is written m3 or m^3";
          case '^' -> "expected a whole exponent after '^'";
          case ' ', '\t', '\u00a0' -> "a unit holds no blanks; write it in one piece, such as m3/h";
          case '[' -> "this '[' is never closed";
          case '(' -> "expected an operator before '(', or a blank where the unit ends";
          case ')' -> "expected a unit before ')'";
          case '-', '+', '−' ->
              "a sign stands only before the digits of an exponent; an uncertainty begins with ± or +/-";
          default ->
              "unexpected '" + text.substring(at, end) + "' in a unit; expected one such as m3/h";
        };
    return fault(at, end, what);
  }

  /** The fault of a symbol that stands for no unit. */
  static TextFault unknown(String text, int start, String symbol) {
    String hint = UnitHints.BY_SYMBOL.get(symbol.toLowerCase(Locale.ROOT));
    String message = "unknown unit '" + quoted(symbol) + "'";
    if (hint != null) {
      message += ": " + hint;
    } else {
      List<String> near = nearest(symbol);
      message +=
          near.isEmpty()
              ? "; units are UCUM codes such as m3/h, kg/s, Pa.s, [gal_us]/min"
              : "; did you mean " + String.join(" or ", near) + "?";
    }
    return fault(start, start + symbol.length(), message);
  }

  /** Known symbols like this one: those that differ in case only, else those one slip away. */
  static List<String> nearest(String symbol) {
    List<String> sameButCase = new ArrayList<>();
    List<String> oneSlip = new ArrayList<>();
    int leastChanges = Integer.MAX_VALUE;
    if (symbol.length() > MAX_QUOTED) {
      return oneSlip;
    }
    for (String known : candidates()) {
      if (known.equalsIgnoreCase(symbol)) {
        sameButCase.add(known);
        leastChanges = Math.min(leastChanges, changes(symbol, known));
      } else if (symbol.length() > 1 && known.length() > 1 && oneSlipAway(symbol, known)) {
        oneSlip.add(known);
      }
    }
    int least = leastChanges;
    sameButCase.removeIf(known -> changes(symbol, known) > least);
    List<String> best = sameButCase.isEmpty() ? oneSlip : sameButCase;
    return List.copyOf(best.subList(0, Math.min(MAX_SUGGESTIONS, best.size())));
  }

  /** In how many places two texts of the same length differ. */
  private static int changes(String a, String b) {
    int count = 0;
    for (int i = 0; i < Math.min(a.length(), b.length()); i++) {
      count += a.charAt(i) == b.charAt(i) ? 0 : 1;
    }
    return count;
  }

  private static List<String> candidates() {
    List<String> all = new ArrayList<>();
    for (UnitAtom atom : UnitTable.instance().atoms()) {
      all.add(atom.symbol());
    }
    for (UnitAtom atom : UnitTable.instance().atoms()) {
      if (atom.metric()) {
        for (String prefix : List.of("k", "m", "M", "c", "u", "n", "G", "d", "h", "p", "T")) {
          all.add(prefix + atom.symbol());
        }
      }
    }
    return all;
  }

  /** Whether one insertion, deletion, substitution or swap of neighbours makes one the other. */
  private static boolean oneSlipAway(String a, String b) {
    int shorter = Math.min(a.length(), b.length());
    if (Math.max(a.length(), b.length()) - shorter > 1) {
      return false;
    }
    int head = 0;
    while (head < shorter && a.charAt(head) == b.charAt(head)) {
      head++;
    }
    String restA = a.substring(head);
    String restB = b.substring(head);
    if (restA.isEmpty() || restB.isEmpty()) {
      return true;
    }
    boolean inserted = restA.equals(restB.substring(1));
    boolean deleted = restB.equals(restA.substring(1));
    boolean substituted = restA.substring(1).equals(restB.substring(1));
    boolean swapped =
        restA.length() > 1
            && restA.length() == restB.length()
            && restA.charAt(0) == restB.charAt(1)
            && restA.charAt(1) == restB.charAt(0)
            && restA.substring(2).equals(restB.substring(2));
    return inserted || deleted || substituted || swapped;
  }

  private static String quoted(String text) {
    return text.length() <= MAX_QUOTED ? text : text.substring(0, MAX_QUOTED) + "…";
  }

  private static TextFault fault(int start, int end, String message) {
    return new TextFault(ProblemKind.UNIT, start, end, message);
  }
}
