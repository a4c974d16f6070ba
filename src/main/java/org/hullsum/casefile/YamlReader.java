package org.hullsum.casefile;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hullsum.problem.Place;
import org.hullsum.problem.ProblemKind;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.common.FlowStyle;
import org.snakeyaml.engine.v2.composer.Composer;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.nodes.CollectionNode;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;
import org.snakeyaml.engine.v2.parser.ParserImpl;
import org.snakeyaml.engine.v2.scanner.StreamReader;
import org.snakeyaml.engine.v2.schema.FailsafeSchema;

/**
 * Reads YAML 1.2 into {@link YamlValue}s, within bounds on nesting, aliases and what the aliases
 * expand to, without duplicate keys, merge keys, tags, and values that hold themselves.
 */
final class YamlReader {
  private static final int MOST_ALIASES = 1000;

  /** Values after aliases are written out; ten times what 8 MB of text can hold without them. */
  private static final long MOST_VALUES = 20_000_000;

  /** An alias stands for a copy: the sizes of what it copies add up. */
  private final Map<Node, YamlValue> done = new IdentityHashMap<>();

  private final Map<YamlValue, Long> sizes = new IdentityHashMap<>();
  private final SourceText source;
  private final ProblemAccumulator problems;

  /** Whether a value holds itself, so that there is no tree to look at. */
  private boolean endless;

  private YamlReader(SourceText source, ProblemAccumulator problems) {
    this.source = source;
    this.problems = problems;
  }

  /** The mapping that the file holds; empty where a problem was reported. */
  static Optional<YamlMap> read(SourceText source, ProblemAccumulator problems) {
    YamlReader reader = new YamlReader(source, problems);
    return reader.compose().flatMap(reader::root);
  }

  private Optional<Node> compose() {
    LoadSettings settings =
        LoadSettings.builder()
            .setLabel(source.file())
            .setUseMarks(true)
            .setSchema(new FailsafeSchema())
            .setAllowDuplicateKeys(true)
            .setAllowNonScalarKeys(true)
            .setMaxAliasesForCollections(MOST_ALIASES)
            .setCodePointLimit(FileTextReader.MOST_BYTES + 1)
            .build();
    BoundedParser parser =
        new BoundedParser(new ParserImpl(settings, new StreamReader(settings, source.text())));
    try {
      Optional<Node> node = new Composer(settings, parser).getSingleNode();
      if (node.isEmpty()) {
        problems.add(
            ProblemKind.NOT_TEXT,
            source.wholeFile(),
            "the file holds only comments; a case begins with `format: hullsum-case/1`");
      }
      return node;
    } catch (YamlEngineException fault) {
      YamlFaults.report(fault, source, problems);
      return Optional.empty();
    }
  }

  private Optional<YamlMap> root(Node node) {
    Optional<YamlValue> value = convert(node, false);
    if (value.isEmpty() || endless) {
      return Optional.empty();
    }
    if (sizes.getOrDefault(value.get(), 1L) > MOST_VALUES) {
      problems.add(
          ProblemKind.LIMIT_EXCEEDED,
          source.wholeFile(),
          "the aliases of this file stand for more than " + MOST_VALUES + " values");
      return Optional.empty();
    }
    Optional<YamlMap> map = value.get().asMap();
    if (map.isEmpty()) {
      problems.add(
          ProblemKind.WRONG_TYPE,
          value.get().place(),
          "a case is a mapping that begins with `format: hullsum-case/1`; here is "
              + value.get().described()
              + value.get().asText().map(YamlTraps::hint).orElse(""));
    }
    return map;
  }

