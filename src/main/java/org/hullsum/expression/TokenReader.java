package org.hullsum.expression;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import org.hullsum.expression.Expression.Constant;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.Quantity;
import org.hullsum.units.Unit;
import org.hullsum.units.UnitParser;
import org.hullsum.units.UnitPrefix;
import org.hullsum.units.WorkingUnits;

/**
 * Cuts an expression into numbers (with their units), names and signs; see {@link ExpressionParser}
 * for the rule by which a unit ends.
 */
final class TokenReader {
  private static final Set<String> WORDS = Set.of("and", "or", "not");
  private static final Set<String> PLAIN_UNITS = Set.of("deg", "rad");
  private static final List<String> SIGNS =
      List.of("<=", ">=", "==", "!=", "<", ">", "+", "-", "*", "/", "^", "(", ")", ",");

  /** Signs of other notations, with what to write instead; longer ones first. */
  private static final List<Map.Entry<String, String>> FOREIGN =
      List.of(
          Map.entry("**", "write ^ for a power, such as x^2"),
          Map.entry("&&", "write 'and'"),
          Map.entry("||", "write 'or'"),
          Map.entry("<>", "write != for 'not equal'"),
          Map.entry("=<", "write <= for 'less or equal'"),
          Map.entry("=>", "write >= for 'greater or equal'"),
          Map.entry("=", "write == to compare; a formula assigns nothing"),
          Map.entry("&", "write 'and'"),
          Map.entry("|", "write 'or' for a choice, abs(x) for a magnitude"),
          Map.entry("!", "write 'not', or != for 'not equal'"),
          Map.entry("?", "write if(condition, a, b)"),
          Map.entry(
              "%",
              "a remainder is not available; a percentage stands after a number and one blank, such as 5 %"),
          Map.entry("[", "write parentheses ( )"),
          Map.entry("]", "write parentheses ( )"),
          Map.entry("{", "write parentheses ( )"),
          Map.entry("}", "write parentheses ( )"),
          Map.entry(";", "write a comma between arguments"),
          Map.entry("\u2212", "write the hyphen - for minus"),
          Map.entry("\u2013", "write the hyphen - for minus"),
          Map.entry("\u00d7", "write * for times"),
          Map.entry("\u00b7", "write * for times"),
          Map.entry("\u22c5", "write * for times"),
          Map.entry("\u00f7", "write / for a quotient"),
          Map.entry("\u2264", "write <= for 'less or equal'"),
          Map.entry("\u2265", "write >= for 'greater or equal'"),
          Map.entry("\u2260", "write != for 'not equal'"),
          Map.entry("\u221a", "write sqrt(x)"),
          Map.entry("\u03c0", "write pi"));

  private static final String SUPERSCRIPTS =
      "\u2070\u00b9\u00b2\u00b3\u2074\u2075\u2076\u2077\u2078\u2079";

  private final String text;
  private final WorkingUnits working;
  private final List<String> notes = new ArrayList<>();
  private int position;

  TokenReader(String text, WorkingUnits working) {
    this.text = text;
    this.working = working;
  }

  List<String> notes() {
    return notes;
  }

  /** The next token; at the end of the text an {@code END}, again and again. */
  Token next() throws TextFault {
    while (position < text.length() && Character.isWhitespace(text.charAt(position))) {
      position++;
    }
    int start = position;
    if (start == text.length()) {
      return Token.of(Token.Kind.END, text, start, start);
    }
    char first = text.charAt(start);
    if (isDigit(first)) {
      return number(start);
    }
    if (first == '\u03c0') {
      throw foreign(start);
    }
    if (isNameStart(first)) {
      position = endOfName(start);
      return Token.of(Token.Kind.NAME, text, start, position);
    }
    for (String sign : SIGNS) {
      if (text.startsWith(sign, start)
          && !text.startsWith("**", start)
          && !text.startsWith("<>", start)) {
        position = start + sign.length();
        return Token.of(Token.Kind.SIGN, text, start, position);
      }
    }
    throw foreign(start);
  }

  private TextFault foreign(int start) {
    for (Map.Entry<String, String> sign : FOREIGN) {
      if (text.startsWith(sign.getKey(), start)) {
        return fault(
            start,
            start + sign.getKey().length(),
            "'" + sign.getKey() + "' is not used here; " + sign.getValue());
      }
    }
    char found = text.charAt(start);
    if (found == '.') {
      return fault(start, start + 1, "digits are missing before the decimal point; write 0.5");
    }
    int superscript = SUPERSCRIPTS.indexOf(found);
    if (superscript >= 0) {
      return fault(start, start + 1, "write ^" + superscript + " for '" + found + "'");
    }
    int end = start + Character.charCount(text.codePointAt(start));
    String shown =
        Character.isISOControl(found)
            ? String.format("the control character U+%04X", (int) found)
            : "'" + text.substring(start, end) + "'";
    return fault(start, end, shown + " means nothing in a formula");
  }

  private static boolean isDigit(char c) {
    return c >= '0' && c <= '9';
  }

  private static boolean isNameStart(char c) {
    return Character.isLetter(c) || c == '_';
  }

