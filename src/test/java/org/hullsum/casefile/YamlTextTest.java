package org.hullsum.casefile;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import org.hullsum.problem.Place;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every character of a scalar has its place in the file, however the scalar is written. */
class YamlTextTest {
  /**
   * A file with one key, the text of its value, and where the mark {@code !} of the text stands.
   */
  private record Written(String file, String text, int line, int column) {
    @Override
    public String toString() {
      return file;
    }
  }

  static List<Written> writings() {
    return List.of(
        new Written("k: a + !", "a + !", 1, 8),
        new Written("k:   \"a + !\"", "a + !", 1, 11),
        new Written("k: 'a + !'", "a + !", 1, 9),
        new Written("k: 'it''s !'", "it's !", 1, 11),
        new Written("k: \"a\\tb \\\"!\\\"\"", "a\tb \"!\"", 1, 12),
        new Written("k: \"\\u00b5 + !\"", "µ + !", 1, 14),
        new Written("k: \"\\xb5 + !\"", "µ + !", 1, 12),
        new Written("k: m\u00b2 + !", "m² + !", 1, 9),
        new Written("k: \uD83D\uDCA7 + !", "\uD83D\uDCA7 + !", 1, 8),
        new Written("k: a +\n   b +\n   !", "a + b + !", 3, 4),
        new Written("k: \"a +\n  b + \\\n  !\"", "a + b + !", 3, 3),
        new Written("k: >\n  a +\n  b + !\n", "a + b + !\n", 3, 7),
        new Written("k: |\n  a +\n  b + !\n", "a +\nb + !\n", 3, 7),
        new Written("k: {a: 1, b: [c, d + !]}", "d + !", 1, 22));
  }

  @ParameterizedTest
  @MethodSource("writings")
  void characterHasItsPlace(Written written) {
    SourceText source = new SourceText("f", written.file());
    YamlMap map = YamlReader.read(source, new ProblemAccumulator()).orElseThrow();
    YamlText text = last(map.entries().get(0).value());

    assertEquals(written.text(), text.text());
    assertEquals(
        new Place("f", written.line(), written.column()), text.place(text.text().indexOf('!')));
  }

  private static YamlText last(YamlValue value) {
    if (value.asText().isPresent()) {
      return value.asText().get();
    }
    List<YamlValue> children =
        value.asList().isPresent()
            ? value.asList().get().items()
            : value.asMap().orElseThrow().entries().stream().map(YamlMap.Entry::value).toList();
    return last(children.get(children.size() - 1));
  }

  @ParameterizedTest
  @MethodSource("writings")
  void endOfATextHasAPlaceBehindItsLastCharacter(Written written) {
    SourceText source = new SourceText("f", written.file());
    YamlMap map = YamlReader.read(source, new ProblemAccumulator()).orElseThrow();
    YamlText text = last(map.entries().get(0).value());
    Place end = text.place(text.text().length());
    Place mark = text.place(text.text().indexOf('!'));

    assertEquals(true, end.line() > mark.line() || end.column() > mark.column());
  }
}