  private Optional<YamlValue> convert(Node node, boolean inFlow) {
    YamlValue known = done.get(node);
    if (known != null) {
      return Optional.of(known);
    }
    if (node.isRecursive()) {
      endless = true;
      problems.add(
          ProblemKind.WRONG_VALUE,
          place(node.getStartMark()),
          "this value holds itself by an alias");
      return Optional.empty();
    }
    Optional<YamlValue> value =
        switch (node.getNodeType()) {
          case SCALAR -> Optional.of(text((ScalarNode) node, inFlow));
          case SEQUENCE -> list((SequenceNode) node, inFlow);
          case MAPPING -> map((MappingNode) node, inFlow);
          case ANCHOR -> Optional.empty();
        };
    value.ifPresent(v -> done.put(node, v));
    return value;
  }

  private static boolean flow(CollectionNode<?> node, boolean inFlow) {
    return inFlow || node.getFlowStyle() == FlowStyle.FLOW;
  }

  private Optional<YamlValue> list(SequenceNode node, boolean inFlow) {
    List<YamlValue> items = new ArrayList<>();
    long size = 1;
    for (Node item : node.getValue()) {
      Optional<YamlValue> value = convert(item, flow(node, inFlow));
      if (value.isPresent()) {
        items.add(value.get());
        size += sizes.getOrDefault(value.get(), 1L);
      }
    }
    YamlList list = new YamlList(items, place(node.getStartMark()));
    sizes.put(list, Math.min(size, 2 * MOST_VALUES));
    return Optional.of(list);
  }

  private Optional<YamlValue> map(MappingNode node, boolean inFlow) {
    Map<String, Place> seen = new HashMap<>();
    List<YamlMap.Entry> entries = new ArrayList<>();
    long size = 1;
    for (NodeTuple tuple : node.getValue()) {
      Optional<YamlText> key =
          convert(tuple.getKeyNode(), flow(node, inFlow)).flatMap(YamlValue::asText);
      if (key.isEmpty()) {
        problems.add(
            ProblemKind.WRONG_TYPE,
            place(tuple.getKeyNode().getStartMark()),
            "a key is a text; here is a list or a mapping");
        continue;
      }
      if (!acceptKey(key.get(), seen)) {
        continue;
      }
      Optional<YamlValue> value = convert(tuple.getValueNode(), flow(node, inFlow));
      if (value.isPresent()) {
        entries.add(new YamlMap.Entry(key.get(), value.get()));
        size += sizes.getOrDefault(value.get(), 1L);
      }
    }
    YamlMap map = new YamlMap(entries, place(node.getStartMark()));
    sizes.put(map, Math.min(size, 2 * MOST_VALUES));
    return Optional.of(map);
  }

  private boolean acceptKey(YamlText key, Map<String, Place> seen) {
    if (key.plain() && key.text().equals("<<")) {
      problems.add(
          ProblemKind.MERGE_KEY,
          key.place(),
          "merge keys (`<<`) are not part of the format; write the keys out, or let an alias stand"
              + " for a whole value");
      return false;
    }
    Place first = seen.putIfAbsent(key.text(), key.place());
    if (first != null) {
      problems.add(
          ProblemKind.DUPLICATE_KEY,
          key.place(),
          "the key " + key.shown() + " stands here twice; first on line " + first.line());
      return false;
    }
    return true;
  }

  private YamlText text(ScalarNode node, boolean inFlow) {
    YamlText.Style style =
        switch (node.getScalarStyle()) {
          case SINGLE_QUOTED -> YamlText.Style.SINGLE_QUOTED;
          case DOUBLE_QUOTED -> YamlText.Style.DOUBLE_QUOTED;
          case LITERAL, FOLDED -> YamlText.Style.BLOCK;
          default -> YamlText.Style.PLAIN;
        };
    int start = index(node.getStartMark());
    return new YamlText(
        node.getValue(), style, inFlow, start, Math.max(start, index(node.getEndMark())), source);
  }

  private int index(Optional<Mark> mark) {
    return mark.map(m -> source.indexOf(m.getLine(), m.getColumn())).orElse(0);
  }

  private Place place(Optional<Mark> mark) {
    return source.place(index(mark));
  }
}
