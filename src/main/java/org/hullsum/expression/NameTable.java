package org.hullsum.expression;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/** The names that one formula may use, and hints for those that it may not. */
final class NameTable {
  private static final int MOST_LISTED = 12;

  private static final Map<String, String> HINTS =
      Map.ofEntries(
          Map.entry("log", "write ln(x) for the natural logarithm, log10(x) for the decimal one"),
          Map.entry("lg", "write log10(x)"),
          Map.entry("log2", "write ln(x)/ln(2)"),
          Map.entry("pow", "write x^y"),
          Map.entry("arcsin", "write asin(x)"),
          Map.entry("arccos", "write acos(x)"),
          Map.entry("arctan", "write atan(x)"),
          Map.entry("sec", "write 1/cos(x)"),
          Map.entry("csc", "write 1/sin(x)"),
          Map.entry("cot", "write 1/tan(x)"),
          Map.entry("sgn", "write sign(x)"),
          Map.entry("fabs", "write abs(x)"),
          Map.entry("square", "write x^2"),
          Map.entry("true", "write a condition that holds, such as 1 == 1"),
          Map.entry("false", "write a condition that does not hold, such as 1 == 0"),
          Map.entry("True", "write a condition that holds, such as 1 == 1"),
          Map.entry("False", "write a condition that does not hold, such as 1 == 0"),
          Map.entry("and", "it stands between two conditions"),
          Map.entry("or", "it stands between two conditions"),
          Map.entry("then", "write if(condition, a, b)"),
          Map.entry("else", "write if(condition, a, b)"),
          Map.entry("inf", "infinite numbers are not used"),
          Map.entry("nan", "a formula has a value everywhere it is used"));

  /** Looked up, never copied: one case has many formulas and may have many parameters. */
  private final Set<String> symbols;

  NameTable(Collection<String> symbols) {
    this.symbols = symbols instanceof Set<String> set ? set : Set.copyOf(symbols);
  }

  boolean knows(String name) {
    return symbols.contains(name);
  }

  /** The symbol or constant of that name. */
  Expression operand(Token name, boolean called) throws TextFault {
    String text = name.text();
    if (knows(text)) {
      return Expression.symbol(text);
    }
    return switch (text) {
      case "pi" -> new Constant(Math.PI, Optional.empty(), Optional.of(text));
      case "e" -> new Constant(Math.E, Optional.empty(), Optional.of(text));
      default -> throw unknown(name, called);
    };
  }

  private TextFault unknown(Token name, boolean called) {
    String text = name.text();
    String hint = HINTS.get(text);
    if (hint != null) {
      return new TextFault(
          ProblemKind.UNKNOWN_NAME,
          name.start(),
          name.end(),
          "'" + text + "' is not available here; " + hint);
    }
    List<String> functions =
        new ArrayList<>(Arrays.stream(Function.values()).map(Function::word).toList());
    functions.add("if");
    List<String> known = new ArrayList<>(called ? functions : symbols);
    known.addAll(called ? symbols : functions);
    known.addAll(List.of("pi", "e"));
    String what = called ? "function" : "name";
    return new TextFault(
        ProblemKind.UNKNOWN_NAME,
        name.start(),
        name.end(),
        NameSuggestion.nearest(text, known)
            .map(near -> "unknown " + what + " '" + text + "'; did you mean '" + near + "'?")
            .orElseGet(() -> "unknown " + what + " '" + text + "'; " + listed(called)));
  }

  private String listed(boolean called) {
    if (called) {
      return "the functions are "
          + String.join(" ", Arrays.stream(Function.values()).map(Function::word).toList())
          + " if";
    }
    if (symbols.isEmpty()) {
      return "only numbers, pi and e may stand here";
    }
    return "known here: "
        + String.join(", ", symbols.stream().sorted().limit(MOST_LISTED).toList())
        + (symbols.size() > MOST_LISTED ? ", …" : "");
  }
}