  private int endOfName(int start) {
    int end = start;
    while (end < text.length()
        && (isNameStart(text.charAt(end)) || Character.isDigit(text.charAt(end)))) {
      end++;
    }
    return end;
  }

  private int endOfDigits(int start) {
    int end = start;
    while (end < text.length() && isDigit(text.charAt(end))) {
      end++;
    }
    return end;
  }

  private Token number(int start) throws TextFault {
    int end = endOfDigits(start);
    if (end < text.length() && text.charAt(end) == '.') {
      int fraction = endOfDigits(end + 1);
      if (fraction == end + 1) {
        throw fault(
            start,
            fraction,
            "digits are missing after the decimal point; write "
                + text.substring(start, end)
                + ".0");
      }
      end = fraction;
    }
    end = endOfExponent(end);
    double value = Double.parseDouble(text.substring(start, end));
    if (Double.isInfinite(value)) {
      throw fault(start, end, "the number is beyond the largest, 1.8e308");
    }
    refuseJuxtaposition(start, end);
    position = end;
    return numberWithUnit(start, end, value);
  }

  private int endOfExponent(int start) {
    if (start == text.length() || Character.toLowerCase(text.charAt(start)) != 'e') {
      return start;
    }
    int digits = start + 1;
    if (digits < text.length() && (text.charAt(digits) == '+' || text.charAt(digits) == '-')) {
      digits++;
    }
    int end = endOfDigits(digits);
    return end == digits ? start : end;
  }

  /** {@code 3x} and {@code 3(x)}. */
  private void refuseJuxtaposition(int start, int end) throws TextFault {
    if (end == text.length()) {
      return;
    }
    char next = text.charAt(end);
    String number = text.substring(start, end);
    if (isNameStart(next)) {
      int nameEnd = endOfName(end);
      String name = text.substring(end, nameEnd);
      throw fault(
          start,
          nameEnd,
          "something is missing between "
              + number
              + " and "
              + name
              + "; write "
              + number
              + "*"
              + name
              + " for a product, or '"
              + number
              + " "
              + name
              + "' with a blank where "
              + name
              + " is a unit");
    }
    if (next == '.') {
      throw fault(start, end + 1, "a number has one decimal point");
    }
    if (next == '%' || next == '°') {
      throw fault(start, end + 1, "write a blank between a number and its unit");
    }
  }

  private Token numberWithUnit(int start, int end, double value) throws TextFault {
    int unitStart = end;
    while (unitStart < text.length() && text.charAt(unitStart) == ' ') {
      unitStart++;
    }
    if (unitStart == end || !mayBeginUnit(unitStart)) {
      Constant bare = Expression.number(value);
      return new Token(
          Token.Kind.NUMBER, start, end, text.substring(start, end), Optional.of(bare));
    }
    UnitPrefix prefix = unit(start, end, unitStart);
    Unit unit = prefix.unit();
    position = prefix.end();
    notes.addAll(prefix.notes());
    if (working.none() && !PLAIN_UNITS.contains(unit.code())) {
      throw new TextFault(
          ProblemKind.UNIT,
          unitStart,
          position,
          "with 'units: none' no unit is written but deg and rad on angles");
    }
    Constant quantity =
        new Constant(
            new Quantity(value, unit, false).in(working),
            Optional.of(unit.dimension()),
            Optional.of(text.substring(start, end) + " " + text.substring(unitStart, position)));
    if (!Double.isFinite(quantity.value())) {
      throw fault(start, position, "the quantity is beyond the largest number, 1.8e308");
    }
    return new Token(
        Token.Kind.NUMBER, start, position, text.substring(start, position), Optional.of(quantity));
  }

  private boolean mayBeginUnit(int start) {
    if (start == text.length()) {
      return false;
    }
    char first = text.charAt(start);
    if (Character.isLetter(first)) {
      return !WORDS.contains(text.substring(start, endOfName(start)));
    }
    return first == '%' || first == '°' || first == '[' || text.startsWith("1/", start);
  }

  private UnitPrefix unit(int start, int end, int unitStart) throws TextFault {
    String number = text.substring(start, end);
    int wordEnd = Math.max(unitStart + 1, endOfName(unitStart));
    String word = text.substring(unitStart, wordEnd);
    UnitPrefix prefix;
    try {
      prefix = UnitParser.parsePrefix(text, unitStart);
    } catch (TextFault fault) {
      throw new TextFault(
          fault.kind(),
          fault.start(),
          fault.end(),
          fault.getMessage() + "; for a product write " + number + "*" + word);
    }
    int after = prefix.end();
    if (after < text.length()
        && (isNameStart(text.charAt(after))
            || Character.isDigit(text.charAt(after))
            || text.charAt(after) == '(')) {
      throw new TextFault(
          ProblemKind.UNIT,
          unitStart,
          Math.max(after, wordEnd),
          "'" + word + "' is not a unit; for a product write " + number + "*" + word);
    }
    return prefix;
  }

  private static TextFault fault(int start, int end, String message) {
    return new TextFault(ProblemKind.EXPRESSION, start, end, message);
  }
}
