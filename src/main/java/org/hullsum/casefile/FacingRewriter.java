package org.hullsum.casefile;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import java.util.Set;

/**
 * Turns the {@code facing} of patches in the text of a case file, and leaves every other character
 * as it is.
 */
public final class FacingRewriter {
  private static final String BYTE_ORDER_MARK = "\uFEFF";

  private static final Map<String, String> OPPOSITES =
      Map.of(
          "as-drawn", "reversed",
          "reversed", "as-drawn",
          "upward", "downward",
          "downward", "upward");

  private final SourceText source;
  private final TextEdits edits = new TextEdits();
  private final Map<String, String> refused = new LinkedHashMap<>();

  /**
   * What became of a file.
   *
   * @param text of the file, as it is to be written
   * @param refused patches that could not be turned, each with the reason
   */
  public record Turned(String text, Map<String, String> refused) {
    public Turned {
      refused = Map.copyOf(refused);
    }
  }

  private FacingRewriter(SourceText source) {
    this.source = source;
  }

  /**
   * Turns patches of a case that can be read.
   *
   * @param file the case
   * @param patches the names of those to be turned
   * @throws IOException if the file can't be read any more
   */
  public static Turned turn(Path file, Set<String> patches) throws IOException {
    return turn(Files.readString(file, StandardCharsets.UTF_8), file.toString(), patches);
  }

  static Turned turn(String whole, String name, Set<String> patches) {
    String mark = whole.startsWith(BYTE_ORDER_MARK) ? BYTE_ORDER_MARK : "";
    SourceText source = new SourceText(name, whole.substring(mark.length()));
    FacingRewriter rewriter = new FacingRewriter(source);
    YamlMap root =
        YamlReader.read(source, new ProblemAccumulator())
            .orElseThrow(() -> new IllegalArgumentException(name + " is no case"));
    root.entry("patches").flatMap(e -> e.value().asMap()).ifPresent(m -> rewriter.look(m, patches));
    return new Turned(mark + rewriter.edits.appliedTo(source.text()), rewriter.refused);
  }

  private void look(YamlMap all, Set<String> patches) {
    for (YamlMap.Entry entry : all.entries()) {
      if (!patches.contains(entry.name())) {
        continue;
      }
      Optional<YamlMap> map = entry.value().asMap();
      Optional<String> other =
          all.entries().stream()
              .filter(e -> !e.name().equals(entry.name()) && begin(e) == begin(entry))
              .map(YamlMap.Entry::name)
              .findFirst();
      if (other.isPresent()) {
        refused.put(
            entry.name(), "`" + other.get() + "` is the same text by an alias; write it out twice");
      } else {
        map.ifPresent(m -> turn(entry.name(), m));
      }
    }
  }

  /** Where the text of a patch begins: the same for two that are one by an alias. */
  private static int begin(YamlMap.Entry patch) {
    return patch.value().asMap().map(m -> m.entries().get(0).key().start()).orElse(-1);
  }

  private void turn(String patch, YamlMap map) {
    Optional<YamlMap.Entry> facing = map.entry("facing");
    Optional<String> fault =
        facing.isPresent() ? changed(facing.get()) : inserted(map.entry("surface").orElseThrow());
    fault.ifPresent(reason -> refused.put(patch, reason));
  }

  /** Turns a facing that is written; tells why it can't. */
  private Optional<String> changed(YamlMap.Entry facing) {
    if (facing.value().asText().isPresent()) {
      YamlText word = facing.value().asText().get();
      if (word.start() < facing.key().end()) {
        return Optional.of("its facing is an alias; write the word out");
      }
      edits.replace(word.start(), word.end(), OPPOSITES.getOrDefault(word.text(), "reversed"));
      return Optional.empty();
    }
    Optional<YamlList> along =
        facing.value().asMap().flatMap(m -> m.entry("along")).flatMap(e -> e.value().asList());
    if (along.isEmpty()) {
      return Optional.of(
          "`away-from` has no opposite; write as-drawn, reversed or {along: VECTOR} instead");
    }
    for (YamlValue item : along.get().items()) {
      Optional<YamlText> component = item.asText();
      if (component.isEmpty() || component.get().start() < facing.key().end()) {
        return Optional.of("the components of `along` are not written out there");
      }
      YamlText text = component.get();
      edits.replace(text.start(), text.end(), negated(text));
    }
    return Optional.empty();
  }

  /** A component with the other sign, written as it was. */
  private static String negated(YamlText text) {
    String plain = text.text().strip();
    String turned =
        plain.matches("[-+]?0*\\.?0*")
            ? plain
            : plain.matches("-[\\w.]+")
                ? plain.substring(1)
                : plain.matches("\\+?[\\w.]+") ? "-" + plain.replace("+", "") : "-(" + plain + ")";
    return switch (text.style()) {
      case SINGLE_QUOTED -> "'" + turned + "'";
      case DOUBLE_QUOTED -> '"' + turned + '"';
      default -> turned;
    };
  }

  /** Writes a facing before the surface, in the style of the mapping. */
  private Optional<String> inserted(YamlMap.Entry surface) {
    YamlText key = surface.key();
    int line = source.lineAt(key.start());
    int lineStart = source.indexOf(line, 0);
    String before = source.text().substring(lineStart, key.start());
    if (key.inFlow()) {
      edits.replace(key.start(), key.start(), "facing: reversed, ");
    } else if (before.isBlank()) {
      String end = source.line(line).length() + 2 == source.lineLength(line) ? "\r\n" : "\n";
      edits.replace(key.start(), key.start(), "facing: reversed" + end + before);
    } else {
      return Optional.of("there is no room for `facing` before its surface; write it by hand");
    }
    return Optional.empty();
  }
}
