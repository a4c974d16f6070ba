package org.hullsum.expression;

import java.util.ArrayList;
import java.util.Collection;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.expression.Expression.Binary;
import org.hullsum.expression.Expression.Call;
import org.hullsum.expression.Expression.Comparison;
import org.hullsum.expression.Expression.Conditional;
import org.hullsum.expression.Expression.Connective;
import org.hullsum.expression.Expression.Logical;
import org.hullsum.expression.Expression.Negation;
import org.hullsum.expression.Expression.Operator;
import org.hullsum.expression.Expression.Relation;
import org.hullsum.expression.Expression.Symbol;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;
import org.hullsum.units.WorkingUnits;

/** One reading of one formula: a Pratt parser, bounded in depth, over a {@link TokenReader}. */
final class ExpressionReader {
  private static final int NOT = 3;
  private static final int COMPARISON = 4;
  private static final int MINUS = 7;
  private static final int POWER = 8;

  private static final Map<String, Integer> BINDING =
      Map.ofEntries(
          Map.entry("or", 1),
          Map.entry("and", 2),
          Map.entry("<", COMPARISON),
          Map.entry("<=", COMPARISON),
          Map.entry(">", COMPARISON),
          Map.entry(">=", COMPARISON),
          Map.entry("==", COMPARISON),
          Map.entry("!=", COMPARISON),
          Map.entry("+", 5),
          Map.entry("-", 5),
          Map.entry("*", 6),
          Map.entry("/", 6),
          Map.entry("^", POWER));

  private final String text;
  private final TokenReader tokens;
  private final NameTable names;
  private final IdentityHashMap<Expression, int[]> spans = new IdentityHashMap<>();
  private final IdentityHashMap<Expression, Integer> heights = new IdentityHashMap<>();
  private Token token;
  private int previousEnd;
  private int depth;

  ExpressionReader(String text, Collection<String> symbols, WorkingUnits working) throws TextFault {
    this.text = text;
    this.tokens = new TokenReader(text, working);
    this.names = new NameTable(symbols);
    this.token = tokens.next();
  }

  ParsedExpression read() throws TextFault {
    if (token.kind() == Token.Kind.END) {
      throw fault(0, text.length(), "the formula is empty");
    }
    Expression root = expression(0);
    if (token.kind() != Token.Kind.END) {
      throw unexpected();
    }
    return new ParsedExpression(root, text, spans, tokens.notes());
  }

  private TextFault unexpected() {
    if (token.is(")")) {
      return fault(token.start(), token.end(), "this parenthesis was never opened");
    }
    if (token.is(",")) {
      return fault(
          token.start(),
          token.end(),
          "a comma stands only between the arguments of a function; decimals have a point, such as 1.5");
    }
    return fault(
        token.start(),
        token.end(),
        "an operator is missing before '" + token.text() + "'; write * for a product");
  }

  private void advance() throws TextFault {
    previousEnd = token.end();
    token = tokens.next();
  }

  /** An expression of operators that bind tighter than {@code loosest}. */
  private Expression expression(int loosest) throws TextFault {
    depth++;
    if (depth > ExpressionParser.MAX_DEPTH) {
      throw new TextFault(
          ProblemKind.LIMIT_EXCEEDED,
          token.start(),
          token.end(),
          "the formula is nested more than " + ExpressionParser.MAX_DEPTH + " deep");
    }
    int start = token.start();
    Expression left = operand();
    boolean compared = false;
    while (true) {
      Integer binding = token.kind() == Token.Kind.NUMBER ? null : BINDING.get(token.text());
      if (binding == null || binding <= loosest) {
        break;
      }
      if (binding == COMPARISON && compared) {
        throw fault(start, token.end(), "comparisons are not chained; write a < b and b < c");
      }
      compared = binding == COMPARISON;
      left = operation(left, start, binding);
    }
    if (token.beginsOperand()) {
      throw unexpectedOperand(left, start);
    }
    depth--;
    return left;
  }

  private TextFault unexpectedOperand(Expression left, int start) {
    if (token.is("(") && left instanceof Symbol symbol && start == spans.get(left)[0]) {
      return fault(
          spans.get(left)[0],
          token.end(),
          "'"
              + symbol.name()
              + "' is not a function; write "
              + symbol.name()
              + "*( … ) for a product");
    }
    return unexpected();
  }

  private Expression operation(Expression left, int start, int binding) throws TextFault {
    String sign = token.text();
    advance();
    Expression right = expression(binding == POWER ? MINUS : binding);
    return switch (sign) {
      case "or" -> logical(Connective.OR, left, right, start);
      case "and" -> logical(Connective.AND, left, right, start);
      case "+" -> binary(Operator.ADD, left, right, start);
      case "-" -> binary(Operator.SUBTRACT, left, right, start);
      case "*" -> binary(Operator.MULTIPLY, left, right, start);
      case "/" -> binary(Operator.DIVIDE, left, right, start);
      case "^" -> binary(Operator.POWER, left, right, start);
      default -> placed(new Comparison(relation(sign), left, right), start);
    };
  }

  private Expression binary(Operator operator, Expression left, Expression right, int start)
      throws TextFault {
    return placed(new Binary(operator, left, right), start);
  }

  private static Relation relation(String sign) {
    for (Relation relation : Relation.values()) {
      if (Printer.sign(relation).equals(sign)) {
        return relation;
      }
    }
    throw new IllegalArgumentException(sign + " is not a comparison");
  }

