package org.hullsum.casefile;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import org.hullsum.problem.ProblemKind;
import org.snakeyaml.engine.v2.common.Anchor;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.events.MappingStartEvent;
import org.snakeyaml.engine.v2.events.NodeEvent;
import org.snakeyaml.engine.v2.events.ScalarEvent;
import org.snakeyaml.engine.v2.events.SequenceStartEvent;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.parser.Parser;

/**
 * A parser that gives up where a file nests too deep or uses what the format has not (tags, anchors
 * to which nothing refers), before anything recursive sees it.
 */
final class BoundedParser implements Parser {
  /** A case file needs about ten levels. */
  static final int DEEPEST = 64;

  /** Why the parser gave up. */
  static final class Refusal extends YamlEngineException {
    private static final long serialVersionUID = 1L;

    private final ProblemKind kind;
    private final transient Optional<Mark> mark;

    Refusal(ProblemKind kind, Optional<Mark> mark, String message) {
      super(message);
      this.kind = kind;
      this.mark = mark;
    }

    ProblemKind kind() {
      return kind;
    }

    Optional<Mark> mark() {
      return mark;
    }
  }

  private final Parser parser;
  private final Map<String, NodeEvent> unusedAnchors = new LinkedHashMap<>();
  private int depth;

  BoundedParser(Parser parser) {
    this.parser = parser;
  }

  @Override
  public boolean checkEvent(Event.ID choice) {
    return parser.checkEvent(choice);
  }

  @Override
  public Event peekEvent() {
    return parser.peekEvent();
  }

  @Override
  public boolean hasNext() {
    return parser.hasNext();
  }

  @Override
  public Event next() {
    Event event = parser.next();
    switch (event.getEventId()) {
      case SequenceStart, MappingStart -> {
        depth++;
        if (depth > DEEPEST) {
          throw new Refusal(
              ProblemKind.LIMIT_EXCEEDED,
              event.getStartMark(),
              "lists and mappings nest deeper than " + DEEPEST + " levels here");
        }
      }
      case SequenceEnd, MappingEnd -> depth--;
      default -> {}
    }
    refuseTag(event);
    follow(event);
    return event;
  }

  private void follow(Event event) {
    switch (event.getEventId()) {
      case Alias ->
          ((NodeEvent) event).getAnchor().map(Anchor::getValue).ifPresent(unusedAnchors::remove);
      case Scalar, SequenceStart, MappingStart -> {
        NodeEvent node = (NodeEvent) event;
        node.getAnchor().map(Anchor::getValue).ifPresent(name -> unusedAnchors.put(name, node));
      }
      case StreamEnd -> refuseUnused();
      default -> {}
    }
  }

  /** A text that begins with an ampersand reads as an anchor, and its beginning is gone. */
  private void refuseUnused() {
    Optional<Map.Entry<String, NodeEvent>> anchor = unusedAnchors.entrySet().stream().findFirst();
    if (anchor.isPresent()) {
      throw new Refusal(
          ProblemKind.SYNTAX,
          anchor.get().getValue().getStartMark(),
          "a text that begins with `&` is an anchor to YAML, and nothing refers to `&"
              + anchor.get().getKey()
              + "`: quote the text, as in \"&…\", or leave the anchor out");
    }
  }

  private static void refuseTag(Event event) {
    Optional<String> tag =
        switch (event.getEventId()) {
          case Scalar -> ((ScalarEvent) event).getTag();
          case SequenceStart -> ((SequenceStartEvent) event).getTag();
          case MappingStart -> ((MappingStartEvent) event).getTag();
          default -> Optional.empty();
        };
    if (tag.isPresent()) {
      throw new Refusal(
          ProblemKind.SYNTAX,
          ((NodeEvent) event).getStartMark(),
          "a text that begins with `!` is a tag to YAML: quote it, as in \"!…\"");
    }
  }
}
