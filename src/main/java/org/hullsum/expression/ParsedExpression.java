package org.hullsum.expression;

import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import org.hullsum.problem.ProblemKind;
import org.hullsum.problem.TextFault;

/**
 * An expression with the text from which it was read, so that what is found wrong with a part later
 * can be shown at its place. Immutable.
 */
public final class ParsedExpression {
  private final Expression root;
  private final String text;
  private final Map<Expression, int[]> spans;
  private final List<String> notes;

  /** The map is taken over, not copied; its keys count by identity. */
  ParsedExpression(
      Expression root, String text, IdentityHashMap<Expression, int[]> spans, List<String> notes) {
    this.root = Objects.requireNonNull(root, "root");
    this.text = Objects.requireNonNull(text, "text");
    this.spans = spans;
    this.notes = List.copyOf(notes);
  }

  public Expression root() {
    return root;
  }

  public String text() {
    return text;
  }

  /** What a report must say of how the units in it were read; usually empty. */
  public List<String> notes() {
    return notes;
  }

  /**
   * Where a node stands in the text, by identity: index of its first character and index after its
   * last. A node that is not of this expression has the span of the whole text.
   */
  public int[] spanOf(Expression node) {
    int[] span = spans.get(node);
    return span == null ? new int[] {0, text.length()} : span.clone();
  }

  /** A fault at a node of this expression. */
  public TextFault faultAt(Expression node, ProblemKind kind, String message) {
    int[] span = spanOf(node);
    return new TextFault(kind, span[0], span[1], message);
  }
}