  private Expression logical(Connective connective, Expression left, Expression right, int start)
      throws TextFault {
    requireCondition(left, connective.name().toLowerCase(java.util.Locale.ROOT));
    requireCondition(right, connective.name().toLowerCase(java.util.Locale.ROOT));
    List<Expression> conditions = new ArrayList<>();
    if (left instanceof Logical joined
        && joined.connective() == connective
        && start == spans.get(left)[0]) {
      conditions.addAll(joined.conditions());
    } else {
      conditions.add(left);
    }
    conditions.add(right);
    return placed(new Logical(connective, conditions), start);
  }

  private void requireCondition(Expression e, String where) throws TextFault {
    if (!condition(e)) {
      int[] span = spans.get(e);
      throw fault(
          span[0],
          span[1],
          "'"
              + where
              + "' needs a condition such as x > 0, not a number; for 'is not zero' write != 0");
    }
  }

  private static boolean condition(Expression e) {
    return e instanceof Comparison
        || e instanceof Logical
        || e instanceof Conditional c && condition(c.then()) && condition(c.otherwise());
  }

  /** Records where a new node stands, and refuses one that is too high above its leaves. */
  private Expression placed(Expression e, int start) throws TextFault {
    int height = 0;
    for (Expression child : e.children()) {
      height = Math.max(height, heights.get(child) + 1);
    }
    if (height > ExpressionParser.MAX_HEIGHT) {
      throw new TextFault(
          ProblemKind.LIMIT_EXCEEDED,
          start,
          previousEnd,
          "more than "
              + ExpressionParser.MAX_HEIGHT
              + " operations are chained; name parts of the formula as parameters");
    }
    heights.put(e, height);
    spans.put(e, new int[] {start, previousEnd});
    return e;
  }

  private Expression operand() throws TextFault {
    Token first = token;
    switch (first.kind()) {
      case NUMBER -> {
        advance();
        return placed(first.number().orElseThrow(), first.start());
      }
      case NAME -> {
        return named(first);
      }
      case END -> throw missingOperand();
      case SIGN -> {
        return signed(first);
      }
    }
    throw new IllegalStateException("token " + first);
  }

  private Expression signed(Token sign) throws TextFault {
    switch (sign.text()) {
      case "-" -> {
        advance();
        return placed(new Negation(expression(MINUS - 1)), sign.start());
      }
      case "+" -> {
        advance();
        return expression(MINUS - 1);
      }
      case "(" -> {
        advance();
        if (token.is(")")) {
          throw fault(sign.start(), token.end(), "there is nothing between these parentheses");
        }
        Expression inner = expression(0);
        close(sign);
        return inner;
      }
      default -> throw missingOperand();
    }
  }

  private TextFault missingOperand() {
    String found =
        token.kind() == Token.Kind.END ? "the formula ends" : "'" + token.text() + "' stands";
    return fault(
        token.start(), token.end(), found + " where a number, a name or a parenthesis is expected");
  }

  private void close(Token opened) throws TextFault {
    if (token.is(")")) {
      advance();
      return;
    }
    if (token.kind() == Token.Kind.END) {
      throw fault(opened.start(), opened.end(), "this parenthesis is not closed");
    }
    throw unexpected();
  }

  private Expression named(Token name) throws TextFault {
    advance();
    if (name.is("not")) {
      Expression operand = expression(NOT - 1);
      requireCondition(operand, "not");
      return placed(new Logical(Connective.NOT, List.of(operand)), name.start());
    }
    if (name.is("if")) {
      return conditional(name);
    }
    Optional<Function> function = Function.named(name.text());
    if (function.isPresent() && !names.knows(name.text())) {
      return call(name, function.get());
    }
    return placed(names.operand(name, token.is("(")), name.start());
  }

  private Expression conditional(Token name) throws TextFault {
    List<Expression> parts = arguments(name);
    if (parts.size() != 3) {
      throw fault(
          name.start(),
          previousEnd,
          "if takes 3 arguments, not " + parts.size() + ": if(condition, a, b)");
    }
    requireCondition(parts.get(0), "if");
    return placed(new Conditional(parts.get(0), parts.get(1), parts.get(2)), name.start());
  }

  private Expression call(Token name, Function function) throws TextFault {
    List<Expression> arguments = arguments(name);
    int fewest = function.fewestArguments();
    int most = function.mostArguments();
    if (arguments.size() < fewest || arguments.size() > most) {
      String wanted = fewest == most ? fewest + "" : fewest + " to " + most;
      throw fault(
          name.start(),
          previousEnd,
          name.text()
              + " takes "
              + wanted
              + (most == 1 ? " argument" : " arguments")
              + ", not "
              + arguments.size());
    }
    return placed(new Call(function, arguments), name.start());
  }

  private List<Expression> arguments(Token name) throws TextFault {
    Token opened = token;
    if (!opened.is("(")) {
      throw fault(
          name.start(),
          name.end(),
          "'"
              + name.text()
              + "' is a function; write its arguments in parentheses: "
              + name.text()
              + "( … )");
    }
    advance();
    List<Expression> arguments = new ArrayList<>();
    if (token.is(")")) {
      advance();
      return arguments;
    }
    arguments.add(expression(0));
    while (token.is(",")) {
      advance();
      arguments.add(expression(0));
    }
    close(opened);
    return arguments;
  }

  private static TextFault fault(int start, int end, String message) {
    return new TextFault(ProblemKind.EXPRESSION, start, end, message);
  }
}
